import { describe, expect, it } from 'vitest'
import { moistureEmissionRate, moistureTestsNeeded, probeDepth } from '../../shared/domain/moisture.ts'
import { quantity, valueIn } from '../../shared/domain/units.ts'

const square = (value: number) => quantity(value, 'ft²')

describe('moisture emission rate, ASTM F1869: 52.911 × g ÷ (ft² × h)', () => {
  it.each([
    [3.1, 66, 5.45],
    [2, 64.5, 3.598],
  ])('%d g under a dome of 0.456 ft² in %d h is %d lb/1000 ft²·24 h', (gain, hours, rate) => {
    const measured = moistureEmissionRate(
      { gain: quantity(gain, 'g'), area: square(0.456), time: quantity(hours, 'h') },
      'lb/1000 ft²·24 h',
    )
    expect(measured.value).toBeCloseTo(rate, 3)
    expect(measured.value).toBeCloseTo((52.911 * gain) / (0.456 * hours), 4)
  })

  it.each([
    [3, 14.65],
    [5, 24.41],
    [10, 48.82],
    [15, 73.24],
    [25, 122.06],
  ])('%d lb/1000 ft²·24 h is %d g/m²·24 h', (pounds, grams) => {
    expect(valueIn(quantity(pounds, 'lb/1000 ft²·24 h'), 'g/m²·24 h')).toBeCloseTo(grams, 2)
  })
})

describe('probes for humidity in the slab, ASTM F2170', () => {
  it('stand at 40 % of a slab that dries from one side, at 20 % of one that dries from both', () => {
    expect(probeDepth(quantity(6, 'in'), 'one side').value).toBeCloseTo(2.4, 9)
    expect(probeDepth(quantity(6, 'in'), 'one side').unit).toBe('in')
    expect(probeDepth(quantity(8, 'in'), 'both sides').value).toBeCloseTo(1.6, 9)
    expect(probeDepth(quantity(150, 'mm'), 'one side').value).toBeCloseTo(60, 9)
    expect(probeDepth(quantity(150, 'mm'), 'both sides').value).toBeCloseTo(30, 9)
  })

  it.each([
    [12_500, 15],
    [1000, 3],
    [2400, 5],
    [1001, 4],
    [200, 3],
  ])('%d ft² want %d tests: three and one for each further 1,000 ft² begun', (area, tests) => {
    expect(moistureTestsNeeded(square(area))).toBe(tests)
  })
})
