import { expect, it } from 'vitest'
import type { Page } from 'playwright-core'
import type { Revision } from '@shared/schemas/records.ts'
import { axe, overflows, widths } from './browser.ts'
import { complaintsOf, eventually, readRevision, saved, settled, steelDraft, useStage } from './stage.ts'

const stage = useStage()

const figure = (min: number, max = min, unit = 'mm') => ({ min: { si: min, unit, typed: `${min} ${unit}` }, max: { si: max, unit, typed: `${max} ${unit}` }, all: false })

/** A V in 12 mm plate with two processes, to be designed. */
async function jointDraft(page: Page, title: string): Promise<Revision> {
  const base = steelDraft(title)
  const { joint: _none, ...variables } = { joint: null, ...base.variables }
  const content = { ...base, variables: { ...variables, thickness: figure(12), joint: { groove: 'single-v', includedAngle: figure(55, 65, '°'), rootOpening: figure(3), rootFace: figure(1) }, processes: [{ id: 'p1', process: 'GTAW' }, { id: 'p2', process: 'GMAW' }] } }
  const answer = await page.request.post('/api/procedures', { data: { content } })
  expect(answer.status(), await answer.text()).toBe(201)
  return (await answer.json()) as Revision
}

const area = (page: Page) => page.locator('#joint figcaption dd').first().textContent()

it('a joint is dragged, typed, moved by keys and laid out; what is saved is what was drawn, also in the PDF', async () => {
  const page = await stage.as('engineer')
  const complaints = complaintsOf(page)
  const { id } = await jointDraft(page, 'Designed by hand')
  await page.goto(`/revisions/${id}`)
  await settled(page)
  await eventually(() => area(page)).toBe('106 mm²')

  // Drag: the angle's handle outwards; drawing, field and figures go along before the hand lets go.
  const angle = page.getByRole('slider', { name: 'Included angle', exact: true })
  const grip = await angle.boundingBox()
  if (!grip) throw new Error('the handle is not on the page')
  const [x, y] = [grip.x + grip.width / 2, grip.y + grip.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  for (let step = 1; step <= 8; step += 1) await page.mouse.move(x + step * 4, y)
  const dragged = Number.parseFloat((await angle.getAttribute('aria-valuetext')) ?? '')
  expect(dragged).toBeGreaterThan(65)
  expect(await page.getByRole('textbox', { name: 'Included angle, from', exact: true }).inputValue()).toBe(String(dragged - 5))
  expect(await area(page)).not.toBe('106 mm²')
  await page.mouse.up()

  // Keys on a handle, then a figure written at it.
  const opening = page.getByRole('slider', { name: 'Root opening', exact: true })
  await opening.focus()
  await page.keyboard.press('ArrowUp')
  await page.keyboard.press('ArrowUp')
  await eventually(() => opening.getAttribute('aria-valuetext')).toBe('4 mm')
  await page.keyboard.press('Enter')
  await page.keyboard.type('2-4')
  await page.keyboard.press('Enter')
  await eventually(() => page.evaluate('document.activeElement.getAttribute("aria-label")')).toBe('Root opening')

  // Typing in the field lights the dimension up and redraws at each key.
  const face = page.getByRole('textbox', { name: 'Root face, to', exact: true })
  await face.focus()
  await face.fill('3')
  await eventually(() => page.getByRole('slider', { name: 'Root face', exact: true }).getAttribute('aria-valuetext')).toBe('2 mm')
  await face.fill('30')
  await eventually(() => page.locator('#row-joint-rootFace-error').textContent()).toMatch(/root face of 15\.5 mm leaves nothing to prepare in 12 mm/)
  await face.fill('2')
  await face.blur()

  await page.getByRole('textbox', { name: 'Bead, GTAW, mm²' }).fill('15')
  await page.getByRole('textbox', { name: 'Bead, GMAW, mm²' }).fill('25')
  await page.getByRole('button', { name: 'Lay out from bead size' }).click()
  await page.getByRole('region', { name: 'Pass sequence' }).getByRole('listitem').first().waitFor()
  await page.getByRole('button', { name: 'Move place 3 earlier' }).click()
  await page.keyboard.press('Control+s')
  await saved(page)
  await eventually(async () => (await readRevision(page, id)).content.variables.processes[1]?.passes.length ?? 0).toBeGreaterThan(2)
  const { variables } = (await readRevision(page, id)).content
  expect(variables.joint).toMatchObject({ includedAngle: { min: { si: dragged - 5 }, max: { si: dragged + 5 } }, rootOpening: { min: { si: 2 }, max: { si: 4 } }, rootFace: { min: { si: 1 }, max: { si: 2 } } })
  const passes = variables.processes.flatMap((block) => block.passes)
  expect(passes.filter(({ layer }) => layer === 'root')).toHaveLength(1)
  const document = await page.request.get(`/api/revisions/${id}/document?paper=A4`)
  expect([document.status(), document.headers()['content-type']]).toEqual([200, 'application/pdf'])
  expect(complaints).toEqual([])
})

it.each(widths)('fits, is named for readers, and works by touch at %i px', async (width) => {
  const page = await stage.as('engineer', { width })
  const { id } = await jointDraft(page, `Designed at ${width}`)
  await page.goto(`/revisions/${id}`)
  await settled(page)
  await page.getByRole('slider', { name: 'Included angle', exact: true }).waitFor()
  expect(await overflows(page)).toBe(false)
  expect(await axe(page)).toEqual([])
  const box = await page.locator('#joint svg[role=group]').boundingBox()
  expect(box && box.x >= 0 && box.x + box.width <= width).toBe(true)
  await page.getByRole('button', { name: 'Standard details' }).click()
  const dialog = page.getByRole('dialog', { name: 'Standard groove details' })
  await dialog.getByRole('button', { name: /^Use/ }).first().waitFor()
  expect(await axe(page)).toEqual([])
  await dialog.getByRole('button', { name: /^Use/ }).first().click()
  await page.locator('#joint').getByText('at fit-up').waitFor()
})
