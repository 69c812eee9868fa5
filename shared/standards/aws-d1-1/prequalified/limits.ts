/** Figures of Table 5.1 (read 2020): greatest electrode, current, pass and fillet by process, position and pass. Every "greatest" is inclusive. */
import type { Process, ProcessBlock } from '../../../schemas/welding.ts'
import type { Place } from '../positions.ts'
import type { Printed } from './joint-details.ts'

const p = (US: number, SI: number): Printed => ({ US, SI })
type Plain = 'flat' | 'horizontal' | 'vertical' | 'overhead'

export const plainPlaces = (places: readonly Place[]): Plain[] => places.flatMap((place) => (place === '5F' || place === 'T-, Y- or K-connection' ? [] : [place]))

/** How a submerged arc is fed: several electrodes may be parallel (one power source) or multiple (one each). */
export type Feed = 'single' | 'several'
export const feedOf = ({ technique }: ProcessBlock): Feed | null => ((technique.electrodeCount ?? 0) > 1 || technique.electrodes === 'multiple' ? 'several' : technique.electrodeCount === 1 || technique.electrodes === 'single' ? 'single' : null)

/** A test is needed: the table has no prequalified row. */
export const NO_ROW = 'test'

/**
 * Greatest electrode diameter.
 * @param restricted SMAW electrode of EXX14 or low-hydrogen kind, which is smaller in vertical and overhead
 */
export function diameterLimit(process: Process, weld: 'groove' | 'fillet', place: Plain, root: boolean, restricted: boolean): Printed | typeof NO_ROW | null {
  if (process === 'SMAW') {
    if (place === 'flat') return root ? p(3 / 16, 4.8) : weld === 'fillet' ? p(5 / 16, 8) : p(1 / 4, 6.4)
    if (place === 'horizontal') return weld === 'fillet' ? p(1 / 4, 6.4) : p(3 / 16, 4.8)
    return restricted ? p(5 / 32, 4) : p(3 / 16, 4.8)
  }
  if (process === 'SAW') return place === 'flat' || (place === 'horizontal' && weld === 'fillet') ? p(1 / 4, 6.4) : NO_ROW
  if (process === 'GMAW' || process === 'FCAW') return place === 'vertical' ? p(3 / 32, 2.4) : place === 'overhead' ? p(5 / 64, 2) : p(1 / 8, 3.2)
  return null
}

/** Greatest root pass thickness; null = unlimited. */
export const rootPassLimit = (process: Process, place: Plain): Printed | null => (process === 'SAW' ? null : place === 'flat' ? p(3 / 8, 10) : place === 'vertical' ? p(1 / 2, 12) : p(5 / 16, 8))

/** Greatest fill pass thickness; null = unlimited. */
export const fillPassLimit = (process: Process, feed: Feed | null): Printed | null => (process === 'SMAW' ? p(3 / 16, 5) : process === 'SAW' && feed === 'several' ? null : p(1 / 4, 6))

/** Greatest single-pass fillet: `sure` holds for every way of feeding the arc, `maybe` for the most generous; null = unlimited. */
export function singlePassFillet(process: Process, place: Plain, feed: Feed | null): { sure: Printed; maybe: Printed } | null {
  const same = (printed: Printed): { sure: Printed; maybe: Printed } => ({ sure: printed, maybe: printed })
  if (process === 'SAW') {
    if (place === 'flat') return null
    return feed === 'single' ? same(p(5 / 16, 8)) : { sure: p(5 / 16, 8), maybe: p(1 / 2, 12) }
  }
  const wire = process !== 'SMAW'
  if (place === 'flat') return same(wire ? p(1 / 2, 12) : p(3 / 8, 10))
  if (place === 'horizontal') return same(wire ? p(3 / 8, 10) : p(5 / 16, 8))
  return same(place === 'vertical' ? p(1 / 2, 12) : p(5 / 16, 8))
}

export type SawPass = 'fillet' | 'root with opening' | 'root without opening' | 'fill' | 'cap'
const SAW_CURRENT: Readonly<Record<SawPass, readonly [single: number, parallel: number]>> = { fillet: [1000, 1200], 'root with opening': [600, 700], 'root without opening': [600, 900], fill: [600, 1200], cap: [Infinity, Infinity] }

/** Greatest current of SAW in A; for several electrodes parallel ones have a limit and multiple ones have none. */
export const sawCurrent = (pass: SawPass, feed: Feed): { sure: number; maybe: number } => (feed === 'single' ? { sure: SAW_CURRENT[pass][0], maybe: SAW_CURRENT[pass][0] } : { sure: SAW_CURRENT[pass][1], maybe: Infinity })

interface Row { upTo: Printed; least: Printed }
const rows = (...list: readonly (readonly [US: number, SI: number, leastUS: number, leastSI: number])[]): Row[] => list.map(([US, SI, leastUS, leastSI]) => ({ upTo: p(US, SI), least: p(leastUS, leastSI) }))

/** Table 7.7: smallest fillet by T (sizes secondary). */
export const MINIMUM_FILLET: readonly Row[] = rows([1 / 4, 6, 1 / 8, 3], [1 / 2, 12, 3 / 16, 5], [3 / 4, 20, 1 / 4, 6], [Infinity, Infinity, 5 / 16, 8])
/** Table 5.5: smallest partial-penetration weld by T (memory). */
export const MINIMUM_PARTIAL: readonly Row[] = rows([3 / 16, 5, 1 / 16, 2], [1 / 4, 6, 1 / 8, 3], [1 / 2, 12, 3 / 16, 5], [3 / 4, 20, 1 / 4, 6], [1.5, 38, 5 / 16, 8], [2.25, 57, 3 / 8, 10], [6, 150, 1 / 2, 12], [Infinity, Infinity, 5 / 8, 16])

/** Bands are closed at the top. @returns the smallest size in the system's unit */
export function minimumSize(table: readonly Row[], T: number, system: 'SI' | 'US'): number {
  const row = table.find(({ upTo }) => T <= upTo[system]) ?? table.at(-1)
  return row ? row.least[system] : 0
}

/** Table 5.8: lowest preheat and interpass temperature by category; bands closed at the top. */
const PREHEAT = {
  SI: { bands: [20, 38, 65], A: [0, 65, 110, 150], B: [0, 10, 65, 110], C: [10, 65, 110, 150], D: [0, 0, 0, 0] },
  US: { bands: [3 / 4, 1.5, 2.5], A: [32, 150, 225, 300], B: [32, 50, 150, 225], C: [50, 150, 225, 300], D: [32, 32, 32, 32] },
} as const

/** @param T thickest part at the point of welding, in the system's unit */
export function minimumPreheat(category: 'A' | 'B' | 'C' | 'D', T: number, system: 'SI' | 'US'): number {
  const table = PREHEAT[system]
  const band = table.bands.filter((top) => T > top).length
  return table[category][band] ?? table[category][0]
}
