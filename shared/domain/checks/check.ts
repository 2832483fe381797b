import type { Course, EvaluationInput } from '../build-up.ts'
import type { CourseResult, TimelineEntry } from '../evaluation.ts'
import { type Figure, type Missing, isTypical } from '../figure.ts'
import type { Finding, FindingStatus } from '../finding.ts'
import type { MixFacts } from '../mix.ts'

/** A course with all that a check may ask of it. */
export interface Laid {
  course: Course
  mix: MixFacts | undefined
  result: CourseResult
  time: TimelineEntry
  /** The course that this one is laid on, past preparing and grinding; undefined on the slab. */
  beneath: Laid | undefined
  /** True when the surface was ground or prepared between `beneath` and this course. */
  onGroundSurface: boolean
}

/** The floor as the checks see it. */
export interface Floor {
  input: EvaluationInput
  laid: readonly Laid[]
}

/** A rule as a row: what it needs, what it compares with, and how. */
export interface Check {
  readonly id: string
  readonly title: string
  /** The properties and measurements it cannot do without. */
  readonly needs: readonly string[]
  readonly source: string
  readonly run: (floor: Floor) => Verdict[]
}

/** What a check says of one course, before the row's own words are put to it. */
export interface Verdict {
  courseId: string | null
  status: FindingStatus
  says: string
  todo?: string
  figures?: { label: string; figure: Figure }[]
  missing?: Missing[]
}

/** Courses that lay a mix down. */
export function resinCourses({ laid }: Floor): Laid[] {
  return laid.filter(({ course }) => course.stage !== 'prep' && course.stage !== 'grind')
}

/** An unknown for want of figures: named, with who could supply them. */
export function unknown(courseId: string | null, says: string, missing: (Missing | Figure)[]): Verdict {
  const list = missing.flatMap((one) => ('kind' in one ? (one.kind === 'not-stated' ? [one.missing] : []) : [one]))
  const asks = [...new Set(list.map(({ ask }) => ask))].join('; ')
  return { courseId, status: 'unknown', says, todo: asks ? `Ask ${asks}.` : 'Supply the figure.', missing: list }
}

/** A measurement of the floor that was not made. */
export function notMeasured(property: Missing['property'], what: string): Missing {
  return { property, part: 'mixed', of: what, subject: { kind: 'conditions', id: property }, ask: 'whoever surveys the floor' }
}

/** The row's words put to its verdicts. A check that rests on a typical value is never met by it. */
export function findingsOf(check: Check, floor: Floor): Finding[] {
  return check.run(floor).map(({ todo = '', figures = [], missing = [], ...verdict }) => {
    const typical = verdict.status === 'met' && figures.some(({ figure }) => isTypical(figure))
    return {
      checkId: check.id,
      title: check.title,
      ...verdict,
      ...(typical ? { status: 'unknown' as const, says: `${verdict.says} This rests on a typical value, which decides nothing.` } : {}),
      todo: typical ? 'Find the figure on the sheet, or ask the maker in writing.' : verdict.status === 'met' ? '' : todo,
      figures,
      missing,
      source: check.source,
    }
  })
}
