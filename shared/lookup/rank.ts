/**
 * Which approved procedures a joint can be welded by: all that was asked lies inside what the document states. It reads the
 * documents alone and knows no clause of a standard; what a document does not state, it does not allow.
 */
import { describeValue } from '../comparison/describe.ts'
import { squeeze } from '../library/search.ts'
import type { Interval } from '../schemas/common.ts'
import type { BaseMetal, ProcedureContent, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'
import { formatInterval } from '../units/format.ts'
import type { UnitSystem } from '../units/types.ts'
import type { AskedMetal, JointQuestion } from './joint-question.ts'

export interface Candidate { id: string; content: ProcedureContent }
/** `score` from 0 to 100; `reasons` and `wants` are plain sentences. */
export interface Fit { id: string; reasons: string[]; score: number }
export interface NearMiss { id: string; wants: string[] }
export interface Ranking { fits: Fit[]; near: NearMiss[] }

/** More misses than this are another joint, not a near miss. */
const NEAR_MISSES = 2

type Answer = { fits: true; reason: string | null; score: number } | { fits: false; want: string }
const yes = (reason: string | null, score = 0): Answer => ({ fits: true, reason, score })
const no = (want: string): Answer => ({ fits: false, want })

const metalName = (metal: BaseMetal): string => [metal.specification, metal.grade].filter((part) => part).join(' ') || (metal.pNumber ? `P-No. ${metal.pNumber}` : 'no metal')

/** How closely a stated metal is the one asked: 4 the same row, 3 the same grade, 2 the same P-Number and Group, 1 the same P-Number; 0 not at all. */
function metalMatch(asked: AskedMetal, stated: BaseMetal, toughness: boolean | null): number {
  if (stated.libraryId !== null && asked.libraryIds.includes(stated.libraryId)) return asked.libraryIds.length === 1 ? 4 : 3
  const written = [stated.grade, `${stated.specification ?? ''}${stated.grade ?? ''}`, stated.uns].filter((text): text is string => !!text).map(squeeze)
  if (written.includes(squeeze(asked.text))) return 3
  if (stated.grade === null && stated.pNumber === null && stated.iso15608 !== null && stated.iso15608 === asked.iso15608) return 1
  // Not listed is never equal to not listed: two metals without a P-Number are two metals.
  if (asked.pNumber === null || stated.pNumber === null || asked.pNumber !== stated.pNumber) return 0
  if (asked.groupNumber !== null && asked.groupNumber === stated.groupNumber) return 2
  return toughness === true ? 0 : 1
}

const CLOSENESS = ['', 'the same P-Number or group', 'the same P-Number and Group', 'the same grade', 'the same metal'] as const

/** The closer of the two ways to lay the asked pair on the stated one: its weaker side and the sum of both. */
function pairMatch(one: AskedMetal, other: AskedMetal, { a, b }: WeldingVariables['baseMetals'], toughness: boolean | null): { worst: number; sum: number } {
  const ways = [[metalMatch(one, a, toughness), metalMatch(other, b, toughness)], [metalMatch(one, b, toughness), metalMatch(other, a, toughness)]] as const
  const [straight, crossed] = ways.map(([first, second]) => ({ worst: Math.min(first, second), sum: first + second }))
  const none = { worst: 0, sum: 0 }
  return (crossed ?? none).worst > (straight ?? none).worst || ((crossed ?? none).worst === (straight ?? none).worst && (crossed ?? none).sum > (straight ?? none).sum) ? (crossed ?? none) : (straight ?? none)
}

function metals({ metalA, metalB }: JointQuestion, { baseMetals, toughnessRequired }: WeldingVariables): Answer | null {
  const [one, other] = [metalA ?? metalB, metalB ?? metalA]
  if (!one || !other) return null
  const best = pairMatch(one, other, baseMetals, toughnessRequired)
  const [nameA, nameB] = [metalName(baseMetals.a), metalName(baseMetals.b)]
  const pair = nameA === nameB ? nameA : `${nameA} to ${nameB}`
  const asked = one.text === other.text ? one.text : `${one.text} to ${other.text}`
  if (best.worst > 0) return yes(`${asked}: ${CLOSENESS[best.worst] ?? ''} as ${pair}`, best.sum * 5)
  const onlyGroup = toughnessRequired === true && pairMatch(one, other, baseMetals, false).worst > 0
  return no(onlyGroup ? `It requires toughness and states ${pair}; ${asked} is not shown to be of the same Group.` : `It is for ${pair}, not ${asked}.`)
}

const CLOSE = 1e-9

/** Whether the ends that were asked lie inside what is stated. */
function inside(asked: Interval, stated: Interval): boolean {
  if (stated.all) return true
  if (asked.all) return false
  const below = asked.min && stated.min && asked.min.si < stated.min.si - CLOSE
  const above = asked.max && stated.max && asked.max.si > stated.max.si + CLOSE
  const fits = (end: Interval['min']): boolean => !end || ((!stated.min || end.si >= stated.min.si - CLOSE) && (!stated.max || end.si <= stated.max.si + CLOSE))
  return !below && !above && fits(asked.min) && fits(asked.max)
}
const given = (interval: Interval | null): interval is Interval => interval !== null && (interval.all || interval.min !== null || interval.max !== null)

/** Narrower ranges were written for such a joint: up to ten points. */
function tightness(stated: Interval): number {
  if (stated.all || !stated.min || !stated.max || stated.max.si <= 0) return 0
  return 10 * Math.max(0, Math.min(1, stated.min.si / stated.max.si))
}

function thickness(question: JointQuestion, variables: WeldingVariables, system: UnitSystem): Answer | null {
  if (!given(question.thickness)) return null
  const asked = formatInterval(question.thickness, 'length', system).text
  if (!given(variables.thickness)) return no(`It states no base metal thickness; ${asked} is asked.`)
  const stated = formatInterval(variables.thickness, 'length', system).text
  return inside(question.thickness, variables.thickness) ? yes(`${asked} lies within its thickness of ${stated}`, tightness(variables.thickness)) : no(`Its base metal thickness is ${stated}; ${asked} is outside.`)
}

function diameter(question: JointQuestion, variables: WeldingVariables, system: UnitSystem): Answer | null {
  if (!given(question.diameter)) return null
  const asked = formatInterval(question.diameter, 'length', system).text
  if (!given(variables.diameter)) return variables.product === 'plate' ? null : yes('it states no limit of diameter')
  const stated = formatInterval(variables.diameter, 'length', system).text
  return inside(question.diameter, variables.diameter) ? yes(`outside diameter ${asked} lies within ${stated}`, tightness(variables.diameter) / 5) : no(`Its outside diameter is ${stated}; ${asked} is outside.`)
}

const processNames = (blocks: readonly ProcessBlock[]): string => [...new Set(blocks.map(({ process }) => process ?? 'no process'))].join(' + ')

function process(question: JointQuestion, { processes }: WeldingVariables): Answer | null {
  if (question.processes.length === 0) return null
  const missing = question.processes.filter((asked) => !processes.some((block) => block.process === asked))
  if (missing.length > 0) return no(`It is for ${processNames(processes)}, not ${missing.join(' + ')}.`)
  const exact = processes.every((block) => block.process !== null && question.processes.includes(block.process))
  return yes(`${processNames(processes)}${exact ? '' : `, with ${question.processes.join(' + ')} among them`}`, exact ? 20 : 8)
}

function pulsed(question: JointQuestion, { processes }: WeldingVariables): Answer | null {
  if (question.pulsed !== true) return null
  const asked = processes.filter((block) => question.processes.length === 0 || (block.process !== null && question.processes.includes(block.process)))
  return asked.some(({ electrical }) => electrical.pulsed === true || electrical.transferMode === 'pulsed-spray') ? yes('pulsed current', 5) : no('It does not state pulsed current.')
}

const VERTICAL = /^[356]/

/** Every process of the document must allow the position: the joint is welded by the whole of it. */
function position(question: JointQuestion, { processes }: WeldingVariables): Answer | null {
  const { position: asked, progression } = question
  if (asked === null) return null
  const without = processes.find((block) => !block.positions.includes(asked))
  if (without) return no(`Its ${without.process ?? 'process'} is for ${describeValue('processes.0.positions', without.positions, 'SI')}; ${asked} is asked.`)
  if (progression !== null && VERTICAL.test(asked)) {
    const other = processes.find((block) => block.progression !== progression && block.progression !== 'both')
    if (other) return no(`Its ${other.process ?? 'process'} is welded ${other.progression === null ? 'with no progression stated' : `${other.progression}ward`}; ${progression}ward is asked.`)
  }
  const count = Math.max(...processes.map(({ positions }) => positions.length))
  return yes(`${asked}${progression && VERTICAL.test(asked) ? ` ${progression}ward` : ''} is among its positions`, Math.max(0, 6 - count))
}

function weld(question: JointQuestion, { joint }: WeldingVariables): Answer | null {
  if (question.weld === null) return null
  return joint.weld === question.weld ? yes(`${question.weld} weld`, 5) : no(`It is for ${joint.weld} welds, not ${question.weld} welds.`)
}

function product(question: JointQuestion, variables: WeldingVariables): Answer | null {
  if (question.product === null) return null
  if (variables.product === question.product) return yes(variables.product, 4)
  return variables.product === 'plate-and-pipe' ? yes('plate and pipe', 2) : no(`It is for ${variables.product}, not ${question.product}.`)
}

function toughness(question: JointQuestion, { toughnessRequired }: WeldingVariables): Answer | null {
  if (question.toughness !== true) return null
  return toughnessRequired === true ? yes('written for work that requires toughness', 3) : no('The job requires toughness; the procedure does not state it.')
}

/**
 * Candidates that allow all that is asked, best first (closest metal, then process, tightest range), and those that miss by little,
 * each with what lies outside. A question in which nothing was read ranks nothing.
 * @param system in which figures are told
 */
export function rankForJoint(joint: JointQuestion, candidates: readonly Candidate[], system: UnitSystem = 'SI'): Ranking {
  const [fits, near]: [Fit[], NearMiss[]] = [[], []]
  for (const { id, content } of candidates) {
    const { variables } = content
    const answers = [metals(joint, variables), thickness(joint, variables, system), diameter(joint, variables, system), process(joint, variables), pulsed(joint, variables), position(joint, variables), weld(joint, variables), product(joint, variables), toughness(joint, variables)].filter((answer) => answer !== null)
    if (answers.length === 0) continue
    const wants = answers.flatMap((answer) => (answer.fits ? [] : [answer.want]))
    if (wants.length === 0) fits.push({ id, reasons: answers.flatMap((answer) => (answer.fits && answer.reason !== null ? [answer.reason] : [])), score: Number(answers.reduce((sum, answer) => sum + (answer.fits ? answer.score : 0), 0).toFixed(2)) })
    else if (wants.length <= NEAR_MISSES && wants.length < answers.length) near.push({ id, wants })
  }
  // Sorting is stable, so that equal candidates keep the order in which they came.
  return { fits: fits.sort((one, other) => other.score - one.score), near: near.sort((one, other) => one.wants.length - other.wants.length) }
}
