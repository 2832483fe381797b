import { createHash } from 'node:crypto'
import { mkdir, rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { createCanvas } from '@napi-rs/canvas'
import type { SheetKind } from '../../../shared/domain/sheet.ts'
import { printPdf } from '../../documents/print-pdf.ts'
import { readPages } from '../../features/sheets/page-reader.ts'
import { demoMixes, supersededRevision } from './mixes.ts'
import { demoProducts, scannedProduct } from './products.ts'
import { dataSheet, safetySheet } from './sheet-looks.ts'
import { type LocatedFact, dataFacts, safetyFacts } from './sheet-facts.ts'

/** One PDF of the demo with its pages as the reader reads them and what it states. Kept beside the PDFs, so that the first start need not read them. */
export interface DemoSheet {
  file: string
  kind: SheetKind
  title: string
  maker: string
  dated: string
  /** Name of the product (safety) or mix (data) that it speaks of. */
  of: string
  sha256: string
  bytes: number
  pages: { width: number; height: number; rotation: number; text: string; words: [string, number, number, number, number][] }[]
  facts: LocatedFact[]
  /** An older revision, not in force. */
  superseded: boolean
}

export const demoFolder = join(import.meta.dirname, '../../../fixtures/demo-sheets')
const fileName = (name: string, kind: SheetKind, suffix = '') => `${name.toLowerCase().replace(/[^a-z0-9]+/g, '-')}-${kind}${suffix}.pdf`

type Drawing = Omit<DemoSheet, 'sha256' | 'bytes' | 'pages' | 'facts'> & {
  bytes: Uint8Array<ArrayBuffer>
  facts: (pages: DemoSheet['pages']) => LocatedFact[]
}

async function drawings(): Promise<Drawing[]> {
  const wordsOf = (pages: DemoSheet['pages']) => pages.map(({ words }) => words)
  const older = demoMixes
    .filter(({ name }) => name === supersededRevision.mix)
    .map((mix) => ({
      ...mix,
      dated: supersededRevision.dated,
      table: mix.table && {
        ...mix.table,
        rows: mix.table.rows.map((row) => (row.property === 'recoatWindow' ? { ...row, cells: supersededRevision.windows } : row)),
      },
    }))
  const data = async (mix: (typeof demoMixes)[number], superseded: boolean): Promise<Drawing> => ({
    file: fileName(mix.name, 'data', superseded ? `-${mix.dated.slice(0, 4)}` : ''),
    kind: 'data',
    title: `${mix.name}, data sheet`,
    maker: mix.maker,
    dated: mix.dated,
    of: mix.name,
    superseded,
    bytes: await printPdf(dataSheet(mix)),
    facts: (pages) => dataFacts(mix, wordsOf(pages)),
  })
  const all: Drawing[] = []
  for (const mix of older) all.push(await data(mix as (typeof demoMixes)[number], true))
  for (const mix of demoMixes) all.push(await data(mix, false))
  for (const product of demoProducts) {
    const scanned = product.name === scannedProduct
    all.push({
      file: fileName(product.name, 'safety'),
      kind: 'safety',
      title: `${product.name}, safety sheet`,
      maker: product.maker,
      dated: product.dated,
      of: product.name,
      superseded: false,
      bytes: scanned ? await scan(product.name) : await printPdf(safetySheet(product)),
      facts: (pages) => (scanned ? [] : safetyFacts(product, wordsOf(pages))),
    })
  }
  return all
}

/** A sheet as a scanner gives it: a grey picture of a page, with no text to read. */
async function scan(name: string): Promise<Uint8Array<ArrayBuffer>> {
  const canvas = createCanvas(850, 1100)
  const context = canvas.getContext('2d')
  context.fillStyle = '#e9e7e1'
  context.fillRect(0, 0, 850, 1100)
  context.rotate(0.008)
  context.fillStyle = '#3b3b3b'
  context.font = 'bold 34px sans-serif'
  context.fillText('Safety data sheet', 90, 130)
  context.font = '22px sans-serif'
  const lines = [
    name,
    '',
    '1. Identification',
    'Supplier: Corbel Minerals, Quarry Lane, Withy Hollow',
    'Emergency telephone: 1-800-555-0162',
    '',
    '2. Hazard identification',
    'Not classified as hazardous.',
    '',
    '7. Handling and storage',
    'Avoid raising dust. Keep bags dry.',
    '',
    '16. Other information',
    'October 2, 2023',
  ]
  lines.forEach((line, index) => context.fillText(line, 90, 190 + index * 40))
  const image = `data:image/jpeg;base64,${canvas.toBuffer('image/jpeg', 70).toString('base64')}`
  const created = new Date('2023-10-02T09:00:00Z')
  return printPdf({
    pageSize: 'LETTER',
    pageMargins: 0,
    info: { creationDate: created, modDate: created },
    content: [{ image, width: 612 }],
  })
}

/** Draws every sheet of the demo anew and writes what was read off it beside it. */
export async function drawSheets(): Promise<DemoSheet[]> {
  await rm(demoFolder, { recursive: true, force: true })
  await mkdir(demoFolder, { recursive: true })
  const sheets: DemoSheet[] = []
  for (const { bytes, facts, ...sheet } of await drawings()) {
    await writeFile(join(demoFolder, sheet.file), bytes)
    const sha256 = createHash('sha256').update(bytes).digest('hex')
    const read = await readPages(new Uint8Array(bytes))
    if (!('pages' in read)) throw new Error(`${sheet.file}: ${read.detail}`)
    sheets.push({ ...sheet, sha256, bytes: bytes.length, pages: read.pages, facts: facts(read.pages) })
  }
  await writeFile(join(demoFolder, 'sheets.json'), `${JSON.stringify(sheets)}\n`)
  return sheets
}

if (process.argv[1] === import.meta.filename) {
  const sheets = await drawSheets()
  process.stdout.write(`${sheets.length} sheets drawn, ${sheets.reduce((sum, { facts }) => sum + facts.length, 0)} values found on them\n`)
}
