/** A joint that somebody asks a procedure for, however it was put. */
import { readBaseMetals } from '../library/base-metals.ts'
import type { BaseMetalRow } from '../library/rows.ts'
import type { Interval } from '../schemas/common.ts'
import type { Position, Process } from '../schemas/welding.ts'

/** A metal as asked: the rows that it can mean, and the numbers on which all of them agree (null = not listed or not agreed). */
export interface AskedMetal {
  text: string
  libraryIds: string[]
  pNumber: string | null
  groupNumber: number | null
  iso15608: string | null
}

export interface JointQuestion {
  metalA: AskedMetal | null
  metalB: AskedMetal | null
  /** mm */
  thickness: Interval | null
  /** Outside diameter of pipe, mm. */
  diameter: Interval | null
  process: Process | null
  /** All processes named; the first is `process`. */
  processes: Process[]
  pulsed: boolean | null
  position: Position | null
  progression: 'up' | 'down' | null
  weld: 'groove' | 'fillet' | null
  product: 'plate' | 'pipe' | null
  /** Whether the contract wants toughness tests behind the procedure. */
  toughness: boolean | null
}

export const emptyQuestion: JointQuestion = { metalA: null, metalB: null, thickness: null, diameter: null, process: null, processes: [], pulsed: null, position: null, progression: null, weld: null, product: null, toughness: null }

/** What all rows agree on; one that is not listed agrees with nothing. */
function agreed<T>(rows: readonly BaseMetalRow[], pick: (row: BaseMetalRow) => T | null): T | null {
  const values = new Set(rows.map(pick))
  return values.size === 1 ? ([...values][0] ?? null) : null
}

const P_NUMBER = /^P\s*-?\s*(?:No\.?|Number|Nr\.?)\s*(\d+[A-Z]?)$/i

/**
 * A metal written as grade, specification and grade, UNS or EN number, or `P-No. 8`.
 * @param product narrows a grade that is listed as plate and as pipe
 * @returns null when nothing is listed under it
 */
export function askedMetal(text: string, product: 'plate' | 'pipe' | null = null): AskedMetal | null {
  const pNumber = P_NUMBER.exec(text.trim())?.[1]
  if (pNumber) return { text: text.trim(), libraryIds: [], pNumber: pNumber.toUpperCase(), groupNumber: null, iso15608: null }
  const rows = readBaseMetals(text)
  if (rows.length === 0) return null
  const ofProduct = rows.filter(({ product_form: form }) => (product === 'pipe' ? /pipe|tube|fitting/i.test(form) : product === 'plate' ? /plate|sheet|strip/i.test(form) : false))
  const meant = ofProduct.length > 0 ? ofProduct : rows
  return { text: text.trim(), libraryIds: meant.map(({ id }) => id), pNumber: agreed(meant, (row) => row.p_no), groupNumber: agreed(meant, (row) => row.group_no), iso15608: agreed(meant, (row) => row.iso_15608_subgroup) }
}
