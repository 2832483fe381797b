import { type Fact, factsOf, rangeOf } from '../fact.ts'
import { type Figure, type KnownFigure, figureOfFact } from '../figure.ts'
import { formatRange } from '../format.ts'
import type { Range } from '../property.ts'
import { mapRange } from '../working.ts'
import { valueIn } from '../units.ts'
import { type Check, type Laid, type LaidMix, type Verdict, resinCourses, unchosen, unknown, unstatedOfMix } from './check.ts'

type Place = 'below' | 'above' | 'within'

/** Where a film lies against a limit, in the limit's unit, unrounded; a part in a million is left to the binary fraction. */
function placeOf(film: Range, limit: Range): Place {
  const { min, max } = mapRange(film, limit.unit, (value) => valueIn({ value, unit: film.unit }, limit.unit))
  if (limit.min !== undefined && (min ?? max ?? 0) < limit.min * (1 - 1e-6)) return 'below'
  if (limit.max !== undefined && (max ?? min ?? 0) > limit.max * (1 + 1e-6)) return 'above'
  return 'within'
}

interface Compared {
  fact: Fact
  limit: Range
  film: KnownFigure
  how: 'wet' | 'dry'
  place: Place
}

/** One of the sheet's ranges beside the film it speaks of; both films where it does not say which. */
function compare(fact: Fact, { result }: Laid): Compared[] | { open: Figure } {
  const limit = rangeOf(fact)
  const hows = fact.film ? [fact.film] : (['wet', 'dry'] as const)
  const films = hows.map((how) => ({ how, figure: how === 'wet' ? result.wetFilm : result.dryFilm }))
  const open = films.find(({ figure }) => figure.kind === 'not-stated')
  if (open) return { open: open.figure }
  return films.flatMap(({ how, figure }) =>
    limit && figure.kind !== 'not-stated' ? [{ fact, limit, film: figure, how, place: placeOf(figure.value, limit) }] : [],
  )
}

/** Ranges that hold at this film: the sheet's own before typical ones. */
function limitsOf({ mix }: LaidMix): Fact[] {
  const facts = factsOf(mix.facts, 'filmThickness')
  const own = facts.filter(({ origin }) => origin.kind !== 'typical')
  return own.length > 0 ? own : facts
}

const shownLimit = ({ fact, limit }: Pick<Compared, 'fact' | 'limit'>) => `${formatRange(limit)}${fact.film ? ` ${fact.film}` : ''}`
const unique = (list: readonly string[]) => [...new Set(list)]

function figuresOf(compared: readonly Compared[]) {
  const films = new Map(compared.map(({ how, film }) => [`${how} film`, film as Figure]))
  const limits = new Map(compared.map((one) => [`the sheet’s range, ${shownLimit(one)}`, figureOfFact(one.fact)]))
  return [...films, ...limits].map(([label, figure]) => ({ label, figure }))
}

/** An end that no range of the sheet gives. */
function openEnd(facts: readonly Fact[]): 'greatest' | 'least' | undefined {
  const ranges = facts.flatMap((fact) => rangeOf(fact) ?? [])
  if (ranges.every(({ max }) => max === undefined)) return 'greatest'
  return ranges.every(({ min }) => min === undefined) ? 'least' : undefined
}

function verdictOf(laid: LaidMix): Verdict {
  const { course, mix } = laid
  const facts = limitsOf(laid)
  if (facts.length === 0)
    return unknown(course.id, `No sheet of ${mix.name} states a film thickness.`, [unstatedOfMix('filmThickness', mix)])
  const compared: Compared[] = []
  for (const fact of facts) {
    const one = compare(fact, laid)
    if ('open' in one) return unknown(course.id, `The ${fact.film ?? 'wet or dry'} film of this course is not known.`, [one.open])
    compared.push(...one)
  }
  const figures = figuresOf(compared)
  const films = unique(compared.map(({ film, how }) => `${formatRange(film.value)} ${how}`)).join(', ')
  const limits = unique(compared.map(shownLimit)).join('; ')
  const says = `${films} is laid; the sheet allows ${limits}.`
  const outside = compared.filter(({ place }) => place !== 'within')
  if (outside.length === 0) {
    const open = openEnd(facts)
    if (!open) return { courseId: course.id, status: 'met', says, figures }
    const because = `the sheet states no ${open} film`
    return { ...unknown(course.id, `${says} It states no ${open} film.`, [unstatedOfMix('filmThickness', mix, because)]), figures }
  }
  return { courseId: course.id, says, figures, ...outsideVerdict(compared, outside, mix) }
}

type Judged = Pick<Verdict, 'status' | 'todo' | 'missing'>

const isFull = ({ limit }: Compared) => limit.min !== undefined && limit.max !== undefined

/** True when a film lies within another whole range for the same kind of film. */
function isAlternative(other: Compared, one: Compared): boolean {
  return other.place === 'within' && other.fact !== one.fact && other.fact.film === one.fact.film && isFull(other) && isFull(one)
}

/** Outside of some range: a stop, unless the ranges are alternatives or do not say which film they mean. */
function outsideVerdict(compared: readonly Compared[], outside: readonly Compared[], mix: LaidMix['mix']): Judged {
  const unsaid = outside.filter(({ fact }) => fact.film === undefined)
  const bothWays = unsaid.some(({ fact }) => compared.some((one) => one.fact === fact && one.place === 'within'))
  if (bothWays && unsaid.length === outside.length) {
    const because = 'the sheet does not say whether its range is wet or dry, and here the two differ'
    return {
      status: 'unknown',
      todo: 'Ask the maker, in writing, whether the range is wet or dry.',
      missing: [unstatedOfMix('filmThickness', mix, because)],
    }
  }
  if (outside.every((one) => compared.some((other) => isAlternative(other, one)))) {
    return {
      status: 'caution',
      todo: 'The sheet gives several ranges and this film is outside of one: see on its page which holds for this use.',
    }
  }
  const below = outside.some(({ place }) => place === 'below')
  return {
    status: 'stop',
    todo: below
      ? 'Lay it thicker, or choose a mix that may be laid this thin.'
      : 'Lay it in two coats, or choose a mix that may be laid this thick.',
  }
}

export const filmInRange: Check = {
  id: 'film-in-range',
  title: 'Film within the sheet’s range',
  needs: ['film thickness per coat of the mix', 'thickness or spread rate of the course'],
  source: 'the mix’s data sheet',
  severity:
    'Stop: outside its range a film wears through, cracks, traps solvent or does not cure. Caution where one of several ranges holds.',
  run: (floor) =>
    resinCourses(floor)
      .filter(({ course }) => course.stage !== 'fill')
      .map((laid) => {
        const { mix, course } = laid
        if (mix) return verdictOf({ ...laid, mix })
        return unknown(course.id, 'No mix is chosen.', [unchosen('filmThickness', course.title, 'no mix is chosen for this course')])
      }),
}
