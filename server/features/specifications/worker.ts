import { parentPort } from 'node:worker_threads'
import type { SpecDocument } from '../../../shared/domain/specification/document.ts'
import { toDocx } from './docx.ts'
import { toPdf } from './pdf.ts'

export interface Task {
  kind: 'docx' | 'pdf'
  document: SpecDocument
}
/** The bytes, or the words of what went wrong. */
export type Made = { bytes: Uint8Array } | { problem: string }

const make = ({ kind, document }: Task): Promise<Uint8Array> => (kind === 'docx' ? toDocx(document) : toPdf(document))

// One file at a time: a document goes in, its bytes come out.
parentPort?.on('message', (task: Task) => {
  make(task).then(
    (bytes) => parentPort?.postMessage({ bytes } satisfies Made),
    (error: unknown) =>
      parentPort?.postMessage({ problem: error instanceof Error ? (error.stack ?? error.message) : String(error) } satisfies Made),
  )
})
