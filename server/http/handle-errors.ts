import type { ErrorRequestHandler, RequestHandler } from 'express'
import { AppError, type ErrorBody, type ErrorCode } from '../../shared/api/errors.ts'

export const nothingHere: RequestHandler = () => {
  throw new AppError('not-found')
}

/** Statuses that Express's own parsers throw, by code of ours. */
const byStatus: Record<number, ErrorCode> = { 400: 'malformed', 404: 'not-found', 413: 'too-large', 415: 'wrong-type' }

function asAppError(error: unknown): AppError | undefined {
  if (error instanceof AppError) return error
  if (error instanceof URIError) return new AppError('malformed')
  const status = (error as { status?: unknown }).status
  const code = typeof status === 'number' ? byStatus[status] : undefined
  return code ? new AppError(code) : undefined
}

/** PostgreSQL's code of a refused value (too long, not representable): the request's fault. */
function isRefusedValue(error: unknown): boolean {
  const code = (error as { cause?: { code?: unknown } }).cause?.code
  return typeof code === 'string' && code.startsWith('22')
}

/** The one place where an error becomes an answer. What is not ours is logged whole and answered without detail. */
export function handleErrors(log: (line: string) => void): ErrorRequestHandler {
  // eslint-disable-next-line max-params -- Express knows an error handler by its four parameters
  return (error: unknown, request, response, next) => {
    if (response.headersSent) return next(error)
    let known = asAppError(error)
    if (!known && isRefusedValue(error)) known = new AppError('invalid')
    if (!known) {
      const cause = (error as { cause?: unknown }).cause
      const text = (part: unknown) => (part instanceof Error ? (part.stack ?? part.message).slice(0, 2000) : String(part))
      log(
        `error ${request.method} ${request.path} ${JSON.stringify(text(error))}${cause ? ` caused by ${JSON.stringify(text(cause))}` : ''}`,
      )
      known = new AppError('unavailable')
    }
    const body: ErrorBody = { error: { code: known.code, message: known.message, ...(known.fields ? { fields: known.fields } : {}) } }
    if (known.code === 'too-many') response.setHeader('Retry-After', '30')
    response.status(known.status).json(body)
  }
}
