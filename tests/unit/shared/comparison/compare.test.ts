import { describe, expect, it, test } from 'vitest'
import { compareContent } from '../../../../shared/comparison/compare.ts'
import { FIELDS, fieldPattern } from '../../../../shared/comparison/fields.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent } from '../../../../shared/schemas/welding.ts'
import { interval, quantity } from '../../../../shared/units/convert.ts'

const blocks = (...processes: Record<string, unknown>[]) => processes
const procedure = (variables: Record<string, unknown> = {}, rest: Record<string, unknown> = {}): ProcedureContent =>
  procedureContentSchema.parse({ title: 'Groove weld', ...rest, variables: { standards: [{ standard: 'asme-ix', edition: '2023' }], thickness: interval(5, 20, 'length'), processes: blocks({ id: 'a', process: 'GTAW', passes: [{ number: '1', layer: 'root' }] }, { id: 'b', process: 'SMAW', filler: { fNumber: '4' } }), ...variables } })
const coupon = (rest: Record<string, unknown> = {}): CouponContent => couponContentSchema.parse({ title: 'Coupon', variables: procedure().variables, runSheet: [{ id: 'r', processId: 'a', pass: '1' }], tension: [{ id: 't', specimen: 'T1' }], bends: [{ id: 'b', specimen: 'B1', kind: 'side' }], macros: [{ id: 'm', specimen: 'M1' }], toughness: [{ id: 'c', place: 'weld' }], hardness: [{ id: 'h', scale: 'HV10', place: 'weld', values: [200] }], ndt: [{ id: 'n', method: 'RT' }], ...rest })

describe('two procedures', () => {
  it('alike have no change', () => {
    expect(compareContent(procedure(), procedure())).toEqual([])
  })
  it('name each field that differs, in the document\'s order', () => {
    const after = procedure({ thickness: interval(5, 25, 'length'), toughnessRequired: true, processes: blocks({ id: 'a', process: 'GTAW', passes: [{ number: '1', layer: 'root', current: interval(90, 120, 'current') }] }, { id: 'b', process: 'SMAW', filler: { fNumber: '3' } }) }, { title: 'Groove weld, plate', notes: 'See sketch.' })
    expect(compareContent(procedure(), after)).toEqual([
      { field: 'title', label: 'Title', before: 'Groove weld', after: 'Groove weld, plate' },
      { field: 'toughnessRequired', label: 'Toughness required', before: null, after: 'yes' },
      { field: 'thickness', label: 'Base metal thickness', before: '5–20 mm', after: '5–25 mm' },
      { field: 'processes.0.passes.0.current', label: 'GTAW pass 1: Current', before: null, after: '90–120 A' },
      { field: 'processes.1.filler.fNumber', label: 'SMAW: F-Number', before: '4', after: '3' },
      { field: 'notes', label: 'Notes', before: null, after: 'See sketch.' },
    ])
  })
  it('match process blocks by id, whatever their place', () => {
    const after = procedure({ processes: blocks({ id: 'b', process: 'SMAW', filler: { fNumber: '4' } }, { id: 'a', process: 'GTAW', passes: [{ number: '1', layer: 'root' }] }) })
    expect(compareContent(procedure(), after)).toEqual([{ field: 'processes', label: 'Processes, order', before: 'GTAW, SMAW', after: 'SMAW, GTAW' }])
  })
  it('tell what a removed block held and what a new one holds', () => {
    const after = procedure({ processes: blocks({ id: 'a', process: 'GTAW', passes: [{ number: '1', layer: 'root' }] }, { id: 'c', process: 'FCAW' }) })
    const changes = compareContent(procedure(), after)
    expect(changes).toContainEqual({ field: 'processes.1.process', label: 'FCAW: Process', before: null, after: 'FCAW' })
    expect(changes).toContainEqual({ field: 'processes.1.filler.fNumber', label: 'SMAW: F-Number', before: '4', after: null })
  })
  it('match passes by number', () => {
    const passes = (...numbers: string[]) => procedure({ processes: blocks({ id: 'a', process: 'GTAW', passes: numbers.map((number) => ({ number, layer: 'fill' })) }) })
    const labels = compareContent(passes('1', '2', '3'), passes('1', '3', '4')).map(({ label }) => label)
    expect(labels).toEqual(['GTAW pass 4: Pass number', 'GTAW pass 4: Layer', 'GTAW pass 2: Pass number', 'GTAW pass 2: Layer'])
  })
  it('see no change where the figure is only written in other units', () => {
    const [mm, inch] = [procedure({ thickness: interval(12.7, undefined, 'length') }), procedure({ thickness: interval(0.5, undefined, 'length', 'in') })]
    expect(compareContent(mm, inch)).toEqual([])
  })
  it('show a change that rounding would hide', () => {
    const [one, other] = [procedure({ thickness: interval(12.701, undefined, 'length') }), procedure({ thickness: interval(12.702, undefined, 'length') })]
    expect(compareContent(one, other)[0]).toMatchObject({ before: '12.701 mm', after: '12.702 mm' })
    expect(compareContent(one, other, 'US')[0]).toMatchObject({ before: '12.701 mm', after: '12.702 mm' })
  })
  it('take nothing given and an empty interval as one', () => {
    expect(compareContent(procedure({ thickness: null }), procedure({ thickness: interval(null, null, 'length') }))).toEqual([])
  })
})

/** A value that fits a field, other than an empty one. */
function sample(kind: string, path: string): unknown {
  const known: Record<string, unknown> = { unitSystem: 'US', product: 'pipe', 'joint.weld': 'fillet', 'joint.type': 'tee', 'joint.penetration': 'partial' }
  if (path in known) return known[path]
  if (kind === 'quantity') return quantity(7, 'length')
  if (kind === 'interval') return interval(7, 8, 'length')
  if (kind === 'quantities') return [quantity(7, 'length')]
  if (kind === 'boolean') return path.endsWith('.added') ? false : true
  if (kind === 'number') return 7
  if (kind === 'numbers') return [7]
  if (kind === 'gas') return [{ gas: 'He', percent: 100 }]
  if (kind === 'positions') return ['6G']
  if (kind === 'ids') return ['0b0e7c1e-5f0e-4c1a-9d55-5d2a1c1f0001']
  if (kind === 'standards') return [{ standard: 'aws-d1-1', edition: '2020', level: null }]
  if (kind === 'panel') return [{ control: 'Trim', hint: null, value: '7', unit: '', scaleMin: null, scaleMax: null, min: null, max: null }]
  if (kind === 'openings') return [{ size: quantity(7, 'length'), corner: false, fromInternalFlaw: null }]
  return 'another'
}
function withValue(content: Record<string, unknown>, path: string, value: unknown): Record<string, unknown> {
  const copy = structuredClone(content)
  const keys = path.replaceAll('*', '0').split('.')
  let place: Record<string, unknown> = keys[0] !== undefined && !(keys[0] in copy) ? (copy.variables as Record<string, unknown>) : copy
  keys.slice(0, -1).forEach((key) => {
    place[key] ??= {}
    place = place[key] as Record<string, unknown>
  })
  place[keys.at(-1) ?? ''] = value
  return copy
}

describe('no field is forgotten', () => {
  const pointers = /\.libraryId$/
  test.each(FIELDS.filter(({ path }) => !pointers.test(path)).map(({ path, kind }) => [path, kind] as const))('%s', (path, kind) => {
    const base = path in procedure() ? procedure() : coupon()
    const changed = withValue(base, path, sample(kind, path)) as unknown as CouponContent
    const changes = compareContent(base as CouponContent, changed, 'SI')
    const patterns = new Set(changes.map(({ field }) => fieldPattern(field)))
    expect(patterns).toContain(path)
    if (!/\.number$/.test(path)) expect(patterns.size).toBe(1)
  })
  it('but a pointer to the library is not compared', () => {
    expect(compareContent(procedure(), procedure({ baseMetals: { a: { libraryId: 'us-a36' } } }))).toEqual([])
  })
})
