import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import pg from 'pg'
import { inject } from 'vitest'
import { type OpenDatabase, openDatabase } from '../../server/db/open.ts'

/** A migrated database of its own: a copy of the run's template, or a fresh database on the server of TEST_DATABASE_URL. */
export async function testDatabase(): Promise<OpenDatabase> {
  const server = process.env['TEST_DATABASE_URL']
  return server ? onServer(server) : embedded()
}

async function embedded(): Promise<OpenDatabase> {
  const dataDir = await mkdtemp(join(tmpdir(), 'wearcourse-db-'))
  const database = await openDatabase({ dataDir, loadFrom: inject('databaseTemplate') })
  return {
    ...database,
    async close() {
      await database.close()
      await rm(dataDir, { recursive: true, force: true })
    },
  }
}

async function onServer(url: string): Promise<OpenDatabase> {
  const name = `wearcourse_${process.pid}_${Math.random().toString(36).slice(2)}`
  const admin = new pg.Client({ connectionString: url })
  await admin.connect()
  await admin.query(`create database ${name}`)
  const own = new URL(url)
  own.pathname = `/${name}`
  const dataDir = await mkdtemp(join(tmpdir(), 'wearcourse-db-'))
  const database = await openDatabase({ dataDir, databaseUrl: own.href })
  return {
    ...database,
    async close() {
      await database.close()
      await admin.query(`drop database ${name} with (force)`)
      await admin.end()
      await rm(dataDir, { recursive: true, force: true })
    },
  }
}
