import { describe, expect, it } from 'vitest'
import { grooveVolume, jointVolume } from '../../shared/domain/joint.ts'
import { holesVolume, spallVolume } from '../../shared/domain/spall.ts'
import { type Quantity, quantity, valueIn } from '../../shared/domain/units.ts'

const inch = (value: number) => quantity(value, 'in')
const feet = (value: number) => quantity(value, 'ft')
const millimetre = (value: number) => quantity(value, 'mm')
const feetPerGallon = (volume: Quantity) => 1 / valueIn(volume, 'gal')

describe('joint filler, ft/gal = 231 ÷ (12 w d), from the definition of the gallon', () => {
  it.each([
    [1 / 8, 1, 154, 0.649],
    [1 / 4, 1, 77, 1.299],
    [1 / 4, 1.5, 51.33, 1.948],
    [1 / 4, 2, 38.5, 2.597],
    [3 / 8, 1, 51.33, 1.948],
    [3 / 8, 1.5, 34.22, 2.922],
    [3 / 8, 2, 25.67, 3.896],
    [1 / 2, 1, 38.5, 2.597],
    [1 / 2, 2, 19.25, 5.195],
    [3 / 4, 2, 12.83, 7.792],
  ])('%d × %d in: %d ft/gal, %d gal for 100 ft', (...[width, depth, perGallon, per100]) => {
    expect(feetPerGallon(jointVolume({ length: feet(1), width: inch(width), depth: inch(depth) }))).toBeCloseTo(perGallon, 1)
    expect(valueIn(jointVolume({ length: feet(100), width: inch(width), depth: inch(depth) }), 'gal')).toBeCloseTo(per100, 3)
  })

  it.each([
    [1, 1 / 4, 77],
    [2, 1 / 4, 39],
    [2, 1 / 2, 19],
    [4, 1 / 2, 9],
  ])('published fill chart, whole feet: %d deep × %d wide in, %d ft/gal', (depth, width, chart) => {
    const exact = feetPerGallon(jointVolume({ length: feet(1), width: inch(width), depth: inch(depth) }))
    expect(Math.abs(exact - chart)).toBeLessThan(1)
  })

  it('1,000 ft of 3/16 × 2 in take 19.5 gal', () => {
    expect(valueIn(jointVolume({ length: feet(1000), width: inch(3 / 16), depth: inch(2) }), 'gal')).toBeCloseTo(19.5, 1)
  })

  it('a 10.1 fl oz cartridge (18.2 in³) fills 24.4 ft of 1/4 × 1/4 in; a chart that prints 50 ft is wrong by two', () => {
    const perFoot = valueIn(jointVolume({ length: feet(1), width: inch(1 / 4), depth: inch(1 / 4) }), 'in³')
    expect(18.2 / perFoot).toBeCloseTo(24.3, 1)
    expect(18.3 / perFoot).toBeCloseTo(24.4, 1)
  })

  it('in SI: 6 × 50 mm is 0.300 L/m, 10 × 25 mm 4.0 m/L', () => {
    expect(valueIn(jointVolume({ length: quantity(1, 'm'), width: millimetre(6), depth: millimetre(50) }), 'L')).toBeCloseTo(0.3, 9)
    expect(1 / valueIn(jointVolume({ length: quantity(1, 'm'), width: millimetre(10), depth: millimetre(25) }), 'L')).toBeCloseTo(4, 9)
  })

  it('a V groove is half: 1/2 × 1/2 in 154 ft/gal, 1/4 × 1/4 in 616 ft/gal', () => {
    const groove = (size: number) => feetPerGallon(grooveVolume({ length: feet(1), width: inch(size), depth: inch(size) }))
    expect(groove(1 / 2)).toBeCloseTo(154, 6)
    expect(groove(1 / 4)).toBeCloseTo(616, 6)
  })
})

describe('spalls', () => {
  it('12 × 8 × 1/2 in is 48 in³, 0.2078 gal', () => {
    const hole = holesVolume({ count: 1, length: inch(12), width: inch(8), depth: inch(0.5), shape: 1 })
    expect(valueIn(hole, 'in³')).toBeCloseTo(48, 9)
    expect(valueIn(hole, 'gal')).toBeCloseTo(0.2078, 4)
  })

  it('120 ft² at a mean of 0.35 in is 26.2 gal', () => {
    expect(valueIn(spallVolume({ area: quantity(120, 'ft²'), meanDepth: inch(0.35) }), 'gal')).toBeCloseTo(26.2, 1)
  })

  it('1/8 in over 20 % of 1,000 ft² is the material of a 1/8 in floor for 200 ft² more (contractors’ rule)', () => {
    const fill = spallVolume({ area: quantity(200, 'ft²'), meanDepth: inch(1 / 8) })
    const floor = spallVolume({ area: quantity(1000, 'ft²'), meanDepth: inch(1 / 8) })
    expect(fill.value / floor.value).toBeCloseTo(0.2, 12)
  })
})
