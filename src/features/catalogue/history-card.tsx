import { useState } from 'react'
import { sentenceOf } from '../../lib/api.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/page.tsx'
import { useChanges } from '../people/queries.ts'
import { changeWords } from './change-words.ts'

const first = 8
const moment = (at: string) =>
  new Date(at).toLocaleString('en-US', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hour12: false,
  })

/** Who changed what of this record, from what. */
export function HistoryCard({ kind, id }: { kind: string; id: string }) {
  const mayRead = useCan('audit:read')
  const changes = useChanges({ subjectKind: kind, subjectId: id }, mayRead)
  const [all, setAll] = useState(false)
  if (!mayRead) return null
  return (
    <Card title="History">
      <Asking query={changes} says={sentenceOf}>
        {({ items }) => (
          <>
            <ul>
              {items.slice(0, all ? undefined : first).map((change) => (
                <ChangeItem key={change.id} change={change} />
              ))}
            </ul>
            {!all && items.length > first && (
              <Button look="quiet" onClick={() => setAll(true)}>
                Show {items.length - first} earlier changes
              </Button>
            )}
          </>
        )}
      </Asking>
    </Card>
  )
}

function ChangeItem({ change }: { change: { at: string; personName: string | null; action: string; from?: unknown; to?: unknown } }) {
  const { did, lines } = changeWords(change)
  return (
    <li className="border-b border-rule px-4 py-2 last:border-b-0">
      <time dateTime={change.at} className="block text-small text-pencil">
        {moment(change.at)}
      </time>
      {change.personName ?? 'Wearcourse'} {did}
      {lines.map(({ label, from, to }) => (
        <span key={label} className="block break-words">
          <span className="text-pencil">{label}:</span> {from !== null && <span className={to === null ? '' : 'text-pencil'}>{from}</span>}
          {from !== null && to !== null && <span aria-label="is now"> → </span>}
          {to}
        </span>
      ))}
    </li>
  )
}
