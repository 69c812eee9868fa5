// @vitest-environment jsdom
import { fireEvent, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import type { Coupon, Revision } from '@shared/schemas/records.ts'
import { couponContentSchema, procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { routes } from '@/features/procedures/routes.tsx'
import { ids, mockApi, problem, session, showRoutes, type Answer, type Asked } from '../../support/render.tsx'

const REVISION = '9f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c10'
const PROCEDURE = '9f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c11'
const at = '2026-12-01T10:00:00.000Z'

const content = (change: Partial<ProcedureContent> = {}): ProcedureContent =>
  procedureContentSchema.parse({
    title: 'Groove weld, carbon steel plate',
    ...change,
    variables: { standards: [{ standard: 'asme-ix', edition: '2021' }], thickness: interval(5, 25, 'length'), preheat: { minimum: quantity(10, 'temperature') }, processes: [{ id: 'p1', process: 'SMAW', maxPassThickness: quantity(4, 'length') }], ...change.variables },
  })
const revision = (given: Partial<Revision> = {}): Revision => ({ id: REVISION, procedureId: PROCEDURE, number: 'WPS-002', revision: 'A', state: 'draft', author: { id: ids.me, name: 'Edda Nilsen' }, createdAt: at, updatedAt: at, decidedAt: null, version: 1, content: content(), coupons: [], signatures: [], deviationReason: null, contentSha256: 'a'.repeat(64), may: ['save', 'discard', 'submit'], ...given })

const COUPON = '9f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c12'
/** A certified 10 mm coupon, which qualifies 1.5 to 20 mm. */
const coupon = (): Coupon => {
  const { variables } = content()
  const base = couponContentSchema.parse({ title: '10 mm plate', variables: { ...variables, thickness: interval(10, undefined, 'length'), processes: [{ ...variables.processes[0], depositThickness: interval(10, undefined, 'length') }] }, runSheet: [] })
  return { id: COUPON, number: 'PQR-001', state: 'certified', revisionId: null, procedureId: null, procedureNumber: null, inspector: { id: ids.other, name: 'Ines' }, version: 3, createdAt: at, updatedAt: at, content: base, signatures: [], contentSha256: 'c'.repeat(64), may: [] }
}

/** What a busy machine may take. */
const SLOW = { timeout: 20_000 }
const saved = ({ body, headers }: Asked) => ({ body: revision({ version: Number(headers.get('if-match')?.replaceAll('"', '')) + 1, content: (body as { content: ProcedureContent }).content }) })
const open = async (answers: Record<string, Answer> = {}) => {
  const asked = mockApi({ [`GET /api/revisions/${REVISION}`]: { body: revision() }, [`PUT /api/revisions/${REVISION}`]: saved, 'GET /api/coupons': { body: { items: [], next: null, total: 0 } }, 'GET /api/procedures': { body: { items: [], next: null, total: 0 } }, ...answers })
  const shown = showRoutes(routes, { as: session(['procedures.draft', 'procedures.submit']), path: `/revisions/${REVISION}` })
  await waitFor(() => find('h1'), { timeout: 20_000 })
  const puts = () => asked.filter(({ method }) => method === 'PUT')
  return { ...shown, asked, puts, sent: () => (puts().at(-1)?.body as { content: ProcedureContent }).content }
}
// By plain selectors: asking a whole sheet for its roles and labels anew at every change takes longer than the test.
const find = <E extends HTMLElement>(css: string): E => {
  const found = document.querySelector<E>(css)
  if (!found) throw new Error(`nothing is ${css}`)
  return found
}
const box = (name: string) => (name === 'Title' ? find<HTMLInputElement>('#scope input[maxlength="160"]') : find<HTMLInputElement>(`input[aria-label="${name}"]`))
const write = (name: string, text: string) => {
  fireEvent.change(box(name), { target: { value: text } })
  fireEvent.blur(box(name))
}
const button = (name: string) => {
  const found = [...document.querySelectorAll('button')].find((one) => one.textContent === name || one.getAttribute('aria-label') === name)
  if (!found) throw new Error(`no button is called ${name}`)
  return found
}
const press = (name: string) => waitFor(() => fireEvent.click(button(name)), { timeout: 20_000 })
const status = () => [...document.querySelectorAll('[role=status]')].map(({ textContent }) => textContent).join(' ')

describe('a draft', { timeout: 90_000 }, () => {
  it('saves itself when typing rests, against the version last read', async () => {
    const { puts, sent } = await open()
    write('Thickness, to', '3/4 in')
    await waitFor(() => expect(puts()).toHaveLength(1), SLOW)
    expect(puts()[0]?.headers.get('if-match')).toBe('"1"')
    expect(sent().variables.thickness?.max).toMatchObject({ si: 19.05, typed: '3/4 in' })
    await waitFor(() => expect(status()).toContain('Saved'), SLOW)
    write('Title', 'Groove weld, plate')
    fireEvent.keyDown(window, { key: 's', ctrlKey: true })
    await waitFor(() => expect(puts()).toHaveLength(2), SLOW)
    expect(puts()[1]?.headers.get('if-match')).toBe('"2"')
  })

  it('keeps what is typed on this device while the server fails, and carries on from it after a crash', async () => {
    const first = await open({ [`PUT /api/revisions/${REVISION}`]: problem(503, 'The server is being looked after.') })
    write('Thickness, to', '18')
    await waitFor(() => expect(status()).toContain('kept on this device'), SLOW)
    expect(box('Thickness, to').value).toBe('18')
    expect(Object.keys(localStorage).some((key) => key.includes(REVISION))).toBe(true)
    const kept = { ...localStorage }
    first.unmount()
    Object.assign(localStorage, kept)
    const second = await open()
    expect(box('Thickness, to').value).toBe('18')
    await waitFor(() => expect(second.puts()).toHaveLength(1), SLOW)
    expect(second.sent().variables.thickness?.max?.si).toBe(18)
    await waitFor(() => expect(Object.keys(localStorage).some((key) => key.includes(REVISION))).toBe(false), SLOW)
  })

  it('names the field that the server refuses, at the field and beside the sheet', async () => {
    await open({ [`PUT /api/revisions/${REVISION}`]: problem(422, 'The thickness is not right.', { errors: [{ field: 'content.variables.thickness', message: 'Thickness: 4000 mm is more than can be welded here.' }] }) })
    write('Thickness, to', '4000')
    await waitFor(() => expect(document.body.textContent).toContain('Thickness: 4000 mm is more than can be welded here.'), SLOW)
    expect(status()).toContain('Not saved')
    expect(box('Thickness, to').value).toBe('4000')
  })

  it('shows both versions when somebody saved first, and saves what was chosen over theirs', async () => {
    const theirs = revision({ version: 7, content: content({ title: 'Their title', variables: { ...content().variables, thickness: interval(5, 12, 'length') } }) })
    let refused = false
    const { sent, puts } = await open({
      [`PUT /api/revisions/${REVISION}`]: (asked) => {
        if (refused) return saved(asked)
        refused = true
        return problem(409, 'Somebody else saved first.', { current: theirs })
      },
    })
    write('Thickness, to', '18')
    const dialog = await screen.findByRole('dialog', undefined, SLOW)
    expect(dialog.textContent).toContain('5–18 mm')
    expect(dialog.textContent).toContain('5–12 mm')
    const save = within(dialog).getByText<HTMLButtonElement>('Save the joined version')
    expect(save.disabled).toBe(true)
    fireEvent.click(within(dialog).getByLabelText(/Yours.*5–18 mm/))
    fireEvent.click(save)
    await waitFor(() => expect(puts()).toHaveLength(2), SLOW)
    expect(puts()[1]?.headers.get('if-match')).toBe('"7"')
    expect(sent()).toMatchObject({ title: 'Their title', variables: { thickness: { max: { si: 18 } } } })
    expect(box('Title').value).toBe('Their title')
  })

  it('adds, moves and removes processes', async () => {
    const { sent } = await open()
    await press('Another process')
    await waitFor(() => fireEvent.change(find('#row-processes-1-process'), { target: { value: 'GTAW' } }), SLOW)
    await press('Move GTAW up')
    await waitFor(() => expect(sent().variables.processes.map(({ process }) => process)).toEqual(['GTAW', 'SMAW']), SLOW)
    await press('Remove GTAW 1')
    await waitFor(() => expect(sent().variables.processes.map(({ process }) => process)).toEqual(['SMAW']), SLOW)
  })

  it('applies a fix from the margin and takes it back with Ctrl+Z', async () => {
    const { sent } = await open({
      [`GET /api/revisions/${REVISION}`]: { body: revision({ content: content({ supportingCoupons: [COUPON] }) }) },
      [`GET /api/coupons/${COUPON}`]: { body: coupon() },
    })
    await press('Set base metal thickness to 20 mm')
    await waitFor(() => expect(box('Thickness, to').value).toBe('20'), SLOW)
    await waitFor(() => expect(sent().variables.thickness?.max?.si).toBe(20), SLOW)
    fireEvent.keyDown(window, { key: 'z', ctrlKey: true })
    await waitFor(() => expect(box('Thickness, to').value).toBe('25'), SLOW)
    await waitFor(() => expect(sent().variables.thickness?.max?.si).toBe(25), SLOW)
  })

  it('saves first and then sends for review, with the version that was stored', async () => {
    const { asked } = await open({ [`POST /api/revisions/${REVISION}/submission`]: { body: revision({ version: 3, state: 'in-review', may: [] }) } })
    write('Title', 'Groove weld, plate')
    await press('Send for review')
    await press('Send WPS-002 rev A for review')
    await waitFor(() => expect(asked.some(({ path }) => path.endsWith('/submission'))).toBe(true), SLOW)
    const order = asked.filter(({ method }) => method !== 'GET').map(({ method, headers }) => `${method} ${headers.get('if-match')}`)
    expect(order).toEqual(['PUT "1"', 'POST "2"'])
    await waitFor(() => expect(document.body.textContent).toContain('In review'), SLOW)
    expect(document.querySelector('#scope input')).toBeNull()
  })
})

describe('a revision that may not be edited', { timeout: 90_000 }, () => {
  it('is the same sheet as text, with its signatures', async () => {
    await open({
      [`GET /api/revisions/${REVISION}`]: {
        body: revision({ state: 'approved', may: ['send', 'revise'], signatures: [{ id: ids.other, person: { id: ids.other, name: 'Sam Tully' }, role: 'supervisor', meaning: 'approved', statement: 'I approve it.', reason: null, contentSha256: 'b'.repeat(64), signedAt: at }] }),
      },
      [`GET /api/procedures/${PROCEDURE}`]: { body: { id: PROCEDURE, number: 'WPS-002', revisions: [] } },
    })
    expect(document.querySelector('main input, input[type=text], textarea, select')).toBeNull()
    expect(document.body.textContent).toContain('5–25 mm')
    expect(document.body.textContent).toContain('I approve it.')
    await press('E-mail')
    const dialog = await screen.findByRole('dialog')
    await userEvent.type(within(dialog).getByLabelText('To'), 'nobody')
    fireEvent.click(within(dialog).getByText('Send'))
    await waitFor(() => expect(dialog.textContent).toMatch(/nobody.*name@example\.com/))
  })
})
