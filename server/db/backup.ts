import { resolve } from 'node:path'
import { readEnvironment } from '../env.ts'
import { makeBackup } from './make-backup.ts'
import { restoreBackup } from './restore-backup.ts'

// npm run backup -- FILE, npm run restore -- FILE
const [, , what, name] = process.argv

async function run(): Promise<void> {
  process.umask(0o077)
  if ((what !== 'backup' && what !== 'restore') || !name)
    throw new Error('Say which file: npm run backup -- FILE, or npm run restore -- FILE.')
  // npm runs scripts in the project's folder; a relative name is meant from where the person stands.
  const file = resolve(process.env['INIT_CWD'] ?? process.cwd(), name)
  const place = readEnvironment(process.env)
  const { rows, tables, files, missing } = what === 'backup' ? await makeBackup(place, file) : await restoreBackup(place, file)
  for (const hash of missing) process.stderr.write(`The database speaks of a file that is not in the store: ${hash}\n`)
  process.stdout.write(
    `${what === 'backup' ? 'Backed up' : 'Restored'} ${rows} rows of ${tables} tables and ${files} files ${what === 'backup' ? 'to' : 'from'} ${file}\n`,
  )
}

run().then(
  () => process.exit(0),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
    process.exit(1)
  },
)
