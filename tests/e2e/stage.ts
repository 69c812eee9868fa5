import type { Browser, BrowserContext, ConsoleMessage, Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, inject } from 'vitest'
import type { Role } from '@shared/schemas/people.ts'
import type { Revision } from '@shared/schemas/records.ts'
import { openBrowser, openContext } from './browser.ts'
import '../setup/provided.ts'

/** Long enough for a loaded machine, short enough that what never comes is told within the test's time. */
const PATIENCE = 20_000

type Who = Role | `${string}@${string}`
type Look = Parameters<typeof openContext>[1]
type State = Awaited<ReturnType<BrowserContext['storageState']>>

export interface Stage {
  browser: () => Browser
  /** A page of its own, signed in as the demo firm's person of that role, or of that address; the sign-in is made once a file. */
  as: (who: Who, look?: Look) => Promise<Page>
  /** A page of its own, signed in with an address and a password that are not the demo firm's. */
  with: (email: string, secret: string, look?: Look) => Promise<Page>
  /** A page of its own, signed out. */
  stranger: (look?: Look) => Promise<Page>
}

/** The demo firm's password, the same for everybody. */
export const password = (): string => inject('demoSignIns')[0]?.password ?? ''

/** Who signs in for a role: the person who has it alone. */
export function addressOf(who: Who): string {
  if (who.includes('@')) return who
  const person = inject('demoSignIns').find((one) => one.role === who)
  if (!person) throw new Error(`The demo firm has no sign-in for the role ${who}.`)
  return person.email
}

/** One browser for a test file; what it opened is closed with it. Call it at the top of the file. */
export function useStage(): Stage {
  let browser: Browser | undefined
  const states = new Map<string, Promise<State>>()
  const open = (): Browser => {
    if (!browser) throw new Error('the browser opens before the first test')
    return browser
  }
  const pageIn = async (context: BrowserContext): Promise<Page> => {
    context.setDefaultTimeout(PATIENCE)
    return context.newPage()
  }
  const signedIn = async (email: string, secret = password()): Promise<State> => {
    const context = await openContext(open())
    const answer = await context.request.post('/api/session', { data: { email, password: secret } })
    if (!answer.ok()) throw new Error(`Signing in as ${email} answered ${answer.status()}: ${await answer.text()}`)
    const state = await context.storageState()
    await context.close()
    return state
  }
  beforeAll(async () => {
    browser = await openBrowser()
  })
  afterAll(() => browser?.close())
  return {
    browser: open,
    as: async (who, look) => {
      const email = addressOf(who)
      const state = states.get(email) ?? signedIn(email)
      states.set(email, state)
      return pageIn(await openContext(open(), look, await state))
    },
    with: async (email, secret, look) => pageIn(await openContext(open(), look, await signedIn(email, secret))),
    stranger: async (look) => pageIn(await openContext(open(), look)),
  }
}

/** Everything that a page complains of: errors on the console and errors that nobody caught. Empty it with `splice(0)`. */
export function complaintsOf(page: Page): string[] {
  const complaints: string[] = []
  const said = (message: ConsoleMessage) => `${message.text()} (${message.location().url})`
  page.on('console', (message) => (message.type() === 'error' || message.type() === 'warning') && complaints.push(said(message)))
  page.on('pageerror', (error) => complaints.push(String(error)))
  return complaints
}

/** Waits until the page shows its heading and nothing of it is still being read. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole('heading', { level: 1 }).first().waitFor()
  await page.waitForLoadState('networkidle')
  await page.waitForFunction(() => document.querySelectorAll('main [role=status] .animate-pulse, [role=progressbar]:not([aria-hidden=true])').length === 0)
}

/** Polls until a value is as expected; for what the page shows a moment later. */
export const eventually = <T>(read: () => T | Promise<T>) => expect.poll(read, { timeout: PATIENCE, interval: 100 })

/** A carbon steel stick procedure as JSON, small enough to be read at a glance. */
export const steelDraft = (title: string) => ({
  title,
  variables: {
    standards: [{ standard: 'asme-ix', edition: '2023' }],
    thickness: { min: { si: 5, unit: 'mm', typed: '5 mm' }, max: { si: 16, unit: 'mm', typed: '16 mm' } },
    processes: [{ id: 'p1', positions: ['1G', '3G'], process: 'SMAW', mechanisation: 'manual', filler: { specification: 'A5.1', classification: 'E7018', fNumber: '4', aNumber: 1 }, electrical: { currentType: 'DCEP' } }],
    baseMetals: { a: { specification: 'A/SA-516', grade: '70', pNumber: '1', groupNumber: 2 }, b: { specification: 'A/SA-516', grade: '70', pNumber: '1', groupNumber: 2 } },
  },
})

/** Starts a procedure through the API as whoever the page is signed in as. */
export async function newDraft(page: Page, title: string): Promise<Revision> {
  const answer = await page.request.post('/api/procedures', { data: { content: steelDraft(title) } })
  expect(answer.status(), await answer.text()).toBe(201)
  return (await answer.json()) as Revision
}

/** A revision as the server keeps it now. */
export async function readRevision(page: Page, id: string): Promise<Revision> {
  const answer = await page.request.get(`/api/revisions/${id}`)
  expect(answer.status(), await answer.text()).toBe(200)
  return (await answer.json()) as Revision
}

/** Waits until the sheet says that all is saved. */
export const saved = (page: Page): Promise<void> => page.getByRole('main').getByText('Saved', { exact: true }).and(page.locator('[role=status]')).waitFor()

/** Waits until the focus is inside, as it is a moment after a dialog opens. */
export const focusInside = (place: Locator) => eventually(() => place.evaluate((element) => element.contains(document.activeElement))).toBe(true)
