import { type Fact, factSchema } from '../../../shared/domain/fact.ts'
import { formatConditions, formatValue } from '../../../shared/domain/format.ts'
import { properties } from '../../../shared/domain/property.ts'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'

interface Change {
  action: string
  from?: unknown
  to?: unknown
}

/** A change in words: what was done, and each thing that changed with what it was before. */
export interface ChangeWords {
  did: string
  lines: { label: string; from: string | null; to: string | null }[]
}

const fieldNames: Record<string, string> = {
  name: 'Name',
  maker: 'Maker',
  kind: 'Kind',
  chemistry: 'Chemistry',
  note: 'Note',
  color: 'Colour',
  parts: 'Parts',
}
const did: Record<string, string> = {
  added: 'added this record',
  changed: 'changed',
  withdrawn: 'withdrew this record',
  restored: 'restored this record',
  'value-set': 'set a value',
  'value-amended': 'amended a value',
  'value-removed': 'removed a value',
  'values-set': 'read in values',
}

const asFact = (value: unknown): Fact | undefined => {
  const parsed = factSchema.safeParse(value)
  return parsed.success ? parsed.data : undefined
}

function knownHow({ origin }: Fact): string {
  if (origin.kind === 'stated')
    return `${origin.citation.sheetTitle}, ${writtenDate(origin.citation.revisionDate)}, page ${origin.citation.page}`
  return origin.kind === 'entered' ? `entered: ${origin.reason}` : `typical: ${origin.source}`
}

const told = (fact: Fact | undefined) =>
  fact ? `${[formatValue(fact), formatConditions(fact.at)].filter(Boolean).join(' ')} (${knownHow(fact)})` : null

function asText(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'empty'
  if (typeof value === 'string' || typeof value === 'number') return String(value)
  return Array.isArray(value) ? `${value.length} of them` : JSON.stringify(value)
}

function factLines(from: unknown, to: unknown): ChangeWords['lines'] | undefined {
  const [before, after] = [asFact(from), asFact(to)]
  const fact = after ?? before
  if (!fact) return undefined
  const part = fact.part === 'mixed' ? '' : ` of part ${fact.part}`
  return [{ label: `${properties[fact.property].label}${part}`, from: told(before), to: told(after) }]
}

/** A row of the trail of a product or a mix in words. */
export function changeWords({ action, from, to }: Change): ChangeWords {
  const said = did[action] ?? action.replaceAll('-', ' ')
  const lines = factLines(from, to)
  if (lines) return { did: said, lines }
  if (action === 'values-set') {
    const count = (to as { values?: unknown } | null)?.values
    return { did: count === 1 ? 'read in one value' : `read in ${asText(count)} values`, lines: [] }
  }
  if (action !== 'changed') return { did: said, lines: [] }
  const before = (from ?? {}) as Record<string, unknown>
  const after = (to ?? {}) as Record<string, unknown>
  return {
    did: said,
    lines: Object.keys(after).map((key) => ({ label: fieldNames[key] ?? key, from: asText(before[key]), to: asText(after[key]) })),
  }
}
