import { randomBytes } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { writeDurably } from './files/write-durably.ts'

/** The session secret: made once and kept in `DATA_DIR/session-secret`, readable by the owner alone. */
export async function sessionSecretIn(dataDir: string): Promise<string> {
  const path = join(dataDir, 'session-secret')
  try {
    return (await readFile(path, 'utf8')).trim()
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error
    const secret = randomBytes(48).toString('base64url')
    writeDurably(path, `${secret}\n`)
    return secret
  }
}
