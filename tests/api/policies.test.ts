/**
 * Who may do what, written out here once more by hand: the test must not read the table that it tests.
 * a administrator, e engineer, i inspector, s supervisor, w welder, u auditor; `open` needs no sign-in.
 */
import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Endpoint } from '../../shared/schemas/endpoint.ts'
import { endpoints, type EndpointName } from '../../shared/schemas/endpoints.ts'
import { ROLES, type Role } from '../../shared/schemas/people.ts'
import { problem, startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

const letters: Record<Role, string> = { administrator: 'a', engineer: 'e', inspector: 'i', supervisor: 's', welder: 'w', auditor: 'u' }
const ALL = 'aeiswu'

const expected: Record<EndpointName, string> = {
  readSession: 'open',
  signIn: 'open',
  signOut: 'open',
  signOutEverywhere: ALL,
  requestReset: 'open',
  resetPassword: 'open',
  readInvitation: 'open',
  acceptInvitation: 'open',
  changePassword: ALL,
  changeAccount: ALL,

  listPeople: ALL,
  invitePerson: 'a',
  readPerson: ALL,
  changePerson: 'a',
  resendInvitation: 'a',
  readOrganization: ALL,
  changeOrganization: 'a',

  listLibrary: ALL,
  readLibraryItem: ALL,
  listLibraryUses: ALL,
  createLibraryItem: 'ae',
  saveLibraryItem: 'ae',
  removeLibraryItem: 'ae',

  listProcedures: ALL,
  createProcedure: 'e',
  readProcedure: ALL,
  reviseProcedure: 'e',
  readRevision: ALL,
  saveRevision: 'e',
  discardRevision: 'e',
  assessRevision: ALL,
  compareRevision: ALL,
  impactOfRevision: ALL,
  submitRevision: 'e',
  returnRevision: 's',
  approveRevision: 's',
  withdrawRevision: 's',
  printRevision: ALL,
  mailRevision: 'es',

  listCoupons: ALL,
  createCoupon: 'i',
  readCoupon: ALL,
  saveCoupon: 'i',
  qualifyCoupon: ALL,
  qualifyUnderAllStandards: ALL,
  listCertifiedCoupons: ALL,
  certifyCoupon: 'is',
  rejectCoupon: 'is',
  printCoupon: ALL,
  mailCoupon: 'eis',
  listPhotos: ALL,
  addPhotos: 'i',
  changePhoto: 'i',
  removePhoto: 'i',
  readPhoto: ALL,
  readThumbnail: ALL,

  listJobs: ALL,
  createJob: 'es',
  readJob: ALL,
  saveJob: 'es',

  listHeats: ALL,
  createHeat: 'aei',
  readHeat: ALL,
  saveHeat: 'aei',
  removeHeat: 'aei',
  addHeatFiles: 'aei',
  readHeatFile: ALL,
  removeHeatFile: 'aei',

  listMachines: ALL,
  createMachine: 'ae',
  readMachine: ALL,
  saveMachine: 'ae',
  listMachineFiles: ALL,
  addMachineFiles: 'ae',
  readMachineFile: ALL,
  removeMachineFile: 'ae',
  readPanelCard: ALL,

  listArcRecordings: ALL,
  addArcRecording: 'eisw',
  readArcRecording: ALL,
  plotArcRecording: ALL,
  attachArcRecording: 'eisw',
  readArcFile: ALL,
  removeArcRecording: 'eisw',

  listTrials: ALL,
  createTrial: 'eisw',
  readTrial: ALL,
  saveTrial: 'eisw',
  discardTrial: 'eisw',
  addBead: 'eisw',
  saveBead: 'eisw',
  removeBead: 'eisw',
  addBeadPhotos: 'eisw',
  readBeadPhoto: ALL,
  readBeadThumbnail: ALL,
  removeBeadPhoto: 'eisw',
  promoteBead: 'e',

  listStandards: ALL,
  readStandard: ALL,

  lookUp: ALL,
  assess: ALL,
  readToday: ALL,
  listOutbox: 'aeis',
  readMail: 'aeis',
  readMailAttachment: 'aeis',
}

/** Values for the path of an address that exists but names nothing that does. */
const pathValues: Record<string, () => string> = { id: randomUUID, token: () => 'x'.repeat(43), kind: () => 'base-metals', index: () => '0' }

const addressOf = ({ path }: Endpoint): string => `/api${path.replace(/:(\w+)/g, (_all, name: string) => {
  const value = pathValues[name]
  if (!value) throw new Error(`no value for :${name}`)
  return value()
})}`

async function ask(agent: Agent, name: EndpointName) {
  const endpoint: Endpoint = endpoints[name]
  const request = agent[endpoint.method](addressOf(endpoint))
  if (endpoint.ifMatch) request.set('If-Match', '"1"')
  return endpoint.method === 'get' || endpoint.method === 'delete' || endpoint.upload ? request : request.send({})
}

let app: TestApp
let works: TestOrganization
const agents = new Map<Role, Agent>()
beforeAll(async () => {
  app = await startApp()
  works = await app.makeOrganization()
  for (const role of ROLES) agents.set(role, await app.agentFor(works, role))
})
afterAll(() => app.close())

const names = Object.keys(endpoints) as EndpointName[]
/** These end the session that they are asked in, so each gets one of its own. */
const endSessions: EndpointName[] = ['signOut', 'signOutEverywhere']
const notMounted = 'There is no such address here.'

it('the table above names every endpoint', () => {
  expect(Object.keys(expected).sort()).toEqual([...names].sort())
})

describe.each(names)('%s', (name) => {
  const who = expected[name]

  it('not signed in', async () => {
    const answer = await ask(app.anonymous(), name)
    if (who !== 'open') expect(problem(answer)).toMatchObject({ status: 401, title: 'Not signed in' })
    else expect([403, 500]).not.toContain(answer.status)
    // Signing in with nothing is a malformed request, not a refusal.
    if (who === 'open') expect(answer.status).not.toBe(401)
    expect(answer.text ?? '').not.toContain(notMounted)
  })

  it.each(ROLES)('%s', async (role) => {
    const agent = endSessions.includes(name) ? await app.agentFor(await app.makeOrganization(), role) : agents.get(role)
    if (!agent) throw new Error(`no agent for ${role}`)
    const answer = await ask(agent, name)
    if (who === 'open' || who.includes(letters[role])) {
      expect([401, 403]).not.toContain(answer.status)
      expect(answer.status).toBeLessThan(500)
      expect(answer.text ?? '', 'is mounted').not.toContain(notMounted)
    } else {
      expect(problem(answer)).toMatchObject({ status: 403, title: 'Not allowed' })
    }
  })
})

describe('a person with several roles', () => {
  it('may do what any of them allows', async () => {
    const own = await app.makeOrganization()
    await app.services.database.owner.query("update people set roles = '{welder,administrator}' where id = $1", [own.people.welder.id])
    const agent = await app.agentFor(own, 'welder')
    expect((await ask(agent, 'invitePerson')).status).toBe(400)
    expect((await ask(agent, 'createProcedure')).status).toBe(403)
  })
})

describe('the auditor', () => {
  it('changes nothing but the own account', () => {
    const changes = names.filter((name) => endpoints[name].method !== 'get' && expected[name] !== 'open' && expected[name].includes('u'))
    expect(changes.sort()).toEqual(['assess', 'changeAccount', 'changePassword', 'signOutEverywhere'])
  })
})
