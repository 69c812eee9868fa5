/** What the advice on fillers reads: facts of a metal and of a filler out of a record and the library row behind it. */
import type { Basis } from '../schemas/assessment.ts'
import type { BaseMetal, Filler, Process } from '../schemas/welding.ts'
import { baseMetalById, resolveBaseMetal } from './base-metals.ts'
import { fillerById, resolveFiller } from './filler-metals.ts'
import type { BaseMetalRow, FillerRow } from './rows.ts'

export type MetalFamily = 'steel' | 'stainless' | 'aluminium' | 'copper' | 'nickel' | 'titanium' | 'zirconium'

export interface MetalFacts {
  name: string
  record: BaseMetal
  /** P-Number, or null. */
  pNumber: string | null
  /** ISO/TR 15608 sub-group or group, or null. */
  group: string | null
  family: MetalFamily | null
  /** MPa */
  tensile: number | null
  composition: string | null
  basis: Basis
  propertiesBasis: Basis
}

export interface FillerFacts {
  name: string
  record: Filler
  row: FillerRow | null
  family: MetalFamily | null
  /** MPa */
  tensile: number | null
  composition: string | null
  basis: Basis
  propertiesBasis: Basis
}

/** Reads rows that are not of the reference, e.g. the organization's own. */
export interface AdviceLibrary { metal?(id: string): BaseMetalRow | null; filler?(id: string): FillerRow | null }

const STRENGTH: readonly Basis[] = ['read', 'secondary', 'memory', 'common-practice']
/** A basis of a library row; an own row rests on what its organization wrote, which nobody here has read. */
const basisOf = (text: string | null | undefined): Basis => STRENGTH.find((basis) => basis === text) ?? 'memory'
/** The weakest of several. */
export const weakest = (...bases: Basis[]): Basis => STRENGTH[Math.max(...bases.map((basis) => STRENGTH.indexOf(basis)))] ?? 'memory'

function familyOfMetal(pNumber: string | null, group: string | null): MetalFamily | null {
  const p = pNumber === null ? NaN : Number.parseInt(pNumber, 10)
  const g = group === null ? NaN : Number.parseInt(group, 10)
  const within = (from: number, to: number, value: number): boolean => value >= from && value <= to
  // 904L is P-No. 45 and group 8: the group tells the kind of metal, the P-Number how it is qualified.
  if ([7, 8, 10].includes(g)) return 'stainless'
  if (within(1, 11, g)) return 'steel'
  if (within(21, 26, g)) return 'aluminium'
  if (within(31, 38, g)) return 'copper'
  if (within(41, 48, g)) return 'nickel'
  if (within(51, 54, g)) return 'titanium'
  if ([6, 7, 8, 10].includes(p)) return 'stainless'
  if (within(1, 15, p)) return 'steel'
  if (within(21, 26, p)) return 'aluminium'
  if (within(31, 35, p)) return 'copper'
  if (within(41, 49, p)) return 'nickel'
  if (within(51, 53, p)) return 'titanium'
  return within(61, 62, p) ? 'zirconium' : null
}

/** F-Number families: 1 to 6 steels, of which the filler group or analysis tells stainless; 21 to 25 Al, 31 to 37 Cu, 41 to 45 Ni, 51 to 54 Ti. */
function familyOfFiller(fNumber: number | null, row: FillerRow | null, classification: string): MetalFamily | null {
  if (row?.iso_9606_filler_group === 'FM5') return 'stainless'
  if (row?.iso_9606_filler_group === 'FM6') return 'nickel'
  if (/^(?:FM[1-4])$/.test(row?.iso_9606_filler_group ?? '')) return 'steel'
  if (fNumber === 5) return 'stainless'
  if (fNumber !== null && fNumber <= 6) return row?.spec.includes('5.9') || row?.spec.includes('5.22') ? 'stainless' : 'steel'
  const family = fNumber === null ? null : ({ 2: 'aluminium', 3: 'copper', 4: 'nickel', 5: 'titanium', 6: 'zirconium' } as const)[Math.floor(fNumber / 10)]
  return family ?? (/^(?:ER?\d{4}|S ?Al|Al ?\d{4}|R\d{4})/i.test(classification) && /(?:^|\D)[1-5]\d{3}A?(?!\d)/.test(classification) && /^(?:ER|R|S ?Al|Al)/i.test(classification) ? 'aluminium' : null)
}

const has = (metal: BaseMetal): boolean => Boolean(metal.specification ?? metal.grade ?? metal.uns ?? metal.pNumber ?? metal.iso15608)

/** Facts of a metal of a record; null when none is stated. */
export function metalFacts(record: BaseMetal, library: AdviceLibrary = {}): MetalFacts | null {
  if (!has(record)) return null
  const listed = record.libraryId === null ? null : (baseMetalById(record.libraryId) ?? library.metal?.(record.libraryId) ?? null)
  const row = listed ?? (record.specification ? resolveBaseMetal(record.specification, record.grade ?? '') : null)
  const pNumber = record.pNumber ?? null
  const group = record.iso15608 ?? null
  return {
    name: [record.specification, record.grade].filter(Boolean).join(' ') || (record.uns ?? (pNumber === null ? `group ${group}` : `P-Number ${pNumber}`)),
    record, pNumber, group,
    family: familyOfMetal(pNumber, group),
    tensile: record.minTensile?.si ?? row?.min_tensile_mpa ?? null,
    composition: row?.nominal_composition ?? null,
    basis: basisOf(row?.basis), propertiesBasis: basisOf(row?.properties_basis),
  }
}

/** Facts of a filler of a record; null for none, an autogenous weld or an unnamed one. */
export function fillerFacts(record: Filler, library: AdviceLibrary = {}): FillerFacts | null {
  if (record.added === false || !record.classification) return null
  const listed = record.libraryId === null ? null : (fillerById(record.libraryId) ?? library.filler?.(record.libraryId) ?? null)
  const row = listed ?? resolveFiller(record.classification, record.specification)
  const fNumber = record.fNumber === null ? (row?.f_no ?? null) : Number.parseInt(record.fNumber, 10)
  return {
    name: record.classification, record, row,
    family: familyOfFiller(Number.isNaN(fNumber) ? null : fNumber, row, record.classification),
    tensile: row?.min_tensile_mpa ?? null,
    composition: row?.nominal_composition ?? null,
    basis: basisOf(row?.basis), propertiesBasis: basisOf(row?.properties_basis),
  }
}

export type Verdict = 'suits' | 'unfit' | 'cannot-tell'
/** One sentence of advice with what it rests on. `care`: something to mind; `fact`: a property. */
export interface Remark { id: string; kind: Verdict | 'care' | 'fact'; text: string; source: string; basis: Basis }

/** What is advised on. */
export interface Asked { metals: readonly MetalFacts[]; filler: FillerFacts; process: Process | null; serviceTemperature: number | null }

export const remark = (id: string, kind: Remark['kind'], text: string, source: string, basis: Basis): Remark => ({ id, kind, text, source, basis })
export const namesOf = (metals: readonly MetalFacts[]): string => [...new Set(metals.map(({ name }) => name))].join(' and ')
