import type { MixFacts } from './mix.ts'
import { mixedDensityFigure } from './mixed-density.ts'
import { type Quantity, type Unit, convert, dimensionOf, quantity, valueIn } from './units.ts'

/**
 * An amount in the unit that packs are sold in: the same dimension, or volume to mass and back through the density of the mix.
 * Undefined where the dimension differs and no density is known.
 */
export function inDimension(amount: Quantity, { unit, mix }: { unit: Unit; mix?: MixFacts }): Quantity | undefined {
  if (dimensionOf(amount.unit) === dimensionOf(unit)) return convert(amount, unit)
  const density = mix && mixedDensityFigure(mix)
  if (!density || density.kind === 'not-stated') return undefined
  const { min, max, unit: per } = density.value
  if (min === undefined || max === undefined) return undefined
  const kilogramsPerLitre = valueIn({ value: (min + max) / 2, unit: per }, 'kg/L')
  return dimensionOf(unit) === 'mass'
    ? convert(quantity(valueIn(amount, 'L') * kilogramsPerLitre, 'kg'), unit)
    : convert(quantity(valueIn(amount, 'kg') / kilogramsPerLitre, 'L'), unit)
}
