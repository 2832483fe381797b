import { Link } from 'react-router'
import type { MixRecord } from '../../../shared/api/catalogue.ts'
import { formatNumber } from '../../../shared/domain/format.ts'
import { proportionsOf } from '../../../shared/domain/proportion.ts'
import { paths } from '../../lib/paths.ts'
import { FigureView } from '../../ui/figure-view.tsx'
import { Card } from '../../ui/page.tsx'

const share = (value: number | null) => (value === null ? <span className="text-pencil">not stated</span> : `${formatNumber(value * 100, 1)} %`)

/** The parts of a mix, by volume and by weight. */
export function PartsCard({ mix }: { mix: MixRecord }) {
  const { proportions, ratioByVolume, ratioByWeight } = proportionsOf(mix)
  return (
    <Card title="Parts">
      <div className="overflow-x-auto">
        <table className="w-full text-left">
          <thead className="text-pencil">
            <tr className="border-b border-rule">
              <th scope="col" className="px-4 py-2 font-normal">Part</th>
              <th scope="col" className="px-4 font-normal">Product</th>
              <th scope="col" className="px-4 text-right font-normal">Density</th>
              <th scope="col" className="px-4 text-right font-normal">By volume</th>
              <th scope="col" className="px-4 text-right font-normal">By weight</th>
            </tr>
          </thead>
          <tbody>
            {proportions.map((part) => (
              <tr key={part.part} className="border-b border-rule">
                <td className="px-4 py-2">{part.part}</td>
                <td className="px-4">
                  <Link to={paths.product(part.productId)} className="text-resin hover:underline">{part.name}</Link>
                </td>
                <td className="px-4 text-right"><FigureView figure={part.density} /></td>
                <td className="px-4 text-right">{share(part.volumeShare)}</td>
                <td className="px-4 text-right">{share(part.massShare)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {proportions.length > 1 && (
        <p className="px-4 py-2 text-pencil">
          {ratioByVolume ?? 'Not stated'} by volume, {ratioByWeight ?? 'not stated'} by weight. What is not stated itself is worked out through the densities.
        </p>
      )}
    </Card>
  )
}
