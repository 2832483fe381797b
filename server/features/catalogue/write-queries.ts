import { and, asc, eq, inArray, ne, sql } from 'drizzle-orm'
import type * as z from 'zod'
import type { MixRecord, ProductRecord, catalogueEndpoints as wire } from '../../../shared/api/catalogue.ts'
import { AppError } from '../../../shared/api/errors.ts'
import { recordChange } from '../../db/audit.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { mixParts, mixes, products } from '../../db/schema/catalogue.ts'
import { addFact, endFactsOfLostParts } from './fact-queries.ts'
import { readMixFacts, readProductFacts } from './queries.ts'
import { keepMixSearchText, keepProductSearchText } from './search-text-queries.ts'
import { type Writer, ofMix } from './subject.ts'
import { readUses } from './use-queries.ts'

/** @throws AppError `not-found` */
export async function readProduct(db: Database, id: string): Promise<ProductRecord> {
  const [row] = await db
    .select({ note: products.note, version: products.version, updatedAt: products.updatedAt })
    .from(products)
    .where(eq(products.id, id))
  const facts = (await readProductFacts(db, [id]))[id]
  if (!row || !facts) throw new AppError('not-found')
  return { ...facts, ...row, updatedAt: new Date(row.updatedAt).toISOString(), usedIn: await readUses(db, { productId: id }) }
}

/** @throws AppError `not-found` */
export async function readMix(db: Database, id: string): Promise<MixRecord> {
  const [row] = await db
    .select({ note: mixes.note, version: mixes.version, updatedAt: mixes.updatedAt })
    .from(mixes)
    .where(eq(mixes.id, id))
  const facts = (await readMixFacts(db, [id]))[id]
  if (!row || !facts) throw new AppError('not-found')
  return { ...facts, ...row, updatedAt: new Date(row.updatedAt).toISOString(), usedIn: await readUses(db, { mixId: id }) }
}

const taken = () =>
  new AppError('duplicate', {
    message: 'This maker already has one of this name.',
    fields: { name: 'This maker already has one of this name.' },
  })

async function refuseTaken(
  tx: Transaction,
  table: typeof products | typeof mixes,
  { name, maker, except }: { name: string; maker: string; except?: string },
): Promise<void> {
  const sameName = and(sql`lower(${table.name}) = lower(${name})`, sql`lower(${table.maker}) = lower(${maker})`)
  const rows = await tx
    .select({ id: table.id })
    .from(table)
    .where(and(sameName, except ? ne(table.id, except) : undefined))
    .limit(1)
  if (rows.length > 0) throw taken()
}

/** Two people may add the same at the same moment; the index then refuses the second. 23505 is unique_violation (PostgreSQL, appendix A). */
async function unlessTaken<T>(write: PromiseLike<T>): Promise<T> {
  try {
    return await write
  } catch (error) {
    if ((error as { cause?: { code?: unknown } }).cause?.code === '23505') throw taken()
    throw error
  }
}

export async function addProduct(tx: Transaction, body: z.output<typeof wire.addProduct.body>, by: Writer): Promise<string> {
  await refuseTaken(tx, products, body)
  const [row] = await unlessTaken(
    tx
      .insert(products)
      .values({ ...body, searchText: '' })
      .returning({ id: products.id }),
  )
  if (!row) throw new AppError('unavailable')
  await keepProductSearchText(tx, row.id)
  await recordChange(tx, { personId: by.id, action: 'added', subject: { kind: 'product', id: row.id }, to: body })
  return row.id
}

/** What a change really changes: fields that are given and say something else than before. */
function changesOf<T extends object>(given: T, before: object): { to: Partial<T>; from: Record<string, unknown> } {
  const was = before as Record<string, unknown>
  const changed = Object.entries(given).filter(([key, value]) => value !== undefined && value !== was[key])
  return { to: Object.fromEntries(changed) as Partial<T>, from: Object.fromEntries(changed.map(([key]) => [key, was[key]])) }
}

function actionOf(to: { status?: string | undefined }): string {
  if (to.status === undefined) return 'changed'
  return to.status === 'withdrawn' ? 'withdrawn' : 'restored'
}

/** @throws AppError `not-found`, `conflict` when someone has changed it since, `duplicate` */
export async function changeProduct(
  tx: Transaction,
  id: string,
  { by, version, ...body }: z.output<typeof wire.changeProduct.body> & { by: Writer },
): Promise<void> {
  const [before] = await tx.select().from(products).where(eq(products.id, id)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== version) throw new AppError('conflict')
  const { to, from } = changesOf(body, before)
  if (Object.keys(to).length === 0) return
  await refuseTaken(tx, products, { name: body.name ?? before.name, maker: body.maker ?? before.maker, except: id })
  await unlessTaken(
    tx
      .update(products)
      .set({ ...to, version: version + 1, updatedAt: sql`now()` })
      .where(eq(products.id, id)),
  )
  await keepProductSearchText(tx, id)
  await recordChange(tx, { personId: by.id, action: actionOf(to), subject: { kind: 'product', id }, from, to })
}

type Parts = z.output<typeof wire.addMix.body>['parts']

/** Parts must be in the catalogue; what is withdrawn stays where it is but is not newly chosen. */
async function keepParts(tx: Transaction, mixId: string, { parts, before }: { parts: Parts; before: Parts }): Promise<void> {
  const ids = parts.map(({ productId }) => productId)
  const found = new Map(
    (await tx.select({ id: products.id, status: products.status }).from(products).where(inArray(products.id, ids))).map(
      ({ id, status }) => [id, status],
    ),
  )
  const fields: Record<string, string> = {}
  for (const [index, { productId }] of parts.entries()) {
    const field = `parts.${index}.productId`
    if (!found.has(productId)) fields[field] = 'This product is not in the catalogue.'
    else if (found.get(productId) === 'withdrawn' && !before.some((part) => part.productId === productId))
      fields[field] = 'This product is withdrawn. Choose another.'
  }
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields })
  await tx.delete(mixParts).where(eq(mixParts.mixId, mixId))
  await tx.insert(mixParts).values(parts.map((part) => ({ mixId, ...part })))
}

export async function addMix(tx: Transaction, { ratio, parts, ...body }: z.output<typeof wire.addMix.body>, by: Writer): Promise<string> {
  await refuseTaken(tx, mixes, body)
  const [row] = await unlessTaken(
    tx
      .insert(mixes)
      .values({ ...body, searchText: '' })
      .returning({ id: mixes.id }),
  )
  if (!row) throw new AppError('unavailable')
  await keepParts(tx, row.id, { parts, before: [] })
  await keepMixSearchText(tx, row.id)
  await recordChange(tx, { personId: by.id, action: 'added', subject: { kind: 'mix', id: row.id }, to: { ...body, parts } })
  if (ratio) {
    const statement = { property: 'mixRatio' as const, part: 'mixed' as const, value: ratio.value }
    await addFact(tx, ofMix(row.id), { body: { statement, how: { kind: 'entered', reason: ratio.reason } }, by })
  }
  return row.id
}

/** @throws AppError `not-found`, `conflict` when someone has changed it since, `duplicate` */
export async function changeMix(
  tx: Transaction,
  id: string,
  { by, version, parts, ...body }: z.output<typeof wire.changeMix.body> & { by: Writer },
): Promise<void> {
  const [before] = await tx.select().from(mixes).where(eq(mixes.id, id)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== version) throw new AppError('conflict')
  const partsBefore = await tx
    .select({ part: mixParts.part, productId: mixParts.productId })
    .from(mixParts)
    .where(eq(mixParts.mixId, id))
    .orderBy(asc(mixParts.part))
  const { to, from } = changesOf(body, before)
  const changed =
    parts && JSON.stringify(parts.map(({ productId }) => productId)) !== JSON.stringify(partsBefore.map(({ productId }) => productId))
      ? parts
      : undefined
  if (Object.keys(to).length === 0 && !changed) return
  await refuseTaken(tx, mixes, { name: body.name ?? before.name, maker: body.maker ?? before.maker, except: id })
  await unlessTaken(
    tx
      .update(mixes)
      .set({ ...to, version: version + 1, updatedAt: sql`now()` })
      .where(eq(mixes.id, id)),
  )
  if (changed) await keepParts(tx, id, { parts: changed, before: partsBefore })
  await recordChange(tx, {
    personId: by.id,
    action: actionOf(to),
    subject: { kind: 'mix', id },
    from: { ...from, ...(changed ? { parts: partsBefore } : {}) },
    to: { ...to, ...(changed ? { parts: changed } : {}) },
  })
  if (changed && changed.length !== partsBefore.length) await endFactsOfLostParts(tx, id, { parts: changed.length, by })
  await keepMixSearchText(tx, id)
}
