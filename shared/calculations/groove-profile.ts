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
function preparedSide(type: GrooveType, figures: GrooveFigures, depth: number): Edge {
  const bevel = figures.bevelAngle ?? 0
  const slope = Math.tan(radians(bevel))
  if (type === 'square') return [{ offset: 0, y: 0 }, { offset: 0, y: depth }]
  if (type === 'compound-v') {
    const kink = depth / 2
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

/** A whole edge from underside to top. A double groove is taken equally deep on both sides. */
function edge(type: GrooveType, figures: GrooveFigures): Edge {
  const { thickness, rootFace } = figures
  if (isFlare(type)) return preparedSide(type, figures, thickness)
  if (!isDouble(type)) {
    const side = preparedSide(type, figures, thickness - rootFace).map(({ offset, y }) => ({ offset, y: y + rootFace }))
    return rootFace > 0 ? [{ offset: 0, y: 0 }, ...side] : side
  }
  const depth = (thickness - rootFace) / 2
  const side = preparedSide(type, figures, depth)
  return [...side.map(({ offset, y }) => ({ offset, y: depth - y })).reverse(), ...side.map(({ offset, y }) => ({ offset, y: depth + rootFace + y }))].filter((point, index, all) => index === 0 || point.y > (all[index - 1]?.y ?? -1) + 1e-12)
}

/** Both edges of the groove; the unprepared edge of a bevel or J groove stands straight. */
export function grooveProfile(type: GrooveType, figures: GrooveFigures): GrooveProfile {
  const prepared = edge(type, figures)
  const top = isFlare(type) ? (figures.rootRadius ?? 0) : figures.thickness
  const straight: Edge = [{ offset: 0, y: 0 }, { offset: 0, y: top }]
  const half = figures.rootOpening / 2
  const placed = (points: Edge): Edge => points.map(({ offset, y }) => ({ offset: offset + half, y }))
  return { left: placed(bothEdgesPrepared(type) ? prepared : straight), right: placed(prepared), top, meeting: isDouble(type) ? (figures.thickness - figures.rootFace) / 2 : null }
}

/** Offset of an edge at a height, straight between its points. */
export function offsetAt(points: Edge, y: number): number {
  const above = points.findIndex((point) => point.y >= y)
  const [high, low] = [points[above === -1 ? points.length - 1 : above], points[Math.max(0, (above === -1 ? points.length : above) - 1)]]
  if (!high || !low) return 0
  return high.y === low.y ? high.offset : low.offset + ((y - low.y) / (high.y - low.y)) * (high.offset - low.offset)
}
