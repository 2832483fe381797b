import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { decimalsFor, roundHalfEven, wholeUp } from './rounding.ts'

describe('rounding of what is shown', () => {
  it('goes half to even', () => {
    expect([0.5, 1.5, 2.5, -0.5, -1.5].map((value) => roundHalfEven(value, 0))).toEqual([0, 2, 2, 0, -2])
    expect(roundHalfEven(2.675, 2), '2.67499… in the machine, a tie to people').toBe(2.68)
    expect(roundHalfEven(2.665, 2)).toBe(2.66)
    expect(roundHalfEven(1.005, 2)).toBe(1)
  })

  it('is never further off than half of the last decimal', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 4 }), (value, decimals) => {
        expect(Math.abs(roundHalfEven(value, decimals) - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-6))
      }),
    )
  })

  it('shows three digits of what is worked out', () => {
    expect([0.00123, 0.1234, 1.234, 12.34, 123.4, 1234].map((value) => decimalsFor(value))).toEqual([4, 3, 2, 1, 0, 0])
    expect(decimalsFor(0)).toBe(0)
  })
})

describe('rounding of what is ordered', () => {
  it('goes up, but exactly 60.000 gal is 20 kits of 3 gal and not 21', () => {
    expect(wholeUp(59.94 / 3)).toBe(20)
    expect(wholeUp(60 / 3)).toBe(20)
    expect(wholeUp((0.1 + 0.2) / 0.1), '3.0000000000000004 in the machine').toBe(3)
    expect(wholeUp(60.001 / 3)).toBe(21)
  })

  it('never orders less than is needed, nor a whole piece more', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e5, noNaN: true }), (need) => {
        expect(wholeUp(need)).toBeGreaterThanOrEqual(need - 1e-9)
        expect(wholeUp(need)).toBeLessThan(need + 1)
      }),
    )
  })
})
