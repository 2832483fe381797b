import { icriEdition, profileForThickness, profileOfMethod } from '../../reference/icri.ts'
import { factOf, rangeOf } from '../fact.ts'
import { formatNumber, formatRange } from '../format.ts'
import { figureOfFact, notStated } from '../figure.ts'
import { leastOf } from '../working.ts'
import { valueIn } from '../units.ts'
import { type Check, type Floor, type Laid, type Verdict, resinCourses, unknown } from './check.ts'

const csp = ({ from, to }: { from: number; to: number }) => (from === to ? `CSP ${from}` : `CSP ${from}–${to}`)

/** The preparation that a floor stands on: the last one before the first mix is laid. */
function preparationOf({ laid }: Floor): Laid | undefined {
  const first = laid.findIndex(({ course }) => course.stage !== 'prep' && course.stage !== 'grind')
  return laid.slice(0, first === -1 ? laid.length : first).findLast(({ course }) => course.preparation !== null)
}

/** Total thickness in mil of what is laid over the field of the floor, with the courses whose film is not known. */
function thicknessOf(floor: Floor): { mil: number; open: Laid[] } {
  const counted = resinCourses(floor).filter(({ course }) => course.stage !== 'fill' && course.stage !== 'cove')
  const open = counted.filter(({ result }) => result.dryFilm.kind === 'not-stated' && result.wetFilm.kind === 'not-stated')
  const mil = counted.reduce((sum, { result }) => {
    const film = result.dryFilm.kind === 'not-stated' ? result.wetFilm : result.dryFilm
    return film.kind === 'not-stated' ? sum : sum + valueIn(leastOf(film.value), 'mil')
  }, 0)
  return { mil, open }
}

/** What the first mix's own sheet asks of the profile; its word goes before the standard's table. */
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
  }
}

function againstStandard(profile: number, floor: Floor): Verdict {
  const { mil, open } = thicknessOf(floor)
  const courseId = preparationOf(floor)?.course.id ?? null
  if (open.length > 0) return unknown(courseId, `The thickness of ${open.map(({ course }) => course.title).join(', ')} is not known.`, open.map(({ result }) => result.wetFilm))
  const band = profileForThickness.find(({ above, upTo }) => mil > above && mil <= upTo)
  if (!band) return unknown(courseId, 'Nothing with a thickness is laid.', [notStated('filmThickness', { of: 'the floor', subject: null, ask: 'whoever builds this up' })])
  const { profile: asked, what } = band
  const status = profile < asked.from ? 'stop' : profile > asked.to ? 'caution' : 'met'
  return {
    courseId,
    status,
    says: `CSP ${profile} is prepared; ${formatNumber(mil)} mil in all (${what}) asks for ${csp(asked)}.`,
    todo: status === 'stop' ? `Prepare to ${csp(asked)}: a smoother surface does not hold a floor this thick.` : `Prepare to ${csp(asked)}, or allow for the resin that the deeper texture takes and for marks that show.`,
  }
}

export const profileForFilm: Check = {
  id: 'profile-for-film',
  title: 'Profile for what follows',
  needs: ['preparation.profile', 'filmThickness'],
  source: icriEdition,
  run(floor) {
    const prep = preparationOf(floor)
    const profile = prep?.course.preparation?.profile
    const [first] = resinCourses(floor)
    if (!first) return []
    if (profile === undefined) {
      const missing = notStated('surfaceProfile', { of: prep?.course.title ?? 'the slab', subject: null, ask: 'whoever builds this up', because: 'no preparation with a profile stands before the first mix' })
      return [unknown(prep?.course.id ?? null, 'No profile is asked for before the first mix.', [missing])]
    }
    const bySheet = againstSheet(profile, first)
    return bySheet ? [bySheet, againstStandard(profile, floor)] : [againstStandard(profile, floor)]
  },
}

export const prepReachesProfile: Check = {
  id: 'prep-reaches-profile',
  title: 'Preparation reaches the profile',
  needs: ['preparation.method', 'preparation.profile'],
  source: icriEdition,
  run: ({ laid }) =>
    laid.flatMap(({ course }): Verdict[] => {
      if (course.stage !== 'prep' && !course.preparation) return []
      const { method, profile } = course.preparation ?? {}
      const reach = method && profileOfMethod[method]
      if (!method || !reach || profile === undefined) {
        return [unknown(course.id, 'Method and profile are not both given.', [notStated('surfaceProfile', { of: course.title, subject: null, ask: 'whoever builds this up' })])]
      }
      const status = profile > reach.to ? 'stop' : profile < reach.from ? 'caution' : 'met'
      return [
        {
          courseId: course.id,
          status,
          says: `${method[0]?.toUpperCase()}${method.slice(1)} leaves ${csp(reach)}; CSP ${profile} is asked for.`,
          todo: status === 'stop' ? 'Choose a method that cuts deeper.' : 'Choose a gentler method, or expect a rougher surface.',
        },
      ]
    }),
}
