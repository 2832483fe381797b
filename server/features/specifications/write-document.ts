import { AppError } from '../../../shared/api/errors.ts'
import type { SpecSummary } from '../../../shared/api/specifications.ts'
import type { EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { SpecDocument, SpecHeader } from '../../../shared/domain/specification/document.ts'
import type { SpecInput } from '../../../shared/domain/specification/floor.ts'
import { specify } from '../../../shared/domain/specification/specify.ts'
import type { Database } from '../../db/open.ts'
import { readJob } from '../jobs/queries.ts'
import { readFirm } from '../people/queries.ts'

export const noBuildUp = 'This job has no released build-up yet. Choose one on the job’s page, then write its specification.'

type JobRead = Awaited<ReturnType<typeof readJob>>
export type JobWithFloor = JobRead & { buildUp: NonNullable<JobRead['buildUp']> }

/**
 * A job that can be specified: its build-up version has been released, now or once.
 * @throws AppError `invalid`, `not-found`
 */
export async function jobToSpecify(db: Database, place: { jobId: string; now: number }): Promise<JobWithFloor> {
  const { buildUp, ...job } = await readJob(db, place)
  if (!buildUp || (buildUp.status !== 'released' && buildUp.status !== 'superseded')) throw new AppError('invalid', { message: noBuildUp })
  return { ...job, buildUp }
}

/** The calendar day at an instant where the job is. */
function dayIn(timeZone: string, now: number): string {
  return new Intl.DateTimeFormat('en-CA', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(now)
}

interface Wanted {
  summary: Pick<SpecSummary, 'jobId' | 'title' | 'sectionNumber'>
  issue: SpecHeader['issue']
  now: number
}

export interface Written {
  document: SpecDocument
  job: JobWithFloor
  /** All that it was written from. */
  facts: SpecInput
  revisionIds: string[]
}

/** Every sheet revision that a floor's facts and records rest on. */
export function revisionsOf({ mixes, products }: EvaluationInput): string[] {
  const holders = [
    ...Object.values(mixes),
    ...Object.values(mixes).flatMap(({ parts }) => parts.map(({ product }) => product)),
    ...Object.values(products),
  ]
  const cited = holders.flatMap(({ facts }) =>
    facts.flatMap(({ origin }) => (origin.kind === 'stated' ? [origin.citation.revisionId] : [])),
  )
  return [...new Set([...holders.flatMap(({ sheets }) => sheets.map(({ revisionId }) => revisionId)), ...cited])]
}

/** Writes the document of a job as the facts are now. */
export async function writeDocument(db: Database, { summary, issue, now }: Wanted): Promise<Written> {
  const [job, firm] = await Promise.all([jobToSpecify(db, { jobId: summary.jobId, now }), readFirm(db)])
  const { number, name, version, status, releasedAt, releasedByName, releaseReasons, input } = job.buildUp
  const facts: SpecInput = {
    header: {
      firm: { name: firm.name, address: firm.address, phone: firm.phone },
      project: job.name,
      jobNumber: job.number,
      client: job.client,
      site: job.site,
      sectionNumber: summary.sectionNumber,
      sectionTitle: summary.title,
      date: dayIn(job.timeZone, now),
      issue,
    },
    buildUp: { number, name, version, status, releasedAt, releasedByName },
    input,
    reasons: releaseReasons,
    bays: job.bays,
    texture: job.conditions.texture,
    loss: job.loss,
  }
  return { document: specify(facts), job, facts, revisionIds: revisionsOf(input) }
}
