/** F-Numbers of ASME IX Table QW-432: usability grouping by specification and classification pattern. */
import { bareClassification, matchFillers } from './filler-metals.ts'

/** 2013 to 2023 as remembered; aluminium lines secondary. */
export interface FNumberReading { fNumber: number | null; clause: 'QW-432'; basis: 'memory' | 'secondary'; how: string }

const spec = (text: string | null | undefined): string | null => /(?:SFA|A)\s*-?\s*(5\.\d+)/i.exec(text ?? '')?.[1] ?? null

const STEEL_WIRE = ['5.2', '5.9', '5.17', '5.18', '5.20', '5.22', '5.23', '5.25', '5.26', '5.28', '5.29', '5.30', '5.36']
const WIRE_PATTERN = /^(?:ER\d{2,3}[SC]-|ER(?:[23]\d{2}|4\d{2}|5\d{2}|2209|2553|259[345]|630)(?:[A-Z]|$)|E\d{2,3}C-|E\d{2,3}T\d*-|E\d{3,4}[A-Z]*T\d-|F\d)/
const AUSTENITIC = /^E(?:2\d{2}|3\d{2}|2209|2553|259[345]|33-31|16-8-2)(?!\d)/
const STRAIGHT_CHROMIUM = /^E(?:4\d{2}|5\d{2}|630)(?!\d)/

/** Steel electrodes of SFA-5.1 and 5.5 by their last two figures; EXX28 is F-1 although low hydrogen. */
function byUsability(classification: string): number | null {
  const figures = /^E\d{2,3}(\d{2})(?:M|$|-)/.exec(classification)?.[1]
  if (figures === undefined) return null
  const groups: readonly (readonly [number, readonly string[]])[] = [[1, ['20', '22', '24', '27', '28']], [2, ['12', '13', '14', '19']], [3, ['10', '11']], [4, ['15', '16', '18', '48']]]
  return groups.find(([, ends]) => ends.includes(figures))?.[0] ?? null
}

function stainlessElectrode(classification: string): number | null {
  if (!AUSTENITIC.test(classification) && !STRAIGHT_CHROMIUM.test(classification)) return null
  if (/-2[56]$/.test(classification)) return 1
  if (!/-1[567]$/.test(classification)) return null
  return AUSTENITIC.test(classification) ? 5 : 4
}

const NONFERROUS: readonly (readonly [number, RegExp])[] = [
  [21, /^(?:E1100|E3003|[ER]{1,2}1100|[ER]{1,2}1188)$/],
  [22, /^(?:ER|R)(?:5183|5356|5554|5556|5654)$/],
  [23, /^(?:E4043|(?:ER|R)(?:4043|4047|4145|4643))$/],
  [25, /^(?:ER|R)2319$/],
  [31, /^ER?CU$/],
  [32, /^(?:ECUSI|ERCUSI-A)$/],
  [33, /^(?:ECUSN-[AC]|ERCUSN-A)$/],
  [34, /^ER?CUNI$/],
  [36, /^(?:ECUAL-(?:A2|B)|ERCUAL-A[123])$/],
  [37, /^ER?CU(?:NI|MNNI)AL$/],
  [41, /^ER?NI-1$/],
  [42, /^ER?NICU-7$/],
  [45, /^(?:ENICRMO-(?:1|9|11)|ERNICRMO-(?:1|8|9|11)|ERNIFECR-1)$/],
  [43, /^(?:ENICRFE-\d+|ENICRMO-\d+|ERNICR-\d+|ERNICRFE-\d+|ERNICRMO-\d+)$/],
  [44, /^ER?NIMO-\d+$/],
  [51, /^ERTI-[1-4]$/],
  [52, /^ERTI-7$/],
  [53, /^ERTI-9$/],
  [54, /^ERTI-12$/],
  [61, /^ERZR[234]$/],
]

/** By the patterns of the table; the specification decides first where it is given. */
function byPattern(classification: string, specification: string | null): number | null {
  if (specification === '5.13') return 71
  if (specification === '5.21') return 72
  if (specification && STEEL_WIRE.includes(specification)) return 6
  if (specification === '5.4') return stainlessElectrode(classification)
  if (specification === '5.1' || specification === '5.5') return byUsability(classification)
  const nonferrous = NONFERROUS.find(([, pattern]) => pattern.test(classification))?.[0]
  if (nonferrous !== undefined) return nonferrous
  if (specification) return null
  return stainlessElectrode(classification) ?? (WIRE_PATTERN.test(classification) ? 6 : byUsability(classification))
}

/**
 * The F-Number of a classification. Supplements (`-1`, `H4R`) do not alter it.
 * @returns null as number for ISO classifications and for what the table as known here does not name
 */
export function fNumberOf(classification: string, specification?: string | null): FNumberReading {
  const bare = bareClassification(classification)
  const fNumber = byPattern(bare.replaceAll(' ', ''), spec(specification))
  const listed = matchFillers(classification, specification).filter((row) => row.f_no !== null)
  const numbers = new Set(listed.map((row) => row.f_no))
  const settled = fNumber ?? (numbers.size === 1 ? ([...numbers][0] ?? null) : null)
  const basis = settled !== null && settled >= 21 && settled <= 25 ? 'secondary' : 'memory'
  if (settled === null) return { fNumber: null, clause: 'QW-432', basis, how: `${classification.trim()} is not among the classifications known of QW-432; state its F-Number from your edition.` }
  return { fNumber: settled, clause: 'QW-432', basis, how: `${bare} falls in F-No. ${settled} of QW-432.` }
}
