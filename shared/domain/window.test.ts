import { describe, expect, it } from 'vitest'
import type { Fact } from './fact.ts'
import { after, clockTime, clockWindow, wallTime, windowAt, windowFacts } from './window.ts'
import { quantity } from './units.ts'

let count = 0
const window = (min: number | undefined, max: number | undefined, { next, at = 70 }: { next?: string; at?: number } = {}): Fact => ({
  id: `w${++count}`,
  property: 'recoatWindow',
  part: 'mixed',
  value: { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }), unit: 'h' },
  at: { temperature: quantity(at, '°F'), ...(next ? { next } : {}) },
  origin: { kind: 'entered', reason: 'maker’s letter', by: 'P. Ware', at: '2026-01-10' },
})
const prime = (facts: Fact[]) => ({ id: 'prime', name: 'Ostrel Prime 10', facts })
const top = { id: 'top', name: 'Corbel Seal 20', chemistry: 'polyurethane' as const }
const at = quantity(70, '°F')

describe('which window holds under the next coat', () => {
  it('is the one stated for that coat by name, before the one for any', () => {
    const mix = prime([window(8, 24), window(6, 12, { next: 'Corbel Seal 20' })])
    expect(windowAt(mix, { temperature: at, next: top })).toMatchObject({
      value: { min: 6, max: 12 },
      condition: 'at 70 °F, before Corbel Seal 20',
    })
    expect(windowAt(mix, { temperature: at, next: undefined })).toMatchObject({ value: { min: 8, max: 24 } })
  })

  it('is the one for the next coat’s chemistry, where the sheet speaks of that', () => {
    const mix = prime([window(8, 24), window(6, 16, { next: 'any polyurethane top coat' })])
    expect(windowAt(mix, { temperature: at, next: top })).toMatchObject({ value: { max: 16 } })
    expect(windowAt(mix, { temperature: at, next: { ...top, chemistry: 'polyurea' } }), 'polyurea is not polyurethane').toMatchObject({
      value: { max: 24 },
    })
  })

  it('is not stated when the sheet names other coats only', () => {
    const mix = prime([window(8, 24, { next: 'Teasel Body 5' })])
    expect(windowAt(mix, { temperature: at, next: top })).toMatchObject({
      kind: 'not-stated',
      missing: { because: 'the sheet states it before Teasel Body 5 only' },
    })
  })

  it('knows a window with itself', () => {
    const mix = prime([window(4, 48, { next: 'itself' }), window(8, 24)])
    expect(windowFacts(mix, { id: 'prime', name: 'Ostrel Prime 10', chemistry: 'epoxy' })).toHaveLength(1)
    expect(windowAt(mix, { temperature: at, next: top })).toMatchObject({ value: { min: 8, max: 24 } })
  })

  it('interpolates between the temperatures of the window it chose and of no other', () => {
    const mix = prime([window(16, 48, { at: 50 }), window(8, 24, { at: 70 }), window(5, 10, { at: 60, next: 'Teasel Body 5' })])
    const figure = windowAt(mix, { temperature: quantity(60, '°F'), next: top })
    expect(figure.kind === 'computed' && figure.value.max).toBeCloseTo(33.72, 2)
  })
})

describe('a window as clock times', () => {
  const chicago = 'America/Chicago'
  const start = Date.parse('2026-03-03T16:30:00-06:00') // a Tuesday

  it('runs across midnight', () => {
    expect(clockTime(start, chicago)).toBe('Tue 16:30')
    expect(clockWindow({ min: 9, max: 24, unit: 'h' }, { start, zone: chicago })).toMatchObject({
      opens: { text: 'Wed 01:30' },
      closes: { text: 'Wed 16:30' },
    })
  })

  it('leaves an end that no sheet states unstated', () => {
    expect(clockWindow({ min: 9, unit: 'h' }, { start, zone: chicago }).closes).toBeNull()
    expect(clockWindow({ max: 2, unit: 'd' }, { start, zone: chicago })).toMatchObject({ opens: null, closes: { text: 'Thu 16:30' } })
  })

  it('counts hours that pass, not hours on the wall, when clocks are put forward', () => {
    // 8 March 2026, 02:00 CST becomes 03:00 CDT: 8 h after Saturday 22:00 it is 07:00 on the wall
    const saturday = Date.parse('2026-03-07T22:00:00-06:00')
    expect(clockTime(after(saturday, 8), chicago)).toBe('Sun 07:00')
  })

  it('tells the hour apart that comes twice when clocks are put back', () => {
    // 1 November 2026, 02:00 CDT becomes 01:00 CST
    const saturday = Date.parse('2026-10-31T22:00:00-05:00')
    const wall = (hours: number) => wallTime(after(saturday, hours), { zone: chicago, from: saturday })
    expect([3.5, 4.5, 5.5].map(wall)).toEqual(['Sun 01:30 CDT', 'Sun 01:30 CST', 'Sun 02:30'])
  })

  it('shows the date once a weekday alone would mislead', () => {
    expect(clockWindow({ min: 7, max: 7, unit: 'd' }, { start, zone: chicago }).opens?.text).toBe('Tue 10 Mar 17:30')
  })

  it('is of the site’s zone, wherever the phone is', () => {
    expect(clockTime(start, 'Europe/Berlin')).toBe('Tue 23:30')
  })
})
