import { and, asc, eq, isNull, ne, sql } from 'drizzle-orm'
import type * as z from 'zod'
import type { FactBody, MixRecord, ProductRecord, catalogueEndpoints as wire } from '../../../shared/api/catalogue.ts'
import { AppError } from '../../../shared/api/errors.ts'
import type { Fact } from '../../../shared/domain/fact.ts'
import { type Statement, definitionOf } from '../../../shared/domain/property.ts'
import { recordChange } from '../../db/audit.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { mixParts, mixes, products, propertyValues, sheetSubjects } from '../../db/schema/catalogue.ts'
import { sheetPages, sheetRevisions } from '../../db/schema/sheets.ts'
import { readFactsOf, readMixFacts, readProductFacts } from './queries.ts'
import { readUses } from './use-queries.ts'

/** Who writes; null for what the system fills in by itself. */
export interface Writer {
  id: string | null
  name: string
}
export type Subject = { productId: string; mixId: null } | { productId: null; mixId: string }

const kindOf = (subject: Subject) => (subject.productId === null ? 'mix' : 'product')
const idOf = (subject: Subject) => subject.productId ?? subject.mixId
export const ofProduct = (productId: string): Subject => ({ productId, mixId: null })
export const ofMix = (mixId: string): Subject => ({ productId: null, mixId })

/** @throws AppError `not-found` */
export async function readProduct(db: Database, id: string): Promise<ProductRecord> {
  const [row] = await db.select({ note: products.note, version: products.version, updatedAt: products.updatedAt }).from(products).where(eq(products.id, id))
  const facts = (await readProductFacts(db, [id]))[id]
  if (!row || !facts) throw new AppError('not-found')
  return { ...facts, ...row, updatedAt: new Date(row.updatedAt).toISOString(), usedIn: await readUses(db, { productId: id }) }
}

/** @throws AppError `not-found` */
export async function readMix(db: Database, id: string): Promise<MixRecord> {
  const [row] = await db.select({ note: mixes.note, version: mixes.version, updatedAt: mixes.updatedAt }).from(mixes).where(eq(mixes.id, id))
  const facts = (await readMixFacts(db, [id]))[id]
  if (!row || !facts) throw new AppError('not-found')
  return { ...facts, ...row, updatedAt: new Date(row.updatedAt).toISOString(), usedIn: await readUses(db, { mixId: id }) }
}

const taken = () => new AppError('duplicate', { message: 'This maker already has one of this name.', fields: { name: 'This name is taken for this maker.' } })

async function refuseTaken(tx: Transaction, table: typeof products | typeof mixes, { name, maker, except }: { name: string; maker: string; except?: string }): Promise<void> {
  const same = and(eq(sql`lower(${table.name})`, name.toLowerCase()), eq(sql`lower(${table.maker})`, maker.toLowerCase()), except ? ne(table.id, except) : undefined)
  const rows = await tx.select({ id: table.id }).from(table).where(same).limit(1)
  if (rows.length > 0) throw taken()
}

export async function addProduct(tx: Transaction, body: z.output<typeof wire.addProduct.body>, by: Writer): Promise<string> {
  await refuseTaken(tx, products, body)
  const [row] = await tx.insert(products).values({ ...body, searchText: '' }).returning({ id: products.id })
  if (!row) throw new AppError('unavailable')
  await keepSearchText(tx, ofProduct(row.id))
  await recordChange(tx, { personId: by.id, action: 'added', subject: { kind: 'product', id: row.id }, to: body })
  return row.id
}

const present = <T extends object>(values: T) => Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined)) as Partial<T>

export async function changeProduct(tx: Transaction, id: string, { by, version, ...body }: z.output<typeof wire.changeProduct.body> & { by: Writer }): Promise<void> {
  const [before] = await tx.select().from(products).where(eq(products.id, id)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== version) throw new AppError('conflict')
  const to = present(body)
  await refuseTaken(tx, products, { name: body.name ?? before.name, maker: body.maker ?? before.maker, except: id })
  await tx.update(products).set({ ...to, version: version + 1, updatedAt: sql`now()` }).where(eq(products.id, id))
  await keepSearchText(tx, ofProduct(id))
  await recordChange(tx, { personId: by.id, action: actionOf(body.status), subject: { kind: 'product', id }, from: pick(before, to), to })
}

const actionOf = (status: string | undefined) => (status === 'withdrawn' ? 'withdrawn' : status === 'active' ? 'restored' : 'changed')
const pick = (before: object, keys: object) => Object.fromEntries(Object.keys(keys).map((key) => [key, (before as Record<string, unknown>)[key]]))

async function keepParts(tx: Transaction, mixId: string, parts: { part: 'A' | 'B' | 'C'; productId: string }[]): Promise<void> {
  for (const [index, { productId }] of parts.entries()) {
    const [product] = await tx.select({ id: products.id }).from(products).where(eq(products.id, productId))
    if (!product) throw new AppError('invalid', { fields: { [`parts.${index}.productId`]: 'This product is not in the catalogue.' } })
  }
  await tx.delete(mixParts).where(eq(mixParts.mixId, mixId))
  await tx.insert(mixParts).values(parts.map((part) => ({ mixId, ...part })))
}

export async function addMix(tx: Transaction, { ratio, parts, ...body }: z.output<typeof wire.addMix.body>, by: Writer): Promise<string> {
  await refuseTaken(tx, mixes, body)
  const [row] = await tx.insert(mixes).values({ ...body, searchText: '' }).returning({ id: mixes.id })
  if (!row) throw new AppError('unavailable')
  await keepParts(tx, row.id, parts)
  await keepSearchText(tx, ofMix(row.id))
  await recordChange(tx, { personId: by.id, action: 'added', subject: { kind: 'mix', id: row.id }, to: { ...body, parts } })
  if (ratio) {
    const statement: Statement = { property: 'mixRatio', part: 'mixed', value: ratio.value }
    await addFact(tx, ofMix(row.id), { statement, how: { kind: 'entered', reason: ratio.reason }, by })
  }
  return row.id
}

export async function changeMix(tx: Transaction, id: string, { by, version, parts, ...body }: z.output<typeof wire.changeMix.body> & { by: Writer }): Promise<void> {
  const [before] = await tx.select().from(mixes).where(eq(mixes.id, id)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== version) throw new AppError('conflict')
  const partsBefore = await tx.select({ part: mixParts.part, productId: mixParts.productId }).from(mixParts).where(eq(mixParts.mixId, id)).orderBy(asc(mixParts.part))
  const to = present(body)
  await refuseTaken(tx, mixes, { name: body.name ?? before.name, maker: body.maker ?? before.maker, except: id })
  await tx.update(mixes).set({ ...to, version: version + 1, updatedAt: sql`now()` }).where(eq(mixes.id, id))
  if (parts) await keepParts(tx, id, parts)
  await keepSearchText(tx, ofMix(id))
  const from = { ...pick(before, to), ...(parts ? { parts: partsBefore } : {}) }
  await recordChange(tx, { personId: by.id, action: actionOf(body.status), subject: { kind: 'mix', id }, from, to: { ...to, ...(parts ? { parts } : {}) } })
}

/** Name, maker, kind, chemistry, CAS numbers and hazard codes, for the search. */
async function keepSearchText(tx: Transaction, subject: Subject): Promise<void> {
  const id = idOf(subject)
  const facts = (await readFactsOf(tx, { productIds: subject.productId ? [subject.productId] : [], mixIds: subject.mixId ? [subject.mixId] : [] })).get(id) ?? []
  const words = facts.flatMap(({ value }) => ('codes' in value ? value.codes : 'name' in value ? [value.name, value.cas ?? ''] : []))
  const text = sql`lower(concat_ws(' ', name, maker, chemistry, ${words.join(' ')}::text))`
  if (subject.productId !== null) await tx.update(products).set({ searchText: sql`${text} || ' ' || kind` }).where(eq(products.id, id))
  else await tx.update(mixes).set({ searchText: text }).where(eq(mixes.id, id))
}

/** A cited page must be of a sheet that speaks of the subject, and must be there. */
async function refuseWrongCitation(tx: Transaction, subject: Subject, { how }: FactBody): Promise<void> {
  if (how.kind !== 'stated') return
  const [revision] = await tx.select({ sheetId: sheetRevisions.sheetId, pages: sheetRevisions.pages }).from(sheetRevisions).where(eq(sheetRevisions.id, how.revisionId))
  if (!revision) throw new AppError('invalid', { fields: { 'how.revisionId': 'This sheet is not here.' } })
  const ofSubject = subject.productId === null ? eq(sheetSubjects.mixId, subject.mixId) : eq(sheetSubjects.productId, subject.productId)
  const linked = await tx.select({ id: sheetSubjects.id }).from(sheetSubjects).where(and(eq(sheetSubjects.sheetId, revision.sheetId), ofSubject))
  if (linked.length === 0) throw new AppError('invalid', { fields: { 'how.revisionId': 'This sheet is not one of this record. Attach it first.' } })
  const [page] = await tx.select({ width: sheetPages.width, height: sheetPages.height }).from(sheetPages).where(and(eq(sheetPages.revisionId, how.revisionId), eq(sheetPages.page, how.page)))
  if (!page) throw new AppError('invalid', { fields: { 'how.page': `The sheet has ${revision.pages} pages.` } })
  const { box } = how
  if (box && (box[0] >= box[2] || box[1] >= box[3] || box[0] < -1 || box[1] < -1 || box[2] > page.width + 1 || box[3] > page.height + 1)) {
    throw new AppError('invalid', { fields: { 'how.box': 'The box is not on the page.' } })
  }
}

function columnsOf({ statement, how }: FactBody, by: Writer) {
  const cited = how.kind === 'stated' ? { revisionId: how.revisionId, page: how.page, box: how.box, quote: how.quote, reason: null } : { revisionId: null, page: null, box: null, quote: null, reason: how.reason }
  const { property, part, value, at, film, of, thinned } = statement
  return { property, part, value, at: at ?? null, film: film ?? null, of: of ?? null, thinned: thinned ?? null, kind: how.kind, ...cited, byPersonId: by.id, byName: by.name }
}

async function readFact(tx: Transaction, subject: Subject, factId: string): Promise<Fact> {
  const facts = await readFactsOf(tx, { productIds: subject.productId ? [subject.productId] : [], mixIds: subject.mixId ? [subject.mixId] : [] })
  const fact = facts.get(idOf(subject))?.find(({ id }) => id === factId)
  if (!fact) throw new AppError('not-found')
  return fact
}

/** Adds a value. A property that does not repeat takes the place of the one that was there. */
export async function addFact(tx: Transaction, subject: Subject, { by, ...body }: FactBody & { by: Writer }): Promise<Fact> {
  const exists = subject.productId === null
    ? await tx.select({ id: mixes.id }).from(mixes).where(eq(mixes.id, subject.mixId)).for('update')
    : await tx.select({ id: products.id }).from(products).where(eq(products.id, subject.productId)).for('update')
  if (exists.length === 0) throw new AppError('not-found')
  await refuseWrongCitation(tx, subject, body)
  const { property, part } = body.statement
  const live = and(
    subject.productId === null ? eq(propertyValues.mixId, subject.mixId) : eq(propertyValues.productId, subject.productId),
    eq(propertyValues.property, property), eq(propertyValues.part, part), isNull(propertyValues.endedAt),
  )
  const replaced = definitionOf(property).repeats ? [] : await tx.update(propertyValues).set({ endedAt: sql`now()` }).where(live).returning({ value: propertyValues.value, at: propertyValues.at })
  const [row] = await tx.insert(propertyValues).values({ ...columnsOf(body, by), productId: subject.productId, mixId: subject.mixId }).returning({ id: propertyValues.id })
  if (!row) throw new AppError('unavailable')
  await keepSearchText(tx, subject)
  await recordChange(tx, { personId: by.id, action: 'value-set', subject: { kind: kindOf(subject), id: idOf(subject) }, ...(replaced[0] ? { from: { property, part, ...replaced[0] } } : {}), to: body })
  return readFact(tx, subject, row.id)
}

/**
 * Adds many values of one record at once, those of its sheets when they are first read in. The pages are taken to be right: they come from the
 * reader, not from a person. One row of the trail for all.
 */
export async function addFactsAtOnce(tx: Transaction, subject: Subject, { bodies, by }: { bodies: readonly FactBody[]; by: Writer }): Promise<void> {
  if (bodies.length === 0) return
  const rows = bodies.map((body, position) => ({ ...columnsOf(body, by), position, productId: subject.productId, mixId: subject.mixId }))
  await tx.insert(propertyValues).values(rows)
  await keepSearchText(tx, subject)
  await recordChange(tx, { personId: by.id, action: 'values-set', subject: { kind: kindOf(subject), id: idOf(subject) }, to: { values: bodies.length } })
}

async function liveFact(tx: Transaction, factId: string) {
  const [row] = await tx.select().from(propertyValues).where(and(eq(propertyValues.id, factId), isNull(propertyValues.endedAt))).for('update')
  if (!row) throw new AppError('not-found')
  const subject: Subject = row.productId === null ? ofMix(row.mixId ?? '') : ofProduct(row.productId)
  return { row, subject }
}

const saidBy = ({ property, part, value, at, kind, reason, revisionId, page, quote }: typeof propertyValues.$inferSelect) => ({ property, part, value, at, kind, reason, revisionId, page, quote })

/** Puts another value in the place of one, in the same place of a table. */
export async function amendFact(tx: Transaction, factId: string, { by, ...body }: FactBody & { by: Writer }): Promise<Fact> {
  const { row, subject } = await liveFact(tx, factId)
  await refuseWrongCitation(tx, subject, body)
  await tx.update(propertyValues).set({ endedAt: sql`now()` }).where(eq(propertyValues.id, factId))
  const [made] = await tx.insert(propertyValues).values({ ...columnsOf(body, by), position: row.position, productId: subject.productId, mixId: subject.mixId }).returning({ id: propertyValues.id })
  if (!made) throw new AppError('unavailable')
  await keepSearchText(tx, subject)
  await recordChange(tx, { personId: by.id, action: 'value-amended', subject: { kind: kindOf(subject), id: idOf(subject) }, from: saidBy(row), to: body })
  return readFact(tx, subject, made.id)
}

/** Takes a value out; it stays in the history. */
export async function endFact(tx: Transaction, factId: string, by: Writer): Promise<void> {
  const { row, subject } = await liveFact(tx, factId)
  await tx.update(propertyValues).set({ endedAt: sql`now()` }).where(eq(propertyValues.id, factId))
  await keepSearchText(tx, subject)
  await recordChange(tx, { personId: by.id, action: 'value-removed', subject: { kind: kindOf(subject), id: idOf(subject) }, from: saidBy(row) })
}
