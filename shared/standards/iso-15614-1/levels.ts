/** Levels 1 and 2: which one is asked, which one a coupon was tested to, and what follows where only the level 2 limit is held. */
import { lowerFirst } from '../common/lacking.ts'
import type { CouponSide, RangeContext, Rule, RuleContext } from '../rule.ts'

export type Level = '1' | '2'

/** Where no level is named, level 2 applies (introduction; read in the foreword of a national adoption). */
export const levelOf = (context: Pick<RangeContext, 'level'>): Level => context.level ?? '2'

/** Level to which a coupon was tested, from its record; null where the record doesn't name this standard. */
export function couponLevel(side: Pick<CouponSide, 'variables'>): Level | null {
  const entry = side.variables.standards.find(({ standard }) => standard === 'iso-15614-1')
  return entry ? (entry.level ?? '2') : null
}

/**
 * A variable that level 1 leaves free: not to state it is no fault there.
 * @param isUnstated whether the procedure says nothing of it
 */
export function freeAtLevelOne(rule: Rule, isUnstated: (context: RuleContext) => boolean): Rule {
  return {
    ...rule,
    check(context, sides, joined) {
      const judged = rule.check(context, sides, joined)
      if (judged?.verdict !== 'cannot-tell' || levelOf(context) === '2' || !isUnstated(context)) return judged
      return { verdict: 'within', sentence: `Level 1 does not limit the ${lowerFirst(rule.label)}.`, asked: null, range: joined, clause: judged.clause, basis: 'memory' }
    },
  }
}

/** A limit of level 2 whose level 1 counterpart isn't held: level 1 is wider, so inside is inside, and beyond it can't be told. */
export function levelTwoLimit(rule: Rule): Rule {
  return {
    ...rule,
    check(context, sides, joined) {
      const judged = rule.check(context, sides, joined)
      if (judged?.verdict !== 'outside' || levelOf(context) === '2') return judged
      return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} That is the limit of level 2; what level 1 allows beyond it isn't held here.`, missing: [`the level 1 rule of ${judged.clause ?? rule.meta.clause} in your edition`] }
    },
  }
}
