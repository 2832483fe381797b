import type { CourseResult, Proportion } from '../../../shared/domain/evaluation.ts'
import type { Figure } from '../../../shared/domain/figure.ts'
import { type ShownSystem, formatNumber, formatRange, formatWindowFigure, shownUnit } from '../../../shared/domain/format.ts'
import { convert } from '../../../shared/domain/units.ts'
import { FigureView } from '../../ui/figure-view.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'
import { Hazards } from './hazards.tsx'

type Row = { label: string; figure: Figure; text?: string }

/** Square metres of 1,000 ft²: 1000 × 0.3048², exact. */
const thousandSquareFeet = 1000 * 0.3048 ** 2

/** Resin is told per 1,000 ft² in gallons or per 100 m² in litres: the area changes with the unit. */
function resinRow(figure: Figure, system: ShownSystem): Row {
  if (figure.kind === 'not-stated') return { label: 'Mixed resin', figure }
  const { unit } = figure.value
  const shown = shownUnit(unit, system)
  const label = `Mixed resin per ${shown === 'gal' ? '1,000 ft²' : '100 m²'}`
  if (shown === unit) return { label, figure }
  const scale = shown === 'L' ? 100 / thousandSquareFeet : thousandSquareFeet / 100
  const scaled = (end: number | undefined) => (end === undefined ? undefined : convert({ value: end * scale, unit }, shown).value)
  const [min, max] = [scaled(figure.value.min), scaled(figure.value.max)]
  return { label, figure, text: formatRange({ ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }), unit: shown }) }
}

function rowsOf(result: CourseResult, system: ShownSystem): Row[] {
  const {
    wetFilm,
    dryFilm,
    spreadRate,
    resinPerArea,
    aggregatePerArea,
    potLife,
    workingTime,
    window,
    footTraffic,
    vehicleTraffic,
    fullCure,
    voc,
  } = result
  return [
    { label: 'Wet film', figure: wetFilm },
    { label: 'Dry film', figure: dryFilm },
    { label: 'Spread rate', figure: spreadRate },
    resinRow(resinPerArea, system),
    ...(aggregatePerArea ? [{ label: 'Sand', figure: aggregatePerArea }] : []),
    { label: 'Pot life', figure: potLife },
    { label: 'Working time on the floor', figure: workingTime },
    { label: 'Window for the next course', figure: window, text: formatWindowFigure(window) },
    { label: 'Foot traffic', figure: footTraffic },
    { label: 'Vehicle traffic', figure: vehicleTraffic },
    { label: 'Full cure', figure: fullCure },
    { label: 'VOC', figure: voc },
  ]
}

/** All that a course comes to: each figure with how it is known. */
export function CourseFigures({ result }: { result: CourseResult }) {
  const { system } = useUnitSystem()
  return (
    <div className="grid gap-x-8 gap-y-4 sm:grid-cols-2">
      <dl className="grid grid-cols-[minmax(0,1fr)_auto] content-start">
        {rowsOf(result, system).map(({ label, figure, text }) => (
          <div key={label} className="contents">
            <dt className="border-b border-rule py-1 text-pencil">{label}</dt>
            <dd className="border-b border-rule py-1 pl-4 text-right">
              <FigureView figure={figure} {...(text ? { text } : {})} />
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
        Mix{' '}
        {[result.ratioByVolume && `${result.ratioByVolume} by volume`, result.ratioByWeight && `${result.ratioByWeight} by weight`]
          .filter(Boolean)
          .join(', ')}
      </caption>
      <thead>
        <tr className="border-b border-ink text-pencil">
          <th scope="col" className="py-1 font-normal">
            Part
          </th>
          <th scope="col" className="py-1 text-right font-normal">
            by volume
          </th>
          <th scope="col" className="py-1 text-right font-normal">
            by weight
          </th>
          <th scope="col" className="py-1 text-right font-normal">
            density
          </th>
        </tr>
      </thead>
      <tbody>
        {result.proportions.map((proportion: Proportion) => (
          <tr key={proportion.part} className="border-b border-rule">
            <th scope="row" className="py-1 font-normal">
              {proportion.part} <span className="text-pencil">{proportion.name}</span>
            </th>
            <td className="py-1 pl-3 text-right whitespace-nowrap">{share(proportion.volumeShare)}</td>
            <td className="py-1 pl-3 text-right whitespace-nowrap">{share(proportion.massShare)}</td>
            <td className="py-1 pl-3 text-right whitespace-nowrap">
              <FigureView figure={proportion.density} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
