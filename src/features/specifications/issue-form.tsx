import { useState } from 'react'
import { useNavigate } from 'react-router'
import type { Specification } from '../../../shared/api/specifications.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { useUser } from '../../lib/user.ts'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/page.tsx'
import { useSpecificationWork } from './queries.ts'

/** Says what issuing does, and does it. */
export function IssueForm({ specification, onDone }: { specification: Specification; onDone: () => void }) {
  const [problem, setProblem] = useState<string>()
  const [busy, setBusy] = useState(false)
  const work = useSpecificationWork()
  const navigate = useNavigate()
  const user = useUser()
  const { unknowns, overrides } = specification.document.front
  const issue = async () => {
    setBusy(true)
    try {
      const made = await work.issue(specification)
      onDone()
      await navigate(paths.issue(specification.id, made.number))
    } catch (error) {
      setProblem(sentenceOf(error))
      setBusy(false)
    }
  }
  return (
    <div className="grid gap-3">
      {problem && <Notice tone="stop">{problem}</Notice>}
      <p>
        Issue {(specification.issues[0]?.number ?? 0) + 1} will be numbered, dated today and signed by {user.name}. Its text, its facts and
        both files are kept as they are now and never change.
      </p>
      <p>
        It states {unknowns.length === 1 ? 'one thing' : `${unknowns.length} things`} that no sheet says and{' '}
        {overrides.length === 1 ? 'one check' : `${overrides.length} checks`} not met or accepted with a reason.
      </p>
      <span>
        <Button look="primary" busy={busy} onClick={() => void issue()}>
          Issue
        </Button>
      </span>
    </div>
  )
}
