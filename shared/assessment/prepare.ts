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
  /** Its place among the rules of the edition. */
  place: number
  /** Where its findings stand, by the path of the block ('' = the weld). */
  fields: Map<string, string>
}

export interface PreparedEdition {
  /** How many rules there are. */
  size: number
  weld: readonly PreparedWeldRule[]
  byProcess: ReadonlyMap<Process, readonly PreparedRule[]>
}

/** A rule of the weld as a whole, by the process from which it takes its class. */
export interface PreparedWeldRule { rule: Rule; byProcess: ReadonlyMap<Process, PreparedRule> }

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
  const byProcess = new Map<Process, PreparedRule[]>(standard.processes.map((process) => [process, []]))
  const weld: PreparedWeldRule[] = []
  rules.forEach((rule, place) => {
    const own = new Map<Process, PreparedRule>()
    for (const process of standard.processes) {
      const ruleClass = rule.meta.classes[process]
      if (ruleClass) own.set(process, { rule, class: ruleClass, classBasis: classBasis(rule, process), place, fields: new Map() })
    }
    if (rule.meta.scope === 'weld') weld.push({ rule, byProcess: own })
    else for (const [process, prepared] of own) byProcess.get(process)?.push(prepared)
  })
  return { size: rules.length, weld, byProcess }
}

/** Dotted path beside which the findings of a rule stand. */
export function fieldOf({ rule, fields }: PreparedRule, path: string): string {
  let field = fields.get(path)
  if (field === undefined) {
    field = rule.at === 'block' && path !== '' ? `${path}.${rule.field}` : rule.field
    fields.set(path, field)
  }
  return field
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
