/** Which inputs of a calculator are elements of a composition, and of which metal. */
import type { Calculator, CalculatorInput } from '@shared/calculations/catalogue.ts'
import { ELEMENT_SYMBOLS, type Element } from '@shared/calculations/chemistry.ts'
import type { ElementInput } from './ElementGrid.tsx'

export interface ElementGroup {
  /** '' for a calculator of one metal, else `a`, `b` or `f`. */
  letter: string
  legend: string
  elements: ElementInput[]
}

const SYMBOLS = new Map(Object.entries(ELEMENT_SYMBOLS) as [Element, string][])
const LEGENDS: Readonly<Record<string, string>> = { '': 'Composition', a: 'Base metal A', b: 'Base metal B', f: 'Filler' }

function elementOf(key: string, input: CalculatorInput): { letter: string; symbol: string } | null {
  if (input.kind !== 'number' || input.unit !== '%' || !input.optional) return null
  const own = SYMBOLS.get(key as Element)
  if (own) return { letter: '', symbol: own }
  const [letter = '', symbol] = [key.charAt(0), key.slice(1)]
  return letter in LEGENDS && [...SYMBOLS.values()].includes(symbol) ? { letter, symbol } : null
}

/** The inputs parted into plain ones and compositions, each in the catalogue's order. */
export function partedInputs(calculator: Calculator): { plain: [string, CalculatorInput][]; groups: ElementGroup[] } {
  const plain: [string, CalculatorInput][] = []
  const groups: ElementGroup[] = []
  for (const [key, input] of Object.entries(calculator.inputs)) {
    const element = elementOf(key, input)
    if (!element) {
      plain.push([key, input])
      continue
    }
    const group = groups.find(({ letter }) => letter === element.letter) ?? { letter: element.letter, legend: LEGENDS[element.letter] ?? 'Composition', elements: [] }
    if (!groups.includes(group)) groups.push(group)
    group.elements.push({ key, input, symbol: element.symbol })
  }
  return { plain, groups }
}

/** Whether a calculator asks for a composition. */
export const elementsOfGroup = (calculator: Calculator): boolean => partedInputs(calculator).groups.length > 0

/** The key of an element's input in a group. */
export const elementKey = (group: Pick<ElementGroup, 'elements'>, symbol: string): string | null => group.elements.find((each) => each.symbol === symbol)?.key ?? null
