/** How a calculator is defined: inputs and outputs as data, and the calculation between them. */
import { worksheet, type Calculation, type FigureValue, type Source } from '../result.ts'
import { formatNumber } from '../../units/format.ts'
import { SI_UNIT, type Dimension } from '../../units/types.ts'
import { schemaOf, type CalculatorInputs, type Given, type InputValue } from './inputs.ts'

export const CALCULATOR_GROUPS = [
  { id: 'heat', title: 'Heat input' },
  { id: 'pulse', title: 'Pulsed arc' },
  { id: 'wire', title: 'Wire, current and deposition' },
  { id: 'chemistry', title: 'Numbers from chemistry' },
  { id: 'stainless', title: 'Stainless steel' },
  { id: 'preheat', title: 'Preheat' },
  { id: 'cooling', title: 'Cooling time and hardness' },
  { id: 'joint', title: 'Joint and weld metal' },
  { id: 'cost', title: 'Consumables, time and cost' },
  { id: 'tests', title: 'Tests and conversions' },
  { id: 'gas', title: 'Gas' },
] as const
export type CalculatorGroup = (typeof CALCULATOR_GROUPS)[number]['id']

export interface Output<K extends string = string> {
  key: K
  label: string
  /** Set where the reader's unit system may convert it; the value is in the dimension's storage unit. */
  dimension?: Dimension
  unit?: string
  /** Decimals at most, for a figure without dimension. */
  decimals?: number
  /** Words for a truth or a code word. */
  words?: Readonly<Record<string, string>>
}

export interface ShownFigure {
  key: string
  label: string
  value: FigureValue
  dimension: Dimension | null
  unit: string
  decimals: number
  /** Figure and unit in metric working units; a dash where there is none. */
  text: string
}

export interface CalculatorResult extends Calculation {
  /** Outputs in order, the principal first; empty when an input is wrong. */
  shown: ShownFigure[]
  /** What the inputs were read as; null when one is wrong. */
  inputs: Record<string, InputValue> | null
}

/** What the worked example must come to: a figure within `within`, or a word. */
export type ExampleExpectation = { value: number; within: number } | string | boolean | null

export interface Calculator {
  /** In kebab case: its place in the address. */
  id: string
  title: string
  /** One sentence. */
  purpose: string
  group: CalculatorGroup
  inputs: CalculatorInputs
  outputs: readonly Output[]
  /** In plain text, one line each. */
  formula: readonly string[]
  source: Source
  /** Limits within which it is stated, in words. */
  validity: string
  /** The inputs' examples are its inputs. `from` names a worked case or the working by hand. */
  example: { from: string; expect: Readonly<Record<string, ExampleExpectation | undefined>> }
  /** Schema of the inputs by key; reads numbers and texts; what is left out is empty, but a choice takes its example. */
  schema: ReturnType<typeof schemaOf>
  /** Never throws and never gives NaN: a bad input comes back among `problems` by its key. */
  run(inputs: Readonly<Record<string, unknown>>): CalculatorResult
}

type Keys<F> = Extract<keyof F, string>

interface Definition<I extends CalculatorInputs, F extends object> {
  id: string
  title: string
  purpose: string
  group: CalculatorGroup
  inputs: I
  outputs: readonly Output<Keys<F>>[]
  formula: readonly string[]
  source: Source
  validity: string
  example: { from: string; expect: Readonly<Partial<Record<Keys<F>, ExampleExpectation>>> }
  calculate: (given: Given<I>) => Calculation<F>
}

function show(output: Output, value: FigureValue): ShownFigure {
  const { key, label, dimension = null, words } = output
  const unit = output.unit ?? ''
  const decimals = output.decimals ?? 2
  const shown = { key, label, value, dimension, unit, decimals }
  if (value === null) return { ...shown, text: '–' }
  if (typeof value !== 'number') return { ...shown, text: words?.[String(value)] ?? (typeof value === 'boolean' ? (value ? 'yes' : 'no') : value) }
  const figure = dimension ? formatNumber(value, dimension) : formatPlain(value, decimals)
  const suffix = dimension ? SI_UNIT[dimension] : unit
  return { ...shown, unit: suffix, text: suffix === '' ? figure : suffix === '°' ? `${figure}°` : `${figure} ${suffix}` }
}

/** Rounded to `decimals`; a figure that would round to nothing keeps two significant digits. */
function formatPlain(value: number, decimals: number): string {
  const rounded = Number(value.toFixed(decimals))
  return String(rounded === 0 && Math.abs(value) >= 1e-9 ? Number(value.toPrecision(2)) : rounded + 0)
}

const isFigure = (value: unknown): value is FigureValue => value === null || ['number', 'string', 'boolean'].includes(typeof value)

/** Makes a calculator of its definition. */
export function calculator<const I extends CalculatorInputs, F extends object>({ calculate, ...definition }: Definition<I, F>): Calculator {
  const schema = schemaOf(definition.inputs)
  return {
    ...definition,
    schema,
    run(raw) {
      const read = schema.safeParse(raw)
      if (!read.success) {
        const sheet = worksheet(definition.source)
        for (const { path, message } of read.error.issues) sheet.refuse(String(path[0] ?? ''), message)
        return { ...sheet.stop(''), shown: [], inputs: null }
      }
      // The schema is made of these very inputs, so what it reads has their shape.
      const result = calculate(read.data as Given<I>)
      const figures = result.figures ? Object.fromEntries(Object.entries(result.figures).filter((entry): entry is [string, FigureValue] => isFigure(entry[1]))) : null
      return { ...result, figures, shown: figures ? definition.outputs.map((output) => show(output, figures[output.key] ?? null)) : [], inputs: read.data }
    },
  }
}
