import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { couponFromProcedure } from '../../../../shared/records/coupon-from-procedure.ts'
import { COUPON_MOVES, isOpen, mayMove, openStateOf } from '../../../../shared/records/coupon-states.ts'
import { revisionLetter } from '../../../../shared/records/revision-letters.ts'
import { statementOf } from '../../../../shared/records/statements.ts'
import { COUPON_STATES } from '../../../../shared/schemas/records.ts'
import { couponContentSchema, procedureContentSchema } from '../../../../shared/schemas/welding.ts'
import { interval, quantity } from '../../../../shared/units/convert.ts'

const procedure = procedureContentSchema.parse({
  title: 'Groove weld',
  variables: {
    standards: [{ standard: 'asme-ix', edition: '2023' }],
    thickness: interval(5, 20, 'length'),
    preheat: { minimum: quantity(10, 'temperature'), method: 'torch' },
    joint: { groove: 'single-v', includedAngle: interval(60, 70, 'angle') },
    processes: [{
      id: 'p1', process: 'SMAW', positions: ['1G', '3G'], progression: 'up', passes: [{ number: '1' }],
      filler: { classification: 'E7018', fNumber: '4', lot: 'L1', diameters: [quantity(3.2, 'length'), quantity(4, 'length')] },
      electrical: { currentType: 'DCEP', current: interval(90, 140, 'current') },
    }],
  },
})

describe('a coupon opened against a procedure', () => {
  const coupon = couponFromProcedure(procedure, 'WPS-001')
  const block = coupon.variables.processes[0]

  it('keeps what the procedure names', () => {
    expect(block?.process).toBe('SMAW')
    expect(block?.filler.classification).toBe('E7018')
    expect(block?.electrical.currentType).toBe('DCEP')
    expect(block?.progression).toBe('up')
    expect(coupon.variables.joint.groove).toBe('single-v')
    expect(coupon.variables.preheat.method).toBe('torch')
  })

  it('leaves open what has to be measured or chosen', () => {
    expect(coupon.variables.thickness).toBeNull()
    expect(coupon.variables.preheat.minimum).toBeNull()
    expect(coupon.variables.joint.includedAngle).toBeNull()
    expect(block?.electrical.current).toBeNull()
    expect(block?.positions).toEqual([])
    expect(block?.filler.diameters).toEqual([])
    expect(block?.filler.lot).toBeNull()
    expect(block?.passes).toEqual([])
  })

  it('is a coupon that the schema takes unchanged', () => {
    expect(couponContentSchema.parse(coupon)).toEqual(coupon)
  })
})

describe('where a coupon stands', () => {
  const empty = { runSheet: [], tension: [], bends: [], macros: [], toughness: [], hardness: [] }
  const row = couponContentSchema.shape.runSheet.unwrap().element.parse({ id: 'r', processId: 'p', pass: '1' })
  const bend = couponContentSchema.shape.bends.unwrap().element.parse({ id: 'b', specimen: 'B1', kind: 'side' })

  it('follows what is recorded', () => {
    expect(openStateOf(empty)).toBe('planned')
    expect(openStateOf({ ...empty, runSheet: [row] })).toBe('welding')
    expect(openStateOf({ ...empty, runSheet: [row], bends: [bend] })).toBe('testing')
    expect(openStateOf({ ...empty, bends: [bend] })).toBe('testing')
    const { ndt } = couponContentSchema.parse({ ...couponFromProcedure(procedure, 'WPS-001'), ndt: [{ id: 'n', method: 'RT' }] })
    expect(openStateOf({ ...empty, ndt })).toBe('testing')
    expect(openStateOf({ ...empty, ndt: [] })).toBe('planned')
  })

  it('is closed once certified or rejected', () => {
    expect(COUPON_STATES.filter(isOpen)).toEqual(['planned', 'welding', 'testing'])
  })

  it('is certified from testing only, rejected from any open state', () => {
    expect(COUPON_STATES.filter((state) => mayMove(state, 'certified', 'certification'))).toEqual(['testing'])
    expect(COUPON_STATES.filter((state) => mayMove(state, 'rejected', 'rejection'))).toEqual(['planned', 'welding', 'testing'])
    expect(COUPON_MOVES.some((move) => move.by === 'save' && (move.to === 'certified' || move.to === 'rejected'))).toBe(false)
  })
})

describe('revision letters', () => {
  it.each([[1, 'A'], [26, 'Z'], [27, 'AA'], [52, 'AZ'], [53, 'BA'], [702, 'ZZ'], [703, 'AAA']])('%i is %s', (ordinal, letter) => {
    expect(revisionLetter(ordinal)).toBe(letter)
  })

  it('never repeats, and grows by length then alphabet', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 100_000 }), (ordinal) => {
      const [now, next] = [revisionLetter(ordinal), revisionLetter(ordinal + 1)]
      expect(next.length > now.length || (next.length === now.length && next > now)).toBe(true)
    }))
  })

  it.each([0, -1, 1.5])('has none for %d', (ordinal) => {
    expect(() => revisionLetter(ordinal)).toThrow(RangeError)
  })
})

describe('statements', () => {
  it('say who, as what, and what they do to which record', () => {
    expect(statementOf({ meaning: 'approved', record: 'WPS-001 revision A', name: 'S. Vale', role: 'supervisor' })).toBe('I, S. Vale, acting as supervisor, approve WPS-001 revision A for production. Every finding is within what its coupons qualify.')
  })

  it('say how many findings were accepted', () => {
    expect(statementOf({ meaning: 'approved', record: 'WPS-001 revision A', name: 'S. Vale', role: 'supervisor', deviations: 1 })).toContain('accepting 1 finding for the reason')
    expect(statementOf({ meaning: 'approved', record: 'WPS-001 revision A', name: 'S. Vale', role: 'supervisor', deviations: 2 })).toContain('accepting 2 findings for the reason')
  })
})
