import type { Fact } from '../../../shared/domain/fact.ts'
import { type Property, definitionOf } from '../../../shared/domain/property.ts'
import { conditionDimensions } from '../../../shared/domain/statement.ts'
import { type Unit, unitsOf } from '../../../shared/domain/units.ts'
import { numberOf } from '../../ui/number-field.tsx'

export type ConditionName = keyof typeof conditionDimensions
export const conditionNames = Object.keys(conditionDimensions) as ConditionName[]

/** How a range is said: one figure, between two, or with one end alone. */
export type Saying = 'one' | 'between' | 'least' | 'most'

/** What stands in the inputs of the value form: text as typed, by field. Kept while the page of the sheet is open. */
export interface ValueDraft {
  property: Property
  part: Fact['part']
  saying: Saying
  min: string
  max: string
  unit: string
  text: string
  basis: string
  cas: string
  is: string
  at: Record<ConditionName, { value: string; unit: string }>
  next: string
  wetOrDry: string
  of: string
  thinned: string
  how: 'stated' | 'entered'
  reason: string
  revisionId: string
  page: string
  box: string
  quote: string
}

/** Parts of a ratio from "2:1", "2 : 1" or "100 to 43.4"; what is no number is NaN. */
export function ratioFrom(text: string): number[] {
  if (text.trim() === '') return []
  return text.split(/\s*(?::|to|\/)\s*/).map((part) => numberOf(part) ?? Number.NaN)
}

/** Undefined when empty, NaN when it is no number, which the request's schema then says. */
const number = (text: string): number | undefined => {
  const value = numberOf(text)
  return value === null ? undefined : (value ?? Number.NaN)
}

/** The units a value of a property may have. */
export function unitsFor(property: Property): Unit[] {
  return (definitionOf(property).dimensions ?? []).flatMap((dimension) => unitsOf(dimension) as Unit[])
}

/** The first unit offered: the one that sheets of the trade print most. */
const usual: Partial<Record<Property, Unit>> = {
  density: 'lb/gal',
  voc: 'g/L',
  packSize: 'gal',
  potLife: 'min',
  workingTime: 'min',
  inductionTime: 'min',
  recoatWindow: 'h',
  tackFree: 'h',
  footTraffic: 'h',
  vehicleTraffic: 'h',
  fullCure: 'd',
  filmThickness: 'mil',
  spreadRate: 'ft²/gal',
  consumption: 'lb/ft²',
  applicationTemperature: '°F',
  storageTemperature: '°F',
  flashPoint: '°F',
  dewPointMargin: 'Δ°F',
  pullOffStrength: 'psi',
}
/** How sheets mostly say it: limits as bounds, working ranges from – to. */
const usualSaying: Partial<Record<Property, Saying>> = {
  recoatWindow: 'between',
  ingredient: 'between',
  filmThickness: 'between',
  applicationTemperature: 'between',
  storageTemperature: 'between',
  surfaceProfile: 'between',
  spreadRate: 'between',
  voc: 'most',
  maxRelativeHumidity: 'most',
  substrateRelativeHumidity: 'most',
  moistureEmission: 'most',
  dewPointMargin: 'least',
  pullOffStrength: 'least',
}
const usualOf: Record<ConditionName, Unit> = { temperature: '°F', mass: 'g', volume: 'gal', relativeHumidity: '%', film: 'mil' }

function rangeOf({ saying, min, max }: ValueDraft) {
  const [low, high] = [number(min), number(max)]
  const ends = { one: [low, low], between: [low, high], least: [low, undefined], most: [undefined, high] }[saying]
  return { ...(ends[0] === undefined ? {} : { min: ends[0] }), ...(ends[1] === undefined ? {} : { max: ends[1] }) }
}

function valueOf(draft: ValueDraft): unknown {
  switch (definitionOf(draft.property).form) {
    case 'quantity':
    case 'window':
      return { ...rangeOf(draft), unit: draft.unit }
    case 'ratio':
      return { parts: ratioFrom(draft.text), ...(draft.basis ? { basis: draft.basis } : {}) }
    case 'codes':
      return { codes: codesFrom(draft.text) }
    case 'substance':
      return { name: draft.text, ...(draft.cas ? { cas: draft.cas } : {}), ...rangeOf(draft), unit: '%' }
    case 'date':
      return { date: draft.text.trim() }
    case 'flag':
      return { is: draft.is === 'yes' }
    case 'text':
      return { text: draft.text }
  }
}

/** Codes from a line of them. The first letters are made capitals; those after the digits tell classes apart by their case (H360Fd, H350i) and stay. */
export function codesFrom(text: string): string[] {
  const codes = text
    .replace(/\s*\+\s*/g, '+')
    .split(/[\s,;]+/)
    .filter(Boolean)
  return codes.map((code) => code.replace(/(^|\+)[a-z]+/gi, (letters) => letters.toUpperCase()))
}

function conditionsOf({ at, next }: ValueDraft) {
  const given: Record<string, unknown> = {}
  for (const name of conditionNames) {
    const value = number(at[name].value)
    if (value !== undefined) given[name] = { value, unit: at[name].unit }
  }
  if (next.trim()) given['next'] = next.trim()
  return Object.keys(given).length > 0 ? { at: given } : {}
}

/** The request's body of what was typed; the request's own schema says what is wrong with it. */
export function bodyOfDraft(draft: ValueDraft): unknown {
  const statement = {
    property: draft.property,
    part: draft.part,
    value: valueOf(draft),
    ...conditionsOf(draft),
    ...(draft.wetOrDry ? { film: draft.wetOrDry } : {}),
    ...(draft.of ? { of: draft.of } : {}),
    ...(draft.thinned === 'yes' ? { thinned: true } : {}),
  }
  const box = draft.box ? draft.box.split(',').map(Number) : null
  const how =
    draft.how === 'stated'
      ? { kind: 'stated', revisionId: draft.revisionId, page: Number(draft.page), box, quote: draft.quote.trim() || null }
      : { kind: 'entered', reason: draft.reason }
  return { statement, how }
}

/** Problems under the names of the inputs they are shown at. */
export function valueFields(fields: Record<string, string>): Record<string, string> {
  const at = (address: string) => {
    if (/^statement\.value\.(unit|max|basis|cas)$/.test(address)) return address
    if (address.startsWith('statement.value')) return 'statement.value'
    const condition = /^statement\.at\.(\w+)/.exec(address)?.[1]
    if (condition) return condition === 'next' ? 'statement.at.next' : `statement.at.${condition}.value`
    return address === 'how.box' ? 'how.page' : address
  }
  const shown: Record<string, string> = {}
  for (const [address, message] of Object.entries(fields)) shown[at(address)] ??= message
  return shown
}

const written = (value: number | undefined) => (value === undefined ? '' : String(value))

function sayingOf(min: number | undefined, max: number | undefined): Saying {
  if (min === undefined) return 'most'
  if (max === undefined) return 'least'
  return min === max ? 'one' : 'between'
}

const blankConditions = () =>
  Object.fromEntries(conditionNames.map((name) => [name, { value: '', unit: usualOf[name] }])) as ValueDraft['at']

/** What the inputs begin with: empty, or what a value says. */
export function draftOf(property: Property, fact?: Fact): ValueDraft {
  const blank: ValueDraft = {
    property,
    part: 'mixed',
    saying: usualSaying[property] ?? 'one',
    min: '',
    max: '',
    unit: usual[property] ?? unitsFor(property)[0] ?? '',
    text: '',
    basis: 'volume',
    cas: '',
    is: 'yes',
    at: blankConditions(),
    next: '',
    wetOrDry: '',
    of: '',
    thinned: '',
    how: 'entered',
    reason: '',
    revisionId: '',
    page: '1',
    box: '',
    quote: '',
  }
  if (!fact) return blank
  const { value, at, origin } = fact
  const conditions = blankConditions()
  for (const name of conditionNames) {
    const given = at?.[name]
    if (given) conditions[name] = { value: written(given.value), unit: given.unit }
  }
  return {
    ...blank,
    part: fact.part,
    ...('unit' in value
      ? {
          saying: 'name' in value && value.min === undefined && value.max === undefined ? 'between' : sayingOf(value.min, value.max),
          min: written(value.min),
          max: written(value.max),
          unit: value.unit,
        }
      : {}),
    ...('parts' in value ? { text: value.parts.join(' : '), basis: value.basis ?? '' } : {}),
    ...('codes' in value ? { text: value.codes.join(', ') } : {}),
    ...('name' in value ? { text: value.name, cas: value.cas ?? '' } : {}),
    ...('text' in value ? { text: value.text } : {}),
    ...('date' in value ? { text: value.date } : {}),
    ...('is' in value ? { is: value.is ? 'yes' : 'no' } : {}),
    at: conditions,
    next: at?.next ?? '',
    wetOrDry: fact.film ?? '',
    of: fact.of ?? '',
    thinned: fact.thinned ? 'yes' : '',
    ...(origin.kind === 'stated'
      ? {
          how: 'stated' as const,
          revisionId: origin.citation.revisionId,
          page: String(origin.citation.page),
          box: origin.citation.box?.join(',') ?? '',
          quote: origin.citation.quote ?? '',
        }
      : { how: 'entered' as const, reason: origin.kind === 'entered' ? origin.reason : '' }),
  }
}
