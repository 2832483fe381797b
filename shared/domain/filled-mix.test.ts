import { describe, expect, it } from 'vitest'
import type { Fact } from './fact.ts'
import { filledYield } from './filled-mix.ts'
import type { ProductFacts } from './product.ts'
import { quantity } from './units.ts'

const density = (value: number, unit: 'kg/L' | 'lb/ft³'): Fact => ({
  id: 'd',
  property: 'density',
  part: 'mixed',
  value: { min: value, max: value, unit },
  origin: { kind: 'entered', reason: 'label', by: 'test', at: '2026-01-01' },
})
const sand = (facts: Fact[], chemistry: ProductFacts['chemistry'] = 'silica'): Record<string, ProductFacts> => ({
  sand: { id: 'sand', name: 'Teasel quartz', maker: 'Teasel', kind: 'aggregate', chemistry, status: 'active', facts, sheets: [] },
})
const course = { title: 'Slurry', filler: { productId: 'sand', loading: quantity(13.8, 'lb/gal') } }

describe('what a gallon of resin yields with its sand', () => {
  it('is 1.624 gal with 13.8 lb of quartz: 1 + 13.8 ÷ 22.115', () => {
    const filled = filledYield(course, sand([density(2.65, 'kg/L')]))
    expect('perLiquid' in filled && filled.perLiquid).toBeCloseTo(1.624, 3)
  })

  it('is the gallon itself without sand', () => {
    expect(filledYield({ title: 'Body', filler: null }, {})).toEqual({ perLiquid: 1, fact: undefined })
  })

  it('is not stated when the sand’s sheet states no density, or the product is gone', () => {
    expect(filledYield(course, sand([]))).toMatchObject({
      missing: { kind: 'not-stated', missing: { property: 'density', of: 'Teasel quartz' } },
    })
    expect(filledYield(course, {})).toMatchObject({ missing: { missing: { of: 'Slurry', subject: null } } })
  })

  it('does not take the density of a heap of silica for that of its grain; a light filler may be light', () => {
    expect(filledYield(course, sand([density(1.6, 'kg/L')]))).toMatchObject({
      missing: { missing: { because: '1.6 kg/L is the density of the heap, not of the grain' } },
    })
    expect(filledYield(course, sand([density(100, 'lb/ft³')]))).toHaveProperty('missing')
    expect(filledYield(course, sand([density(0.7, 'kg/L')], 'other mineral'))).toHaveProperty('perLiquid')
  })
})
