/** Every calculator as data: what the calculators page lists, what an address opens, what a draft can run. */
import { CALCULATOR_GROUPS, type Calculator, type CalculatorGroup, type CalculatorResult } from './catalogue/define.ts'
import { chemistryCalculators } from './catalogue/chemistry.ts'
import { coolingCalculators } from './catalogue/cooling.ts'
import { costCalculators } from './catalogue/cost.ts'
import { gasCalculators } from './catalogue/gas.ts'
import { heatCalculators } from './catalogue/heat.ts'
import type { InputValue } from './catalogue/inputs.ts'
import { jointCalculators } from './catalogue/joint.ts'
import { preheatCalculators } from './catalogue/preheat.ts'
import { pulseCalculators } from './catalogue/pulse.ts'
import { stainlessCalculators } from './catalogue/stainless.ts'
import { testCalculators } from './catalogue/tests.ts'
import { wireCalculators } from './catalogue/wire.ts'

export { CALCULATOR_GROUPS }
export type { Calculator, CalculatorGroup, CalculatorResult, ExampleExpectation, Output, ShownFigure } from './catalogue/define.ts'
export type { CalculatorInput, CalculatorInputs, ChoiceInput, InputValue, NumberInput, QuantityInput } from './catalogue/inputs.ts'

/** In the order of the groups. */
export const calculators: readonly Calculator[] = [...heatCalculators, ...pulseCalculators, ...wireCalculators, ...chemistryCalculators, ...stainlessCalculators, ...preheatCalculators, ...coolingCalculators, ...jointCalculators, ...costCalculators, ...testCalculators, ...gasCalculators]

const byId = new Map(calculators.map((each) => [each.id, each]))
/** @returns the calculator of that address, or null */
export const calculatorById = (id: string): Calculator | null => byId.get(id) ?? null
export const calculatorsOf = (group: CalculatorGroup): Calculator[] => calculators.filter((each) => each.group === group)

/** Schema of a calculator's inputs by key; null for an unknown one. */
export const calculatorInputsSchema = (id: string): Calculator['schema'] | null => calculatorById(id)?.schema ?? null

/** The inputs of the worked example. */
export const exampleInputs = (calculator: Calculator): Record<string, InputValue> => Object.fromEntries(Object.entries(calculator.inputs).map(([key, { example }]) => [key, example]))

/**
 * What an address asks of a calculator: texts by input key, ready for `run`.
 * An address that names none of its inputs opens the worked example; else what it doesn't name is empty.
 */
export function inputsFromAddress(calculator: Calculator, search: URLSearchParams | string): Record<string, InputValue> {
  const params = typeof search === 'string' ? new URLSearchParams(search) : search
  const entries = Object.entries(calculator.inputs)
  if (!entries.some(([, { address }]) => params.has(address))) return exampleInputs(calculator)
  return Object.fromEntries(entries.map(([key, input]) => [key, params.get(input.address) ?? (input.kind === 'choice' ? input.example : null)]))
}

/** The address of a set of inputs, without `?`; an empty input is left out. Reads back to the same inputs. */
export function addressOfInputs(calculator: Calculator, inputs: Readonly<Record<string, unknown>>): string {
  const params = new URLSearchParams()
  for (const [key, { address }] of Object.entries(calculator.inputs)) {
    const value = inputs[key]
    if ((typeof value === 'number' || typeof value === 'string') && value !== '') params.set(address, String(value))
  }
  return params.toString()
}

/** Runs a calculator straight from an address. */
export const runAddress = (calculator: Calculator, search: URLSearchParams | string): CalculatorResult => calculator.run(inputsFromAddress(calculator, search))
