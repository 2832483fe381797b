import { Worker, type WorkerOptions } from 'node:worker_threads'

interface ThreadOptions extends Omit<WorkerOptions, 'eval' | 'argv'> {
  /** Large packages of plain JavaScript to load before the loader of TypeScript, which would parse them all again (pdf.js: 0.9 s in place of 3). */
  ahead?: readonly string[]
}

/**
 * Starts a TypeScript module in a thread of its own. Node 20 does not hand the loader of TypeScript on to threads,
 * so the thread registers it first (thread-start.mjs), wherever the parent runs from.
 */
export function startThread(module: URL, { ahead = [], ...options }: ThreadOptions = {}): Worker {
  return new Worker(new URL('./thread-start.mjs', import.meta.url), { ...options, argv: [module.href, ...ahead], execArgv: [] })
}
