/** Welding positions of ASME IX QW-461 / AWS A3.0 beside ISO 6947. */
import { POSITIONS, type Position, type ProcessBlock } from '../schemas/welding.ts'
import data from './data/positions.json' with { type: 'json' }
import { positionRowSchema, type PositionRow } from './rows.ts'

export const positions: readonly PositionRow[] = data.table.map((row) => positionRowSchema.parse(row))
export const isoMainPositions: readonly { symbol: string; name: string }[] = data.iso_main_positions
export const positionSource: string = data.source

type Weld = 'groove' | 'fillet'
type Product = 'plate' | 'pipe' | 'plate-and-pipe' | null
type Progression = ProcessBlock['progression']

export interface IsoPositionReading {
  /** ISO 6947 symbols; more than one while the progression is open. */
  iso: string[]
  decided: boolean
  basis: string
  note: string | null
}

const ofProduct = (row: PositionRow, product: Product): boolean => product === null || product === 'plate-and-pipe' || row.product.startsWith(product)

/**
 * ISO 6947 symbol of an ASME/AWS test position.
 * @param product null: not stated
 * @param progression null: not stated; the vertical positions then have two symbols and `decided` is false
 */
export function isoPosition(asme: string, weld: Weld | null, product: Product, progression: Progression): IsoPositionReading {
  const rows = positions.filter((row) => row.asme_aws === asme && (weld === null || row.weld_type === weld) && ofProduct(row, product) && (row.progression === null || progression === null || progression === 'both' || row.progression === progression))
  const iso = [...new Set(rows.map((row) => row.iso_6947))]
  const basis = rows.some((row) => row.basis === 'memory') ? 'memory' : (rows[0]?.basis ?? 'memory')
  return { iso, decided: iso.length === 1, basis, note: rows.find((row) => row.note !== null)?.note ?? null }
}

export interface AsmePositionReading { positions: Position[]; progression: 'up' | 'down' | null; basis: string }

const isPosition = (value: string | null): value is Position => POSITIONS.some((position) => position === value)

/** ASME/AWS positions that an ISO 6947 symbol covers for a weld and product, and the progression that it states. */
export function asmePositions(iso: string, weld: Weld | null, product: Product): AsmePositionReading {
  const rows = positions.filter((row) => row.iso_6947 === iso.toUpperCase() && (weld === null || row.weld_type === weld) && ofProduct(row, product))
  const found = [...new Set(rows.map((row) => row.asme_aws))].filter(isPosition)
  const progressions = [...new Set(rows.map((row) => row.progression))]
  return { positions: found, progression: progressions.length === 1 ? (progressions[0] ?? null) : null, basis: rows.some((row) => row.basis === 'memory') ? 'memory' : 'read' }
}
