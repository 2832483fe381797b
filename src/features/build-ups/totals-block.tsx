import type { VersionSummary } from '../../../shared/api/build-ups.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import { FigureView } from '../../ui/figure-view.tsx'

/** The drawing's title block: what the floor comes to and who answers for it. */
export function TotalsBlock({ totals, version }: { totals: Evaluation['totals']; version: VersionSummary }) {
  const cells: [string, React.ReactNode][] = [
    ['Total build, dry', <FigureView key="t" figure={totals.thickness} />],
    ['VOC, worst', <FigureView key="v" figure={totals.vocWorst} />],
    ['To feet', <FigureView key="f" figure={totals.hoursToFoot} />],
    ['To vehicles', <FigureView key="w" figure={totals.hoursToVehicles} />],
    ['Dew point', <FigureView key="d" figure={totals.dewPoint} />],
    ['Version', `${version.number}, ${version.status}`],
    ['Released by', version.releasedByName ?? 'not released'],
    [
      'Released on',
      version.releasedAt
        ? new Date(version.releasedAt).toLocaleDateString('en-US', { day: 'numeric', month: 'short', year: 'numeric' })
        : 'not released',
    ],
  ]
  return (
    <dl className="mt-4 grid break-inside-avoid grid-cols-2 border-t border-ink">
      {cells.map(([label, value]) => (
        <div key={label} className="border-b border-rule px-1.5 py-1 odd:border-r">
          <dt className="text-[12px]/[16px] text-pencil">{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  )
}
