/** The same variables judged by a general rule library, json-rules-engine: rules as data, with the bounds that our own coupons give. */
import { Engine, type NestedCondition, type RuleProperties, type TopLevelCondition } from 'json-rules-engine'
import { assess, qualifyCoupon, type AssessInput } from '../../shared/assessment/assess.ts'
import type { Assessment, Finding, QualifiedSpan } from '../../shared/schemas/assessment.ts'

export type Facts = Record<string, number | string>

export interface Compared {
  /** Ids of our rules that the library judges too. */
  rules: readonly string[]
  /** What each procedure of the pool asks, read out beforehand: the library is spared the reading. */
  facts: readonly Facts[]
  /** Ids of the rules that the library finds covered. */
  judge: (facts: Facts) => Promise<string[]>
}

/** A range as conditions on a variable's facts: any of its parts holds all that is asked. */
function conditionOf(id: string, range: QualifiedSpan): NestedCondition {
  if (range.type === 'set') return range.any ? { all: [] } : { fact: id, operator: 'in', value: range.values }
  return {
    any: range.segments.map(({ lower, upper }) => ({
      all: [
        ...('value' in lower ? [{ fact: `${id}.min`, operator: lower.kind === 'closed' ? 'greaterThanInclusive' : 'greaterThan', value: lower.value }] : []),
        ...('value' in upper ? [{ fact: `${id}.max`, operator: upper.kind === 'closed' ? 'lessThanInclusive' : 'lessThan', value: upper.value }] : []),
      ],
    })),
  }
}

/** What a finding's variable asks, as facts; nothing where the procedure does not state it. */
function factsOf(assessment: Assessment, rules: ReadonlySet<string>): Facts {
  const facts: Facts = {}
  for (const { ruleId, asked } of assessment.findings) {
    if (!rules.has(ruleId) || asked === null) continue
    if (!Array.isArray(asked)) Object.assign(facts, { [`${ruleId}.min`]: asked.min ?? -Infinity, [`${ruleId}.max`]: asked.max ?? Infinity })
    else if (asked.length === 1 && asked[0] !== undefined) facts[ruleId] = asked[0]
    else throw new Error(`${ruleId} asks several names at once, which this comparison does not express.`)
  }
  return facts
}

const isJudged = ({ asked, range, verdict }: Finding): boolean => asked !== null && range !== null && verdict === 'within'

/** Every bound of the variable is known and limits it somewhere, so that the library has something to judge. */
const isKnown = (range: QualifiedSpan): boolean => (range.type === 'set' ? !range.unknown && !range.any : range.segments.every(({ lower, upper }) => lower.kind !== 'unknown' && upper.kind !== 'unknown' && (lower.kind !== 'unlimited' || upper.kind !== 'unlimited')))

/**
 * Builds the library's rules from the ranges that each coupon qualifies by itself: a variable is covered where any of the coupons covers it.
 * @param input the procedure as it stands, all of it within
 * @throws Error when fewer than 12 variables can be told in that way, or when a verdict over the pool differs from ours
 */
export async function compare(input: AssessInput, pool: readonly AssessInput[]): Promise<Compared> {
  const ranges = input.coupons.map((coupon) => qualifyCoupon(coupon, input.standard, input.edition, input.level ?? null).ranges)
  const judged = new Set(assess(input).findings.filter(isJudged).map(({ ruleId }) => ruleId))
  const rules: RuleProperties[] = []
  for (const id of judged) {
    const own = ranges.flatMap((list) => list.filter(({ ruleId }) => ruleId === id).map(({ range }) => range))
    if (own.length !== ranges.length || !own.every(isKnown)) continue
    const conditions: TopLevelCondition = { any: own.map((range) => conditionOf(id, range)) }
    rules.push({ conditions, event: { type: id } })
  }
  if (rules.length < 12) throw new Error(`Only ${rules.length} variables can be told as the library's rules.`)
  const ids = new Set(rules.map(({ event }) => event.type))
  const engine = new Engine(rules, { allowUndefinedFacts: true })
  const judge = async (facts: Facts): Promise<string[]> => (await engine.run(facts)).events.map(({ type }) => type)
  const facts: Facts[] = []
  for (const one of pool) {
    const assessment = assess(one)
    const own = factsOf(assessment, ids)
    const ours = assessment.findings.filter(({ ruleId, verdict }) => ids.has(ruleId) && verdict === 'within').map(({ ruleId }) => ruleId).sort()
    const theirs = (await judge(own)).sort()
    if (ours.join() !== theirs.join()) throw new Error(`The library's verdicts differ from ours: ${[...new Set([...ours, ...theirs])].filter((id) => ours.includes(id) !== theirs.includes(id)).join(', ')}.`)
    facts.push(own)
  }
  return { rules: [...ids], facts, judge }
}
