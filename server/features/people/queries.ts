import { and, asc, count, desc, eq, gt, ilike, isNull, lt, or, sql } from 'drizzle-orm'
import { createHash, randomBytes } from 'node:crypto'
import { AppError } from '../../../shared/api/errors.ts'
import type { Firm, Person } from '../../../shared/api/people.ts'
import type { User } from '../../../shared/api/session.ts'
import type { Role } from '../../../shared/domain/access.ts'
import { recordChange } from '../../db/audit.ts'
import type { Database, Transaction } from '../../db/open.ts'
import { auditTrail, firm } from '../../db/schema/firm.ts'
import { passwordLinks, people, session, signInFailures } from '../../db/schema/people.ts'
import { offsetOf, pageOf } from '../../http/list.ts'

const sha256 = (text: string) => createHash('sha256').update(text).digest('hex')
const personColumns = {
  id: people.id,
  name: people.name,
  email: people.email,
  role: people.role,
  status: people.status,
  version: people.version,
}
const containing = (q: string) => `%${q.replace(/[\\%_]/g, '\\$&')}%`

/** A person who may be signed in: active only. */
export async function findUser(db: Database, id: string): Promise<User | undefined> {
  const [row] = await db
    .select(personColumns)
    .from(people)
    .where(and(eq(people.id, id), eq(people.status, 'active')))
  return row && { id: row.id, name: row.name, email: row.email, role: row.role }
}

export async function findForSignIn(db: Database, email: string) {
  const [row] = await db
    .select()
    .from(people)
    .where(and(eq(people.email, email), eq(people.status, 'active')))
  return row
}

export async function readFailures(db: Database, email: string) {
  const [row] = await db
    .select()
    .from(signInFailures)
    .where(eq(signInFailures.emailHash, sha256(email)))
  return row
}

export async function countFailure(db: Database, email: string, now: number): Promise<void> {
  const lastAt = new Date(now).toISOString()
  await db
    .insert(signInFailures)
    .values({ emailHash: sha256(email), failures: 1, lastAt })
    .onConflictDoUpdate({ target: signInFailures.emailHash, set: { failures: sql`${signInFailures.failures} + 1`, lastAt } })
}

export async function forgetFailures(db: Database, email: string): Promise<void> {
  await db.delete(signInFailures).where(eq(signInFailures.emailHash, sha256(email)))
}

/** Sign-ins are part of the trail: who, when, whether it worked. */
export function recordSignIn(
  db: Database,
  entry: { personId: string | null; action: 'signed-in' | 'sign-in-refused' | 'signed-out'; email: string },
) {
  return db.transaction((tx) =>
    recordChange(tx, {
      personId: entry.personId,
      action: entry.action,
      subject: { kind: 'session', id: sha256(entry.email).slice(0, 16) },
    }),
  )
}

export async function listPeople(
  db: Database,
  { q, sort, limit, cursor }: { q: string; sort: string; limit: number; cursor?: string | undefined },
) {
  const offset = offsetOf(cursor)
  const where = q ? or(ilike(people.name, containing(q)), ilike(people.email, containing(q))) : undefined
  const column = sort.endsWith('email') ? people.email : sort.endsWith('role') ? people.role : people.name
  const order = sort.startsWith('-') ? desc(column) : asc(column)
  const [rows, [counted]] = await Promise.all([
    db.select(personColumns).from(people).where(where).orderBy(order, asc(people.id)).limit(limit).offset(offset),
    db.select({ total: count() }).from(people).where(where),
  ])
  return pageOf(rows, { offset, limit, total: counted?.total ?? 0 })
}

export function listCrew(db: Database) {
  return db
    .select({ id: people.id, name: people.name })
    .from(people)
    .where(and(eq(people.role, 'crew'), eq(people.status, 'active')))
    .orderBy(asc(people.name))
}

interface NewPerson {
  name: string
  email: string
  role: Role
  passwordHash?: string
}

/** Makes a person: active with a password, invited without. */
export async function addPerson(tx: Transaction, { passwordHash, ...person }: NewPerson, byId: string | null): Promise<Person> {
  const status = passwordHash ? 'active' : 'invited'
  const [row] = await tx
    .insert(people)
    .values({ ...person, status, passwordHash: passwordHash ?? null })
    .onConflictDoNothing()
    .returning(personColumns)
  if (!row)
    throw new AppError('duplicate', {
      message: 'Someone with this e-mail address is already here.',
      fields: { email: 'This address is taken.' },
    })
  await recordChange(tx, { personId: byId, action: 'added', subject: { kind: 'person', id: row.id }, to: { ...person, status } })
  return row
}

export async function hasPeople(db: Database | Transaction): Promise<boolean> {
  const rows = await db.select({ id: people.id }).from(people).limit(1)
  return rows.length > 0
}

interface PersonChange {
  version: number
  name?: string | undefined
  role?: Role | undefined
  status?: 'active' | 'disabled' | undefined
}

/** Changes a person. The last active technical lead stays one; a disabled person loses all sessions. */
export async function changePerson(tx: Transaction, id: string, { by, ...change }: PersonChange & { by: User }): Promise<Person> {
  const [before] = await tx.select().from(people).where(eq(people.id, id)).for('update')
  if (!before) throw new AppError('not-found')
  if (before.version !== change.version) throw new AppError('conflict')
  if (change.status === 'active' && !before.passwordHash)
    throw new AppError('invalid', { fields: { status: 'This person has not set a password yet. Send the invitation again.' } })
  const to = { name: change.name ?? before.name, role: change.role ?? before.role, status: change.status ?? before.status }
  if (before.role === 'lead' && before.status === 'active' && (to.role !== 'lead' || to.status !== 'active')) await refuseLastLead(tx, id)
  const [row] = await tx
    .update(people)
    .set({ ...to, version: before.version + 1 })
    .where(eq(people.id, id))
    .returning(personColumns)
  if (!row) throw new AppError('not-found')
  if (to.status === 'disabled') await endSessions(tx, id)
  await recordChange(tx, {
    personId: by.id,
    action: 'changed',
    subject: { kind: 'person', id },
    from: { name: before.name, role: before.role, status: before.status },
    to,
  })
  return row
}

async function refuseLastLead(tx: Transaction, id: string): Promise<void> {
  const leads = await tx
    .select({ id: people.id })
    .from(people)
    .where(and(eq(people.role, 'lead'), eq(people.status, 'active')))
    .for('update')
  if (!leads.some((lead) => lead.id !== id))
    throw new AppError('in-use', { message: 'The last technical lead cannot be changed. Make another one first.' })
}

/** Ends every session of a person, or all but one. */
export async function endSessions(tx: Transaction | Database, personId: string, exceptSid?: string): Promise<void> {
  await tx
    .delete(session)
    .where(and(sql`${session.sess}->'passport'->>'user' = ${personId}`, exceptSid ? sql`${session.sid} <> ${exceptSid}` : undefined))
}

export async function readPerson(db: Database | Transaction, id: string) {
  const [row] = await db.select(personColumns).from(people).where(eq(people.id, id))
  if (!row) throw new AppError('not-found')
  return row
}

export async function findByEmail(db: Database, email: string) {
  const [row] = await db.select(personColumns).from(people).where(eq(people.email, email))
  return row
}

const hour = 3_600_000
const lifetime = { invitation: 7 * 24 * hour, reset: hour } as const

/** Makes a single-use link; older ones of the person die. Returns the token, of which only the hash is kept. */
export async function makeLink(
  tx: Transaction,
  link: { personId: string; purpose: 'invitation' | 'reset'; now: number; byId: string | null },
): Promise<string> {
  const token = randomBytes(32).toString('base64url')
  await tx.delete(passwordLinks).where(eq(passwordLinks.personId, link.personId))
  await tx
    .insert(passwordLinks)
    .values({
      personId: link.personId,
      purpose: link.purpose,
      tokenHash: sha256(token),
      expiresAt: new Date(link.now + lifetime[link.purpose]).toISOString(),
    })
  await recordChange(tx, { personId: link.byId, action: `${link.purpose}-sent`, subject: { kind: 'person', id: link.personId } })
  return token
}

/** Uses a link up: sets the password, makes an invited person active, ends all sessions. */
export async function setPasswordByLink(
  tx: Transaction,
  { token, passwordHash, now }: { token: string; passwordHash: string; now: number },
) {
  const instant = new Date(now).toISOString()
  const [link] = await tx
    .update(passwordLinks)
    .set({ usedAt: instant })
    .where(and(eq(passwordLinks.tokenHash, sha256(token)), isNull(passwordLinks.usedAt), gt(passwordLinks.expiresAt, instant)))
    .returning()
  if (!link) throw new AppError('link-dead')
  const person = await readPerson(tx, link.personId)
  if (person.status === 'disabled') throw new AppError('link-dead')
  await setPassword(tx, person.id, { passwordHash })
  return person
}

/** Keeps a new password hash and ends the person's sessions, save the one that asked. */
export async function setPassword(
  tx: Transaction,
  personId: string,
  { passwordHash, exceptSid }: { passwordHash: string; exceptSid?: string },
): Promise<void> {
  await tx
    .update(people)
    .set({ passwordHash, status: 'active', version: sql`${people.version} + 1` })
    .where(eq(people.id, personId))
  await endSessions(tx, personId, exceptSid)
  await recordChange(tx, { personId, action: 'password-set', subject: { kind: 'person', id: personId } })
}

export async function readPasswordHash(db: Database, personId: string): Promise<string | null> {
  const [row] = await db.select({ hash: people.passwordHash }).from(people).where(eq(people.id, personId))
  return row?.hash ?? null
}

const firmColumns = {
  name: firm.name,
  address: firm.address,
  phone: firm.phone,
  sheetAgeLimitYears: firm.sheetAgeLimitYears,
  version: firm.version,
}

export async function readFirm(db: Database | Transaction): Promise<Firm & { isDemo: boolean }> {
  const [row] = await db.select({ ...firmColumns, isDemo: firm.isDemo }).from(firm)
  return row ?? { name: 'Wearcourse', address: '', phone: '', sheetAgeLimitYears: 3, isDemo: false, version: 1 }
}

export async function makeFirm(
  tx: Transaction,
  values: { name: string; address?: string; phone?: string; isDemo: boolean },
): Promise<void> {
  await tx.insert(firm).values(values)
  await recordChange(tx, { personId: null, action: 'added', subject: { kind: 'firm', id: '1' }, to: values })
}

export async function changeFirm(tx: Transaction, { version, ...to }: Firm, by: User): Promise<Firm> {
  const before = await readFirm(tx)
  const [row] = await tx
    .update(firm)
    .set({ ...to, version: version + 1 })
    .where(eq(firm.version, version))
    .returning(firmColumns)
  if (!row) throw new AppError('conflict')
  await recordChange(tx, { personId: by.id, action: 'changed', subject: { kind: 'firm', id: '1' }, from: before, to })
  return row
}

interface ChangesWanted {
  subjectKind?: string | undefined
  subjectId?: string | undefined
  limit: number
  cursor?: string | undefined
}

/** The audit trail, newest first. */
export async function listChanges(db: Database, { subjectKind, subjectId, limit, cursor }: ChangesWanted) {
  const rows = await db
    .select({
      id: auditTrail.id,
      at: auditTrail.at,
      personName: people.name,
      action: auditTrail.action,
      subjectKind: auditTrail.subjectKind,
      subjectId: auditTrail.subjectId,
      from: auditTrail.from,
      to: auditTrail.to,
    })
    .from(auditTrail)
    .leftJoin(people, eq(people.id, auditTrail.personId))
    .where(
      and(
        subjectKind ? eq(auditTrail.subjectKind, subjectKind) : undefined,
        subjectId ? eq(auditTrail.subjectId, subjectId) : undefined,
        cursor ? lt(auditTrail.id, Number(cursor)) : undefined,
      ),
    )
    .orderBy(desc(auditTrail.id))
    .limit(limit + 1)
  const items = rows.slice(0, limit)
  return { items, nextCursor: rows.length > limit ? String(items.at(-1)?.id ?? '') : null }
}
