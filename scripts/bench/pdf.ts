import { chromium } from 'playwright-core'
import { findChromium } from '../lib/system.mjs'
import { alternate, median, type Figure } from './measure.ts'
import type { Caller } from './product.ts'

/** A draft's PDF, made anew for each request, against Chromium printing the same record's page. */
export async function measurePdf(caller: Caller, baseUrl: string, seconds: number): Promise<Figure[]> {
  const executablePath = findChromium()
  if (!executablePath) throw new Error('No Chromium was found: npm run bench installs it where it may.')
  const { items } = await caller.read('listProcedures', { query: { state: 'draft' } })
  const row = items[0]
  if (!row) throw new Error('The demo firm has no draft to print.')
  const browser = await chromium.launch({ executablePath, args: ['--disable-gpu', '--disable-dev-shm-usage', '--no-first-run', ...(process.getuid?.() === 0 ? ['--no-sandbox'] : [])] })
  try {
    const context = await browser.newContext({ baseURL: baseUrl, serviceWorkers: 'block', viewport: { width: 1440, height: 900 } })
    const [name = '', value = ''] = caller.cookie.split('=', 2)
    await context.addCookies([{ name, value, url: baseUrl }])
    const page = await context.newPage()
    const open = async () => {
      await page.goto(`/procedures/${row.id}`, { waitUntil: 'networkidle' })
      // A page that only says "not found" would print quickly.
      await page.getByText(row.number).first().waitFor()
    }
    const print = () => page.pdf({ format: 'A4', printBackground: true })
    const times = await alternate(
      {
        ours: async () => (await caller.get(`/api/revisions/${row.revisionId}/document?paper=A4`)).arrayBuffer(),
        opened: async () => {
          await open()
          await print()
        },
        print,
      },
      seconds,
    )
    const ours = median(times.ours)
    const printed = median(times.print)
    const opened = median(times.opened)
    const note = `median of ${times.ours.length}, ${row.number}, A4`
    return [
      { name: 'Procedure as PDF', value: ours, unit: 'ms', note: `${note}, through the API` },
      { name: "Chromium's print-to-PDF", value: printed, unit: 'ms', note: `${note}, page already open` },
      { name: 'Opened and printed', value: opened, unit: 'ms', note: `${note}, the page loaded for each print` },
      { name: 'PDF: ours / print', value: ours / printed, unit: '×', note: 'below 1 is quicker' },
      { name: 'PDF: ours / opened', value: ours / opened, unit: '×', note: 'below 1 is quicker' },
    ]
  } finally {
    await browser.close()
  }
}
