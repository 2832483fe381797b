import type { SpecDocument } from './document.ts'
import { writtenDate } from '../sheet-age.ts'

/** A table of tags: the first cell of a row is the tag. */
export interface Register {
  id: string
  title: string
  columns: { label: string; width: number }[]
  rows: string[][]
}

const columnsOf = (columns: readonly [string, number][]) => columns.map(([label, width]) => ({ label, width }))

/** The tables that tags lead to: sheets' pages, workings, entered and typical values. Those without rows are left out. */
export function registersOf({ sources, workings, entered, typicals }: SpecDocument): Register[] {
  return [
    {
      id: 'sources',
      title: 'Sources: sheets and pages',
      columns: columnsOf([
        ['Tag', 8],
        ['Sheet', 32],
        ['Revision', 16],
        ['Page', 8],
        ['Words of the sheet', 36],
      ]),
      rows: sources.map(({ tag, title, revisionDate, page, quotes }) => [
        tag,
        title,
        writtenDate(revisionDate),
        String(page),
        quotes.join(' · ') || 'not marked',
      ]),
    },
    {
      id: 'workings',
      title: 'Workings of computed values',
      columns: columnsOf([
        ['Tag', 8],
        ['Formula', 25],
        ['Sum', 39],
        ['Source', 18],
        ['From', 10],
      ]),
      rows: workings.map(({ tag, formula, sum, source, from }) => [tag, formula, sum, source, from.join(', ')]),
    },
    {
      id: 'entered',
      title: 'Entered values',
      columns: columnsOf([
        ['Tag', 8],
        ['Reason', 60],
        ['By', 32],
      ]),
      rows: entered.map(({ tag, reason, by, at }) => [tag, reason, `${by}, ${at.slice(0, 10)}`]),
    },
    {
      id: 'typicals',
      title: 'Typical values, verify',
      columns: columnsOf([
        ['Tag', 8],
        ['Source', 72],
        ['Dated', 20],
      ]),
      rows: typicals.map(({ tag, source, dated }) => [tag, source, dated]),
    },
  ].filter(({ rows }) => rows.length > 0)
}
