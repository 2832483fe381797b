import { randomUUID } from 'node:crypto'
import type supertest from 'supertest'
import { describe, expect, it } from 'vitest'
import { errorBodySchema } from '../../shared/api/errors.ts'
import { roles } from '../../shared/domain/access.ts'
import { type Agent, testApp } from '../setup/app.ts'

const { as } = await testApp()

interface Operation {
  operationId: string
  security: unknown[]
  'x-roles': string[]
  requestBody?: { content: Record<string, unknown> }
  parameters: { name: string; in: string; schema: { type?: string; enum?: string[] } }[]
}
type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

const document = (await as.nobody.get('/api/openapi.json').expect(200)).body as {
  openapi: string
  paths: Record<string, Record<string, Operation>>
}
const operations = Object.entries(document.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method: method as Method, operation })),
)
const guarded = operations.filter(({ operation }) => operation.security.length > 0)

/** An address of the operation with ids that name nothing. */
const filled = (path: string) => path.replace(/\{(\w+)\}/g, (_, name: string) => (/number|page$/i.test(name) ? '1' : randomUUID()))
const request = (agent: Agent, { path, method }: { path: string; method: Method }) => agent[method](filled(path))
const isError = (answer: supertest.Response) => errorBodySchema.parse(answer.body).error.code

describe('every endpoint of the OpenAPI document', () => {
  it('is described in OpenAPI 3.1, and there are many', () => {
    expect(document.openapi).toBe('3.1.0')
    expect(operations.length).toBeGreaterThan(25)
  })

  it.each(guarded.map((one) => [`${one.method} ${one.path}`, one] as const))('answers 401 without a session: %s', async (_, one) => {
    const answer = await request(as.nobody, one)
    expect(answer.status).toBe(401)
    expect(isError(answer)).toBe('not-signed-in')
  })

  const wrongRoles = guarded.flatMap((one) =>
    roles
      .filter((role) => !one.operation['x-roles'].includes(role))
      .map((role) => [`${role}: ${one.method} ${one.path}`, role, one] as const),
  )
  it.each(wrongRoles)('answers 403 to the wrong role: %s', async (_, role, one) => {
    const answer = await request(as[role], one)
    expect(answer.status).toBe(403)
    expect(isError(answer)).toBe('forbidden')
  })

  const jsonBodies = operations.filter(({ operation }) => operation.requestBody?.content['application/json'])
  const badBodies: [string, unknown][] = [
    ['null', null],
    ['a text', 'text'],
    ['a number', 7],
    ['a list', []],
    ['an empty object', {}],
    ['wrong types', { name: 5, email: [], password: {}, version: 'one', bays: 'many', courses: 1, value: [], parts: 'A' }],
    ['control characters', { name: 'a\u0000b', email: '\u0007@x.example', title: '\u0001', reason: '\u0000', version: 1 }],
    ['a polluted prototype', JSON.parse('{"__proto__":{"role":"lead"},"constructor":{"prototype":{}}}')],
  ]
  it.each(jsonBodies.map((one) => [`${one.method} ${one.path}`, one] as const))(
    'refuses every malformed body with 4xx, never 5xx: %s',
    async (_, one) => {
      const role = roles.find((role) => one.operation['x-roles'].includes(role)) ?? 'nobody'
      if (['signIn', 'signOut'].includes(one.operation.operationId)) return
      for (const [what, body] of badBodies) {
        const answer = await request(as[role], one).set('Content-Type', 'application/json').send(JSON.stringify(body))
        expect(answer.status, what).toBeGreaterThanOrEqual(400)
        expect(answer.status, what).toBeLessThan(500)
      }
      const broken = await request(as[role], one).set('Content-Type', 'application/json').send('{"name":')
      expect(broken.status).toBe(400)
      const huge = await request(as[role], one)
        .set('Content-Type', 'application/json')
        .send(JSON.stringify({ name: 'x'.repeat(1_200_000) }))
      expect(huge.status).toBe(413)
      const form = await request(as[role], one).set('Content-Type', 'application/x-www-form-urlencoded').send('name=x')
      expect(form.status).toBe(415)
    },
  )

  const lists = operations.filter(
    ({ method, operation }) =>
      method === 'get' && operation.parameters.some(({ name, in: place }) => place === 'query' && name === 'limit'),
  )
  it.each(lists.map((one) => [one.path, one] as const))('refuses a list query at fault and names the field: %s', async (_, one) => {
    const role = roles.find((role) => one.operation['x-roles'].includes(role)) ?? 'nobody'
    for (const query of ['limit=0', 'limit=201', 'limit=many', 'cursor=%00', 'cursor=../../x']) {
      const answer = await as[role].get(`${filled(one.path)}?${query}`)
      expect(answer.status, query).toBe(400)
      expect(Object.keys(errorBodySchema.parse(answer.body).error.fields ?? {}), query).toContain(query.split('=')[0])
    }
  })

  const named = operations.filter(({ path }) => path.includes('{'))
  it.each(named.map((one) => [`${one.method} ${one.path}`, one] as const))(
    'an id that is none of ours leads to 404 or is refused: %s',
    async (_, one) => {
      const role = roles.find((role) => one.operation['x-roles'].includes(role)) ?? 'nobody'
      for (const id of ['nothing', '1', "' or 1=1 --", '%00', '..%2f..%2fetc', 'a'.repeat(3000)]) {
        const answer = await as[role][one.method](one.path.replace(/\{\w+\}/g, id.includes('%') ? id : encodeURIComponent(id))).set(
          'Content-Type',
          'application/json',
        )
        expect(answer.status, id).toBeGreaterThanOrEqual(400)
        expect(answer.status, id).toBeLessThan(500)
      }
    },
  )
})
