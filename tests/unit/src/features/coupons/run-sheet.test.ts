import { describe, expect, it } from 'vitest'
import { processBlockSchema, runRowSchema, type RunRow } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { addRow, cellText, copyLastRow, runColumns, writeCell, writePass } from '@/features/coupons/run-grid.ts'

const row = (given: Partial<RunRow> = {}): RunRow => runRowSchema.parse({ id: 'r1', processId: 'p1', pass: '1', layer: 'root', ...given })
const block = (given: object) => processBlockSchema.parse({ id: 'p1', ...given })
const columnOf = (id: string) => {
  const found = runColumns([block({ process: 'GMAW', electrical: { waveformControlled: true } })], []).find((one) => one.id === id)
  if (!found) throw new Error(id)
  return found
}

describe('run sheet cells', () => {
  it('reads figures, ranges and other units, and keeps them as typed', () => {
    const amps = writeCell(row(), columnOf('current'), '148-152', 'SI')
    expect(amps).toMatchObject({ ok: true, row: { current: { min: { si: 148 }, max: { si: 152 } } } })
    const length = writeCell(row(), columnOf('length'), '12 in', 'SI')
    expect(length.ok && length.row.length).toMatchObject({ si: 304.8, unit: 'in', typed: '12 in' })
    const feed = writeCell(row(), columnOf('wireFeed'), '335 in/min', 'SI')
    expect(feed.ok && feed.row.wireFeed?.min?.si).toBeCloseTo(8.509, 3)
    expect(writeCell(row({ length: quantity(300, 'length') }), columnOf('length'), ' ', 'SI')).toMatchObject({ ok: true, row: { length: null } })
  })
  it('says what is wrong, naming pass and cell, and changes nothing', () => {
    const wrong = writeCell(row({ pass: '3' }), columnOf('voltage'), 'twenty', 'SI')
    expect(wrong.ok ? '' : wrong.message).toMatch(/^Pass 3, volts: "twenty"/)
    const volts = writeCell(row(), columnOf('current'), '180 V', 'SI')
    expect(volts.ok ? '' : volts.message).toContain('is a voltage')
    expect(writeCell(row(), columnOf('current'), '190-180', 'SI').ok).toBe(false)
    expect(writePass(row(), '').ok).toBe(false)
  })
  it('shows a figure without the unit of the column, and another unit with it', () => {
    expect(cellText(row({ current: interval(150, undefined, 'current') }), columnOf('current'), 'SI')).toBe('150')
    expect(cellText(row({ length: quantity(12, 'length', 'in') }), columnOf('length'), 'SI')).toBe('304.8')
    expect(cellText(row(), columnOf('current'), 'SI')).toBe('')
  })
  it('offers wire feed for wire alone, and energy where the waveform is controlled; what is filled stays', () => {
    const ids = (blocks: object[], rows: RunRow[] = []) => runColumns(blocks.map(block), rows).map(({ id }) => id)
    expect(ids([{ process: 'SMAW' }])).not.toContain('wireFeed')
    expect(ids([{ process: 'SMAW' }], [row({ wireFeed: interval(8, 8, 'wireFeed') })])).toContain('wireFeed')
    expect(ids([{ process: 'GMAW' }])).toContain('wireFeed')
    expect(ids([{ process: 'GMAW' }])).not.toContain('instantaneousEnergy')
    expect(ids([{ process: 'GMAW', electrical: { waveformControlled: true } }])).toContain('instantaneousEnergy')
  })
})

describe('run sheet rows', () => {
  it('number on; a root is followed by fill', () => {
    const rows = addRow([row({ pass: '2-4', layer: 'root', fillerDiameter: quantity(3.2, 'length') })], [block({ process: 'SMAW' })], 'r2')
    expect(rows[1]).toMatchObject({ id: 'r2', processId: 'p1', pass: '5', layer: 'fill', fillerDiameter: { si: 3.2 }, current: null })
  })
  it('copy the last row, but never what has to be read anew', () => {
    const last = row({ pass: '2', current: interval(150, 150, 'current'), length: quantity(300, 'length'), arcTime: quantity(38, 'duration'), interpass: quantity(55, 'temperature'), note: 'restart' })
    const [, copy] = copyLastRow([last], 'r9')
    expect(copy).toMatchObject({ id: 'r9', pass: '3', current: { min: { si: 150 } }, length: { si: 300 }, arcTime: null, interpass: null, note: null })
    expect(copyLastRow([], 'r9')).toEqual([])
  })
})
