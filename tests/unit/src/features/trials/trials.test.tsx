// @vitest-environment jsdom
import { configure, fireEvent, screen, waitFor, within } from '@testing-library/react'
import { describe, expect, it, vi } from 'vitest'
import type { Machine } from '@shared/schemas/machines.ts'
import type { Bead, BeadContent, Trial } from '@shared/schemas/trials.ts'
import { interval } from '@shared/units/convert.ts'
import '@/features/trials/pages/BeadPage.tsx'
import '@/features/trials/pages/TrialPage.tsx'
import { createRoutes } from '@/routes.tsx'
import { beadOf, measuredTravel, pulseBead, pulseMachine } from '../../../../fixtures/trials.ts'
import { ids, mockApi, problem, session, showRoutes } from '../../support/render.tsx'

// The page is large, and a busy machine slow.
configure({ asyncUtilTimeout: 8000 })

const TRIAL = '00000000-0000-4000-8000-aaaaaaaaaaaa'
const MACHINE = '7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0007'
const machine: Machine = { id: MACHINE, number: 'M-009', version: 1, updatedAt: '2026-11-01T08:00:00Z', content: pulseMachine(), may: [] }
const on = (content: BeadContent): BeadContent => ({ ...content, machineId: MACHINE })
const beads: Bead[] = [
  beadOf(1, on(pulseBead({ feed: 5.5 }, { score: 4, note: 'quiet' }))),
  beadOf(2, on(pulseBead({}, { score: 5, measured: { ...measuredTravel(450), current: interval(104, undefined, 'current') } }))),
  beadOf(3, on(pulseBead({ feed: 6.8 }, { score: 1, faults: [{ fault: 'spatter', severity: 3 }] }))),
]
const trial = (more: Partial<Trial> = {}): Trial => ({ id: TRIAL, number: 'T-004', title: 'ER5356 on 6 mm', goal: null, version: 1, updatedAt: '2026-11-02T08:00:00Z', by: { id: ids.me, name: 'Anya Brook' }, bestScore: 5, machine: 'M-009 Bay 9 pulse', wire: 'ER5356 1.2 mm', metal: 'ASTM B209 6061-T6', procedureId: null, procedureNumber: null, beads, may: ['save', 'record', 'discard', 'promote'], ...more })
const welder = session(['trials.read', 'trials.record', 'machines.read', 'arc.read'], { roles: ['welder'] })
const engineer = session(['trials.read', 'trials.record', 'machines.read', 'procedures.draft', 'arc.read'])
const page = (items: unknown[]) => ({ body: { items, next: null, total: items.length } })
const answers = (record: Trial) => ({
  [`GET /api/trials/${TRIAL}`]: { body: record }, [`GET /api/machines/${MACHINE}`]: { body: machine },
  'GET /api/machines': page([{ id: MACHINE, number: 'M-009', name: 'Bay 9 pulse', location: '', modes: [], calibrationDueOn: null, calibration: 'unknown', processes: [], retired: false, updatedAt: '2026-11-01T08:00:00Z' }]), 'GET /api/arc-recordings': page([]),
})
const box = (name: string) => screen.findByRole<HTMLInputElement>('textbox', { name })
/** Everything that this device keeps of beads. */
const kept = () => Object.keys(localStorage).filter((key) => key.startsWith('sidebend.bead'))

describe('the form between two beads', () => {
  const open = (more: Parameters<typeof mockApi>[0] = {}, path = 'bead', record = trial()) => {
    const seen = mockApi({ ...answers(record), ...more })
    return { seen, ...showRoutes(createRoutes, { as: welder, path: `/dial-in/${TRIAL}/${path}` }) }
  }

  it('is the last bead again: every knob as it was, nothing looked at yet', async () => {
    open()
    await screen.findByRole('heading', { level: 1, name: 'Bead 4' })
    expect((await box('Wire feed')).value).toBe('6.8')
    expect((await box('Frequency')).value).toBe('100')
    expect((await box('Note')).value).toBe('')
    expect(screen.getByText('as on bead 3')).toBeDefined()
    expect(screen.getByRole('button', { name: /^Score 1,/ }).getAttribute('aria-pressed')).toBe('false')
    expect(screen.getByText(/A copy of bead 3, which scored 1 \(spatter, bad\)/)).toBeDefined()
  })

  it('is not saved over a knob whose text is no figure, or below nothing', async () => {
    const { seen } = open()
    const feed = await box('Wire feed')
    await waitFor(() => expect(feed.value).toBe('6.8'))
    for (const [typed, said] of [['abc', /“abc” is no figure/], ['-5', /Wire feed can’t be below nothing/]] as const) {
      fireEvent.change(feed, { target: { value: typed } })
      fireEvent.click(screen.getByRole('button', { name: 'Save bead 4' }))
      expect((await screen.findAllByText(said)).length).toBe(2)
      expect(feed.value).toBe(typed)
    }
    expect(seen.filter(({ method }) => method === 'POST')).toEqual([])
    fireEvent.change(feed, { target: { value: '6.9' } })
    expect(screen.queryByText(/can’t be below nothing/)).toBeNull()
  })

  it('changes one thing by steps of the control, says what to bring along, and dials it on asking', async () => {
    open({}, `bead?copy=${beads[1]?.id}`)
    await waitFor(async () => expect((await box('Wire feed')).value).toBe('6.0'))
    fireEvent.click(screen.getByRole('button', { name: 'Wire feed up' }))
    expect((await box('Wire feed')).value).toBe('6.1')
    expect(screen.getByText('was 6.0 m/min')).toBeDefined()
    expect(screen.getByText('one thing changed')).toBeDefined()
    fireEvent.change(await box('Wire feed'), { target: { value: '8' } })
    fireEvent.click(await screen.findByRole('button', { name: 'Set Frequency to 133 Hz' }))
    expect((await box('Frequency')).value).toBe('133')
    expect(screen.getByText('2 things changed')).toBeDefined()
  })

  it('keeps every key on this device until the bead is sent, and sends it once with an id of its own', async () => {
    const { seen, unmount } = open({ [`POST /api/trials/${TRIAL}/beads`]: ({ body }) => ({ status: 201, body: { ...beadOf(4, (body as { content: BeadContent }).content), id: (body as { id: string }).id } }) })
    fireEvent.change(await box('Note'), { target: { value: 'hum, no ticks' } })
    unmount()
    expect(kept()).toHaveLength(1)
    showRoutes(createRoutes, { as: welder, path: `/dial-in/${TRIAL}/bead` })
    await screen.findByText(/You were writing this bead/)
    expect((await box('Note')).value).toBe('hum, no ticks')
    fireEvent.click(screen.getByRole('button', { name: /^Spatter/ }))
    fireEvent.click(screen.getByRole('button', { name: 'Spatter, a little' }))
    fireEvent.click(screen.getByRole('button', { name: /^Score 4,/ }))
    fireEvent.click(screen.getByRole('button', { name: 'Save bead 4' }))
    await screen.findByRole('heading', { level: 1, name: 'T-004' })
    await waitFor(() => expect(kept()).toEqual([]))
    const [sent, ...again] = seen.filter(({ method }) => method === 'POST')
    expect(again).toEqual([])
    expect(sent?.body).toMatchObject({ id: expect.stringMatching(/^[0-9a-f-]{36}$/) as string, content: { note: 'hum, no ticks', score: 4, faults: [{ fault: 'spatter', severity: 2 }] } })
  })

  it('keeps a bead half written while another is copied and sent', async () => {
    const stored = { [`POST /api/trials/${TRIAL}/beads`]: ({ body }: { body: unknown }) => ({ status: 201, body: { ...beadOf(4, (body as { content: BeadContent }).content), id: (body as { id: string }).id } }) }
    const first = open(stored)
    fireEvent.change(await box('Note'), { target: { value: 'half a sentence' } })
    first.unmount()
    const second = open(stored, `bead?copy=${beads[1]?.id}`)
    expect((await box('Note')).value).toBe('')
    fireEvent.change(await box('Note'), { target: { value: 'the other one' } })
    fireEvent.click(screen.getByRole('button', { name: 'Save bead 4' }))
    await screen.findByRole('heading', { level: 1, name: 'T-004' })
    await waitFor(() => expect(kept()).toHaveLength(1))
    second.unmount()
    open(stored)
    expect((await box('Note')).value).toBe('half a sentence')
    fireEvent.click(screen.getByRole('button', { name: 'Start anew' }))
    expect((await box('Note')).value).toBe('')
    expect(kept()).toEqual([])
  })

  it('waits on this device when the server can’t be reached, says so, and goes when asked', async () => {
    let reachable = false
    const { seen } = open({ [`POST /api/trials/${TRIAL}/beads`]: ({ body }) => (reachable ? { status: 201, body: { ...beadOf(4, (body as { content: BeadContent }).content), id: (body as { id: string }).id } } : problem(503, 'Not now.')) })
    fireEvent.click(await screen.findByRole('button', { name: 'Save bead 4' }))
    await screen.findByText('One bead waits on this device:')
    expect(kept()).toHaveLength(1)
    reachable = true
    fireEvent.click(screen.getByRole('button', { name: 'Try now' }))
    await waitFor(() => expect(kept()).toEqual([]))
    const sent = seen.filter(({ method }) => method === 'POST').map(({ body }) => (body as { id: string }).id)
    expect(new Set(sent).size).toBe(1)
  })

  it('gives a bead that the server refuses back to be mended, with all that was typed', async () => {
    open({ [`POST /api/trials/${TRIAL}/beads`]: problem(422, 'That machine is not in the register. Choose another.') })
    fireEvent.change(await box('Note'), { target: { value: 'kept' } })
    fireEvent.click(screen.getByRole('button', { name: 'Save bead 4' }))
    await screen.findByText(/That machine is not in the register/)
    fireEvent.click(screen.getByRole('button', { name: 'Open it and mend it' }))
    expect((await box('Note')).value).toBe('kept')
  })

  it('holds back what can’t be, with a sentence at the field', async () => {
    const { seen } = open()
    const speed = await screen.findByLabelText('Travel speed, mm/min')
    fireEvent.change(speed, { target: { value: '0' } })
    fireEvent.blur(speed)
    fireEvent.change(await box('Wire feed'), { target: { value: 'fast' } })
    expect(screen.getByText(/“fast” is no figure/)).toBeDefined()
    fireEvent.change(await box('Wire feed'), { target: { value: '90' } })
    expect(screen.getByText(/Off the scale, which runs from 1.0 to 20.0 m\/min/)).toBeDefined()
    fireEvent.click(screen.getByRole('button', { name: 'Save bead 4' }))
    expect((await screen.findAllByText(/Travel speed must be above 0/)).length).toBeGreaterThan(0)
    expect(seen.some(({ method }) => method === 'POST')).toBe(false)
  })

  it('shows both versions when somebody else saved the bead first, and saves mine over theirs only when told to', async () => {
    const versions: string[] = []
    open({
      [`PUT /api/beads/${beads[1]?.id}`]: ({ headers, body }) => {
        versions.push(headers.get('If-Match') ?? '')
        return versions.length === 1 ? problem(409, 'Somebody else saved first.', { current: { ...beads[1], version: 5, content: { ...beads[1]?.content, score: 2 } } }) : { body: { ...beads[1], version: 6, content: (body as { content: BeadContent }).content } }
      },
    }, `bead?edit=${beads[1]?.id}`)
    fireEvent.click(await screen.findByRole('button', { name: /^Score 4,/ }))
    fireEvent.click(screen.getByRole('button', { name: 'Save bead 2' }))
    const both = within(await screen.findByRole('alert', { name: 'Two versions' }))
    expect(both.getByText('theirs 2, yours 4')).toBeDefined()
    fireEvent.click(both.getByRole('button', { name: 'Save mine over it' }))
    await waitFor(() => expect(versions).toEqual(['"1"', '"5"']))
  })

  it('is closed to those who only read', async () => {
    mockApi(answers(trial()))
    showRoutes(createRoutes, { as: session(['trials.read']), path: `/dial-in/${TRIAL}/bead` })
    await screen.findByText(/Engineers, inspectors, supervisors and welders log beads/)
  })
})

describe('the trial', () => {
  const open = (record = trial(), as = engineer, more: Parameters<typeof mockApi>[0] = {}) => {
    const seen = mockApi({ ...answers(record), ...more })
    showRoutes(createRoutes, { as, path: `/dial-in/${TRIAL}` })
    return seen
  }

  it('marks what was changed from each bead to the next, for the eye and for readers', async () => {
    open()
    const table = within(await screen.findByRole('table', { name: /Beads; a setting that differs/ }))
    const [, first, second, third] = table.getAllByRole('row')
    await waitFor(() => expect(within(second as HTMLElement).getByText('6.0')).toBeDefined())
    expect(within(first as HTMLElement).queryByText(/, (up|down)/)).toBeNull()
    expect(within(second as HTMLElement).getAllByText(', up')).toHaveLength(1)
    expect(within(third as HTMLElement).getByText('spatter, bad')).toBeDefined()
  })

  it('compares two beads and draws them over two figures, with a table beside the drawing', async () => {
    open()
    const compared = within(await screen.findByRole('region', { name: 'Before and after' }))
    expect(compared.getByText('Wire per pulse')).toBeDefined()
    fireEvent.change(compared.getByLabelText('After'), { target: { value: '2' } })
    fireEvent.change(compared.getByLabelText('Before'), { target: { value: '1' } })
    expect(await compared.findByText(/^Wire feed$/)).toBeDefined()
    const plot = within(screen.getByRole('region', { name: 'Plot' }))
    expect(plot.getByRole('img', { name: /3 beads, Wire feed, as set, m\/min across/ })).toBeDefined()
    expect(plot.getAllByRole('row', { hidden: true })).toHaveLength(4)
  })

  it('shows the ranges with their reasons before a draft is made, then opens it', async () => {
    const seen = open(trial(), engineer, { [`POST /api/trials/${TRIAL}/promotion`]: { status: 201, body: { id: ids.other } } })
    const [make] = await screen.findAllByRole('button', { name: 'Make it a procedure' })
    fireEvent.click(make as HTMLElement)
    const dialog = within(await screen.findByRole('dialog'))
    expect(dialog.getByText('5.5 to 6.0')).toBeDefined()
    expect(dialog.getByText(/Bead 3 at 6.8 m\/min scored 1 \(spatter, bad\): the range stops short of it/)).toBeDefined()
    fireEvent.change(dialog.getByLabelText('Bead'), { target: { value: beads[2]?.id } })
    expect((await dialog.findByRole('alert')).textContent).toMatch(/Bead 3 scored 1: choose a bead that you would weld again/)
    expect(dialog.getByRole<HTMLButtonElement>('button', { name: 'Create the draft' }).disabled).toBe(true)
    fireEvent.change(dialog.getByLabelText('Bead'), { target: { value: beads[1]?.id } })
    fireEvent.click(dialog.getByRole('button', { name: 'Create the draft' }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'POST')?.body).toMatchObject({ beadId: beads[1]?.id, title: 'ER5356 on 6 mm', standards: [{ standard: 'asme-ix' }], unitSystem: 'SI' }))
  })

  it('takes the figures of a recording over as measured, on asking', async () => {
    const figures = { rows: 9, badRows: 0, samplesPerSecond: 5000, duration: 18, bad: [], gaps: { count: 0, duration: 0 }, alternating: false, arcTime: 17.6, stops: [], stopCount: 0, current: { mean: 103.6, rms: 150, min: 0, max: 360 }, voltage: { mean: 22.4, rms: 22.5, min: 0, max: 30 }, averageInstantaneousPower: 2600, energy: 45000, meterPower: 2320, meterError: -10.8, pulse: { frequency: 100, peakCurrent: 350.2, backgroundCurrent: 60.1, onTime: 1.5, count: 1760 }, said: [] }
    const recording = { id: ids.other, fileName: 'bead 2.csv', bytes: 100, rows: 9, uploadedAt: '2026-11-02T08:00:00Z', by: { id: ids.me, name: 'Anya Brook' }, attachment: { couponId: null, runRowId: null, beadId: beads[1]?.id ?? null, weldLength: null }, attachedTo: 'T-004 bead 2', figures }
    const seen = mockApi({ ...answers(trial()), 'GET /api/arc-recordings': page([recording]), [`PUT /api/beads/${beads[1]?.id}`]: ({ body }) => ({ body: { ...beads[1], version: 2, content: (body as { content: BeadContent }).content } }) })
    showRoutes(createRoutes, { as: engineer, path: `/dial-in/${TRIAL}?bead=2` })
    await screen.findByText(/bead 2.csv says peak 350 A, background 60 A, mean 104 A and 22.4 V/)
    fireEvent.click(screen.getByRole('button', { name: 'Take them over' }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'PUT')?.body).toMatchObject({ content: { measured: { peakCurrent: { si: 350 }, backgroundCurrent: { si: 60 }, current: { min: { si: 104 } }, travelSpeed: { min: { si: 450 } } } } }))
  })

  it('teaches what to do while it is empty, and offers no acts to those who only read', async () => {
    open(trial({ beads: [], bestScore: null, machine: null, wire: null, metal: null, may: [] }), session(['trials.read']))
    await screen.findByText(/Each one after that is a copy with one thing changed/)
    expect(screen.queryByRole('link', { name: /bead/i })).toBeNull()
    expect(screen.queryByRole('button', { name: 'Make it a procedure' })).toBeNull()
  })

  it('says what failed and tries again on asking', async () => {
    vi.spyOn(console, 'error').mockImplementation(() => undefined)
    const seen = open(trial(), engineer, { [`GET /api/trials/${TRIAL}`]: problem(500, 'The database did not answer in time.') })
    await screen.findByText('The database did not answer in time.')
    const before = seen.length
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }))
    await waitFor(() => expect(seen.length).toBeGreaterThan(before))
  })
})
