/** QW-202.2(c), QW-451.3 and QW-451.4: groove coupons cover grooves and fillets; fillet coupons only fillets that hold no pressure. */
import { setRange } from '../../../ranges/set.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { editionsUntil } from '../editions.ts'

const GROOVE = 'groove'
const FILLET = 'fillet that holds no pressure'
const PRESSURE_FILLET = 'fillet that holds pressure'
const ALL_KINDS: readonly string[] = [GROOVE, FILLET, PRESSURE_FILLET].sort()

export const weldKind: Rule = {
  meta: {
    id: 'asme-ix/weld-kind',
    title: 'Groove or fillet coupon',
    standard: 'asme-ix',
    clause: 'QW-202.2',
    editions: editionsUntil(undefined),
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' },
    basis: 'read',
    source: 'QW-202.2(c), 2015',
    statement: 'A groove coupon covers grooves and every fillet; a fillet coupon covers fillets that hold no pressure.',
    scope: 'process',
    combine: 'each',
  },
  field: 'joint.weld',
  at: 'weld',
  label: 'Kind of weld',
  range: (_context, side) =>
    side.variables.joint.weld === 'groove'
      ? { range: setRange(ALL_KINDS), tested: 'groove', reason: 'A groove coupon covers grooves and fillets of every size.', clause: 'QW-451.4' }
      : { range: setRange([FILLET]), tested: 'fillet', reason: 'A fillet coupon covers only fillets that hold no pressure.', clause: 'QW-202.2(c)' },
  check(context, sides, joined) {
    const { joint } = context.procedure
    if (joined?.type !== 'set') return null
    const groove = joined.values.includes(GROOVE)
    const asked = joint.weld === 'groove' ? GROOVE : joint.pressureRetaining === false ? FILLET : PRESSURE_FILLET
    if (groove) return { verdict: 'within', sentence: `${names(sides)} is a groove coupon, which covers ${joint.weld === 'groove' ? 'grooves' : 'every fillet'}.`, asked: [asked], range: joined, clause: joint.weld === 'groove' ? 'QW-202.2' : 'QW-451.4' }
    const plan = { kind: 'plan-coupon' as const, label: 'Weld a groove coupon', requirement: 'A groove coupon with tension and bend tests.' }
    if (joint.weld === 'groove') return { verdict: 'outside', sentence: `A groove weld is not covered: ${names(sides)} is a fillet coupon.`, asked: [asked], range: joined, clause: 'QW-202.2', fixes: [plan] }
    if (joint.pressureRetaining === false) return { verdict: 'within', sentence: `${names(sides)} is a fillet coupon, which covers fillets that hold no pressure.`, asked: [asked], range: joined, clause: 'QW-202.2(c)' }
    if (joint.pressureRetaining === true) return { verdict: 'outside', sentence: `A fillet that holds pressure is not covered: ${names(sides)} is a fillet coupon, and pressure-retaining fillets need a groove coupon.`, asked: [asked], range: joined, clause: 'QW-202.2(c)', fixes: [plan] }
    return { verdict: 'cannot-tell', sentence: `${names(sides)} is a fillet coupon, which covers only fillets that hold no pressure; the procedure does not say whether this one does.`, asked: null, range: joined, clause: 'QW-202.2(c)', missing: ['procedure: joint.pressureRetaining'], fixes: [{ kind: 'state', label: 'State whether the fillet holds pressure', field: 'joint.pressureRetaining' }, plan] }
  },
}
