import { describe, expect, it } from 'vitest'
import { ageInYears, dayYearsBefore, inOrder } from './sheet-age.ts'

describe('the age of a sheet', () => {
  it('is counted from its own date', () => {
    expect(ageInYears('2021-06-15', '2024-06-15')).toBe(3)
    // 30 days of 365.25.
    expect(ageInYears('2024-06-01', '2024-07-01')).toBeCloseTo(1 / 12, 3)
  })

  it('is never made less than it is: a month or a year alone counts from its beginning', () => {
    expect(ageInYears('2024-03', '2024-03-31')).toBeGreaterThan(ageInYears('2024-03-18', '2024-03-31'))
    expect(ageInYears('2021', '2024-12-31')).toBeGreaterThan(3.9)
  })

  it('has passed a limit of three years on the day after three years', () => {
    expect(dayYearsBefore('2024-06-15T08:00:00Z', 3)).toBe('2021-06-15')
    expect(dayYearsBefore('2024-01-31', 0.5)).toBe('2023-07-31')
  })
})

describe('revisions of a sheet', () => {
  const of = (revisionDate: string | null, uploadedAt: string) => ({ revisionDate, uploadedAt })
  it('stand in the order of their dates, not of upload', () => {
    expect(inOrder([of('2025-03-01', '2025-04-01T00:00:00Z'), of('2022-02', '2025-05-01T00:00:00Z')]).map((r) => r.revisionDate)).toEqual([
      '2022-02',
      '2025-03-01',
    ])
  })

  it('count from the day of upload while they have no date', () => {
    expect(inOrder([of(null, '2025-05-01T00:00:00Z'), of('2024-01-01', '2025-05-02T00:00:00Z')]).map((r) => r.revisionDate)).toEqual([
      '2024-01-01',
      null,
    ])
  })
})
