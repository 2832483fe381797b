import { and, asc, desc, eq, max, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { User } from '../../../shared/api/session.ts'
import type { Revision, Sheet, Subject } from '../../../shared/api/sheets.ts'
import { can } from '../../../shared/domain/access.ts'
import { findPhrase } from '../../../shared/domain/sheet-text.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { mixes, products, sheetSubjects } from '../../db/schema/catalogue.ts'
import { people } from '../../db/schema/people.ts'
import { sheetPages, sheetRevisions, sheets } from '../../db/schema/sheets.ts'
import { findRevisionDate } from './suggest-details.ts'

/**
 * Sheets that a person may open. The office opens all; a crew opens the sheets of what its jobs are laid with: those that speak of the mixes,
 * their parts and the aggregates of the courses, and those that a value of these is cited from.
 */
function openTo(user: User) {
  if (can(user.role, 'sheet:list')) return undefined
  return sql`${sheets.id} in (
    with laid as (
      select c.mix_id, c.course from job_people jp join jobs j on j.id = jp.job_id join courses c on c.version_id = j.build_up_version_id
      where jp.person_id = ${user.id}
    ), used_mixes as (select mix_id as id from laid where mix_id is not null),
    used_products as (
      select product_id::text as id from mix_parts where mix_id in (select id from used_mixes)
      union select course->'filler'->>'productId' from laid union select course->'broadcast'->>'productId' from laid
    )
    select s.sheet_id from sheet_subjects s where s.mix_id in (select id from used_mixes) or s.product_id::text in (select id from used_products)
    union select r.sheet_id from property_values v join sheet_revisions r on r.id = v.revision_id
      where v.mix_id in (select id from used_mixes) or v.product_id::text in (select id from used_products)
  )`
}

/** A sheet with its revisions, newest first. @throws AppError `not-found`, also for one that the person may not know of. */
export async function readSheet(db: Database | Transaction, sheetId: string, user: User): Promise<Sheet> {
  const [sheet] = await db
    .select()
    .from(sheets)
    .where(and(eq(sheets.id, sheetId), openTo(user)))
  if (!sheet) throw new AppError('not-found')
  const { id, kind, title, maker, version } = sheet
  return { id, kind, title, maker, version, revisions: await revisionsOf(db, id), subjects: await subjectsOf(db, id) }
}

async function revisionsOf(db: Database | Transaction, sheetId: string): Promise<Revision[]> {
  const rows = await db
    .select({ revision: sheetRevisions, uploadedByName: people.name })
    .from(sheetRevisions)
    .leftJoin(people, eq(people.id, sheetRevisions.uploadedBy))
    .where(eq(sheetRevisions.sheetId, sheetId))
    .orderBy(desc(sheetRevisions.sequence))
  const revisions: Revision[] = []
  for (const [index, { revision, uploadedByName }] of rows.entries()) {
    const { id, fileName, bytes, sha256, pages, state, revisionDate, uploadedAt } = revision
    const suggestedDate = revisionDate === null ? findRevisionDate(await textOf(db, id)) : null
    revisions.push({
      id,
      fileName,
      bytes,
      sha256,
      pages,
      state,
      revisionDate,
      suggestedDate,
      uploadedByName,
      superseded: index > 0,
      uploadedAt: new Date(uploadedAt).toISOString(),
    })
  }
  return revisions
}

async function textOf(db: Database | Transaction, revisionId: string): Promise<string> {
  const rows = await db
    .select({ text: sheetPages.text })
    .from(sheetPages)
    .where(eq(sheetPages.revisionId, revisionId))
    .orderBy(asc(sheetPages.page))
    .limit(40)
  return rows.map((row) => row.text).join('\n')
}

async function subjectsOf(db: Database | Transaction, sheetId: string): Promise<Subject[]> {
  const rows = await db
    .select({
      product: { id: products.id, name: products.name, maker: products.maker },
      mix: { id: mixes.id, name: mixes.name, maker: mixes.maker },
    })
    .from(sheetSubjects)
    .leftJoin(products, eq(products.id, sheetSubjects.productId))
    .leftJoin(mixes, eq(mixes.id, sheetSubjects.mixId))
    .where(eq(sheetSubjects.sheetId, sheetId))
  const subjects = rows.flatMap(({ product, mix }): Subject[] => [
    ...(product ? [{ kind: 'product' as const, ...product }] : []),
    ...(mix ? [{ kind: 'mix' as const, ...mix }] : []),
  ])
  return subjects.sort((a, b) => a.name.localeCompare(b.name))
}

/** A revision's file and place among its sheet's revisions. @throws AppError `not-found`, also for one that the person may not know of. */
export async function findRevision(db: Database | Transaction, revisionId: string, user: User) {
  const [row] = await db
    .select({ revision: sheetRevisions })
    .from(sheetRevisions)
    .innerJoin(sheets, eq(sheets.id, sheetRevisions.sheetId))
    .where(and(eq(sheetRevisions.id, revisionId), openTo(user)))
  if (!row) throw new AppError('not-found')
  return row.revision
}

export async function readPageWords(db: Database, { revisionId, page }: { revisionId: string; page: number }, user: User) {
  await findRevision(db, revisionId, user)
  const [row] = await db
    .select()
    .from(sheetPages)
    .where(and(eq(sheetPages.revisionId, revisionId), eq(sheetPages.page, page)))
  if (!row) throw new AppError('not-found')
  const { width, height, rotation, words } = row
  return { page, width, height, rotation, words }
}

const mostHits = 500

/** Every place where a phrase stands, page by page, in the pages' own order. */
export async function searchRevision(db: Database, { revisionId, q }: { revisionId: string; q: string }, user: User) {
  await findRevision(db, revisionId, user)
  const hits: { page: number; boxes: [number, number, number, number][]; excerpt: string }[] = []
  const [last] = await db
    .select({ page: max(sheetPages.page) })
    .from(sheetPages)
    .where(eq(sheetPages.revisionId, revisionId))
  const pagesAtOnce = 50
  for (let from = 1; from <= (last?.page ?? 0) && hits.length <= mostHits; from += pagesAtOnce) {
    const rows = await db
      .select({ page: sheetPages.page, words: sheetPages.words })
      .from(sheetPages)
      .where(
        and(eq(sheetPages.revisionId, revisionId), sql`${sheetPages.page} >= ${from}`, sql`${sheetPages.page} < ${from + pagesAtOnce}`),
      )
      .orderBy(asc(sheetPages.page))
    for (const row of rows) hits.push(...findPhrase(row.words, q).map((hit) => ({ page: row.page, ...hit })))
  }
  return { hits: hits.slice(0, mostHits), more: hits.length > mostHits }
}

/** The revision that holds these bytes, with its sheet. */
export async function findByBytes(db: Database, sha256: string) {
  const [row] = await db
    .select({ revisionId: sheetRevisions.id, sheetId: sheets.id, title: sheets.title })
    .from(sheetRevisions)
    .innerJoin(sheets, eq(sheets.id, sheetRevisions.sheetId))
    .where(eq(sheetRevisions.sha256, sha256))
  return row
}
