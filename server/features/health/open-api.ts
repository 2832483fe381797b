import * as z from 'zod'
import type { Endpoint } from '../../../shared/api/endpoint.ts'
import { endpoints } from '../../../shared/api/endpoints.ts'
import { errorBodySchema, errorCodes } from '../../../shared/api/errors.ts'
import { actions, can, roles } from '../../../shared/domain/access.ts'

const schemaOf = (schema: z.ZodType, io: 'input' | 'output') => {
  const { $schema: _, ...json } = z.toJSONSchema(schema, { io, unrepresentable: 'any' })
  return json
}

const failures = Object.fromEntries(
  [...new Set(Object.values(errorCodes).map(({ status }) => status))]
    .sort()
    .map((status) => [String(status), { $ref: '#/components/responses/error' }]),
)

/** The roles that may call an endpoint; anyone signed in unless an action is named. */
function rolesFor(access: Endpoint['access']) {
  return access === 'public' ? [] : access === 'signed-in' ? [...roles] : roles.filter((role) => can(role, access))
}

function parametersOf({ params, query }: Endpoint) {
  const list = (schema: z.ZodObject | undefined, place: 'path' | 'query') =>
    Object.entries(schema?.shape ?? {}).map(([name, part]) => ({
      name,
      in: place,
      required: place === 'path' || !(part as z.ZodType).safeParse(undefined).success,
      schema: schemaOf(part as z.ZodType, 'input'),
    }))
  return [...list(params, 'path'), ...list(query, 'query')]
}

function requestBodyOf({ body }: Endpoint) {
  if (!body) return {}
  const content =
    body === 'files'
      ? {
          'multipart/form-data': {
            schema: { type: 'object', properties: { files: { type: 'array', items: { type: 'string', format: 'binary' } } } },
          },
        }
      : { 'application/json': { schema: schemaOf(body, 'input') } }
  return { requestBody: { required: true, content } }
}

function responseOf({ response }: Endpoint) {
  if (response === 'nothing') return { description: 'Done.' }
  if ('file' in response)
    return { description: 'The file.', content: { [response.file]: { schema: { type: 'string', format: 'binary' } } } }
  return { description: 'Done.', content: { 'application/json': { schema: schemaOf(response, 'output') } } }
}

/** OpenAPI 3.1 of every endpoint, from the schemas that the routes parse with. `x-roles` tells who may call. */
export function openApiDocument(): Record<string, unknown> {
  const paths: Record<string, Record<string, unknown>> = {}
  for (const [operationId, endpoint] of Object.entries(endpoints)) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}')
    const isPublic = endpoint.access === 'public'
    paths[path] = {
      ...paths[path],
      [endpoint.method]: {
        operationId,
        summary: endpoint.summary,
        parameters: parametersOf(endpoint),
        ...requestBodyOf(endpoint),
        responses: { [String(endpoint.status ?? 200)]: responseOf(endpoint), ...failures },
        security: isPublic ? [] : [{ session: [] }],
        'x-roles': rolesFor(endpoint.access),
      },
    }
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Wearcourse', version: '1' },
    paths,
    'x-actions': actions,
    components: {
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'wearcourse' } },
      responses: {
        error: { description: 'What went wrong.', content: { 'application/json': { schema: schemaOf(errorBodySchema, 'output') } } },
      },
    },
  }
}
