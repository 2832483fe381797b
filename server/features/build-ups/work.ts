import { randomUUID } from 'node:crypto'
import { isDeepStrictEqual } from 'node:util'
import type { Conditions, Course, Stage } from '../../../shared/domain/build-up.ts'
import { firstConditions, newCourse } from '../../../shared/domain/course.ts'

/** Courses and conditions: what a draft is made of. */
export interface Work {
  courses: Course[]
  conditions: Conditions
}

/** The work of a new build-up: one course a stage, nothing chosen. */
export function workOfStages(stages: readonly Stage[]): Work {
  return { courses: stages.map((stage) => newCourse(stage, randomUUID().slice(0, 8))), conditions: firstConditions }
}

/** What changed between two lists of courses, course by course, for the trail. */
export function differences(before: Work, after: Work) {
  const changedIn = (list: readonly Course[], other: readonly Course[]) =>
    list.filter(
      (course) =>
        !isDeepStrictEqual(
          course,
          other.find(({ id }) => id === course.id),
        ),
    )
  const conditions = !isDeepStrictEqual(before.conditions, after.conditions)
  const order = !isDeepStrictEqual(
    before.courses.map(({ id }) => id),
    after.courses.map(({ id }) => id),
  )
  const side = (of: Work, other: Work) => ({
    courses: changedIn(of.courses, other.courses),
    ...(order ? { order: of.courses.map(({ id }) => id) } : {}),
    ...(conditions ? { conditions: of.conditions } : {}),
  })
  return { from: side(before, after), to: side(after, before) }
}
