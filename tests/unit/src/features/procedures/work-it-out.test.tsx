// @vitest-environment jsdom
import { fireEvent, waitFor } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import type { Revision } from '@shared/schemas/records.ts'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import { interval } from '@shared/units/convert.ts'
import { routes } from '@/features/procedures/routes.tsx'
import { ids, mockApi, session, showRoutes, type Asked } from '../../support/render.tsx'

const REVISION = '9f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c40'
const at = '2026-12-01T10:00:00.000Z'
const steel = { specification: 'A/SA-516', grade: '70', pNumber: '1', groupNumber: 2 }
const content: ProcedureContent = procedureContentSchema.parse({
  title: 'Groove weld, carbon steel plate',
  variables: {
    standards: [{ standard: 'asme-ix', edition: '2021' }],
    thickness: interval(5, 30, 'length'),
    baseMetals: { a: steel, b: steel },
    processes: [{ id: 'p1', process: 'SMAW', filler: { classification: 'E7018-H4' }, electrical: { current: interval(120, 160, 'current'), voltage: interval(22, 25, 'voltage'), travelSpeed: interval(120, 180, 'travelSpeed') } }],
  },
})
const revision = (change: Partial<Revision> = {}): Revision => ({ id: REVISION, procedureId: ids.other, number: 'WPS-002', revision: 'A', state: 'draft', author: { id: ids.me, name: 'Edda Nilsen' }, createdAt: at, updatedAt: at, decidedAt: null, version: 1, content, coupons: [], signatures: [], deviationReason: null, contentSha256: 'a'.repeat(64), may: ['save'], ...change })

const SLOW = { timeout: 20_000 }
const saved = ({ body, headers }: Asked) => ({ body: revision({ version: Number(headers.get('if-match')?.replaceAll('"', '')) + 1, content: (body as { content: ProcedureContent }).content }) })
const open = async (change: Partial<Revision> = {}) => {
  const asked = mockApi({ [`GET /api/revisions/${REVISION}`]: { body: revision(change) }, [`PUT /api/revisions/${REVISION}`]: saved, 'GET /api/coupons': { body: { items: [], next: null, total: 0 } } })
  showRoutes(routes, { as: session(['procedures.draft']), path: `/revisions/${REVISION}` })
  await waitFor(() => expect(document.querySelector('h1')).not.toBeNull(), SLOW)
  return () => (asked.filter(({ method }) => method === 'PUT').at(-1)?.body as { content: ProcedureContent } | undefined)?.content.variables
}
// By plain selectors: asking a whole sheet for its roles anew at every change takes longer than the test.
const button = (name: RegExp): HTMLButtonElement => {
  const found = [...document.querySelectorAll('button')].find((one) => name.test(one.textContent ?? ''))
  if (!found) throw new Error(`no button is called ${String(name)}`)
  return found
}
const press = (name: RegExp) => waitFor(() => fireEvent.click(button(name)), SLOW)
const box = (label: string): HTMLInputElement => {
  const found = [...document.querySelectorAll('label')].find((one) => one.textContent?.startsWith(label) && one.closest('section[aria-label^="Work it out"]'))
  const input = found && document.getElementById(found.htmlFor)
  if (!(input instanceof HTMLInputElement)) throw new Error(`no box is called ${label}`)
  return input
}

describe('worked out in a draft', { timeout: 90_000 }, () => {
  it('is written into the field, and taken back with Ctrl+Z', async () => {
    const sent = await open()
    await press(/Work it out for Preheat, minimum/)
    fireEvent.change(await waitFor(() => box('CET'), SLOW), { target: { value: '0.36' } })
    await press(/^Use \d+ °C$/)
    const field = () => document.querySelector<HTMLInputElement>('#row-preheat-minimum')?.value
    await waitFor(() => expect(Number(field())).toBeGreaterThan(50), SLOW)
    await waitFor(() => expect(sent()?.preheat.minimum?.si).toBe(Number(field())), SLOW)
    // The panel stays, so that the figures can be looked at again.
    expect(box('CET').value).toBe('0.36')
    fireEvent.keyDown(window, { key: 'z', ctrlKey: true })
    await waitFor(() => expect(field()).toBe(''), SLOW)
    await waitFor(() => expect(sent()?.preheat.minimum).toBeNull(), SLOW)
  })

  it('follows the draft while the panel is open, and writes both ends of heat input', async () => {
    const sent = await open()
    await press(/Work it out for SMAW, Heat input/)
    await waitFor(() => expect(box('Voltage').value).toBe('25'), SLOW)
    const volts = document.querySelector<HTMLInputElement>('#row-processes-0-electrical-voltage-to')
    if (!volts) throw new Error('no volts')
    fireEvent.change(volts, { target: { value: '27' } })
    fireEvent.blur(volts)
    await waitFor(() => expect(box('Voltage').value).toBe('27'), SLOW)
    // 22 × 120 × 60 / 180 = 880 and 27 × 160 × 60 / 120 = 2160 J/mm
    await press(/^Use 0\.88 kJ\/mm to 2\.16 kJ\/mm$/)
    await waitFor(() => expect(sent()?.processes[0]?.electrical.heatInput).toMatchObject({ min: { si: 0.88 }, max: { si: 2.16 } }), SLOW)
  })

  it('has no place in a procedure that is only read', async () => {
    await open({ state: 'approved', may: [] })
    expect([...document.querySelectorAll('button')].some((one) => one.textContent?.startsWith('Work it out'))).toBe(false)
  })
})
