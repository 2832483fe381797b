import { type SQL, and, asc, count, desc, eq, isNull, ne, sql } from 'drizzle-orm'
import type * as z from 'zod'
import type { SheetRow, Subject, sheetEndpoints } from '../../../shared/api/sheets.ts'
import type { SheetKind } from '../../../shared/domain/sheet.ts'
import type { Database } from '../../db/open.ts'
import { mixes, products } from '../../db/schema/catalogue.ts'
import { sheetRevisions, sheets } from '../../db/schema/sheets.ts'
import { offsetOf, pageOf } from '../../http/list.ts'

type Wanted = z.output<typeof sheetEndpoints.listSheets.query>

const superseded = sql<boolean>`exists (select 1 from sheet_revisions newer where newer.sheet_id = ${sheetRevisions.sheetId} and newer.sequence > ${sheetRevisions.sequence})`
const revisionCount = sql<number>`(select count(*)::int from sheet_revisions own where own.sheet_id = ${sheets.id})`
const subjectNames = sql<string[]>`(
  select coalesce(json_agg(coalesce(p.name, m.name) order by coalesce(p.name, m.name)), '[]'::json) from sheet_subjects s
  left join products p on p.id = s.product_id left join mixes m on m.id = s.mix_id where s.sheet_id = ${sheets.id})`

/** Each word is contained or nearly so: a typo does not hide a sheet. */
function matches(q: string, text: SQL | typeof sheets.searchText): SQL | undefined {
  const words = q.toLowerCase().split(/\s+/).filter(Boolean).slice(0, 8)
  return and(
    ...words.map((word) => sql`(position(${word} in ${text}) > 0 or (length(${word}) > 3 and word_similarity(${word}, ${text}) >= 0.5))`),
  )
}

const columns = {
  title: sql`lower(${sheets.title})`,
  maker: sql`lower(${sheets.maker})`,
  revisionDate: sheetRevisions.revisionDate,
  uploadedAt: sheetRevisions.uploadedAt,
  pages: sheetRevisions.pages,
} as const

/** The list of sheets: one row a revision in force, or the superseded ones. `oldestDay`: what is dated before it has passed the firm's limit. */
export async function listSheets(db: Database, wanted: Wanted & { oldestDay: string }) {
  const { q, sort, limit, cursor, kind, standing, age, oldestDay } = wanted
  const offset = offsetOf(cursor)
  const where = and(
    q ? matches(q, sheets.searchText) : undefined,
    kind ? eq(sheets.kind, kind) : undefined,
    standing === 'all' ? undefined : standing === 'superseded' ? superseded : sql`not ${superseded}`,
    age === 'undated' ? isNull(sheetRevisions.revisionDate) : undefined,
    age === 'beyond'
      ? sql`${sheetRevisions.revisionDate} < ${oldestDay}`
      : age === 'within'
        ? sql`${sheetRevisions.revisionDate} >= ${oldestDay}`
        : undefined,
  )
  const column = columns[sort.replace(/^-/, '') as keyof typeof columns]
  const order = sort.startsWith('-') ? sql`${column} desc nulls last` : sql`${column} asc nulls last`
  const from = <T extends Record<string, unknown>>(fields: T) =>
    db
      .select(fields as never)
      .from(sheetRevisions)
      .innerJoin(sheets, eq(sheets.id, sheetRevisions.sheetId))
      .where(where)
  const rows = (await from({
    sheetId: sheets.id,
    revisionId: sheetRevisions.id,
    kind: sheets.kind,
    title: sheets.title,
    maker: sheets.maker,
    fileName: sheetRevisions.fileName,
    revisionDate: sheetRevisions.revisionDate,
    pages: sheetRevisions.pages,
    state: sheetRevisions.state,
    uploadedAt: sheetRevisions.uploadedAt,
    superseded,
    revisions: revisionCount,
    subjects: subjectNames,
  })
    .orderBy(order, desc(sheetRevisions.sequence), asc(sheetRevisions.id))
    .limit(limit)
    .offset(offset)) as SheetRow[]
  const [counted] = (await from({ total: count() })) as { total: number }[]
  const items = rows.map((row) => ({ ...row, uploadedAt: new Date(row.uploadedAt).toISOString() }))
  return pageOf(items, { offset, limit, total: counted?.total ?? 0 })
}

/** Sheets of the same kind with a title like this one, likest first. */
export function findAlike(db: Database, { title, kind, exceptId }: { title: string; kind: SheetKind; exceptId: string }) {
  const likeness = sql`similarity(lower(${sheets.title}), lower(${title}))`
  return db
    .select({ id: sheets.id, kind: sheets.kind, title: sheets.title })
    .from(sheets)
    .where(and(sql`${likeness} > 0.45`, eq(sheets.kind, kind), ne(sheets.id, exceptId)))
    .orderBy(desc(likeness), asc(sheets.id))
    .limit(5)
}

/** Products and mixes in use, by name; as many as a picker shows. */
export async function listSubjects(db: Database, q: string): Promise<Subject[]> {
  const most = 20
  const productRows = await db
    .select({ id: products.id, name: products.name, maker: products.maker })
    .from(products)
    .where(and(eq(products.status, 'active'), q ? matches(q, sql`lower(${products.maker} || ' ' || ${products.name})`) : undefined))
    .orderBy(asc(products.name))
    .limit(most)
  const mixRows = await db
    .select({ id: mixes.id, name: mixes.name, maker: mixes.maker })
    .from(mixes)
    .where(and(eq(mixes.status, 'active'), q ? matches(q, sql`lower(${mixes.maker} || ' ' || ${mixes.name})`) : undefined))
    .orderBy(asc(mixes.name))
    .limit(most)
  return [...mixRows.map((row) => ({ kind: 'mix' as const, ...row })), ...productRows.map((row) => ({ kind: 'product' as const, ...row }))]
}
