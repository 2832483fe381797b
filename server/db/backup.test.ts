import { createHash } from 'node:crypto'
import { readFileSync, writeFileSync } from 'node:fs'
import { cp, mkdtemp, readdir, rm, stat } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDiskStore } from '../files/store.ts'
import { fillDemo } from './demo/fill.ts'
import { makeBackup } from './make-backup.ts'
import { type OpenDatabase, openDatabase } from './open.ts'
import { restoreBackup } from './restore-backup.ts'

const folder = await mkdtemp(join(tmpdir(), 'wearcourse-backup-'))
afterAll(() => rm(folder, { recursive: true, force: true }))
const place = (name: string) => ({ dataDir: join(folder, name), databaseUrl: undefined, s3: undefined })
const server = process.env['TEST_DATABASE_URL']
const file = join(folder, 'backup.tar.gz')

/** Every row of every table as PostgreSQL prints it, and where the counters stand. */
async function everything({ pool }: OpenDatabase): Promise<Record<string, unknown>> {
  const { rows: tables } = await pool.query<{ name: string }>(
    "select tablename as name from pg_tables where schemaname = 'public' and tablename <> 'session' order by 1",
  )
  const found: Record<string, unknown> = {}
  for (const { name } of tables) found[name] = (await pool.query(`select t::text from "${name}" t order by 1`)).rows
  found['counters'] = (await pool.query('select sequencename, last_value from pg_sequences order by 1')).rows
  return found
}

async function filesOf(dataDir: string): Promise<string[]> {
  const entries = await readdir(join(dataDir, 'files'), { recursive: true, withFileTypes: true })
  return entries
    .filter((entry) => entry.isFile())
    .map(({ name, parentPath }) => {
      expect(
        createHash('sha256')
          .update(readFileSync(join(parentPath, name)))
          .digest('hex'),
      ).toBe(name)
      return name
    })
    .sort()
}

describe('a backup', () => {
  let before: Record<string, unknown>
  beforeAll(async () => {
    const database = await openDatabase(place('first'))
    await fillDemo({ db: database.db, files: await openDiskStore(place('first').dataDir), now: Date.parse('2026-03-02T08:00:00Z') })
    // Values that a text form could lose: control characters and quotes, the null of JSON, the shortest and longest figures, an empty text.
    await database.pool.query(`insert into audit_trail (person_id, action, subject_kind, subject_id, "from", "to") values
      (null, E'tab\\t quote\\' "double" \\\\ line\\n {brace} NULL', '', 'ü λ ₂', 'null'::jsonb, '[0.1, 1e-300, 123456789012345678901234567890, "\\\\n"]'::jsonb)`)
    await database.pool.query("select setval(pg_get_serial_sequence('jobs', 'number'), 4711)")
    before = await everything(database)
    await database.close()
  }, 240_000)

  it('carries all rows, files and counters into an empty folder', async () => {
    const made = await makeBackup(place('first'), file)
    expect(made.missing).toEqual([])
    expect(made.files).toBe((await filesOf(place('first').dataDir)).length)
    expect((await stat(file)).mode & 0o777).toBe(0o600)

    const restored = await restoreBackup(place('second'), file)
    expect(restored.rows).toBe(made.rows)
    expect(await filesOf(place('second').dataDir)).toEqual(await filesOf(place('first').dataDir))
    const database = await openDatabase(place('second'))
    expect(await everything(database)).toEqual(before)
    const { rows } = await database.pool.query<{ id: string }>(
      "insert into audit_trail (action, subject_kind, subject_id) values ('next', '', '') returning id",
    )
    expect(Number(rows[0]?.id)).toBeGreaterThan(0)
    await database.close()
  }, 240_000)

  it.runIf(server)(
    'goes into an empty database on a server and back, and is refused by one that is not empty',
    async () => {
      const admin = new pg.Client({ connectionString: server })
      await admin.connect()
      await admin.query('create database from_backup')
      const onServer = { ...place('of-the-server'), databaseUrl: Object.assign(new URL(server ?? ''), { pathname: '/from_backup' }).href }
      try {
        await restoreBackup(onServer, file)
        const database = await openDatabase(onServer)
        expect(await everything(database)).toEqual(before)
        await database.close()
        await expect(restoreBackup({ ...onServer, dataDir: join(folder, 'another') }, file)).rejects.toThrow(/DATABASE_URL is not empty/)
        const again = join(folder, 'from-server')
        await makeBackup(onServer, again)
        await restoreBackup(place('from-server-again'), again)
        const back = await openDatabase(place('from-server-again'))
        expect(await everything(back)).toEqual(before)
        await back.close()
      } finally {
        await admin.query('drop database from_backup with (force)')
        await admin.end()
      }
    },
    240_000,
  )

  it('is not written over a file, nor made of nothing, nor beside a running Wearcourse', async () => {
    await expect(makeBackup(place('first'), file)).rejects.toThrow(/is there already/)
    await expect(makeBackup(place('nothing'), join(folder, 'none'))).rejects.toThrow(/There is no database in/)
    await expect(makeBackup(place('first'), join(folder, 'no/such/folder/b'))).rejects.toThrow(/cannot be written/)
    const running = await openDatabase(place('first'))
    await expect(makeBackup(place('first'), join(folder, 'other'))).rejects.toThrow(/in use by another Wearcourse/)
    await running.close()
  }, 240_000)

  it('is refused by a folder that is not empty, which stays as it was', async () => {
    await cp(place('second').dataDir, place('third').dataDir, { recursive: true })
    await expect(restoreBackup(place('third'), file)).rejects.toThrow(/is not empty/)
    expect(await filesOf(place('third').dataDir)).toEqual(await filesOf(place('second').dataDir))
  })

  it.each([
    ['a changed byte', (bytes: Buffer) => (bytes.writeUInt8(bytes.readUInt8(bytes.length >> 1) ^ 1, bytes.length >> 1), bytes)],
    ['a missing end', (bytes: Buffer) => bytes.subarray(0, bytes.length - 5000)],
    ['nothing in it', () => Buffer.alloc(0)],
    ['something else in it', () => Buffer.from('%PDF-1.4 not a backup')],
  ])('with %s is refused and leaves nothing behind', async (_what, damage) => {
    const damaged = join(folder, 'damaged')
    writeFileSync(damaged, damage(readFileSync(file)))
    await expect(restoreBackup(place('fourth'), damaged)).rejects.toThrow(/is damaged, cut short, or not a backup/)
    await expect(stat(place('fourth').dataDir)).rejects.toThrow('ENOENT')
  })

  it('that does not exist is told', async () => {
    await expect(restoreBackup(place('fourth'), join(folder, 'nowhere'))).rejects.toThrow(/There is no file/)
  })
})
