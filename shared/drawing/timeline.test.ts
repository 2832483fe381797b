import { describe, expect, it } from 'vitest'
import type { TimelineEntry } from '../domain/evaluation.ts'
import { type TimelineRow, hoursText, timelineOf, timelineSvg } from './timeline.ts'

const row = (number: number, title: string, entry: Partial<TimelineEntry>): TimelineRow => ({
  id: String(number),
  number,
  title,
  color: '#8f9a98',
  entry: {
    courseId: String(number),
    start: null,
    workingUntil: null,
    windowOpens: null,
    windowCloses: null,
    foot: null,
    vehicles: null,
    fullCure: null,
    ...entry,
  },
})
const rows = [
  row(1, 'Slurry', { start: 0, workingUntil: 0.4, windowOpens: 12, windowCloses: 30 }),
  row(2, 'Prime coat', { start: 14, workingUntil: 14.5, windowOpens: 23, windowCloses: 52 }),
  row(3, 'Top coat', { start: 24, workingUntil: 24.5, foot: 48, vehicles: 96, fullCure: 192 }),
]
const texts = (list: TimelineRow[], options = { width: 1000 }) =>
  timelineOf(list, options).shapes.flatMap((shape) => (shape.kind === 'text' ? [shape.text] : []))

describe('timelineOf', () => {
  it('shows each window by its two times, and when feet and vehicles return', () => {
    expect(texts(rows)).toEqual(expect.arrayContaining(['12 h', '30 h', '23 h', '52 h', 'feet 48 h', 'vehicles 96 h', 'full cure 8 d →']))
  })
  it('counts by the clock when the start is known', () => {
    const clock = (hour: number) => `${String((6 + hour) % 24).padStart(2, '0')}:00`
    expect(timelineOf(rows, { width: 1000, clock }).shapes.flatMap((shape) => (shape.kind === 'text' ? [shape.text] : []))).toEqual(
      expect.arrayContaining(['18:00', '12:00']),
    )
  })
  it('leaves a window without an end open, and says so', () => {
    const open = [row(1, 'Broadcast', { start: 0, workingUntil: 1, windowOpens: 8 }), row(2, 'Seal', { start: 20 })]
    expect(texts(open)).toContain('no end stated')
    expect(timelineOf(open, { width: 1000 }).alternative).toContain('closing of the window not stated')
  })
  it('does not invent a start', () => {
    expect(timelineOf([row(1, 'Body', {})], { width: 600 }).rows[0]?.says).toBe('Course 1, Body: start not known')
  })
  it('stays well-formed, narrow or empty', () => {
    for (const list of [rows, []]) expect(timelineSvg(timelineOf(list, { width: 358, narrow: true }))).not.toMatch(/NaN|undefined|Infinity/)
  })
})

describe('hoursText', () => {
  it('says hours as people do', () => {
    expect([0.75, 9, 14.5, 192].map(hoursText)).toEqual(['45 min', '9 h', '14.5 h', '8 d'])
  })
})
