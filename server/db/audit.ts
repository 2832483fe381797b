import type { Transaction } from './open.ts'
import { auditTrail } from './schema/firm.ts'

export interface Change {
  /** Null for what the system does by itself. */
  personId: string | null
  action: string
  subject: { kind: string; id: string }
  from?: unknown
  to?: unknown
}

/** Writes who changed what, from what, to what. Called in the transaction of the change, never outside one. */
export async function recordChange(tx: Transaction, { personId, action, subject, from, to }: Change): Promise<void> {
  await tx
    .insert(auditTrail)
    .values({ personId, action, subjectKind: subject.kind, subjectId: subject.id, from: from ?? null, to: to ?? null })
}
