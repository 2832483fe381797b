import type { CourseResult, Proportion } from './evaluation.ts'
import type { Figure, KnownFigure } from './figure.ts'
import { formatNumber, formatRange } from './format.ts'
import { notStated } from './figure.ts'
import type { MixFacts } from './mix.ts'
import { type Unit, quantity, valueIn } from './units.ts'
import { computed, mapRange, sourcesOf } from './working.ts'

/** One component's share of an amount of mixed resin, by volume and on the scale. */
export interface PartQuantity {
  part: Proportion['part']
  productId: string
  name: string
  volume: Figure
  mass: Figure
}

/**
 * What a volume of mixed resin takes of each part: volume × share of the volume, and that × the part's density. Not stated where the ratio by volume,
 * or the density, cannot be known.
 */
export function partQuantities(
  mix: MixFacts,
  { total, proportions }: { total: Figure; proportions: CourseResult['proportions'] },
): PartQuantity[] {
  return proportions.map((proportion) => {
    const volume = volumeOfPart(mix, total, proportion)
    return { part: proportion.part, productId: proportion.productId, name: proportion.name, volume, mass: massOfPart(volume, proportion) }
  })
}

function volumeOfPart(mix: MixFacts, total: Figure, { part, volumeShare }: Proportion): Figure {
  if (total.kind === 'not-stated') return total
  if (volumeShare === null) {
    return notStated('mixRatio', {
      of: mix.name,
      subject: { kind: 'mix', id: mix.id },
      ask: 'the maker, in writing',
      because: 'no ratio by volume is stated or can be worked out',
    })
  }
  const value = mapRange(total.value, total.value.unit, (amount) => amount * volumeShare)
  const sum = `${formatRange(total.value)} × ${formatNumber(volumeShare * 100, 2)} % = ${formatRange(value)}`
  return computed(
    value,
    { formula: `part ${part} = mixed volume × its share`, sum, source: 'the ratio by volume' },
    sourcesOf('mixed volume', total),
  )
}

function massOfPart(volume: Figure, { part, density }: Proportion): Figure {
  if (volume.kind === 'not-stated') return volume
  if (density.kind === 'not-stated') return density
  const { min, max, unit } = density.value
  if (min === undefined || max === undefined) {
    return notStated('density', {
      of: `part ${part}`,
      part,
      subject: null,
      ask: 'the maker, in writing',
      because: 'only a bound is stated',
    })
  }
  const middle = quantity((min + max) / 2, unit)
  const mass = massUnit(volume)
  const value = mapRange(volume.value, mass, (amount) =>
    valueIn(quantity(valueIn(quantity(amount, volume.value.unit), 'L') * valueIn(middle, 'kg/L'), 'kg'), mass),
  )
  const sum = `${formatRange(volume.value)} × ${formatRange({ min: middle.value, max: middle.value, unit })} = ${formatRange(value)}`
  return computed(value, { formula: 'mass = volume × density', sum, source: 'definition of density' }, [
    ...sourcesOf(`volume of part ${part}`, volume),
    ...sourcesOf(`density of part ${part}`, density),
  ])
}

const massUnit = (volume: KnownFigure): Unit => (volume.value.unit === 'gal' ? 'lb' : 'kg')
