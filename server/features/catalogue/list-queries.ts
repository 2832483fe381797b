import { type AnyColumn, type SQL, and, asc, count, desc, eq, inArray, or, sql } from 'drizzle-orm'
import type { MixRow, ProductRow } from '../../../shared/api/catalogue.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { mixes, products } from '../../db/schema/catalogue.ts'
import { offsetOf, pageOf } from '../../http/list.ts'

interface Wanted {
  q: string
  sort: string
  kind?: ProductRow['kind'] | undefined
  maker?: string | undefined
  chemistry?: string | undefined
  status?: 'active' | 'withdrawn' | undefined
}
interface Place {
  limit: number
  cursor?: string | undefined
}

/** How alike a word must be to what is looked for: one letter of six wrong, doubled or left out still finds it. */
const alike = 0.42
/** Numbers and codes are looked for as typed: one digit off is another substance, another hazard. Short words resemble everything. */
const isExact = (word: string) => /\d/.test(word) || word.length < 4

const wordsOf = (q: string) => q.toLowerCase().split(/\s+/).filter(Boolean).slice(0, 10)
const holding = (word: string) => `%${word.replace(/[\\%_]/g, '\\$&')}%`
/** The word with each two neighbours swapped: trigrams alone forgive a swap near a word's beginning too little. */
const swaps = (word: string) =>
  Array.from(
    { length: Math.min(word.length, 20) - 1 },
    (_, at) => `${word.slice(0, at)}${word[at + 1] ?? ''}${word[at] ?? ''}${word.slice(at + 2)}`,
  )

/** Rows that hold every word that is looked for. */
const holdsAll = (text: AnyColumn, q: string) => and(...wordsOf(q).map((word) => sql`${text} like ${holding(word)}`))

/** Rows that hold every word or one like it; each condition can use the trigram index. */
function resemblesAll(text: AnyColumn, q: string): SQL | undefined {
  return and(
    ...wordsOf(q).map((word) => {
      const holds = sql`${text} like ${holding(word)}`
      return isExact(word)
        ? holds
        : or(holds, sql`${word} <% ${text}`, ...swaps(word).map((swapped) => sql`${text} like ${holding(swapped)}`))
    }),
  )
}

/** A way of looking: what must be so, and what comes first. */
interface Look {
  where: SQL | undefined
  first: SQL[]
}

/**
 * Looks for rows that hold the words as typed; only where there are none, for rows with words like them, which costs a hundred times as much a row.
 * The text begins with the name, so that what is found early in it comes first.
 */
async function searching<T extends { total: number }>(
  db: Database,
  { q, text }: { q: string; text: AnyColumn },
  work: (tx: Database | Transaction, look: Look) => Promise<T>,
): Promise<T> {
  const words = wordsOf(q)
  const exact = await work(db, { where: holdsAll(text, q), first: words.slice(0, 1).map((word) => sql`position(${word} in ${text})`) })
  if (exact.total > 0 || words.every(isExact)) return exact
  return db.transaction(async (tx) => {
    // The threshold belongs to the session. The planner takes `<%` to be as cheap as `=` and would read the whole table for it.
    await tx.execute(sql.raw(`set local pg_trgm.word_similarity_threshold = ${alike}; set local enable_seqscan = off`))
    return work(tx, { where: resemblesAll(text, q), first: [sql`word_similarity(${q.toLowerCase()}, ${text}) desc`] })
  })
}

/** The order that was asked for; while something is looked for, what fits best comes before the order of names. */
function orderOf({ q, sort }: Wanted, { first }: Look, columns: Record<string, SQL>): SQL[] {
  const by = columns[sort.replace(/^-/, '')] ?? sql`1`
  return [...(q && sort === 'name' ? first : []), sort.startsWith('-') ? desc(by) : asc(by)]
}

const productColumns = {
  id: products.id,
  name: products.name,
  maker: products.maker,
  kind: products.kind,
  chemistry: products.chemistry,
  status: products.status,
  updatedAt: products.updatedAt,
}
const mixColumns = {
  id: mixes.id,
  name: mixes.name,
  maker: mixes.maker,
  chemistry: mixes.chemistry,
  color: mixes.color,
  status: mixes.status,
  updatedAt: mixes.updatedAt,
}

/** What is counted beside each row; asked for the rows of one page alone, not for those that a page far down skips. */
async function productCounts(tx: Database | Transaction, ids: string[] | 'all') {
  const columns = {
    id: products.id,
    facts: sql<number>`(select count(*)::int from property_values v where v.product_id = products.id and v.ended_at is null)`,
    sheets: sql<number>`(select count(*)::int from sheet_subjects s where s.product_id = products.id)`,
  }
  const rows = await tx
    .select(columns)
    .from(products)
    .where(ids === 'all' ? undefined : inArray(products.id, ids))
  return new Map(rows.map(({ id, ...counts }) => [id, counts]))
}

async function mixCounts(tx: Database | Transaction, ids: string[] | 'all') {
  const columns = {
    id: mixes.id,
    parts: sql<
      string[]
    >`(select coalesce(json_agg(p.name order by mp.part), '[]') from mix_parts mp join products p on p.id = mp.product_id where mp.mix_id = mixes.id)`,
    facts: sql<number>`(select count(*)::int from property_values v where v.mix_id = mixes.id and v.ended_at is null)`,
    sheets: sql<number>`(select count(*)::int from sheet_subjects s where s.mix_id = mixes.id)`,
  }
  const rows = await tx
    .select(columns)
    .from(mixes)
    .where(ids === 'all' ? undefined : inArray(mixes.id, ids))
  return new Map(rows.map(({ id, ...counts }) => [id, counts]))
}

/** Names are ordered without regard to capitals. */
const orders = (table: typeof products | typeof mixes) => ({
  name: sql`lower(${table.name})`,
  maker: sql`lower(${table.maker})`,
  chemistry: sql`${table.chemistry}`,
  updatedAt: sql`${table.updatedAt}`,
})
const iso = (instant: string) => new Date(instant).toISOString()

/** Where in the list: a page of it, or all. */
type Span = { limit: number; offset: number } | 'all'

async function someProducts(tx: Database | Transaction, wanted: Wanted, { look, span }: { look: Look; span: Span }) {
  const where = and(
    look.where,
    wanted.kind ? eq(products.kind, wanted.kind) : undefined,
    wanted.maker ? eq(products.maker, wanted.maker) : undefined,
    wanted.chemistry ? eq(products.chemistry, wanted.chemistry) : undefined,
    wanted.status ? eq(products.status, wanted.status) : undefined,
  )
  const order = orderOf(wanted, look, { ...orders(products), kind: sql`${products.kind}` })
  const query = tx
    .select(productColumns)
    .from(products)
    .where(where)
    .orderBy(...order, asc(products.id))
  const rows = await (span === 'all' ? query : query.limit(span.limit).offset(span.offset))
  const [all] = await tx.select({ total: count() }).from(products).where(where)
  const counts = await productCounts(tx, span === 'all' ? 'all' : rows.map(({ id }) => id))
  const none = { facts: 0, sheets: 0 }
  return {
    rows: rows.map((row): ProductRow => ({ ...row, updatedAt: iso(row.updatedAt), ...(counts.get(row.id) ?? none) })),
    total: all?.total ?? 0,
  }
}

async function someMixes(tx: Database | Transaction, wanted: Wanted, { look, span }: { look: Look; span: Span }) {
  const where = and(
    look.where,
    wanted.maker ? eq(mixes.maker, wanted.maker) : undefined,
    wanted.chemistry ? eq(mixes.chemistry, wanted.chemistry) : undefined,
    wanted.status ? eq(mixes.status, wanted.status) : undefined,
  )
  const query = tx
    .select(mixColumns)
    .from(mixes)
    .where(where)
    .orderBy(...orderOf(wanted, look, orders(mixes)), asc(mixes.id))
  const rows = await (span === 'all' ? query : query.limit(span.limit).offset(span.offset))
  const [all] = await tx.select({ total: count() }).from(mixes).where(where)
  const counts = await mixCounts(tx, span === 'all' ? 'all' : rows.map(({ id }) => id))
  const none = { facts: 0, sheets: 0, parts: [] }
  return {
    rows: rows.map((row): MixRow => ({ ...row, updatedAt: iso(row.updatedAt), ...(counts.get(row.id) ?? none) })),
    total: all?.total ?? 0,
  }
}

const findProducts = (db: Database, wanted: Wanted, span: Span) =>
  searching(db, { q: wanted.q, text: products.searchText }, (tx, look) => someProducts(tx, wanted, { look, span }))
const findMixes = (db: Database, wanted: Wanted, span: Span) =>
  searching(db, { q: wanted.q, text: mixes.searchText }, (tx, look) => someMixes(tx, wanted, { look, span }))

export async function listProducts(db: Database, { limit, cursor, ...wanted }: Wanted & Place) {
  const offset = offsetOf(cursor)
  const { rows, total } = await findProducts(db, wanted, { limit, offset })
  return pageOf(rows, { offset, limit, total })
}

export async function listMixes(db: Database, { limit, cursor, ...wanted }: Wanted & Place) {
  const offset = offsetOf(cursor)
  const { rows, total } = await findMixes(db, wanted, { limit, offset })
  return pageOf(rows, { offset, limit, total })
}

/** The whole list, for export. */
export const allProducts = async (db: Database, wanted: Wanted): Promise<ProductRow[]> => (await findProducts(db, wanted, 'all')).rows
/** The whole list, for export. */
export const allMixes = async (db: Database, wanted: Wanted): Promise<MixRow[]> => (await findMixes(db, wanted, 'all')).rows

export async function listMakers(db: Database): Promise<string[]> {
  const { rows } = await db.execute<{ maker: string }>(sql`select maker from products union select maker from mixes order by maker`)
  return rows.map(({ maker }) => maker)
}
