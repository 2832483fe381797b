import { SelectField, TextField } from '../../ui/field.tsx'
import { Card } from '../../ui/page.tsx'
import type { JobFormPart } from './job-form-part.ts'

/** The instant as `datetime-local` shows it in the browser's own zone, and back. */
const toLocal = (instant: string | null) => {
  if (!instant) return ''
  const date = new Date(instant)
  return new Date(date.getTime() - date.getTimezoneOffset() * 60_000).toISOString().slice(0, 16)
}
const fromLocal = (text: string) => (text ? new Date(text).toISOString() : null)

const zones = Intl.supportedValuesOf('timeZone')

/** What and where, and when work is to begin. */
export function DetailsCard({ body, change, fields, disabled }: JobFormPart) {
  return (
    <Card title="Job">
      <div className="grid gap-4 p-4 sm:grid-cols-2">
        <TextField
          label="Name"
          name="name"
          value={body.name}
          error={fields['name']}
          disabled={disabled}
          className="sm:col-span-2"
          onChange={(event) => change({ name: event.target.value })}
        />
        <TextField
          label="Client"
          name="client"
          value={body.client}
          error={fields['client']}
          disabled={disabled}
          onChange={(event) => change({ client: event.target.value })}
        />
        <TextField
          label="Site"
          name="site"
          value={body.site}
          error={fields['site']}
          disabled={disabled}
          onChange={(event) => change({ site: event.target.value })}
        />
        <TextField
          label="Planned start of the first course"
          name="startsAt"
          type="datetime-local"
          value={toLocal(body.startsAt)}
          error={fields['startsAt']}
          disabled={disabled}
          help="In this device's time."
          onChange={(event) => change({ startsAt: fromLocal(event.target.value) })}
        />
        <SelectField
          label="Time zone of the site"
          name="timeZone"
          value={body.timeZone}
          error={fields['timeZone']}
          disabled={disabled}
          onChange={(event) => change({ timeZone: event.target.value })}
        >
          {[...new Set([body.timeZone, ...zones])].map((zone) => (
            <option key={zone}>{zone}</option>
          ))}
        </SelectField>
        <SelectField
          label="Standing"
          name="status"
          value={body.status}
          disabled={disabled}
          onChange={(event) => change({ status: event.target.value === 'closed' ? 'closed' : 'open' })}
        >
          <option value="open">Open</option>
          <option value="closed">Closed</option>
        </SelectField>
      </div>
    </Card>
  )
}
