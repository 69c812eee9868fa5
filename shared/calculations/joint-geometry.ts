/**
 * The cross-section of a joint: plates, backing, passes, dimensions, groove area and weld metal. Pure geometry in mm, x across
 * the joint and y upwards, so that the screen and the printed page draw the same. Areas are plane geometry; the U and J shapes and the
 * mass per metre agree with the published worked examples in the tests.
 */
import { baseMetalById } from '../library/base-metals.ts'
import type { Interval } from '../schemas/common.ts'
import type { Joint, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'
import { formatInterval } from '../units/format.ts'
import type { Dimension, UnitSystem } from '../units/types.ts'
import { filletGeometry } from './fillet-geometry.ts'
import { bothEdgesPrepared, grooveProfile, hasAngle, hasRadius, isDouble, isFlare, offsetAt, type GrooveProfile } from './groove-profile.ts'
import { drawnValue, grooveFigures } from './joint-figures.ts'
import { bySide, layBackingBeads, layRegion, passesOf, type LaidPass, type Region } from './pass-layout.ts'
import { boundsOf, polygonArea, type Bounds, type Point, type Polygon } from './polygon.ts'

export interface JointDimension {
  kind: 'thickness' | 'thickness-b' | 'root-opening' | 'root-face' | 'included-angle' | 'bevel-angle' | 'root-radius' | 'leg'
  from: Point
  to: Point
  /** The corner of an angle, which opens from `from` to `to`. */
  vertex: Point | null
  /** The figure as the record states it, in the reader's units. */
  text: string
}

export interface JointGeometry {
  plates: Polygon[]
  backing: Polygon | null
  /** Outline of the weld without reinforcement: what is drawn where no passes are listed. */
  weld: Polygon[]
  passes: LaidPass[]
  dimensions: JointDimension[]
  bounds: Bounds
  /** Weld section without reinforcement; null when a figure it needs is not given. */
  areaMm2: number | null
  /** null without area or density. */
  weldMetalKgPerM: number | null
  /** Geometry that can't be, and figures without which nothing can be drawn. */
  impossible: string[]
  /** What the record leaves open and the drawing had to take. */
  assumed: string[]
}

export interface JointSetting {
  joint: Joint
  thickness: Interval | null
  thicknessB?: Interval | null
  blocks?: readonly Pick<ProcessBlock, 'id' | 'passes'>[]
  /** kg/m³ of the deposit; null = not known, then no mass is given. */
  density?: number | null
  system: UnitSystem
}

/** Mass of weld metal, kg per metre, of a section in mm² at a density in kg/m³. */
export const massPerMetre = (areaMm2: number, density: number): number => (areaMm2 * density) / 1e6

const written = (interval: Interval | null, dimension: Dimension, system: UnitSystem): string => (interval ? formatInterval(interval, dimension, system).text : '')

const REINFORCEMENT_MM = 1.5
const BACKING_MM = 6

/** Parts of the groove to fill, in welding order of their sides. */
function regions(joint: Joint, profile: GrooveProfile, rootFace: number): Region[] {
  const reinforcement = Math.min(REINFORCEMENT_MM, profile.top * 0.12)
  const closed = offsetAt(profile.left, 0) + offsetAt(profile.right, 0) < 1e-9
  if (profile.meeting === null) return [{ from: joint.penetration === 'partial' || closed ? rootFace : 0, to: profile.top, reinforcement }]
  const open = !(joint.penetration === 'partial' || (closed && offsetAt(profile.right, profile.meeting + rootFace / 2) < 1e-9))
  return [
    { from: profile.meeting + (open ? 0 : rootFace), to: profile.top, reinforcement },
    { from: profile.meeting, to: 0, reinforcement },
  ]
}

/** Outline between two heights. */
function outline(profile: GrooveProfile, from: number, to: number): Polygon {
  const [low, high] = [Math.min(from, to), Math.max(from, to)]
  const side = (points: GrooveProfile['left']): Point[] => [{ x: offsetAt(points, low), y: low }, ...points.filter(({ y }) => y > low && y < high).map(({ offset, y }) => ({ x: offset, y })), { x: offsetAt(points, high), y: high }]
  return [...side(profile.left).map(({ x, y }) => ({ x: -x, y })), ...side(profile.right).reverse()]
}

/** The two members: lying plates, but for a tee or corner joint whose unprepared member stands. */
function members(joint: Joint, profile: GrooveProfile, thickness: number, standing: number | null): Polygon[] {
  const reach = Math.max(...profile.left.map(({ offset }) => offset), ...profile.right.map(({ offset }) => offset)) + Math.max(1.2 * thickness, 12)
  const flare = joint.groove !== null && isFlare(joint.groove)
  /** Inside of a rounded member's wall, from its top back to its foot; a solid round where the wall is as thick as the radius. */
  const inside = (centre: number): Point[] => {
    const radius = Math.max(0, profile.top - thickness)
    return Array.from({ length: 17 }, (_, step) => ({ x: centre - radius * Math.sin((step / 16) * (Math.PI / 2)), y: radius * Math.cos((step / 16) * (Math.PI / 2)) }))
  }
  const lying = (points: GrooveProfile['left']): Polygon => {
    const edge = points.map(({ offset, y }) => ({ x: offset, y }))
    const last = edge.at(-1) ?? { x: 0, y: thickness }
    return flare ? [...edge, { x: reach, y: last.y }, { x: reach, y: Math.max(0, last.y - thickness) }, ...inside(last.x)] : [...edge, { x: reach, y: last.y }, { x: reach, y: 0 }]
  }
  const right = lying(profile.right)
  const stands = (joint.type === 'tee' || joint.type === 'corner') && joint.groove !== null && !bothEdgesPrepared(joint.groove)
  const face = -(profile.left[0]?.offset ?? 0)
  const width = standing ?? thickness
  const left = stands
    ? [{ x: face, y: joint.type === 'tee' ? -1.2 * thickness : 0 }, { x: face, y: profile.top + (joint.type === 'tee' ? 1.2 * thickness : 0) }, { x: face - width, y: profile.top + (joint.type === 'tee' ? 1.2 * thickness : 0) }, { x: face - width, y: joint.type === 'tee' ? -1.2 * thickness : 0 }]
    : flare && !bothEdgesPrepared(joint.groove ?? 'square')
      ? [{ x: face, y: 0 }, { x: face, y: profile.top }, { x: face - width, y: profile.top }, { x: face - width, y: 0 }]
      : lying(profile.left).map(({ x, y }) => ({ x: -x, y }))
  return [left, right]
}

/** Strip under the root, where the backing is a body of its own. */
function backingStrip(joint: Joint, rootOpening: number, thickness: number): Polygon | null {
  if (joint.backing !== 'metal' && joint.backing !== 'ceramic' && joint.backing !== 'flux') return null
  const [half, depth] = [rootOpening / 2 + Math.max(10, thickness / 2), Math.min(BACKING_MM, Math.max(2, thickness / 2))]
  return [{ x: -half, y: -depth }, { x: half, y: -depth }, { x: half, y: 0 }, { x: -half, y: 0 }]
}

function grooveDimensions(joint: Joint, profile: GrooveProfile, setting: JointSetting, bounds: Bounds, rootFace: number): JointDimension[] {
  const { system } = setting
  const top = profile.top
  const [leftTop, rightTop] = [-offsetAt(profile.left, top), offsetAt(profile.right, top)]
  const [leftRoot, rightRoot] = [-offsetAt(profile.left, 0), offsetAt(profile.right, 0)]
  const list: JointDimension[] = []
  const add = (kind: JointDimension['kind'], from: Point, to: Point, interval: Interval | null, dimension: Dimension, vertex: Point | null = null) => {
    const text = written(interval, dimension, system)
    if (text !== '') list.push({ kind, from, to, vertex, text })
  }
  const foot = profile.meeting === null ? 0 : profile.meeting
  add('thickness', { x: bounds.maxX, y: joint.groove && isFlare(joint.groove) ? Math.max(0, top - (drawnValue(setting.thickness) ?? 0)) : 0 }, { x: bounds.maxX, y: top }, setting.thickness, 'length')
  add('root-opening', { x: -offsetAt(profile.left, foot), y: foot }, { x: offsetAt(profile.right, foot), y: foot }, joint.rootOpening, 'length')
  if (rootFace > 0) add('root-face', { x: rightRoot, y: foot }, { x: rightRoot, y: foot + rootFace }, joint.rootFace, 'length')
  const start = foot + rootFace
  if (joint.groove && hasAngle(joint.groove)) {
    const vertex = { x: bothEdgesPrepared(joint.groove) ? (leftRoot + rightRoot) / 2 : offsetAt(profile.right, start), y: start }
    const upright = { x: offsetAt(profile.right, start), y: top }
    if (bothEdgesPrepared(joint.groove)) add('included-angle', { x: leftTop, y: top }, { x: rightTop, y: top }, joint.includedAngle, 'angle', vertex)
    add('bevel-angle', upright, { x: rightTop, y: top }, joint.bevelAngle ?? (bothEdgesPrepared(joint.groove) ? null : joint.includedAngle), 'angle', { x: upright.x, y: start })
  }
  if (joint.groove && hasRadius(joint.groove)) {
    const radius = drawnValue(joint.rootRadius) ?? 0
    const centre = isFlare(joint.groove) ? { x: offsetAt(profile.right, 0) + radius, y: 0 } : { x: offsetAt(profile.right, start), y: start + radius }
    add('root-radius', centre, { x: offsetAt(profile.right, start + (isFlare(joint.groove) ? radius * 0.7 : radius * 0.3)), y: start + (isFlare(joint.groove) ? radius * 0.7 : radius * 0.3) }, joint.rootRadius, 'length')
  }
  return list
}

const nothing = (impossible: string[], assumed: string[]): JointGeometry => ({ plates: [], backing: null, weld: [], passes: [], dimensions: [], bounds: boundsOf([]), areaMm2: null, weldMetalKgPerM: null, impossible, assumed })

/**
 * The cross-section of a joint.
 * An interval is drawn at its middle and labelled as written. Where `impossible` is not empty nothing is drawn.
 */
export function jointGeometry(setting: JointSetting): JointGeometry {
  const { joint, system } = setting
  const [thickness, thicknessB] = [drawnValue(setting.thickness), drawnValue(setting.thicknessB ?? null)]
  const passes = passesOf(setting.blocks ?? [])
  if (joint.weld === 'fillet') {
    const fillet = filletGeometry({ joint, thickness, thicknessB: thicknessB ?? thickness, passes, system })
    if (!fillet.drawn) return nothing(fillet.impossible, [])
    const { plates, weld, laid, areaMm2, legs } = fillet.drawn
    const dimensions: JointDimension[] = [{ kind: 'leg' as const, ...legs, vertex: null, text: written(joint.filletLeg, 'length', system) }, { kind: 'thickness' as const, ...fillet.drawn.thicknessMark, vertex: null, text: written(setting.thickness, 'length', system) }, ...(setting.thicknessB ? [{ kind: 'thickness-b' as const, ...fillet.drawn.thicknessBMark, vertex: null, text: written(setting.thicknessB, 'length', system) }] : [])]
    return { plates, backing: null, weld, passes: laid, dimensions: dimensions.filter(({ text }) => text !== ''), bounds: boundsOf([...plates, ...weld]), areaMm2, weldMetalKgPerM: setting.density ? massPerMetre(areaMm2, setting.density) : null, impossible: [], assumed: fillet.assumed }
  }
  const { figures, impossible, assumed } = grooveFigures(joint, thickness, system)
  if (!figures || !joint.groove) return nothing(impossible, assumed)
  const profile = grooveProfile(joint.groove, figures)
  const parts = regions(joint, profile, figures.rootFace)
  const weld = parts.map(({ from, to }) => outline(profile, from, to))
  const underneath = isDouble(joint.groove) ? [] : passes.filter(({ layer }) => layer === 'backing')
  const inGroove = passes.filter((pass) => !underneath.includes(pass))
  const sides = isDouble(joint.groove) ? bySide(inGroove) : [inGroove, []]
  const laid = [...parts.flatMap((part, index) => layRegion(sides[index] ?? [], profile, part)), ...layBackingBeads(underneath, figures.rootOpening, Math.min(2.5, figures.thickness * 0.2))].sort((one, other) => one.order - other.order)
  const known = joint.rootOpening !== null && (joint.rootFace !== null || joint.groove === 'square' || isFlare(joint.groove))
  const areaMm2 = known ? weld.reduce((sum, polygon) => sum + polygonArea(polygon), 0) : null
  const plates = members(joint, profile, figures.thickness, thicknessB)
  const backing = backingStrip(joint, figures.rootOpening, figures.thickness)
  const bounds = boundsOf([...plates, ...(backing ? [backing] : []), ...laid.map(({ polygon }) => polygon)])
  return { plates, backing, weld, passes: laid, dimensions: grooveDimensions(joint, profile, setting, bounds, figures.rootFace), bounds, areaMm2, weldMetalKgPerM: areaMm2 !== null && setting.density ? massPerMetre(areaMm2, setting.density) : null, impossible: [], assumed }
}

/** Density of the base metal as a stand-in for that of its weld metal, kg/m³; null for a metal that is not from the library. */
export const densityOf = (variables: Pick<WeldingVariables, 'baseMetals'>): number | null => (variables.baseMetals.a.libraryId ? (baseMetalById(variables.baseMetals.a.libraryId)?.density_kg_m3 ?? null) : null)

/** The cross-section of a procedure or coupon, with the passes of all its process blocks. */
export const geometryOf = (variables: WeldingVariables, system: UnitSystem = variables.unitSystem): JointGeometry => jointGeometry({ joint: variables.joint, thickness: variables.thickness, thicknessB: variables.thicknessB, blocks: variables.processes, density: densityOf(variables), system })
