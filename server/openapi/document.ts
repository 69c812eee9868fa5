import { z } from 'zod'
import { createDocument, type ZodOpenApiOperationObject, type ZodOpenApiParameters, type ZodOpenApiPathsObject, type ZodOpenApiResponsesObject } from 'zod-openapi'
import { problemSchema } from '../../shared/schemas/common.ts'
import { COOKIE } from '../middleware/session.ts'
import type { Endpoint } from '../../shared/schemas/endpoint.ts'
import { endpoints } from '../../shared/schemas/endpoints.ts'

const uploadSchema = z.object({ files: z.array(z.string().meta({ format: 'binary' })) }).meta({ id: 'Upload' })
const ifMatch = z.string().meta({ description: 'The ETag last read, like "3"; keeps two people from overwriting each other.', example: '"3"' })

/** What can go wrong, and when an operation says so. */
const problems: readonly [status: number, description: string, when: (endpoint: Endpoint) => boolean][] = [
  [400, 'The request could not be read; `errors` names each field, its value and what would be right.', () => true],
  [401, 'Not signed in.', ({ public: open, action }) => !open || action === 'session.create'],
  [403, 'The roles do not allow it, or the change was asked for by another site.', ({ method, public: open }) => !open || method !== 'get'],
  [404, 'No such record in this organization.', ({ path, public: open }) => path.includes(':') && !open],
  [409, 'Somebody else saved first, or the record exists; `current` is the present version.', ({ method, ifMatch: versioned }) => versioned === true || method === 'post'],
  [410, 'The private link has been used or is too old.', ({ path }) => path.includes(':token')],
  [413, 'Larger than accepted.', ({ body, upload }) => upload === true || !(body instanceof z.ZodVoid)],
  [415, 'Another kind of content than accepted.', ({ body, upload }) => upload === true || !(body instanceof z.ZodVoid)],
  [422, 'Understood, but the record’s state or the rules do not allow it.', ({ method }) => method !== 'get'],
  [428, 'If-Match is missing.', ({ ifMatch: versioned }) => versioned === true],
  [429, 'Too many tries; Retry-After says how many seconds to wait.', ({ action, body }) => action === 'session.create' || action === 'password.reset' || (body instanceof z.ZodObject && ('password' in body.shape || 'currentPassword' in body.shape))],
]

function responsesOf(endpoint: Endpoint): ZodOpenApiResponsesObject {
  const responses: ZodOpenApiResponsesObject = {}
  const description = endpoint.status === 204 ? 'Done.' : endpoint.status === 202 ? 'Accepted; it is done in the background.' : endpoint.status === 201 ? 'Made.' : 'Found.'
  const versioned = endpoint.response instanceof z.ZodObject && 'version' in endpoint.response.shape
  const content = endpoint.binary
    ? { [endpoint.binary]: { schema: { type: 'string' as const, format: 'binary' } } }
    : endpoint.response instanceof z.ZodVoid
      ? undefined
      : { 'application/json': { schema: endpoint.response } }
  responses[`${endpoint.status}` as '200'] = {
    description,
    ...(content && { content }),
    ...(versioned && { headers: z.object({ ETag: z.string().meta({ description: 'The version, for If-Match.' }) }) }),
  }
  for (const [status, text, when] of problems) {
    if (when(endpoint)) responses[`${status}` as '400'] = { description: text, content: { 'application/problem+json': { schema: problemSchema } } }
  }
  return responses
}

function parametersOf(endpoint: Endpoint): ZodOpenApiParameters {
  const holdsFields = (schema: z.ZodType): schema is z.ZodObject => schema instanceof z.ZodObject && Object.keys(schema.shape).length > 0
  return {
    ...(holdsFields(endpoint.params) && { path: endpoint.params }),
    ...(holdsFields(endpoint.query) && { query: endpoint.query }),
    ...(endpoint.ifMatch && { header: z.object({ 'If-Match': ifMatch }) }),
  }
}

function operationOf(name: string, endpoint: Endpoint): ZodOpenApiOperationObject {
  return {
    operationId: name,
    tags: [endpoint.tag],
    summary: endpoint.summary,
    requestParams: parametersOf(endpoint),
    ...(endpoint.upload
      ? { requestBody: { required: true, content: { 'multipart/form-data': { schema: uploadSchema } } } }
      : endpoint.body instanceof z.ZodVoid
        ? {}
        : { requestBody: { required: true, content: { 'application/json': { schema: endpoint.body } } } }),
    responses: responsesOf(endpoint),
    security: endpoint.public ? [] : [{ session: [] }],
  }
}

/** The registry's path as OpenAPI writes it: `/people/:id` is `/people/{id}`. */
export const openApiPath = (path: string): string => path.replace(/:(\w+)/g, '{$1}')

/** The API as an OpenAPI 3.1 document, made from the same schemas that the server parses with. */
export function apiDocument(): ReturnType<typeof createDocument> {
  const paths: ZodOpenApiPathsObject = {}
  for (const [name, endpoint] of Object.entries(endpoints) as [string, Endpoint][]) {
    const path = openApiPath(endpoint.path)
    paths[path] = { ...paths[path], [endpoint.method]: operationOf(name, endpoint) }
  }
  return createDocument({
    openapi: '3.1.0',
    info: { title: 'Sidebend', version: '1', description: 'Welding procedures: written, tested, approved and used. Lists give `next`, the cursor of the page that follows. Errors are problem details (RFC 9457).' },
    servers: [{ url: '/api' }],
    tags: [...new Set(Object.values(endpoints).map(({ tag }) => tag))].map((name) => ({ name })),
    paths,
    components: { securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: COOKIE, description: 'Set by signing in: POST /api/session.' } } },
  })
}
