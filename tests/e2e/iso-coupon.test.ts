import type { Locator, Page } from 'playwright-core'
import { expect, it } from 'vitest'
import type { CouponQualification } from '@shared/schemas/assessment.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import { axe } from './browser.ts'
import { eventually, password, saved, settled, useStage } from './stage.ts'

const stage = useStage()

const box = (place: Page | Locator, name: string | RegExp) => place.getByRole('textbox', { name, exact: true })
async function write(place: Page | Locator, name: string | RegExp, text: string): Promise<void> {
  await box(place, name).fill(text)
  await box(place, name).blur()
}
const choose = (place: Page | Locator, name: string, label: string) => place.getByRole('combobox', { name, exact: true }).selectOption({ label })
async function pick(page: Page, name: string | RegExp, text: string, option: RegExp): Promise<void> {
  await page.getByRole('combobox', { name }).first().pressSequentially(text)
  await page.getByRole('option', { name: option }).first().click()
  await page.getByRole('listbox').waitFor({ state: 'detached' })
}
const room = (page: Page, name: string) => page.getByRole('region', { name, exact: true })
const add = (page: Page, name: string, button: string) => room(page, name).getByRole('button', { name: button, exact: true }).click()

it('an inspector takes a coupon to ISO 15614-1 level 2 from a blank sheet to certified', async () => {
  const page = await stage.as('inspector')
  await page.goto('/coupons/new')
  await box(page, 'Title').fill('S355J2 plate 20 mm, solid wire, 3G')
  await choose(page, 'Standard', 'ISO 15614-1')
  expect(await page.getByRole('combobox', { name: 'Level' }).inputValue(), 'the level that applies where none is named').toBe('2')
  expect(await page.getByRole('combobox', { name: 'Supported' }).count(), 'a coupon is always a test').toBe(0)
  await page.getByRole('group', { name: 'Processes' }).getByRole('button', { name: 'GMAW', exact: true }).click()
  await pick(page, /^Metal/, 'S355J2', /^EN 10025-2 S355J2/)
  await page.getByRole('button', { name: 'Open the coupon' }).last().click()
  await page.waitForURL(/\/coupons\/[0-9a-f]{8}-/)
  await settled(page)
  const id = new URL(page.url()).pathname.split('/').at(-1) ?? ''
  const number = (await page.getByRole('heading', { level: 1 }).textContent())?.trim() ?? ''
  const read = async () => (await (await page.request.get(`/api/coupons/${id}`)).json()) as Coupon

  await box(page, 'Welded on').fill('2026-10-05')
  await write(page, 'Welder', 'Joe Pell')
  await write(page, 'Witness', 'Hal Ostby')
  await write(page, 'Thickness', '20')
  await write(page, 'Condition or temper, A', 'N')
  await write(page, 'Condition or temper, B', 'N')
  await choose(page, 'Impact values specified, A', 'Yes')
  await choose(page, 'Impact values specified, B', 'Yes')
  await choose(page, 'Toughness required', 'Yes')
  await write(page, 'Impact test temperature', '-20')
  await write(page, 'Impact energy', '27')
  await choose(page, 'Hardness required', 'Yes')
  await choose(page, 'Groove', 'Single V')
  await write(page, 'Root opening', '2-3')
  await choose(page, 'Backing', 'None')
  await choose(page, 'Welded from both sides', 'No')
  await choose(page, 'GMAW: Mechanisation', 'Semiautomatic')
  await write(page, 'GMAW: Deposit thickness', '20')
  await write(page, 'GMAW: Thickest pass', '3')
  await pick(page, 'GMAW: Filler metal', '3Si1', /G 42 4 M21 3Si1/)
  await write(page, 'GMAW: Trade name', 'Weirwire SG2')
  await page.getByRole('group', { name: 'GMAW: Positions' }).getByRole('button', { name: '3G', exact: true }).click()
  await choose(page, 'GMAW: Vertical progression', 'Up')
  await pick(page, 'GMAW: Shielding gas', '18', /82.*18/)
  await write(page, 'GMAW: Shielding gas, flow', '14')
  await choose(page, 'GMAW: Current', 'DC, electrode positive')
  await choose(page, 'GMAW: Transfer mode', 'Spray')
  await choose(page, 'GMAW: Pulsed', 'No')
  await choose(page, 'GMAW: Waveform controlled', 'No')
  await write(page, 'GMAW: Heat input', '1.06')
  await choose(page, 'GMAW: Heat input found by', 'Volts × amps ÷ travel')
  await choose(page, 'GMAW: The figure is', 'Arc energy, U · I ÷ v')
  await choose(page, 'GMAW: Passes per side', 'Multiple')
  await write(page, 'Preheat, minimum', '100')
  await write(page, 'Interpass, maximum', '200')
  await choose(page, 'Post-heating', 'No')
  await choose(page, 'Condition', 'None')
  await write(page, 'Laboratory', 'Wharfside Materials Laboratory')
  await write(page, 'Report number', 'WML-26-1005')
  await box(page, 'Tested on').fill('2026-10-14')

  await page.getByRole('button', { name: 'Log the first pass' }).click()
  for (const [name, text] of [['amps', '190'], ['volts', '25'], ['travel', '268'], ['interpass', '150']] as const) await write(page, `Pass 1, ${name}`, text)

  const wanted = room(page, 'Specimens asked for')
  for (const label of ['Visual testing, whole length', 'Radiographic or ultrasonic testing, whole length', 'Hardness survey, HV10', 'Impact sets of three', 'Macro sections', 'Side bends']) await wanted.getByText(label, { exact: true }).waitFor()
  const certify = page.getByRole('button', { name: 'Certify', exact: true })

  for (const [button, mark] of [['Visual', 'VT'], ['Radiography', 'RT'], ['Magnetic particle', 'MT']] as const) {
    await add(page, 'Non-destructive testing', button)
    const row = room(page, 'Non-destructive testing').getByRole('group', { name: mark, exact: true })
    await choose(row, 'Whole length tested', 'Yes')
    await row.getByRole('article', { name: 'Cannot tell:' }).first().waitFor()
    await choose(row, 'Accepted', 'Yes')
    await write(row, 'Report number', `WML-26-1005-${mark}`)
    await row.getByRole('article', { name: /^Accepted: / }).waitFor()
  }
  for (const [mark, load] of [['T1', '262'], ['T2', '264']] as const) {
    await add(page, 'Tension', 'Tension specimen')
    const row = room(page, 'Tension').getByRole('group', { name: mark, exact: true })
    await write(row, 'Width, mm', '25')
    await write(row, 'Thickness, mm', '20')
    await write(row, 'Ultimate load, kN', load)
    await choose(row, 'Broke in', 'Base metal')
  }
  for (const mark of ['S1', 'S2', 'S3', 'S4']) {
    await add(page, 'Bends', 'Side bend')
    const row = room(page, 'Bends').getByRole('group', { name: mark, exact: true })
    for (const [name, text] of [[/^Thickness/, '10'], [/^Former/, '40'], [/^Angle/, '180']] as const) await write(row, name, text)
    await row.getByRole('checkbox', { name: /face inspected/i }).check()
  }
  await add(page, 'Macro sections', 'Macro section')
  const macro = room(page, 'Macro sections').getByRole('group', { name: 'M1', exact: true })
  await choose(macro, 'Fusion complete', 'Yes')
  await choose(macro, 'Cracks', 'No')
  for (const [mark, values] of [['Weld', '74, 81, 69'], ['HAZ', '96, 88, 103']] as const) {
    await add(page, 'Toughness', 'Set of impact specimens')
    const row = room(page, 'Toughness').getByRole('group', { name: mark, exact: true })
    await write(row, /^Temperature/, '-20')
    await write(row, /^Size/, '10 x 10')
    await write(row, /^Absorbed energy/, values)
  }
  await add(page, 'Hardness', 'Row of indentations')
  const hardness = room(page, 'Hardness').getByRole('group').first()
  await choose(hardness, 'Place', 'Heat-affected zone')
  await write(hardness, /^Hardness/, '238, 251, 266')

  // A result opens to how it was reached.
  const note = room(page, 'Hardness').getByRole('article', { name: /^Accepted: / })
  await note.getByText('How this was reached').click()
  expect(await note.textContent()).toMatch(/ISO 15614-1 2017\+A1:2019, 7\.4\.5.*266 HV10/)
  await eventually(async () => ((await (await page.request.get(`/api/coupons/${id}/qualification`)).json()) as { qualifications: CouponQualification[] }).qualifications.flatMap(({ missing }) => missing.map(({ message }) => message))).toEqual([])
  await page.getByText('Nothing is missing for certification.').waitFor()
  await saved(page)
  expect(await axe(page)).toEqual([])

  const kept = await read()
  expect(kept.content.variables.thickness).toMatchObject({ min: { si: 20 }, max: { si: 20 } })
  expect(kept.content.variables.joint.rootOpening).toMatchObject({ min: { si: 2 }, max: { si: 3 } })
  expect(kept.content.variables.postHeating).toEqual({ used: false, temperature: null, time: null })
  expect(kept.content.ndt?.map(({ method, accepted, wholeLength }) => [method, accepted, wholeLength])).toEqual([['VT', true, true], ['RT', true, true], ['MT', true, true]])

  await certify.click()
  const dialog = page.getByRole('dialog', { name: `Certify ${number}` })
  await dialog.getByLabel('Your password').fill(password())
  await dialog.getByRole('button', { name: `Certify ${number}` }).click()
  await dialog.waitFor({ state: 'detached' })
  await eventually(async () => (await read()).state).toBe('certified')
  const { qualifications } = (await (await page.request.get(`/api/coupons/${id}/qualification`)).json()) as { qualifications: CouponQualification[] }
  expect(qualifications.map(({ standard, readyToCertify, missing }) => [standard, readyToCertify, missing])).toEqual([['iso-15614-1', true, []]])
  await room(page, 'Non-destructive testing').getByText('WML-26-1005-RT').waitFor()
  expect(await room(page, 'What this coupon qualifies').textContent()).toContain('2017+A1:2019')
  const printed = await page.request.get(`/api/coupons/${id}/document`)
  expect(printed.status()).toBe(200)
})

it('a procedure chooses its route and its edition when it is begun, and changes them in the draft', async () => {
  const page = await stage.as('engineer')
  await page.goto('/procedures/new')
  await box(page, 'Title').fill('Fillets on frames, prequalified')
  await choose(page, 'Standard', 'AWS D1.1')
  await choose(page, 'Supported', 'Prequalified')
  await page.getByRole('group', { name: 'Processes' }).getByRole('button', { name: 'FCAW', exact: true }).click()
  await page.getByRole('button', { name: 'Open the sheet' }).click()
  await page.waitForURL(/\/revisions\//)
  await settled(page)
  const id = new URL(page.url()).pathname.split('/').at(-1) ?? ''
  const read = async () => ((await (await page.request.get(`/api/revisions/${id}`)).json()) as { content: Coupon['content'] }).content.variables.standards
  expect(await read()).toMatchObject([{ standard: 'aws-d1-1', route: 'prequalified', level: null }])
  const judged = page.getByRole('article', { name: /^(Cannot tell|Outside):/ }).first()
  await judged.waitFor()
  // Opening a draft changes nothing in it.
  await page.getByRole('main').getByText('Saved', { exact: true }).first().waitFor()
  await choose(page, 'How AWS D1.1 supports it', 'By test')
  await page.getByRole('button', { name: 'Standard', exact: true }).click()
  await choose(page, 'Standard 2', 'ISO 15614-1')
  await choose(page, 'Level of ISO 15614-1', 'Level 1')
  await eventually(read).toMatchObject([{ standard: 'aws-d1-1', route: 'test' }, { standard: 'iso-15614-1', level: '1' }])
  await judged.getByText('How this was reached').click()
  expect(await judged.textContent()).toMatch(/edition \d{4}|Read in|From memory|secondary/)
})
