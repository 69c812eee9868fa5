/**
 * One process block (or the weld as a whole) against its coupons. Order of judgement:
 * 1. `each` variables, coupon by coupon: the coupons that cover all of them agree and may act together;
 * 2. `jointly` variables: a coupon that covers alone is preferred, else agreeing ones together;
 * 3. `union` variables: the ranges of the agreeing coupons join.
 * With toughness, supplementary variables are judged by the coupons that carry toughness tests.
 */
import { unionAll } from '../ranges/span.ts'
import type { AssessedCoupon, QualifiedSpan } from '../schemas/assessment.ts'
import { capital, list, names } from '../standards/common/wording.ts'
import type { CouponSide, RuleContext, RuleVerdict, Standard } from '../standards/rule.ts'
import { pushFinding, pushRange } from './findings.ts'
import { planOf, type Answer, type Item, type Judged, type Memory, type Plan } from './plan.ts'
import type { PreparedEdition } from './prepare.ts'
import type { Reads } from './reads.ts'
import { answerOf, newRun, rangeOf, spanOf, type BlockJudgement, type Linked, type Question, type Run } from './run.ts'

/** What is remembered of the linked coupons, and the values of this procedure. */
export interface Remembering { memory: Memory; reads: Reads }

/**
 * Judges one block.
 * @param remembering null where the choice of coupons is new
 * @param out takes its findings, and every range of every coupon that was asked
 */
export function judgeBlock(standard: Standard, prepared: PreparedEdition, context: RuleContext, others: readonly AssessedCoupon[], remembering: Remembering | null, out: BlockJudgement): void {
  const plan = planOf(standard, prepared, context, remembering === null ? null : remembering.memory)
  if (plan.items === 0) return
  const run = newRun({ standard, prepared, context, others, out, reads: remembering === null ? null : remembering.reads }, plan)
  for (const item of plan.direct) {
    const sides = item.manner === 'alone' ? run.sides : NO_SIDES
    const answer = answerOf(run, item, sides, item.manner === 'alone' ? askAlone : item.manner === 'unsupported' ? askUnsupported : askNotAVariable)
    pushFinding(run, item, sides, answer, answer.judged[0] ?? null, null)
  }
  if (plan.each.length + plan.joint.length + plan.union.length > 0) judgeWithCoupons(run, plan)
}

const NO_SIDES: readonly Linked[] = []

const isWithin = (judged: Judged | undefined): boolean => !judged || judged.verdict === 'within'
const agreesEssential = (side: Linked): boolean => side.essentialOutside + side.essentialUnsure === 0
const agreesSupplementary = (side: Linked): boolean => side.supplementaryOutside + side.supplementaryUnsure === 0
const canFail = (side: Linked): boolean => side.essentialOutside + side.supplementaryOutside > 0
const hasMechanical = (side: CouponSide): boolean => side.role !== 'toughness-only'
const carriesToughness = (side: CouponSide): boolean => side.role !== 'mechanical'

/** Each side by itself. */
const askEach: Question = (run, item, sides, context) => {
  const judged = new Array<Judged | undefined>(run.sides.length).fill(undefined)
  for (const side of sides) judged[side.index] = item.rule.check(context, side.alone, spanOf(run, item, side, context))
  return { judged, used: null }
}

/** Those that cover it alone, or else all together. */
const askJointly: Question = (run, item, sides, context) => {
  const alones = sides.filter((side) => isWithin(item.rule.check(context, side.alone, spanOf(run, item, side, context))))
  const used = alones.length > 0 ? alones : sides
  return { judged: [item.rule.check(context, used, joinRanges(run, item, used, context))], used: alones.length > 0 ? alones.map(({ index }) => index) : null }
}

const askTogether: Question = (run, item, sides, context) => ({ judged: [item.rule.check(context, sides, joinRanges(run, item, sides, context))], used: null })

/** The procedure's own value, or a rule that needs no coupon. */
const askAlone: Question = (_, item, sides, context) => ({ judged: [item.rule.check(context, sides, null)], used: null })

const applies = ({ rule }: Item, context: RuleContext): boolean => !rule.applies || rule.applies(context)

const askNotAVariable: Question = (_, item, __, context) => ({
  judged: [applies(item, context) ? { verdict: 'within', sentence: `${item.rule.label} ${/ and /.test(item.rule.label) ? 'are no variables' : 'is no variable'} here, because toughness is not required.`, asked: null, range: null, tested: [] } : null],
  used: null,
})

const askUnsupported: Question = (_, item, __, context) => ({ judged: [applies(item, context) ? unsupported(item, context) : null], used: null })

function unsupported(item: Item, context: RuleContext): RuleVerdict {
  const process = context.block?.process ?? 'this weld'
  const why = context.coupons.length === 0 ? 'no coupon is linked' : `none of ${list([...new Set(context.coupons.map((coupon) => coupon.number))])} was welded with ${process}`
  return { verdict: 'cannot-tell', sentence: `${capital(item.rule.label)} can't be judged: no coupon supports this process (${why}).`, asked: null, range: null, tested: [], missing: [`a coupon welded with ${process}`], fixes: [{ kind: 'plan-coupon', label: `Weld a coupon with ${process}`, requirement: `A coupon welded with ${process}.` }] }
}

/** Counts how one coupon fared by one `each` variable. */
function tally(item: Item, side: Linked, judged: Judged | undefined): void {
  if (!judged || judged.verdict === 'within') return
  if (item.class === 'supplementary') {
    if (judged.verdict === 'outside') side.supplementaryOutside += 1
    else side.supplementaryUnsure += 1
  } else if (judged.verdict === 'outside') side.essentialOutside += 1
  else side.essentialUnsure += 1
}

const judgedOf = (run: Run, item: Item, side: Linked): Judged | undefined => run.answers[item.index]?.judged[side.index]

function judgeWithCoupons(run: Run, { each, joint, union }: Plan): void {
  const { context, sides } = run
  // Toughness coupons answer for supplementary variables; a purely mechanical record can't have recorded them.
  const tough = context.toughness === true ? sides.filter(carriesToughness) : sides
  const judgesSupplementary = tough.length > 0 ? tough : sides
  for (const item of each) {
    const asked = item.class === 'supplementary' ? judgesSupplementary : sides
    const answer = answerOf(run, item, asked, askEach)
    run.answers[item.index] = answer
    for (const side of asked) tally(item, side, answer.judged[side.index])
  }
  const essential = sides.filter(agreesEssential)
  let supplementary: readonly Linked[] = judgesSupplementary.filter((side) => agreesEssential(side) && agreesSupplementary(side))
  const lead = pickLead(sides, true)
  const toughAgreeing = judgesSupplementary.filter(agreesEssential)
  const toughLead = pickLead(toughAgreeing.length > 0 ? toughAgreeing : judgesSupplementary, false)

  for (const item of each) {
    const group = item.class === 'essential' ? essential : supplementary
    const nearest = item.class === 'essential' ? lead : toughLead
    const chosen = group.length > 0 ? group : nearest ? nearest.alone : NO_SIDES
    const answer = run.answers[item.index]
    if (!answer) continue
    for (const side of sides) if (answer.judged[side.index] !== undefined) pushRange(run, item, side)
    const first = chosen[0]
    const lone = chosen.length < sides.length && group.length === 0
    if (first) pushFinding(run, item, chosen, answer, answer.judged[first.index] ?? null, lone ? `No linked coupon covers every variable of this process by itself; ${names(chosen)} comes nearest.` : null, lone)
  }

  for (const item of joint) {
    const candidates = supplementary.length > 0 ? supplementary : toughLead ? toughLead.alone : NO_SIDES
    const answer = answerOf(run, item, candidates, askJointly)
    for (const side of candidates) pushRange(run, item, side)
    const used = answer.used === null ? candidates : candidates.filter(({ index }) => answer.used?.includes(index))
    if (answer.used !== null) supplementary = used
    pushFinding(run, item, used, answer, answer.judged[0] ?? null, null)
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
  const notes = byClass.map((used) => (used.length > 1 ? `${names(used)} agree in the other variables, so their ranges join; a gap stays uncovered.` : null))
  for (const item of union) {
    const at = item.class === 'essential' ? 0 : 1
    const used = byClass[at]
    const answer = answerOf(run, item, used, askTogether)
    for (const side of sides) pushRange(run, item, side)
    const judged = answer.judged[0] ?? null
    const maybe = judged && judged.verdict === 'outside' && sides.length > used.length ? sides.filter((side) => !used.includes(side) && !canFail(side) && hasMechanical(side)) : []
    if (judged && maybe.length > 0) {
      const pool = used[0] && !canFail(used[0]) ? [...used, ...maybe] : maybe
      const wider = answerOf(run, item, pool, askTogether).judged[0]
      if (wider && wider.verdict !== 'outside') {
        const missing = maybe.flatMap((side) => each.flatMap((other) => judgedOf(run, other, side)?.missing ?? []))
        const told: RuleVerdict = { ...wider, verdict: 'cannot-tell', sentence: `${wider.sentence} But whether ${names(maybe)} agrees in the other variables can't be told yet.`, missing: [...new Set([...(wider.missing ?? []), ...missing])] }
        pushFinding(run, item, pool, { judged: [told], used: null, ranges: null, told: null } satisfies Answer, told, null)
        continue
      }
    }
    pushFinding(run, item, used, answer, judged, notes[at] ?? null)
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

function joinRanges(run: Run, item: Item, sides: readonly Linked[], context: RuleContext): QualifiedSpan | null {
  const { rule } = item
  if (rule.join) return rule.join(context, sides, sides.map((side) => rangeOf(run, item, side, context).given))
  const spans: QualifiedSpan[] = []
  for (const side of sides) {
    const span = spanOf(run, item, side, context)
    if (span) spans.push(span)
  }
  const { joined } = item
  if (joined !== null && joined.of.length === spans.length && joined.of.every((span, i) => span === spans[i])) return joined.span
  const span = unionAll(spans)
  item.joined = { of: spans, span }
  return span
}
