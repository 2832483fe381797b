import * as z from 'zod'

/** Every error the server answers with: its HTTP status and what a person can do. One row a code. */
export const errorCodes = {
  malformed: { status: 400, message: 'The request could not be read.' },
  'not-signed-in': { status: 401, message: 'Sign in to go on.' },
  'wrong-credentials': { status: 401, message: 'The e-mail address or the password is not right.' },
  forbidden: { status: 403, message: 'Your role does not allow this.' },
  'wrong-origin': { status: 403, message: 'The request came from another site and was refused.' },
  'not-found': { status: 404, message: 'There is nothing here, or it is not yours to see.' },
  conflict: { status: 409, message: 'Someone else has changed this meanwhile. Load it again and repeat your change.' },
  duplicate: { status: 409, message: 'This is already here.' },
  'in-use': { status: 409, message: 'This is in use and cannot be removed.' },
  'release-refused': { status: 409, message: 'A check stops this release.' },
  'reasons-missing': { status: 422, message: 'Every caution and unknown needs a reason before release.' },
  'too-large': { status: 413, message: 'This is larger than allowed.' },
  'wrong-type': { status: 415, message: 'This kind of content is not accepted here.' },
  invalid: { status: 422, message: 'There is a problem with what was entered.' },
  'not-a-pdf': { status: 422, message: 'This file is not a PDF.' },
  encrypted: { status: 422, message: 'This PDF needs a password. Save a copy without one and upload that.' },
  damaged: { status: 422, message: 'This PDF is damaged and cannot be opened.' },
  'link-dead': { status: 422, message: 'This link has been used or has expired. Ask for a new one.' },
  'too-many': { status: 429, message: 'Too many tries. Wait a little and try again.' },
  unavailable: { status: 503, message: 'The database does not answer. Try again in a minute.' },
} as const satisfies Record<string, { status: number; message: string }>

export type ErrorCode = keyof typeof errorCodes
const codes = Object.keys(errorCodes) as [ErrorCode, ...ErrorCode[]]
export const errorCodeSchema = z.enum(codes)

export const errorBodySchema = z.object({
  error: z.object({
    code: errorCodeSchema,
    message: z.string(),
    /** Address of the field (`body.parts.0.productId`) to what is wrong with it. */
    fields: z.record(z.string(), z.string()).optional(),
  }),
})
export type ErrorBody = z.infer<typeof errorBodySchema>

/** An error that crosses the wire by its code. */
export class AppError extends Error {
  readonly code: ErrorCode
  readonly fields: Record<string, string> | undefined

  constructor(code: ErrorCode, options: { message?: string; fields?: Record<string, string> } = {}) {
    super(options.message ?? errorCodes[code].message)
    this.name = 'AppError'
    this.code = code
    this.fields = options.fields
  }

  get status(): number {
    return errorCodes[this.code].status
  }
}
