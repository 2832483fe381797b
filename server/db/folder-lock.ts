import { createHash } from 'node:crypto'
import { realpathSync } from 'node:fs'
import { type Server, createServer } from 'node:net'

/**
 * Locks a data folder for this process: PGlite has no lock of its own, and two processes on one folder lose data without an error.
 * An abstract socket named after the folder; the kernel frees it however the process ends. Linux only, one network namespace.
 * @throws Error in one sentence when another process holds the folder.
 */
export async function lockFolder(folder: string): Promise<{ release: () => Promise<void> }> {
  const name = createHash('sha256').update(realpathSync(folder)).digest('hex').slice(0, 32)
  const lock: Server = createServer((socket) => socket.destroy())
  await new Promise<void>((resolve, reject) => {
    lock.once('error', (error: NodeJS.ErrnoException) =>
      reject(
        error.code === 'EADDRINUSE'
          ? new Error(`The data folder ${folder} is in use by another Wearcourse. Stop that one first, or set another DATA_DIR.`)
          : error,
      ),
    )
    lock.listen(`\0wearcourse-${name}`, resolve)
  })
  lock.unref()
  return { release: () => new Promise((resolve) => lock.close(() => resolve())) }
}
