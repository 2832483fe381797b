import { type Fact, codesOf, flagOf, substanceOf } from './fact.ts'
import type { Figure } from './figure.ts'
import type { Range, Ratio, ValueConditions } from './property.ts'
import { decimalsFor, roundHalfEven } from './rounding.ts'
import { type Unit, convert, dimensionOf } from './units.ts'

export const notStatedText = 'not stated'
export type ShownSystem = 'stated' | 'us' | 'si'

/** The unit of the other system that people of the trade use for it. Units that both use have none. */
const counterparts: Partial<Record<Unit, Unit>> = {
  mil: 'µm', in: 'mm', ft: 'm', 'ft²': 'm²', gal: 'L', lb: 'kg', oz: 'g', 'lb/gal': 'kg/L', 'lb/ft³': 'kg/L', 'ft²/gal': 'm²/L', 'lb/ft²': 'kg/m²',
  '°F': '°C', 'Δ°F': 'Δ°C', psi: 'MPa', 'lb/1000 ft²·24 h': 'g/m²·24 h',
  µm: 'mil', mm: 'in', m: 'ft', 'm²': 'ft²', L: 'gal', mL: 'oz', 'm³': 'gal', kg: 'lb', g: 'oz', 'kg/L': 'lb/gal', 'g/cm³': 'lb/gal', 'm²/L': 'ft²/gal',
  'kg/m²': 'lb/ft²', 'g/m²': 'lb/ft²', '°C': '°F', 'Δ°C': 'Δ°F', MPa: 'psi', 'g/m²·24 h': 'lb/1000 ft²·24 h',
}
const us = new Set<Unit>(['mil', 'in', 'ft', 'ft²', 'gal', 'in³', 'lb', 'oz', 'lb/gal', 'lb/ft³', 'ft²/gal', 'lb/ft²', '°F', 'Δ°F', 'psi', 'lb/1000 ft²·24 h'])

/** The unit's counterpart in the other system, or undefined where both systems share it. */
export function counterpartOf(unit: Unit): Unit | undefined {
  const other = counterparts[unit]
  return other && dimensionOf(other) === dimensionOf(unit) ? other : undefined
}

/** The unit to show a value in: as stated, or of the system asked for. */
export function shownUnit(unit: Unit, system: ShownSystem): Unit {
  if (system === 'stated') return unit
  return us.has(unit) === (system === 'us') ? unit : (counterpartOf(unit) ?? unit)
}

/** Made once each: a build-up is worked out on every keystroke. */
const writers = Array.from({ length: 13 }, (_, maximumFractionDigits) => new Intl.NumberFormat('en-US', { maximumFractionDigits }))

/** A number as people write it: thousands with commas, no trailing zeros that mean nothing. At most twelve decimals. */
export function formatNumber(value: number, decimals = decimalsFor(value)): string {
  return writers[decimals]?.format(roundHalfEven(value, decimals)) ?? String(value)
}

/** `Δ` tells differences from degrees in types; people read °F. */
export const unitText = (unit: Unit) => unit.replace('Δ', '')

const spaced = (unit: Unit) => (unit === 'CSP' ? '' : ` ${unitText(unit)}`)

/** "25–30 min", "at least 5 °F", "at most 85 %", "10.7 mil"; a profile reads "CSP 3–5". */
export function formatRange(range: Range, system: ShownSystem = 'stated'): string {
  const unit = shownUnit(range.unit, system)
  const number = (value: number) => {
    const shown = convert({ value, unit: range.unit }, unit).value
    return formatNumber(shown, unit === range.unit ? Math.max(decimalsFor(shown), statedDecimals(value)) : decimalsFor(shown))
  }
  const before = unit === 'CSP' ? 'CSP ' : unit === 'USD' ? '$' : ''
  const after = unit === 'USD' ? '' : spaced(unit)
  const { min, max } = range
  if (min !== undefined && max !== undefined) return `${before}${min === max ? number(min) : `${number(min)}–${number(max)}`}${after}`
  return min !== undefined ? `at least ${before}${number(min)}${after}` : `at most ${before}${number(max ?? 0)}${after}`
}

/** Decimals a value was written with, up to four: 7.692 keeps three, a computed 10.694444… is not stretched. */
function statedDecimals(value: number): number {
  const [, decimals = ''] = String(value).split('.')
  return decimals.length <= 3 ? decimals.length : 0
}

/** A window: "9–24 h", "from 9 h, no latest stated", "within 24 h, no earliest stated". */
export function formatWindow(range: Range, system: ShownSystem = 'stated'): string {
  if (range.min !== undefined && range.max !== undefined) return formatRange(range, system)
  const end = formatRange({ ...range, min: range.min ?? range.max, max: range.max ?? range.min }, system)
  return range.min !== undefined ? `from ${end}, latest not stated` : `within ${end}, earliest not stated`
}

/** "2 : 1 by volume"; a ratio without basis says so. */
export function formatRatio({ parts, basis }: Ratio): string {
  return `${parts.map((part) => formatNumber(part, 3)).join(' : ')} ${basis ? `by ${basis}` : '(basis not stated)'}`
}

/** "at 70 °F, 1 gal", or nothing. */
export function formatConditions(at: ValueConditions | undefined, system: ShownSystem = 'stated'): string {
  if (!at) return ''
  const quantities = [at.temperature, at.mass, at.volume, at.relativeHumidity, at.film].filter((one) => one !== undefined)
  const shown = quantities.map(({ value, unit }) => formatRange({ min: value, max: value, unit }, system) + (one(at.relativeHumidity, value, unit) ? ' RH' : ''))
  return [...shown.length > 0 ? [`at ${shown.join(', ')}`] : [], ...(at.next ? [`before ${at.next}`] : [])].join(', ')
}

const one = (quantity: { value: number; unit: Unit } | undefined, value: number, unit: Unit) => quantity?.value === value && quantity.unit === unit

/** The value of a fact in words, without its conditions. */
export function formatValue(fact: Pick<Fact, 'property' | 'value'> & Partial<Fact>, system: ShownSystem = 'stated'): string {
  const { value } = fact
  if ('parts' in value) return formatRatio(value)
  if ('codes' in value) return codesOf(fact as Fact).join(', ')
  if ('text' in value) return value.text
  if ('date' in value) return value.date
  if ('is' in value) return flagOf(fact as Fact) ? 'yes' : 'no'
  if ('name' in value) return formatSubstance(fact as Fact)
  const text = fact.property === 'recoatWindow' ? formatWindow(value, system) : formatRange(value, system)
  return [text, fact.film, fact.of && `(${fact.of})`, fact.thinned && 'thinned'].filter(Boolean).join(' ')
}

function formatSubstance(fact: Fact): string {
  const substance = substanceOf(fact)
  if (!substance) return notStatedText
  const { name, cas, min, max } = substance
  const share = min !== undefined && max !== undefined ? `${formatNumber(min)}–${formatNumber(max)} %` : max !== undefined ? `at most ${formatNumber(max)} %` : min !== undefined ? `at least ${formatNumber(min)} %` : 'share not stated'
  return `${name}${cas ? ` (${cas})` : ''}, ${share}`
}

/** A figure in words: its range, or "not stated". */
export function formatFigure(figure: Figure, system: ShownSystem = 'stated'): string {
  return figure.kind === 'not-stated' ? notStatedText : formatRange(figure.value, system)
}
