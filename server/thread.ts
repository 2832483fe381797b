import { Worker, type WorkerOptions } from 'node:worker_threads'

interface ThreadOptions extends Omit<WorkerOptions, 'eval'> {
  /** Large packages of plain JavaScript to load before the loader of TypeScript, which would parse them all again (pdf.js: 0.9 s in place of 3). */
  ahead?: readonly string[]
}

/**
 * Starts a TypeScript module in a thread of its own. Node 20 does not hand the loader of TypeScript on to threads,
 * so the thread registers it first, wherever the parent runs from.
 */
export function startThread(module: URL, { ahead = [], ...options }: ThreadOptions = {}): Worker {
  const loader = import.meta.resolve('tsx/esm/api')
  const packages = ahead.map((name) => `import(${JSON.stringify(import.meta.resolve(name))})`).join()
  const begin = `Promise.all([${packages}]).then(() => import(${JSON.stringify(loader)})).then(({ register }) => { register(); return import(${JSON.stringify(module.href)}) })`
  return new Worker(begin, { ...options, eval: true, execArgv: [] })
}
