import { Router } from 'express'
import { peopleEndpoints as wire } from '../../../shared/api/people.ts'
import type { AppContext } from '../../http/context.ts'
import { offsetOf, pageOf } from '../../http/list.ts'
import { serve } from '../../http/serve.ts'
import { linkMail } from './link-mail.ts'
import { addPerson, changeFirm, changePerson, listChanges, listCrew, listPeople, makeLink, readFirm, readPerson } from './queries.ts'

/** People and the firm: a technical lead's pages. */
export function peopleRoutes({ db, mail, clock, publicUrl }: AppContext): Router {
  const router = Router()

  serve(router, wire.listPeople, ({ query }) => listPeople(db, query))
  serve(router, wire.invite, async ({ body, user }) => {
    const { person, token, firmName } = await db.transaction(async (tx) => {
      const person = await addPerson(tx, body, user.id)
      const token = await makeLink(tx, { personId: person.id, purpose: 'invitation', now: clock(), byId: user.id })
      return { person, token, firmName: (await readFirm(tx)).name }
    })
    await mail.send(linkMail({ to: person.email, purpose: 'invitation', token, publicUrl, firmName }))
    return person
  })
  serve(router, wire.changePerson, ({ params, body, user }) =>
    db.transaction((tx) => changePerson(tx, params.personId, { ...body, by: user })),
  )
  serve(router, wire.sendLink, async ({ params, user }) => {
    const person = await readPerson(db, params.personId)
    const purpose = person.status === 'invited' ? 'invitation' : 'reset'
    const token = await db.transaction((tx) => makeLink(tx, { personId: person.id, purpose, now: clock(), byId: user.id }))
    const { name: firmName } = await readFirm(db)
    await mail.send(linkMail({ to: person.email, purpose, token, publicUrl, firmName }))
  })
  serve(router, wire.listCrew, async () => ({ items: await listCrew(db) }))
  serve(router, wire.readFirm, () => readFirm(db))
  serve(router, wire.changeFirm, ({ body, user }) => db.transaction((tx) => changeFirm(tx, body, user)))
  serve(router, wire.listOutbox, async ({ query: { q, limit, cursor } }) => {
    const all = (await mail.outbox()).filter((kept) => `${kept.to} ${kept.subject}`.toLowerCase().includes(q.toLowerCase()))
    const offset = offsetOf(cursor)
    return pageOf(all.slice(offset, offset + limit), { offset, limit, total: all.length })
  })
  serve(router, wire.listChanges, ({ query }) => listChanges(db, query))

  return router
}
