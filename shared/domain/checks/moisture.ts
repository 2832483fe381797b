import { leastOf } from '../working.ts'
import { type Fact, factsOf, rangeOf } from '../fact.ts'
import { figureOfFact, notStated } from '../figure.ts'
import { formatRange } from '../format.ts'
import type { MixFacts } from '../mix.ts'
import type { Property } from '../property.ts'
import { type Quantity, quantity, valueIn } from '../units.ts'
import { type Check, type Laid, type Verdict, notMeasured, resinCourses, unknown } from './check.ts'

const tests = {
  substrateRelativeHumidity: 'humidity in the slab (ASTM F2170)',
  moistureEmission: 'moisture emission rate (ASTM F1869)',
} as const

/** The limit that holds at the film laid: one that asks for a thicker film does not hold. Undefined film: only unconditional limits hold. */
function limitsAt(facts: readonly Fact[], { result }: Laid): { holding: Fact[]; conditional: Fact[] } {
  const film = result.wetFilm.kind === 'not-stated' ? undefined : leastOf(result.wetFilm.value)
  const holds = (fact: Fact) => !fact.at?.film || (film !== undefined && valueIn(film, fact.at.film.unit) >= fact.at.film.value - 1e-9)
  return { holding: facts.filter(holds), conditional: facts.filter((fact) => !holds(fact)) }
}

/** Of the limits that hold, the most generous: the sheet allows it at this film. */
function limitOf(facts: readonly Fact[]): { fact: Fact; max: Quantity } | undefined {
  return facts
    .flatMap((fact) => {
      const range = rangeOf(fact)
      return range?.max === undefined ? [] : [{ fact, max: quantity(range.max, range.unit) }]
    })
    .sort((a, b) => valueIn(b.max, a.max.unit) - a.max.value)[0]
}

function verdictOf(laid: Laid & { mix: MixFacts }, property: Property & keyof typeof tests, measured: Quantity | null): Verdict {
  const { course, mix } = laid
  const facts = factsOf(mix.facts, property)
  const { holding, conditional } = limitsAt(facts, laid)
  const limit = limitOf(holding)
  const missing = { of: mix.name, subject: { kind: 'mix' as const, id: mix.id }, ask: 'the maker, in writing' }
  if (!limit) {
    const condition = conditional[0]?.at?.film
    const because = condition
      ? `a limit is stated only from a film of ${formatRange({ min: condition.value, max: condition.value, unit: condition.unit })}`
      : undefined
    return unknown(
      course.id,
      `No sheet of ${mix.name} states a limit for the ${tests[property]}${because ? ` at this film: ${because}` : ''}.`,
      [notStated(property, { ...missing, ...(because ? { because } : {}) })],
    )
  }
  const figures = [{ label: `limit of ${mix.name}`, figure: figureOfFact(limit.fact) }]
  if (!measured)
    return {
      ...unknown(
        course.id,
        `The ${tests[property]} has not been measured; the sheet allows ${formatRange({ max: limit.max.value, unit: limit.max.unit })}.`,
        [notMeasured(property, tests[property])],
      ),
      todo: 'Measure it before this floor is priced or laid. A result speaks only for that place and day.',
      figures,
    }
  const value = valueIn(measured, limit.max.unit)
  const met = value <= limit.max.value
  return {
    courseId: course.id,
    status: met ? 'met' : 'stop',
    says: `${tests[property][0]?.toUpperCase()}${tests[property].slice(1)} is ${formatRange({ min: measured.value, max: measured.value, unit: measured.unit })}; the sheet allows ${formatRange({ max: limit.max.value, unit: limit.max.unit })}.`,
    todo: 'Let the slab dry, or begin with a mix that is made for this moisture.',
    figures,
  }
}

export const moistureLimit: Check = {
  id: 'moisture-limit',
  title: 'Moisture in the slab',
  needs: ['substrateRelativeHumidity or moistureEmission of the first mix', 'the same measured'],
  source: 'the data sheet of the first mix on the slab; ASTM F2170, F1869',
  run(floor) {
    const first = resinCourses(floor).find(({ course, mix }) => mix && course.stage !== 'fill' && course.stage !== 'cove')
    if (!first?.mix) return []
    const laid = { ...first, mix: first.mix }
    const { substrateRelativeHumidity, moistureEmission } = floor.input.conditions
    const humidity = substrateRelativeHumidity === null ? null : quantity(substrateRelativeHumidity, '%')
    const wanted: [Property & keyof typeof tests, Quantity | null][] = [
      ['substrateRelativeHumidity', humidity],
      ['moistureEmission', moistureEmission],
    ]
    const stated = wanted.filter(([property, measured]) => measured !== null || factsOf(laid.mix.facts, property).length > 0)
    const asked = stated.length > 0 ? stated : wanted.slice(0, 1)
    return asked.map(([property, measured]) => verdictOf(laid, property, measured))
  },
}
