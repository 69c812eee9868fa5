/** A-Number of a ferrous weld metal from its exact chemistry, and how far each element stands from the limits of the row. */
import { A_NUMBER_ELEMENTS, aNumberSource, aNumberTable, aNumbersOf, type ANumberElement, type DepositComposition } from '../library/a-numbers.ts'
import { demandChemistry, ELEMENT_SYMBOLS, type Chemistry } from './chemistry.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const aNumberCalculationSource: Source = { standard: 'ASME BPVC Section IX', edition: aNumberSource.edition, clause: aNumberSource.clause, basis: aNumberSource.basis, note: aNumberSource.source }

/** Room of one element within a row: per cent up to the nearer limit, negative outside. null where the row sets no limit. */
export interface ElementClearance { element: ANumberElement; percent: number; min: number | null; max: number | null; room: number | null }
export interface ANumberFigures {
  /** Every A-Number that the figures allow. */
  candidates: number[]
  decided: boolean
  /** The one A-Number when decided. */
  aNumber: number | null
  /** For reading: `1`, `1 or 2`, `none`. */
  reading: string
  /** By candidate. */
  clearance: Record<number, ElementClearance[]>
}

/**
 * A-Number of a deposit, mass per cent of the weld metal and not of the wire.
 * An element that is not given excludes nothing and leaves the answer undecided.
 * @returns `value` is the A-Number when it is decided
 */
export function aNumberFromChemistry(chemistry: Chemistry): Calculation<ANumberFigures> {
  const sheet = worksheet(aNumberCalculationSource)
  demandChemistry(sheet, chemistry)
  if (sheet.refused) return sheet.stop('')
  const composition: DepositComposition = Object.fromEntries(A_NUMBER_ELEMENTS.flatMap((element) => (chemistry[element] === undefined || chemistry[element] === null ? [] : [[element, chemistry[element]]])))
  const { candidates, decided, missing } = aNumbersOf(composition)
  const clearance = Object.fromEntries(candidates.map((number) => {
    const row = aNumberTable.find(({ a_no }) => a_no === number)
    return [number, A_NUMBER_ELEMENTS.flatMap((element): ElementClearance[] => {
      const percent = composition[element]
      const limit: { min: number | null; max: number | null } | undefined = row?.[element]
      if (percent === undefined || !limit) return []
      const rooms = [...(limit.min === null ? [] : [percent - limit.min]), ...(limit.max === null ? [] : [limit.max - percent])]
      return [{ element, percent, ...{ min: limit.min, max: limit.max }, room: rooms.length > 0 ? Math.min(...rooms) : null }]
    })]
  })) as Record<number, ElementClearance[]>
  for (const number of candidates) {
    const tightest = (clearance[number] ?? []).filter(({ room }) => room !== null).sort((one, other) => (one.room ?? 0) - (other.room ?? 0))[0]
    sheet.stepText(`A-Number ${number}`, 'every element within the limits of the row', tightest ? `nearest to a limit: ${ELEMENT_SYMBOLS[tightest.element]} ${written(tightest.percent)} %, ${written(tightest.room ?? 0)} % from it` : 'no limit is near', 'holds')
  }
  if (candidates.length === 0) sheet.note('No row holds this deposit: state the analysis in place of an A-Number.')
  if (candidates.length > 1) sheet.note(`Several rows hold it: ${candidates.join(', ')}. ${missing.length > 0 ? 'Give the missing elements.' : 'Choose with the filler maker’s data.'}`)
  if (missing.length > 0 && candidates.length > 0) sheet.note(`${missing.map((element) => ELEMENT_SYMBOLS[element]).join(', ')} not given: they exclude nothing, so the answer stays open.`)
  const aNumber = decided ? (candidates[0] ?? null) : null
  return sheet.done('', aNumber, { candidates, decided, aNumber, reading: candidates.length > 0 ? candidates.join(' or ') : 'none', clearance })
}
