import { createHash } from 'node:crypto'
import type { Database } from '../../db/open.ts'
import type { FileStore } from '../../files/store.ts'
import { keepIssue, readSummary } from './queries.ts'
import { render } from './render.ts'
import { writeDocument } from './write-document.ts'

interface IssueWanted {
  specificationId: string
  /** Edit counter that the person saw. */
  version: number
  /** `id` null: issued by the system itself. */
  by: { id: string | null; name: string }
}

/**
 * Issues a specification: writes it from the facts of this moment, numbers, dates and signs it, and freezes its tree, its facts and the bytes of its files.
 * Returns the issue's number.
 */
export async function issueSpecification(
  { db, files, now }: { db: Database; files: FileStore; now: number },
  { specificationId, version, by }: IssueWanted,
): Promise<number> {
  const summary = await readSummary(db, specificationId)
  const number = (summary.issues[0]?.number ?? 0) + 1
  const { document, facts } = await writeDocument(db, { summary, issue: { number, by: by.name }, now })
  const [docx, pdf] = [await render.docx(document), await render.pdf(document)]
  const tree = JSON.stringify(document)
  const [docxSha256, pdfSha256] = [await files.keep(docx), await files.keep(pdf)]
  await db.transaction((tx) =>
    keepIssue(tx, {
      specificationId,
      version,
      number,
      by,
      tree,
      docxSha256,
      pdfSha256,
      facts,
      issuedAt: new Date(now).toISOString(),
      treeSha256: createHash('sha256').update(tree).digest('hex'),
    }),
  )
  return number
}
