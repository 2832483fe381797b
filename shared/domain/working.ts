import type { Fact } from './fact.ts'
import type { Figure, KnownFigure, Working } from './figure.ts'
import type { Range } from './property.ts'
import { type Quantity, type Unit, convert } from './units.ts'

type Computed = Extract<Figure, { kind: 'computed' }>
export type Source = Computed['from'][number]

/** A single value as a range: both ends the same. */
export function point({ value, unit }: Quantity): Range {
  return { min: value, max: value, unit }
}

/** Both ends of a range through a rising function, in the unit that the function answers in. */
export function mapRange(range: Range, unit: Unit, rising: (value: number) => number): Range {
  return {
    ...(range.min === undefined ? {} : { min: rising(range.min) }),
    ...(range.max === undefined ? {} : { max: rising(range.max) }),
    unit,
  }
}

/** A range in another unit of its dimension. */
function rangeIn(range: Range, unit: Unit): Range {
  return mapRange(range, unit, (value) => convert({ value, unit: range.unit }, unit).value)
}

/** Sum of ranges, end by end, in one unit. An end that one of them lacks is lacking in the sum. */
export function sumOf(ranges: readonly Range[], unit: Unit): Range {
  const same = ranges.map((range) => rangeIn(range, unit))
  const end = (side: 'min' | 'max') => same.reduce<number | undefined>((sum, range) => add(sum, range[side]), 0)
  const [min, max] = [end('min'), end('max')]
  return { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }), unit }
}

const add = (a: number | undefined, b: number | undefined) => (a === undefined || b === undefined ? undefined : a + b)

/** The least value of a range: what may be counted on. */
export function leastOf({ min, max, unit }: Range): Quantity {
  return { value: min ?? max ?? Number.NaN, unit }
}

/** The greatest value a range allows: what must be enough. */
export function greatestOf({ min, max, unit }: Range): Quantity {
  return { value: max ?? min ?? Number.NaN, unit }
}

/** A computed figure with its sum. */
export function computed(value: Quantity | Range, working: Working, from: readonly Source[] = []): Computed {
  return { kind: 'computed', value: 'value' in value ? point(value) : value, working, from: [...from] }
}

/** A fact as a source of a computed figure. */
export function sourceOf(label: string, fact: Fact): Source {
  return { label, factId: fact.id, origin: fact.origin }
}

/** What a figure rests on, as sources of another one: a computed figure hands on its own. */
export function sourcesOf(label: string, figure: KnownFigure): Source[] {
  return figure.kind === 'fact' ? [{ label, factId: figure.factId, origin: figure.origin }] : figure.from
}
