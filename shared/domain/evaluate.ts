import type { Course, EvaluationInput } from './build-up.ts'
import { courseResult, isDry, leastOf, productsOf } from './course-result.ts'
import type { Laid } from './checks/check.ts'
import { runChecks } from './checks/index.ts'
import { dewPoint } from './dew-point.ts'
import type { CourseResult, Evaluation } from './evaluation.ts'
import { type Figure, notStated } from './figure.ts'
import { formatNumber, formatRange, unitText } from './format.ts'
import { unionOfHazards } from './hazard.ts'
import type { MixFacts } from './mix.ts'
import { timelineOf } from './timeline.ts'
import { convert, quantity, valueIn } from './units.ts'

/**
 * Works a build-up out: figures of each course, totals, timeline and findings, at one set of conditions. The single entry: builder,
 * specification, site card and server call this and nothing else. Pure; never throws on input of the right form.
 */
export function evaluate(input: EvaluationInput): Evaluation {
  const { courses, mixes, products } = input
  const mixOf = (course: Course | undefined): MixFacts | undefined => (course?.mixId ? mixes[course.mixId] : undefined)
  const results = courses.map((course, index) => courseResult(course, input, mixOf(courses.slice(index + 1).find((next) => !isDry(next)))))
  const timeline = timelineOf(courses, results)
  const laid = layUp(courses, { results, timeline, mixOf })
  return {
    courses: results,
    totals: {
      thickness: totalThickness(courses, results),
      vocWorst: worstVoc(courses, results),
      hoursToFoot: hoursTo('foot', { courses, results, timeline }),
      hoursToVehicles: hoursTo('vehicles', { courses, results, timeline }),
      dewPoint: dewPointFigure(input),
    },
    timeline,
    findings: runChecks({ input, laid }),
    hazards: unionOfHazards(courses.flatMap((course) => productsOf(course, { mixes, products }))),
  }
}

interface Parts {
  results: readonly CourseResult[]
  timeline: Evaluation['timeline']
  mixOf: (course: Course) => MixFacts | undefined
}

/** Courses as the checks see them, each with the one it is laid on. */
function layUp(courses: readonly Course[], { results, timeline, mixOf }: Parts): Laid[] {
  const laid: Laid[] = []
  let beneath: Laid | undefined
  let ground = false
  courses.forEach((course, index) => {
    const [result, time] = [results[index], timeline[index]]
    if (!result || !time) return
    const one: Laid = { course, mix: mixOf(course), result, time, beneath: isDry(course) ? undefined : beneath, onGroundSurface: ground }
    laid.push(one)
    if (isDry(course)) ground = true
    else {
      beneath = one
      ground = false
    }
  })
  return laid
}

const overField = (course: Course) => !isDry(course) && course.stage !== 'fill' && course.stage !== 'cove'

/** Dry thickness of all courses over the field of the floor, in the unit of the thickest. Stones standing out of a broadcast are not counted. */
function totalThickness(courses: readonly Course[], results: readonly CourseResult[]): Figure {
  const films = courses.flatMap((course, index) => (overField(course) ? [{ course, film: results[index]?.dryFilm }] : []))
  const missing = films.find(({ film }) => !film || film.kind === 'not-stated')
  if (films.length === 0 || missing) {
    if (missing?.film?.kind === 'not-stated') return missing.film
    return notStated('filmThickness', { of: 'the floor', subject: null, ask: 'whoever builds this up', because: 'nothing is laid' })
  }
  const known = films.flatMap(({ film }) => (film && film.kind !== 'not-stated' ? [leastOf(film.value)] : []))
  const unit = known.some(({ unit: one }) => one === 'mil' || one === 'in') ? 'mil' : 'µm'
  const total = known.reduce((sum, film) => sum + valueIn(film, unit), 0)
  return {
    kind: 'computed',
    value: { min: total, max: total, unit },
    working: { formula: 'sum of the dry films', sum: `${known.map((film) => formatNumber(valueIn(film, unit))).join(' + ')} = ${formatNumber(total)} ${unit}`, source: 'the courses' },
    from: [],
  }
}

/** The greatest VOC content of any course; not stated as soon as one is not. */
function worstVoc(courses: readonly Course[], results: readonly CourseResult[]): Figure {
  const contents = courses.flatMap((course, index) => (isDry(course) ? [] : (results[index]?.voc ?? [])))
  const missing = contents.find(({ kind }) => kind === 'not-stated')
  if (missing) return missing
  const known = contents.flatMap((figure) => (figure.kind === 'not-stated' ? [] : [figure]))
  const grams = (figure: (typeof known)[number]) => valueIn({ value: figure.value.max ?? figure.value.min ?? 0, unit: figure.value.unit }, 'g/L')
  const [worst] = known.sort((a, b) => grams(b) - grams(a))
  return worst ?? notStated('voc', { of: 'the floor', subject: null, ask: 'whoever builds this up', because: 'no mix is chosen' })
}

/** Hours from the start of the first course until feet or wheels may return: the last of the courses to allow it. */
function hoursTo(traffic: 'foot' | 'vehicles', floor: { courses: readonly Course[]; results: readonly CourseResult[]; timeline: Evaluation['timeline'] }): Figure {
  const property = traffic === 'foot' ? 'footTraffic' : 'vehicleTraffic'
  const top = floor.courses.findLastIndex(overField)
  const [entry, result, course] = [floor.timeline[top], floor.results[top], floor.courses[top]]
  if (!entry || !result || !course) return notStated(property, { of: 'the floor', subject: null, ask: 'whoever builds this up', because: 'nothing is laid' })
  const own = result[property]
  const hours = entry[traffic]
  if (own.kind === 'not-stated') return own
  if (hours === null || entry.start === null) return notStated(property, { of: course.title, subject: null, ask: 'whoever plans the work', because: 'when the last course starts is not known' })
  return {
    kind: 'computed',
    value: { min: hours, max: hours, unit: 'h' },
    working: { formula: 'start of the last course + its sheet’s time', sum: `${formatNumber(entry.start, 1)} h + ${formatRange(own.value)} = ${formatNumber(hours, 1)} h`, source: 'timeline at the slab temperature; laying time not counted' },
    from: [],
  }
}

function dewPointFigure({ conditions }: EvaluationInput): Figure {
  const { airTemperature, relativeHumidity } = conditions
  const unit = airTemperature.unit === '°F' ? '°F' : '°C'
  const dew = convert(dewPoint({ temperature: airTemperature, relativeHumidity }), unit)
  return {
    kind: 'computed',
    value: { min: dew.value, max: dew.value, unit },
    working: {
      formula: 'Td = b γ ÷ (a − γ), γ = ln(RH/100) + a T ÷ (b + T)',
      sum: `air ${formatNumber(airTemperature.value, 1)} ${unitText(airTemperature.unit)}, ${formatNumber(relativeHumidity)} % RH: ${formatNumber(dew.value, 1)} ${unitText(quantity(0, unit).unit)}`,
      source: 'Magnus formula over water, WMO No. 8 constants',
    },
    from: [],
  }
}
