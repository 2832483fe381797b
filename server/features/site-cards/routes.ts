import { Router } from 'express'
import { siteCardEndpoints as wire } from '../../../shared/api/site-cards.ts'
import type { AppContext } from '../../http/context.ts'
import { serve } from '../../http/serve.ts'
import { listSiteCards, readSiteCard } from './queries.ts'

/** Site cards: what a crew sees of its jobs. */
export function siteCardRoutes({ db, clock }: AppContext): Router {
  const router = Router()
  serve(router, wire.listSiteCards, ({ query, user }) => listSiteCards(db, user, query))
  serve(router, wire.readSiteCard, ({ params, user }) => readSiteCard(db, { jobId: params.jobId, user, now: clock() }))
  return router
}
