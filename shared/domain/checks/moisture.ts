import { type Fact, factsOf, rangeOf } from '../fact.ts'
import { figureOfFact } from '../figure.ts'
import { formatQuantity } from '../format.ts'
import type { Property } from '../property.ts'
import { type Quantity, quantity, valueIn } from '../units.ts'
import { leastOf } from '../working.ts'
import {
  type Check,
  type Laid,
  type LaidMix,
  type Verdict,
  capital,
  fieldCourses,
  notMeasured,
  unchosen,
  unknown,
  unstatedOfMix,
} from './check.ts'

const tests = {
  substrateRelativeHumidity: 'humidity in the slab (ASTM F2170)',
  moistureEmission: 'moisture emission rate (ASTM F1869)',
} as const
type Tested = Property & keyof typeof tests

/** True when a limit holds at the film laid: one without a film always, one from a film on only where so much is laid. */
function holds(fact: Fact, { result }: Laid): boolean {
  const from = fact.at?.film
  if (!from) return true
  const films = fact.film === 'wet' ? [result.wetFilm] : fact.film === 'dry' ? [result.dryFilm] : [result.wetFilm, result.dryFilm]
  return films.every((film) => film.kind !== 'not-stated' && valueIn(leastOf(film.value), from.unit) >= from.value * (1 - 1e-9))
}

const filmFrom = (fact: Fact) => (fact.at?.film ? valueIn(fact.at.film, 'µm') : 0)

/** The limit that holds at the film laid: that of the thickest film it fulfils, and of several for one film the lowest. */
function limitOf(facts: readonly Fact[], laid: Laid): { fact: Fact; max: Quantity } | undefined {
  const holding = facts.filter((fact) => holds(fact, laid))
  const thickest = Math.max(0, ...holding.map(filmFrom))
  return holding
    .filter((fact) => filmFrom(fact) === thickest)
    .flatMap((fact) => {
      const range = rangeOf(fact)
      return range?.max === undefined ? [] : [{ fact, max: quantity(range.max, range.unit) }]
    })
    .sort((a, b) => a.max.value - valueIn(b.max, a.max.unit))[0]
}

/** The sheet's own limits before typical ones. */
function limitsOf({ mix }: LaidMix, property: Tested): Fact[] {
  const facts = factsOf(mix.facts, property)
  const own = facts.filter(({ origin }) => origin.kind !== 'typical')
  return own.length > 0 ? own : facts
}

function noLimit({ course, mix }: LaidMix, property: Tested, facts: readonly Fact[]): Verdict {
  const film = facts.find((fact) => fact.at?.film)?.at?.film
  const because = film ? `a limit is stated only from a film of ${formatQuantity(film)}` : undefined
  const says = `No sheet of ${mix.name} states a limit for the ${tests[property]}${because ? ` at the film laid here: ${because}` : ''}.`
  return unknown(course.id, says, [unstatedOfMix(property, mix, because)])
}

function verdictOf(laid: LaidMix, property: Tested, measured: Quantity | null): Verdict {
  const { course, mix } = laid
  const facts = limitsOf(laid, property)
  const limit = limitOf(facts, laid)
  if (!limit) return noLimit(laid, property, facts)
  const film = limit.fact.at?.film
  const allows = `the sheet of ${mix.name} allows ≤ ${formatQuantity(limit.max)}${film ? ` from a film of ${formatQuantity(film)}` : ''}`
  const figures = [{ label: `limit of ${mix.name}`, figure: figureOfFact(limit.fact) }]
  if (!measured) {
    const says = `The ${tests[property]} has not been measured; ${allows}.`
    const todo = 'Measure it before this floor is priced or laid. A result speaks only for that place and day.'
    return { ...unknown(course.id, says, [notMeasured(property, tests[property])]), todo, figures }
  }
  const met = valueIn(measured, limit.max.unit) <= limit.max.value * (1 + 1e-9)
  return {
    courseId: course.id,
    status: met ? 'met' : 'stop',
    says: `${capital(tests[property])} is ${formatQuantity(measured)}; ${allows}.`,
    todo: 'Let the slab dry, or begin with a mix that is made for this moisture.',
    figures,
  }
}

export const moistureLimit: Check = {
  id: 'moisture-limit',
  title: 'Moisture in the slab',
  needs: ['moisture limit of the first mix on the slab', 'the same measured in the slab'],
  source: 'the data sheet of the first mix on the slab; ASTM F2170, F1869',
  severity:
    'Stop over the lowest limit that holds at the film laid: blisters and loss of bond over the whole floor. A test not made is never taken as dry.',
  run(floor) {
    const [first] = fieldCourses(floor)
    if (!first) return []
    const { course, mix } = first
    if (!mix) {
      const missing = unchosen('substrateRelativeHumidity', course.title, 'no mix is chosen for the first course on the slab')
      return [unknown(course.id, 'No mix is chosen for the first course on the slab, so no moisture limit can be asked for.', [missing])]
    }
    const { substrateRelativeHumidity, moistureEmission } = floor.input.conditions
    const humidity = substrateRelativeHumidity === null ? null : quantity(substrateRelativeHumidity, '%')
    const wanted: [Tested, Quantity | null][] = [
      ['substrateRelativeHumidity', humidity],
      ['moistureEmission', moistureEmission],
    ]
    const stated = wanted.filter(([property, measured]) => measured !== null || factsOf(mix.facts, property).length > 0)
    const asked = stated.length > 0 ? stated : wanted.slice(0, 1)
    return asked.map(([property, measured]) => verdictOf({ ...first, mix }, property, measured))
  },
}
