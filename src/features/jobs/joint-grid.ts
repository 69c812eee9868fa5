/** The joints of a job as cells that are typed and moved in. Pure. */
import type { Job, JobJoint } from '@shared/schemas/records.ts'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import { POSITIONS, PROCESSES } from '@shared/schemas/welding.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import type { Option } from '@/components/fields/text.tsx'
import { intervalText, readIntervalCell } from '@/components/variables/pass-grid.ts'

/** A joint under somebody's hands: without an id until it has been saved once. */
export interface JointRow extends Omit<JobJoint, 'id'> {
  /** Tells rows apart on the page. */
  key: string
  id: string | null
}

interface Common {
  id: keyof JobJoint
  label: string
  /** Share of the row's width at the desk. */
  width: string
}
export type JointColumn = Common & ({ kind: 'text'; max: number } | { kind: 'choice'; options: readonly Option[]; empty?: string } | { kind: 'interval'; dimension: Dimension } | { kind: 'count' })

const same = (values: readonly string[]): readonly Option[] => values.map((value) => ({ value, label: value }))

export const JOINT_COLUMNS: readonly JointColumn[] = [
  { id: 'number', label: 'Joint', kind: 'text', max: 20, width: '4.5rem' },
  { id: 'mark', label: 'Mark', kind: 'text', max: 80, width: 'minmax(8rem,2fr)' },
  { id: 'metalA', label: 'Metal', kind: 'text', max: 80, width: 'minmax(5rem,1fr)' },
  { id: 'metalB', label: 'To metal', kind: 'text', max: 80, width: 'minmax(5rem,1fr)' },
  { id: 'process', label: 'Process', kind: 'choice', options: same(PROCESSES), empty: 'Any', width: '5.75rem' },
  { id: 'weld', label: 'Weld', kind: 'choice', options: [{ value: 'groove', label: 'Groove' }, { value: 'fillet', label: 'Fillet' }], width: '5.5rem' },
  { id: 'product', label: 'Product', kind: 'choice', options: [{ value: 'plate', label: 'Plate' }, { value: 'pipe', label: 'Pipe' }], width: '5rem' },
  { id: 'thickness', label: 'Thickness', kind: 'interval', dimension: 'length', width: '5rem' },
  { id: 'diameter', label: 'Diameter', kind: 'interval', dimension: 'length', width: '5rem' },
  { id: 'position', label: 'Position', kind: 'choice', options: same(POSITIONS), empty: 'Any', width: '5rem' },
  { id: 'count', label: 'Count', kind: 'count', width: '3.75rem' },
]
export const MAX_JOINTS = 500

export const rowsOf = (job: Job): JointRow[] => job.joints.map((joint) => ({ ...joint, key: joint.id }))

/** The number after the last: J8 after J7; where it can't be told, the count plus one. */
export function nextNumber(rows: readonly Pick<JointRow, 'number'>[]): string {
  const last = rows.at(-1)?.number ?? ''
  const [, head, digits] = /^(.*?)(\d+)$/.exec(last) ?? []
  const taken = new Set(rows.map(({ number }) => number))
  let next = digits === undefined ? rows.length + 1 : Number(digits) + 1
  const name = () => `${digits === undefined ? 'J' : (head ?? '')}${next}`
  while (taken.has(name())) next += 1
  return name()
}

/** A further joint: of the same metals, process and kind as the one before, not yet assigned. */
export function addJoint(rows: readonly JointRow[], key: string): JointRow[] {
  const last = rows.at(-1)
  const fresh: JointRow = { key, id: null, number: nextNumber(rows), mark: null, metalA: last?.metalA ?? null, metalB: last?.metalB ?? null, process: last?.process ?? null, weld: last?.weld ?? 'groove', product: last?.product ?? 'plate', thickness: null, diameter: null, position: last?.position ?? null, length: null, count: 1, revisionId: null, procedureNumber: null }
  return [...rows, fresh]
}

export function cellText(row: JointRow, column: JointColumn, system: UnitSystem): string {
  const value = row[column.id]
  if (column.kind === 'interval') return intervalText(row[column.id as 'thickness' | 'diameter'], column.dimension, system)
  return typeof value === 'string' || typeof value === 'number' ? String(value) : ''
}

/** A joint with one cell typed anew, or what is wrong with the text. */
export function writeCell(row: JointRow, column: JointColumn, text: string, system: UnitSystem): { ok: true; row: JointRow } | { ok: false; message: string } {
  const typed = text.trim()
  const put = (value: unknown): { ok: true; row: JointRow } => ({ ok: true, row: { ...row, [column.id]: value } })
  switch (column.kind) {
    case 'text':
      if (typed.length > column.max) return { ok: false, message: `${column.label}: at most ${column.max} characters; ${typed.length} are written.` }
      if (column.id === 'number') return typed === '' ? { ok: false, message: 'Give the joint a number, e.g. J7.' } : put(typed)
      return put(typed === '' ? null : typed)
    case 'choice':
      return put(typed === '' ? null : typed)
    case 'interval': {
      const reading = readIntervalCell(typed, column.dimension, `Joint ${row.number}, ${column.label.toLowerCase()}: `, system)
      return reading.ok ? put(reading.value) : reading
    }
    case 'count': {
      const count = Number(typed)
      return Number.isInteger(count) && count >= 1 && count <= 100_000 ? put(count) : { ok: false, message: `Joint ${row.number}: "${typed}" is not a count from 1 to 100 000.` }
    }
  }
}

type WriteJob = BodyOf<'saveJob'>

/** The job as it is saved with these joints. */
export const toSave = ({ title, customer, code, toughnessRequired, notes }: Pick<Job, 'title' | 'customer' | 'code' | 'toughnessRequired' | 'notes'>, rows: readonly JointRow[]): WriteJob => ({
  title, customer, code, toughnessRequired, notes,
  joints: rows.map(({ key: _key, id, procedureNumber: _number, ...joint }) => ({ ...joint, ...(id === null ? {} : { id }) })),
})
