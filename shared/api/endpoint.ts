import type * as z from 'zod'
import type { Action } from '../domain/access.ts'

/** Who may call: anyone, anyone signed in, or whoever `can` do the action. */
export type Access = 'public' | 'signed-in' | Action

/**
 * One endpoint of the wire: the route parses with these schemas in and out, the client parses with them, OpenAPI is made from them.
 * `response: 'file'` answers bytes of `contentType`; `body: 'files'` takes multipart PDFs.
 */
export interface Endpoint {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete'
  /** Express form: `/api/products/:productId`. */
  readonly path: `/api/${string}`
  readonly summary: string
  readonly access: Access
  readonly params?: z.ZodObject
  readonly query?: z.ZodObject
  readonly body?: z.ZodType | 'files'
  readonly response: z.ZodType | 'nothing' | { readonly file: string }
  /** 200 unless said: 201 for what is made, 202 for what is taken on, 204 for nothing. */
  readonly status?: 200 | 201 | 202 | 204
}

/** Declares an endpoint with its exact types. */
export function endpoint<const E extends Endpoint>(declaration: E): E {
  return declaration
}

type SchemaOutput<S> = S extends z.ZodType ? z.output<S> : undefined
type SchemaInput<S> = S extends z.ZodType ? z.input<S> : undefined

export interface Request<E extends Endpoint> {
  params: SchemaOutput<E['params']>
  query: SchemaOutput<E['query']>
  body: SchemaOutput<E['body']>
}
export type Reply<E extends Endpoint> = E['response'] extends z.ZodType ? z.input<E['response']> : unknown
export type Received<E extends Endpoint> = E['response'] extends z.ZodType ? z.output<E['response']> : undefined

/** What a client passes: only the parts that the endpoint has. */
export type CallInput<E extends Endpoint> = (E['params'] extends z.ZodType
  ? { params: SchemaInput<E['params']> }
  : { params?: undefined }) &
  (E['query'] extends z.ZodType ? { query?: SchemaInput<E['query']> } : { query?: undefined }) &
  (E['body'] extends z.ZodType ? { body: SchemaInput<E['body']> } : { body?: undefined })
