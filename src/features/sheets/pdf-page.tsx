import { type PDFDocumentProxy, type PDFPageProxy, TextLayer } from 'pdfjs-dist'
import { type CSSProperties, type ReactNode, useEffect, useRef, useState } from 'react'
import './page-text.css'

/** Browsers give up on larger canvases; beyond it the page is drawn coarser and stretched. */
const mostPixels = 16_777_216

interface PdfPageProps {
  pdf: PDFDocumentProxy
  page: number
  /** Width to fit at zoom 1, in CSS pixels. */
  fitWidth: number
  zoom: number
  /** What lies over the page: boxes; `scale` is CSS pixels a point. */
  children: (scale: number) => ReactNode
}

/** A page of a PDF as picture, with its text over it to be selected. */
export function PdfPage({ pdf, page: number, fitWidth, zoom, children }: PdfPageProps) {
  const { page, error } = usePage(pdf, number)
  const size = page?.getViewport({ scale: 1 })
  const scale = size ? (fitWidth / size.width) * zoom : 1
  if (error) return <p className="p-4 text-stop">This page cannot be shown. The file can still be downloaded.</p>
  if (!page || !size)
    return (
      <p role="status" className="min-h-[70vh] p-4 text-pencil">
        Loading the page …
      </p>
    )
  const width = size.width * scale
  const height = size.height * scale
  const style = { width, height, '--total-scale-factor': scale, '--scale-round-x': '1px', '--scale-round-y': '1px' } as CSSProperties
  return (
    <div className="relative mx-auto border border-rule bg-white" style={style}>
      <Picture page={page} scale={scale} />
      <Text page={page} scale={scale} />
      {children(scale)}
    </div>
  )
}

function usePage(pdf: PDFDocumentProxy, number: number): { page: PDFPageProxy | undefined; error: unknown } {
  const [state, setState] = useState<{ page?: PDFPageProxy; error?: unknown }>({})
  useEffect(() => {
    let gone = false
    pdf.getPage(number).then(
      (page) => !gone && setState({ page }),
      (error: unknown) => !gone && setState({ error }),
    )
    return () => {
      gone = true
    }
  }, [pdf, number])
  return { page: state.page, error: state.error }
}

function Picture({ page, scale }: { page: PDFPageProxy; scale: number }) {
  const canvas = useRef<HTMLCanvasElement>(null)
  useEffect(() => {
    const element = canvas.current
    if (!element) return
    const plain = page.getViewport({ scale })
    const density = Math.min(window.devicePixelRatio || 1, Math.sqrt(mostPixels / (plain.width * plain.height)))
    const viewport = page.getViewport({ scale: scale * density })
    // Drawn aside first: the picture before stays until the new one is whole.
    const aside = document.createElement('canvas')
    aside.width = Math.floor(viewport.width)
    aside.height = Math.floor(viewport.height)
    const task = page.render({ canvas: aside, viewport })
    task.promise.then(
      () => {
        element.width = aside.width
        element.height = aside.height
        element.getContext('2d')?.drawImage(aside, 0, 0)
        element.dataset['drawn'] = String(page.pageNumber)
      },
      () => undefined, // cancelled by the next one
    )
    return () => task.cancel()
  }, [page, scale])
  return <canvas ref={canvas} className="absolute inset-0 h-full w-full" aria-hidden="true" />
}

function Text({ page, scale }: { page: PDFPageProxy; scale: number }) {
  const layer = useRef<HTMLDivElement>(null)
  useEffect(() => {
    const container = layer.current
    if (!container) return
    const text = new TextLayer({ textContentSource: page.streamTextContent(), container, viewport: page.getViewport({ scale }) })
    text.render().catch(() => undefined) // cancelled by the next one
    return () => {
      text.cancel()
      container.replaceChildren()
    }
  }, [page, scale])
  return <div ref={layer} className="page-text" />
}
