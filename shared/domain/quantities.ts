import type { Course, EvaluationInput } from './build-up.ts'
import type { CourseResult } from './evaluation.ts'
import type { Figure } from './figure.ts'
import type { Bay, Loss } from './job.ts'
import { type KitPlan, chooseKits, joinPlans } from './kits.ts'
import type { MixFacts } from './mix.ts'
import { type PartKits, packsOfMix, packsOfProduct, partKitsOf } from './packs.ts'
import { type PartQuantity, partQuantities } from './part-quantities.ts'
import { broadcastMass, fillerMass } from './sand-quantities.ts'
import { type BayTerms, bayTerms, fillsOf, sumFigures } from './volume-terms.ts'
import { inDimension } from './volume-or-mass.ts'
import { greatestOf } from './working.ts'
import type { ProductFacts } from './product.ts'
import type { Quantity } from './units.ts'

export interface QuantitiesInput {
  floor: Pick<EvaluationInput, 'courses' | 'mixes' | 'products'>
  results: readonly CourseResult[]
  bays: readonly Bay[]
  /** Mean texture depth of the prepared slab; null: not measured, and then left out and said so. */
  texture: Quantity | null
  loss: Loss
}

interface BayQuantity extends BayTerms {
  bayId: string
  name: string
}

/** Whole packs for a need, or why there are none. `perBay`: kits are not carried from one bay to the next, since the sheet gives no leave to split them. */
interface Packing {
  plan: KitPlan | null
  partKits: PartKits
  perBay: boolean
}

interface AggregateQuantity {
  use: 'filler' | 'broadcast'
  product: Pick<ProductFacts, 'id' | 'name' | 'maker'>
  mass: Figure
  plan: KitPlan | null
}

export interface CourseQuantity {
  courseId: string
  title: string
  mix: Pick<MixFacts, 'id' | 'name' | 'maker'>
  bays: BayQuantity[]
  /** Mixed liquid resin, loss included. */
  total: Figure
  parts: PartQuantity[]
  packing: Packing
  aggregates: AggregateQuantity[]
}

/**
 * What a job takes, course by course and bay by bay, each term shown: film, texture of the slab under the first film, joints, spalls and loss; then whole
 * kits and bags. Courses that lay nothing down are left out. Kits are counted per bay unless the sheet allows part kits.
 */
export function jobQuantities(given: QuantitiesInput): CourseQuantity[] {
  return given.floor.courses.flatMap((course) => {
    const mix = course.mixId ? given.floor.mixes[course.mixId] : undefined
    const result = given.results.find(({ courseId }) => courseId === course.id)
    return mix && result ? [courseQuantity({ course, mix, result }, given)] : []
  })
}

function courseQuantity(
  { course, mix, result }: { course: Course; mix: MixFacts; result: CourseResult },
  given: QuantitiesInput,
): CourseQuantity {
  const fills = fillsOf(course, given.floor.courses)
  const bays = given.bays.map((bay): BayQuantity => ({
    bayId: bay.id,
    name: bay.name,
    ...bayTerms(bay, { course, result, fills, ...given }),
  }))
  const total = sumFigures(
    bays.map((bay) => bay.total),
    'sum of the bays',
  )
  return {
    courseId: course.id,
    title: course.title,
    mix: { id: mix.id, name: mix.name, maker: mix.maker },
    bays,
    total,
    parts: partQuantities(mix, { total, proportions: result.proportions }),
    packing: packingOf(mix, { total, bays: bays.map((bay) => bay.total) }),
    aggregates: aggregatesOf(course, { total, bays: given.bays, products: given.floor.products }),
  }
}

function packingOf(mix: MixFacts, { total, bays }: { total: Figure; bays: readonly Figure[] }): Packing {
  const partKits = partKitsOf(mix)
  const perBay = partKits !== 'allowed' && bays.length > 1
  const packs = packsOfMix(mix)
  const [first] = packs
  if (!first || total.kind === 'not-stated') return { plan: null, partKits, perBay }
  const plans = (perBay ? bays : [total]).map((figure) => {
    const need = figure.kind === 'not-stated' ? undefined : inDimension(greatestOf(figure.value), { unit: first.size.unit, mix })
    return need ? chooseKits(need, packs) : null
  })
  const known = plans.filter((plan) => plan !== null)
  return { plan: known.length === plans.length ? joinPlans(known, first.size.unit) : null, partKits, perBay }
}

function aggregatesOf(
  course: Course,
  { total, bays, products }: { total: Figure; bays: readonly Bay[]; products: EvaluationInput['products'] },
): AggregateQuantity[] {
  const line = (use: AggregateQuantity['use'], productId: string, mass: Figure): AggregateQuantity[] => {
    const product = products[productId]
    if (!product) return []
    const { id, name, maker } = product
    const bags = packsOfProduct(product).filter(({ size }) => inDimension(size, { unit: 'kg' }) !== undefined)
    return [{ use, product: { id, name, maker }, mass, plan: mass.kind === 'not-stated' ? null : chooseKits(greatestOf(mass.value), bags) }]
  }
  return [
    ...(course.filler ? line('filler', course.filler.productId, fillerMass(course.filler.loading, total)) : []),
    ...(course.broadcast ? line('broadcast', course.broadcast.productId, broadcastMass(course.broadcast.rate, bays)) : []),
  ]
}
