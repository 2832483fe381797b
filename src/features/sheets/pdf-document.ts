import { GlobalWorkerOptions, type PDFDocumentProxy, getDocument } from 'pdfjs-dist'
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

/** Opens the PDF of a revision; its parts are fetched in ranges as pages ask for them. Nothing in it is run. */
export function usePdf(revisionId: string): { pdf: PDFDocumentProxy | undefined; error: unknown } {
  const [state, setState] = useState<{ revisionId: string; pdf?: PDFDocumentProxy; error?: unknown }>({ revisionId })
  useEffect(() => {
    const task = getDocument({
      url: fileAddress(revisionId), isEvalSupported: false, enableXfa: false, disableAutoFetch: true, useWorkerFetch: false, verbosity: 0,
      BinaryDataFactory: OwnFiles, cMapUrl: 'own/', standardFontDataUrl: 'own/', wasmUrl: 'own/', cMapPacked: true,
    })
    let gone = false
    task.promise.then(
      (pdf) => !gone && setState({ revisionId, pdf }),
      (error: unknown) => !gone && setState({ revisionId, error }),
    )
    return () => {
      gone = true
      void task.destroy()
    }
  }, [revisionId])
  return state.revisionId === revisionId ? { pdf: state.pdf, error: state.error } : { pdf: undefined, error: undefined }
}
