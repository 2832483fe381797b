import type { Course } from './build-up.ts'
import { isDry } from './course-result.ts'
import type { CourseResult, TimelineEntry } from './evaluation.ts'
import type { Figure } from './figure.ts'
import { valueIn } from './units.ts'

/** Hours of one end of a time; null when not stated. `late` takes the other end where the asked one is missing. */
function hoursOf(figure: Figure, side: 'min' | 'max', late = false): number | null {
  if (figure.kind === 'not-stated') return null
  const { min, max, unit } = figure.value
  const value = side === 'min' ? (min ?? (late ? max : undefined)) : (max ?? (late ? min : undefined))
  return value === undefined ? null : valueIn({ value, unit }, 'h')
}

const plus = (start: number | null, hours: number | null) => (start === null || hours === null ? null : start + hours)

/**
 * When each course starts and what follows from it, in hours from the start of the first. A course without a planned start begins as soon as
 * the one beneath lets it: when that one's window opens. Laying itself takes no time here; how long it takes is not on any sheet.
 * Working time counts to its short end, waits for traffic to their long end. Null: cannot be known.
 */
export function timelineOf(courses: readonly Course[], results: readonly CourseResult[]): TimelineEntry[] {
  let opens: number | null = 0
  return courses.map((course, index) => {
    const result = results[index]
    const start = course.startsAfter ?? opens
    if (!result || isDry(course)) {
      opens = start
      return {
        courseId: course.id,
        start,
        workingUntil: null,
        windowOpens: null,
        windowCloses: null,
        foot: null,
        vehicles: null,
        fullCure: null,
      }
    }
    const workable = hoursOf(result.workingTime, 'min', true) ?? hoursOf(result.potLife, 'min', true)
    const entry: TimelineEntry = {
      courseId: course.id,
      start,
      workingUntil: plus(start, workable),
      windowOpens: plus(start, hoursOf(result.window, 'min')),
      windowCloses: plus(start, hoursOf(result.window, 'max')),
      foot: plus(start, hoursOf(result.footTraffic, 'max', true)),
      vehicles: plus(start, hoursOf(result.vehicleTraffic, 'max', true)),
      fullCure: plus(start, hoursOf(result.fullCure, 'max', true)),
    }
    opens = entry.windowOpens
    return entry
  })
}
