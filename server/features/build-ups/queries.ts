import { and, asc, count, desc, eq, inArray, ne, or, sql } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import { isDeepStrictEqual } from 'node:util'
import { AppError } from '../../../shared/api/errors.ts'
import type { BuildUpSummary, VersionSummary } from '../../../shared/api/build-ups.ts'
import type { User } from '../../../shared/api/session.ts'
import type { BuildUpStatus, Conditions, Course, EvaluationInput, Stage } from '../../../shared/domain/build-up.ts'
import { firstConditions, newCourse } from '../../../shared/domain/course.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import { recordChange } from '../../db/audit.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { buildUpVersions, buildUps, courses } from '../../db/schema/build-ups.ts'
import { mixes, products } from '../../db/schema/catalogue.ts'
import { people } from '../../db/schema/people.ts'
import { offsetOf, pageOf } from '../../http/list.ts'
import { readMixFacts, readProductFacts } from '../catalogue/queries.ts'
import { readFirm } from '../people/queries.ts'

type Reader = Database | Transaction
export type VersionRow = typeof buildUpVersions.$inferSelect
/** Courses and conditions: what a draft is made of. */
export interface Work {
  courses: Course[]
  conditions: Conditions
}

const containing = (q: string) => `%${q.replace(/[\\%_]/g, '\\$&')}%`
const label = (number: number) => `BU-${String(number).padStart(3, '0')}`
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

export async function readFacts(db: Reader, ids: { mixIds: string[]; productIds: string[] }): Promise<Pick<EvaluationInput, 'mixes' | 'products'>> {
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

async function readWork(db: Reader, version: VersionRow): Promise<Work> {
  return { courses: (await readCourses(db, [version.id])).get(version.id) ?? [], conditions: version.conditions }
}

/** The frozen input of a version that was ever released; the live one of a draft. */
export async function inputOfVersion(db: Reader, version: VersionRow, now: number): Promise<EvaluationInput> {
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
    ...summary, version: row.version, releaseReasons: row.releaseReasons ?? {}, input: await inputOfVersion(db, row, place.now), evaluation: row.frozenEvaluation,
  }
  return { ...head, opened }
}

async function readRow(db: Reader, where: ReturnType<typeof eq>): Promise<VersionRow> {
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
    buildUpId: version.buildUpId, versionId, number, name, version: version.number, status: version.status, releasedAt: version.releasedAt,
    releasedByName: version.releasedByName, releaseReasons: version.releaseReasons ?? {}, input: await inputOfVersion(db, version, now),
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
    throw new AppError('invalid', { message: 'Choose a released version of a build-up.', fields: { buildUpVersionId: 'This version is not released.' } })
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

const sortColumns = { number: buildUps.number, name: sql`lower(${buildUps.name})`, status: buildUpVersions.status, updatedAt: buildUpVersions.updatedAt }

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
    .select({ buildUp: { id: buildUps.id, number: buildUps.number, name: buildUps.name }, version: buildUpVersions, updatedByName: people.name })
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
  const near = (text: typeof mixes.searchText | typeof products.searchText) => (q ? or(sql`${text} like ${containing(q)}`, sql`word_similarity(${q}, ${text}) >= 0.4`) : undefined)
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

/** What a search finds a build-up by: its name, its number and the mixes of its newest version. */
async function keepSearchText(tx: Transaction, buildUpId: string): Promise<void> {
  const mixName = sql`(select string_agg(distinct m.maker || ' ' || m.name, ' ') from courses c join mixes m on m.id = c.mix_id
    where c.version_id = (select v.id from build_up_versions v where v.build_up_id = ${buildUpId} order by v.number desc limit 1))`
  await tx
    .update(buildUps)
    .set({ searchText: sql`lower(${buildUps.name} || ' bu-' || lpad(${buildUps.number}::text, 3, '0') || ' ' || coalesce(${mixName}, ''))` })
    .where(eq(buildUps.id, buildUpId))
}

async function writeCourses(tx: Transaction, versionId: string, list: readonly Course[]): Promise<void> {
  await tx.delete(courses).where(eq(courses.versionId, versionId))
  if (list.length === 0) return
  await tx.insert(courses).values(
    list.map((course, position) => ({ versionId, courseId: course.id, position, stage: course.stage, mixId: course.mixId, course })),
  )
}

/** Refuses courses that name a mix or product that is not in the catalogue. */
export function refuseUnknown(list: readonly Course[], facts: Pick<EvaluationInput, 'mixes' | 'products'>): void {
  const fields: Record<string, string> = {}
  const says = 'This is not in the catalogue.'
  list.forEach((course, index) => {
    if (course.mixId && !facts.mixes[course.mixId]) fields[`courses.${index}.mixId`] = says
    if (course.filler && !facts.products[course.filler.productId]) fields[`courses.${index}.filler.productId`] = says
    if (course.broadcast && !facts.products[course.broadcast.productId]) fields[`courses.${index}.broadcast.productId`] = says
  })
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields })
}

interface NewVersion {
  buildUpId: string
  number: number
  work: Work
  by: User | null
  now: number
}

async function addVersion(tx: Transaction, { buildUpId, number, work, by, now }: NewVersion): Promise<string> {
  const [row] = await tx
    .insert(buildUpVersions)
    .values({ buildUpId, number, conditions: work.conditions, updatedBy: by?.id ?? null, updatedAt: new Date(now).toISOString() })
    .returning({ id: buildUpVersions.id })
  if (!row) throw new AppError('unavailable')
  await writeCourses(tx, row.id, work.courses)
  await keepSearchText(tx, buildUpId)
  return row.id
}

/** Makes a build-up with its first draft. `by` null: the system itself. */
export async function addBuildUp(tx: Transaction, { name, work }: { name: string; work: Work }, who: { by: User | null; now: number; copiedFrom?: string }) {
  const [row] = await tx.insert(buildUps).values({ name }).returning({ id: buildUps.id, number: buildUps.number })
  if (!row) throw new AppError('unavailable')
  const versionId = await addVersion(tx, { buildUpId: row.id, number: 1, work, ...who })
  await recordChange(tx, {
    personId: who.by?.id ?? null, action: 'added', subject: { kind: 'build-up', id: row.id },
    to: { name, number: label(row.number), courses: work.courses.length, ...(who.copiedFrom ? { copiedFrom: who.copiedFrom } : {}) },
  })
  return { buildUpId: row.id, versionId }
}

/** The work of a new build-up: one course a stage, nothing chosen. */
export function workOfStages(stages: readonly Stage[]): Work {
  return { courses: stages.map((stage) => newCourse(stage, randomUUID().slice(0, 8))), conditions: firstConditions }
}

export async function renameBuildUp(tx: Transaction, buildUpId: string, change: { name: string; note: string; version: number; by: User }) {
  const [before] = await tx.select().from(buildUps).where(eq(buildUps.id, buildUpId)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== change.version) throw new AppError('conflict')
  const to = { name: change.name, note: change.note }
  await tx.update(buildUps).set({ ...to, version: before.version + 1 }).where(eq(buildUps.id, buildUpId))
  await keepSearchText(tx, buildUpId)
  await recordChange(tx, { personId: change.by.id, action: 'renamed', subject: { kind: 'build-up', id: buildUpId }, from: { name: before.name, note: before.note }, to })
  return { ...to, version: before.version + 1 }
}

/** Copies a version into a build-up of its own. */
export async function copyBuildUp(tx: Transaction, buildUpId: string, wanted: { name: string; number: number; by: User; now: number }) {
  const source = await readRow(tx, and(eq(buildUpVersions.buildUpId, buildUpId), eq(buildUpVersions.number, wanted.number)) as ReturnType<typeof eq>)
  const work = source.frozenInput ?? (await readWork(tx, source))
  return addBuildUp(tx, { name: wanted.name, work: { courses: work.courses, conditions: work.conditions } }, { by: wanted.by, now: wanted.now, copiedFrom: source.id })
}

/** Begins a draft from a version, or from unsaved work that began on it. Returns its number. */
export async function addDraft(tx: Transaction, buildUpId: string, wanted: { from: number; work?: Work | undefined; by: User; now: number }): Promise<number> {
  await tx.select({ id: buildUps.id }).from(buildUps).where(eq(buildUps.id, buildUpId)).for('update')
  const { versions } = await readHead(tx, buildUpId)
  const source = versions.find((version) => version.number === wanted.from)
  if (!source) throw new AppError('not-found')
  const work = wanted.work ?? (await readWork(tx, await readRow(tx, eq(buildUpVersions.id, source.id))))
  if (wanted.work) refuseUnknown(work.courses, await readFactsFor(tx, work.courses))
  const number = (versions[0]?.number ?? 0) + 1
  const versionId = await addVersion(tx, { buildUpId, number, work, by: wanted.by, now: wanted.now })
  await recordChange(tx, { personId: wanted.by.id, action: 'drafted', subject: { kind: 'build-up', id: buildUpId }, to: { version: number, versionId, from: wanted.from } })
  return number
}

interface VersionPlace {
  buildUpId: string
  number: number
  /** Edit counter that the person saw. */
  version: number
}

/** Takes a version for changing. Who saved it meanwhile is told by name. */
async function takeVersion(tx: Transaction, { buildUpId, number, version }: VersionPlace): Promise<VersionRow> {
  const [row] = await tx
    .select()
    .from(buildUpVersions)
    .where(and(eq(buildUpVersions.buildUpId, buildUpId), eq(buildUpVersions.number, number)))
    .for('update')
  if (!row) throw new AppError('not-found')
  if (row.version === version) return row
  const [person] = row.updatedBy ? await tx.select({ name: people.name }).from(people).where(eq(people.id, row.updatedBy)) : []
  throw new AppError('conflict', { message: `${person?.name ?? 'Someone else'} has changed this version meanwhile.` })
}

/** What changed between two lists of courses, course by course, for the trail. */
function differences(before: Work, after: Work) {
  const changedIn = (list: readonly Course[], other: readonly Course[]) => list.filter((course) => !isDeepStrictEqual(course, other.find(({ id }) => id === course.id)))
  const conditions = !isDeepStrictEqual(before.conditions, after.conditions)
  const order = !isDeepStrictEqual(before.courses.map(({ id }) => id), after.courses.map(({ id }) => id))
  const side = (of: Work, other: Work) => ({
    courses: changedIn(of.courses, other.courses),
    ...(order ? { order: of.courses.map(({ id }) => id) } : {}),
    ...(conditions ? { conditions: of.conditions } : {}),
  })
  return { from: side(before, after), to: side(after, before) }
}

/** Keeps a draft whole. A released version, or one that someone else saved since, is not overwritten. */
export async function saveDraft(tx: Transaction, place: VersionPlace, { work, by, now }: { work: Work; by: User; now: number }) {
  const row = await takeVersion(tx, place)
  if (row.status !== 'draft') throw new AppError('conflict', { message: 'This version is no longer a draft. Begin a new draft from it.' })
  const input = await inputOf(tx, work, now)
  refuseUnknown(work.courses, input)
  const before = await readWork(tx, row)
  await writeCourses(tx, row.id, work.courses)
  await keepSearchText(tx, place.buildUpId)
  const updatedAt = new Date(now).toISOString()
  const version = row.version + 1
  await tx.update(buildUpVersions).set({ conditions: work.conditions, version, updatedAt, updatedBy: by.id }).where(eq(buildUpVersions.id, row.id))
  await recordChange(tx, { personId: by.id, action: 'saved', subject: { kind: 'build-up-version', id: row.id }, ...differences(before, work) })
  return { version, updatedAt, updatedByName: by.name, input }
}

/** Takes a draft with what it is reckoned from at this moment, for release. */
export async function takeForRelease(tx: Transaction, place: VersionPlace, now: number): Promise<{ row: VersionRow; input: EvaluationInput }> {
  const row = await takeVersion(tx, place)
  if (row.status !== 'draft') throw new AppError('conflict', { message: 'This version is no longer a draft.' })
  return { row, input: await inputOf(tx, await readWork(tx, row), now) }
}

interface Release {
  input: EvaluationInput
  evaluation: Evaluation
  reasons: Record<string, string>
  by: { id: string | null; name: string }
  now: number
}

/** Freezes a draft with its facts and result; the version released before it becomes superseded. */
export async function keepRelease(tx: Transaction, row: VersionRow, { input, evaluation, reasons, by, now }: Release): Promise<void> {
  const at = new Date(now).toISOString()
  const earlier = await tx
    .update(buildUpVersions)
    .set({ status: 'superseded', version: sql`${buildUpVersions.version} + 1` })
    .where(and(eq(buildUpVersions.buildUpId, row.buildUpId), eq(buildUpVersions.status, 'released'), ne(buildUpVersions.id, row.id)))
    .returning({ id: buildUpVersions.id, number: buildUpVersions.number })
  await tx
    .update(buildUpVersions)
    .set({
      status: 'released', version: row.version + 1, updatedAt: at, updatedBy: by.id, releasedAt: at, releasedBy: by.id, releasedByName: by.name,
      releaseReasons: reasons, frozenInput: input, frozenEvaluation: evaluation,
    })
    .where(eq(buildUpVersions.id, row.id))
  const subject = (id: string) => ({ kind: 'build-up-version', id })
  await recordChange(tx, { personId: by.id, action: 'released', subject: subject(row.id), from: { status: row.status }, to: { status: 'released', number: row.number, reasons } })
  for (const one of earlier) {
    await recordChange(tx, { personId: by.id, action: 'superseded', subject: subject(one.id), from: { status: 'released' }, to: { status: 'superseded', by: row.number } })
  }
}

/** Takes a version out of use. Its facts stay; jobs that are laid by it keep it. */
export async function withdrawVersion(tx: Transaction, place: VersionPlace, who: { by: User; mayRelease: boolean; now: number }): Promise<void> {
  const row = await takeVersion(tx, place)
  if (row.status !== 'draft' && !who.mayRelease) throw new AppError('forbidden')
  if (row.status === 'withdrawn') throw new AppError('conflict', { message: 'This version is already withdrawn.' })
  await tx
    .update(buildUpVersions)
    .set({ status: 'withdrawn', version: row.version + 1, updatedAt: new Date(who.now).toISOString(), updatedBy: who.by.id })
    .where(eq(buildUpVersions.id, row.id))
  await recordChange(tx, {
    personId: who.by.id, action: 'withdrawn', subject: { kind: 'build-up-version', id: row.id }, from: { status: row.status }, to: { status: 'withdrawn' },
  })
}
