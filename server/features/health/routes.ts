import { Router } from 'express'
import { AppError } from '../../../shared/api/errors.ts'
import { healthEndpoints as wire } from '../../../shared/api/health.ts'
import { serve } from '../../http/serve.ts'
import { openApiDocument } from './open-api.ts'

export function healthRoutes(isAnswering: () => Promise<boolean>): Router {
  const router = Router()
  const document = openApiDocument()
  serve(router, wire.health, async () => {
    if (!(await isAnswering())) throw new AppError('unavailable')
    return { status: 'ok' as const }
  })
  serve(router, wire.openApi, () => document)
  return router
}
