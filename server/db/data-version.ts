import { existsSync, readFileSync, readdirSync } from 'node:fs'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import * as z from 'zod'
import { writeDurably } from '../files/write-durably.ts'

const markSchema = z.object({ pglite: z.string(), format: z.number() })
const format = 1

/** The version of PGlite that runs here. */
export const pgliteVersion = z
  .object({ version: z.string() })
  .parse(
    JSON.parse(readFileSync(join(dirname(createRequire(import.meta.url).resolve('@electric-sql/pglite')), '../package.json'), 'utf8')),
  ).version

/**
 * Checks that a data folder was written by this version of PGlite, and marks an empty one. Another version may read it wrongly without an error.
 * @throws Error in two sentences: what is wrong, and what to do.
 */
export function checkDataVersion(dataDir: string): void {
  const mark = join(dataDir, 'database.version.json')
  const database = join(dataDir, 'database')
  const isEmpty = !existsSync(database) || readdirSync(database).length === 0
  if (isEmpty) {
    writeDurably(mark, `${JSON.stringify({ pglite: pgliteVersion, format })}\n`)
    return
  }
  const written = existsSync(mark) ? markSchema.safeParse(JSON.parse(readFileSync(mark, 'utf8') || 'null')) : undefined
  if (written?.success && written.data.pglite === pgliteVersion && written.data.format === format) return
  const by = written?.success ? `PGlite ${written.data.pglite}` : 'an unknown version of PGlite'
  throw new Error(
    `The database in ${dataDir} was written by ${by}; this is PGlite ${pgliteVersion}. ` +
      'Make a backup with the Wearcourse that wrote it (npm run backup -- FILE) and restore it with this one into an empty folder (npm run restore -- FILE).',
  )
}
