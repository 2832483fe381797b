import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { type OpenDatabase, openDatabase } from '../../server/db/open.ts'

/** A migrated database of its own. */
export async function testDatabase(): Promise<OpenDatabase> {
  const dataDir = await mkdtemp(join(tmpdir(), 'wearcourse-db-'))
  const database = await openDatabase({ dataDir })
  return {
    ...database,
    async close() {
      await database.close()
      await rm(dataDir, { recursive: true, force: true })
    },
  }
}
