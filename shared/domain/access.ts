import * as z from 'zod'

export const roles = ['lead', 'estimator', 'crew'] as const
export const roleSchema = z.enum(roles)
export type Role = z.infer<typeof roleSchema>

/** Who may do what. One row an action; the route and the button ask the same table. */
const allowed = {
  'catalogue:read': ['lead', 'estimator'],
  'catalogue:write': ['lead'],
  'sheet:read': ['lead', 'estimator', 'crew'],
  'sheet:list': ['lead', 'estimator'],
  'sheet:write': ['lead'],
  'build-up:read': ['lead', 'estimator'],
  'build-up:draft': ['lead', 'estimator'],
  'build-up:release': ['lead'],
  'job:read': ['lead', 'estimator'],
  'job:write': ['lead', 'estimator'],
  'price:read': ['lead', 'estimator'],
  'specification:read': ['lead', 'estimator'],
  'specification:write': ['lead', 'estimator'],
  'site-card:read': ['lead', 'estimator', 'crew'],
  'people:manage': ['lead'],
  'firm:manage': ['lead'],
  'outbox:read': ['lead'],
  'audit:read': ['lead'],
  'own-account': ['lead', 'estimator', 'crew'],
} as const satisfies Record<string, readonly Role[]>

export type Action = keyof typeof allowed
export const actions = Object.keys(allowed) as Action[]

/** May someone with this role do this? The one function that guards routes and hides buttons. */
export function can(role: Role, action: Action): boolean {
  return (allowed[action] as readonly Role[]).includes(role)
}
