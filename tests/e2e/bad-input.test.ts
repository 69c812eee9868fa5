import type { Locator, Page } from 'playwright-core'
import { expect, it } from 'vitest'
import { addressOf, eventually, newDraft, password, readRevision, saved, settled, useStage } from './stage.ts'

const stage = useStage()

const box = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true })

/** What a field is said to be wrong about, by the very text that readers are given with it. */
async function complaintAt(field: Locator): Promise<string> {
  if ((await field.getAttribute('aria-invalid')) !== 'true') return ''
  return field.evaluate((element) => (element.getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent ?? '').join(' '))
}

/** Types a wrong text, leaves the field, and gives what is said; the text must still be there. */
async function refusalOf(field: Locator, text: string): Promise<string> {
  await field.fill(text)
  await field.blur()
  expect(await field.inputValue(), 'what was typed stays').toBe(text)
  return complaintAt(field)
}

it('says what is wrong with a sign-in, and keeps the address', async () => {
  const page = await stage.stranger()
  await page.goto('/sign-in')
  const email = box(page, 'E-mail')
  const secret = page.getByLabel('Password', { exact: true })
  const signIn = page.getByRole('button', { name: 'Sign in', exact: true })
  await email.fill('ines at larkfield')
  await signIn.click()
  await eventually(() => complaintAt(email)).toContain('like name@example.com')
  await eventually(() => complaintAt(secret)).toBe('Write your password.')
  await email.fill('absent@larkfield.example')
  await secret.fill('some password or other')
  await signIn.click()
  const refused = page.getByRole('alert')
  await refused.filter({ hasText: 'do not belong together' }).waitFor()
  const unknown = await refused.textContent()
  expect(await email.inputValue()).toBe('absent@larkfield.example')
  // Whether somebody has an account is not told to strangers.
  await email.fill(addressOf('auditor'))
  await secret.fill('not this one')
  await signIn.click()
  await page.waitForResponse((answer) => answer.url().endsWith('/api/session') && answer.status() === 401)
  await eventually(() => refused.textContent()).toBe(unknown)
  // And the right password lets in, to the page that was asked for.
  await page.goto('/procedures?state=draft')
  await page.waitForURL(/\/sign-in\?/)
  await email.fill(addressOf('auditor'))
  await secret.fill(password())
  await signIn.click()
  await page.waitForURL(/\/procedures\?state=draft$/)
})

it('slows down whoever guesses, and says for how long', async () => {
  const page = await stage.stranger()
  await page.goto('/sign-in')
  const email = `guessed-${Date.now()}@larkfield.example`
  const guess = async () => (await page.request.post('/api/session', { data: { email, password: 'one more guess' } })).status()
  const before: number[] = []
  for (let tries = 0; tries < 10; tries += 1) before.push(await guess())
  expect(new Set(before)).toEqual(new Set([401]))
  await box(page, 'E-mail').fill(email)
  await page.getByLabel('Password', { exact: true }).fill('one more guess')
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  const told = page.getByRole('alert')
  await told.filter({ hasText: 'Too many tries have failed of late.' }).waitFor()
  expect(await told.textContent()).toMatch(/Wait \d+ minutes and try again, or ask for a link/)
})

it('names a wrong figure at its field, with the value and what would be right', async () => {
  const page = await stage.as('engineer')
  const { id, version } = await newDraft(page, 'Wrong figures')
  await page.goto(`/revisions/${id}`)
  await settled(page)
  const most = box(page, 'Thickness, to')
  expect(await refusalOf(most, 'thick')).toMatch(/"thick" is not a length.*e\.g\. 12\.7 mm/)
  expect(await refusalOf(most, '200 F')).toMatch(/"200 F" is a temperature, not a length/)
  expect(await refusalOf(most, '12 furlongs')).toMatch(/"furlongs" in "12 furlongs" is not a unit of length.*mm/)
  expect(await refusalOf(most, '-4')).toMatch(/"-4" is below zero/)
  expect(await refusalOf(most, '3/8'), 'a bare fraction has no unit in SI').toMatch(/Write 3\/8 in, or the figure in mm/)
  const least = box(page, 'Thickness, from')
  await least.fill('30')
  await least.blur()
  await page.getByText('Thickness: the lower figure, 30, is above the upper, 16 mm. Swap them or correct one.').waitFor()
  await least.fill('5')
  await least.blur()
  expect(await refusalOf(most, '3/8"'), 'and the same with its sign is right').toBe('')
  await page.getByText('= 9.5 mm').waitFor()

  expect(await refusalOf(box(page, 'SMAW: A-Number'), '99')).toBe('SMAW: A-Number: "99" is not a whole number from 1 to 12.')
  expect(await refusalOf(box(page, 'SMAW: Sizes'), '2.5, thick')).toMatch(/"thick" is not a length/)
  expect(await refusalOf(box(page, 'Preheat, minimum'), '-300')).toMatch(/"-300" is below absolute zero/)
  expect(await refusalOf(box(page, 'SMAW: Amps, from'), 'all')).toMatch(/Amps.*"all" does not apply here/)

  await page.getByRole('button', { name: 'First pass' }).click()
  expect(await refusalOf(box(page, 'Pass 1, volts'), '26-22')).toMatch(/Pass 1, volts: .*26/)
  expect(await refusalOf(box(page, 'Pass 1, amps'), 'hot')).toMatch(/Pass 1, amps: "hot" is not a current.*180 A/)

  // What could be read was saved, what could not left the last good value.
  await eventually(async () => (await readRevision(page, id)).content.variables.thickness?.max?.typed).toBe('3/8"')
  const stored = await readRevision(page, id)
  expect(stored.version).toBeGreaterThan(version)
  expect(stored.content.variables.processes[0]?.filler.aNumber).toBe(1)
})

it('does not save a sheet without a title, says so, and keeps what was typed', async () => {
  const page = await stage.as('engineer')
  const { id } = await newDraft(page, 'Soon without a title')
  await page.goto(`/revisions/${id}`)
  await settled(page)
  await box(page, 'Title').fill('')
  await box(page, 'SMAW: Trade name').fill('typed beside it')
  await page.keyboard.press('Control+s')
  await page.getByRole('status').filter({ hasText: 'Give the procedure a title' }).waitFor()
  await eventually(() => complaintAt(box(page, 'Title'))).toContain('Give the procedure a title, e.g.')
  expect(await box(page, 'SMAW: Trade name').inputValue()).toBe('typed beside it')
  await box(page, 'Title').fill('With a title again')
  await saved(page)
  expect((await readRevision(page, id)).content).toMatchObject({ title: 'With a title again', variables: { processes: [{ filler: { tradeName: 'typed beside it' } }] } })

  await page.goto('/procedures/new')
  await page.getByRole('button', { name: 'Open the sheet' }).click()
  await eventually(() => complaintAt(box(page, 'Title'))).toContain('Give the procedure a title')
})

it('keeps what was typed when the server fails, and saves it on asking', async () => {
  const page = await stage.as('engineer')
  const { id } = await newDraft(page, 'The server fails')
  await page.goto(`/revisions/${id}`)
  await settled(page)
  await page.route(`**/api/revisions/${id}`, (route) => (route.request().method() === 'PUT' ? route.fulfill({ status: 500, contentType: 'text/html', body: '<h1>Oh no</h1>' }) : route.continue()))
  await box(page, 'SMAW: Trade name').fill('typed into a failing server')
  await page.keyboard.press('Control+s')
  const told = page.getByRole('status').filter({ hasText: 'Not saved: kept on this device' })
  await told.waitFor()
  expect(await told.textContent()).toContain('Nothing you typed is lost')
  expect(await box(page, 'SMAW: Trade name').inputValue()).toBe('typed into a failing server')
  await page.unroute(`**/api/revisions/${id}`)
  await told.getByRole('button', { name: 'Try now' }).click()
  await saved(page)
  expect((await readRevision(page, id)).content.variables.processes[0]?.filler.tradeName).toBe('typed into a failing server')
})

it('names what a draft lacks before it can be reviewed, and sends nothing', async () => {
  const page = await stage.as('engineer')
  const { id, number } = await newDraft(page, 'Not ready')
  await page.goto(`/revisions/${id}`)
  await settled(page)
  await box(page, 'Thickness, from').fill('')
  await box(page, 'Thickness, from').blur()
  await box(page, 'Thickness, to').fill('')
  await box(page, 'Thickness, to').blur()
  await page.getByRole('button', { name: 'Send for review' }).click()
  const dialog = page.getByRole('dialog', { name: 'Send for review' })
  await dialog.getByRole('button', { name: `Send ${number} rev A for review` }).click()
  await dialog.getByRole('alert').filter({ hasText: 'Give the base metal thickness, e.g. 5-20 mm.' }).waitFor()
  expect((await readRevision(page, id)).state).toBe('draft')
})

it('names a wrong address and keeps the message, and a short password and keeps the old', async () => {
  const page = await stage.as('supervisor')
  const list = (await (await page.request.get('/api/procedures?state=approved&limit=1')).json()) as { items: { revisionId: string }[] }
  await page.goto(`/revisions/${list.items[0]?.revisionId}`)
  await page.getByRole('button', { name: 'E-mail' }).click()
  const dialog = page.getByRole('dialog', { name: 'E-mail the procedure' })
  await dialog.getByRole('textbox', { name: /^Message/ }).fill('For your files.')
  await dialog.getByRole('textbox', { name: 'To' }).fill('client@example.com, the client')
  await dialog.getByRole('button', { name: 'Send' }).click()
  await eventually(() => complaintAt(dialog.getByRole('textbox', { name: 'To' }))).toMatch(/"the" is not an e-mail address\. Write one like/)
  expect(await dialog.getByRole('textbox', { name: /^Message/ }).inputValue()).toBe('For your files.')

  await page.goto('/account')
  await page.getByLabel('New password').first().fill('short')
  await page.getByRole('button', { name: 'Change the password' }).click()
  await eventually(() => complaintAt(page.getByLabel('New password').first())).toContain('at least 12 characters')
})
