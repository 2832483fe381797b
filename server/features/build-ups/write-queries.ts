import { and, eq, ne, sql } from 'drizzle-orm'
import { AppError } from '../../../shared/api/errors.ts'
import type { User } from '../../../shared/api/session.ts'
import type { Course, EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import { recordChange } from '../../db/audit.ts'
import type { Transaction } from '../../db/open.ts'
import { buildUpVersions, buildUps, courses } from '../../db/schema/build-ups.ts'
import { people } from '../../db/schema/people.ts'
import { type VersionRow, inputOf, readFactsFor, readHead, readRow, readWork } from './queries.ts'
import { type Work, differences } from './work.ts'

const label = (number: number) => `BU-${String(number).padStart(3, '0')}`

/** What a search finds a build-up by: its name, its number and the mixes of its newest version. */
async function keepSearchText(tx: Transaction, buildUpId: string): Promise<void> {
  const mixName = sql`(select string_agg(distinct m.maker || ' ' || m.name, ' ') from courses c join mixes m on m.id = c.mix_id
    where c.version_id = (select v.id from build_up_versions v where v.build_up_id = ${buildUpId} order by v.number desc limit 1))`
  await tx
    .update(buildUps)
    .set({
      searchText: sql`lower(${buildUps.name} || ' bu-' || lpad(${buildUps.number}::text, 3, '0') || ' ' || coalesce(${mixName}, ''))`,
    })
    .where(eq(buildUps.id, buildUpId))
}

async function writeCourses(tx: Transaction, versionId: string, list: readonly Course[]): Promise<void> {
  await tx.delete(courses).where(eq(courses.versionId, versionId))
  if (list.length === 0) return
  await tx
    .insert(courses)
    .values(
      list.map((course, position) => ({ versionId, courseId: course.id, position, stage: course.stage, mixId: course.mixId, course })),
    )
}

/** Refuses courses that name a mix or product that is not in the catalogue. */
function refuseUnknown(list: readonly Course[], facts: Pick<EvaluationInput, 'mixes' | 'products'>): void {
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
export async function addBuildUp(
  tx: Transaction,
  { name, work }: { name: string; work: Work },
  who: { by: User | null; now: number; copiedFrom?: string },
) {
  const [row] = await tx.insert(buildUps).values({ name }).returning({ id: buildUps.id, number: buildUps.number })
  if (!row) throw new AppError('unavailable')
  const versionId = await addVersion(tx, { buildUpId: row.id, number: 1, work, ...who })
  await recordChange(tx, {
    personId: who.by?.id ?? null,
    action: 'added',
    subject: { kind: 'build-up', id: row.id },
    to: { name, number: label(row.number), courses: work.courses.length, ...(who.copiedFrom ? { copiedFrom: who.copiedFrom } : {}) },
  })
  return { buildUpId: row.id, versionId }
}

export async function renameBuildUp(tx: Transaction, buildUpId: string, change: { name: string; note: string; version: number; by: User }) {
  const [before] = await tx.select().from(buildUps).where(eq(buildUps.id, buildUpId)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== change.version) throw new AppError('conflict')
  const to = { name: change.name, note: change.note }
  await tx
    .update(buildUps)
    .set({ ...to, version: before.version + 1 })
    .where(eq(buildUps.id, buildUpId))
  await keepSearchText(tx, buildUpId)
  await recordChange(tx, {
    personId: change.by.id,
    action: 'renamed',
    subject: { kind: 'build-up', id: buildUpId },
    from: { name: before.name, note: before.note },
    to,
  })
  return { ...to, version: before.version + 1 }
}

/** Copies a version into a build-up of its own. */
export async function copyBuildUp(tx: Transaction, buildUpId: string, wanted: { name: string; number: number; by: User; now: number }) {
  const source = await readRow(tx, and(eq(buildUpVersions.buildUpId, buildUpId), eq(buildUpVersions.number, wanted.number)))
  const work = source.frozenInput ?? (await readWork(tx, source))
  return addBuildUp(
    tx,
    { name: wanted.name, work: { courses: work.courses, conditions: work.conditions } },
    { by: wanted.by, now: wanted.now, copiedFrom: source.id },
  )
}

/** Begins a draft from a version, or from unsaved work that began on it. Returns its number. */
export async function addDraft(
  tx: Transaction,
  buildUpId: string,
  wanted: { from: number; work?: Work | undefined; by: User; now: number },
): Promise<number> {
  await tx.select({ id: buildUps.id }).from(buildUps).where(eq(buildUps.id, buildUpId)).for('update')
  const { versions } = await readHead(tx, buildUpId)
  const source = versions.find((version) => version.number === wanted.from)
  if (!source) throw new AppError('not-found')
  const work = wanted.work ?? (await readWork(tx, await readRow(tx, eq(buildUpVersions.id, source.id))))
  if (wanted.work) refuseUnknown(work.courses, await readFactsFor(tx, work.courses))
  const number = (versions[0]?.number ?? 0) + 1
  const versionId = await addVersion(tx, { buildUpId, number, work, by: wanted.by, now: wanted.now })
  await recordChange(tx, {
    personId: wanted.by.id,
    action: 'drafted',
    subject: { kind: 'build-up', id: buildUpId },
    to: { version: number, versionId, from: wanted.from },
  })
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
  await tx
    .update(buildUpVersions)
    .set({ conditions: work.conditions, version, updatedAt, updatedBy: by.id })
    .where(eq(buildUpVersions.id, row.id))
  await recordChange(tx, {
    personId: by.id,
    action: 'saved',
    subject: { kind: 'build-up-version', id: row.id },
    ...differences(before, work),
  })
  return { version, updatedAt, updatedByName: by.name, input }
}

/** Takes a draft with what it is reckoned from at this moment, for release. */
export async function takeForRelease(
  tx: Transaction,
  place: VersionPlace,
  now: number,
): Promise<{ row: VersionRow; input: EvaluationInput }> {
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
      status: 'released',
      version: row.version + 1,
      updatedAt: at,
      updatedBy: by.id,
      releasedAt: at,
      releasedBy: by.id,
      releasedByName: by.name,
      releaseReasons: reasons,
      frozenInput: input,
      frozenEvaluation: evaluation,
    })
    .where(eq(buildUpVersions.id, row.id))
  const subject = (id: string) => ({ kind: 'build-up-version', id })
  await recordChange(tx, {
    personId: by.id,
    action: 'released',
    subject: subject(row.id),
    from: { status: row.status },
    to: { status: 'released', number: row.number, reasons },
  })
  for (const one of earlier) {
    await recordChange(tx, {
      personId: by.id,
      action: 'superseded',
      subject: subject(one.id),
      from: { status: 'released' },
      to: { status: 'superseded', by: row.number },
    })
  }
}

/** Takes a version out of use. Its facts stay; jobs that are laid by it keep it. */
export async function withdrawVersion(
  tx: Transaction,
  place: VersionPlace,
  who: { by: User; mayRelease: boolean; now: number },
): Promise<void> {
  const row = await takeVersion(tx, place)
  if (row.status !== 'draft' && !who.mayRelease) throw new AppError('forbidden')
  if (row.status === 'withdrawn') throw new AppError('conflict', { message: 'This version is already withdrawn.' })
  await tx
    .update(buildUpVersions)
    .set({ status: 'withdrawn', version: row.version + 1, updatedAt: new Date(who.now).toISOString(), updatedBy: who.by.id })
    .where(eq(buildUpVersions.id, row.id))
  await recordChange(tx, {
    personId: who.by.id,
    action: 'withdrawn',
    subject: { kind: 'build-up-version', id: row.id },
    from: { status: row.status },
    to: { status: 'withdrawn' },
  })
}
