import { mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { type NodePgDatabase, drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'
import { startThread } from '../thread.ts'
import * as schema from './schema/index.ts'

export type Database = NodePgDatabase<typeof schema>
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0]
export interface OpenDatabase {
  db: Database
  pool: pg.Pool
  kind: 'embedded' | 'server'
  isAnswering(): Promise<boolean>
  checkpoint(): Promise<void>
  close(): Promise<void>
}

export async function openDatabase(options: { dataDir: string; databaseUrl?: string; log?: (line: string) => void }): Promise<OpenDatabase> {
  const folder = join(options.dataDir, 'database')
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const socketFolder = mkdtempSync(join(tmpdir(), 'wc-'))
  const worker = startThread(new URL('./pglite-worker.ts', import.meta.url), {
    workerData: { dir: folder, socket: join(socketFolder, '.s.PGSQL.5432') },
  })
  await new Promise<void>((resolve, reject) => {
    worker.once('message', () => resolve())
    worker.once('error', reject)
  })
  const pool = new pg.Pool({ host: socketFolder, port: 5432, user: 'postgres', database: 'postgres', max: 3, connectionTimeoutMillis: 5000 })
  pool.on('error', (error) => options.log?.(String(error)))
  const db = drizzle(pool, { schema })
  await migrate(db, { migrationsFolder: join(import.meta.dirname, '../../drizzle') })
  return {
    db, pool, kind: 'embedded',
    isAnswering: () => pool.query('select 1').then(() => true, () => false),
    checkpoint: async () => void (await pool.query('checkpoint')),
    async close() {
      await pool.end()
      const closed = new Promise((resolve) => worker.once('message', resolve))
      worker.postMessage('close')
      await closed
      await worker.terminate()
      rmSync(socketFolder, { recursive: true, force: true })
    },
  }
}
