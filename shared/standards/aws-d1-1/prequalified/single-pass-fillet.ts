/** Table 5.1: largest fillet in one pass. */
import { figures, unitOf } from '../../common/reading.ts'
import { intervalCures } from '../../common/cures.ts'
import { cannotTell, show } from '../../common/wording.ts'
import { askedPlaces } from '../positions.ts'
import { lengthRange } from '../ranges.ts'
import { feedOf, plainPlaces, singlePassFillet } from './limits.ts'
import { condition } from './meta.ts'
import { noPosition, tightest } from './places.ts'
import { EPSILON, FOUR, saysByTable, TABLE_5_1 } from './verdict.ts'

export const pqSinglePassFillet = condition({
  file: 'single-pass-fillet', title: 'Largest single-pass fillet', clause: 'Table 5.1', basis: 'read', source: `${TABLE_5_1}; the limits for bare weathering steel (note f) are not kept here`, field: 'joint.filletLeg', at: 'weld', more: FOUR,
  statement: 'A fillet laid in one pass is not larger than the table allows for process and position.',
  applies: (context, block) => context.procedure.joint.weld === 'fillet' && block.technique.passesPerSide !== 'multiple',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const leg = figures(context.procedure.joint.filletLeg, 'length', system)
    const top = leg.fault ? null : leg.all ? Infinity : (leg.max ?? leg.min)
    if (top === null) return cannotTell('The fillet size is not stated.', ['procedure: joint.filletLeg'], { field: 'joint.filletLeg', fixes: [{ kind: 'state', label: 'State the fillet size', field: 'joint.filletLeg' }] })
    const places = plainPlaces(askedPlaces(block.positions))
    if (places.length === 0) return noPosition(context)
    const process = block.process ?? 'SMAW'
    const feed = feedOf(block)
    const sure = tightest(places, (place) => singlePassFillet(process, place, feed)?.sure ?? null, system)
    const maybe = tightest(places, (place) => singlePassFillet(process, place, feed)?.maybe ?? null, system)
    if (!sure || !maybe) return saysByTable(context, 'within', 'A single-pass fillet of any size is allowed here.', { range: lengthRange(system, null, null) })
    const asked = { min: leg.min, max: Number.isFinite(top) ? top : null }
    const range = lengthRange(system, null, sure.value)
    const shown = Number.isFinite(top) ? show(top, unit) : 'Every size'
    if (top <= sure.value + EPSILON) return saysByTable(context, 'within', `A fillet of ${shown} is not larger than the ${show(sure.value, unit)} allowed in one pass.`, { asked, range })
    const wrong = leg.min !== null && leg.min > sure.value ? (['min', 'max'] as const) : (['max'] as const)
    const set = intervalCures({ label: 'the fillet', dimension: 'length', field: 'joint.filletLeg', current: context.procedure.joint.filletLeg, range, asked, wrong })
    const several = { kind: 'set' as const, label: 'Lay it in several passes', field: `${context.path}.technique.passesPerSide`, value: 'multiple' }
    if (block.technique.passesPerSide === null) return cannotTell(`${shown} is over the ${show(sure.value, unit)} allowed in one pass; whether one or several passes are laid is not stated.`, ['procedure: technique.passesPerSide'], { asked, range, field: `${context.path}.technique.passesPerSide`, fixes: [several, ...set] })
    if (top <= maybe.value + EPSILON) return cannotTell(`${shown} is over the ${show(sure.value, unit)} of single and parallel electrodes; only multiple electrodes reach ${show(maybe.value, unit)}.`, ['procedure: how the electrodes are fed'], { asked, range, fixes: [several, ...set] })
    return saysByTable(context, 'outside', `A fillet of ${shown} is larger than the ${show(sure.value, unit)} allowed in one pass in ${sure.place} position.`, { asked, range, fixes: [several, ...set] })
  },
})
