import { condensationPoint, dewPointMargin, marginBounds } from '../dew-point.ts'
import { type Fact, factsOf, rangeOf } from '../fact.ts'
import { figureOfFact } from '../figure.ts'
import { formatNumber, formatQuantity, formatRange, unitText } from '../format.ts'
import type { Range } from '../property.ts'
import { type Quantity, convert, valueIn } from '../units.ts'
import { computed } from '../working.ts'
import { type Check, type Floor, type LaidMix, type Verdict, capital, mixCourses, unknown, unstatedOfMix } from './check.ts'

interface Asked {
  what: 'slab' | 'air'
  at: Quantity
  range: Range
  fact: Fact
}

const isOutside = ({ at, range }: Asked) => {
  const value = valueIn(at, range.unit)
  return (range.min !== undefined && value < range.min - 1e-9) || (range.max !== undefined && value > range.max + 1e-9)
}

/** Every range that the sheet gives with the temperature it is asked of; one that does not say is asked of slab and air. */
function askedOf(facts: readonly Fact[], { input }: Floor): Asked[] {
  const { slabTemperature, airTemperature } = input.conditions
  const measured = [
    { what: 'slab', at: slabTemperature },
    { what: 'air', at: airTemperature },
  ] as const
  return facts.flatMap((fact) => {
    const range = rangeOf(fact)
    return range ? measured.filter(({ what }) => (fact.of ?? what) === what).map((one) => ({ ...one, range, fact })) : []
  })
}

/** "slab 68 °F (20 °C), the sheet allows 5–30 °C": told in the limit's unit too where that is another. */
function inWords({ what, at, range }: Asked): string {
  const other = range.unit === at.unit ? '' : ` (${formatQuantity(convert(at, range.unit))})`
  return `${what} ${formatQuantity(at)}${other}, the sheet allows ${formatRange(range)}`
}

function temperatureVerdict({ course, mix }: LaidMix, floor: Floor): Verdict {
  const facts = factsOf(mix.facts, 'applicationTemperature')
  if (facts.length === 0) {
    return unknown(course.id, `No sheet of ${mix.name} states at which temperature it may be laid.`, [
      unstatedOfMix('applicationTemperature', mix),
    ])
  }
  const asked = askedOf(facts, floor)
  if (asked.length === 0) {
    const because = 'the sheet speaks of the material’s temperature only, which is not among the conditions'
    return unknown(course.id, 'The sheet states no temperature of slab or air.', [unstatedOfMix('applicationTemperature', mix, because)])
  }
  const said = (list: readonly Asked[]) => capital(list.map(inWords).join('; '))
  const figures = facts.map((fact, index) => ({
    label: `the sheet’s range${facts.length > 1 ? ` ${index + 1}` : ''}${fact.of ? `, ${fact.of}` : ''}`,
    figure: figureOfFact(fact),
  }))
  const outside = asked.filter(isOutside)
  if (outside.length > 0) {
    const todo = 'Wait, heat or cool until slab and air are inside the range. Heat indirectly: a flame in the room brings water and soot.'
    return { courseId: course.id, status: 'stop', says: `${said(outside)}.`, todo, figures }
  }
  const ends = (['slab', 'air'] as const).flatMap((what) => openEnd(asked.filter((one) => one.what === what)) ?? [])
  if (ends.length > 0) {
    const because = `the sheet states no ${[...new Set(ends)].join(' and no ')} temperature`
    return { ...unknown(course.id, `${said(asked)}: ${because}.`, [unstatedOfMix('applicationTemperature', mix, because)]), figures }
  }
  return { courseId: course.id, status: 'met', says: `${said(asked)}.`, figures }
}

/** The end that none of the ranges asked of slab, or of air, gives. */
function openEnd(asked: readonly Asked[]): 'lowest' | 'highest' | undefined {
  if (asked.length === 0) return undefined
  if (asked.every(({ range }) => range.min === undefined)) return 'lowest'
  return asked.every(({ range }) => range.max === undefined) ? 'highest' : undefined
}

export const temperatureInRange: Check = {
  id: 'temperature-in-range',
  title: 'Temperature within the sheet’s range',
  needs: ['application temperature of the mix', 'slab and air temperature'],
  source: 'the mix’s data sheet',
  severity: 'Stop: too cold a film does not cure, too hot it is gone before it is laid.',
  run: (floor) => mixCourses(floor).map((laid) => temperatureVerdict(laid, floor)),
}

type MarginUnit = 'Δ°F' | 'Δ°C'

function marginFigure(margin: Quantity<MarginUnit>, { input }: Floor) {
  const { slabTemperature, airTemperature, relativeHumidity } = input.conditions
  const { at, name } = condensationPoint({ temperature: airTemperature, relativeHumidity })
  const dew = convert(at, slabTemperature.unit === '°F' ? '°F' : '°C')
  return computed(margin, {
    formula: name === 'dew point' ? 'slab − dew point (over water)' : 'slab − frost point (over ice)',
    sum: `${formatQuantity(slabTemperature)} − ${formatQuantity(dew)} (air ${formatQuantity(airTemperature)}, ${formatNumber(relativeHumidity)} % RH) = ${formatQuantity(margin)}`,
    source: 'Magnus formula, WMO No. 8 constants',
  })
}

/** One margin that the sheet asks for: 3 °C and 5 °F are two different limits, each judged in its own unit, on unrounded values. */
function marginAgainst(fact: Fact, floor: Floor) {
  const limit = rangeOf(fact)
  if (limit?.min === undefined) return []
  const { slabTemperature: slab, airTemperature: temperature, relativeHumidity } = floor.input.conditions
  const air = { temperature, relativeHumidity }
  const unit: MarginUnit = limit.unit === 'Δ°F' ? 'Δ°F' : 'Δ°C'
  const margin = dewPointMargin(slab, air, unit)
  const least = convert(marginBounds(slab, air).least, unit)
  const status = margin.value < limit.min ? 'stop' : least.value < limit.min ? 'caution' : 'met'
  return [{ fact, limit, margin, least, status } as const]
}

/** In tenths, or in as many more places as it takes to tell a margin that is short of its limit from one that is not. */
function marginInWords({ value, unit }: Quantity<MarginUnit>, limit: number): string {
  const places = [1, 2, 3].find((decimals) => Number(value.toFixed(decimals)) < limit === value < limit) ?? 4
  return `${formatNumber(Math.abs(value), places)} ${unitText(unit)} ${value < 0 ? 'below' : 'above'}`
}

function dewVerdict({ course, mix }: LaidMix, floor: Floor): Verdict {
  const margins = factsOf(mix.facts, 'dewPointMargin').flatMap((fact) => marginAgainst(fact, floor))
  const severest = (['stop', 'caution', 'met'] as const).flatMap((status) => margins.find((one) => one.status === status) ?? [])[0]
  if (!severest) {
    const says = `No sheet of ${mix.name} states how far above the dew point the slab must be.`
    return unknown(course.id, says, [unstatedOfMix('dewPointMargin', mix)])
  }
  const { status, margin, limit, least } = severest
  const { airTemperature: temperature, relativeHumidity, slabTemperature } = floor.input.conditions
  const { name } = condensationPoint({ temperature, relativeHumidity })
  const place = marginInWords(margin, limit.min ?? 0)
  const says = `The slab at ${formatQuantity(slabTemperature)} is ${place} the ${name}; the sheet asks for ${formatRange(limit)}.`
  const unsure = `With common instruments (±0.5 °C, ±3 % RH) it may be ${formatQuantity(least)}.`
  return {
    courseId: course.id,
    status,
    says: status === 'caution' ? `${says} ${unsure}` : says,
    todo:
      status === 'stop'
        ? 'Hold the work. Warm the slab or dry the air, then measure again.'
        : 'Measure again with better instruments, and again every hour while laying and curing.',
    figures: [
      { label: `slab above ${name}`, figure: marginFigure(margin, floor) },
      ...margins.map((one, index) => ({ label: `the sheet’s margin${index > 0 ? ` ${index + 1}` : ''}`, figure: figureOfFact(one.fact) })),
    ],
  }
}

export const dewPointMarginKept: Check = {
  id: 'dew-point-margin',
  title: 'Slab above the dew point',
  needs: ['margin above the dew point of the mix', 'slab and air temperature, humidity of the air'],
  source: 'the mix’s data sheet; Magnus formula, WMO No. 8 (from memory)',
  severity: 'Stop under the sheet’s margin: water settles in the film. Caution where the instruments cannot tell.',
  run: (floor) => mixCourses(floor).map((laid) => dewVerdict(laid, floor)),
}
