import { parentPort, workerData } from 'node:worker_threads'
import { PGlite } from '@electric-sql/pglite'
import { pg_trgm } from '@electric-sql/pglite/contrib/pg_trgm'
import { unaccent } from '@electric-sql/pglite/contrib/unaccent'
import { PGLiteSocketServer } from '@electric-sql/pglite-socket'

const { dir, socket } = workerData as { dir: string; socket: string }
const lite = await PGlite.create({ dataDir: dir, extensions: { pg_trgm, unaccent } })
const server = new PGLiteSocketServer({ db: lite, path: socket, maxConnections: 10 })
await server.start()
parentPort?.on('message', () => {
  void server.stop().then(() => lite.close()).then(() => parentPort?.postMessage('closed'))
})
parentPort?.postMessage('ready')
