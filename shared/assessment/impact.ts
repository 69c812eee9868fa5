/**
 * What a revision means under one standard: each changed field with its class and whether the linked coupons still cover it.
 * Classes, fields and clauses all come from the rules; nothing here knows what a clause says.
 */
import { compareContent, type FieldChange } from '../comparison/compare.ts'
import type { AssessedCoupon, Assessment, Basis, Finding } from '../schemas/assessment.ts'
import type { Route, StandardId } from '../schemas/common.ts'
import { STANDINGS, type ImpactChange, type ImpactClass, type RevisionImpact, type Standing } from '../schemas/standards.ts'
import type { ProcedureContent, ProcessBlock } from '../schemas/welding.ts'
import { weakest } from '../standards/common/rule-kinds.ts'
import { capital, list } from '../standards/common/wording.ts'
import { getStandard } from '../standards/index.ts'
import type { Rule, Standard } from '../standards/rule.ts'
import { assess } from './assess.ts'
import { isOfDocument, isOfTrace } from './impact-paths.ts'
import { keyOf, prepareTouched, type Touched } from './impact-touched.ts'

export interface ImpactInput {
  before: ProcedureContent
  after: ProcedureContent
  standard: StandardId
  edition: string
  level?: '1' | '2' | null
  /** Absent = by test. */
  route?: Route
  /** The coupons linked to the newer revision. */
  coupons: readonly AssessedCoupon[]
  /** What changed, where it is known already. */
  changes?: readonly FieldChange[]
}

const CLASS_WORD: Record<ImpactClass, string> = { editorial: 'editorial', nonessential: 'nonessential', supplementary: 'supplementary essential', essential: 'essential' }
const RANK: Record<ImpactClass, number> = { editorial: 0, nonessential: 1, supplementary: 2, essential: 3 }
const standingRank = (standing: Standing): number => STANDINGS.indexOf(standing)

type Judged = Pick<ImpactChange, 'class' | 'ruleIds' | 'clause' | 'basis' | 'standing' | 'sentence' | 'wanted'>
const plain = (kind: ImpactClass, standing: Standing, sentence: string): Judged => ({ class: kind, ruleIds: [], clause: null, basis: null, standing, sentence, wanted: null })

interface Scene { input: ImpactInput; standard: Standard; before: ReadonlyMap<string, Finding>; after: Assessment }

/**
 * Every changed field of a revision under one standard and edition.
 * @param input two contents of one procedure, the standard to judge by and the coupons linked now; nothing is changed
 * @returns no changes for equal contents; an unknown standard, edition or process gives "cannot tell", never an error
 */
export function revisionImpact(input: ImpactInput): RevisionImpact {
  const { standard: id, edition, level = null, route = 'test', coupons } = input
  const changes = input.changes ?? compareContent(input.before, input.after)
  const judge = (procedure: ProcedureContent): Assessment => assess({ procedure, coupons, standard: id, edition, level, route })
  const after = judge(input.after)
  const standard = getStandard(id)
  const told: ImpactChange[] = []
  if (changes.length > 0) {
    const known = standard?.editions.some((one) => one.id === edition) && (standard.routes ?? ['test']).includes(route) ? standard : null
    const scene: Scene | null = known && { input, standard: known, before: new Map(judge(input.before).findings.map((finding) => [keyOf(finding), finding])), after }
    const touchedBy = known && prepareTouched({ standard: known, edition, level, route }, input.before.variables, input.after.variables)
    for (const change of changes) told.push({ ...change, ...(ofDocument(change) ?? (scene && touchedBy ? judgeChange(scene, change, touchedBy(change)) : unknown(change, `the rules of ${standard ? `edition ${edition} of ${standard.shortName}` : id} are not in the program`))) })
  }
  return { standard: id, edition, changes: told, overall: overallOf(told, after, standard?.shortName ?? id) }
}

function ofDocument({ field, label }: FieldChange): Judged | null {
  if (field === 'supportingCoupons') return plain('editorial', 'revise only', 'Other coupons support the procedure; each variable below is judged by those that are linked now.')
  if (field === 'standards') return plain('editorial', 'revise only', 'The procedure names other standards or editions; it is judged whole by those that it names now.')
  if (field === 'unitSystem') return plain('editorial', 'revise only', 'The record is kept in other units; its figures are judged by the breakpoints that the standard prints in those units.')
  if (field === 'processes' || field.endsWith('.passes')) return plain('editorial', 'revise only', `${label} changed and nothing else of it: revise the document.`)
  return isOfDocument(field) ? plain('editorial', 'revise only', `${label} is part of the document, not of the weld: revise the document.`) : null
}

const traced = ({ label }: FieldChange): Judged => plain('editorial', 'revise only', `${label} names, traces or explains, and no rule judges it: revise the document.`)
const unknown = (change: FieldChange, why: string): Judged =>
  isOfTrace(change.field) ? traced(change) : plain('essential', 'cannot tell', `Whether ${change.label} is essential can't be told: ${why}. Treat it as essential until you have looked it up.`)

function judgeChange(scene: Scene, change: FieldChange, touched: Touched): Judged {
  const { standard, input } = scene
  const blocks = touched.place.block
  const strange = ({ process }: ProcessBlock): boolean => process === null || !standard.processes.includes(process)
  const mine = [blocks.now, blocks.old].filter((block) => block !== null)
  const stranger = mine.find(strange)
  if (stranger) return unknown(change, stranger.process === null ? 'the welding process is not stated' : `${stranger.process === 'OTHER' ? 'this process' : stranger.process} is outside the rules of ${standard.shortName} kept here`)
  const outside = mine.length > 0 ? [] : [...input.before.variables.processes, ...input.after.variables.processes].filter(strange)
  const kind = strongest(touched)
  if (kind === 'editorial') {
    if (outside.length > 0) return unknown(change, `the procedure has a process outside the rules of ${standard.shortName} kept here`)
    if (isOfTrace(change.field)) return traced(change)
    const [idle] = touched.idle
    if (idle) return { ...ofRules([...touched.idle]), class: 'editorial', standing: 'revise only', sentence: `${change.label} is no variable here, because toughness is not required: revise the document.`, wanted: null }
    return plain('editorial', 'revise only', `No rule of ${standard.shortName} ${input.edition} kept here judges ${change.label}: revise the document.`)
  }
  const rules = [...touched.rules].filter(([, own]) => own === kind).map(([rule]) => rule)
  const named = rules.filter((rule) => touched.exact.has(rule))
  const shown = named.length > 0 ? named : rules
  if (kind === 'nonessential') return { ...ofRules(shown), class: kind, standing: 'revise only', sentence: `${change.label} is a nonessential variable: revise the procedure; no new coupon is needed.`, wanted: null }
  return covered(scene, change, touched, kind, shown, outside.length > 0)
}

function strongest({ rules }: Touched): ImpactClass {
  let kind: ImpactClass = 'editorial'
  for (const own of rules.values()) if (own !== 'not-a-variable' && RANK[own] > RANK[kind]) kind = own
  return kind
}

function ofRules(rules: readonly Rule[], findings: readonly Finding[] = []): Pick<Judged, 'ruleIds' | 'clause' | 'basis'> {
  const clauses = [...new Set(findings.length > 0 ? findings.map(({ clause }) => clause) : rules.map(({ meta }) => meta.clause))]
  const bases: Basis[] = findings.length > 0 ? findings.map(({ basis }) => basis) : rules.map(({ meta }) => meta.basis)
  return { ruleIds: [...new Set([...findings.map(({ ruleId }) => ruleId), ...rules.map(({ meta }) => meta.id)])], clause: clauses.length > 0 ? list(clauses) : null, basis: bases.length > 0 ? bases.reduce(weakest) : null }
}

/** Whether the linked coupons cover an essential or supplementary change. */
function covered(scene: Scene, change: FieldChange, touched: Touched, kind: 'essential' | 'supplementary', shown: readonly Rule[], outOfScope: boolean): Judged {
  const { after, before, input } = scene
  const block = touched.place.block
  const counts = ({ class: own }: Finding): boolean => own === 'essential' || own === 'supplementary'
  const ids = new Set([...touched.rules.keys()].map(({ meta }) => meta.id))
  const findings = after.findings.filter((finding) => counts(finding) && ids.has(finding.ruleId) && (finding.processId === null || (!block.now && !block.old) || finding.processId === block.now?.id))
  const head = `${change.label} is ${kind === 'essential' ? 'an' : 'a'} ${CLASS_WORD[kind]} variable`
  const outside = findings.filter(({ verdict }) => verdict === 'outside')
  const faults = after.findings.filter(({ ruleId, field }) => ruleId === 'assessment/contradiction' && (field === change.field || change.field.startsWith(`${field}.`)))
  const open = [...faults, ...findings.filter(({ verdict }) => verdict === 'cannot-tell')]
  const shownOf = (deciding: readonly Finding[]): Pick<Judged, 'ruleIds' | 'clause' | 'basis'> => ofRules(shown, deciding.filter(({ clause }) => clause !== ''))
  const beforeToo = (deciding: readonly Finding[]): string => (deciding.length > 0 && deciding.every((finding) => before.get(keyOf(finding))?.verdict === finding.verdict) ? ' So it was before the change.' : '')
  const tell = (deciding: readonly Finding[]): string => {
    const all = [...new Set(deciding.map(({ sentence }) => sentence))]
    return `${all.slice(0, 3).join(' ')}${all.length > 3 ? ` And ${all.length - 3} more.` : ''}`
  }

  if (outside.length > 0) return { ...shownOf(outside), class: kind, standing: 'requalify', sentence: `${head}. ${tell(outside)}${beforeToo(outside)}`, wanted: wantedBy(outside) ?? `A coupon whose ${list(shown.map(({ label }) => label))} is ${change.after ?? 'as asked'}.` }
  if (open.length > 0) return { ...shownOf(open), class: kind, standing: 'cannot tell', sentence: `${head}. ${tell(open)}${beforeToo(open)}`, wanted: wantedBy(open) }
  if (outOfScope) return { ...ofRules(shown), class: kind, standing: 'cannot tell', sentence: `${head}, and one process of the procedure is outside the rules kept here, so whether it is still covered can't be told.`, wanted: null }
  const uncertified = input.coupons.filter(({ id, certified }) => !certified && findings.some(({ couponIds }) => couponIds.includes(id)))
  if (uncertified.length > 0) return { ...shownOf(findings), class: kind, standing: 'cannot tell', sentence: `${head}. ${tell(findings)} But ${list(uncertified.map(({ number }) => number))} ${uncertified.length > 1 ? 'are' : 'is'} not certified yet, so can't support a procedure.`, wanted: null }
  if (findings.length === 0) return { ...ofRules(shown), class: kind, standing: 'still covered', sentence: `${head}, but it no longer arises in this revision, so there is nothing of it that a coupon would have to cover.`, wanted: null }
  const own = findings.filter(({ ruleId }) => shown.some(({ meta }) => meta.id === ruleId))
  const telling = own.length > 0 ? own : findings
  return { ...shownOf(telling), class: kind, standing: 'still covered', sentence: `${head}. ${tell(telling)}`, wanted: null }
}

function wantedBy(findings: readonly Finding[]): string | null {
  const asked = [...new Set(findings.flatMap(({ fixes }) => fixes.flatMap((fix) => (fix.kind === 'plan-coupon' ? [fix.requirement] : []))))]
  return asked.length > 0 ? asked.join(' ') : null
}

function overallOf(changes: readonly ImpactChange[], after: Assessment, shortName: string): RevisionImpact['overall'] {
  const counts = { editorial: 0, nonessential: 0, supplementary: 0, essential: 0 }
  let kind: ImpactClass | null = null
  let standing: Standing | null = null
  for (const change of changes) {
    counts[change.class] += 1
    if (kind === null || RANK[change.class] > RANK[kind]) kind = change.class
    if (standing === null || standingRank(change.standing) > standingRank(standing)) standing = change.standing
  }
  const named = (wanted: Standing): string => list([...new Set(changes.filter((change) => change.standing === wanted).map(({ label }) => label))])
  const whole = after.verdict === 'within' ? '' : ` The whole procedure, changed or not, is ${after.verdict === 'outside' ? 'outside' : 'not shown to be within'} what its coupons qualify.`
  const sentence =
    standing === null ? 'Nothing has changed.'
    : standing === 'requalify' ? `A new qualification is needed under ${shortName}: ${named('requalify')}.`
    : standing === 'cannot tell' ? `Whether the coupons still cover the revision under ${shortName} can't be told: ${named('cannot tell')}.${whole}`
    : standing === 'still covered' ? `${capital(kind === 'supplementary' ? 'supplementary essential' : 'essential')} variables changed under ${shortName}, and the linked coupons still cover them.${whole}`
    : `Revise only: nothing that changed needs a new coupon under ${shortName}.${whole}`
  return { class: kind, standing, verdict: after.verdict, sentence, counts }
}
