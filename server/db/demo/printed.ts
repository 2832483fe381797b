import type { Property, Statement } from '../../../shared/domain/property.ts'

/** A value as a sheet of the demo prints it: the row's label, the words of the value, what it says. */
export interface PrintedValue {
  label: string
  words: string
  statement: Statement
}

type At = NonNullable<Statement['at']>
type Unit = Extract<Statement['value'], { unit: string }>['unit']
const unitWords = (unit: string) => unit.replace('Δ', '').replace('lb/1000 ft²·24 h', 'lb/1,000 ft²·24 h').replace('month', 'months')
const written = (value: number) => value.toLocaleString('en-US', { maximumFractionDigits: 3 })

const sayRange = (min: number | undefined, max: number | undefined, unit: string) => {
  const after = unit === 'CSP' ? '' : ` ${unitWords(unit)}`
  const before = unit === 'CSP' ? 'CSP ' : ''
  if (min !== undefined && max !== undefined) return `${before}${min === max ? written(min) : `${written(min)}–${written(max)}`}${after}`
  return min !== undefined ? `min. ${before}${written(min)}${after}` : `max. ${before}${written(max ?? 0)}${after}`
}

interface Extra {
  at?: At
  part?: Statement['part']
  film?: 'wet' | 'dry'
  of?: 'air' | 'slab' | 'material'
  after?: string
}

/** A range with its unit; null is an end that the sheet does not state. */
export function range(
  property: Property,
  label: string,
  [min, max, unit, extra = {}]: [number | null, number | null, Unit, Extra?],
): PrintedValue {
  const { after, ...rest } = extra
  const value = { ...(min === null ? {} : { min }), ...(max === null ? {} : { max }), unit } as Statement['value']
  const words = [sayRange(min ?? undefined, max ?? undefined, unit), rest.film, after].filter(Boolean).join(' ')
  return { label, words, statement: { property, part: 'mixed', value, ...rest } }
}

export function ratio(label: string, parts: number[], basis: 'volume' | 'weight'): PrintedValue {
  return { label, words: `${parts.join(' : ')} by ${basis}`, statement: { property: 'mixRatio', part: 'mixed', value: { parts, basis } } }
}

export function split(allowed: boolean): PrintedValue {
  return {
    label: 'Kits',
    words: allowed ? 'Part kits may be mixed on a scale.' : 'Mix full kits only.',
    statement: { property: 'splitKit', part: 'mixed', value: { is: allowed } },
  }
}

/** A row of a table over temperature: the same property at each, ends of windows with a null where none is stated. */
export interface TemperatureRow {
  property: Property
  label: string
  unit: Unit
  /** One a column. */
  cells: ([number | null, number | null] | number)[]
  mass?: At['mass']
  volume?: At['volume']
}

/** The cells of a row as printed values. */
export function cellsOf(
  { property, label, unit, cells, mass, volume }: TemperatureRow,
  temperatures: number[],
  degree: '°F' | '°C',
): PrintedValue[] {
  return cells.map((cell, index) => {
    const [min, max] = typeof cell === 'number' ? [cell, cell] : cell
    const at: At = {
      temperature: { value: temperatures[index] ?? 0, unit: degree },
      ...(mass ? { mass } : {}),
      ...(volume ? { volume } : {}),
    }
    return range(property, label, [min, max, unit, { at }])
  })
}

/** How a row's label stands in the table, with the mass or volume that it holds for. */
export function tableLabel({ label, mass, volume }: TemperatureRow): string {
  const amount = volume ?? mass
  return amount ? `${label}, ${amount.value} ${amount.unit}` : label
}
