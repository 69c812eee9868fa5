/** Tells ranges and findings: the words around a rule's verdict, in the shapes that are drawn, printed and sent. */
import type { Finding, Fix, QualifiedRange } from '../schemas/assessment.ts'
import { weakest } from '../standards/common/rule-kinds.ts'
import { distinct } from '../standards/common/wording.ts'
import type { CouponSide, RuleVerdict } from '../standards/rule.ts'
import { coversAlone, gridOf, rangeOf as keptRangeOf, sidesOf } from './kept.ts'
import type { Answer, Item, Judged } from './plan.ts'
import { lasting } from './remembered.ts'
import { maskOf, rangeOf, type Linked, type Run } from './run.ts'

/** The range as it is told; kept, because mostly it is told again of the same block. */
export function pushRange(run: Run, item: Item, side: Linked): void {
  const kept = rangeOf(run, item, side)
  const { given, told } = kept
  if (given === null) return
  const { block } = run.context
  const id = block === null ? null : block.id
  if (told && told.processId === id && told.field === item.field && told.class === item.class) {
    run.out.ranges.push(told)
    return
  }
  const { rule, prepared: { classBasis } } = item
  const range: QualifiedRange = {
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
  if (told !== undefined) kept.told = lasting(range)
  run.out.ranges.push(range)
}

/**
 * Tells a finding, the same one as before where it rests on the same answer.
 * @param lone which of two notes it bears, if any
 */
export function pushFinding(run: Run, item: Item, sides: readonly Linked[], answer: Answer, judged: Judged, note: string | null, lone = false): void {
  if (!judged) return
  // Which other coupons there are to offer is no part of an answer.
  const known = judged.verdict === 'within' || run.others.length === 0 ? answer.told : null
  if (known === null) {
    run.out.findings.push(findingOf(run, item, sides, judged, note))
  } else {
    const mask = maskOf(sides)
    const processId = run.context.block === null ? null : run.context.block.id
    for (const told of known) {
      if (told.mask === mask && told.lone === lone && told.processId === processId) {
        run.out.findings.push(told.finding)
        return
      }
    }
    const finding = findingOf(run, item, sides, judged, note)
    run.out.findings.push(finding)
    if (known.length < MOST_TOLD) known.push({ mask, lone, processId, finding: lasting(finding) })
  }
}

const MOST_TOLD = 8

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
