import { timingSafeEqual } from 'node:crypto'
import { Router } from 'express'
import { AppError } from '../../../shared/api/errors.ts'
import { sessionEndpoints as wire } from '../../../shared/api/session.ts'
import type { AppContext } from '../../http/context.ts'
import { atMost } from '../../http/security.ts'
import { serve } from '../../http/serve.ts'
import { linkMail } from './link-mail.ts'
import { hashPassword, passwordFits } from './password.ts'
import {
  addPerson,
  endSessions,
  findByEmail,
  hasPeople,
  makeFirm,
  makeLink,
  readFirm,
  readPasswordHash,
  recordSignIn,
  setPassword,
  setPasswordByLink,
} from './queries.ts'

/** Sign-in, sign-out and passwords. What is asked of an unknown address is answered like that of a known one. */
export function sessionRoutes({ db, mail, clock, publicUrl, sessions, firstLeadCode, demo, log }: AppContext): Router {
  const router = Router()
  const slowly = [atMost(60)]

  serve(router, wire.start, async () => {
    const { name, isDemo } = await readFirm(db)
    return { firmName: name, demo: isDemo && demo ? demo : null, needsFirstLead: firstLeadCode !== undefined && !(await hasPeople(db)) }
  })
  serve(router, wire.signIn, async ({ http }) => ({ user: await sessions.signIn(http.request) }), slowly)
  serve(router, wire.who, ({ user }) => ({ user }))
  serve(router, wire.signOut, async ({ user, http }) => {
    await sessions.end(http.request)
    await recordSignIn(db, { personId: user.id, action: 'signed-out', email: user.email })
    http.response.setHeader('Clear-Site-Data', '"cache", "storage"')
  })
  serve(router, wire.signOutEverywhere, async ({ user, http }) => {
    await endSessions(db, user.id)
    await sessions.end(http.request)
    await recordSignIn(db, { personId: user.id, action: 'signed-out', email: user.email })
    http.response.setHeader('Clear-Site-Data', '"cache", "storage"')
  })
  serve(
    router,
    wire.changePassword,
    async ({ body, user, http }) => {
      if (!(await passwordFits(await readPasswordHash(db, user.id), body.currentPassword))) {
        throw new AppError('invalid', { fields: { currentPassword: 'This is not your present password.' } })
      }
      const passwordHash = await hashPassword(body.newPassword)
      await db.transaction((tx) => setPassword(tx, user.id, { passwordHash, exceptSid: http.request.sessionID }))
      await mail.send({
        to: user.email,
        subject: 'Your password was changed',
        text: 'Your Wearcourse password was changed just now. If it was not you, tell your technical lead at once.\n',
      })
    },
    slowly,
  )
  serve(
    router,
    wire.askForLink,
    ({ body }) => {
      sendResetLink(body.email).catch((error: unknown) => log(`mail ${String(error)}`))
    },
    slowly,
  )
  serve(
    router,
    wire.setPassword,
    async ({ body }) => {
      const passwordHash = await hashPassword(body.password)
      const person = await db.transaction((tx) => setPasswordByLink(tx, { token: body.token, passwordHash, now: clock() }))
      await mail.send({
        to: person.email,
        subject: 'Your password was set',
        text: 'A new Wearcourse password was set for this address just now. If it was not you, tell your technical lead at once.\n',
      })
    },
    slowly,
  )
  serve(
    router,
    wire.makeFirstLead,
    async ({ body, http }) => {
      if (firstLeadCode === undefined || !sameText(body.code, firstLeadCode))
        throw new AppError('invalid', { fields: { code: 'This is not the code printed at the start.' } })
      const passwordHash = await hashPassword(body.password)
      const person = await db.transaction(async (tx) => {
        if (await hasPeople(tx)) throw new AppError('not-found')
        await makeFirm(tx, { name: body.firmName, isDemo: false })
        return addPerson(tx, { name: body.name, email: body.email, role: 'lead', passwordHash }, null)
      })
      const user = { id: person.id, name: person.name, email: person.email, role: person.role }
      await sessions.start(http.request, user)
      return { user }
    },
    slowly,
  )

  /** Runs after the answer has gone, so that its time tells nothing about the address. */
  async function sendResetLink(email: string): Promise<void> {
    const person = await findByEmail(db, email)
    if (!person || person.status === 'disabled') return
    const purpose = person.status === 'invited' ? 'invitation' : 'reset'
    const token = await db.transaction((tx) => makeLink(tx, { personId: person.id, purpose, now: clock(), byId: null }))
    const { name: firmName } = await readFirm(db)
    await mail.send(linkMail({ to: email, purpose, token, publicUrl, firmName }))
  }

  return router
}

function sameText(given: string, wanted: string): boolean {
  const [a, b] = [Buffer.from(given.trim()), Buffer.from(wanted)]
  return a.length === b.length && timingSafeEqual(a, b)
}
