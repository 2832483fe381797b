import { and, eq, sql } from 'drizzle-orm'
import type { FactBody } from '../../../shared/api/catalogue.ts'
import { AppError } from '../../../shared/api/errors.ts'
import type { Fact } from '../../../shared/domain/fact.ts'
import { type Statement, definitionOf } from '../../../shared/domain/property.ts'
import { recordChange } from '../../db/audit.ts'
import type { Transaction } from '../../db/open.ts'
import { mixParts, mixes, products, propertyValues, sheetSubjects } from '../../db/schema/catalogue.ts'
import { sheetPages, sheetRevisions } from '../../db/schema/sheets.ts'
import { readFactsOf } from './queries.ts'
import { keepMixSearchText, keepProductSearchText } from './search-text-queries.ts'
import { type Subject, type Writer, ofMix, ofProduct, recordOf } from './subject.ts'

const isOf = (subject: Subject) =>
  subject.productId === null ? eq(propertyValues.mixId, subject.mixId) : eq(propertyValues.productId, subject.productId)
const keepSearchText = (tx: Transaction, subject: Subject) =>
  subject.productId === null ? keepMixSearchText(tx, subject.mixId) : keepProductSearchText(tx, subject.productId)

/** Locks the record that values are said of, so that two people's values come one after the other. */
async function lockRecord(tx: Transaction, subject: Subject): Promise<void> {
  const rows =
    subject.productId === null
      ? await tx.select({ id: mixes.id }).from(mixes).where(eq(mixes.id, subject.mixId)).for('update')
      : await tx.select({ id: products.id }).from(products).where(eq(products.id, subject.productId)).for('update')
  if (rows.length === 0) throw new AppError('not-found')
}

const refuse = (field: string, message: string) => new AppError('invalid', { fields: { [field]: message } })

/** A value is said of a part that the record has, and a ratio has the parts of its mix. */
async function refuseWrongPart(tx: Transaction, subject: Subject, { statement }: FactBody): Promise<void> {
  const { part, value } = statement
  if (subject.productId !== null) {
    if (part !== 'mixed') throw refuse('statement.part', 'A product is one thing; parts belong to the mix.')
    if ('parts' in value) throw refuse('statement.property', 'A ratio belongs to the mix, not to one product.')
    return
  }
  const parts = await tx.select({ part: mixParts.part }).from(mixParts).where(eq(mixParts.mixId, subject.mixId))
  if (part !== 'mixed' && !parts.some((one) => one.part === part)) throw refuse('statement.part', `This mix has no part ${part}.`)
  if (!('parts' in value) || value.parts.length === parts.length) return
  const message =
    parts.length === 1 ? 'One part alone has no ratio.' : `The mix has ${parts.length} parts, this ratio ${value.parts.length}.`
  throw refuse('statement.value.parts', message)
}

/** A cited page must be of a sheet that speaks of the record, and must be there; a box must lie on it. */
async function refuseWrongCitation(tx: Transaction, subject: Subject, { how }: FactBody): Promise<void> {
  if (how.kind !== 'stated') return
  const [revision] = await tx
    .select({ sheetId: sheetRevisions.sheetId, pages: sheetRevisions.pages })
    .from(sheetRevisions)
    .where(eq(sheetRevisions.id, how.revisionId))
  if (!revision) throw refuse('how.revisionId', 'This sheet is not here.')
  const ofSubject = subject.productId === null ? eq(sheetSubjects.mixId, subject.mixId) : eq(sheetSubjects.productId, subject.productId)
  const linked = await tx
    .select({ id: sheetSubjects.id })
    .from(sheetSubjects)
    .where(and(eq(sheetSubjects.sheetId, revision.sheetId), ofSubject))
  if (linked.length === 0) throw refuse('how.revisionId', 'This sheet is not one of this record. Attach it first.')
  if (how.page > revision.pages)
    throw refuse('how.page', revision.pages === 1 ? 'The sheet has one page.' : `The sheet has ${revision.pages} pages.`)
  if (!how.box) return
  const [page] = await tx
    .select({ width: sheetPages.width, height: sheetPages.height })
    .from(sheetPages)
    .where(and(eq(sheetPages.revisionId, how.revisionId), eq(sheetPages.page, how.page)))
  const [left, top, right, bottom] = how.box
  const onPage = page && left >= -1 && top >= -1 && right <= page.width + 1 && bottom <= page.height + 1
  if (!onPage || left >= right || top >= bottom) throw refuse('how.box', 'The box is not on the page.')
}

function columnsOf({ statement, how }: FactBody, by: Writer) {
  const cited =
    how.kind === 'stated'
      ? { revisionId: how.revisionId, page: how.page, box: how.box, quote: how.quote, reason: null }
      : { revisionId: null, page: null, box: null, quote: null, reason: how.reason }
  const { property, part, value, at, film, of, thinned } = statement
  return {
    property,
    part,
    value,
    at: at ?? null,
    film: film ?? null,
    of: of ?? null,
    thinned: thinned ?? null,
    kind: how.kind,
    ...cited,
    byPersonId: by.id,
    byName: by.name,
  }
}

const sortedJson = (value: unknown): string =>
  JSON.stringify(value, (_, inner: unknown) =>
    inner && typeof inner === 'object' && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  )
/** The same value of the same thing under the same conditions, however it is known. */
const sayTheSame = (a: Statement, b: Statement) => {
  const said = ({ property, part, value, at, film, of, thinned }: Statement) =>
    sortedJson({ property, part, value, at, film, of, thinned: thinned ?? false })
  return said(a) === said(b)
}

async function liveFactsOf(tx: Transaction, subject: Subject): Promise<Fact[]> {
  const facts = await readFactsOf(tx, {
    productIds: subject.productId ? [subject.productId] : [],
    mixIds: subject.mixId ? [subject.mixId] : [],
  })
  return facts.get(recordOf(subject).id) ?? []
}

async function endRow(tx: Transaction, id: string): Promise<void> {
  await tx
    .update(propertyValues)
    .set({ endedAt: sql`now()` })
    .where(eq(propertyValues.id, id))
}

async function insertFact(tx: Transaction, subject: Subject, values: ReturnType<typeof columnsOf> & { position?: number }): Promise<Fact> {
  const next = sql`(select coalesce(max(position), -1) + 1 from property_values where ${isOf(subject)} and property = ${values.property})`
  const [row] = await tx
    .insert(propertyValues)
    .values({ ...values, position: values.position ?? next, productId: subject.productId, mixId: subject.mixId })
    .returning({ id: propertyValues.id })
  await keepSearchText(tx, subject)
  const fact = (await liveFactsOf(tx, subject)).find(({ id }) => id === row?.id)
  if (!fact) throw new AppError('unavailable')
  return fact
}

const ofSame = (facts: readonly Fact[], { property, part }: Pick<Fact, 'property' | 'part'>) =>
  facts.filter((fact) => fact.property === property && fact.part === part)

/** Adds a value. A property that does not repeat takes the place of the value that was there. */
export async function addFact(tx: Transaction, subject: Subject, { body, by }: { body: FactBody; by: Writer }): Promise<Fact> {
  await lockRecord(tx, subject)
  await refuseWrongPart(tx, subject, body)
  await refuseWrongCitation(tx, subject, body)
  const there = ofSame(await liveFactsOf(tx, subject), body.statement)
  const repeats = definitionOf(body.statement.property).repeats
  if (repeats && there.some((fact) => sayTheSame(fact, body.statement))) {
    throw new AppError('duplicate', {
      message: 'This value is here already, with the same conditions. Amend it to say how else it is known.',
    })
  }
  const [replaced] = repeats ? [] : there
  if (replaced) await endRow(tx, replaced.id)
  const fact = await insertFact(tx, subject, columnsOf(body, by))
  await recordChange(tx, {
    personId: by.id,
    action: 'value-set',
    subject: recordOf(subject),
    ...(replaced ? { from: replaced } : {}),
    to: fact,
  })
  return fact
}

/**
 * Adds many values of one record at once, those of its sheets when they are first read in. The pages are taken to be right: they come from the
 * reader, not from a person. One row of the trail for all.
 */
export async function addFactsAtOnce(
  tx: Transaction,
  subject: Subject,
  { bodies, by }: { bodies: readonly FactBody[]; by: Writer },
): Promise<void> {
  if (bodies.length === 0) return
  const rows = bodies.map((body, position) => ({ ...columnsOf(body, by), position, productId: subject.productId, mixId: subject.mixId }))
  await tx.insert(propertyValues).values(rows)
  await keepSearchText(tx, subject)
  await recordChange(tx, { personId: by.id, action: 'values-set', subject: recordOf(subject), to: { values: bodies.length } })
}

/** A live value with its record locked. @throws AppError `not-found`, or `conflict` when someone has changed or removed it meanwhile. */
async function lockFact(tx: Transaction, factId: string) {
  const where = eq(propertyValues.id, factId)
  const [found] = await tx
    .select({ productId: propertyValues.productId, mixId: propertyValues.mixId, position: propertyValues.position })
    .from(propertyValues)
    .where(where)
  if (!found) throw new AppError('not-found')
  const subject = found.productId === null ? ofMix(found.mixId ?? '') : ofProduct(found.productId)
  await lockRecord(tx, subject)
  const facts = await liveFactsOf(tx, subject)
  const fact = facts.find(({ id }) => id === factId)
  if (!fact)
    throw new AppError('conflict', {
      message: 'Someone else has changed or removed this value meanwhile. Go back to the record and look at what stands there now.',
    })
  return { fact, others: facts.filter(({ id }) => id !== factId), subject, position: found.position }
}

/** Puts another value of the same property in the place of one, in the same place of a table. */
export async function amendFact(tx: Transaction, factId: string, { body, by }: { body: FactBody; by: Writer }): Promise<Fact> {
  const { fact: before, others, subject, position } = await lockFact(tx, factId)
  const { statement } = body
  if (statement.property !== before.property) throw refuse('statement.property', 'An amended value stays one of the same property.')
  await refuseWrongPart(tx, subject, body)
  await refuseWrongCitation(tx, subject, body)
  const there = ofSame(others, statement)
  if (definitionOf(statement.property).repeats) {
    if (there.some((fact) => sayTheSame(fact, statement)))
      throw new AppError('duplicate', { message: 'This value is here already, with the same conditions.' })
  } else if (there.length > 0) throw refuse('statement.part', 'There is a value of this part already. Amend that one.')
  await endRow(tx, factId)
  const fact = await insertFact(tx, subject, { ...columnsOf(body, by), position })
  await recordChange(tx, { personId: by.id, action: 'value-amended', subject: recordOf(subject), from: before, to: fact })
  return fact
}

/** Takes a value out; it stays in the history. */
export async function endFact(tx: Transaction, factId: string, by: Writer): Promise<void> {
  const { fact, subject } = await lockFact(tx, factId)
  await endRow(tx, factId)
  await keepSearchText(tx, subject)
  await recordChange(tx, { personId: by.id, action: 'value-removed', subject: recordOf(subject), from: fact })
}

/** Takes out what no longer fits a mix whose parts have changed in number: ratios of another length, values of parts that are gone. */
export async function endFactsOfLostParts(tx: Transaction, mixId: string, { parts, by }: { parts: number; by: Writer }): Promise<void> {
  const kept = ['mixed', ...['A', 'B', 'C'].slice(0, parts)]
  const fits = ({ part, value }: Fact) => kept.includes(part) && (!('parts' in value) || value.parts.length === parts)
  for (const fact of (await liveFactsOf(tx, ofMix(mixId))).filter((one) => !fits(one))) {
    await endRow(tx, fact.id)
    await recordChange(tx, {
      personId: by.id,
      action: 'value-removed',
      subject: { kind: 'mix', id: mixId },
      from: fact,
      to: { because: 'The mix has other parts now.' },
    })
  }
}
