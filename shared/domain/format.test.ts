import { describe, expect, it } from 'vitest'
import type { Fact } from './fact.ts'
import {
  counterpartOf,
  formatBoth,
  formatConditions,
  formatFigure,
  formatNumber,
  formatQuantity,
  formatRange,
  formatValue,
  formatWindow,
  formatWindowFigure,
  shownUnit,
} from './format.ts'
import { notStated } from './figure.ts'
import type { PropertyValue } from './property.ts'
import { dimensionOf, quantity, units } from './units.ts'

const value = (property: Fact['property'], given: PropertyValue, others: Partial<Fact> = {}) =>
  formatValue({ property, value: given, ...others })

describe('a range in words', () => {
  it('says a single figure once, a range with its ends, and a bound as a bound', () => {
    expect(formatRange({ min: 30, max: 30, unit: 'min' })).toBe('30 min')
    expect(formatRange({ min: 25, max: 30, unit: 'min' })).toBe('25–30 min')
    expect(formatRange({ min: 5, unit: 'Δ°F' })).toBe('≥ 5 °F')
    expect(formatRange({ max: 85, unit: '%' })).toBe('≤ 85 %')
    expect(formatRange({ min: 3, max: 5, unit: 'CSP' })).toBe('CSP 3–5')
  })

  it('does not let a minus look like a range', () => {
    expect(formatRange({ min: -26, max: 38, unit: '°C' })).toBe('−26 to 38 °C')
    expect(formatNumber(-0.01, 1), 'no minus nought').toBe('0')
  })

  it('keeps the decimals a sheet writes, and shows three digits of what is worked out', () => {
    expect(formatRange({ min: 7.692, max: 7.692, unit: 'mil' })).toBe('7.692 mil')
    expect(formatQuantity(quantity(1604.1667 / 150, 'mil'))).toBe('10.7 mil')
    expect(formatQuantity(quantity(1604.166666667, 'ft²'))).toBe('1,604 ft²')
    expect(formatQuantity(quantity(16.69345, '°C'))).toBe('16.7 °C')
  })

  it('writes money with its cents, and months as a word', () => {
    expect(formatRange({ min: 1240, max: 1240, unit: 'USD' })).toBe('$1,240')
    expect(formatRange({ min: 12.5, max: 12.5, unit: 'USD' })).toBe('$12.50')
    expect(formatRange({ min: 12, max: 12, unit: 'month' })).toBe('12 months')
    expect(formatRange({ min: 1, max: 1, unit: 'month' })).toBe('1 month')
  })
})

describe('the other system beside it', () => {
  it('puts the stated unit first', () => {
    expect(formatBoth({ min: 10.7, max: 10.7, unit: 'mil' })).toBe('10.7 mil (272 µm)')
    expect(formatBoth({ min: 10, max: 32, unit: '°C' })).toBe('10–32 °C (50–89.6 °F)')
    expect(formatBoth({ min: 8, max: 24, unit: 'h' }), 'hours are hours in both').toBe('8–24 h')
  })

  it('turns a margin into a margin and a temperature into a temperature', () => {
    expect(formatBoth({ min: 5, unit: 'Δ°F' })).toBe('≥ 5 °F (≥ 2.8 °C)')
    expect(formatBoth({ min: 5, unit: '°F' })).toBe('≥ 5 °F (≥ −15 °C)')
  })

  it('tells a VOC content in g/L and a density in kg/L', () => {
    expect(value('density', { min: 9.2, max: 9.2, unit: 'lb/gal' })).toBe('9.2 lb/gal')
    expect(formatValue({ property: 'density', value: { min: 9.2, max: 9.2, unit: 'lb/gal' } }, 'si')).toBe('1.1 kg/L')
    expect(formatValue({ property: 'voc', value: { max: 2.8, unit: 'lb/gal' } }, 'si')).toBe('≤ 336 g/L')
    expect(formatValue({ property: 'voc', value: { max: 50, unit: 'g/L' } }, 'us')).toBe('≤ 0.417 lb/gal')
  })

  it('has a counterpart of the same dimension, and back again, for every unit that has one', () => {
    for (const unit of units) {
      const other = counterpartOf(unit)
      if (!other) continue
      expect(dimensionOf(other), unit).toBe(dimensionOf(unit))
      expect(shownUnit(unit, 'us') === unit || shownUnit(unit, 'si') === unit, unit).toBe(true)
      expect(shownUnit(unit, 'us'), unit).not.toBe(shownUnit(unit, 'si'))
    }
  })
})

describe('a value of every form', () => {
  it('is told as the sheet tells it', () => {
    expect(value('mixRatio', { parts: [2, 1], basis: 'volume' })).toBe('2 : 1 by volume')
    expect(value('mixRatio', { parts: [100, 43.4] })).toBe('100 : 43.4 (basis not stated)')
    expect(value('hazardStatements', { codes: ['H315', 'H317'] })).toBe('H315, H317')
    expect(value('ingredient', { name: 'Benzyl alcohol', cas: '100-51-6', min: 10, max: 30, unit: '%' })).toBe(
      'Benzyl alcohol (100-51-6), 10–30 %',
    )
    expect(value('ingredient', { name: 'Pigment', unit: '%' })).toBe('Pigment, share not stated')
    expect(value('gloves', { text: 'butyl rubber' })).toBe('butyl rubber')
    expect(value('revisionDate', { date: '2024-03' })).toBe('2024-03')
    expect(value('splitKit', { is: false })).toBe('no')
    expect(value('filmThickness', { min: 8, max: 12, unit: 'mil' }, { film: 'dry' })).toBe('8–12 mil dry')
    expect(value('applicationTemperature', { min: 50, max: 90, unit: '°F' }, { of: 'slab' })).toBe('50–90 °F (slab)')
    expect(value('voc', { max: 50, unit: 'g/L' }, { thinned: true })).toBe('≤ 50 g/L thinned')
  })

  it('says of a window which end nobody has stated', () => {
    expect(value('recoatWindow', { min: 8, max: 24, unit: 'h' })).toBe('8–24 h')
    expect(value('recoatWindow', { min: 8, unit: 'h' })).toBe('from 8 h, latest not stated')
    expect(formatWindow({ max: 24, unit: 'h' })).toBe('within 24 h, earliest not stated')
  })

  it('names the conditions it holds at', () => {
    const at = { temperature: quantity(70, '°F'), volume: quantity(1, 'gal'), relativeHumidity: quantity(50, '%'), next: 'Corbel Seal 20' }
    expect(formatConditions(at)).toBe('at 70 °F, 1 gal, 50 % RH, before Corbel Seal 20')
    expect(formatConditions(at, 'si')).toBe('at 21.1 °C, 3.79 L, 50 % RH, before Corbel Seal 20')
    expect(formatConditions(undefined)).toBe('')
  })

  it('is "not stated" when no sheet says it, never nought', () => {
    const absent = notStated('potLife', { of: 'Ostrel Body 20', subject: null, ask: 'the maker, in writing' })
    expect(formatFigure(absent)).toBe('not stated')
    expect(formatWindowFigure(absent)).toBe('not stated')
  })
})
