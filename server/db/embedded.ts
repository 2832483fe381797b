import { chmodSync, existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Worker } from 'node:worker_threads'
import { startThread } from '../thread.ts'
import { checkDataVersion } from './data-version.ts'
import { lockFolder } from './folder-lock.ts'
import type { PgliteWorkerData } from './pglite-worker.ts'

type Order = 'checkpoint' | 'close' | { dumpTo: string }

export interface Embedded {
  connection: { host: string; port: number; user: string; database: string }
  order(order: Order): Promise<void>
  close(): Promise<void>
}

/** Starts PGlite on `DATA_DIR/database` in a thread of its own, behind a socket in a folder that only this user may enter. */
export async function startEmbedded({ dataDir, loadFrom, log }: { dataDir: string; loadFrom: string | undefined; log: (line: string) => void }): Promise<Embedded> {
  const folder = join(dataDir, 'database')
  const lock = await lockFolder(dataDir)
  const sockets = mkdtempSync(join(tmpdir(), 'wc-'))
  chmodSync(sockets, 0o700)
  try {
    checkDataVersion(dataDir)
    if (!existsSync(folder)) mkdirSync(folder, { mode: 0o700 })
    const worker = await ready({ folder, socket: join(sockets, '.s.PGSQL.5432'), loadFrom })
    worker.on('error', (error) => log(`database thread ${error.message}`))
    const order = (what: Order) => ask(worker, what)
    return {
      connection: { host: sockets, port: 5432, user: 'postgres', database: 'postgres' },
      order,
      async close() {
        await order('close')
        await worker.terminate()
        rmSync(sockets, { recursive: true, force: true })
        await lock.release()
      },
    }
  } catch (error) {
    rmSync(sockets, { recursive: true, force: true })
    await lock.release()
    throw error
  }
}

async function ready(workerData: PgliteWorkerData): Promise<Worker> {
  const worker = startThread(new URL('./pglite-worker.ts', import.meta.url), { workerData, ahead: ['@electric-sql/pglite', '@electric-sql/pglite-socket'] })
  await new Promise<void>((resolve, reject) => {
    const ended = () => reject(new Error('The database could not be opened.'))
    worker.once('error', reject)
    worker.once('exit', ended)
    worker.once('message', () => {
      worker.off('error', reject)
      worker.off('exit', ended)
      resolve()
    })
  })
  return worker
}

/** Gives the thread an order and waits for its word, one order at a time. */
function ask(worker: Worker, order: Order): Promise<void> {
  return new Promise((resolve, reject) => {
    worker.once('message', (answer: { failed?: string }) => (answer.failed === undefined ? resolve() : reject(new Error(answer.failed))))
    worker.postMessage(order)
  })
}
