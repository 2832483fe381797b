import type { CourseResult, Proportion } from './evaluation.ts'
import { type Fact, factOf, factsOf, rangeOf, ratioOf } from './fact.ts'
import { type Figure, notStated } from './figure.ts'
import { formatNumber } from './format.ts'
import type { MixFacts } from './mix.ts'
import { perHundredOfA, sharesOf, volumeOfWeight, weightOfVolume } from './ratio.ts'
import { valueIn } from './units.ts'

type Part = MixFacts['parts'][number]

/** Density of one component: on its own sheet, or as the mix's data sheet states it for the part. */
export function densityFactOf(mix: MixFacts, { part, product }: Part): Fact | undefined {
  return factOf(product.facts, 'density') ?? factOf(mix.facts, 'density', part)
}

function densityFigure(mix: MixFacts, part: Part): Figure {
  const fact = densityFactOf(mix, part)
  const range = rangeOf(fact)
  if (fact && range) return { kind: 'fact', value: range, factId: fact.id, origin: fact.origin }
  return notStated('density', {
    of: part.product.name,
    part: part.part,
    subject: { kind: 'product', id: part.product.id },
    ask: 'the maker, in writing',
  })
}

/** kg/L of a component, the middle of a stated range; undefined when not stated. */
function densityOf(mix: MixFacts, part: Part): number | undefined {
  const range = rangeOf(densityFactOf(mix, part))
  if (!range) return undefined
  const ends = [range.min, range.max].filter((end) => end !== undefined)
  return valueIn({ value: ends.reduce((sum, end) => sum + end, 0) / ends.length, unit: range.unit }, 'kg/L')
}

/** The ratio of a mix by both bases: as stated where it is, through the densities where they are stated, else null. */
export function ratiosOf(mix: MixFacts): { volume: number[] | null; weight: number[] | null } {
  const ratios = factsOf(mix.facts, 'mixRatio').map(ratioOf)
  const stated = (basis: 'volume' | 'weight') =>
    ratios.find((ratio) => ratio?.basis === basis && ratio.parts.length === mix.parts.length)?.parts ?? null
  const [volume, weight] = [stated('volume'), stated('weight')]
  const densities = mix.parts.map((part) => densityOf(mix, part))
  const known = densities.filter((density) => density !== undefined)
  if (known.length < mix.parts.length) return { volume, weight }
  return { volume: volume ?? (weight && volumeOfWeight(weight, known)), weight: weight ?? (volume && weightOfVolume(volume, known)) }
}

const written = (parts: readonly number[], decimals: number) => parts.map((part) => formatNumber(part, decimals)).join(' : ')
/** A ratio by volume with its smallest part as one. */
const perSmallest = (parts: readonly number[]) => parts.map((part) => part / Math.min(...parts))

/** What each component is of the mix, and the ratio by volume and by weight in words. */
export function proportionsOf(mix: MixFacts | undefined): Pick<CourseResult, 'proportions' | 'ratioByVolume' | 'ratioByWeight'> {
  if (!mix) return { proportions: [], ratioByVolume: null, ratioByWeight: null }
  const alone = mix.parts.length === 1
  const { volume, weight } = ratiosOf(mix)
  const volumeShares = alone ? [1] : volume && sharesOf(volume)
  const massShares = alone ? [1] : weight && sharesOf(weight)
  const proportions = mix.parts.map((part, index): Proportion => ({
    part: part.part,
    productId: part.product.id,
    name: part.product.name,
    volumeShare: volumeShares?.[index] ?? null,
    massShare: massShares?.[index] ?? null,
    density: densityFigure(mix, part),
  }))
  return {
    proportions,
    ratioByVolume: alone || !volume ? null : written(perSmallest(volume), 2),
    ratioByWeight: alone || !weight ? null : written(perHundredOfA(weight), 1),
  }
}
