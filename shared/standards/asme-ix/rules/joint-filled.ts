/** QW-202.2(a) with QW-200.4: in a full-penetration groove the deposits of all processes together fill the joint. */
import type { Interval } from '../../../schemas/common.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { intervalCures } from '../../common/cures.ts'
import { figures, isStated, tidy, unitOf } from '../../common/reading.ts'
import { cannotTell, list, show, stateFix } from '../../common/wording.ts'
import type { Rule, RuleContext } from '../../rule.ts'
import { editionsUntil } from '../editions.ts'
import { lengthRange } from '../ranges.ts'

/** Upper end of an interval; Infinity = every thickness, null = not stated or contradictory. */
function top(interval: Interval | null, system: UnitSystem): number | null {
  const { min, max, all, fault } = figures(interval, 'length', system)
  return fault ? null : all ? Infinity : (max ?? min)
}

/** The thickest weld that the procedure asks for: of two members the thinner decides. */
function jointTop({ thickness, thicknessB }: WeldingVariables, system: UnitSystem): number | null {
  const first = top(thickness, system)
  if (!isStated(thicknessB)) return first
  const second = top(thicknessB, system)
  return first === null || second === null ? null : Math.min(first, second)
}

/** An autogenous pass fuses the joint without a deposit, so there nothing can be added up; a repair need not fill the thickness. */
const applies = ({ procedure: { joint, processes } }: RuleContext): boolean =>
  joint.weld === 'groove' && joint.penetration === 'full' && joint.work == null && processes.every(({ filler }) => filler.added === true)

export const jointFilled: Rule = {
  meta: {
    id: 'asme-ix/joint-filled',
    title: 'Deposits fill the joint',
    standard: 'asme-ix',
    clause: 'QW-202.2',
    editions: editionsUntil(undefined),
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' },
    basis: 'memory',
    source: 'QW-202.2(a), QW-200.4 and the notes of QW-451',
    statement: 'The deposits of all processes of a full-penetration groove are together at least as thick as the joint.',
    scope: 'weld',
    combine: 'each',
    withoutCoupon: true,
  },
  field: 'thickness',
  at: 'weld',
  label: 'Deposits together',
  applies,
  range: () => null,
  check(context) {
    if (!applies(context)) return null
    const { procedure, system } = context
    const unit = unitOf('length', system)
    const joint = jointTop(procedure, system)
    // The rule of base metal thickness already says that it is missing.
    if (joint === null) return null
    const parts = procedure.processes.map(({ process, depositThickness }, i) => ({ name: process ?? 'the process not named', deposit: top(depositThickness, system), field: `processes.${i}.depositThickness` }))
    const filled = tidy(parts.reduce((sum, { deposit }) => sum + (deposit ?? 0), 0))
    const asked = { min: 0, max: joint === Infinity ? null : joint }
    const wanted = joint === Infinity ? 'joints of every thickness' : `a joint of ${show(joint, unit)}`
    if (filled >= joint) return { verdict: 'within', sentence: `The deposits of the procedure together fill ${wanted}.`, asked, range: lengthRange(system, 0, filled === Infinity ? null : filled), tested: [] }
    const open = parts.filter(({ deposit }) => deposit === null)
    if (open.length > 0) {
      return cannotTell(`Whether the deposits together fill ${wanted} can't be told, because the deposit of ${list(open.map(({ name }) => name))} isn't stated.`, open.map(({ field }) => `procedure: ${field}`), { asked, tested: [], fixes: open.map(({ name, field }) => stateFix(parts.length > 1 ? `deposit thickness of ${name}` : 'deposit thickness', field)) })
    }
    const range = lengthRange(system, 0, filled)
    // Not "outside": no coupon would cure it, the procedure must say how the rest is filled.
    return {
      verdict: 'cannot-tell',
      sentence: `${parts.length > 1 ? `The deposits of ${list(parts.map(({ name }) => name))} together come` : 'The deposit comes'} to ${show(filled, unit)} at most, so how ${wanted} is filled with full penetration can't be told.`,
      missing: parts.map(({ field }) => `procedure: ${field} (enough to fill the joint)`),
      asked,
      range,
      tested: [],
      fixes: [
        ...(isStated(procedure.thicknessB) ? [] : intervalCures({ label: 'base metal thickness', dimension: 'length', field: 'thickness', current: procedure.thickness, range, asked, wrong: ['max'] })),
        ...parts.map(({ name, field }) => ({ kind: 'state' as const, label: `State a larger deposit of ${name}`, field })),
      ],
      reasoning: [`Deposits: ${parts.map(({ name, deposit }) => `${name} ${show(Number(deposit), unit)}`).join(', ')}.`, 'Each process stays inside its own deposit limit; what one may not deposit another must.'],
    }
  },
}
