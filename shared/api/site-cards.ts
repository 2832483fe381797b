import * as z from 'zod'
import { baySchema, jobConditionsSchema } from '../domain/job.ts'
import { endpoint } from './endpoint.ts'
import { jobBuildUpSchema, jobSummarySchema } from './jobs.ts'
import { idSchema, listOf, listQuery } from './list.ts'

/** What a phone on the floor is given of one job: everything it takes to work the card out by itself, and nothing of prices. */
export const siteCardSchema = z.object({
  jobId: idSchema,
  number: z.int(),
  name: z.string(),
  site: z.string(),
  startsAt: z.string().nullable(),
  timeZone: z.string(),
  conditions: jobConditionsSchema,
  bays: z.array(baySchema),
  buildUp: jobBuildUpSchema.nullable(),
  firm: z.object({ name: z.string(), phone: z.string() }),
  /** When the office last changed what the card rests on. */
  asOf: z.string(),
})
export type SiteCard = z.infer<typeof siteCardSchema>

export const siteCardEndpoints = {
  listSiteCards: endpoint({
    method: 'get',
    path: '/api/site-cards',
    access: 'site-card:read',
    summary: 'Site cards one may open: all for the office, those of the own jobs for the crew',
    query: listQuery(['number', 'name', 'startsAt']),
    response: listOf(jobSummarySchema.pick({ id: true, number: true, name: true, site: true, startsAt: true, bays: true })),
  }),
  readSiteCard: endpoint({
    method: 'get',
    path: '/api/site-cards/:jobId',
    access: 'site-card:read',
    summary: 'The site card of a job',
    params: z.object({ jobId: idSchema }),
    response: siteCardSchema,
  }),
}
