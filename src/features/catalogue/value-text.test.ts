import { describe, expect, it } from 'vitest'
import { factBody } from '../../../shared/api/catalogue.ts'
import type { Fact } from '../../../shared/domain/fact.ts'
import { bodyOfDraft, codesFrom, draftOf, ratioFrom, valueFields } from './value-text.ts'

const origin = { kind: 'entered', reason: 'Maker’s letter', by: 'Test lead', at: '2026-05-03T08:00:00.000Z' } as const
const fact = (part: Partial<Fact> & Pick<Fact, 'property' | 'value'>): Fact => ({ id: '1', part: 'mixed', origin, ...part })
const back = (one: Fact) => factBody.parse(bodyOfDraft(draftOf(one.property, one))).statement

describe('the value form', () => {
  it.each([
    fact({ property: 'density', value: { min: 9.4, max: 9.4, unit: 'lb/gal' }, part: 'A' }),
    fact({ property: 'voc', value: { max: 10, unit: 'g/L' }, thinned: true }),
    fact({ property: 'dewPointMargin', value: { min: 5, unit: 'Δ°F' } }),
    fact({
      property: 'potLife',
      value: { min: 25, max: 30, unit: 'min' },
      at: { temperature: { value: 75, unit: '°F' }, mass: { value: 150, unit: 'g' }, relativeHumidity: { value: 50, unit: '%' } },
    }),
    fact({ property: 'recoatWindow', value: { min: 8, unit: 'h' }, at: { next: 'Corbel Seal' } }),
    fact({ property: 'filmThickness', value: { min: 8, max: 20, unit: 'mil' }, film: 'wet' }),
    fact({ property: 'applicationTemperature', value: { min: -5, max: 35, unit: '°C' }, of: 'slab' }),
    fact({ property: 'mixRatio', value: { parts: [4, 1, 6.5], basis: 'weight' } }),
    fact({ property: 'mixRatio', value: { parts: [2, 1] } }),
    fact({ property: 'precautionaryStatements', value: { codes: ['P280', 'P305+P351+P338'] } }),
    fact({ property: 'hazardStatements', value: { codes: ['H350i', 'H360Fd'] } }),
    fact({ property: 'ingredient', value: { name: 'Benzyl alcohol', cas: '100-51-6', min: 10, max: 30, unit: '%' } }),
    fact({ property: 'ingredient', value: { name: 'Trade secret', unit: '%' } }),
    fact({ property: 'gloves', value: { text: 'Butyl rubber' } }),
    fact({ property: 'revisionDate', value: { date: '2024-03' } }),
    fact({ property: 'splitKit', value: { is: false } }),
  ])('shows a value of $property and gives the same value back', (one) => {
    const { id: _, origin: __, ...statement } = one
    expect(back(one)).toEqual(statement)
  })

  it('reads ratios as people write them', () => {
    expect(ratioFrom('2:1')).toEqual([2, 1])
    expect(ratioFrom('100 to 43.4')).toEqual([100, 43.4])
    expect(ratioFrom('4 : 1 : 6,5')).toEqual([4, 1, 6.5])
    expect(ratioFrom('')).toEqual([])
    expect(ratioFrom('two : 1')).toEqual([Number.NaN, 1])
  })

  it('reads codes as people type them', () => {
    expect(codesFrom('h315, H317;euh205  p305 + p351 + P338\nH360Fd')).toEqual(['H315', 'H317', 'EUH205', 'P305+P351+P338', 'H360Fd'])
  })

  it('tells each problem at an input that is there', () => {
    expect(
      valueFields({
        'statement.value.min': 'a',
        'statement.value': 'b',
        'statement.value.unit': 'c',
        'statement.value.codes.2': 'd',
        'statement.at.mass.value': 'e',
        'how.box': 'f',
      }),
    ).toEqual({ 'statement.value': 'a', 'statement.value.unit': 'c', 'statement.at.mass.value': 'e', 'how.page': 'f' })
  })

  it('sends what is no number as none, so that the field is named', () => {
    const draft = { ...draftOf('density'), min: 'nine', reason: 'x' }
    expect(factBody.safeParse(bodyOfDraft(draft)).error?.issues.map(({ path }) => path.join('.'))).toContain('statement.value.min')
    const empty = { ...draftOf('density'), reason: 'x' }
    expect(factBody.safeParse(bodyOfDraft(empty)).error?.issues[0]?.message).toBe('Write a figure.')
  })
})
