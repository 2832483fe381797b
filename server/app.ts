import express, { type Express, type Router } from 'express'
import type { Pool } from 'pg'
import type { Database } from './db/open.ts'
import { buildUpRoutes } from './features/build-ups/routes.ts'
import { catalogueRoutes } from './features/catalogue/routes.ts'
import { healthRoutes } from './features/health/routes.ts'
import { findUser } from './features/people/queries.ts'
import { jobRoutes } from './features/jobs/routes.ts'
import { peopleRoutes } from './features/people/routes.ts'
import { sessionRoutes } from './features/people/session-routes.ts'
import { checkPassword } from './features/people/sign-in.ts'
import { siteCardRoutes } from './features/site-cards/routes.ts'
import { sheetRoutes } from './features/sheets/routes.ts'
import { specificationRoutes } from './features/specifications/routes.ts'
import type { FileStore } from './files/store.ts'
import type { AppContext } from './http/context.ts'
import { handleErrors, nothingHere } from './http/handle-errors.ts'
import { atMost, jsonOrFiles, sameOrigin, securityHeaders } from './http/security.ts'
import { createSessions } from './http/session.ts'
import type { Mailer } from './mail/send.ts'

export interface AppParts {
  db: Database
  pool: Pool
  isAnswering: () => Promise<boolean>
  files: FileStore
  mail: Mailer
  clock: () => number
  publicUrl: string
  sessionSecret: string
  firstLeadCode?: string | undefined
  demo?: AppContext['demo']
  log: (line: string) => void
  /** The built client: serves pages and their files. Absent under tests of the API. */
  pages?: Router
  /** Requests a minute from one address or account. */
  requestsPerMinute?: number
}

/** One routes function a feature. */
const features: ((context: AppContext) => Router)[] = [
  sessionRoutes,
  peopleRoutes,
  catalogueRoutes,
  jobRoutes,
  siteCardRoutes,
  sheetRoutes,
  buildUpRoutes,
  specificationRoutes,
]

/** The server without its socket: middleware, the features' routers, 404 and the one error handler. */
export function createApp(parts: AppParts): Express {
  const { db, pool, publicUrl, clock, log } = parts
  const app = express()
  app.disable('x-powered-by')
  app.set('query parser', 'simple')
  app.use(securityHeaders(publicUrl))
  app.use(healthRoutes(parts.isAnswering))
  if (parts.pages) app.use(parts.pages)

  const sessions = createSessions({
    pool,
    publicUrl,
    clock,
    secret: parts.sessionSecret,
    findUser: (id) => findUser(db, id),
    checkPassword: (email, password) => checkPassword(db, { email, password, now: clock() }),
  })
  const context: AppContext = {
    db,
    files: parts.files,
    mail: parts.mail,
    sessions,
    clock,
    publicUrl,
    firstLeadCode: parts.firstLeadCode,
    demo: parts.demo,
    log,
  }
  app.use('/api', (_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store')
    next()
  })
  app.use(sameOrigin(publicUrl), jsonOrFiles, sessions.middleware, atMost(parts.requestsPerMinute ?? 1200))
  app.use(express.json({ limit: '1mb', strict: true }))
  for (const routes of features) app.use(routes(context))
  app.use(nothingHere)
  app.use(handleErrors(log))
  return app
}
