import * as z from 'zod'
import { endpoint } from './endpoint.ts'

export const healthEndpoints = {
  health: endpoint({
    method: 'get',
    path: '/api/health',
    access: 'public',
    summary: 'Is the server serving',
    response: z.object({ status: z.literal('ok') }),
  }),
  openApi: endpoint({
    method: 'get',
    path: '/api/openapi.json',
    access: 'public',
    summary: 'This document',
    response: z.record(z.string(), z.unknown()),
  }),
}
