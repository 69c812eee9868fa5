/**
 * The prepared edge of each groove type: how far it stands from the plane of the root opening at each height.
 * Shapes as in AWS A3.0; a U or J is a root radius tangent to the bevel, beginning at the root opening.
 */
import type { GROOVE_TYPES } from '../schemas/welding.ts'
import { radians } from './polygon.ts'

export type GrooveType = (typeof GROOVE_TYPES)[number]

/** mm and degrees; null = not given. */
export interface GrooveFigures {
  thickness: number
  rootOpening: number
  rootFace: number
  /** Angle of one prepared edge. */
  bevelAngle: number | null
  /** Angle of the upper part of a compound groove. */
  upperBevelAngle: number | null
  rootRadius: number | null
  /** Depth of the second side of a double groove; half of what the root face leaves unless given. */
  secondDepth?: number
  /** Angle of one edge on the second side, where it differs. */
  secondBevelAngle?: number | null
  /** Height above the underside at which a compound groove changes its angle; half of the depth unless given. */
  angleChange?: number | null
  /** Depth gouged out from the underside. */
  gouge?: number
}

/** Offsets of an edge at ascending heights. */
export type Edge = readonly { offset: number; y: number }[]

export interface GrooveProfile {
  left: Edge
  right: Edge
  /** Height of the top of the weld, the thickness but for flare grooves. */
  top: number
  /** Where the two sides of a double groove meet: the underside of the root face; null for a single groove. */
  meeting: number | null
  /** Depth gouged from the underside, 0 without. */
  gouge: number
}

const ARC_STEPS = 64
const TYPES_WITH_BOTH_EDGES: readonly GrooveType[] = ['single-v', 'double-v', 'single-u', 'double-u', 'compound-v', 'flare-v']
export const isDouble = (type: GrooveType): boolean => type.startsWith('double-')
export const isFlare = (type: GrooveType): boolean => type.startsWith('flare-')
export const bothEdgesPrepared = (type: GrooveType): boolean => TYPES_WITH_BOTH_EDGES.includes(type)
export const hasRadius = (type: GrooveType): boolean => /-[uj]$/.test(type) || isFlare(type)
export const hasAngle = (type: GrooveType): boolean => type !== 'square' && !isFlare(type)

/** Depth of a U or J below which the wall is straight. */
export const arcHeight = (radius: number, bevel: number): number => radius * (1 - Math.sin(radians(bevel)))

/** One prepared side of depth `depth`: offsets from its bottom, height 0 at the root face. */
function preparedSide(type: GrooveType, figures: GrooveFigures, depth: number, bevel: number): Edge {
  const slope = Math.tan(radians(bevel))
  if (type === 'square') return [{ offset: 0, y: 0 }, { offset: 0, y: depth }]
  if (type === 'compound-v') {
    const kink = figures.angleChange == null ? depth / 2 : figures.angleChange - figures.rootFace
    const offset = kink * slope
    return [{ offset: 0, y: 0 }, { offset, y: kink }, { offset: offset + (depth - kink) * Math.tan(radians(figures.upperBevelAngle ?? bevel)), y: depth }]
  }
  const radius = figures.rootRadius ?? 0
  if (isFlare(type)) return Array.from({ length: ARC_STEPS + 1 }, (_, step) => ({ offset: radius * (1 - Math.cos((step / ARC_STEPS) * (Math.PI / 2))), y: radius * Math.sin((step / ARC_STEPS) * (Math.PI / 2)) }))
  if (hasRadius(type)) {
    const end = Math.PI / 2 - radians(bevel)
    const arc = Array.from({ length: ARC_STEPS + 1 }, (_, step) => ({ offset: radius * Math.sin((step / ARC_STEPS) * end), y: radius * (1 - Math.cos((step / ARC_STEPS) * end)) }))
    const last = arc.at(-1) ?? { offset: 0, y: 0 }
    return [...arc, { offset: last.offset + (depth - last.y) * slope, y: depth }]
  }
  return [{ offset: 0, y: 0 }, { offset: depth * slope, y: depth }]
}

const rising = (points: Edge): Edge => points.filter((point, index, all) => index === 0 || point.y > (all[index - 1]?.y ?? -1) + 1e-12)

/** Depth of the second side of a double groove. */
const secondDepthOf = (figures: GrooveFigures): number => figures.secondDepth ?? (figures.thickness - figures.rootFace) / 2

/** A whole edge from underside to top. */
function edge(type: GrooveType, figures: GrooveFigures): Edge {
  const { thickness, rootFace } = figures
  const bevel = figures.bevelAngle ?? 0
  if (isFlare(type)) return preparedSide(type, figures, thickness, bevel)
  if (!isDouble(type)) {
    const side = preparedSide(type, figures, thickness - rootFace, bevel).map(({ offset, y }) => ({ offset, y: y + rootFace }))
    return rootFace > 0 ? [{ offset: 0, y: 0 }, ...side] : side
  }
  const second = secondDepthOf(figures)
  const upper = preparedSide(type, figures, thickness - rootFace - second, bevel)
  const lower = preparedSide(type, figures, second, figures.secondBevelAngle ?? bevel)
  return rising([...lower.map(({ offset, y }) => ({ offset, y: second - y })).reverse(), ...upper.map(({ offset, y }) => ({ offset, y: second + rootFace + y }))])
}

/** Shape of a gouge whose depth alone is given: a round bottom, then sides that open. */
export const GOUGE_RADIUS_MM = 5
export const GOUGE_SIDE_DEGREES = 30
/** How far a gouge reaches from the middle of the root, `up` below its tip. */
function gougeOffset(up: number): number {
  const side = radians(GOUGE_SIDE_DEGREES)
  const arc = GOUGE_RADIUS_MM * (1 - Math.sin(side))
  return up <= arc ? Math.sqrt(Math.max(0, GOUGE_RADIUS_MM ** 2 - (GOUGE_RADIUS_MM - up) ** 2)) : GOUGE_RADIUS_MM * Math.cos(side) + (up - arc) * Math.tan(side)
}

/** An edge with what a gouge from the underside takes away as well. */
function gouged(points: Edge, depth: number): Edge {
  if (depth <= 0) return points
  const heights = [...new Set([...points.map(({ y }) => y), ...Array.from({ length: 33 }, (_, step) => depth * (1 - (1 - step / 32) ** 2))])].sort((one, other) => one - other)
  return rising(heights.map((y) => ({ y, offset: y < depth ? Math.max(offsetAt(points, y), gougeOffset(depth - y)) : offsetAt(points, y) })))
}

/** Both edges of the groove; the unprepared edge of a bevel or J groove stands straight. */
export function grooveProfile(type: GrooveType, figures: GrooveFigures): GrooveProfile {
  const prepared = edge(type, figures)
  const top = isFlare(type) ? (figures.rootRadius ?? 0) : figures.thickness
  const straight: Edge = [{ offset: 0, y: 0 }, { offset: 0, y: top }]
  const half = figures.rootOpening / 2
  const gouge = figures.gouge ?? 0
  const placed = (points: Edge): Edge => gouged(points.map(({ offset, y }) => ({ offset: offset + half, y })), gouge)
  return { left: placed(bothEdgesPrepared(type) ? prepared : straight), right: placed(prepared), top, meeting: isDouble(type) ? secondDepthOf(figures) : null, gouge }
}

/** Offset of an edge at a height, straight between its points. */
export function offsetAt(points: Edge, y: number): number {
  const above = points.findIndex((point) => point.y >= y)
  const [high, low] = [points[above === -1 ? points.length - 1 : above], points[Math.max(0, (above === -1 ? points.length : above) - 1)]]
  if (!high || !low) return 0
  return high.y === low.y ? high.offset : low.offset + ((y - low.y) / (high.y - low.y)) * (high.offset - low.offset)
}
