/** A-Numbers of ASME IX Table QW-442: classes of ferrous weld metal analysis. Limits from memory of the 2013 to 2023 editions. */
import data from './data/a-numbers.json' with { type: 'json' }

export const A_NUMBER_ELEMENTS = ['c', 'cr', 'mo', 'ni', 'mn', 'si'] as const
export type ANumberElement = (typeof A_NUMBER_ELEMENTS)[number]
/** Mass per cent of the deposit, not of the wire. */
export type DepositComposition = Partial<Record<ANumberElement, number>>

export const aNumberTable = data.table
export const aNumberSource = { clause: data.clause, edition: data.edition, basis: 'memory', source: data.source } as const

export interface ANumberReading {
  /** Every A-Number that the figures given allow, ascending. */
  candidates: number[]
  /** One candidate and no figure missing that could alter it. */
  decided: boolean
  /** Elements without a figure; never taken as nought. */
  missing: ANumberElement[]
}

/**
 * All A-Numbers whose limits hold the deposit. None: state the analysis. Several: ask, never choose.
 * An element that is not given excludes nothing, and leaves the answer undecided unless the candidate list is empty.
 */
export function aNumbersOf(composition: DepositComposition): ANumberReading {
  const missing = A_NUMBER_ELEMENTS.filter((element) => composition[element] === undefined)
  const candidates = data.table
    .filter((row) =>
      A_NUMBER_ELEMENTS.every((element) => {
        const percent = composition[element]
        const limit: { min: number | null; max: number | null } = row[element]
        return percent === undefined || ((limit.min === null || percent >= limit.min) && (limit.max === null || percent <= limit.max))
      }),
    )
    .map((row) => row.a_no)
  return { candidates, decided: candidates.length === 1 && missing.length === 0, missing }
}
