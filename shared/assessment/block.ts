/**
 * One process block (or the weld as a whole) against its coupons. Order of judgement:
 * 1. `each` variables, coupon by coupon: the coupons that cover all of them agree and may act together;
 * 2. `jointly` variables: a coupon that covers alone is preferred, else agreeing ones together;
 * 3. `union` variables: the ranges of the agreeing coupons join.
 * With toughness, supplementary variables are judged by the coupons that carry toughness tests.
 */
import { unionAll } from '../ranges/span.ts'
import type { AssessedCoupon, Finding, Fix, QualifiedRange, QualifiedSpan, VariableClass } from '../schemas/assessment.ts'
import { weakest } from '../standards/common/rule-kinds.ts'
import { capital, distinct, list, names } from '../standards/common/wording.ts'
import type { CouponSide, Rule, RuleContext, RuleVerdict, Standard } from '../standards/rule.ts'
import { coversAlone, gridOf, rangeOf as keptRangeOf, sidesOf, type Grid, type KeptFinding, type KeptRange, type KeptSide } from './kept.ts'
import { effectiveClass, fieldOf, type PreparedEdition, type PreparedRule } from './prepare.ts'

export interface BlockJudgement { findings: Finding[]; ranges: QualifiedRange[] }

/** A side with its place in the run and how it has fared so far among the `each` variables. */
interface Linked extends CouponSide {
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

interface Item {
  prepared: PreparedRule
  rule: Rule
  class: VariableClass
  field: string
  /** Where its row starts in the run's grids. */
  row: number
}

type Judged = RuleVerdict | null

interface Run {
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
  /** Grids of items by sides, row after row; undefined = not asked yet. Each range is worked out once. */
  ranges: (KeptRange | undefined)[]
  judged: (Judged | undefined)[]
}

function link(prepared: PreparedEdition, context: RuleContext, kept: KeptSide, index: number): Linked {
  const alone: Linked[] = []
  const { coupon, variables, block, role } = kept
  const linked: Linked = { coupon, variables, block, role, index, kept, grid: gridOf(kept, prepared, context), alone, essentialOutside: 0, essentialUnsure: 0, supplementaryOutside: 0, supplementaryUnsure: 0 }
  alone.push(linked)
  return linked
}

/**
 * Judges one block.
 * @param out takes its findings, and every range of every coupon that was asked
 */
export function judgeBlock(standard: Standard, prepared: PreparedEdition, context: RuleContext, others: readonly AssessedCoupon[], out: BlockJudgement): void {
  const rules = rulesFor(prepared, context)
  if (rules.length === 0) return
  const sides: Linked[] = []
  for (const kept of sidesOf(standard, context.coupons, context.block)) sides.push(link(prepared, context, kept, sides.length))
  const cells = rules.length * sides.length
  const run: Run = { standard, prepared, context, sides, others, otherSides: null, out, named: null, ids: [], ranges: new Array<KeptRange | undefined>(cells), judged: new Array<Judged | undefined>(cells) }
  const each: Item[] = []
  const joint: Item[] = []
  const union: Item[] = []
  let row = 0
  for (const own of rules) {
    const { rule } = own
    const item: Item = { prepared: own, rule, class: effectiveClass(own.class, context.toughness), field: fieldOf(own, context.path), row }
    row += sides.length
    if (item.class === 'not-a-variable') notAVariable(run, item)
    else if (item.class === 'nonessential' || rule.meta.withoutCoupon) alone(run, item)
    else if (sides.length === 0) unsupported(run, item)
    else (rule.meta.combine === 'each' ? each : rule.meta.combine === 'jointly' ? joint : union).push(item)
  }
  if (each.length + joint.length + union.length > 0) judgeWithCoupons(run, each, joint, union)
}

/** For the weld as a whole a rule takes its class from the first process that has one. */
function rulesFor(prepared: PreparedEdition, context: RuleContext): readonly PreparedRule[] {
  if (context.block) return (context.block.process && prepared.byProcess.get(context.block.process)) || []
  const rules: PreparedRule[] = []
  for (const { byProcess } of prepared.weld) {
    const first = context.procedure.processes.find((block) => block.process && byProcess.has(block.process))?.process
    const own = first && byProcess.get(first)
    if (own) rules.push(own)
  }
  return rules
}

function rangeOf(run: Run, item: Item, side: Linked): KeptRange {
  const at = item.row + side.index
  let range = run.ranges[at]
  if (range === undefined) {
    range = keptRangeOf(side.grid, item.prepared, run.context, side.kept)
    run.ranges[at] = range
  }
  return range
}

const spanOf = (run: Run, item: Item, side: Linked): QualifiedSpan | null => {
  const { given } = rangeOf(run, item, side)
  return given === null ? null : given.range
}

const isWithin = (judged: Judged | undefined): boolean => !judged || judged.verdict === 'within'
const agreesEssential = (side: Linked): boolean => side.essentialOutside + side.essentialUnsure === 0
const agreesSupplementary = (side: Linked): boolean => side.supplementaryOutside + side.supplementaryUnsure === 0
const canFail = (side: Linked): boolean => side.essentialOutside + side.supplementaryOutside > 0
const hasMechanical = (side: CouponSide): boolean => side.role !== 'toughness-only'
const carriesToughness = (side: CouponSide): boolean => side.role !== 'mechanical'

/** Judges one coupon by one `each` variable and keeps how it fared. */
function judgeAlone(run: Run, item: Item, side: Linked): void {
  const judged = item.rule.check(run.context, side.alone, spanOf(run, item, side))
  run.judged[item.row + side.index] = judged
  if (judged === null || judged.verdict === 'within') return
  if (item.class === 'supplementary') {
    if (judged.verdict === 'outside') side.supplementaryOutside += 1
    else side.supplementaryUnsure += 1
  } else if (judged.verdict === 'outside') side.essentialOutside += 1
  else side.essentialUnsure += 1
}

function judgeWithCoupons(run: Run, each: readonly Item[], joint: readonly Item[], union: readonly Item[]): void {
  const { context, sides } = run
  // Toughness coupons answer for supplementary variables; a purely mechanical record can't have recorded them.
  const tough = context.toughness === true ? sides.filter(carriesToughness) : sides
  const judgesSupplementary = tough.length > 0 ? tough : sides
  for (const item of each) for (const side of item.class === 'supplementary' ? judgesSupplementary : sides) judgeAlone(run, item, side)
  const essential = sides.filter(agreesEssential)
  let supplementary: readonly Linked[] = judgesSupplementary.filter((side) => agreesEssential(side) && agreesSupplementary(side))
  const lead = pickLead(sides, true)
  const toughAgreeing = judgesSupplementary.filter(agreesEssential)
  const toughLead = pickLead(toughAgreeing.length > 0 ? toughAgreeing : judgesSupplementary, false)

  for (const item of each) {
    const group = item.class === 'essential' ? essential : supplementary
    const nearest = item.class === 'essential' ? lead : toughLead
    const chosen = group.length > 0 ? group : nearest ? nearest.alone : []
    for (const side of sides) if (run.judged[item.row + side.index] !== undefined) pushRange(run, item, side)
    const first = chosen[0]
    const judged = first && run.judged[item.row + first.index]
    if (judged) pushFinding(run, item, chosen, judged, chosen.length < sides.length && group.length === 0 ? `No linked coupon covers every variable of this process by itself; ${names(chosen)} comes nearest.` : null)
  }

  for (const item of joint) {
    const candidates = supplementary.length > 0 ? supplementary : toughLead ? toughLead.alone : []
    for (const side of candidates) pushRange(run, item, side)
    const alones = candidates.filter((side) => isWithin(item.rule.check(context, side.alone, spanOf(run, item, side))))
    const used = alones.length > 0 ? alones : candidates
    const judged = item.rule.check(context, used, joinRanges(run, item, used))
    if (alones.length > 0) supplementary = alones
    pushFinding(run, item, used, judged, null)
  }

  if (union.length > 0) judgeUnion(run, each, union, { essential, supplementary, lead })
}

interface Groups { essential: readonly Linked[]; supplementary: readonly Linked[]; lead: Linked | null }

/** The coupons whose ranges join for a variable of that class. */
function joining(toughness: boolean | null, essentialClass: boolean, { essential, supplementary, lead }: Groups): readonly Linked[] {
  let used = essential
  if (toughness === true) used = essential.filter((side) => side.role === 'mechanical' || supplementary.length === 0 || supplementary.includes(side))
  else if (!essentialClass) used = supplementary
  if (essentialClass && used.some(hasMechanical)) used = used.filter(hasMechanical)
  return used.length === 0 && lead ? lead.alone : used
}

function judgeUnion(run: Run, each: readonly Item[], union: readonly Item[], groups: Groups): void {
  const { context, sides } = run
  const byClass = [joining(context.toughness, true, groups), joining(context.toughness, false, groups)] as const
  for (const item of union) {
    const used = item.class === 'essential' ? byClass[0] : byClass[1]
    for (const side of sides) pushRange(run, item, side)
    const judged = item.rule.check(context, used, joinRanges(run, item, used))
    const maybe = judged && judged.verdict === 'outside' && sides.length > used.length ? sides.filter((side) => !used.includes(side) && !canFail(side) && hasMechanical(side)) : []
    if (judged && maybe.length > 0) {
      const pool = used[0] && !canFail(used[0]) ? [...used, ...maybe] : maybe
      const wider = item.rule.check(context, pool, joinRanges(run, item, pool))
      if (wider && wider.verdict !== 'outside') {
        const missing = maybe.flatMap((side) => each.flatMap((other) => run.judged[other.row + side.index]?.missing ?? []))
        pushFinding(run, item, pool, { ...wider, verdict: 'cannot-tell', sentence: `${wider.sentence} But whether ${names(maybe)} agrees in the other variables can't be told yet.`, missing: [...new Set([...(wider.missing ?? []), ...missing])] }, null)
        continue
      }
    }
    pushFinding(run, item, used, judged, used.length > 1 ? `${names(used)} agree in the other variables, so their ranges join; a gap stays uncovered.` : null)
  }
}

/** The coupon that comes nearest: fewest variables outside, then fewest that can't be told, then as linked. */
function pickLead(sides: readonly Linked[], withEssential: boolean): Linked | null {
  let best: Linked | null = null
  let bestScore = Infinity
  for (const side of sides) {
    const score = side.supplementaryOutside * 1000 + side.supplementaryUnsure + (withEssential ? side.essentialOutside * 1000 + side.essentialUnsure : 0)
    if (score < bestScore) {
      best = side
      bestScore = score
    }
  }
  return best
}

function joinRanges(run: Run, item: Item, sides: readonly Linked[]): QualifiedSpan | null {
  const { rule } = item
  if (rule.join) return rule.join(run.context, sides, sides.map((side) => rangeOf(run, item, side).given))
  const spans: QualifiedSpan[] = []
  for (const side of sides) {
    const span = spanOf(run, item, side)
    if (span) spans.push(span)
  }
  return unionAll(spans)
}

/** The range as it is told; kept, because mostly it is told again of the same block. */
function pushRange(run: Run, item: Item, side: Linked): void {
  const kept = rangeOf(run, item, side)
  const { given, told } = kept
  if (given === null) return
  const { block } = run.context
  const id = block === null ? null : block.id
  if (told !== null && told.processId === id && told.field === item.field && told.class === item.class) {
    run.out.ranges.push(told)
    return
  }
  const { rule, prepared: { classBasis } } = item
  kept.told = {
    ruleId: rule.meta.id,
    variable: rule.meta.title,
    label: rule.label,
    field: item.field,
    processId: id,
    process: block === null ? null : block.process,
    class: item.class,
    range: given.range,
    tested: given.tested,
    couponId: side.coupon.id,
    clause: given.clause ?? rule.meta.clause,
    basis: given.basis ? weakest(given.basis, classBasis) : classBasis,
    reason: given.reason,
  }
  run.out.ranges.push(kept.told)
}

function pushFinding(run: Run, item: Item, sides: readonly Linked[], judged: Judged, note: string | null): void {
  if (!judged) return
  // What is within and was judged by the very same verdict and ranges is told as it was told last.
  const first = judged.verdict === 'within' && sides[0] ? rangeOf(run, item, sides[0]) : null
  if (first?.finding && isSame(run, item, sides, judged, note, first.finding)) {
    run.out.findings.push(first.finding.finding)
    return
  }
  const finding = findingOf(run, item, sides, judged, note)
  run.out.findings.push(finding)
  // A range that is not kept is another object next time, so nothing would be found on it.
  if (first && sides[0]?.grid[item.prepared.place] === first) first.finding = { finding, judged, note, ranges: sides.map((side) => rangeOf(run, item, side)) }
}

function isSame(run: Run, item: Item, sides: readonly Linked[], judged: RuleVerdict, note: string | null, { finding, judged: before, note: noted, ranges }: KeptFinding): boolean {
  const { block } = run.context
  if (before !== judged || noted !== note || ranges.length !== sides.length || finding.class !== (judged.class ?? item.class) || finding.field !== (judged.field ?? item.field) || finding.processId !== (block === null ? null : block.id)) return false
  for (let i = 0; i < sides.length; i += 1) {
    const side = sides[i]
    if (!side || ranges[i] !== rangeOf(run, item, side)) return false
  }
  return true
}

function findingOf(run: Run, item: Item, sides: readonly Linked[], judged: RuleVerdict, note: string | null): Finding {
  const { context } = run
  const { rule } = item
  const { meta } = rule
  const tentative = item.class === 'supplementary' && context.toughness === null && judged.verdict === 'outside'
  const verdict = tentative ? 'cannot-tell' : judged.verdict
  const fixes: Fix[] = judged.fixes ? [...judged.fixes] : []
  if (tentative) fixes.unshift({ kind: 'state', label: 'State whether toughness is required', field: 'toughnessRequired' })
  if (verdict !== 'within' && run.others.length > 0 && item.class !== 'nonessential') offerOthers(run, item, fixes)
  return {
    ruleId: meta.id,
    standard: run.standard.id,
    edition: context.edition,
    clause: judged.clause ?? meta.clause,
    title: meta.title,
    verdict,
    class: judged.class ?? item.class,
    field: judged.field ?? item.field,
    processId: context.block === null ? null : context.block.id,
    sentence: tentative ? `${judged.sentence} It matters only if toughness is required, which isn't stated.` : judged.sentence,
    asked: judged.asked,
    range: judged.range,
    tested: judged.tested ? [...judged.tested] : testedOf(run, item, sides),
    couponIds: idsOf(run, sides),
    missing: tentative ? ['procedure: toughnessRequired', ...(judged.missing ?? [])] : missingOf(run, item, sides, judged),
    fixes,
    basis: judged.basis ? weakest(judged.basis, item.prepared.classBasis) : item.prepared.classBasis,
    source: meta.source,
    reasoning: stepsOf(run, item, sides, judged, note),
  }
}

const idOf = (side: CouponSide): string => side.coupon.id

function idsOf(run: Run, sides: readonly Linked[]): string[] {
  if (run.named !== sides) {
    run.named = sides
    run.ids = distinct(sides, idOf)
  }
  return run.ids.slice()
}

function testedOf(run: Run, item: Item, sides: readonly Linked[]): Finding['tested'] {
  const tested: Finding['tested'] = []
  for (const side of sides) {
    const { given } = rangeOf(run, item, side)
    if (given !== null && given.tested !== null) tested.push(given.tested)
  }
  return tested
}

/** Of the coupons only those that lack something are named; what the procedure lacks stays. */
function missingOf(run: Run, item: Item, sides: readonly Linked[], judged: RuleVerdict): string[] {
  const told = judged.missing ?? []
  if (judged.verdict !== 'cannot-tell') return [...told]
  const lacking = sides.flatMap((side) => rangeOf(run, item, side).given?.missing ?? [])
  return lacking.length === 0 ? [...told] : [...new Set([...told.filter((text) => text.startsWith('procedure')), ...lacking])]
}

/** From each coupon's value to its range, then the rule's own steps: for the opened reasoning. */
function stepsOf(run: Run, item: Item, sides: readonly Linked[], judged: RuleVerdict, note: string | null): string[] {
  const told: string[] = []
  const { units } = run.standard
  if (units !== undefined && sides.length > 0 && run.context.system !== units) told.push(`The procedure is written in ${run.context.system} units; it is judged by the ${units} figures, the only ones that ${run.standard.shortName} prints.`)
  for (const side of sides) {
    const { step } = rangeOf(run, item, side)
    if (step !== null) told.push(step)
    if (units !== undefined && side.variables.unitSystem !== units) told.push(`${side.coupon.number} is recorded in ${side.variables.unitSystem} units; it is judged by the ${units} figures, the only ones that ${run.standard.shortName} prints.`)
    else if (units === undefined && side.variables.unitSystem !== run.context.system) told.push(`${side.coupon.number} is recorded in ${side.variables.unitSystem} units; it is judged by the ${run.context.system} figures, as the procedure is.`)
  }
  if (judged.reasoning) told.push(...judged.reasoning)
  if (note !== null) told.push(note)
  return told
}

/** Stored coupons that would cover this variable, three at most. */
function offerOthers(run: Run, { prepared }: Item, fixes: Fix[]): void {
  const { context, sides } = run
  run.otherSides ??= sidesOf(run.standard, run.others, context.block).filter((side) => !sides.some((linked) => linked.coupon.id === side.coupon.id))
  let offered = 0
  for (const side of run.otherSides) {
    if (offered === 3) return
    const range = keptRangeOf(gridOf(side, run.prepared, context), prepared, context, side)
    if (!coversAlone(prepared.rule, context, side, range) || fixes.some((fix) => fix.kind === 'link-coupon' && fix.couponId === side.coupon.id)) continue
    fixes.push({ kind: 'link-coupon', label: `Link ${side.coupon.number}, which covers it`, couponId: side.coupon.id })
    offered += 1
  }
}

/** The procedure's own value, or a rule that needs no coupon. */
function alone(run: Run, item: Item): void {
  pushFinding(run, item, run.sides, item.rule.check(run.context, run.sides, null), null)
}

function notAVariable(run: Run, item: Item): void {
  if (item.rule.applies && !item.rule.applies(run.context)) return
  pushFinding(run, item, [], { verdict: 'within', sentence: `${item.rule.label} is no variable here, because toughness is not required.`, asked: null, range: null, tested: [] }, null)
}

function unsupported(run: Run, item: Item): void {
  if (item.rule.applies && !item.rule.applies(run.context)) return
  const process = run.context.block?.process ?? 'this weld'
  const why = run.context.coupons.length === 0 ? 'no coupon is linked' : `none of ${list([...new Set(run.context.coupons.map((coupon) => coupon.number))])} was welded with ${process}`
  pushFinding(run, item, [], { verdict: 'cannot-tell', sentence: `${capital(item.rule.label)} can't be judged: no coupon supports this process (${why}).`, asked: null, range: null, tested: [], missing: [`a coupon welded with ${process}`], fixes: [{ kind: 'plan-coupon', label: `Weld a coupon with ${process}`, requirement: `A coupon welded with ${process}.` }] }, null)
}
