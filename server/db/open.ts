import { mkdirSync } from 'node:fs'
import { type NodePgDatabase, drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { startEmbedded } from './embedded.ts'
import { migrateDatabase } from './migrate.ts'
import * as schema from './schema/index.ts'

export type Database = NodePgDatabase<typeof schema>
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0]

export interface OpenDatabase {
  db: Database
  pool: pg.Pool
  kind: 'embedded' | 'server'
  /** Does it answer, within two seconds. */
  isAnswering(): Promise<boolean>
  checkpoint(): Promise<void>
  /** Writes a copy of the embedded data folder to a file; refused on a server. */
  dumpTo(file: string): Promise<void>
  close(): Promise<void>
}

export interface OpenOptions {
  dataDir: string
  databaseUrl?: string
  log?: (line: string) => void
  /** After this the caller gets an error and the database counts as not answering until it does again. */
  queryTimeLimitMs?: number
  /** A dump of a migrated data folder to begin with. */
  loadFrom?: string
}

const defaultTimeLimit = 20_000

/** Opens the database, embedded in `dataDir` or on the server of `databaseUrl`, and brings its tables up to date. */
export async function openDatabase(options: OpenOptions): Promise<OpenDatabase> {
  const limit = options.queryTimeLimitMs ?? defaultTimeLimit
  const log = options.log ?? (() => undefined)
  mkdirSync(options.dataDir, { recursive: true, mode: 0o700 })
  const embedded = options.databaseUrl ? undefined : await startEmbedded({ dataDir: options.dataDir, loadFrom: options.loadFrom, log })
  // One connection to the embedded database: pglite-socket queues single protocol messages, so the parse, bind and execute of two connections
  // outside transactions mix (seen: "bind supplies 2 parameters, requires 3", "portal does not exist", a session lost).
  const pool = new pg.Pool({
    ...(embedded ? { ...embedded.connection, max: 1 } : { connectionString: options.databaseUrl, max: 10, statement_timeout: limit }),
    connectionTimeoutMillis: 10_000,
    query_timeout: limit,
  })
  pool.on('error', (error) => log(`database ${error.message}`))
  const db = drizzle(pool, { schema })
  const close = async () => {
    await pool.end()
    await embedded?.close()
  }
  try {
    await migrateDatabase(db, pool, embedded ? 'embedded' : 'server')
  } catch (error) {
    await close()
    throw error
  }
  return {
    db,
    pool,
    kind: embedded ? 'embedded' : 'server',
    isAnswering: () => answers(pool),
    checkpoint: () => embedded?.order('checkpoint') ?? Promise.resolve(),
    dumpTo: (file) => embedded?.order({ dumpTo: file }) ?? Promise.reject(new Error('A PostgreSQL server is backed up with pg_dump.')),
    close,
  }
}

/** One question with a short limit of its own: a database that is stuck or full must not hold the health check up. */
async function answers(pool: pg.Pool): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined
  const late = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), 2000)
  })
  const answered = pool.query('select 1').then(() => true, () => false)
  try {
    return await Promise.race([answered, late])
  } finally {
    clearTimeout(timer)
  }
}
