import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drawnHeight, fitScale, scaleFor } from './scale.ts'

const mil = 25.4
const room = { height: 260, least: 17, most: 118 }

describe('fitScale', () => {
  it('draws 125 mil of slurry and two coats of 10.7 mil with the films at a stated multiple of the slurry’s scale', () => {
    const scale = fitScale([125 * mil, 10.7 * mil, 10.7 * mil], room)
    // 118 px / 125 mil = 0.944 px a mil; 10.7 mil × 0.944 = 10.1 px is under 17 px, twice that is 20.2 px
    expect(scale.filmFactor).toBe(2)
    expect(drawnHeight(125 * mil, scale)).toBeCloseTo(118, 6)
    expect(drawnHeight(10.7 * mil, scale)).toBeCloseTo((10.7 / 125) * 118 * 2, 6)
  })

  it('shows 3 mil beside 1 in', () => {
    const scale = fitScale([3 * mil, 1000 * mil], room)
    expect(drawnHeight(3 * mil, scale)).toBeGreaterThanOrEqual(17)
    expect(drawnHeight(1000 * mil, scale)).toBeLessThanOrEqual(118)
    expect(drawnHeight(3 * mil, scale) / scale.filmFactor / (3 * mil)).toBeCloseTo(drawnHeight(1000 * mil, scale) / (1000 * mil), 12)
  })

  it('keeps one scale where all can be seen at it', () => {
    expect(fitScale([20 * mil, 25 * mil, 40 * mil], room)).toMatchObject({ filmFactor: 1, filmLimit: 0 })
  })

  it('is true within a band, fits the room and never draws a thinner course taller than a thicker one', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 40, max: 60_000, noNaN: true }), { minLength: 1, maxLength: 14 }), (thicknesses) => {
        const scale = fitScale(thicknesses, room)
        const heights = thicknesses.map((one) => drawnHeight(one, scale))
        expect(heights.reduce((sum, one) => sum + one, 0)).toBeLessThanOrEqual(room.height + 1e-6)
        thicknesses.forEach((one, index) => {
          expect((heights[index] ?? 0) / scaleFor(one, scale)).toBeCloseTo(one, 6)
          thicknesses.forEach((other, place) => {
            if (one > other) expect(heights[index] ?? 0).toBeGreaterThanOrEqual((heights[place] ?? 0) - 1e-9)
          })
        })
      }),
    )
  })
})
