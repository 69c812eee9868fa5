/** Rule lists prepared once for each standard, edition and process, so that a run does not search. */
import type { Basis, VariableClass } from '../schemas/assessment.ts'
import type { Route } from '../schemas/common.ts'
import type { Process } from '../schemas/welding.ts'
import { weakest } from '../standards/common/rule-kinds.ts'
import type { Rule, RuleClass, Standard } from '../standards/rule.ts'

export interface PreparedRule {
  rule: Rule
  class: RuleClass
  /** Weaker of the bases of figure and class letter for this process. */
  classBasis: Basis
}

export interface PreparedEdition {
  weld: readonly Rule[]
  byProcess: ReadonlyMap<Process, readonly PreparedRule[]>
}

const cache = new WeakMap<Standard, Map<string, PreparedEdition | null>>()

/** The rules of one edition and route by process; null when the standard does not know the edition. */
export function prepare(standard: Standard, edition: string, route: Route = 'test'): PreparedEdition | null {
  let editions = cache.get(standard)
  if (!editions) {
    editions = new Map<string, PreparedEdition | null>()
    cache.set(standard, editions)
  }
  const key = `${route}/${edition}`
  let prepared = editions.get(key)
  if (prepared === undefined) {
    prepared = standard.editions.some(({ id }) => id === edition) ? build(standard, edition, route) : null
    // A request may name any text as its edition: only what the standard lists is kept.
    if (prepared) editions.set(key, prepared)
  }
  return prepared
}

function build(standard: Standard, edition: string, route: Route): PreparedEdition {
  const rules = standard.rules.filter((rule) => rule.meta.editions.includes(edition) && (rule.meta.route ?? route) === route).map(alike)
  const byProcess = new Map<Process, PreparedRule[]>()
  for (const process of standard.processes) {
    const own: PreparedRule[] = []
    for (const rule of rules) {
      const ruleClass = rule.meta.classes[process]
      if (rule.meta.scope === 'process' && ruleClass) own.push({ rule, class: ruleClass, classBasis: classBasis(rule, process) })
    }
    byProcess.set(process, own)
  }
  return { weld: rules.filter((rule) => rule.meta.scope === 'weld'), byProcess }
}

const blankMeta = (): Partial<Rule['meta']> => ({ id: undefined, title: undefined, standard: undefined, clause: undefined, editions: undefined, classes: undefined, basis: undefined, classBasis: undefined, source: undefined, statement: undefined, scope: undefined, combine: undefined, route: undefined, withoutCoupon: undefined })
const blankRule = (): Partial<Rule> => ({ meta: undefined, field: undefined, at: undefined, label: undefined, applies: undefined, range: undefined, join: undefined, check: undefined })

/** The same rule with its properties in one order: rules are written in many shapes, and the engine reads one shape faster. */
const alike = (rule: Rule): Rule => Object.assign(blankRule(), rule, { meta: Object.assign(blankMeta(), rule.meta) })

/** Basis of the class letter of a rule for a process. */
export function classBasis(rule: Rule, process: Process | null): Basis {
  const given = rule.meta.classBasis
  const own = typeof given === 'string' ? given : (process && given?.[process]) || rule.meta.basis
  return weakest(own, rule.meta.basis)
}

/** How a class acts: which class is shown, and whether the verdict counts. `toughness` null = not said whether it is required. */
export function effectiveClass(ruleClass: RuleClass, toughness: boolean | null): VariableClass {
  if (ruleClass === 'dual') return toughness === false ? 'nonessential' : 'supplementary'
  if (ruleClass === 'supplementary') return toughness === false ? 'not-a-variable' : 'supplementary'
  return ruleClass
}
