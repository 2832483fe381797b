import { Link } from 'react-router'
import type { SpecSummary } from '../../../shared/api/specifications.ts'
import { paths } from '../../lib/paths.ts'
import { Card } from '../../ui/page.tsx'
import { files } from './queries.ts'

const dateOf = (instant: string) => new Date(instant).toLocaleDateString('en-US', { dateStyle: 'medium' })

/** Issues of a specification, newest first, each with its frozen files. */
export function IssuesCard({ specification: { id, issues } }: { specification: Pick<SpecSummary, 'id' | 'issues'> }) {
  return (
    <Card title="Issues">
      {issues.length === 0 && <p className="px-4 py-3 text-pencil">Not issued yet.</p>}
      <ul>
        {issues.map(({ number, issuedAt, issuedByName }) => (
          <li key={number} className="border-b border-rule px-4 py-2 last:border-b-0">
            <Link to={paths.issue(id, number)} className="font-semibold text-resin underline-offset-4 hover:underline">
              Issue {number}
            </Link>
            <span className="block text-small text-pencil">
              {dateOf(issuedAt)}, {issuedByName}
            </span>
            <span className="flex gap-4">
              <a href={files.issue(id, number, 'docx')} download className="text-resin underline-offset-4 hover:underline">
                DOCX
              </a>
              <a href={files.issue(id, number, 'pdf')} download className="text-resin underline-offset-4 hover:underline">
                PDF
              </a>
            </span>
          </li>
        ))}
      </ul>
    </Card>
  )
}
