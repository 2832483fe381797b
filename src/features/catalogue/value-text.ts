import type { Fact } from '../../../shared/domain/fact.ts'
import { type Property, definitionOf } from '../../../shared/domain/property.ts'
import { type Unit, unitsOf } from '../../../shared/domain/units.ts'
import { numberOf } from '../../ui/number-field.tsx'

/** What stands in the inputs of the value form: text as typed, by field. Kept while the page of the sheet is open. */
export interface ValueDraft {
  property: Property
  part: 'mixed' | 'A' | 'B' | 'C'
  min: string
  max: string
  unit: string
  text: string
  basis: string
  cas: string
  is: string
  temperature: string
  temperatureUnit: string
  mass: string
  massUnit: string
  volume: string
  volumeUnit: string
  film: string
  filmUnit: string
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

/** Parts of a ratio from "2:1", "2 : 1" or "100 to 43.4"; what is no number gives none. */
export function ratioFrom(text: string): number[] {
  const parts = text.split(/\s*(?::|to|\/)\s*/).map((part) => numberOf(part))
  return parts.every((part): part is number => typeof part === 'number') ? parts : []
}

const number = (text: string): number | undefined => {
  const value = numberOf(text)
  return value === null ? undefined : value === undefined ? Number.NaN : value
}

/** The units a value of a property may have. */
export function unitsFor(property: Property): Unit[] {
  return (definitionOf(property).dimensions ?? []).flatMap((dimension) => unitsOf(dimension) as Unit[])
}

function valueOf(draft: ValueDraft): unknown {
  const range = () => {
    const [min, max] = [number(draft.min), number(draft.max)]
    return { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }) }
  }
  switch (definitionOf(draft.property).form) {
    case 'quantity':
    case 'window':
      return { ...range(), unit: draft.unit }
    case 'ratio':
      return { parts: ratioFrom(draft.text), ...(draft.basis ? { basis: draft.basis } : {}) }
    case 'codes':
      return { codes: draft.text.split(/[\s,;]+/).filter(Boolean) }
    case 'substance':
      return { name: draft.text, ...(draft.cas ? { cas: draft.cas } : {}), ...range(), unit: '%' }
    case 'date':
      return { date: draft.text.trim() }
    case 'flag':
      return { is: draft.is === 'yes' }
    case 'text':
      return { text: draft.text }
  }
}

function conditionsOf(draft: ValueDraft) {
  const one = (text: string, unit: string) => {
    const value = number(text)
    return value === undefined ? undefined : { value, unit }
  }
  const at = {
    temperature: one(draft.temperature, draft.temperatureUnit), mass: one(draft.mass, draft.massUnit), volume: one(draft.volume, draft.volumeUnit), film: one(draft.film, draft.filmUnit),
    next: draft.next.trim() || undefined,
  }
  const given = Object.fromEntries(Object.entries(at).filter(([, value]) => value !== undefined))
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

const written = (value: number | undefined) => (value === undefined ? '' : String(value))

/** What the inputs begin with: empty, or what a value says. */
export function draftOf(property: Property, fact?: Fact): ValueDraft {
  const blank: ValueDraft = {
    property, part: 'mixed', min: '', max: '', unit: unitsFor(property)[0] ?? '', text: '', basis: 'volume', cas: '', is: 'yes', temperature: '', temperatureUnit: '°F', mass: '', massUnit: 'g',
    volume: '', volumeUnit: 'gal', film: '', filmUnit: 'mil', next: '', wetOrDry: '', of: '', thinned: '', how: 'entered', reason: '', revisionId: '', page: '1', box: '', quote: '',
  }
  if (!fact) return blank
  const { value, at, origin } = fact
  return {
    ...blank,
    part: fact.part,
    ...('unit' in value ? { min: written(value.min), max: written(value.max), unit: value.unit } : {}),
    ...('parts' in value ? { text: value.parts.join(' : '), basis: value.basis ?? '' } : {}),
    ...('codes' in value ? { text: value.codes.join(', ') } : {}),
    ...('name' in value ? { text: value.name, cas: value.cas ?? '' } : {}),
    ...('text' in value ? { text: value.text } : {}),
    ...('date' in value ? { text: value.date } : {}),
    ...('is' in value ? { is: value.is ? 'yes' : 'no' } : {}),
    ...(at?.temperature ? { temperature: written(at.temperature.value), temperatureUnit: at.temperature.unit } : {}),
    ...(at?.mass ? { mass: written(at.mass.value), massUnit: at.mass.unit } : {}),
    ...(at?.volume ? { volume: written(at.volume.value), volumeUnit: at.volume.unit } : {}),
    ...(at?.film ? { film: written(at.film.value), filmUnit: at.film.unit } : {}),
    next: at?.next ?? '',
    wetOrDry: fact.film ?? '',
    of: fact.of ?? '',
    thinned: fact.thinned ? 'yes' : '',
    ...(origin.kind === 'stated'
      ? { how: 'stated' as const, revisionId: origin.citation.revisionId, page: String(origin.citation.page), box: origin.citation.box?.join(',') ?? '', quote: origin.citation.quote ?? '' }
      : { how: 'entered' as const, reason: origin.kind === 'entered' ? origin.reason : '' }),
  }
}
