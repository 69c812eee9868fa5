import path from 'node:path'
import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { PanelCard } from '@shared/schemas/machines.ts'
import type { Trial } from '@shared/schemas/trials.ts'
import { axe } from './browser.ts'
import { complaintsOf, eventually, readRevision, settled, useStage } from './stage.ts'

const stage = useStage()

/** Six beads by thumb on a phone, between welds; then the desk makes of the best one a procedure, whose panel card dials that machine. */
describe('from six trial beads to a procedure with a panel card', () => {
  let phone: Page
  let desk: Page
  let trialId = ''
  let complaints: string[] = []
  beforeAll(async () => {
    phone = await stage.as('welder', { width: 390, height: 844 })
    complaints = complaintsOf(phone)
    desk = await stage.as('engineer')
  })
  afterAll(async () => {
    await phone.context().close()
    await desk.context().close()
  })
  const trial = async (): Promise<Trial> => (await (await phone.request.get(`/api/trials/${trialId}`)).json()) as Trial
  /** Types into a type-ahead and takes the first that it offers. */
  const pick = async (label: string, text: string, option: RegExp) => {
    await phone.getByRole('combobox', { name: label }).pressSequentially(text)
    await phone.getByRole('option', { name: option }).first().waitFor()
    await phone.keyboard.press('ArrowDown')
    await phone.keyboard.press('Enter')
    await phone.getByRole('listbox').waitFor({ state: 'detached' })
  }
  const saveBead = async (number: number) => {
    await phone.getByRole('button', { name: `Save bead ${number}` }).click()
    await phone.waitForURL(/\/dial-in\/[0-9a-f-]+$/)
    await eventually(async () => (await trial()).beads.length).toBe(number)
  }
  /** Copies the last bead and turns one knob; the panel card's own names are on the buttons. */
  const next = async (number: number, turn: { knob: string; to: string } | null, score: number, faults: readonly (readonly [string, number])[] = []) => {
    await phone.getByRole('link', { name: 'Copy last bead, change one thing' }).click()
    await phone.getByRole('heading', { level: 1, name: `Bead ${number}` }).waitFor()
    if (turn) await phone.getByRole('textbox', { name: turn.knob, exact: true }).fill(turn.to)
    await phone.getByRole('button', { name: new RegExp(`^Score ${score},`) }).click()
    for (const [fault, taps] of faults) for (let tap = 0; tap < taps; tap += 1) await phone.getByRole('button', { name: new RegExp(`^${fault}`) }).click()
  }

  it('begins a trial and logs the first bead with its set-up', async () => {
    await phone.goto('/dial-in')
    await settled(phone)
    await phone.getByRole('button', { name: 'Begin a trial' }).first().click()
    await phone.getByRole('textbox', { name: 'What setting are you after?' }).fill('ER5356 corner, 6 mm 6061')
    await phone.getByRole('button', { name: 'Begin', exact: true }).click()
    await phone.waitForURL(/\/dial-in\/[0-9a-f-]{36}$/)
    trialId = phone.url().split('/').at(-1) ?? ''
    await phone.getByRole('link', { name: 'Log the first bead' }).click()
    await phone.getByRole('heading', { level: 1, name: 'Bead 1' }).waitFor()
    await phone.getByLabel('Machine').selectOption({ label: 'M-003 Bay 3 pulse' })
    await phone.getByLabel('Mode').selectOption({ label: 'Manual pulse' })
    await pick('Wire or electrode', 'ER5356', /^ER5356/)
    await phone.getByLabel('Wire diameter, mm').fill('1.2')
    await phone.getByRole('combobox', { name: 'Gas' }).fill('Ar 100')
    await phone.keyboard.press('Tab')
    await phone.getByLabel('Stick-out, mm').fill('16')
    await pick('Metal', '6061-T6', /6061-T6/)
    await phone.getByLabel('Thickness, mm').fill('6')
    await phone.getByLabel('Position').selectOption('2F')
    for (const [knob, value] of [['Wire feed', '320'], ['Voltage', '23'], ['Background', '17'], ['Frequency', '116'], ['Pulse on-time', '1.9']] as const) await phone.getByRole('textbox', { name: knob, exact: true }).fill(value)
    await phone.getByRole('button', { name: /^Score 4,/ }).click()
    await phone.getByLabel('Note').fill('A little proud, sound arc')
    expect(await axe(phone)).toEqual([])
    await saveBead(1)
    const [bead] = (await trial()).beads
    expect(bead?.content).toMatchObject({ modeKey: 'manual-pulse', wireId: 'a510-er5356', wireDiameter: { si: 1.2 }, gas: { components: [{ gas: 'Ar', percent: 100 }] }, score: 4, note: 'A little proud, sound arc' })
    expect(bead?.content.settings.map(({ label, value, unit }) => `${label} ${value} ${unit}`)).toEqual(['Wire feed 320 in/min', 'Voltage 23 V', 'Background 17 V', 'Frequency 116 Hz', 'Pulse on-time 1.9 ms'])
  })

  it('raises the feed, is told which setting to bring along, and takes it over', async () => {
    await next(2, { knob: 'Wire feed', to: '330' }, 5)
    // 116 × 330 / 320 = 119.6 → 120 on steps of 1 Hz.
    await phone.getByText('Frequency to 120 Hz').waitFor()
    await phone.getByRole('button', { name: 'Set Frequency to 120 Hz' }).click()
    expect(await phone.getByRole('textbox', { name: 'Frequency', exact: true }).inputValue()).toBe('120')
    await phone.getByText('2 things changed').waitFor()
    await phone.getByLabel('Take a photo').setInputFiles(path.join(import.meta.dirname, '../fixtures/photos/macro-with-place.jpg'))
    await phone.getByRole('list', { name: 'Photos to send' }).getByText('macro-with-place.jpg').waitFor()
    await saveBead(2)
    await eventually(async () => (await trial()).beads[1]?.photos.map(({ mediaType }) => mediaType)).toEqual(['image/jpeg'])
  })

  it('loses nothing when the network drops between two beads', async () => {
    await next(3, { knob: 'Voltage', to: '23.4' }, 4)
    await phone.context().setOffline(true)
    await phone.getByRole('button', { name: 'Save bead 3' }).click()
    await phone.getByText('One bead waits').waitFor()
    expect((await phone.evaluate(() => Object.keys(localStorage).filter((key) => key.startsWith('sidebend.beads.')))).length).toBe(1)
    // The next one is written meanwhile, and left half-way.
    await phone.getByRole('link', { name: 'Copy last bead, change one thing' }).click()
    await phone.getByRole('heading', { level: 1, name: 'Bead 4' }).waitFor()
    await phone.getByRole('button', { name: 'Voltage up' }).click()
    expect(await phone.getByRole('textbox', { name: 'Voltage', exact: true }).inputValue()).toBe('23.5')
    await phone.context().setOffline(false)
    await phone.goto(`/dial-in/${trialId}`)
    await eventually(async () => (await trial()).beads.length).toBe(3)
    await phone.getByRole('link', { name: 'Copy last bead, change one thing' }).click()
    await phone.getByText('You were writing this bead').waitFor()
    expect(await phone.getByRole('textbox', { name: 'Voltage', exact: true }).inputValue()).toBe('23.5')
    complaints.splice(0)
  })

  it('logs three more, good and bad', async () => {
    await phone.getByRole('textbox', { name: 'Voltage', exact: true }).fill('24.4')
    await phone.getByRole('button', { name: /^Score 1,/ }).click()
    for (let tap = 0; tap < 3; tap += 1) await phone.getByRole('button', { name: /^Soot/ }).click()
    await phone.getByRole('button', { name: 'Soot, bad' }).waitFor()
    await saveBead(4)
    // From the bad one back to the best. Bead 6 is bad at 124 Hz as well, so that frequency stays out of the range.
    await phone.getByRole('link', { name: 'Back to bead 2, the best' }).click()
    await phone.getByRole('heading', { level: 1, name: 'Bead 5' }).waitFor()
    await phone.getByRole('textbox', { name: 'Frequency', exact: true }).fill('124')
    await phone.getByRole('button', { name: /^Score 4,/ }).click()
    await saveBead(5)
    await next(6, { knob: 'Wire feed', to: '360' }, 2, [['Spatter', 2]])
    await saveBead(6)
    expect(await phone.evaluate(() => Object.keys(localStorage).filter((key) => /^sidebend\.beads?\./.test(key)))).toEqual([])
    expect(complaints).toEqual([])
  })

  it('shows at the desk what each change did, promotes the best bead, and opens the draft', async () => {
    await desk.goto(`/dial-in/${trialId}`)
    await settled(desk)
    await desk.getByRole('table', { name: /Beads; a setting that differs/ }).waitFor()
    await desk.getByRole('button', { name: 'Make it a procedure' }).first().click()
    const dialog = desk.getByRole('dialog', { name: 'Make it a procedure' })
    expect(await dialog.getByLabel('Bead', { exact: true }).locator('option:checked').textContent()).toBe('Bead 2, score 5')
    await dialog.getByText('320 to 330').first().waitFor()
    await dialog.getByText(/Bead 6 at 360 in\/min scored 2 \(spatter, clear\): the range stops short of it/).waitFor()
    await dialog.getByText(/Bead 4 at 24.4 V scored 1 \(soot, bad\)/).waitFor()
    await dialog.getByRole('textbox', { name: 'Title of the procedure' }).fill('Corner, 6061-T6, pulsed, ER5356')
    await dialog.getByRole('button', { name: 'Create the draft' }).click()
    await desk.waitForURL(/\/revisions\/[0-9a-f-]+$/)
    await settled(desk)
    const revision = await readRevision(desk, desk.url().split('/').at(-1) ?? '')
    const block = revision.content.variables.processes[0]
    expect(revision).toMatchObject({ state: 'draft', content: { title: 'Corner, 6061-T6, pulsed, ER5356' } })
    expect(block).toMatchObject({ process: 'GMAW', filler: { classification: 'ER5356', fNumber: '22' }, electrical: { transferMode: 'pulsed-spray', pulseFrequency: { min: { si: 116 }, max: { si: 120 } }, voltage: { min: { si: 23 }, max: { si: 23.4 } } } })
    expect(revision.content.variables.baseMetals.a.pNumber).toBe('23')
    expect((await trial()).procedureNumber).toBe(revision.number)
  })

  it('has a panel card on that machine that dials inside the ranges', async () => {
    const revisionId = desk.url().split('/').at(-1) ?? ''
    const { beads } = await trial()
    const machineId = beads[0]?.content.machineId ?? ''
    const asked = (await (await desk.request.get(`/api/revisions/${revisionId}/panel-card?machine=${machineId}&mode=manual-pulse`)).json()) as PanelCard
    expect(asked.notices.filter(({ level }) => level === 'refuse')).toEqual([])
    expect(asked.lines.map(({ label, min, max }) => [label, min, max])).toEqual([['Wire feed', 320, 330], ['Voltage', 23, 23.4], ['Background', 17, 17], ['Frequency', 116, 120], ['Pulse on-time', 1.9, 1.9]])
    await desk.goto(`/machines/${machineId}/card?revision=${revisionId}&mode=manual-pulse`)
    await settled(desk)
    const card = desk.getByRole('article', { name: 'Panel card' })
    await card.getByText('Wire feed').first().waitFor()
    const text = (await card.innerText()).replace(/\s+/g, ' ')
    for (const { label, value } of asked.lines) expect([label, text.includes(label), text.includes(String(value))]).toEqual([label, true, true])
    expect(text).toContain('Nobody has approved this procedure')
  })
})
