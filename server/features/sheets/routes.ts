import { Router } from 'express'
import { AppError } from '../../../shared/api/errors.ts'
import { type UploadedFile, sheetEndpoints as wire, uploadFieldsSchema, uploadLimits } from '../../../shared/api/sheets.ts'
import { dayYearsBefore } from '../../../shared/domain/sheet-age.ts'
import { sendFile } from '../../files/send-file.ts'
import type { AppContext } from '../../http/context.ts'
import { serve } from '../../http/serve.ts'
import { takeFiles } from '../../http/uploads.ts'
import { parsePart } from '../../http/validate.ts'
import { readFirm } from '../people/queries.ts'
import { listSheets, listSubjects } from './list-queries.ts'
import { changeSheet, moveRevision } from './queries.ts'
import { findRevision, readPageWords, readSheet, searchRevision } from './read-queries.ts'
import { prepareReader } from './read-pdf.ts'
import { takeUpload } from './take-upload.ts'

/** Sheets: upload, list, read, correct, download and search. */
export function sheetRoutes({ db, files, clock }: AppContext): Router {
  const router = Router()
  const upload = takeFiles({ folder: files.incoming, field: 'files', ...uploadLimits })

  serve(router, wire.listSheets, async ({ query }) => {
    const { sheetAgeLimitYears } = await readFirm(db)
    return listSheets(db, { ...query, oldestDay: dayYearsBefore(new Date(clock()).toISOString(), sheetAgeLimitYears) })
  })
  serve(
    router,
    wire.uploadSheets,
    async ({ user, http }) => {
      const taken = (http.request.files ?? []) as Express.Multer.File[]
      const fields = parsePart(uploadFieldsSchema, { ...(http.request.body as object) }, 'body')
      if (taken.length === 0) throw new AppError('invalid', { fields: { files: 'Choose at least one PDF.' } })
      if (fields.sheetId) await readSheet(db, fields.sheetId, user)
      const results: UploadedFile[] = await Promise.all(taken.map((file) => takeUpload({ db, files, file, fields, user })))
      const [only] = results
      if (results.length === 1 && only?.outcome === 'refused') throw new AppError(only.code, { message: only.message })
      return { files: results }
    },
    [
      (_request, _response, next) => {
        prepareReader()
        next()
      },
      upload,
    ],
  )
  serve(router, wire.readSheet, ({ params, user }) => readSheet(db, params.sheetId, user))
  serve(router, wire.changeSheet, ({ params, body, user }) =>
    db.transaction((tx) => changeSheet(tx, params.sheetId, { ...body, by: user })),
  )
  serve(router, wire.moveRevision, ({ params, body, user }) => db.transaction((tx) => moveRevision(tx, { ...params, ...body }, user)))
  serve(router, wire.readRevision, async ({ params, user }) => {
    const { sheetId, id } = await findRevision(db, params.revisionId, user)
    const sheet = await readSheet(db, sheetId, user)
    const revision = sheet.revisions.find((one) => one.id === id)
    if (!revision) throw new AppError('not-found')
    return { sheet, revision }
  })
  serve(router, wire.downloadRevision, async ({ params, user, http }) => {
    const { sha256, fileName } = await findRevision(db, params.revisionId, user)
    await sendFile({ files, sha256, name: fileName, type: 'application/pdf', ...http })
  })
  serve(router, wire.readPage, ({ params, user }) => readPageWords(db, params, user))
  serve(router, wire.searchRevision, ({ params, query, user }) => searchRevision(db, { ...params, ...query }, user))
  serve(router, wire.listSubjects, async ({ query }) => ({ items: await listSubjects(db, query.q) }))

  return router
}
