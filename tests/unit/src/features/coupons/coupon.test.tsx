// @vitest-environment jsdom
import { act, configure, fireEvent, screen, waitFor, within } from '@testing-library/react'
import { describe, expect, it, vi } from 'vitest'
import type { Coupon, Photo } from '@shared/schemas/records.ts'
import { couponContentSchema, type CouponContent } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { couponConflict, formPath, nextMark } from '@/features/coupons/content.ts'
import { partsOf } from '@/features/coupons/components/ListField.tsx'
import { refusalOf } from '@/features/coupons/uploads.ts'
import { mergeContents } from '@/lib/draft/merge.ts'
import '@/features/coupons/pages/CouponPage.tsx'
import { createRoutes } from '@/routes.tsx'
import { ids, mockApi, problem, session, showRoutes } from '../../support/render.tsx'

// The page is large, and a busy machine slow.
configure({ asyncUtilTimeout: 8000 })

const ID = '7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0006'
const content = (more: object = {}): CouponContent =>
  couponContentSchema.parse({
    title: '10 mm plate, 3G',
    variables: {
      standards: [{ standard: 'asme-ix', edition: '2021' }],
      thickness: interval(10, 10, 'length'),
      baseMetals: { a: { pNumber: '1', minTensile: quantity(485, 'stress') }, b: { pNumber: '1', minTensile: quantity(485, 'stress') } },
      processes: [{ id: 'p1', process: 'SMAW', electrical: { waveformControlled: false } }],
    },
    runSheet: [{ id: 'r1', processId: 'p1', pass: '1', layer: 'root', current: interval(100, 100, 'current'), voltage: interval(24, 24, 'voltage'), length: quantity(300, 'length'), arcTime: quantity(120, 'duration') }],
    ...more,
  })
const coupon = (more: Partial<Coupon> = {}): Coupon => ({ id: ID, number: 'PQR-009', state: 'welding', revisionId: null, procedureId: null, procedureNumber: null, inspector: { id: ids.me, name: 'Hal Ostby' }, version: 4, createdAt: '2026-11-01T08:00:00Z', updatedAt: '2026-11-02T08:00:00Z', content: content(), signatures: [], contentSha256: 'a'.repeat(64), may: ['save', 'photograph', 'reject'], ...more })
const inspector = session(['coupons.read', 'coupons.record', 'coupons.certify'], { roles: ['inspector'] })
/** A field by selector: asking by label walks the whole page, which is large, once for every field. */
const box = (selector: string): HTMLInputElement => {
  const found = document.querySelector<HTMLInputElement>(selector)
  if (!found) throw new Error(`no field ${selector}`)
  return found
}
/** Types into a field and leaves it. */
const fill = (selector: string, text: string) => {
  fireEvent.change(box(selector), { target: { value: text } })
  fireEvent.blur(box(selector))
}
const cell = (name: string) => `[aria-label="Pass 1, ${name}"]`
const open = (record: Coupon, more: Parameters<typeof mockApi>[0] = {}) => {
  const seen = mockApi({ [`GET /api/coupons/${ID}`]: { body: record }, [`GET /api/coupons/${ID}/photos`]: { body: { items: [] } }, [`PUT /api/coupons/${ID}`]: ({ body }) => ({ body: { ...record, version: record.version + 1, content: (body as { content: CouponContent }).content } }), ...more })
  showRoutes(createRoutes, { as: inspector, path: `/coupons/${ID}` })
  return seen
}

describe('coupon page', () => {
  it('computes heat input beside the pass and follows what is typed', async () => {
    open(coupon())
    const pass = within(await waitFor(() => box('[aria-label="Pass 1"]')))
    // 24 V × 100 A × 60 / 150 mm/min = 960 J/mm
    expect(pass.getByText('0.96')).toBeDefined()
    expect(pass.getByText(/Travel 150 mm\/min from length and arc time/)).toBeDefined()
    fill(cell('amps'), '200')
    expect(await pass.findByText('1.92')).toBeDefined()
    fill(cell('volts'), '')
    expect(await pass.findByText(/Heat input needs voltage/)).toBeDefined()
  })
  it('saves by itself with the version last read, and keeps a cell that cannot be read', async () => {
    const seen = open(coupon())
    await waitFor(() => box('#row-welder'))
    fill('#row-welder', 'Anya Brook')
    await waitFor(() => expect(seen.some(({ method }) => method === 'PUT')).toBe(true), { timeout: 8000 })
    const put = seen.find(({ method }) => method === 'PUT')
    expect(put?.headers.get('if-match')).toBe('"4"')
    expect((put?.body as { content: CouponContent }).content.welder).toBe('Anya Brook')
    const interpass = box(cell('interpass'))
    fill(cell('interpass'), 'warm')
    expect(interpass.value).toBe('warm')
    expect(await screen.findByText(/"warm" is not a temperature/)).toBeDefined()
  })
  it('judges a specimen as it is typed, and says what is missing with a way to the field', async () => {
    open(coupon())
    fireEvent.click(await screen.findByText('Tension specimen'))
    fill('#row-tension-0-width', '19')
    fill('#row-tension-0-thickness', '10')
    fill('#row-tension-0-load', '95')
    const note = within(await waitFor(() => box('[aria-label="Accepted: T1"]')))
    expect(note.getByText(/T1 reached 500 MPa/)).toBeDefined()
    fireEvent.click(screen.getByText('Name the welder who welded the coupon.'))
    expect(document.activeElement).toBe(box('#row-welder'))
  })
  it('takes the visual examination and non-destructive tests, each judged with its clause', async () => {
    const base = content()
    const seen = open(coupon({ content: { ...base, variables: { ...base.variables, standards: [{ standard: 'aws-d1-1', edition: '2020', level: null }], joint: { ...base.variables.joint, groove: 'single-v' } } } }))
    fireEvent.click(await screen.findByText('Visual examination', { selector: 'button' }))
    const choose = (selector: string, answer: string) => fireEvent.change(box(selector), { target: { value: answer } })
    choose('#row-visual-cracks', 'no')
    choose('#row-visual-cratersFull', 'yes')
    choose('#row-visual-rootSound', 'yes')
    fill('#row-visual-reinforcement', '2')
    const doubtful = within(await waitFor(() => box('[aria-label="Cannot tell: Visual"]')))
    expect(doubtful.getByText(/undercut isn't recorded/)).toBeDefined()
    fill('#row-visual-undercut', '0.3')
    const accepted = within(await waitFor(() => box('[aria-label="Accepted: Visual"]')))
    expect(accepted.getByText(/AWS D1\.1 2020/).textContent).toContain('judged from what is recorded')
    fireEvent.click(screen.getByText('Radiography', { selector: 'button' }))
    choose('#row-ndt-0-accepted', 'no')
    await waitFor(() => box('[aria-label="Not accepted: RT"]'))
    await waitFor(() => expect(seen.filter(({ method }) => method === 'PUT').length).toBeGreaterThan(0), { timeout: 8000 })
    const kept = (seen.findLast(({ method }) => method === 'PUT')?.body as { content: CouponContent }).content
    expect(kept.visual).toMatchObject({ cracks: false, undercut: { si: 0.3 }, rootConcavity: null })
    expect(kept.ndt).toMatchObject([{ method: 'RT', accepted: false }])
  })
  it('saves nothing by being opened, though some fields may be absent', async () => {
    const seen = open(coupon({ content: { ...content(), variables: { ...content().variables, standards: [{ standard: 'iso-15614-1', edition: '2017+A1:2019', level: '2' }] } } }))
    await waitFor(() => box('#row-hardnessRequired'))
    await new Promise((done) => setTimeout(done, 1500))
    expect(seen.filter(({ method }) => method === 'PUT')).toEqual([])
    fireEvent.change(box('#row-postHeating-used'), { target: { value: 'yes' } })
    await waitFor(() => box('#row-postHeating-temperature'))
    fill('#row-postHeating-temperature', '250')
    await waitFor(() => expect(seen.some(({ method }) => method === 'PUT')).toBe(true), { timeout: 8000 })
    await waitFor(() => expect((seen.findLast(({ method }) => method === 'PUT')?.body as { content: CouponContent }).content.variables.postHeating).toMatchObject({ used: true, temperature: { min: { si: 250 }, max: { si: 250 } }, time: null }), { timeout: 8000 })
  })
  it('is only read once it is certified', async () => {
    open(coupon({ state: 'certified', may: ['send'] }))
    expect((await screen.findAllByText('10 mm plate, 3G')).length).toBeGreaterThan(0)
    expect(document.querySelector('#row-welder')).toBeNull()
    expect(screen.queryByText('Certify')).toBeNull()
    expect(screen.getByText('E-mail')).toBeDefined()
  })
})

describe('photos', () => {
  it('are refused with a sentence before a byte is sent', () => {
    expect(refusalOf({ name: 'root.jpg', size: 0, type: 'image/jpeg' })).toMatch(/root\.jpg is empty/)
    expect(refusalOf({ name: 'film.mov', size: 5000, type: 'video/quicktime' })).toMatch(/film\.mov is not a photo or a paper/)
    expect(refusalOf({ name: 'big.png', size: 30 * 1024 * 1024, type: 'image/png' })).toMatch(/31 MB; at most 25 MB/)
    expect(refusalOf({ name: 'IMG_1.HEIC', size: 5000, type: '' })).toBeNull()
  })
  it('show a refusal of the server beside those that were kept, and leave when dismissed', async () => {
    const kept: Photo = { id: ids.other, couponId: ID, fileName: 'cap.jpg', mediaType: 'image/jpeg', bytes: 1200, sha256: 'b'.repeat(64), width: 10, height: 10, caption: '', tag: '', takenAt: null, uploadedAt: '2026-11-02T08:00:00Z', uploadedBy: { id: ids.me, name: 'Hal Ostby' }, hasThumbnail: true }
    class Sent {
      upload: { onprogress: unknown } = { onprogress: null }
      status = 0
      responseText = ''
      onload: (() => void) | null = null
      open() {}
      setRequestHeader() {}
      send(form: FormData) {
        const file = form.get('files') as File
        const refused = file.name === 'notes.jpg'
        this.status = refused ? 422 : 201
        this.responseText = JSON.stringify(refused ? problem(422, 'notes.jpg is named .jpg but is PDF inside. Rename it to .pdf, or export it again.').body : { items: [kept] })
        setTimeout(() => act(() => this.onload?.()), 0)
      }
    }
    vi.stubGlobal('XMLHttpRequest', Sent)
    open(coupon())
    const input = await waitFor(() => box('[aria-label="Choose photos or papers"]'))
    fireEvent.change(input, { target: { files: [new File(['x'], 'notes.jpg', { type: 'image/jpeg' }), new File(['y'], 'cap.jpg', { type: 'image/jpeg' })] } })
    expect(await screen.findByText(/notes\.jpg is named \.jpg but is PDF inside/)).toBeDefined()
    expect(await waitFor(() => box('[aria-label="Look at cap.jpg"]'))).toBeDefined()
    fireEvent.click(box('[aria-label="Dismiss notes.jpg"]'))
    expect(screen.queryByText(/is PDF inside/)).toBeNull()
  })
})

describe('two versions of a coupon', () => {
  it('are joined pass by pass and test by test', () => {
    const base = content()
    const mine: CouponContent = { ...base, welder: 'Anya Brook', runSheet: base.runSheet.map((row) => ({ ...row, interpass: quantity(60, 'temperature') })) }
    const theirs: CouponContent = { ...base, witness: 'Sam Ferrow', runSheet: [...base.runSheet, { ...base.runSheet[0]!, id: 'r2', pass: '2' }] }
    const { content: joined, differences } = mergeContents(base, mine, theirs, couponConflict.lists)
    expect(joined).toMatchObject({ welder: 'Anya Brook', witness: 'Sam Ferrow', runSheet: [{ id: 'r1', interpass: { si: 60 } }, { id: 'r2' }] })
    expect(differences.some(({ by }) => by === 'both')).toBe(false)
    expect(differences.map(({ path }) => couponConflict.label(path, joined))).toContain('Run sheet 1: Interpass temperature')
    expect(couponConflict.words('runSheet#r1.interpass', quantity(60, 'temperature'), joined, 'SI')).toBe('60 °C')
  })
  it('are joined where only one of them has non-destructive tests', () => {
    const base = content()
    const mine = { ...base, welder: 'Anya Brook' }
    const theirs: CouponContent = { ...base, ndt: [{ id: 'n1', method: 'RT', accepted: true, reportNumber: null, note: null }] }
    expect(mergeContents(base, mine, theirs, couponConflict.lists).content).toMatchObject({ welder: 'Anya Brook', ndt: [{ id: 'n1' }] })
    expect(couponConflict.label('ndt#n1.accepted', theirs)).toBe('Nondestructive testing RT: Accepted')
  })
  it('names fields by the form’s own paths', () => {
    expect(formPath('content.bends.0.angle')).toBe('bends.0.angle')
    expect(formPath('thickness')).toBe('variables.thickness')
    expect(nextMark('S', ['S1', 'S3', 'F9'])).toBe('S4')
    expect(partsOf('31, 28 34; 40')).toEqual(['31', '28', '34', '40'])
  })
})
