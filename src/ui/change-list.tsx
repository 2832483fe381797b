interface Change {
  id: number
  at: string
  personName: string | null
  action: string
  subjectKind: string
  from?: unknown
  to?: unknown
}

const asText = (value: unknown) => (value === null || value === undefined ? '' : JSON.stringify(value, null, 1))

/** Rows of the audit trail; what changed opens on demand. */
export function ChangeList({ items }: { items: Change[] }) {
  if (items.length === 0) return <p className="p-4 text-pencil">Nothing has been changed yet.</p>
  return (
    <ul>
      {items.map((change) => (
        <li key={change.id} className="border-b border-rule px-4 py-2 last:border-b-0">
          <details>
            <summary className="cursor-pointer">
              <time dateTime={change.at} className="text-pencil">
                {new Date(change.at).toLocaleString()}
              </time>{' '}
              {change.personName ?? 'Wearcourse'}: {change.subjectKind} {change.action.replaceAll('-', ' ')}
            </summary>
            <div className="mt-2 grid gap-3 md:grid-cols-2">
              <Side name="From" text={asText(change.from)} />
              <Side name="To" text={asText(change.to)} />
            </div>
          </details>
        </li>
      ))}
    </ul>
  )
}

function Side({ name, text }: { name: string; text: string }) {
  if (!text) return null
  return (
    <div>
      <p className="text-pencil">{name}</p>
      <pre className="overflow-x-auto bg-paper p-2 text-small whitespace-pre-wrap">{text}</pre>
    </div>
  )
}
