import type { Conditions } from '../../../shared/domain/build-up.ts'
import type { Quantity } from '../../../shared/domain/units.ts'
import { vocPlaces } from '../../../shared/reference/voc-limits.ts'
import { QuantityText } from '../../ui/figure-view.tsx'

const measured = (quantity: Quantity | null) => (quantity ? <QuantityText {...quantity} /> : 'not measured')

/** The conditions that a version was reckoned at, to read. */
export function ConditionsSummary({ conditions }: { conditions: Conditions }) {
  const { slabTemperature, airTemperature, relativeHumidity, substrateRelativeHumidity, moistureEmission, vocPlace } = conditions
  const rows: [string, React.ReactNode][] = [
    ['Slab', measured(slabTemperature)],
    ['Air', measured(airTemperature)],
    ['Humidity of the air', `${relativeHumidity} % RH`],
    ['Humidity in the slab', substrateRelativeHumidity === null ? 'not measured' : `${substrateRelativeHumidity} % RH`],
    ['Moisture emission', measured(moistureEmission)],
    ['VOC rules of', vocPlace === null ? 'none chosen' : (vocPlaces.find(({ id }) => id === vocPlace)?.name ?? vocPlace)],
  ]
  return (
    <dl className="grid grid-cols-2 gap-x-4 gap-y-2 border border-rule bg-card px-4 py-3 md:grid-cols-3 xl:grid-cols-6 print:grid-cols-3">
      {rows.map(([label, value]) => (
        <div key={label}>
          <dt className="text-small text-pencil">{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  )
}
