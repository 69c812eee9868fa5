/** A coupon by itself: specimens, results, what is missing for certification, and what it qualifies. */
import type { AssessedCoupon, CouponQualification, QualifiedRange, TestVerdict } from '../../schemas/assessment.ts'
import { fieldAt } from '../../comparison/fields.ts'
import { fieldWords, lowerFirst, pathOfMissing } from '../common/lacking.ts'
import { weakest } from '../common/rule-kinds.ts'
import { figureOrNull, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import type { CouponSide, RangeContext } from '../rule.ts'
import { formerDiameter, judgeBend, judgeMacro } from './acceptance.ts'
import { heatInputContradictions } from './heat-input-record.ts'
import { role } from './role.ts'
import { rules } from './rules/index.ts'
import { specimenRequirements } from './specimens.ts'
import { judgeTension, stressDisagrees, stressText } from './tension.ts'

type Missing = CouponQualification['missing'][number]

/** What the record itself lacks before it may be certified. */
function missingFromRecord(coupon: AssessedCoupon): Missing[] {
  const { content } = coupon
  const missing: Missing[] = []
  const need = (present: unknown, field: string, message: string, clause: string): void => {
    if (!present) missing.push({ field, message, clause })
  }
  const { variables } = content
  if (variables.joint.weld === 'groove') need(variables.thickness, 'variables.thickness', 'Record the thickness of the coupon.', 'QW-451')
  need(content.weldedOn, 'weldedOn', 'Record the date of welding.', 'QW-200.2(b)')
  need(content.welder, 'welder', 'Name the welder who welded the coupon.', 'QW-200.2(b)')
  need(content.laboratory, 'laboratory', 'Name the laboratory that tested the coupon.', 'QW-200.2(b)')
  need(content.reportNumber, 'reportNumber', "Give the number of the laboratory's report.", 'QW-200.2(b)')
  variables.processes.forEach((block, i) => need(block.process, `variables.processes.${i}.process`, 'State the welding process.', 'QW-200.2(b)'))
  return missing
}

/** Former by QW-466.1 against the one recorded; null when nothing is wrong or nothing can be said. */
function formerIssue(coupon: AssessedCoupon, index: number): Missing | null {
  const { variables, bends } = coupon.content
  const bend = bends[index]
  const system = variables.unitSystem
  const t = figureOrNull(bend?.thickness, 'length', system)
  const used = figureOrNull(bend?.formerDiameter, 'length', system)
  if (!bend || t === null || used === null || t <= 0) return null
  const elongation = [variables.baseMetals.a.minElongation?.si, variables.baseMetals.b.minElongation?.si].filter((value) => value !== undefined)
  const former = formerDiameter(t, variables, variables.processes.map((block) => block.filler.fNumber ?? ''), elongation.length > 0 ? Math.min(...elongation) : null)
  const unit = unitOf('length', system)
  // Half a millimetre of room: printed formers are rounded from the formula.
  if (!former || used <= former.diameter + (system === 'SI' ? 0.5 : 0.02)) return null
  return { field: `bends.${index}.formerDiameter`, message: `${bend.specimen} was bent over ${show(used, unit)}; a ${show(t, unit)} specimen takes a former of ${show(former.diameter, unit)} (${former.how})${former.maximum ? ' at most' : ''}.`, clause: 'QW-466.1' }
}

/** Essential variables that the coupon doesn't record, from the ranges that can't be told. */
function missingFromRanges(ranges: readonly (QualifiedRange & { missing: readonly string[] })[], { number, content }: AssessedCoupon): Missing[] {
  const blocks = content.variables.processes
  const missing = new Map<string, Missing>()
  for (const range of ranges) {
    if (range.class !== 'essential' && range.class !== 'supplementary') continue
    const at = blocks.findIndex(({ id }) => id === range.processId)
    for (const text of range.missing) {
      const path = pathOfMissing(text)
      const below = fieldAt(path) === null && fieldAt(`processes.*.${path}`) !== null
      const field = path === 'runSheet' ? path : below ? `variables.processes.${Math.max(0, at)}.${path}` : `variables.${path}`
      if (!missing.has(field)) missing.set(field, { field, message: `Record the ${fieldWords(text.replace(`${number}: `, ''))}; the range of the ${lowerFirst(range.label)} follows from it.`, clause: range.clause })
    }
  }
  return [...missing.values()]
}

/** Every range that the coupon gives, judged in its own units. */
export function couponRanges(coupon: AssessedCoupon, edition: string, level: '1' | '2' | null): (QualifiedRange & { missing: readonly string[] })[] {
  const { variables } = coupon.content
  const out: (QualifiedRange & { missing: readonly string[] })[] = []
  const toughness = variables.toughnessRequired === true || coupon.content.toughness.length > 0
  const context: RangeContext = { edition, level, system: variables.unitSystem, toughness, procedure: null, block: null, coupons: [coupon] }
  variables.processes.forEach((block, i) => {
    if (!block.process) return
    const side: CouponSide = { coupon, variables, block, role: role(coupon) }
    for (const rule of rules) {
      const ruleClass = rule.meta.classes[block.process]
      if (!ruleClass || ruleClass === 'nonessential' || !rule.meta.editions.includes(edition)) continue
      if (!toughness && ruleClass !== 'essential') continue
      // Judged as if the coupon's own weld were asked: variables that do not arise for it give no range.
      if (rule.applies && !rule.applies({ ...context, procedure: variables, block, path: `processes.${i}` })) continue
      const range = rule.range(context, side)
      if (!range) continue
      const classBasis = typeof rule.meta.classBasis === 'object' ? rule.meta.classBasis[block.process] : rule.meta.classBasis
      out.push({
        ruleId: rule.meta.id,
        variable: rule.meta.title,
        label: rule.label,
        field: rule.at === 'block' ? `processes.${i}.${rule.field}` : rule.field,
        processId: block.id,
        process: block.process,
        class: ruleClass === 'dual' || ruleClass === 'supplementary' ? 'supplementary' : 'essential',
        range: range.range,
        tested: range.tested,
        couponId: coupon.id,
        clause: range.clause ?? rule.meta.clause,
        basis: weakest(range.basis ?? rule.meta.basis, classBasis ?? rule.meta.basis),
        reason: range.reason,
        missing: range.missing ?? [],
      })
    }
  })
  return out
}

/**
 * Qualifies a coupon under one edition.
 * @returns specimens asked and recorded, each result judged, what is still missing for certification, and the ranges
 */
export function qualify(coupon: AssessedCoupon, edition: string, level: '1' | '2' | null): CouponQualification {
  const { variables, tension, bends, macros } = coupon.content
  const specimens = specimenRequirements(coupon)
  const results: TestVerdict[] = [...tension.map((test) => judgeTension(test, variables)), ...bends.map((test) => judgeBend(test, variables)), ...macros.map((test) => judgeMacro(test, variables))]
  const ranges = couponRanges(coupon, edition, level)
  const missing: Missing[] = missingFromRecord(coupon)
  // A coupon that only adds toughness to another record needs no mechanical specimens of its own (QW-401.1).
  if (role(coupon) !== 'toughness-only') {
    for (const row of specimens) {
      if (row.recorded < row.required) missing.push({ field: row.kind === 'tension' ? 'tension' : row.kind === 'macro' ? 'macros' : 'bends', message: `${row.label}: ${row.required} are required, ${row.recorded} ${row.recorded === 1 ? 'is' : 'are'} recorded.${row.kind === 'tension' && row.recorded < tension.length && row.alternative ? ` ${row.alternative}` : ''}`, clause: row.clause })
    }
  }
  if (variables.toughnessRequired === true && !coupon.content.toughness.some((test) => test.values.length > 0)) missing.push({ field: 'toughness', message: 'The coupon was welded for toughness; record the toughness results.', clause: 'QW-401.1' })
  for (const result of results) {
    if (result.verdict !== 'pass') missing.push({ field: fieldOfTest(coupon, result.testId), message: result.sentence, clause: result.verdict === 'fail' ? 'QW-202.1' : result.clause })
  }
  tension.forEach((test, i) => {
    const apart = stressDisagrees(test)
    if (apart) missing.push({ field: `tension.${i}.reportedStrength`, message: `${test.specimen}: load and area give ${stressText(apart.computed, variables.unitSystem)}, but ${stressText(apart.reported, variables.unitSystem)} is reported. Check the load, the size and the report.`, clause: 'QW-152' })
  })
  missing.push(...heatInputContradictions(coupon))
  bends.forEach((_, i) => {
    const issue = formerIssue(coupon, i)
    if (issue) missing.push(issue)
  })
  const known = new Set(missing.map(({ field }) => field))
  for (const row of missingFromRanges(ranges, coupon)) if (!known.has(row.field)) missing.push(row)
  return { standard: 'asme-ix', edition, specimens, results, missing, readyToCertify: missing.length === 0, ranges: ranges.map(({ missing: _, ...range }) => range) }
}

function fieldOfTest({ content }: AssessedCoupon, id: string): string {
  for (const kind of ['tension', 'bends', 'macros'] as const) {
    const index = content[kind].findIndex((test) => test.id === id)
    if (index >= 0) return `${kind}.${index}`
  }
  return 'tension'
}
