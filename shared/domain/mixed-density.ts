import { type Fact, factOf, rangeOf } from './fact.ts'
import { type Figure, notStated } from './figure.ts'
import { formatNumber, formatRange } from './format.ts'
import type { MixFacts } from './mix.ts'
import { densityFactOf, ratiosOf } from './proportion.ts'
import { mixedDensity } from './ratio.ts'
import { type Unit, quantity, valueIn } from './units.ts'
import { computed, sourceOf } from './working.ts'

/** The middle of a fact's range, in a unit; undefined when it has but one end. */
function middleIn(fact: Fact | undefined, unit: Unit): number | undefined {
  const range = rangeOf(fact)
  if (range?.min === undefined || range.max === undefined) return undefined
  return valueIn({ value: (range.min + range.max) / 2, unit: range.unit }, unit)
}

/**
 * Density of a mix: as its own sheet states it, else worked out from the ratio by volume and the densities of its parts, Σ part × density ÷ Σ part;
 * volumes are taken to add up. Not stated when neither is known.
 */
export function mixedDensityFigure(mix: MixFacts): Figure {
  const [alone] = mix.parts.length === 1 ? mix.parts : []
  const stated = factOf(mix.facts, 'density') ?? (alone && densityFactOf(mix, alone))
  const range = rangeOf(stated)
  if (stated && range) return { kind: 'fact', value: range, factId: stated.id, origin: stated.origin }
  const facts = mix.parts.map((part) => densityFactOf(mix, part))
  const lacking = mix.parts[facts.findIndex((fact) => middleIn(fact, 'kg/L') === undefined)]
  const { volume } = ratiosOf(mix)
  if (lacking || !volume) {
    return lacking
      ? notStated('density', {
          of: lacking.product.name,
          part: lacking.part,
          subject: { kind: 'product', id: lacking.product.id },
          ask: 'the maker, in writing',
        })
      : notStated('mixRatio', { of: mix.name, subject: { kind: 'mix', id: mix.id }, ask: 'the maker, in writing' })
  }
  const unit = rangeOf(facts[0])?.unit === 'lb/gal' ? 'lb/gal' : 'kg/L'
  const densities = facts.map((fact) => middleIn(fact, unit) ?? Number.NaN)
  const value = quantity(mixedDensity(volume, densities), unit)
  const terms = volume.map((part, index) => `${formatNumber(part)} × ${formatNumber(densities[index] ?? Number.NaN)}`).join(' + ')
  const total = volume.reduce((sum, part) => sum + part, 0)
  return computed(
    value,
    {
      formula: 'density of the mix = Σ part × density ÷ Σ part, by volume',
      sum: `(${terms}) ÷ ${formatNumber(total)} = ${formatRange({ min: value.value, max: value.value, unit })}`,
      source: 'conservation of mass; volumes taken to add up',
    },
    facts.flatMap((fact, index) => (fact ? [sourceOf(`density of ${mix.parts[index]?.product.name ?? 'a part'}`, fact)] : [])),
  )
}
