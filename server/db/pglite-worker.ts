import { readdirSync } from 'node:fs'
import { join } from 'node:path'
import { parentPort, workerData } from 'node:worker_threads'
import { watchWrites } from './durable-files.ts'

/** The thread of the embedded database: PGlite behind a socket, every commit on the disk before its answer leaves. */
export interface PgliteWorkerData {
  folder: string
  socket: string
  /** Path of a dump of a data folder to begin with, when the folder is empty. */
  loadFrom: string | undefined
}

/** What the main thread may ask for, one at a time and while no query is under way. */
export type Order = 'answer' | 'checkpoint' | 'close' | { dumpTo: string }

const { folder, socket, loadFrom } = workerData as PgliteWorkerData
const disk = watchWrites(folder)

// The packages were loaded ahead; they reach the file system through the functions that are watched now.
const { PGlite } = await import('@electric-sql/pglite')
const { pg_trgm } = await import('@electric-sql/pglite/contrib/pg_trgm')
const { unaccent } = await import('@electric-sql/pglite/contrib/unaccent')
const { PGLiteSocketServer } = await import('@electric-sql/pglite-socket')
const { openAsBlob } = await import('node:fs')

const lite = await PGlite.create({
  dataDir: folder,
  extensions: { pg_trgm, unaccent },
  ...(loadFrom && readdirSync(folder).length === 0 ? { loadDataDir: await openAsBlob(loadFrom) } : {}),
})
disk.syncAll()

/** Messages after which a transaction may have been committed: a simple query, the end of an extended one. */
const commits = new Set(['Q'.charCodeAt(0), 'S'.charCodeAt(0)])
const sync = Uint8Array.of('S'.charCodeAt(0), 0, 0, 0, 4)
const simpleQuery = (text: string) => Uint8Array.of('Q'.charCodeAt(0), 0, 0, 0, text.length + 5, ...new TextEncoder().encode(text), 0)
/** Segments of the write-ahead log (16 MB each) after which a checkpoint is due: there is no checkpointer here. */
const segmentsBeforeCheckpoint = 3
let mayBeDue = false

/** Ends this thread. After a failed sync or a crash of the database nothing may be answered: what is on the disk is what counts. */
function die(error: unknown): Promise<never> {
  setImmediate(() => {
    throw error instanceof Error ? error : new Error(String(error))
  })
  return new Promise(() => undefined)
}

/** Runs a message of our own between those of the client; called while the client's message still holds the database. */
const between = (message: Uint8Array) => lite.execProtocolRawStream(message, { syncToFs: false, onRawData: () => undefined })

/** What the last client left half done: it may have gone between the parts of a query, and the next one would end it unknowingly. */
async function forgetLastClient(): Promise<void> {
  await between(sync)
  if (lite.isInTransaction()) await between(simpleQuery('ROLLBACK'))
}

/** Checkpoints when the log has grown, after a query and never inside a transaction. */
async function checkpointWhenDue(): Promise<void> {
  if (!mayBeDue || lite.isInTransaction()) return
  mayBeDue = false
  const segments = readdirSync(join(folder, 'pg_wal')).filter((name) => /^[0-9A-F]{24}$/.test(name)).length
  if (segments < segmentsBeforeCheckpoint) return
  await between(simpleQuery('CHECKPOINT'))
  disk.syncAll()
}
const timer = setInterval(() => (mayBeDue = true), 5000)

/**
 * What the socket server is given: answers are held back until the log they rest on is on the disk. An error must not leave here: the socket
 * server would stop working off its queue without a word.
 */
const durable = new Proxy(lite, {
  get(target, name) {
    if (name === 'execProtocolRawStream') {
      return async (message: Uint8Array, options: { onRawData: (data: Uint8Array) => void }) => {
        try {
          if (message[0] === 0) await forgetLastClient()
          const held: Uint8Array[] = []
          await target.execProtocolRawStream(message, { syncToFs: false, onRawData: (data) => held.push(data.slice()) })
          const ends = commits.has(message[0] ?? 0)
          if (ends) disk.syncLog()
          for (const data of held) options.onRawData(data)
          if (ends) await checkpointWhenDue()
        } catch (error) {
          await die(error)
        }
      }
    }
    const value: unknown = Reflect.get(target, name, target)
    return typeof value === 'function' ? (value.bind(target) as unknown) : value
  },
})

const server = new PGLiteSocketServer({ db: durable, path: socket, maxConnections: 20 })
await server.start()

parentPort?.on('message', ({ id, order }: { id: number; order: Order }) => {
  void obey(order).then(
    () => parentPort?.postMessage({ id }),
    (error: unknown) => parentPort?.postMessage({ id, failed: error instanceof Error ? error.message : String(error) }),
  )
})

async function obey(order: Order): Promise<void> {
  if (order === 'answer') return
  if (order === 'checkpoint') {
    await lite.exec('CHECKPOINT')
    disk.syncAll()
    return
  }
  if (order === 'close') {
    clearInterval(timer)
    await server.stop()
    await obey('checkpoint')
    await lite.close()
    disk.syncAll()
    return
  }
  const { writeFile } = await import('node:fs/promises')
  const dump = await lite.dumpDataDir('none')
  await writeFile(order.dumpTo, new Uint8Array(await dump.arrayBuffer()))
}

parentPort?.postMessage('ready')
