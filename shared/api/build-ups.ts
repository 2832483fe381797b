import * as z from 'zod'
import { buildUpStatusSchema, conditionsSchema, courseSchema, evaluationInputSchema, stageSchema } from '../domain/build-up.ts'
import { evaluationSchema } from '../domain/evaluation.ts'
import { figureSchema } from '../domain/figure.ts'
import { mixFactsSchema } from '../domain/mix.ts'
import { productFactsSchema } from '../domain/product.ts'
import { sectionLayerSchema } from '../drawing/section-layer.ts'
import { endpoint } from './endpoint.ts'
import { idSchema, line, listOf, listQuery, paragraph, versionSchema } from './list.ts'

const buildUpId = z.object({ buildUpId: idSchema })
const versionPlace = buildUpId.extend({ number: z.coerce.number().int().min(1).max(100_000) })

const countsSchema = z.object({ stop: z.int(), caution: z.int(), unknown: z.int(), met: z.int() })

/** A build-up in the list: its newest version, drawn and summed up. */
const buildUpSummarySchema = z.object({
  id: idSchema,
  /** Shown as BU-014. */
  number: z.int(),
  name: z.string(),
  newest: z.object({
    versionId: idSchema,
    number: z.int(),
    status: buildUpStatusSchema,
    updatedAt: z.string(),
    updatedByName: z.string().nullable(),
  }),
  /** The version that jobs are laid by, if there is one. */
  released: z.object({ versionId: idSchema, number: z.int() }).nullable(),
  courses: z.int(),
  thickness: figureSchema,
  findings: countsSchema,
  layers: z.array(sectionLayerSchema),
})
export type BuildUpSummary = z.infer<typeof buildUpSummarySchema>

const versionSummarySchema = z.object({
  id: idSchema,
  number: z.int(),
  status: buildUpStatusSchema,
  updatedAt: z.string(),
  updatedByName: z.string().nullable(),
  releasedAt: z.string().nullable(),
  releasedByName: z.string().nullable(),
})
export type VersionSummary = z.infer<typeof versionSummarySchema>

/** A build-up opened at one version. Facts are the catalogue's of this moment for a draft, and those of the day of release afterwards. */
const buildUpSchema = z.object({
  id: idSchema,
  number: z.int(),
  name: z.string(),
  note: z.string(),
  /** Edit counter of name and note. */
  version: versionSchema,
  versions: z.array(versionSummarySchema),
  opened: versionSummarySchema.extend({
    /** Edit counter of the draft. */
    version: versionSchema,
    releaseReasons: z.record(z.string(), z.string()),
    input: evaluationInputSchema,
    /** As reckoned at release; null for a draft, which is reckoned where it is shown. */
    evaluation: evaluationSchema.nullable(),
  }),
})
export type BuildUp = z.infer<typeof buildUpSchema>

const courseBody = courseSchema
  .extend({
    id: z.string().regex(/^[A-Za-z0-9_-]{1,40}$/, 'Ids have letters, digits, - and _ only.'),
    title: line(120),
    note: paragraph(2000),
    mixId: idSchema.nullable(),
    filler: courseSchema.shape.filler.unwrap().extend({ productId: idSchema }).nullable(),
    broadcast: courseSchema.shape.broadcast.unwrap().extend({ productId: idSchema }).nullable(),
  })
  .refine((course) => !(course.thickness && course.spreadRate), {
    path: ['spreadRate'],
    error: 'Give the thickness or the spread rate, not both.',
  })

const conditionsBody = conditionsSchema.extend({ vocPlace: line(120).nullable() })

const coursesBody = z
  .array(courseBody)
  .max(60)
  .refine((courses) => new Set(courses.map((course) => course.id)).size === courses.length, 'Two courses have the same id.')

const draftBody = z.strictObject({ courses: coursesBody, conditions: conditionsBody })
const reasonsBody = z.record(
  z.string().regex(/^[a-z0-9-]{1,60}:[A-Za-z0-9_-]{1,40}$/, 'A reason is kept under its check and course.'),
  paragraph(1000),
)

const choiceSchema = z.object({ id: idSchema, name: z.string(), maker: z.string() })
const mixChoiceSchema = choiceSchema.extend({ chemistry: z.string(), color: z.string() })

export const buildUpEndpoints = {
  listBuildUps: endpoint({
    method: 'get',
    path: '/api/build-ups',
    access: 'build-up:read',
    summary: 'List the build-ups by their newest version',
    query: listQuery(['number', 'name', 'status', 'updatedAt']).extend({ status: buildUpStatusSchema.optional() }),
    response: listOf(buildUpSummarySchema),
  }),
  addBuildUp: endpoint({
    method: 'post',
    path: '/api/build-ups',
    access: 'build-up:draft',
    summary: 'Begin a build-up, empty or from a row of stages, bottom up',
    status: 201,
    body: z.strictObject({ name: line(160), stages: z.array(stageSchema).max(40) }),
    response: buildUpSchema,
  }),
  readCourseFacts: endpoint({
    method: 'get',
    path: '/api/build-ups/facts',
    access: 'build-up:read',
    summary: 'Read what is known of mixes and aggregates, for a draft at work',
    query: z.object({ mixes: idList(), products: idList() }),
    response: z.object({ mixes: z.record(z.string(), mixFactsSchema), products: z.record(z.string(), productFactsSchema) }),
  }),
  listChoices: endpoint({
    method: 'get',
    path: '/api/build-ups/choices',
    access: 'build-up:read',
    summary: 'Find mixes and aggregates to choose for a course',
    query: z.object({ q: z.string().trim().max(200).default('') }),
    response: z.object({ mixes: z.array(mixChoiceSchema), aggregates: z.array(choiceSchema) }),
  }),
  readBuildUp: endpoint({
    method: 'get',
    path: '/api/build-ups/:buildUpId',
    access: 'build-up:read',
    summary: 'Open a build-up at a version, or at its newest',
    params: buildUpId,
    query: z.object({ version: z.coerce.number().int().min(1).max(100_000).optional() }),
    response: buildUpSchema,
  }),
  renameBuildUp: endpoint({
    method: 'patch',
    path: '/api/build-ups/:buildUpId',
    access: 'build-up:draft',
    summary: 'Rename a build-up',
    params: buildUpId,
    body: z.strictObject({ name: line(160), note: paragraph(2000), version: versionSchema }),
    response: z.object({ name: z.string(), note: z.string(), version: versionSchema }),
  }),
  copyBuildUp: endpoint({
    method: 'post',
    path: '/api/build-ups/:buildUpId/copies',
    access: 'build-up:draft',
    summary: 'Copy a version into a build-up of its own',
    params: buildUpId,
    status: 201,
    body: z.strictObject({ name: line(160), number: z.int().min(1).max(100_000) }),
    response: buildUpSchema,
  }),
  addDraft: endpoint({
    method: 'post',
    path: '/api/build-ups/:buildUpId/versions',
    access: 'build-up:draft',
    summary: 'Begin a draft from a version, or from unsaved work on it',
    params: buildUpId,
    status: 201,
    body: z.strictObject({ from: z.int().min(1).max(100_000), work: draftBody.optional() }),
    response: buildUpSchema,
  }),
  saveDraft: endpoint({
    method: 'put',
    path: '/api/build-ups/:buildUpId/versions/:number',
    access: 'build-up:draft',
    summary: 'Save a draft whole',
    params: versionPlace,
    body: draftBody.extend({ version: versionSchema }),
    response: z.object({ version: versionSchema, updatedAt: z.string(), updatedByName: z.string().nullable(), findings: countsSchema }),
  }),
  releaseVersion: endpoint({
    method: 'post',
    path: '/api/build-ups/:buildUpId/versions/:number/release',
    access: 'build-up:release',
    summary: 'Release a draft: refused by a stop, a reason kept for each caution and unknown',
    params: versionPlace,
    body: z.strictObject({ version: versionSchema, reasons: reasonsBody }),
    response: buildUpSchema,
  }),
  withdrawVersion: endpoint({
    method: 'post',
    path: '/api/build-ups/:buildUpId/versions/:number/withdraw',
    access: 'build-up:draft',
    summary: 'Withdraw a version: a draft by whoever drafts, any other by a technical lead',
    params: versionPlace,
    body: z.strictObject({ version: versionSchema }),
    response: buildUpSchema,
  }),
}

/** Up to 60 ids with commas between. */
function idList() {
  return z
    .string()
    .max(60 * 37)
    .default('')
    .transform((text) => text.split(',').filter(Boolean))
    .pipe(z.array(idSchema).max(60))
}
