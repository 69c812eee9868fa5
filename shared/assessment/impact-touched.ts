/**
 * Which rules a change touches. A rule is touched when making the change alone, or taking it back alone, alters what the rule asks
 * or says; a nonessential rule, which only wants its value stated, when it stands at the field or reads it. Two probe coupons, as
 * if each revision had been welded as written, make the rules speak whatever coupons are linked.
 */
import { fieldPattern } from '../comparison/fields.ts'
import type { AssessedCoupon, Finding, VariableClass } from '../schemas/assessment.ts'
import type { Route } from '../schemas/common.ts'
import type { CouponContent, ProcedureContent, WeldingVariables } from '../schemas/welding.ts'
import type { Rule, Standard } from '../standards/rule.ts'
import { assess } from './assess.ts'
import { placeOf, variants, type Place } from './impact-paths.ts'
import { fieldsRead } from './impact-reads.ts'
import type { FieldChange } from '../comparison/compare.ts'

export interface Frame { standard: Standard; edition: string; level: '1' | '2' | null; route: Route }
export interface Touched { place: Place; rules: Map<Rule, VariableClass>; /** Rules that stand at the very field. */ exact: Set<Rule>; /** Rules at the very field that do not count, because toughness is not required. */ idle: Set<Rule> }

const CLASS_RANK: Record<VariableClass, number> = { 'not-a-variable': 0, nonessential: 1, supplementary: 2, essential: 3 }

const probe = (variables: WeldingVariables, id: string): AssessedCoupon => {
  const content: CouponContent = { title: id, variables, weldedOn: null, welder: null, welderStamp: null, witness: null, machine: null, runSheet: [], tension: [], bends: [], macros: [], toughness: [], hardness: [], laboratory: null, reportNumber: null, testedOn: null, notes: null }
  return { id, number: id, certified: true, content }
}

export const keyOf = ({ ruleId, processId }: Pick<Finding, 'ruleId' | 'processId'>): string => `${ruleId} ${processId ?? ''}`

type Said = ReadonlyMap<string, Finding>

/** What every rule says of a record judged by one probe. */
function said(frame: Frame, variables: WeldingVariables, coupon: AssessedCoupon): Said {
  const procedure: ProcedureContent = { title: '', scope: null, variables, supportingCoupons: [], notes: null }
  const { findings } = assess({ procedure, coupons: [coupon], standard: frame.standard.id, edition: frame.edition, level: frame.level, route: frame.route })
  return new Map(findings.map((finding) => [keyOf(finding), finding]))
}

const meaningOf = (finding: Finding | undefined): string => (finding && finding.class !== 'not-a-variable' ? JSON.stringify([finding.verdict, finding.class, finding.asked]) : '')

/** Rules that stand at a field (`exact`) or at the part that holds it, the closest part first. */
function standsAt(rule: Rule, pattern: string): 'exact' | 'part' | null {
  const own = rule.at === 'block' ? `processes.*.${rule.field}` : rule.field
  return own === pattern ? 'exact' : pattern.startsWith(`${own}.`) ? 'part' : null
}

export function prepareTouched(frame: Frame, before: WeldingVariables, after: WeldingVariables): (change: FieldChange) => Touched {
  const probes = [probe(before, 'before'), probe(after, 'after')]
  const known = new Map<WeldingVariables, Said[]>()
  const saidOf = (variables: WeldingVariables): Said[] => {
    let answers = known.get(variables)
    if (!answers) {
      answers = probes.map((coupon) => said(frame, variables, coupon))
      if (variables === before || variables === after) known.set(variables, answers)
    }
    return answers
  }
  const rules = new Map(frame.standard.rules.filter(({ meta }) => meta.editions.includes(frame.edition) && (meta.route ?? frame.route) === frame.route).map((rule) => [rule.meta.id, rule]))
  const reads = new Map<Rule, Set<string>>()
  const readsOf = (rule: Rule): Set<string> => {
    const own = reads.get(rule) ?? new Set([before, after].flatMap((variables) => variables.processes.flatMap((block, index) => (block.process && rule.meta.classes[block.process] ? [...fieldsRead(rule, variables, index, frame)] : []))))
    reads.set(rule, own)
    return own
  }
  return (change) => {
    const place = placeOf(change, before, after)
    const pattern = fieldPattern(change.field)
    const touched: Touched = { place, rules: new Map(), exact: new Set(), idle: new Set() }
    const touch = (rule: Rule, kind: VariableClass): void => {
      if (kind === 'not-a-variable') return
      const had = touched.rules.get(rule)
      if (!had || CLASS_RANK[kind] > CLASS_RANK[had]) touched.rules.set(rule, kind)
    }
    const blockIds = new Set([place.block.old?.id, place.block.now?.id].filter((id) => id !== undefined))
    const concerns = (finding: Finding): boolean => finding.processId === null || blockIds.size === 0 || blockIds.has(finding.processId)

    const whole = place.old === null || place.now === null
    if (!whole) {
      for (const [without, withChange] of variants(place, before, after)) {
        const [one, other] = [saidOf(without), saidOf(withChange)]
        probes.forEach((_, i) => {
          for (const key of new Set([...(one[i]?.keys() ?? []), ...(other[i]?.keys() ?? [])])) {
            const [a, b] = [one[i]?.get(key), other[i]?.get(key)]
            if (meaningOf(a) === meaningOf(b)) continue
            const rule = rules.get((a ?? b)?.ruleId ?? '')
            for (const finding of [a, b]) if (rule && finding && concerns(finding)) touch(rule, finding.class)
          }
        })
      }
    }
    // Where the variable arises at all, the rule at the very field is touched even if it can't compare the two values.
    for (const answers of [...saidOf(before), ...saidOf(after)]) {
      for (const finding of answers.values()) {
        const rule = rules.get(finding.ruleId)
        if (!rule || !concerns(finding)) continue
        const at = standsAt(rule, pattern)
        if (at === 'exact' && finding.class === 'not-a-variable') touched.idle.add(rule)
        else if (at === 'exact') {
          touched.exact.add(rule)
          touch(rule, finding.class)
        } else if (at === 'part' && whole) touch(rule, finding.class)
        else if (finding.class === 'nonessential' && rule.meta.withoutCoupon && (at === 'part' || readsOf(rule).has(pattern))) touch(rule, finding.class)
      }
    }
    return touched
  }
}
