import { type Content, type ContentNode, fontName } from '../../documents/print-pdf.ts'
import {
  type Run,
  type Runs,
  type SpecDocument,
  type SpecTable,
  frontTitles,
  tagText,
} from '../../../shared/domain/specification/document.ts'
import { type NumberedItem, numberedArticles, numberedItems } from '../../../shared/domain/specification/numbering.ts'
import { registersOf } from '../../../shared/domain/specification/registers.ts'
import { drawSection } from './section-drawing.ts'

const pencil = '#55606a'
const step = 22
export const strong = (node: ContentNode): ContentNode => ({ ...node, bold: true })

/** A heading never stands alone at the foot of a page: it goes with what comes first beneath it. */
function together(head: Content, [first, ...rest]: readonly Content[]): Content[] {
  return [{ stack: [head, first ?? ''], unbreakable: true }, ...rest]
}

/** A line: figures carry their tags, small, as links to the tables at the end. */
function inline(runs: readonly Run[]): Content[] {
  return runs.flatMap((run): Content[] => {
    if (run.kind !== 'figure') return [{ text: run.text }]
    const figure = { text: run.text, ...(run.known === 'not-stated' ? { italics: true } : {}) }
    const [first] = run.tags
    const tag = tagText(run)
    return tag ? [figure, { text: tag, fontSize: 7.5, color: pencil, ...(first ? { linkToDestination: first } : {}) }] : [figure]
  })
}

function paragraph({ label, level, runs }: NumberedItem): Content {
  return {
    columns: [
      { width: step, text: label },
      { width: '*', text: inline(runs) },
    ],
    columnGap: 0,
    margin: [level * step, level === 0 ? 4 : 1.5, 0, 0],
  }
}

const heading = (text: string, id: string, more: ContentNode = {}): ContentNode => ({
  text,
  id,
  outline: true,
  outlineText: text,
  outlineExpanded: false,
  ...more,
})

function parts({ parts: all }: SpecDocument): Content[] {
  return all.flatMap((part): Content[] => {
    const title = `PART ${part.number} ${part.title.toUpperCase()}`
    const id = `part-${part.number}`
    const articles = numberedArticles(part).flatMap((article): Content[] => {
      const head = heading(`${article.number}  ${article.title.toUpperCase()}`, `${id}-${article.id}`, {
        style: 'article',
        outlineParentId: id,
      })
      return together(head, article.items.map(paragraph))
    })
    return together(heading(title, id, { style: 'part' }), articles.length > 0 ? articles : [{ text: 'Not used', margin: [0, 6, 0, 0] }])
  })
}

function front({ front: lists }: SpecDocument): Content[] {
  const kinds = Object.keys(frontTitles) as (keyof typeof frontTitles)[]
  return [
    heading('READ FIRST', 'front', { style: 'part' }),
    ...kinds.flatMap((kind) =>
      together(
        { text: frontTitles[kind], style: 'article' },
        lists[kind].length > 0 ? numberedItems(lists[kind]).map(paragraph) : [{ text: 'None.', margin: [0, 3, 0, 0] }],
      ),
    ),
  ]
}

interface Grid {
  title: string
  columns: { label: string; width: number }[]
  rows: ContentNode[][]
  note?: string
}

const titleRow = ({ title, columns }: Pick<Grid, 'title' | 'columns'>): Content[] => [
  strong({ text: title, fontSize: 10.5, colSpan: columns.length }),
  ...columns.slice(1).map(() => ({})),
]

/** The bookmark of a table sits in its first row: title and head are printed on every page, and each printing would be one more. */
function bookmarked([first = [], ...rest]: readonly ContentNode[][], title: string): Content[][] {
  const [cell = {}, ...cells] = first
  return [[{ ...cell, outline: true, outlineText: title, outlineParentId: 'schedules' }, ...cells], ...rest]
}

/** A table with its title and head repeated on every page and no row broken over two. */
function grid({ title, columns, rows, note }: Grid): Content[] {
  const total = columns.reduce((sum, { width }) => sum + width, 0)
  return [
    {
      table: {
        headerRows: 2,
        keepWithHeaderRows: 1,
        dontBreakRows: true,
        widths: columns.map(({ width }) => `${(100 * width) / total}%`),
        body: [titleRow({ title, columns }), columns.map(({ label }) => ({ text: label, bold: true })), ...bookmarked(rows, title)],
      },
      layout: 'schedule',
      fontSize: 8.5,
      margin: [0, 8, 0, 0],
    },
    ...(note ? [{ text: note, fontSize: 8.5, color: pencil, margin: [0, 3, 0, 0] }] : []),
  ]
}

const schedule = ({ title, columns, rows, note }: SpecTable): Content[] =>
  grid({ title, columns, note, rows: rows.map((row) => row.map((cell: Runs) => ({ text: inline(cell) }))) })

function registers(document: SpecDocument): Content[] {
  return registersOf(document).flatMap(({ title, columns, rows }) =>
    grid({ title, columns, rows: rows.map(([tag = '', ...cells]) => [{ text: tag, id: tag }, ...cells.map((text) => ({ text }))]) }),
  )
}

function drawing(document: SpecDocument): Content[] {
  if (document.section.layers.length === 0) return []
  const { svg, alternative } = drawSection(document, fontName)
  return [
    {
      stack: [
        heading('Section through the floor', 'section', { style: 'article', outlineParentId: 'schedules' }),
        { svg, width: 468, margin: [0, 4, 0, 4] },
        { text: alternative, fontSize: 8.5, color: pencil },
      ],
      unbreakable: true,
    },
  ]
}

/** Everything between the title and the last page. */
export function contentOf(document: SpecDocument): Content[] {
  return [
    ...front(document),
    ...parts(document),
    ...together(heading('SCHEDULES', 'schedules', { style: 'part' }), drawing(document)),
    ...document.schedules.flatMap(schedule),
    ...registers(document),
    strong({ text: document.closing.join(' '), margin: [0, 14, 0, 0] }),
    { text: `END OF SECTION ${document.header.sectionNumber}`, alignment: 'center', margin: [0, 16, 0, 0] },
  ]
}
