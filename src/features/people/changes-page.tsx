import { sentenceOf } from '../../lib/api.ts'
import { Asking } from '../../ui/asking.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { ChangeList } from '../../ui/change-list.tsx'
import { useChanges } from './queries.ts'

/** The audit trail of everything, newest first. */
export function ChangesPage() {
  const changes = useChanges({})
  return (
    <Page title="Changes" under="Who changed what, newest first.">
      <Card>
        <Asking query={changes} says={sentenceOf}>
          {({ items }) => <ChangeList items={items} />}
        </Asking>
      </Card>
    </Page>
  )
}
