import type { Worker } from 'node:worker_threads'
import { startThread } from '../../thread.ts'
import type { ReadResult } from './page-reader.ts'

export interface ReadLimits {
  milliseconds: number
  /** Of JavaScript's own heap in the worker. */
  heapMegabytes: number
  /** How far the whole process may grow while a file is read: buffers are not on the heap. */
  growthMegabytes: number
}
const usual: ReadLimits = { milliseconds: 30_000, heapMegabytes: 512, growthMegabytes: 640 }
const atOnce = 2
const megabyte = 1024 * 1024
/** A worker that waits this long for work is let go, with the memory it holds. */
const idleMilliseconds = 20_000

function startWorker({ heapMegabytes }: ReadLimits): Worker {
  const worker = startThread(new URL('./worker.ts', import.meta.url), {
    ahead: ['pdfjs-dist/legacy/build/pdf.mjs', 'pdfjs-dist/legacy/build/pdf.worker.mjs'],
    resourceLimits: { maxOldGenerationSizeMb: heapMegabytes },
    stderr: true,
    stdout: true,
  })
  worker.on('error', () => undefined)
  worker.once('exit', () => forget(worker))
  worker.unref()
  return worker
}

const idle = new Map<Worker, NodeJS.Timeout>()
const waiting: (() => void)[] = []
let busy = 0

/** Reads a PDF's pages in a worker thread, two files at once. A worker that takes too long, takes too much or breaks is ended; the file is told of. */
export async function readPdf(path: string, limits: ReadLimits = usual): Promise<ReadResult> {
  if (busy >= atOnce) await new Promise<void>((resolve) => waiting.push(resolve))
  else busy += 1
  try {
    return await readWith(limits === usual ? takeWorker() : startWorker(limits), path, limits)
  } finally {
    const next = waiting.shift()
    if (next) next()
    else busy -= 1
  }
}

function takeWorker(): Worker {
  const [worker] = idle.keys()
  if (!worker) return startWorker(usual)
  forget(worker)
  return worker
}

/** Starts a worker ahead of its work: loading the reader takes longer than reading most sheets. */
export function prepareReader(): void {
  if (idle.size + busy < atOnce) rest(startWorker(usual))
}

function forget(worker: Worker): void {
  clearTimeout(idle.get(worker))
  idle.delete(worker)
}

function rest(worker: Worker): void {
  const timer = setTimeout(() => void worker.terminate(), idleMilliseconds)
  idle.set(worker, timer.unref())
}

function readWith(worker: Worker, path: string, limits: ReadLimits): Promise<ReadResult> {
  return new Promise((resolve) => {
    const before = process.memoryUsage.rss()
    const answered = (result: ReadResult) => end(result, true)
    const end = (result: ReadResult, isHealthy = false) => {
      clearTimeout(timer)
      clearInterval(watch)
      worker.off('message', answered).off('error', broken).off('exit', ended)
      if (limits === usual && isHealthy) rest(worker)
      else void worker.terminate()
      resolve(result)
    }
    const tooMuch = (detail: string) => end({ problem: 'too-large', detail })
    const broken = (error: Error & { code?: string }) =>
      error.code === 'ERR_WORKER_OUT_OF_MEMORY'
        ? tooMuch('more memory to read than allowed')
        : end({ problem: 'damaged', detail: error.message })
    const ended = (code: number) => end({ problem: 'damaged', detail: `the reader ended with ${code}` })
    const timer = setTimeout(() => tooMuch(`more than ${limits.milliseconds / 1000} s to read`), limits.milliseconds)
    const watch = setInterval(() => {
      if (process.memoryUsage.rss() - before > limits.growthMegabytes * megabyte) tooMuch('more memory to read than allowed')
    }, 50)
    worker.once('message', answered).once('error', broken).once('exit', ended)
    worker.postMessage(path)
  })
}
