import type { Router } from 'express'
import type { Request as ExpressRequest, RequestHandler, Response } from 'express'
import type { Endpoint, Reply, Request } from '../../shared/api/endpoint.ts'
import { AppError } from '../../shared/api/errors.ts'
import type { User } from '../../shared/api/session.ts'
import { can } from '../../shared/domain/access.ts'
import { parsePart } from './validate.ts'

/** What a handler gets: the parsed request, the person (never absent on guarded routes) and Express's own pair for files and sessions. */
export interface Call<E extends Endpoint> extends Request<E> {
  user: E['access'] extends 'public' ? User | undefined : User
  http: { request: ExpressRequest; response: Response }
}
type Handler<E extends Endpoint> = (call: Call<E>) => Promise<Reply<E>> | Reply<E>

/** The wall: 401 without a session, 403 when the role may not. */
export function guard(access: Endpoint['access'], user: User | undefined): void {
  if (access === 'public') return
  if (!user) throw new AppError('not-signed-in')
  if (access !== 'signed-in' && !can(user.role, access)) throw new AppError('forbidden')
}

/**
 * Puts an endpoint on a router: guard, parse in, handle, parse out. `before` runs after the guard (uploads, rate limits).
 * A handler of a file endpoint writes to `http.response` itself.
 */
// eslint-disable-next-line max-params -- a route reads as one line: where, what, how, and what goes before
export function serve<E extends Endpoint>(router: Router, endpoint: E, handler: Handler<E>, before: RequestHandler[] = []): void {
  const guarded: RequestHandler = (request, _response, next) => {
    guard(endpoint.access, request.user)
    next()
  }
  const handle: RequestHandler = async (request, response) => {
    const call = {
      params: endpoint.params && parsePart(endpoint.params, request.params, 'params'),
      query: endpoint.query && parsePart(endpoint.query, request.query, 'query'),
      body: endpoint.body && endpoint.body !== 'files' ? parsePart(endpoint.body, request.body, 'body') : undefined,
      user: request.user,
      http: { request, response },
    } as Call<E>
    const reply = await handler(call)
    if (typeof endpoint.response === 'object' && 'file' in endpoint.response) return
    response.status(endpoint.status ?? 200)
    if (endpoint.response === 'nothing') response.end()
    else response.json(endpoint.response.parse(reply))
  }
  router[endpoint.method](endpoint.path, guarded, ...before, handle)
}
