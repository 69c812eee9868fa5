/**
 * The texts of a calculator's inputs between a person, an address and the calculation. A text is kept as typed; where a bare figure
 * is meant in another unit than the storage unit, its unit is written behind it, so that it reads the same for everybody.
 */
import type { Quantity } from '../schemas/common.ts'
import { fromSi, SHOWN_UNIT } from '../units/convert.ts'
import { formatQuantity } from '../units/format.ts'
import { parseQuantity } from '../units/parse.ts'
import { SI_UNIT, type Dimension, type UnitSystem } from '../units/types.ts'
import { exampleInputs, inputsFromAddress, type Calculator, type CalculatorInput, type InputValue } from './catalogue.ts'

/** A calculator's inputs by key, as texts; an empty text is left open. */
export type InputTexts = Readonly<Record<string, string>>

const PLAIN = /^[+-]?\d+(\.\d+)?$/
/** Digits that a converted figure keeps: more than any shop measures, few enough to read. */
const DIGITS = 4

/** A quantity as a text that reads the same in either system: a bare decimal is in the storage unit. */
export function quantityText({ typed, unit }: Quantity, dimension: Dimension): string {
  const text = typed.trim()
  const figure = text.endsWith(unit) ? text.slice(0, -unit.length).trim() : text
  if (unit === SI_UNIT[dimension] && PLAIN.test(figure)) return figure
  const bare = /^[\d\s.,/¼½¾⅛⅜⅝⅞⅓⅔-]+$/.test(text)
  return bare ? `${text} ${unit}` : text
}

/** What a person who reads `system` typed into an input, as the text to keep. What can't be read is kept as it is. */
export function keptText(input: CalculatorInput, typed: string, system: UnitSystem): string {
  if (input.kind !== 'quantity') return typed
  const read = parseQuantity(typed, input.dimension, system)
  return read.ok ? quantityText(read.quantity, input.dimension) : typed
}

/** A kept text as its box shows it to a person who reads `system`: without the unit that stands beside the box anyway. */
export function boxText(input: CalculatorInput, kept: string, system: UnitSystem): string {
  if (input.kind !== 'quantity') return kept
  const [stored, shown] = [SI_UNIT[input.dimension], SHOWN_UNIT[system][input.dimension]]
  if (PLAIN.test(kept)) return stored === shown || samePlace(input.dimension, stored, shown) ? kept : `${kept} ${stored}`
  const bare = kept.endsWith(shown) ? kept.slice(0, -shown.length).trim() : null
  return bare !== null && keptText(input, bare, system) === kept ? bare : kept
}

/** K and °C of a difference are one figure under two names. */
const samePlace = (dimension: Dimension, stored: string, shown: string): boolean => fromSi(1, dimension, stored) === fromSi(1, dimension, shown) && fromSi(0, dimension, shown) === 0

/** `= 254 mm/min`: what a text comes to in the reader's unit, where it is written in another; null where it is not. */
export function readAs(input: CalculatorInput, kept: string, system: UnitSystem): string | null {
  if (input.kind !== 'quantity') return null
  const read = parseQuantity(PLAIN.test(kept) ? `${kept} ${input.unit}` : kept, input.dimension, system)
  if (!read.ok || read.quantity.unit === SHOWN_UNIT[system][input.dimension] || samePlace(input.dimension, read.quantity.unit, SHOWN_UNIT[system][input.dimension])) return null
  return `= ${formatQuantity(read.quantity, input.dimension, system).text}`
}

/** A storage figure as a person who reads `system` would type it. */
function figureText(input: CalculatorInput, value: InputValue, system: UnitSystem): string {
  if (value === null) return ''
  if (input.kind !== 'quantity' || typeof value !== 'number') return String(value)
  const shown = SHOWN_UNIT[system][input.dimension]
  const there = fromSi(value, input.dimension, shown)
  return there === value ? String(value) : `${Number(there.toPrecision(DIGITS))} ${shown}`
}

/** The worked example in the reader's own units. */
export function exampleTexts(calculator: Calculator, system: UnitSystem): InputTexts {
  const values = exampleInputs(calculator)
  return Object.fromEntries(Object.entries(calculator.inputs).map(([key, input]) => [key, figureText(input, values[key] ?? null, system)]))
}

/** Whether an address names any of the inputs; one that names none opens the worked example. */
const isAsked = (calculator: Calculator, search: URLSearchParams): boolean => Object.values(calculator.inputs).some(({ address }) => search.has(address))

/** The texts that an address asks for. */
export function textsFromAddress(calculator: Calculator, search: URLSearchParams, system: UnitSystem): InputTexts {
  if (!isAsked(calculator, search)) return exampleTexts(calculator, system)
  return Object.fromEntries(Object.entries(inputsFromAddress(calculator, search)).map(([key, value]) => [key, value === null ? '' : String(value)]))
}

/** Nothing typed yet: choices as they open, figures empty. */
export const emptyTexts = (calculator: Calculator): InputTexts => Object.fromEntries(Object.entries(calculator.inputs).map(([key, input]) => [key, input.kind === 'choice' ? input.example : '']))
