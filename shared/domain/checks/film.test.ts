import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact, findingOf, restate } from '../../../tests/setup/example-floor.ts'
import type { Fact } from '../fact.ts'

const film = (range: { min?: number; max?: number }, rest: Partial<Fact> = { film: 'wet' }) =>
  fact('filmThickness', { ...range, unit: 'mil' }, rest)

/** The top coat at a wet film in mil, against what the sheet says of films. */
function topAt(value: number, ...facts: Fact[]): Example {
  const floor = exampleFloor()
  restate(floor, 'filmThickness', ...facts)
  Object.assign(courseOf(floor, 'top'), { spreadRate: null, thickness: { value, unit: 'mil', film: 'wet' } })
  return floor
}
const verdict = (floor: Example) => findingOf(floor, 'film-in-range', 'top')

describe('film within the sheet’s range', () => {
  it.each([
    [7.999, 'stop'],
    [8, 'met'],
    [12, 'met'],
    [12.001, 'stop'],
  ] as const)('%d mil against 8–12 mil: %s; ends belong to the range', (mil, status) => {
    expect(verdict(topAt(mil, film({ min: 8, max: 12 }))).status).toBe(status)
  })

  it('is compared in the unit of the sheet: 200 µm is met by 200 µm, not by 7.87 mil rounded', () => {
    const floor = topAt(8, fact('filmThickness', { min: 150, max: 200, unit: 'µm' }, { film: 'wet' }))
    courseOf(floor, 'top').thickness = { value: 200, unit: 'µm', film: 'wet' }
    expect(verdict(floor).status).toBe('met')
    courseOf(floor, 'top').thickness = { value: 7.88, unit: 'mil', film: 'wet' } // 200.15 µm
    expect(verdict(floor).status).toBe('stop')
  })

  it('least and greatest stated apart are one range', () => {
    expect(verdict(topAt(10, film({ min: 8 }), film({ max: 12 }))).status).toBe('met')
    expect(verdict(topAt(14, film({ min: 8 }), film({ max: 12 }))).status).toBe('stop')
  })

  it('a least alone, kept, leaves the greatest unknown; missed, it is a stop', () => {
    const kept = verdict(topAt(10, film({ min: 8 })))
    expect(kept).toMatchObject({
      status: 'unknown',
      missing: [{ property: 'filmThickness', because: 'the sheet states no greatest film', ask: 'the maker, in writing' }],
    })
    expect(verdict(topAt(6, film({ min: 8 }))).status).toBe('stop')
  })

  it('a wet and a dry range are both held: 14 mil wet of 50 % solids is 7 mil dry', () => {
    const floor = topAt(14, film({ min: 12, max: 16 }), film({ min: 6, max: 8 }, { film: 'dry' }))
    restate(floor, 'volumeSolids', fact('volumeSolids', { min: 50, max: 50, unit: '%' }))
    expect(verdict(floor).status).toBe('met')
    restate(floor, 'volumeSolids', fact('volumeSolids', { min: 40, max: 40, unit: '%' })) // 5.6 mil dry
    expect(verdict(floor).status).toBe('stop')
  })

  it('solids of 96–100 % make a dry range; all of it must lie within', () => {
    const floor = topAt(10, film({ min: 9.6, max: 10 }, { film: 'dry' }))
    restate(floor, 'volumeSolids', fact('volumeSolids', { min: 96, max: 100, unit: '%' }))
    expect(verdict(floor).status).toBe('met')
    restate(floor, 'volumeSolids', fact('volumeSolids', { min: 95, max: 100, unit: '%' }))
    expect(verdict(floor).status).toBe('stop')
  })

  it('one of several ranges, for another use, is a caution to look at the page', () => {
    const finding = verdict(topAt(10, film({ min: 8, max: 12 }), film({ min: 4, max: 6 })))
    expect(finding.status).toBe('caution')
    expect(finding.todo).toMatch(/page/)
  })

  it('a typical range does not stand beside the sheet’s own, and alone decides nothing', () => {
    const typical = { film: 'wet' as const, origin: { kind: 'typical' as const, source: 'common practice', dated: '2026' } }
    expect(verdict(topAt(10, film({ min: 8, max: 12 }), film({ min: 3, max: 5 }, typical))).status).toBe('met')
    expect(verdict(topAt(10, film({ min: 8, max: 12 }, typical))).status).toBe('unknown')
  })

  it('a dry range without solids is unknown for want of the solids', () => {
    const floor = topAt(10, film({ min: 8, max: 12 }, { film: 'dry' }))
    restate(floor, 'volumeSolids')
    expect(verdict(floor)).toMatchObject({ status: 'unknown', missing: [{ property: 'volumeSolids', of: 'Example epoxy' }] })
  })

  it('a range in hours is no film: it is not stated', () => {
    expect(verdict(topAt(10, fact('filmThickness', { min: 1, max: 20, unit: 'h' }))).status).toBe('unknown')
  })
})
