import { Link } from 'react-router'
import type { Fact } from '../../../shared/domain/fact.ts'
import { type Property, definitionOf, properties, propertyNames } from '../../../shared/domain/property.ts'
import { useCan } from '../../lib/user.ts'
import { Card } from '../../ui/page.tsx'
import type { RecordKind } from './queries.ts'

/** A safety sheet speaks of a product; a data sheet of what goes on the floor, and of the density, packs and shelf life of each product. */
const ofProducts = new Set<Property>(['density', 'packSize', 'shelfLife', 'storageTemperature', 'viscosity'])

function expected(kind: RecordKind, property: Property): boolean {
  const { source } = definitionOf(property)
  if (source === 'firm' || property === 'productName' || property === 'revisionDate') return false
  return kind === 'product' ? source === 'safety' || source === 'both' || ofProducts.has(property) : source !== 'safety'
}

/** What no sheet has said of this record: listed, never passed over. */
export function NotStatedCard({ base, kind, record }: { base: string; kind: RecordKind; record: { facts: readonly Fact[] } }) {
  const mayWrite = useCan('catalogue:write')
  const known = new Set(record.facts.map(({ property }) => property))
  const absent = propertyNames.filter((property) => expected(kind, property) && !known.has(property))
  if (absent.length === 0) return null
  return (
    <Card title="Not stated">
      <p className="px-4 pt-3 text-pencil">No sheet loaded here says it, and nobody has entered it. A check that needs one of these answers unknown.</p>
      <ul className="flex flex-wrap gap-x-5 gap-y-1 p-4">
        {absent.map((property) => (
          <li key={property}>
            {mayWrite ? (
              <Link to={`${base}/values/new?property=${property}`} className="text-resin hover:underline">
                {properties[property].label}
              </Link>
            ) : (
              properties[property].label
            )}
          </li>
        ))}
      </ul>
    </Card>
  )
}
