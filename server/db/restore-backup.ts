import { createWriteStream } from 'node:fs'
import { cp, mkdtemp, readdir, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import pg from 'pg'
import type { FileStore } from '../files/store.ts'
import {
  type About,
  type BackupPlace,
  type Carried,
  aboutSchema,
  countersSchema,
  inTransaction,
  openStore,
  partSchema,
} from './backup-contents.ts'
import { bytesOf, checkBackupFile, readBackupFile } from './backup-file.ts'
import { migrationsFolder, readJournal } from './migrate.ts'
import { type OpenDatabase, openDatabase } from './open.ts'
import { setCounter, writePart } from './table-copy.ts'

/** Puts a backup into an empty data folder or an empty database, and brings its tables up to date. What fails leaves nothing behind. */
export async function restoreBackup(place: BackupPlace, file: string): Promise<Carried> {
  await checkBackupFile(file)
  const about = await readAbout(file)
  await refuseUnlessEmpty(place)
  const migrations = await migrationsUpTo(about.lastMigration)
  let database: OpenDatabase | undefined
  try {
    database = await openDatabase({ dataDir: place.dataDir, databaseUrl: place.databaseUrl, migrations })
    const store = await openStore(place)
    const carried = await inTransaction(database, 'begin', (client) => load(client, store, file))
    await database.close()
    database = await openDatabase({ dataDir: place.dataDir, databaseUrl: place.databaseUrl })
    await database.close()
    return carried
  } catch (error) {
    await leaveNothing(place, database)
    throw error
  } finally {
    await rm(migrations, { recursive: true, force: true })
  }
}

async function readAbout(file: string): Promise<About> {
  let about: unknown
  await readBackupFile(file, async ({ name, content }) => {
    if (name === 'about.json') about = JSON.parse((await bytesOf(content)).toString())
    else await bytesOf(content)
  })
  const known = aboutSchema.safeParse(about)
  if (!known.success) throw new Error(`${file} was made by a Wearcourse that this one does not know; update Wearcourse first.`)
  return known.data
}

async function refuseUnlessEmpty(place: BackupPlace): Promise<void> {
  const holds = async (name: string) => (await readdir(join(place.dataDir, name)).catch(() => [])).length > 0
  const full = [...(place.databaseUrl ? [] : ['database']), ...(place.s3 ? [] : ['files'])]
  for (const name of full) {
    if (await holds(name))
      throw new Error(`${place.dataDir} is not empty; a backup is restored into an empty folder only. Set another DATA_DIR.`)
  }
  if (!place.databaseUrl) return
  const client = new pg.Client({ connectionString: place.databaseUrl, connectionTimeoutMillis: 10_000 })
  await client.connect()
  const { rows } = await client.query("select 1 from pg_tables where schemaname in ('public', 'drizzle') limit 1")
  await client.end()
  if (rows.length > 0) throw new Error('The database of DATABASE_URL is not empty; a backup is restored into an empty one only.')
}

/** A copy of the migrations up to the one that the backup was made at: its rows fit those tables, later migrations then change both. */
async function migrationsUpTo(last: number): Promise<string> {
  const journal = readJournal(migrationsFolder)
  if (!journal.entries.some(({ when }) => when === last)) {
    throw new Error(
      'The backup was made with tables that this Wearcourse does not know; restore it with the Wearcourse that made it, or update this one.',
    )
  }
  const folder = await mkdtemp(join(tmpdir(), 'wc-migrations-'))
  await cp(migrationsFolder, folder, { recursive: true })
  await writeFile(
    join(folder, 'meta/_journal.json'),
    JSON.stringify({ ...journal, entries: journal.entries.filter(({ when }) => when <= last) }),
  )
  return folder
}

async function load(client: pg.PoolClient, store: FileStore, file: string): Promise<Carried> {
  const tables = new Set<string>()
  const carried: Carried = { tables: 0, rows: 0, files: 0, missing: [] }
  await readBackupFile(file, async ({ name, content }) => {
    const [kind, rest = ''] = name.split('/')
    if (kind === 'files') {
      const path = join(store.incoming, rest)
      await pipeline(content, createWriteStream(path, { mode: 0o600 }))
      await store.adopt(path, rest)
      carried.files += 1
      return
    }
    const bytes = await bytesOf(content)
    if (kind === 'rows') {
      const part = partSchema.parse(JSON.parse(bytes.toString()))
      await writePart(client, part)
      tables.add(part.table)
      carried.rows += part.rows.length
    } else if (kind === 'counters.json') {
      for (const counter of countersSchema.parse(JSON.parse(bytes.toString()))) await setCounter(client, counter)
    }
  })
  return { ...carried, tables: tables.size }
}

/** Only what this restore made is taken away: it had found the place empty and holds its lock. */
async function leaveNothing(place: BackupPlace, database: OpenDatabase | undefined): Promise<void> {
  if (!database) return
  if (place.databaseUrl) await database.pool.query(dropAll).catch(() => undefined)
  await database.close().catch(() => undefined)
  if (!place.databaseUrl) {
    for (const name of ['database', 'database.version.json']) await rm(join(place.dataDir, name), { recursive: true, force: true })
  }
  if (!place.s3) await rm(join(place.dataDir, 'files'), { recursive: true, force: true })
}

const dropAll = `do $$ declare name text; begin
  for name in select tablename from pg_tables where schemaname = 'public' loop execute format('drop table public.%I cascade', name); end loop;
  for name in select typname from pg_type where typnamespace = 'public'::regnamespace and typtype = 'e' loop execute format('drop type public.%I', name); end loop;
  drop schema if exists drizzle cascade;
end $$`
