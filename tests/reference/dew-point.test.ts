import psychrolib from 'psychrolib'
import fc from 'fast-check'
import { beforeAll, describe, expect, it } from 'vitest'
import {
  condensationPoint,
  dewPoint,
  dewPointMargin,
  frostPoint,
  greyBand,
  highestHumidity,
  marginBounds,
} from '../../shared/domain/dew-point.ts'
import { quantity, valueIn } from '../../shared/domain/units.ts'

/** psychrolib 1.1.1 holds the ASHRAE Handbook 2017 equations. Below 0 °C it answers with the frost point. */
beforeAll(() => psychrolib.SetUnitSystem(psychrolib.SI))
const psychro = (t: number, rh: number) => psychrolib.GetTDewPointFromRelHum(t, rh / 100)
const air = (t: number, relativeHumidity: number, unit: '°C' | '°F' = '°C') => ({ temperature: quantity(t, unit), relativeHumidity })

describe('dew point, against psychrolib', () => {
  it.each([
    [5, 85, 2.691],
    [10, 50, 0.063],
    [10, 80, 6.713],
    [15, 60, 7.307],
    [20, 50, 9.272],
    [20, 65, 13.227],
    [20, 85, 17.403],
    [2, 95, 1.284],
    [25, 60, 16.701],
    [25, 75, 20.261],
    [30, 50, 18.447],
    [30, 85, 27.199],
    [35, 40, 19.385],
    [40, 70, 33.469],
  ])('air %d °C, %d %% RH: %d °C', (t, rh, expected) => {
    expect(psychro(t, rh), 'the reference itself').toBeCloseTo(expected, 2)
    expect(Math.abs(dewPoint(air(t, rh)).value - expected)).toBeLessThan(0.04)
  })

  it('stays within 0.04 °C from 1 to 45 °C and 20 to 100 % RH, wherever the dew point is above 0 °C', () => {
    let worst = 0
    for (let t = 1; t <= 45; t++) {
      for (let rh = 20; rh <= 100; rh += 5) {
        const reference = psychro(t, rh)
        if (reference >= 0) worst = Math.max(worst, Math.abs(dewPoint(air(t, rh)).value - reference))
      }
    }
    expect(worst).toBeLessThan(0.04)
    expect(worst, 'the grid was walked').toBeGreaterThan(0.01)
  })

  it('in °F: 70 °F and 65 % is 57.7 °F, 90 °F and 50 % is 68.9 °F (psychrolib, ± 0.1)', () => {
    const fahrenheit = (t: number, rh: number) => valueIn(dewPoint(air(t, rh, '°F')), '°F')
    const table = [
      [50, 50, 32.1],
      [60, 50, 41.3],
      [70, 50, 50.5],
      [70, 65, 57.7],
      [70, 80, 63.6],
      [75, 65, 62.5],
      [80, 60, 64.9],
      [85, 70, 74.1],
      [90, 50, 68.9],
    ] as const
    for (const [t, rh, expected] of table) expect(Math.abs(fahrenheit(t, rh) - expected), `${t} °F, ${rh} %`).toBeLessThan(0.1)
  })
})

describe('dew point, against a published table (industry data sheet of 2013, 0.1 °C, within 0.15 °C)', () => {
  it.each([
    [10, 50, 0.1],
    [15, 50, 4.7],
    [20, 50, 9.3],
    [25, 50, 13.8],
    [30, 50, 18.4],
    [20, 55, 10.7],
    [20, 60, 12],
    [25, 60, 16.7],
    [30, 60, 21.4],
    [20, 65, 13.3],
    [10, 75, 5.7],
    [10, 80, 6.7],
    [15, 80, 11.5],
    [10, 85, 7.6],
    [15, 85, 12.5],
    [10, 90, 8.4],
  ])('air %d °C, %d %% RH: %d °C', (t, rh, printed) => expect(Math.abs(dewPoint(air(t, rh)).value - printed)).toBeLessThan(0.15))

  it.each([
    [5, 50, -4.1],
    [8, 50, -1.6],
  ])('prints the frost point below freezing: air %d °C, %d %% RH: %d °C', (t, rh, printed) => {
    expect(Math.abs(frostPoint(air(t, rh)).value - printed)).toBeLessThan(0.15)
    expect(Math.abs(dewPoint(air(t, rh)).value - printed), 'the dew point is another thing').toBeGreaterThan(0.15)
  })
})

describe('the frost-point trap', () => {
  it('5 °C and 50 % RH: dew point −4.58 °C over water, frost point −4.03 °C over ice, half a kelvin apart', () => {
    expect(dewPoint(air(5, 50)).value).toBeCloseTo(-4.577, 2)
    expect(frostPoint(air(5, 50)).value).toBeCloseTo(psychro(5, 50), 1)
    expect(psychro(5, 50)).toBeCloseTo(-4.033, 2)
    expect(psychro(0.5, 90)).toBeCloseTo(-0.836, 2)
    expect(frostPoint(air(0.5, 90)).value).toBeCloseTo(-0.836, 1)
  })

  it('counts the margin from whichever comes first as the slab cools', () => {
    expect(condensationPoint(air(20, 50)).name).toBe('dew point')
    expect(condensationPoint(air(5, 50))).toMatchObject({ name: 'frost point' })
    // a slab at −1.5 °C is 3.08 °C above the dew point over water, and only 2.53 °C above the frost that comes first
    expect(dewPointMargin(quantity(-1.5, '°C'), air(5, 50), 'Δ°C').value).toBeCloseTo(2.53, 1)
  })
})

describe('slab above the dew point', () => {
  it.each([
    ['a', 20, 65, 17, 3.8],
    ['b', 20, 65, 16, 2.8],
    ['c', 25, 75, 22, 1.7],
    ['e', 10, 88, 14, 5.9],
  ])('%s: air %d °C, %d %% RH, slab %d °C is %d °C above', (...[, t, rh, slab, margin]) => {
    expect(dewPointMargin(quantity(slab, '°C'), air(t, rh), 'Δ°C').value).toBeCloseTo(margin, 1)
  })

  it('d: air 75 °F, 65 % RH, slab 67.4 °F is 4.95 °F above: short of 5 °F by less than the constants of the formula are worth', () => {
    const margin = dewPointMargin(quantity(67.4, '°F'), air(75, 65, '°F'), 'Δ°F').value
    expect(Math.abs(margin - 4.95)).toBeLessThan(0.05)
    expect(margin).toBeLessThan(5)
  })

  it('3 °C and 5 °F are two limits: slab 16 °C, air 20 °C and 65 % misses 3 °C, and is within the grey band of 5 °F', () => {
    const slab = quantity(16, '°C')
    expect(dewPointMargin(slab, air(20, 65), 'Δ°C').value).toBeLessThan(3)
    const psychrolibMargin = (16 - psychro(20, 65)) * 1.8
    const own = dewPointMargin(slab, air(20, 65), 'Δ°F').value
    expect(psychrolibMargin, 'by psychrolib it misses').toBeLessThan(5)
    expect(own, 'by the WMO constants it passes').toBeGreaterThan(5)
    expect(Math.abs(own - 5)).toBeLessThan(valueIn(greyBand, 'Δ°F'))
  })

  it.each([
    [20, 17, 68.35],
    [20, 20, 82.86],
    [25, 22, 69.35],
    [10, 8, 71.05],
    [30, 24, 58.59],
  ])('air %d °C, slab %d °C: up to %d %% RH leaves 3 °C (psychrolib)', (t, slab, rh) => {
    expect(highestHumidity({ slab: quantity(slab, '°C'), air: quantity(t, '°C'), margin: quantity(3, 'Δ°C') })).toBeCloseTo(rh, 0)
  })

  it('±0.5 °C and ±3 % RH move the dew point by about 2.2 °F at 70 °F and 50 % (common practice): a margin of 6 °F may be under 4 °F', () => {
    const room = air(70, 50, '°F')
    const slab = quantity(valueIn(dewPoint(room), '°F') + 6, '°F')
    const { least, greatest } = marginBounds(slab, room)
    expect(valueIn(least, 'Δ°F')).toBeLessThan(4)
    expect(valueIn(greatest, 'Δ°F')).toBeGreaterThan(8)
  })

  it('lies between the bounds that the instruments leave, and the highest humidity leaves the margin asked for', () => {
    const t = fc.double({ min: 1, max: 45, noNaN: true })
    const rh = fc.double({ min: 5, max: 97, noNaN: true })
    fc.assert(
      fc.property(t, rh, t, (air1, humidity, slabAt) => {
        const [slab, room] = [quantity(slabAt, '°C'), air(air1, humidity)]
        const margin = dewPointMargin(slab, room, 'Δ°C').value
        const { least, greatest } = marginBounds(slab, room)
        expect(least.value).toBeLessThan(margin)
        expect(greatest.value).toBeGreaterThan(margin)
        const highest = highestHumidity({ slab, air: room.temperature, margin: quantity(3, 'Δ°C') })
        if (highest <= 100 && highest >= 1) expect(dewPointMargin(slab, air(air1, highest), 'Δ°C').value).toBeCloseTo(3, 6)
      }),
    )
  })
})
