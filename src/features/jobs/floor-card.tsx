import { Link } from 'react-router'
import type { Job } from '../../../shared/api/jobs.ts'
import { sectionLayers } from '../../../shared/drawing/section-layer.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { SelectField } from '../../ui/field.tsx'
import { FindingList } from '../../ui/finding-list.tsx'
import { Card, Notice } from '../../ui/page.tsx'
import { SectionFigure } from '../../ui/section-figure.tsx'
import { useEvaluated } from './evaluated.ts'
import type { JobFormPart } from './job-form-part.ts'
import { useReleasedBuildUps } from './queries.ts'

/** Which floor is laid here, and what the checks say of it at this job's conditions. */
export function FloorCard({ body, change, fields, disabled, job }: JobFormPart & { job: Job | undefined }) {
  const released = useReleasedBuildUps()
  const worked = useEvaluated(body, job)
  return (
    <Card
      title="Floor"
      actions={
        worked && (
          <Link className="text-resin hover:underline" to={paths.buildUp(worked.buildUp.buildUpId, worked.buildUp.version)}>
            Open the build-up
          </Link>
        )
      }
    >
      <div className="p-4">
        <Asking query={released} says={sentenceOf}>
          {(list) => (
            <SelectField
              label="Build-up"
              name="buildUpVersionId"
              value={body.buildUpVersionId ?? ''}
              disabled={disabled}
              error={fields['buildUpVersionId']}
              help={list.length === 0 ? 'No build-up is released yet. A technical lead releases one.' : 'Released versions only.'}
              onChange={(event) => change({ buildUpVersionId: event.target.value || null })}
            >
              <option value="">None chosen</option>
              {job?.buildUp && !list.some(({ versionId }) => versionId === job.buildUp?.versionId) && (
                <option value={job.buildUp.versionId}>
                  {job.buildUp.name}, version {job.buildUp.version} ({job.buildUp.status})
                </option>
              )}
              {list.map((one) => (
                <option key={one.versionId} value={one.versionId}>
                  {one.name}, version {one.version}
                </option>
              ))}
            </SelectField>
          )}
        </Asking>
      </div>
      {body.buildUpVersionId && !worked && <Notice>Save the job to see this floor worked out.</Notice>}
      {worked && (
        <>
          <div className="overflow-x-auto border-t border-rule px-4 py-3">
            <SectionFigure layers={sectionLayers(worked.input, worked.evaluation)} width={600} height={380} unit="mil" standalone />
          </div>
          <div className="border-t border-rule p-4">
            <h3 className="mb-2">Checks at this job’s conditions</h3>
            <FindingList
              findings={worked.evaluation.findings}
              titles={Object.fromEntries(worked.input.courses.map(({ id, title }) => [id, title]))}
            />
          </div>
        </>
      )}
    </Card>
  )
}
