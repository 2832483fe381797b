import { sentenceOf } from '../../lib/api.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { ChangeList } from '../../ui/change-list.tsx'
import { Card } from '../../ui/page.tsx'
import { useChanges } from '../people/queries.ts'

/** Who changed what of this record, from what. */
export function HistoryCard({ kind, id }: { kind: string; id: string }) {
  const mayRead = useCan('audit:read')
  const changes = useChanges({ subjectKind: kind, subjectId: id }, mayRead)
  if (!mayRead) return null
  return (
    <Card title="History">
      <Asking query={changes} says={sentenceOf}>
        {({ items }) => <ChangeList items={items} />}
      </Asking>
    </Card>
  )
}
