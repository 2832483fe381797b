import * as z from 'zod'
import { specDocumentSchema } from '../domain/specification/document.ts'
import { endpoint } from './endpoint.ts'
import { idSchema, line, versionSchema } from './list.ts'

/** Number and title that a section has unless a person chooses others: MasterFormat, from memory. */
export const usualSection = { sectionNumber: '09 67 23', title: 'Resinous flooring' } as const

const jobId = z.object({ jobId: idSchema })
const specificationId = z.object({ specificationId: idSchema })
const issueNumber = specificationId.extend({ number: z.coerce.number().int().min(1).max(100_000) })

const sectionNumberSchema = z
  .string()
  .trim()
  .regex(/^\d{2} \d{2} \d{2}(\.\d{2})?$/, 'A section number reads like 09 67 23 or 09 67 23.13.')
const titleSchema = line(120)

export const specIssueSchema = z.object({ number: z.int(), issuedAt: z.string(), issuedByName: z.string() })
export type SpecIssueSummary = z.infer<typeof specIssueSchema>

export const specSummarySchema = z.object({
  id: idSchema,
  jobId: idSchema,
  title: z.string(),
  sectionNumber: z.string(),
  version: versionSchema,
  updatedAt: z.string(),
  /** Newest first. */
  issues: z.array(specIssueSchema),
})
export type SpecSummary = z.infer<typeof specSummarySchema>

/** The specification as it would be issued now; a changed fact changes it, issues stay. */
export const specificationSchema = specSummarySchema.extend({
  jobName: z.string(),
  document: specDocumentSchema,
  /** Titles of sheets that it rests on and that a newer revision has replaced. */
  restsOnSuperseded: z.array(z.string()),
})
export type Specification = z.infer<typeof specificationSchema>

export const issueSchema = specIssueSchema.extend({
  specificationId: idSchema,
  jobId: idSchema,
  jobName: z.string(),
  document: specDocumentSchema,
  treeSha256: z.string(),
  docxSha256: z.string(),
  pdfSha256: z.string(),
  /** Titles of sheets that it rests on and that a newer revision has replaced since. */
  restsOnSuperseded: z.array(z.string()),
})
export type SpecIssue = z.infer<typeof issueSchema>

const docx = 'application/vnd.openxmlformats-officedocument.wordprocessingml.document'

export const specificationEndpoints = {
  addSpecification: endpoint({
    method: 'post',
    path: '/api/jobs/:jobId/specifications',
    access: 'specification:write',
    summary: 'Begin a specification for a job',
    status: 201,
    params: jobId,
    body: z.strictObject({
      title: titleSchema.default(usualSection.title),
      sectionNumber: sectionNumberSchema.default(usualSection.sectionNumber),
    }),
    response: specificationSchema,
  }),
  listSpecifications: endpoint({
    method: 'get',
    path: '/api/jobs/:jobId/specifications',
    access: 'specification:read',
    summary: 'List the specifications of a job',
    params: jobId,
    response: z.object({ items: z.array(specSummarySchema) }),
  }),
  readSpecification: endpoint({
    method: 'get',
    path: '/api/specifications/:specificationId',
    access: 'specification:read',
    summary: 'Read a specification as it stands now',
    params: specificationId,
    response: specificationSchema,
  }),
  changeSpecification: endpoint({
    method: 'put',
    path: '/api/specifications/:specificationId',
    access: 'specification:write',
    summary: 'Change title and section number',
    params: specificationId,
    body: z.strictObject({ title: titleSchema, sectionNumber: sectionNumberSchema, version: versionSchema }),
    response: specificationSchema,
  }),
  issueSpecification: endpoint({
    method: 'post',
    path: '/api/specifications/:specificationId/issues',
    access: 'specification:write',
    summary: 'Issue: number, date, sign and freeze',
    status: 201,
    params: specificationId,
    body: z.strictObject({ version: versionSchema }),
    response: issueSchema,
  }),
  readIssue: endpoint({
    method: 'get',
    path: '/api/specifications/:specificationId/issues/:number',
    access: 'specification:read',
    summary: 'Read an issue as it was frozen',
    params: issueNumber,
    response: issueSchema,
  }),
  downloadDraftDocx: endpoint({
    method: 'get',
    path: '/api/specifications/:specificationId/draft.docx',
    access: 'specification:read',
    summary: 'Export the draft as DOCX',
    params: specificationId,
    response: { file: docx },
  }),
  downloadDraftPdf: endpoint({
    method: 'get',
    path: '/api/specifications/:specificationId/draft.pdf',
    access: 'specification:read',
    summary: 'Export the draft as PDF',
    params: specificationId,
    response: { file: 'application/pdf' },
  }),
  downloadIssueDocx: endpoint({
    method: 'get',
    path: '/api/specifications/:specificationId/issues/:number/files/docx',
    access: 'specification:read',
    summary: 'The DOCX of an issue, as frozen',
    params: issueNumber,
    response: { file: docx },
  }),
  downloadIssuePdf: endpoint({
    method: 'get',
    path: '/api/specifications/:specificationId/issues/:number/files/pdf',
    access: 'specification:read',
    summary: 'The PDF of an issue, as frozen',
    params: issueNumber,
    response: { file: 'application/pdf' },
  }),
}
