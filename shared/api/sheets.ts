import * as z from 'zod'
import { boxSchema } from '../domain/fact.ts'
import { sheetKindSchema } from '../domain/sheet.ts'
import { endpoint } from './endpoint.ts'
import { errorCodeSchema } from './errors.ts'
import { idSchema, line, listOf, listQuery, versionSchema } from './list.ts'

/** 25 MB a file, 50 files a request. */
export const uploadLimits = { bytes: 25 * 1024 * 1024, files: 50 } as const

const sheetId = z.object({ sheetId: idSchema })
const revisionId = z.object({ revisionId: idSchema })
const dateSchema = z
  .string()
  .regex(/^\d{4}(-(0[1-9]|1[0-2])(-(0[1-9]|[12]\d|3[01]))?)?$/, 'Write the date as 2024-03-18, 2024-03 or 2024.')
  .refine((date) => date.length < 10 || isDay(date), 'There is no such day.')

const makerSchema = z.union([z.literal(''), line(120)])

function isDay(date: string): boolean {
  const day = new Date(`${date}T00:00:00Z`)
  return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(date)
}

/** What a sheet speaks of: one product or one mix. */
const subjectRefSchema = z.union([z.strictObject({ productId: idSchema }), z.strictObject({ mixId: idSchema })])
export type SubjectRef = z.infer<typeof subjectRefSchema>
const subjectSchema = z.object({ kind: z.enum(['product', 'mix']), id: idSchema, name: z.string(), maker: z.string() })
export type Subject = z.infer<typeof subjectSchema>

/** Found simply in the text, for a person to check; never kept without one. */
const suggestionSchema = z.object({ kind: sheetKindSchema, title: z.string(), revisionDate: z.string().nullable() })
export type Suggestion = z.infer<typeof suggestionSchema>

const revisionSchema = z.object({
  id: idSchema,
  fileName: z.string(),
  bytes: z.int(),
  sha256: z.string(),
  pages: z.int(),
  state: z.enum(['ready', 'no-text']),
  revisionDate: z.string().nullable(),
  /** A date that the text gives, while nobody has confirmed one. */
  suggestedDate: z.string().nullable(),
  uploadedAt: z.string(),
  uploadedByName: z.string().nullable(),
  superseded: z.boolean(),
})
export type Revision = z.infer<typeof revisionSchema>

const sheetSchema = z.object({
  id: idSchema,
  kind: sheetKindSchema,
  title: z.string(),
  maker: z.string(),
  version: versionSchema,
  /** Newest first; the first is in force. */
  revisions: z.array(revisionSchema),
  subjects: z.array(subjectSchema),
})
export type Sheet = z.infer<typeof sheetSchema>

/** A revision in the list of sheets. */
const sheetRowSchema = z.object({
  sheetId: idSchema,
  revisionId: idSchema,
  kind: sheetKindSchema,
  title: z.string(),
  maker: z.string(),
  fileName: z.string(),
  revisionDate: z.string().nullable(),
  pages: z.int(),
  state: z.enum(['ready', 'no-text']),
  uploadedAt: z.string(),
  superseded: z.boolean(),
  revisions: z.int(),
  subjects: z.array(z.string()),
})
export type SheetRow = z.infer<typeof sheetRowSchema>

const uploadedFileSchema = z.discriminatedUnion('outcome', [
  z.object({
    outcome: z.literal('added'),
    fileName: z.string(),
    revisionId: idSchema,
    sheet: sheetSchema,
    suggestion: suggestionSchema,
    /** Sheets of a like title: the file may be a new revision of one. */
    alike: z.array(z.object({ id: idSchema, kind: sheetKindSchema, title: z.string() })),
  }),
  z.object({ outcome: z.literal('duplicate'), fileName: z.string(), revisionId: idSchema, sheetId: idSchema, title: z.string() }),
  z.object({ outcome: z.literal('refused'), fileName: z.string(), code: errorCodeSchema, message: z.string() }),
])
export type UploadedFile = z.infer<typeof uploadedFileSchema>

/** Fields that may go with the files. What is left out is suggested by the text, save the date, which stays open. */
export const uploadFieldsSchema = z.strictObject({
  /** The files are new revisions of this sheet. */
  sheetId: idSchema.optional(),
  kind: sheetKindSchema.optional(),
  title: line(200).optional(),
  maker: makerSchema.optional(),
  revisionDate: dateSchema.optional(),
})

export const sheetEndpoints = {
  listSheets: endpoint({
    method: 'get',
    path: '/api/sheets',
    access: 'sheet:list',
    summary: 'List the sheets by the revision in force, or the superseded revisions',
    query: listQuery(['title', 'maker', 'revisionDate', 'uploadedAt', 'pages']).extend({
      kind: sheetKindSchema.optional(),
      standing: z.enum(['in-force', 'superseded', 'all']).default('in-force'),
      /** Against the firm's limit on the age of sheets. */
      age: z.enum(['within', 'beyond', 'undated']).optional(),
    }),
    response: listOf(sheetRowSchema),
  }),
  uploadSheets: endpoint({
    method: 'post',
    path: '/api/sheets',
    access: 'sheet:write',
    body: 'files',
    summary:
      'Upload PDFs (field `files`, with optional sheetId, kind, title, maker, revisionDate). One refused file alone answers with its error',
    response: z.object({ files: z.array(uploadedFileSchema) }),
  }),
  readSheet: endpoint({
    method: 'get',
    path: '/api/sheets/:sheetId',
    access: 'sheet:read',
    summary: 'Read a sheet with its revisions',
    params: sheetId,
    response: sheetSchema,
  }),
  changeSheet: endpoint({
    method: 'put',
    path: '/api/sheets/:sheetId',
    access: 'sheet:write',
    summary: 'Change kind, title, maker, subjects and the dates of revisions',
    params: sheetId,
    body: z.strictObject({
      version: versionSchema,
      kind: sheetKindSchema,
      title: line(200),
      maker: makerSchema,
      subjects: z.array(subjectRefSchema).max(100),
      /** Only those that change. */
      dates: z
        .array(z.strictObject({ revisionId: idSchema, revisionDate: dateSchema.nullable() }))
        .max(200)
        .default([]),
    }),
    response: sheetSchema,
  }),
  moveRevision: endpoint({
    method: 'put',
    path: '/api/sheet-revisions/:revisionId/sheet',
    access: 'sheet:write',
    summary: 'Make a revision one of another sheet; a sheet left without revisions goes',
    params: revisionId,
    body: z.strictObject({ sheetId: idSchema }),
    response: sheetSchema,
  }),
  readRevision: endpoint({
    method: 'get',
    path: '/api/sheet-revisions/:revisionId',
    access: 'sheet:read',
    summary: 'Read a revision and the sheet it is of',
    params: revisionId,
    response: z.object({ sheet: sheetSchema, revision: revisionSchema }),
  }),
  downloadRevision: endpoint({
    method: 'get',
    path: '/api/sheet-revisions/:revisionId/file',
    access: 'sheet:read',
    summary: 'The PDF as uploaded, whole or in ranges',
    params: revisionId,
    response: { file: 'application/pdf' },
  }),
  readPage: endpoint({
    method: 'get',
    path: '/api/sheet-revisions/:revisionId/pages/:page',
    access: 'sheet:read',
    summary: 'Words of a page with their places',
    params: revisionId.extend({ page: z.coerce.number().int().min(1).max(1000) }),
    response: z.object({
      page: z.int(),
      width: z.number(),
      height: z.number(),
      rotation: z.int(),
      words: z.array(z.tuple([z.string(), z.number(), z.number(), z.number(), z.number()])),
    }),
  }),
  searchRevision: endpoint({
    method: 'get',
    path: '/api/sheet-revisions/:revisionId/hits',
    access: 'sheet:read',
    summary: 'Where a phrase stands in a revision',
    params: revisionId,
    query: z.object({ q: z.string().trim().min(1).max(200) }),
    response: z.object({
      hits: z.array(z.object({ page: z.int(), boxes: z.array(boxSchema), excerpt: z.string() })),
      /** More stand there than are listed. */
      more: z.boolean(),
    }),
  }),
  listSubjects: endpoint({
    method: 'get',
    path: '/api/sheet-subjects',
    access: 'sheet:write',
    summary: 'Products and mixes by name, to attach a sheet to',
    query: z.object({ q: z.string().trim().max(200).default('') }),
    response: z.object({ items: z.array(subjectSchema) }),
  }),
}
