/**
 * The cross-section of a joint: plates, backing, passes, dimensions, groove area and weld metal. Pure geometry in mm, x across
 * the joint and y upwards, so that the screen and the printed page draw the same. Areas are plane geometry; the U and J shapes and the
 * mass per metre agree with the published worked examples in the tests.
 */
import { baseMetalById } from '../library/base-metals.ts'
import type { Interval } from '../schemas/common.ts'
import type { Joint, WeldingVariables } from '../schemas/welding.ts'
import type { UnitSystem } from '../units/types.ts'
import { filletGeometry } from './fillet-geometry.ts'
import { grooveProfile, isFlare, offsetAt, type GrooveFigures, type GrooveProfile } from './groove-profile.ts'
import { drawnValue, grooveFigures, Remarks, writerFor, type Problem } from './joint-figures.ts'
import { grooveMarks, Marks, written, type JointDimension } from './joint-marks.ts'
import { backingStrip, checkEdgeEnds, edgeMembers, edgeWeldProfile, excessOf, grooveMembers, insertOf, isUnequalButt, memberStands } from './joint-members.ts'
import { bySide, layBackingBeads, layFillet, layRegion, passesOf, type LaidPass, type PassBlock, type PassToLay, type Region } from './pass-layout.ts'
import { boundsOf, centroid, polygonArea, type Bounds, type Point, type Polygon } from './polygon.ts'

export type { JointDimension } from './joint-marks.ts'

export interface JointGeometry {
  plates: Polygon[]
  backing: Polygon | null
  /** A consumable insert, which becomes part of the weld. */
  insert: Polygon | null
  /** Outline of the weld without reinforcement: what is drawn where no passes are listed. */
  weld: Polygon[]
  passes: LaidPass[]
  dimensions: JointDimension[]
  bounds: Bounds
  /** Weld section without reinforcement; null when a figure it needs is not given. */
  areaMm2: number | null
  /** null without area or density. */
  weldMetalKgPerM: number | null
  /** Weld metal once round the pipe, kg; null for plate and where it can't be told. */
  weldMetalRoundKg: number | null
  /** Throat of a flat fillet, mm. */
  throatMm: number | null
  /** Of a pipe: what stands at its axis, which lies on the root side. */
  axis: string | null
  /** What can't be, each at the field where it is mended. Where there is any, nothing is drawn. */
  problems: Problem[]
  /** The sentences of `problems`. */
  impossible: string[]
  /** What the record leaves open and the drawing had to take. */
  assumed: string[]
  /** The groove itself, for laying passes and for handles; null for a fillet and where nothing is drawn. */
  groove: { profile: GrooveProfile; figures: GrooveFigures; regions: readonly Region[] } | null
  /** A fillet's corner and toes, one for each weld; also the fillets that reinforce a groove. */
  fillets: { corner: Point; toeA: Point; toeB: Point }[]
}

export interface JointSetting {
  joint: Joint
  thickness: Interval | null
  thicknessB?: Interval | null
  blocks?: readonly PassBlock[]
  /** kg/m³ of the deposit; null = not known, then no mass is given. */
  density?: number | null
  /** Outside diameter of a pipe; absent for plate. */
  diameter?: Interval | null
  system: UnitSystem
}

/** Mass of weld metal, kg per metre, of a section in mm² at a density in kg/m³. */
export const massPerMetre = (areaMm2: number, density: number): number => (areaMm2 * density) / 1e6

const REINFORCEMENT_MM = 1.5

/** Parts of the groove to fill, in welding order of their sides. */
function regions(joint: Joint, profile: GrooveProfile, rootFace: number): Region[] {
  const reinforcement = Math.min(REINFORCEMENT_MM, profile.top * 0.12)
  const closed = offsetAt(profile.left, profile.gouge) + offsetAt(profile.right, profile.gouge) < 1e-9
  if (profile.meeting === null) {
    const from = joint.penetration === 'partial' || closed ? rootFace : 0
    const first = { from: Math.max(from, profile.gouge), to: profile.top, reinforcement }
    return profile.gouge > 0 ? [first, { from: profile.gouge, to: 0, reinforcement }] : [first]
  }
  const open = !(joint.penetration === 'partial' || (closed && offsetAt(profile.right, profile.meeting + rootFace / 2) < 1e-9))
  const second = Math.max(profile.meeting, profile.gouge)
  return [
    { from: Math.max(profile.meeting + (open ? 0 : rootFace), profile.gouge), to: profile.top, reinforcement },
    { from: second, to: 0, reinforcement },
  ]
}

/** Outline between two heights. */
function outline(profile: GrooveProfile, from: number, to: number): Polygon {
  const [low, high] = [Math.min(from, to), Math.max(from, to)]
  const side = (points: GrooveProfile['left']): Point[] => [{ x: offsetAt(points, low), y: low }, ...points.filter(({ y }) => y > low && y < high).map(({ offset, y }) => ({ x: offset, y })), { x: offsetAt(points, high), y: high }]
  return [...side(profile.left).map(({ x, y }) => ({ x: -x, y })), ...side(profile.right).reverse()]
}

const nothing = (remarks: { problems: Problem[]; assumed: string[] }): JointGeometry => ({
  plates: [], backing: null, insert: null, weld: [], passes: [], dimensions: [], bounds: boundsOf([]), areaMm2: null, weldMetalKgPerM: null, weldMetalRoundKg: null, throatMm: null, axis: null,
  problems: remarks.problems, impossible: remarks.problems.map(({ sentence }) => sentence), assumed: remarks.assumed, groove: null, fillets: [],
})

/** Fillets over a groove weld in a tee joint, between its surface and the standing member. */
function reinforcingFillets(joint: Joint, profile: GrooveProfile, remarks: Remarks, system: UnitSystem): JointGeometry['fillets'] {
  const leg = drawnValue(joint.reinforcingFillet)
  if (leg === null) return []
  if (leg <= 0) remarks.refuse('joint.reinforcingFillet', `A reinforcing fillet of ${writerFor(system).length(leg)} is none; its leg must be above 0.`)
  if (joint.type !== 'tee' || !memberStands(joint)) {
    remarks.take('A reinforcing fillet is drawn on tee joints only.')
    return []
  }
  const face = -(drawnValue(joint.rootOpening) ?? 0) / 2
  const over = { corner: { x: face, y: profile.top }, toeA: { x: face + leg, y: profile.top }, toeB: { x: face, y: profile.top + leg } }
  const under = { corner: { x: face, y: 0 }, toeA: { x: face + leg, y: 0 }, toeB: { x: face, y: -leg } }
  return profile.meeting === null && profile.gouge === 0 ? [over] : [over, under]
}

/** Passes in a groove: backing beads under it, passes of its sides, fillets over it. */
function layGroove(passes: readonly PassToLay[], joint: Joint, profile: GrooveProfile, figures: GrooveFigures, parts: readonly Region[], fillets: JointGeometry['fillets']): LaidPass[] {
  const covering = fillets.length > 0 ? passes.filter(({ layer }) => layer === 'fillet') : []
  const twoSides = parts.length > 1
  const underneath = twoSides ? [] : passes.filter(({ layer }) => layer === 'backing')
  const inGroove = passes.filter((pass) => !underneath.includes(pass) && !covering.includes(pass))
  const sides = twoSides ? bySide(inGroove) : [inGroove, []]
  const half = fillets.length > 1 ? Math.ceil(covering.length / 2) : covering.length
  return [
    ...parts.flatMap((part, index) => layRegion(sides[index] ?? [], profile, part)),
    ...layBackingBeads(underneath, figures.rootOpening, Math.min(2.5, figures.thickness * 0.2)),
    ...fillets.flatMap(({ corner, toeA, toeB }, index) => layFillet(index === 0 ? covering.slice(0, half) : covering.slice(half), corner, toeA, toeB)),
  ].sort((one, other) => one.order - other.order)
}

/** A pipe's wall against its diameter: the axis of the drawing, and the way once round at the weld's centre. */
function pipeOf({ diameter = null, thickness, system }: JointSetting, wall: number, remarks: Remarks): { axis: string | null; outside: number | null } {
  const drawn = drawnValue(diameter)
  if (drawn === null || !diameter || diameter.all) return { axis: null, outside: null }
  const words = writerFor(system)
  // A procedure covers ranges: they clash only where the thinnest wall is too thick for the largest pipe.
  const largest = diameter.max?.si ?? Infinity
  const thinnest = Math.min(wall, thickness?.min?.si ?? wall)
  if (largest <= 0) remarks.refuse('diameter', `An outside diameter of ${words.length(largest)} is no pipe; it must be above 0.`)
  else if (2 * thinnest >= largest) remarks.refuse('thickness', `A wall of ${words.length(thinnest)} does not fit in a pipe of ${words.length(largest)} outside diameter.`)
  return { axis: `axis of the pipe, Ø ${written(diameter, 'length', system)}`, outside: diameter.min && diameter.max && 2 * wall < drawn ? drawn : null }
}

function grooveGeometry(setting: JointSetting, passes: readonly PassToLay[]): JointGeometry {
  const { joint, system } = setting
  const words = writerFor(system)
  const [a, b] = [drawnValue(setting.thickness), drawnValue(setting.thicknessB ?? null)]
  const unequal = isUnequalButt(joint, a, b)
  const thinner = unequal && a !== null && b !== null ? Math.min(a, b) : a
  const { figures, problems, assumed } = grooveFigures(joint, thinner, system, unequal && thinner === b ? (setting.thicknessB ?? null) : setting.thickness)
  const remarks = new Remarks()
  remarks.problems.push(...problems)
  remarks.assumed.push(...assumed)
  if (b !== null && b <= 0) remarks.refuse('thicknessB', `A thickness of ${words.length(b)} can't be welded; it must be above 0.`)
  const excess = unequal && a !== null && b !== null ? excessOf(joint, Math.abs(a - b), words, remarks) : null
  const pipe = pipeOf(setting, thinner ?? 0, remarks)
  if (!figures || !joint.groove || remarks.problems.length > 0) return nothing(remarks)
  const wall = thinner ?? figures.thickness
  const edge = joint.type === 'edge' && !isFlare(joint.groove)
  const profile = edge && joint.groove === 'square' ? edgeWeldProfile(figures, wall, b ?? wall) : grooveProfile(joint.groove, figures)
  if (edge && joint.groove !== 'square') checkEdgeEnds(profile, figures.rootOpening, wall, b ?? wall, system, remarks)
  const fillets = reinforcingFillets(joint, profile, remarks, system)
  if (remarks.problems.length > 0) return nothing(remarks)
  // A fillet over the groove is its reinforcement.
  const parts = regions(joint, profile, figures.rootFace).map((part) => (fillets.length > 0 ? { ...part, reinforcement: 0 } : part))
  const weld = [...parts.map(({ from, to }) => outline(profile, from, to)), ...fillets.map(({ corner, toeA, toeB }) => [corner, toeA, toeB])]
  const laid = layGroove(passes, joint, profile, figures, parts, fillets)
  const known = joint.rootOpening !== null && (joint.rootFace !== null || (joint.grooveDepth ?? null) !== null || joint.groove === 'square' || isFlare(joint.groove))
  const areaMm2 = known ? weld.reduce((sum, polygon) => sum + polygonArea(polygon), 0) : null
  const members = edge ? edgeMembers(joint, profile, wall, b ?? wall) : grooveMembers(joint, profile, unequal ? (a ?? wall) : wall, b, excess)
  const plates = [members.a, members.b]
  const backing = edge ? null : backingStrip(joint, figures.rootOpening, wall)
  const insert = edge ? null : insertOf(joint, figures)
  const bounds = boundsOf([...plates, ...weld, ...(backing ? [backing] : []), ...laid.map(({ polygon }) => polygon)])
  const marks = grooveMarks({ joint, thickness: setting.thickness, thicknessB: setting.thicknessB ?? null, profile, figures, members, excess, backing, insert }, system)
  const top = fillets[0]
  if (top) {
    const mark = new Marks(system)
    mark.add('reinforcing-fillet', 'joint.reinforcingFillet', top.corner, top.toeB, joint.reinforcingFillet, 'length')
    marks.push(...mark.list)
  }
  const kgPerM = areaMm2 !== null && setting.density ? massPerMetre(areaMm2, setting.density) : null
  return {
    plates, backing, insert, weld, passes: laid, dimensions: marks, bounds, areaMm2, weldMetalKgPerM: kgPerM,
    weldMetalRoundKg: kgPerM !== null && pipe.outside !== null && joint.type === 'butt' ? kgPerM * roundM(weld, pipe.outside, profile.top) : null,
    throatMm: null, axis: joint.type === 'butt' ? pipe.axis : null, problems: [], impossible: [], assumed: remarks.assumed, groove: { profile, figures, regions: parts }, fillets,
  }
}

/** Way once round the pipe, m, of the weld's centre of area, which is what its section sweeps over (Pappus). */
function roundM(weld: readonly Polygon[], outside: number, top: number): number {
  const areas = weld.map(polygonArea)
  const whole = areas.reduce((sum, area) => sum + area, 0)
  if (whole <= 0) return 0
  const centre = weld.reduce((sum, polygon, index) => sum + centroid(polygon).y * (areas[index] ?? 0), 0) / whole
  return (2 * Math.PI * (outside / 2 - top + centre)) / 1000
}

function filletJoint(setting: JointSetting, passes: readonly PassToLay[]): JointGeometry {
  const { joint, system } = setting
  const [a, b] = [drawnValue(setting.thickness), drawnValue(setting.thicknessB ?? null)]
  const fillet = filletGeometry({ joint, thickness: a, thicknessB: b ?? a, thicknessBGiven: setting.thicknessB ?? null, passes, system })
  if (!fillet.drawn) return nothing(fillet)
  const { plates, weld, laid, areaMm2, legs, legsB, throat, memberAngle } = fillet.drawn
  const marks = new Marks(system)
  marks.add('leg', 'joint.filletLeg', legs.from, legs.to, joint.filletLeg, 'length')
  marks.add('leg-b', 'joint.filletLegB', legsB.from, legsB.to, joint.filletLegB, 'length')
  marks.add('thickness', 'thickness', fillet.drawn.thicknessMark.from, fillet.drawn.thicknessMark.to, setting.thickness, 'length')
  marks.add('thickness-b', 'thicknessB', fillet.drawn.thicknessBMark.from, fillet.drawn.thicknessBMark.to, setting.thicknessB, 'length')
  marks.add('root-opening', 'joint.rootOpening', { x: legs.from.x, y: 0 }, { x: legs.from.x, y: drawnValue(joint.rootOpening) ?? 0 }, (drawnValue(joint.rootOpening) ?? 0) > 0 ? joint.rootOpening : null, 'length')
  if (memberAngle !== 90) marks.add('member-angle', 'joint.memberAngle', legs.to, legsB.to, joint.memberAngle, 'angle', legs.from)
  const fillets = weld.map(([corner, toeA, toeB]) => ({ corner: corner ?? legs.from, toeA: toeA ?? legs.to, toeB: toeB ?? legsB.to }))
  const bounds = boundsOf([...plates, ...weld])
  return { plates, backing: null, insert: null, weld, passes: laid, dimensions: marks.list, bounds, areaMm2, weldMetalKgPerM: setting.density ? massPerMetre(areaMm2, setting.density) : null, weldMetalRoundKg: null, throatMm: throat, axis: null, problems: [], impossible: [], assumed: fillet.assumed, groove: null, fillets }
}

/**
 * The cross-section of a joint.
 * An interval is drawn at its middle and labelled as written. Where `problems` is not empty nothing is drawn.
 */
export function jointGeometry(setting: JointSetting): JointGeometry {
  const passes = passesOf(setting.blocks ?? [])
  return setting.joint.weld === 'fillet' ? filletJoint(setting, passes) : grooveGeometry(setting, passes)
}

/** Density of the base metal as a stand-in for that of its weld metal, kg/m³; null for a metal that is not from the library. */
const densityOf = (variables: Pick<WeldingVariables, 'baseMetals'>): number | null => (variables.baseMetals.a.libraryId ? (baseMetalById(variables.baseMetals.a.libraryId)?.density_kg_m3 ?? null) : null)

/** What a weld's variables say of its cross-section. */
export const settingOf = (variables: WeldingVariables, system: UnitSystem = variables.unitSystem): JointSetting => ({ joint: variables.joint, thickness: variables.thickness, thicknessB: variables.thicknessB, blocks: variables.processes, density: densityOf(variables), diameter: variables.product === 'pipe' ? variables.diameter : null, system })

/** The cross-section of a procedure or coupon, with the passes of all its process blocks. */
export const geometryOf = (variables: WeldingVariables, system: UnitSystem = variables.unitSystem): JointGeometry => jointGeometry(settingOf(variables, system))

