import type { CourseResult, Proportion } from '../../../shared/domain/evaluation.ts'
import type { Figure } from '../../../shared/domain/figure.ts'
import { formatNumber } from '../../../shared/domain/format.ts'
import { FigureView } from '../../ui/figure-view.tsx'
import { Hazards } from './hazards.tsx'

const rows: [keyof CourseResult, string][] = [
  ['wetFilm', 'Wet film'], ['dryFilm', 'Dry film'], ['spreadRate', 'Spread rate'], ['resinPerArea', 'Mixed resin'], ['aggregatePerArea', 'Sand'], ['potLife', 'Pot life'],
  ['workingTime', 'Working time on the floor'], ['window', 'Window for the next course'], ['footTraffic', 'Foot traffic'], ['vehicleTraffic', 'Vehicle traffic'],
  ['fullCure', 'Full cure'], ['voc', 'VOC'],
]

/** All that a course comes to: each figure with how it is known. */
export function CourseFigures({ result }: { result: CourseResult }) {
  const shown = rows.flatMap(([key, label]) => (result[key] === null ? [] : [{ label, figure: result[key] as Figure }]))
  return (
    <div className="grid gap-x-8 gap-y-4 sm:grid-cols-2">
      <dl className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4">
        {shown.map(({ label, figure }) => (
          <div key={label} className="contents">
            <dt className="border-b border-rule py-1 text-pencil">{label}</dt>
            <dd className="border-b border-rule py-1 text-right">
              <FigureView figure={figure} />
            </dd>
          </div>
        ))}
      </dl>
      <div className="flex flex-col gap-4">
        {result.proportions.length > 0 && <Proportions result={result} />}
        {result.hazards && <Hazards hazards={result.hazards} />}
      </div>
    </div>
  )
}

const share = (value: number | null) => (value === null ? 'not known' : `${formatNumber(value * 100, 1)} %`)

function Proportions({ result }: { result: CourseResult }) {
  return (
    <table className="w-full text-left">
      <caption className="mb-1 text-left font-semibold">
        Mix {[result.ratioByVolume && `${result.ratioByVolume} by volume`, result.ratioByWeight && `${result.ratioByWeight} by weight`].filter(Boolean).join(', ')}
      </caption>
      <thead>
        <tr className="border-b border-ink text-pencil">
          <th scope="col" className="py-1 font-normal">Part</th>
          <th scope="col" className="py-1 text-right font-normal">by volume</th>
          <th scope="col" className="py-1 text-right font-normal">by weight</th>
          <th scope="col" className="py-1 text-right font-normal">density</th>
        </tr>
      </thead>
      <tbody>
        {result.proportions.map((proportion: Proportion) => (
          <tr key={proportion.part} className="border-b border-rule">
            <th scope="row" className="py-1 font-normal">
              {proportion.part} <span className="text-pencil">{proportion.name}</span>
            </th>
            <td className="py-1 text-right">{share(proportion.volumeShare)}</td>
            <td className="py-1 text-right">{share(proportion.massShare)}</td>
            <td className="py-1 text-right">
              <FigureView figure={proportion.density} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
