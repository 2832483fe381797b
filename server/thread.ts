import { Worker, type WorkerOptions } from 'node:worker_threads'

/**
 * Starts a TypeScript module in a thread of its own. Node 20 does not hand the loader of TypeScript on to threads,
 * so the thread registers it first, wherever the parent runs from.
 */
export function startThread(module: URL, options: Omit<WorkerOptions, 'eval'> = {}): Worker {
  const loader = import.meta.resolve('tsx/esm/api')
  const begin = `import(${JSON.stringify(loader)}).then(({ register }) => { register(); return import(${JSON.stringify(module.href)}) })`
  return new Worker(begin, { ...options, eval: true, execArgv: [] })
}
