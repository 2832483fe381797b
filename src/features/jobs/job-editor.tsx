import { useState } from 'react'
import { Link, useBlocker, useNavigate } from 'react-router'
import { type Job, type JobBody, jobEndpoints } from '../../../shared/api/jobs.ts'
import { AppError } from '../../../shared/api/errors.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Notice, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { BaysCard } from './bays-card.tsx'
import { ConditionsCard } from './conditions-card.tsx'
import { CrewCard } from './crew-card.tsx'
import { DetailsCard } from './details-card.tsx'
import { FloorCard } from './floor-card.tsx'
import type { JobFormPart } from './job-form-part.ts'
import { bodyOf, emptyBody } from './job-body.ts'
import { QuantitiesCards } from './quantities-cards.tsx'
import { useSaveJob } from './queries.ts'
import { SpecificationCard } from './specification-card.tsx'

/** The whole job as one form; figures follow every edit, saving is one action. */
export function JobEditor({ job }: { job: Job | undefined }) {
  const [body, setBody] = useState<JobBody>(() => (job ? bodyOf(job) : emptyBody()))
  const [saved, setSaved] = useState(body)
  const [base, setBase] = useState(job)
  const [conflict, setConflict] = useState(false)
  const mayWrite = useCan('job:write')
  const save = useSaveJob()
  const navigate = useNavigate()
  const dirty = body !== saved
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => dirty && currentLocation.pathname !== nextLocation.pathname && !leaving.now,
  )
  const { submit, problems, busy } = useSubmit(jobEndpoints.addJob.body, async (checked) => {
    try {
      return base ? await save.change(base, checked) : await save.add(checked)
    } catch (error) {
      setConflict(error instanceof AppError && error.code === 'conflict')
      throw error
    }
  })
  const onSave = async () => {
    const kept = await submit(body)
    if (!kept) return
    setSaved(body)
    setBase(kept)
    setConflict(false)
    if (!base) {
      leaving.now = true
      await navigate(paths.job(kept.id), { replace: true })
      leaving.now = false
    }
  }
  const part: JobFormPart = {
    body,
    change: (changes) => setBody((before) => ({ ...before, ...changes })),
    fields: problems.fields,
    disabled: !mayWrite,
  }
  return (
    <Page
      title={base ? base.name : 'Open a job'}
      under={base && `J-${String(base.number).padStart(3, '0')}, ${base.status}. ${dirty ? 'Changed, not saved.' : 'Saved.'}`}
      actions={
        <>
          {base && (
            <Link to={paths.siteCard(base.id)} className={buttonClass()}>
              Site card
            </Link>
          )}
          {mayWrite && (
            <Button look="primary" busy={busy} disabled={!dirty && Boolean(base)} onClick={() => void onSave()}>
              {base ? 'Save' : 'Open the job'}
            </Button>
          )}
        </>
      }
    >
      <ProblemSummary problems={problems} />
      {conflict && base && (
        <Notice tone="caution">
          <p className="mb-2">Someone else saved this job meanwhile. Your changes are still here, but they cannot be saved over theirs.</p>
          <Button onClick={() => window.location.reload()}>Load theirs and give up mine</Button>
        </Notice>
      )}
      {blocker.state === 'blocked' && (
        <Notice tone="caution">
          <p className="mb-2">There are changes that are not saved.</p>
          <span className="flex gap-2">
            <Button onClick={() => blocker.reset()}>Stay here</Button>
            <Button look="stop" onClick={() => blocker.proceed()}>
              Leave without saving
            </Button>
          </span>
        </Notice>
      )}
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
        <div className="grid content-start gap-5">
          <DetailsCard {...part} />
          <BaysCard {...part} />
          <ConditionsCard {...part} />
        </div>
        <div className="grid content-start gap-5">
          <FloorCard {...part} job={base} />
          {base && <SpecificationCard job={base} dirty={dirty} />}
          <QuantitiesCards body={body} job={base} />
          <CrewCard {...part} job={base} />
        </div>
      </div>
    </Page>
  )
}

/** Set while the page itself moves on after the first save. */
const leaving = { now: false }
