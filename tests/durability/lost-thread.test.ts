import { readdirSync, renameSync, symlinkSync, unlinkSync } from 'node:fs'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import express from 'express'
import pg from 'pg'
import supertest from 'supertest'
import { afterAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open.ts'
import { healthRoutes } from '../../server/features/health/routes.ts'
import { handleErrors } from '../../server/http/handle-errors.ts'

const folder = await mkdtemp(join(tmpdir(), 'wearcourse-lost-'))
afterAll(() => rm(folder, { recursive: true, force: true }))

/** The log file that is written to now: the one changed last. */
const currentLog = (dataDir: string) =>
  readdirSync(join(dataDir, 'database/pg_wal'))
    .filter((name) => /^[0-9A-F]{24}$/.test(name))
    .sort()
    .map((name) => join(dataDir, 'database/pg_wal', name))[0] ?? ''

describe('the thread of the embedded database', () => {
  it('answers no commit whose log could not be put on the disk; it ends, says so, and the health check fails', async () => {
    const dataDir = join(folder, 'unsynced')
    const logged: string[] = []
    let lost: string | undefined
    const database = await openDatabase({ dataDir, log: (line) => logged.push(line), onLost: (reason) => (lost = reason) })
    await database.pool.query('create table rows_kept (n int)')
    await database.pool.query('insert into rows_kept values (1)')
    const app = express()
      .use(healthRoutes(() => database.isAnswering()))
      .use(handleErrors((line) => logged.push(line)))
    await supertest(app).get('/api/health').expect(200)

    // The path of the log now leads nowhere: PGlite still writes to the file it has open, but nothing can put it on the disk.
    const log = currentLog(dataDir)
    renameSync(log, `${log}.away`)
    symlinkSync(log, log)
    await expect(database.pool.query('insert into rows_kept values (2)')).rejects.toThrow()
    await expect.poll(() => lost, { timeout: 5000 }).toMatch(/ELOOP/)
    await supertest(app).get('/api/health').expect(503)
    expect(logged.join('\n')).toMatch(/The embedded database stopped: .*start Wearcourse again/)
    await expect(database.checkpoint()).rejects.toThrow()
    await database.close()

    unlinkSync(log)
    renameSync(`${log}.away`, log)
    const again = await openDatabase({ dataDir })
    expect((await again.pool.query('select n from rows_kept order by n')).rows[0]).toEqual({ n: 1 })
    await again.close()
  }, 60_000)

  it('that gives no sign of life is ended, and its folder is free again', async () => {
    const dataDir = join(folder, 'stuck')
    let lost: string | undefined
    const database = await openDatabase({ dataDir, queryTimeLimitMs: 500, silenceLimitMs: 1000, onLost: (reason) => (lost = reason) })
    await expect(database.pool.query('select count(*) from generate_series(1, 1000000000)')).rejects.toThrow()
    await expect.poll(() => lost, { timeout: 10_000 }).toBe('no sign of life for 1 s')
    await database.close()
    const again = await openDatabase({ dataDir })
    expect(await again.isAnswering()).toBe(true)
    await again.close()
  }, 60_000)

  it('forgets what a client left half done', async () => {
    const database = await openDatabase({ dataDir: join(folder, 'half') })
    await database.pool.query('create table halves (n int)')
    const { host, port, user, database: name } = database.pool.options
    const gone = new pg.Client({ host, port, user, database: name })
    gone.on('error', () => undefined)
    await gone.connect()
    const connection = (
      gone as unknown as {
        connection: pg.Connection & {
          parse: (query: object) => void
          bind: (query: object) => void
          execute: (query: object) => void
          flush: () => void
          stream: { destroy: () => void }
        }
      }
    ).connection
    connection.parse({ text: 'insert into halves values (1 / 0)', name: '', types: [] })
    connection.bind({})
    connection.execute({})
    connection.flush()
    await new Promise((resolve) => setTimeout(resolve, 300))
    connection.stream.destroy()
    await new Promise((resolve) => setTimeout(resolve, 300))
    const next = new pg.Client({ host, port, user, database: name })
    await next.connect()
    expect((await next.query('insert into halves values ($1) returning n', [7])).rows).toEqual([{ n: 7 }])
    await next.end()
    expect((await database.pool.query('select n from halves')).rows).toEqual([{ n: 7 }])
    await database.close()
  }, 60_000)
})
