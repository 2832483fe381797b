import { type Fact, factsOf, rangeOf } from './fact.ts'
import { type Figure, type Missing, notStated } from './figure.ts'
import { formatConditions, formatNumber, formatRange, unitText } from './format.ts'
import type { Property, Range } from './property.ts'
import { type Quantity, type Unit, convert, quantity, valueIn } from './units.ts'

/** Two temperatures within half a kelvin are the same column of a sheet. */
const sameTemperature = 0.5

interface Cell {
  fact: Fact
  range: Range
  /** °C; undefined when the sheet states none. */
  celsius: number | undefined
}

const celsiusOf = (fact: Fact) => (fact.at?.temperature ? valueIn(fact.at.temperature, '°C') : undefined)

/** Conditions besides temperature that make two facts two tables: a pot life of 150 g is not one of a gallon. */
const tableKey = ({ at, film, of }: Fact) => JSON.stringify([at?.mass, at?.volume, at?.relativeHumidity, at?.film, at?.next, film, of])

/**
 * The facts of a property as one table over temperature. Where a sheet has several (by mass, by next coat), the one with the most
 * temperatures counts; among equals the first stated.
 */
function tableOf(facts: readonly Fact[]): Cell[] {
  const tables = new Map<string, Cell[]>()
  for (const fact of facts) {
    const range = rangeOf(fact)
    if (range) tables.set(tableKey(fact), [...(tables.get(tableKey(fact)) ?? []), { fact, range, celsius: celsiusOf(fact) }])
  }
  const [best = []] = [...tables.values()].sort((a, b) => b.length - a.length)
  return best.sort((a, b) => (a.celsius ?? -Infinity) - (b.celsius ?? -Infinity))
}

/** Weight of the warmer column at a temperature: ln t is a straight line over 1/T (Arrhenius), T in kelvin. */
export function arrheniusWeight(celsius: number, { below, above }: { below: number; above: number }): number {
  const inverse = (degrees: number) => 1 / (degrees + 273.15)
  return (inverse(below) - inverse(celsius)) / (inverse(below) - inverse(above))
}

const between = (low: number, high: number, weight: number) => Math.exp(Math.log(low) * (1 - weight) + Math.log(high) * weight)

function interpolated(low: Cell, high: Cell, celsius: number): Range {
  const weight = arrheniusWeight(celsius, { below: low.celsius ?? 0, above: high.celsius ?? 0 })
  const { unit } = low.range
  const end = (side: 'min' | 'max') => {
    const [a, b] = [low.range[side], high.range[side]]
    if (a === undefined || b === undefined) return undefined
    return between(a, valueIn(quantity(b, high.range.unit), unit), weight)
  }
  const [min, max] = [end('min'), end('max')]
  return { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }), unit }
}

export interface TableQuestion {
  property: Property
  temperature: Quantity<'°F' | '°C'> | Quantity
  /** Who is asked about, for what is not stated: the mix by name and id. */
  mix: { id: string; name: string }
}

/** Why a table has no answer. */
function absent({ property, mix }: TableQuestion, because?: string): Figure {
  const of: Omit<Missing, 'property' | 'part'> = {
    of: mix.name, subject: { kind: 'mix', id: mix.id }, ask: 'the maker, in writing', ...(because ? { because } : {}),
  }
  return notStated(property, of)
}

/**
 * A property of a mix at a temperature, from its sheet's own table: the cell itself, or interpolated between two columns on an Arrhenius
 * scale; outside the table it is not stated ("the sheet stops at 50 °F"). A value with no temperature is given with that said.
 */
export function valueAt(facts: readonly Fact[], question: TableQuestion): Figure {
  const cells = tableOf(factsOf(facts, question.property))
  const [first] = cells
  const last = cells.at(-1)
  if (!first || !last) return absent(question)
  if (first.celsius === undefined) return asFigure(first, ['no temperature stated', formatConditions(first.fact.at)].filter(Boolean).join(', '))
  const celsius = valueIn(question.temperature, '°C')
  const exact = cells.find((cell) => cell.celsius !== undefined && Math.abs(cell.celsius - celsius) <= sameTemperature)
  if (exact) return asFigure(exact, formatConditions(exact.fact.at))
  const above = cells.findIndex((cell) => (cell.celsius ?? 0) > celsius)
  const [low, high] = [cells[above - 1], cells[above]]
  if (!low || !high) return absent(question, beyond(celsius < (first.celsius ?? 0) ? first : last, cells.length))
  return interpolatedFigure([low, high], question)
}

function beyond({ fact }: Cell, columns: number): string {
  const at = fact.at?.temperature
  const edge = at ? formatRange({ min: at.value, max: at.value, unit: at.unit }) : ''
  return columns === 1 ? `the sheet states it at ${edge} only` : `the sheet stops at ${edge}`
}

function asFigure({ fact, range }: Cell, condition: string): Figure {
  return { kind: 'fact', value: range, factId: fact.id, origin: fact.origin, ...(condition ? { condition } : {}) }
}

function interpolatedFigure([low, high]: [Cell, Cell], { temperature }: TableQuestion): Figure {
  const celsius = valueIn(temperature, '°C')
  const value = interpolated(low, high, celsius)
  const unit: Unit = low.fact.at?.temperature?.unit ?? '°C'
  const degrees = (at: number) => `${formatNumber(convert(quantity(at, '°C'), unit).value, 1)} ${unitText(unit)}`
  const cell = ({ range, celsius: at = 0 }: Cell) => `${formatRange(range)} at ${degrees(at)}`
  return {
    kind: 'computed',
    value,
    working: {
      formula: 'Interpolated in the sheet’s own table: ln t straight over 1/T (Arrhenius)',
      sum: `between ${cell(low)} and ${cell(high)}: ${formatRange(value)} at ${degrees(celsius)}`,
      source: 'the sheet’s table; Arrhenius law',
    },
    from: [low, high].map((one) => ({ label: cell(one), factId: one.fact.id, origin: one.fact.origin })),
  }
}
