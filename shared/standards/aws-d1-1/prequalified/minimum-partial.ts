/** Table 5.5: smallest partial-penetration weld by thickness. */
import { figures, tidy, unitOf } from '../../common/reading.ts'
import { intervalCures } from '../../common/cures.ts'
import { cannotTell, show } from '../../common/wording.ts'
import { askedPlaces } from '../positions.ts'
import { lengthRange, testKind } from '../ranges.ts'
import { MINIMUM_PARTIAL, minimumSize, plainPlaces } from './limits.ts'
import { matchDetail } from './match-detail.ts'
import { condition } from './meta.ts'
import { decidingThickness, lowHydrogenProcess } from './metals.ts'
import { EPSILON, FOUR, says } from './verdict.ts'

export const pqMinimumPartial = condition({
  file: 'minimum-partial-penetration', title: 'Smallest partial-penetration weld', clause: 'Table 5.5', basis: 'memory', source: 'Table 5.5 as recalled; what each detail takes off the groove depth from an engineering manual', field: 'depositThickness', at: 'block', more: FOUR,
  statement: 'A partial-penetration weld is at least the size that the table gives for the thickness; in some details the weld is smaller than the groove is deep.',
  applies: (context) => testKind(context.procedure) === 'partial',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const field = `${context.path}.depositThickness`
    const depth = figures(block.depositThickness, 'length', system)
    const had = depth.fault || depth.all ? null : (depth.min ?? depth.max)
    const lowHydrogen = lowHydrogenProcess(block)
    const T = lowHydrogen === null ? null : decidingThickness(context, lowHydrogen)
    if (lowHydrogen === null) return cannotTell("Whether the electrode is low-hydrogen can't be read from its classification, and the smallest weld depends on it.", ['procedure: filler.classification'], { field: `${context.path}.filler.classification` })
    if (!T) return cannotTell('The thickness is not stated, and the smallest weld depends on it.', ['procedure: thickness'], { field: 'thickness', fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] })
    if (had === null) return cannotTell('The groove depth is not stated as a figure.', ['procedure: depositThickness'], { field, fixes: [{ kind: 'state', label: 'State the groove depth', field }] })
    const least = Math.min(minimumSize(MINIMUM_PARTIAL, T.high, system), T.thinner)
    const range = lengthRange(system, least, null)
    const asked = { min: had, max: depth.max }
    const basis = 'memory' as const
    const { detail, fits } = matchDetail(context.procedure, block, system)
    const places = plainPlaces(askedPlaces(block.positions))
    const off = fits === 'yes' && detail?.loss ? Math.max(0, ...places.map((place) => detail.loss?.(place)[system] ?? 0)) : null
    const size = off === null ? null : tidy(Math.max(0, had - off))
    if (had < least - EPSILON || (size !== null && size < least - EPSILON)) return says('outside', `A weld of ${show(size ?? had, unit)} is smaller than the ${show(least, unit)} needed.`, { asked, range, basis, fixes: intervalCures({ label: 'the groove depth', dimension: 'length', field, current: block.depositThickness, range: lengthRange(system, tidy(least + (off ?? 0)), null), asked, wrong: depth.max !== null && depth.max < least + (off ?? 0) ? ['min', 'max'] : ['min'] }) })
    if (size === null) return cannotTell(`The groove is ${show(had, unit)} deep and ${show(least, unit)} of weld is needed; how much the detail takes off the depth is not known, because no detail kept here fits.`, ['a prequalified detail that the groove meets'], { asked, range, basis })
    return says('within', `A weld of ${show(size, unit)} is at least the ${show(least, unit)} needed${off ? ` (the detail takes ${show(off, unit)} off the groove depth)` : ''}.`, { asked, range, basis })
  },
})
