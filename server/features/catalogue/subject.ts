/** Who writes; null for what the system fills in by itself. */
export interface Writer {
  id: string | null
  name: string
}

/** What a value is said of: one product or one mix. */
export type Subject = { productId: string; mixId: null } | { productId: null; mixId: string }

export const ofProduct = (productId: string): Subject => ({ productId, mixId: null })
export const ofMix = (mixId: string): Subject => ({ productId: null, mixId })

/** The record that a row of the audit trail names. */
export const recordOf = (subject: Subject) =>
  subject.productId === null ? { kind: 'mix', id: subject.mixId } : { kind: 'product', id: subject.productId }
