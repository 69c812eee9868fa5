// @vitest-environment jsdom
import { screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { arcRecordingSchema, type ArcRecording } from '@shared/schemas/arc-data.ts'
import { AttachDialog } from '@/features/arc-data/components/AttachDialog.tsx'
import { beadOf, pulseBead } from '../../../../fixtures/trials.ts'
import { ids, mockApi, show } from '../../support/render.tsx'

const TRIAL = '5f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1d01'
const RECORDING = '5f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1d02'
const level = { mean: 100, rms: 100, min: 90, max: 110 }
const recording = (more: Partial<ArcRecording> = {}): ArcRecording =>
  arcRecordingSchema.parse({
    id: RECORDING, fileName: 'bead.csv', bytes: 100, rows: 3, uploadedAt: '2026-11-01T08:00:00Z', by: { id: ids.me, name: 'Anya Brook' }, attachment: {}, attachedTo: null, sha256: 'x', version: 4, may: ['attach'], heatInput: null,
    figures: { rows: 3, badRows: 0, samplesPerSecond: 1000, duration: 1, arcTime: 1, stops: [], stopCount: 0, current: level, voltage: level, averageInstantaneousPower: 1, energy: 1, meterPower: 1, meterError: 0, pulse: null, said: [] },
    layout: { delimiter: ',', decimal: '.', headerRows: 1, columns: { time: 0, current: 1, voltage: 2 }, timeUnit: 's' },
    plot: { t: [], currentMin: [], currentMax: [], voltageMin: [], voltageMax: [] },
    ...more,
  })
const trialRow = { id: TRIAL, number: 'T-004', title: 'ER5356 on 6 mm', beads: 2, bestScore: null, machine: null, wire: null, metal: null, procedureId: null, procedureNumber: null, by: { id: ids.me, name: 'Anya Brook' }, updatedAt: '2026-11-02T08:00:00Z' }
const beads = [beadOf(1, pulseBead()), beadOf(2, pulseBead({}, { score: 4 }))]
const open = (given: ArcRecording) =>
  mockApi({
    'GET /api/trials': { body: { items: [trialRow], next: null, total: 1 } },
    [`GET /api/trials/${TRIAL}`]: { body: { ...trialRow, goal: null, version: 1, beads, may: [] } },
    [`PUT /api/arc-recordings/${RECORDING}/attachment`]: { body: { ...given, attachedTo: 'T-004 bead 2' } },
  })

describe('attaching a recording', () => {
  it('goes to a bead of a trial, and to none until the bead is chosen', async () => {
    const given = recording()
    const seen = open(given)
    const onClose = vi.fn()
    show(<AttachDialog recording={given} onClose={onClose} />)
    await userEvent.selectOptions(await screen.findByRole('combobox', { name: 'What was welded' }), 'A trial bead')
    expect(screen.queryByRole('combobox', { name: /^Coupon/ })).toBeNull()
    await userEvent.type(screen.getByRole('combobox', { name: /^Trial/ }), 'T-004')
    await userEvent.click(await screen.findByRole('option', { name: /T-004/ }))
    const save = () => screen.getByRole<HTMLButtonElement>('button', { name: 'Save' })
    await waitFor(() => expect(screen.getByRole('combobox', { name: /^Bead/ }).children).toHaveLength(3))
    expect(save().disabled).toBe(true)
    await userEvent.selectOptions(screen.getByRole('combobox', { name: /^Bead/ }), 'Bead 2, score 4')
    await userEvent.click(save())
    await waitFor(() => expect(onClose).toHaveBeenCalled())
    expect(seen.find(({ method }) => method === 'PUT')?.body).toEqual({ couponId: null, runRowId: null, beadId: beads[1]?.id, weldLength: null })
  })
  it('stays on its bead when only the length is given', async () => {
    const given = recording({ attachment: { couponId: null, runRowId: null, beadId: beads[0]?.id ?? null, weldLength: null }, attachedTo: 'T-004 bead 1' })
    const seen = open(given)
    show(<AttachDialog recording={given} onClose={() => undefined} />)
    await screen.findByText(/It is attached to T-004 bead 1/)
    await userEvent.type(screen.getByRole('textbox', { name: /Length welded meanwhile/ }), '120')
    await userEvent.click(screen.getByRole('button', { name: 'Save' }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'PUT')?.body).toEqual({ couponId: null, runRowId: null, beadId: beads[0]?.id, weldLength: 120 }))
  })
})
