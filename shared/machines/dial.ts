/** From a range in the unit of storage to the positions of a control, rounded inward: no rounding ever leaves the range. */
import type { PanelControl } from '../schemas/machines.ts'
import { settle } from '../units/convert.ts'
import { fromStorage, toStorage } from './panel-quantities.ts'

/** From lo to hi, both included; an end that is open is infinite. */
export interface Span { lo: number; hi: number }

/** What both spans hold; null when they have nothing in common. */
export function overlap(one: Span, other: Span): Span | null {
  const lo = Math.max(one.lo, other.lo)
  const hi = Math.min(one.hi, other.hi)
  return lo <= hi ? { lo, hi } : null
}

/**
 * What a reading may show so that the true value lies in the span although the meter is off by ± `percent` of the reading:
 * lo / (1 − a) to hi / (1 + a). 180 to 220 A with ± 2.5 % leaves 184.6 to 214.6 A. [calculated]
 * @returns null when the meter's band is wider than the span
 */
export function narrowed({ lo, hi }: Span, percent: number | null): Span | null {
  if (percent === null) return { lo, hi }
  const share = percent / 100
  const within = { lo: Number.isFinite(lo) ? lo / (1 - share) : lo, hi: Number.isFinite(hi) ? hi / (1 + share) : hi }
  return within.lo <= within.hi ? within : null
}

export type Dialled =
  /** `value` is the position nearest to the middle; min and max are the outermost positions inside. */
  | { ok: true; min: number; max: number; value: number; /** Positions inside; null where the control is stepless. */ positions: number | null }
  /** `off-scale`: the whole range lies beyond an end of the scale. `step`: the scale passes over it. */
  | { ok: false; why: 'off-scale' | 'step'; below: number | null; above: number | null }

type Scale = Pick<PanelControl, 'min' | 'max' | 'step'>

/** The position with this number, counted from the bottom of the scale, free of the noise of adding steps. */
const position = ({ min, step }: { min: number; step: number }, index: number): number => settle(min + index * step)

/**
 * Positions of a control whose value `inside` accepts; it is asked at the bounds too, so what is accepted decides and rounding does not.
 * Steps are counted from the bottom of the scale.
 * @param wanted the range in the panel's unit, to begin the search at
 */
function positionsInside(scale: Scale, wanted: Span, inside: (value: number) => boolean): Dialled {
  const on = overlap(wanted, { lo: scale.min, hi: scale.max })
  if (!on) return { ok: false, why: 'off-scale', below: wanted.lo > scale.max ? scale.max : null, above: wanted.hi < scale.min ? scale.min : null }
  if (scale.step === null) return stepless(on, inside)
  const grid = { min: scale.min, step: scale.step }
  const last = Math.floor((scale.max - scale.min) / scale.step + 1e-9)
  const near = (value: number) => Math.max(0, Math.min(last, Math.round((value - scale.min) / grid.step)))
  // One step to either side of where the bound falls: the conversion's last digit may put a position in or out.
  let first = Math.max(0, near(on.lo) - 1)
  while (first <= last && !inside(position(grid, first)) && position(grid, first) <= on.hi) first += 1
  let final = Math.min(last, near(on.hi) + 1)
  while (final >= 0 && !inside(position(grid, final)) && position(grid, final) >= on.lo) final -= 1
  if (first > final || !inside(position(grid, first)) || !inside(position(grid, final))) {
    const low = Math.floor((on.lo - grid.min) / grid.step)
    return { ok: false, why: 'step', below: low >= 0 ? position(grid, low) : null, above: low + 1 <= last ? position(grid, low + 1) : null }
  }
  const middle = Math.max(first, Math.min(final, near((on.lo + on.hi) / 2)))
  return { ok: true, min: position(grid, first), max: position(grid, final), value: position(grid, middle), positions: final - first + 1 }
}

/** A stepless knob is read to about a twentieth of the range; bounds are given to that, inward, and exactly where the range is a single figure. */
function stepless({ lo, hi }: Span, inside: (value: number) => boolean): Dialled {
  const width = hi - lo
  if (width > 0) {
    const step = 10 ** Math.floor(Math.log10(width / 10))
    const grid = (value: number) => settle(value * step)
    let [first, final] = [Math.ceil(lo / step - 1e-9), Math.floor(hi / step + 1e-9)]
    while (first <= final && !inside(grid(first))) first += 1
    while (final >= first && !inside(grid(final))) final -= 1
    const middle = Math.max(first, Math.min(final, Math.round((lo + hi) / 2 / step)))
    if (first <= final) return { ok: true, min: grid(first), max: grid(final), value: grid(middle), positions: null }
  }
  const [exact] = [lo, hi, settle(lo), settle(hi)].filter(inside)
  return exact === undefined ? { ok: false, why: 'step', below: null, above: null } : { ok: true, min: exact, max: exact, value: exact, positions: null }
}

/**
 * The positions of a control inside a range given in the unit of storage.
 * Every figure offered, converted back, lies in the range.
 * @returns null when the panel's unit does not measure what the control sets
 */
export function dialStored(control: Pick<PanelControl, 'sets' | 'unit' | 'min' | 'max' | 'step'>, { lo, hi }: Span): Dialled | null {
  const inside = (value: number): boolean => {
    const stored = toStorage(value, control.sets, control.unit)
    return stored !== null && stored >= lo && stored <= hi
  }
  const ends = [lo, hi].map((end) => (Number.isFinite(end) ? fromStorage(end, control.sets, control.unit) : end))
  const [from, to] = ends
  if (from === undefined || to === undefined || from === null || to === null) return null
  return positionsInside(control, { lo: from, hi: to }, inside)
}

/** The positions of a control inside a range in the panel's own figures, e.g. a stretch of a bare knob, that `also` accepts. */
export const dialFigures = (control: Scale, { lo, hi }: Span, also: (value: number) => boolean = () => true): Dialled => positionsInside(control, { lo, hi }, (value) => value >= lo && value <= hi && also(value))
