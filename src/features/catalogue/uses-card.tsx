import { Link } from 'react-router'
import type { MixRecord } from '../../../shared/api/catalogue.ts'
import { paths } from '../../lib/paths.ts'
import { Card } from '../../ui/page.tsx'

const addressOf = { mix: paths.mix, 'build-up': paths.buildUp, job: paths.job, specification: paths.specification } as const
const names = { mix: 'Mix', 'build-up': 'Build-up', job: 'Job', specification: 'Specification' } as const

/** Mixes, build-ups and jobs that rest on this record. */
export function UsesCard({ uses }: { uses: MixRecord['usedIn'] }) {
  return (
    <Card title="Where it is used">
      {uses.length === 0 && <p className="p-4 text-pencil">Nowhere yet.</p>}
      <ul>
        {uses.map((use) => (
          <li key={`${use.kind} ${use.id} ${use.version ?? ''}`} className="border-b border-rule px-4 py-2 last:border-b-0">
            <span className="text-pencil">{names[use.kind]}</span>{' '}
            <Link
              to={use.kind === 'build-up' && use.version !== null ? paths.buildUp(use.id, use.version) : addressOf[use.kind](use.id)}
              className="text-resin hover:underline"
            >
              {use.name}
              {use.version !== null && `, version ${use.version}`}
            </Link>
          </li>
        ))}
      </ul>
    </Card>
  )
}
