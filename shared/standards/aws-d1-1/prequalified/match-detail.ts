/** Looks for a prequalified detail that a drafted groove fits in every respect. */
import type { Interval } from '../../../schemas/common.ts'
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, isNoGas, tidy, unitOf } from '../../common/reading.ts'
import { list, show } from '../../common/wording.ts'
import { grooveAngleOf, oneEdgeBevelled } from '../groove-angle.ts'
import { askedPlaces } from '../positions.ts'
import { details, readDesignation, type Detail, type Printed } from './joint-details.ts'

export interface Match {
  /** `unknown`: the list kept here has no line for such a groove, or the draft leaves something open. */
  fits: 'yes' | 'no' | 'unknown'
  detail: Detail | null
  /** Why the nearest detail does not fit, in words; each with its field. */
  misses: { field: string; sentence: string }[]
  /** Fields that the draft leaves open. */
  lacking: string[]
}

interface Span { min: number; max: number }
type Check = { field: string; sentence: string } | { lacks: string } | null

const EPSILON = 1e-6
const stated = (interval: Interval | null, dimension: 'length' | 'angle', system: UnitSystem): (Span & { spread: boolean }) | null => {
  const { min, max, all, fault } = figures(interval, dimension, system)
  const low = min ?? max
  const high = max ?? min
  return fault || all || low === null || high === null ? null : { min: low, max: high, spread: low !== high }
}

/** A single value must lie in the tolerance for drawings; a range may use the tolerance of fit-up beside it. */
function allowed(nominal: Span, detailed: readonly [number, number], fitUp: readonly [number, number], spread: boolean): Span {
  return { min: nominal.min - detailed[0] - (spread ? fitUp[0] : 0), max: nominal.max + detailed[1] + (spread ? fitUp[1] : 0) }
}

const size = (printed: Printed | null, system: UnitSystem): number => (printed === null ? Infinity : printed[system])

function lengthCheck(interval: Interval | null, nominal: readonly [Printed, Printed] | Span, which: 'opening' | 'face', detail: Detail, system: UnitSystem, field: string, label: string): Check {
  const had = stated(interval, 'length', system)
  if (!had) return { lacks: field }
  const unit = unitOf('length', system)
  const tolerances = detail.tolerances
  const span: Span = 'min' in nominal ? nominal : { min: nominal[0][system], max: nominal[1][system] }
  const pair = (one: { up: Printed | null; down: Printed | null }): readonly [number, number] => [size(one.down, system), size(one.up, system)]
  const may = allowed(span, pair(tolerances.detailed[which]), pair(tolerances.fitUp[which]), had.spread)
  if (had.min >= may.min - EPSILON && had.max <= may.max + EPSILON) return null
  return { field, sentence: `${label} ${had.spread ? `${show(had.min, unit)} to ${show(had.max, unit)}` : show(had.min, unit)} is outside ${show(tidy(Math.max(0, may.min)), unit)} to ${may.max === Infinity ? 'unlimited' : show(tidy(may.max), unit)} of ${detail.code}` }
}

function angleCheck(variables: WeldingVariables, detail: Detail, system: UnitSystem): Check {
  if (detail.angle === null) return null
  const field = oneEdgeBevelled(detail.groove) ? 'joint.bevelAngle' : 'joint.includedAngle'
  const had = stated(grooveAngleOf(variables.joint), 'angle', system)
  if (!had) return { lacks: field }
  const { detailed, fitUp } = detail.tolerances
  const may = allowed({ min: detail.angle, max: detail.angle }, [-detailed.angle[1], detailed.angle[0]], [-fitUp.angle[1], fitUp.angle[0]], had.spread)
  if (had.min >= may.min && had.max <= may.max) return null
  return { field, sentence: `groove angle ${had.spread ? `${show(had.min, '°')} to ${show(had.max, '°')}` : show(had.min, '°')} is outside ${show(may.min, '°')} to ${show(may.max, '°')} of ${detail.code}` }
}

function thicknessCheck(variables: WeldingVariables, detail: Detail, system: UnitSystem): Check {
  if (detail.most === null && detail.least === null) return null
  const unit = unitOf('length', system)
  const { min, max, all, fault } = figures(variables.thickness, 'length', system)
  const low = min ?? max
  const high = all ? Infinity : (max ?? min)
  if (fault || high === null || (low === null && !all)) return { lacks: 'thickness' }
  if (detail.most && high > detail.most[system]) return { field: 'thickness', sentence: `${high === Infinity ? 'unlimited thickness' : `thickness ${show(high, unit)}`} is over the ${show(detail.most[system], unit)} of ${detail.code}` }
  if (detail.least && (low ?? 0) < detail.least[system]) return { field: 'thickness', sentence: `thickness ${show(low ?? 0, unit)} is under the ${show(detail.least[system], unit)} of ${detail.code}` }
  return null
}

/** Root opening that follows the thickness, for the thicknesses asked. */
function openingOf(variables: WeldingVariables, detail: Detail, system: UnitSystem): readonly [Printed, Printed] | Span | null {
  if (detail.opening !== 'T' && detail.opening !== 'T/2') return detail.opening
  const had = stated(variables.thickness, 'length', system)
  const factor = detail.opening === 'T' ? 1 : 0.5
  // One stated opening must suit every thickness asked.
  return had ? { min: had.max * factor, max: had.min * factor } : null
}

function backingChecks(variables: WeldingVariables, detail: Detail): Check[] {
  const { backing, backGouging } = variables.joint
  const checks: Check[] = []
  if (backing === null) checks.push({ lacks: 'joint.backing' })
  else if (detail.backed !== (backing !== 'none')) checks.push({ field: 'joint.backing', sentence: `${detail.code} is welded ${detail.backed ? 'on backing' : 'without backing'}` })
  if (detail.bothSides) {
    if (variables.joint.weldedFromBothSides === null) checks.push({ lacks: 'joint.weldedFromBothSides' })
    else if (!variables.joint.weldedFromBothSides) checks.push({ field: 'joint.weldedFromBothSides', sentence: `${detail.code} is welded from both sides` })
  }
  if (detail.gouged) {
    if (backGouging === null) checks.push({ lacks: 'joint.backGouging' })
    else if (backGouging === 'none') checks.push({ field: 'joint.backGouging', sentence: `${detail.code} is backgouged to sound metal before the second side` })
  }
  return checks
}

function blockChecks(block: ProcessBlock, detail: Detail): Check[] {
  const checks: Check[] = []
  if (block.positions.length === 0) checks.push({ lacks: 'positions' })
  // No detail is for short-circuiting; which transfer is meant must be known.
  if (block.process === 'GMAW' && block.electrical.transferMode === null) checks.push({ lacks: 'electrical.transferMode' })
  const missed = askedPlaces(block.positions).filter((place) => !detail.places.includes(place))
  if (missed.length > 0) checks.push({ field: 'positions', sentence: `${detail.code} is for ${list(detail.places)} welding, not ${list(missed)}` })
  if (detail.gas === 'required' && block.process === 'FCAW') {
    if (!block.shieldingGas) checks.push({ lacks: 'shieldingGas' })
    else if (isNoGas(block.shieldingGas)) checks.push({ field: 'shieldingGas', sentence: `this line of ${detail.code} needs an external shielding gas` })
  }
  return checks
}

/** A detail on backing is drawn without a root face. */
function noFaceCheck({ joint }: WeldingVariables, detail: Detail, system: UnitSystem): Check {
  const had = stated(joint.rootFace, 'length', system)
  return had && had.max > 0 ? { field: 'joint.rootFace', sentence: `root face ${show(had.max, unitOf('length', system))} does not belong to ${detail.code}, which is drawn without one` } : null
}

function radiusCheck({ joint }: WeldingVariables, detail: Detail, system: UnitSystem): Check {
  if (!detail.radius) return null
  const had = stated(joint.rootRadius, 'length', system)
  if (!had) return { lacks: 'joint.rootRadius' }
  const unit = unitOf('length', system)
  const [least, more] = [detail.radius[0][system], detail.radius[1][system]]
  const most = tidy(least + more * (had.spread ? 2 : 1))
  if (had.min >= least - EPSILON && had.max <= most + EPSILON) return null
  return { field: 'joint.rootRadius', sentence: `groove radius ${had.spread ? `${show(had.min, unit)} to ${show(had.max, unit)}` : show(had.min, unit)} is outside ${show(least, unit)} to ${show(most, unit)} of ${detail.code}` }
}

function checksOf(variables: WeldingVariables, block: ProcessBlock, detail: Detail, system: UnitSystem): Check[] {
  const opening = openingOf(variables, detail, system)
  return [
    thicknessCheck(variables, detail, system),
    opening === null ? { lacks: 'thickness' } : lengthCheck(variables.joint.rootOpening, opening, 'opening', detail, system, 'joint.rootOpening', 'root opening'),
    angleCheck(variables, detail, system),
    detail.face && !detail.backed ? lengthCheck(variables.joint.rootFace, detail.face, 'face', detail, system, 'joint.rootFace', 'root face') : detail.angle !== null ? noFaceCheck(variables, detail, system) : null,
    radiusCheck(variables, detail, system),
    ...backingChecks(variables, detail),
    ...blockChecks(block, detail),
  ]
}

/** Details of such a groove for the process; SMAW details serve GMAW and FCAW only where the figure notes it, which isn't kept here. */
function candidates(variables: WeldingVariables, block: ProcessBlock): Detail[] {
  const { joint } = variables
  if (block.process === 'GMAW' && block.electrical.transferMode === 'short-circuiting') return []
  const designation = joint.designation ? readDesignation(joint.designation) : null
  return details.filter((detail) => block.process !== null && detail.processes.includes(block.process) && detail.penetration === joint.penetration && detail.groove === joint.groove && detail.joints.includes(joint.type) && (!designation || detail.code === joint.designation?.trim()))
}

/** Whether a drafted groove fits a detail of the list kept here, and if not, what is nearest. */
export function matchDetail(variables: WeldingVariables, block: ProcessBlock, system: UnitSystem): Match {
  const { joint } = variables
  if (joint.groove === null) return { fits: 'unknown', detail: null, misses: [], lacking: ['joint.groove'] }
  let nearest: Match | null = null
  for (const detail of candidates(variables, block)) {
    const checks = checksOf(variables, block, detail, system).filter((check) => check !== null)
    const misses = checks.flatMap((check) => ('sentence' in check ? [check] : []))
    const lacking = [...new Set(checks.flatMap((check) => ('lacks' in check ? [check.lacks] : [])))]
    const match: Match = { fits: misses.length > 0 ? 'no' : lacking.length > 0 ? 'unknown' : 'yes', detail, misses, lacking }
    if (match.fits === 'yes') return match
    if (!nearest || misses.length < nearest.misses.length || (misses.length === nearest.misses.length && lacking.length < nearest.lacking.length)) nearest = match
  }
  return nearest ?? { fits: 'unknown', detail: null, misses: [], lacking: [] }
}
