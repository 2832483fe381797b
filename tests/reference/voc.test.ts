import { describe, expect, it } from 'vitest'
import { vocActual, vocLessWater } from '../../shared/domain/voc.ts'
import { convert, quantity } from '../../shared/domain/units.ts'

const litre = { voc: 0, volume: 1, water: 0, exempt: 0 }

describe('VOC content by 40 CFR 59.406(a)(1): (Ws − Ww − Wec) ÷ (Vm − Vw − Vec), formula from memory, values worked by hand', () => {
  it('a water-borne litre with 585 g of volatiles, 500 of them water: 85 g/L actual, 170 g/L less water', () => {
    const part = { ...litre, voc: 585 - 500, water: 0.5 }
    expect(vocActual([part])).toBeCloseTo(85, 10)
    expect(vocLessWater([part])).toBeCloseTo(170, 10)
    expect(convert(quantity(170, 'g/L'), 'lb/gal').value).toBeCloseTo(1.419, 3)
  })
  it('an exempt solvent of 200 g at 790 g/L in a litre with 440 g of volatiles: 240 actual, 321.36 regulatory', () => {
    const part = { ...litre, voc: 240, exempt: 200 / 790 }
    expect(vocActual([part])).toBeCloseTo(240, 10)
    expect(vocLessWater([part])).toBeCloseTo(321.36, 2)
  })
  it('5 % of thinner of 870 g/L in a coating of 100 g/L: 136.67 g/L', () => {
    expect(vocLessWater([{ ...litre, voc: 100 }, { ...litre, voc: 0.05 * 870, volume: 0.05 }])).toBeCloseTo(136.67, 2)
  })
  it('a two-pack of 3 L (60 g VOC, 0.9 L water) and 1 L (40 g): 32.26 g/L; averaging the parts’ own contents would give 31.43', () => {
    const a = { voc: 60, volume: 3, water: 0.9, exempt: 0 }
    const b = { voc: 40, volume: 1, water: 0, exempt: 0 }
    expect(vocLessWater([a, b])).toBeCloseTo(32.26, 2)
    expect(vocActual([a, b])).toBeCloseTo(25, 10)
    const averaged = (3 * vocLessWater([a]) + vocLessWater([b])) / 4
    expect(averaged).toBeCloseTo(31.43, 2)
  })
  it.each([[50, 0.417], [100, 0.835], [150, 1.252], [250, 2.086], [275, 2.295], [340, 2.837], [400, 3.338], [450, 3.755]])('%d g/L are %d lb/gal (table of 40 CFR 59 and rules of air districts)', (grams, pounds) => {
    expect(convert(quantity(grams, 'g/L'), 'lb/gal').value).toBeCloseTo(pounds, 3)
  })
})
