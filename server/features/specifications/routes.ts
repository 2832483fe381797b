import { createHash } from 'node:crypto'
import { type Request, type Response, Router } from 'express'
import { type SpecIssue, type Specification, specificationEndpoints as wire } from '../../../shared/api/specifications.ts'
import { type SpecDocument, specDocumentSchema } from '../../../shared/domain/specification/document.ts'
import { cleanFileName } from '../../files/file-name.ts'
import { attachment, sendFile } from '../../files/send-file.ts'
import type { AppContext } from '../../http/context.ts'
import { serve } from '../../http/serve.ts'
import { issueSpecification } from './issue.ts'
import { addSpecification, changeSpecification, listSpecifications, readIssueRow, readSummary, supersededAmong } from './queries.ts'
import { prepareRender, render } from './render.ts'
import { jobToSpecify, revisionsOf, writeDocument } from './write-document.ts'
import type { SpecInput } from '../../../shared/domain/specification/floor.ts'

const types = { docx: 'application/vnd.openxmlformats-officedocument.wordprocessingml.document', pdf: 'application/pdf' } as const
type FileKind = keyof typeof types

/** "09 67 23 Resinous flooring, Filling hall, issue 1.pdf". */
function fileName({ header }: SpecDocument, kind: FileKind): string {
  const standing = header.issue ? `issue ${header.issue.number}` : 'draft'
  return cleanFileName(`${header.sectionNumber} ${header.sectionTitle}, ${header.project}, ${standing}`.replaceAll('/', '-'), `.${kind}`)
}

/** Answers with bytes made this moment; the same bytes are not sent twice. */
function sendMade(
  bytes: Buffer,
  { name, kind, request, response }: { name: string; kind: FileKind; request: Request; response: Response },
): void {
  const etag = `"${createHash('sha256').update(bytes).digest('hex')}"`
  response.set({
    ETag: etag,
    'Content-Disposition': attachment(name),
    'Cache-Control': 'private, no-cache',
    'X-Content-Type-Options': 'nosniff',
  })
  if (request.headers['if-none-match'] === etag) response.status(304).end()
  else response.type(types[kind]).send(bytes)
}

/** Specifications: written from a job's released build-up, issued, exported. */
export function specificationRoutes({ db, files, clock }: AppContext): Router {
  const router = Router()

  const live = async (specificationId: string): Promise<Specification> => {
    const summary = await readSummary(db, specificationId)
    const { document, job, revisionIds } = await writeDocument(db, { summary, issue: null, now: clock() })
    return { ...summary, jobName: job.name, document, restsOnSuperseded: await supersededAmong(db, revisionIds) }
  }
  const issued = async (place: { specificationId: string; number: number }): Promise<SpecIssue> => {
    const { tree, facts, id: _, issuedBy: __, ...row } = await readIssueRow(db, place)
    const document = specDocumentSchema.parse(JSON.parse(tree))
    return { ...row, document, restsOnSuperseded: await supersededAmong(db, revisionsOf((facts as SpecInput).input)) }
  }
  const draft = async (specificationId: string) => {
    const summary = await readSummary(db, specificationId)
    return (await writeDocument(db, { summary, issue: null, now: clock() })).document
  }

  serve(router, wire.addSpecification, async ({ params, body, user }) => {
    await jobToSpecify(db, { jobId: params.jobId, now: clock() })
    return live(await db.transaction((tx) => addSpecification(tx, { ...params, ...body }, user.id)))
  })
  serve(router, wire.listSpecifications, async ({ params }) => ({ items: await listSpecifications(db, params.jobId) }))
  serve(router, wire.readSpecification, ({ params }) => {
    prepareRender()
    return live(params.specificationId)
  })
  serve(router, wire.changeSpecification, async ({ params, body, user }) => {
    await db.transaction((tx) => changeSpecification(tx, params.specificationId, { ...body, by: user }))
    return live(params.specificationId)
  })
  serve(router, wire.issueSpecification, async ({ params, body, user }) => {
    const number = await issueSpecification({ db, files, now: clock() }, { ...params, ...body, by: user })
    return issued({ ...params, number })
  })
  serve(router, wire.readIssue, ({ params }) => issued(params))
  serve(router, wire.downloadDraftDocx, async ({ params, http }) => {
    const document = await draft(params.specificationId)
    sendMade(await render.docx(document), { name: fileName(document, 'docx'), kind: 'docx', ...http })
  })
  serve(router, wire.downloadDraftPdf, async ({ params, http }) => {
    const document = await draft(params.specificationId)
    sendMade(await render.pdf(document), { name: fileName(document, 'pdf'), kind: 'pdf', ...http })
  })
  const sendIssued = async (
    place: { specificationId: string; number: number },
    kind: FileKind,
    http: { request: Request; response: Response },
  ) => {
    const { tree, docxSha256, pdfSha256 } = await readIssueRow(db, place)
    const name = fileName(specDocumentSchema.parse(JSON.parse(tree)), kind)
    await sendFile({ files, sha256: kind === 'docx' ? docxSha256 : pdfSha256, name, type: types[kind], ...http })
  }
  serve(router, wire.downloadIssueDocx, ({ params, http }) => sendIssued(params, 'docx', http))
  serve(router, wire.downloadIssuePdf, ({ params, http }) => sendIssued(params, 'pdf', http))

  return router
}
