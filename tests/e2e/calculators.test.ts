/** A figure worked out on its own page and sent as a link, and one worked out beside a field and written into a draft. */
import type { Page } from 'playwright-core'
import { describe, expect, it } from 'vitest'
import { eventually, readRevision, saved, settled, useStage } from './stage.ts'

const stage = useStage()
const result = async (page: Page) => (await page.getByRole('region', { name: 'Result' }).filter({ visible: true }).textContent()) ?? ''

describe('a calculator', () => {
  it('is found by its shop name, follows typing, and its address opens it again for somebody else', async () => {
    const page = await stage.as('welder')
    await page.goto('/')
    await page.getByRole('link', { name: 'Calculators' }).click()
    await page.getByRole('searchbox', { name: /^Find a calculator/ }).fill('kJ/mm')
    await page.getByRole('region', { name: 'Found' }).getByRole('link', { name: /^Heat input from meters/ }).click()
    await page.getByRole('heading', { level: 1, name: 'Heat input from meters' }).waitFor()
    await page.getByRole('textbox', { name: 'Voltage' }).fill('26')
    await page.getByRole('textbox', { name: 'Travel speed' }).fill('10 in/min')
    // 26 × 180 × 60 / 254 / 1000
    await eventually(() => result(page)).toContain('1.11')
    await page.waitForURL(/v=26&i=180&s=10\+in%2Fmin$/)
    const link = page.url()
    await page.goBack()
    await page.getByRole('region', { name: 'Found' }).waitFor()

    const other = await stage.as('engineer')
    await other.goto(link)
    await eventually(() => result(other)).toContain('1.11')
    expect(await other.getByRole('textbox', { name: 'Travel speed' }).inputValue()).toBe('10 in/min')
    await other.context().close()
    await page.context().close()
  })
})

describe('beside a field of a draft', () => {
  it('a heat input is worked out from the draft, written, saved and taken back', async () => {
    const page = await stage.as('engineer')
    const drafts = ((await (await page.request.get('/api/procedures?state=draft&sort=number&limit=20')).json()) as { items: { revisionId: string }[] }).items
    const stated = await Promise.all(
      drafts.map(async ({ revisionId }) => {
        const { content, may } = await readRevision(page, revisionId)
        return { revisionId, may, block: content.variables.processes[0] }
      }),
    )
    const chosen = stated.find(({ may, block }) => may.includes('save') && block?.electrical.voltage && block.electrical.current && block.electrical.travelSpeed && block.electrical.waveformControlled !== true)
    if (!chosen) throw new Error('no draft of the demo states volts, amps and travel speed')
    const before = chosen.block?.electrical.heatInput ?? null
    const heat = async () => (await readRevision(page, chosen.revisionId)).content.variables.processes[0]?.electrical.heatInput ?? null
    await page.goto(`/revisions/${chosen.revisionId}`)
    await settled(page)
    await page.getByRole('button', { name: /^Work it out for .*Heat input$/ }).first().click()
    const panel = page.getByRole('region', { name: /^Work it out: .*Heat input$/ })
    await panel.getByText('From the draft: Volts', { exact: false }).waitFor()
    const use = panel.getByRole('button', { name: /^Use [\d.]+ kJ\/mm/ })
    const figures = [...((await use.textContent()) ?? '').matchAll(/[\d.]+(?= kJ)/g)].map(([text]) => Number(text))
    await use.click()
    await saved(page)
    await eventually(heat).toMatchObject({ max: { si: figures.at(-1) } })
    await page.getByRole('button', { name: 'Undo' }).first().click()
    await saved(page)
    await eventually(heat).toEqual(before)
    await page.context().close()
  })
})
