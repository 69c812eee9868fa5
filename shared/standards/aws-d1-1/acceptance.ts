/** Whether results of the test weld are accepted: visual 6.10.1, non-destructive 6.10.2, bends, tension and macros 6.10.3, CVN, retests 6.10.5. */
import type { AssessedCoupon, Basis, TestVerdict } from '../../schemas/assessment.ts'
import type { BendTest, CouponContent, NdtTest, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figure, figureOrNull, single, tidy, unitOf } from '../common/reading.ts'
import { list, show } from '../common/wording.ts'
import { clauseIn } from './editions.ts'
import { couponThickness, FIGURES, testKind } from './ranges.ts'
import { identity, members, specKey, systemOf } from './steels.ts'

type Judged = Pick<TestVerdict, 'verdict' | 'sentence'>

/** Specified minimum tensile strength by steel, as printed in both systems; A36, A500 B and C and A53 B read in 2015, the others from memory. */
const STRENGTH: Readonly<Record<string, { SI: number; US: number }>> = {
  A36: { SI: 400, US: 58 }, 'A500 B': { SI: 400, US: 58 }, 'A500 C': { SI: 425, US: 62 }, 'A53 B': { SI: 415, US: 60 },
  'A572 50': { SI: 450, US: 65 }, A992: { SI: 450, US: 65 }, A588: { SI: 485, US: 70 }, 'A572 65': { SI: 550, US: 80 }, 'A913 65': { SI: 550, US: 80 },
}

/** Least strength of the weaker base metal, as recorded or by the table; null when a metal gives none. */
export function requiredStrength(variables: WeldingVariables, system: UnitSystem): number | null {
  const all = members(variables, system).map(({ metal }) => STRENGTH[identity(metal) ?? '']?.[system] ?? STRENGTH[specKey(metal) ?? '']?.[system] ?? figureOrNull(metal.minTensile, 'stress', system))
  const known = all.filter((value) => value !== null)
  return known.length === all.length ? Math.min(...known) : null
}

export interface BendJudgement extends Judged {
  /** Sum of the openings that count, in the record's unit. */
  sum: number
  /** A long corner crack without slag or fusion flaw: neither pass nor fail, another specimen is tested. */
  disregarded: boolean
}

/** 180° (memory), less what the specimen springs back. */
const FULL_BEND = 170

/** Corner cracks first, then single size and sum of the others on the convex face (read 2015, 4.9.3.3). */
export function bendJudgement(test: BendTest, system: UnitSystem): BendJudgement {
  const f = FIGURES[system]
  const unit = unitOf('length', system)
  const sizes = test.openings.map((opening) => ({ ...opening, size: figure(opening.size, 'length', system) }))
  const rest = sizes.filter(({ corner }) => !corner).map(({ size }) => size)
  const sum = tidy(rest.filter((size) => size > f.undercut && size <= f.opening).reduce((total, size) => total + size, 0))
  const told = (verdict: Judged['verdict'], sentence: string, disregarded = false): BendJudgement => ({ verdict, sentence: `${test.specimen} ${sentence}`, sum, disregarded })
  if (test.broke) return told('fail', 'broke.')
  const long = rest.find((size) => size > f.opening)
  if (long !== undefined) return told('fail', `has an opening of ${show(long, unit)}, over the ${show(f.opening, unit)} allowed.`)
  if (sum > f.openingSum) return told('fail', `has openings that sum to ${show(sum, unit)}, over the ${show(f.openingSum, unit)} allowed (those up to ${show(f.undercut, unit)} are not counted).`)
  const corners = sizes.filter(({ corner }) => corner)
  const flawed = corners.find(({ size, fromInternalFlaw }) => fromInternalFlaw === true && size > f.opening)
  if (flawed) return told('fail', `has a corner crack of ${show(flawed.size, unit)} from slag or another fusion flaw, over the ${show(f.opening, unit)} allowed.`)
  const unsure = corners.find(({ size, fromInternalFlaw }) => fromInternalFlaw === null && size > f.opening)
  if (unsure) return told('cannot-tell', `has a corner crack of ${show(unsure.size, unit)}; whether it comes from slag or another fusion flaw decides, and isn't recorded.`)
  const plain = corners.find(({ size }) => size > f.corner)
  if (plain) return told('cannot-tell', `has a corner crack of ${show(plain.size, unit)} without slag or fusion flaw: the specimen is disregarded and a replacement from the same weld is tested.`, true)
  if (test.angle && test.angle.si < FULL_BEND) return told('cannot-tell', `was bent to ${show(test.angle.si, '°')} only; a bend of 180° is asked.`)
  if (!test.inspected && test.openings.length === 0) return told('cannot-tell', 'has no inspection recorded.')
  return told('pass', test.openings.length === 0 ? 'shows no opening.' : `is accepted: openings that count sum to ${show(sum, unit)} of ${show(f.openingSum, unit)}.`)
}

/** Macro section: cracks, fusion, and the legs or size that were specified. */
export function macroJudgement(test: CouponContent['macros'][number], variables: WeldingVariables, system: UnitSystem): Judged {
  const unit = unitOf('length', system)
  if (test.cracks === true) return { verdict: 'fail', sentence: `${test.specimen} shows a crack.` }
  if (test.fusionComplete === false) return { verdict: 'fail', sentence: `${test.specimen} shows incomplete fusion.` }
  if (test.cracks === null || test.fusionComplete === null) return { verdict: 'cannot-tell', sentence: `${test.specimen}: cracks or fusion aren't recorded.` }
  if (testKind(variables) === 'partial') return { verdict: 'cannot-tell', sentence: `${test.specimen}: fusion complete, no cracks; whether the weld is as large as specified is not part of the record and must be judged by a person.` }
  if (testKind(variables) !== 'fillet') return { verdict: 'pass', sentence: `${test.specimen}: fusion complete, no cracks.` }
  const wanted = single(variables.joint.filletLeg, 'length', system)
  const legs = [test.leg1, test.leg2].map((leg) => figureOrNull(leg, 'length', system))
  if (wanted === null || legs.some((leg) => leg === null)) return { verdict: 'cannot-tell', sentence: `${test.specimen}: the legs and the leg that was specified aren't all recorded.` }
  const least = Math.min(...legs.filter((leg) => leg !== null))
  return least >= wanted ? { verdict: 'pass', sentence: `${test.specimen}: fusion complete, no cracks, legs at least ${show(wanted, unit)}.` } : { verdict: 'fail', sentence: `${test.specimen}: a leg of ${show(least, unit)} is under the ${show(wanted, unit)} specified.` }
}

type Visual = NonNullable<CouponContent['visual']>

/** Visual examination of the test weld (read 2020, 6.10.1). */
export function visualJudgement(visual: Visual, variables: WeldingVariables, system: UnitSystem): Judged {
  const f = FIGURES[system]
  const unit = unitOf('length', system)
  const kind = testKind(variables)
  const faults: string[] = []
  const open: string[] = []
  const limit = (label: string, value: Visual['undercut'], most: number, needed: boolean): void => {
    const size = figureOrNull(value, 'length', system)
    if (size === null) { if (needed) open.push(label) } else if (size > most) faults.push(`${label} of ${show(size, unit)} is over the ${show(most, unit)} allowed`)
  }
  const must = (label: string, value: boolean | null, good: boolean, fault: string): void => {
    if (value === null) open.push(label)
    else if (value !== good) faults.push(fault)
  }
  must('cracks', visual.cracks, false, 'there is a crack')
  must('craters', visual.cratersFull, true, 'a crater is not full')
  limit('undercut', visual.undercut, f.undercut, true)
  if (kind === 'fillet') must('profile', visual.profileAccepted, true, 'the profile is not accepted')
  else limit('reinforcement', visual.reinforcement, f.reinforcement, true)
  if (kind === 'complete') {
    must('root', visual.rootSound, true, 'the root shows incomplete fusion or inadequate penetration')
    limit('root concavity', visual.rootConcavity, f.concavity, false)
    limit('melt-through', visual.meltThrough, f.meltThrough, false)
    if ((figureOrNull(visual.rootConcavity, 'length', system) ?? 0) > 0) {
      const T = couponThickness(variables, system)
      const had = figureOrNull(visual.weldThickness, 'length', system)
      if (had === null || T === null) open.push('weld thickness at the concave root')
      else if (had < T) faults.push(`the weld is ${show(had, unit)} thick at the concave root, less than the base metal`)
    }
  }
  if (faults.length > 0) return { verdict: 'fail', sentence: `Visual examination: ${list(faults)}.` }
  if (open.length > 0) return { verdict: 'cannot-tell', sentence: `Visual examination: ${list(open)} ${open.length > 1 ? "aren't" : "isn't"} recorded.` }
  return { verdict: 'pass', sentence: 'Visual examination is accepted.' }
}

/** Radiography or ultrasonics of the whole length (read 2015, 4.9.2). */
export function ndtJudgement(test: NdtTest): Judged {
  if (test.accepted === false) return { verdict: 'fail', sentence: `${test.method} was not accepted.` }
  if (test.accepted === null) return { verdict: 'cannot-tell', sentence: `${test.method}: the result isn't recorded.` }
  if (test.wholeLength === false) return { verdict: 'fail', sentence: `${test.method} did not cover the whole length of the test weld.` }
  if (test.wholeLength !== true && (test.method === 'RT' || test.method === 'UT')) return { verdict: 'cannot-tell', sentence: `${test.method}: whether the whole length was tested isn't recorded.` }
  return { verdict: 'pass', sentence: `${test.method} was accepted.` }
}

/** CVN values against what the contract asks; the standard itself gives no values. */
export function toughnessJudgement(test: CouponContent['toughness'][number], variables: WeldingVariables): Judged {
  const where = `Toughness of the ${test.place === 'weld' ? 'weld' : 'heat-affected zone'}`
  const wanted = variables.impactEnergy?.si ?? null
  if (test.values.length === 0) return { verdict: 'cannot-tell', sentence: `${where}: no values are recorded.` }
  if (wanted === null) return { verdict: 'cannot-tell', sentence: `${where}: the energy that the contract asks isn't stated.` }
  const mean = tidy(test.values.reduce((sum, value) => sum + value.si, 0) / test.values.length)
  if (mean < wanted) return { verdict: 'fail', sentence: `${where}: the mean of ${round1(mean)} J is under the ${round1(wanted)} J asked.` }
  if (test.values.some((value) => value.si < wanted)) return { verdict: 'cannot-tell', sentence: `${where}: the mean of ${round1(mean)} J is enough, but a single value is under ${round1(wanted)} J; what the contract allows a single value isn't stated.` }
  return { verdict: 'pass', sentence: `${where}: every value is at least the ${round1(wanted)} J asked.` }
}

const round1 = (value: number): number => Math.round(value * 10) / 10

/** Plunger for 10 mm (3/8 in.) specimens by specified yield strength (memory). */
const PLUNGER = { SI: [[345, 38.1], [620, 50.8], [Infinity, 63.5]], US: [[50, 1.5], [90, 2], [Infinity, 2.5]] } as const

/** Row of the table by a yield strength in the unit of `system`: 0, 1 or 2. */
function plungerRow(yieldStrength: number, system: UnitSystem): 0 | 1 | 2 {
  const [low, middle] = PLUNGER[system]
  return yieldStrength <= low[0] ? 0 : yieldStrength < middle[0] ? 1 : 2
}

/** @param yieldStrength in the system's unit @returns plunger diameter A for a 10 mm (3/8 in.) specimen */
export const plungerDiameter = (yieldStrength: number, system: UnitSystem): number => PLUNGER[system][plungerRow(yieldStrength, system)][1]

/** What is wrong with the former of a bend; null when nothing is, or nothing can be said. */
export function formerIssue(coupon: AssessedCoupon, index: number, edition: string): { field: string; message: string; clause: string } | null {
  const { variables, bends } = coupon.content
  const system = variables.unitSystem
  const bend = bends[index]
  const unit = unitOf('length', system)
  const t = figureOrNull(bend?.thickness, 'length', system)
  const used = figureOrNull(bend?.formerDiameter, 'length', system)
  // A yield strength typed in MPa belongs to the metric row, whatever the record is in: 345 MPa is 50 ksi here.
  const yields = members(variables, system).flatMap(({ metal }) => (metal.minYield ? [plungerRow(figure(metal.minYield, 'stress', systemOf(metal.minYield)), systemOf(metal.minYield))] : []))
  // The printed plungers are for 10 mm (3/8 in.) specimens only.
  if (!bend || t === null || used === null || yields.length === 0 || Math.abs(t - (system === 'SI' ? 9.8 : 3 / 8)) > (system === 'SI' ? 0.4 : 0.02)) return null
  const most = PLUNGER[system][Math.max(...yields) as 0 | 1 | 2][1]
  if (used <= most + (system === 'SI' ? 0.5 : 0.02)) return null
  return { field: `bends.${index}.formerDiameter`, message: `${bend.specimen} was bent over ${show(used, unit)}; the plunger for this base metal is ${show(most, unit)}.`, clause: clauseIn(edition, '6.10.3') }
}

export const CLAUSES: Record<'visual' | 'ndt' | 'bend' | 'tension' | 'macro' | 'toughness' | 'retest', { clause: string; basis: Basis }> = {
  visual: { clause: '6.10.1', basis: 'read' },
  ndt: { clause: '6.10.2', basis: 'read' },
  bend: { clause: '6.10.3.3', basis: 'read' },
  tension: { clause: '6.10.3', basis: 'memory' },
  macro: { clause: '6.10.4', basis: 'memory' },
  toughness: { clause: 'Table 6.7', basis: 'memory' },
  retest: { clause: '6.10.5', basis: 'secondary' },
}
