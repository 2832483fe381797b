import { type AnyColumn, type SQL, and, asc, count, desc, eq, sql } from 'drizzle-orm'
import type { MixRow, ProductRow } from '../../../shared/api/catalogue.ts'
import type { Database } from '../../db/open.ts'
import { mixes, products } from '../../db/schema/catalogue.ts'
import { offsetOf, pageOf } from '../../http/list.ts'

interface ListWanted {
  q: string
  sort: string
  limit: number
  cursor?: string | undefined
  maker?: string | undefined
  chemistry?: string | undefined
  status?: 'active' | 'withdrawn' | undefined
}

/** How alike a word must be to what is looked for: a letter wrong, doubled or left out in a word of six still finds it. */
const alike = 0.45

/** Rows whose text holds what is looked for, or is like it; both conditions use the trigram index. */
function matching(text: AnyColumn, q: string): SQL | undefined {
  const words = q.toLowerCase()
  if (!words) return undefined
  const pattern = `%${words.replace(/[\\%_]/g, '\\$&')}%`
  return sql`(${text} like ${pattern} or ${words} <% ${text})`
}

/** The best match first while something is looked for and no other order was asked. */
function orderOf(text: AnyColumn, { q, sort }: ListWanted, column: AnyColumn): SQL[] {
  const byName = sort === 'name' && q ? [sql`word_similarity(${q.toLowerCase()}, ${text}) desc`] : []
  return [...byName, sort.startsWith('-') ? desc(column) : asc(column)]
}

const counted = (table: 'product' | 'mix') => ({
  facts: sql<number>`(select count(*)::int from property_values v where v.${sql.raw(`${table}_id`)} = ${sql.raw(table === 'product' ? 'products' : 'mixes')}.id and v.ended_at is null)`,
  sheets: sql<number>`(select count(*)::int from sheet_subjects s where s.${sql.raw(`${table}_id`)} = ${sql.raw(table === 'product' ? 'products' : 'mixes')}.id)`,
})

/** The threshold of `<%` belongs to the session; it is set where it is used. */
async function withThreshold<T>(db: Database, work: (tx: Parameters<Parameters<Database['transaction']>[0]>[0]) => Promise<T>): Promise<T> {
  return db.transaction(async (tx) => {
    await tx.execute(sql.raw(`set local pg_trgm.word_similarity_threshold = ${alike}`))
    return work(tx)
  })
}

export function listProducts(db: Database, wanted: ListWanted & { kind?: string | undefined }) {
  const columns = { name: products.name, maker: products.maker, kind: products.kind, chemistry: products.chemistry, updatedAt: products.updatedAt }
  const where = and(
    matching(products.searchText, wanted.q),
    wanted.kind ? sql`${products.kind} = ${wanted.kind}` : undefined,
    wanted.maker ? eq(products.maker, wanted.maker) : undefined,
    wanted.chemistry ? eq(products.chemistry, wanted.chemistry) : undefined,
    wanted.status ? eq(products.status, wanted.status) : undefined,
  )
  const offset = offsetOf(wanted.cursor)
  return withThreshold(db, async (tx) => {
    const rows = await tx
      .select({ id: products.id, name: products.name, maker: products.maker, kind: products.kind, chemistry: products.chemistry, status: products.status, updatedAt: products.updatedAt, ...counted('product') })
      .from(products)
      .where(where)
      .orderBy(...orderOf(products.searchText, wanted, columns[wanted.sort.replace(/^-/, '') as keyof typeof columns]), asc(products.id))
      .limit(wanted.limit)
      .offset(offset)
    const [all] = await tx.select({ total: count() }).from(products).where(where)
    const items = rows.map((row): ProductRow => ({ ...row, updatedAt: new Date(row.updatedAt).toISOString() }))
    return pageOf(items, { offset, limit: wanted.limit, total: all?.total ?? 0 })
  })
}

export function listMixes(db: Database, wanted: ListWanted) {
  const columns = { name: mixes.name, maker: mixes.maker, chemistry: mixes.chemistry, updatedAt: mixes.updatedAt }
  const where = and(
    matching(mixes.searchText, wanted.q),
    wanted.maker ? eq(mixes.maker, wanted.maker) : undefined,
    wanted.chemistry ? eq(mixes.chemistry, wanted.chemistry) : undefined,
    wanted.status ? eq(mixes.status, wanted.status) : undefined,
  )
  const offset = offsetOf(wanted.cursor)
  return withThreshold(db, async (tx) => {
    const rows = await tx
      .select({
        id: mixes.id, name: mixes.name, maker: mixes.maker, chemistry: mixes.chemistry, color: mixes.color, status: mixes.status, updatedAt: mixes.updatedAt,
        parts: sql<number>`(select count(*)::int from mix_parts p where p.mix_id = mixes.id)`, ...counted('mix'),
      })
      .from(mixes)
      .where(where)
      .orderBy(...orderOf(mixes.searchText, wanted, columns[wanted.sort.replace(/^-/, '') as keyof typeof columns]), asc(mixes.id))
      .limit(wanted.limit)
      .offset(offset)
    const [all] = await tx.select({ total: count() }).from(mixes).where(where)
    const items = rows.map((row): MixRow => ({ ...row, updatedAt: new Date(row.updatedAt).toISOString() }))
    return pageOf(items, { offset, limit: wanted.limit, total: all?.total ?? 0 })
  })
}

export async function listMakers(db: Database): Promise<string[]> {
  const { rows } = await db.execute<{ maker: string }>(sql`select maker from products union select maker from mixes order by maker`)
  return rows.map(({ maker }) => maker)
}
