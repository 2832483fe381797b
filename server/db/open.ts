import { mkdirSync } from 'node:fs'
import { type NodePgDatabase, drizzle } from 'drizzle-orm/node-postgres'
import pg from 'pg'
import { AskingPool, markTransactions } from './asking-pool.ts'
import { startEmbedded } from './embedded.ts'
import { lockFolder } from './folder-lock.ts'
import { migrateDatabase, migrationsFolder } from './migrate.ts'
import type { Order } from './pglite-worker.ts'
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
  /** Writes a copy of the embedded data folder to a file, for tests to begin with; only this version of PGlite reads it. Nothing on a server. */
  dumpTo(file: string): Promise<void>
  close(): Promise<void>
}

export interface OpenOptions {
  dataDir: string
  databaseUrl?: string | undefined
  log?: (line: string) => void
  /** After this the caller gets an error and the database counts as not answering until it does again. */
  queryTimeLimitMs?: number
  /** After so long without a sign of life the thread of the embedded database counts as lost. */
  silenceLimitMs?: number
  /** The embedded database has ended by itself and will not come back in this process. */
  onLost?: (reason: string) => void
  /** Another folder of migrations, or none: the tables stay as they are. */
  migrations?: string
  /** A dump of a migrated data folder to begin with. */
  loadFrom?: string
}

const defaultTimeLimit = 20_000

/**
 * Opens the database, embedded in `dataDir` or on the server of `databaseUrl`, and brings its tables up to date.
 * The data folder is locked meanwhile, whichever it is: uploads and generated secrets are there too.
 */
export async function openDatabase(options: OpenOptions): Promise<OpenDatabase> {
  mkdirSync(options.dataDir, { recursive: true, mode: 0o700 })
  const lock = await lockFolder(options.dataDir)
  try {
    const database = await openLocked(options)
    return { ...database, close: () => database.close().finally(() => lock.release()) }
  } catch (error) {
    await lock.release()
    throw error
  }
}

async function openLocked(options: OpenOptions): Promise<OpenDatabase> {
  const {
    dataDir,
    databaseUrl,
    queryTimeLimitMs = defaultTimeLimit,
    silenceLimitMs = 60_000,
    migrations = migrationsFolder,
    log = () => undefined,
  } = options
  const onLost = (reason: string) => {
    log(`The embedded database stopped: ${reason}. Nothing that was saved is lost; see that the disk has room and start Wearcourse again.`)
    options.onLost?.(reason)
  }
  const embedded = databaseUrl ? undefined : await startEmbedded({ dataDir, loadFrom: options.loadFrom, silenceLimitMs, onLost })
  // One connection to the embedded database: pglite-socket queues single protocol messages, so the parse, bind and execute of two connections
  // outside transactions mix (seen: "bind supplies 2 parameters, requires 3", "portal does not exist", a session lost).
  const pool = new AskingPool({
    ...(embedded ? { ...embedded.connection, max: 1 } : { connectionString: databaseUrl, max: 10, statement_timeout: queryTimeLimitMs }),
    connectionTimeoutMillis: 10_000,
    query_timeout: queryTimeLimitMs,
  })
  pool.on('error', (error) => log(`database ${error.message}`))
  const db = markTransactions(drizzle(pool, { schema }))
  /** While it holds the one connection no query is under way. */
  const alone = async (order: Order) => {
    if (!embedded) return
    const client = await pool.connect()
    try {
      await embedded.order(order)
    } finally {
      client.release()
    }
  }
  const close = async () => {
    await pool.end()
    await embedded?.close()
  }
  try {
    if (migrations !== 'none') await migrateDatabase(db, pool, { kind: embedded ? 'embedded' : 'server', folder: migrations })
  } catch (error) {
    await close()
    throw error
  }
  return {
    db,
    pool,
    kind: embedded ? 'embedded' : 'server',
    isAnswering: () => answers(pool),
    checkpoint: () => alone('checkpoint'),
    dumpTo: (file) => alone({ dumpTo: file }),
    close,
  }
}

/** One question with a short limit of its own: a database that is stuck or full must not hold the health check up. */
async function answers(pool: pg.Pool): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined
  const late = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), 2000)
  })
  const answered = pool.query('select 1').then(
    () => true,
    () => false,
  )
  try {
    return await Promise.race([answered, late])
  } finally {
    clearTimeout(timer)
  }
}
