import type * as z from 'zod'
import { AppError } from '../../shared/api/errors.ts'

/** Codes of what is wrong, by the part of the request: an address that names nothing is not found, a bad query malformed, a bad body invalid. */
const codeOf = { params: 'not-found', query: 'malformed', body: 'invalid' } as const

/** Parses one part of a request or throws with each field named. */
export function parsePart<S extends z.ZodType>(schema: S, value: unknown, part: keyof typeof codeOf): z.output<S> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  throw new AppError(codeOf[part], part === 'params' ? {} : { fields: fieldsOf(result.error) })
}

/** Field address to message; the first problem of a field counts. */
export function fieldsOf(error: z.ZodError): Record<string, string> {
  const fields: Record<string, string> = {}
  const keep = (path: PropertyKey[], message: string) => (fields[path.join('.') || 'body'] ??= message)
  for (const issue of error.issues) {
    if (issue.code === 'unrecognized_keys') issue.keys.forEach((key) => keep([...issue.path, key], 'This field is not known.'))
    else keep(issue.path, issue.message)
  }
  return fields
}
