import { type SubmitEvent, useState } from 'react'
import { Link } from 'react-router'
import { sessionEndpoints } from '../../../shared/api/session.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { Notice } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { setPassword } from './queries.ts'

/** Sets a password with the link of a mail. The token stands behind `#` and is never sent as part of an address. */
export function PasswordPage() {
  const [token] = useState(() => window.location.hash.slice(1))
  const [done, setDone] = useState(false)
  const { submit, problems, busy } = useSubmit(sessionEndpoints.setPassword.body, async (body) => {
    await setPassword(body)
    return true
  })
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const password = new FormData(event.currentTarget).get('password')
    if (await submit({ token, password })) setDone(true)
  }
  return (
    <main id="main" className="mx-auto w-full max-w-md px-4 py-12">
      <title>Set a password · Wearcourse</title>
      <p className="text-section font-bold">Wearcourse</p>
      <h1 className="mb-4 text-title">Set a password</h1>
      {done ? (
        <Notice>
          The password is set.{' '}
          <Link className="text-resin underline" to={paths.signIn}>
            Sign in
          </Link>
        </Notice>
      ) : (
        <>
          <ProblemSummary problems={problems} />
          <form onSubmit={onSubmit} className="border border-rule bg-card p-5">
            <TextField
              label="New password"
              name="password"
              type="password"
              autoComplete="new-password"
              required
              className="mb-5"
              help="At least 12 characters. A few unrelated words do well."
              error={problems.fields['password'] ?? (problems.fields['token'] && 'The link is not whole. Open it again from the mail.')}
            />
            <Button type="submit" look="primary" busy={busy}>
              Set password
            </Button>
          </form>
        </>
      )}
    </main>
  )
}
