import type { ValueDraft } from './value-text.ts'

/** What each group of inputs of the value form is given. */
export interface DraftPart {
  draft: ValueDraft
  change: (part: Partial<ValueDraft>) => void
  fields: Record<string, string>
}
