import { containsInterval } from '../../ranges/numeric.ts'
import type { Fix, NumericRange } from '../../schemas/assessment.ts'
import { intervalCures } from '../common/cures.ts'
import { figures, isStated } from '../common/reading.ts'
import type { RuleContext } from '../rule.ts'

/** Set fixes for the thickness of each member that lies outside, so that both come inside. */
export function memberCures(context: RuleContext, range: NumericRange, label: string): Fix[] {
  const { procedure, system } = context
  return (['thickness', 'thicknessB'] as const).flatMap((field) => {
    const current = procedure[field]
    const { min, max, all, fault } = figures(current, 'length', system)
    if (!isStated(current) || fault) return []
    const asked = all ? { min: null, max: null } : { min: min ?? max, max: max ?? min }
    if (containsInterval(range, asked) !== 'outside') return []
    const wrong = (['min', 'max'] as const).filter((end) => asked[end] === null || containsInterval(range, { min: asked[end], max: asked[end] }) !== 'within')
    return intervalCures({ label: field === 'thickness' ? label : `${label} of the second member`, dimension: 'length', field, current, range, asked, wrong })
  })
}
