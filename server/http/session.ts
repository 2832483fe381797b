import connectPgSimple from 'connect-pg-simple'
import { type Request, type RequestHandler, Router } from 'express'
import session from 'express-session'
import passport from 'passport'
import { Strategy } from 'passport-local'
import type { Pool } from 'pg'
import { AppError } from '../../shared/api/errors.ts'
import type { User } from '../../shared/api/session.ts'

declare module 'express-session' {
  interface SessionData {
    /** Epoch ms of the sign-in; a session ends for good after `longest`. */
    startedAt: number
  }
}
type SignedIn = User
declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- passport declares its user this way
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- passport's user is ours
    interface User extends SignedIn {}
  }
}

const day = 86_400_000
/** A phone in the field may be out of reach for days; unused for `idle` or older than `longest` it must sign in again. */
const idle = 7 * day
const longest = 30 * day

export interface SessionOptions {
  pool: Pool
  secret: string
  publicUrl: string
  clock: () => number
  /** The person behind a session, or undefined when gone or disabled: asked on every request, so a change of role is in force at once. */
  findUser: (id: string) => Promise<User | undefined>
  /** The person with this address and password, or undefined; takes the same time either way. */
  checkPassword: (email: string, password: string) => Promise<User | undefined>
}

export interface Sessions {
  middleware: Router
  /** Checks `email` and `password` of the body through passport-local and starts a session. */
  signIn(request: Request): Promise<User>
  /** Puts a person into a session with a new id. */
  start(request: Request, user: User): Promise<void>
  /** Ends this session and forgets its row. */
  end(request: Request): Promise<void>
}

/** Cookie name: `__Host-` binds it to the host and needs https. */
export function cookieName(publicUrl: string): string {
  return publicUrl.startsWith('https:') ? '__Host-wearcourse' : 'wearcourse'
}

/** Sessions in the database through connect-pg-simple, signed in through passport-local. */
export function createSessions(options: SessionOptions): Sessions {
  const { clock } = options
  const authenticator = authenticatorFor(options)
  const middleware = Router()
  middleware.use(sessionMiddleware(options), authenticator.session() as RequestHandler, endOldSessions(clock))
  const start = async (request: Request, user: User) => {
    await settled((done) => request.logIn(user, done))
    request.session.startedAt = clock()
  }
  return {
    middleware,
    start,
    end: (request) => settled((done) => request.session.destroy(done)),
    async signIn(request) {
      const user = await new Promise<User | false>((resolve, reject) => {
        const callback = (error: unknown, found?: User | false | null) => (error ? reject(asError(error)) : resolve(found || false))
        const run = authenticator.authenticate('local', callback) as (
          request: Request,
          response: unknown,
          next: (error: Error) => void,
        ) => void
        run(request, request.res, reject)
      })
      if (!user) throw new AppError('wrong-credentials')
      await start(request, user)
      return user
    },
  }
}

const asError = (thrown: unknown) => (thrown instanceof Error ? thrown : new Error(String(thrown)))

function settled(begin: (done: (error: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => begin((error) => (error ? reject(asError(error)) : resolve())))
}

function sessionMiddleware({ pool, secret, publicUrl }: SessionOptions) {
  const PgStore = connectPgSimple(session)
  const overHttps = publicUrl.startsWith('https:')
  return session({
    name: cookieName(publicUrl),
    secret,
    store: new PgStore({ pool, tableName: 'session', pruneSessionInterval: 3600, errorLog: () => undefined }),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    proxy: overHttps,
    cookie: { httpOnly: true, sameSite: 'strict', secure: overHttps, path: '/', maxAge: idle },
  })
}

/** An authenticator of its own for each app, so that two apps in one process do not share strategies. */
function authenticatorFor({ findUser, checkPassword }: SessionOptions) {
  const own = new passport.Passport()
  own.serializeUser((user, done) => done(null, user.id))
  own.deserializeUser((id: string, done) => {
    findUser(id).then((user) => done(null, user ?? false), done)
  })
  own.use(
    new Strategy({ usernameField: 'email' }, (email, password, done) => {
      checkPassword(email, password).then((user) => done(null, user ?? false), done)
    }),
  )
  return own
}

function endOldSessions(clock: () => number) {
  const router = Router()
  router.use((request, _response, next) => {
    if (!request.user || clock() - (request.session.startedAt ?? 0) <= longest) return next()
    request.session.destroy((error: unknown) => {
      delete request.user
      next(error)
    })
  })
  return router
}
