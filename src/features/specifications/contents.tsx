import { type SpecDocument, frontTitles } from '../../../shared/domain/specification/document.ts'
import { numberedArticles } from '../../../shared/domain/specification/numbering.ts'
import { registersOf } from '../../../shared/domain/specification/registers.ts'

interface Entry {
  id: string
  text: string
  under: { id: string; text: string }[]
}

function entriesOf(document: SpecDocument): Entry[] {
  const front = Object.entries(frontTitles).map(([kind, text]) => ({ id: `front-${kind}`, text }))
  const parts = document.parts.map((part) => ({
    id: `part-${part.number}`,
    text: `Part ${part.number} ${part.title}`,
    under: numberedArticles(part).map(({ id, number, title }) => ({ id: `part-${part.number}-${id}`, text: `${number} ${title}` })),
  }))
  const tables = [...document.schedules, ...registersOf(document)].map(({ id, title }) => ({ id: `table-${id}`, text: title }))
  return [{ id: 'front', text: 'Read first', under: front }, ...parts, { id: 'schedules', text: 'Schedules', under: tables }]
}

/** Parts, articles and schedules, each a jump to its place on the page. */
export function Contents({ document }: { document: SpecDocument }) {
  return (
    <nav aria-label="Contents" className="px-4 py-3 text-small">
      {entriesOf(document).map(({ id, text, under }) => (
        <div key={id} className="mb-2 last:mb-0">
          <a href={`#${id}`} className="block py-1 font-semibold underline-offset-4 hover:underline">
            {text}
          </a>
          <ul>
            {under.map((entry) => (
              <li key={entry.id}>
                <a href={`#${entry.id}`} className="block py-1 text-pencil underline-offset-4 hover:text-resin hover:underline">
                  {entry.text}
                </a>
              </li>
            ))}
          </ul>
        </div>
      ))}
    </nav>
  )
}
