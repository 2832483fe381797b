import { createRequire } from 'node:module'
import { dirname } from 'node:path'
import { OPS, type PDFDocumentProxy, type PDFPageProxy, getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import type { PlacedText } from '../../db/schema/sheets.ts'
import { type GlyphRunFont, placeWords } from './place-words.ts'

/** A page as it is shown (its rotation applied): size in points, its text line by line, its words with their places. */
export interface ReadPage {
  width: number
  height: number
  rotation: number
  text: string
  words: PlacedText[]
}
export type ReadProblem = 'encrypted' | 'damaged' | 'too-large'
/** What came of reading a PDF: its pages, or why there are none. */
export type ReadResult = { pages: ReadPage[] } | { problem: ReadProblem; detail: string }

type PDFOperatorList = Awaited<ReturnType<PDFPageProxy['getOperatorList']>>

const pageLimit = 1000
const root = dirname(createRequire(import.meta.url).resolve('pdfjs-dist/package.json'))

/** Reads pages and words of a PDF. Nothing in the file is run; pictures are not decoded. */
export async function readPages(bytes: Uint8Array<ArrayBuffer>): Promise<ReadResult> {
  const task = getDocument({
    data: bytes,
    verbosity: 0,
    isEvalSupported: false,
    enableXfa: false,
    maxImageSize: 1,
    disableFontFace: true,
    useSystemFonts: false,
    standardFontDataUrl: `${root}/standard_fonts/`,
    cMapUrl: `${root}/cmaps/`,
    cMapPacked: true,
    wasmUrl: `${root}/wasm/`,
  })
  try {
    const document = await task.promise
    if (document.numPages > pageLimit) return { problem: 'too-large', detail: `${document.numPages} pages` }
    const pages: ReadPage[] = []
    for (let number = 1; number <= document.numPages; number++) pages.push(await readPage(document, number))
    return pages.length > 0 ? { pages } : { problem: 'damaged', detail: 'no pages' }
  } catch (error) {
    const { name, message } = error instanceof Error ? error : { name: '', message: String(error) }
    return { problem: name === 'PasswordException' ? 'encrypted' : 'damaged', detail: `${name}: ${message}` }
  } finally {
    await task.destroy()
  }
}

async function readPage(document: PDFDocumentProxy, number: number): Promise<ReadPage> {
  const page = await document.getPage(number)
  const viewport = page.getViewport({ scale: 1 })
  const operators = await page.getOperatorList({ annotationMode: 0 })
  const fonts = await fontsOf(page, operators)
  const lines = placeWords({ operators, fontOf: (name) => fonts.get(name), toShown: viewport.transform, size: viewport })
  page.cleanup()
  return {
    width: round(viewport.width),
    height: round(viewport.height),
    rotation: viewport.rotation,
    text: lines.map((line) => line.map(([text]) => text).join(' ')).join('\n'),
    words: lines.flat(),
  }
}

const round = (points: number) => Math.round(points * 100) / 100

/** Metrics of a page's fonts by the name that its operators use. They arrive by themselves, some after the operators. */
async function fontsOf(page: PDFPageProxy, { fnArray, argsArray }: PDFOperatorList): Promise<Map<string, GlyphRunFont>> {
  const used = fnArray.flatMap((operator, index) => (operator === OPS.setFont ? [(argsArray[index] as [string])[0]] : []))
  const arrived = [...new Set(used)].map(
    (name) =>
      new Promise<[string, GlyphRunFont]>((resolve) => void page.commonObjs.get(name, (font: GlyphRunFont) => resolve([name, font]))),
  )
  return new Map(await Promise.all(arrived))
}
