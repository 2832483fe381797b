import { GlobalWorkerOptions, type PDFDocumentLoadingTask, type PDFDocumentProxy, PDFWorker, getDocument } from 'pdfjs-dist'
import workerUrl from 'pdfjs-dist/build/pdf.worker.min.mjs?url'
import { useEffect, useState } from 'react'
import { fileAddress } from './queries.ts'

GlobalWorkerOptions.workerSrc = workerUrl

/** Hands pdf.js the files it may need beside the PDF, from this build and from nowhere else. */
class OwnFiles {
  async fetch({ filename }: { filename: string }): Promise<Uint8Array> {
    const { ownFiles } = await import('./pdf-own-files.ts')
    const url = ownFiles[filename]
    if (!url) throw new Error(`${filename} is not part of this build`)
    const response = await fetch(url)
    if (!response.ok) throw new Error(`${filename}: ${response.status}`)
    return new Uint8Array(await response.arrayBuffer())
  }
}

/** One for all documents: starting it costs more than opening most sheets. */
let worker: PDFWorker | undefined

/** Kept open, so that going from value to value of a few sheets does not fetch them again; oldest first. */
const open = new Map<string, PDFDocumentLoadingTask>()
const mostOpen = 4

function openPdf(revisionId: string): PDFDocumentLoadingTask {
  const before = open.get(revisionId)
  open.delete(revisionId)
  worker ??= new PDFWorker()
  const task =
    before ??
    getDocument({
      url: fileAddress(revisionId),
      worker,
      isEvalSupported: false,
      enableXfa: false,
      disableAutoFetch: true,
      useWorkerFetch: false,
      verbosity: 0,
      BinaryDataFactory: OwnFiles,
      cMapUrl: 'own/',
      standardFontDataUrl: 'own/',
      wasmUrl: 'own/',
      cMapPacked: true,
    })
  open.set(revisionId, task)
  const [oldest] = open
  if (open.size > mostOpen && oldest) forget(oldest[0])
  return task
}

function forget(revisionId: string): void {
  void open.get(revisionId)?.destroy()
  open.delete(revisionId)
}

/** Opens the PDF of a revision; its parts are fetched in ranges as pages ask for them. Nothing in it is run. */
export function usePdf(revisionId: string): { pdf: PDFDocumentProxy | undefined; error: unknown } {
  const [state, setState] = useState<{ revisionId: string; pdf?: PDFDocumentProxy; error?: unknown }>({ revisionId })
  useEffect(() => {
    let gone = false
    openPdf(revisionId).promise.then(
      (pdf) => !gone && setState({ revisionId, pdf }),
      (error: unknown) => {
        forget(revisionId)
        if (!gone) setState({ revisionId, error })
      },
    )
    return () => {
      gone = true
    }
  }, [revisionId])
  return state.revisionId === revisionId ? { pdf: state.pdf, error: state.error } : { pdf: undefined, error: undefined }
}
