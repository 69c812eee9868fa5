/** What of a joint's drawing can be taken hold of: where, which figure it sets, and what a place on the drawing means for it. Pure. */
import type { Interval, Quantity } from '../schemas/common.ts'
import type { Joint } from '../schemas/welding.ts'
import { fromSi, SHOWN_UNIT, toSi } from '../units/convert.ts'
import type { UnitSystem } from '../units/types.ts'
import { bothEdgesPrepared, grooveProfile, hasAngle, hasRadius, isFlare, offsetAt } from './groove-profile.ts'
import { angleField, drawnValue } from './joint-figures.ts'
import type { JointGeometry, JointSetting } from './joint-geometry.ts'
import type { MarkKind } from './joint-marks.ts'
import { isUnequalButt, memberStands } from './joint-members.ts'
import type { Point } from './polygon.ts'

export interface JointHandle {
  kind: MarkKind
  /** Field of the weld's variables that it sets. */
  path: string
  label: string
  dimension: 'length' | 'angle'
  at: Point
  /** mm or degrees. */
  value: number
  min: number
  max: number
  /** Direction in which the value grows, for the arrow that is drawn. */
  axis: 'x' | 'y'
  /** The value that a place on the drawing asks for; not yet rounded or kept within its ends. */
  read: (place: Point) => number
}

/** Step of a drag or an arrow key: half a millimetre or 1/32 in.; a degree. In mm or degrees. */
export const stepOf = (dimension: 'length' | 'angle', system: UnitSystem): number => (dimension === 'angle' ? 1 : system === 'SI' ? 0.5 : 25.4 / 32)

const clamp = (value: number, min: number, max: number): number => Math.min(max, Math.max(min, value))
/** A value on the handle's steps and within its ends. */
export const settled = (handle: Pick<JointHandle, 'dimension' | 'min' | 'max'>, value: number, system: UnitSystem): number => {
  const step = stepOf(handle.dimension, system)
  return clamp(Math.round(value / step) * step, Math.ceil(handle.min / step - 1e-9) * step, Math.max(handle.min, Math.floor(handle.max / step + 1e-9) * step))
}

const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b))
/** Inches to the 32nd as the trade writes them: `1 3/8 in`. */
function inches(value: number): string {
  const parts = Math.round(value * 32)
  if (Math.abs(value * 32 - parts) > 1e-6) return `${Number(value.toFixed(4))} in`
  const [whole, rest] = [Math.floor(parts / 32), parts % 32]
  if (rest === 0) return `${whole} in`
  const common = gcd(rest, 32)
  return `${whole > 0 ? `${whole} ` : ''}${rest / common}/${32 / common} in`
}

/** A figure in mm or degrees as it would be typed in a system. */
export function typedQuantity(value: number, dimension: 'length' | 'angle', system: UnitSystem): Quantity {
  const unit = SHOWN_UNIT[system][dimension]
  const shown = Number(fromSi(value, dimension, unit).toFixed(unit === 'in' ? 6 : 3))
  return { si: toSi(shown, dimension, unit), unit, typed: unit === 'in' ? inches(shown) : `${shown} ${unit}` }
}

/** An interval moved so that its drawn value is `value`; its width, or the end that it lacks, stays. Never below 0. */
export function movedInterval(interval: Interval | null, value: number, dimension: 'length' | 'angle', system: UnitSystem): Interval {
  const [min, max] = [interval?.min ?? null, interval?.max ?? null]
  const at = (si: number) => typedQuantity(si, dimension, system)
  if (min && max && min.si !== max.si) {
    const half = Math.min((max.si - min.si) / 2, value)
    return { min: at(value - half), max: at(value + half), all: false }
  }
  if (min && !max) return { min: at(value), max: null, all: false }
  if (!min && max) return { min: null, max: at(value), all: false }
  return { min: at(value), max: at(value), all: false }
}

/** The bevel at which the edge's top lies at `x`, by halving: the edge moves outwards as the angle grows. */
function bevelAt(joint: Joint, geometry: NonNullable<JointGeometry['groove']>, x: number): number {
  const { figures, profile } = geometry
  let [low, high] = [0, 89]
  for (let turn = 0; turn < 32; turn += 1) {
    const middle = (low + high) / 2
    const edge = grooveProfile(joint.groove ?? 'single-v', { ...figures, bevelAngle: middle, gouge: 0 })
    if (offsetAt(edge.right, profile.top) < x) low = middle
    else high = middle
  }
  return (low + high) / 2
}

function grooveHandles({ joint, thickness, thicknessB }: JointSetting, geometry: JointGeometry, groove: NonNullable<JointGeometry['groove']>): JointHandle[] {
  const { profile, figures } = groove
  const { top } = profile
  const handles: JointHandle[] = []
  const type = joint.groove ?? 'square'
  const foot = profile.meeting ?? 0
  const start = foot + figures.rootFace
  const unequal = isUnequalButt(joint, drawnValue(thickness), drawnValue(thicknessB ?? null))
  const edge = joint.type === 'edge' && !isFlare(type)
  const mark = (kind: MarkKind) => geometry.dimensions.find((one) => one.kind === kind)
  for (const kind of ['thickness', ...(unequal ? ['thickness-b'] : [])] as const) {
    const placed = mark(kind as MarkKind)
    if (!placed || edge || isFlare(type)) continue
    const inset = (placed.from.x < 0 ? 1 : -1) * 6
    handles.push({ kind: kind as MarkKind, path: placed.path, label: kind === 'thickness' ? 'Thickness' : 'Thickness of B', dimension: 'length', at: { x: placed.to.x + inset, y: placed.to.y }, value: placed.to.y - placed.from.y, min: 0.5, max: 300, axis: 'y', read: ({ y }) => y - placed.from.y })
  }
  const rootY = Math.max(foot, profile.gouge)
  const tight = figures.rootOpening
  handles.push({ kind: 'root-opening', path: 'joint.rootOpening', label: 'Root opening', dimension: 'length', at: { x: -tight / 2, y: rootY }, value: tight, min: 0, max: 50, axis: 'x', read: ({ x }) => -2 * x })
  if (type !== 'square' && !isFlare(type) && !edge) {
    const depth = (joint.rootFace === null && (joint.grooveDepth ?? null) !== null)
    const right = offsetAt(profile.right, start)
    if (depth) handles.push({ kind: 'groove-depth', path: 'joint.grooveDepth', label: 'Groove depth', dimension: 'length', at: { x: right, y: start }, value: top - start, min: 0.5, max: top - foot, axis: 'y', read: ({ y }) => top - y })
    else if ((joint.grooveDepth ?? null) === null) handles.push({ kind: 'root-face', path: 'joint.rootFace', label: 'Root face', dimension: 'length', at: { x: right, y: start }, value: figures.rootFace, min: 0, max: Math.max(0, figures.thickness - 0.5), axis: 'y', read: ({ y }) => y - foot })
  }
  if (edge) handles.push({ kind: 'groove-depth', path: 'joint.grooveDepth', label: 'Groove depth', dimension: 'length', at: { x: 0, y: top }, value: top, min: 0.5, max: 100, axis: 'y', read: ({ y }) => y })
  if (hasAngle(type) && type !== 'compound-v') {
    const both = bothEdgesPrepared(type)
    const field = both ? angleField(type) : joint.bevelAngle === null && joint.includedAngle !== null ? 'joint.includedAngle' : 'joint.bevelAngle'
    const stated = both && joint.includedAngle === null && joint.bevelAngle !== null ? 'joint.bevelAngle' : field
    const factor = both && stated === 'joint.includedAngle' ? 2 : 1
    handles.push({ kind: factor === 2 ? 'included-angle' : 'bevel-angle', path: stated, label: stated === 'joint.includedAngle' ? 'Included angle' : 'Bevel angle', dimension: 'angle', at: { x: offsetAt(profile.right, top), y: top }, value: factor * (figures.bevelAngle ?? 0), min: hasRadius(type) ? 0 : 1, max: factor * 85, axis: 'x', read: ({ x }) => factor * bevelAt(joint, groove, x) })
  }
  const radius = mark('root-radius')
  if (radius) {
    const turn = Math.atan2(radius.to.y - radius.from.y, radius.to.x - radius.from.x)
    const from = isFlare(type) ? { x: radius.from.x - figures.rootRadius!, y: 0 } : { x: radius.from.x, y: start }
    const reach = isFlare(type) ? 1 + Math.cos(turn) : Math.cos(turn)
    handles.push({ kind: 'root-radius', path: 'joint.rootRadius', label: 'Root radius', dimension: 'length', at: radius.to, value: figures.rootRadius ?? 0, min: 0.5, max: 100, axis: 'x', read: ({ x }) => (x - from.x) / Math.max(0.05, Math.abs(reach)) })
  }
  const cover = geometry.fillets[0]
  if (cover) handles.push({ kind: 'reinforcing-fillet', path: 'joint.reinforcingFillet', label: 'Reinforcing fillet', dimension: 'length', at: cover.toeB, value: cover.toeB.y - cover.corner.y, min: 0.5, max: 50, axis: 'y', read: ({ y }) => y - cover.corner.y })
  if (memberStands(joint) && mark('thickness-b')) {
    const placed = mark('thickness-b')
    if (placed) handles.push({ kind: 'thickness-b', path: 'thicknessB', label: 'Thickness of B', dimension: 'length', at: { x: placed.from.x, y: top / 2 }, value: Math.abs(placed.to.x - placed.from.x), min: 0.5, max: 300, axis: 'x', read: ({ x }) => placed.to.x - x })
  }
  return handles
}

function filletHandles({ joint }: JointSetting, geometry: JointGeometry): JointHandle[] {
  const [fillet] = geometry.fillets
  if (!fillet) return []
  const { corner, toeA, toeB } = fillet
  const legB = Math.hypot(toeB.x - corner.x, toeB.y - corner.y)
  const [ux, uy] = [(toeB.x - corner.x) / legB, (toeB.y - corner.y) / legB]
  const thickness = geometry.dimensions.find(({ kind }) => kind === 'thickness')
  const handles: JointHandle[] = [{ kind: 'leg', path: 'joint.filletLeg', label: 'Fillet leg', dimension: 'length', at: toeA, value: toeA.x - corner.x, min: 1, max: 80, axis: 'x', read: ({ x }) => x - corner.x }]
  if ((joint.filletLegB ?? null) !== null) handles.push({ kind: 'leg-b', path: 'joint.filletLegB', label: 'Leg on B', dimension: 'length', at: toeB, value: legB, min: 1, max: 80, axis: 'y', read: ({ x, y }) => (x - corner.x) * ux + (y - corner.y) * uy })
  else handles.push({ kind: 'leg', path: 'joint.filletLeg', label: 'Fillet leg, on B', dimension: 'length', at: toeB, value: legB, min: 1, max: 80, axis: 'y', read: ({ x, y }) => (x - corner.x) * ux + (y - corner.y) * uy })
  if (thickness) handles.push({ kind: 'thickness', path: 'thickness', label: 'Thickness', dimension: 'length', at: { x: thickness.from.x - 6, y: thickness.from.y }, value: -thickness.from.y, min: 0.5, max: 300, axis: 'y', read: ({ y }) => -y })
  if (geometry.dimensions.some(({ kind }) => kind === 'member-angle')) {
    handles.push({ kind: 'member-angle', path: 'joint.memberAngle', label: 'Angle between members', dimension: 'angle', at: { x: corner.x + ux * legB * 1.5, y: corner.y + uy * legB * 1.5 }, value: (Math.atan2(uy, ux) * 180) / Math.PI, min: 30, max: 150, axis: 'x', read: ({ x, y }) => (Math.atan2(Math.max(1e-6, y - corner.y), x - corner.x) * 180) / Math.PI })
  }
  return handles
}

/** Handles of a drawn joint; none where nothing is drawn. */
export function handlesOf(setting: JointSetting, geometry: JointGeometry): JointHandle[] {
  if (geometry.plates.length === 0) return []
  return geometry.groove ? grooveHandles(setting, geometry, geometry.groove) : filletHandles(setting, geometry)
}


