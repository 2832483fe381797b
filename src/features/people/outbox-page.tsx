import { sentenceOf } from '../../lib/api.ts'
import { Asking } from '../../ui/asking.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { useOutbox } from './queries.ts'

/** Mail kept here because no mail server is set. */
export function OutboxPage() {
  const outbox = useOutbox()
  return (
    <Page title="Outbox" under="Mail that stays here while no mail server is set. Pass links on yourself.">
      <Asking query={outbox} says={sentenceOf}>
        {({ items }) =>
          items.length === 0 ? (
            <Notice>No mail has been written yet.</Notice>
          ) : (
            <ul className="grid gap-4">
              {items.map((mail) => (
                <li key={mail.id}>
                  <Card title={mail.subject}>
                    <div className="p-4">
                      <p className="text-pencil">
                        To {mail.to}, <time dateTime={mail.at}>{new Date(mail.at).toLocaleString()}</time>
                      </p>
                      <p className="mt-2 break-words whitespace-pre-line">{mail.text}</p>
                    </div>
                  </Card>
                </li>
              ))}
            </ul>
          )
        }
      </Asking>
    </Page>
  )
}
