/** Inputs of a calculator as data: what a form shows, what an address carries, and the zod schema that reads both. */
import { z } from 'zod'
import { parseQuantity } from '../../units/parse.ts'
import { plainSigns, readNumber } from '../../units/read-number.ts'
import { SI_UNIT, type Dimension } from '../../units/types.ts'
import { complaint, type Demand } from '../result.ts'

interface Common {
  /** Short name in an address: `v` in `?v=24&i=180`. */
  address: string
  label: string
  help: string | null
}
/** A figure with a unit that the reader may choose; always in the dimension's storage unit here. */
export interface QuantityInput extends Common { kind: 'quantity'; dimension: Dimension; unit: string; example: number | null; optional: boolean; demand: Demand }
/** A figure of one fixed unit, or of none (''). */
export interface NumberInput extends Common { kind: 'number'; unit: string; example: number | null; optional: boolean; demand: Demand }
export interface ChoiceInput<V extends string = string> extends Common { kind: 'choice'; options: readonly { value: V; label: string }[]; example: V }
export type CalculatorInput = QuantityInput | NumberInput | ChoiceInput
export type CalculatorInputs = Readonly<Record<string, CalculatorInput>>
export type InputValue = number | string | null

/** What `run` gets for a set of inputs. */
export type Given<I extends CalculatorInputs> = { [K in keyof I]: I[K] extends ChoiceInput<infer V> ? V : I[K] extends { optional: true } ? number | null : number }

type Options = Demand & { help?: string }
const split = ({ help, ...demand }: Options): { help: string | null; demand: Demand } => ({ help: help ?? null, demand })

/** A figure that must be given. */
export const quantity = (address: string, label: string, dimension: Dimension, example: number, options: Options = { above: 0 }): QuantityInput & { optional: false } => ({ kind: 'quantity', address, label, dimension, unit: SI_UNIT[dimension], example, optional: false, ...split(options) })
/** A figure that may be left out. */
export const quantityIfAny = (address: string, label: string, dimension: Dimension, example: number | null, options: Options = { above: 0 }): QuantityInput & { optional: true } => ({ ...quantity(address, label, dimension, 0, options), example, optional: true })
export const number = (address: string, label: string, unit: string, example: number, options: Options = { above: 0 }): NumberInput & { optional: false } => ({ kind: 'number', address, label, unit, example, optional: false, ...split(options) })
export const numberIfAny = (address: string, label: string, unit: string, example: number | null, options: Options = { above: 0 }): NumberInput & { optional: true } => ({ ...number(address, label, unit, 0, options), example, optional: true })
export const choice = <const V extends string>(address: string, label: string, options: readonly { value: V; label: string }[], example: NoInfer<V>, help: string | null = null): ChoiceInput<V> => ({ kind: 'choice', address, label, options, example, help })

type Reading = { value: InputValue } | { message: string }
const TOO_LONG = 60
const sentence = (text: string): string => (/[.!?]$/.test(text) ? text : `${text}.`)

const DECIMAL = /^[+-]?\d+(\.\d+)?(e[+-]?\d{1,3})?$/i

/** A number as typed (`0.18`, `0,18`, `1 1/2`), with nothing after it. */
function readPlain(text: string, label: string): Reading {
  const plain = plainSigns(text)
  const negative = /^-\s*/.exec(plain)
  const rest = negative ? plain.slice(negative[0].length) : plain
  const read = readNumber(rest)
  if (read && 'problem' in read) return { message: sentence(`${label}: ${read.problem}`) }
  if (!read || read.length !== rest.length) return { message: `${label}: "${text.slice(0, TOO_LONG)}" is no number.` }
  return { value: negative ? -read.value : read.value }
}

/** A text as a figure in the storage unit: a bare decimal is in that unit, anything else is read as a form reads it. */
function readFigure(input: QuantityInput | NumberInput, text: string): Reading {
  if (DECIMAL.test(text)) return { value: Number(text) }
  if (input.kind === 'number') return readPlain(text, input.label)
  const read = parseQuantity(text, input.dimension, 'SI')
  return read.ok ? { value: read.quantity.si } : { message: sentence(`${input.label}: ${read.message}`) }
}

/**
 * Reads what an address or a form gives for an input: a number in the storage unit, or a text (`24`, `10 in/min`).
 * @param raw undefined, null or '' = left empty; a choice that is left out takes its example
 */
export function readInput(input: CalculatorInput, raw: unknown): Reading {
  const { label } = input
  const text = typeof raw === 'string' ? raw.trim() : (raw ?? null)
  if (input.kind === 'choice') {
    if (text === null) return { value: input.example }
    const option = input.options.find(({ value }) => value === text)
    return option ? { value: option.value } : { message: `${label}: "${typeof text === 'string' ? text.slice(0, TOO_LONG) : typeof text}" is none of the choices (${input.options.map((each) => each.value).join(', ')}).` }
  }
  if (text === null || text === '') return input.optional ? { value: null } : { message: `${label} is not given.` }
  if (typeof text !== 'number' && typeof text !== 'string') return { message: `${label} is no number.` }
  const read = typeof text === 'number' ? { value: text } : readFigure(input, text)
  if ('message' in read) return read
  const value = Number(read.value)
  const message = complaint(label, value, { ...input.demand, unit: input.unit })
  return message ? { message } : { value }
}

/** Schema of a calculator's inputs by key; each issue stands at the key and its message names the input. */
export function schemaOf(inputs: CalculatorInputs) {
  return z.object(Object.fromEntries(Object.entries(inputs).map(([key, input]) => [
    key,
    z.unknown().optional().transform((raw, context): InputValue => {
      const read = readInput(input, raw)
      if ('value' in read) return read.value
      context.addIssue({ code: 'custom', message: read.message })
      return z.NEVER
    }),
  ])))
}
