import type { Basis } from '../../../schemas/assessment.ts'
import type { ProcessBlock } from '../../../schemas/welding.ts'
import type { Rule, RuleContext, RuleMeta, RuleVerdict } from '../../rule.ts'
import { ownMeta } from '../meta.ts'

export interface PrequalifiedSpec {
  file: string
  title: string
  clause: string
  basis: Basis
  source: string
  statement: string
  field: string
  at: 'weld' | 'block'
  more?: Partial<RuleMeta>
  applies?: (context: RuleContext, block: ProcessBlock) => boolean
  check: (context: RuleContext, block: ProcessBlock) => RuleVerdict | null
}

/** A condition of prequalification: judged by the procedure alone, no coupon has a say. */
export function condition(spec: PrequalifiedSpec): Rule {
  const arises = (context: RuleContext): ProcessBlock | null => (context.block && (!spec.applies || spec.applies(context, context.block)) ? context.block : null)
  return {
    meta: ownMeta(`prequalified-${spec.file}`, spec.title, spec.clause, spec.basis, spec.source, spec.statement, { route: 'prequalified', withoutCoupon: true, ...spec.more }),
    field: spec.field,
    at: spec.at,
    label: spec.title,
    applies: (context) => arises(context) !== null,
    range: () => null,
    check(context) {
      const block = arises(context)
      return block && spec.check(context, block)
    },
  }
}

/** Table 5.1 was read in 2020; for another edition its figures are recalled. */
export const limitBasis = (context: RuleContext): Basis => (context.edition === '2020' ? 'read' : 'memory')
