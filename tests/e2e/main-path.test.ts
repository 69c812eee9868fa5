import { execFile } from 'node:child_process'
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { promisify } from 'node:util'
import type { Page } from 'playwright-core'
import sharp from 'sharp'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Coupon } from '@shared/schemas/records.ts'
import { widths } from './browser.ts'
import { eventually, password, readRevision, saved, settled, useStage } from './stage.ts'

const stage = useStage()
const run = promisify(execFile)

/** A box to write in; one that offers what the library holds is a type-ahead and takes free text as well. */
const box = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true }).or(page.getByRole('combobox', { name, exact: true }))
async function write(page: Page, name: string, text: string): Promise<void> {
  await box(page, name).fill(text)
  await box(page, name).blur()
}
const choose = (page: Page, name: string, label: string) => page.getByRole('combobox', { name, exact: true }).selectOption({ label })
/** Types into a type-ahead and picks what it offers. */
async function pick(page: Page, name: string | RegExp, text: string, option: RegExp): Promise<void> {
  await page.getByRole('combobox', { name }).pressSequentially(text)
  await page.getByRole('option', { name: option }).first().click()
  await page.getByRole('listbox').waitFor({ state: 'detached' })
}
const press = (page: Page, group: string, button: string) => page.getByRole('group', { name: group }).getByRole('button', { name: button, exact: true }).click()
/** The tally at the head of the margin: "0 outside, 0 cannot tell, 27 within". */
const tally = (page: Page) => page.getByRole('status', { name: /\d+ outside, \d+ cannot tell, \d+ within/ }).first().getAttribute('aria-label')
const idIn = (page: Page) => new URL(page.url()).pathname.split('/').at(-1) ?? ''

/** What one step leaves to the next: each test is a step of the one path and needs those before it. */
const path_ = { revisionId: '', number: '', couponId: '', coupon: '' }
let folder = ''
let pdf: Buffer = Buffer.alloc(0)

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sidebend-path-'))
})
afterAll(() => rm(folder, { recursive: true, force: true }))

describe.sequential('the whole path with real records', () => {
  it('an engineer drafts a procedure, and the margin says that nothing supports it yet', async () => {
    const page = await stage.as('engineer')
    await page.goto('/')
    await page.getByRole('link', { name: 'Draft a procedure' }).click()
    await box(page, 'Title').fill('Shell butts of a water vessel, A516-70, stick')
    await press(page, 'Processes', 'SMAW')
    await pick(page, /^Metal A/, 'A516-70', /^A\/SA-516 70/)
    await page.getByRole('button', { name: 'Open the sheet' }).click()
    await page.waitForURL(/\/revisions\//)
    await settled(page)
    path_.revisionId = idIn(page)
    path_.number = (await readRevision(page, path_.revisionId)).number
    expect(await page.getByRole('heading', { level: 1 }).textContent()).toContain(path_.number)
    await eventually(() => tally(page)).toMatch(/^0 outside, [1-9]\d* cannot tell/)

    await choose(page, 'Groove', 'Single V')
    await write(page, 'Included angle, from', '60-70')
    await write(page, 'Root opening, from', '2-4 mm')
    await write(page, 'Root face, from', '0-2')
    await choose(page, 'Backing', 'None')
    await choose(page, 'Retainers', 'No')
    await choose(page, 'Back gouging', 'None')
    await write(page, 'Thickness, from', '5')
    await write(page, 'Thickness, to', '5/8 in')
    await page.getByText('= 15.9 mm').first().waitFor()
    await choose(page, 'SMAW: Mechanisation', 'Manual')
    await write(page, 'SMAW: Deposit thickness, to', '5/8"')
    await write(page, 'SMAW: Thickest pass', '4')
    await pick(page, 'SMAW: Filler metal', 'E7018', /^E7018 /)
    expect(await box(page, 'SMAW: F-Number').inputValue(), 'its numbers come with the filler').toBe('4')
    expect(await box(page, 'SMAW: A-Number').inputValue()).toBe('1')
    await write(page, 'SMAW: Sizes', '2.5, 1/8 in')
    for (const position of ['1G', '2G', '3G']) await press(page, 'SMAW: Positions', position)
    await choose(page, 'SMAW: Vertical progression', 'Up')
    await choose(page, 'SMAW: Current', 'DC, electrode positive')
    await write(page, 'SMAW: Amps, from', '80-140')
    await write(page, 'SMAW: Volts, from', '20-26')
    await write(page, 'SMAW: Travel speed, from', '60-150')
    await choose(page, 'SMAW: Bead', 'Stringer or weave')
    await write(page, 'SMAW: Initial cleaning', 'grind to bright metal')
    await write(page, 'SMAW: Interpass cleaning', 'chip and wire brush')
    await choose(page, 'SMAW: Passes per side', 'Multiple')
    await choose(page, 'SMAW: Electrodes', 'Single')
    await choose(page, 'SMAW: Peening', 'None')
    await write(page, 'Preheat, minimum', '50 F')
    await page.getByText('= 10 °C').waitFor()
    await write(page, 'Interpass, maximum', '250')
    await write(page, 'Maintenance', 'until the joint is complete')
    await choose(page, 'Condition', 'None')
    await choose(page, 'Toughness required', 'No')

    const note = page.getByRole('article', { name: 'Cannot tell: T qualified' })
    expect(await note.textContent()).toContain('no coupon')
    await page.getByRole('article', { name: 'Cannot tell: F-Number', exact: true }).waitFor()
    await saved(page)
    const { content } = await readRevision(page, path_.revisionId)
    expect(content.variables.baseMetals.a).toMatchObject({ pNumber: '1', groupNumber: 2, uns: 'K02700' })
    expect(content.variables.thickness?.max).toMatchObject({ si: 15.875, unit: 'in', typed: '5/8 in' })
    expect(content.variables.preheat.minimum).toMatchObject({ si: 10, typed: '50 F' })
  })

  it('an inspector opens a coupon against the draft, logs the passes and the tests, and certifies it', async () => {
    const page = await stage.as('inspector')
    await page.goto('/coupons')
    await page.getByRole('link', { name: 'Open a coupon' }).click()
    await pick(page, 'Procedure', path_.number, new RegExp(`^${path_.number}`))
    await page.getByRole('button', { name: 'Open the coupon' }).first().click()
    await page.waitForURL(/\/coupons\/[0-9a-f]{8}-/)
    await settled(page)
    path_.couponId = idIn(page)
    path_.coupon = (await page.getByRole('heading', { level: 1 }).textContent())?.trim() ?? ''
    expect(path_.coupon).toMatch(/\d/)
    expect(await page.getByRole('combobox', { name: 'Metal A' }).inputValue(), 'what the draft names comes with it').toBe('A/SA-516 70')
    const certify = page.getByRole('button', { name: 'Certify', exact: true })
    expect(await certify.count(), 'nothing to certify before anything is tested').toBe(0)

    await write(page, 'Title', '10 mm plate, 3G')
    await box(page, 'Welded on').fill('2026-10-05')
    await write(page, 'Welder', 'Joe Pell')
    await write(page, 'Stamp', 'L11')
    await write(page, 'Heat number, A', 'H-48812')
    await write(page, 'Heat number, B', 'H-48812')
    await write(page, 'Thickness', '10 mm')
    await write(page, 'SMAW: Deposit thickness', '10')
    await write(page, 'SMAW: Thickest pass', '3.5')
    await press(page, 'SMAW: Positions', '3G')
    await choose(page, 'SMAW: Vertical progression', 'Up')
    await write(page, 'Preheat, minimum', '20')
    await write(page, 'Interpass, maximum', '210')

    await page.getByRole('button', { name: 'Log the first pass' }).click()
    const cells = [
      ['90', '22', '80', ''],
      ['115', '24', '110', '120'],
      ['118', '24', '115', '180'],
    ] as const
    for (const [index, [amps, volts, travel, interpass]] of cells.entries()) {
      if (index > 0) await page.getByRole('button', { name: 'Next pass' }).click()
      const pass = `Pass ${index + 1}`
      await write(page, `${pass}, amps`, amps)
      await write(page, `${pass}, volts`, volts)
      await write(page, `${pass}, travel`, travel)
      if (interpass) await write(page, `${pass}, interpass`, interpass)
    }
    // 118 A × 24 V × 60 ÷ 115 mm/min = 1.48 kJ/mm, the hottest pass
    const sheet = page.getByRole('region', { name: 'Run sheet' })
    await sheet.getByText(/Heat input.*1\.4\d–1\.5\d? kJ\/mm/).waitFor()
    await sheet.getByText(/hottest interpass 180 °C/).waitFor()

    const tension = page.getByRole('region', { name: 'Tension' })
    for (const [mark, load] of [['T1', '98.5'], ['T2', '99.1']] as const) {
      await tension.getByRole('button', { name: 'Tension specimen' }).click()
      const row = tension.getByRole('group', { name: mark })
      const type = async (name: string, text: string) => {
        await row.getByRole('textbox', { name }).fill(text)
        await row.getByRole('textbox', { name }).blur()
      }
      await type('Width, mm', '19')
      await type('Thickness, mm', '10')
      await type('Load, kN', load)
      await row.getByRole('combobox', { name: 'Broke in' }).selectOption({ label: 'Base metal' })
      await row.getByRole('combobox', { name: 'Fracture' }).selectOption({ label: 'Ductile' })
    }
    // 98.5 kN ÷ (19 × 10 mm²)
    await tension.getByText('518').first().waitFor()
    await tension.getByRole('article', { name: 'Accepted: T1' }).waitFor()
    await page.getByText(/things? (is|are) missing/).first().waitFor()
    await certify.waitFor()
    expect(await certify.isDisabled(), 'nothing is certified while things are missing').toBe(true)

    const bends = page.getByRole('region', { name: 'Bends' })
    for (const mark of ['S1', 'S2', 'S3', 'S4']) {
      await bends.getByRole('button', { name: 'Side bend' }).click()
      const row = bends.getByRole('group', { name: mark, exact: true })
      for (const [name, text] of [[/^Thickness/, '10'], [/^Former/, '40'], [/^Angle/, '180']] as const) {
        await row.getByRole('textbox', { name }).fill(text)
        await row.getByRole('textbox', { name }).blur()
      }
      await row.getByRole('checkbox', { name: /face inspected/i }).check()
    }
    await bends.getByRole('article', { name: 'Accepted: S4' }).waitFor()
    await write(page, 'Laboratory', 'Weir Lane Test House')
    await write(page, 'Report number', 'WL-26-118')
    await box(page, 'Tested on').fill('2026-10-12')
    await page.getByText('Nothing is missing for certification.').waitFor()
    await saved(page)
  })

  it('keeps photos and papers with the coupon, and refuses what is neither, in a sentence', async () => {
    const page = await stage.as('inspector')
    await page.goto(`/coupons/${path_.couponId}`)
    await settled(page)
    const photos = page.getByRole('region', { name: 'Photos and papers' })
    const picture = sharp({ create: { width: 640, height: 480, channels: 3, background: { r: 170, g: 120, b: 60 } } })
    const jpeg = await picture.clone().jpeg().toBuffer()
    const files = [
      { name: 'set-up.jpg', mimeType: 'image/jpeg', buffer: jpeg },
      { name: 'bend S2.png', mimeType: 'image/png', buffer: await picture.clone().png().toBuffer() },
      { name: 'report WL-26-118.pdf', mimeType: 'application/pdf', buffer: Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n') },
    ]
    await photos.getByLabel('Choose photos or papers').setInputFiles(files)
    await photos.getByRole('button', { name: 'Look at set-up.jpg' }).waitFor()
    await photos.getByRole('button', { name: 'Look at bend S2.png' }).waitFor()
    await photos.getByRole('link', { name: 'Open the paper report WL-26-118.pdf' }).waitFor()
    await photos.getByRole('textbox', { name: 'Caption of set-up.jpg' }).fill('Tacked and ready')
    await photos.getByRole('textbox', { name: 'Caption of set-up.jpg' }).press('Enter')
    await photos.getByRole('button', { name: 'Look at Tacked and ready' }).waitFor()

    await photos.getByLabel('Choose photos or papers').setInputFiles([{ name: 'notes.txt', mimeType: 'text/plain', buffer: Buffer.from('not a photo at all') }])
    await photos.getByRole('alert').filter({ hasText: 'notes.txt is not a photo or a paper' }).waitFor()
    await photos.getByLabel('Choose photos or papers').setInputFiles([{ name: 'bend S3.png', mimeType: 'image/png', buffer: jpeg }])
    await photos.getByRole('alert').filter({ hasText: 'bend S3.png is named .png but is JPEG inside' }).waitFor()
    await photos.getByLabel('Choose photos or papers').setInputFiles([{ name: 'empty.jpg', mimeType: 'image/jpeg', buffer: Buffer.alloc(0) }])
    await photos.getByRole('alert').filter({ hasText: 'empty.jpg is empty' }).waitFor()
    const kept = (await (await page.request.get(`/api/coupons/${path_.couponId}/photos`)).json()) as { items: { id: string; fileName: string; caption: string }[] }
    expect(kept.items.map(({ fileName }) => fileName).sort()).toEqual(['bend S2.png', 'report WL-26-118.pdf', 'set-up.jpg'])
    const original = kept.items.find(({ caption }) => caption === 'Tacked and ready')
    const read = await page.request.get(`/api/photos/${original?.id}/original`)
    expect(jpeg.equals(await read.body()), 'the original is kept untouched').toBe(true)
  })

  it('the inspector certifies by password, and the record is closed', async () => {
    const page = await stage.as('inspector')
    await page.goto(`/coupons/${path_.couponId}`)
    await settled(page)
    await page.getByRole('button', { name: 'Certify', exact: true }).click()
    const dialog = page.getByRole('dialog', { name: `Certify ${path_.coupon}` })
    await dialog.getByLabel('Your password').fill('not my password at all')
    await dialog.getByRole('button', { name: `Certify ${path_.coupon}` }).click()
    await dialog.getByText('This is not the password of your account.').waitFor()
    await dialog.getByLabel('Your password').fill(password())
    await dialog.getByRole('button', { name: `Certify ${path_.coupon}` }).click()
    await dialog.waitFor({ state: 'detached' })
    await page.getByRole('region', { name: 'Signatures' }).getByText('Certified', { exact: true }).waitFor()
    expect(await box(page, 'Title').count(), 'nothing can be typed any more').toBe(0)
    const coupon = (await (await page.request.get(`/api/coupons/${path_.couponId}`)).json()) as Coupon
    expect(coupon).toMatchObject({ state: 'certified', signatures: [{ meaning: 'certified' }] })
    const again = await page.request.put(`/api/coupons/${path_.couponId}`, { data: { content: coupon.content }, headers: { 'If-Match': `"${coupon.version}"` } })
    expect(again.status()).toBeGreaterThanOrEqual(400)
  })

  it('the engineer links the coupon: what could not be told is within, what goes beyond is outside, and the fix is a click', async () => {
    const page = await stage.as('engineer')
    await page.goto(`/revisions/${path_.revisionId}`)
    await settled(page)
    await pick(page, 'Link a coupon', path_.coupon, new RegExp(`^${path_.coupon}`))
    await page.getByRole('region', { name: 'Supporting coupons' }).getByRole('link', { name: path_.coupon }).waitFor()
    await eventually(() => tally(page)).toMatch(/^0 outside, 0 cannot tell, [1-9]/)

    await write(page, 'Thickness, to', '25')
    const outside = page.getByRole('article', { name: 'Outside: T qualified' })
    await outside.waitFor()
    expect(await outside.textContent()).toMatch(/25 mm.*20 mm/)
    const gauge = page.getByRole('img', { name: /^(T qualified|Thickness).*Outside: 20 to 25 mm/ })
    await gauge.waitFor()
    expect(await gauge.locator('path.fill-oxide').evaluate((bar) => getComputedStyle(bar).fill), 'what sticks out is red oxide').toBe('rgb(168, 54, 31)')

    await outside.getByRole('button', { name: /20 mm/ }).click()
    await outside.waitFor({ state: 'detached' })
    expect(await box(page, 'Thickness, to').inputValue()).toBe('20')
    await page.getByRole('button', { name: 'Undo' }).click()
    await outside.waitFor()
    expect(await box(page, 'Thickness, to').inputValue()).toBe('25')

    await write(page, 'Thickness, to', '5/8 in')
    await outside.waitFor({ state: 'detached' })
    await eventually(() => tally(page)).toMatch(/^0 outside, 0 cannot tell/)
    await saved(page)
  })

  it('submits it, and the author can’t approve it', async () => {
    const page = await stage.as('engineer')
    await page.goto(`/revisions/${path_.revisionId}`)
    await settled(page)
    await page.getByRole('button', { name: 'Send for review' }).click()
    const dialog = page.getByRole('dialog', { name: 'Send for review' })
    await dialog.getByText('Every essential finding is within what the coupons qualify.').waitFor()
    await dialog.getByRole('button', { name: `Send ${path_.number} rev A for review` }).click()
    await dialog.waitFor({ state: 'detached' })
    await page.getByText('In review', { exact: true }).first().waitFor()
    expect(await box(page, 'Title').count(), 'under review it can’t be changed').toBe(0)

    await page.goto(`/revisions/${path_.revisionId}/review`)
    await page.getByText('You wrote this revision, so somebody else has to approve it.').waitFor()
    expect(await page.getByRole('button', { name: 'Approve and sign' }).count()).toBe(0)
    const { version } = await readRevision(page, path_.revisionId)
    const tried = await page.request.post(`/api/revisions/${path_.revisionId}/approval`, { data: { password: password() }, headers: { 'If-Match': `"${version}"` } })
    expect(tried.status()).toBe(403)
  })

  it('a supervisor reviews and signs, and the signed PDF stands up to an outside verifier', async () => {
    const page = await stage.as('supervisor')
    await page.goto('/')
    await page.getByRole('link', { name: new RegExp(path_.number) }).first().click()
    await page.waitForURL(new RegExp(path_.revisionId))
    if (!page.url().endsWith('/review')) await page.getByRole('link', { name: 'Review' }).click()
    await page.getByText('Every essential finding is within what the coupons qualify.').waitFor()
    await page.getByRole('region', { name: 'Coupons' }).getByRole('link', { name: path_.coupon }).waitFor()
    const decision = page.getByRole('complementary', { name: 'Decision' })
    await decision.getByLabel('Your password').fill(password())
    await decision.getByRole('button', { name: 'Approve and sign' }).click()
    await page.waitForURL(new RegExp(`/revisions/${path_.revisionId}$`))
    await page.getByRole('region', { name: 'Signatures' }).getByText('Approved', { exact: true }).waitFor()

    const href = await page.getByRole('link', { name: 'Print' }).getAttribute('href')
    const answer = await page.context().request.get(href ?? '')
    expect(answer.headers()['content-type']).toContain('application/pdf')
    pdf = await answer.body()
    const file = path.join(folder, 'procedure.pdf')
    await writeFile(file, pdf)
    const verified = (await run('pdfsig', [file])).stdout
    expect(verified).toContain('Signature is Valid')
    expect(verified).toContain('Total document signed')
    const text = (await run('pdftotext', ['-layout', file, '-'])).stdout
    for (const part of [path_.number, path_.coupon, 'Shell butts of a water vessel', 'A/SA-516 70', 'E7018', 'Ines Callard', 'Marit Vance']) expect(text).toContain(part)
    // One byte changed, and the verifier says so: what was checked above is the content, not the mere presence of a signature.
    const changed = Buffer.from(pdf)
    changed[200] = (changed[200] ?? 0) ^ 1
    await writeFile(file, changed)
    expect((await run('pdfsig', [file]).catch((error: unknown) => error as { stdout: string })).stdout).not.toContain('Signature is Valid')
  })

  it('e-mails it; the caught mail is readable in the outbox with the very PDF', async () => {
    const page = await stage.as('supervisor')
    await page.goto(`/revisions/${path_.revisionId}`)
    await page.getByRole('button', { name: 'E-mail' }).click()
    const dialog = page.getByRole('dialog', { name: 'E-mail the procedure' })
    await dialog.getByRole('textbox', { name: 'To' }).fill('inspection@hollin.example, stores@larkfield.example')
    await dialog.getByRole('textbox', { name: /^Message/ }).fill('For the vessel; the plates arrive on Tuesday.')
    await dialog.getByRole('button', { name: 'Send' }).click()
    await dialog.waitFor({ state: 'detached' })

    await page.goto('/outbox')
    await page.getByRole('link', { name: new RegExp(path_.number) }).first().click()
    await page.waitForURL(/\/outbox\/./)
    await eventually(async () => {
      await page.reload()
      await settled(page)
      return page.getByText('caught, not sent').count()
    }).toBe(1)
    await page.getByText('For the vessel; the plates arrive on Tuesday.').waitFor()
    await page.getByText('inspection@hollin.example, stores@larkfield.example').waitFor()
    const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('region', { name: 'Attached' }).getByRole('link', { name: 'Download' }).click()])
    expect(download.suggestedFilename()).toMatch(new RegExp(`${path_.number}.*\\.pdf$`))
    const attached = path.join(folder, 'attached.pdf')
    await download.saveAs(attached)
    const bytes = await readFile(attached)
    expect(bytes.equals(pdf), 'what was sent is what was signed, byte for byte').toBe(true)
    expect((await run('pdfsig', [attached])).stdout).toContain('Signature is Valid')
  })

  it('a welder looks the joint up on a phone and reads the figures in the shop view', async () => {
    const page = await stage.as('welder', { width: widths[2], height: 844 })
    await page.goto('/')
    await page.getByRole('button', { name: 'Open the menu' }).click()
    const find = page.getByRole('textbox', { name: 'Find a procedure for a joint' })
    await find.fill('10 mm A516-70 to A516-70 SMAW 3G')
    await find.press('Enter')
    const first = page.getByRole('region', { name: 'Procedures that fit' }).getByRole('listitem').first()
    await first.waitFor()
    const said = await first.innerText()
    expect(said).toContain(path_.number)
    expect(said, 'with the reason').toMatch(/10 mm/)
    await first.getByRole('link').click()
    await page.waitForURL(`/shop/${path_.revisionId}`)
    await page.getByRole('heading', { level: 1, name: path_.number }).waitFor()
    const dials = page.getByRole('region', { name: 'Keep within' })
    expect(await dials.getByRole('listitem').allInnerTexts()).toEqual([expect.stringMatching(/Amps\s+80–140\s*A/), expect.stringMatching(/Volts\s+20–26\s*V/), expect.stringMatching(/Travel\s+60–150\s*mm\/min/)])
    await page.getByText('E7018').first().waitFor()
    await page.getByText(/Approved by Marit Vance/).waitFor()
  })

  it('and the revision can’t be edited any more', async () => {
    const page = await stage.as('engineer')
    await page.goto(`/revisions/${path_.revisionId}`)
    await settled(page)
    await page.getByRole('button', { name: 'Revise' }).waitFor()
    expect(await page.getByRole('main').getByRole('textbox').count()).toBe(0)
    const revision = await readRevision(page, path_.revisionId)
    const tried = await page.request.put(`/api/revisions/${path_.revisionId}`, { data: { content: { ...revision.content, title: 'Changed behind the signature' } }, headers: { 'If-Match': `"${revision.version}"` } })
    expect(tried.status()).toBeGreaterThanOrEqual(400)
    expect((await readRevision(page, path_.revisionId)).contentSha256).toBe(revision.contentSha256)
  })
})
