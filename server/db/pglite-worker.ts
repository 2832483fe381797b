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
/** Segments of the write-ahead log (16 MB each) after which a checkpoint is due: there is no checkpointer here. */
const segmentsBeforeCheckpoint = 3
let checkpointing = false

/** What the socket server is given: answers are held back until the log they rest on is on the disk. */
const durable = new Proxy(lite, {
  get(target, name) {
    if (name === 'execProtocolRawStream') {
      return async (message: Uint8Array, options: { onRawData: (data: Uint8Array) => void }) => {
        const held: Uint8Array[] = []
        await target.execProtocolRawStream(message, { syncToFs: false, onRawData: (data) => held.push(data.slice()) })
        if (commits.has(message[0] ?? 0)) disk.syncLog()
        for (const data of held) options.onRawData(data)
      }
    }
    const value: unknown = Reflect.get(target, name, target)
    return typeof value === 'function' ? (value.bind(target) as unknown) : value
  },
})

const server = new PGLiteSocketServer({ db: durable, path: socket, maxConnections: 20 })
await server.start()

async function checkpoint(): Promise<void> {
  await lite.exec('CHECKPOINT')
  disk.syncAll()
}

/** Checkpoints when the log has grown, between statements and never inside a transaction. */
async function checkpointWhenDue(): Promise<void> {
  const segments = readdirSync(join(folder, 'pg_wal')).filter((name) => /^[0-9A-F]{24}$/.test(name)).length
  if (checkpointing || segments < segmentsBeforeCheckpoint) return
  checkpointing = true
  try {
    await checkpoint()
  } finally {
    checkpointing = false
  }
}
const timer = setInterval(() => void checkpointWhenDue().catch(() => undefined), 5000)

parentPort?.on('message', (order: 'checkpoint' | 'close' | { dumpTo: string }) => {
  void obey(order).then(
    () => parentPort?.postMessage({ done: order }),
    (error: unknown) => parentPort?.postMessage({ failed: error instanceof Error ? error.message : String(error) }),
  )
})

async function obey(order: 'checkpoint' | 'close' | { dumpTo: string }): Promise<void> {
  if (order === 'checkpoint') return checkpoint()
  if (order === 'close') {
    clearInterval(timer)
    await server.stop()
    await checkpoint()
    await lite.close()
    disk.syncAll()
    return
  }
  const { writeFile } = await import('node:fs/promises')
  const dump = await lite.dumpDataDir('none')
  await writeFile(order.dumpTo, new Uint8Array(await dump.arrayBuffer()))
}

parentPort?.postMessage('ready')
