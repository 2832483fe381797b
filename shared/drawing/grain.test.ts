import { describe, expect, it } from 'vitest'
import { grainSizeIn } from './grain.ts'

describe('grainSizeIn', () => {
  // Source of the openings: ASTM E11 nominal, No. 20 = 850 µm, No. 40 = 425 µm, No. 70 = 212 µm (from memory).
  it('reads a sieve number, a pair of sieves and millimetres from the name of a sand', () => {
    expect(grainSizeIn('40-mesh silica')).toBe(425)
    expect(grainSizeIn('Quartz 20/40 mesh')).toBe((850 + 425) / 2)
    expect(grainSizeIn('#70 mesh')).toBe(212)
    expect(grainSizeIn('Basalt 0.3–0.8 mm')).toBeCloseTo(550, 6)
  })
  it('does not guess a size that the name does not state', () => {
    expect(grainSizeIn('Fine silica')).toBeNull()
    expect(grainSizeIn('Silica flour, bag of 50 lb')).toBeNull()
  })
})
