import type { RuleContext, RuleVerdict } from '../../rule.ts'
import { limitBasis } from './meta.ts'

/** A verdict on a draft by itself, without coupon. */
export const says = (verdict: RuleVerdict['verdict'], sentence: string, more: Partial<RuleVerdict> = {}): RuleVerdict => ({ verdict, sentence, asked: null, range: null, ...more })

/** The same where the figure stands in Table 5.1: its basis follows the edition. */
export const saysByTable = (context: RuleContext, verdict: RuleVerdict['verdict'], sentence: string, more: Partial<RuleVerdict> = {}): RuleVerdict => says(verdict, sentence, { basis: limitBasis(context), ...more })

/** The cure of what is never prequalified. */
export const byTest = { kind: 'plan-coupon' as const, label: 'Qualify by test', requirement: 'A qualification test (PQR), with the procedure judged by the route by test.' }

export const FOUR = { classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' } } as const
export const TABLE_5_1 = 'Table 5.1 read in 2020; figures of other editions recalled'

/** Differences below this are noise of conversion. */
export const EPSILON = 1e-6
