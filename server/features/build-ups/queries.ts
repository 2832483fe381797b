import { type SQL, and, asc, count, desc, eq, inArray, or, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { BuildUpSummary, VersionSummary } from '../../../shared/api/build-ups.ts'
import type { BuildUpStatus, Course, EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { buildUpVersions, buildUps, courses } from '../../db/schema/build-ups.ts'
import { mixes, products } from '../../db/schema/catalogue.ts'
import { people } from '../../db/schema/people.ts'
import { offsetOf, pageOf } from '../../http/list.ts'
import { readMixFacts, readProductFacts } from '../catalogue/queries.ts'
import { readFirm } from '../people/queries.ts'
import type { Work } from './work.ts'

type Reader = Database | Transaction
export type VersionRow = typeof buildUpVersions.$inferSelect
const containing = (q: string) => `%${q.replace(/[\\%_]/g, '\\$&')}%`
const dayOf = (now: number) => new Date(now).toISOString().slice(0, 10)

/** The courses of versions, bottom up, by version. */
export async function readCourses(db: Reader, versionIds: string[]): Promise<Map<string, Course[]>> {
  const byVersion = new Map<string, Course[]>(versionIds.map((id) => [id, []]))
  if (versionIds.length === 0) return byVersion
  const rows = await db
    .select({ versionId: courses.versionId, course: courses.course })
    .from(courses)
    .where(inArray(courses.versionId, versionIds))
    .orderBy(courses.versionId, courses.position)
  for (const row of rows) byVersion.get(row.versionId)?.push(row.course)
  return byVersion
}

/** The catalogue's facts of everything that the courses use, at this moment. */
export async function readFactsFor(db: Reader, drafts: readonly Course[]): Promise<Pick<EvaluationInput, 'mixes' | 'products'>> {
  const mixIds = drafts.flatMap((course) => course.mixId ?? [])
  const productIds = drafts.flatMap((course) => [course.filler?.productId ?? [], course.broadcast?.productId ?? []].flat())
  return readFacts(db, { mixIds, productIds })
}

export async function readFacts(
  db: Reader,
  ids: { mixIds: string[]; productIds: string[] },
): Promise<Pick<EvaluationInput, 'mixes' | 'products'>> {
  const mixes = await readMixFacts(db, [...new Set(ids.mixIds)])
  const products = await readProductFacts(db, [...new Set(ids.productIds)])
  return { mixes, products }
}

/** What `evaluate` is given for a draft: its work, the facts of this moment and the firm's limits. */
export async function inputOf(db: Reader, work: Work, now: number): Promise<EvaluationInput> {
  const facts = await readFactsFor(db, work.courses)
  const { sheetAgeLimitYears } = await readFirm(db)
  return { ...work, ...facts, onDate: dayOf(now), sheetAgeLimitYears }
}

export async function readWork(db: Reader, version: VersionRow): Promise<Work> {
  return { courses: (await readCourses(db, [version.id])).get(version.id) ?? [], conditions: version.conditions }
}

/** The frozen input of a version that was ever released; the live one of a draft. */
async function inputOfVersion(db: Reader, version: VersionRow, now: number): Promise<EvaluationInput> {
  return version.frozenInput ?? inputOf(db, await readWork(db, version), now)
}

const versionColumns = {
  id: buildUpVersions.id,
  number: buildUpVersions.number,
  status: buildUpVersions.status,
  updatedAt: buildUpVersions.updatedAt,
  updatedByName: people.name,
  releasedAt: buildUpVersions.releasedAt,
  releasedByName: buildUpVersions.releasedByName,
}

/** The head of a build-up with its versions, newest first. */
export async function readHead(db: Reader, buildUpId: string) {
  const [head] = await db
    .select({ id: buildUps.id, number: buildUps.number, name: buildUps.name, note: buildUps.note, version: buildUps.version })
    .from(buildUps)
    .where(eq(buildUps.id, buildUpId))
  if (!head) throw new AppError('not-found')
  const versions: VersionSummary[] = await db
    .select(versionColumns)
    .from(buildUpVersions)
    .leftJoin(people, eq(people.id, buildUpVersions.updatedBy))
    .where(eq(buildUpVersions.buildUpId, buildUpId))
    .orderBy(desc(buildUpVersions.number))
  return { ...head, versions }
}

/** A build-up opened at a version number, or at its newest. */
export async function readBuildUp(db: Reader, buildUpId: string, place: { number?: number | undefined; now: number }) {
  const head = await readHead(db, buildUpId)
  const summary = place.number === undefined ? head.versions[0] : head.versions.find((version) => version.number === place.number)
  if (!summary) throw new AppError('not-found')
  const row = await readRow(db, eq(buildUpVersions.id, summary.id))
  const opened = {
    ...summary,
    version: row.version,
    releaseReasons: row.releaseReasons ?? {},
    input: await inputOfVersion(db, row, place.now),
    evaluation: row.frozenEvaluation,
  }
  return { ...head, opened }
}

export async function readRow(db: Reader, where: SQL | undefined): Promise<VersionRow> {
  const [row] = await db.select().from(buildUpVersions).where(where)
  if (!row) throw new AppError('not-found')
  return row
}

/** A version as jobs, specifications and site cards take it: frozen facts once released. Undefined when there is none. */
export async function readVersion(db: Reader, versionId: string, now: number) {
  const [found] = await db
    .select({ version: buildUpVersions, number: buildUps.number, name: buildUps.name })
    .from(buildUpVersions)
    .innerJoin(buildUps, eq(buildUps.id, buildUpVersions.buildUpId))
    .where(eq(buildUpVersions.id, versionId))
  if (!found) return undefined
  const { version, number, name } = found
  return {
    buildUpId: version.buildUpId,
    versionId,
    number,
    name,
    version: version.number,
    status: version.status,
    releasedAt: version.releasedAt,
    releasedByName: version.releasedByName,
    releaseReasons: version.releaseReasons ?? {},
    input: await inputOfVersion(db, version, now),
    /** As reckoned at release; null for what was never released. */
    evaluation: version.frozenEvaluation,
  }
}
export type VersionInUse = NonNullable<Awaited<ReturnType<typeof readVersion>>>

/**
 * A version that may be built and specified from: released now, or released once and superseded since.
 * @throws AppError `invalid` for a draft or a withdrawn one.
 */
export async function readReleasedVersion(db: Reader, versionId: string, now: number): Promise<VersionInUse & { evaluation: Evaluation }> {
  const found = await readVersion(db, versionId, now)
  const usable = found && (found.status === 'released' || found.status === 'superseded')
  if (!usable || !found.evaluation) {
    throw new AppError('invalid', {
      message: 'Choose a released version of a build-up.',
      fields: { buildUpVersionId: 'This version is not released.' },
    })
  }
  return { ...found, evaluation: found.evaluation }
}

interface ListWanted {
  q: string
  sort: string
  limit: number
  cursor?: string | undefined
  status?: BuildUpStatus | undefined
}

const sortColumns = {
  number: buildUps.number,
  name: sql`lower(${buildUps.name})`,
  status: buildUpVersions.status,
  updatedAt: buildUpVersions.updatedAt,
}

/** A page of build-ups by their newest version, with the rows that the list is reckoned from. */
export async function listNewest(db: Database, wanted: ListWanted) {
  const offset = offsetOf(wanted.cursor)
  const q = wanted.q.toLowerCase()
  const where = and(
    sql`${buildUpVersions.number} = (select max(v.number) from ${buildUpVersions} v where v.build_up_id = ${buildUps.id})`,
    q ? or(sql`${buildUps.searchText} like ${containing(q)}`, sql`word_similarity(${q}, ${buildUps.searchText}) >= 0.5`) : undefined,
    wanted.status ? eq(buildUpVersions.status, wanted.status) : undefined,
  )
  const column = sortColumns[wanted.sort.replace(/^-/, '') as keyof typeof sortColumns]
  const order = wanted.sort.startsWith('-') ? desc(column) : asc(column)
  const joined = eq(buildUpVersions.buildUpId, buildUps.id)
  const rows = await db
    .select({
      buildUp: { id: buildUps.id, number: buildUps.number, name: buildUps.name },
      version: buildUpVersions,
      updatedByName: people.name,
    })
    .from(buildUps)
    .innerJoin(buildUpVersions, joined)
    .leftJoin(people, eq(people.id, buildUpVersions.updatedBy))
    .where(where)
    .orderBy(order, asc(buildUps.number))
    .limit(wanted.limit)
    .offset(offset)
  const [counted] = await db.select({ total: count() }).from(buildUps).innerJoin(buildUpVersions, joined).where(where)
  return pageOf(rows, { offset, limit: wanted.limit, total: counted?.total ?? 0 })
}

/** Mixes and aggregates in use that a course may be given: those nearest to what is typed, or the first by name. */
export async function readChoices(db: Reader, typed: string) {
  const q = typed.toLowerCase()
  const most = 200
  const near = (text: typeof mixes.searchText | typeof products.searchText) =>
    q ? or(sql`${text} like ${containing(q)}`, sql`word_similarity(${q}, ${text}) >= 0.4`) : undefined
  const found = await db
    .select({ id: mixes.id, name: mixes.name, maker: mixes.maker, chemistry: mixes.chemistry, color: mixes.color })
    .from(mixes)
    .where(and(eq(mixes.status, 'active'), near(mixes.searchText)))
    .orderBy(mixes.name, mixes.id)
    .limit(most)
  const aggregates = await db
    .select({ id: products.id, name: products.name, maker: products.maker })
    .from(products)
    .where(and(eq(products.status, 'active'), inArray(products.kind, ['aggregate', 'filler']), near(products.searchText)))
    .orderBy(products.name, products.id)
    .limit(most)
  return { mixes: found, aggregates }
}

/** The released version of each build-up, by build-up. */
export async function readReleased(db: Reader, buildUpIds: string[]): Promise<Map<string, NonNullable<BuildUpSummary['released']>>> {
  if (buildUpIds.length === 0) return new Map()
  const rows = await db
    .select({ buildUpId: buildUpVersions.buildUpId, versionId: buildUpVersions.id, number: buildUpVersions.number })
    .from(buildUpVersions)
    .where(and(inArray(buildUpVersions.buildUpId, buildUpIds), eq(buildUpVersions.status, 'released')))
  return new Map(rows.map(({ buildUpId, ...version }) => [buildUpId, version]))
}
