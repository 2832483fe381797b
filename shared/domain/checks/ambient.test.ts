import { describe, expect, it } from 'vitest'
import { exampleFloor, fact, findingOf, restate } from '../../../tests/setup/example-floor.ts'
import type { Fact } from '../fact.ts'
import type { Quantity } from '../units.ts'

const celsius = (value: number): Quantity => ({ value, unit: '°C' })
const fahrenheit = (value: number): Quantity => ({ value, unit: '°F' })

interface Room {
  slab: Quantity
  air: Quantity
  humidity: number
}

function dewVerdict({ slab, air, humidity }: Room, ...margins: Fact[]) {
  const floor = exampleFloor()
  restate(floor, 'dewPointMargin', ...margins)
  Object.assign(floor.input.conditions, { slabTemperature: slab, airTemperature: air, relativeHumidity: humidity })
  return findingOf(floor, 'dew-point-margin', 'top')
}
const three = fact('dewPointMargin', { min: 3, unit: 'Δ°C' })
const five = fact('dewPointMargin', { min: 5, unit: 'Δ°F' })

describe('slab above the dew point: 3 °C and 5 °F are two different limits (dew points by psychrolib, ASHRAE 2017)', () => {
  it('20 °C, 65 %, slab 17 °C: dew point 13.2, margin 3.8: kept, but within the instruments’ error of 3', () => {
    expect(dewVerdict({ slab: celsius(17), air: celsius(20), humidity: 65 }, three).status).toBe('caution')
  })

  it('20 °C, 65 %, slab 16 °C: dew point 13.23, margin 2.77 °C fails 3 °C; the same is 4.99 °F, and is never met for 5 °F', () => {
    expect(dewVerdict({ slab: celsius(16), air: celsius(20), humidity: 65 }, three).status).toBe('stop')
    expect(dewVerdict({ slab: celsius(16), air: celsius(20), humidity: 65 }, five).status).not.toBe('met')
  })

  it('25 °C, 75 %, slab 22 °C: dew point 20.3, margin 1.7: stop', () => {
    expect(dewVerdict({ slab: celsius(22), air: celsius(25), humidity: 75 }, three).status).toBe('stop')
  })

  it('75 °F, 65 %, slab 67.4 °F: dew point 62.45, margin 4.95 °F fails 5 by a twentieth, decided unrounded', () => {
    const finding = dewVerdict({ slab: fahrenheit(67.4), air: fahrenheit(75), humidity: 65 }, five)
    expect(finding.status).toBe('stop')
    expect(finding.says).toBe('The slab at 67.4 °F is 4.97 °F above the dew point; the sheet asks for ≥ 5 °F.')
  })

  it('10 °C, 88 %, slab 14 °C: dew point 8.11, margin 5.9: kept beyond the instruments’ error', () => {
    expect(dewVerdict({ slab: celsius(14), air: celsius(10), humidity: 88 }, three).status).toBe('met')
  })

  it('a sheet that asks for both is held to the stricter at the edge', () => {
    // 2.9 °C is 5.2 °F: above 5 °F, under 3 °C
    const room = { slab: celsius(16.13), air: celsius(20), humidity: 65 }
    expect(dewVerdict(room, five).status).toBe('caution')
    expect(dewVerdict(room, five, three)).toMatchObject({ status: 'stop', says: expect.stringContaining('≥ 3 °C') as string })
  })

  it('a slab under the dew point is said to be below it', () => {
    expect(dewVerdict({ slab: celsius(10), air: celsius(25), humidity: 75 }, three).says).toMatch(/10\.3 °C below the dew point/)
  })

  it('below freezing it is the frost point that counts: 5 °C and 50 %, frost at −4.0, dew at −4.6 °C', () => {
    const finding = dewVerdict({ slab: celsius(2), air: celsius(5), humidity: 50 }, three)
    expect(finding.says).toMatch(/6 °C above the frost point/)
  })

  it('a sheet that names no margin leaves it unknown; a common one is not put in its place', () => {
    expect(dewVerdict({ slab: celsius(20), air: celsius(20), humidity: 40 })).toMatchObject({
      status: 'unknown',
      missing: [{ property: 'dewPointMargin' }],
    })
  })
})

function temperatureVerdict(slab: Quantity, air: Quantity, ...ranges: Fact[]) {
  const floor = exampleFloor()
  restate(floor, 'applicationTemperature', ...ranges)
  Object.assign(floor.input.conditions, { slabTemperature: slab, airTemperature: air })
  return findingOf(floor, 'temperature-in-range', 'top')
}
const range = (ends: { min?: number; max?: number }, rest: Partial<Fact> = {}) =>
  fact('applicationTemperature', { ...ends, unit: '°F' }, rest)

describe('temperature within the sheet’s range', () => {
  it.each([
    [50, 'met'],
    [49.9, 'stop'],
    [90, 'met'],
    [90.1, 'stop'],
  ] as const)('slab and air at %d °F against 50–90 °F: %s', (at, status) => {
    expect(temperatureVerdict(fahrenheit(at), fahrenheit(at), range({ min: 50, max: 90 })).status).toBe(status)
  })

  it('10 °C is 50 °F to the last digit', () => {
    expect(temperatureVerdict(celsius(10), celsius(10), range({ min: 50, max: 90 }))).toMatchObject({
      status: 'met',
      says: 'Slab 10 °C (50 °F), the sheet allows 50–90 °F; air 10 °C (50 °F), the sheet allows 50–90 °F.',
    })
  })

  it('a range of the slab does not bind the air', () => {
    expect(temperatureVerdict(fahrenheit(60), fahrenheit(100), range({ min: 50, max: 90 }, { of: 'slab' })).status).toBe('met')
    expect(temperatureVerdict(fahrenheit(60), fahrenheit(100), range({ min: 50, max: 90 })).status).toBe('stop')
  })

  it('of slab and air apart, each is held to its own', () => {
    const own = [range({ min: 50, max: 80 }, { of: 'slab' }), range({ min: 50, max: 95 }, { of: 'air' })]
    expect(temperatureVerdict(fahrenheit(75), fahrenheit(90), ...own).status).toBe('met')
    expect(temperatureVerdict(fahrenheit(85), fahrenheit(90), ...own).says).toBe('Slab 85 °F, the sheet allows 50–80 °F.')
  })

  it('"not below 50 °F" alone does not say how hot it may be', () => {
    expect(temperatureVerdict(fahrenheit(70), fahrenheit(70), range({ min: 50 }))).toMatchObject({
      status: 'unknown',
      missing: [{ because: 'the sheet states no highest temperature' }],
    })
    expect(temperatureVerdict(fahrenheit(40), fahrenheit(40), range({ min: 50 })).status).toBe('stop')
    expect(temperatureVerdict(fahrenheit(70), fahrenheit(70), range({ min: 50 }), range({ max: 90 })).status).toBe('met')
  })

  it('a range of the material only is asked of nothing measured here', () => {
    expect(temperatureVerdict(fahrenheit(70), fahrenheit(70), range({ min: 60, max: 80 }, { of: 'material' })).status).toBe('unknown')
  })
})
