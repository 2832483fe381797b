import type { SectionLayer } from '../../drawing/section-layer.ts'
import type { Course, EvaluationInput } from '../build-up.ts'
import { isDry, productsOf } from '../course-result.ts'
import type { CourseResult, Evaluation } from '../evaluation.ts'
import type { Bay, Loss } from '../job.ts'
import type { MixFacts } from '../mix.ts'
import type { ProductFacts } from '../product.ts'
import type { CourseQuantity } from '../quantities.ts'
import type { Quantity, Unit } from '../units.ts'
import { convert } from '../units.ts'
import type { SpecHeader } from './document.ts'
import type { Register } from './sources.ts'

/** What a specification is written from. */
export interface SpecInput {
  header: Omit<SpecHeader, 'buildUp'>
  buildUp: SpecHeader['buildUp']
  input: EvaluationInput
  /** Reasons given at release for what a check did not meet. */
  reasons: Readonly<Record<string, string>>
  bays: readonly Bay[]
  texture: Quantity | null
  loss: Loss
}

/** One course with everything the document says of it. */
export interface SpecCourse {
  /** From 1, bottom up. */
  number: number
  course: Course
  result: CourseResult
  mix: MixFacts | undefined
  /** What is laid on it next. */
  next: MixFacts | undefined
  filler: ProductFacts | undefined
  broadcast: ProductFacts | undefined
  products: ProductFacts[]
}

/** The floor as the parts of the document read it. */
export interface Floor {
  given: SpecInput
  evaluation: Evaluation
  courses: SpecCourse[]
  mixes: MixFacts[]
  /** Components, fillers and aggregates, each once. */
  products: ProductFacts[]
  aggregates: ProductFacts[]
  quantities: CourseQuantity[]
  layers: SectionLayer[]
  register: Register
}

const unique = <T extends { id: string }>(list: readonly T[]): T[] => [...new Map(list.map((one) => [one.id, one])).values()]

/** Courses with their mixes and what comes next, and every mix and product once. */
export function readFloor({ input }: SpecInput, evaluation: Evaluation): Pick<Floor, 'courses' | 'mixes' | 'products' | 'aggregates'> {
  const mixOf = (course: Course | undefined) => (course?.mixId ? input.mixes[course.mixId] : undefined)
  const productOf = (id: string | undefined) => (id ? input.products[id] : undefined)
  const courses = input.courses.flatMap((course, index): SpecCourse[] => {
    const result = evaluation.courses[index]
    if (!result) return []
    const next = mixOf(input.courses.slice(index + 1).find((one) => !isDry(one)))
    return [
      {
        number: index + 1,
        course,
        result,
        next,
        mix: mixOf(course),
        products: productsOf(course, input),
        filler: productOf(course.filler?.productId),
        broadcast: productOf(course.broadcast?.productId),
      },
    ]
  })
  return {
    courses,
    mixes: unique(courses.flatMap(({ mix }) => mix ?? [])),
    products: unique(courses.flatMap(({ products }) => products)),
    aggregates: unique(courses.flatMap(({ filler, broadcast }) => [filler, broadcast].filter((one) => one !== undefined))),
  }
}

/** A fill without a film of its own: it takes what the joints and cracks hold. */
export function fillsByVolume({ course }: SpecCourse): boolean {
  return course.stage === 'fill' && course.thickness === null && course.spreadRate === null
}

/** The three temperatures that windows are told at, in the unit that most of the sheets use; the slab's where they are even. */
export function threeTemperatures({ mixes, given }: Pick<Floor, 'mixes' | 'given'>): Quantity[] {
  const stated = mixes.flatMap(
    ({ facts }) => facts.find(({ property, at }) => property === 'recoatWindow' && at?.temperature)?.at?.temperature?.unit ?? [],
  )
  const fahrenheit = stated.filter((one) => one === '°F').length
  const slab = given.input.conditions.slabTemperature.unit
  const unit: Unit = fahrenheit * 2 === stated.length ? slab : fahrenheit * 2 > stated.length ? '°F' : '°C'
  return (unit === '°F' ? [50, 70, 90] : [10, 20, 30]).map((value) => ({ value, unit }))
}

/** Area of all bays in the unit of the first; null when there are none. */
export function areaOf(bays: readonly Bay[]): Quantity | null {
  const [first] = bays
  if (!first) return null
  const { unit } = first.area
  return { value: bays.reduce((sum, { area }) => sum + convert(area, unit).value, 0), unit }
}
