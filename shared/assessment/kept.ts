/**
 * What is worked out of a coupon once and kept beside it: its sides, what it proves, its contradictions and those ranges that did
 * not look at the procedure. A coupon stays the same while a procedure is edited, or while one is compared with thousands.
 * A record is never changed in place: whoever edits one makes another object.
 */
import type { AssessedCoupon, QualifiedRange } from '../schemas/assessment.ts'
import type { ProcessBlock } from '../schemas/welding.ts'
import type { CouponSide, Rule, RuleContext, RuleRange, Standard } from '../standards/rule.ts'
import { contradictions, type Contradiction } from './contradictions.ts'
import type { PreparedEdition, PreparedRule } from './prepare.ts'
import { lasting } from './remembered.ts'

/** One rule's range of a side, with the step of the reasoning that tells of it. */
export interface KeptRange {
  given: RuleRange | null
  step: string | null
  /** As an assessment told it last; undefined where the range itself is not kept. */
  told: QualifiedRange | null | undefined
}

/** The ranges of a side under one edition, for one level, unit system and toughness. */
interface GridOf {
  prepared: PreparedEdition
  level: RuleContext['level']
  system: RuleContext['system']
  toughness: RuleContext['toughness']
  ranges: Grid
}

/** By the rule's place in the edition; `DEPENDS` where it looks at the procedure, undefined = not asked yet. */
export type Grid = (KeptRange | typeof DEPENDS | undefined)[]

export const DEPENDS = 'depends on the procedure'

export interface KeptSide extends CouponSide { grids: GridOf[] }

export interface KeptCoupon {
  coupon: AssessedCoupon
  weld: KeptSide
  /** One for each process block that names its process. */
  blocks: readonly KeptSide[]
}

const byStandard = new WeakMap<Standard, WeakMap<AssessedCoupon['content'], KeptCoupon>>()

/** What is kept of a coupon under a standard; made anew where the record has another identity, number or state. */
export function keptCoupon(standard: Standard, coupon: AssessedCoupon): KeptCoupon {
  let known = byStandard.get(standard)
  if (!known) {
    known = new WeakMap()
    byStandard.set(standard, known)
  }
  let kept = known.get(coupon.content)
  if (kept === undefined || !isSame(kept.coupon, coupon)) {
    const role = standard.role(coupon)
    const { variables } = coupon.content
    const side = (block: ProcessBlock | null): KeptSide => ({ coupon, variables, block, role, grids: [] })
    kept = { coupon, weld: side(null), blocks: variables.processes.flatMap((block) => (block.process === null ? [] : [side(block)])) }
    known.set(coupon.content, kept)
  }
  return kept
}

const isSame = (a: AssessedCoupon, b: AssessedCoupon): boolean => a === b || (a.id === b.id && a.number === b.number && a.certified === b.certified)

/** Sides of coupons for a block: their blocks of the same process, or the weld as a whole. */
export function sidesOf(standard: Standard, coupons: readonly AssessedCoupon[], block: ProcessBlock | null): KeptSide[] {
  const sides: KeptSide[] = []
  for (const coupon of coupons) {
    const kept = keptCoupon(standard, coupon)
    if (block === null) sides.push(kept.weld)
    else for (const side of kept.blocks) if (side.block?.process === block.process) sides.push(side)
  }
  return sides
}

/** The side's ranges under the edition and what else of the context a range may depend on without looking at the procedure. */
export function gridOf(side: KeptSide, prepared: PreparedEdition, { level, system, toughness }: RuleContext): Grid {
  for (const grid of side.grids) if (grid.prepared === prepared && grid.toughness === toughness && grid.system === system && grid.level === level) return grid.ranges
  const grid: GridOf = { prepared, level, system, toughness, ranges: new Array<Grid[number]>(prepared.size) }
  side.grids.push(grid)
  return grid.ranges
}

/**
 * A rule's range of a side: kept where working it out did not look at the procedure, its block or the other coupons, so that
 * it is the same for every procedure.
 */
export function rangeOf(grid: Grid, { rule, place }: PreparedRule, context: RuleContext, side: KeptSide): KeptRange {
  const known = grid[place]
  if (known === DEPENDS) return withStep(rule.range(context, side), side)
  if (known !== undefined) return known
  const watched = watch(context)
  const made = withStep(rule.range(watched.context, side), side)
  if (watched.looked()) {
    grid[place] = DEPENDS
    return made
  }
  const kept: KeptRange = { ...lasting(made), told: null }
  grid[place] = kept
  return kept
}

const withStep = (given: RuleRange | null, side: CouponSide): KeptRange => ({ given, step: given === null ? null : `${side.coupon.number}: ${given.reason}`, told: undefined })

/** The context, and whether anything was read of it that differs from procedure to procedure. Its properties are its own, so that a copy of it counts as looking. */
function watch(context: RuleContext): { context: RuleContext; looked: () => boolean } {
  const { edition, level, system, toughness, route } = context
  let looked = false
  const see = <K extends 'procedure' | 'block' | 'coupons' | 'path'>(key: K): RuleContext[K] => {
    looked = true
    return context[key]
  }
  return {
    context: { edition, level, system, toughness, route, get procedure() { return see('procedure') }, get block() { return see('block') }, get coupons() { return see('coupons') }, get path() { return see('path') } },
    looked: () => looked,
  }
}

const contradictionsOf = new WeakMap<AssessedCoupon['content'], readonly Contradiction[]>()

/** What in a coupon's record contradicts itself. */
export function couponContradictions({ content }: AssessedCoupon): readonly Contradiction[] {
  let found = contradictionsOf.get(content)
  if (found === undefined) {
    found = contradictions(content.variables, true)
    contradictionsOf.set(content, found)
  }
  return found
}

/** Whether a rule of this side covers what the procedure asks, without another coupon. */
export function coversAlone(rule: Rule, context: RuleContext, side: KeptSide, range: KeptRange): boolean {
  return rule.check(context, [side], range.given?.range ?? null)?.verdict === 'within'
}
