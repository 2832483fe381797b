import { AppError } from '../../../shared/api/errors.ts'
import type { User } from '../../../shared/api/session.ts'
import type { SiteCard } from '../../../shared/api/site-cards.ts'
import type { EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { Fact } from '../../../shared/domain/fact.ts'
import { can } from '../../../shared/domain/access.ts'
import type { Database } from '../../db/open.ts'
import { isOnJob, listJobs, readJob } from '../jobs/queries.ts'
import { readFirm } from '../people/queries.ts'

/** Open jobs whose card the person may open. */
export function listSiteCards(db: Database, user: User, query: { q: string; sort: string; limit: number; cursor?: string | undefined }) {
  return listJobs(db, { ...query, status: 'open', ...(can(user.role, 'job:read') ? {} : { ofPerson: user.id }) })
}

const withoutPrices = (facts: Fact[]) => facts.filter((fact) => fact.property !== 'packPrice')

/** The facts of a build-up as a crew may have them. */
function forCrew(input: EvaluationInput): EvaluationInput {
  const products = Object.fromEntries(
    Object.entries(input.products).map(([id, product]) => [id, { ...product, facts: withoutPrices(product.facts) }]),
  )
  const mixes = Object.fromEntries(
    Object.entries(input.mixes).map(([id, mix]) => [
      id,
      {
        ...mix,
        facts: withoutPrices(mix.facts),
        parts: mix.parts.map(({ part, product }) => ({ part, product: { ...product, facts: withoutPrices(product.facts) } })),
      },
    ]),
  )
  return { ...input, mixes, products }
}

/**
 * The card of a job. A job that the person is not on is not there for them.
 * @throws AppError `not-found`
 */
export async function readSiteCard(db: Database, { jobId, user, now }: { jobId: string; user: User; now: number }): Promise<SiteCard> {
  if (!can(user.role, 'job:read') && !(await isOnJob(db, { jobId, personId: user.id }))) throw new AppError('not-found')
  const [job, firm] = await Promise.all([readJob(db, { jobId, now }), readFirm(db)])
  return {
    jobId: job.id,
    number: job.number,
    name: job.name,
    site: job.site,
    startsAt: job.startsAt,
    timeZone: job.timeZone,
    conditions: job.conditions,
    bays: job.bays,
    buildUp: job.buildUp && { ...job.buildUp, releaseReasons: {}, input: forCrew(job.buildUp.input) },
    firm: { name: firm.name, phone: firm.phone },
    asOf: job.updatedAt,
  }
}
