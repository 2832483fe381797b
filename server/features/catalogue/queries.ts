import { and, asc, eq, inArray, isNull, or, sql } from 'drizzle-orm'
import type { Fact } from '../../../shared/domain/fact.ts'
import type { MixFacts } from '../../../shared/domain/mix.ts'
import type { ProductFacts } from '../../../shared/domain/product.ts'
import { type Property, propertyNames } from '../../../shared/domain/property.ts'
import type { SheetSummary } from '../../../shared/domain/sheet.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { mixParts, mixes, products, propertyValues, sheetSubjects } from '../../db/schema/catalogue.ts'
import { sheetRevisions, sheets } from '../../db/schema/sheets.ts'

type Reader = Database | Transaction
/** Products or mixes by id. */
interface Subjects {
  productIds: string[]
  mixIds: string[]
}
const grouped = <T>(rows: { key: string; item: T }[]) => {
  const groups = new Map<string, T[]>()
  for (const { key, item } of rows) groups.set(key, [...(groups.get(key) ?? []), item])
  return groups
}

const valueColumns = { value: propertyValues, sheetId: sheets.id, sheetTitle: sheets.title, revisionDate: sheetRevisions.revisionDate }
type ValueRow = {
  value: typeof propertyValues.$inferSelect
  sheetId: string | null
  sheetTitle: string | null
  revisionDate: string | null
}

/** A row of the table as a fact with its citation. */
function factOfRow({ value: row, sheetId, sheetTitle, revisionDate }: ValueRow): Fact {
  const person = { by: row.byName, at: new Date(row.madeAt).toISOString() }
  const origin: Fact['origin'] =
    row.kind === 'stated' && row.revisionId && sheetId
      ? {
          kind: 'stated',
          ...person,
          citation: {
            sheetId,
            revisionId: row.revisionId,
            sheetTitle: sheetTitle ?? '',
            revisionDate,
            page: row.page ?? 1,
            box: row.box,
            quote: row.quote,
          },
        }
      : { kind: 'entered', reason: row.reason ?? '', ...person }
  return {
    id: row.id,
    property: row.property as Property,
    part: row.part,
    value: row.value,
    ...(row.at ? { at: row.at } : {}),
    ...(row.film ? { film: row.film } : {}),
    ...(row.of ? { of: row.of } : {}),
    ...(row.thinned === null ? {} : { thinned: row.thinned }),
    origin,
  }
}

const rank = new Map(propertyNames.map((property, index) => [property, index]))
/** In the order of the properties, then as put in. */
const inOrder = (rows: ValueRow[]) => rows.map(factOfRow).sort((a, b) => (rank.get(a.property) ?? 0) - (rank.get(b.property) ?? 0))

/** Live facts of products and mixes, by their ids. */
export async function readFactsOf(db: Reader, { productIds, mixIds }: Subjects): Promise<Map<string, Fact[]>> {
  const wanted = [
    ...(productIds.length > 0 ? [inArray(propertyValues.productId, productIds)] : []),
    ...(mixIds.length > 0 ? [inArray(propertyValues.mixId, mixIds)] : []),
  ]
  if (wanted.length === 0) return new Map()
  const rows = await db
    .select(valueColumns)
    .from(propertyValues)
    .leftJoin(sheetRevisions, eq(sheetRevisions.id, propertyValues.revisionId))
    .leftJoin(sheets, eq(sheets.id, sheetRevisions.sheetId))
    .where(and(or(...wanted), isNull(propertyValues.endedAt)))
    .orderBy(asc(propertyValues.position), asc(propertyValues.madeAt), asc(propertyValues.id))
  const groups = grouped(rows.map((row) => ({ key: row.value.productId ?? row.value.mixId ?? '', item: row })))
  return new Map([...groups].map(([id, list]) => [id, inOrder(list)]))
}

/** The sheets of products and mixes at the revision in force, by the ids of what they speak of. */
export async function readSheetsOf(db: Reader, { productIds, mixIds }: Subjects): Promise<Map<string, SheetSummary[]>> {
  const wanted = [
    ...(productIds.length > 0 ? [inArray(sheetSubjects.productId, productIds)] : []),
    ...(mixIds.length > 0 ? [inArray(sheetSubjects.mixId, mixIds)] : []),
  ]
  if (wanted.length === 0) return new Map()
  const rows = await db
    .select({
      productId: sheetSubjects.productId,
      mixId: sheetSubjects.mixId,
      id: sheets.id,
      kind: sheets.kind,
      title: sheets.title,
      revisionId: sheetRevisions.id,
      revisionDate: sheetRevisions.revisionDate,
      pages: sheetRevisions.pages,
    })
    .from(sheetSubjects)
    .innerJoin(sheets, eq(sheets.id, sheetSubjects.sheetId))
    .innerJoin(
      sheetRevisions,
      and(
        eq(sheetRevisions.sheetId, sheets.id),
        eq(sheetRevisions.sequence, sql`(select max(newest.sequence) from sheet_revisions newest where newest.sheet_id = ${sheets.id})`),
      ),
    )
    .where(or(...wanted))
    .orderBy(asc(sheets.kind), asc(sheets.title))
  return grouped(rows.map(({ productId, mixId, ...sheet }) => ({ key: productId ?? mixId ?? '', item: { ...sheet, superseded: false } })))
}

const productColumns = {
  id: products.id,
  name: products.name,
  maker: products.maker,
  kind: products.kind,
  chemistry: products.chemistry,
  status: products.status,
}

/** Products with what is known of them, by id; those that are not there are left out. */
export async function readProductFacts(db: Reader, ids: string[]): Promise<Record<string, ProductFacts>> {
  if (ids.length === 0) return {}
  const rows = await db.select(productColumns).from(products).where(inArray(products.id, ids))
  const found = { productIds: rows.map(({ id }) => id), mixIds: [] }
  const facts = await readFactsOf(db, found)
  const sheetsOf = await readSheetsOf(db, found)
  return Object.fromEntries(
    rows.map((row) => [
      row.id,
      { ...row, chemistry: row.chemistry as ProductFacts['chemistry'], facts: facts.get(row.id) ?? [], sheets: sheetsOf.get(row.id) ?? [] },
    ]),
  )
}

/** Mixes with their parts and what is known of them, by id; those that are not there are left out. */
export async function readMixFacts(db: Reader, ids: string[]): Promise<Record<string, MixFacts>> {
  if (ids.length === 0) return {}
  const rows = await db
    .select({ id: mixes.id, name: mixes.name, maker: mixes.maker, chemistry: mixes.chemistry, color: mixes.color, status: mixes.status })
    .from(mixes)
    .where(inArray(mixes.id, ids))
  const found = { productIds: [], mixIds: rows.map(({ id }) => id) }
  const parts =
    found.mixIds.length > 0 ? await db.select().from(mixParts).where(inArray(mixParts.mixId, found.mixIds)).orderBy(asc(mixParts.part)) : []
  const productFacts = await readProductFacts(db, [...new Set(parts.map(({ productId }) => productId))])
  const facts = await readFactsOf(db, found)
  const sheetsOf = await readSheetsOf(db, found)
  return Object.fromEntries(
    rows.map((row) => [
      row.id,
      {
        ...row,
        chemistry: row.chemistry as MixFacts['chemistry'],
        parts: parts
          .filter(({ mixId }) => mixId === row.id)
          .flatMap(({ part, productId }) => {
            const product = productFacts[productId]
            return product ? [{ part, product }] : []
          }),
        facts: facts.get(row.id) ?? [],
        sheets: sheetsOf.get(row.id) ?? [],
      },
    ]),
  )
}
