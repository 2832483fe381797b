import { AlignmentType, Document, Footer, Header, Packer, PageNumber, Paragraph, Tab, TabStopType, TextRun } from 'docx'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'
import { type SpecDocument, issueWords } from '../../../shared/domain/specification/document.ts'
import { drawingBlocks, frontBlocks, grid, headingOne, partBlocks, registerBlocks, runOf, scheduleBlocks } from './docx-content.ts'
import { numbering, pencil, styles } from './docx-styles.ts'
import { withoutZipDates } from './same-bytes.ts'
import { paintSection } from './section-drawing.ts'
import { titleRows } from '../../../shared/domain/specification/title-block.ts'

const textEdge = 9360

function pageEdges({ header }: SpecDocument) {
  const edge = (children: (TextRun | string)[]) =>
    new Paragraph({
      style: 'PageEdge',
      tabStops: [{ type: TabStopType.RIGHT, position: textEdge }],
      children: children.map((one) => (typeof one === 'string' ? new TextRun(one) : one)),
    })
  return {
    headers: {
      default: new Header({
        children: [edge([header.project, runOf({ children: [new Tab(), issueWords(header)], bold: !header.issue })])],
      }),
    },
    footers: {
      default: new Footer({
        children: [
          edge([
            `${header.sectionNumber} ${header.sectionTitle}, ${writtenDate(header.date)}`,
            new TextRun({ children: [new Tab(), 'Page ', PageNumber.CURRENT, ' of ', PageNumber.TOTAL_PAGES] }),
          ]),
        ],
      }),
    },
  }
}

function titleBlocks({ header }: SpecDocument) {
  const rows = titleRows(header).map(([label, value]) => [[new TextRun({ text: label, color: pencil })], [new TextRun(value)]])
  return [
    new Paragraph({ text: `SECTION ${header.sectionNumber}`, alignment: AlignmentType.CENTER }),
    new Paragraph({ text: header.sectionTitle.toUpperCase(), style: 'Title' }),
    grid({
      columns: [
        { label: '', width: 15 },
        { label: '', width: 85 },
      ],
      rows,
      head: false,
    }),
  ]
}

async function bodyOf(document: SpecDocument) {
  const drawing = document.section.layers.length > 0 ? drawingBlocks(await paintSection(document)) : []
  return [
    ...titleBlocks(document),
    ...frontBlocks(document),
    ...partBlocks(document),
    headingOne('SCHEDULES'),
    ...drawing,
    ...scheduleBlocks(document),
    ...registerBlocks(document),
    new Paragraph({ spacing: { before: 240 }, children: [runOf({ text: document.closing.join(' '), bold: true })] }),
    new Paragraph({ spacing: { before: 240 }, alignment: AlignmentType.CENTER, text: `END OF SECTION ${document.header.sectionNumber}` }),
  ]
}

const escaped = (text: string) => text.replace(/[<>&"']/g, (sign) => `&#${sign.charCodeAt(0)};`)

/** Where the font is not installed, a word processor takes the nearest upright sans by this description (PANOSE as the font's own OS/2 table has it). */
const fontTable = {
  path: 'word/fontTable.xml',
  data: '<?xml version="1.0" encoding="UTF-8" standalone="yes"?><w:fonts xmlns:w="http://schemas.openxmlformats.org/wordprocessingml/2006/main"><w:font w:name="Source Sans 3"><w:altName w:val="Source Sans Pro"/><w:panose1 w:val="020B0303030403020204"/><w:charset w:val="00"/><w:family w:val="swiss"/><w:pitch w:val="variable"/></w:font></w:fonts>',
}

/** Title and dates of the file (ECMA-376 part 2, core properties): the document's own date, not the clock's. */
function coreProperties({ header }: SpecDocument, title: string): string {
  const at = `${header.date}T00:00:00Z`
  const names =
    'xmlns:cp="http://schemas.openxmlformats.org/package/2006/metadata/core-properties" xmlns:dc="http://purl.org/dc/elements/1.1/" xmlns:dcterms="http://purl.org/dc/terms/" xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance"'
  const date = (name: string) => `<dcterms:${name} xsi:type="dcterms:W3CDTF">${at}</dcterms:${name}>`
  return `<?xml version="1.0" encoding="UTF-8"?><cp:coreProperties ${names}><dc:title>${escaped(title)}</dc:title><dc:creator>${escaped(header.firm.name)}</dc:creator><dc:language>en-US</dc:language>${date('created')}${date('modified')}</cp:coreProperties>`
}

/** The document for word processors: real styles, one real multilevel list, tables with repeated heads. The same tree gives the same bytes. */
export async function toDocx(document: SpecDocument): Promise<Buffer> {
  const title = `${document.header.sectionNumber} ${document.header.sectionTitle}, ${document.header.project}`
  const file = new Document({
    title,
    creator: document.header.firm.name,
    styles,
    numbering,
    sections: [
      {
        properties: { page: { size: { width: 12240, height: 15840 }, margin: { top: 1440, right: 1440, bottom: 1300, left: 1440 } } },
        ...pageEdges(document),
        children: await bodyOf(document),
      },
    ],
  })
  const core = { path: 'docProps/core.xml', data: coreProperties(document, title) }
  return withoutZipDates(await Packer.toBuffer(file, undefined, [core, fontTable]))
}
