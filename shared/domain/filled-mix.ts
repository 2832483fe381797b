import { yieldPerLiquid } from './aggregate.ts'
import type { Course, EvaluationInput } from './build-up.ts'
import { type Fact, factOf, rangeOf } from './fact.ts'
import { type Figure, notStated } from './figure.ts'
import { formatRange } from './format.ts'
import type { ProductFacts } from './product.ts'
import { quantity, valueIn } from './units.ts'

/** Quartz weighs 2.65 kg/L as grain and about 1.6 as a heap: a silica "density" under this is the heap's. Source: ASTM C29 terms; from memory. */
const leastSilicaGrain = quantity(2, 'kg/L')

/** What a filled mix yields: volume of mix per volume of liquid resin, 1 where no sand goes in the pail. */
export type FilledYield = { perLiquid: number; fact: Fact | undefined } | { missing: Figure }

/**
 * Volume of filled mix per volume of liquid resin, from the course's loading and the density that the sand's own sheet states for its grain.
 * Not known when that is not stated, or when what is stated can only be the density of the heap. Source: absolute volumes.
 */
export function filledYield(course: Pick<Course, 'title' | 'filler'>, products: EvaluationInput['products']): FilledYield {
  if (!course.filler) return { perLiquid: 1, fact: undefined }
  const product = products[course.filler.productId]
  const fact = product && factOf(product.facts, 'density')
  const range = rangeOf(fact)
  if (range?.min === undefined || range.max === undefined) return { missing: noGrainDensity(course.title, product) }
  const density = quantity((range.min + range.max) / 2, range.unit)
  if (product?.chemistry === 'silica' && valueIn(density, 'kg/L') < leastSilicaGrain.value) {
    return { missing: noGrainDensity(course.title, product, `${formatRange(range)} is the density of the heap, not of the grain`) }
  }
  return { perLiquid: yieldPerLiquid(course.filler.loading, density), fact }
}

function noGrainDensity(title: string, product: ProductFacts | undefined, because = 'the sand’s own density is not stated'): Figure {
  return notStated('density', {
    of: product?.name ?? title,
    subject: product ? { kind: 'product', id: product.id } : null,
    ask: 'the maker, in writing',
    because,
  })
}
