import type { Assessment, Finding, NumericRange, QualifiedRange, VariableClass, Verdict } from '@shared/schemas/assessment.ts'
import type { Gauge } from './layout/gauge.ts'
import { STANDARD_NAME } from './words.ts'

/** One verdict with its gauge, ready to stand beside a variable. */
export interface Judged { label: string; standard: string; clause: string; verdict: Verdict | null; class: VariableClass; gauge: Gauge }

export const standardWithEdition = (choice: { standard: Assessment['standard']; edition: string }): string => `${STANDARD_NAME[choice.standard]} · ${choice.edition}`

const isNumeric = (finding: Finding): finding is Finding & { range: NumericRange } => finding.range?.type === 'numeric'

/**
 * Things that are the same but for the process they speak of, gathered in their first order: a rule that looks at the whole weld
 * speaks once for each process, and paper need not say it twice.
 */
export function gathered<T extends { processId: string | null }>(items: readonly T[], sameness: (item: T) => readonly unknown[]): { item: T; processIds: string[] }[] {
  const groups = new Map<string, { item: T; processIds: string[] }>()
  for (const item of items) {
    const key = JSON.stringify(sameness(item))
    const group = groups.get(key) ?? { item, processIds: [] }
    if (item.processId !== null) group.processIds.push(item.processId)
    groups.set(key, group)
  }
  return [...groups.values()]
}

/** Findings by the field beside which they stand; remembers which gauges have been drawn, so that none is left out. */
export class Judgements {
  private readonly byField = new Map<string, Finding[]>()
  private readonly drawn = new Set<Finding>()
  /** @param processes short names of the process blocks by id */
  constructor(private readonly assessments: readonly Assessment[], private readonly processes: ReadonlyMap<string, string> = new Map()) {
    for (const finding of assessments.flatMap((assessment) => assessment.findings)) this.byField.set(finding.field, [...(this.byField.get(finding.field) ?? []), finding])
  }

  private judged(finding: Finding & { range: NumericRange }, processIds: readonly string[] = []): Judged {
    const asked = finding.asked && !Array.isArray(finding.asked) ? finding.asked : null
    return {
      label: finding.title,
      standard: [this.assessments.length > 1 ? STANDARD_NAME[finding.standard] : '', ...processIds.map((id) => this.processes.get(id) ?? '')].filter(Boolean).join(' · '),
      clause: finding.clause,
      verdict: finding.verdict,
      class: finding.class,
      gauge: { range: finding.range, asked, tested: finding.tested.filter((value): value is number => typeof value === 'number') },
    }
  }

  /** Findings with a numeric range at this field. */
  gauges(field: string): Judged[] {
    const found = (this.byField.get(field) ?? []).filter(isNumeric)
    found.forEach((finding) => this.drawn.add(finding))
    const groups = gathered(found, ({ standard, clause, verdict, class: variableClass, range, asked, tested }) => [standard, clause, verdict, variableClass, range, asked, tested])
    // Where a field is the whole weld's and the processes' verdicts differ, each is named.
    const differ = !field.startsWith('processes.') && groups.length > 1
    return groups.map(({ item, processIds }) => this.judged(item, differ ? processIds : []))
  }

  /** Verdicts without a gauge at this field, or at any field of the list. */
  marks(...fields: string[]): { verdict: Verdict; clause: string }[] {
    const rank = { outside: 0, 'cannot-tell': 1, within: 2 }
    const found = fields.flatMap((field) => this.byField.get(field) ?? []).filter((finding) => !isNumeric(finding)).sort((a, b) => rank[a.verdict] - rank[b.verdict])
    return gathered(found, ({ verdict, clause }) => [verdict, clause]).map(({ item: { verdict, clause } }) => ({ verdict, clause }))
  }

  /** Numeric findings that no section asked for. */
  leftOver(): { field: string; judged: Judged }[] {
    return [...this.byField.values()].flat().filter(isNumeric).filter((finding) => !this.drawn.has(finding)).map((finding) => ({ field: finding.field, judged: this.judged(finding) }))
  }
}

/** A coupon's range as a gauge without anything asked. */
export const rangeAsJudged = (range: QualifiedRange & { range: NumericRange }): Judged => ({
  label: range.label,
  standard: '',
  clause: range.clause,
  verdict: null,
  class: range.class,
  gauge: { range: range.range, asked: null, tested: typeof range.tested === 'number' ? [range.tested] : [] },
})
