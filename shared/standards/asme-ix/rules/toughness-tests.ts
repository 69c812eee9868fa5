/** QW-401.1: where toughness is required, a supporting coupon must carry toughness tests. */
import { setRange } from '../../../ranges/set.ts'
import { names, verb } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { editionsUntil } from '../editions.ts'

const tested = (side: CouponSide): boolean => side.coupon.content.toughness.some((test) => test.values.length > 0)

export const toughnessTests: Rule = {
  meta: {
    id: 'asme-ix/toughness-tests',
    title: 'Toughness tests',
    standard: 'asme-ix',
    clause: 'QW-401.1',
    editions: editionsUntil(undefined),
    classes: { SMAW: 'supplementary', SAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' },
    basis: 'read',
    source: 'QW-401.1, 2017',
    statement: 'Supplementary variables are proved by a coupon with toughness tests; such a coupon may be added later to one without.',
    scope: 'process',
    combine: 'each',
  },
  field: 'toughnessRequired',
  at: 'weld',
  label: 'Toughness tests',
  range: (_context, side) => ({ range: setRange(tested(side) ? ['with toughness', 'without toughness'] : ['without toughness']), tested: tested(side) ? 'with toughness' : 'without toughness', reason: tested(side) ? 'The coupon carries toughness tests.' : 'The coupon carries no toughness tests.' }),
  check({ toughness }, sides, joined) {
    if (sides.some(tested)) return { verdict: 'within', sentence: `${names(sides)} ${verb(sides, 'carries', 'carry')} toughness tests.`, asked: ['with toughness'], range: joined }
    const plan = { kind: 'plan-coupon' as const, label: 'Weld a coupon with toughness tests', requirement: 'A coupon with the same essential and supplementary variables, tested for toughness.' }
    const awaited = sides.filter((side) => side.variables.toughnessRequired === true)
    if (awaited.length > 0) return { verdict: 'cannot-tell', sentence: `${names(awaited)} ${verb(awaited, 'was', 'were')} welded for toughness, but no toughness results are recorded yet.`, asked: ['with toughness'], range: joined, missing: awaited.map((side) => `${side.coupon.number}: toughness`) }
    return { verdict: 'outside', sentence: `${toughness === null ? '' : 'Toughness is required, but '}${names(sides)} ${verb(sides, 'carries', 'carry')} no toughness tests.`, asked: ['with toughness'], range: joined, fixes: [plan] }
  },
}
