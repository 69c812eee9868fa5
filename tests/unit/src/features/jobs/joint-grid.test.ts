import { describe, expect, it } from 'vitest'
import type { Job } from '@shared/schemas/records.ts'
import { addJoint, JOINT_COLUMNS, nextNumber, rowsOf, toSave, writeCell, type JointRow } from '@/features/jobs/joint-grid.ts'

const column = (id: string) => {
  const found = JOINT_COLUMNS.find((one) => one.id === id)
  if (!found) throw new Error(id)
  return found
}
const row: JointRow = { key: 'k', id: null, number: 'J7', mark: null, metalA: 'A36', metalB: 'A36', process: 'SMAW', weld: 'groove', product: 'plate', thickness: null, diameter: null, position: '3G', length: null, count: 1, revisionId: null, procedureNumber: null }

describe('joints of a job', () => {
  it('number on from the last, past those that are taken', () => {
    expect(nextNumber([{ number: 'J7' }])).toBe('J8')
    expect(nextNumber([{ number: 'J8' }, { number: 'J7' }])).toBe('J9')
    expect(nextNumber([{ number: 'nozzle' }])).toBe('J2')
    expect(nextNumber([])).toBe('J1')
  })
  it('take metals and process from the one before, but no size and no procedure', () => {
    const [, next] = addJoint([{ ...row, revisionId: 'r', count: 4 }], 'k2')
    expect(next).toMatchObject({ key: 'k2', id: null, number: 'J8', metalA: 'A36', process: 'SMAW', position: '3G', thickness: null, count: 1, revisionId: null })
  })
  it('read their cells, or say what is wrong', () => {
    expect(writeCell(row, column('thickness'), '1/2 in', 'SI')).toMatchObject({ ok: true, row: { thickness: { min: { si: 12.7 } } } })
    const wrong = writeCell(row, column('thickness'), 'thick', 'SI')
    expect(wrong.ok ? '' : wrong.message).toMatch(/^Joint J7, thickness: /)
    expect(writeCell(row, column('count'), '0', 'SI').ok).toBe(false)
    expect(writeCell(row, column('count'), '2.5', 'SI').ok).toBe(false)
    expect(writeCell(row, column('count'), '12', 'SI')).toMatchObject({ row: { count: 12 } })
    expect(writeCell(row, column('number'), ' ', 'SI').ok).toBe(false)
    expect(writeCell(row, column('mark'), 'x'.repeat(81), 'SI').ok).toBe(false)
    expect(writeCell(row, column('process'), '', 'SI')).toMatchObject({ row: { process: null } })
  })
  it('are saved with their ids, new ones without', () => {
    const { key: _key, ...joint } = row
    const job = { title: 'Tank', customer: '', code: '', toughnessRequired: false, notes: '', joints: [{ ...joint, id: 'known' }] } as unknown as Job
    const saved = toSave(job, addJoint(rowsOf(job), 'k2'))
    expect(saved.joints?.map((one) => one.id)).toEqual(['known', undefined])
    expect(saved.joints?.[1]).not.toHaveProperty('key')
    expect(saved.joints?.[1]).not.toHaveProperty('procedureNumber')
  })
})
