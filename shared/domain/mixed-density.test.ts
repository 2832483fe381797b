import { describe, expect, it } from 'vitest'
import type { Fact } from './fact.ts'
import { formatFigure } from './format.ts'
import type { MixFacts } from './mix.ts'
import { mixedDensityFigure } from './mixed-density.ts'
import type { Range } from './property.ts'
import { quantity } from './units.ts'
import { inDimension } from './volume-or-mass.ts'

let count = 0
const fact = (property: Fact['property'], value: Fact['value']): Fact => ({
  id: `d${++count}`,
  property,
  part: 'mixed',
  value,
  origin: { kind: 'entered', reason: 'label', by: 'test', at: '2026-01-01' },
})
const density = (value: number, unit: Range['unit'] = 'kg/L') => fact('density', { min: value, max: value, unit })
const letters = ['A', 'B', 'C'] as const
const mix = (facts: Fact[], ...parts: Fact[][]): MixFacts => ({
  id: 'm',
  name: 'Ostrel Body 20',
  maker: 'Ostrel',
  chemistry: 'epoxy',
  color: '#a8571a',
  status: 'active',
  facts,
  sheets: [],
  parts: parts.map((own, index) => ({
    part: letters[index] ?? 'A',
    product: {
      id: `p${index}`,
      name: `Ostrel ${letters[index] ?? 'A'}`,
      maker: 'Ostrel',
      kind: 'resin' as const,
      chemistry: 'epoxy' as const,
      status: 'active' as const,
      facts: own,
      sheets: [],
    },
  })),
})
const twoToOne = fact('mixRatio', { parts: [2, 1], basis: 'volume' })

describe('density of a mix', () => {
  it('is worked out from the ratio and the parts: (2 × 1.13 + 0.98) ÷ 3 = 1.080 kg/L, with its sources', () => {
    const figure = mixedDensityFigure(mix([twoToOne], [density(1.13)], [density(0.98)]))
    expect(figure.kind === 'computed' && figure.working.sum).toBe('(2 × 1.13 + 1 × 0.98) ÷ 3 = 1.08 kg/L')
    expect(figure.kind === 'computed' && figure.from.map(({ label }) => label)).toEqual(['density of Ostrel A', 'density of Ostrel B'])
  })

  it('is what its own sheet states, where it does', () => {
    expect(mixedDensityFigure(mix([twoToOne, density(1.1)], [density(1.13)], [density(0.98)]))).toMatchObject({
      kind: 'fact',
      value: { min: 1.1 },
    })
  })

  it('names the part whose density nobody states, and does not take a bound for a value', () => {
    expect(mixedDensityFigure(mix([twoToOne], [density(1.13)], []))).toMatchObject({
      kind: 'not-stated',
      missing: { property: 'density', part: 'B', of: 'Ostrel B' },
    })
    expect(mixedDensityFigure(mix([twoToOne], [fact('density', { min: 1.1, unit: 'kg/L' })], [density(0.98)]))).toMatchObject({
      kind: 'not-stated',
      missing: { part: 'A' },
    })
    expect(mixedDensityFigure(mix([], [density(1.13)], [density(0.98)]))).toMatchObject({
      kind: 'not-stated',
      missing: { property: 'mixRatio' },
    })
  })

  it('turns gallons into pounds for kits sold by weight, and is not made up where it is not known', () => {
    const stated = mix([density(9.2, 'lb/gal')], [])
    expect(inDimension(quantity(10, 'gal'), { unit: 'lb', mix: stated })?.value).toBeCloseTo(92, 9)
    expect(inDimension(quantity(92, 'lb'), { unit: 'gal', mix: stated })?.value).toBeCloseTo(10, 9)
    expect(inDimension(quantity(10, 'gal'), { unit: 'kg', mix: mix([], []) })).toBeUndefined()
    expect(formatFigure(mixedDensityFigure(mix([], [])))).toBe('not stated')
  })
})
