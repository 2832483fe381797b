import type { Course, EvaluationInput } from './build-up.ts'
import { isDry } from './course-result.ts'
import { condensationPoint } from './dew-point.ts'
import type { CourseResult, TimelineEntry } from './evaluation.ts'
import { type Figure, type KnownFigure, notStated } from './figure.ts'
import { formatNumber, formatQuantity, formatRange } from './format.ts'
import { convert, valueIn } from './units.ts'
import { type Source, computed, greatestOf, point, sourcesOf, sumOf } from './working.ts'

/** A course with what was worked out for it. */
export interface Worked {
  course: Course
  result: CourseResult
  time: TimelineEntry
}

/** True for courses that cover the field of the floor: not preparing, grinding, filling joints or running up walls. */
export function overField(course: Course): boolean {
  return !isDry(course) && course.stage !== 'fill' && course.stage !== 'cove'
}

const nothing = (property: 'filmThickness' | 'voc' | 'footTraffic' | 'vehicleTraffic', because: string) =>
  notStated(property, { of: 'the floor', subject: null, ask: 'whoever builds this up', because })

/** Dry thickness of all courses over the field of the floor. Stones standing out of a broadcast are not counted. */
export function totalThickness(floor: readonly Worked[]): Figure {
  const field = floor.filter(({ course }) => overField(course))
  const missing = field.map(({ result }) => result.dryFilm).find(({ kind }) => kind === 'not-stated')
  if (missing) return missing
  const films = field.flatMap(({ course, result: { dryFilm } }) =>
    dryFilm.kind === 'not-stated' ? [] : [{ title: course.title, film: dryFilm }],
  )
  if (films.length === 0) return nothing('filmThickness', 'nothing is laid')
  const us = films.some(({ film }) => film.value.unit === 'mil' || film.value.unit === 'in')
  const unit = us ? 'mil' : 'µm'
  const total = sumOf(
    films.map(({ film }) => film.value),
    unit,
  )
  const terms = films.map(({ film }) => formatRange(sumOf([film.value], unit)))
  return computed(
    total,
    { formula: 'sum of the dry films', sum: `${terms.join(' + ')} = ${formatRange(total)}`, source: 'the courses' },
    films.flatMap(({ title, film }) => sourcesOf(`dry film of ${title}`, film)),
  )
}

/** The greatest VOC content of any course; not stated as soon as one is not. */
export function worstVoc(floor: readonly Worked[]): Figure {
  const contents = floor.filter(({ course }) => !isDry(course)).map(({ result }) => result.voc)
  const missing = contents.find(({ kind }) => kind === 'not-stated')
  if (missing) return missing
  const grams = (figure: KnownFigure) => valueIn(greatestOf(figure.value), 'g/L')
  const [worst] = contents.filter((figure) => figure.kind !== 'not-stated').sort((a, b) => grams(b) - grams(a))
  return worst ?? nothing('voc', 'no mix is chosen')
}

/** Hours from the start of the first course until feet or wheels may return: when the last of the courses over the field allows it. */
export function hoursTo(traffic: 'foot' | 'vehicles', floor: readonly Worked[]): Figure {
  const property = traffic === 'foot' ? 'footTraffic' : 'vehicleTraffic'
  const field = floor.filter(({ course }) => overField(course))
  const top = field.at(-1)
  if (!top) return nothing(property, 'nothing is laid')
  const own = top.result[property]
  if (own.kind === 'not-stated') return own
  if (top.time[traffic] === null) {
    const because = 'when the last course starts is not known'
    return notStated(property, { of: top.course.title, subject: null, ask: 'whoever plans the work', because })
  }
  const latest = field.reduce((last, one) => ((one.time[traffic] ?? -1) > (last.time[traffic] ?? -1) ? one : last), top)
  const [start, hours, stated] = [latest.time.start ?? 0, latest.time[traffic] ?? 0, latest.result[property]]
  const wait = stated.kind === 'not-stated' ? '' : formatRange(stated.value)
  const from: Source[] =
    stated.kind === 'not-stated' ? [] : sourcesOf(`${traffic === 'foot' ? 'foot' : 'vehicle'} traffic on ${latest.course.title}`, stated)
  return computed(
    { value: hours, unit: 'h' },
    {
      formula: `start of ${latest.course.title} + its sheet’s time`,
      sum: `${formatNumber(start, 1)} h + ${wait} = ${formatNumber(hours, 1)} h`,
      source: 'timeline at the slab temperature; laying itself not counted',
    },
    from,
  )
}

/** Where water settles on the slab: the dew point, or below freezing the frost point, in the unit of the air temperature. */
export function dewPointFigure({ conditions }: Pick<EvaluationInput, 'conditions'>): Figure {
  const { airTemperature, relativeHumidity } = conditions
  const { at, name } = condensationPoint({ temperature: airTemperature, relativeHumidity })
  const dew = convert(at, airTemperature.unit)
  return computed(dew, {
    formula: 'Td = b γ ÷ (a − γ), γ = ln(RH/100) + a T ÷ (b + T)',
    sum: `air ${formatQuantity(airTemperature)}, ${formatNumber(relativeHumidity)} % RH: ${name} ${formatRange(point(dew))}`,
    source: name === 'dew point' ? 'Magnus formula over water, WMO No. 8 constants' : 'Magnus formula over ice, WMO No. 8 constants',
  })
}
