import { leastOf } from '../working.ts'
import { factsOf, rangeOf } from '../fact.ts'
import { figureOfFact, notStated } from '../figure.ts'
import { formatRange } from '../format.ts'
import { valueIn } from '../units.ts'
import { type Check, type Laid, type Verdict, resinCourses, unknown } from './check.ts'

/** Compares in the unit of the limit, unrounded; a part in a million is left to the binary fraction. */
function compare(film: number, { min, max }: { min?: number | undefined; max?: number | undefined }) {
  if (min !== undefined && film < min * (1 - 1e-6)) return 'below'
  if (max !== undefined && film > max * (1 + 1e-6)) return 'above'
  return 'within'
}

function verdictOf({ course, mix, result }: Laid): Verdict {
  const facts = mix ? factsOf(mix.facts, 'filmThickness') : []
  const fact = facts.find((one) => one.film !== undefined) ?? facts[0]
  const limit = rangeOf(fact)
  if (!mix || !fact || !limit) {
    const missing = notStated('filmThickness', {
      of: mix?.name ?? course.title,
      subject: mix ? { kind: 'mix', id: mix.id } : null,
      ask: mix ? 'the maker, in writing' : 'whoever builds this up',
    })
    return unknown(course.id, mix ? `No sheet of ${mix.name} states a film thickness.` : 'No mix is chosen.', [missing])
  }
  const films = fact.film === 'dry' ? [result.dryFilm] : fact.film === 'wet' ? [result.wetFilm] : [result.wetFilm, result.dryFilm]
  const unknownFilm = films.find(({ kind }) => kind === 'not-stated')
  if (unknownFilm) return unknown(course.id, `The ${fact.film ?? 'wet or dry'} film of this course is not known.`, [unknownFilm])
  const places = new Set(
    films.map((film) => (film.kind === 'not-stated' ? 'within' : compare(valueIn(leastOf(film.value), limit.unit), limit))),
  )
  const figures = [
    ...films.map((figure, index) => ({ label: `${fact.film ?? (index === 0 ? 'wet' : 'dry')} film`, figure })),
    { label: 'the sheet’s range', figure: figureOfFact(fact) },
  ]
  const laid = films.map((film) => (film.kind === 'not-stated' ? '' : formatRange(film.value)))
  const says = `${[...new Set(laid)].join(' wet, ')}${fact.film ? ` ${fact.film}` : places.size > 1 || new Set(laid).size > 1 ? ' dry' : ''} is laid; the sheet allows ${formatRange(limit)}${fact.film ? ` ${fact.film}` : ''}.`
  if (places.size > 1) {
    return {
      courseId: course.id,
      status: 'unknown',
      says: `${says} It does not say whether wet or dry, and here the two differ.`,
      todo: 'Ask the maker, in writing, whether the range is wet or dry.',
      figures,
    }
  }
  const [place] = places
  if (place === 'within') return { courseId: course.id, status: 'met', says, figures }
  const todo =
    place === 'below'
      ? 'Lay it thicker, or choose a mix that may be laid this thin.'
      : 'Lay it in two coats, or choose a mix that may be laid this thick.'
  return { courseId: course.id, status: 'stop', says, todo, figures }
}

export const filmInRange: Check = {
  id: 'film-in-range',
  title: 'Film within the sheet’s range',
  needs: ['filmThickness', 'thickness or spread rate of the course'],
  source: 'the mix’s data sheet',
  run: (floor) =>
    resinCourses(floor)
      .filter(({ course }) => course.stage !== 'fill')
      .map(verdictOf),
}
