import type { Bound, Finding, NumericRange } from '@shared/schemas/assessment.ts'

export const closed = (value: number): Bound => ({ kind: 'closed', value })
export const open = (value: number): Bound => ({ kind: 'open', value })
export const unlimited: Bound = { kind: 'unlimited' }
export const unknown: Bound = { kind: 'unknown' }

export const mm = (...pairs: [Bound, Bound][]): NumericRange => ({ type: 'numeric', dimension: 'length', unit: 'mm', segments: pairs.map(([lower, upper]) => ({ lower, upper })) })

const base: Finding = {
  ruleId: 'example/thickness',
  standard: 'asme-ix',
  edition: '2021',
  clause: 'QW-451.1',
  title: 'Thickness, groove',
  verdict: 'outside',
  class: 'essential',
  field: 'thickness',
  processId: null,
  sentence: '25 mm is above the 20 mm (2T) that the 10 mm coupon of PQR-009 qualifies. Needs a coupon of at least 12.5 mm.',
  asked: { min: 5, max: 25 },
  range: mm([closed(5), closed(20)]),
  tested: [10],
  couponIds: ['coupon-9'],
  missing: [],
  fixes: [
    { kind: 'set', label: 'Set to 20 mm', field: 'thickness.max', value: 20 },
    { kind: 'plan-coupon', label: 'Plan a coupon', requirement: 'T of at least 12.5 mm' },
  ],
  basis: 'secondary',
  source: 'ASME BPVC.IX 2021, QW-451.1',
  reasoning: ['PQR-009 was welded on T = 10 mm.', 'A coupon of that thickness qualifies up to 2T = 20 mm.', 'The procedure asks for 5 to 25 mm: 20 to 25 mm is not covered.'],
}

export const findings = {
  outside: base,
  within: { ...base, ruleId: 'example/p-number', clause: 'QW-403.11', title: 'P-Number', verdict: 'within', field: 'baseMetals', sentence: 'P-23 to P-23 is covered by PQR-009.', fixes: [], range: null, reasoning: ['PQR-009 joined P-23 to P-23.'] },
  withinToo: { ...base, ruleId: 'example/f-number', clause: 'QW-404.4', title: 'F-Number', verdict: 'within', field: 'filler', sentence: 'ER5356 is F-22, as tested.', fixes: [], range: null, reasoning: [] },
  cannotTell: {
    ...base,
    ruleId: 'example/heat-input',
    clause: 'QW-409.1',
    title: 'Heat input',
    verdict: 'cannot-tell',
    class: 'supplementary',
    field: 'heatInput',
    sentence: 'The coupon record has no travel speed, so the heat input that it qualifies cannot be computed.',
    missing: ['travel speed of passes 2 to 4 on PQR-009'],
    basis: 'memory',
    range: { type: 'numeric', dimension: 'heatInput', unit: 'kJ/mm', segments: [{ lower: unknown, upper: unknown }] },
    fixes: [{ kind: 'state', label: 'State the travel speed', field: 'travelSpeed' }],
  },
} satisfies Record<string, Finding>
