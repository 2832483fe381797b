import type { MixRecord, ProductRecord } from '../../../shared/api/catalogue.ts'
import type { Fact } from '../../../shared/domain/fact.ts'
import { unionOfHazards } from '../../../shared/domain/hazard.ts'
import { OriginValue } from '../../ui/figure-view.tsx'
import { Card } from '../../ui/page.tsx'
import { Pictogram } from '../../ui/pictogram.tsx'

/** Hazards as official statements and pictograms, from the safety sheets of the product, or of all parts of a mix. */
export function HazardsCard({ record }: { record: ProductRecord | MixRecord }) {
  const products = 'parts' in record ? record.parts.map(({ product }) => product) : [record]
  const hazards = unionOfHazards(products)
  const facts: Fact[] = products.flatMap((product) => product.facts)
  const originOf = (code: string) => facts.find(({ value }) => 'codes' in value && value.codes.includes(code))?.origin
  const statement = ({ code, text, from }: (typeof hazards.statements)[number]) => {
    const origin = originOf(code)
    return (
      <li key={code} title={from.join(', ')}>
        {origin ? <OriginValue origin={origin}>{code}</OriginValue> : code} {text}
      </li>
    )
  }
  return (
    <Card title="Hazards">
      <div className="p-4">
        {hazards.signalWord && <p className="mb-2 font-bold">{hazards.signalWord}</p>}
        <div className="mb-3 flex flex-wrap gap-2">
          {hazards.pictograms.map((code) => (
            <Pictogram key={code} code={code} />
          ))}
        </div>
        <ul>{hazards.statements.map(statement)}</ul>
        {hazards.precautions.length > 0 && (
          <details className="mt-2">
            <summary className="cursor-pointer text-pencil">{hazards.precautions.length} precautionary statements</summary>
            <ul className="mt-1">{hazards.precautions.map(statement)}</ul>
          </details>
        )}
        {hazards.notStated.length > 0 && (
          <p className="mt-2 text-pencil">No hazards stated on a loaded safety sheet for {hazards.notStated.join(', ')}: not known, which is not the same as none.</p>
        )}
        {'parts' in record && <p className="mt-2 text-small text-pencil">The union of the parts. What arises in mixing, curing and grinding stands on no sheet.</p>}
      </div>
    </Card>
  )
}
