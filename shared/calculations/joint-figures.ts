/** The figures of a joint that a drawing needs, with what is impossible and what had to be assumed, in words. */
import type { Interval } from '../schemas/common.ts'
import type { Joint } from '../schemas/welding.ts'
import { formatInterval } from '../units/format.ts'
import type { UnitSystem } from '../units/types.ts'
import { arcHeight, bothEdgesPrepared, hasAngle, hasRadius, isDouble, isFlare, type GrooveFigures, type GrooveType } from './groove-profile.ts'

/** The value drawn for an interval: the middle of two ends, else the end that is given. */
export function drawnValue(interval: Interval | null): number | null {
  if (!interval) return null
  const [min, max] = [interval.min?.si ?? null, interval.max?.si ?? null]
  if (min !== null && max !== null) return (min + max) / 2
  return min ?? max
}

export interface FiguresReading {
  figures: GrooveFigures | null
  /** Why nothing can be drawn, or why the drawing can't be welded. */
  impossible: string[]
  /** What the record leaves open and the drawing had to take. */
  assumed: string[]
}

export interface Writer { length(mm: number): string; angle(degrees: number): string }
export const writerFor = (system: UnitSystem): Writer => ({
  length: (mm) => formatInterval({ min: { si: mm, unit: 'mm', typed: '' }, max: { si: mm, unit: 'mm', typed: '' }, all: false }, 'length', system, { asTyped: false }).text,
  angle: (degrees) => `${Number(degrees.toFixed(1))}°`,
})

/** Angle of one prepared edge: half of the included angle where both are prepared. */
function bevelOf(joint: Joint, type: GrooveType): number | null {
  const [included, bevel] = [drawnValue(joint.includedAngle), drawnValue(joint.bevelAngle)]
  if (type === 'compound-v') return included === null ? bevel : included / 2
  if (!bothEdgesPrepared(type)) return bevel ?? included
  return bevel ?? (included === null ? null : included / 2)
}

function checkAngle(joint: Joint, type: GrooveType, bevel: number | null, words: Writer): string[] {
  if (!hasAngle(type)) return []
  if (bevel === null) return [bothEdgesPrepared(type) ? 'The included angle is not given.' : 'The bevel angle is not given.']
  const included = drawnValue(joint.includedAngle)
  if (included !== null && included >= 180) return [`An included angle of ${words.angle(included)} leaves no plate; it must be below 180°.`]
  if (bevel >= 90) return [`A bevel angle of ${words.angle(bevel)} leaves no plate; it must be below 90°.`]
  if (bevel < 0 || (bevel === 0 && !hasRadius(type))) return [`An angle of ${words.angle(bevel)} is no bevel; give an angle above 0°, or choose a square groove.`]
  if (bothEdgesPrepared(type) && included !== null && drawnValue(joint.bevelAngle) !== null && type !== 'compound-v' && Math.abs(included - 2 * bevel) > 0.5) return [`The included angle of ${words.angle(included)} is not twice the bevel angle of ${words.angle(bevel)}.`]
  return []
}

/**
 * Figures of a groove weld.
 * @param thickness mm; null = not given
 */
export function grooveFigures(joint: Joint, thickness: number | null, system: UnitSystem): FiguresReading {
  const words = writerFor(system)
  const [impossible, assumed]: [string[], string[]] = [[], []]
  const type = joint.groove
  if (!type) return { figures: null, impossible: ['The groove type is not given.'], assumed }
  if (thickness === null && !isFlare(type)) impossible.push('The base metal thickness is not given.')
  else if (thickness !== null && thickness <= 0) impossible.push(`A base metal thickness of ${words.length(thickness)} can't be welded; it must be above 0.`)
  const bevel = bevelOf(joint, type)
  impossible.push(...checkAngle(joint, type, bevel, words))
  const radius = drawnValue(joint.rootRadius)
  if (hasRadius(type) && (radius === null || radius <= 0)) impossible.push(isFlare(type) ? 'The outside radius of the rounded member (root radius) is not given.' : 'The root radius is not given.')
  const opening = drawnValue(joint.rootOpening)
  if (opening === null) assumed.push('The root opening is not given; the joint is drawn closed.')
  const faceCounts = type !== 'square' && !isFlare(type)
  const face = faceCounts ? drawnValue(joint.rootFace) : 0
  if (face === null) assumed.push('The root face is not given; the edge is drawn sharp.')
  if (thickness !== null && thickness > 0 && face !== null && face > 0 && face >= thickness) impossible.push(`A root face of ${words.length(face)} leaves nothing to prepare in ${words.length(thickness)}; it must be below the thickness.`)
  else if (thickness !== null && hasRadius(type) && !isFlare(type) && radius !== null && bevel !== null) {
    const depth = (thickness - (face ?? 0)) / (isDouble(type) ? 2 : 1)
    if (arcHeight(radius, bevel) > depth + 1e-9) impossible.push(`A root radius of ${words.length(radius)} needs ${words.length(arcHeight(radius, bevel))} of depth; the groove has ${words.length(depth)}.`)
  }
  if ((joint.type === 'tee' || joint.type === 'lap') && bothEdgesPrepared(type)) impossible.push(`A ${type} groove needs two prepared edges; a ${joint.type} joint has one. Choose a bevel or J groove, or a butt joint.`)
  if (isDouble(type)) assumed.push('Both sides of the groove are taken equally deep.')
  if (type === 'compound-v') assumed.push('The angle is taken to change at half of the depth.')
  if (impossible.length > 0) return { figures: null, impossible, assumed }
  const upper = type === 'compound-v' ? (drawnValue(joint.bevelAngle) ?? bevel) : null
  return { figures: { thickness: thickness ?? radius ?? 0, rootOpening: opening ?? 0, rootFace: face ?? 0, bevelAngle: bevel, upperBevelAngle: upper, rootRadius: radius }, impossible, assumed }
}
