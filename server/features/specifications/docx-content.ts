import {
  BorderStyle,
  HeadingLevel,
  type IRunOptions,
  ImageRun,
  Paragraph,
  Table,
  TableCell,
  TableLayoutType,
  TableRow,
  TextRun,
  WidthType,
} from 'docx'
import { type Run, type SpecDocument, frontTitles, tagText } from '../../../shared/domain/specification/document.ts'
import { numberedArticles, numberedItems } from '../../../shared/domain/specification/numbering.ts'
import { frontList, partList, pencil } from './docx-styles.ts'
import type { paintSection } from './section-drawing.ts'
import { type Register, registersOf } from '../../../shared/domain/specification/registers.ts'

/** Width of the text on Letter paper with margins of an inch, in twentieths of a point. */
const pageWidth = 9360
type Block = Paragraph | Table

/** Words with a look. */
export const runOf = (options: IRunOptions) => new TextRun(options)

function inline(runs: readonly Run[]): TextRun[] {
  return runs.flatMap((run) => {
    const italics = run.kind === 'figure' && run.known === 'not-stated'
    const words = run.text.split('\n').map((text, index) => runOf({ text, italics, ...(index > 0 ? { break: 1 } : {}) }))
    const tag = tagText(run)
    return tag ? [...words, new TextRun({ text: tag, size: 15, color: pencil })] : words
  })
}

export const headingOne = (text: string) => new Paragraph({ text, heading: HeadingLevel.HEADING_1 })
const headingTwo = (text: string) => new Paragraph({ text, heading: HeadingLevel.HEADING_2 })

/** Parts, articles and paragraphs on the levels of one real list; the heading styles carry its first two. */
export function partBlocks({ parts }: SpecDocument): Block[] {
  return parts.flatMap((part) => [
    new Paragraph({ text: part.title.toUpperCase(), heading: HeadingLevel.HEADING_1, numbering: { reference: partList, level: 0 } }),
    ...(part.articles.length === 0 ? [new Paragraph({ text: 'Not used' })] : []),
    ...numberedArticles(part).flatMap((article) => [
      new Paragraph({ text: article.title.toUpperCase(), heading: HeadingLevel.HEADING_2, numbering: { reference: partList, level: 1 } }),
      ...article.items.map(
        ({ level, runs }) => new Paragraph({ children: inline(runs), numbering: { reference: partList, level: level + 2 } }),
      ),
    ]),
  ])
}

export function frontBlocks({ front }: SpecDocument): Block[] {
  const kinds = Object.keys(frontTitles) as (keyof typeof frontTitles)[]
  return [
    headingOne('READ FIRST'),
    ...kinds.flatMap((kind, instance) => [
      headingTwo(frontTitles[kind]),
      ...(front[kind].length === 0 ? [new Paragraph({ text: 'None.' })] : []),
      ...numberedItems(front[kind]).map(
        ({ level, runs }) => new Paragraph({ children: inline(runs), numbering: { reference: frontList, level, instance } }),
      ),
    ]),
  ]
}

const none = { style: BorderStyle.NONE, size: 0, color: 'auto' }
const hair = { style: BorderStyle.SINGLE, size: 4, color: 'C9C7C0' }

interface Grid {
  columns: readonly { label: string; width: number }[]
  rows: readonly (readonly TextRun[])[][]
  head?: boolean
}

/** A table whose head repeats on every page and whose rows are not broken over two. */
export function grid({ columns, rows, head = true }: Grid): Table {
  const total = columns.reduce((sum, { width }) => sum + width, 0)
  const widths = columns.map(({ width }) => Math.round((pageWidth * width) / total))
  const cell = (children: readonly TextRun[], index: number) =>
    new TableCell({
      width: { size: widths[index] ?? 0, type: WidthType.DXA },
      margins: { top: 40, bottom: 40, left: 60, right: 60 },
      children: [new Paragraph({ style: 'TableText', children })],
    })
  return new Table({
    width: { size: pageWidth, type: WidthType.DXA },
    columnWidths: widths,
    layout: TableLayoutType.FIXED,
    borders: { top: hair, bottom: hair, left: none, right: none, insideHorizontal: hair, insideVertical: none },
    rows: [
      ...(head
        ? [
            new TableRow({
              tableHeader: true,
              cantSplit: true,
              children: columns.map(({ label }, index) => cell([runOf({ text: label, bold: true })], index)),
            }),
          ]
        : []),
      ...rows.map((row) => new TableRow({ cantSplit: true, children: row.map(cell) })),
    ],
  })
}

const note = (text: string) => (text ? [new Paragraph({ text, style: 'TableNote' })] : [])

export function scheduleBlocks({ schedules }: SpecDocument): Block[] {
  return schedules.flatMap(({ title, columns, rows, note: words }) => [
    headingTwo(title),
    grid({ columns, rows: rows.map((row) => row.map(inline)) }),
    ...note(words),
  ])
}

export function registerBlocks(document: SpecDocument): Block[] {
  return registersOf(document).flatMap(({ title, columns, rows }: Register) => [
    headingTwo(title),
    grid({ columns, rows: rows.map((row) => row.map((text) => [new TextRun({ text })])) }),
  ])
}

/** The section drawing, as lines and as a picture for word processors that draw no SVG, with its words for those who do not see it. */
export function drawingBlocks({ svg, png, width, height, alternative }: Awaited<ReturnType<typeof paintSection>>): Block[] {
  const wide = 600
  const image = new ImageRun({
    type: 'svg',
    data: Buffer.from(svg),
    fallback: { type: 'png', data: png },
    transformation: { width: wide, height: Math.round((height * wide) / width) },
    altText: { id: '1', name: 'Section through the floor', title: 'Section through the floor', description: alternative },
  })
  return [headingTwo('Section through the floor'), new Paragraph({ children: [image] }), ...note(alternative)]
}
