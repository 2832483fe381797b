import { join } from 'node:path'
import type { NodePgDatabase } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import type pg from 'pg'
import type * as schema from './schema/index.ts'

/** Any number will do, as long as every process uses the same. */
const migrationLock = 4620_4620

/** Brings the tables up to date. On a server several processes may start at once: one migrates, the others wait for it. */
export async function migrateDatabase(db: NodePgDatabase<typeof schema>, pool: pg.Pool, kind: 'embedded' | 'server'): Promise<void> {
  const migrationsFolder = join(import.meta.dirname, '../../drizzle')
  if (kind === 'embedded') return migrate(db, { migrationsFolder })
  const client = await pool.connect()
  try {
    await client.query(`select pg_advisory_lock(${migrationLock})`)
    await migrate(db, { migrationsFolder })
  } finally {
    await client.query(`select pg_advisory_unlock(${migrationLock})`)
    client.release()
  }
}
