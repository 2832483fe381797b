import { useState } from 'react'
import type * as z from 'zod'
import { AppError } from '../../shared/api/errors.ts'
import { sentenceOf } from './api.ts'

export interface Problems {
  /** Field address to what is wrong; the address is the input's `name`. */
  fields: Record<string, string>
  /** What is wrong with the whole, in a sentence. */
  summary: string | undefined
}
const none: Problems = { fields: {}, summary: undefined }

/**
 * Sends a form: checks the values with the request's own schema, calls `send`, and keeps what either refuses, by field.
 * What was typed stays in the inputs whatever happens.
 */
export function useSubmit<S extends z.ZodType, R>(schema: S, send: (body: z.output<S>) => Promise<R>) {
  const [problems, setProblems] = useState<Problems>(none)
  const [busy, setBusy] = useState(false)
  const submit = async (values: unknown): Promise<R | undefined> => {
    const parsed = schema.safeParse(values)
    if (!parsed.success) {
      const fields: Record<string, string> = {}
      for (const issue of parsed.error.issues) fields[issue.path.join('.')] ??= issue.message
      setProblems({ fields, summary: undefined })
      return undefined
    }
    setBusy(true)
    try {
      const result = await send(parsed.data)
      setProblems(none)
      return result
    } catch (error) {
      setProblems(problemsOf(error))
      return undefined
    } finally {
      setBusy(false)
    }
  }
  return { submit, problems, busy, setProblems }
}

/** What a thrown error says of a form's fields. */
export function problemsOf(error: unknown): Problems {
  const fields = error instanceof AppError ? (error.fields ?? {}) : {}
  return { fields, summary: Object.keys(fields).length > 0 ? undefined : sentenceOf(error) }
}
