import { type SubmitEvent, useState } from 'react'
import type { Firm } from '../../../shared/api/people.ts'
import { peopleEndpoints } from '../../../shared/api/people.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { AreaField, TextField } from '../../ui/field.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { useChangeFirm, useFirm } from './queries.ts'

/** The firm's name on documents, and its own limits. */
export function FirmPage() {
  const firm = useFirm()
  return (
    <Page title="Firm">
      <Asking query={firm} says={sentenceOf}>
        {(data) => <FirmForm key={data.version} firm={data} />}
      </Asking>
    </Page>
  )
}

function FirmForm({ firm }: { firm: Firm }) {
  const change = useChangeFirm()
  const [saved, setSaved] = useState(false)
  const { submit, problems, busy } = useSubmit(peopleEndpoints.changeFirm.body, change)
  const { fields } = problems
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const { sheetAgeLimitYears, ...rest } = Object.fromEntries(new FormData(event.currentTarget))
    setSaved(Boolean(await submit({ ...rest, version: firm.version, sheetAgeLimitYears: Number(sheetAgeLimitYears) })))
  }
  return (
    <Card className="max-w-xl">
      <form onSubmit={onSubmit} className="flex flex-col gap-4 p-4">
        <ProblemSummary problems={problems} />
        {saved && <Notice>Saved.</Notice>}
        <TextField label="Name" name="name" defaultValue={firm.name} error={fields['name']} />
        <AreaField label="Address" name="address" defaultValue={firm.address} error={fields['address']} />
        <TextField label="Telephone" name="phone" defaultValue={firm.phone} error={fields['phone']} />
        <TextField
          label="Oldest safety sheet to accept"
          name="sheetAgeLimitYears"
          inputMode="decimal"
          defaultValue={String(firm.sheetAgeLimitYears)}
          unit="years"
          help="Older ones are called out by the check of sheets."
          error={fields['sheetAgeLimitYears']}
        />
        <div>
          <Button type="submit" look="primary" busy={busy}>
            Save
          </Button>
        </div>
      </form>
    </Card>
  )
}
