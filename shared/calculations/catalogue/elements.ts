/** Inputs for the elements of a composition. */
import { ELEMENT_NAMES, ELEMENT_SYMBOLS, type Chemistry, type Element } from '../chemistry.ts'
import { numberIfAny, type NumberInput } from './inputs.ts'

type Optional = NumberInput & { optional: true }

/** One input for each element, key and address its symbol in lower case; an element without an example starts empty. */
export const elements = <const E extends Element>(examples: Readonly<Record<E, number | null>>): Record<E, Optional> =>
  Object.fromEntries((Object.entries(examples) as [E, number | null][]).map(([element, example]) => [element, numberIfAny(element, ELEMENT_NAMES[element], '%', example, { least: 0, most: 100 })])) as Record<E, Optional>

/** The same for one of several metals: key and address are the letter and the symbol, `aCr`. */
export const elementsOf = <const P extends string, const E extends Element>(letter: P, of: string, examples: Readonly<Record<E, number | null>>): Record<`${P}${Capitalize<E>}`, Optional> =>
  Object.fromEntries((Object.entries(examples) as [E, number | null][]).map(([element, example]) => [`${letter}${ELEMENT_SYMBOLS[element]}`, numberIfAny(`${letter}${ELEMENT_SYMBOLS[element]}`, `${of}: ${ELEMENT_NAMES[element].toLowerCase()}`, '%', example, { least: 0, most: 100 })])) as Record<`${P}${Capitalize<E>}`, Optional>

/** The composition with `letter` before its keys. */
export const chemistryOf = (given: Readonly<Record<string, unknown>>, letter: string): Chemistry =>
  Object.fromEntries((Object.entries(ELEMENT_SYMBOLS) as [Element, string][]).flatMap(([element, symbol]) => {
    const value = given[`${letter}${symbol}`]
    return typeof value === 'number' ? [[element, value]] : []
  }))
