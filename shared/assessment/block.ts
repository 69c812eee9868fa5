/**
 * One process block (or the weld as a whole) against its coupons. Order of judgement:
 * 1. `each` variables, coupon by coupon: the coupons that cover all of them agree and may act together;
 * 2. `jointly` variables: a coupon that covers alone is preferred, else agreeing ones together;
 * 3. `union` variables: the ranges of the agreeing coupons join.
 * With toughness, supplementary variables are judged by the coupons that carry toughness tests.
 */
import { unionAll } from '../ranges/span.ts'
import type { AssessedCoupon, Basis, Finding, Fix, QualifiedRange, QualifiedSpan, VariableClass } from '../schemas/assessment.ts'
import { weakest } from '../standards/common/rule-kinds.ts'
import { capital, list, names } from '../standards/common/wording.ts'
import type { CouponSide, Rule, RuleContext, RuleRange, RuleVerdict, Standard } from '../standards/rule.ts'
import { classBasis, effectiveClass, type PreparedEdition, type PreparedRule } from './prepare.ts'

export interface BlockJudgement { findings: Finding[]; ranges: QualifiedRange[] }

interface Item { rule: Rule; class: VariableClass; basis: Basis }
type Judged = RuleVerdict | null

interface Run {
  standard: Standard
  context: RuleContext
  sides: readonly CouponSide[]
  others: readonly AssessedCoupon[]
  out: BlockJudgement
  /** Each coupon's range of each rule, worked out once. */
  known: Map<Rule, Map<CouponSide, RuleRange | null>>
}

/** Sides of a coupon for a block: its blocks of the same process, or the weld as a whole. */
export function sidesOf(standard: Standard, coupons: readonly AssessedCoupon[], context: Pick<RuleContext, 'block'>): CouponSide[] {
  const sides: CouponSide[] = []
  for (const coupon of coupons) {
    const { variables } = coupon.content
    const role = standard.role(coupon)
    if (!context.block) sides.push({ coupon, variables, block: null, role })
    else for (const block of variables.processes) if (block.process !== null && block.process === context.block.process) sides.push({ coupon, variables, block, role })
  }
  return sides
}

/** Judges one block. @returns its findings, and every range of every coupon that was asked */
export function judgeBlock(standard: Standard, prepared: PreparedEdition, context: RuleContext, others: readonly AssessedCoupon[]): BlockJudgement {
  const out: BlockJudgement = { findings: [], ranges: [] }
  const rules = rulesFor(standard, prepared, context)
  if (rules.length === 0) return out
  const run: Run = { standard, context, sides: sidesOf(standard, context.coupons, context), others, out, known: new Map() }
  const each: Item[] = []
  const joint: Item[] = []
  const union: Item[] = []
  for (const { rule, class: ruleClass, classBasis: basis } of rules) {
    const item: Item = { rule, class: effectiveClass(ruleClass, context.toughness), basis }
    if (item.class === 'not-a-variable') notAVariable(run, item)
    else if (item.class === 'nonessential' || rule.meta.withoutCoupon) alone(run, item)
    else if (run.sides.length === 0) unsupported(run, item)
    else (rule.meta.combine === 'each' ? each : rule.meta.combine === 'jointly' ? joint : union).push(item)
  }
  if (each.length + joint.length + union.length > 0) judgeWithCoupons(run, each, joint, union)
  return out
}

/** For the weld as a whole a rule takes its class from the first process that has one. */
function rulesFor(standard: Standard, prepared: PreparedEdition, context: RuleContext): readonly PreparedRule[] {
  if (context.block) return (context.block.process && prepared.byProcess.get(context.block.process)) || []
  const rules: PreparedRule[] = []
  for (const rule of prepared.weld) {
    const process = context.procedure.processes.find((block) => block.process && rule.meta.classes[block.process])?.process
    const ruleClass = process ? rule.meta.classes[process] : undefined
    if (process && ruleClass && standard.processes.includes(process)) rules.push({ rule, class: ruleClass, classBasis: classBasis(rule, process) })
  }
  return rules
}

function rangeOf(run: Run, rule: Rule, side: CouponSide): RuleRange | null {
  let row = run.known.get(rule)
  if (!row) {
    row = new Map<CouponSide, RuleRange | null>()
    run.known.set(rule, row)
  }
  let range = row.get(side)
  if (range === undefined) {
    range = rule.range(run.context, side)
    row.set(side, range)
  }
  return range
}

interface Single { range: RuleRange | null; judged: Judged }

function judgeWithCoupons(run: Run, each: readonly Item[], joint: readonly Item[], union: readonly Item[]): void {
  const { context, sides } = run
  // Toughness coupons answer for supplementary variables; a purely mechanical record can't have recorded them.
  const tough = context.toughness === true ? sides.filter((side) => side.role !== 'mechanical') : sides
  const judgesSupplementary = tough.length > 0 ? tough : sides
  const grid = new Map<Item, Map<CouponSide, Single>>()
  for (const item of each) {
    const row = new Map<CouponSide, Single>()
    for (const side of item.class === 'supplementary' ? judgesSupplementary : sides) {
      const range = rangeOf(run, item.rule, side)
      row.set(side, { range, judged: item.rule.check(context, [side], range?.range ?? null) })
    }
    grid.set(item, row)
  }
  const verdictsOf = (side: CouponSide, ofClass: VariableClass): Single[] => each.filter((item) => item.class === ofClass).flatMap((item) => grid.get(item)?.get(side) ?? [])
  const agrees = (side: CouponSide, ofClass: VariableClass): boolean => each.every((item) => item.class !== ofClass || verdictIs(grid.get(item)?.get(side)))
  const essential = sides.filter((side) => agrees(side, 'essential'))
  let supplementary = judgesSupplementary.filter((side) => essential.includes(side) && agrees(side, 'supplementary'))
  const lead = pickLead(sides, (side) => [...verdictsOf(side, 'essential'), ...verdictsOf(side, 'supplementary')])
  const toughLead = pickLead(essential.some((side) => judgesSupplementary.includes(side)) ? judgesSupplementary.filter((side) => essential.includes(side)) : judgesSupplementary, (side) => verdictsOf(side, 'supplementary'))

  for (const item of each) {
    const row = grid.get(item)
    const group = item.class === 'essential' ? essential : supplementary
    const chosen = group.length > 0 ? group : [item.class === 'essential' ? lead : toughLead].filter((side) => side !== null)
    const first = chosen[0] && row?.get(chosen[0])
    if (row) for (const [side, { range }] of row) pushRange(run, item, side, range)
    if (first) pushFinding(run, item, chosen, first.judged, chosen.length < sides.length && group.length === 0 ? [`No linked coupon covers every variable of this process by itself; ${names(chosen)} comes nearest.`] : [])
  }

  for (const item of joint) {
    const candidates = supplementary.length > 0 ? supplementary : toughLead ? [toughLead] : []
    const ranges = candidates.map((side) => rangeOf(run, item.rule, side))
    candidates.forEach((side, i) => pushRange(run, item, side, ranges[i] ?? null))
    const alones = candidates.filter((side, i) => verdictIs({ range: ranges[i] ?? null, judged: item.rule.check(context, [side], ranges[i]?.range ?? null) }))
    const used = alones.length > 0 ? alones : candidates
    const judged = item.rule.check(context, used, joinRanges(run, item.rule, used))
    if (alones.length > 0) supplementary = alones
    pushFinding(run, item, used, judged, [])
  }

  const canFail = (side: CouponSide): boolean => each.some((item) => grid.get(item)?.get(side)?.judged?.verdict === 'outside')
  for (const item of union) {
    const mechanical = item.class === 'essential'
    let used = context.toughness !== true ? essential : essential.filter((side) => (side.role === 'mechanical' ? true : supplementary.length === 0 || supplementary.includes(side)))
    if (context.toughness !== true && !mechanical) used = supplementary
    if (mechanical && used.some((side) => side.role !== 'toughness-only')) used = used.filter((side) => side.role !== 'toughness-only')
    if (used.length === 0 && lead) used = [lead]
    for (const side of sides) pushRange(run, item, side, rangeOf(run, item.rule, side))
    const judged = item.rule.check(context, used, joinRanges(run, item.rule, used))
    const maybe = judged && judged.verdict === 'outside' && sides.length > used.length ? sides.filter((side) => !used.includes(side) && !canFail(side) && side.role !== 'toughness-only') : []
    if (judged && maybe.length > 0) {
      const pool = canFail(used[0] as CouponSide) ? maybe : [...used, ...maybe]
      const wider = item.rule.check(context, pool, joinRanges(run, item.rule, pool))
      if (wider && wider.verdict !== 'outside') {
        const missing = maybe.flatMap((side) => each.flatMap((other) => grid.get(other)?.get(side)?.judged?.missing ?? []))
        pushFinding(run, item, pool, { ...wider, verdict: 'cannot-tell', sentence: `${wider.sentence} But whether ${names(maybe)} agrees in the other variables can't be told yet.`, missing: [...new Set([...(wider.missing ?? []), ...missing])] }, [])
        continue
      }
    }
    pushFinding(run, item, used, judged, used.length > 1 ? [`${names(used)} agree in the other variables, so their ranges join; a gap stays uncovered.`] : [])
  }
}

const verdictIs = (single: Single | undefined): boolean => !single || single.judged === null || single.judged.verdict === 'within'

/** The coupon that comes nearest: fewest variables outside, then fewest that can't be told, then as linked. */
function pickLead(sides: readonly CouponSide[], verdicts: (side: CouponSide) => readonly Single[]): CouponSide | null {
  if (sides.length < 2) return sides[0] ?? null
  let best: CouponSide | null = null
  let bestScore = Infinity
  for (const side of sides) {
    let score = 0
    for (const { judged } of verdicts(side)) score += judged === null || judged.verdict === 'within' ? 0 : judged.verdict === 'outside' ? 1000 : 1
    if (score < bestScore) {
      best = side
      bestScore = score
    }
  }
  return best
}

function joinRanges(run: Run, rule: Rule, sides: readonly CouponSide[]): QualifiedSpan | null {
  const ranges = sides.map((side) => rangeOf(run, rule, side))
  if (rule.join) return rule.join(run.context, sides, ranges)
  return unionAll(ranges.flatMap((range) => (range ? [range.range] : [])))
}

function pushRange(run: Run, item: Item, side: CouponSide, given: RuleRange | null): void {
  if (!given) return
  const { rule } = item
  run.out.ranges.push({
    ruleId: rule.meta.id,
    variable: rule.meta.title,
    label: rule.label,
    field: fieldOf(run.context, rule),
    processId: run.context.block?.id ?? null,
    process: run.context.block?.process ?? null,
    class: item.class,
    range: given.range,
    tested: given.tested,
    couponId: side.coupon.id,
    clause: given.clause ?? rule.meta.clause,
    basis: weakest(given.basis ?? rule.meta.basis, item.basis),
    reason: given.reason,
  })
}

const fieldOf = (context: RuleContext, rule: Rule): string => (rule.at === 'block' && context.path ? `${context.path}.${rule.field}` : rule.field)

function pushFinding(run: Run, item: Item, sides: readonly CouponSide[], judged: Judged, notes: readonly string[]): void {
  if (!judged) return
  const { rule } = item
  const tentative = item.class === 'supplementary' && run.context.toughness === null && judged.verdict === 'outside'
  const verdict = tentative ? 'cannot-tell' : judged.verdict
  const fixes: Fix[] = tentative ? [{ kind: 'state', label: 'State whether toughness is required', field: 'toughnessRequired' }, ...(judged.fixes ?? [])] : [...(judged.fixes ?? [])]
  if (verdict !== 'within' && run.others.length > 0 && item.class !== 'nonessential') offerOthers(run, rule, fixes)
  const tested: Finding['tested'] = judged.tested ? [...judged.tested] : []
  if (!judged.tested) {
    for (const side of sides) {
      const value = rangeOf(run, rule, side)?.tested
      if (value !== null && value !== undefined) tested.push(value)
    }
  }
  run.out.findings.push({
    ruleId: rule.meta.id,
    standard: run.standard.id,
    edition: run.context.edition,
    clause: judged.clause ?? rule.meta.clause,
    title: rule.meta.title,
    verdict,
    class: judged.class ?? item.class,
    field: judged.field ?? fieldOf(run.context, rule),
    processId: run.context.block?.id ?? null,
    sentence: tentative ? `${judged.sentence} It matters only if toughness is required, which isn't stated.` : judged.sentence,
    asked: judged.asked,
    range: judged.range,
    tested,
    couponIds: [...new Set(sides.map((side) => side.coupon.id))],
    missing: tentative ? ['procedure: toughnessRequired', ...(judged.missing ?? [])] : missingOf(run, rule, sides, judged),
    fixes,
    basis: weakest(judged.basis ?? rule.meta.basis, item.basis),
    source: rule.meta.source,
    reasoning: [...steps(run, rule, sides), ...(judged.reasoning ?? []), ...notes],
  })
}

/** Of the coupons only those that lack something are named; what the procedure lacks stays. */
function missingOf(run: Run, rule: Rule, sides: readonly CouponSide[], judged: RuleVerdict): string[] {
  const told = judged.missing ?? []
  if (judged.verdict !== 'cannot-tell') return [...told]
  const lacking = sides.flatMap((side) => rangeOf(run, rule, side)?.missing ?? [])
  return lacking.length === 0 ? [...told] : [...new Set([...told.filter((text) => text.startsWith('procedure')), ...lacking])]
}

/** From each coupon's value to its range, for the opened reasoning. */
function steps(run: Run, rule: Rule, sides: readonly CouponSide[]): string[] {
  const told: string[] = []
  for (const side of sides) {
    const range = rangeOf(run, rule, side)
    if (range) told.push(`${side.coupon.number}: ${range.reason}`)
    if (side.variables.unitSystem !== run.context.system) told.push(`${side.coupon.number} is recorded in ${side.variables.unitSystem} units; it is judged by the ${run.context.system} figures, as the procedure is.`)
  }
  return told
}

/** Stored coupons that would cover this variable. */
function offerOthers(run: Run, rule: Rule, fixes: Fix[]): void {
  let offered = 0
  for (const side of sidesOf(run.standard, run.others, run.context)) {
    if (offered === 3 || run.sides.some((linked) => linked.coupon.id === side.coupon.id)) continue
    const judged = rule.check(run.context, [side], rangeOf(run, rule, side)?.range ?? null)
    if (judged?.verdict !== 'within' || fixes.some((fix) => fix.kind === 'link-coupon' && fix.couponId === side.coupon.id)) continue
    fixes.push({ kind: 'link-coupon', label: `Link ${side.coupon.number}, which covers it`, couponId: side.coupon.id })
    offered += 1
  }
}

/** The procedure's own value, or a rule that needs no coupon. */
function alone(run: Run, item: Item): void {
  pushFinding(run, item, run.sides, item.rule.check(run.context, run.sides, null), [])
}

function notAVariable(run: Run, item: Item): void {
  if (item.rule.applies && !item.rule.applies(run.context)) return
  pushFinding(run, item, [], { verdict: 'within', sentence: `${item.rule.label} is no variable here, because toughness is not required.`, asked: null, range: null, tested: [] }, [])
}

function unsupported(run: Run, item: Item): void {
  if (item.rule.applies && !item.rule.applies(run.context)) return
  const process = run.context.block?.process ?? 'this weld'
  const why = run.context.coupons.length === 0 ? 'no coupon is linked' : `none of ${list([...new Set(run.context.coupons.map((coupon) => coupon.number))])} was welded with ${process}`
  pushFinding(run, item, [], { verdict: 'cannot-tell', sentence: `${capital(item.rule.label)} can't be judged: no coupon supports this process (${why}).`, asked: null, range: null, tested: [], missing: [`a coupon welded with ${process}`], fixes: [{ kind: 'plan-coupon', label: `Weld a coupon with ${process}`, requirement: `A coupon welded with ${process}.` }] }, [])
}
