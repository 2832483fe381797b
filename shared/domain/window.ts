import { type Fact, factsOf } from './fact.ts'
import type { Figure } from './figure.ts'
import type { MixFacts } from './mix.ts'
import type { Range } from './property.ts'
import { valueAt } from './sheet-table.ts'
import { type Quantity, valueIn } from './units.ts'

type NextCoat = Pick<MixFacts, 'id' | 'name' | 'chemistry'>

const words = (text: string) =>
  ` ${text
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim()} `

/** True when a sheet's words for the next coat mean this mix: its name, its chemistry ("any epoxy coat"), or the mix itself ("with itself"). */
function means(next: string, { mix, of }: { mix: NextCoat; of: { id: string } }): boolean {
  const said = words(next)
  if (/ (itself|self|same product|same material) /.test(said)) return mix.id === of.id
  const name = words(mix.name)
  return name.includes(said) || said.includes(name) || (mix.chemistry !== 'other' && said.includes(words(mix.chemistry)))
}

/**
 * The recoat windows that hold under a given next coat: those stated for that coat go before those stated for any; one stated for another coat
 * does not hold, and when nothing is laid upon it, only those stated for any do.
 */
export function windowFacts(of: Pick<MixFacts, 'id' | 'facts'>, next: NextCoat | undefined): Fact[] {
  const windows = factsOf(of.facts, 'recoatWindow')
  const named = windows.filter(({ at }) => at?.next !== undefined && next !== undefined && means(at.next, { mix: next, of }))
  return named.length > 0 ? named : windows.filter(({ at }) => at?.next === undefined)
}

/**
 * Recoat window of a mix at a temperature, beneath a given next coat, from its sheet's own table. Either end may be missing: then nobody has said
 * how early, or how late. A window stated only for other coats is not one for this.
 */
export function windowAt(
  mix: Pick<MixFacts, 'id' | 'name' | 'facts'>,
  { temperature, next }: { temperature: Quantity; next: NextCoat | undefined },
): Figure {
  const others = [...new Set(factsOf(mix.facts, 'recoatWindow').flatMap(({ at }) => at?.next ?? []))]
  const because = others.length > 0 ? `the sheet states it before ${others.join(', ')} only` : undefined
  return valueAt(windowFacts(mix, next), { property: 'recoatWindow', temperature, mix, ...(because ? { because } : {}) })
}

const hour = 3_600_000

/** An instant some hours after another; clocks that are put forward or back do not change what has passed. Epoch milliseconds. */
export function after(start: number, hours: number): number {
  return start + hours * hour
}

const clock = { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' } as const

/** An instant as the clock on the site's wall shows it: "Tue 04:00". `zone` is an IANA time zone. */
export function clockTime(instant: number, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { weekday: 'short', ...clock, timeZone: zone }).format(instant).replace(',', '')
}

/** The same with the date: "Tue 3 Mar 04:00". */
function datedTime(instant: number, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { weekday: 'short', day: 'numeric', month: 'short', ...clock, timeZone: zone })
    .format(instant)
    .replaceAll(',', '')
}

/** The zone's short name at an instant, where the wall shows the same time twice because clocks are put back; else nothing. */
function whichOfTwo(instant: number, zone: string): string {
  const twice = [-hour, hour].some((off) => clockTime(instant + off, zone) === clockTime(instant, zone))
  if (!twice) return ''
  const parts = new Intl.DateTimeFormat('en-US', { timeZoneName: 'short', timeZone: zone }).formatToParts(instant)
  return ` ${parts.find(({ type }) => type === 'timeZoneName')?.value ?? ''}`
}

/** An instant on the wall clock, with its date when it is six days or more from another, and told apart where the hour comes twice. */
export function wallTime(instant: number, { zone, from }: { zone: string; from: number }): string {
  const shown = Math.abs(instant - from) < 6 * 24 * hour ? clockTime(instant, zone) : datedTime(instant, zone)
  return shown + whichOfTwo(instant, zone)
}

export interface ClockWindow {
  /** Epoch milliseconds and the wall clock's words; null: not stated. */
  opens: { at: number; text: string } | null
  closes: { at: number; text: string } | null
}

/** A window as clock times, from the start of the course that it counts from. Null ends are not stated and stay so. */
export function clockWindow(window: Range, { start, zone }: { start: number; zone: string }): ClockWindow {
  const end = (value: number | undefined) => {
    if (value === undefined) return null
    const at = after(start, valueIn({ value, unit: window.unit }, 'h'))
    return { at, text: wallTime(at, { zone, from: start }) }
  }
  return { opens: end(window.min), closes: end(window.max) }
}
