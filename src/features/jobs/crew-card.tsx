import type { Job } from '../../../shared/api/jobs.ts'
import { sentenceOf } from '../../lib/api.ts'
import { Asking } from '../../ui/asking.tsx'
import { Card } from '../../ui/page.tsx'
import { QrCode } from '../../ui/qr-code.tsx'
import { useCrew } from '../people/queries.ts'
import type { JobFormPart } from './job-form-part.ts'

/** Who opens the site card, and the code that opens it on a phone. */
export function CrewCard({ body, change, fields, disabled, job }: JobFormPart & { job: Job | undefined }) {
  const crew = useCrew()
  const toggle = (id: string, on: boolean) => change({ crewIds: on ? [...body.crewIds, id] : body.crewIds.filter((one) => one !== id) })
  return (
    <Card title="Crew and site card">
      <div className="grid gap-4 p-4 sm:grid-cols-2">
        <fieldset>
          <legend className="mb-1 font-semibold">On this job</legend>
          <Asking query={crew} says={sentenceOf}>
            {({ items }) =>
              items.length === 0 ? (
                <p className="text-pencil">Nobody has the role crew yet. A technical lead invites people.</p>
              ) : (
                items.map((person) => (
                  <label key={person.id} className="flex min-h-9 items-center gap-2">
                    <input
                      type="checkbox"
                      className="h-5 w-5"
                      checked={body.crewIds.includes(person.id)}
                      disabled={disabled}
                      onChange={(event) => toggle(person.id, event.target.checked)}
                    />
                    {person.name}
                  </label>
                ))
              )
            }
          </Asking>
          {Object.entries(fields).map(([name, message]) =>
            name.startsWith('crewIds') ? (
              <p key={name} className="font-semibold text-stop">
                {message}
              </p>
            ) : null,
          )}
        </fieldset>
        {job && (
          <div>
            <QrCode text={job.siteCardUrl} label={`Site card of ${job.name}`} />
            <p className="mt-1 text-small text-pencil">Opens the site card on a phone of the crew. Print it for the mixing station.</p>
          </div>
        )}
      </div>
    </Card>
  )
}
