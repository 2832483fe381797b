import type { Express } from 'express'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import supertest from 'supertest'
import { afterAll } from 'vitest'
import { type Role, roles } from '../../shared/domain/access.ts'
import { createApp } from '../../server/app.ts'
import type { Database } from '../../server/db/open.ts'
import { hashPassword } from '../../server/features/people/password.ts'
import { addPerson, makeFirm } from '../../server/features/people/queries.ts'
import { type FileStore, openDiskStore } from '../../server/files/store.ts'
import { type Mailer, outboxMailer } from '../../server/mail/send.ts'
import { testDatabase } from './database.ts'

export type Agent = ReturnType<typeof supertest.agent>
export const testPassword = 'quillwater-demo'

export interface TestApp {
  app: Express
  db: Database
  files: FileStore
  mail: Mailer
  dataDir: string
  /** Set to move time; starts at the real now. */
  time: { now: number }
  /** Signed in as each role, and not at all. */
  as: Record<Role | 'nobody', Agent>
  /** Ids of the three people. */
  ids: Record<Role, string>
  /** Lines the server logged. */
  logged: string[]
}

/** The whole application on its own real database and folder, with one person of each role signed in. Closed after the file's tests. */
export async function testApp(
  options: { publicUrl?: string; withPeople?: boolean; firstLeadCode?: string; requestsPerMinute?: number } = {},
): Promise<TestApp> {
  const dataDir = await mkdtemp(join(tmpdir(), 'wearcourse-test-'))
  const database = await testDatabase()
  const time = { now: Date.now() }
  const logged: string[] = []
  const files = await openDiskStore(dataDir)
  const mail = await outboxMailer(dataDir, () => time.now)
  const app = createApp({
    db: database.db,
    pool: database.pool,
    isAnswering: () => database.isAnswering(),
    files,
    mail,
    clock: () => time.now,
    publicUrl: options.publicUrl ?? 'http://localhost:4620',
    sessionSecret: 'a secret for tests only, long enough',
    firstLeadCode: options.firstLeadCode,
    log: (line) => logged.push(line),
    requestsPerMinute: options.requestsPerMinute ?? 100_000,
  })
  afterAll(async () => {
    await database.close()
    await rm(dataDir, { recursive: true, force: true })
  })
  const withPeople = options.withPeople ?? true
  const ids = withPeople ? await addPeople(database.db) : { lead: '', estimator: '', crew: '' }
  const as = { nobody: supertest.agent(app) } as TestApp['as']
  for (const role of roles) {
    as[role] = supertest.agent(app)
    if (withPeople)
      await as[role]
        .post('/api/session')
        .send({ email: `${role}@brackenholt.example`, password: testPassword })
        .expect(200)
  }
  return { app, db: database.db, files, mail, dataDir, time, as, ids, logged }
}

async function addPeople(db: Database): Promise<Record<Role, string>> {
  const passwordHash = await hashPassword(testPassword)
  return db.transaction(async (tx) => {
    await makeFirm(tx, { name: 'Brackenholt Floors', isDemo: true })
    const ids = {} as Record<Role, string>
    for (const role of roles) {
      const person = await addPerson(tx, { name: `Test ${role}`, email: `${role}@brackenholt.example`, role, passwordHash }, null)
      ids[role] = person.id
    }
    return ids
  })
}
