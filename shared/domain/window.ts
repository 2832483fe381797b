import type { Fact } from './fact.ts'

/**
 * The recoat windows that hold under a given next coat: one stated for that coat by name goes before those stated for any;
 * one stated for another coat does not hold.
 */
export function windowFacts(facts: readonly Fact[], nextMix: string | undefined): Fact[] {
  const isWindow = (fact: Fact) => fact.property === 'recoatWindow'
  const named = facts.filter((fact) => isWindow(fact) && fact.at?.next !== undefined && nextMix !== undefined && nextMix.toLowerCase().includes(fact.at.next.toLowerCase()))
  const general = facts.filter((fact) => isWindow(fact) && fact.at?.next === undefined)
  return named.length > 0 ? named : general
}

/** An instant some hours after another; clocks that are put forward or back do not change what has passed. Epoch milliseconds. */
export function after(start: number, hours: number): number {
  return start + hours * 3_600_000
}

/** An instant as the clock on the site's wall shows it: "Tue 04:00". `zone` is an IANA time zone. */
export function clockTime(instant: number, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { weekday: 'short', hour: '2-digit', minute: '2-digit', hourCycle: 'h23', timeZone: zone }).format(instant).replace(',', '')
}
