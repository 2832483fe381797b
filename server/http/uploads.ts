import type { RequestHandler } from 'express'
import multer, { MulterError, diskStorage } from 'multer'
import { randomUUID } from 'node:crypto'
import { rm } from 'node:fs/promises'
import { AppError } from '../../shared/api/errors.ts'

interface Accepts {
  /** Folder of files that are not yet accepted. */
  folder: string
  field: string
  bytes: number
  files: number
}

/** Streams the files of a multipart request to disk under names of our own. What the handler does not take over is removed when the answer is out. */
export function takeFiles({ folder, field, bytes, files }: Accepts): RequestHandler {
  const upload = multer({
    storage: diskStorage({ destination: folder, filename: (_request, _file, done) => done(null, randomUUID()) }),
    limits: { fileSize: bytes, files, fields: 20, fieldSize: 4000, fieldNameSize: 100, parts: files + 20, headerPairs: 50 },
    defParamCharset: 'utf8',
  }).array(field, files)
  return (request, response, next) => {
    if (!request.is('multipart/form-data')) throw new AppError('wrong-type')
    response.once('close', () => {
      // A file that was broken off has no path: multer has removed it.
      const taken = (request.files ?? []) as { path?: string }[]
      for (const { path } of taken) if (path) void rm(path, { force: true })
    })
    upload(request, response, (error: unknown) =>
      next(error === undefined || error === null ? undefined : asAppError(error, { bytes, files })),
    )
  }
}

function asAppError(error: unknown, { bytes, files }: { bytes: number; files: number }): unknown {
  if (error instanceof MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE')
      return new AppError('too-large', { message: `This file is larger than ${Math.round(bytes / 1024 / 1024)} MB.` })
    if (error.code === 'LIMIT_UNEXPECTED_FILE')
      return new AppError('malformed', { message: `Send at most ${files} files, in the field that takes them.` })
    return new AppError('too-large', { message: 'The upload has too many parts or fields.' })
  }
  // What the multipart parser throws is the request's fault: a cut or malformed body.
  return error instanceof Error && !(error as NodeJS.ErrnoException).code ? new AppError('malformed') : error
}
