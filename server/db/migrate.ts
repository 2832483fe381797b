import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { NodePgDatabase } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import type pg from 'pg'
import * as z from 'zod'
import type * as schema from './schema/index.ts'

export const migrationsFolder = join(import.meta.dirname, '../../drizzle')
/** Any number will do, as long as every process uses the same. */
const migrationLock = 4620_4620
const journalSchema = z.looseObject({ entries: z.array(z.looseObject({ when: z.number() })) })

/** The list of migrations, each known by when it was made. */
export function readJournal(folder: string): z.infer<typeof journalSchema> {
  return journalSchema.parse(JSON.parse(readFileSync(join(folder, 'meta/_journal.json'), 'utf8')))
}

/** When the newest migration that ran was made: the version of the tables. Undefined before the first. */
export async function readLastMigration(client: pg.Pool | pg.ClientBase): Promise<number | undefined> {
  const { rows: tables } = await client.query<{ isThere: boolean }>(
    `select to_regclass('drizzle.__drizzle_migrations') is not null as "isThere"`,
  )
  if (!tables[0]?.isThere) return undefined
  const { rows } = await client.query<{ last: string | null }>('select max(created_at)::text as last from drizzle.__drizzle_migrations')
  return rows[0]?.last ? Number(rows[0].last) : undefined
}

/**
 * Brings the tables up to date. On a server several processes may start at once: one migrates, the others wait for it.
 * @throws Error when the tables are not of this Wearcourse or an earlier one.
 */
export async function migrateDatabase(
  db: NodePgDatabase<typeof schema>,
  pool: pg.Pool,
  { kind, folder }: { kind: 'embedded' | 'server'; folder: string },
): Promise<void> {
  if (kind === 'embedded') return migrateKnown(db, pool, folder)
  const client = await pool.connect()
  try {
    await client.query(`select pg_advisory_lock(${migrationLock})`)
    await migrateKnown(db, pool, folder)
  } finally {
    await client.query(`select pg_advisory_unlock(${migrationLock})`)
    client.release()
  }
}

async function migrateKnown(db: NodePgDatabase<typeof schema>, pool: pg.Pool, folder: string): Promise<void> {
  const last = await readLastMigration(pool)
  if (last !== undefined && !readJournal(folder).entries.some(({ when }) => when === last)) {
    throw new Error('The tables of this database were made by another version of Wearcourse; start that version, or update this one.')
  }
  await migrate(db, { migrationsFolder: folder })
}
