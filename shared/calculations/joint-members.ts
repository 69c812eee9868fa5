/** The two members of a groove joint in section, with what lies under or in its root. */
import type { Joint } from '../schemas/welding.ts'
import { bothEdgesPrepared, isFlare, offsetAt, type Edge, type GrooveFigures, type GrooveProfile } from './groove-profile.ts'
import { drawnValue, Remarks, writerFor, type Writer } from './joint-figures.ts'
import { radians, type Point, type Polygon } from './polygon.ts'

/** Whether the member without a prepared edge stands upright. */
export const memberStands = (joint: Joint): boolean => (joint.type === 'tee' || joint.type === 'corner') && joint.groove !== null && !bothEdgesPrepared(joint.groove)
/** Whether two lying members of different thickness meet. */
export const isUnequalButt = (joint: Joint, a: number | null, b: number | null): boolean => joint.weld === 'groove' && joint.type === 'butt' && joint.groove !== null && !isFlare(joint.groove) && a !== null && b !== null && Math.abs(a - b) > 1e-9

/** What a thicker member has beyond the thinner one, and the slope down to it. */
export interface Excess { above: number; below: number; taper: number | null }

/** How the thicker member of an unequal butt joint lies; refuses a taper that can't be. */
export function excessOf(joint: Joint, more: number, words: Writer, remarks: Remarks): Excess {
  const taper = drawnValue(joint.taperAngle)
  if (taper !== null && (taper < 1 || taper >= 90)) remarks.refuse('joint.taperAngle', `A taper of ${words.angle(taper)} can’t be drawn; it must be at least 1° and below 90°.`)
  else if (taper === null) remarks.take(`No taper is given for the ${words.length(more)} by which one member is thicker; it is drawn as a step.`)
  const alignment = joint.alignment ?? null
  if (alignment === null) remarks.take('Which surfaces are flush is not given; the root side is.')
  const below = alignment === 'face-side' ? more : alignment === 'centred' ? more / 2 : 0
  return { above: more - below, below, taper }
}

const reachOf = (profile: GrooveProfile, thickness: number): number => Math.max(...profile.left.map(({ offset }) => offset), ...profile.right.map(({ offset }) => offset)) + Math.max(0.6 * thickness, 10)
const runOf = (rise: number, taper: number | null): number => (taper === null || rise <= 0 ? 0 : rise / Math.tan(radians(taper)))

/** A lying plate to the right of its edge. */
function lyingPlate(points: Edge, reach: number, excess: Excess | null): Polygon {
  const edge = points.map(({ offset, y }) => ({ x: offset, y }))
  const [first, last] = [edge[0] ?? { x: 0, y: 0 }, edge.at(-1) ?? { x: 0, y: 0 }]
  const { above, below, taper } = excess ?? { above: 0, below: 0, taper: null }
  const top = above > 0 ? [{ x: last.x + runOf(above, taper), y: last.y + above }] : []
  const bottom = below > 0 ? [{ x: first.x + runOf(below, taper), y: first.y - below }] : []
  return [...edge, ...top, { x: reach, y: last.y + above }, { x: reach, y: first.y - below }, ...bottom]
}

/** A rounded member: its outside is the edge, its inside a round of the radius less the wall; solid where the wall is as thick. */
function roundedMember(points: Edge, reach: number, wall: number, top: number): Polygon {
  const edge = points.map(({ offset, y }) => ({ x: offset, y }))
  const last = edge.at(-1) ?? { x: 0, y: top }
  const radius = Math.max(0, top - wall)
  const inside = Array.from({ length: 17 }, (_, step) => ({ x: last.x - radius * Math.sin((step / 16) * (Math.PI / 2)), y: radius * Math.cos((step / 16) * (Math.PI / 2)) }))
  return [...edge, { x: reach, y: last.y }, { x: reach, y: Math.max(0, last.y - wall) }, ...inside]
}

const mirror = (polygon: Polygon): Polygon => polygon.map(({ x, y }) => ({ x: -x, y }))
const block = (x0: number, y0: number, x1: number, y1: number): Polygon => [{ x: x1, y: y0 }, { x: x1, y: y1 }, { x: x0, y: y1 }, { x: x0, y: y0 }]

export interface Members {
  a: Polygon
  b: Polygon
  /** Where a member's thickness is dimensioned. */
  markA: { from: Point; to: Point }
  markB: { from: Point; to: Point } | null
}

/**
 * Members of a groove joint, A at the left. An unprepared member of a tee or corner joint stands and is B, as in the drawing of a fillet;
 * the prepared member lies.
 * @param a mm of the member that lies or, of a butt joint, stands left; `b` of the other
 */
export function grooveMembers(joint: Joint, profile: GrooveProfile, a: number, b: number | null, excess: Excess | null): Members {
  const top = profile.top
  const face = -(drawnValue(joint.rootOpening) ?? 0) / 2
  const width = b ?? a
  const reach = reachOf(profile, Math.min(a, b ?? a)) + (excess ? Math.max(runOf(excess.above, excess.taper), runOf(excess.below, excess.taper)) : 0)
  if (joint.groove !== null && isFlare(joint.groove)) {
    const rounded = roundedMember(profile.right, reach, a, top)
    const other = bothEdgesPrepared(joint.groove) ? mirror(roundedMember(profile.left, reach, b ?? a, top)) : joint.type === 'tee' || joint.type === 'corner' || joint.type === 'lap' ? block(face - width, 0, face, top) : block(face - width, 0, face, top)
    return { a: other, b: rounded, markA: { from: { x: reach, y: Math.max(0, top - a) }, to: { x: reach, y: top } }, markB: null }
  }
  if (memberStands(joint)) {
    const over = joint.type === 'tee' ? Math.max(0.5 * a, 8, 1.4 * (drawnValue(joint.reinforcingFillet) ?? 0)) : 0
    // A gouge may bite into the standing member too.
    const surface = profile.left.map(({ offset, y }) => ({ x: -offset, y }))
    const standing = [{ x: face, y: -over }, ...surface, { x: face, y: top + over }, { x: face - width, y: top + over }, { x: face - width, y: -over }]
    return { a: over > 0 ? standing : [...surface, { x: face - width, y: top }, { x: face - width, y: 0 }], b: lyingPlate(profile.right, reach, null), markA: { from: { x: reach, y: 0 }, to: { x: reach, y: top } }, markB: b === null ? null : { from: { x: face - width, y: -over }, to: { x: face, y: -over } } }
  }
  const thickIsB = b !== null && b > a
  const left = mirror(lyingPlate(profile.left, reach, thickIsB ? null : excess))
  const right = lyingPlate(profile.right, reach, thickIsB ? excess : null)
  const tall = (thick: boolean) => (thick && excess ? { low: -excess.below, high: top + excess.above } : { low: 0, high: top })
  const [ya, yb] = [tall(!thickIsB), tall(thickIsB)]
  if (!excess) return { a: left, b: right, markA: { from: { x: reach, y: 0 }, to: { x: reach, y: top } }, markB: null }
  return { a: left, b: right, markA: { from: { x: -reach, y: ya.low }, to: { x: -reach, y: ya.high } }, markB: { from: { x: reach, y: yb.low }, to: { x: reach, y: yb.high } } }
}

/** Members of an edge joint: side by side and upright, their ends at the top; the groove is prepared in the inner corners. */
export function edgeMembers(joint: Joint, profile: GrooveProfile, a: number, b: number): Members {
  const half = profile.right[0]?.offset ?? 0
  const onTop = joint.groove === 'square'
  const top = onTop ? 0 : profile.top
  const foot = top - Math.max(2 * Math.max(a, b), 2 * profile.top)
  const inner = onTop ? [{ x: half, y: 0 }] : profile.right.map(({ offset, y }) => ({ x: offset, y }))
  const outer = onTop ? [{ x: half, y: 0 }] : profile.left.map(({ offset, y }) => ({ x: offset, y }))
  const open = drawnValue(joint.rootOpening) ?? 0
  const [ia, ib] = onTop ? [open / 2, open / 2] : [outer[0]?.x ?? 0, inner[0]?.x ?? 0]
  const member = (edge: readonly Point[], inside: number, thick: number): Polygon => (onTop ? [{ x: inside, y: foot }, { x: inside, y: 0 }, { x: inside + thick, y: 0 }, { x: inside + thick, y: foot }] : [{ x: inside, y: foot }, ...edge, { x: inside + thick, y: top }, { x: inside + thick, y: foot }])
  return { a: mirror(member(outer, ia, a)), b: member(inner, ib, b), markA: { from: { x: -ia - a, y: foot }, to: { x: -ia, y: foot } }, markB: { from: { x: ib, y: foot }, to: { x: ib + b, y: foot } } }
}

/** The weld over the ends of a square edge joint: across both members. */
export function edgeWeldProfile(figures: GrooveFigures, a: number, b: number): GrooveProfile {
  const side = (thick: number): Edge => [{ offset: figures.rootOpening / 2 + thick, y: 0 }, { offset: figures.rootOpening / 2 + thick, y: figures.thickness }]
  return { left: side(a), right: side(b), top: figures.thickness, meeting: null, gouge: 0 }
}

/** Refuses a preparation that takes the whole end of an edge joint's member. */
export function checkEdgeEnds(profile: GrooveProfile, opening: number, a: number, b: number, system: 'SI' | 'US', remarks: Remarks): void {
  const words = writerFor(system)
  const [left, right] = [offsetAt(profile.left, profile.top) - opening / 2, offsetAt(profile.right, profile.top) - opening / 2]
  const most = left > a + 1e-9 ? { taken: left, of: a } : right > b + 1e-9 ? { taken: right, of: b } : null
  if (most) remarks.refuse('joint.grooveDepth', `The groove takes ${words.length(most.taken)} of an end that is ${words.length(most.of)} thick; make it shallower or steeper.`)
}

const DEFAULT_BACKING_MM = 6
const INSERT_MM = 3

/**
 * Strip under the root, where the backing is a body of its own; a ceramic one has a hollow for the root bead. Under a tee it ends at the
 * face of the member that stands.
 */
export function backingStrip(joint: Joint, rootOpening: number, thickness: number): Polygon | null {
  if (joint.backing !== 'metal' && joint.backing !== 'ceramic' && joint.backing !== 'flux') return null
  const beside = joint.type === 'tee' && memberStands(joint)
  const width = drawnValue(joint.backingWidth) ?? rootOpening + (beside ? 1 : 2) * Math.max(10, thickness / 2)
  const left = beside ? -rootOpening / 2 : -width / 2
  const right = left + width
  const depth = drawnValue(joint.backingThickness) ?? Math.min(DEFAULT_BACKING_MM, Math.max(2, thickness / 2))
  const hollow = Math.min(1.2, depth / 3)
  const reach = Math.min((width / 2) * 0.7, rootOpening / 2 + 3)
  const [from, to] = [Math.min(reach, right), Math.max(-reach, left)]
  const surface = joint.backing === 'ceramic' ? Array.from({ length: 13 }, (_, step) => ({ x: from - ((from - to) * step) / 12, y: -hollow * (1 - (1 - step / 6) ** 2) })) : []
  return [{ x: left, y: 0 }, { x: left, y: -depth }, { x: right, y: -depth }, { x: right, y: 0 }, ...surface]
}

/** A consumable insert in the root; null where there is none, or no opening to lay it into. */
export function insertOf(joint: Joint, figures: GrooveFigures): Polygon | null {
  if (joint.backing !== 'consumable-insert') return null
  const width = drawnValue(joint.insertWidth) ?? figures.rootOpening
  if (width <= 0) return null
  const height = drawnValue(joint.insertHeight) ?? Math.min(INSERT_MM, figures.thickness)
  return block(-width / 2, 0, width / 2, height)
}
