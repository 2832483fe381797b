import { type Fact, factsOf, rangeOf } from './fact.ts'
import { type Figure, type Missing, notStated } from './figure.ts'
import { formatConditions, formatNumber, formatRange, unitText } from './format.ts'
import type { Property, Range } from './property.ts'
import { type Quantity, type Unit, convert, quantity, valueIn } from './units.ts'
import { computed, sourceOf } from './working.ts'

/** Two temperatures within half a kelvin are the same column of a sheet: 75 °F and 24 °C are. */
const sameColumn = 0.5

interface Cell {
  fact: Fact
  range: Range
  /** °C; NaN when the sheet states none. */
  celsius: number
}

/** A property's facts that differ in temperature alone, coldest first. */
export interface SheetTable {
  cells: readonly Cell[]
  /** The other conditions that all cells share, in words: "150 g", "before Corbel Seal". */
  condition: string
  temperatureStated: boolean
}

/** Conditions besides temperature that make two facts two tables: a pot life of 150 g is not one of a gallon. Typical values stand apart. */
function tableKey({ at, film, of, origin }: Fact): string {
  const amount = (one: Quantity | undefined, unit: Unit) => (one ? Number(valueIn(one, unit).toPrecision(4)) : null)
  return JSON.stringify([
    origin.kind === 'typical',
    at?.temperature === undefined,
    amount(at?.mass, 'g'),
    amount(at?.volume, 'mL'),
    amount(at?.relativeHumidity, '%'),
    amount(at?.film, 'µm'),
    at?.next?.toLowerCase(),
    film,
    of,
  ])
}

/**
 * The facts of a property as tables over temperature, in the order they are looked in: what a sheet or a person states before typical values, tables
 * with temperatures before values without, more temperatures before fewer, and among equals the first stated.
 */
export function tablesOf(facts: readonly Fact[], property: Property): SheetTable[] {
  const groups = new Map<string, Cell[]>()
  for (const fact of factsOf(facts, property)) {
    const range = rangeOf(fact)
    const celsius = fact.at?.temperature ? valueIn(fact.at.temperature, '°C') : Number.NaN
    if (range) groups.set(tableKey(fact), [...(groups.get(tableKey(fact)) ?? []), { fact, range, celsius }])
  }
  const tables = [...groups.values()].map((cells): SheetTable => ({
    cells: [...cells].sort((a, b) => a.celsius - b.celsius),
    condition: withoutTemperature(cells[0]),
    temperatureStated: cells[0]?.fact.at?.temperature !== undefined,
  }))
  const rank = ({ cells, temperatureStated }: SheetTable) =>
    (cells[0]?.fact.origin.kind === 'typical' ? 1e6 : 0) + (temperatureStated ? 0 : 1e3) - cells.length
  return tables.sort((a, b) => rank(a) - rank(b))
}

function withoutTemperature(cell: Cell | undefined): string {
  const { temperature: _, ...others } = cell?.fact.at ?? {}
  return formatConditions(others)
}

/** Weight of the warmer column at a temperature: ln t is a straight line over 1/T (Arrhenius), T in kelvin. */
export function arrheniusWeight(celsius: number, { below, above }: { below: number; above: number }): number {
  const inverse = (degrees: number) => 1 / (degrees + 273.15)
  return (inverse(below) - inverse(celsius)) / (inverse(below) - inverse(above))
}

/** One end between two columns: straight in ln t. An end that is nought in a column has no logarithm and goes straight in t. */
function between(low: number, high: number, weight: number): number {
  if (low <= 0 || high <= 0) return low * (1 - weight) + high * weight
  return Math.exp(Math.log(low) * (1 - weight) + Math.log(high) * weight)
}

/** End by end; an end that either column leaves open is open between them. Undefined when no end is left. */
function interpolated(low: Cell, high: Cell, celsius: number): Range | undefined {
  const weight = arrheniusWeight(celsius, { below: low.celsius, above: high.celsius })
  const { unit } = low.range
  const end = (side: 'min' | 'max') => {
    const [a, b] = [low.range[side], high.range[side]]
    return a === undefined || b === undefined ? undefined : between(a, valueIn(quantity(b, high.range.unit), unit), weight)
  }
  const [min, max] = [end('min'), end('max')]
  if (min === undefined && max === undefined) return undefined
  return { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }), unit }
}

export interface TableQuestion {
  property: Property
  temperature: Quantity
  /** Who is asked about, for what is not stated: the mix by name and id. */
  mix: { id: string; name: string }
  /** Said when there is nothing to look in. */
  because?: string
}

/** Why a table has no answer. */
function absent({ property, mix }: TableQuestion, because?: string): Figure {
  const of: Omit<Missing, 'property' | 'part'> = {
    of: mix.name,
    subject: { kind: 'mix', id: mix.id },
    ask: 'the maker, in writing',
    ...(because ? { because } : {}),
  }
  return notStated(property, of)
}

/**
 * A property of a mix at a temperature, from its sheet's own table: the cell itself, or interpolated between two columns on an Arrhenius scale;
 * outside the table it is not stated ("the sheet stops at 50 °F"), and a value at one temperature holds at that one only (within half a kelvin).
 * A value without temperature is given with that said. Where a sheet has several tables (by mass, by next coat), the first that reaches the
 * temperature answers; see `tablesOf` for their order. The conditions of the answer are kept in its words.
 */
export function valueAt(facts: readonly Fact[], question: TableQuestion): Figure {
  const tables = tablesOf(facts, question.property)
  const answers = tables.map((table) => answerOf(table, question))
  return answers.find((answer) => answer.kind !== 'not-stated') ?? answers[0] ?? absent(question, question.because)
}

function answerOf({ cells, condition, temperatureStated }: SheetTable, question: TableQuestion): Figure {
  const [first] = cells
  const last = cells.at(-1)
  if (!first || !last) return absent(question)
  if (!temperatureStated) return asFigure(first, ['no temperature stated', condition].filter(Boolean).join(', '))
  const celsius = valueIn(question.temperature, '°C')
  const exact = nearest(cells, celsius)
  if (exact) return asFigure(exact, formatConditions(exact.fact.at))
  const above = cells.findIndex((cell) => cell.celsius > celsius)
  const [low, high] = [cells[above - 1], cells[above]]
  if (!low || !high) return absent(question, beyond(celsius < first.celsius ? first : last, cells))
  const value = interpolated(low, high, celsius)
  return value
    ? interpolatedFigure([low, high], { value, question, condition })
    : absent(question, 'the columns on either side state different ends')
}

/** The column of a temperature: the nearest within half a kelvin, the first stated among equals. */
function nearest(cells: readonly Cell[], celsius: number): Cell | undefined {
  const off = (cell: Cell) => Math.abs(cell.celsius - celsius)
  const [best] = [...cells].sort((a, b) => off(a) - off(b))
  return best && off(best) <= sameColumn + 1e-9 ? best : undefined
}

function beyond({ fact, celsius }: Cell, cells: readonly Cell[]): string {
  const at = fact.at?.temperature
  const edge = at ? formatRange({ min: at.value, max: at.value, unit: at.unit }) : ''
  return cells.every((cell) => Math.abs(cell.celsius - celsius) <= sameColumn)
    ? `the sheet states it at ${edge} only`
    : `the sheet stops at ${edge}`
}

function asFigure({ fact, range }: Cell, condition: string): Figure {
  return { kind: 'fact', value: range, factId: fact.id, origin: fact.origin, ...(condition ? { condition } : {}) }
}

function interpolatedFigure(
  [low, high]: [Cell, Cell],
  { value, question, condition }: { value: Range; question: TableQuestion; condition: string },
): Figure {
  const unit: Unit = low.fact.at?.temperature?.unit ?? '°C'
  const degrees = (at: number) => `${formatNumber(convert(quantity(at, '°C'), unit).value, 1)} ${unitText(unit)}`
  const cell = ({ range, celsius }: Cell) => `${formatRange(range)} at ${degrees(celsius)}`
  const asked = degrees(valueIn(question.temperature, '°C'))
  return computed(
    value,
    {
      formula: 'Interpolated in the sheet’s own table: ln t straight over 1/T (Arrhenius)',
      sum: `between ${cell(low)} and ${cell(high)}: ${formatRange(value)} at ${asked}${condition ? `, ${condition.replace(/^at /, '')}` : ''}`,
      source: 'the sheet’s table; Arrhenius law',
    },
    [low, high].map((one) => sourceOf(cell(one), one.fact)),
  )
}
