import fc from 'fast-check'
import { unit as mathUnit } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { type Unit, add, convert, dimensionOf, quantity, units, unitsOf, valueIn } from '../../shared/domain/units.ts'

/**
 * Every unit that can be converted, against mathjs 15 (its own table of units), to 1e-5 relative. Not against our own factors.
 * `psi` by its definition, pound-force per square inch.
 */
const inMath: Partial<Record<Unit, string>> = {
  µm: 'um',
  mm: 'mm',
  m: 'm',
  mil: 'mil',
  in: 'inch',
  ft: 'ft',
  'm²': 'm^2',
  'ft²': 'ft^2',
  mL: 'mL',
  L: 'L',
  'm³': 'm^3',
  gal: 'gallon',
  'in³': 'inch^3',
  g: 'g',
  kg: 'kg',
  lb: 'lbm',
  oz: 'oz',
  'g/L': 'g/L',
  'kg/L': 'kg/L',
  'g/cm³': 'g/cm^3',
  'lb/gal': 'lbm/gallon',
  'lb/ft³': 'lbm/ft^3',
  'm²/L': 'm^2/L',
  'ft²/gal': 'ft^2/gallon',
  'kg/m²': 'kg/m^2',
  'g/m²': 'g/m^2',
  'lb/ft²': 'lbm/ft^2',
  s: 's',
  min: 'minute',
  h: 'hour',
  d: 'day',
  week: 'week',
  '°C': 'degC',
  '°F': 'degF',
  'Δ°C': 'K',
  'Δ°F': 'degR',
  MPa: 'MPa',
  psi: 'lbf/inch^2',
  N: 'N',
  kN: 'kN',
  lbf: 'lbf',
  'mPa·s': 'mPa s',
  'lb/1000 ft²·24 h': 'lbm/(ft^2 day)',
  'g/m²·24 h': 'g/(m^2 day)',
}
/** What mathjs' unit is worth of ours: it has no name for a thousand square feet. */
const times: Partial<Record<Unit, number>> = { 'lb/1000 ft²·24 h': 1e-3 }

const pairs = units.flatMap((from) =>
  unitsOf(dimensionOf(from))
    .filter((to) => to !== from)
    .map((to) => [from, to] as [Unit, Unit]),
)

describe('conversions, against mathjs', () => {
  it('covers every unit that has another of its dimension', () => {
    expect([...new Set(pairs.flat())].filter((unit) => !inMath[unit])).toEqual([])
    expect(pairs.length).toBeGreaterThan(100)
  })

  it.each(pairs)('%s to %s', (from, to) => {
    const value = 37.5
    const expected = mathUnit(value * (times[from] ?? 1), inMath[from] ?? '').toNumber(inMath[to] ?? '') / (times[to] ?? 1)
    expect(Math.abs(valueIn(quantity(value, from), to) / expected - 1)).toBeLessThan(1e-5)
  })

  it('percent, CSP, money, months and mPa·s have no counterpart', () => {
    expect(units.filter((unit) => unitsOf(dimensionOf(unit)).length === 1)).toEqual(['mPa·s', '%', 'month', 'CSP', 'USD'])
  })
})

describe('figures of the trade, from the exact definitions', () => {
  it.each([
    [1, 'gal', 3.785411784, 'L'],
    [1, 'lb', 453.59237, 'g'],
    [1, 'ft²', 0.09290304, 'm²'],
    [1, 'mil', 25.4, 'µm'],
    [1, 'lb/gal', 119.826427, 'g/L'],
    [1, 'g/cm³', 8.3454045, 'lb/gal'],
    [1, 'g/cm³', 62.42796, 'lb/ft³'],
    [1, 'MPa', 145.03774, 'psi'],
    [1, 'lb/1000 ft²·24 h', 4.8824276, 'g/m²·24 h'],
    [1, 'lb/ft²', 4.8824276, 'kg/m²'],
    [5, 'Δ°F', 2.7777778, 'Δ°C'],
    [3, 'Δ°C', 5.4, 'Δ°F'],
    [50, '°F', 10, '°C'],
    [-40, '°F', -40, '°C'],
    [0.016, 'in', 0.4064, 'mm'],
    [0.5, 'lb/ft²', 2.44121, 'kg/m²'],
    [9.2, 'lb/gal', 1.1024, 'kg/L'],
  ] as const)('%d %s is %d %s', (...[value, from, expected, to]) => {
    expect(Math.abs(valueIn(quantity<Unit>(value, from), to) / expected - 1)).toBeLessThan(1e-5)
  })

  it.each([
    [50, 0.417],
    [100, 0.835],
    [150, 1.252],
    [250, 2.086],
    [275, 2.295],
    [340, 2.837],
    [350, 2.921],
    [400, 3.338],
    [450, 3.755],
    [600, 5.007],
    [700, 5.842],
  ])('a VOC content of %d g/L is %d lb/gal', (grams, pounds) => expect(valueIn(quantity(grams, 'g/L'), 'lb/gal')).toBeCloseTo(pounds, 3))

  it('5 °F above the dew point is 2.78 °C above it, not −15 °C', () => {
    expect(valueIn(quantity(5, 'Δ°F'), 'Δ°C')).toBeCloseTo(2.7778, 4)
    expect(valueIn(quantity(5, '°F'), '°C')).toBeCloseTo(-15, 9)
  })
})

describe('units are kept apart', () => {
  it('what measures different things does not convert', () => {
    expect(() => convert(quantity(1, 'mil'), 'gal')).toThrow('mil and gal measure different things')
    expect(() => convert(quantity(5, 'Δ°F'), '°F')).toThrow(RangeError)
    expect(() => convert(quantity(5, 'lb/gal'), 'lb')).toThrow(RangeError)
  })

  it('mils and micrometres are not added: it does not compile', () => {
    expect(add(quantity(10, 'mil'), quantity(6, 'mil'))).toEqual({ value: 16, unit: 'mil' })
    // @ts-expect-error mixing mils and micrometres does not compile
    add(quantity(10, 'mil'), quantity(6, 'µm'))
    // @ts-expect-error nor does a difference in temperature with a temperature
    add(quantity(50, '°F'), quantity(5, 'Δ°F'))
  })

  it('there and back is where one was, for every pair', () => {
    fc.assert(
      fc.property(fc.constantFrom(...pairs), fc.double({ min: -1e6, max: 1e6, noNaN: true }), ([from, to], value) => {
        const back = convert(convert(quantity(value, from), to), from).value
        expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)))
      }),
    )
  })
})
