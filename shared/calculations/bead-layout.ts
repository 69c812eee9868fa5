/**
 * How many passes a joint takes and in which order, from the size of a bead. An estimate, as the reference has it: passes = weld section
 * over bead section, rounded up; a root bead is usually smaller, so it may have a size of its own.
 */
import type { Pass } from '../schemas/welding.ts'
import type { JointGeometry } from './joint-geometry.ts'
import { areaBetween, heightFor, widthAt, type Region } from './pass-layout.ts'
import { polygonArea } from './polygon.ts'
import { passesToFill } from './weld-metal.ts'
import type { GrooveProfile } from './groove-profile.ts'

/** A process and what it lays. */
export interface BeadSize {
  processId: string
  /** Section of one bead, mm². */
  bead: number
  /** Height that this process fills, mm; null = the first lays the root pass alone, the last all that is left, one between an even share. */
  height: number | null
}

export interface PlannedPass { processId: string; layer: NonNullable<Pass['layer']>; side: 'first' | 'second'; beadArea: number }
export type PassPlan = { ok: true; passes: PlannedPass[] } | { ok: false; sentence: string }

const MOST = 200
/** Width over height of a typical bead in a drawing. */
const BEAD_SHAPE = 1.8

/** Beads in the outermost layer: as many as lie side by side across its width. */
const capsFor = (profile: GrooveProfile, to: number, bead: number, most: number): number => Math.max(1, Math.min(most, Math.round(widthAt(profile, to) / Math.sqrt(bead * BEAD_SHAPE))))

/** Heights at which one process hands over to the next, from the root outwards. */
function shares(profile: GrooveProfile, region: Region, sizes: readonly BeadSize[], alone: boolean): { size: BeadSize; area: number }[] {
  const whole = areaBetween(profile, region.from, region.to)
  const direction = Math.sign(region.to - region.from)
  let at = region.from
  const list: { size: BeadSize; area: number }[] = []
  sizes.forEach((size, index) => {
    const rest = areaBetween(profile, at, region.to)
    const last = index === sizes.length - 1
    const end = last ? region.to : size.height !== null ? at + direction * Math.min(size.height, Math.abs(region.to - at)) : index === 0 ? heightFor(profile, at, region.to, Math.min(size.bead, rest)) : heightFor(profile, at, region.to, rest / (sizes.length - index))
    list.push({ size, area: areaBetween(profile, at, end) })
    at = end
  })
  return alone || whole > 0 ? list.filter(({ area }) => area > 1e-6 || sizes.length === 1) : []
}

/** Passes of one side of a groove. */
function planRegion(profile: GrooveProfile, region: Region, sizes: readonly BeadSize[], side: 'first' | 'second'): PlannedPass[] {
  const parts = shares(profile, region, sizes, false)
  const passes = parts.flatMap(({ size, area }) => {
    const count = Math.max(1, passesToFill(area, size.bead))
    return Array.from({ length: count }, (): PlannedPass => ({ processId: size.processId, layer: 'fill', side, beadArea: area / count }))
  })
  const [first] = passes
  // A second side of one pass is its cap.
  if (first) first.layer = side === 'second' && passes.length === 1 ? 'cap' : 'root'
  const last = parts.at(-1)
  const fromLast = passes.filter(({ processId, layer }) => layer === 'fill' && processId === last?.size.processId).length
  const caps = last && passes.length > 1 ? capsFor(profile, region.to, last.size.bead, Math.max(1, fromLast)) : 0
  for (const pass of caps > 0 ? passes.slice(-caps) : []) if (pass !== first) pass.layer = 'cap'
  return passes
}

/** Passes of fillets, each of `area` mm². */
function planFillets(areas: readonly number[], size: BeadSize): PlannedPass[] {
  return areas.flatMap((area, index) => {
    const count = Math.max(1, passesToFill(area, size.bead))
    return Array.from({ length: count }, (): PlannedPass => ({ processId: size.processId, layer: 'fillet', side: index === 0 ? 'first' : 'second', beadArea: area / count }))
  })
}

/**
 * Lays out a pass sequence from bead sizes, processes in the order in which they weld. Together the beads are as large as the weld's
 * section; each is at most as large as asked.
 * @returns a sentence where the joint isn't drawn, or a size is none
 */
export function layOutPasses(geometry: JointGeometry, sizes: readonly BeadSize[]): PassPlan {
  const [problem] = geometry.problems
  if (problem) return { ok: false, sentence: `The joint can’t be laid out yet. ${problem.sentence}` }
  const bad = sizes.find(({ bead }) => !(bead > 0))
  if (bad || sizes.length === 0) return { ok: false, sentence: 'Give a bead section above 0 for each process, e.g. 20 mm².' }
  const last = sizes.at(-1)
  if (!last) return { ok: false, sentence: 'Add a process first.' }
  const { groove, fillets, weld } = geometry
  const total = weld.reduce((sum, polygon) => sum + polygonArea(polygon), 0)
  if (total <= 0) return { ok: false, sentence: 'The joint has no section to fill: give a root opening or an angle.' }
  const least = Math.min(...sizes.map(({ bead }) => bead))
  if (total / least > MOST) return { ok: false, sentence: `That would be more than ${MOST} passes; give a larger bead section.` }
  if (!groove) return { ok: true, passes: planFillets(weld.map(polygonArea), last) }
  const passes = groove.regions.flatMap((region, index) => (areaBetween(groove.profile, region.from, region.to) > 1e-6 ? planRegion(groove.profile, region, index === 0 ? sizes : sizes.slice(-1), index === 0 ? 'first' : 'second') : []))
  const covering = fillets.length > 0 ? planFillets(weld.slice(-fillets.length).map(polygonArea), last) : []
  return { ok: true, passes: [...passes, ...covering] }
}

/** Passes that fill the weld's section with one size of bead; null where the section is not known. */
export const passEstimate = (geometry: JointGeometry, bead: number): number | null => (geometry.areaMm2 !== null && bead > 0 ? passesToFill(geometry.areaMm2, bead) : null)
