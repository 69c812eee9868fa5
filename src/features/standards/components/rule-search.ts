/** Which rules of a standard a reader asked for. */
import type { StandardRule } from '@shared/schemas/standards.ts'

export interface RuleFilters { q: string; process: string; kind: string; basis: string; edition: string }

const wordsOf = (rule: StandardRule): string => `${rule.title} ${rule.clause} ${rule.statement} ${rule.fieldLabel} ${rule.section} ${rule.source}`.toLowerCase()

/** A rule stays when it holds every word of the search and fits every filter; class and process are asked of the same pairing. */
export function chosenRules(rules: readonly StandardRule[], { q, process, kind, basis, edition }: RuleFilters): StandardRule[] {
  const words = q.toLowerCase().split(/\s+/).filter((word) => word !== '')
  return rules.filter((rule) => {
    const text = words.length > 0 ? wordsOf(rule) : ''
    return (
      words.every((word) => text.includes(word)) &&
      ((process === '' && kind === '') || rule.classes.some((one) => (process === '' || one.process === process) && (kind === '' || one.class === kind))) &&
      (basis === '' || rule.basis === basis) &&
      (edition === '' || rule.editions.includes(edition))
    )
  })
}

/** Rules by the section of the document in which their variable stands, in the order of the rules. */
export function bySection(rules: readonly StandardRule[]): [section: string, rules: StandardRule[]][] {
  const sections = new Map<string, StandardRule[]>()
  for (const rule of rules) sections.set(rule.section, [...(sections.get(rule.section) ?? []), rule])
  return [...sections]
}
