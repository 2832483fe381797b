import { and, desc, eq, inArray, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { SheetKind } from '../../../shared/domain/sheet.ts'
import { recordChange } from '../../db/audit.ts'
import type { Transaction } from '../../db/open.ts'
import { mixes, products, sheetSubjects } from '../../db/schema/catalogue.ts'
import { type PlacedText, sheetPages, sheetRevisions, sheets } from '../../db/schema/sheets.ts'

/** What a sheet speaks of: one product or one mix. */
export type SheetSubject = { productId: string } | { mixId: string }

export interface SheetDetails {
  kind: SheetKind
  title: string
  maker: string
  subjects: readonly SheetSubject[]
}

export interface NewRevision {
  sheetId: string
  /** Of the file, which the store has taken over by the end of the transaction. */
  sha256: string
  bytes: number
  fileName: string
  /** ISO, as far as stated; null when no date is known. */
  revisionDate: string | null
  pages: readonly { width: number; height: number; rotation: number; text: string; words: PlacedText[] }[]
  uploadedBy: string | null
  /** ISO instant; now unless given. */
  uploadedAt?: string
}

/** Makes a sheet that has no revision yet; `addRevision` follows in the same transaction. */
export async function addSheet(tx: Transaction, { subjects, ...details }: SheetDetails, by: string | null): Promise<string> {
  const [row] = await tx.insert(sheets).values(details).returning({ id: sheets.id })
  if (!row) throw new AppError('unavailable')
  await setSubjects(tx, row.id, subjects)
  await recordChange(tx, { personId: by, action: 'added', subject: { kind: 'sheet', id: row.id }, to: { ...details, subjects } })
  return row.id
}

/**
 * Adds a PDF to a sheet as its newest revision, with the words of its pages.
 * @throws AppError `duplicate` when the same bytes are here already, `not-found` without the sheet.
 */
export async function addRevision(tx: Transaction, { pages, ...revision }: NewRevision): Promise<string> {
  const [sheet] = await tx.select({ id: sheets.id }).from(sheets).where(eq(sheets.id, revision.sheetId)).for('update')
  if (!sheet) throw new AppError('not-found')
  const state = pages.some((page) => page.words.length > 0) ? 'ready' : 'no-text'
  const [row] = await tx
    .insert(sheetRevisions)
    .values({
      ...revision, state, pages: pages.length,
      sequence: sql`(select coalesce(max(${sheetRevisions.sequence}), 0) + 1 from ${sheetRevisions} where ${sheetRevisions.sheetId} = ${revision.sheetId})`,
    })
    .onConflictDoNothing({ target: sheetRevisions.sha256 })
    .returning({ id: sheetRevisions.id })
  if (!row) throw new AppError('duplicate', { message: 'This file is already here.' })
  const rows = pages.map((page, index) => ({ ...page, revisionId: row.id, page: index + 1 }))
  for (let from = 0; from < rows.length; from += 50) await tx.insert(sheetPages).values(rows.slice(from, from + 50))
  await refreshSearchText(tx, revision.sheetId)
  await recordChange(tx, {
    personId: revision.uploadedBy, action: 'revision-added', subject: { kind: 'sheet', id: revision.sheetId },
    to: { revisionId: row.id, fileName: revision.fileName, sha256: revision.sha256, revisionDate: revision.revisionDate, pages: pages.length, state },
  })
  return row.id
}

/** Puts a sheet's products and mixes in place of those it had. @throws AppError naming the field of one that does not exist. */
export async function setSubjects(tx: Transaction, sheetId: string, subjects: readonly SheetSubject[]): Promise<void> {
  const productIds = [...new Set(subjects.flatMap((subject) => ('productId' in subject ? [subject.productId] : [])))]
  const mixIds = [...new Set(subjects.flatMap((subject) => ('mixId' in subject ? [subject.mixId] : [])))]
  await tx.delete(sheetSubjects).where(eq(sheetSubjects.sheetId, sheetId))
  const foundProducts = productIds.length > 0 ? await tx.select({ id: products.id }).from(products).where(inArray(products.id, productIds)) : []
  const foundMixes = mixIds.length > 0 ? await tx.select({ id: mixes.id }).from(mixes).where(inArray(mixes.id, mixIds)) : []
  if (foundProducts.length < productIds.length || foundMixes.length < mixIds.length) {
    throw new AppError('invalid', { fields: { subjects: 'One of these products or mixes is not here any more.' } })
  }
  const rows = [...productIds.map((productId) => ({ sheetId, productId })), ...mixIds.map((mixId) => ({ sheetId, mixId }))]
  if (rows.length > 0) await tx.insert(sheetSubjects).values(rows)
}

/** Title, maker and file names in lower case: what the search of the list looks through. */
async function refreshSearchText(tx: Transaction, sheetId: string): Promise<void> {
  const [sheet] = await tx.select({ title: sheets.title, maker: sheets.maker }).from(sheets).where(eq(sheets.id, sheetId))
  const names = await tx
    .select({ fileName: sheetRevisions.fileName })
    .from(sheetRevisions)
    .where(eq(sheetRevisions.sheetId, sheetId))
    .orderBy(desc(sheetRevisions.sequence))
  const words = [sheet?.title, sheet?.maker, ...names.map(({ fileName }) => fileName.replace(/\.pdf$/i, '').replace(/[_-]+/g, ' '))]
  await tx.update(sheets).set({ searchText: words.join(' ').toLowerCase().slice(0, 4000) }).where(and(eq(sheets.id, sheetId)))
}
