/** Table 7.7: smallest fillet by thickness. */
import { figures, unitOf } from '../../common/reading.ts'
import { intervalCures } from '../../common/cures.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { RuleContext } from '../../rule.ts'
import { lengthRange } from '../ranges.ts'
import { MINIMUM_FILLET, minimumSize } from './limits.ts'
import { condition } from './meta.ts'
import { decidingThickness, lowHydrogenProcess } from './metals.ts'
import { EPSILON, FOUR, says } from './verdict.ts'

export interface MinimumFillet { T: number; leg: number }

/** Smallest fillet for the thickest metal asked, never more than the thinner part; null where no thickness is stated. */
export function minimumFillet(context: RuleContext, lowHydrogen: boolean): MinimumFillet | null {
  const T = decidingThickness(context, lowHydrogen)
  return T && { T: T.high, leg: Math.min(minimumSize(MINIMUM_FILLET, T.high, context.system), T.thinner) }
}

export const pqMinimumFillet = condition({
  file: 'minimum-fillet', title: 'Smallest fillet', clause: 'Table 7.7', basis: 'secondary', source: 'Sizes as listed in a course text; notes from memory', field: 'joint.filletLeg', at: 'weld', more: FOUR,
  statement: 'A fillet is at least the size that the table gives for the thickness: of the thinner part with low-hydrogen processes, else of the thicker part and in a single pass; it need not be larger than the thinner part. Cyclic loading, which asks for at least 5 mm (3/16 in.), is not kept in the record and not judged.',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const leg = figures(context.procedure.joint.filletLeg, 'length', system)
    const low = leg.fault || leg.all ? null : (leg.min ?? leg.max)
    const high = leg.fault ? null : leg.all ? Infinity : (leg.max ?? leg.min)
    const lowHydrogen = lowHydrogenProcess(block)
    if (lowHydrogen === null) return cannotTell("Whether the electrode is low-hydrogen can't be read from its classification, and the smallest fillet depends on it.", ['procedure: filler.classification'], { field: `${context.path}.filler.classification` })
    const least = minimumFillet(context, lowHydrogen)
    if (!least) return cannotTell('The thickness is not stated, and the smallest fillet depends on it.', ['procedure: thickness'], { field: 'thickness', fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] })
    if (high === null) return cannotTell('The fillet size is not stated.', ['procedure: joint.filletLeg'], { field: 'joint.filletLeg', fixes: [{ kind: 'state', label: 'State the fillet size', field: 'joint.filletLeg' }] })
    // The sizes are secondary; which part counts, and the single pass, are recalled.
    const basis = 'memory' as const
    const range = lengthRange(system, least.leg, null)
    const asked = { min: low, max: Number.isFinite(high) ? high : null }
    const wrong = high < least.leg ? (['min', 'max'] as const) : (['min'] as const)
    const set = intervalCures({ label: 'the fillet', dimension: 'length', field: 'joint.filletLeg', current: context.procedure.joint.filletLeg, range, asked, wrong })
    const why = `${show(least.leg, unit)} for ${lowHydrogen ? 'the thinner' : 'the thicker'} part of ${least.T === Infinity ? 'unlimited thickness' : show(least.T, unit)}`
    if (high < least.leg - EPSILON) return says('outside', `A fillet of ${show(high, unit)} is smaller than ${why}.`, { asked, range, basis, fixes: set })
    if (!lowHydrogen && block.technique.passesPerSide === 'multiple') return cannotTell(`With an electrode that is not low-hydrogen the smallest fillet (${why}) must be laid in a single pass; the procedure lays several.`, ['procedure: that the smallest fillet is laid in one pass'], { asked, range, basis, field: `${context.path}.technique.passesPerSide` })
    if (low === null || low < least.leg - EPSILON) return cannotTell(`The thickest metal asked needs at least ${why}; smaller fillets are asked as well, and which metal they are for is not stated.`, ['procedure: fillet size for each thickness'], { asked, range, basis, fixes: set })
    return says('within', `A fillet of ${show(low, unit)} is at least ${why}.`, { asked, range, basis })
  },
})
