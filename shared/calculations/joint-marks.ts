/** The dimensions of a groove joint: where each is measured and what it says. */
import type { Interval } from '../schemas/common.ts'
import type { Joint } from '../schemas/welding.ts'
import { formatInterval } from '../units/format.ts'
import type { Dimension, UnitSystem } from '../units/types.ts'
import { bothEdgesPrepared, hasAngle, hasRadius, isDouble, isFlare, offsetAt, type GrooveFigures, type GrooveProfile } from './groove-profile.ts'
import { drawnValue } from './joint-figures.ts'
import type { Excess, Members } from './joint-members.ts'
import { radians, type Point, type Polygon } from './polygon.ts'

export type MarkKind =
  | 'thickness' | 'thickness-b' | 'root-opening' | 'root-face' | 'included-angle' | 'bevel-angle' | 'root-radius' | 'leg' | 'leg-b'
  | 'groove-depth' | 'second-depth' | 'second-angle' | 'angle-change' | 'upper-angle' | 'taper' | 'member-angle' | 'reinforcing-fillet' | 'backing-thickness' | 'backing-width' | 'gouge-depth' | 'insert-width' | 'insert-height'

export interface JointDimension {
  kind: MarkKind
  /** Field of the weld's variables that holds the figure. */
  path: string
  from: Point
  to: Point
  /** The corner of an angle, which opens from `from` to `to`. */
  vertex: Point | null
  /** The figure as the record states it, in the reader's units. */
  text: string
}

export const written = (interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): string => (interval ? formatInterval(interval, dimension, system).text : '')

/** Gathers the dimensions that the record states. */
export class Marks {
  readonly list: JointDimension[] = []
  constructor(private readonly system: UnitSystem) {}
  add(kind: MarkKind, path: string, from: Point, to: Point, interval: Interval | null | undefined, dimension: Dimension, vertex: Point | null = null): void {
    const text = written(interval, dimension, this.system)
    if (text !== '') this.list.push({ kind, path, from, to, vertex, text })
  }
}

export interface Marked { joint: Joint; thickness: Interval | null; thicknessB: Interval | null; profile: GrooveProfile; figures: GrooveFigures; members: Members; excess: Excess | null; backing: Polygon | null; insert: Polygon | null }

function markAngles(marks: Marks, { joint, profile, figures }: Marked, start: number): void {
  if (!joint.groove || !hasAngle(joint.groove)) return
  const { top } = profile
  const both = bothEdgesPrepared(joint.groove)
  const [leftTop, rightTop] = [-offsetAt(profile.left, top), offsetAt(profile.right, top)]
  const root = offsetAt(profile.right, start)
  const vertex = { x: both ? (root - offsetAt(profile.left, start)) / 2 : root, y: start }
  const upright = { x: root, y: top }
  if (joint.groove === 'compound-v') {
    const kink = figures.angleChange ?? start + (top - start) / 2
    const [low, high] = [offsetAt(profile.right, kink), offsetAt(profile.left, kink)]
    marks.add('included-angle', 'joint.includedAngle', { x: -high, y: kink }, { x: low, y: kink }, joint.includedAngle, 'angle', vertex)
    marks.add('upper-angle', 'joint.bevelAngle', { x: low, y: top }, { x: rightTop, y: top }, joint.bevelAngle, 'angle', { x: low, y: kink })
    marks.add('angle-change', 'joint.angleChange', { x: -high, y: 0 }, { x: -high, y: kink }, joint.angleChange, 'length')
    return
  }
  if (both) marks.add('included-angle', 'joint.includedAngle', { x: leftTop, y: top }, { x: rightTop, y: top }, joint.includedAngle, 'angle', vertex)
  marks.add('bevel-angle', 'joint.bevelAngle', upright, { x: rightTop, y: top }, joint.bevelAngle ?? (both ? null : joint.includedAngle), 'angle', { x: upright.x, y: start })
  if (!isDouble(joint.groove) || profile.meeting === null) return
  const meeting = profile.meeting
  const below = offsetAt(profile.right, meeting)
  const corner = { x: both ? (below - offsetAt(profile.left, meeting)) / 2 : below, y: meeting }
  marks.add('second-angle', 'joint.secondAngle', { x: both ? -offsetAt(profile.left, 0) : below, y: 0 }, { x: offsetAt(profile.right, 0), y: 0 }, joint.secondAngle, 'angle', corner)
}

/** Dimensions of a groove joint, in the order in which a reader wants them. */
export function grooveMarks(marked: Marked, system: UnitSystem): JointDimension[] {
  const { joint, profile, figures, members, backing, insert } = marked
  const marks = new Marks(system)
  const { top } = profile
  const foot = profile.meeting ?? 0
  const start = foot + figures.rootFace
  const { markA, markB } = members
  marks.add('thickness', 'thickness', markA.from, markA.to, marked.thickness, 'length')
  if (markB) marks.add('thickness-b', 'thicknessB', markB.from, markB.to, marked.thicknessB, 'length')
  const at = Math.max(foot, profile.gouge)
  const half = figures.rootOpening / 2
  if (joint.type !== 'edge' || isFlare(joint.groove ?? 'square') || half > 0) marks.add('root-opening', 'joint.rootOpening', { x: -half, y: at }, { x: half, y: at }, joint.rootOpening, 'length')
  const edge = offsetAt(profile.right, start)
  if (figures.rootFace > 0 && profile.gouge < start) marks.add('root-face', 'joint.rootFace', { x: edge, y: foot }, { x: edge, y: start }, joint.rootFace, 'length')
  markAngles(marks, marked, start)
  if (joint.groove && hasRadius(joint.groove)) {
    const radius = drawnValue(joint.rootRadius) ?? 0
    const flare = isFlare(joint.groove)
    const turn = flare ? Math.PI / 4 : Math.min(Math.PI / 4, (Math.PI / 2 - radians(figures.bevelAngle ?? 0)) / 2)
    const centre = flare ? { x: offsetAt(profile.right, 0) + radius, y: 0 } : { x: edge, y: start + radius }
    const onArc = flare ? { x: centre.x - radius * Math.cos(turn), y: radius * Math.sin(turn) } : { x: edge + radius * Math.sin(turn), y: start + radius * (1 - Math.cos(turn)) }
    marks.add('root-radius', 'joint.rootRadius', centre, onArc, joint.rootRadius, 'length')
  }
  const side = -offsetAt(profile.left, top)
  if (joint.type === 'edge' && !isFlare(joint.groove ?? 'square')) marks.add('groove-depth', 'joint.grooveDepth', { x: side, y: 0 }, { x: side, y: top }, joint.grooveDepth, 'length')
  else marks.add('groove-depth', 'joint.grooveDepth', { x: side, y: start }, { x: side, y: top }, joint.grooveDepth, 'length')
  if (profile.meeting !== null) marks.add('second-depth', 'joint.secondDepth', { x: -offsetAt(profile.left, 0), y: 0 }, { x: -offsetAt(profile.left, 0), y: profile.meeting }, joint.secondDepth, 'length')
  if (profile.gouge > 0) marks.add('gouge-depth', 'joint.backGougeDepth', { x: -offsetAt(profile.left, 0), y: 0 }, { x: -offsetAt(profile.left, 0), y: profile.gouge }, joint.backGougeDepth, 'length')
  markTaper(marks, marked)
  if (backing) {
    const [left, right, low] = [Math.min(...backing.map(({ x }) => x)), Math.max(...backing.map(({ x }) => x)), Math.min(...backing.map(({ y }) => y))]
    marks.add('backing-thickness', 'joint.backingThickness', { x: left, y: low }, { x: left, y: 0 }, joint.backingThickness, 'length')
    marks.add('backing-width', 'joint.backingWidth', { x: left, y: low }, { x: right, y: low }, joint.backingWidth, 'length')
  }
  if (insert) {
    const [left, right, high] = [Math.min(...insert.map(({ x }) => x)), Math.max(...insert.map(({ x }) => x)), Math.max(...insert.map(({ y }) => y))]
    marks.add('insert-width', 'joint.insertWidth', { x: left, y: 0 }, { x: right, y: 0 }, joint.insertWidth, 'length')
    marks.add('insert-height', 'joint.insertHeight', { x: left, y: 0 }, { x: left, y: high }, joint.insertHeight, 'length')
  }
  return marks.list
}

function markTaper(marks: Marks, { joint, profile, excess, thickness, thicknessB }: Marked): void {
  if (!excess || excess.taper === null) return
  const thickIsB = (drawnValue(thicknessB) ?? 0) > (drawnValue(thickness) ?? 0)
  const sign = thickIsB ? 1 : -1
  const edge = thickIsB ? profile.right : profile.left
  const up = excess.above > 0
  const rise = up ? excess.above : excess.below
  const run = rise / Math.tan(radians(excess.taper))
  const corner = { x: sign * offsetAt(edge, up ? profile.top : 0), y: up ? profile.top : 0 }
  marks.add('taper', 'joint.taperAngle', { x: corner.x + sign * run, y: corner.y }, { x: corner.x + sign * run, y: corner.y + (up ? rise : -rise) }, joint.taperAngle, 'angle', corner)
}

