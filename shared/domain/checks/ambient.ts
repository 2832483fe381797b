import { condensationPoint, dewPointMargin, marginBounds } from '../dew-point.ts'
import { factOf, factsOf, rangeOf } from '../fact.ts'
import { type Figure, figureOfFact, notStated } from '../figure.ts'
import { formatNumber, formatRange, unitText } from '../format.ts'
import type { MixFacts } from '../mix.ts'
import type { Property } from '../property.ts'
import { type Quantity, convert, valueIn } from '../units.ts'
import { type Check, type Floor, type Laid, type Verdict, resinCourses, unknown } from './check.ts'

const missingOf = (property: Property, mix: MixFacts) => notStated(property, { of: mix.name, subject: { kind: 'mix', id: mix.id }, ask: 'the maker, in writing' })
const withMix = (floor: Floor) => resinCourses(floor).flatMap((laid) => (laid.mix ? [{ ...laid, mix: laid.mix }] : []))
type Mixed = Laid & { mix: MixFacts }

function temperatureVerdict({ course, mix }: Mixed, { input }: Floor): Verdict {
  const facts = factsOf(mix.facts, 'applicationTemperature')
  if (facts.length === 0) return unknown(course.id, `No sheet of ${mix.name} states at which temperature it may be laid.`, [missingOf('applicationTemperature', mix)])
  const asked = facts.flatMap((fact) => {
    const range = rangeOf(fact)
    const measured: [string, Quantity][] = [['slab', input.conditions.slabTemperature], ['air', input.conditions.airTemperature]]
    return range ? measured.filter(([what]) => (fact.of ?? what) === what).map(([what, at]) => ({ what, at, range, fact })) : []
  })
  const outside = asked.filter(({ at, range }) => {
    const value = valueIn(at, range.unit)
    return (range.min !== undefined && value < range.min) || (range.max !== undefined && value > range.max)
  })
  const figures = facts.map((fact) => ({ label: `the sheet’s range${fact.of ? `, ${fact.of}` : ''}`, figure: figureOfFact(fact) }))
  const said = (list: typeof asked) => list.map(({ what, at, range }) => `${what} ${formatNumber(at.value, 1)} ${unitText(at.unit)}, the sheet allows ${formatRange(range)}`).join('; ')
  if (asked.length === 0) return unknown(course.id, 'The sheet speaks of the material’s temperature only, which is not among the conditions.', [missingOf('applicationTemperature', mix)])
  return outside.length > 0
    ? { courseId: course.id, status: 'stop', says: `${said(outside)}.`, todo: 'Wait, heat or cool until slab and air are inside the range. Heat indirectly: a flame in the room brings water and soot.', figures }
    : { courseId: course.id, status: 'met', says: `${said(asked)}.`, figures }
}

export const temperatureInRange: Check = {
  id: 'temperature-in-range',
  title: 'Temperature within the sheet’s range',
  needs: ['applicationTemperature', 'slab and air temperature'],
  source: 'the mix’s data sheet',
  run: (floor) => withMix(floor).map((laid) => temperatureVerdict(laid, floor)),
}

function marginFigure(margin: Quantity, { input }: Floor): Figure {
  const { slabTemperature, airTemperature, relativeHumidity } = input.conditions
  const { at, name } = condensationPoint({ temperature: airTemperature, relativeHumidity })
  const dew = convert(at, slabTemperature.unit === '°F' ? '°F' : '°C')
  const degrees = (of: Quantity) => `${formatNumber(of.value, 1)} ${unitText(of.unit)}`
  return {
    kind: 'computed',
    value: { min: margin.value, max: margin.value, unit: margin.unit },
    working: {
      formula: name === 'dew point' ? 'slab − dew point (over water)' : 'slab − frost point (over ice)',
      sum: `${degrees(slabTemperature)} − ${degrees(dew)} (air ${degrees(airTemperature)}, ${formatNumber(relativeHumidity)} % RH) = ${degrees(margin)}`,
      source: 'Magnus formula, WMO No. 8 constants',
    },
    from: [],
  }
}

function dewVerdict({ course, mix }: Mixed, floor: Floor): Verdict {
  const fact = factOf(mix.facts, 'dewPointMargin')
  const limit = rangeOf(fact)
  if (!fact || limit?.min === undefined) return unknown(course.id, `No sheet of ${mix.name} states how far above the dew point the slab must be.`, [missingOf('dewPointMargin', mix)])
  const { slabTemperature: slab, airTemperature: temperature, relativeHumidity } = floor.input.conditions
  const air = { temperature, relativeHumidity }
  const unit = limit.unit === 'Δ°F' ? 'Δ°F' : 'Δ°C'
  const margin = dewPointMargin(slab, air, unit)
  const { least } = marginBounds(slab, air)
  const status = margin.value < limit.min ? 'stop' : valueIn(least, unit) < limit.min ? 'caution' : 'met'
  const says = `The slab is ${formatNumber(margin.value, 1)} ${unitText(unit)} above the dew point; the sheet asks for ${formatRange(limit)}.`
  return {
    courseId: course.id,
    status,
    says: status === 'caution' ? `${says} With common instruments (±0.5 °C, ±3 % RH) it may be ${formatNumber(valueIn(least, unit), 1)} ${unitText(unit)}.` : says,
    todo: status === 'stop' ? 'Hold the work. Warm the slab or dry the air, then measure again.' : 'Measure again with better instruments, and again every hour while laying and curing.',
    figures: [
      { label: 'slab above dew point', figure: marginFigure(margin, floor) },
      { label: 'the sheet’s margin', figure: figureOfFact(fact) },
    ],
  }
}

export const dewPointMarginKept: Check = {
  id: 'dew-point-margin',
  title: 'Slab above the dew point',
  needs: ['dewPointMargin', 'slab and air temperature, humidity of the air'],
  source: 'the mix’s data sheet; Magnus formula, WMO No. 8',
  run: (floor) => withMix(floor).map((laid) => dewVerdict(laid, floor)),
}
