import type { Assessment, Finding } from '@shared/schemas/assessment.ts'
import type { Judgements } from './judgements.ts'
import { gathered, standardWithEdition } from './judgements.ts'
import { drawGaugeRow } from './layout/gauge-row.ts'
import { VERDICT_COLOUR, VERDICT_WORD } from './layout/marks.ts'
import { STRONG, type Sheet } from './layout/sheet.ts'
import { drawTable, type Cell } from './layout/table.ts'
import type { Context } from './weld-sections.ts'
import { BASIS_WORD, CLASS_WORD } from './words.ts'

const ORDER = { outside: 0, 'cannot-tell': 1, within: 2 } as const
const CLASS_ORDER = { essential: 0, supplementary: 1, nonessential: 2, 'not-a-variable': 3 } as const

/** Numeric ranges of variables that have no row of their own. */
export function drawLeftOverRanges(context: Context, judgements: Judgements): void {
  const left = judgements.leftOver()
  if (left.length === 0) return
  context.sheet.section('Further ranges', '', () => {
    for (const { judged } of left) {
      const { asked, range } = judged.gauge
      const value = asked ? [asked.min, asked.max].filter((end, index, all): end is number => end !== null && (index === 0 || end !== all[0])).map((end) => context.figures.ofRange(end, range)).join(' to ') : ''
      drawGaugeRow(context.sheet, context.figures, { label: judged.label, value: value || 'not stated', judged: [judged] })
    }
  })
}

const countsLine = ({ counts }: Assessment): string => `${counts.outside} outside · ${counts.cannotTell} cannot tell · ${counts.within} within`

/** What is missing is named by its path in the record; on paper that becomes words: `processes.1.backingGas` is "backing gas". */
const missingInWords = (missing: string): string =>
  missing.replace(/\b[a-z][A-Za-z]*(?:\.[A-Za-z0-9]+)+\b/g, (path) => path.replace(/^processes\.\d+\./, '').replace(/\./g, ', ').replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase())

function row(finding: Finding, processIds: readonly string[], processes: ReadonlyMap<string, string>): Cell[] {
  const missing = finding.missing.length > 0 ? ` Missing: ${finding.missing.map(missingInWords).join('; ')}.` : ''
  const process = processIds.map((id) => processes.get(id)).filter(Boolean).join(', ')
  const basis = finding.basis === 'read' ? '' : BASIS_WORD[finding.basis]
  return [{ text: '', verdict: finding.verdict }, CLASS_WORD[finding.class], { text: process ? `${finding.title} · ${process}` : finding.title, strong: true }, `${finding.sentence}${missing}`, [finding.clause, basis].filter(Boolean).join(' · ')]
}

/** What the standards' rules say of the procedure: open findings first, then what is within; and why the open ones were accepted. */
export function drawFindings(sheet: Sheet, assessments: readonly Assessment[], deviationReason: string | null, processes: ReadonlyMap<string, string> = new Map()): void {
  if (assessments.length === 0) {
    sheet.section('Findings', '', () => sheet.callout('Not judged', 'No standard\'s rules have been run over this revision, so nothing here says that a coupon supports it.', 'straw'), 50)
    return
  }
  sheet.section('Findings', assessments.length === 1 ? countsLine(assessments[0]!) : `${assessments.length} standards`, () => {
    if (deviationReason) sheet.callout('Approved with open findings. Reason recorded by the approver:', deviationReason, 'oxide')
    for (const assessment of assessments) {
      sheet.subhead(standardWithEdition(assessment), assessments.length > 1 ? countsLine(assessment) : `judged in ${assessment.unitSystem} figures`, 60)
      sheet.paragraph(`Overall: ${VERDICT_WORD[assessment.verdict]}. Never better than the worst essential finding.`, { ...STRONG, colour: VERDICT_COLOUR[assessment.verdict] })
      const sorted = [...assessment.findings].sort((a, b) => ORDER[a.verdict] - ORDER[b.verdict] || CLASS_ORDER[a.class] - CLASS_ORDER[b.class] || a.clause.localeCompare(b.clause, 'en', { numeric: true }))
      if (sorted.length > 0) drawTable(sheet, [{ title: 'Verdict', share: 13 }, { title: 'Class', share: 13 }, { title: 'Variable', share: 19 }, { title: 'Finding', share: 38 }, { title: 'Clause and basis', share: 20 }], gathered(sorted, ({ title, verdict, class: variableClass, sentence, clause, basis, missing }) => [title, verdict, variableClass, sentence, clause, basis, missing.map(missingInWords)]).map(({ item, processIds }) => row(item, processIds, processes)))
    }
  }, 80)
}
