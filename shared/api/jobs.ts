import * as z from 'zod'
import { evaluationInputSchema } from '../domain/build-up.ts'
import { baySchema, jobConditionsSchema, jobStatusSchema, lossSchema } from '../domain/job.ts'
import { endpoint } from './endpoint.ts'
import { idSchema, line, listOf, listQuery, paragraph, versionSchema } from './list.ts'

const jobId = z.object({ jobId: idSchema })
const timeZone = z.string().max(60).refine(isTimeZone, 'This time zone is not known.')

function isTimeZone(name: string): boolean {
  try {
    return Boolean(new Intl.DateTimeFormat('en', { timeZone: name }))
  } catch {
    return false
  }
}

export const jobSummarySchema = z.object({
  id: idSchema,
  number: z.int(),
  name: z.string(),
  client: z.string(),
  site: z.string(),
  status: jobStatusSchema,
  buildUp: z.object({ id: idSchema, number: z.int(), name: z.string(), version: z.int() }).nullable(),
  startsAt: z.string().nullable(),
  bays: z.int(),
  updatedAt: z.string(),
})
export type JobSummary = z.infer<typeof jobSummarySchema>

/** The build-up version a job is laid by, with its facts: what `evaluate` and the quantities are worked out from. */
export const jobBuildUpSchema = z.object({
  buildUpId: idSchema,
  versionId: idSchema,
  number: z.int(),
  name: z.string(),
  version: z.int(),
  status: z.enum(['draft', 'released', 'superseded', 'withdrawn']),
  releasedAt: z.string().nullable(),
  releasedByName: z.string().nullable(),
  releaseReasons: z.record(z.string(), z.string()),
  /** Facts of the version (frozen when released) with the job's own conditions put in. */
  input: evaluationInputSchema,
})
export type JobBuildUp = z.infer<typeof jobBuildUpSchema>

export const jobSchema = z.object({
  id: idSchema,
  number: z.int(),
  name: z.string(),
  client: z.string(),
  site: z.string(),
  status: jobStatusSchema,
  conditions: jobConditionsSchema,
  loss: lossSchema,
  startsAt: z.string().nullable(),
  timeZone: z.string(),
  bays: z.array(baySchema),
  crew: z.array(z.object({ id: idSchema, name: z.string() })),
  buildUp: jobBuildUpSchema.nullable(),
  /** What the QR code on the job's sheet opens. */
  siteCardUrl: z.string(),
  version: versionSchema,
  updatedAt: z.string(),
})
export type Job = z.infer<typeof jobSchema>

const jobBody = z.strictObject({
  name: line(160),
  client: paragraph(160),
  site: paragraph(300),
  status: jobStatusSchema,
  buildUpVersionId: idSchema.nullable(),
  conditions: jobConditionsSchema,
  loss: lossSchema,
  startsAt: z.iso.datetime({ offset: true }).nullable(),
  timeZone,
  bays: z
    .array(baySchema)
    .max(500)
    .refine((bays) => new Set(bays.map((bay) => bay.id)).size === bays.length, 'Two bays have the same id.'),
  crewIds: z.array(idSchema).max(200),
})
export type JobBody = z.infer<typeof jobBody>

export const jobEndpoints = {
  listJobs: endpoint({
    method: 'get',
    path: '/api/jobs',
    access: 'job:read',
    summary: 'List the jobs',
    query: listQuery(['number', 'name', 'client', 'startsAt', 'updatedAt']).extend({ status: jobStatusSchema.optional() }),
    response: listOf(jobSummarySchema),
  }),
  addJob: endpoint({
    method: 'post',
    path: '/api/jobs',
    access: 'job:write',
    summary: 'Open a job',
    status: 201,
    body: jobBody,
    response: jobSchema,
  }),
  readJob: endpoint({
    method: 'get',
    path: '/api/jobs/:jobId',
    access: 'job:read',
    summary: 'Read a job with its build-up',
    params: jobId,
    response: jobSchema,
  }),
  changeJob: endpoint({
    method: 'put',
    path: '/api/jobs/:jobId',
    access: 'job:write',
    summary: 'Change a job',
    params: jobId,
    body: jobBody.extend({ version: versionSchema }),
    response: jobSchema,
  }),
}
