import { describe, expect, it } from 'vitest'
import type { Fact } from './fact.ts'
import type { MixFacts } from './mix.ts'
import { packsOfMix, packsOfProduct, partKitsOf } from './packs.ts'
import type { ProductFacts } from './product.ts'
import type { Range } from './property.ts'
import { quantity } from './units.ts'

let count = 0
const fact = (property: Fact['property'], value: Fact['value'], others: Partial<Fact> = {}): Fact => ({
  id: `p${++count}`,
  property,
  part: 'mixed',
  value,
  origin: { kind: 'entered', reason: 'price list', by: 'test', at: '2026-01-01' },
  ...others,
})
const exactly = (value: number, unit: Range['unit']): Range => ({ min: value, max: value, unit })
const product = (id: string, facts: Fact[]): ProductFacts => ({
  id,
  name: `Ostrel ${id}`,
  maker: 'Ostrel',
  kind: 'resin',
  chemistry: 'epoxy',
  status: 'active',
  facts,
  sheets: [],
})
const mix = (facts: Fact[], parts: ProductFacts[]): MixFacts => ({
  id: 'mix',
  name: 'Ostrel Body 20',
  maker: 'Ostrel',
  chemistry: 'epoxy',
  color: '#a8571a',
  status: 'active',
  facts,
  sheets: [],
  parts: parts.map((one, index) => ({ part: (['A', 'B', 'C'] as const)[index] ?? 'A', product: one })),
})
const twoToOne = fact('mixRatio', { parts: [2, 1], basis: 'volume' })

describe('kits of a mix', () => {
  it('are the mixed packs that its sheet states', () => {
    const packs = packsOfMix(
      mix([twoToOne, fact('packSize', exactly(3, 'gal')), fact('packSize', exactly(15, 'gal'))], [product('A', []), product('B', [])]),
    )
    expect(packs.map(({ size }) => size)).toEqual([quantity(3, 'gal'), quantity(15, 'gal')])
    expect(packs[0]?.items).toMatchObject([{ kind: 'mix', id: 'mix', count: 1 }])
  })

  it('are put together from packs of A and B in ratio, and from no others', () => {
    const packs = packsOfMix(
      mix(
        [twoToOne],
        [
          product('A', [fact('packSize', exactly(2, 'gal')), fact('packSize', exactly(5, 'gal'))]),
          product('B', [fact('packSize', exactly(1, 'gal')), fact('packSize', exactly(5, 'gal'))]),
        ],
      ),
    )
    expect(packs.map(({ size, items }) => [size.value, ...items.map((item) => `${item.count} × ${item.size.value}`)])).toEqual([
      [3, '1 × 2', '1 × 1'],
      [15, '2 × 5', '1 × 5'],
    ])
  })

  it('are packs by weight through the densities, where the ratio is by volume', () => {
    // 2:1 by volume at 1.15 and 0.98 kg/L is 100 : 42.6 by weight: 10 kg and 4.26 kg make a kit
    const a = product('A', [fact('density', exactly(1.15, 'kg/L')), fact('packSize', exactly(10, 'kg'))])
    const b = product('B', [fact('density', exactly(0.98, 'kg/L')), fact('packSize', exactly(4.26, 'kg'))])
    expect(packsOfMix(mix([twoToOne], [a, b])).map(({ size }) => size)).toEqual([quantity(14.26, 'kg')])
  })

  it('are none where the packs do not make up the ratio, or the ratio is not stated', () => {
    const parts = [product('A', [fact('packSize', exactly(3, 'gal'))]), product('B', [fact('packSize', exactly(0.8, 'gal'))])]
    expect(packsOfMix(mix([twoToOne], parts)), 'the nearest, 3 gal to 2 × 0.8, is 1.875 : 1').toEqual([])
    expect(packsOfMix(mix([], parts))).toEqual([])
  })

  it('are the pails of the one product, for a mix of one', () => {
    expect(packsOfMix(mix([], [product('A', [fact('packSize', exactly(5, 'gal'))])])).map(({ size }) => size)).toEqual([quantity(5, 'gal')])
  })
})

describe('prices', () => {
  it('belong to the pack they are entered for', () => {
    const sand = product('sand', [
      fact('packSize', exactly(50, 'lb')),
      fact('packSize', exactly(100, 'lb')),
      fact('packPrice', exactly(14, 'USD'), { at: { mass: quantity(50, 'lb') } }),
    ])
    expect(packsOfProduct(sand).map(({ items }) => items[0]?.price)).toEqual([14, null])
  })

  it('need no size where there is one pack only', () => {
    expect(
      packsOfProduct(product('sand', [fact('packSize', exactly(50, 'lb')), fact('packPrice', exactly(14, 'USD'))]))[0]?.items[0]?.price,
    ).toBe(14)
    const two = product('sand', [
      fact('packSize', exactly(50, 'lb')),
      fact('packSize', exactly(100, 'lb')),
      fact('packPrice', exactly(14, 'USD')),
    ])
    expect(
      packsOfProduct(two).map(({ items }) => items[0]?.price),
      'nobody says which',
    ).toEqual([null, null])
  })
})

describe('part kits', () => {
  it('are for the sheet to allow; silence is not leave', () => {
    const parts = [product('A', []), product('B', [])]
    expect(partKitsOf(mix([fact('splitKit', { is: true })], parts))).toBe('allowed')
    expect(partKitsOf(mix([fact('splitKit', { is: false })], parts))).toBe('forbidden')
    expect(partKitsOf(mix([], parts))).toBe('not stated')
  })

  it('are a matter of course for one product in one pail, unless its sheet forbids', () => {
    expect(partKitsOf(mix([], [product('A', [])]))).toBe('allowed')
    expect(partKitsOf(mix([fact('splitKit', { is: false })], [product('A', [])]))).toBe('forbidden')
  })
})
