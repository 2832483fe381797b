import { chmodSync, existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Worker } from 'node:worker_threads'
import { startThread } from '../thread.ts'
import { checkDataVersion } from './data-version.ts'
import type { Order, PgliteWorkerData } from './pglite-worker.ts'

export interface Embedded {
  connection: { host: string; port: number; user: string; database: string }
  order(order: Order): Promise<void>
  close(): Promise<void>
}

export interface EmbeddedOptions {
  dataDir: string
  loadFrom: string | undefined
  /** After this long without a sign of life the thread counts as lost (a full disk makes PGlite turn round and round). */
  silenceLimitMs: number
  /** Called once when the thread has ended by itself or gives no sign of life: nothing will be answered any more. */
  onLost: (reason: string) => void
}

/** Starts PGlite on `DATA_DIR/database`, which the caller has locked, in a thread of its own, behind a socket in a folder that only this user may enter. */
export async function startEmbedded({ dataDir, loadFrom, silenceLimitMs, onLost }: EmbeddedOptions): Promise<Embedded> {
  const folder = join(dataDir, 'database')
  const sockets = mkdtempSync(join(tmpdir(), 'wc-'))
  chmodSync(sockets, 0o700)
  const removeSockets = () => rmSync(sockets, { recursive: true, force: true })
  try {
    checkDataVersion(dataDir)
    if (!existsSync(folder)) mkdirSync(folder, { mode: 0o700 })
    const worker = await ready({ folder, socket: join(sockets, '.s.PGSQL.5432'), loadFrom })
    const thread = obeyingThread(worker, { silenceLimitMs, onLost })
    return {
      connection: { host: sockets, port: 5432, user: 'postgres', database: 'postgres' },
      order: thread.order,
      async close() {
        try {
          await thread.end()
        } finally {
          removeSockets()
        }
      },
    }
  } catch (error) {
    removeSockets()
    throw error
  }
}

async function ready(workerData: PgliteWorkerData): Promise<Worker> {
  const worker = startThread(new URL('./pglite-worker.ts', import.meta.url), {
    workerData,
    ahead: ['@electric-sql/pglite', '@electric-sql/pglite-socket'],
  })
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

/** Gives the thread orders and waits for its word; notices when it has ended or is stuck. */
function obeyingThread(worker: Worker, { silenceLimitMs, onLost }: Pick<EmbeddedOptions, 'silenceLimitMs' | 'onLost'>) {
  const waiting = new Map<number, { resolve: () => void; reject: (error: Error) => void }>()
  let given = 0
  let state: 'running' | 'closing' | 'lost' = 'running'
  let reason = 'its thread ended'
  let silentTicks = 0

  const lose = (why: string) => {
    if (state === 'lost') return
    const expected = state === 'closing'
    state = 'lost'
    clearInterval(watch)
    for (const { reject } of waiting.values()) reject(new Error(`The database stopped: ${why}.`))
    waiting.clear()
    void worker.terminate()
    if (!expected) onLost(why)
  }
  const order = (what: Order) =>
    new Promise<void>((resolve, reject) => {
      if (state === 'lost') return reject(new Error(`The database stopped: ${reason}.`))
      given += 1
      waiting.set(given, { resolve, reject })
      worker.postMessage({ id: given, order: what })
    })
  worker.on('message', ({ id, failed }: { id: number; failed?: string }) => {
    silentTicks = 0
    const one = waiting.get(id)
    waiting.delete(id)
    if (failed === undefined) one?.resolve()
    else one?.reject(new Error(failed))
  })
  worker.on('error', (error) => (reason = error.message.replace(/\.$/, '')))
  worker.on('exit', () => lose(reason))
  // Ticks are counted, not clock time: a laptop that slept did not lose its database.
  const tickMs = Math.min(5000, silenceLimitMs / 4)
  const watch = setInterval(() => {
    silentTicks += 1
    if (silentTicks * tickMs > silenceLimitMs) {
      reason = `no sign of life for ${Math.round(silenceLimitMs / 1000)} s`
      lose(reason)
    } else if (waiting.size === 0) void order('answer').catch(() => undefined)
  }, tickMs)
  watch.unref()

  return {
    order,
    async end() {
      if (state === 'running') {
        state = 'closing'
        clearInterval(watch)
        await order('close')
      }
      await worker.terminate()
    },
  }
}
