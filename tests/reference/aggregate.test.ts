import { describe, expect, it } from 'vitest'
import { absoluteVolume, mortarVolume, packedOnArea, voidsOf, yieldPerLiquid } from '../../shared/domain/aggregate.ts'
import { wetFilmOfSpread } from '../../shared/domain/film.ts'
import { quantity, valueIn } from '../../shared/domain/units.ts'

/** Quartz as the tables take it: SG 2.65, 22.115 lb/gal solid, 100 lb/ft³ packed. In the product both are stated by the sand's sheet or not known. */
const quartz = quantity(2.65, 'g/cm³')
const packed = quantity(100, 'lb/ft³')

describe('sand', () => {
  it('of SG 2.65 is 22.115 lb/gal and 165.4 lb/ft³ as grain', () => {
    expect(valueIn(quartz, 'lb/gal')).toBeCloseTo(22.115, 3)
    expect(valueIn(quartz, 'lb/ft³')).toBeCloseTo(165.4, 1)
  })

  it.each([
    [100, 'lb/ft³', 39.5],
    [1600, 'g/L', 39.5],
    [110, 'lb/ft³', 33.5],
  ] as const)('packed to %d %s has %d %% voids (ASTM C29)', (value, unit, voids) => {
    expect(100 * voidsOf({ specificGravity: 2.65, bulkDensity: quantity(value, unit) })).toBeCloseTo(voids, 0)
  })

  it.each([
    [0.5, 4.6, 1.208, 15.5],
    [1, 9.2, 1.416, 18.17],
    [1.5, 13.8, 1.624, 20.84],
    [2, 18.4, 1.832, 23.51],
    [3, 27.6, 2.248, 28.85],
  ])(
    'in the pail at %d : 1 by weight, %d lb per gallon of 9.2 lb/gal resin, yields %d gal and %d ft² at 1/8 in',
    (...[, pounds, yielded, area]) => {
      const perLiquid = yieldPerLiquid(quantity(pounds, 'lb/gal'), quartz)
      expect(perLiquid).toBeCloseTo(yielded, 3)
      expect((perLiquid * 1604.1667) / 125).toBeCloseTo(area, 1)
    },
  )

  it.each([
    [27.6, false, 2.248],
    [36.8, true, 2.753],
    [55.2, true, 4.129],
  ])('%d lb in a gallon of resin: the packed sand governs: %s, %d gal', (pounds, sandGoverns, gallons) => {
    const mortar = mortarVolume({ resin: quantity(1, 'gal'), sand: quantity(pounds, 'lb'), grainDensity: quartz, bulkDensity: packed })
    expect(mortar.sandGoverns).toBe(sandGoverns)
    expect(valueIn(mortar.volume, 'gal')).toBeCloseTo(gallons, 2)
  })

  it('3 gal with 37 lb make 4.67 gal: 63 ft² at 0.119 in', () => {
    const volume = 3 + valueIn(absoluteVolume(quantity(37, 'lb'), quartz), 'gal')
    expect(volume).toBeCloseTo(4.67, 2)
    expect(valueIn(wetFilmOfSpread(quantity(63 / volume, 'ft²/gal')), 'in')).toBeCloseTo(0.119, 3)
  })

  it.each([
    [1 / 16, 0.521],
    [1 / 8, 1.04],
    [3 / 16, 1.56],
    [1 / 4, 2.08],
  ])('packed %d in high is %d lb/ft²', (height, mass) => {
    expect(valueIn(packedOnArea(quantity(height, 'in'), packed), 'lb/ft²')).toBeCloseTo(mass, 2)
  })
})
