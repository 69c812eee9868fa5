import { describe, expect, it } from 'vitest'
import type { Fix } from '@shared/schemas/assessment.ts'
import { quantity } from '@shared/units/convert.ts'
import { applyFix, undoFix } from '@/features/procedures/draft/fixes.ts'
import { steelProcedure } from '../../../../fixtures/samples.ts'

const content = steelProcedure()
const twenty: Fix = { kind: 'set', label: 'Set to 20 mm', field: 'thickness.max', value: quantity(20, 'length') }

describe('fixes', () => {
  it('sets one end of an interval and takes the whole interval back', () => {
    const result = applyFix(content, twenty)
    expect(result?.content.variables.thickness).toMatchObject({ min: { si: 5 }, max: { si: 20 } })
    expect(result?.applied.path).toBe('variables.thickness')
    expect(result && undoFix(result.content, result.applied)).toEqual(content)
  })
  it('states a value that was not there before', () => {
    const bare = { ...content, variables: { ...content.variables, thickness: null } }
    const result = applyFix(bare, twenty)
    expect(result?.content.variables.thickness).toMatchObject({ min: null, max: { si: 20 } })
    expect(result && undoFix(result.content, result.applied)?.variables.thickness).toBeNull()
  })
  it('does not overwrite what was changed since', () => {
    const result = applyFix(content, twenty)
    if (!result) throw new Error('the fix applies')
    const later = applyFix(result.content, { ...twenty, value: quantity(18, 'length') })
    expect(later && undoFix(later.content, result.applied)).toBeNull()
  })
  it('links a coupon once', () => {
    const link: Fix = { kind: 'link-coupon', label: 'Link PQR-011', couponId: '7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0009' }
    const result = applyFix(content, link)
    expect(result?.content.supportingCoupons).toHaveLength(content.supportingCoupons.length + 1)
    expect(result && applyFix(result.content, link)).toBeNull()
  })
  it('refuses a value that does not fit, a path that is not there, and what changes no content', () => {
    expect(applyFix(content, { ...twenty, value: 'twenty' })).toBeNull()
    expect(applyFix(content, { ...twenty, field: 'processes.9.depositThickness.max' })).toBeNull()
    expect(applyFix(content, { kind: 'plan-coupon', label: 'Weld a coupon', requirement: 'A coupon of 12.5 mm.' })).toBeNull()
    expect(applyFix(content, { kind: 'state', label: 'State it', field: 'thickness' })).toBeNull()
  })
})
