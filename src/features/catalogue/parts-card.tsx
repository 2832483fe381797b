import { Link } from 'react-router'
import type { MixRecord } from '../../../shared/api/catalogue.ts'
import { proportionsOf } from '../../../shared/domain/proportion.ts'
import { paths } from '../../lib/paths.ts'
import { FigureView } from '../../ui/figure-view.tsx'
import { Card } from '../../ui/page.tsx'
import { shareFigures } from './share-figures.ts'

const headings = ['Density', 'By volume', 'By weight']

/** The parts of a mix, by volume and by weight. */
export function PartsCard({ mix }: { mix: MixRecord }) {
  const { proportions, ratioByVolume, ratioByWeight } = proportionsOf(mix)
  const alone = mix.parts.length === 1
  const [byVolume, byWeight] = [shareFigures(mix, 'volume'), shareFigures(mix, 'weight')]
  const numeric = 'px-4 py-2 text-right align-top'
  return (
    <Card title={alone ? 'The product' : 'Parts'}>
      <div className="overflow-x-auto">
        <table className="w-full text-left">
          <thead className="text-pencil">
            <tr className="border-b border-rule">
              {!alone && (
                <th scope="col" className="px-4 py-2 font-normal">
                  Part
                </th>
              )}
              <th scope="col" className="px-4 py-2 font-normal">
                Product
              </th>
              {headings.slice(0, alone ? 1 : 3).map((heading) => (
                <th key={heading} scope="col" className="px-4 text-right font-normal whitespace-nowrap">
                  {heading}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {proportions.map((part, index) => (
              <tr key={part.part} className="border-b border-rule last:border-b-0">
                {!alone && <td className="px-4 py-2 align-top">{part.part}</td>}
                <td className="px-4 py-2 align-top">
                  <Link to={paths.product(part.productId)} className="text-resin hover:underline">
                    {part.name}
                  </Link>
                  {mix.parts[index]?.product.status === 'withdrawn' && <span className="text-pencil"> withdrawn</span>}
                </td>
                <td className={numeric}>
                  <FigureView figure={part.density} />
                </td>
                {!alone &&
                  [byVolume[index], byWeight[index]].map((figure, at) => (
                    <td key={headings[at + 1]} className={numeric}>
                      {figure && <FigureView figure={figure} />}
                    </td>
                  ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {!alone && (
        <p className="border-t border-rule px-4 py-2 text-pencil">
          {ratioByVolume ?? 'Not stated'} by volume, {ratioByWeight ?? 'not stated'} by weight. What is not stated itself is worked out
          through the densities.
        </p>
      )}
    </Card>
  )
}
