import { useState } from 'react'
import { Link, useNavigate } from 'react-router'
import type { Job } from '../../../shared/api/jobs.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { Card, Notice } from '../../ui/page.tsx'
import { useSpecificationWork, useSpecificationsOf } from '../specifications/queries.ts'

/** The written specifications of a job; a new one is written from the build-up that is saved. */
export function SpecificationCard({ job, dirty }: { job: Job; dirty: boolean }) {
  const [problem, setProblem] = useState<string>()
  const [busy, setBusy] = useState(false)
  const mayWrite = useCan('specification:write')
  const work = useSpecificationWork()
  const navigate = useNavigate()
  const begin = async () => {
    setBusy(true)
    try {
      const made = await work.add(job.id)
      await navigate(paths.specification(made.id))
    } catch (error) {
      setProblem(sentenceOf(error))
    } finally {
      setBusy(false)
    }
  }
  return (
    <Card
      title="Specification"
      actions={
        mayWrite && (
          <Button className="no-print" busy={busy} disabled={dirty || !job.buildUp} onClick={() => void begin()}>
            Write a specification
          </Button>
        )
      }
    >
      {problem && <Notice tone="stop">{problem}</Notice>}
      <Asking query={useSpecificationsOf(job.id)} says={sentenceOf}>
        {({ items }) => (
          <ul>
            {items.map(({ id, sectionNumber, title, issues: [last] }) => (
              <li key={id} className="border-b border-rule px-4 py-2 last:border-b-0">
                <Link to={paths.specification(id)} className="font-semibold text-resin underline-offset-4 hover:underline">
                  {sectionNumber} {title}
                </Link>
                <span className="block text-small text-pencil">
                  {last ? `Issue ${last.number}, by ${last.issuedByName}` : 'Draft, not issued'}
                </span>
              </li>
            ))}
            {items.length === 0 && (
              <li className="px-4 py-3 text-pencil">
                {job.buildUp
                  ? dirty
                    ? 'Save the job, then write its specification.'
                    : 'None yet.'
                  : 'Choose a released build-up and save, then write its specification.'}
              </li>
            )}
          </ul>
        )}
      </Asking>
    </Card>
  )
}
