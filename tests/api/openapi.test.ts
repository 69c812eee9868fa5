import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { z } from 'zod'
import type { Endpoint } from '../../shared/schemas/endpoint.ts'
import { endpoints } from '../../shared/schemas/endpoints.ts'
import { openApiPath } from '../../server/openapi/document.ts'
import { startApp, type TestApp } from './harness.ts'

interface Operation {
  operationId: string
  summary: string
  parameters?: { name: string; in: string; required?: boolean; schema: object }[]
  requestBody?: { content: Record<string, { schema: object }> }
  responses: Record<string, { description: string; content?: Record<string, { schema: object }>; headers?: object }>
  security: object[]
}
interface Document {
  openapi: string
  paths: Record<string, Record<string, Operation>>
  components: { schemas: Record<string, object>; securitySchemes: Record<string, object> }
}

let app: TestApp
let document: Document
beforeAll(async () => {
  app = await startApp()
  document = (await app.anonymous().get('/api/openapi.json').expect(200)).body as Document
})
afterAll(() => app.close())

const all = Object.entries(endpoints) as [string, Endpoint][]
const operationOf = (endpoint: Endpoint) => document.paths[openApiPath(endpoint.path)]?.[endpoint.method]

function refsIn(value: unknown): string[] {
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, inner]) => (key === '$ref' && typeof inner === 'string' ? [inner] : refsIn(inner)))
}

describe('the OpenAPI document', () => {
  it('is version 3.1 and holds every endpoint once, and nothing else', () => {
    expect(document.openapi).toBe('3.1.0')
    const listed = Object.values(document.paths).flatMap((item) => Object.values(item).map(({ operationId }) => operationId))
    expect(listed.sort()).toEqual(Object.keys(endpoints).sort())
  })

  it('has no reference that leads nowhere', () => {
    const refs = refsIn(document)
    expect(refs.length).toBeGreaterThan(50)
    for (const ref of refs) expect(document.components.schemas, ref).toHaveProperty([ref.replace('#/components/schemas/', '')])
  })

  it.each(all)('%s tells its parameters, body, answers and who may ask', (_name, endpoint) => {
    const operation = operationOf(endpoint)
    expect(operation?.summary).toBe(endpoint.summary)
    const inPath = [...endpoint.path.matchAll(/:(\w+)/g)].map(([, name]) => name)
    expect(operation?.parameters?.filter((p) => p.in === 'path' && p.required).map(({ name }) => name) ?? []).toEqual(inPath)
    expect(operation?.parameters?.some(({ name }) => name === 'If-Match') ?? false).toBe(endpoint.ifMatch === true)
    const mediaType = endpoint.upload ? 'multipart/form-data' : endpoint.body instanceof z.ZodVoid ? undefined : 'application/json'
    expect(Object.keys(operation?.requestBody?.content ?? {})).toEqual(mediaType ? [mediaType] : [])
    const success = operation?.responses[endpoint.status]
    const answers = endpoint.binary ?? (endpoint.response instanceof z.ZodVoid ? undefined : 'application/json')
    expect(Object.keys(success?.content ?? {})).toEqual(answers ? [answers] : [])
    for (const [status, response] of Object.entries(operation?.responses ?? {})) {
      if (Number(status) >= 400) expect(response.content?.['application/problem+json']?.schema).toEqual({ $ref: '#/components/schemas/Problem' })
    }
    expect(operation?.responses).toHaveProperty('400')
    expect(operation?.responses['401'] !== undefined).toBe(!endpoint.public || endpoint.action === 'session.create')
    expect(operation?.responses['428'] !== undefined).toBe(endpoint.ifMatch === true)
    expect(operation?.security).toEqual(endpoint.public ? [] : [{ session: [] }])
  })

  it('says that a default may be left out when asking, and is always there when answered', () => {
    const schemas = document.components.schemas as Record<string, { required?: string[] }>
    expect(schemas.WriteJob?.required).toEqual(['title'])
    expect(schemas.Job?.required).toContain('notes')
  })

  it('can be read as a page without scripts', async () => {
    const page = await app.anonymous().get('/api/docs').expect(200)
    expect(page.type).toBe('text/html')
    expect(page.text).not.toMatch(/<script|javascript:|\son\w+=/i)
    for (const [name] of all) expect(page.text).toContain(`id="${name}"`)
    const targets = [...page.text.matchAll(/href="#(\w+)"/g)].map(([, id]) => id)
    expect(targets.length).toBeGreaterThan(20)
    for (const id of new Set(targets)) expect(page.text).toContain(`id="${id}"`)
  })
})
