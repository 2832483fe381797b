import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { TestProject } from 'vitest/node'
import { openDatabase } from '../../server/db/open.ts'

declare module 'vitest' {
  interface ProvidedContext {
    /** Path of a dump of a migrated, empty database. */
    databaseTemplate: string
  }
}

/** Makes the migrated database once for a run; every test file begins with a copy. Not needed on a server. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  if (process.env['TEST_DATABASE_URL']) {
    project.provide('databaseTemplate', '')
    return () => Promise.resolve()
  }
  const dataDir = await mkdtemp(join(tmpdir(), 'wearcourse-template-'))
  const dump = join(dataDir, 'template.tar')
  const database = await openDatabase({ dataDir })
  await database.checkpoint()
  await database.dumpTo(dump)
  await database.close()
  project.provide('databaseTemplate', dump)
  return () => rm(dataDir, { recursive: true, force: true })
}
