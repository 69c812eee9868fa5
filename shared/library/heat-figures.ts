/** What follows from the chemistry of a heat or lot: the figures that its kind of metal calls for, each with formula, limits and source. */
import { aNumberFromChemistry } from '../calculations/a-number.ts'
import { carbonEquivalent, carbonEquivalentDefinitions } from '../calculations/carbon-equivalent.ts'
import { ELEMENTS as CALCULATED, type Chemistry as Shares, type Element as Calculated } from '../calculations/chemistry.ts'
import { ferriteNumber } from '../calculations/ferrite-number.ts'
import type { Calculation } from '../calculations/result.ts'
import { pren } from '../calculations/stainless-equivalents.ts'
import type { Chemistry, WriteHeat } from '../schemas/heats.ts'

export type Family = 'steel' | 'stainless' | 'aluminium' | 'nickel' | 'other'
export const FAMILY_WORDS: Readonly<Record<Family, string>> = { steel: 'a ferritic steel', stainless: 'a stainless steel', aluminium: 'aluminium', nickel: 'a nickel alloy', other: 'a metal of another kind' }

/** From this chromium on a steel counts as stainless (10.5 %, the limit of EN 10088-1; recalled). */
const STAINLESS_CR = 10.5

/**
 * The kind of metal by its chemistry; an element that is not given counts as 0, and what is left of 100 % as iron.
 * @returns null when nothing is given
 */
export function familyOf(chemistry: Chemistry): Family | null {
  if (chemistry.length === 0) return null
  const share = (element: string): number => chemistry.find((row) => row.element === element)?.percent ?? 0
  const given = new Set(chemistry.map(({ element }) => element))
  if (share('Al') > 50) return 'aluminium'
  const iron = given.has('Fe') ? share('Fe') : 100 - chemistry.reduce((sum, { percent }) => sum + percent, 0)
  if (share('Ni') > 40 && share('Ni') > iron) return 'nickel'
  // A certificate of an aluminium wire leaves its balance out and never has carbon; one of a steel always has.
  if (!given.has('C') && (share('Mg') > 0.2 || given.has('Zn')) && !given.has('Cr')) return 'aluminium'
  if (!given.has('C') && !given.has('Fe') && !given.has('Cr')) return 'other'
  if (given.has('Fe') && iron < 40) return 'other'
  return share('Cr') >= STAINLESS_CR ? 'stainless' : 'steel'
}

/** The shares in the form that the calculations take; elements that none of them uses are left out. */
export const sharesOf = (chemistry: Chemistry): Shares => Object.fromEntries(chemistry.flatMap(({ element, percent }): [Calculated, number][] => CALCULATED.flatMap((known) => (known === element.toLowerCase() ? [[known, percent]] : []))))

export interface HeatFigure {
  id: 'ceIiw' | 'pcm' | 'cet' | 'cen' | 'aNumber' | 'ferriteNumber' | 'pren'
  label: string
  /** What the figure is computed by, as one line. */
  formula: string
  calculation: Calculation<object>
  /** As read: `0.439`, `1 or 2`, `below 4`; null where it can't be told. */
  reading: string | null
  /** Page of the calculator that it comes from. */
  calculator: string
}
export interface HeatFigures {
  family: Family | null
  figures: HeatFigure[]
  /** Why a figure that one might look for is not there. */
  notes: string[]
}

const fixed = (value: number | null, digits: number): string | null => (value === null ? null : value.toFixed(digits))

function equivalents(shares: Shares): HeatFigure[] {
  return (['ceIiw', 'pcm', 'cet', 'cen'] as const).map((id) => {
    const calculation = carbonEquivalent(id, shares)
    return { id, label: carbonEquivalentDefinitions[id].label, formula: carbonEquivalentDefinitions[id].formula, calculation, reading: fixed(calculation.value, 3), calculator: 'carbon-equivalents' }
  })
}

function aNumber(shares: Shares): HeatFigure {
  const calculation = aNumberFromChemistry(shares)
  return { id: 'aNumber', label: 'A-Number', formula: 'every element within the limits of the row', calculation, reading: calculation.figures?.reading ?? null, calculator: 'a-number' }
}

function stainless(shares: Shares, chemistry: Chemistry): HeatFigure[] {
  const ferrite = ferriteNumber(shares)
  const tungsten = chemistry.some(({ element, percent }) => element === 'W' && percent > 0)
  const pitting = pren(shares, tungsten ? 'tungsten' : 'usual')
  return [
    { id: 'ferriteNumber', label: 'Ferrite number', formula: 'WRC-1992: Cr eq = Cr + Mo + 0.7 Nb, Ni eq = Ni + 35 C + 20 N + 0.25 Cu', calculation: ferrite, reading: fixed(ferrite.value, 1) ?? ferrite.figures?.reading ?? null, calculator: 'ferrite-number' },
    { id: 'pren', label: 'PREN', formula: pitting.figures?.formula ?? '', calculation: pitting, reading: fixed(pitting.value, 1), calculator: 'pren' },
  ]
}

/** The figures of a heat or lot by its kind of metal. Advisory: none of them passes or fails a record by itself. */
export function heatFigures({ kind, chemistryOf, chemistry }: Pick<WriteHeat, 'kind' | 'chemistryOf' | 'chemistry'>): HeatFigures {
  const family = familyOf(chemistry)
  const shares = sharesOf(chemistry)
  const notes: string[] = []
  const bounds = chemistry.filter(({ atMost }) => atMost).map(({ element }) => element)
  if (bounds.length > 0 && family !== null) notes.push(`${bounds.join(', ')} ${bounds.length === 1 ? 'is given as a bound and counts' : 'are given as bounds and count'} at that bound.`)
  if (family === null) return { family, figures: [], notes }
  if (chemistry.reduce((sum, { percent }) => sum + percent, 0) > 100.0001) return { family: null, figures: [], notes: ['The elements add up to more than 100 %, so one of them is wrong; nothing is worked out before it is put right.'] }
  if (family === 'aluminium' || family === 'nickel' || family === 'other') return { family, figures: [], notes: [...notes, `By its chemistry this is ${FAMILY_WORDS[family]}: carbon equivalents, A-Number, ferrite number and PREN are not stated for it.`] }
  const figures = family === 'steel' ? equivalents(shares) : stainless(shares, chemistry)
  if (kind === 'lot' && chemistryOf === 'deposit') figures.push(aNumber(shares))
  else if (kind === 'lot') notes.push(chemistryOf === 'wire' ? 'The A-Number is of the deposit, not of the wire: gas and flux change the analysis, so it is not worked out from this one.' : 'Say that the analysis is of the deposit, and the A-Number is worked out too.')
  if (family === 'stainless' && kind === 'heat') notes.push('The ferrite number is that of the metal as it stands, without filler: for a weld, count the dilution in.')
  return { family, figures, notes }
}
