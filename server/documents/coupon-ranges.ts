import type { CouponQualification, NumericRange, QualifiedRange, QualifiedSpan } from '@shared/schemas/assessment.ts'
import { gathered, rangeAsJudged, standardWithEdition } from './judgements.ts'
import { drawGaugeRow } from './layout/gauge-row.ts'
import { drawTable } from './layout/table.ts'
import type { Figures } from './layout/figures.ts'
import type { Context } from './weld-sections.ts'
import { BASIS_WORD, CLASS_WORD } from './words.ts'

const numeric = (range: QualifiedRange): range is QualifiedRange & { range: NumericRange } => range.range.type === 'numeric'

const spanInWords = (span: QualifiedSpan, figures: Figures): string =>
  span.type === 'numeric' ? figures.range(span) : span.unknown ? 'cannot be told' : span.any ? 'any' : span.values.length > 0 ? span.values.join(', ') : 'nothing qualified'

const testedInWords = (range: QualifiedRange, figures: Figures): string =>
  range.tested === null ? 'not recorded' : typeof range.tested === 'number' ? (range.range.type === 'numeric' ? figures.ofRange(range.tested, range.range) : String(range.tested)) : range.tested

/** What the coupon qualifies under each standard: gauges for what is measured, then every range with the way it comes about. */
export function drawQualified(context: Context, qualifications: readonly CouponQualification[]): void {
  const { sheet, figures } = context
  for (const qualification of qualifications) {
    const name = standardWithEdition(qualification)
    const same = ({ label, class: variableClass, tested, range, reason, clause, basis }: QualifiedRange) => [label, variableClass, tested, range, reason, clause, basis]
    const groups = gathered(qualification.ranges, same).map(({ item, processIds }) => ({ range: item, process: [...new Set(processIds.map((id) => qualification.ranges.find((other) => other.processId === id)?.process ?? ''))].filter(Boolean).join(', ') }))
    sheet.section(`Range of qualification · ${name}`, `${groups.length} variables`, () => {
      for (const { range, process } of groups) {
        if (!numeric(range)) continue
        drawGaugeRow(sheet, figures, { label: range.label, note: process || undefined, value: `welded: ${testedInWords(range, figures)}`, judged: [rangeAsJudged(range)] })
      }
      drawTable(sheet, [{ title: 'Variable', share: 18 }, { title: 'Class', share: 12 }, { title: 'Welded', share: 12 }, { title: 'Qualified', share: 18 }, { title: 'How it comes about', share: 32 }, { title: 'Clause and basis', share: 20 }], groups.map(({ range, process }) => [
        { text: process ? `${range.label} · ${process}` : range.label, strong: true }, CLASS_WORD[range.class], testedInWords(range, figures), spanInWords(range.range, figures), range.reason, [range.clause, range.basis === 'read' ? '' : BASIS_WORD[range.basis]].filter(Boolean).join(' · '),
      ]))
      if (qualification.ranges.length === 0) sheet.callout('No range computed', 'The record lacks what the standard\'s rules need, so nothing can be said about what this coupon qualifies.', 'straw')
    }, 90)
  }
}
