import { eq, inArray, max, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { User } from '../../../shared/api/session.ts'
import type { Sheet, SubjectRef } from '../../../shared/api/sheets.ts'
import { inOrder } from '../../../shared/domain/sheet-age.ts'
import type { SheetKind } from '../../../shared/domain/sheet.ts'
import { recordChange } from '../../db/audit.ts'
import type { Transaction } from '../../db/open.ts'
import { mixes, products, sheetSubjects } from '../../db/schema/catalogue.ts'
import { type PlacedText, sheetPages, sheetRevisions, sheets } from '../../db/schema/sheets.ts'
import { readSheet } from './read-queries.ts'

export interface SheetDetails {
  kind: SheetKind
  title: string
  maker: string
  subjects: readonly SubjectRef[]
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
 * Adds a PDF to a sheet as a revision, with the words of its pages; its date places it among the others.
 * @throws AppError `duplicate` when the same bytes are here already, `not-found` without the sheet.
 */
export async function addRevision(tx: Transaction, { pages, ...revision }: NewRevision): Promise<string> {
  const [sheet] = await tx.select({ id: sheets.id }).from(sheets).where(eq(sheets.id, revision.sheetId)).for('update')
  if (!sheet) throw new AppError('not-found')
  const state = pages.some((page) => page.words.length > 0) ? 'ready' : 'no-text'
  const [row] = await tx
    .insert(sheetRevisions)
    .values({
      ...revision,
      state,
      pages: pages.length,
      sequence: sql`(select coalesce(max(${sheetRevisions.sequence}), 0) + 1 from ${sheetRevisions} where ${sheetRevisions.sheetId} = ${revision.sheetId})`,
    })
    .onConflictDoNothing({ target: sheetRevisions.sha256 })
    .returning({ id: sheetRevisions.id })
  if (!row) throw new AppError('duplicate', { message: 'This file is already here.' })
  const rows = pages.map((page, index) => ({ ...page, revisionId: row.id, page: index + 1 }))
  for (let from = 0; from < rows.length; from += 50) await tx.insert(sheetPages).values(rows.slice(from, from + 50))
  await arrange(tx, revision.sheetId)
  await recordChange(tx, {
    personId: revision.uploadedBy,
    action: 'revision-added',
    subject: { kind: 'sheet', id: revision.sheetId },
    to: {
      revisionId: row.id,
      fileName: revision.fileName,
      sha256: revision.sha256,
      revisionDate: revision.revisionDate,
      pages: pages.length,
      state,
    },
  })
  return row.id
}

/** Puts a sheet's products and mixes in place of those it had. @throws AppError naming the field of one that does not exist. */
async function setSubjects(tx: Transaction, sheetId: string, subjects: readonly SubjectRef[]): Promise<void> {
  const productIds = [...new Set(subjects.flatMap((subject) => ('productId' in subject ? [subject.productId] : [])))]
  const mixIds = [...new Set(subjects.flatMap((subject) => ('mixId' in subject ? [subject.mixId] : [])))]
  await tx.delete(sheetSubjects).where(eq(sheetSubjects.sheetId, sheetId))
  const foundProducts =
    productIds.length > 0 ? await tx.select({ id: products.id }).from(products).where(inArray(products.id, productIds)) : []
  const foundMixes = mixIds.length > 0 ? await tx.select({ id: mixes.id }).from(mixes).where(inArray(mixes.id, mixIds)) : []
  if (foundProducts.length < productIds.length || foundMixes.length < mixIds.length) {
    throw new AppError('invalid', { fields: { subjects: 'One of these products or mixes is not here any more.' } })
  }
  const rows = [...productIds.map((productId) => ({ sheetId, productId })), ...mixIds.map((mixId) => ({ sheetId, mixId }))]
  if (rows.length > 0) await tx.insert(sheetSubjects).values(rows)
}

/** Brings a sheet's revisions into order and its search text up to date: title, maker and file names in lower case. */
async function arrange(tx: Transaction, sheetId: string): Promise<void> {
  const revisions = await tx.select().from(sheetRevisions).where(eq(sheetRevisions.sheetId, sheetId)).orderBy(sheetRevisions.sequence)
  const wanted = inOrder(revisions.map((revision) => ({ ...revision, uploadedAt: new Date(revision.uploadedAt).toISOString() })))
  if (wanted.some((revision, index) => revision.sequence !== index + 1)) {
    // Out of the way first: no two revisions of a sheet may have one number even for a moment.
    await tx
      .update(sheetRevisions)
      .set({ sequence: sql`-${sheetRevisions.sequence} - 100000` })
      .where(eq(sheetRevisions.sheetId, sheetId))
    for (const [index, revision] of wanted.entries())
      await tx
        .update(sheetRevisions)
        .set({ sequence: index + 1 })
        .where(eq(sheetRevisions.id, revision.id))
  }
  const [sheet] = await tx.select({ title: sheets.title, maker: sheets.maker }).from(sheets).where(eq(sheets.id, sheetId))
  const names = wanted.reverse().map(({ fileName }) => fileName.replace(/\.pdf$/i, '').replace(/[_-]+/g, ' '))
  await tx
    .update(sheets)
    .set({ searchText: [sheet?.title, sheet?.maker, ...names].join(' ').toLowerCase().slice(0, 4000) })
    .where(eq(sheets.id, sheetId))
}

interface SheetChange extends SheetDetails {
  version: number
  dates: readonly { revisionId: string; revisionDate: string | null }[]
}

/** Changes what is said of a sheet. @throws AppError `conflict` when someone else changed it meanwhile. */
export async function changeSheet(tx: Transaction, sheetId: string, { by, ...change }: SheetChange & { by: User }): Promise<Sheet> {
  const { version, kind, title, maker, subjects, dates } = change
  const [row] = await tx.select({ version: sheets.version }).from(sheets).where(eq(sheets.id, sheetId)).for('update')
  if (!row) throw new AppError('not-found')
  if (row.version !== version) throw new AppError('conflict')
  const before = await readSheet(tx, sheetId, by)
  for (const { revisionId, revisionDate } of dates) {
    if (!before.revisions.some((revision) => revision.id === revisionId))
      throw new AppError('invalid', { fields: { dates: 'A revision is not of this sheet.' } })
    await tx.update(sheetRevisions).set({ revisionDate }).where(eq(sheetRevisions.id, revisionId))
  }
  await tx
    .update(sheets)
    .set({ kind, title, maker, version: version + 1 })
    .where(eq(sheets.id, sheetId))
  await setSubjects(tx, sheetId, subjects)
  await arrange(tx, sheetId)
  const after = await readSheet(tx, sheetId, by)
  await recordChange(tx, {
    personId: by.id,
    action: 'changed',
    subject: { kind: 'sheet', id: sheetId },
    from: described(before),
    to: described(after),
  })
  return after
}

/** What the audit trail keeps of a sheet. */
function described({ kind, title, maker, subjects, revisions }: Sheet) {
  return {
    kind,
    title,
    maker,
    subjects: subjects.map((subject) => ({ [`${subject.kind}Id`]: subject.id, name: subject.name })),
    revisions: revisions.map((revision) => ({ revisionId: revision.id, revisionDate: revision.revisionDate })),
  }
}

/** Makes a revision one of another sheet, which keeps its own title and subjects; a sheet left empty goes. */
export async function moveRevision(
  tx: Transaction,
  { revisionId, sheetId }: { revisionId: string; sheetId: string },
  by: User,
): Promise<Sheet> {
  const [revision] = await tx
    .select({ from: sheetRevisions.sheetId })
    .from(sheetRevisions)
    .where(eq(sheetRevisions.id, revisionId))
    .for('update')
  if (!revision) throw new AppError('not-found')
  const locked = await tx
    .select({ id: sheets.id })
    .from(sheets)
    .where(inArray(sheets.id, [revision.from, sheetId]))
    .orderBy(sheets.id)
    .for('update')
  if (!locked.some((sheet) => sheet.id === sheetId))
    throw new AppError('invalid', { fields: { sheetId: 'This sheet is not here any more.' } })
  if (revision.from === sheetId) return readSheet(tx, sheetId, by)
  const [last] = await tx
    .select({ sequence: max(sheetRevisions.sequence) })
    .from(sheetRevisions)
    .where(eq(sheetRevisions.sheetId, sheetId))
  await tx
    .update(sheetRevisions)
    .set({ sheetId, sequence: (last?.sequence ?? 0) + 1 })
    .where(eq(sheetRevisions.id, revisionId))
  const left = await tx.select({ id: sheetRevisions.id }).from(sheetRevisions).where(eq(sheetRevisions.sheetId, revision.from)).limit(1)
  if (left.length > 0) await arrange(tx, revision.from)
  else await removeEmptySheet(tx, revision.from, by)
  await arrange(tx, sheetId)
  await tx
    .update(sheets)
    .set({ version: sql`${sheets.version} + 1` })
    .where(inArray(sheets.id, [revision.from, sheetId]))
  await recordChange(tx, {
    personId: by.id,
    action: 'revision-moved',
    subject: { kind: 'sheet', id: sheetId },
    from: { sheetId: revision.from, revisionId },
    to: { sheetId, revisionId },
  })
  return readSheet(tx, sheetId, by)
}

async function removeEmptySheet(tx: Transaction, sheetId: string, by: User): Promise<void> {
  const before = await readSheet(tx, sheetId, by)
  await tx.delete(sheetSubjects).where(eq(sheetSubjects.sheetId, sheetId))
  await tx.delete(sheets).where(eq(sheets.id, sheetId))
  await recordChange(tx, { personId: by.id, action: 'removed', subject: { kind: 'sheet', id: sheetId }, from: described(before) })
}
