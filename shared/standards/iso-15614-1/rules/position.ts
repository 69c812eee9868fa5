/** 8.4.2: welding position; any covers any at level 1, and at level 2 where neither impact nor hardness is required, save downwards. */
import { setRange } from '../../../ranges/set.ts'
import type { AssessedCoupon } from '../../../schemas/assessment.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { DOWNWARD, hasHardnessTests, hasImpactTests, isoPositions, materialGroup, secondMember } from '../../common/iso-names.ts'
import { nameBandRule, type NameBand } from '../../common/review-band.ts'
import { list } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule, RuleContext, RuleVerdict } from '../../rule.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'

const UPWARD = ['PA', 'PB', 'PC', 'PD', 'PE', 'PF', 'PH', 'PK', 'H-L045']
/** Where the heat input is usually highest and lowest on plate, and pipe positions that can supply both. */
const HIGH = 'PF'
const LOW = 'PC'
const BOTH: readonly string[] = ['PH', 'H-L045']

/** Duplex: both extremes carry both kinds of test (recalled). */
const isDuplex = (variables: WeldingVariables): boolean => [variables.baseMetals.a, secondMember(variables)].some((metal) => materialGroup(metal)?.main === 10)

interface Needs { impact: boolean | null; hardness: boolean | null }

/** What the procedure requires; a coupon by itself is judged by the tests it carries. */
function needs(context: RangeContext, coupon: AssessedCoupon): Needs {
  if (!context.procedure) return { impact: hasImpactTests(coupon.content) || context.toughness === true, hardness: hasHardnessTests(coupon.content) || coupon.content.variables.hardnessRequired === true }
  return { impact: context.toughness, hardness: context.procedure.hardnessRequired ?? null }
}

function covers(tested: readonly string[], context: RangeContext, coupon: AssessedCoupon): NameBand {
  if (levelOf(context) === '1') return { sure: 'any' }
  const down = tested.filter((position) => DOWNWARD.has(position))
  // A downward coupon covers itself; what else it covers is not told.
  const free = tested.some((position) => !DOWNWARD.has(position)) ? [...UPWARD, ...down] : down
  const { impact, hardness } = needs(context, coupon)
  if (impact === false && hardness === false) return free === down ? { sure: down, maybe: UPWARD, why: 'What a coupon welded downwards covers beyond itself is not known here.' } : { sure: free }
  if (impact !== true && hardness !== true) {
    return { sure: tested, maybe: free, why: 'Every position but the downward ones is covered where neither impact nor hardness is required, which isn\'t stated.', missing: [...(impact === null ? ['procedure: toughnessRequired'] : []), ...(hardness === null ? ['procedure: hardnessRequired'] : [])] }
  }
  const high = tested.includes(HIGH) && hasImpactTests(coupon.content)
  const low = tested.includes(LOW) && hasHardnessTests(coupon.content)
  const both = tested.some((position) => BOTH.includes(position))
  const duplex = isDuplex(context.procedure ?? coupon.content.variables)
  const enough = !duplex && (impact !== true || high) && (hardness !== true || low)
  if (enough && impact !== null && hardness !== null) return { sure: free, basis: 'secondary' }
  const wanted = duplex ? 'impact and hardness tests of both, the position of highest and that of lowest heat input (group 10)' : [...(impact === true ? ['impact specimens from the position of highest heat input (on plate usually PF)'] : []), ...(hardness === true ? ['hardness from the one of lowest (usually PC)'] : [])].join(' and ')
  return { sure: tested, maybe: free, basis: 'secondary', why: `Other positions are covered only with ${wanted}${both ? '; a fixed pipe can supply both, if the specimens were taken there' : ''}.`, missing: [...(impact === null ? ['procedure: toughnessRequired'] : []), ...(hardness === null ? ['procedure: hardnessRequired'] : []), 'which position of the test had the highest and which the lowest heat input'] }
}

/** Where one coupon has the highest heat input with impact tests and another the lowest with hardness tests, they cover the rest together. */
function together(context: RuleContext, sides: readonly CouponSide[]): RuleVerdict | null {
  const { block, procedure } = context
  if (sides.length < 2 || !block || levelOf(context) === '1' || context.toughness !== true || procedure.hardnessRequired !== true) return null
  const asked = isoPositions(procedure, block)
  const has = (symbol: string, tested: (content: AssessedCoupon['content']) => boolean): CouponSide | undefined => sides.find((side) => side.block && isoPositions(side.variables, side.block)?.includes(symbol) && tested(side.coupon.content))
  const duplex = isDuplex(procedure)
  const bothTests = (content: AssessedCoupon['content']): boolean => hasImpactTests(content) && hasHardnessTests(content)
  const high = has(HIGH, duplex ? bothTests : hasImpactTests)
  const low = has(LOW, duplex ? bothTests : hasHardnessTests)
  if (!asked || !high || !low || !asked.every((symbol) => UPWARD.includes(symbol))) return null
  return { verdict: 'within', sentence: `${list(asked)} is covered: ${high.coupon.number} was tested for impact in ${HIGH} and ${low.coupon.number} for hardness in ${LOW}.`, asked, range: setRange(UPWARD), basis: 'secondary' }
}

const base = nameBandRule({
  meta: meta('position', { title: 'Welding position', clause: '8.4.2', basis: 'memory', combine: 'jointly', statement: 'Level 1: any position covers all. Level 2: any covers all but PG, PJ and J-L045 where neither impact nor hardness is required; with impact the specimens come from the position of highest heat input, with hardness from the lowest, usually PF and PC on plate; of group 10 both tests come from both. Whether hardness is required is taken from the procedure.' }),
  field: 'positions',
  at: 'block',
  label: 'position',
  asked: (context) => context.block && isoPositions(context.procedure, context.block),
  tested: (_context, side) => side.block && isoPositions(side.variables, side.block),
  covers: (tested, context, side) => covers(tested, context, side.coupon),
  because: 'Downward positions need their own test; with impact or hardness the highest and lowest heat input decide.',
  lacks: () => ['positions', 'progression'],
})

export const position: Rule = { ...base, check: (context, sides, joined) => together(context, sides) ?? base.check(context, sides, joined) }
