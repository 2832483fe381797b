import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  dryFilmOfWet,
  dryFilmUsed,
  practicalSpread,
  spreadOfDryFilm,
  spreadOfWetFilm,
  volumeOfFilm,
  wetFilmOfDry,
  wetFilmOfSpread,
  withLoss,
} from '../../shared/domain/film.ts'
import { wholeUp } from '../../shared/domain/rounding.ts'
import { type Quantity, convert, quantity, valueIn } from '../../shared/domain/units.ts'

/**
 * Held against the definitions of gallon (231 in³), foot and mil, exact since 1959, and against values computed from them to 0.01 %.
 */
const near = (value: number, expected: number, relative = 1e-4) =>
  expect(Math.abs(value / expected - 1), `${value} against ${expected}`).toBeLessThan(relative)
const percent = (value: number) => quantity(value, '%')
const rate = (value: number) => quantity(value, 'ft²/gal')

describe('coverage identity', () => {
  it('a gallon over 1,604.17 ft² is one mil: 231 in³ × 1000 mil/in ÷ 144 in²/ft²', () => {
    expect((231 * 1000) / 144).toBeCloseTo(1604.1667, 4)
    near(spreadOfWetFilm(quantity(1, 'mil')).value, (231 * 1000) / 144, 1e-12)
    near(wetFilmOfSpread(rate((231 * 1000) / 144)).value, 1, 1e-12)
  })

  it('a litre over a square metre is a millimetre', () => {
    near(spreadOfWetFilm(quantity(1, 'mm')).value, 1, 1e-12)
    near(wetFilmOfSpread(quantity(1, 'm²/L')).value, 1000, 1e-12)
    expect(wetFilmOfSpread(quantity(1, 'm²/L')).unit).toBe('µm')
  })

  it('a litre over 39.3701 m² is one mil', () => near(valueIn(spreadOfWetFilm(quantity(25.4, 'µm')), 'm²/L'), 39.3701, 1e-6))

  it('ft²/gal to m²/L is × 0.024542387, back × 40.745833', () => {
    near(valueIn(rate(1), 'm²/L'), 0.024542387, 1e-7)
    near(valueIn(quantity(1, 'm²/L'), 'ft²/gal'), 40.745833, 1e-7)
  })
})

describe('two resin coats at 150 ft²/gal (common practice, no source)', () => {
  it('are 10.7 mil wet each: 1604.17 ÷ 150', () => expect(wetFilmOfSpread(rate(150)).value).toBeCloseTo(10.7, 1))

  it('take 33.3 gal a coat on 5,000 ft² before loss: 5000 ÷ 150', () => {
    const film = wetFilmOfSpread(rate(150))
    expect(valueIn(volumeOfFilm({ area: quantity(5000, 'ft²'), film }), 'gal')).toBeCloseTo(33.333, 3)
  })
})

describe('spread of 100 % solids resin (table computed from the definitions)', () => {
  const table = [
    [5, 127, 320.83, 7.874],
    [8, 203.2, 200.52, 4.921],
    [10, 254, 160.42, 3.937],
    [12, 304.8, 133.68, 3.281],
    [16, 406.4, 100.26, 2.461],
    [20, 508, 80.21, 1.9685],
    [40, 1016, 40.1, 0.9843],
    [62.5, 1587.5, 25.667, 0.6299],
    [125, 3175, 12.833, 0.315],
    [250, 6350, 6.417, 0.1575],
  ] as const
  it.each(table)('%d mil is %d µm, %d ft²/gal, %d m²/L', (...[mil, micron, us, si]) => {
    near(valueIn(quantity(mil, 'mil'), 'µm'), micron, 1e-9)
    near(spreadOfWetFilm(quantity(mil, 'mil')).value, us, 2e-4)
    near(spreadOfWetFilm(quantity(micron, 'µm')).value, si, 2e-4)
    near(wetFilmOfSpread(rate(us)).value, mil, 2e-4)
  })
})

describe('wet and dry film, theory and practice', () => {
  const solids = percent(65)
  it('1a: 65 % solids, 5 mil dry: 208.542 ft²/gal, 7.692 mil wet', () => {
    near(spreadOfDryFilm(quantity(5, 'mil'), { volumeSolids: solids }).value, 208.542)
    near(wetFilmOfDry(quantity(5, 'mil'), { volumeSolids: solids }).value, 7.692)
    near(dryFilmOfWet(quantity(7.6923, 'mil'), solids).value, 5)
  })

  it('1b: 20 % lost is not 20 % added: 59.940 gal against 57.542 gal on 10,000 ft², from 47.952 gal in theory', () => {
    const spread = spreadOfDryFilm(quantity(5, 'mil'), { volumeSolids: solids })
    const net = 10_000 / spread.value
    near(net, 47.952)
    near(withLoss(net, { percent: 20, convention: 'lost' }), 59.94)
    near(withLoss(net, { percent: 20, convention: 'added' }), 57.542)
    near(practicalSpread(spread, { percent: 20, convention: 'lost' }).value, 166.833)
    near(10_000 / practicalSpread(spread, { percent: 20, convention: 'added' }).value, 57.542)
  })

  it('1c: 65 % solids, 125 µm dry: 5.200 m²/L, 192.3 µm wet, 4.160 m²/L with 20 % lost, 240.38 L on 1,000 m²', () => {
    const spread = spreadOfDryFilm(quantity(125, 'µm'), { volumeSolids: solids })
    near(spread.value, 5.2)
    expect(spread.unit).toBe('m²/L')
    near(wetFilmOfDry(quantity(125, 'µm'), { volumeSolids: solids }).value, 192.3, 2e-4)
    near(practicalSpread(spread, { percent: 20, convention: 'lost' }).value, 4.16)
    near(1000 / practicalSpread(spread, { percent: 20, convention: 'lost' }).value, 240.38)
  })

  it('1d: 12 gal of 48 % solids on 1,500 ft² leave 6.160 mil (156.5 µm)', () => {
    const film = dryFilmUsed({ volume: quantity(12, 'gal'), area: quantity(1500, 'ft²'), volumeSolids: percent(48) })
    near(valueIn(film, 'mil'), 6.16)
    near(film.value, 156.5, 5e-4)
  })

  it('1e: 65 % solids, 5 mil dry, thinned 10 % by volume: 8.462 mil wet', () => {
    near(wetFilmOfDry(quantity(5, 'mil'), { volumeSolids: solids, thinning: 0.1 }).value, 8.462)
  })

  it('1f: 50 L of 100 % solids on 120 m² are 416.67 µm (16.40 mil)', () => {
    const film = dryFilmUsed({ volume: quantity(50, 'L'), area: quantity(120, 'm²'), volumeSolids: percent(100) })
    near(film.value, 416.67)
    near(valueIn(film, 'mil'), 16.4, 5e-4)
  })

  it('1g: 59.940 gal are 20 kits of 3 gal or 12 of 5 gal, and exactly 60.000 gal are 20, not 21', () => {
    expect(wholeUp(59.94 / 3)).toBe(20)
    expect(wholeUp(59.94 / 5)).toBe(12)
    expect(wholeUp(60 / 3)).toBe(20)
    expect(wholeUp(convert(quantity(convert(quantity(60, 'gal'), 'L').value, 'L'), 'gal').value / 3), 'through litres and back').toBe(20)
  })
})

describe('whatever the film', () => {
  const films = fc.oneof(
    fc.double({ min: 1, max: 500, noNaN: true }).map((value) => quantity(value, 'mil')),
    fc.double({ min: 25, max: 12_000, noNaN: true }).map((value) => quantity(value, 'µm')),
  )

  it('spread rate and film give each other', () => {
    fc.assert(
      fc.property(films, (film) => {
        near(valueIn(wetFilmOfSpread(spreadOfWetFilm(film)), film.unit), film.value, 1e-9)
      }),
    )
  })

  it('more area never needs less resin, and a thicker film never less', () => {
    const volume = (area: number, film: Quantity) => volumeOfFilm({ area: quantity(area, 'ft²'), film }).value
    const area = fc.double({ min: 1, max: 1e6, noNaN: true })
    fc.assert(
      fc.property(area, area, films, (one, more, film) => {
        const [small, large] = [Math.min(one, more), Math.max(one, more)]
        expect(volume(large, film)).toBeGreaterThanOrEqual(volume(small, film))
        expect(volume(large, { ...film, value: film.value * 1.5 })).toBeGreaterThanOrEqual(volume(large, film))
      }),
    )
  })

  it('a share lost always asks for at least as much as the same share added', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 60, noNaN: true }), (share) => {
        expect(withLoss(100, { percent: share, convention: 'lost' })).toBeGreaterThanOrEqual(
          withLoss(100, { percent: share, convention: 'added' }) - 1e-9,
        )
      }),
    )
  })
})
