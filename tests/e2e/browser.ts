import { createRequire } from 'node:module'
import type { AxeResults } from 'axe-core'
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core'
import { inject } from 'vitest'
import { findChromium } from '../../scripts/lib/system.mjs'
import '../setup/provided.ts'

/** Desk, tablet and phone, in CSS pixels. */
export const widths = [1440, 820, 390] as const

/**
 * Starts this machine's Chromium.
 * @throws Error in a sentence when there is none
 */
export async function openBrowser(): Promise<Browser> {
  const executablePath = findChromium()
  if (!executablePath) throw new Error('No Chromium was found. Install it (Debian: apt-get install chromium), or name it in CHROMIUM.')
  // Chromium's sandbox refuses to run as root.
  const asRoot = process.getuid?.() === 0
  return chromium.launch({
    executablePath,
    args: ['--disable-gpu', '--disable-quic', '--disable-dev-shm-usage', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--no-first-run', ...(asRoot ? ['--no-sandbox'] : [])],
  })
}

/**
 * A fresh browser profile on the product under test, signed out unless it starts from another's state.
 * `bypassCSP` lets axe be injected, so a test of the policy itself turns it off; service workers are off unless a test is about them.
 */
export const openContext = (browser: Browser, { width = widths[0], height = 900, serviceWorkers = 'block', bypassCSP = true }: { width?: number; height?: number; serviceWorkers?: 'allow' | 'block'; bypassCSP?: boolean } = {}, storageState?: Awaited<ReturnType<BrowserContext['storageState']>>): Promise<BrowserContext> =>
  browser.newContext({ ...(storageState ? { storageState } : {}), baseURL: inject('baseUrl'), viewport: { width, height }, bypassCSP, serviceWorkers, acceptDownloads: true, hasTouch: width < 500, reducedMotion: 'reduce' })

const axeFile = createRequire(import.meta.url).resolve('axe-core/axe.min.js')

/**
 * What axe finds against WCAG 2.2 A and AA on the page as it stands.
 * @returns one line a violation, with the elements at fault; empty when there is none
 */
export async function axe(page: Page): Promise<string[]> {
  if (!(await page.evaluate(() => 'axe' in window))) await page.addScriptTag({ path: axeFile })
  const results = await page.evaluate(() =>
    (window as unknown as { axe: { run: (options: object) => Promise<AxeResults> } }).axe.run({ runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'], resultTypes: ['violations'] }),
  )
  return results.violations.map((violation) => `${violation.id}: ${violation.help} — ${violation.nodes.map((node) => node.target.join(' ')).join(' | ')}`)
}

/** Whether the page is wider than its window, so that a person would have to scroll sideways. */
export const overflows = (page: Page): Promise<boolean> => page.evaluate(() => document.documentElement.scrollWidth > document.documentElement.clientWidth)
