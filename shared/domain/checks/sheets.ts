import { productsOf } from '../course-result.ts'
import type { MixFacts } from '../mix.ts'
import type { ProductFacts } from '../product.ts'
import type { SheetKind, SheetSummary } from '../sheet.ts'
import { type Check, type Floor, type Laid, type Verdict, resinCourses } from './check.ts'

interface Wanted {
  of: string
  kind: SheetKind
  sheets: readonly SheetSummary[]
}

const kindName = { data: 'data sheet', safety: 'safety sheet' } as const

/** A data sheet of the mix, which its only product's counts as, and a safety sheet of everything handled. */
function wantedFor({ course, mix }: Laid, { input }: Floor): Wanted[] {
  const handled = productsOf(course, input)
  const dataOf = (one: MixFacts): Wanted => ({ of: one.name, kind: 'data', sheets: [...one.sheets, ...(one.parts.length === 1 ? (one.parts[0]?.product.sheets ?? []) : [])] })
  return [...(mix ? [dataOf(mix)] : []), ...handled.map((product: ProductFacts): Wanted => ({ of: product.name, kind: 'safety', sheets: product.sheets }))]
}

const current = ({ kind, sheets }: Wanted) => sheets.filter((sheet) => sheet.kind === kind && !sheet.superseded)

function presence(laid: Laid, floor: Floor): Verdict {
  const wanted = wantedFor(laid, floor)
  const { course, mix } = laid
  if (!mix && wanted.length === 0) return { courseId: course.id, status: 'unknown', says: 'No mix is chosen, so no sheet can be asked for.', todo: 'Choose a mix.' }
  const absent = wanted.filter((one) => current(one).length === 0)
  if (absent.length === 0) return { courseId: course.id, status: 'met', says: `Data sheet and safety sheets of all ${wanted.length - (mix ? 1 : 0)} components are loaded.` }
  const says = `${absent.map(({ of, kind }) => `${of} has no ${kindName[kind]}`).join('; ')}.`
  const safety = absent.some(({ kind }) => kind === 'safety')
  return { courseId: course.id, status: safety ? 'stop' : 'caution', says, todo: 'Ask the maker for it and upload it. Nobody opens a pail whose safety sheet is not at hand (29 CFR 1910.1200).' }
}

export const sheetPresent: Check = {
  id: 'sheet-present',
  title: 'Sheets loaded',
  needs: ['a data sheet of the mix, a safety sheet of each component'],
  source: '29 CFR 1910.1200(g)(8): safety sheets readily accessible',
  run: (floor) => resinCourses(floor).map((laid) => presence(laid, floor)),
}

/** Whole years and part of one between two ISO dates; a date without a day counts from its first, the oldest it can be. */
function yearsBetween(from: string, to: string): number {
  const parts = (date: string) => {
    const [year = 0, month = 1, day = 1] = date.split('-').map(Number)
    return year + (month - 1) / 12 + (day - 1) / 372
  }
  return parts(to) - parts(from)
}

function currency(laid: Laid, floor: Floor): Verdict[] {
  const { onDate, sheetAgeLimitYears } = floor.input
  const { course } = laid
  const loaded = wantedFor(laid, floor).flatMap((wanted) => current(wanted).map((sheet) => ({ ...sheet, of: wanted.of })))
  const superseded = citedSuperseded(laid)
  if (loaded.length === 0 && superseded.length === 0) return [{ courseId: course.id, status: 'unknown', says: 'No sheet is loaded whose age could be judged.', todo: 'Upload the sheets.' }]
  const undated = loaded.filter(({ kind, revisionDate }) => kind === 'safety' && revisionDate === null)
  const old = loaded.filter(({ kind, revisionDate }) => kind === 'safety' && revisionDate !== null && yearsBetween(revisionDate, onDate) > sheetAgeLimitYears)
  if (superseded.length > 0) return [{ courseId: course.id, status: 'caution', says: `Figures rest on a superseded revision: ${superseded.join('; ')}.`, todo: 'Confirm the figures on the newer revision.' }]
  if (old.length > 0) return [{ courseId: course.id, status: 'caution', says: `${old.map(({ of, revisionDate }) => `The safety sheet of ${of} is from ${revisionDate ?? ''}`).join('; ')}, older than ${sheetAgeLimitYears} years.`, todo: 'Ask the maker for the current one.' }]
  if (undated.length > 0) return [{ courseId: course.id, status: 'unknown', says: `${undated.map(({ of }) => of).join(', ')}: the safety sheet states no date.`, todo: 'Ask the maker for its date.' }]
  return [{ courseId: course.id, status: 'met', says: `The newest revisions loaded are in use; no safety sheet is older than ${sheetAgeLimitYears} years.` }]
}

/** Titles of superseded revisions that facts of the course still cite. */
function citedSuperseded({ mix }: Laid): string[] {
  if (!mix) return []
  const holders = [mix, ...mix.parts.map(({ product }) => product)]
  const inForce = new Map(holders.flatMap(({ sheets }) => sheets.filter((sheet) => !sheet.superseded).map((sheet) => [sheet.id, sheet.revisionId] as const)))
  const cited = holders.flatMap(({ facts }) => facts.flatMap(({ origin }) => (origin.kind === 'stated' ? [origin.citation] : [])))
  const stale = cited.filter(({ sheetId, revisionId }) => inForce.has(sheetId) && inForce.get(sheetId) !== revisionId)
  return [...new Set(stale.map(({ sheetTitle, revisionDate }) => `${sheetTitle}${revisionDate ? ` of ${revisionDate}` : ''}`))]
}

export const sheetCurrent: Check = {
  id: 'sheet-current',
  title: 'Sheets current',
  needs: ['revision dates of the sheets'],
  source: 'the firm’s limit on the age of safety sheets; revisions loaded',
  run: (floor) => resinCourses(floor).flatMap((laid) => currency(laid, floor)),
}
