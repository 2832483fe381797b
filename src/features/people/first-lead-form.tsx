import type { SubmitEvent } from 'react'
import { useNavigate } from 'react-router'
import { sessionEndpoints } from '../../../shared/api/session.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { useMakeFirstLead } from './queries.ts'

/** Nobody is here yet: the person at the machine founds the firm with the code printed at the start. */
export function FirstLeadForm() {
  const make = useMakeFirstLead()
  const navigate = useNavigate()
  const { submit, problems, busy } = useSubmit(sessionEndpoints.makeFirstLead.body, make)
  const { fields } = problems
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    if (await submit(Object.fromEntries(new FormData(event.currentTarget)))) await navigate(paths.home, { replace: true })
  }
  return (
    <>
      <h1 className="mb-4 text-title">Start a new firm</h1>
      <ProblemSummary problems={problems} />
      <form onSubmit={onSubmit} className="flex flex-col gap-4 border border-rule bg-card p-5">
        <TextField
          label="Code"
          name="code"
          help="Printed where Wearcourse was started."
          autoComplete="off"
          required
          error={fields['code']}
        />
        <TextField label="Name of the firm" name="firmName" autoComplete="organization" required error={fields['firmName']} />
        <TextField label="Your name" name="name" autoComplete="name" required error={fields['name']} />
        <TextField label="Your e-mail address" name="email" type="email" autoComplete="username" required error={fields['email']} />
        <TextField
          label="Password"
          name="password"
          type="password"
          help="At least 12 characters. A few unrelated words do well."
          autoComplete="new-password"
          required
          error={fields['password']}
        />
        <div>
          <Button type="submit" look="primary" busy={busy}>
            Start
          </Button>
        </div>
      </form>
    </>
  )
}
