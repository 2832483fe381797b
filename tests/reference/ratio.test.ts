import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { mixedDensity, offRatioPercent, perHundredOfA, sharesOf, volumeOfWeight, weightOfVolume } from '../../shared/domain/ratio.ts'
import { quantity, valueIn } from '../../shared/domain/units.ts'

/** Conservation of mass, computed from exact constants; 5a to 5d are numbered as the trade's check sums. */
const byWeight = (parts: number[], densities: number[]) => perHundredOfA(weightOfVolume(parts, densities))

describe('ratio by volume and by weight', () => {
  it('5a: 2:1 by volume, 1.13 and 0.98 g/mL, is 100 : 43.36 by weight and 1.080 g/mL (9.013 lb/gal) mixed', () => {
    expect(byWeight([2, 1], [1.13, 0.98])[1]).toBeCloseTo(43.36, 2)
    expect(mixedDensity([2, 1], [1.13, 0.98])).toBeCloseTo(1.08, 3)
    expect(valueIn(quantity(mixedDensity([2, 1], [1.13, 0.98]), 'kg/L'), 'lb/gal')).toBeCloseTo(9.013, 3)
  })

  it('5b: 4:1 by volume, 1.45 and 1.00 g/mL, is 100 : 17.24 by weight, and back 4.000 : 1', () => {
    const weight = byWeight([4, 1], [1.45, 1])
    expect(weight[1]).toBeCloseTo(17.24, 2)
    const [a = 0, b = 1] = volumeOfWeight(weight, [1.45, 1])
    expect(a / b).toBeCloseTo(4, 9)
  })

  it('5c: 100:50 by weight, 1.15 and 1.02 g/mL, is 1.774 : 1 by volume', () => {
    const [a = 0, b = 1] = volumeOfWeight([100, 50], [1.15, 1.02])
    expect(a / b).toBeCloseTo(1.774, 3)
  })

  it('5d: 9.2 lb/gal is 1.1024 g/mL', () => expect(valueIn(quantity(9.2, 'lb/gal'), 'g/cm³')).toBeCloseTo(1.1024, 4))

  it('2:1 by volume weighed as 2:1, at 9.6 and 8.3 lb/gal, is 15.7 % too much hardener', () => {
    const [, wanted = 0] = byWeight([2, 1], [9.6, 8.3])
    expect(offRatioPercent(50, wanted)).toBeCloseTo(15.66, 2)
  })

  it('1.25 gal at 2:1 by volume, 9.6 and 8.3 lb/gal, is 8.00 lb (3,629 g) of A and 3.46 lb (1,569 g) of B on the scale', () => {
    const [a = 0, b = 0] = sharesOf([2, 1]).map((share, index) => 1.25 * share * ([9.6, 8.3][index] ?? 0))
    expect(a).toBeCloseTo(8, 9)
    expect(b).toBeCloseTo(3.458, 3)
    expect(valueIn(quantity(a, 'lb'), 'g')).toBeCloseTo(3629, 0)
    expect(valueIn(quantity(b, 'lb'), 'g')).toBeCloseTo(1569, 0)
  })

  it('goes the same way for three parts: 1 : 1 : 4 by volume, 1.1, 1.2 and 2.65', () => {
    expect(byWeight([1, 1, 4], [1.1, 1.2, 2.65]).map((part) => Number(part.toFixed(2)))).toEqual([100, 109.09, 963.64])
    expect(mixedDensity([1, 1, 4], [1.1, 1.2, 2.65])).toBeCloseTo((1.1 + 1.2 + 4 * 2.65) / 6, 12)
  })

  it('comes back through the densities, and never weighs nothing', () => {
    const part = fc.double({ min: 0.1, max: 1000, noNaN: true })
    const density = fc.double({ min: 0.5, max: 5, noNaN: true })
    fc.assert(
      fc.property(fc.tuple(part, part, part), fc.tuple(density, density, density), (parts, densities) => {
        const back = sharesOf(volumeOfWeight(weightOfVolume(parts, densities), densities))
        sharesOf(parts).forEach((share, index) => expect(back[index]).toBeCloseTo(share, 9))
        const mixed = mixedDensity(parts, densities)
        expect(mixed).toBeGreaterThanOrEqual(Math.min(...densities) - 1e-9)
        expect(mixed).toBeLessThanOrEqual(Math.max(...densities) + 1e-9)
      }),
    )
  })
})
