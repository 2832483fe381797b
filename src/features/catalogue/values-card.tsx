import { useState } from 'react'
import { Link } from 'react-router'
import type { Fact } from '../../../shared/domain/fact.ts'
import { formatConditions, formatValue } from '../../../shared/domain/format.ts'
import { type Property, properties } from '../../../shared/domain/property.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useCan } from '../../lib/user.ts'
import { OriginValue } from '../../ui/figure-view.tsx'
import { Card } from '../../ui/page.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'
import { useCatalogueChanges } from './queries.ts'

/** Statements of hazards have a card of their own; here stands everything else. */
const elsewhere = new Set<Property>(['hazardStatements', 'precautionaryStatements', 'supplementalStatements', 'signalWord'])

/** Every value with its kind and page, one property a block, the cells of a table one under the other. */
export function ValuesCard({ base, record }: { base: string; record: { facts: readonly Fact[] } }) {
  const shown = record.facts.filter(({ property }) => !elsewhere.has(property))
  const groups = [...new Set(shown.map(({ property }) => property))].map((property) => ({ property, facts: shown.filter((fact) => fact.property === property) }))
  return (
    <Card title="What is known">
      {groups.length === 0 && <p className="p-4 text-pencil">Nothing yet. Upload its sheets, or add a value with its reason.</p>}
      <dl>
        {groups.map(({ property, facts }) => (
          <div key={property} className="grid gap-x-4 border-b border-rule px-4 py-2 last:border-b-0 sm:grid-cols-[200px_minmax(0,1fr)]">
            <dt className="text-pencil">{properties[property].label}</dt>
            <dd>
              {facts.map((fact) => (
                <ValueLine key={fact.id} base={base} fact={fact} />
              ))}
            </dd>
          </div>
        ))}
      </dl>
    </Card>
  )
}

function ValueLine({ base, fact }: { base: string; fact: Fact }) {
  const { system } = useUnitSystem()
  const mayWrite = useCan('catalogue:write')
  const { endFact } = useCatalogueChanges()
  const [error, setError] = useState<string>()
  const conditions = formatConditions(fact.at, system)
  const remove = () => void endFact(fact.id).catch((thrown: unknown) => setError(sentenceOf(thrown)))
  return (
    <div className="flex flex-wrap items-baseline justify-between gap-x-3 py-0.5">
      <span>
        {fact.part !== 'mixed' && <span className="text-pencil">{fact.part}: </span>}
        <OriginValue origin={fact.origin}>{formatValue(fact, system)}</OriginValue>
        {conditions && <span className="text-pencil"> {conditions}</span>}
        {error && <span className="block font-semibold text-stop">{error}</span>}
      </span>
      {mayWrite && (
        <span className="no-print flex gap-1 text-small">
          <Link to={`${base}/values/${fact.id}`} className="px-1 text-resin hover:underline" aria-label={`Amend ${properties[fact.property].label}`}>
            Amend
          </Link>
          <button type="button" className="px-1 text-resin hover:underline" aria-label={`Remove ${properties[fact.property].label}`} onClick={remove}>
            Remove
          </button>
        </span>
      )}
    </div>
  )
}
