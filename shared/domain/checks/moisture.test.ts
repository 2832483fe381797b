import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact, findingOf, findingsOf, restate } from '../../../tests/setup/example-floor.ts'
import type { Fact } from '../fact.ts'

const humidity = (max: number, rest: Partial<Fact> = {}) => fact('substrateRelativeHumidity', { max, unit: '%' }, rest)
const from = (value: number) => ({ at: { film: { value, unit: 'mil' as const } } })

/** The prime coat at a wet film in mil on a slab of some humidity, against what its sheet allows. */
function onSlab({ percent, mil }: { percent: number; mil: number }, ...limits: Fact[]): Example {
  const floor = exampleFloor()
  restate(floor, 'substrateRelativeHumidity', ...limits)
  Object.assign(courseOf(floor, 'prime'), { spreadRate: null, thickness: { value: mil, unit: 'mil', film: 'wet' } })
  floor.input.conditions.substrateRelativeHumidity = percent
  return floor
}
const status = (floor: Example) => findingOf(floor, 'moisture-limit', 'prime').status

describe('moisture in the slab', () => {
  it.each([
    [80, 'met'],
    [80.1, 'stop'],
  ] as const)('%d %% where 80 %% is allowed: %s', (percent, expected) => {
    expect(status(onSlab({ percent, mil: 10 }, humidity(80)))).toBe(expected)
  })

  it('"up to 99 % when applied at 16 mils min." holds from 16 mil on', () => {
    const limits = [humidity(85), humidity(99, from(16))]
    expect(status(onSlab({ percent: 93, mil: 16 }, ...limits))).toBe('met')
    expect(status(onSlab({ percent: 93, mil: 15.9 }, ...limits))).toBe('stop')
    expect(status(onSlab({ percent: 80, mil: 10 }, ...limits))).toBe('met')
    expect(findingOf(onSlab({ percent: 93, mil: 18 }, ...limits), 'moisture-limit', 'prime').says).toMatch(/≤ 99 % from a film of 16 mil/)
  })

  it('with no limit for a thin film it is unknown, not the thick one’s', () => {
    const finding = findingOf(onSlab({ percent: 70, mil: 10 }, humidity(99, from(16))), 'moisture-limit', 'prime')
    expect(finding).toMatchObject({ status: 'unknown', missing: [{ because: 'a limit is stated only from a film of 16 mil' }] })
  })

  it('of two limits that hold alike the lowest counts', () => {
    expect(status(onSlab({ percent: 78, mil: 10 }, humidity(80), humidity(75)))).toBe('stop')
  })

  it('a film of half solids must be thick enough wet and dry, since the sheet does not say which', () => {
    const floor = onSlab({ percent: 93, mil: 20 }, humidity(85), humidity(99, from(16)))
    restate(floor, 'volumeSolids', fact('volumeSolids', { min: 50, max: 50, unit: '%' }))
    expect(status(floor)).toBe('stop')
  })

  it('the emission rate is compared in the sheet’s unit: 15 g/m²·24 h is above 3 lb/1000 ft²·24 h, which is 14.65', () => {
    const floor = onSlab({ percent: 70, mil: 10 }, humidity(80))
    restate(floor, 'moistureEmission', fact('moistureEmission', { max: 3, unit: 'lb/1000 ft²·24 h' }))
    floor.input.conditions.moistureEmission = { value: 15, unit: 'g/m²·24 h' }
    expect(findingsOf(floor, 'moisture-limit').map((finding) => finding.status)).toEqual(['stop', 'met'])
    floor.input.conditions.moistureEmission = { value: 14.6, unit: 'g/m²·24 h' }
    expect(findingsOf(floor, 'moisture-limit').map((finding) => finding.status)).toEqual(['met', 'met'])
  })

  it('a limit of the sheet that was not measured is unknown beside the one that was', () => {
    const floor = onSlab({ percent: 70, mil: 10 }, humidity(80))
    restate(floor, 'moistureEmission', fact('moistureEmission', { max: 3, unit: 'lb/1000 ft²·24 h' }))
    expect(findingsOf(floor, 'moisture-limit').map((finding) => finding.status)).toEqual(['unknown', 'met'])
  })

  it('the first course counts even when its mix is not chosen: the limit of the second is not taken for it', () => {
    const floor = onSlab({ percent: 70, mil: 10 }, humidity(80))
    courseOf(floor, 'prime').mixId = null
    expect(findingsOf(floor, 'moisture-limit').map(({ courseId, status: one }) => [courseId, one])).toEqual([['prime', 'unknown']])
  })
})
