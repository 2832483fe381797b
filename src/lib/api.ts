import * as z from 'zod'
import type { CallInput, Endpoint, Received } from '../../shared/api/endpoint.ts'
import { AppError, errorBodySchema } from '../../shared/api/errors.ts'

/** The server could not be reached: no network, or it is down. */
export class OfflineError extends Error {
  constructor() {
    super('The server cannot be reached. Check the connection and try again.')
    this.name = 'OfflineError'
  }
}

/** The address of an endpoint with its parameters and query put in. */
export function addressOf(endpoint: Endpoint, input: { params?: object | undefined; query?: object | undefined } = {}): string {
  const params = input.params as Record<string, string> | undefined
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(params?.[name] ?? ''))
  const query = new URLSearchParams()
  for (const [name, value] of Object.entries(input.query ?? {})) if (value !== undefined && value !== '') query.set(name, String(value))
  const search = query.toString()
  return search ? `${path}?${search}` : path
}

/**
 * Calls an endpoint and parses what it answers.
 * @throws AppError by code, OfflineError without an answer.
 */
export async function call<E extends Endpoint>(endpoint: E, input: CallInput<E> & { signal?: AbortSignal }): Promise<Received<E>> {
  const body = input.body === undefined ? {} : { body: JSON.stringify(input.body), headers: { 'Content-Type': 'application/json' } }
  let response: Response
  try {
    response = await fetch(addressOf(endpoint, input), {
      method: endpoint.method.toUpperCase(),
      credentials: 'same-origin',
      ...body,
      ...(input.signal ? { signal: input.signal } : {}),
    })
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw new OfflineError()
  }
  if (!response.ok) throw await errorOf(response)
  if (!(endpoint.response instanceof z.ZodType)) return undefined as Received<E>
  return endpoint.response.parse(await response.json()) as Received<E>
}

/** The error that a refused response carries. */
export async function errorOf(response: { status: number; json(): Promise<unknown> }): Promise<AppError> {
  const parsed = errorBodySchema.safeParse(await response.json().catch(() => undefined))
  if (!parsed.success) return new AppError(response.status === 429 ? 'too-many' : 'unavailable')
  const { code, message, fields } = parsed.data.error
  return new AppError(code, { message, ...(fields ? { fields } : {}) })
}

/** A sentence for a person about anything that was thrown. */
export function sentenceOf(error: unknown): string {
  return error instanceof AppError || error instanceof OfflineError ? error.message : 'Something went wrong on this page. Load it again.'
}
