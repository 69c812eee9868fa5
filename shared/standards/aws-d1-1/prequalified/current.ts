/** Table 5.1: largest current; within the maker's range for SMAW, GMAW and FCAW. */
import { between, closed, containsInterval, UNLIMITED } from '../../../ranges/numeric.ts'
import type { Fix, NumericRange } from '../../../schemas/assessment.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { Pass, ProcessBlock } from '../../../schemas/welding.ts'
import { figures, isStated, type Figures } from '../../common/reading.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { RuleContext, RuleVerdict } from '../../rule.ts'
import { intervalCures } from '../../common/cures.ts'
import { feedOf, sawCurrent, type SawPass } from './limits.ts'
import { condition } from './meta.ts'
import { EPSILON, FOUR, saysByTable, TABLE_5_1 } from './verdict.ts'

const passKind = (pass: Pick<Pass, 'layer'>, opening: Figures): SawPass | null => {
  if (pass.layer === 'cap') return 'cap'
  if (pass.layer === 'fillet') return 'fillet'
  if (pass.layer === 'fill' || pass.layer === 'hot' || pass.layer === 'backing') return 'fill'
  if (pass.layer !== 'root') return null
  const most = opening.max ?? opening.min
  return most === null ? null : most > 0 ? 'root with opening' : 'root without opening'
}

/** Set fixes that bring one stated range of current inside. */
function cures(interval: Interval | null, field: string, range: NumericRange): Fix[] {
  const { min, max } = figures(interval, 'current', 'SI')
  const asked = { min: min ?? max, max: max ?? min }
  const wrong = (['min', 'max'] as const).filter((end) => containsInterval(range, { min: asked[end], max: asked[end] }) === 'outside')
  return intervalCures({ label: 'the current', dimension: 'current', field, current: interval, range, asked, wrong })
}

function sawCurrentVerdict(context: RuleContext, block: ProcessBlock): RuleVerdict {
  const feed = feedOf(block)
  const fieldOfFeed = `${context.path}.technique.electrodes`
  if (feed === null) return cannotTell('Whether one or several electrodes are used is not stated, and the limit of current depends on it.', ['procedure: technique.electrodes'], { field: fieldOfFeed, fixes: [{ kind: 'state', label: 'State the number of electrodes', field: fieldOfFeed }] })
  const opening = figures(context.procedure.joint.rootOpening, 'length', context.system)
  const fillet = context.procedure.joint.weld === 'fillet'
  const lines = block.passes.flatMap((pass, i) => { const { max, min } = figures(pass.current, 'current', context.system); const top = max ?? min; return top === null ? [] : [{ top, kind: fillet ? ('fillet' as const) : passKind(pass, opening), at: `${context.path}.passes.${i}.current`, interval: pass.current }] })
  const own = figures(block.electrical.current, 'current', context.system)
  const ownTop = own.fault ? null : (own.max ?? own.min)
  // A range of the block that reaches above every pass allows more than the passes say.
  if (ownTop !== null && lines.every(({ top }) => ownTop > top)) lines.push({ top: ownTop, kind: fillet ? 'fillet' : null, at: `${context.path}.electrical.current`, interval: block.electrical.current })
  if (lines.length === 0) return cannotTell('The current is not stated.', ['procedure: electrical.current'], { field: `${context.path}.electrical.current`, fixes: [{ kind: 'state', label: 'State the current', field: `${context.path}.electrical.current` }] })
  const asked = { min: 0, max: Math.max(...lines.map(({ top }) => top)) }
  // An unnamed groove pass is held to the strictest row; above that the layer must be known.
  const strict = Math.min(...(['root with opening', 'root without opening', 'fill'] as const).map((kind) => sawCurrent(kind, feed).sure))
  let unsure: string | null = null
  for (const { top, kind, at, interval } of lines) {
    const limit = kind === null ? { sure: strict, maybe: Infinity } : sawCurrent(kind, feed)
    if (top <= limit.sure) continue
    if (top > limit.maybe) return saysByTable(context, 'outside', `${show(top, 'A')} is over the ${show(limit.sure, 'A')} allowed for the ${kind ?? ''}${kind === 'fillet' ? '' : ' pass'} with one electrode.`, { asked, range: between('current', 'A', UNLIMITED, closed(limit.sure)), field: at, fixes: cures(interval, at, between('current', 'A', UNLIMITED, closed(limit.sure))) })
    unsure = kind === null ? `${show(top, 'A')} is over the ${show(limit.sure, 'A')} of the strictest pass; state the current of each pass with its layer.` : `${show(top, 'A')} is over the ${show(limit.sure, 'A')} allowed for parallel electrodes (${kind}); multiple electrodes with a power source each have no limit. Which it is, is not recorded.`
  }
  return unsure === null ? saysByTable(context, 'within', `${show(asked.max, 'A')} is not over the current allowed.`, { asked }) : cannotTell(unsure, ['procedure: passes with their layer, or how the electrodes are fed'], { asked, field: `${context.path}.passes` })
}

export const pqCurrent = condition({
  file: 'current', title: 'Largest current', clause: 'Table 5.1', basis: 'read', source: TABLE_5_1, field: 'electrical.current', at: 'block', more: FOUR,
  statement: 'SMAW, GMAW and FCAW stay within the range that the maker of the electrode recommends; submerged arc within the figures of the table for each pass.',
  check(context, block) {
    if (block.process === 'SAW') return sawCurrentVerdict(context, block)
    const field = `${context.path}.electrical.makerCurrent`
    const maker = figures(block.electrical.makerCurrent, 'current', context.system)
    const lines = [{ interval: block.electrical.current, at: `${context.path}.electrical.current` }, ...block.passes.map((pass, i) => ({ interval: pass.current, at: `${context.path}.passes.${i}.current` }))].filter(({ interval }) => isStated(interval))
    const stated = lines.map(({ interval }) => figures(interval, 'current', context.system))
    if (stated.length === 0 || stated.some(({ fault }) => fault)) return cannotTell('The current is not stated, or contradicts itself.', ['procedure: electrical.current'], { field: `${context.path}.electrical.current`, fixes: [{ kind: 'state', label: 'State the current', field: `${context.path}.electrical.current` }] })
    const asked = { min: Math.min(...stated.map(({ min, max, all }) => (all ? -Infinity : (min ?? max ?? 0)))), max: Math.max(...stated.map(({ min, max, all }) => (all ? Infinity : (max ?? min ?? 0)))) }
    const told = { min: Number.isFinite(asked.min) ? asked.min : null, max: Number.isFinite(asked.max) ? asked.max : null }
    if (maker.min === null || maker.max === null) return cannotTell('The current must stay in the range that the maker of the electrode recommends, which the procedure does not state.', ['procedure: electrical.makerCurrent'], { field, asked: told, fixes: [{ kind: 'state', label: "State the maker's range of current", field }] })
    const range = between('current', 'A', closed(maker.min), closed(maker.max))
    const inside = asked.min >= maker.min - EPSILON && asked.max <= maker.max + EPSILON
    const words = `${show(maker.min, 'A')} to ${show(maker.max, 'A')} that the maker recommends`
    return inside ? saysByTable(context, 'within', `The current lies inside the ${words}.`, { asked: told, range }) : saysByTable(context, 'outside', `The current goes beyond the ${words}.`, { asked: told, range, fixes: lines.flatMap(({ interval, at }) => cures(interval, at, range)) })
  },
})
