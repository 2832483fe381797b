import { type ProfileBand, type ProfileRange, icriEdition, profileForThickness, profileOfMethod } from '../../reference/icri.ts'
import type { Course } from '../build-up.ts'
import { factOf, rangeOf } from '../fact.ts'
import { type KnownFigure, figureOfFact } from '../figure.ts'
import { formatRange } from '../format.ts'
import type { Range } from '../property.ts'
import { sumOf } from '../working.ts'
import { type Check, type Floor, type Laid, type Verdict, capital, fieldCourses, unchosen, unknown } from './check.ts'

const csp = ({ from, to }: ProfileRange) => (from === to ? `CSP ${from}` : `CSP ${from}–${to}`)

/** Preparing that comes before the field of the floor is laid, bottom up. */
function preparationsOf({ laid }: Floor): Course[] {
  const first = laid.findIndex(({ course }) => !['prep', 'grind', 'fill', 'cove'].includes(course.stage))
  return laid.slice(0, first === -1 ? laid.length : first).flatMap(({ course }) => (course.preparation ? [course] : []))
}

/** The profile that the floor stands on: what the last preparation that names one asks for. */
function preparedProfile(floor: Floor): { course: Course; profile: number } | undefined {
  return preparationsOf(floor)
    .flatMap((course) => (course.preparation?.profile === undefined ? [] : [{ course, profile: course.preparation.profile }]))
    .at(-1)
}

/** Dry film of a course, or its wet film where the solids are not stated: what the standard's thickness comes nearest to. */
function filmOf({ result }: Laid): KnownFigure | undefined {
  return [result.dryFilm, result.wetFilm].find((film) => film.kind !== 'not-stated')
}

/** What the first mix's own sheet asks of the profile. A stop: its maker knows what it holds to. */
function againstSheet(profile: number, { course, mix }: Laid): Verdict | undefined {
  const fact = mix && factOf(mix.facts, 'surfaceProfile')
  const range = rangeOf(fact)
  if (!mix || !fact || !range) return undefined
  const met = profile >= (range.min ?? 1) && profile <= (range.max ?? 10)
  return {
    courseId: course.id,
    status: met ? 'met' : 'stop',
    says: `CSP ${profile} is prepared; the sheet of ${mix.name} asks for ${formatRange(range)}.`,
    todo: `Prepare to ${formatRange(range)}, or choose another first coat.`,
    figures: [{ label: 'profile the sheet asks for', figure: figureOfFact(fact) }],
    source: 'the data sheet of the first mix',
  }
}

/** Bands that a thickness falls into; between two bands the thicker one's, which asks for more. */
function bandsAt({ min = 0, max = min }: Range, system: 'mil' | 'mm'): ProfileBand[] {
  const hit = profileForThickness.filter((band) => max >= band[system].from - 1e-9 && min <= band[system].to + 1e-9)
  return hit.length > 0 ? hit : profileForThickness.filter((band) => band[system].from > max).slice(0, 1)
}

function againstStandard({ course, profile }: { course: Course; profile: number }, floor: Floor, sheetMet: boolean): Verdict {
  const field = fieldCourses(floor)
  const open = field.filter((laid) => !filmOf(laid))
  if (open.length > 0) {
    const titles = open.map((laid) => laid.course.title).join(', ')
    return unknown(
      course.id,
      `The thickness of ${titles} is not known.`,
      open.map(({ result }) => result.wetFilm),
    )
  }
  const films = field.flatMap((laid) => filmOf(laid) ?? [])
  const system = films.some(({ value }) => value.unit === 'mil' || value.unit === 'in') ? 'mil' : 'mm'
  const total = sumOf(
    films.map(({ value }) => value),
    system,
  )
  const bands = bandsAt(total, system)
  const asked = { from: Math.min(...bands.map((band) => band.profile.from)), to: Math.max(...bands.map((band) => band.profile.to)) }
  const place = profile < asked.from ? 'smoother' : profile > asked.to ? 'rougher' : 'within'
  const says = `CSP ${profile} is prepared; ${formatRange(total)} in all (${bands.map(({ what }) => what).join(' or ')}) asks for ${csp(asked)}.`
  const figures = field.flatMap((laid, index) => {
    const figure = filmOf(laid)
    return figure ? [{ label: `film ${index + 1}, ${laid.course.title}`, figure }] : []
  })
  if (place === 'within') return { courseId: course.id, status: 'met', says, figures }
  if (place === 'rougher') {
    const todo = `Prepare to ${csp(asked)}, or allow for the resin that the deeper texture takes and for marks that show.`
    return { courseId: course.id, status: 'caution', says, todo, figures }
  }
  const more = sheetMet ? ' The sheet of the first mix asks for less than the standard does.' : ''
  return {
    courseId: course.id,
    status: sheetMet ? 'caution' : 'stop',
    says: `${says}${more}`,
    todo: sheetMet
      ? 'Ask the maker, in writing, whether its profile holds under the whole floor.'
      : `Prepare to ${csp(asked)}: a smoother surface does not hold a floor this thick.`,
    figures,
  }
}

export const profileForFilm: Check = {
  id: 'profile-for-film',
  title: 'Profile for what follows',
  needs: ['profile of the preparation', 'film of every course over the field'],
  source: icriEdition,
  severity:
    'Stop when too smooth: the floor peels. Caution when too rough: it costs resin and shows. Caution when the first mix’s sheet is content with less.',
  run(floor) {
    const [first] = fieldCourses(floor)
    if (!first) return []
    const prepared = preparedProfile(floor)
    if (!prepared) {
      const prep = preparationsOf(floor).at(-1)
      const because = 'no preparation with a profile stands before the first course over the field'
      return [
        unknown(prep?.id ?? null, 'No profile is asked for before the first course.', [
          unchosen('surfaceProfile', prep?.title ?? 'the slab', because),
        ]),
      ]
    }
    const bySheet = againstSheet(prepared.profile, first)
    return [...(bySheet ? [bySheet] : []), againstStandard(prepared, floor, bySheet?.status === 'met')]
  },
}

/** Cleaning before the cut, which leaves no profile of its own: it need not name one when a later preparation does. */
const cleaning: readonly string[] = ['detergent scrubbing', 'low-pressure water cleaning']

function reachVerdict(course: Course, floor: Floor): Verdict[] {
  const { method, profile } = course.preparation ?? {}
  const last = preparationsOf(floor).at(-1)
  if (profile === undefined && method && cleaning.includes(method) && last && last.id !== course.id) return []
  const reach = method && profileOfMethod[method]
  if (!reach || profile === undefined) {
    const because = method ? 'the profile asked for is not given' : 'the method of preparation is not given'
    return [unknown(course.id, 'Method and profile are not both given.', [unchosen('surfaceProfile', course.title, because)])]
  }
  const status = profile > reach.to ? 'stop' : profile < reach.from ? 'caution' : 'met'
  const todo =
    status === 'stop'
      ? 'Choose a method that cuts deeper, or work it over a second time with one.'
      : 'Choose a gentler method, or expect a rougher surface.'
  return [{ courseId: course.id, status, says: `${capital(method)} leaves ${csp(reach)}; CSP ${profile} is asked for.`, todo }]
}

export const prepReachesProfile: Check = {
  id: 'prep-reaches-profile',
  title: 'Preparation reaches the profile',
  needs: ['method of preparation', 'profile of the preparation'],
  source: icriEdition,
  severity: 'Stop when the method cannot cut so deep: the profile asked for will not be there. Caution when it leaves more.',
  run: (floor) => floor.laid.flatMap(({ course }) => (course.stage === 'prep' || course.preparation ? reachVerdict(course, floor) : [])),
}
