// @vitest-environment jsdom
import { configure, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import type { Use } from '@shared/calculations/beside.ts'
import type { CalculatorRecord } from '@shared/calculations/from-record.ts'
import { weldingVariablesSchema } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { WorkItOut, type WorkItOutProps } from '@/components/work-it-out/WorkItOut.tsx'
import { mockApi, session, show } from '../support/render.tsx'

// What a busy machine may take.
configure({ asyncUtilTimeout: 15_000 })
vi.setConfig({ testTimeout: 60_000 })

const steel = { libraryId: 'us-a516-70', specification: 'A/SA-516', grade: '70', pNumber: '1', groupNumber: 2 }
const record = (change: object = {}, block: object = {}): CalculatorRecord => ({
  variables: weldingVariablesSchema.parse({
    standards: [{ standard: 'asme-ix', edition: '2021' }],
    baseMetals: { a: steel, b: steel },
    thickness: interval(10, 30, 'length'),
    preheat: { minimum: quantity(20, 'temperature') },
    ...change,
    processes: [{ id: 'p1', process: 'SMAW', filler: { classification: 'E7018-H4' }, electrical: { current: interval(120, 160, 'current'), voltage: interval(22, 25, 'voltage'), travelSpeed: interval(120, 180, 'travelSpeed') }, ...block }],
  }),
})
const heat = (id: string, number: string, c: number) => ({ id, kind: 'heat', number, libraryId: 'us-a516-70', grade: 'A516-70', certificate: null, certificateType: null, receivedOn: null, chemistryOf: 'ladle', chemistry: [{ element: 'C', percent: c }, { element: 'Mn', percent: 1.4 }, { element: 'Si', percent: 0.3 }, { element: 'Fe', percent: 97 }], files: 0, updatedAt: '2026-12-01T10:00:00.000Z' })
const heats = [heat('7f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c31', '48213', 0.2), heat('7f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c32', '50077', 0.16)]

const open = async (props: Partial<WorkItOutProps> = {}, list: readonly object[] = []) => {
  mockApi({ 'GET /api/heats': { body: { items: list, next: null, total: list.length } } })
  const onUse = vi.fn<(use: Use, label: string) => void>()
  show(<WorkItOut what="Preheat, minimum" calculators={['preheat-method-b', 'preheat-method-a']} record={record()} blockIndex={0} system="SI" onUse={onUse} {...props} />, { as: session(['heats.read']) })
  const user = userEvent.setup()
  await user.click(screen.getByRole('button', { name: /^Work it out/ }))
  return { user, onUse, panel: screen.getByRole('region', { name: `Work it out: ${props.what ?? 'Preheat, minimum'}` }) }
}
const box = (name: string | RegExp) => screen.getByRole<HTMLInputElement>('textbox', { name })

describe('beside a field', () => {
  it('shows nothing where no calculator belongs', () => {
    show(<WorkItOut what="x" calculators={[]} record={record()} blockIndex={null} system="SI" />)
    expect(screen.queryByRole('button')).toBeNull()
  })

  it('tells of each figure whether it is the draft’s, assumed or missing, and calls nothing wrong that nobody typed', async () => {
    const { panel } = await open()
    expect(box('Thickness of the thicker part').value).toBe('30')
    expect(within(panel).getByText('From the draft: Thickness, upper end')).toBeTruthy()
    expect(within(panel).getByText(/^Assumed: a usual shop/)).toBeTruthy()
    expect(within(panel).getByText('From the draft: Filler metal: its designator promises at most 4 ml/100 g')).toBeTruthy()
    expect(within(panel).getByText('Not in the draft')).toBeTruthy()
    expect(within(panel).getByText('Still wanted: CET.')).toBeTruthy()
    expect(box('CET').getAttribute('aria-invalid')).toBeNull()
    expect(within(panel).queryByRole('button', { name: /^Use/ })).toBeNull()
  })

  it('works out what is missing once it is typed, and writes the figure rounded up', async () => {
    const { user, onUse } = await open()
    await user.type(box('CET'), '0.36')
    await user.click(await screen.findByRole('button', { name: /^Use \d+ °C$/ }))
    const [use, label] = onUse.mock.calls[0] ?? []
    expect(use?.field).toBe('preheat.minimum')
    expect(use?.value).toMatchObject({ unit: '°C' })
    expect(Number((use?.value as { si: number }).si) % 5).toBe(0)
    expect(label).toMatch(/^Preheat, minimum: \d+ °C, preheat by ISO/)
  })

  it('takes the analysis of the heat that somebody chooses', async () => {
    const { user, panel } = await open({}, heats)
    const choice = await within(panel).findByRole('combobox', { name: 'Analysis of metal A' })
    expect(box('CET').value).toBe('')
    await user.selectOptions(choice, heats[0]?.id ?? '')
    // 0.20 + 1.4/10
    await waitFor(() => expect(box('CET').value).toBe('0.34'))
    expect(within(panel).getByText('Analysis of metal A, heat 48213')).toBeTruthy()
  })

  it('takes the only heat of the grade by itself', async () => {
    await open({}, heats.slice(1))
    await waitFor(() => expect(box('CET').value).toBe('0.3'))
  })

  it('works the carbon equivalent out of an analysis that is pasted', async () => {
    const { user, panel } = await open()
    await user.click(within(panel).getByText('Work out the carbon equivalent from an analysis'))
    await user.click(within(panel).getByText(/^Paste from a certificate/))
    await user.click(box('Analysis of the steel, as copied'))
    await user.paste('C 0.18 Mn 1.50 S 0.004 Zz 3')
    await user.click(within(panel).getByRole('button', { name: 'Fill in' }))
    expect(box('CET').value).toBe('0.33')
    expect(within(panel).getByText(/Not used by this formula: S/)).toBeTruthy()
    expect(within(panel).getByText(/^“.*Zz.*” was left out/)).toBeTruthy()
  })

  it('keeps what is typed over the draft, says so, and goes back to the draft’s figures', async () => {
    const { user, panel } = await open()
    await user.clear(box('Thickness of the thicker part'))
    await user.type(box('Thickness of the thicker part'), '1/2 in')
    expect(within(panel).getByText('Typed here; the draft has 30 mm')).toBeTruthy()
    await user.selectOptions(screen.getByRole('combobox', { name: 'Method' }), 'preheat-method-a')
    await user.selectOptions(screen.getByRole('combobox', { name: 'Method' }), 'preheat-method-b')
    expect(box('Thickness of the thicker part').value).toBe('1/2 in')
    await user.click(within(panel).getByRole('button', { name: 'Back to the draft’s figures' }))
    expect(box('Thickness of the thicker part').value).toBe('30')
  })

  it('names the field of a figure that can’t be read and keeps it', async () => {
    const { user, panel } = await open()
    await user.clear(box('Thickness of the thicker part'))
    await user.type(box('Thickness of the thicker part'), 'thick')
    await user.tab()
    expect(await within(panel).findByText(/^Thickness of the thicker part: "thick" is not a length/)).toBeTruthy()
    expect(box('Thickness of the thicker part').value).toBe('thick')
  })

  it('opens the full page with the same figures', async () => {
    const { user } = await open()
    await user.type(box('CET'), '0.36')
    const link = screen.getByRole('link', { name: 'Full page with these figures' })
    expect(link.getAttribute('href')).toMatch(/^\/calculators\/preheat-method-b\?cet=0\.36&t=30&hd=4&q=[\d.]+&ta=20$/)
  })

  it('closes with Esc and gives the cursor back', async () => {
    const { user } = await open()
    await user.click(box('CET'))
    await user.keyboard('{Escape}')
    expect(screen.queryByRole('region')).toBeNull()
    expect(document.activeElement?.textContent).toContain('Work it out')
  })
})

describe('over the ranges of the draft', () => {
  it('offers both ends of heat input while its figures are the draft’s, and one once they are not', async () => {
    const { user, onUse } = await open({ what: 'Heat input', calculators: ['heat-input-meter'] })
    // 22 × 120 × 60 / 180 = 880; 25 × 160 × 60 / 120 = 2000 J/mm
    await user.click(screen.getByRole('button', { name: 'Use 0.88 kJ/mm to 2 kJ/mm' }))
    expect(onUse.mock.calls[0]?.[0]).toMatchObject({ field: 'processes.0.electrical.heatInput', value: { min: { si: 0.88 }, max: { si: 2 } } })
    await user.clear(box('Voltage'))
    await user.type(box('Voltage'), '24')
    await user.click(screen.getByRole('button', { name: 'Use 1.92 kJ/mm as the greatest' }))
    expect(onUse.mock.calls[1]?.[0]).toMatchObject({ field: 'processes.0.electrical.heatInput.max', value: { si: 1.92 } })
  })
})

describe('the shop’s own prices', () => {
  it('are kept on this device from weld to weld', async () => {
    const first = await open({ what: 'cost', calculators: ['cost'] })
    await first.user.type(box('Price of the filler'), '4.20')
    await first.user.type(box('Labour and overhead'), '55')
    document.body.replaceChildren()
    await open({ what: 'cost', calculators: ['cost'] })
    expect(box('Price of the filler').value).toBe('4.20')
    expect(box('Labour and overhead').value).toBe('55')
    expect(screen.getAllByText('Kept on this device').length).toBe(2)
    expect(box('Weld length').value).toBe('')
  })
})
