import { execFile } from 'node:child_process'
import { randomUUID } from 'node:crypto'
import { promisify } from 'node:util'
import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import type { Role } from '@shared/schemas/people.ts'
import { axe, overflows, widths } from './browser.ts'
import { complaintsOf, eventually, focusInside, settled, useStage } from './stage.ts'

const stage = useStage()
const run = promisify(execFile)

/** Records of the demo firm by what they are, as the API lists them. */
const found: Record<string, string> = {}
beforeAll(async () => {
  const page = await stage.as('engineer')
  const list = async (path: string) => ((await (await page.request.get(`/api/${path}`)).json()) as { items: { id: string; revisionId?: string }[] }).items
  for (const state of ['draft', 'in-review', 'approved', 'withdrawn']) found[state] = (await list(`procedures?state=${state}&sort=number&limit=1`))[0]?.revisionId ?? ''
  for (const state of ['certified', 'testing', 'rejected', 'planned', 'welding']) found[`coupon ${state}`] = (await list(`coupons?state=${state}&limit=1`))[0]?.id ?? ''
  found['open coupon'] = found['coupon testing'] || found['coupon welding'] || found['coupon planned'] || ''
  found.job = (await list('jobs?limit=1'))[0]?.id ?? ''
  const machines = await list('machines?sort=number')
  ;[found['precise machine'], found['plain feeder'], found['lumping machine']] = machines.map(({ id }) => id) as [string, string, string]
  found['pulsed aluminium'] = (await list('procedures?q=ER5356&state=approved&limit=1'))[0]?.revisionId ?? ''
  found.recording = (await list('arc-recordings?q=PQR&limit=1'))[0]?.id ?? ''
  found.trial = (await list('trials?sort=number&limit=1'))[0]?.id ?? ''
  found.heat = (await list('heats?q=K4471&limit=1'))[0]?.id ?? ''
  found.lot = (await list('heats?q=308-77193&limit=1'))[0]?.id ?? ''
  found['own grade'] = (await list('library/base-metals?q=wear%20plate&limit=1'))[0]?.id ?? ''
  found.metal = (await list('library/base-metals?q=A516-70&limit=1'))[0]?.id ?? ''
  found.filler = (await list('library/filler-metals?q=ER5356&limit=1'))[0]?.id ?? ''
  const to = { to: ['screens@larkfield.example'], message: 'For the outbox.' }
  expect((await page.request.post(`/api/revisions/${found.approved}/mails`, { data: to })).status()).toBe(202)
  found.mail = (await list('outbox?limit=1'))[0]?.id ?? ''
  for (const name of ['draft', 'in-review', 'approved', 'withdrawn', 'coupon certified', 'open coupon', 'job', 'recording', 'mail', 'precise machine', 'plain feeder', 'lumping machine', 'pulsed aluminium']) expect(found[name], name).toBeTruthy()
  await page.context().close()
})

/** Between them the desk and the phone show all that the tablet shows, so axe reads those two. */
const READ = [widths[0], widths[2]] as readonly number[]

/** What every screen owes to whoever opens it, at each width: one head, a name in the tab, no scrolling sideways, nothing that axe finds. */
async function faultsOf(page: Page, read = READ): Promise<string[]> {
  const faults: string[] = []
  for (const width of widths) {
    await page.setViewportSize({ width, height: width < 500 ? 844 : 900 })
    await page.evaluate(() => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done))))
    const add = (fault: string) => faults.push(`${width} px: ${fault}`)
    const heads = await page.getByRole('heading', { level: 1 }).count()
    if (heads !== 1) add(`${heads} headings of level 1`)
    if (await overflows(page)) add('wider than its window')
    if (read.includes(width)) for (const violation of await axe(page)) add(violation)
  }
  if (!/^.+ · Sidebend$/.test(await page.title())) faults.push(`titled "${await page.title()}"`)
  return faults
}

async function visit(page: Page, complaints: string[], path: string, read = READ): Promise<string[]> {
  complaints.splice(0)
  await page.setViewportSize({ width: widths[0], height: 900 })
  await page.goto(path)
  await settled(page)
  return [...(await faultsOf(page, read)), ...complaints]
}

const screens: readonly (readonly [Role, ...(string | readonly [label: string, path: () => string])[]])[] = [
  ['engineer', '/', '/procedures', '/procedures?q=nothing-is-called-this', '/procedures/new', ['a draft', () => `/revisions/${found.draft}`], ['an approved procedure', () => `/revisions/${found.approved}`], ['a withdrawn procedure', () => `/revisions/${found.withdrawn}`], '/outbox', ['a mail', () => `/outbox/${found.mail}`], '/jobs', ['a job', () => `/jobs/${found.job}`], ['a grade of one’s own, changed', () => `/library/base-metals/${found['own grade']}/edit`], '/library/gases/new', ['a filler started from the reference', () => `/library/filler-metals/new?from=${found.filler}`], '/machines', '/machines/new', ['a machine with programs', () => `/machines/${found['lumping machine']}`], '/dial-in', ['a trial', () => `/dial-in/${found.trial}?bead=7`], '/account'],
  ['inspector', '/', '/library/heats', '/library/heats/new', '/library/heats/new?kind=lot', ['a heat', () => `/library/heats/${found.heat}`], '/coupons', '/coupons/new', ['an open coupon', () => `/coupons/${found['open coupon']}`], ['a certified coupon', () => `/coupons/${found['coupon certified']}`], ['a coupon under each standard', () => `/coupons/${found['coupon certified']}/standards`]],
  ['supervisor', '/', '/arc-data', '/arc-data/new', ['a recording of volts and amperes', () => `/arc-data/${found.recording}`], ['a review', () => `/revisions/${found['in-review']}/review`]],
  ['administrator', '/', '/people'],
  ['welder', '/', '/calculators', '/calculators?q=t8/5', '/calculators/heat-input-meter', '/calculators/ferrite-dilution', '/calculators/preheat-method-b?cet=0.6&t=18-22&hd=5&q=1.5&ta=20', ['the next trial bead', () => `/dial-in/${found.trial}/bead`], ['a first trial bead', () => `/dial-in/${found.trial}/bead?copy=none`], '/look-up', '/look-up?line=12%20mm%20A516-70%20to%20A516-70%20SMAW%203G', '/look-up?line=200%20mm%20unobtainium', ['the shop view', () => `/shop/${found.approved}`], ['the shop view of a draft', () => `/shop/${found.draft}`], ['a machine as text', () => `/machines/${found['precise machine']}`], '/machines/card', ['a panel card', () => `/machines/${found['lumping machine']}/card?revision=${found['pulsed aluminium']}&mode=manual-pulse`], ['a panel card of one knob', () => `/machines/${found['lumping machine']}/card?revision=${found['pulsed aluminium']}&mode=pulse`], ['a panel card that refuses', () => `/machines/${found['plain feeder']}/card?revision=${found['pulsed aluminium']}`]],
  ['auditor', '/', ['a trial', () => `/dial-in/${found.trial}`], ['a procedure in review', () => `/revisions/${found['in-review']}`], ['a job', () => `/jobs/${found.job}`], '/library/heats', ['a lot as text', () => `/library/heats/${found.lot}`], ['a base metal', () => `/library/base-metals/${found.metal}`], ['a filler metal', () => `/library/filler-metals/${found.filler}`], ['a grade of one’s own', () => `/library/base-metals/${found['own grade']}`], '/library/base-metals', '/library/filler-metals', '/library/gases', '/library/positions', '/library/processes', '/standards', '/standards/asme-ix', '/no/such/page'],
]

describe.each(screens.map(([role, ...paths]) => ({ role, paths })))('$role', ({ role, paths }) => {
  let page: Page
  let complaints: string[]
  beforeAll(async () => {
    page = await stage.as(role)
    complaints = complaintsOf(page)
  })
  afterAll(() => page.context().close())

  it.each(paths.map((one) => (typeof one === 'string' ? ([one, () => one] as const) : one)))('%s', async (_label, path) => {
    expect(await visit(page, complaints, path())).toEqual([])
  })
})

describe('signed out', () => {
  it.each(['/sign-in', '/forgot-password'])('%s', async (path) => {
    const page = await stage.stranger()
    expect(await visit(page, complaintsOf(page), path)).toEqual([])
  })

  it.each([`/reset-password/${'x'.repeat(40)}`, `/invitation/${'x'.repeat(40)}`])('%s, a link that is no longer good', async (path) => {
    const page = await stage.stranger()
    await page.goto(path)
    await settled(page)
    expect(await faultsOf(page)).toEqual([])
  })

  it('leads from any page to sign-in', async () => {
    const page = await stage.stranger()
    await page.goto(`/revisions/${found.approved}`)
    await page.waitForURL(/\/sign-in\?/)
    await page.getByRole('heading', { level: 1, name: 'Sign in' }).waitFor()
  })
})

describe('a record that is not there', () => {
  it.each(['/revisions/', '/coupons/', '/jobs/', '/machines/', '/arc-data/', '/dial-in/', '/outbox/', '/shop/', '/library/heats/', '/library/base-metals/'])('%s… says so with a head and a way on', async (path) => {
    const page = await stage.as('engineer')
    await page.goto(`${path}${randomUUID()}`)
    await page.getByText(/not (there|found)|No sheet/i).first().waitFor()
    expect(await faultsOf(page, [widths[2]])).toEqual([])
  })
})

const dialogs: readonly (readonly [Role, button: string | RegExp, path: () => string])[] = [
  ['engineer', 'Send for review', () => `/revisions/${found.draft}`],
  ['supervisor', 'E-mail', () => `/revisions/${found.approved}`],
  ['supervisor', 'Withdraw', () => `/revisions/${found.approved}`],
  ['supervisor', 'Return with a comment', () => `/revisions/${found['in-review']}/review`],
  ['inspector', 'Reject', () => `/coupons/${found['open coupon']}`],
  ['inspector', 'Attach elsewhere', () => `/arc-data/${found.recording}`],
  ['inspector', 'Write the energy into the pass', () => `/arc-data/${found.recording}`],
  ['engineer', 'Remove it', () => `/library/base-metals/${found['own grade']}`],
  ['administrator', /^Invite/, () => '/people'],
  ['engineer', 'Open a job', () => '/jobs'],
  ['engineer', 'Begin a trial', () => '/dial-in'],
  ['engineer', 'Make it a procedure', () => `/dial-in/${found.trial}`],
]

describe('dialogs', () => {
  it.each(dialogs)('%s: %s', async (role, button, path) => {
    const page = await stage.as(role)
    await page.goto(path())
    await page.getByRole('button', { name: button }).first().click()
    await focusInside(page.getByRole('dialog'))
    for (const width of widths) {
      await page.setViewportSize({ width, height: 844 })
      expect([width, await overflows(page)]).toEqual([width, false])
    }
    expect(await axe(page)).toEqual([])
    await page.context().close()
  })
})

describe('worked out in a draft', () => {
  it('every calculator beside a field opens in its place', async () => {
    const page = await stage.as('engineer')
    const complaints = complaintsOf(page)
    await page.goto(`/revisions/${found.draft}`)
    await settled(page)
    const openers = page.getByRole('button', { name: /^Work it out/ })
    expect(await openers.count()).toBeGreaterThan(3)
    for (const opener of await openers.all()) await opener.click()
    expect(await page.getByRole('region', { name: /^Work it out/ }).count()).toBe(await openers.count())
    expect([...(await faultsOf(page)), ...complaints]).toEqual([])
    await page.context().close()
  })
})

describe('when the server fails', () => {
  let page: Page
  beforeAll(async () => {
    page = await stage.as('engineer')
  })
  afterAll(() => page.context().close())

  it.each([
    ['/procedures', 'procedures'],
    ['/coupons', 'coupons'],
    ['/jobs', 'jobs'],
    ['/machines', 'machines'],
    ['/arc-data', 'arc-recordings'],
    ['/dial-in', 'trials'],
    ['/library/heats', 'heats'],
    ['/outbox', 'outbox'],
    ['/people', 'people'],
    ['/library/base-metals', 'library/base-metals'],
    ['/', 'today'],
  ])('%s says what failed and tries again on asking', async (path, api) => {
    const matches = (url: URL) => url.pathname === `/api/${api}`
    await page.route(matches, (route) => route.fulfill({ status: 500, contentType: 'application/problem+json', json: { type: 'about:blank', title: 'The server failed', status: 500, detail: 'The database did not answer in time.', requestId: 'e2e-1' } }))
    await page.goto(path)
    const alert = page.getByRole('alert').filter({ hasText: 'The database did not answer in time.' })
    await alert.waitFor()
    expect(await alert.textContent()).toContain('Request e2e-1')
    expect(await faultsOf(page, [widths[2]])).toEqual([])
    await page.unroute(matches)
    await alert.getByRole('button', { name: 'Try again' }).click()
    await alert.waitFor({ state: 'detached' })
  })

  it('and without a connection says that nothing is lost', async () => {
    await page.route((url) => url.pathname === '/api/procedures', (route) => route.abort())
    await page.goto('/procedures')
    await page.getByRole('alert').filter({ hasText: 'The server cannot be reached. Nothing you typed is lost' }).waitFor()
  })
})

describe('an organization that has just been opened', () => {
  const email = `first-${randomUUID().slice(0, 8)}@works.example`
  let secret = ''
  beforeAll(async () => {
    const { stdout } = await run(process.execPath, ['--import', 'tsx', 'scripts/organization.ts', '--name', 'Bracken Works', '--person', 'Nell Harrow', '--email', email], { env: { ...process.env, DATABASE_URL: inject('databaseUrl') } })
    secret = /^ {2}(\S+)$/m.exec(stdout)?.[1] ?? ''
  })

  it('shows what each list is for and offers the first step', async () => {
    const page = await stage.with(email, secret)
    const { person } = (await (await page.request.get('/api/session')).json()) as { person: { id: string; roles: Role[] } }
    const { version } = (await (await page.request.get(`/api/people/${person.id}`)).json()) as { version: number }
    const roles: Role[] = ['administrator', 'engineer', 'inspector', 'supervisor']
    expect((await page.request.patch(`/api/people/${person.id}`, { data: { roles }, headers: { 'If-Match': `"${version}"` } })).status()).toBe(200)
    const complaints = complaintsOf(page)
    for (const [path, title, step] of [['/procedures', 'No procedure yet', 'New procedure'], ['/coupons', 'No coupon yet', /coupon/i], ['/jobs', 'No job yet', 'Open a job'], ['/machines', 'No machine yet', /Register a machine/], ['/arc-data', 'No recording yet', 'Upload a recording'], ['/dial-in', 'No trial yet', 'Begin a trial'], ['/library/heats', 'No heat and no lot yet', 'Record a heat'], ['/outbox', 'Nothing has been sent', null], ['/', 'Nothing waits for you', null]] as const) {
      expect([path, await visit(page, complaints, path, [widths[0]])]).toEqual([path, []])
      await page.getByRole('heading', { level: 2, name: title }).waitFor()
      if (step) await page.getByRole('main').getByRole(path === '/jobs' || path === '/dial-in' ? 'button' : 'link', { name: step }).last().waitFor()
    }
    // The other theme has colours of its own, which must be told apart as well.
    expect((await page.request.patch('/api/account', { data: { theme: 'night' } })).status()).toBe(200)
    for (const path of ['/procedures', '/procedures/new', '/machines/new', '/library/base-metals', '/account']) expect(['by night', path, await visit(page, complaints, path, [widths[0]])]).toEqual(['by night', path, []])
    await page.goto('/library/base-metals')
    await eventually(() => page.getByRole('row').count()).toBeGreaterThan(10)
  })
})

it('loads under the content security policy without a refusal', async () => {
  const page = await stage.as('engineer', { bypassCSP: false })
  const complaints = complaintsOf(page)
  for (const path of ['/', '/procedures', `/revisions/${found.draft}`, `/coupons/${found['coupon certified']}`, '/look-up', `/shop/${found.approved}`, '/api/docs']) {
    await page.goto(path)
    await page.waitForLoadState('networkidle')
  }
  expect(complaints).toEqual([])
  const policy = (await page.request.get('/')).headers()['content-security-policy'] ?? ''
  expect(policy).toMatch(/script-src 'self'(;|$)/)
  expect(policy).not.toContain('unsafe-eval')
})
