import * as z from 'zod'

/** `?q=&sort=&limit=&cursor=`; a leading `-` on `sort` turns the order round. Cursors are opaque. */
export function listQuery<const S extends readonly [string, ...string[]]>(sortable: S) {
  type Choice = S[number] | `-${S[number]}`
  const choices = sortable.flatMap((key) => [key, `-${key}`]) as [Choice, ...Choice[]]
  const order: z.ZodType<Choice, string> = z.enum(choices as [string, ...string[]])
  return z.object({
    q: z.string().trim().max(200).default(''),
    sort: order.default(choices[0] as never),
    limit: z.coerce.number().int().min(1).max(200).default(50),
    cursor: z
      .string()
      .max(40)
      .regex(/^[A-Za-z0-9_-]+$/)
      .optional(),
  })
}

export function listOf<T extends z.ZodType>(item: T) {
  return z.object({ items: z.array(item), total: z.int(), nextCursor: z.string().nullable(), previousCursor: z.string().nullable() })
}

export const idSchema = z.uuid()
/** Edit counter sent back with a change; another number on the server is a conflict (409). */
export const versionSchema = z.int().min(1)
/** One line of text a person typed: no control characters. */
export function line(max: number) {
  return (
    z
      .string()
      .trim()
      .min(1, 'This cannot be empty.')
      .max(max, `At most ${max} characters.`)
      // eslint-disable-next-line no-control-regex -- control characters are what this refuses
      .regex(/^[^\u0000-\u001f\u007f\p{Cs}]*$/u, 'Control characters are not accepted.')
  )
}
/** Text of several lines; may be empty. */
export function paragraph(max: number) {
  return (
    z
      .string()
      .trim()
      .max(max, `At most ${max} characters.`)
      // eslint-disable-next-line no-control-regex -- control characters other than tab and line breaks are refused
      .regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f\p{Cs}]*$/u, 'Control characters are not accepted.')
  )
}
