/** The figures of a joint that a drawing needs, with what is impossible, each at its field, and what had to be assumed, in words. */
import type { Interval } from '../schemas/common.ts'
import type { Joint } from '../schemas/welding.ts'
import { formatInterval } from '../units/format.ts'
import type { UnitSystem } from '../units/types.ts'
import { arcHeight, bothEdgesPrepared, GOUGE_RADIUS_MM, GOUGE_SIDE_DEGREES, hasAngle, hasRadius, isDouble, isFlare, type GrooveFigures, type GrooveType } from './groove-profile.ts'

/** The value drawn for an interval: the middle of two ends, else the end that is given. */
export function drawnValue(interval: Interval | null | undefined): number | null {
  if (!interval) return null
  const [min, max] = [interval.min?.si ?? null, interval.max?.si ?? null]
  if (min !== null && max !== null) return (min + max) / 2
  return min ?? max
}

/** What can't be, in one sentence, at the field of the weld's variables where it is mended. */
export interface Problem { path: string; sentence: string; /** A figure that is not given yet, rather than one that can't be. */ lacking?: true }

/** Gathers what is impossible and what is taken. */
export class Remarks {
  readonly problems: Problem[] = []
  readonly assumed: string[] = []
  refuse(path: string, sentence: string): void {
    this.problems.push({ path, sentence })
  }
  /** Refuses because a figure is not given. */
  lack(path: string, sentence: string): void {
    this.problems.push({ path, sentence, lacking: true })
  }
  take(sentence: string): void {
    this.assumed.push(sentence)
  }
  /** Refuses a length that is below nought. */
  notNegative(path: string, name: string, value: number | null | undefined, words: Writer): void {
    if (value !== null && value !== undefined && value < 0) this.refuse(path, `${name} of ${words.length(value)} can’t be; it must be 0 or more.`)
  }
}

export interface FiguresReading {
  figures: GrooveFigures | null
  problems: Problem[]
  /** What the record leaves open and the drawing had to take. */
  assumed: string[]
}

export interface Writer { length(mm: number): string; angle(degrees: number): string }
export const writerFor = (system: UnitSystem): Writer => ({
  length: (mm) => formatInterval({ min: { si: mm, unit: 'mm', typed: '' }, max: { si: mm, unit: 'mm', typed: '' }, all: false }, 'length', system, { asTyped: false }).text,
  angle: (degrees) => `${Number(degrees.toFixed(1))}°`,
})

/** The field that holds the angle of a groove. */
export const angleField = (type: GrooveType): 'joint.includedAngle' | 'joint.bevelAngle' => (bothEdgesPrepared(type) ? 'joint.includedAngle' : 'joint.bevelAngle')

/** Angle of one prepared edge: half of the included angle where both are prepared. */
function bevelOf(joint: Joint, type: GrooveType): number | null {
  const [included, bevel] = [drawnValue(joint.includedAngle), drawnValue(joint.bevelAngle)]
  if (type === 'compound-v') return included === null ? bevel : included / 2
  if (!bothEdgesPrepared(type)) return bevel ?? included
  return bevel ?? (included === null ? null : included / 2)
}

function checkAngle(joint: Joint, type: GrooveType, bevel: number | null, words: Writer, remarks: Remarks): void {
  if (!hasAngle(type)) return
  const field = angleField(type)
  const included = drawnValue(joint.includedAngle)
  if (bevel === null) remarks.lack(field, bothEdgesPrepared(type) ? 'The included angle is not given.' : 'The bevel angle is not given.')
  else if (included !== null && included >= 180) remarks.refuse('joint.includedAngle', `An included angle of ${words.angle(included)} leaves no plate; it must be below 180°.`)
  else if (bevel >= 90) remarks.refuse('joint.bevelAngle', `A bevel angle of ${words.angle(bevel)} leaves no plate; it must be below 90°.`)
  else if (bevel < 0 || (bevel === 0 && !hasRadius(type))) remarks.refuse(field, `An angle of ${words.angle(bevel)} is no bevel; give an angle above 0°, or choose a square groove.`)
  else if (bothEdgesPrepared(type) && included !== null && drawnValue(joint.bevelAngle) !== null && type !== 'compound-v' && Math.abs(included - 2 * bevel) > 0.5) remarks.refuse('joint.bevelAngle', `The included angle of ${words.angle(included)} is not twice the bevel angle of ${words.angle(bevel)}.`)
  const upper = type === 'compound-v' ? drawnValue(joint.bevelAngle) : null
  if (upper !== null && (upper >= 90 || upper < 0)) remarks.refuse('joint.bevelAngle', `An upper angle of ${words.angle(upper)} can’t be; it must be from 0° to below 90°.`)
}

/** Ends of an interval that may be open. */
const span = (interval: Interval | null | undefined): [number, number] => [interval?.min?.si ?? (interval?.max ? 0 : -Infinity), interval?.max?.si ?? Infinity]
/** Whether some values within the intervals add up to one within the last. */
function canAddUp(parts: readonly (Interval | null | undefined)[], whole: Interval | null): boolean {
  const [low, high] = parts.map(span).reduce(([a, b], [c, d]) => [a + c, b + d], [0, 0])
  const [least, most] = span(whole)
  return low <= most + 1e-6 && high >= least - 1e-6
}

interface Depths { rootFace: number; first: number; second: number }

/** How a thickness is shared between the sides and the root face: of three figures that are open, one follows from the others. */
function depthsOf(joint: Joint, type: GrooveType, thickness: number, thicknessGiven: Interval | null, words: Writer, remarks: Remarks): Depths | null {
  const count = remarks.problems.length
  const face = drawnValue(joint.rootFace)
  const first = drawnValue(joint.grooveDepth)
  const second = isDouble(type) ? drawnValue(joint.secondDepth) : 0
  remarks.notNegative('joint.rootFace', 'A root face', face, words)
  if (first !== null && first <= 0) remarks.refuse('joint.grooveDepth', `A groove depth of ${words.length(first)} is no groove; it must be above 0.`)
  if (isDouble(type) && second !== null && second <= 0) remarks.refuse('joint.secondDepth', `A depth of ${words.length(second)} is no second side; choose a single groove, or give a depth above 0.`)
  if (face !== null && face > 0 && face >= thickness) remarks.refuse('joint.rootFace', `A root face of ${words.length(face)} leaves nothing to prepare in ${words.length(thickness)}; it must be below the thickness.`)
  if (remarks.problems.length > count) return null
  const prepared = (first ?? 0) + (second ?? 0)
  if (prepared > thickness + 1e-9) {
    remarks.refuse(first === null ? 'joint.secondDepth' : 'joint.grooveDepth', `A groove ${words.length(prepared)} deep does not fit in ${words.length(thickness)}.`)
    return null
  }
  if (first !== null && second !== null) {
    if (face !== null && !canAddUp([joint.grooveDepth, isDouble(type) ? joint.secondDepth : { min: { si: 0, unit: 'mm', typed: '0' }, max: { si: 0, unit: 'mm', typed: '0' }, all: false }, joint.rootFace], thicknessGiven)) {
      remarks.refuse('joint.grooveDepth', `A groove depth of ${words.length(prepared)} and a root face of ${words.length(face)} do not make up the thickness of ${words.length(thickness)}; mend one of them, or leave one open.`)
      return null
    }
    return { rootFace: thickness - prepared, first, second }
  }
  if (face === null) remarks.take('The root face is not given; the edge is drawn sharp.')
  const rest = thickness - (face ?? 0)
  if (!isDouble(type)) return { rootFace: face ?? 0, first: rest, second: 0 }
  if (first === null && second === null) remarks.take('Both sides of the groove are taken equally deep.')
  const deep = first ?? (second === null ? rest / 2 : rest - second)
  if (deep <= 0 || rest - deep <= 0) {
    remarks.refuse(first === null ? 'joint.secondDepth' : 'joint.grooveDepth', `A depth of ${words.length(first ?? second ?? 0)} leaves nothing for the other side: ${words.length(thickness)} less the root face is ${words.length(rest)}.`)
    return null
  }
  return { rootFace: face ?? 0, first: deep, second: rest - deep }
}

function checkRadius(type: GrooveType, radius: number | null, sides: readonly { depth: number; bevel: number | null }[], words: Writer, remarks: Remarks): void {
  if (!hasRadius(type) || isFlare(type) || radius === null || radius <= 0) return
  for (const { depth, bevel } of sides) {
    if (bevel === null || arcHeight(radius, bevel) <= depth + 1e-9) continue
    remarks.refuse('joint.rootRadius', `A root radius of ${words.length(radius)} needs ${words.length(arcHeight(radius, bevel))} of depth; the groove has ${words.length(depth)}.`)
    return
  }
}

/** What lies in or under the root: backing, insert, gouge. */
function checkRoot(joint: Joint, opening: number, thickness: number, words: Writer, remarks: Remarks): number {
  const [width, deep] = [drawnValue(joint.backingWidth), drawnValue(joint.backingThickness)]
  if (joint.backing === 'metal' || joint.backing === 'ceramic' || joint.backing === 'flux') {
    if (width !== null && width <= opening) remarks.refuse('joint.backingWidth', `A backing ${words.length(width)} wide does not span the root opening of ${words.length(opening)}.`)
    if (deep !== null && deep <= 0) remarks.refuse('joint.backingThickness', `A backing of ${words.length(deep)} holds nothing; its thickness must be above 0.`)
  }
  if (joint.backing === 'consumable-insert') {
    const [across, high] = [drawnValue(joint.insertWidth), drawnValue(joint.insertHeight)]
    if (across !== null && across <= 0) remarks.refuse('joint.insertWidth', `An insert of ${words.length(across)} is none; its width must be above 0.`)
    else if (across !== null && across > opening + 1e-9) remarks.refuse('joint.insertWidth', `An insert ${words.length(across)} wide does not fit in a root opening of ${words.length(opening)}.`)
    if (high !== null && (high <= 0 || high > thickness)) remarks.refuse('joint.insertHeight', `An insert ${words.length(high)} high does not fit in ${words.length(thickness)}; give a height above 0 and below the thickness.`)
    if (across === null) remarks.take('The insert is drawn as wide as the root opening.')
    if (high === null) remarks.take('The height of the insert is not given; it is drawn 3 mm high, or as high as a thinner joint is.')
  }
  if (joint.backGouging === null || joint.backGouging === 'none') return 0
  const gouge = drawnValue(joint.backGougeDepth)
  if (gouge === null) {
    remarks.take('The depth of back gouging is not given; it is not drawn.')
    return 0
  }
  if (gouge <= 0 || gouge >= thickness) remarks.refuse('joint.backGougeDepth', gouge <= 0 ? `Gouging ${words.length(gouge)} deep takes nothing away; give a depth above 0.` : `Gouging ${words.length(gouge)} deep cuts through ${words.length(thickness)}; it must be below the thickness.`)
  remarks.take(`The gouge is drawn with a round bottom of ${words.length(GOUGE_RADIUS_MM)} radius and sides that open ${2 * GOUGE_SIDE_DEGREES}°, as its depth alone is given.`)
  return gouge
}

/** Whether a joint of this type has edges for such a groove. */
function checkType(joint: Joint, type: GrooveType, remarks: Remarks): void {
  if (joint.type === 'tee' && bothEdgesPrepared(type)) remarks.refuse('joint.groove', `A ${type.replace(/-([uvj])$/, (_, letter: string) => ` ${letter.toUpperCase()}`).replaceAll('-', ' ')} groove needs two prepared edges; a tee joint has one. Choose a bevel or J groove, or a butt joint.`)
  if (joint.type === 'lap' && !isFlare(type)) remarks.refuse('joint.type', 'A lap joint has no edges that face each other; choose a fillet weld, or a butt, corner or tee joint.')
  if (joint.type === 'edge' && isDouble(type)) remarks.refuse('joint.groove', 'An edge joint is welded from one side; choose a single groove.')
}

/**
 * Figures of a groove weld.
 * @param thickness mm of the thinner member; null = not given. Of an edge joint it is the thickness of one member, and the groove depth counts.
 * @param given the thickness as written, so that depths may add up within its range
 */
export function grooveFigures(joint: Joint, thickness: number | null, system: UnitSystem, given: Interval | null = null): FiguresReading {
  const words = writerFor(system)
  const remarks = new Remarks()
  const type = joint.groove
  const answer = (figures: GrooveFigures | null): FiguresReading => ({ figures: remarks.problems.length > 0 ? null : figures, problems: remarks.problems, assumed: remarks.assumed })
  if (!type) {
    remarks.lack('joint.groove', 'The groove type is not given.')
    return answer(null)
  }
  if (thickness === null && !isFlare(type)) remarks.lack('thickness', 'The base metal thickness is not given.')
  else if (thickness !== null && thickness <= 0) remarks.refuse('thickness', `A base metal thickness of ${words.length(thickness)} can't be welded; it must be above 0.`)
  const bevel = bevelOf(joint, type)
  checkAngle(joint, type, bevel, words, remarks)
  const radius = drawnValue(joint.rootRadius)
  if (hasRadius(type) && radius === null) remarks.lack('joint.rootRadius', isFlare(type) ? 'The outside radius of the rounded member (root radius) is not given.' : 'The root radius is not given.')
  else if (hasRadius(type) && radius !== null && radius <= 0) remarks.refuse('joint.rootRadius', `A root radius of ${words.length(radius)} is none; it must be above 0.`)
  const opening = drawnValue(joint.rootOpening)
  if (opening === null) remarks.take('The root opening is not given; the joint is drawn closed.')
  remarks.notNegative('joint.rootOpening', 'A root opening', opening, words)
  checkType(joint, type, remarks)
  const edge = joint.type === 'edge' && !isFlare(type)
  const depth = edge ? drawnValue(joint.grooveDepth) : thickness
  if (edge && depth === null) remarks.lack('joint.grooveDepth', 'The groove depth is not given; of an edge joint it is the depth of the weld.')
  else if (edge && depth !== null && depth <= 0) remarks.refuse('joint.grooveDepth', `A groove depth of ${words.length(depth)} is no groove; it must be above 0.`)
  if (depth === null || depth <= 0) return answer(isFlare(type) && thickness === null ? { thickness: radius ?? 0, rootOpening: opening ?? 0, rootFace: 0, bevelAngle: bevel, upperBevelAngle: null, rootRadius: radius } : null)
  const plain = type === 'square' || isFlare(type) || edge
  const depths = plain ? { rootFace: 0, first: depth, second: 0 } : depthsOf(joint, type, depth, given, words, remarks)
  const gouge = edge || isFlare(type) ? 0 : checkRoot(joint, opening ?? 0, depth, words, remarks)
  if (!depths) return answer(null)
  const secondGiven = isDouble(type) ? drawnValue(joint.secondAngle) : null
  const secondBevel = secondGiven === null ? null : bothEdgesPrepared(type) ? secondGiven / 2 : secondGiven
  if (secondBevel !== null && (secondBevel >= 90 || secondBevel < 0 || (secondBevel === 0 && !hasRadius(type)))) remarks.refuse('joint.secondAngle', `An angle of ${words.angle(secondGiven ?? 0)} on the second side can’t be; it must be above 0° and below ${bothEdgesPrepared(type) ? '180°' : '90°'}.`)
  checkRadius(type, radius, [{ depth: depths.first, bevel }, ...(isDouble(type) ? [{ depth: depths.second, bevel: secondBevel ?? bevel }] : [])], words, remarks)
  const change = type === 'compound-v' ? drawnValue(joint.angleChange) : null
  if (type === 'compound-v' && change === null) remarks.take('The angle is taken to change at half of the depth.')
  if (change !== null && (change <= depths.rootFace || change >= depth)) remarks.refuse('joint.angleChange', `The angle can’t change at ${words.length(change)}: the groove goes from ${words.length(depths.rootFace)} to ${words.length(depth)}.`)
  if (type === 'compound-v' && drawnValue(joint.bevelAngle) === null) remarks.take('The angle of the upper part (bevel angle) is not given; the groove is drawn with one angle.')
  const upper = type === 'compound-v' ? (drawnValue(joint.bevelAngle) ?? bevel) : null
  return answer({ thickness: depth, rootOpening: opening ?? 0, rootFace: depths.rootFace, bevelAngle: bevel, upperBevelAngle: upper, rootRadius: radius, secondDepth: isDouble(type) ? depths.second : undefined, secondBevelAngle: secondBevel, angleChange: change, gouge })
}
