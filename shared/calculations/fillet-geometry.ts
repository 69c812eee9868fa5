/** Fillet welds of tee, lap and corner joints: flat face, legs alike or not, members square or skewed. */
import type { Interval } from '../schemas/common.ts'
import type { Joint } from '../schemas/welding.ts'
import type { UnitSystem } from '../units/types.ts'
import { drawnValue, Remarks, writerFor, type Problem } from './joint-figures.ts'
import { layFillet, type LaidPass, type PassToLay } from './pass-layout.ts'
import { radians, type Point, type Polygon } from './polygon.ts'

interface Mark { from: Point; to: Point }
export interface DrawnFillet {
  plates: Polygon[]
  weld: Polygon[]
  laid: LaidPass[]
  areaMm2: number
  /** From the corner to the toe on A, and to the toe on B. */
  legs: Mark
  legsB: Mark
  thicknessMark: Mark
  thicknessBMark: Mark
  /** Throat of the flat fillet, mm. */
  throat: number
  /** Degrees between the members on the side of the weld. */
  memberAngle: number
}
export interface FilletReading { drawn: DrawnFillet | null; problems: Problem[]; assumed: string[] }

/** Throat of an equal-leg fillet at a right angle: leg / √2. mm in, mm out. */
export const throatOf = (leg: number): number => leg / Math.SQRT2

/** Throat of a flat fillet: the height of its triangle over the face. mm and degrees in, mm out. */
export function throatOfLegs(legA: number, legB: number, memberAngle = 90): number {
  const face = Math.sqrt(legA ** 2 + legB ** 2 - 2 * legA * legB * Math.cos(radians(memberAngle)))
  return (legA * legB * Math.sin(radians(memberAngle))) / face
}

const box = (x0: number, y0: number, x1: number, y1: number): Polygon => [{ x: x0, y: y0 }, { x: x1, y: y0 }, { x: x1, y: y1 }, { x: x0, y: y1 }]

function checkMembers(joint: Joint, thickness: number | null, thicknessB: number | null, thicknessBGiven: Interval | null, system: UnitSystem, remarks: Remarks): void {
  const words = writerFor(system)
  if (joint.type === 'butt' || joint.type === 'edge') remarks.refuse('joint.type', `A fillet weld needs two faces at an angle; choose a tee, corner or lap joint instead of ${joint.type === 'edge' ? 'an edge' : 'a butt'} joint.`)
  if (thickness === null || thicknessB === null) remarks.lack('thickness', 'The base metal thickness is not given.')
  else if (thickness <= 0 || thicknessB <= 0) remarks.refuse(thickness <= 0 ? 'thickness' : 'thicknessB', 'The base metal thickness must be above 0.')
  const leg = drawnValue(joint.filletLeg)
  const gap = drawnValue(joint.rootOpening) ?? 0
  const legB = drawnValue(joint.filletLegB) ?? leg
  remarks.notNegative('joint.rootOpening', 'A gap', gap, words)
  if (leg === null) remarks.lack('joint.filletLeg', 'The fillet leg is not given.')
  else if (leg <= 0) remarks.refuse('joint.filletLeg', `A fillet leg of ${words.length(leg)} is no weld; it must be above 0.`)
  if (leg !== null && legB !== null && legB !== leg && legB <= 0) remarks.refuse('joint.filletLegB', `A leg of ${words.length(legB)} on B is no weld; it must be above 0.`)
  if (leg !== null && leg > 0 && legB !== null && legB > 0) {
    if (gap >= legB) remarks.refuse('joint.rootOpening', `A gap of ${words.length(gap)} is as large as the leg of ${words.length(legB)}; the fillet would not reach both members.`)
    if (joint.type === 'lap' && thicknessB !== null && legB > thicknessB + 1e-9) remarks.refuse(drawnValue(joint.filletLegB) === null ? 'joint.filletLeg' : 'joint.filletLegB', `A leg of ${words.length(legB)} does not fit on the edge of a ${words.length(thicknessB)} plate${thicknessBGiven ? '' : ' (A is as thick as B unless the thickness of B is given)'}.`)
  }
  const angle = drawnValue(joint.memberAngle)
  if (angle === null) return
  if (angle < 5 || angle > 175) remarks.refuse('joint.memberAngle', `Members at ${words.angle(angle)} leave no corner for a fillet; give an angle from 5° to 175°.`)
  else if (joint.type === 'lap' && Math.abs(angle - 90) > 1e-9) remarks.refuse('joint.memberAngle', 'The faces of a lap joint stand square to each other; take the angle out, or choose a tee joint.')
}

/**
 * The section of a fillet weld; member A lies, member B stands on it or laps it.
 * @param thickness mm of A, `thicknessB` mm of B; null = not given
 */
export function filletGeometry({ joint, thickness, thicknessB, thicknessBGiven = null, passes, system }: { joint: Joint; thickness: number | null; thicknessB: number | null; thicknessBGiven?: Interval | null; passes: readonly PassToLay[]; system: UnitSystem }): FilletReading {
  const remarks = new Remarks()
  checkMembers(joint, thickness, thicknessB, thicknessBGiven, system, remarks)
  const leg = drawnValue(joint.filletLeg)
  const { problems, assumed } = remarks
  if (problems.length > 0 || leg === null || thickness === null || thicknessB === null) return { drawn: null, problems, assumed }
  const legB = drawnValue(joint.filletLegB) ?? leg
  const gap = drawnValue(joint.rootOpening) ?? 0
  if (gap > 0) remarks.take('The gap under the standing member is not counted in the weld section.')

  const memberAngle = drawnValue(joint.memberAngle) ?? 90
  const up: Point = { x: Math.cos(radians(memberAngle)), y: Math.sin(radians(memberAngle)) }
  const arm = leg + Math.max(0.8 * thickness, 10)
  const height = Math.max(legB * 1.6, legB + 0.7 * thicknessB, 10)
  const tee = joint.type === 'tee'
  const lap = joint.type === 'lap'
  // A skewed member is as wide at its foot as its thickness is cut aslant.
  const foot = lap ? thicknessB : thicknessB / up.y
  const edgeX = tee ? foot / 2 : lap ? 0 : foot
  const start = tee ? -foot / 2 - arm : lap ? -arm : Math.min(0, up.x * height)
  const lying = box(start, -thickness, edgeX + arm + Math.max(0, up.x * height), 0)
  const lean = (x: number, along: number): Point => ({ x: x + up.x * along, y: gap + up.y * along })
  const standing: Polygon = lap ? box(-arm, gap, 0, gap + thicknessB) : [lean(edgeX - foot, 0), lean(edgeX, 0), lean(edgeX, height), lean(edgeX - foot, height)]
  const bothSides = tee && joint.weldedFromBothSides === true
  interface Corner { corner: Point; toeA: Point; toeB: Point }
  const right: Corner = { corner: { x: edgeX, y: 0 }, toeA: { x: edgeX + leg, y: 0 }, toeB: { x: edgeX + up.x * legB, y: up.y * legB } }
  const left: Corner = { corner: { x: edgeX - foot, y: 0 }, toeA: { x: edgeX - foot - leg, y: 0 }, toeB: { x: edgeX - foot + up.x * legB, y: up.y * legB } }
  const corners = bothSides ? [right, left] : [right]
  if (bothSides && memberAngle !== 90) remarks.take(`The fillet on the other side stands at ${writerFor(system).angle(180 - memberAngle)}, with the same legs.`)
  const cut = bothSides ? passes.findIndex(({ side }) => side === 'second') : -1
  const first = bothSides ? passes.slice(0, cut > 0 ? cut : Math.ceil(passes.length / 2)) : passes
  const far = { x: edgeX + arm + Math.max(0, up.x * height) }
  return {
    drawn: {
      plates: [lying, standing],
      weld: corners.map(({ corner, toeA, toeB }) => [corner, toeA, toeB]),
      laid: [...layFillet(first, right.corner, right.toeA, right.toeB), ...layFillet(passes.slice(first.length), left.corner, left.toeA, left.toeB)],
      areaMm2: (corners.length * leg * legB * up.y) / 2,
      legs: { from: right.corner, to: right.toeA },
      legsB: { from: right.corner, to: right.toeB },
      thicknessMark: { from: { ...far, y: -thickness }, to: { ...far, y: 0 } },
      thicknessBMark: lap ? { from: { x: -arm, y: gap }, to: { x: -arm, y: gap + thicknessB } } : { from: { x: lean(edgeX, height).x - thicknessB * up.y, y: lean(edgeX, height).y + thicknessB * up.x }, to: lean(edgeX, height) },
      throat: throatOfLegs(leg, legB, memberAngle),
      memberAngle,
    },
    problems,
    assumed,
  }
}
