/**
 * The shop's own measurements of a one-knob program: knob → wire feed, volts, amps. Between two points that follow each other on the
 * scale a straight line is taken; beyond the outermost points nothing is known. [calculated]
 */
import type { ProgramPoint } from '../schemas/machines.ts'
import { settle } from '../units/convert.ts'
import { overlap, type Span } from './dial.ts'

export type Measured = 'wireFeed' | 'voltage' | 'current'
/** What was measured at a knob position; low and high differ where the same position was measured twice with different outcomes. */
interface Station { knob: number; low: number; high: number }

/** Positions in rising order, with what was measured there; positions at which it was not are left out. */
export function stationsOf(points: readonly ProgramPoint[], of: Measured): Station[] {
  const byKnob = new Map<number, Station>()
  for (const point of points) {
    const value = point[of]
    if (value === null) continue
    const known = byKnob.get(point.knob)
    byKnob.set(point.knob, known ? { knob: point.knob, low: Math.min(known.low, value), high: Math.max(known.high, value) } : { knob: point.knob, low: value, high: value })
  }
  return [...byKnob.values()].sort((one, other) => one.knob - other.knob)
}

/** Whether what was measured both rises and falls along the scale, or was measured twice with different outcomes. */
export function isUneven(points: readonly ProgramPoint[], of: Measured): boolean {
  const stations = stationsOf(points, of)
  const steps = stations.slice(1).map(({ low, high }, index) => Math.sign(low + high - (stations[index]?.low ?? 0) - (stations[index]?.high ?? 0)))
  return (steps.includes(1) && steps.includes(-1)) || stations.some(({ low, high }) => low !== high)
}

const between = (from: number, to: number, share: number): number => settle(from + (to - from) * share)

/**
 * What comes out at a knob position, from the points on either side of it; low and high as in {@link Station}.
 * @returns null beyond the outermost points, or where nothing was measured
 */
export function measuredAt(points: readonly ProgramPoint[], of: Measured, knob: number): { low: number; high: number } | null {
  const stations = stationsOf(points, of)
  const after = stations.findIndex((station) => station.knob >= knob)
  const right = stations[after]
  if (!right) return null
  if (right.knob === knob) return { low: right.low, high: right.high }
  const left = stations[after - 1]
  if (!left) return null
  const share = (knob - left.knob) / (right.knob - left.knob)
  return { low: between(left.low, right.low, share), high: between(left.high, right.high, share) }
}

/** The part of a segment, as shares 0 to 1, on which a straight line from a to b is at least `least`. */
function partAtLeast(a: number, b: number, least: number): Span | null {
  if (a >= least && b >= least) return { lo: 0, hi: 1 }
  if (a < least && b < least) return null
  const crossing = (least - a) / (b - a)
  return a < b ? { lo: crossing, hi: 1 } : { lo: 0, hi: crossing }
}

/** Stretches that touch are one. */
function joined(spans: readonly Span[]): Span[] {
  const result: Span[] = []
  for (const span of [...spans].sort((one, other) => one.lo - other.lo)) {
    const last = result.at(-1)
    if (last && span.lo <= last.hi) last.hi = Math.max(last.hi, span.hi)
    else result.push({ ...span })
  }
  return result
}

/** All knob positions at which the measured quantity lies in the range: none, one or several stretches, whichever way the points run. */
export function knobStretches(points: readonly ProgramPoint[], of: Measured, range: Span): Span[] {
  const stations = stationsOf(points, of)
  const holds = ({ low, high }: Station) => low >= range.lo && high <= range.hi
  const found: Span[] = stations.filter(holds).map(({ knob }) => ({ lo: knob, hi: knob }))
  stations.slice(1).forEach((right, index) => {
    const left = stations[index]
    if (!left) return
    const above = partAtLeast(left.low, right.low, range.lo)
    const below = partAtLeast(-left.high, -right.high, -range.hi)
    const part = above && below && overlap(above, below)
    if (part) found.push({ lo: between(left.knob, right.knob, part.lo), hi: between(left.knob, right.knob, part.hi) })
  })
  return joined(found)
}

/** What two lists of stretches have in common. */
export const commonStretches = (ones: readonly Span[], others: readonly Span[]): Span[] => joined(ones.flatMap((one) => others.flatMap((other) => overlap(one, other) ?? [])))

/** The wider stretch, the lower one of equals; null of none. */
export const widest = (spans: readonly Span[]): Span | null => spans.reduce<Span | null>((best, span) => (best === null || span.hi - span.lo > best.hi - best.lo ? span : best), null)
