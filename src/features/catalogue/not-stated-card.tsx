import { Link } from 'react-router'
import type { Fact } from '../../../shared/domain/fact.ts'
import { properties } from '../../../shared/domain/property.ts'
import { useCan } from '../../lib/user.ts'
import { Card } from '../../ui/page.tsx'
import { isExpected, propertyGroups } from './property-groups.ts'
import type { RecordKind } from './queries.ts'

/** What no sheet has said of this record: listed by group, never passed over. */
export function NotStatedCard({
  base,
  kind,
  record,
}: {
  base: string
  kind: RecordKind
  record: { facts: readonly Fact[]; parts?: readonly unknown[] }
}) {
  const mayWrite = useCan('catalogue:write')
  const known = new Set(record.facts.map(({ property }) => property))
  const isAlone = record.parts?.length === 1
  const absent = propertyGroups
    .map(({ title, properties: members }) => ({
      title,
      members: members.filter((property) => isExpected(kind, property) && !known.has(property) && !(isAlone && property === 'mixRatio')),
    }))
    .filter(({ members }) => members.length > 0)
  if (absent.length === 0) return null
  return (
    <Card title="Not stated">
      <p className="px-4 pt-3 text-pencil">
        No sheet loaded here says it, and nobody has entered it. A check that needs one of these answers unknown.
      </p>
      <dl className="px-4 py-2">
        {absent.map(({ title, members }) => (
          <div key={title} className="grid gap-x-4 py-1 sm:grid-cols-[200px_minmax(0,1fr)]">
            <dt className="text-pencil">{title}</dt>
            <dd>
              <ul className="flex flex-wrap gap-x-5 gap-y-1">
                {members.map((property) => (
                  <li key={property}>
                    {mayWrite ? (
                      <Link to={`${base}/values/new?property=${property}`} className="text-resin hover:underline" title="Add a value">
                        {properties[property].label}
                      </Link>
                    ) : (
                      properties[property].label
                    )}
                  </li>
                ))}
              </ul>
            </dd>
          </div>
        ))}
      </dl>
    </Card>
  )
}
