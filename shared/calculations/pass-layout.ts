/**
 * Where the passes lie: layers from the root outwards, beads side by side. A drawing of the build-up, not a prediction of bead shape:
 * together the beads fill the groove without gap or overlap. Where bead sections are given, they are drawn in their proportion; else
 * layers are alike in height and beads of a layer share it evenly.
 */
import type { Pass, ProcessBlock } from '../schemas/welding.ts'
import { offsetAt, type GrooveProfile } from './groove-profile.ts'
import { centroid, type Point, type Polygon } from './polygon.ts'

/** `order` counts all passes in the order of welding, from 0. */
export interface PassToLay { order: number; number: string; processId: string; layer: Pass['layer']; /** mm²; null = not given */ beadArea: number | null; side: Pass['side'] }
export interface LaidPass extends PassToLay { polygon: Polygon; labelAt: Point }

/** A process block, as far as its passes are laid. */
export type PassBlock = Pick<ProcessBlock, 'id' | 'passes'>

/** Where a pass is kept: its block and its row there. */
export interface PassPlace { block: number; row: number; pass: Pass; processId: string }

/** The passes of all blocks in the order of welding: by their place in the sequence where one is given, else block after block. */
export function sequenceOf(blocks: readonly PassBlock[]): PassPlace[] {
  const all = blocks.flatMap(({ id, passes }, block) => passes.map((pass, row): PassPlace => ({ block, row, pass, processId: id })))
  if (all.some(({ pass }) => (pass.order ?? null) === null)) return all
  return all.map((place, natural) => ({ place, natural })).sort((one, other) => (one.place.pass.order ?? 0) - (other.place.pass.order ?? 0) || one.natural - other.natural).map(({ place }) => place)
}

/** The passes of all process blocks, in the order in which they are welded. */
export const passesOf = (blocks: readonly PassBlock[]): PassToLay[] => sequenceOf(blocks).map(({ pass, processId }, order) => ({ order, number: pass.number, processId, layer: pass.layer, beadArea: pass.beadArea && pass.beadArea.si > 0 ? pass.beadArea.si : null, side: pass.side ?? null }))

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

const CROWN_STEPS = 24
const BEAD_SHAPE = 1.8

/** A bead between two heights, from fraction `u0` to `u1` of the width; the outer layer carries the reinforcement. */
function bead(profile: GrooveProfile, y0: number, y1: number, u0: number, u1: number, crown: number): Polygon {
  const at = (y: number, u: number): Point => {
    const [left, right] = [-offsetAt(profile.left, y), offsetAt(profile.right, y)]
    return { x: left + u * (right - left), y }
  }
  // Edges are straight between their corners, and so is every line that divides the width between them.
  const corners = [...new Set([...profile.left, ...profile.right].map(({ y }) => y))].filter((y) => y > Math.min(y0, y1) && y < Math.max(y0, y1))
  const heights = [y0, ...corners, y1].sort((one, other) => (y1 > y0 ? one - other : other - one))
  const steps = crown === 0 ? 1 : CROWN_STEPS
  const outer = Array.from({ length: steps + 1 }, (_, step) => {
    const u = u0 + ((u1 - u0) * step) / steps
    const point = at(y1, u)
    return { x: point.x, y: point.y + crown * (1 - (2 * u - 1) ** 2) }
  })
  const sides = heights.slice(0, -1)
  return [...sides.map((y) => at(y, u0)), ...outer, ...sides.map((y) => at(y, u1)).reverse()]
}

export const widthAt = (profile: GrooveProfile, y: number): number => offsetAt(profile.left, y) + offsetAt(profile.right, y)

/** A groove filled from one height towards another: the section at each of its corners, so that a section leads to its height. */
interface Filling { heights: number[]; widths: number[]; areas: number[] }

function fillingOf(profile: GrooveProfile, from: number, to: number): Filling {
  const [low, high] = [Math.min(from, to), Math.max(from, to)]
  const inner = [...new Set([...profile.left, ...profile.right].map(({ y }) => y).filter((y) => y > low && y < high))].sort((one, other) => one - other)
  const rising = [low, ...inner, high]
  const heights = to >= from ? rising : rising.reverse()
  const widths = heights.map((y) => widthAt(profile, y))
  const areas = [0]
  for (let index = 1; index < heights.length; index += 1) areas.push((areas[index - 1] ?? 0) + (((widths[index - 1] ?? 0) + (widths[index] ?? 0)) / 2) * Math.abs((heights[index] ?? 0) - (heights[index - 1] ?? 0)))
  return { heights, widths, areas }
}

/** Height up to which a filling holds `area`; its end where it never does. */
function heightAt({ heights, widths, areas }: Filling, area: number): number {
  const end = areas.findIndex((held) => held >= area)
  if (end === -1) return heights.at(-1) ?? 0
  if (end === 0) return heights[0] ?? 0
  const [y0, y1, w0, w1] = [heights[end - 1] ?? 0, heights[end] ?? 0, widths[end - 1] ?? 0, widths[end] ?? 0]
  const rest = area - (areas[end - 1] ?? 0)
  const run = Math.abs(y1 - y0)
  // Between two corners the width grows evenly: w0 h + (w1 - w0) h² / (2 run) = rest.
  const curve = run > 0 ? (w1 - w0) / (2 * run) : 0
  const h = Math.abs(curve) < 1e-12 ? (w0 > 0 ? rest / w0 : run) : (2 * rest) / (w0 + Math.sqrt(Math.max(0, w0 * w0 + 4 * curve * rest)))
  return y0 + Math.sign(y1 - y0) * Math.min(run, h)
}

/** Section of the groove between two heights, mm²; exact, as the edges are straight between their points. */
export const areaBetween = (profile: GrooveProfile, from: number, to: number): number => fillingOf(profile, from, to).areas.at(-1) ?? 0

/** Height at which a region from `from` towards `to` holds `area`; `to` where it never does. */
export const heightFor = (profile: GrooveProfile, from: number, to: number, area: number): number => heightAt(fillingOf(profile, from, to), area)

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

/** Weight of each pass; where only some sections are given, the others are taken as their mean. null where none is. */
function weightsOf(passes: readonly PassToLay[]): number[] | null {
  const given = passes.flatMap(({ beadArea }) => (beadArea === null ? [] : [beadArea]))
  if (given.length === 0) return null
  const mean = given.reduce((sum, area) => sum + area, 0) / given.length
  return passes.map(({ beadArea }) => beadArea ?? mean)
}

/** Lays passes into one region of a groove, from the root outwards. */
export function layRegion(passes: readonly PassToLay[], profile: GrooveProfile, region: Region): LaidPass[] {
  if (passes.length === 0) return []
  const layers = layersOf(passes, profile, region)
  const step = (region.to - region.from) / layers.length
  const filling = fillingOf(profile, region.from, region.to)
  const whole = filling.areas.at(-1) ?? 0
  const weights = whole > 0 ? weightsOf(passes) : null
  const total = weights?.reduce((sum, weight) => sum + weight, 0) ?? 1
  let next = 0
  let [y0, filled] = [region.from, 0]
  return layers.flatMap((beads, layer) => {
    const shares = weights?.slice(next, next + beads) ?? Array.from({ length: beads }, () => 1)
    const here = shares.reduce((sum, share) => sum + share, 0)
    filled += here
    const y1 = layer === layers.length - 1 ? region.to : weights ? heightAt(filling, (filled / total) * whole) : region.from + step * (layer + 1)
    const crown = layer === layers.length - 1 ? region.reinforcement * Math.sign(step) : 0
    const start = y0
    y0 = y1
    let share = 0
    return passes.slice(next, (next += beads)).map((pass, index) => {
      const u0 = share / here
      share += shares[index] ?? 0
      return placed(pass, bead(profile, start, y1, u0, index === beads - 1 ? 1 : share / here, crown))
    })
  })
}

/** A backing bead under the root of a single groove. */
export function layBackingBeads(passes: readonly PassToLay[], rootOpening: number, height: number): LaidPass[] {
  const half = rootOpening / 2 + height
  return passes.map((pass, index) => {
    const [u0, u1] = [index / passes.length, (index + 1) / passes.length]
    const curve = Array.from({ length: CROWN_STEPS + 1 }, (_, step) => {
      const u = u0 + ((u1 - u0) * step) / CROWN_STEPS
      return { x: -half + 2 * half * u, y: -height * (1 - (2 * u - 1) ** 2) }
    })
    return placed(pass, [{ x: curve[0]?.x ?? 0, y: 0 }, ...curve, { x: curve.at(-1)?.x ?? 0, y: 0 }])
  })
}

/** Passes of a double groove by side: as stated, else the second side begins after the first run of cap passes, else at half. */
export function bySide(passes: readonly PassToLay[]): [PassToLay[], PassToLay[]] {
  if (passes.some(({ side }) => side !== null)) {
    let current: Pass['side'] = 'first'
    const told = passes.map((pass) => ({ pass, side: (current = pass.side ?? current) }))
    return [told.filter(({ side }) => side === 'first').map(({ pass }) => pass), told.filter(({ side }) => side === 'second').map(({ pass }) => pass)]
  }
  const firstCap = passes.findIndex(({ layer }) => layer === 'cap')
  const after = firstCap === -1 ? -1 : passes.findIndex(({ layer }, index) => index > firstCap && layer !== 'cap')
  const backing = passes.findIndex(({ layer }) => layer === 'backing')
  const cut = backing > 0 ? backing : after > 0 ? after : Math.ceil(passes.length / 2)
  return [passes.slice(0, cut), passes.slice(cut)]
}

/**
 * Lays passes into a fillet with corner at `corner` and its toes at `toeA` and `toeB`:
 * bands parallel to the face, each as large as its beads are.
 */
export function layFillet(passes: readonly PassToLay[], corner: Point, toeA: Point, toeB: Point): LaidPass[] {
  if (passes.length === 0) return []
  let layerCount = 1
  while ((layerCount * (layerCount + 1)) / 2 < passes.length) layerCount += 1
  const layers = spread(passes.length, Array.from({ length: layerCount }, (_, index) => index))
  const weights = weightsOf(passes) ?? passes.map(() => 1)
  const total = weights.reduce((sum, weight) => sum + weight, 0)
  const at = (scale: number, u: number): Point => ({ x: corner.x + scale * ((toeA.x - corner.x) * (1 - u) + (toeB.x - corner.x) * u), y: corner.y + scale * ((toeA.y - corner.y) * (1 - u) + (toeB.y - corner.y) * u) })
  let next = 0
  let filled = 0
  return layers.flatMap((beads) => {
    const shares = weights.slice(next, next + beads)
    const here = shares.reduce((sum, share) => sum + share, 0)
    const [inner, outer] = [Math.sqrt(filled / total), Math.sqrt(Math.min(1, (filled + here) / total))]
    filled += here
    let share = 0
    return passes.slice(next, (next += beads)).map((pass, index) => {
      const u0 = share / here
      share += shares[index] ?? 0
      const u1 = index === beads - 1 ? 1 : share / here
      return placed(pass, inner === 0 ? [at(0, 0), at(outer, u0), at(outer, u1)] : [at(inner, u0), at(outer, u0), at(outer, u1), at(inner, u1)])
    })
  })
}
