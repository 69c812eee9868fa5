import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from 'playwright-core'
import type { ArcRecording } from '@shared/schemas/arc-data.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import { eventually, settled, useStage } from './stage.ts'

const stage = useStage()

/** 120 Hz, 2 ms, 400/50 A, 32/20 V: 3832 W where the meters would say 3066 W. No head names the columns. */
const file = (): Buffer =>
  Buffer.from(
    Array.from({ length: 12_000 }, (_, k) => {
      const on = k % 100 < 24
      return `${(k / 12_000).toFixed(6)};${on ? 32 : 20};${on ? 400 : 50}`
    }).join('\n'),
  )

describe('a recording of volts and amperes', () => {
  let page: Page
  let coupon: Coupon
  beforeAll(async () => {
    page = await stage.as('inspector')
    const list = (await (await page.request.get('/api/coupons?state=welding&limit=1')).json()) as { items: { id: string }[] }
    coupon = (await (await page.request.get(`/api/coupons/${list.items[0]?.id}`)).json()) as Coupon
  })
  afterAll(() => page.context().close())

  it('goes from the coupon’s page through its columns to its figures, attached', async () => {
    await page.goto(`/coupons/${coupon.id}`)
    await settled(page)
    await page.getByRole('region', { name: 'Arc data' }).getByRole('link', { name: 'Upload a recording' }).click()
    await page.getByLabel('Choose a recording').setInputFiles({ name: 'root pass.csv', mimeType: 'text/csv', buffer: file() })
    await page.getByText('No head names the voltage; column 2 was taken by its figures.').waitFor()
    await page.getByRole('button', { name: 'Upload and read' }).click()
    await page.getByRole('heading', { level: 1, name: 'root pass.csv' }).waitFor()
    const power = page.getByRole('region', { name: 'Power and energy' })
    await power.getByText(/^3\u2009?8[23]\d/).waitFor()
    await page.getByRole('region', { name: 'Meters against the arc' }).getByText(/% below the power of the arc/).waitFor()
    await page.getByRole('region', { name: 'Pulses' }).getByText(/^120\.\d/).waitFor()
    await page.getByRole('link', { name: coupon.number }).waitFor()
  })

  it('is read closer by keys, down to single samples, and back', async () => {
    const plot = page.getByRole('group', { name: /^Plot of current and voltage/ })
    await plot.focus()
    for (let press = 0; press < 4; press++) await page.keyboard.press('+')
    const asked = await page.waitForResponse((answer) => answer.url().includes('/plot?'))
    expect(asked.status()).toBe(200)
    await page.getByText(/^\d+(\.\d+)? ms to \d+(\.\d+)? ms$/).waitFor()
    await page.keyboard.press('0')
    await page.getByText('All 1.00 s').waitFor()
  })

  it('gives its energy to the pass that it is attached to', async () => {
    await page.getByRole('button', { name: 'Attach elsewhere' }).click()
    const dialog = page.getByRole('dialog')
    const row = coupon.content.runSheet[0]
    await dialog.getByLabel(/^Pass/).selectOption({ value: row?.id ?? '' })
    await dialog.getByLabel(/^Length welded/).fill('12 mm')
    await dialog.getByRole('button', { name: 'Save' }).click()
    await page.getByRole('link', { name: `${coupon.number} pass ${row?.pass}` }).waitFor()
    await page.getByRole('region', { name: 'Power and energy' }).getByText(/over 12 mm/).waitFor()
    await page.getByRole('button', { name: 'Write the energy into the pass' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Write it' }).click()
    const id = page.url().split('/').at(-1)
    const { figures } = (await (await page.request.get(`/api/arc-recordings/${id}`)).json()) as ArcRecording
    await eventually(async () => ((await (await page.request.get(`/api/coupons/${coupon.id}`)).json()) as Coupon).content.runSheet[0]?.instantaneousEnergy?.si).toBe(Math.round(figures.energy))
  })

  it('that can’t be read says why and keeps the choice; mended columns go through', async () => {
    await page.goto('/arc-data/new')
    await page.getByLabel('Choose a recording').setInputFiles({ name: 'notes.txt', mimeType: 'text/plain', buffer: Buffer.from('Dear all,\nplease find attached.\n') })
    await page.getByRole('alert').getByText(/No rows of figures were found/).waitFor()
    await page.getByLabel('Choose a recording').setInputFiles({ name: 'two columns.csv', mimeType: 'text/csv', buffer: Buffer.from(`I (A),U (V)\n${Array.from({ length: 500 }, (_, k) => `${180 + (k % 3)},24`).join('\n')}`) })
    await page.getByText('Give the sample rate first.').waitFor()
    await page.getByLabel('Samples a second').fill('5000')
    await page.getByLabel('What column 1 holds').selectOption('voltage')
    expect(await page.getByLabel('What column 2 holds').inputValue()).toBe('current')
    await page.getByLabel('What column 1 holds').selectOption('current')
    await page.getByRole('button', { name: 'Upload and read' }).click()
    await page.getByRole('heading', { level: 1, name: 'two columns.csv' }).waitFor()
    await page.getByRole('region', { name: 'Meters against the arc' }).getByText('they agree').waitFor()
    await page.getByRole('button', { name: 'Remove' }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Remove it' }).click()
    await page.waitForURL(/\/arc-data$/)
  })
})
