import * as z from 'zod'
import { roleSchema } from '../domain/access.ts'
import { endpoint } from './endpoint.ts'
import { idSchema, line, listOf, listQuery, paragraph, versionSchema } from './list.ts'
import { emailSchema } from './session.ts'

export const personSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  status: z.enum(['invited', 'active', 'disabled']),
  version: versionSchema,
})
export type Person = z.infer<typeof personSchema>
const personId = z.object({ personId: idSchema })
const firmSchema = z.object({
  name: z.string(),
  address: z.string(),
  phone: z.string(),
  sheetAgeLimitYears: z.number(),
  version: versionSchema,
})
export type Firm = z.infer<typeof firmSchema>

export const peopleEndpoints = {
  listPeople: endpoint({
    method: 'get',
    path: '/api/people',
    access: 'people:manage',
    summary: 'List the people of the firm',
    query: listQuery(['name', 'email', 'role']),
    response: listOf(personSchema),
  }),
  invite: endpoint({
    method: 'post',
    path: '/api/people',
    access: 'people:manage',
    summary: 'Invite a person by e-mail',
    status: 201,
    body: z.strictObject({ name: line(120), email: emailSchema, role: roleSchema }),
    response: personSchema,
  }),
  changePerson: endpoint({
    method: 'patch',
    path: '/api/people/:personId',
    access: 'people:manage',
    summary: 'Change name, role or standing; ends their sessions when disabled',
    params: personId,
    body: z.strictObject({
      version: versionSchema,
      name: line(120).optional(),
      role: roleSchema.optional(),
      status: z.enum(['active', 'disabled']).optional(),
    }),
    response: personSchema,
  }),
  sendLink: endpoint({
    method: 'post',
    path: '/api/people/:personId/link',
    access: 'people:manage',
    summary: 'Send a new invitation or reset link',
    params: personId,
    response: 'nothing',
    status: 204,
  }),
  listCrew: endpoint({
    method: 'get',
    path: '/api/crew',
    access: 'job:write',
    summary: 'Names of the crew, to put them on a job',
    response: z.object({ items: z.array(z.object({ id: idSchema, name: z.string() })) }),
  }),
  readFirm: endpoint({
    method: 'get',
    path: '/api/firm',
    access: 'signed-in',
    summary: "The firm's details and limits",
    response: firmSchema,
  }),
  changeFirm: endpoint({
    method: 'put',
    path: '/api/firm',
    access: 'firm:manage',
    summary: "Change the firm's details and limits",
    body: z.strictObject({
      version: versionSchema,
      name: line(120),
      address: paragraph(400),
      phone: paragraph(40),
      sheetAgeLimitYears: z.number().min(0.5).max(20),
    }),
    response: firmSchema,
  }),
  listOutbox: endpoint({
    method: 'get',
    path: '/api/outbox',
    access: 'outbox:read',
    summary: 'Mail kept here because no mail server is set',
    query: listQuery(['at']),
    response: listOf(z.object({ id: z.string(), at: z.string(), to: z.string(), subject: z.string(), text: z.string() })),
  }),
  listChanges: endpoint({
    method: 'get',
    path: '/api/audit',
    access: 'audit:read',
    summary: 'Who changed what, newest first',
    query: z.object({
      subjectKind: z.string().max(40).optional(),
      subjectId: z.string().max(80).optional(),
      limit: z.coerce.number().int().min(1).max(200).default(50),
      cursor: z
        .string()
        .regex(/^\d{1,15}$/)
        .optional(),
    }),
    response: z.object({
      items: z.array(
        z.object({
          id: z.int(),
          at: z.string(),
          personName: z.string().nullable(),
          action: z.string(),
          subjectKind: z.string(),
          subjectId: z.string(),
          from: z.unknown(),
          to: z.unknown(),
        }),
      ),
      nextCursor: z.string().nullable(),
    }),
  }),
}
