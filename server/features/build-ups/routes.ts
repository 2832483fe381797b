import { Router } from 'express'
import { buildUpEndpoints as wire } from '../../../shared/api/build-ups.ts'
import { can } from '../../../shared/domain/access.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import type { AppContext } from '../../http/context.ts'
import { serve } from '../../http/serve.ts'
import { listNewest, readBuildUp, readChoices, readFacts } from './queries.ts'
import { release } from './release.ts'
import { countFindings, summarise } from './summary.ts'
import { workOfStages } from './work.ts'
import { addBuildUp, addDraft, copyBuildUp, renameBuildUp, saveDraft, withdrawVersion } from './write-queries.ts'

/** Build-ups: drafted by lead and estimator, released by the lead. */
export function buildUpRoutes({ db, clock }: AppContext): Router {
  const router = Router()

  serve(router, wire.listBuildUps, async ({ query }) => {
    const page = await listNewest(db, query)
    return { ...page, items: await summarise(db, page.items, clock()) }
  })
  serve(router, wire.addBuildUp, async ({ body, user }) => {
    const now = clock()
    const { buildUpId } = await db.transaction((tx) =>
      addBuildUp(tx, { name: body.name, work: workOfStages(body.stages) }, { by: user, now }),
    )
    return readBuildUp(db, buildUpId, { now })
  })
  serve(router, wire.readCourseFacts, ({ query }) => readFacts(db, { mixIds: query.mixes, productIds: query.products }))
  serve(router, wire.listChoices, ({ query }) => readChoices(db, query.q))
  serve(router, wire.readBuildUp, ({ params, query }) => readBuildUp(db, params.buildUpId, { number: query.version, now: clock() }))
  serve(router, wire.renameBuildUp, ({ params, body, user }) =>
    db.transaction((tx) => renameBuildUp(tx, params.buildUpId, { ...body, by: user })),
  )
  serve(router, wire.copyBuildUp, async ({ params, body, user }) => {
    const now = clock()
    const { buildUpId } = await db.transaction((tx) => copyBuildUp(tx, params.buildUpId, { ...body, by: user, now }))
    return readBuildUp(db, buildUpId, { now })
  })
  serve(router, wire.addDraft, async ({ params, body, user }) => {
    const now = clock()
    const number = await db.transaction((tx) => addDraft(tx, params.buildUpId, { ...body, by: user, now }))
    return readBuildUp(db, params.buildUpId, { number, now })
  })
  serve(router, wire.saveDraft, async ({ params, body, user }) => {
    const { version, courses, conditions } = body
    const { input, ...saved } = await db.transaction((tx) =>
      saveDraft(tx, { ...params, version }, { work: { courses, conditions }, by: user, now: clock() }),
    )
    return { ...saved, findings: countFindings(evaluate(input).findings) }
  })
  serve(router, wire.releaseVersion, async ({ params, body, user }) => {
    const now = clock()
    await db.transaction((tx) => release(tx, { place: { ...params, version: body.version }, reasons: body.reasons, by: user, now }))
    return readBuildUp(db, params.buildUpId, { number: params.number, now })
  })
  serve(router, wire.withdrawVersion, async ({ params, body, user }) => {
    const now = clock()
    const who = { by: user, mayRelease: can(user.role, 'build-up:release'), now }
    await db.transaction((tx) => withdrawVersion(tx, { ...params, version: body.version }, who))
    return readBuildUp(db, params.buildUpId, { number: params.number, now })
  })

  return router
}
