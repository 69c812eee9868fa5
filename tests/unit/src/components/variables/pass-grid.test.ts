import { describe, expect, it } from 'vitest'
import { passSchema, type Pass } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { addPass, caretOf, cellText, moveFrom, nextPassNumber, PASS_COLUMNS, pasteCells, writeCell } from '@/components/variables/pass-grid.ts'

const pass = (given: Partial<Pass> = {}): Pass => passSchema.parse({ number: '1', layer: 'root', ...given })
const column = (id: string) => {
  const found = PASS_COLUMNS.find((one) => one.id === id)
  if (!found) throw new Error(`no column ${id}`)
  return found
}
const edge = { atStart: true, atEnd: true }
const inside = { atStart: false, atEnd: false }

describe('cells', () => {
  it('show the figure without the unit of the head, in the system of the reader', () => {
    expect(cellText(pass({ current: interval(90, 120, 'current') }), column('current'), 'SI')).toBe('90–120')
    expect(cellText(pass({ fillerDiameter: quantity(3.2, 'length') }), column('fillerDiameter'), 'US')).toBe('0.126')
    expect(cellText(pass(), column('layer'), 'SI')).toBe('Root')
    expect(cellText(pass(), column('voltage'), 'SI')).toBe('')
  })
  it('read what people write, and say what is wrong with the rest', () => {
    const read = (id: string, text: string) => writeCell(pass(), column(id), text, 'SI')
    expect(read('current', '90-120')).toMatchObject({ ok: true, pass: { current: { min: { si: 90 }, max: { si: 120 } } } })
    expect(read('fillerDiameter', '.035')).toMatchObject({ ok: true, pass: { fillerDiameter: { si: 0.889, unit: 'in' } } })
    expect(read('layer', 'cap')).toMatchObject({ ok: true, pass: { layer: 'cap' } })
    expect(read('current', '')).toMatchObject({ ok: true, pass: { current: null } })
    expect(read('current', '24 V')).toEqual({ ok: false, message: expect.stringMatching(/^Pass 1, amps: .*voltage/) as string })
    expect(read('voltage', 'all')).toMatchObject({ ok: false })
    expect(read('number', '')).toMatchObject({ ok: false })
  })
  it('read again what they show', () => {
    const full = pass({ fillerDiameter: quantity(3.2, 'length'), current: interval(90, 120, 'current'), voltage: interval(22, null, 'voltage'), travelSpeed: interval(null, 300, 'travelSpeed') })
    for (const one of PASS_COLUMNS) {
      const reading = writeCell(pass(), one, cellText(full, one, 'SI'), 'SI')
      expect(reading.ok && cellText(reading.pass, one, 'SI')).toBe(cellText(full, one, 'SI'))
    }
  })
})

describe('rows', () => {
  it('are numbered on from the last', () => {
    expect(nextPassNumber([])).toBe('1')
    expect(nextPassNumber(['1', '2-4'])).toBe('5')
    expect(nextPassNumber(['cap'])).toBe('2')
    expect(addPass([pass({ fillerDiameter: quantity(3.2, 'length') })])[1]).toMatchObject({ number: '2', layer: 'fill', fillerDiameter: { si: 3.2 } })
  })
  it('are filled from a spreadsheet, with a sentence for each cell that could not be read', () => {
    const { passes, problems } = pasteCells([pass()], 0, 3, '90-110\t22-24\r\n110-130\tmany\r\n', 'SI')
    expect(passes).toHaveLength(2)
    expect(passes[1]).toMatchObject({ number: '2', current: { min: { si: 110 } }, voltage: null })
    expect(problems).toHaveLength(1)
    expect(problems[0]).toContain('Pass 2, volts')
  })
})

describe('moving', () => {
  it('leaves a cell by its edges, and adds a row after the last', () => {
    expect(moveFrom('ArrowRight', 0, 0, 2, edge)).toEqual({ row: 0, column: 1 })
    expect(moveFrom('ArrowRight', 0, 0, 2, inside)).toBeNull()
    expect(moveFrom('ArrowLeft', 0, 0, 2, edge)).toBeNull()
    expect(moveFrom('ArrowDown', 1, 0, 2, edge)).toBeNull()
    expect(moveFrom('Enter', 0, 3, 2, inside)).toEqual({ row: 1, column: 3 })
    expect(moveFrom('Enter', 1, 3, 2, inside)).toEqual({ row: 2, column: 3, add: true })
    expect(moveFrom('x', 0, 0, 2, edge)).toBeNull()
  })
  it('takes a cell that is selected whole for one at both edges', () => {
    expect(caretOf({ selectionStart: 0, selectionEnd: 3, value: '3.2' })).toEqual({ atStart: true, atEnd: true })
    expect(caretOf({ selectionStart: 3, selectionEnd: 3, value: '3.2' })).toEqual({ atStart: false, atEnd: true })
    expect(caretOf({ selectionStart: 1, selectionEnd: 1, value: '3.2' })).toEqual({ atStart: false, atEnd: false })
  })
})
