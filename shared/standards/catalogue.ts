/** A standard as its page shows it, made from the rules themselves: what is checked, how each figure is known, what is not checked. */
import { fieldLabel, fieldSection } from '../comparison/fields.ts'
import type { Basis } from '../schemas/assessment.ts'
import type { StandardDetail, StandardRow, StandardRule } from '../schemas/standards.ts'
import type { Process } from '../schemas/welding.ts'
import { weakest } from './common/rule-kinds.ts'
import type { Rule, Standard } from './rule.ts'

/** The part of a rule's id after the standard's, which names its place on the page. */
export const ruleAnchor = (ruleId: string): string => ruleId.split('/').slice(1).join('-')

function classBasisOf({ meta: { basis, classBasis } }: Rule, process: Process): Basis {
  return weakest(basis, typeof classBasis === 'string' ? classBasis : (classBasis?.[process] ?? basis))
}

function ruleOf(rule: Rule, processes: readonly Process[]): StandardRule {
  const { meta } = rule
  const field = rule.at === 'block' ? `processes.*.${rule.field}` : rule.field
  return {
    id: meta.id,
    title: meta.title,
    clause: meta.clause,
    editions: [...meta.editions],
    classes: processes.flatMap((process) => {
      const own = meta.classes[process]
      return own ? [{ process, class: own, basis: classBasisOf(rule, process) }] : []
    }),
    basis: meta.basis,
    source: meta.source,
    statement: meta.statement,
    field,
    fieldLabel: fieldLabel(field),
    section: fieldSection(field) ?? 'Other',
    route: meta.route ?? null,
    combine: meta.combine,
    withoutCoupon: meta.withoutCoupon ?? false,
  }
}

/** Rules that bind a process of the standard; one shared with another standard may bind none here, and is not checked then. */
const binding = ({ rules, processes }: Standard): Rule[] => rules.filter(({ meta }) => processes.some((process) => meta.classes[process] !== undefined))

/** One line of the list of standards, with how many of its rules stand on which basis. */
export function standardRow(standard: Standard): StandardRow {
  const { id, name, shortName, editions, processes, routes } = standard
  const rules = binding(standard)
  const bases: Record<Basis, number> = { read: 0, secondary: 0, 'common-practice': 0, memory: 0 }
  for (const { meta } of rules) bases[meta.basis] += 1
  return { id, name, shortName, editions: editions.map((edition) => ({ ...edition })), processes: [...processes], routes: [...(routes ?? ['test' as const])], rules: rules.length, bases }
}

/** Everything that the program checks of a standard, and what it does not. */
export const standardDetail = (standard: Standard): StandardDetail => ({
  ...standardRow(standard),
  outOfScope: [...standard.outOfScope],
  certification: { ...standard.certification },
  ruleList: binding(standard).map((rule) => ruleOf(rule, standard.processes)),
})
