import type { Course, EvaluationInput } from '../../shared/domain/build-up.ts'
import { newCourse } from '../../shared/domain/course.ts'
import { evaluate } from '../../shared/domain/evaluate.ts'
import type { Fact } from '../../shared/domain/fact.ts'
import type { Finding } from '../../shared/domain/finding.ts'
import type { MixFacts } from '../../shared/domain/mix.ts'
import type { ProductFacts } from '../../shared/domain/product.ts'
import type { Property, Statement } from '../../shared/domain/property.ts'
import type { SheetSummary } from '../../shared/domain/sheet.ts'

/** A floor on which every check is met, to be bent by a test until one is not. Invented throughout. */
export interface Example {
  courses: Course[]
  mix: MixFacts
  input: EvaluationInput
}

const origin = { kind: 'entered', reason: 'example', by: 'example', at: '2026-01-01T00:00:00Z' } as const

/** A fact of the example. */
export function fact(property: Property, value: Statement['value'], rest: Partial<Fact> = {}): Fact {
  return { id: `${property} ${JSON.stringify(value)} ${JSON.stringify(rest.at ?? {})}`, property, part: 'mixed', value, origin, ...rest }
}

const sheet = (kind: SheetSummary['kind']): SheetSummary => ({
  id: `${kind}-sheet`,
  kind,
  title: `${kind} sheet`,
  revisionId: `${kind}-revision`,
  revisionDate: '2025-06-01',
  pages: 2,
  superseded: false,
})
const product = (id: string, density: number): ProductFacts => ({
  id,
  name: id,
  maker: 'Ostrel',
  kind: 'resin',
  chemistry: 'epoxy',
  status: 'active',
  facts: [fact('density', { min: density, max: density, unit: 'lb/gal' })],
  sheets: [sheet('safety')],
})
const at = (temperature: number) => ({ at: { temperature: { value: temperature, unit: '°F' as const } } })

/** The floor: shot blast CSP 4, a prime and a top of one epoxy, 2 : 1 by volume and 100 : 43.2 by weight (9.6 and 8.3 lb/gal). */
export function exampleFloor(): Example {
  const mix: MixFacts = {
    id: 'mix',
    name: 'Example epoxy',
    maker: 'Ostrel',
    chemistry: 'epoxy',
    color: '#888888',
    status: 'active',
    sheets: [sheet('data')],
    parts: [
      { part: 'A', product: product('Part A', 9.6) },
      { part: 'B', product: product('Part B', 8.3) },
    ],
    facts: [
      fact('mixRatio', { parts: [2, 1], basis: 'volume' }),
      fact('mixRatio', { parts: [100, 43.2], basis: 'weight' }),
      fact('volumeSolids', { min: 100, max: 100, unit: '%' }),
      fact('filmThickness', { min: 8, max: 12, unit: 'mil' }, { film: 'wet' }),
      fact('recoatWindow', { min: 9, max: 24, unit: 'h' }, at(70)),
      fact('recoatWindow', { min: 18, max: 48, unit: 'h' }, at(50)),
      fact('applicationTemperature', { min: 50, max: 90, unit: '°F' }),
      fact('dewPointMargin', { min: 5, unit: 'Δ°F' }),
      fact('substrateRelativeHumidity', { max: 80, unit: '%' }),
      fact('voc', { max: 50, unit: 'g/L' }),
      fact('surfaceProfile', { min: 3, max: 5, unit: 'CSP' }),
    ],
  }
  const laid = (id: string, stage: Course['stage'], startsAfter: number): Course => ({
    ...newCourse(stage, id),
    mixId: 'mix',
    spreadRate: { value: 150, unit: 'ft²/gal' },
    startsAfter,
  })
  const courses: Course[] = [
    { ...newCourse('prep', 'prep'), preparation: { method: 'steel shot blasting', profile: 4 } },
    laid('prime', 'prime', 0),
    laid('top', 'top', 12),
  ]
  return {
    courses,
    mix,
    input: {
      courses,
      mixes: { mix },
      products: {},
      onDate: '2026-12-01',
      sheetAgeLimitYears: 3,
      conditions: {
        slabTemperature: { value: 70, unit: '°F' },
        airTemperature: { value: 70, unit: '°F' },
        relativeHumidity: 45,
        substrateRelativeHumidity: 75,
        moistureEmission: null,
        vocPlace: 'us-national',
      },
    },
  }
}

/** A course of the example by id. */
export function courseOf({ courses }: Example, id: string): Course {
  const found = courses.find((one) => one.id === id)
  if (!found) throw new Error(`no course ${id}`)
  return found
}

/** Puts facts in the place of what the mix says of their properties; no facts: the property is stated no more. */
export function restate({ mix }: Example, property: Property, ...facts: Fact[]): void {
  mix.facts = [...mix.facts.filter((one) => one.property !== property), ...facts]
}

/** What a check says of a floor, course by course. */
export function findingsOf({ input }: Example, checkId: string): Finding[] {
  return evaluate(input).findings.filter((finding) => finding.checkId === checkId)
}

/** What a check says of one course. */
export function findingOf(floor: Example, checkId: string, courseId: string | null): Finding {
  const found = findingsOf(floor, checkId).find((finding) => finding.courseId === courseId)
  if (!found) throw new Error(`${checkId} says nothing of ${courseId ?? 'the floor'}`)
  return found
}
