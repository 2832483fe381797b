import { and, asc, count, desc, eq, inArray, or, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { Job, JobBody, JobBuildUp, JobSummary } from '../../../shared/api/jobs.ts'
import type { User } from '../../../shared/api/session.ts'
import type { JobConditions } from '../../../shared/domain/job.ts'
import { recordChange } from '../../db/audit.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { buildUps, buildUpVersions } from '../../db/schema/build-ups.ts'
import { bays, jobPeople, jobs } from '../../db/schema/jobs.ts'
import { people } from '../../db/schema/people.ts'
import { offsetOf, pageOf } from '../../http/list.ts'
import { readVersion } from '../build-ups/queries.ts'

type Reader = Database | Transaction

const sortColumns = {
  number: jobs.number,
  name: jobs.name,
  client: jobs.client,
  startsAt: jobs.startsAt,
  updatedAt: jobs.updatedAt,
} as const

interface JobsWanted {
  q: string
  sort: string
  limit: number
  cursor?: string | undefined
  status?: 'open' | 'closed' | undefined
  /** Only the jobs this person is on: a crew's view. */
  ofPerson?: string
}

/** Jobs by name, client or site, with typing errors forgiven. */
export async function listJobs(db: Database, { q, sort, limit, cursor, status, ofPerson }: JobsWanted) {
  const offset = offsetOf(cursor)
  const words = q.toLowerCase()
  const where = and(
    status ? eq(jobs.status, status) : undefined,
    words ? or(sql`position(${words} in ${jobs.searchText}) > 0`, sql`word_similarity(${words}, ${jobs.searchText}) > 0.5`) : undefined,
    ofPerson ? inArray(jobs.id, db.select({ id: jobPeople.jobId }).from(jobPeople).where(eq(jobPeople.personId, ofPerson))) : undefined,
  )
  const column = sortColumns[sort.replace(/^-/, '') as keyof typeof sortColumns]
  const order = sort.startsWith('-') ? desc(column) : asc(column)
  const [rows, [counted]] = await Promise.all([
    db
      .select({
        id: jobs.id,
        number: jobs.number,
        name: jobs.name,
        client: jobs.client,
        site: jobs.site,
        status: jobs.status,
        startsAt: jobs.startsAt,
        updatedAt: jobs.updatedAt,
        bays: sql<number>`(select count(*)::int from ${bays} where ${bays.jobId} = ${jobs.id})`,
        buildUpId: buildUps.id,
        buildUpNumber: buildUps.number,
        buildUpName: buildUps.name,
        buildUpVersion: buildUpVersions.number,
      })
      .from(jobs)
      .leftJoin(buildUpVersions, eq(buildUpVersions.id, jobs.buildUpVersionId))
      .leftJoin(buildUps, eq(buildUps.id, buildUpVersions.buildUpId))
      .where(where)
      .orderBy(order, asc(jobs.id))
      .limit(limit)
      .offset(offset),
    db.select({ total: count() }).from(jobs).where(where),
  ])
  const items = rows.map(({ buildUpId, buildUpNumber, buildUpName, buildUpVersion, ...job }): JobSummary => ({
    ...job,
    startsAt: instant(job.startsAt),
    updatedAt: instant(job.updatedAt) ?? '',
    buildUp:
      buildUpId && buildUpNumber && buildUpName && buildUpVersion
        ? { id: buildUpId, number: buildUpNumber, name: buildUpName, version: buildUpVersion }
        : null,
  }))
  return pageOf(items, { offset, limit, total: counted?.total ?? 0 })
}

/** PostgreSQL's text of an instant as ISO 8601. */
function instant(text: string | null): string | null {
  return text === null ? null : new Date(text).toISOString()
}

/** A job without the facts of its build-up: those come from the build-ups' own queries. */
export type JobRecord = Omit<Job, 'buildUp' | 'siteCardUrl'> & { buildUpVersionId: string | null }

/** Is the person one of the job's crew? */
export async function isOnJob(db: Reader, { jobId, personId }: { jobId: string; personId: string }): Promise<boolean> {
  const rows = await db
    .select({ id: jobPeople.jobId })
    .from(jobPeople)
    .where(and(eq(jobPeople.jobId, jobId), eq(jobPeople.personId, personId)))
  return rows.length > 0
}

/** @throws AppError `not-found` */
export async function readJobRecord(db: Reader, jobId: string): Promise<JobRecord> {
  const [row] = await db.select().from(jobs).where(eq(jobs.id, jobId))
  if (!row) throw new AppError('not-found')
  const bayRows = await db.select({ bay: bays.bay }).from(bays).where(eq(bays.jobId, jobId)).orderBy(asc(bays.position))
  const crew = await db
    .select({ id: people.id, name: people.name })
    .from(jobPeople)
    .innerJoin(people, eq(people.id, jobPeople.personId))
    .where(eq(jobPeople.jobId, jobId))
    .orderBy(asc(people.name))
  const { searchText: _, ...job } = row
  return { ...job, startsAt: instant(job.startsAt), updatedAt: instant(job.updatedAt) ?? '', bays: bayRows.map(({ bay }) => bay), crew }
}

const searchTextOf = ({ name, client, site }: JobBody) => [name, client, site].join(' ').toLowerCase()

/** Columns of a job as a request gives them. */
function columnsOf(body: JobBody) {
  const { bays: _bays, crewIds: _crew, ...columns } = body
  return { ...columns, searchText: searchTextOf(body), updatedAt: sql`now()` }
}

/** Opens a job; returns its id. */
export async function addJob(tx: Transaction, body: JobBody, personId: string | null): Promise<string> {
  await refuseUnknownReferences(tx, body)
  const [row] = await tx.insert(jobs).values(columnsOf(body)).returning({ id: jobs.id })
  if (!row) throw new AppError('unavailable')
  await keepParts(tx, row.id, body)
  await recordChange(tx, { personId, action: 'added', subject: { kind: 'job', id: row.id }, to: body })
  return row.id
}

/** Changes a job whole; another version than the person saw is a conflict. */
export async function changeJob(
  tx: Transaction,
  jobId: string,
  { version, by, ...body }: JobBody & { version: number; by: User },
): Promise<void> {
  const [locked] = await tx.select({ version: jobs.version }).from(jobs).where(eq(jobs.id, jobId)).for('update')
  if (!locked) throw new AppError('not-found')
  if (locked.version !== version) throw new AppError('conflict')
  await refuseUnknownReferences(tx, body)
  const { version: _version, updatedAt: _updatedAt, id: _id, number: _number, ...before } = await readJobRecord(tx, jobId)
  await tx
    .update(jobs)
    .set({ ...columnsOf(body), version: version + 1 })
    .where(eq(jobs.id, jobId))
  await keepParts(tx, jobId, body)
  await recordChange(tx, { personId: by.id, action: 'changed', subject: { kind: 'job', id: jobId }, from: before, to: body })
}

async function keepParts(tx: Transaction, jobId: string, { bays: list, crewIds }: JobBody): Promise<void> {
  await tx.delete(bays).where(eq(bays.jobId, jobId))
  if (list.length > 0) await tx.insert(bays).values(list.map((bay, position) => ({ jobId, bayId: bay.id, position, bay })))
  await tx.delete(jobPeople).where(eq(jobPeople.jobId, jobId))
  const ids = [...new Set(crewIds)]
  if (ids.length > 0) await tx.insert(jobPeople).values(ids.map((personId) => ({ jobId, personId })))
}

/** A job may name only what is here, and only a version that has been released: drafts are not laid. */
async function refuseUnknownReferences(tx: Transaction, { buildUpVersionId, crewIds }: JobBody): Promise<void> {
  if (buildUpVersionId) {
    const [version] = await tx
      .select({ releasedAt: buildUpVersions.releasedAt })
      .from(buildUpVersions)
      .where(eq(buildUpVersions.id, buildUpVersionId))
    if (!version) throw new AppError('invalid', { fields: { buildUpVersionId: 'This build-up version is not here.' } })
    if (!version.releasedAt)
      throw new AppError('invalid', { fields: { buildUpVersionId: 'This version is a draft. A technical lead has to release it first.' } })
  }
  if (crewIds.length === 0) return
  const known = await tx
    .select({ id: people.id })
    .from(people)
    .where(and(inArray(people.id, crewIds), eq(people.role, 'crew')))
  const unknown = crewIds.findIndex((id) => !known.some((person) => person.id === id))
  if (unknown >= 0) throw new AppError('invalid', { fields: { [`crewIds.${unknown}`]: 'This person is not one of the crew.' } })
}

/** The day of reckoning of a job: its planned start where there is one, else today. */
function dayOf(startsAt: string | null, now: number): string {
  return (startsAt ?? new Date(now).toISOString()).slice(0, 10)
}

/**
 * A job with the build-up version it is laid by. The facts are those frozen at release; the conditions are the job's own.
 * @throws AppError `not-found`
 */
export async function readJob(db: Database, { jobId, now }: { jobId: string; now: number }): Promise<Omit<Job, 'siteCardUrl'>> {
  const { buildUpVersionId, ...job } = await readJobRecord(db, jobId)
  const buildUp = buildUpVersionId
    ? await buildUpOf(db, { versionId: buildUpVersionId, conditions: job.conditions, startsAt: job.startsAt, now })
    : null
  return { ...job, buildUp }
}

interface Laid {
  versionId: string
  conditions: JobConditions
  startsAt: string | null
  now: number
}

async function buildUpOf(db: Database, { versionId, conditions, startsAt, now }: Laid): Promise<JobBuildUp | null> {
  const found = await readVersion(db, versionId, now)
  if (!found) return null
  const { texture: _texture, ...floorConditions } = conditions
  return {
    buildUpId: found.buildUpId,
    versionId,
    number: found.number,
    name: found.name,
    version: found.version,
    status: found.status,
    releasedAt: found.releasedAt,
    releasedByName: found.releasedByName,
    releaseReasons: found.releaseReasons,
    input: { ...found.input, conditions: floorConditions, onDate: dayOf(startsAt, now) },
  }
}
