import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { SpecIssueSummary, SpecSummary } from '../../../shared/api/specifications.ts'
import type { User } from '../../../shared/api/session.ts'
import { recordChange } from '../../db/audit.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { jobs } from '../../db/schema/jobs.ts'
import { sheetRevisions, sheets } from '../../db/schema/sheets.ts'
import { specificationIssues as issues, specifications } from '../../db/schema/specifications.ts'

type Reader = Database | Transaction

const iso = (text: string) => new Date(text).toISOString()

async function issuesOf(db: Reader, ids: string[]): Promise<Map<string, SpecIssueSummary[]>> {
  const found = new Map<string, SpecIssueSummary[]>(ids.map((id) => [id, []]))
  if (ids.length === 0) return found
  const rows = await db
    .select({ of: issues.specificationId, number: issues.number, issuedAt: issues.issuedAt, issuedByName: issues.issuedByName })
    .from(issues)
    .where(inArray(issues.specificationId, ids))
    .orderBy(desc(issues.number))
  for (const { of, ...issue } of rows) found.get(of)?.push({ ...issue, issuedAt: iso(issue.issuedAt) })
  return found
}

async function summaries(db: Reader, rows: (typeof specifications.$inferSelect)[]): Promise<SpecSummary[]> {
  const issued = await issuesOf(
    db,
    rows.map(({ id }) => id),
  )
  return rows.map(({ createdAt: _, updatedAt, ...row }) => ({ ...row, updatedAt: iso(updatedAt), issues: issued.get(row.id) ?? [] }))
}

/** @throws AppError `not-found` when there is no such job */
export async function listSpecifications(db: Reader, jobId: string): Promise<SpecSummary[]> {
  const [job] = await db.select({ id: jobs.id }).from(jobs).where(eq(jobs.id, jobId))
  if (!job) throw new AppError('not-found')
  return summaries(
    db,
    await db
      .select()
      .from(specifications)
      .where(eq(specifications.jobId, jobId))
      .orderBy(asc(specifications.createdAt), asc(specifications.id)),
  )
}

/** @throws AppError `not-found` */
export async function readSummary(db: Reader, specificationId: string): Promise<SpecSummary> {
  const rows = await db.select().from(specifications).where(eq(specifications.id, specificationId))
  const [found] = await summaries(db, rows)
  if (!found) throw new AppError('not-found')
  return found
}

interface Named {
  title: string
  sectionNumber: string
}

/** Begins a specification; returns its id. `personId` null: the system itself. */
export async function addSpecification(
  tx: Transaction,
  { jobId, title, sectionNumber }: Named & { jobId: string },
  personId: string | null,
): Promise<string> {
  const [row] = await tx.insert(specifications).values({ jobId, title, sectionNumber }).returning({ id: specifications.id })
  if (!row) throw new AppError('unavailable')
  await recordChange(tx, { personId, action: 'added', subject: { kind: 'specification', id: row.id }, to: { jobId, title, sectionNumber } })
  return row.id
}

export async function changeSpecification(
  tx: Transaction,
  id: string,
  { version, by, ...to }: Named & { version: number; by: User },
): Promise<void> {
  const before = await takeSpecification(tx, { id, version })
  await tx
    .update(specifications)
    .set({ ...to, version: version + 1, updatedAt: sql`now()` })
    .where(eq(specifications.id, id))
  await recordChange(tx, {
    personId: by.id,
    action: 'changed',
    subject: { kind: 'specification', id },
    from: { title: before.title, sectionNumber: before.sectionNumber },
    to,
  })
}

/** Locks a specification for changing; another version than the person saw is a conflict. */
async function takeSpecification(tx: Transaction, { id, version }: { id: string; version: number }) {
  const [row] = await tx.select().from(specifications).where(eq(specifications.id, id)).for('update')
  if (!row) throw new AppError('not-found')
  if (row.version !== version) throw new AppError('conflict')
  return row
}

interface Frozen {
  specificationId: string
  version: number
  number: number
  issuedAt: string
  by: { id: string | null; name: string }
  tree: string
  treeSha256: string
  docxSha256: string
  pdfSha256: string
  facts: unknown
}

/** Keeps an issue for good. One issued meanwhile under the same number is a conflict. */
export async function keepIssue(tx: Transaction, { version, by, ...issue }: Frozen): Promise<void> {
  await takeSpecification(tx, { id: issue.specificationId, version })
  const [last] = await tx
    .select({ number: sql<number | null>`max(${issues.number})` })
    .from(issues)
    .where(eq(issues.specificationId, issue.specificationId))
  if ((last?.number ?? 0) + 1 !== issue.number) throw new AppError('conflict')
  await tx.insert(issues).values({ ...issue, issuedBy: by.id, issuedByName: by.name })
  await tx
    .update(specifications)
    .set({ version: version + 1, updatedAt: sql`now()` })
    .where(eq(specifications.id, issue.specificationId))
  const { number, treeSha256, docxSha256, pdfSha256 } = issue
  await recordChange(tx, {
    personId: by.id,
    action: 'issued',
    subject: { kind: 'specification', id: issue.specificationId },
    to: { number, treeSha256, docxSha256, pdfSha256 },
  })
}

/** @throws AppError `not-found` */
export async function readIssueRow(db: Reader, { specificationId, number }: { specificationId: string; number: number }) {
  const [row] = await db
    .select({ issue: issues, jobId: jobs.id, jobName: jobs.name })
    .from(issues)
    .innerJoin(specifications, eq(specifications.id, issues.specificationId))
    .innerJoin(jobs, eq(jobs.id, specifications.jobId))
    .where(and(eq(issues.specificationId, specificationId), eq(issues.number, number)))
  if (!row) throw new AppError('not-found')
  return { ...row.issue, issuedAt: iso(row.issue.issuedAt), jobId: row.jobId, jobName: row.jobName }
}

/** Titles of the sheets among some revisions that a newer revision has replaced. */
export async function supersededAmong(db: Reader, revisionIds: readonly string[]): Promise<string[]> {
  if (revisionIds.length === 0) return []
  const newer = sql`exists (select 1 from sheet_revisions newer where newer.sheet_id = ${sheetRevisions.sheetId} and newer.sequence > ${sheetRevisions.sequence})`
  const rows = await db
    .selectDistinct({ title: sheets.title })
    .from(sheetRevisions)
    .innerJoin(sheets, eq(sheets.id, sheetRevisions.sheetId))
    .where(and(inArray(sheetRevisions.id, [...new Set(revisionIds)]), newer))
    .orderBy(asc(sheets.title))
  return rows.map(({ title }) => title)
}
