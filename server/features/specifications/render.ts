import type { Worker } from 'node:worker_threads'
import type { SpecDocument } from '../../../shared/domain/specification/document.ts'
import { startThread } from '../../thread.ts'
import type { Made, Task } from './worker.ts'

const mostMilliseconds = 60_000
/** A thread that waits this long for work is let go, with the memory it holds. */
const idleMilliseconds = 60_000

let thread: Worker | undefined
let letGo: NodeJS.Timeout | undefined
/** Ends when the file before is made: one thread makes one file after the other. */
let before: Promise<unknown> = Promise.resolve()

/** Starts the thread ahead of its work: loading what makes the files takes longer than making most of them. */
export function prepareRender(): Worker {
  clearTimeout(letGo)
  letGo = setTimeout(end, idleMilliseconds).unref()
  if (thread) return thread
  const started = startThread(new URL('./worker.ts', import.meta.url), { ahead: ['docx', 'pdfmake'] })
  started.on('error', () => undefined)
  started.once('exit', () => {
    if (thread === started) thread = undefined
  })
  started.unref()
  thread = started
  return started
}

function end(): void {
  void thread?.terminate()
  thread = undefined
}

function make(task: Task): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const worker = prepareRender()
    clearTimeout(letGo)
    worker.ref()
    const settle = (done: () => void) => {
      clearTimeout(timer)
      worker.off('message', answered).off('error', broken).off('exit', ended)
      worker.unref()
      letGo = setTimeout(end, idleMilliseconds).unref()
      done()
    }
    const answered = (made: Made) => settle(() => ('bytes' in made ? resolve(Buffer.from(made.bytes)) : reject(new Error(made.problem))))
    const broken = (error: Error) => settle(() => reject(error))
    const ended = (code: number) => settle(() => reject(new Error(`the thread that makes files ended with ${code}`)))
    const timer = setTimeout(() => {
      settle(() => reject(new Error(`a ${task.kind} took more than ${mostMilliseconds / 1000} s`)))
      end()
    }, mostMilliseconds)
    worker.once('message', answered).once('error', broken).once('exit', ended)
    worker.postMessage(task)
  })
}

function inTurn(task: Task): Promise<Buffer> {
  const made = before.then(() => make(task))
  before = made.catch(() => undefined)
  return made
}

/** The two files of a document, made in a thread of their own so that nothing else waits for them. */
export const render = {
  docx: (document: SpecDocument): Promise<Buffer> => inTurn({ kind: 'docx', document }),
  pdf: (document: SpecDocument): Promise<Buffer> => inTurn({ kind: 'pdf', document }),
}
