/** Fillet welds of tee, lap and corner joints: equal legs at a right angle, flat face. */
import type { Joint } from '../schemas/welding.ts'
import type { UnitSystem } from '../units/types.ts'
import { drawnValue, writerFor } from './joint-figures.ts'
import { layFillet, type LaidPass, type PassToLay } from './pass-layout.ts'
import type { Point, Polygon } from './polygon.ts'

interface Mark { from: Point; to: Point }
export interface DrawnFillet { plates: Polygon[]; weld: Polygon[]; laid: LaidPass[]; areaMm2: number; legs: Mark; thicknessMark: Mark; thicknessBMark: Mark }
export interface FilletReading { drawn: DrawnFillet | null; impossible: string[]; assumed: string[] }

/** Throat of an equal-leg fillet at a right angle: leg / √2. mm in, mm out. */
export const throatOf = (leg: number): number => leg / Math.SQRT2

const box = (x0: number, y0: number, x1: number, y1: number): Polygon => [{ x: x0, y: y0 }, { x: x1, y: y0 }, { x: x1, y: y1 }, { x: x0, y: y1 }]

/**
 * The section of a fillet weld; member A lies, member B stands on it or laps it.
 * @param thickness mm of A, `thicknessB` mm of B; null = not given
 */
export function filletGeometry({ joint, thickness, thicknessB, passes, system }: { joint: Joint; thickness: number | null; thicknessB: number | null; passes: readonly PassToLay[]; system: UnitSystem }): FilletReading {
  const words = writerFor(system)
  const impossible: string[] = []
  const assumed: string[] = []
  const leg = drawnValue(joint.filletLeg)
  const gap = drawnValue(joint.rootOpening) ?? 0
  if (joint.type === 'butt' || joint.type === 'edge') impossible.push(`A fillet weld needs two faces at an angle; choose a tee, corner or lap joint instead of a ${joint.type} joint.`)
  if (thickness === null || thicknessB === null) impossible.push('The base metal thickness is not given.')
  else if (thickness <= 0 || thicknessB <= 0) impossible.push('The base metal thickness must be above 0.')
  if (leg === null) impossible.push('The fillet leg is not given.')
  else if (leg <= 0) impossible.push(`A fillet leg of ${words.length(leg)} is no weld; it must be above 0.`)
  else {
    if (gap >= leg) impossible.push(`A gap of ${words.length(gap)} is as large as the leg of ${words.length(leg)}; the fillet would not reach both members.`)
    if (joint.type === 'lap' && thicknessB !== null && leg > thicknessB + 1e-9) impossible.push(`A leg of ${words.length(leg)} does not fit on the edge of a ${words.length(thicknessB)} plate.`)
  }
  if (impossible.length > 0 || leg === null || thickness === null || thicknessB === null) return { drawn: null, impossible, assumed }
  if (gap > 0) assumed.push('The gap under the standing member is not counted in the weld section.')

  const arm = leg + Math.max(1.2 * thickness, 12)
  const height = Math.max(leg * 1.8, leg + 1.2 * thicknessB, 12)
  const tee = joint.type === 'tee'
  const lap = joint.type === 'lap'
  const edgeX = tee ? thicknessB / 2 : lap ? 0 : thicknessB
  const lying = box(tee ? -thicknessB / 2 - arm : lap ? -arm : 0, -thickness, edgeX + arm, 0)
  const standing = tee ? box(-thicknessB / 2, gap, thicknessB / 2, gap + height) : lap ? box(-arm, gap, 0, gap + thicknessB) : box(0, gap, thicknessB, gap + height)
  const triangle = (x: number, direction: 1 | -1): Polygon => [{ x, y: 0 }, { x: x + direction * leg, y: 0 }, { x, y: leg }]
  const bothSides = tee && joint.weldedFromBothSides === true
  const weld = bothSides ? [triangle(edgeX, 1), triangle(-edgeX, -1)] : [triangle(edgeX, 1)]
  const cut = bothSides ? Math.ceil(passes.length / 2) : passes.length
  const up = { x: 0, y: 1 }
  const laid = [...layFillet(passes.slice(0, cut), { x: edgeX, y: 0 }, { x: 1, y: 0 }, up, leg), ...layFillet(passes.slice(cut), { x: -edgeX, y: 0 }, { x: -1, y: 0 }, up, leg)]
  return {
    drawn: {
      plates: [lying, standing],
      weld,
      laid,
      areaMm2: (weld.length * leg * leg) / 2,
      legs: { from: { x: edgeX, y: 0 }, to: { x: edgeX + leg, y: 0 } },
      thicknessMark: { from: { x: edgeX + arm, y: -thickness }, to: { x: edgeX + arm, y: 0 } },
      thicknessBMark: lap ? { from: { x: -arm, y: gap }, to: { x: -arm, y: gap + thicknessB } } : { from: { x: edgeX - thicknessB, y: gap + height }, to: { x: edgeX, y: gap + height } },
    },
    impossible,
    assumed,
  }
}
