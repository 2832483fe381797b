import { type Content, fontName, printPdf } from '../../documents/print-pdf.ts'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'
import { type SpecDocument, issueWords } from '../../../shared/domain/specification/document.ts'
import { contentOf, strong } from './pdf-content.ts'
import { titleRows } from '../../../shared/domain/specification/title-block.ts'

const ink = '#1d2226'
const pencil = '#55606a'
const [inch, side] = [72, 72]

const hairlines = {
  hLineWidth: () => 0.4,
  vLineWidth: () => 0,
  hLineColor: () => '#c9c7c0',
  paddingLeft: () => 3,
  paddingRight: () => 3,
  paddingTop: () => 2.5,
  paddingBottom: () => 2.5,
}
/** Its first row is the title, its second the head. */
const schedule = {
  ...hairlines,
  hLineWidth: (row: number) => (row === 0 ? 0 : row <= 2 ? 0.8 : 0.4),
  hLineColor: (row: number) => (row <= 2 ? ink : '#c9c7c0'),
}
const layouts: Record<string, unknown> = { hairlines, schedule }

/** Tables name their lines by a word; pdfmake takes the functions themselves. */
function withLayouts(content: Content): Content {
  if (Array.isArray(content)) return content.map(withLayouts)
  if (typeof content === 'object' && typeof content['layout'] === 'string') return { ...content, layout: layouts[content['layout']] }
  return content
}

function titleBlock({ header }: SpecDocument): Content[] {
  const rows = titleRows(header)
  return [
    { text: `SECTION ${header.sectionNumber}`, fontSize: 12, alignment: 'center' },
    strong({ text: header.sectionTitle.toUpperCase(), fontSize: 16, alignment: 'center', margin: [0, 2, 0, 12] }),
    { table: { widths: [70, '*'], body: rows.map(([label, value]) => [{ text: label, color: pencil }, value]) }, layout: 'hairlines' },
  ]
}

/** Words at the head of every page; a document that is not issued says so on each. */
function pageHead({ header }: SpecDocument): Content {
  return {
    columns: [
      { width: '*', text: header.project },
      { width: 'auto', text: issueWords(header), bold: !header.issue, alignment: 'right' },
    ],
    fontSize: 8.5,
    color: pencil,
    margin: [side, 36, side, 0],
  }
}

const pageFoot = ({ header }: SpecDocument, page: number, pages: number): Content => ({
  columns: [
    { width: '*', text: `${header.sectionNumber} ${header.sectionTitle}, ${writtenDate(header.date)}` },
    { width: 'auto', text: `Page ${page} of ${pages}`, alignment: 'right' },
  ],
  fontSize: 8.5,
  color: pencil,
  margin: [side, 20, side, 0],
})

/** The document as PDF. The same tree gives the same bytes: the only date is the document's own. */
export async function toPdf(document: SpecDocument): Promise<Uint8Array> {
  const { header } = document
  const title = `${header.sectionNumber} ${header.sectionTitle}, ${header.project}`
  return printPdf({
    content: [...titleBlock(document), ...contentOf(document)].map(withLayouts),
    header: () => pageHead(document),
    footer: (page: number, pages: number) => pageFoot(document, page, pages),
    pageSize: 'LETTER',
    pageMargins: [side, inch * 0.9, side, inch * 0.85],
    defaultStyle: { font: fontName, fontSize: 10, lineHeight: 1.12, color: ink },
    styles: { part: { fontSize: 12, bold: true, margin: [0, 18, 0, 2] }, article: { fontSize: 10.5, bold: true, margin: [0, 11, 0, 1] } },
    info: {
      title,
      author: header.firm.name,
      subject: header.site,
      creator: 'Wearcourse',
      producer: 'Wearcourse',
      creationDate: new Date(`${header.date}T00:00:00Z`),
    },
    version: '1.7',
    language: 'en-US',
    displayTitle: true,
  })
}
