import * as z from 'zod'
import { roleSchema } from '../domain/access.ts'
import { endpoint } from './endpoint.ts'
import { idSchema, line } from './list.ts'

export const emailSchema = z
  .email('Give an e-mail address.')
  .max(254)
  .transform((email) => email.toLowerCase())
/** Long rather than complicated; anything may be pasted. */
export const passwordSchema = z.string().min(12, 'At least 12 characters.').max(256, 'At most 256 characters.')
export const userSchema = z.object({ id: idSchema, name: z.string(), email: z.string(), role: roleSchema })
export type User = z.infer<typeof userSchema>
const userReply = z.object({ user: userSchema })

export const sessionEndpoints = {
  start: endpoint({
    method: 'get',
    path: '/api/start',
    access: 'public',
    summary: 'What the sign-in page needs to know',
    response: z.object({
      firmName: z.string(),
      demo: z.object({ emails: z.array(z.string()), password: z.string() }).nullable(),
      needsFirstLead: z.boolean(),
    }),
  }),
  signIn: endpoint({
    method: 'post',
    path: '/api/session',
    access: 'public',
    summary: 'Sign in',
    body: z.strictObject({ email: z.string().max(254), password: z.string().max(256) }),
    response: userReply,
  }),
  who: endpoint({ method: 'get', path: '/api/session', access: 'signed-in', summary: 'Who is signed in', response: userReply }),
  signOut: endpoint({ method: 'delete', path: '/api/session', access: 'signed-in', summary: 'Sign out', response: 'nothing', status: 204 }),
  signOutEverywhere: endpoint({
    method: 'delete',
    path: '/api/sessions',
    access: 'signed-in',
    summary: 'Sign out on every device',
    response: 'nothing',
    status: 204,
  }),
  changePassword: endpoint({
    method: 'put',
    path: '/api/account/password',
    access: 'own-account',
    summary: 'Change the own password; ends all other sessions',
    body: z.strictObject({ currentPassword: z.string().max(256), newPassword: passwordSchema }),
    response: 'nothing',
    status: 204,
  }),
  askForLink: endpoint({
    method: 'post',
    path: '/api/password-links',
    access: 'public',
    summary: 'Ask for a link to set a new password',
    body: z.strictObject({ email: emailSchema }),
    response: 'nothing',
    status: 204,
  }),
  setPassword: endpoint({
    method: 'post',
    path: '/api/password',
    access: 'public',
    summary: 'Set a password with an invitation or reset link',
    body: z.strictObject({ token: z.string().min(20).max(100), password: passwordSchema }),
    response: 'nothing',
    status: 204,
  }),
  makeFirstLead: endpoint({
    method: 'post',
    path: '/api/first-lead',
    access: 'public',
    summary: 'Make the first technical lead with the code printed at start',
    status: 201,
    body: z.strictObject({
      code: z.string().min(1).max(40),
      firmName: line(120),
      name: line(120),
      email: emailSchema,
      password: passwordSchema,
    }),
    response: userReply,
  }),
}
