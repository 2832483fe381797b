import { describe, expect, it } from 'vitest'
import { convert, quantity } from '../../shared/domain/units.ts'
import { type VocPart, vocActual, vocLessWater, vocPartOf, vocThinned } from '../../shared/domain/voc.ts'
import { vocPlaces } from '../../shared/reference/voc-limits.ts'

const litre = quantity(1, 'L')
const grams = (value: number) => quantity(value, 'g')

describe('VOC content by 40 CFR 59.406(a)(1): (Ws − Ww − Wec) ÷ (Vm − Vw − Vec), formula from memory, values worked by hand', () => {
  it('a water-borne litre with 585 g of volatiles, 500 of them water: 85 g/L actual, 170.0 g/L less water, 1.419 lb/gal', () => {
    const part = vocPartOf({ volume: litre, volatiles: grams(585), water: grams(500), exempt: null })
    expect(vocActual([part])).toBeCloseTo(585 - 500, 10)
    expect(vocLessWater([part])).toBeCloseTo(85 / (1 - 0.5), 10)
    expect(convert(quantity(170, 'g/L'), 'lb/gal').value).toBeCloseTo(1.419, 3)
  })

  it('a litre with 440 g of volatiles, 200 of them exempt at 790 g/L: 240 g/L actual, 321.36 g/L regulatory, 2.682 lb/gal', () => {
    const exempt = { mass: grams(200), density: quantity(790, 'g/L') }
    const part = vocPartOf({ volume: litre, volatiles: grams(440), water: grams(0), exempt })
    expect(vocActual([part])).toBeCloseTo(440 - 200, 10)
    expect(vocLessWater([part])).toBeCloseTo(240 / (1 - 200 / 790), 10)
    expect(vocLessWater([part])).toBeCloseTo(321.36, 2)
    expect(convert(quantity(321.36, 'g/L'), 'lb/gal').value).toBeCloseTo(2.682, 3)
  })

  it('100 g/L with 5 % by volume of a thinner of 870 g/L: (100 + 43.5) ÷ 1.05 = 136.67 g/L, whatever unit it is stated in', () => {
    const thinned = { thinner: quantity(5, '%'), density: quantity(870, 'g/L') }
    expect(vocThinned(quantity(100, 'g/L'), thinned).value).toBeCloseTo(136.67, 2)
    const pounds = { thinner: quantity(5, '%'), density: convert(quantity(870, 'g/L'), 'lb/gal') }
    expect(vocThinned(convert(quantity(100, 'g/L'), 'lb/gal'), pounds).value).toBeCloseTo(136.67, 2)
    const parts: VocPart[] = [
      { voc: 100, volume: 1, water: 0, exempt: 0 },
      { voc: 0.05 * 870, volume: 0.05, water: 0, exempt: 0 },
    ]
    expect(vocLessWater(parts), 'the same from masses').toBeCloseTo(136.67, 2)
  })

  it('no thinner changes nothing', () => {
    expect(vocThinned(quantity(100, 'g/L'), { thinner: quantity(0, '%'), density: quantity(870, 'g/L') }).value).toBe(100)
  })

  it('a two-pack of 3 L (60 g VOC, 0.9 L water) and 1 L (40 g): 100 ÷ (4 − 0.9) = 32.26 g/L, 25.0 actual', () => {
    const a: VocPart = { voc: 60, volume: 3, water: 0.9, exempt: 0 }
    const b: VocPart = { voc: 40, volume: 1, water: 0, exempt: 0 }
    expect(vocLessWater([a, b])).toBeCloseTo(32.26, 2)
    expect(vocActual([a, b])).toBeCloseTo(25, 10)
    // the wrong way: averaging what the parts' own sheets state, 28.57 and 40 g/L, by volume
    const averaged = (3 * (vocLessWater([a]) ?? 0) + (vocLessWater([b]) ?? 0)) / 4
    expect(averaged).toBeCloseTo(31.43, 2)
    expect(averaged).not.toBeCloseTo(vocLessWater([a, b]) ?? 0, 1)
  })

  it('what is water through and through has no content less water', () => {
    expect(vocLessWater([{ voc: 0, volume: 1, water: 1, exempt: 0 }])).toBeUndefined()
    expect(vocActual([])).toBeUndefined()
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
  ])('%d g/L are %d lb/gal (1 lb/gal = 119.82643 g/L, exact definitions)', (metric, pounds) => {
    expect(convert(quantity(metric, 'g/L'), 'lb/gal').value).toBeCloseTo(pounds, 3)
    expect(convert(quantity(1, 'lb/gal'), 'g/L').value).toBeCloseTo(119.82643, 5)
  })
})

describe('rules loaded, by place (40 CFR 59 table 1, air districts, directive 2004/42/EC; from memory)', () => {
  const floor = (id: string) =>
    vocPlaces.find((place) => place.id === id)?.limits.find(({ category }) => category === 'floor coatings')?.limit

  it('floor coatings: 400 nationally, 250 and 100 by the two OTC rules, 100 and 50 in California, 140 and 500 in the European Union', () => {
    expect(
      ['us-national', 'us-otc-1', 'us-otc-2', 'us-ca-2007', 'us-ca-2019', 'us-ca-south-coast', 'ca', 'eu', 'eu-solvent-borne'].map(floor),
    ).toEqual([400, 250, 100, 100, 50, 50, 250, 140, 500])
  })

  it('each place has one name and one id, says where its rule is written and to verify it, and dates every limit', () => {
    expect(new Set(vocPlaces.map(({ id }) => id)).size).toBe(vocPlaces.length)
    expect(new Set(vocPlaces.map(({ name }) => name)).size).toBe(vocPlaces.length)
    for (const { source, limits } of vocPlaces) {
      expect(source).toMatch(/verify/)
      for (const { from, limit } of limits) {
        expect(from).toMatch(/^\d{4}-\d{2}-\d{2}$/)
        expect(limit).toBeGreaterThan(0)
      }
    }
  })

  it('the rounded pounds that 40 CFR 59 prints beside its grams are its grams: 400 (3.3), 350 (2.9), 450 (3.8), 600 (5.0), 700 (5.8)', () => {
    const printed: [number, number][] = [
      [400, 3.3],
      [350, 2.9],
      [450, 3.8],
      [600, 5],
      [700, 5.8],
    ]
    for (const [metric, pounds] of printed) expect(convert(quantity(metric, 'g/L'), 'lb/gal').value).toBeCloseTo(pounds, 1)
  })
})
