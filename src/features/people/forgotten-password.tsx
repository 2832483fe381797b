import { type SubmitEvent, useState } from 'react'
import { sessionEndpoints } from '../../../shared/api/session.ts'
import { useSubmit } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { Notice } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { askForLink } from './queries.ts'

/** Asks for a link; the answer is the same for every address. */
export function ForgottenPassword({ onBack }: { onBack: () => void }) {
  const [sent, setSent] = useState(false)
  const { submit, problems, busy } = useSubmit(sessionEndpoints.askForLink.body, async (body) => {
    await askForLink(body)
    return true
  })
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    if (await submit(Object.fromEntries(new FormData(event.currentTarget)))) setSent(true)
  }
  return (
    <>
      <h1 className="mb-4 text-title">Set a new password</h1>
      {sent ? (
        <Notice>If someone here has this address, a link is on its way. It works once, within one hour.</Notice>
      ) : (
        <>
          <ProblemSummary problems={problems} />
          <form onSubmit={onSubmit} className="border border-rule bg-card p-5">
            <TextField
              label="E-mail address"
              name="email"
              type="email"
              autoComplete="username"
              required
              error={problems.fields['email']}
              className="mb-5"
            />
            <Button type="submit" look="primary" busy={busy}>
              Send me a link
            </Button>
          </form>
        </>
      )}
      <Button look="quiet" className="mt-3" onClick={onBack}>
        Back to sign in
      </Button>
    </>
  )
}
