import type pg from 'pg'
import * as z from 'zod'
import type { Environment } from '../env.ts'
import { type FileStore, openDiskStore } from '../files/store.ts'
import type { OpenDatabase } from './open.ts'

/** What a backup says of itself, in its first entry. The rows do not depend on the version of PGlite; it is told for the record. */
export const aboutSchema = z.object({
  wearcourse: z.literal('backup'),
  format: z.literal(1),
  lastMigration: z.number(),
  pglite: z.string(),
  kind: z.enum(['embedded', 'server']),
  madeAt: z.string(),
})
export type About = z.infer<typeof aboutSchema>
export const partSchema = z.object({ table: z.string(), columns: z.array(z.string()), rows: z.array(z.array(z.string().nullable())) })
export const countersSchema = z.array(z.object({ table: z.string(), column: z.string(), last: z.string(), isUsed: z.boolean() }))

export type BackupPlace = Pick<Environment, 'dataDir' | 'databaseUrl' | 's3'>

export interface Carried {
  tables: number
  rows: number
  files: number
  /** Hashes of files that the database speaks of and the store does not have. */
  missing: string[]
}

export const openStore = async ({ dataDir, s3 }: BackupPlace): Promise<FileStore> =>
  s3 ? (await import('../files/s3-store.ts')).openS3Store(dataDir, s3) : openDiskStore(dataDir)

export async function inTransaction<T>(database: OpenDatabase, begin: string, work: (client: pg.PoolClient) => Promise<T>): Promise<T> {
  const client = await database.pool.connect()
  try {
    await client.query(begin)
    const result = await work(client)
    await client.query('commit')
    return result
  } catch (error) {
    await client.query('rollback').catch(() => undefined)
    throw error
  } finally {
    client.release()
  }
}
