import type { Course, EvaluationInput } from './build-up.ts'
import { courseResult, handledIn, isDry } from './course-result.ts'
import type { Laid } from './checks/check.ts'
import { runChecks } from './checks/index.ts'
import type { Evaluation } from './evaluation.ts'
import { type Worked, dewPointFigure, hoursTo, totalThickness, worstVoc } from './floor-totals.ts'
import { unionOfHazards } from './hazard.ts'
import type { MixFacts } from './mix.ts'
import { withoutUnsoundFacts } from './sound-facts.ts'
import { timelineOf } from './timeline.ts'

/**
 * Works a build-up out: figures of each course, totals, timeline and findings, at one set of conditions. The single entry: builder,
 * specification, site card and server call this and nothing else. Pure; never throws on input of the right form.
 */
export function evaluate(given: EvaluationInput): Evaluation {
  const input = withoutUnsoundFacts(given)
  const { courses, mixes } = input
  const mixOf = (course: Course | undefined): MixFacts | undefined => (course?.mixId ? mixes[course.mixId] : undefined)
  const results = courses.map((course, index) => courseResult(course, input, mixOf(courses.slice(index + 1).find((next) => !isDry(next)))))
  const timeline = timelineOf(courses, results)
  const floor = courses.flatMap((course, index): Worked[] => {
    const [result, time] = [results[index], timeline[index]]
    return result && time ? [{ course, result, time }] : []
  })
  return {
    courses: results,
    totals: {
      thickness: totalThickness(floor),
      vocWorst: worstVoc(floor),
      hoursToFoot: hoursTo('foot', floor),
      hoursToVehicles: hoursTo('vehicles', floor),
      dewPoint: dewPointFigure(input),
    },
    timeline,
    findings: runChecks({ input, laid: layUp(floor, mixOf) }),
    hazards: unionOfHazards(courses.flatMap((course) => handledIn(course, input))),
  }
}

/** Work that leaves the surface cut, so that the next coat holds by its profile: grinding, and preparing by any method that takes concrete or resin off. */
function cutsSurface({ stage, preparation }: Course): boolean {
  const wet = preparation && (preparation.method === 'detergent scrubbing' || preparation.method === 'low-pressure water cleaning')
  return stage === 'grind' ? !wet : preparation !== null && !wet
}

/** Courses as the checks see them, each with the one it is laid on. */
function layUp(floor: readonly Worked[], mixOf: (course: Course) => MixFacts | undefined): Laid[] {
  let beneath: Laid | undefined
  let ground = false
  return floor.map(({ course, result, time }) => {
    const dry = isDry(course)
    const one: Laid = { course, mix: mixOf(course), result, time, beneath: dry ? undefined : beneath, onGroundSurface: !dry && ground }
    if (dry) ground ||= cutsSurface(course)
    else [beneath, ground] = [one, false]
    return one
  })
}
