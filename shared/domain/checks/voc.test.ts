import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact, findingOf, restate } from '../../../tests/setup/example-floor.ts'
import type { Fact } from '../fact.ts'

function laidIn(place: string, ...contents: Fact[]): Example {
  const floor = exampleFloor()
  floor.input.conditions.vocPlace = place
  restate(floor, 'voc', ...contents)
  return floor
}
const metric = (max: number, rest: Partial<Fact> = {}) => fact('voc', { max, unit: 'g/L' }, rest)
const pounds = (max: number) => fact('voc', { max, unit: 'lb/gal' })
const top = (floor: Example) => findingOf(floor, 'voc-limit', 'top')

describe('VOC where the floor is laid (limits from memory, each finding says to verify)', () => {
  it.each([
    [50, 'met'],
    [50.1, 'stop'],
  ] as const)('%d g/L where 50 are allowed: %s', (grams, status) => {
    expect(top(laidIn('us-ca-2019', metric(grams))).status).toBe(status)
  })

  it('the metric figure decides: 0.42 lb/gal is 50.3 g/L but may be 49.7 before rounding, so ask; 0.43 is over', () => {
    expect(top(laidIn('us-ca-2019', pounds(0.42)))).toMatchObject({
      status: 'caution',
      todo: expect.stringContaining('grams per liter') as string,
    })
    expect(top(laidIn('us-ca-2019', pounds(0.43))).status).toBe('stop')
    expect(top(laidIn('us-ca-2019', pounds(0.41))).status).toBe('met')
  })

  it('of several statements the greatest counts, and of mixed and thinned the greater', () => {
    expect(top(laidIn('us-otc-2', metric(80), metric(110))).status).toBe('stop')
    expect(top(laidIn('us-otc-2', metric(80), metric(120, { thinned: true })))).toMatchObject({
      status: 'stop',
      says: expect.stringContaining('120 g/L thinned') as string,
    })
  })

  it('a content stated thinned only does not tell the one as mixed', () => {
    expect(top(laidIn('us-national', metric(80, { thinned: true }))).status).toBe('unknown')
  })

  it('"more than 10 g/L" does not say how much', () => {
    expect(top(laidIn('us-national', fact('voc', { min: 10, unit: 'g/L' }))).status).toBe('unknown')
  })

  it('the strictest category holds: a prime is a primer too, 350 nationally, where a top may have 400 (40 CFR 59.402(b))', () => {
    const floor = laidIn('us-national', metric(380))
    expect(findingOf(floor, 'voc-limit', 'prime').status).toBe('stop')
    expect(top(floor).status).toBe('met')
  })

  it('before a rule was in force there is none loaded', () => {
    const floor = laidIn('us-ca-2019', metric(10))
    floor.input.onDate = '2021-12-31'
    expect(top(floor).status).toBe('unknown')
    floor.input.onDate = '2022-01-01'
    expect(top(floor).status).toBe('met')
  })

  it('no place, an unknown place, no day: unknown for the floor, with whom to ask', () => {
    const floor = laidIn('nowhere', metric(10))
    expect(findingOf(floor, 'voc-limit', null)).toMatchObject({ status: 'unknown', missing: [{ ask: 'the authority of the place' }] })
    floor.input.conditions.vocPlace = null
    expect(findingOf(floor, 'voc-limit', null)).toMatchObject({ status: 'unknown', missing: [{ ask: 'whoever builds this up' }] })
    floor.input.conditions.vocPlace = 'eu'
    floor.input.onDate = 'soon'
    expect(findingOf(floor, 'voc-limit', null)).toMatchObject({ status: 'unknown', missing: [{ ask: 'whoever plans the work' }] })
  })

  it('a course without a mix is unknown', () => {
    const floor = laidIn('us-national', metric(10))
    courseOf(floor, 'top').mixId = null
    expect(top(floor).status).toBe('unknown')
  })
})
