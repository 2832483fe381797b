import type { Course, EvaluationInput } from '../build-up.ts'
import type { CourseResult, TimelineEntry } from '../evaluation.ts'
import { type Figure, type Missing, isTypical } from '../figure.ts'
import type { Finding, FindingStatus } from '../finding.ts'
import type { MixFacts } from '../mix.ts'
import type { Property } from '../property.ts'

/** A course with all that a check may ask of it. */
export interface Laid {
  course: Course
  mix: MixFacts | undefined
  result: CourseResult
  time: TimelineEntry
  /** The course that this one is laid on, past preparing and grinding; undefined on the slab. */
  beneath: Laid | undefined
  /** True when the surface was ground or cut between `beneath` and this course. */
  onGroundSurface: boolean
}

export type LaidMix = Laid & { mix: MixFacts }

/** The floor as the checks see it. */
export interface Floor {
  input: EvaluationInput
  laid: readonly Laid[]
}

/** A rule as a row: what it needs, what it compares with, when it stops, and how. */
export interface Check {
  readonly id: string
  readonly title: string
  /** The properties and measurements it cannot do without. */
  readonly needs: readonly string[]
  readonly source: string
  /** Why a failing finding is a stop or a caution. */
  readonly severity: string
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
  /** Where this verdict compares with something other than the row's source. */
  source?: string
}

/** Courses that lay a mix down. */
export function resinCourses({ laid }: Floor): Laid[] {
  return laid.filter(({ course }) => course.stage !== 'prep' && course.stage !== 'grind')
}

/** Courses whose mix is chosen. */
export function mixCourses(floor: Floor): LaidMix[] {
  return resinCourses(floor).flatMap((laid) => (laid.mix ? [{ ...laid, mix: laid.mix }] : []))
}

/** Courses that cover the field of the floor: not in joints, not up walls. */
export function fieldCourses(floor: Floor): Laid[] {
  return resinCourses(floor).filter(({ course }) => course.stage !== 'fill' && course.stage !== 'cove')
}

const keyOf = ({ of, property, part }: Missing) => `${of} ${property} ${part}`

/** An unknown for want of figures: named, with who could supply them. */
export function unknown(courseId: string | null, says: string, missing: readonly (Missing | Figure)[]): Verdict {
  const all = missing.flatMap((one) => ('kind' in one ? (one.kind === 'not-stated' ? [one.missing] : []) : [one]))
  const list = [...new Map(all.map((one) => [keyOf(one), one])).values()]
  const asks = [...new Set(list.map(({ ask }) => ask))].join('; ')
  return { courseId, status: 'unknown', says, todo: asks ? `Ask ${asks}.` : 'Supply the figure.', missing: list }
}

/** A property that no sheet of a mix states. */
export function unstatedOfMix(property: Property, mix: MixFacts, because?: string): Missing {
  return {
    property,
    part: 'mixed',
    of: mix.name,
    subject: { kind: 'mix', id: mix.id },
    ask: 'the maker, in writing',
    ...(because ? { because } : {}),
  }
}

/** What the person at the builder has not chosen yet. */
export function unchosen(property: Property, of: string, because: string): Missing {
  return { property, part: 'mixed', of, subject: null, ask: 'whoever builds this up', because }
}

/** A measurement of the floor that was not made. */
export function notMeasured(property: Property, what: string): Missing {
  return { property, part: 'mixed', of: what, subject: { kind: 'conditions', id: property }, ask: 'whoever surveys the floor' }
}

/** "Steel shot blasting", from words in the middle of a sentence. */
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}

/** The row's words put to its verdicts. A check that rests on a typical value is never met by it. */
export function findingsOf(check: Check, floor: Floor): Finding[] {
  return check.run(floor).map(({ todo = '', figures = [], missing = [], source = check.source, ...verdict }) => {
    const typical = verdict.status === 'met' ? figures.filter(({ figure }) => isTypical(figure)) : []
    if (typical.length === 0) {
      return { checkId: check.id, title: check.title, ...verdict, todo: verdict.status === 'met' ? '' : todo, figures, missing, source }
    }
    return {
      checkId: check.id,
      title: check.title,
      courseId: verdict.courseId,
      status: 'unknown',
      says: `${verdict.says} This rests on a typical value (${typical.map(({ label }) => label).join(', ')}), which decides nothing.`,
      todo: 'Find the figure on the sheet, or ask the maker in writing.',
      figures,
      missing,
      source,
    }
  })
}
