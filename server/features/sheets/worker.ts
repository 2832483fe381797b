import { readFileSync } from 'node:fs'
import { parentPort } from 'node:worker_threads'
import { readPages } from './page-reader.ts'

// One file at a time: a path comes in, what came of it goes out.
parentPort?.on('message', (path: string) => {
  void readPages(new Uint8Array(readFileSync(path))).then((result) => parentPort?.postMessage(result))
})
