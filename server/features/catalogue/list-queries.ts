import { type AnyColumn, type SQL, and, asc, count, desc, eq, or, sql } from 'drizzle-orm'
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
const swaps = (word: string) => Array.from({ length: Math.min(word.length, 20) - 1 }, (_, at) => `${word.slice(0, at)}${word[at + 1] ?? ''}${word[at] ?? ''}${word.slice(at + 2)}`)

/** Rows that hold every word that is looked for, or one like it; each condition uses the trigram index. */
function matching(text: AnyColumn, q: string): SQL | undefined {
  return and(
    ...wordsOf(q).map((word) => {
      const holds = sql`${text} like ${holding(word)}`
      return isExact(word) ? holds : or(holds, sql`${word} <% ${text}`, ...swaps(word).map((swapped) => sql`${text} like ${holding(swapped)}`))
    }),
  )
}

/** The best match first while something is looked for and no other order was asked. */
function orderOf(text: AnyColumn, { q, sort }: Wanted, columns: Record<string, SQL>): SQL[] {
  const by = columns[sort.replace(/^-/, '')] ?? sql`1`
  const byLikeness = sort === 'name' && q ? [sql`word_similarity(${q.toLowerCase()}, ${text}) desc`] : []
  return [...byLikeness, sort.startsWith('-') ? desc(by) : asc(by)]
}

/** The threshold of `<%` belongs to the session; it is set where it is used. */
async function searching<T>(db: Database, q: string, work: (tx: Database | Transaction) => Promise<T>): Promise<T> {
  if (wordsOf(q).every(isExact)) return work(db)
  return db.transaction(async (tx) => {
    await tx.execute(sql.raw(`set local pg_trgm.word_similarity_threshold = ${alike}`))
    return work(tx)
  })
}

const productColumns = {
  id: products.id, name: products.name, maker: products.maker, kind: products.kind, chemistry: products.chemistry, status: products.status,
  facts: sql<number>`(select count(*)::int from property_values v where v.product_id = products.id and v.ended_at is null)`,
  sheets: sql<number>`(select count(*)::int from sheet_subjects s where s.product_id = products.id)`,
  updatedAt: products.updatedAt,
}
const mixColumns = {
  id: mixes.id, name: mixes.name, maker: mixes.maker, chemistry: mixes.chemistry, color: mixes.color, status: mixes.status,
  parts: sql<string[]>`(select coalesce(json_agg(p.name order by mp.part), '[]') from mix_parts mp join products p on p.id = mp.product_id where mp.mix_id = mixes.id)`,
  facts: sql<number>`(select count(*)::int from property_values v where v.mix_id = mixes.id and v.ended_at is null)`,
  sheets: sql<number>`(select count(*)::int from sheet_subjects s where s.mix_id = mixes.id)`,
  updatedAt: mixes.updatedAt,
}

/** Names are ordered without regard to capitals. */
const orders = (table: typeof products | typeof mixes) => ({
  name: sql`lower(${table.name})`, maker: sql`lower(${table.maker})`, chemistry: sql`${table.chemistry}`, updatedAt: sql`${table.updatedAt}`,
})
const dated = <T extends { updatedAt: string }>(row: T): T => ({ ...row, updatedAt: new Date(row.updatedAt).toISOString() })

function ofProducts(wanted: Wanted) {
  return and(
    matching(products.searchText, wanted.q),
    wanted.kind ? eq(products.kind, wanted.kind) : undefined,
    wanted.maker ? eq(products.maker, wanted.maker) : undefined,
    wanted.chemistry ? eq(products.chemistry, wanted.chemistry) : undefined,
    wanted.status ? eq(products.status, wanted.status) : undefined,
  )
}

async function productRows(tx: Database | Transaction, wanted: Wanted, { limit, offset }: { limit?: number; offset?: number } = {}): Promise<ProductRow[]> {
  const order = orderOf(products.searchText, wanted, { ...orders(products), kind: sql`${products.kind}` })
  const query = tx.select(productColumns).from(products).where(ofProducts(wanted)).orderBy(...order, asc(products.id))
  const rows = await (limit === undefined ? query : query.limit(limit).offset(offset ?? 0))
  return rows.map(dated)
}

export function listProducts(db: Database, wanted: Wanted & Place) {
  const offset = offsetOf(wanted.cursor)
  const { limit } = wanted
  return searching(db, wanted.q, async (tx) => {
    const items = await productRows(tx, wanted, { limit, offset })
    const [all] = await tx.select({ total: count() }).from(products).where(ofProducts(wanted))
    return pageOf(items, { offset, limit, total: all?.total ?? 0 })
  })
}

/** The whole list, for export. */
export function allProducts(db: Database, wanted: Wanted): Promise<ProductRow[]> {
  return searching(db, wanted.q, (tx) => productRows(tx, wanted))
}

function ofMixes(wanted: Wanted) {
  return and(
    matching(mixes.searchText, wanted.q),
    wanted.maker ? eq(mixes.maker, wanted.maker) : undefined,
    wanted.chemistry ? eq(mixes.chemistry, wanted.chemistry) : undefined,
    wanted.status ? eq(mixes.status, wanted.status) : undefined,
  )
}

async function mixRows(tx: Database | Transaction, wanted: Wanted, { limit, offset }: { limit?: number; offset?: number } = {}): Promise<MixRow[]> {
  const query = tx.select(mixColumns).from(mixes).where(ofMixes(wanted)).orderBy(...orderOf(mixes.searchText, wanted, orders(mixes)), asc(mixes.id))
  const rows = await (limit === undefined ? query : query.limit(limit).offset(offset ?? 0))
  return rows.map(dated)
}

export function listMixes(db: Database, wanted: Wanted & Place) {
  const offset = offsetOf(wanted.cursor)
  const { limit } = wanted
  return searching(db, wanted.q, async (tx) => {
    const items = await mixRows(tx, wanted, { limit, offset })
    const [all] = await tx.select({ total: count() }).from(mixes).where(ofMixes(wanted))
    return pageOf(items, { offset, limit, total: all?.total ?? 0 })
  })
}

/** The whole list, for export. */
export function allMixes(db: Database, wanted: Wanted): Promise<MixRow[]> {
  return searching(db, wanted.q, (tx) => mixRows(tx, wanted))
}

export async function listMakers(db: Database): Promise<string[]> {
  const { rows } = await db.execute<{ maker: string }>(sql`select maker from products union select maker from mixes order by maker`)
  return rows.map(({ maker }) => maker)
}
