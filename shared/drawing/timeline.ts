import type { TimelineEntry } from '../domain/evaluation.ts'
import { type Shape, ink, svgOf, textWidth, wrap } from './shapes.ts'

/** One course on the timeline. */
export interface TimelineRow {
  id: string
  number: number
  title: string
  color: string | null
  entry: TimelineEntry
}

export interface TimelineOptions {
  width: number
  /** Clock time of an hour since the start; without it hours are counted. */
  clock?: (hour: number) => string
  /** Titles above the bars instead of beside them. */
  narrow?: boolean
}

interface TimelineMark {
  id: string
  number: number
  says: string
  top: number
  bottom: number
}

export interface TimelineModel {
  width: number
  height: number
  shapes: Shape[]
  rows: TimelineMark[]
  notes: string[]
  alternative: string
  /** Hours across. */
  hours: number
}

const steps = [0.25, 0.5, 1, 2, 4, 6, 12, 24, 48, 72, 168, 336, 672]
const size = 12
const fixed = (value: number) => Math.round(value * 10) / 10

/** Hours as people say them: 45 min, 9 h, 7 d. */
export function hoursText(hours: number): string {
  if (hours < 1 && hours > 0) return `${Math.round(hours * 60)} min`
  if (hours >= 168 && hours % 24 < 0.05) return `${Math.round(hours / 24)} d`
  return `${Number(hours.toFixed(1)).toLocaleString('en-US')} h`
}

/** Far enough to show every start, opening and return to traffic; a window that stays open much longer runs off the edge. */
function hoursAcross(entries: readonly TimelineEntry[]): number {
  const must = entries
    .flatMap((entry) => [entry.start, entry.workingUntil, entry.windowOpens, entry.foot, entry.vehicles])
    .filter((hour) => hour !== null)
  const far = Math.max(1, ...must)
  const closes = entries.map((entry) => entry.windowCloses ?? 0).filter((hour) => hour <= far * 1.8)
  const cure = entries.map((entry) => entry.fullCure ?? 0).filter((hour) => hour <= far * 1.5)
  return Math.max(far, ...closes, ...cure) * 1.06
}

/** The course whose cure the floor waits for; undefined while the start of any course is not known. */
function lastToCure(rows: readonly TimelineRow[]): TimelineRow | undefined {
  if (rows.some((row) => row.entry.start === null)) return undefined
  const wait = ({ entry }: TimelineRow) => Math.max(entry.foot ?? -1, entry.vehicles ?? -1)
  const longest = Math.max(-1, ...rows.map(wait))
  return longest < 0 ? undefined : rows.findLast((row) => wait(row) === longest)
}

interface Axis {
  left: number
  right: number
  hours: number
  text: (hour: number) => string
  at: (hour: number) => number
}

/** Hours across, courses down, in the order they are laid. */
export function timelineOf(rows: readonly TimelineRow[], { width, clock, narrow = false }: TimelineOptions): TimelineModel {
  const entries = rows.map((row) => row.entry)
  const left = narrow ? 8 : Math.min(210, 40 + Math.max(0, ...rows.map((row) => textWidth(row.title, size + 1))))
  const right = width - 26
  const hours = hoursAcross(entries)
  const axis: Axis = { left, right, hours, text: clock ?? hoursText, at: (hour) => left + (Math.min(hour, hours) / hours) * (right - left) }
  const rowHeight = narrow ? 62 : 42
  const height = 12 + rows.length * rowHeight + 26
  const places = rows.map((row, index) => ({ row, line: 12 + index * rowHeight + (narrow ? 38 : 24) }))
  const last = lastToCure(rows)
  return {
    width,
    height,
    hours,
    shapes: [
      ...grid(axis, height - 22),
      ...places.flatMap(({ row, line }) => title(row, { line, narrow, left })),
      ...followers(places, axis),
      ...places.flatMap(({ row, line }, index) => [
        ...working(row, line, axis),
        ...(index < rows.length - 1 ? windowBracket(row, line, axis) : []),
        ...(row === last ? traffic(row, line, axis) : []),
      ]),
    ],
    rows: places.map(({ row, line }) => ({
      id: row.id,
      number: row.number,
      says: rowWords(row, axis.text),
      top: line - (narrow ? 34 : 22),
      bottom: line + (narrow ? 24 : 20),
    })),
    notes: ['Hours from the start of the first course. Bar: working time. Bracket: window for the next course.'],
    alternative: `Timeline in hours from the start of the first course. ${rows.map((row) => rowWords(row, axis.text)).join('. ')}.`,
  }
}

/** The figure as SVG text, for documents. */
export function timelineSvg(model: TimelineModel, options: { fontFamily?: string } = {}): string {
  return svgOf(model, options)
}

function rowWords({ number, title, entry }: TimelineRow, text: Axis['text']): string {
  const { start, workingUntil, windowOpens, windowCloses, foot, vehicles } = entry
  const parts = [start === null ? 'start not known' : `starts ${text(start)}`]
  if (workingUntil !== null) parts.push(`to be placed by ${text(workingUntil)}`)
  if (windowOpens !== null) parts.push(`window opens ${text(windowOpens)}`)
  if (windowCloses !== null) parts.push(`window closes ${text(windowCloses)}`)
  if (windowOpens !== null && windowCloses === null) parts.push('closing of the window not stated')
  if (foot !== null) parts.push(`feet ${text(foot)}`)
  if (vehicles !== null) parts.push(`vehicles ${text(vehicles)}`)
  return `Course ${number}, ${title}: ${parts.join(', ')}`
}

function grid({ left, right, hours, at, text }: Axis, bottom: number): Shape[] {
  const room = Math.max(3, Math.floor((right - left) / 84))
  const step = steps.find((one) => hours / one <= room) ?? 672
  const ticks = Array.from({ length: Math.floor(hours / step) + 1 }, (_, index) => index * step)
  return [
    { kind: 'path', d: ticks.map((hour) => `M${fixed(at(hour))} 6V${bottom}`).join(''), stroke: ink.rule },
    ...ticks.map((hour, index): Shape => ({
      kind: 'text',
      x: at(hour),
      y: bottom + 16,
      text: index === 0 && text === hoursText ? '0 h' : text(hour),
      size: 11.5,
      fill: ink.pencil,
      anchor: index === 0 && left < 20 ? 'start' : 'middle',
    })),
  ]
}

function title(
  { id, number, title: words, color }: TimelineRow,
  { line, narrow, left }: { line: number; narrow: boolean; left: number },
): Shape[] {
  const y = narrow ? line - 18 : line + 4
  const [first = ''] = wrap(words, { width: narrow ? 320 : left - 38, size: size + 1 })
  const cut = first === words ? words : `${first} …`
  return [
    { kind: 'text', x: narrow ? 13 : 8, y, text: String(number), size: size + 1, fill: ink.pencil, course: id },
    {
      kind: 'text',
      x: narrow ? 32 : 28,
      y,
      text: cut,
      size: size + 1,
      fill: ink.ink,
      course: id,
      ...(color === null ? {} : { weight: 600 as const }),
    },
  ]
}

/** The solid bar from the start to the end of the working time; a surface that is only worked has a tick. */
function working({ id, color, entry }: TimelineRow, line: number, { at }: Axis): Shape[] {
  if (entry.start === null)
    return [{ kind: 'text', x: at(0) + 6, y: line + 4, text: 'start not known', size, fill: ink.pencil, course: id }]
  const x = fixed(at(entry.start))
  if (color === null && entry.workingUntil === null)
    return [{ kind: 'path', d: `M${x} ${line - 8}V${line + 8}`, stroke: ink.ink, strokeWidth: 1.6, course: id }]
  const end = entry.workingUntil === null ? x + 3 : Math.max(at(entry.workingUntil), x + 3)
  const known = entry.workingUntil !== null
  return [
    {
      kind: 'path',
      d: `M${x} ${line - 8}H${fixed(end)}V${line + 8}H${x}Z`,
      fill: color ?? ink.pencil,
      stroke: ink.ink,
      strokeWidth: 0.6,
      course: id,
      ...(known ? {} : { dash: '2 2' }),
    },
  ]
}

/** An open bracket between the two times; open-ended where the sheet gives no end or the end lies beyond the edge. */
function windowBracket({ id, entry }: TimelineRow, line: number, axis: Axis): Shape[] {
  const { windowOpens: opens, windowCloses: closes } = entry
  if (opens === null && closes === null) return []
  const { at, hours, right, text } = axis
  const from = fixed(at(opens ?? entry.workingUntil ?? entry.start ?? 0))
  const beyond = closes !== null && closes > hours
  const to = fixed(closes === null || beyond ? right : at(closes))
  const serif = 7
  const stroke = { stroke: ink.resin, strokeWidth: 1.6, course: id }
  const shapes: Shape[] = [
    { kind: 'path', d: `M${from} ${line}H${to}`, ...stroke, ...(closes === null ? { dash: '4 4' } : {}) },
    ...(opens === null
      ? []
      : [{ kind: 'path' as const, d: `M${from + 5} ${line - serif}H${from}V${line + serif}H${from + 5}`, ...stroke }]),
    ...(closes === null || beyond
      ? [{ kind: 'path' as const, d: `M${to - 6} ${line - 5}L${to} ${line}L${to - 6} ${line + 5}`, ...stroke }]
      : [{ kind: 'path' as const, d: `M${to - 5} ${line - serif}H${to}V${line + serif}H${to - 5}`, ...stroke }]),
  ]
  return [...shapes, ...windowTimes({ from, to, closes, opens }, { line, id, text, beyond, axis })]
}

interface WindowEnds {
  from: number
  to: number
  opens: number | null
  closes: number | null
}

function windowTimes(
  { from, to, opens, closes }: WindowEnds,
  at: { line: number; id: string; text: Axis['text']; beyond: boolean; axis: Axis },
): Shape[] {
  const { line, id, text, axis } = at
  const opening = opens === null ? '' : text(opens)
  const closing = closes === null ? 'no end stated' : text(closes)
  const wide = textWidth(opening, size) + textWidth(closing, size) + 14
  const base = { kind: 'text' as const, y: line - 6, size, fill: ink.pencil, course: id }
  if (to - from > wide) {
    return [
      { ...base, x: from + 8, text: opening },
      { ...base, x: to - 8, text: closing, anchor: 'end' as const },
    ]
  }
  const both = opening ? `${opening} to ${closing}` : `until ${closing}`
  const fits = to + 8 + textWidth(both, size) < axis.right
  return [
    fits ? { ...base, x: to + 8, y: line + 4, text: both } : { ...base, x: from - 8, y: line + 4, text: both, anchor: 'end' as const },
  ]
}

/** When the floor takes feet, wheels and everything again. */
function traffic({ id, entry }: TimelineRow, line: number, { at, hours, right, text }: Axis): Shape[] {
  const marks = [
    { word: 'feet', hour: entry.foot },
    { word: 'vehicles', hour: entry.vehicles },
    { word: 'full cure', hour: entry.fullCure },
  ]
  const shown = marks.flatMap(({ word, hour }) => {
    if (hour === null) return []
    const beyond = hour > hours
    const words = `${word} ${text(hour)}${beyond ? ' →' : ''}`
    return [{ x: fixed(beyond ? right : at(hour)), beyond, words, wide: textWidth(words, size) }]
  })
  const starts = sideBySide(
    shown.map(({ x, wide }) => ({ from: x - wide / 2, wide })),
    right + 20,
  )
  return shown.flatMap(({ x, beyond, words }, index): Shape[] => [
    ...(beyond
      ? []
      : [
          {
            kind: 'path' as const,
            d: `M${x} ${line - 7}V${line + 7}M${x - 4} ${line + 7}H${x + 4}`,
            stroke: ink.ink,
            strokeWidth: 1.6,
            course: id,
          },
        ]),
    { kind: 'text', x: starts[index] ?? x, y: line + 20, text: words, size, fill: ink.ink, course: id },
  ])
}

/** Moves words apart so that none covers another and none runs over the end. */
function sideBySide(words: readonly { from: number; wide: number }[], end: number): number[] {
  const starts: number[] = []
  let free = 0
  for (const { from, wide } of words) {
    starts.push(Math.max(from, free))
    free = (starts.at(-1) ?? 0) + wide + 12
  }
  let limit = end
  for (let index = words.length - 1; index >= 0; index -= 1) {
    starts[index] = Math.min(starts[index] ?? 0, limit - (words[index]?.wide ?? 0))
    limit = (starts[index] ?? 0) - 12
  }
  return starts
}

/** A thin line from the start of a course up to the window of the one beneath, so that the eye sees whether it falls inside. */
function followers(places: readonly { row: TimelineRow; line: number }[], { at }: Axis): Shape[] {
  const d = places.flatMap(({ row, line }, index) => {
    const beneath = places.slice(0, index).findLast((one) => one.row.entry.windowOpens !== null || one.row.entry.windowCloses !== null)
    return row.entry.start === null || !beneath ? [] : [`M${fixed(at(row.entry.start))} ${beneath.line - 9}V${line - 8}`]
  })
  return d.length > 0 ? [{ kind: 'path', d: d.join(''), stroke: ink.pencil, strokeWidth: 0.7, dash: '2 3' }] : []
}
