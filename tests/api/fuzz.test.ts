/**
 * Whatever is sent, the server answers: what it cannot use with a problem that says why, and never with 500.
 * Values come from the same schemas as the OpenAPI document. FUZZ_SEED and FUZZ_RUNS look further.
 */
import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { z } from 'zod'
import type { Endpoint } from '../../shared/schemas/endpoint.ts'
import { endpoints, type EndpointName } from '../../shared/schemas/endpoints.ts'
import { ROLES } from '../../shared/schemas/people.ts'
import { arbitraryOf, nearly, oddText, typicalFor, type JsonSchema } from './arbitraries.ts'
import { problem, startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

const seed = Number(process.env.FUZZ_SEED ?? 20261201)
const numRuns = Number(process.env.FUZZ_RUNS ?? 25)

let app: TestApp
let works: TestOrganization
let agent: Agent
/** Ids of records that the fuzzing itself made, by resource, so that later requests also meet real ones. */
const known = new Map<string, string[]>()
const resourceOf = ({ path }: Endpoint): string => path.split('/')[1] ?? ''
const remember = (resource: string, id: unknown): void => {
  if (typeof id === 'string') known.set(resource, [...(known.get(resource) ?? []), id])
}

beforeAll(async () => {
  app = await startApp()
  works = await app.makeOrganization()
  await app.services.database.owner.query('update people set roles = $2 where id = $1', [works.people.administrator.id, ROLES])
  agent = await app.agentFor(works, 'administrator')
  remember('people', works.people.welder.id)
})
afterAll(() => app.close())

const jsonSchemaOf = (schema: z.ZodType): JsonSchema => z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any', target: 'draft-2020-12' }) as JsonSchema

const asText = (value: unknown): string => (typeof value === 'string' ? value : (JSON.stringify(value) ?? ''))

interface Sent {
  path: Record<string, { known: number | null; text: string }>
  query: Record<string, unknown>
  ifMatch: string | null
  body: unknown
}

const rightOf = (schema: JsonSchema, name: string): fc.Arbitrary<unknown> => typicalFor(name, schema) ?? arbitraryOf(schema)

function sentTo(endpoint: Endpoint): fc.Arbitrary<Sent> {
  const names = [...endpoint.path.matchAll(/:(\w+)/g)].map(([, name]) => name ?? '')
  const paths = jsonSchemaOf(endpoint.params)
  const segment = (name: string) => fc.record({
    known: name === 'id' ? fc.option(fc.nat(), { freq: 4 }) : fc.constant(null),
    text: fc.oneof({ weight: 3, arbitrary: nearly(paths.properties?.[name] ?? {}).map(asText) }, { weight: 1, arbitrary: oddText }),
  })
  const queries = Object.entries(jsonSchemaOf(endpoint.query).properties ?? {})
  const query = Object.fromEntries(queries.map(([name, schema]) => [name, fc.oneof({ weight: 8, arbitrary: rightOf(schema, name) }, { weight: 1, arbitrary: oddText })]))
  return fc.record({
    path: fc.record(Object.fromEntries(names.map((name) => [name, segment(name)]))),
    query: fc.record(query, { requiredKeys: [] }),
    ifMatch: endpoint.ifMatch ? fc.constantFrom(null, '"1"', '"2"', '"1"', 'W/"1"', '1', '"x"', '*', '"99999999999"') : fc.constant(null),
    body: endpoint.body instanceof z.ZodVoid ? fc.constant(undefined) : nearly(jsonSchemaOf(endpoint.body)),
  })
}

/** Short enough for an HTTP parser's own limit; `.` and `..` as a whole segment would be taken out of the address before it is sent. */
const asSegment = (text: string): string => encodeURIComponent(text.slice(0, 200)).replace(/^\.+$/, (dots) => '%2E'.repeat(dots.length)) || '%20'

function addressOf(endpoint: Endpoint, { path, query }: Sent): string {
  const at = endpoint.path.replace(/:(\w+)/g, (_all, name: string) => {
    const value = path[name]
    const ids = known.get(resourceOf(endpoint)) ?? []
    const id = typeof value?.known === 'number' ? ids[value.known % Math.max(ids.length, 1)] : undefined
    return asSegment(id ?? value?.text ?? '')
  })
  const pairs = Object.entries(query).filter(([, value]) => value !== undefined).map(([name, value]) => `${name}=${encodeURIComponent(asText(value).slice(0, 400))}`)
  return `/api${at}${pairs.length > 0 ? `?${pairs.join('&')}` : ''}`
}

/** These would end or lock the session that the fuzzing runs in. */
const withoutSession: EndpointName[] = ['signIn', 'signOut', 'signOutEverywhere', 'changePassword', 'requestReset', 'resetPassword', 'acceptInvitation']

describe.each(Object.keys(endpoints) as EndpointName[])('%s', (name) => {
  const endpoint: Endpoint = endpoints[name]
  it('answers with what it promises, or says what is wrong', async () => {
    await fc.assert(
      fc.asyncProperty(sentTo(endpoint), async (sent) => {
        const request = (withoutSession.includes(name) ? app.anonymous() : agent)[endpoint.method](addressOf(endpoint, sent))
        if (sent.ifMatch !== null) request.set('If-Match', sent.ifMatch)
        if (sent.body !== undefined) request.set('Content-Type', 'application/json')
        const answer = await (sent.body === undefined ? request : request.send(JSON.stringify(sent.body)))
        if (answer.status >= 500) throw new Error(`${answer.status}: ${app.logs.filter((line) => line.includes('"err"')).at(-1)?.slice(0, 3000) ?? 'nothing logged'}`)
        if (answer.status >= 400) {
          const told = problem(answer)
          expect(told.status).toBe(answer.status)
          expect(told.detail.length).toBeGreaterThan(10)
        } else {
          expect(answer.status).toBe(endpoint.status)
          const body: unknown = endpoint.binary || endpoint.status === 204 ? undefined : answer.body
          if (endpoint.status === 201) {
            const { id, procedureId } = body as { id?: unknown; procedureId?: unknown }
            // A new procedure is answered with its first revision.
            remember(name === 'createProcedure' || name === 'reviseProcedure' ? 'revisions' : resourceOf(endpoint), id)
            if (name === 'createProcedure') remember('procedures', procedureId)
          }
        }
      }),
      { seed, numRuns, endOnFailure: true },
    )
  })
})

it('meets real records: some of what it sends is right', () => {
  for (const resource of ['people', 'procedures', 'revisions', 'coupons', 'jobs']) expect(known.get(resource)?.length ?? 0, resource).toBeGreaterThan(1)
})
