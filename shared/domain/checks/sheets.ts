import { productsOf } from '../course-result.ts'
import type { Missing } from '../figure.ts'
import type { MixFacts } from '../mix.ts'
import type { ProductFacts } from '../product.ts'
import { dayYearsBefore, writtenDate } from '../sheet-age.ts'
import type { SheetKind, SheetSummary } from '../sheet.ts'
import { type Check, type Floor, type Laid, type Verdict, resinCourses, unchosen, unknown } from './check.ts'

interface Wanted {
  of: string
  subject: NonNullable<Missing['subject']>
  kind: SheetKind
  sheets: readonly SheetSummary[]
}

const kindName = { data: 'data sheet', safety: 'safety sheet' } as const

/** A data sheet of the mix, which its only product's counts as, and a safety sheet of everything handled; one that speaks of the whole mix counts for its parts. */
function wantedFor({ course, mix }: Laid, { input }: Floor): Wanted[] {
  const own = (product: ProductFacts) => mix?.parts.some((part) => part.product.id === product.id) ?? false
  const data = (one: MixFacts): Wanted => ({
    of: one.name,
    subject: { kind: 'mix', id: one.id },
    kind: 'data',
    sheets: [...one.sheets, ...(one.parts.length === 1 ? (one.parts[0]?.product.sheets ?? []) : [])],
  })
  const safety = (product: ProductFacts): Wanted => ({
    of: product.name,
    subject: { kind: 'product', id: product.id },
    kind: 'safety',
    sheets: own(product) ? [...product.sheets, ...(mix?.sheets ?? [])] : product.sheets,
  })
  return [...(mix ? [data(mix)] : []), ...productsOf(course, input).map(safety)]
}

const current = ({ kind, sheets }: Wanted) => sheets.filter((sheet) => sheet.kind === kind && !sheet.superseded)
const missingSheet = ({ of, subject, kind }: Wanted, because = `no ${kindName[kind]} is loaded`): Missing => ({
  property: 'revisionDate',
  part: 'mixed',
  of,
  subject,
  ask: 'the maker',
  because,
})
const noMix = (course: Laid['course']) => unchosen('revisionDate', course.title, 'no mix is chosen for this course')

function presence(laid: Laid, floor: Floor): Verdict {
  const wanted = wantedFor(laid, floor)
  const { course, mix } = laid
  const absent = wanted.filter((one) => current(one).length === 0)
  if (absent.length > 0) {
    const says = `${absent.map(({ of, kind }) => `${of} has no ${kindName[kind]}`).join('; ')}.`
    const safety = absent.some(({ kind }) => kind === 'safety')
    const todo = safety
      ? 'Ask the maker for it and upload it. Nobody opens a pail whose safety sheet is not at hand (29 CFR 1910.1200).'
      : 'Ask the maker for it and upload it.'
    return { courseId: course.id, status: safety ? 'stop' : 'caution', says, todo, missing: absent.map((one) => missingSheet(one)) }
  }
  if (!mix) return { ...unknown(course.id, 'No mix is chosen, so no sheet can be asked for.', [noMix(course)]), todo: 'Choose a mix.' }
  const components = wanted.length - 1
  const says =
    components === 1
      ? 'The data sheet and the safety sheet are loaded.'
      : `The data sheet and the safety sheets of all ${components} components are loaded.`
  return { courseId: course.id, status: 'met', says }
}

export const sheetPresent: Check = {
  id: 'sheet-present',
  title: 'Sheets loaded',
  needs: ['a data sheet of the mix', 'a safety sheet of each component and aggregate'],
  source: '29 CFR 1910.1200(g)(8): safety sheets readily accessible',
  severity: 'Stop without a safety sheet: the law asks for it at hand. Caution without a data sheet: nothing states how the mix is laid.',
  run: (floor) => resinCourses(floor).map((laid) => presence(laid, floor)),
}

/** The last day a date can mean that is stated to the month or year only counts for nothing here: it is taken as its first, the oldest it can be. */
const firstDayOf = (date: string) => `${date}-01-01`.slice(0, 10)
const isDate = (date: string) => /^\d{4}(-\d{2}){0,2}$/.test(date)

/** What is wrong with the sheets in force, in whole sentences. */
function ageOf(loaded: readonly (SheetSummary & { wanted: Wanted })[], { onDate, sheetAgeLimitYears: years }: Floor['input']) {
  const safety = loaded.filter(({ kind }) => kind === 'safety')
  const undated = safety.filter(({ revisionDate }) => revisionDate === null || !isDate(revisionDate))
  const oldest = dayYearsBefore(onDate, years)
  const old = safety.filter(({ revisionDate }) => revisionDate !== null && isDate(revisionDate) && firstDayOf(revisionDate) < oldest)
  const says = old.map(
    ({ wanted, revisionDate }) => `The safety sheet of ${wanted.of} is from ${writtenDate(revisionDate)}, older than ${years} years.`,
  )
  return { old: says, undated: undated.map(({ wanted }) => wanted) }
}

function currency(laid: Laid, floor: Floor): Verdict {
  const { course, mix } = laid
  const { onDate, sheetAgeLimitYears: years } = floor.input
  const loaded = wantedFor(laid, floor).flatMap((wanted) => current(wanted).map((sheet) => ({ ...sheet, wanted })))
  const stale = citedSuperseded(laid, floor)
  const withdrawn = withdrawnOf(laid, floor).map((name) => `${name} is withdrawn from the catalogue: nobody keeps its sheets current.`)
  if (loaded.length === 0 && stale.length === 0 && withdrawn.length === 0) {
    const missing = mix ? wantedFor(laid, floor).map((wanted) => missingSheet(wanted)) : [noMix(course)]
    return { ...unknown(course.id, 'No sheet is loaded whose age could be judged.', missing), todo: 'Upload the sheets.' }
  }
  const { old, undated } = ageOf(loaded, floor.input)
  const rests = stale.length > 0 ? [`Figures rest on a superseded revision: ${stale.join('; ')}.`] : []
  const wrong = [...withdrawn, ...rests, ...old]
  const nameless = undated.map((wanted) => missingSheet(wanted, 'its safety sheet states no date'))
  if (wrong.length > 0) {
    const todo = [
      withdrawn.length > 0 && 'Choose a mix that is kept.',
      stale.length > 0 && 'Confirm the figures on the newer revision.',
      old.length > 0 && 'Ask the maker for the current safety sheet.',
    ]
    return { courseId: course.id, status: 'caution', says: wrong.join(' '), todo: todo.filter(Boolean).join(' '), missing: nameless }
  }
  if (undated.length > 0) {
    const says = `${undated.map(({ of }) => of).join(', ')}: the safety sheet states no date.`
    return { ...unknown(course.id, says, nameless), todo: 'Ask the maker for its date.' }
  }
  if (!isDate(onDate.slice(0, 10)))
    return unknown(course.id, 'The day on which ages are judged is not known.', [unchosen('revisionDate', course.title, 'no day is given')])
  return {
    courseId: course.id,
    status: 'met',
    says: `The newest revisions loaded are in use; no safety sheet is older than ${years} years.`,
  }
}

/** Names of mix, parts and aggregates that the catalogue has withdrawn. */
function withdrawnOf({ course, mix }: Laid, { input }: Floor): string[] {
  return [...(mix ? [mix] : []), ...productsOf(course, input)].filter(({ status }) => status === 'withdrawn').map(({ name }) => name)
}

/** Titles of superseded revisions that facts of the course still cite. */
function citedSuperseded({ course, mix }: Laid, { input }: Floor): string[] {
  const holders = [...(mix ? [mix] : []), ...productsOf(course, input)]
  const inForce = new Map<string, string>()
  for (const { sheets } of holders) for (const sheet of sheets) if (!sheet.superseded) inForce.set(sheet.id, sheet.revisionId)
  const stale = holders.flatMap(({ facts }) =>
    facts.flatMap(({ origin }) => {
      const now = origin.kind === 'stated' ? inForce.get(origin.citation.sheetId) : undefined
      return origin.kind === 'stated' && now !== undefined && now !== origin.citation.revisionId ? [origin.citation] : []
    }),
  )
  return [...new Set(stale.map(({ sheetTitle, revisionDate }) => `${sheetTitle}${revisionDate ? ` of ${writtenDate(revisionDate)}` : ''}`))]
}

export const sheetCurrent: Check = {
  id: 'sheet-current',
  title: 'Sheets current',
  needs: ['revision dates of the safety sheets', 'the day of reckoning'],
  source: 'the firm’s limit on the age of safety sheets; the revisions loaded',
  severity: 'Caution: an old sheet may still be the one in force, which only its maker can say.',
  run: (floor) => resinCourses(floor).map((laid) => currency(laid, floor)),
}
