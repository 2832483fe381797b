import type { MixRecord } from '../../../shared/api/catalogue.ts'
import { formatNumber } from '../../../shared/domain/format.ts'
import type { ComponentPart } from '../../../shared/domain/mix.ts'
import type { Chosen } from './product-picker.tsx'
import { ratioFrom } from './value-text.ts'

/** What stands in the form of a mix, as typed. */
export interface MixDraft {
  name: string
  maker: string
  chemistry: string
  color: string
  note: string
  parts: (Chosen | null)[]
  /** Of a new mix of several parts: its ratio, or that nobody knows it yet. */
  ratioKnown: boolean
  ratio: string
  basis: string
  reason: string
}

export interface MixFormPart {
  draft: MixDraft
  change: (part: Partial<MixDraft>) => void
  fields: Record<string, string>
}

export const partNames = ['A', 'B', 'C'] as const satisfies readonly ComponentPart[]

export function draftOfMix(mix: MixRecord | undefined): MixDraft {
  const ratio = { ratioKnown: true, ratio: '', basis: 'volume', reason: '' }
  if (!mix) return { name: '', maker: '', chemistry: 'epoxy', color: '#8f9a98', note: '', parts: [null, null], ...ratio }
  const { name, maker, chemistry, color, note } = mix
  return {
    name,
    maker,
    chemistry,
    color,
    note,
    parts: mix.parts.map(({ product }) => ({ id: product.id, name: product.name, maker: product.maker })),
    ...ratio,
  }
}

/** The request's body of what was typed; the request's own schema says what is wrong with it. */
export function bodyOfMix({ parts, ratioKnown, ratio, basis, reason, ...plain }: MixDraft, isNew: boolean): unknown {
  const named = parts.map((part, index) => ({ part: partNames[index], productId: part?.id ?? '' }))
  const given = parts.length > 1 && ratioKnown ? { value: { parts: ratioFrom(ratio), ...(basis ? { basis } : {}) }, reason } : null
  return {
    name: plain.name,
    maker: plain.maker,
    chemistry: plain.chemistry,
    color: plain.color,
    note: plain.note,
    parts: named,
    ...(isNew ? { ratio: given } : {}),
  }
}

/** Problems under the names of the inputs they are shown at. */
export function mixFields(fields: Record<string, string>): Record<string, string> {
  const at = (address: string) => {
    if (/^parts\.\d\.productId$/.test(address)) return address
    if (address.startsWith('ratio.value.parts') || address === 'ratio.value' || address === 'ratio') return 'ratio.value.parts'
    return address
  }
  const chosen = (address: string, message: string) =>
    /^parts\.\d\.productId$/.test(address) && /uuid/i.test(message) ? 'Choose a product.' : message
  return Object.fromEntries(Object.entries(fields).map(([address, message]) => [at(address), chosen(address, message)]))
}

const partsInWords = (parts: MixDraft['parts']) =>
  parts.map((part, index) => `${partNames[index] ?? ''} ${part?.name ?? 'not chosen'}`).join('; ')

const labels = { name: 'Name', maker: 'Maker', chemistry: 'Chemistry', color: 'Colour it cures to', note: 'Note' } as const

/** Where a record as saved and a draft differ, in words; what was not changed here is null. */
export function mixDifferences(began: MixDraft, { mine, theirs }: { mine: MixDraft; theirs: MixDraft }) {
  const inWords = (draft: MixDraft) => [
    ...(Object.keys(labels) as (keyof typeof labels)[]).map((name) => draft[name]),
    partsInWords(draft.parts),
  ]
  const [before, typed, saved] = [inWords(began), inWords(mine), inWords(theirs)]
  return [...Object.values(labels), 'Parts']
    .map((label, index) => ({
      label,
      theirs: saved[index] ?? '',
      mine: typed[index] === before[index] ? null : (typed[index] ?? ''),
      same: saved[index] === typed[index],
    }))
    .filter(({ same }) => !same)
}

/** Values that go when a mix gets another number of parts: ratios of another length, values of parts that are gone. */
export function lostWith(mix: MixRecord | undefined, parts: number): string[] {
  const kept: string[] = ['mixed', ...partNames.slice(0, parts)]
  return (mix?.facts ?? []).flatMap(({ part, value, property }) => {
    if ('parts' in value && value.parts.length !== parts) return [`the ratio ${value.parts.map((one) => formatNumber(one, 3)).join(' : ')}`]
    return kept.includes(part) ? [] : [`${property === 'density' ? 'the density' : 'a value'} of part ${part}`]
  })
}
