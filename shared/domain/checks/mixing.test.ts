import { describe, expect, it } from 'vitest'
import { exampleFloor, fact, findingOf, restate } from '../../../tests/setup/example-floor.ts'
import type { Ratio } from '../property.ts'

/** What the check says of ratios beside part densities of 9.6 and 8.3 lb/gal. */
function verdict(...ratios: Ratio[]) {
  const floor = exampleFloor()
  restate(floor, 'mixRatio', ...ratios.map((ratio) => fact('mixRatio', ratio)))
  return findingOf(floor, 'ratio-bases-agree', 'top')
}
const twoToOne: Ratio = { parts: [2, 1], basis: 'volume' }

describe('ratio by volume and by weight', () => {
  // 2 × 9.6 : 1 × 8.3 lb = 100 : 43.229 by weight
  it.each([
    [43.2, 'met'],
    [42.4, 'met'], // +1.96 %
    [42.3, 'caution'], // +2.20 %
    [41.2, 'caution'], // +4.92 %
    [41.1, 'stop'], // +5.18 %
    [50, 'stop'], // the ratio by volume weighed as if it were by weight: 13.5 % short
  ] as const)('2 : 1 by volume beside 100 : %d by weight: %s', (b, status) => {
    expect(verdict(twoToOne, { parts: [100, b], basis: 'weight' }).status).toBe(status)
  })

  it('says by how much, and of which part', () => {
    expect(verdict(twoToOne, { parts: [100, 50], basis: 'weight' }).says).toBe(
      'By volume through the densities 100 : 43.2 by weight; the sheet says 100 : 50: −13.5 % of part B.',
    )
  })

  it('one basis alone cannot agree with anything: unknown, with the other basis named', () => {
    expect(verdict(twoToOne)).toMatchObject({
      status: 'unknown',
      missing: [{ property: 'mixRatio', because: 'the ratio is not stated by weight' }],
    })
    expect(verdict({ parts: [100, 43], basis: 'weight' }).missing[0]?.because).toBe('the ratio is not stated by volume')
  })

  it('"4 parts A to 1 part B" has no basis and is no ratio to mix by', () => {
    expect(verdict({ parts: [4, 1] })).toMatchObject({ status: 'unknown', says: 'No ratio of Example epoxy is stated with its basis.' })
  })

  it('a ratio of three parts does not speak of a mix of two', () => {
    expect(verdict({ parts: [2, 1, 3], basis: 'volume' }, { parts: [100, 43, 200], basis: 'weight' }).status).toBe('unknown')
  })

  it('typical densities decide nothing', () => {
    const floor = exampleFloor()
    const origin = { kind: 'typical', source: 'common practice', dated: '2026' } as const
    for (const { product } of floor.mix.parts) product.facts = product.facts.map((one) => ({ ...one, origin }))
    expect(findingOf(floor, 'ratio-bases-agree', 'top').status).toBe('unknown')
  })

  it('a density with one end only is not known', () => {
    const floor = exampleFloor()
    const [a] = floor.mix.parts
    if (a) a.product.facts = [fact('density', { min: 9.6, unit: 'lb/gal' })]
    const finding = findingOf(floor, 'ratio-bases-agree', 'top')
    expect(finding.status).toBe('unknown')
    expect(finding.missing).toMatchObject([{ property: 'density', part: 'A', of: 'Part A' }])
  })

  it('three parts: each is held against its own weight', () => {
    // 1 L of 1.10, 0.5 L of 1.20, 2 L of 1.60 kg/L: 1.10 : 0.60 : 3.20 kg = 100 : 54.5 : 290.9
    const floor = exampleFloor()
    const product = floor.mix.parts[0]?.product
    if (!product) throw new Error('no part')
    const dense = (kilograms: number) => [fact('density', { min: kilograms, max: kilograms, unit: 'kg/L' })]
    floor.mix.parts = (['A', 'B', 'C'] as const).map((part, index) => ({
      part,
      product: { ...product, id: part, name: part, facts: dense([1.1, 1.2, 1.6][index] ?? 1) },
    }))
    const ratio = (c: number) => [
      fact('mixRatio', { parts: [1, 0.5, 2], basis: 'volume' }),
      fact('mixRatio', { parts: [100, 54.5, c], basis: 'weight' }),
    ]
    restate(floor, 'mixRatio', ...ratio(291))
    expect(findingOf(floor, 'ratio-bases-agree', 'top').status).toBe('met')
    restate(floor, 'mixRatio', ...ratio(320))
    expect(findingOf(floor, 'ratio-bases-agree', 'top')).toMatchObject({
      status: 'stop',
      says: expect.stringContaining('−9.1 % of part C') as string,
    })
  })
})
