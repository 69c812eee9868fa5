/** One run of a standard's rules over a block, and how its questions are answered: as remembered where the procedure holds the same values. */
import type { AssessedCoupon, Finding, QualifiedRange, QualifiedSpan } from '../schemas/assessment.ts'
import type { CouponSide, RuleContext, Standard } from '../standards/rule.ts'
import { DEPENDS, gridOf, rangeOf as keptRangeOf, type Grid, type KeptRange, type KeptSide } from './kept.ts'
import type { Answer, Item, Plan } from './plan.ts'
import type { PreparedEdition } from './prepare.ts'
import { pathsRead, traceOf, type Reads } from './reads.ts'
import { giveUp, isWorthNoting, keep, lasting, newRemembered, recall } from './remembered.ts'

export interface BlockJudgement { findings: Finding[]; ranges: QualifiedRange[] }

/** A side with its place in the run and how it has fared so far among the `each` variables. */
export interface Linked extends CouponSide {
  index: number
  kept: KeptSide
  /** The side's ranges under the edition that is judged by. */
  grid: Grid
  /** This side alone, as `check` takes it. */
  alone: readonly Linked[]
  essentialOutside: number
  essentialUnsure: number
  supplementaryOutside: number
  supplementaryUnsure: number
}

export interface Run {
  standard: Standard
  prepared: PreparedEdition
  context: RuleContext
  sides: readonly Linked[]
  others: readonly AssessedCoupon[]
  /** Sides of the coupons that are not linked; worked out when first asked for. */
  otherSides: readonly KeptSide[] | null
  out: BlockJudgement
  /** The coupons named last, because neighbouring findings mostly name the same. */
  named: readonly Linked[] | null
  ids: readonly string[]
  /** Ranges that look at the procedure, row after row of the items; undefined = not asked yet. */
  ranges: (KeptRange | undefined)[]
  /** By the item's place. */
  answers: (Answer | undefined)[]
  /** The procedure's values by path; null where nothing is remembered. */
  reads: Reads | null
}

function link(prepared: PreparedEdition, context: RuleContext, kept: KeptSide, index: number): Linked {
  const alone: Linked[] = []
  const { coupon, variables, block, role } = kept
  const linked: Linked = { coupon, variables, block, role, index, kept, grid: gridOf(kept, prepared, context), alone, essentialOutside: 0, essentialUnsure: 0, supplementaryOutside: 0, supplementaryUnsure: 0 }
  alone.push(linked)
  return linked
}

export interface RunOf { standard: Standard; prepared: PreparedEdition; context: RuleContext; others: readonly AssessedCoupon[]; out: BlockJudgement; reads: Reads | null }

export function newRun({ standard, prepared, context, others, out, reads }: RunOf, plan: Plan): Run {
  const sides: Linked[] = []
  for (const kept of plan.sides) sides.push(link(prepared, context, kept, sides.length))
  return { standard, prepared, context, sides, others, otherSides: null, out, named: null, ids: [], ranges: [], answers: new Array<Answer | undefined>(plan.items), reads: sides.length > MOST_BITS ? null : reads }
}

/** Groups of sides are told apart by the bits of a number. */
const MOST_BITS = 30

export function maskOf(sides: readonly Linked[]): number {
  let mask = 0
  for (const { index } of sides) mask |= 1 << index
  return mask
}

/** A rule's range of a side. @param context the run's own, or a watched one: then what it reads is read again */
export function rangeOf(run: Run, item: Item, side: Linked, context: RuleContext = run.context): KeptRange {
  const { place } = item.prepared
  const settled = side.grid[place]
  if (settled !== undefined && settled !== DEPENDS) return settled
  const at = item.row + side.index
  const known = context === run.context ? run.ranges[at] : undefined
  if (known !== undefined) return known
  const range = settled === DEPENDS && context === run.context && run.reads !== null ? rangeByValues(run, item, side, run.reads) : keptRangeOf(side.grid, item.prepared, context, side.kept)
  run.ranges[at] = range
  return range
}

/** A range that looks at the procedure mostly looks at little of it: it is told again although its rule is asked for something else. */
function rangeByValues(run: Run, item: Item, side: Linked, reads: Reads): KeptRange {
  const remembered = (item.ranges[side.index] ??= newRemembered<KeptRange>())
  const known = recall(remembered, reads)
  if (known !== null) return known
  if (reads.traces === 0 || !isWorthNoting(remembered)) return keptRangeOf(side.grid, item.prepared, run.context, side.kept)
  const { trace, context } = traceOf(reads, run.context)
  const range = keptRangeOf(side.grid, item.prepared, context, side.kept)
  const paths = pathsRead(trace, range)
  if (paths !== null) {
    keep(remembered, reads, paths, { ...lasting(range), told: null })
    return range
  }
  giveUp(remembered)
  return keptRangeOf(side.grid, item.prepared, run.context, side.kept)
}

export function spanOf(run: Run, item: Item, side: Linked, context?: RuleContext): QualifiedSpan | null {
  const { given } = rangeOf(run, item, side, context)
  return given === null ? null : given.range
}

/** Puts one question to a rule in a context. */
export type Question = (run: Run, item: Item, sides: readonly Linked[], context: RuleContext) => Pick<Answer, 'judged' | 'used'>

/**
 * The rule's answer about a group of sides: the one it gave before where all that it read is the same now.
 * @param ask is a pure function of the context and the sides
 */
export function answerOf(run: Run, item: Item, sides: readonly Linked[], ask: Question): Answer {
  const { reads } = run
  if (reads === null) return anew(run, item, sides, ask, run.context)
  const mask = maskOf(sides)
  let remembered = item.remembered.get(mask)
  if (remembered === undefined) {
    remembered = newRemembered<Answer>()
    item.remembered.set(mask, remembered)
  }
  const known = recall(remembered, reads)
  if (known !== null) {
    const { ranges } = known
    if (ranges !== null) for (let i = 0; i < ranges.length; i += 1) if (ranges[i] !== undefined) run.ranges[item.row + i] = ranges[i]
    return known
  }
  if (reads.traces === 0 || !isWorthNoting(remembered)) return anew(run, item, sides, ask, run.context)
  const { trace, context } = traceOf(reads, run.context)
  const answer = anew(run, item, sides, ask, context)
  const paths = pathsRead(trace, [answer.judged, answer.ranges])
  if (paths !== null) {
    keep(remembered, reads, paths, keptAnswer(answer))
    return answer
  }
  giveUp(remembered)
  for (const { index } of run.sides) run.ranges[item.row + index] = undefined
  return anew(run, item, sides, ask, run.context)
}

/** Ranges that are kept are told as they were told before. */
const keptAnswer = ({ judged, used, ranges }: Answer): Answer => ({ judged: lasting(judged), used, ranges: ranges === null ? null : ranges.map((range) => range && { ...lasting(range), told: null }), told: [] })

function anew(run: Run, item: Item, sides: readonly Linked[], ask: Question, context: RuleContext): Answer {
  const { judged, used } = ask(run, item, sides, context)
  // A finding tells of the ranges, whether the verdict looked at them or not.
  if (judged.some((one) => one)) for (const side of sides) rangeOf(run, item, side, context)
  return { judged, used, ranges: rangesLooking(run, item, sides), told: null }
}

/** The ranges of the sides asked that looked at the procedure. */
function rangesLooking(run: Run, item: Item, sides: readonly Linked[]): Answer['ranges'] {
  let ranges: (KeptRange | undefined)[] | null = null
  for (const { grid, index } of sides) {
    if (grid[item.prepared.place] !== DEPENDS) continue
    ranges ??= new Array<KeptRange | undefined>(run.sides.length).fill(undefined)
    ranges[index] = run.ranges[item.row + index]
  }
  return ranges
}
