import { open, rm } from 'node:fs/promises'
import type * as z from 'zod'
import { AppError } from '../../../shared/api/errors.ts'
import type { User } from '../../../shared/api/session.ts'
import type { UploadedFile, uploadFieldsSchema } from '../../../shared/api/sheets.ts'
import type { Database } from '../../db/open.ts'
import { cleanFileName } from '../../files/file-name.ts'
import { type FileStore, sha256OfFile } from '../../files/store.ts'
import { findAlike } from './list-queries.ts'
import type { ReadPage, ReadProblem } from './page-reader.ts'
import { addRevision, addSheet } from './queries.ts'
import { findByBytes, readSheet } from './read-queries.ts'
import { readPdf } from './read-pdf.ts'
import { suggestDetails } from './suggest-details.ts'

interface Upload {
  db: Database
  files: FileStore
  file: { path: string; originalname: string; size: number }
  fields: z.output<typeof uploadFieldsSchema>
  user: User
}

/** Takes one uploaded file in: is it a PDF, is it here already, can it be read; then sheet, revision, pages and file are kept together or not at all. */
export async function takeUpload({ db, files, file, fields, user }: Upload): Promise<UploadedFile> {
  const fileName = cleanFileName(file.originalname, '.pdf')
  try {
    if (!/\.pdf$/i.test(file.originalname.trim()) || !(await beginsLikePdf(file.path))) throw new AppError('not-a-pdf')
    const sha256 = await sha256OfFile(file.path)
    const here = await findByBytes(db, sha256)
    if (here) return { outcome: 'duplicate', fileName, ...here }
    const result = await readPdf(file.path)
    if ('problem' in result) throw new AppError(result.problem, { message: messageOf(result.problem, result.detail) })
    return await keep({ db, files, fields, user, file: { path: file.path, sha256, fileName, bytes: file.size }, pages: result.pages })
  } catch (error) {
    if (!(error instanceof AppError)) throw error
    return { outcome: 'refused', fileName, code: error.code, message: error.message }
  } finally {
    await rm(file.path, { force: true })
  }
}

interface Kept extends Omit<Upload, 'file'> {
  file: { path: string; sha256: string; fileName: string; bytes: number }
  pages: ReadPage[]
}

async function keep({ db, files, fields, user, file, pages }: Kept): Promise<UploadedFile> {
  const { path, sha256, fileName, bytes } = file
  const suggestion = suggestDetails(pages, fileName)
  const details = { kind: fields.kind ?? suggestion.kind, title: fields.title ?? suggestion.title, maker: fields.maker ?? '', subjects: [] }
  const stored = { isNew: false }
  try {
    const kept = await db.transaction(async (tx) => {
      const sheetId = fields.sheetId ?? (await addSheet(tx, details, user.id))
      const revisionId = await addRevision(tx, {
        sheetId,
        sha256,
        bytes,
        fileName,
        revisionDate: fields.revisionDate ?? null,
        pages,
        uploadedBy: user.id,
      })
      stored.isNew = await files.adopt(path, sha256)
      return { revisionId, sheet: await readSheet(tx, sheetId, user) }
    })
    const alike = fields.sheetId ? [] : await findAlike(db, { title: kept.sheet.title, kind: kept.sheet.kind, exceptId: kept.sheet.id })
    return { outcome: 'added', fileName, ...kept, suggestion, alike }
  } catch (error) {
    const here = await findByBytes(db, sha256)
    if (here) return { outcome: 'duplicate', fileName, ...here }
    if (stored.isNew) await files.discard(sha256)
    throw error
  }
}

/** `%PDF-` within the first 1,024 bytes, as readers have always allowed (ISO 32000-1, annex H, note 13). */
async function beginsLikePdf(path: string): Promise<boolean> {
  const handle = await open(path)
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(1024), 0, 1024, 0)
    return buffer.subarray(0, bytesRead).includes('%PDF-')
  } finally {
    await handle.close()
  }
}

function messageOf(problem: ReadProblem, detail: string): string {
  if (problem === 'too-large')
    return `This PDF is too large to take in: ${detail}. At most 1,000 pages, 30 seconds of reading and 512 MB of memory are allowed.`
  return new AppError(problem).message
}
