/**
 * What a run goes through, worked out once for each choice of coupons: the rules by how they combine, the coupons' sides, and
 * what each rule answered before. It is remembered from the third run on, since a choice that comes once gains nothing.
 */
import type { AssessedCoupon, Finding, QualifiedSpan, VariableClass } from '../schemas/assessment.ts'
import type { Rule, RuleContext, RuleVerdict, Standard } from '../standards/rule.ts'
import { keptCoupon, sidesOf, type KeptCoupon, type KeptRange, type KeptSide } from './kept.ts'
import { effectiveClass, fieldOf, type PreparedEdition, type PreparedRule } from './prepare.ts'
import { newPaths, type Paths } from './reads.ts'
import type { Remembered } from './remembered.ts'

export type Judged = RuleVerdict | null

/** What a rule says of a procedure and a group of sides. */
export interface Answer {
  /** Its verdict: on each side by itself, by the side's place, or one for all. */
  judged: readonly (Judged | undefined)[]
  /** Places of the sides that answer for it, where those are not the ones that were asked. */
  used: readonly number[] | null
  /** Ranges that looked at the procedure, by the side's place; null where none did. */
  ranges: readonly (KeptRange | undefined)[] | null
  /** Findings made of it; null where it is not kept. */
  told: ToldFinding[] | null
}

/** A finding with what else than the answer it rests on. */
export interface ToldFinding { mask: number; lone: boolean; processId: string | null; finding: Finding }

export type Manner = 'not-a-variable' | 'alone' | 'unsupported' | 'each' | 'jointly' | 'union'

export interface Item {
  prepared: PreparedRule
  rule: Rule
  class: VariableClass
  field: string
  manner: Manner
  /** Its place among the items. */
  index: number
  /** Where its row starts in the run's grid of ranges. */
  row: number
  /** What it answered, by the sides that were asked as bits. */
  remembered: Map<number, Remembered<Answer>>
  /** Ranges that look at the procedure, by the side's place. */
  ranges: (Remembered<KeptRange> | undefined)[]
  /** Ranges that were joined last. */
  joined: { of: readonly QualifiedSpan[]; span: QualifiedSpan | null } | null
}

export interface Plan {
  sides: readonly KeptSide[]
  items: number
  /** Judged without coupons, in the order of the rules. */
  direct: readonly Item[]
  each: readonly Item[]
  joint: readonly Item[]
  union: readonly Item[]
}

/** Everything that the engine remembers of one choice of coupons under one edition. */
export interface Memory {
  prepared: PreparedEdition
  level: RuleContext['level']
  system: RuleContext['system']
  toughness: RuleContext['toughness']
  coupons: readonly KeptCoupon[]
  runs: number
  paths: Paths
  /** By path of the block and the processes that decide which rules are asked. */
  plans: Map<string, Plan>
}

/** Choices remembered beside the first of their coupons, the latest first; without coupons beside the edition. */
const memories = new WeakMap<KeptCoupon | PreparedEdition, Memory[]>()
const MOST_CHOICES = 6
const MOST_PLANS = 24
const FIRST_REMEMBERED = 3

/** What is remembered of these coupons; null as long as the choice is new. */
export function memoryOf(standard: Standard, prepared: PreparedEdition, given: readonly AssessedCoupon[], { level, system, toughness }: Pick<RuleContext, 'level' | 'system' | 'toughness'>): Memory | null {
  const coupons = given.map((coupon) => keptCoupon(standard, coupon))
  const holder = coupons[0] ?? prepared
  let choices = memories.get(holder)
  if (choices === undefined) {
    choices = []
    memories.set(holder, choices)
  }
  let memory = choices.find((one) => one.prepared === prepared && one.toughness === toughness && one.system === system && one.level === level && isSameList(one.coupons, coupons))
  if (memory === undefined) {
    memory = { prepared, level, system, toughness, coupons, runs: 0, paths: newPaths(), plans: new Map<string, Plan>() }
    choices.unshift(memory)
    if (choices.length > MOST_CHOICES) choices.pop()
  }
  memory.runs += 1
  return memory.runs < FIRST_REMEMBERED ? null : memory
}

function isSameList(a: readonly KeptCoupon[], b: readonly KeptCoupon[]): boolean {
  if (a.length !== b.length) return false
  for (let i = 0; i < a.length; i += 1) if (a[i] !== b[i]) return false
  return true
}

/** The plan for the block or weld under judgement. */
export function planOf(standard: Standard, prepared: PreparedEdition, context: RuleContext, memory: Memory | null): Plan {
  if (memory === null) return newPlan(standard, prepared, context)
  const { block, path } = context
  const key = block === null ? context.procedure.processes.map(({ process }) => process).join() : `${path} ${block.process ?? ''}`
  let plan = memory.plans.get(key)
  if (plan === undefined) {
    if (memory.plans.size >= MOST_PLANS) memory.plans.clear()
    plan = newPlan(standard, prepared, context)
    memory.plans.set(key, plan)
  }
  return plan
}

function newPlan(standard: Standard, prepared: PreparedEdition, context: RuleContext): Plan {
  const sides = sidesOf(standard, context.coupons, context.block)
  const direct: Item[] = []
  const each: Item[] = []
  const joint: Item[] = []
  const union: Item[] = []
  const lists: Record<Manner, Item[]> = { 'not-a-variable': direct, alone: direct, unsupported: direct, each, jointly: joint, union }
  const rules = rulesFor(prepared, context)
  rules.forEach((own, index) => {
    const { rule } = own
    const variableClass = effectiveClass(own.class, context.toughness)
    const manner: Manner = variableClass === 'not-a-variable' ? variableClass : variableClass === 'nonessential' || rule.meta.withoutCoupon ? 'alone' : sides.length === 0 ? 'unsupported' : rule.meta.combine
    lists[manner].push({ prepared: own, rule, class: variableClass, field: fieldOf(own, context.path), manner, index, row: index * sides.length, remembered: new Map<number, Remembered<Answer>>(), ranges: [], joined: null })
  })
  return { sides, items: rules.length, direct, each, joint, union }
}

/** For the weld as a whole a rule takes its class from the first process that has one. */
function rulesFor(prepared: PreparedEdition, context: RuleContext): readonly PreparedRule[] {
  if (context.block) return (context.block.process && prepared.byProcess.get(context.block.process)) || []
  const rules: PreparedRule[] = []
  for (const { byProcess } of prepared.weld) {
    const first = context.procedure.processes.find((block) => block.process && byProcess.has(block.process))?.process
    const own = first && byProcess.get(first)
    if (own) rules.push(own)
  }
  return rules
}
