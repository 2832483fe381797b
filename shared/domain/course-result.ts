import { type Course, type EvaluationInput, dryStages } from './build-up.ts'
import { aggregateOf, fillerOf, filmsOf, resinOf } from './course-films.ts'
import type { CourseResult } from './evaluation.ts'
import { type Fact, factsOf, rangeOf } from './fact.ts'
import { type Figure, figureOfFact, notStated } from './figure.ts'
import { type Handled, unionOfHazards } from './hazard.ts'
import type { MixFacts } from './mix.ts'
import type { ProductFacts } from './product.ts'
import { proportionsOf } from './proportion.ts'
import { type Property, properties } from './property.ts'
import { valueAt } from './sheet-table.ts'
import { valueIn } from './units.ts'
import { windowAt } from './window.ts'

function noMix(property: Property, course: Course): Figure {
  return notStated(property, {
    of: course.title,
    subject: null,
    ask: 'whoever builds this up',
    because: 'no mix is chosen for this course',
  })
}

/** The greatest a VOC fact allows, g/L; a least alone allows anything. */
export function mostVoc(fact: Fact): number {
  const range = rangeOf(fact)
  return range?.max === undefined ? Infinity : valueIn({ value: range.max, unit: range.unit }, 'g/L')
}

/**
 * VOC of the mix as its sheet states it, unthinned; of several statements the greatest. It is never worked out from the contents of the parts, which
 * leave out water unlike by unlike.
 */
function vocOf(course: Course, mix: MixFacts | undefined): Figure {
  if (!mix) return noMix('voc', course)
  const [worst] = factsOf(mix.facts, 'voc')
    .filter(({ thinned }) => !thinned)
    .sort((a, b) => mostVoc(b) - mostVoc(a))
  return worst
    ? figureOfFact(worst)
    : notStated('voc', { of: mix.name, subject: { kind: 'mix', id: mix.id }, ask: 'the maker, in writing' })
}

/** Everything handled in a course: the parts of its mix and its aggregates. */
export function productsOf(course: Course, { mixes, products }: Pick<EvaluationInput, 'mixes' | 'products'>): ProductFacts[] {
  const mix = course.mixId ? mixes[course.mixId] : undefined
  const sands = [course.filler?.productId, course.broadcast?.productId].flatMap((id) => (id && products[id]) || [])
  return [...(mix?.parts.map(({ product }) => product) ?? []), ...sands]
}

const ofSafety = ({ property }: Fact) => properties[property].source === 'safety'

/**
 * Everything handled in a course with what its labels say. Where one safety sheet speaks of a whole mix, what it says of a part goes with that part
 * and what it says of all parts stands under the mix's own name.
 */
export function handledIn(course: Course, input: Pick<EvaluationInput, 'mixes' | 'products'>): Handled[] {
  const mix = course.mixId ? input.mixes[course.mixId] : undefined
  const ofMix = mix?.facts.filter(ofSafety) ?? []
  if (!mix || ofMix.length === 0) return productsOf(course, input)
  const ofPart = (product: ProductFacts) => {
    const part = mix.parts.find((one) => one.product.id === product.id)?.part
    return part ? ofMix.filter((fact) => fact.part === part) : []
  }
  const whole = ofMix.filter(({ part }) => part === 'mixed')
  const own = productsOf(course, input).map((product) => ({ ...product, facts: [...product.facts, ...ofPart(product)] }))
  return whole.length > 0 ? [...own, { id: mix.id, name: mix.name, facts: whole }] : own
}

/** True for preparing and grinding: work on the surface that lays nothing down. */
export function isDry(course: Course): boolean {
  return (dryStages as readonly string[]).includes(course.stage)
}

/** The figures of one course at the floor's conditions; `next` is the mix laid upon it, for windows that are stated for one coat alone. */
export function courseResult(course: Course, input: EvaluationInput, next: MixFacts | undefined): CourseResult {
  const mix = course.mixId ? input.mixes[course.mixId] : undefined
  const { slabTemperature: temperature } = input.conditions
  const filler = fillerOf(course, input.products)
  const films = filmsOf(course, mix, filler)
  const resinPerArea = resinOf(films.spread, filler)
  const at = (property: Property): Figure => (mix ? valueAt(mix.facts, { property, temperature, mix }) : noMix(property, course))
  const handled = handledIn(course, input)
  return {
    courseId: course.id,
    wetFilm: films.wet,
    dryFilm: films.dry,
    spreadRate: films.spread,
    resinPerArea,
    aggregatePerArea: aggregateOf(course, resinPerArea),
    ...proportionsOf(mix),
    potLife: at('potLife'),
    workingTime: at('workingTime'),
    window: mix ? windowAt(mix, { temperature, next }) : noMix('recoatWindow', course),
    footTraffic: at('footTraffic'),
    vehicleTraffic: at('vehicleTraffic'),
    fullCure: at('fullCure'),
    voc: vocOf(course, mix),
    hazards: handled.length > 0 ? unionOfHazards(handled) : null,
  }
}
