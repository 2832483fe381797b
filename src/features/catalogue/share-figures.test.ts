import { describe, expect, it } from 'vitest'
import type { Fact } from '../../../shared/domain/fact.ts'
import type { MixFacts } from '../../../shared/domain/mix.ts'
import type { ProductFacts } from '../../../shared/domain/product.ts'
import { shareFigures } from './share-figures.ts'

const origin = { kind: 'entered', reason: 'Label', by: 'Test lead', at: '2026-05-03T08:00:00.000Z' } as const
const fact = (part: Pick<Fact, 'property' | 'value'>): Fact => ({ id: part.property, part: 'mixed', origin, ...part })
const product = (name: string, density?: number): ProductFacts => ({
  id: name,
  name,
  maker: 'Ostrel',
  kind: 'resin',
  chemistry: 'epoxy',
  status: 'active',
  sheets: [],
  facts: density === undefined ? [] : [fact({ property: 'density', value: { min: density, max: density, unit: 'lb/gal' } })],
})
const mix = (facts: Fact[], densities: (number | undefined)[] = [9.4, 8.4]): MixFacts => ({
  id: 'm',
  name: 'Ostrel 110',
  maker: 'Ostrel',
  chemistry: 'epoxy',
  color: '#8f9a98',
  status: 'active',
  sheets: [],
  facts,
  parts: densities.map((density, index) => ({ part: (['A', 'B', 'C'] as const)[index]!, product: product(`p${index}`, density) })),
})
const sums = (figures: ReturnType<typeof shareFigures>) =>
  figures.map((figure) => (figure.kind === 'computed' ? figure.working.sum : figure.kind))

describe('the shares of a mix', () => {
  it('are each part over the sum of the ratio that is stated', () => {
    expect(sums(shareFigures(mix([fact({ property: 'mixRatio', value: { parts: [2, 1], basis: 'volume' } })]), 'volume'))).toEqual([
      '2 ÷ (2 + 1) = 66.7 %',
      '1 ÷ (2 + 1) = 33.3 %',
    ])
  })

  it('go through the densities to the other basis: 2 × 9.4 = 18.8 and 1 × 8.4 = 8.4 by weight (conservation of mass)', () => {
    const figures = shareFigures(mix([fact({ property: 'mixRatio', value: { parts: [2, 1], basis: 'volume' } })]), 'weight')
    // By the ratio's own numbers as if they were weights, 66.7 %, which a scale would get wrong
    expect(figures.map((figure) => (figure.kind === 'computed' ? figure.value.min : null))).toEqual([
      expect.closeTo((100 * 18.8) / 27.2, 6),
      expect.closeTo((100 * 8.4) / 27.2, 6),
    ])
    expect(figures[0]?.kind === 'computed' && figures[0].from.map(({ label }) => label)).toEqual([
      'Ratio by volume',
      'Density of part A, 9.4 lb/gal',
      'Density of part B, 8.4 lb/gal',
    ])
  })

  it('are not stated where a density or the ratio lacks, or the ratio has other parts', () => {
    const ratio = fact({ property: 'mixRatio', value: { parts: [2, 1], basis: 'volume' } })
    expect(sums(shareFigures(mix([ratio], [9.4, undefined]), 'weight'))).toEqual(['not-stated', 'not-stated'])
    expect(sums(shareFigures(mix([]), 'volume'))).toEqual(['not-stated', 'not-stated'])
    expect(sums(shareFigures(mix([ratio], [9.4, 8.4, 12]), 'volume'))).toEqual(['not-stated', 'not-stated', 'not-stated'])
    expect(sums(shareFigures(mix([fact({ property: 'mixRatio', value: { parts: [2, 1] } })]), 'volume'))).toEqual([
      'not-stated',
      'not-stated',
    ])
  })
})
