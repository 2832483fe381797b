import type { RequestHandler } from 'express'
import { rateLimit } from 'express-rate-limit'
import helmet from 'helmet'
import { AppError } from '../../shared/api/errors.ts'

/** Response headers. The page may load only what this server ships; pdf.js needs its worker and its decoders. */
export function securityHeaders(publicUrl: string): RequestHandler {
  const overHttps = publicUrl.startsWith('https:')
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        styleSrc: ["'self'"],
        styleSrcAttr: ["'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        workerSrc: ["'self'", 'blob:'],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    strictTransportSecurity: overHttps ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'no-referrer' },
    crossOriginEmbedderPolicy: false,
  })
}

const changing = new Set(['POST', 'PUT', 'PATCH', 'DELETE'])

/** Refuses a state-changing request that a browser sends on behalf of another site. Programs without an Origin pass. */
export function sameOrigin(publicUrl: string): RequestHandler {
  const ours = new URL(publicUrl).host
  return (request, _response, next) => {
    if (!changing.has(request.method)) return next()
    const site = request.headers['sec-fetch-site']
    if (site && site !== 'same-origin' && site !== 'none') throw new AppError('wrong-origin')
    const origin = request.headers.origin
    if (origin !== undefined) {
      const host = URL.canParse(origin) ? new URL(origin).host : ''
      if (host !== ours && host !== request.headers.host) throw new AppError('wrong-origin')
    }
    next()
  }
}

/** A request body is JSON or it is a file upload; forms of other sites cannot send either without asking first. */
export const jsonOrFiles: RequestHandler = (request, _response, next) => {
  const hasBody = request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length'] ?? 0) > 0
  if (hasBody && changing.has(request.method) && !request.is(['application/json', 'multipart/form-data'])) throw new AppError('wrong-type')
  next()
}

/** At most `limit` requests a minute from one address, or one account once signed in. */
export function atMost(limit: number): RequestHandler {
  return rateLimit({
    windowMs: 60_000,
    limit,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    keyGenerator: (request) => request.user?.id ?? request.socket.remoteAddress ?? 'unknown',
    handler: () => {
      throw new AppError('too-many')
    },
    validate: { keyGeneratorIpFallback: false },
  })
}
