import type { SubmitEvent } from 'react'
import { peopleEndpoints } from '../../../shared/api/people.ts'
import { useSubmit } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { SelectField, TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { usePeopleChanges } from './queries.ts'

/** Name, address and role of a new person; the invitation goes by mail. */
export function InviteForm({ onDone }: { onDone: () => void }) {
  const { invite } = usePeopleChanges()
  const { submit, problems, busy } = useSubmit(peopleEndpoints.invite.body, invite)
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    if (await submit(Object.fromEntries(new FormData(event.currentTarget)))) onDone()
  }
  return (
    <form onSubmit={onSubmit} className="flex flex-col gap-4">
      <ProblemSummary problems={problems} />
      <TextField label="Name" name="name" autoComplete="off" error={problems.fields['name']} />
      <TextField label="E-mail address" name="email" type="email" autoComplete="off" error={problems.fields['email']} />
      <SelectField label="Role" name="role" defaultValue="crew" error={problems.fields['role']}>
        <option value="crew">Crew: opens the site cards of its jobs</option>
        <option value="estimator">Estimator: drafts, jobs, specifications</option>
        <option value="lead">Technical lead: everything</option>
      </SelectField>
      <div>
        <Button type="submit" look="primary" busy={busy}>
          Send invitation
        </Button>
      </div>
    </form>
  )
}
