import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { isSha256 } from '../files/store.ts'
import { type About, type BackupPlace, type Carried, inTransaction, openStore } from './backup-contents.ts'
import { writeBackupFile } from './backup-file.ts'
import { pgliteVersion } from './data-version.ts'
import { readLastMigration } from './migrate.ts'
import { openDatabase } from './open.ts'
import { filesSpokenOf, readCounters, readTable, tablesInOrder } from './table-copy.ts'

/** Writes all rows and files into one file. Wearcourse must be stopped: the data folder is locked meanwhile. */
export async function makeBackup(place: BackupPlace, file: string): Promise<Carried> {
  if (!place.databaseUrl && !existsSync(join(place.dataDir, 'database'))) throw new Error(`There is no database in ${place.dataDir}.`)
  const database = await openDatabase({ dataDir: place.dataDir, databaseUrl: place.databaseUrl, migrations: 'none' })
  try {
    const store = await openStore(place)
    return await inTransaction(database, 'begin isolation level repeatable read read only', async (client) => {
      const lastMigration = await readLastMigration(client)
      if (lastMigration === undefined) throw new Error('The database holds nothing of Wearcourse yet.')
      const carried: Carried = { tables: 0, rows: 0, files: 0, missing: [] }
      await writeBackupFile(file, async (writer) => {
        const json = (name: string, content: unknown) => writer.add(name, Buffer.from(JSON.stringify(content)))
        const about: About = {
          wearcourse: 'backup',
          format: 1,
          lastMigration,
          pglite: pgliteVersion,
          kind: database.kind,
          madeAt: new Date().toISOString(),
        }
        await json('about.json', about)
        for (const hash of await filesSpokenOf(client)) {
          if (!isSha256(hash) || !(await store.has(hash))) {
            carried.missing.push(hash)
            continue
          }
          await writer.addStream(`files/${hash}`, await store.size(hash), store.read(hash))
          carried.files += 1
        }
        let part = 0
        for (const table of await tablesInOrder(client)) {
          carried.tables += 1
          for await (const rowsOfTable of readTable(client, table)) {
            await json(`rows/${String(part++).padStart(6, '0')}-${table}.json`, rowsOfTable)
            carried.rows += rowsOfTable.rows.length
          }
        }
        await json('counters.json', await readCounters(client))
      })
      return carried
    })
  } finally {
    await database.close()
  }
}
