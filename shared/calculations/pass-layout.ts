/**
 * Where the passes lie: layers from the root outwards, beads side by side. A drawing of the build-up, not a prediction of bead shape:
 * beads of a layer share it evenly, and together they fill the groove without gap or overlap.
 */
import type { Pass, ProcessBlock } from '../schemas/welding.ts'
import { offsetAt, type GrooveProfile } from './groove-profile.ts'
import { centroid, type Point, type Polygon } from './polygon.ts'

/** `order` counts all passes in the order of welding, from 0. */
export interface PassToLay { order: number; number: string; processId: string; layer: Pass['layer'] }
export interface LaidPass extends PassToLay { polygon: Polygon; labelAt: Point }

/** The passes of all process blocks, in the order in which they are welded. */
export const passesOf = (blocks: readonly Pick<ProcessBlock, 'id' | 'passes'>[]): PassToLay[] => blocks.flatMap(({ id, passes }) => passes.map(({ number, layer }) => ({ number, processId: id, layer }))).map((pass, order) => ({ order, ...pass }))

const placed = (pass: PassToLay, polygon: Polygon): LaidPass => ({ ...pass, polygon, labelAt: centroid(polygon) })

/** Spreads `count` beads over weights, at least one each, by largest remainder; evenly where all weights are nought. */
export function spread(count: number, weightsGiven: readonly number[]): number[] {
  const sumGiven = weightsGiven.reduce((sum, weight) => sum + weight, 0)
  const weights = sumGiven > 0 ? weightsGiven : weightsGiven.map(() => 1)
  const total = sumGiven > 0 ? sumGiven : weights.length
  const extra = Math.max(0, count - weights.length)
  const shares = weights.map((weight) => (weight / total) * extra)
  const given = shares.map(Math.floor)
  const order = shares.map((share, index) => ({ index, rest: share - Math.floor(share) })).sort((one, other) => other.rest - one.rest || other.index - one.index)
  for (let left = extra - given.reduce((sum, beads) => sum + beads, 0); left > 0; left -= 1) {
    const next = order.shift()
    if (next) given[next.index] = (given[next.index] ?? 0) + 1
  }
  return given.map((beads) => beads + 1)
}

/** A part of the groove that is filled from `from` to `to`; `to` lies below `from` on the second side. */
export interface Region { from: number; to: number; reinforcement: number }

const EDGE_STEPS = 24
const BEAD_SHAPE = 1.8

/** A bead between two heights, from fraction `u0` to `u1` of the width; the outer layer carries the reinforcement. */
function bead(profile: GrooveProfile, y0: number, y1: number, u0: number, u1: number, crown: number): Polygon {
  const at = (y: number, u: number): Point => {
    const [left, right] = [-offsetAt(profile.left, y), offsetAt(profile.right, y)]
    return { x: left + u * (right - left), y }
  }
  const heights = [...new Set([...Array.from({ length: EDGE_STEPS + 1 }, (_, step) => y0 + ((y1 - y0) * step) / EDGE_STEPS), ...[...profile.left, ...profile.right].map(({ y }) => y).filter((y) => y > Math.min(y0, y1) && y < Math.max(y0, y1))])].sort((one, other) => (y1 > y0 ? one - other : other - one))
  const outer = Array.from({ length: EDGE_STEPS + 1 }, (_, step) => {
    const u = u0 + ((u1 - u0) * step) / EDGE_STEPS
    const point = at(y1, u)
    return { x: point.x, y: point.y + crown * (1 - (2 * u - 1) ** 2) }
  })
  return [...heights.map((y) => at(y, u0)), ...outer.slice(1, -1), ...heights.map((y) => at(y, u1)).reverse()]
}

const widthAt = (profile: GrooveProfile, y: number): number => offsetAt(profile.left, y) + offsetAt(profile.right, y)

/** Beads in each layer: root and hot passes have one layer each, caps share the last, fill passes spread so that beads look like beads. */
function layersOf(passes: readonly PassToLay[], profile: GrooveProfile, region: Region): number[] {
  const height = Math.abs(region.to - region.from)
  const single = passes.filter(({ layer }) => layer === 'root' || layer === 'hot').length
  const caps = passes.filter(({ layer }) => layer === 'cap').length
  const fills = passes.length - single - caps
  const fixedBefore = Array.from({ length: single }, () => 1)
  const fixedAfter = caps > 0 ? [caps] : []
  if (fills === 0) return [...fixedBefore, ...fixedAfter]
  let best: { beads: number[]; cost: number } | null = null
  for (let layers = 1; layers <= fills; layers += 1) {
    const total = single + layers + fixedAfter.length
    const step = height / total
    const widths = Array.from({ length: layers }, (_, index) => widthAt(profile, region.from + Math.sign(region.to - region.from) * step * (single + index + 0.5)))
    const beads = spread(fills, widths)
    const cost = beads.reduce((sum, count, index) => sum + Math.abs(Math.log(((widths[index] ?? 0) / count / step || 1e-6) / BEAD_SHAPE)) * count, 0)
    if (!best || cost < best.cost - 1e-9) best = { beads, cost }
  }
  return [...fixedBefore, ...(best?.beads ?? []), ...fixedAfter]
}

/** Lays passes into one region of a groove, from the root outwards. */
export function layRegion(passes: readonly PassToLay[], profile: GrooveProfile, region: Region): LaidPass[] {
  if (passes.length === 0) return []
  const layers = layersOf(passes, profile, region)
  const step = (region.to - region.from) / layers.length
  let next = 0
  return layers.flatMap((beads, layer) => {
    const [y0, y1] = [region.from + step * layer, layer === layers.length - 1 ? region.to : region.from + step * (layer + 1)]
    const crown = layer === layers.length - 1 ? region.reinforcement * Math.sign(step) : 0
    return passes.slice(next, (next += beads)).map((pass, index) => placed(pass, bead(profile, y0, y1, index / beads, (index + 1) / beads, crown)))
  })
}

/** A backing bead under the root of a single groove. */
export function layBackingBeads(passes: readonly PassToLay[], rootOpening: number, height: number): LaidPass[] {
  const half = rootOpening / 2 + height
  return passes.map((pass, index) => {
    const [u0, u1] = [index / passes.length, (index + 1) / passes.length]
    const curve = Array.from({ length: EDGE_STEPS + 1 }, (_, step) => {
      const u = u0 + ((u1 - u0) * step) / EDGE_STEPS
      return { x: -half + 2 * half * u, y: -height * (1 - (2 * u - 1) ** 2) }
    })
    return placed(pass, [{ x: curve[0]?.x ?? 0, y: 0 }, ...curve, { x: curve.at(-1)?.x ?? 0, y: 0 }])
  })
}

/** Passes of a double groove by side: the second side begins after the first run of cap passes, else at half. */
export function bySide(passes: readonly PassToLay[]): [PassToLay[], PassToLay[]] {
  const firstCap = passes.findIndex(({ layer }) => layer === 'cap')
  const after = firstCap === -1 ? -1 : passes.findIndex(({ layer }, index) => index > firstCap && layer !== 'cap')
  const backing = passes.findIndex(({ layer }) => layer === 'backing')
  const cut = backing > 0 ? backing : after > 0 ? after : Math.ceil(passes.length / 2)
  return [passes.slice(0, cut), passes.slice(cut)]
}

/**
 * Lays passes into a fillet with corner at `corner`, legs along the unit directions `along` and `up`, leg length `leg`:
 * bands parallel to the face, each as large as its beads are many.
 */
export function layFillet(passes: readonly PassToLay[], corner: Point, along: Point, up: Point, leg: number): LaidPass[] {
  if (passes.length === 0) return []
  let layerCount = 1
  while ((layerCount * (layerCount + 1)) / 2 < passes.length) layerCount += 1
  const layers = spread(passes.length, Array.from({ length: layerCount }, (_, index) => index))
  const at = (scale: number, u: number): Point => ({ x: corner.x + leg * scale * (along.x * (1 - u) + up.x * u), y: corner.y + leg * scale * (along.y * (1 - u) + up.y * u) })
  let next = 0
  return layers.flatMap((beads) => {
    const [inner, outer] = [Math.sqrt(next / passes.length), Math.sqrt((next + beads) / passes.length)]
    return passes.slice(next, (next += beads)).map((pass, index) => {
      const [u0, u1] = [index / beads, (index + 1) / beads]
      return placed(pass, inner === 0 ? [at(0, 0), at(outer, u0), at(outer, u1)] : [at(inner, u0), at(outer, u0), at(outer, u1), at(inner, u1)])
    })
  })
}
