import type { ReactNode } from 'react'
import type { MixRecord, ProductRecord } from '../../../shared/api/catalogue.ts'
import { type Fact, type Origin, textOf } from '../../../shared/domain/fact.ts'
import { formatValue } from '../../../shared/domain/format.ts'
import { firstAidOf, unionOfHazards } from '../../../shared/domain/hazard.ts'
import type { ProductFacts } from '../../../shared/domain/product.ts'
import type { Property } from '../../../shared/domain/property.ts'
import { OriginValue } from '../../ui/figure-view.tsx'
import { Fold } from '../../ui/fold.tsx'
import { Card } from '../../ui/page.tsx'
import { Pictogram } from '../../ui/pictogram.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'

type Statement = ReturnType<typeof unionOfHazards>['statements'][number]

/** What is handled: the product, or the parts of a mix, which are named by their letters here. */
function handledOf(record: ProductRecord | MixRecord): ProductFacts[] {
  if (!('parts' in record)) return [record]
  return record.parts.length === 1
    ? record.parts.map(({ product }) => product)
    : record.parts.map(({ part, product }) => ({ ...product, name: `part ${part}` }))
}

/** Hazards as official statements and pictograms, from the safety sheets of the product, or of all parts of a mix. */
export function HazardsCard({ record }: { record: ProductRecord | MixRecord }) {
  const products = handledOf(record)
  const hazards = unionOfHazards(products)
  const several = products.length > 1
  const firstAid = firstAidOf(hazards.precautions)
  const rest = hazards.precautions.filter((one) => !firstAid.includes(one))
  const facts = products.flatMap((product) => product.facts)
  return (
    <Card title="Hazards">
      <div className="grid gap-3 p-4">
        {hazards.notStated.length > 0 && (
          <p className="text-pencil">
            Hazards are not stated for {hazards.notStated.join(', ')}: no safety sheet loaded here tells them. That is not the same as none.
          </p>
        )}
        {hazards.signalWord && <p className="font-bold">{hazards.signalWord}</p>}
        {hazards.pictograms.length > 0 && (
          <div className="flex flex-wrap gap-2">
            {hazards.pictograms.map((code) => (
              <Pictogram key={code} code={code} />
            ))}
          </div>
        )}
        {hazards.statements.length > 0 && <Statements statements={hazards.statements} facts={facts} several={several} />}
        {firstAid.length > 0 && (
          <Fold summary={`First aid: ${firstAid.length} statements`} summaryClass="font-semibold">
            <Statements statements={firstAid} facts={facts} several={false} />
          </Fold>
        )}
        {rest.length > 0 && (
          <Fold summary={`Precautions: ${rest.length} statements`} summaryClass="font-semibold">
            <Statements statements={rest} facts={facts} several={false} />
          </Fold>
        )}
        <Worn products={products} />
        {several && (
          <p className="text-small text-pencil">All parts together. What arises in mixing, curing and grinding stands on no sheet.</p>
        )}
      </div>
    </Card>
  )
}

function Statements({ statements, facts, several }: { statements: readonly Statement[]; facts: readonly Fact[]; several: boolean }) {
  const originOf = (code: string): Origin | undefined => facts.find(({ value }) => 'codes' in value && value.codes.includes(code))?.origin
  return (
    <ul className="grid gap-0.5">
      {statements.map(({ code, text, from }) => {
        const origin = originOf(code)
        return (
          <li key={code}>
            {origin ? <OriginValue origin={origin}>{code}</OriginValue> : code}{' '}
            {text === code ? <span className="text-pencil">This code is in no list we hold; its wording stands on the sheet.</span> : text}
            {several && <span className="text-small text-pencil"> {from.join(', ')}</span>}
          </li>
        )
      })}
    </ul>
  )
}

const worn: [Property, string][] = [
  ['gloves', 'Gloves'],
  ['eyeProtection', 'Eyes'],
  ['respiratoryProtection', 'Breathing'],
  ['flashPoint', 'Flash point'],
  ['emergencyPhone', 'Emergency telephone'],
]

/** What to wear and whom to call, in the sheets' own words; the same words of two parts stand once. */
function Worn({ products }: { products: readonly ProductFacts[] }) {
  const { system } = useUnitSystem()
  const rows = worn.map(([property, label]) => ({ label, said: saidBy(products, property) }))
  return (
    <dl className="border-t border-rule pt-2">
      {rows.map(({ label, said }) => (
        <Row key={label} label={label}>
          {said.length === 0 && <span className="text-pencil">not stated</span>}
          {said.map(({ fact, from }) => (
            <span key={fact.id} className="block">
              <OriginValue origin={fact.origin}>{formatValue(fact, system)}</OriginValue>
              {products.length > 1 && (
                <span className="text-small text-pencil"> {from.length === products.length ? 'all parts' : from.join(', ')}</span>
              )}
            </span>
          ))}
        </Row>
      ))}
    </dl>
  )
}

function saidBy(products: readonly ProductFacts[], property: Property) {
  const groups = new Map<string, { fact: Fact; from: string[] }>()
  for (const { name, facts } of products) {
    for (const fact of facts.filter((one) => one.property === property)) {
      const words = formatValue(fact)
      const group = groups.get(words)
      if (group) group.from.push(name)
      else groups.set(words, { fact, from: [name] })
    }
  }
  return [...groups.values()]
}

const capital = (words: string) => `${words[0]?.toUpperCase() ?? ''}${words.slice(1)}`

function Row({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="grid gap-x-4 py-0.5 sm:grid-cols-[140px_minmax(0,1fr)]">
      <dt className="text-pencil">{label}</dt>
      <dd className="min-w-0 break-words">{children}</dd>
    </div>
  )
}

/** Transport details of each product in one line each: number, name, class, packing group; what lacks is said to. */
export function TransportCard({ record }: { record: ProductRecord | MixRecord }) {
  const products = handledOf(record)
  return (
    <Card title="Transport">
      <dl className="px-4 py-2">
        {products.map((product) => (
          <Row key={product.id} label={products.length > 1 ? capital(product.name) : 'Declared as'}>
            <TransportLine facts={product.facts} />
          </Row>
        ))}
      </dl>
    </Card>
  )
}

function TransportLine({ facts }: { facts: readonly Fact[] }) {
  const factOf = (property: Property) => facts.find((fact) => fact.property === property)
  const parts: [Property, string][] = [
    ['unNumber', ''],
    ['properShippingName', ''],
    ['transportClass', 'class '],
    ['packingGroup', 'packing group '],
  ]
  const known = parts.flatMap(([property, before]) => {
    const fact = factOf(property)
    return fact ? [{ before, fact }] : []
  })
  if (known.length === 0) return <span className="text-pencil">not stated</span>
  return known.map(({ before, fact }, index) => (
    <span key={fact.id}>
      {index > 0 && ', '}
      {before}
      <OriginValue origin={fact.origin}>{textOf(fact)}</OriginValue>
    </span>
  ))
}
