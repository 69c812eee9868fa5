/** Tables 6.1 and 10.8: which positions of production a test position covers for a procedure (narrower than for a welder). */
import type { Position, WeldingVariables } from '../../schemas/welding.ts'

/** Flat, horizontal, vertical, overhead; `5F` and `T-Y-K` stand alone because nothing confirmed says what covers them. */
export type Place = 'flat' | 'horizontal' | 'vertical' | 'overhead' | '5F' | 'T-, Y- or K-connection'

const ALL: readonly Place[] = ['flat', 'horizontal', 'vertical', 'overhead']

/** Where a weld in that position is laid. */
export const PLACES: Readonly<Record<Position, readonly Place[]>> = {
  '1G': ['flat'], '2G': ['horizontal'], '3G': ['vertical'], '4G': ['overhead'], '5G': ['flat', 'vertical', 'overhead'], '6G': ALL, '6GR': [...ALL, 'T-, Y- or K-connection'],
  '1F': ['flat'], '2F': ['horizontal'], '3F': ['vertical'], '4F': ['overhead'], '5F': ['5F'],
}

const COVERED: Readonly<Record<Position, readonly Place[]>> = {
  '1G': ['flat'], '2G': ['flat', 'horizontal'], '3G': ['vertical'], '4G': ['overhead'], '5G': ['flat', 'vertical', 'overhead'], '6G': [...ALL, '5F'], '6GR': [...ALL, '5F', 'T-, Y- or K-connection'],
  '1F': ['flat'], '2F': ['flat', 'horizontal'], '3F': ['vertical'], '4F': ['overhead'], '5F': ['5F'],
}

/** Places that a procedure asks of its positions. */
export const askedPlaces = (positions: readonly Position[]): Place[] => [...new Set(positions.flatMap((position) => PLACES[position]))]

/** Places that test positions cover together; 2G with 5G covers all, as 6G does. */
export function coveredPlaces(positions: readonly Position[]): Place[] {
  const both = positions.includes('2G') && positions.includes('5G')
  return [...new Set([...positions, ...(both ? (['6G'] as const) : [])].flatMap((position) => COVERED[position]))]
}

/** 1G of plate was read; the other rows are recalled. */
export const positionBasis = (positions: readonly Position[], variables: WeldingVariables): 'read' | 'memory' =>
  variables.product === 'plate' && positions.every((position) => position === '1G') ? 'read' : 'memory'
