import { useQuery } from '@tanstack/react-query'
import { type SubmitEvent, useState } from 'react'
import { Navigate, useNavigate, useSearchParams } from 'react-router'
import { sessionEndpoints } from '../../../shared/api/session.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { FirstLeadForm } from './first-lead-form.tsx'
import { ForgottenPassword } from './forgotten-password.tsx'
import { startOptions, useSignIn, useWho } from './queries.ts'

/** Where to go after signing in: only addresses of this site. */
function destination(search: URLSearchParams): string {
  const to = search.get('to') ?? ''
  return /^\/(?![/\\])/.test(to) ? to : paths.home
}

/** The door: sign in, ask for a new password, or found the firm. */
export function SignInPage() {
  const who = useWho()
  const [search] = useSearchParams()
  const start = useQuery(startOptions)
  if (who.data) return <Navigate to={destination(search)} replace />
  return (
    <main id="main" className="mx-auto w-full max-w-md px-4 py-12">
      <Asking query={start} says={sentenceOf}>
        {({ firmName, demo, needsFirstLead }) => (
          <>
            <title>{needsFirstLead ? 'Start · Wearcourse' : 'Sign in · Wearcourse'}</title>
            <p className="text-section font-bold">Wearcourse</p>
            {needsFirstLead ? <FirstLeadForm /> : <SignInForm firmName={firmName} />}
            {demo && !needsFirstLead && <DemoAccounts {...demo} />}
          </>
        )}
      </Asking>
    </main>
  )
}

function SignInForm({ firmName }: { firmName: string }) {
  const signIn = useSignIn()
  const navigate = useNavigate()
  const [search] = useSearchParams()
  const [forgotten, setForgotten] = useState(false)
  const { submit, problems, busy } = useSubmit(sessionEndpoints.signIn.body, signIn)
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const user = await submit(Object.fromEntries(new FormData(event.currentTarget)))
    if (user) await navigate(destination(search), { replace: true })
  }
  if (forgotten) return <ForgottenPassword onBack={() => setForgotten(false)} />
  return (
    <>
      <h1 className="mb-4 text-title">Sign in to {firmName}</h1>
      <ProblemSummary problems={problems} />
      <form onSubmit={onSubmit} className="border border-rule bg-card p-5">
        <TextField
          label="E-mail address"
          name="email"
          type="email"
          autoComplete="username"
          required
          error={problems.fields['email']}
          className="mb-4"
        />
        <TextField
          label="Password"
          name="password"
          type="password"
          autoComplete="current-password"
          required
          error={problems.fields['password']}
          className="mb-5"
        />
        <div className="flex flex-wrap items-center justify-between gap-3">
          <Button type="submit" look="primary" busy={busy}>
            Sign in
          </Button>
          <Button look="quiet" onClick={() => setForgotten(true)}>
            Set a new password
          </Button>
        </div>
      </form>
    </>
  )
}

function DemoAccounts({ emails, password }: { emails: string[]; password: string }) {
  const fill = (email: string) => {
    const set = (name: string, value: string) => {
      const input = document.querySelector<HTMLInputElement>(`input[name="${name}"]`)
      if (input) input.value = value
    }
    set('email', email)
    set('password', password)
  }
  return (
    <section className="mt-6 border-l-4 border-resin bg-card px-4 py-3">
      <h2 className="font-semibold">This is the demo</h2>
      <p className="text-pencil">All data is invented. Password for all three: {password}</p>
      <ul className="mt-1">
        {emails.map((email) => (
          <li key={email}>
            <button type="button" className="min-h-7 text-resin underline underline-offset-4" onClick={() => fill(email)}>
              {email}
            </button>
          </li>
        ))}
      </ul>
    </section>
  )
}
