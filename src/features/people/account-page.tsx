import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type SubmitEvent, useState } from 'react'
import { useNavigate } from 'react-router'
import { sessionEndpoints } from '../../../shared/api/session.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { useUser } from '../../lib/user.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { changePassword, signOutEverywhere } from './queries.ts'

/** The own account: password and sessions. */
export function AccountPage() {
  const user = useUser()
  const [changed, setChanged] = useState(false)
  const { submit, problems, busy } = useSubmit(sessionEndpoints.changePassword.body, async (body) => {
    await changePassword(body)
    return true
  })
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = event.currentTarget
    if (await submit(Object.fromEntries(new FormData(form)))) {
      form.reset()
      setChanged(true)
    }
  }
  return (
    <Page title={user.name} under={user.email}>
      <div className="grid max-w-3xl gap-5">
        <Card title="Change the password">
          <form onSubmit={onSubmit} className="flex max-w-md flex-col gap-4 p-4">
            <ProblemSummary problems={problems} />
            {changed && <Notice>The password is changed. All other devices are signed out.</Notice>}
            <TextField
              label="Present password"
              name="currentPassword"
              type="password"
              autoComplete="current-password"
              required
              error={problems.fields['currentPassword']}
            />
            <TextField
              label="New password"
              name="newPassword"
              type="password"
              autoComplete="new-password"
              help="At least 12 characters."
              required
              error={problems.fields['newPassword']}
            />
            <div>
              <Button type="submit" look="primary" busy={busy}>
                Change password
              </Button>
            </div>
          </form>
        </Card>
        <SessionsCard />
      </div>
    </Page>
  )
}

function SessionsCard() {
  const client = useQueryClient()
  const navigate = useNavigate()
  const leave = useMutation({
    mutationFn: signOutEverywhere,
    onSuccess: async () => {
      await navigate(paths.signIn)
      client.clear()
    },
  })
  return (
    <Card title="Signed-in devices">
      <div className="p-4">
        <p className="mb-3">A lost phone stays signed in for up to seven days without use. This ends every session, this one too.</p>
        {leave.error && <Notice tone="stop">{sentenceOf(leave.error)}</Notice>}
        <Button look="stop" busy={leave.isPending} onClick={() => leave.mutate()}>
          Sign out everywhere
        </Button>
      </div>
    </Card>
  )
}
