import { Link } from 'react-router'
import type { Fact } from '../../../shared/domain/fact.ts'
import { formatConditions, formatValue } from '../../../shared/domain/format.ts'
import { properties } from '../../../shared/domain/property.ts'
import type { SheetSummary } from '../../../shared/domain/sheet.ts'
import { useCan } from '../../lib/user.ts'
import { OriginValue } from '../../ui/figure-view.tsx'
import { Card } from '../../ui/page.tsx'
import { StatusMark } from '../../ui/status-mark.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'
import { propertyGroups } from './property-groups.ts'

interface ValuesCardProps {
  base: string
  record: { facts: readonly Fact[]; sheets: readonly SheetSummary[] }
}

/** Every value with its kind and page, in groups; the cells of a table one under the other. */
export function ValuesCard({ base, record }: ValuesCardProps) {
  const known = propertyGroups
    .map(({ title, properties: members }) => ({
      title,
      lines: members
        .map((property) => ({ property, facts: record.facts.filter((fact) => fact.property === property) }))
        .filter(({ facts }) => facts.length > 0),
    }))
    .filter(({ lines }) => lines.length > 0)
  return (
    <Card title="What is known">
      {known.length === 0 && <p className="p-4 text-pencil">Nothing yet. Upload its sheets, or add a value with its reason.</p>}
      {known.map(({ title, lines }) => (
        <section key={title} aria-label={title} className="border-b border-rule last:border-b-0">
          <h3 className="px-4 pt-3 pb-1 text-small text-pencil">{title}</h3>
          <dl className="pb-2">
            {lines.map(({ property, facts }) => (
              <div key={property} className="grid gap-x-4 px-4 py-1 sm:grid-cols-[200px_minmax(0,1fr)]">
                <dt className="text-pencil sm:text-ink">{properties[property].label}</dt>
                <dd>
                  {facts.map((fact) => (
                    <ValueLine key={fact.id} base={base} fact={fact} isSuperseded={citesSuperseded(fact, record.sheets)} />
                  ))}
                </dd>
              </div>
            ))}
          </dl>
        </section>
      ))}
    </Card>
  )
}

/** True when the value was read on a revision that is no longer the one in force. */
function citesSuperseded({ origin }: Fact, sheets: readonly SheetSummary[]): boolean {
  if (origin.kind !== 'stated') return false
  const { citation } = origin
  return sheets.some(({ id, revisionId }) => id === citation.sheetId && revisionId !== citation.revisionId)
}

function ValueLine({ base, fact, isSuperseded }: { base: string; fact: Fact; isSuperseded: boolean }) {
  const { system } = useUnitSystem()
  const mayWrite = useCan('catalogue:write')
  const conditions = formatConditions(fact.at, system)
  const shown = formatValue(fact, system)
  return (
    <div className="flex min-h-6 items-baseline justify-between gap-x-3 py-px">
      <span className="min-w-0 break-words">
        {fact.part !== 'mixed' && <span className="text-pencil">part {fact.part} </span>}
        <OriginValue origin={fact.origin}>{shown}</OriginValue>
        {conditions && <span className="text-pencil"> {conditions}</span>}
        {isSuperseded && (
          <span className="text-small text-caution">
            {' '}
            <StatusMark status="caution" wordless /> read on a superseded revision
          </span>
        )}
      </span>
      {mayWrite && (
        <Link
          to={`${base}/values/${fact.id}`}
          className="no-print min-h-6 shrink-0 px-1 text-small leading-6 text-resin hover:underline"
          aria-label={`Amend ${properties[fact.property].label} ${conditions}`.trim()}
        >
          Amend
        </Link>
      )}
    </div>
  )
}
