import type { Calculator, CalculatorResult } from '@shared/calculations/catalogue.ts'
import type { InputTexts } from '@shared/calculations/calculator-texts.ts'
import { partedInputs } from './element-groups.ts'

/** Base metal B may be left out: then both members are of metal A. */
const MAY_BE_EMPTY = 'b'

/**
 * Runs a calculator on what stands in its boxes. A composition without a single figure is asked for rather than counted as nothing:
 * a carbon equivalent of 0 would be a wrong answer to an empty form.
 */
export function runTexts(calculator: Calculator, texts: InputTexts): CalculatorResult {
  const result = calculator.run(texts)
  const empty = partedInputs(calculator).groups.filter(({ letter, elements }) => letter !== MAY_BE_EMPTY && elements.every(({ key }) => (texts[key] ?? '').trim() === ''))
  if (empty.length === 0) return result
  const problems = empty.map(({ letter, legend }) => ({ input: '', message: letter === '' ? 'The composition is not given.' : `The composition of the ${legend.toLowerCase().replace(/ [ab]$/, (name) => name.toUpperCase())} is not given.` }))
  return { ...result, value: null, figures: null, inputs: null, shown: [], steps: [], notes: [], validity: { inside: true, said: [] }, problems: [...result.problems, ...problems] }
}
