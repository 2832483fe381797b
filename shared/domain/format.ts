import { type Fact, codesOf, substanceOf } from './fact.ts'
import type { Figure } from './figure.ts'
import type { Property, Range, Ratio, Substance, ValueConditions } from './property.ts'
import { decimalsFor, roundHalfEven } from './rounding.ts'
import { type Dimension, type Quantity, type Unit, convert, dimensionOf } from './units.ts'

export const notStatedText = 'not stated'
export type ShownSystem = 'stated' | 'us' | 'si'

/** US units with the SI unit that people of the trade use for the same thing. What both systems use (hours, per cent, mPa·s) is not here. */
const siOf: Partial<Record<Unit, Unit>> = {
  mil: 'µm',
  in: 'mm',
  ft: 'm',
  'ft²': 'm²',
  gal: 'L',
  'in³': 'mL',
  lb: 'kg',
  oz: 'g',
  'lb/gal': 'kg/L',
  'lb/ft³': 'kg/L',
  'ft²/gal': 'm²/L',
  'lb/ft²': 'kg/m²',
  '°F': '°C',
  'Δ°F': 'Δ°C',
  psi: 'MPa',
  lbf: 'N',
  'lb/1000 ft²·24 h': 'g/m²·24 h',
}
const usOf: Partial<Record<Unit, Unit>> = {
  µm: 'mil',
  mm: 'in',
  m: 'ft',
  'm²': 'ft²',
  L: 'gal',
  mL: 'in³',
  'm³': 'gal',
  kg: 'lb',
  g: 'oz',
  'kg/L': 'lb/gal',
  'g/cm³': 'lb/gal',
  'g/L': 'lb/gal',
  'm²/L': 'ft²/gal',
  'kg/m²': 'lb/ft²',
  'g/m²': 'lb/ft²',
  '°C': '°F',
  'Δ°C': 'Δ°F',
  MPa: 'psi',
  N: 'lbf',
  kN: 'lbf',
  'g/m²·24 h': 'lb/1000 ft²·24 h',
}

/** The unit's counterpart in the other system, or undefined where both systems share it. A VOC content is told in g/L, a density in kg/L. */
export function counterpartOf(unit: Unit, property?: Property): Unit | undefined {
  if (property === 'voc' && unit === 'lb/gal') return 'g/L'
  return siOf[unit] ?? usOf[unit]
}

/** The unit to show a value in: as stated, or of the system asked for. */
export function shownUnit(unit: Unit, system: ShownSystem, property?: Property): Unit {
  if (system === 'stated') return unit
  const belongs = system === 'us' ? !(unit in usOf) : !(unit in siOf)
  return belongs ? unit : (counterpartOf(unit, property) ?? unit)
}

/** Made once each: a build-up is worked out on every keystroke. */
const writers = Array.from({ length: 13 }, (_, maximumFractionDigits) => new Intl.NumberFormat('en-US', { maximumFractionDigits }))
const cents = new Intl.NumberFormat('en-US', { minimumFractionDigits: 2, maximumFractionDigits: 2 })

/** What `Intl.NumberFormat('en-US')` writes for a number that is rounded already, several times as fast. */
function written(rounded: number): string {
  const size = Math.abs(rounded)
  const text = String(size)
  const [whole = '', fraction] = size < 1000 ? [text] : text.split('.')
  const grouped = size < 1000 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, ',')
  return `${rounded < 0 ? '−' : ''}${grouped}${fraction ? `.${fraction}` : ''}`
}

/** A number as people write it: thousands with commas, no trailing zeros that mean nothing, a minus that is one. At most twelve decimals. */
export function formatNumber(value: number, decimals = decimalsFor(value)): string {
  const rounded = roundHalfEven(value, decimals)
  const size = Math.abs(rounded)
  if (size === 0 || (size >= 1e-6 && size * 10 ** decimals < 1e15)) return written(rounded)
  const text = writers[decimals]?.format(rounded) ?? String(value)
  return text.replace('-', '−')
}

/** `Δ` tells differences from degrees in types; people read °F. */
export const unitText = (unit: Unit) => unit.replace('Δ', '')

/** Decimals that a value worked out or converted is worth: no thermometer on a floor reads hundredths. */
const mostDecimals: Partial<Record<Dimension, number>> = { temperature: 1, temperatureDifference: 1, fraction: 1, profile: 1 }

/** Decimals a value was written with, up to three: 7.692 keeps them, a computed 10.694444… is not stretched. */
function writtenDecimals(value: number): number {
  const [, decimals = ''] = String(value).split('.')
  return decimals.length <= 3 ? decimals.length : 0
}

function shownNumber(value: number, { from, to }: { from: Unit; to: Unit }): string {
  if (to === 'USD') return Number.isInteger(value) ? formatNumber(value, 0) : cents.format(roundHalfEven(value, 2))
  const shown = convert({ value, unit: from }, to).value
  const decimals = Math.min(decimalsFor(shown), mostDecimals[dimensionOf(to)] ?? 4)
  return formatNumber(shown, from === to ? Math.max(decimals, writtenDecimals(value)) : decimals)
}

const affixes = (unit: Unit): [string, string] => (unit === 'USD' ? ['$', ''] : unit === 'CSP' ? ['CSP ', ''] : ['', ` ${unitText(unit)}`])
/** "month" is a word and takes its plural; the other units are symbols. */
const plural = (after: string, value: number | undefined) => (/ (month|week)$/.test(after) && value !== 1 ? `${after}s` : after)

/** "25–30 min", "≥ 5 °F", "≤ 85 %", "10.7 mil", "−26 to 38 °C"; a profile reads "CSP 3–5". In the unit stated, or of a system. */
export function formatRange(range: Range, system: ShownSystem = 'stated', property?: Property): string {
  const { min, max, unit: from } = range
  const to = shownUnit(from, system, property)
  const [before, after] = affixes(to)
  const number = (value: number) => shownNumber(value, { from, to })
  const end = plural(after, max ?? min)
  if (min === undefined || max === undefined) return `${min === undefined ? '≤' : '≥'} ${before}${number(min ?? max ?? Number.NaN)}${end}`
  const [low, high] = [number(min), number(max)]
  if (low === high) return `${before}${low}${end}`
  return `${before}${low}${min < 0 || low.startsWith('−') ? ' to ' : '–'}${high}${end}`
}

/** The stated unit first and the other system's beside it: "10.7 mil (272 µm)"; alone where both systems share the unit. */
export function formatBoth(range: Range, property?: Property): string {
  const other = counterpartOf(range.unit, property)
  const stated = formatRange(range)
  if (!other) return stated
  return `${stated} (${formatRange(range, range.unit in siOf ? 'si' : 'us', property)})`
}

/** One quantity in words. */
export function formatQuantity({ value, unit }: Quantity, system: ShownSystem = 'stated'): string {
  return formatRange({ min: value, max: value, unit }, system)
}

/** A window: "9–24 h", "from 9 h, latest not stated", "within 24 h, earliest not stated". */
export function formatWindow(range: Range, system: ShownSystem = 'stated'): string {
  if (range.min !== undefined && range.max !== undefined) return formatRange(range, system)
  const end = formatQuantity({ value: range.min ?? range.max ?? Number.NaN, unit: range.unit }, system)
  return range.min !== undefined ? `from ${end}, latest not stated` : `within ${end}, earliest not stated`
}

/** "2 : 1 by volume"; a ratio without basis says so. */
function formatRatio({ parts, basis }: Ratio): string {
  return `${parts.map((part) => formatNumber(part, 3)).join(' : ')} ${basis ? `by ${basis}` : '(basis not stated)'}`
}

/** "at 70 °F, 1 gal, 50 % RH, before Corbel Seal", or nothing. */
export function formatConditions(at: ValueConditions | undefined, system: ShownSystem = 'stated'): string {
  if (!at) return ''
  const shown = [at.temperature, at.mass, at.volume, at.film].flatMap((one) => (one ? formatQuantity(one, system) : []))
  if (at.relativeHumidity) shown.push(`${formatQuantity(at.relativeHumidity, system)} RH`)
  return [...(shown.length > 0 ? [`at ${shown.join(', ')}`] : []), ...(at.next ? [`before ${at.next}`] : [])].join(', ')
}

/** The value of a fact in words, without its conditions. */
export function formatValue(fact: Pick<Fact, 'property' | 'value'> & Partial<Fact>, system: ShownSystem = 'stated'): string {
  const { value, property } = fact
  if ('parts' in value) return formatRatio(value)
  if ('codes' in value) return codesOf(fact as Fact).join(', ')
  if ('text' in value) return value.text
  if ('date' in value) return value.date
  if ('is' in value) return value.is ? 'yes' : 'no'
  const substance = substanceOf(fact as Fact)
  if (substance) return formatSubstance(substance)
  const text = property === 'recoatWindow' ? formatWindow(value, system) : formatRange(value, system, property)
  return [text, fact.film, fact.of && `(${fact.of})`, fact.thinned && 'thinned'].filter(Boolean).join(' ')
}

/** "Benzyl alcohol (100-51-6), 10–30 %". */
function formatSubstance({ name, cas, min, max, unit }: Substance): string {
  const ends = { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }) }
  const share = min === undefined && max === undefined ? 'share not stated' : formatRange({ ...ends, unit })
  return `${name}${cas ? ` (${cas})` : ''}, ${share}`
}

/** A figure in words: its range, or "not stated". */
export function formatFigure(figure: Figure, system: ShownSystem = 'stated'): string {
  return figure.kind === 'not-stated' ? notStatedText : formatRange(figure.value, system)
}

/** A window's figure in words: an end that is missing is said to be. */
export function formatWindowFigure(figure: Figure, system: ShownSystem = 'stated'): string {
  return figure.kind === 'not-stated' ? notStatedText : formatWindow(figure.value, system)
}
