import { Router } from 'express'
import { type Job, jobEndpoints as wire } from '../../../shared/api/jobs.ts'
import type { AppContext } from '../../http/context.ts'
import { serve } from '../../http/serve.ts'
import { addJob, changeJob, listJobs, readJob } from './queries.ts'

/** Jobs: the floors to be done, for the office. What a crew sees of one is its site card. */
export function jobRoutes({ db, clock, publicUrl }: AppContext): Router {
  const router = Router()
  const answer = async (jobId: string): Promise<Job> => ({
    ...(await readJob(db, { jobId, now: clock() })),
    siteCardUrl: `${publicUrl}/site-cards/${jobId}`,
  })

  serve(router, wire.listJobs, ({ query }) => listJobs(db, query))
  serve(router, wire.addJob, async ({ body, user }) => answer(await db.transaction((tx) => addJob(tx, body, user.id))))
  serve(router, wire.readJob, ({ params }) => answer(params.jobId))
  serve(router, wire.changeJob, async ({ params, body, user }) => {
    await db.transaction((tx) => changeJob(tx, params.jobId, { ...body, by: user }))
    return answer(params.jobId)
  })

  return router
}
