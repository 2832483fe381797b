import { type Item, type Run, type SpecDocument, type SpecPart, frontTitles } from '../../../shared/domain/specification/document.ts'
import { numberedArticles, numberedItems } from '../../../shared/domain/specification/numbering.ts'
import { registersOf } from '../../../shared/domain/specification/registers.ts'
import { titleRows } from '../../../shared/domain/specification/title-block.ts'
import { standaloneHeight } from '../../../shared/drawing/section.ts'
import { SectionFigure } from '../../ui/section-figure.tsx'
import { RunsView } from './runs-view.tsx'

/** The specification as it is printed: what is not known first, then the three parts, schedules and the tables that tags lead to. */
export function DocumentView({ document }: { document: SpecDocument }) {
  const { header, parts, section, schedules, closing } = document
  return (
    <article
      aria-label={`Section ${header.sectionNumber} ${header.sectionTitle}`}
      className="mx-auto w-full max-w-[860px] border border-rule bg-card px-5 py-6 md:px-12 md:py-10 print:max-w-none print:border-0 print:p-0"
    >
      <p className="text-center">SECTION {header.sectionNumber}</p>
      <p className="mb-4 text-center text-title uppercase">{header.sectionTitle}</p>
      <TitleBlock header={header} />
      <Front front={document.front} />
      {parts.map((part) => (
        <PartView key={part.number} part={part} />
      ))}
      <h2 id="schedules" className="mt-8 text-section uppercase">
        Schedules
      </h2>
      {section.layers.length > 0 && (
        <section className="mt-4">
          <h3 className="font-semibold">Section through the floor</h3>
          {/* eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- what scrolls sideways has to be reached by keyboard */}
          <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Section through the floor">
            <SectionFigure
              layers={section.layers}
              width={680}
              height={standaloneHeight(section.layers.length)}
              unit={section.unit}
              standalone
              className="h-auto w-full max-w-[680px] min-w-[560px] print:min-w-0"
            />
          </div>
        </section>
      )}
      {schedules.map(({ id, title, columns, rows, note }) => (
        <TableView
          key={id}
          id={id}
          title={title}
          columns={columns}
          note={note}
          rows={rows.map((row, at) => ({ key: String(at), cells: row.map((runs, index) => <RunsView key={index} runs={runs} />) }))}
        />
      ))}
      {registersOf(document).map(({ id, title, columns, rows }) => (
        <TableView
          key={id}
          id={id}
          title={title}
          columns={columns}
          rows={rows.map((cells) => ({ key: cells[0] ?? '', id: cells[0], cells }))}
        />
      ))}
      <p className="mt-6 font-semibold">{closing.join(' ')}</p>
      <p className="mt-4 text-center">END OF SECTION {header.sectionNumber}</p>
    </article>
  )
}

function TitleBlock({ header }: Pick<SpecDocument, 'header'>) {
  return (
    <dl className="mb-6 grid grid-cols-[90px_1fr] border-t border-rule">
      {titleRows(header).map(([label, value]) => (
        <div key={label} className="col-span-2 grid grid-cols-subgrid border-b border-rule py-1">
          <dt className="text-pencil">{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  )
}

function Front({ front }: Pick<SpecDocument, 'front'>) {
  const kinds = Object.keys(frontTitles) as (keyof typeof frontTitles)[]
  return (
    <section id="front" aria-label="Read first" className="border-l-4 border-caution pl-4">
      <h2 className="text-section uppercase">Read first</h2>
      {kinds.map((kind) => (
        <section key={kind} id={`front-${kind}`} className="mt-3">
          <h3 className="font-semibold">{frontTitles[kind]}</h3>
          {front[kind].length > 0 ? <Items items={front[kind]} /> : <p>None.</p>}
        </section>
      ))}
    </section>
  )
}

function PartView({ part }: { part: SpecPart }) {
  const articles = numberedArticles(part)
  return (
    <section aria-label={`Part ${part.number} ${part.title}`}>
      <h2 id={`part-${part.number}`} className="mt-8 text-section uppercase">
        Part {part.number} {part.title}
      </h2>
      {articles.length === 0 && <p>Not used</p>}
      {articles.map(({ id, number, title, items }) => (
        <section key={id} id={`part-${part.number}-${id}`} className="mt-4 break-inside-auto">
          <h3 className="mb-1 font-semibold break-after-avoid">
            {number} <span className="uppercase">{title}</span>
          </h3>
          {items.map((item, index) => (
            <Line key={index} {...item} />
          ))}
        </section>
      ))}
    </section>
  )
}

const Items = ({ items }: { items: readonly Item[] }) => numberedItems(items).map((item, index) => <Line key={index} {...item} />)

const indents = ['pl-0', 'pl-5 md:pl-7', 'pl-10 md:pl-14', 'pl-14 md:pl-20', 'pl-16 md:pl-24'] as const

function Line({ label, level, runs }: { label: string; level: number; runs: readonly Run[] }) {
  return (
    <p className={`mt-1 grid grid-cols-[28px_1fr] ${indents[level] ?? ''}`}>
      <span>{label}</span>
      <span>
        <RunsView runs={runs} />
      </span>
    </p>
  )
}

interface TableViewProps {
  id: string
  title: string
  columns: readonly { label: string; width: number }[]
  rows: readonly { key: string; id?: string | undefined; cells: readonly React.ReactNode[] }[]
  note?: string
}

function TableView({ id: tableId, title, columns, rows, note }: TableViewProps) {
  const total = columns.reduce((sum, { width }) => sum + width, 0)
  return (
    <section id={`table-${tableId}`} className="mt-6">
      <h3 className="mb-1 font-semibold break-after-avoid">{title}</h3>
      {/* eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- what scrolls sideways has to be reached by keyboard */}
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={title}>
        <table className="w-full min-w-[560px] table-fixed text-left text-small print:min-w-0">
          <colgroup>
            {columns.map(({ label, width }) => (
              <col key={label} style={{ width: `${(100 * width) / total}%` }} />
            ))}
          </colgroup>
          <thead>
            <tr className="border-y border-ink">
              {columns.map(({ label }) => (
                <th key={label} scope="col" className="py-1 pr-2 align-bottom font-semibold">
                  {label}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ key, id, cells }) => (
              <tr key={key} id={id} className="break-inside-avoid border-b border-rule align-top target:bg-resin-wash">
                {cells.map((cell, index) => (
                  <td key={index} className="py-1 pr-2 break-words whitespace-pre-line">
                    {cell}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {note && <p className="mt-1 text-small text-pencil">{note}</p>}
    </section>
  )
}
