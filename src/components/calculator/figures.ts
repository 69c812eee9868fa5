/** Results of a calculator as a person reads them: in their own units, with what is wrong by field. */
import type { Calculator, CalculatorResult, ShownFigure } from '@shared/calculations/catalogue.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatNumber } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'

export interface ReadFigure {
  figure: string
  /** '' for a word. */
  unit: string
}

/** A result in the reader's units; the catalogue tells it in metric working units. */
export function readFigure({ value, dimension, unit, text }: ShownFigure, system: UnitSystem): ReadFigure {
  if (typeof value !== 'number') return { figure: text, unit: '' }
  if (dimension === null) return { figure: unit !== '' && text.endsWith(unit) ? text.slice(0, -unit.length).trim() : text, unit }
  const shown = SHOWN_UNIT[system][dimension]
  return { figure: formatNumber(value, dimension, shown), unit: shown }
}

export const figureInWords = (shown: ShownFigure, system: UnitSystem): string => {
  const { figure, unit } = readFigure(shown, system)
  return unit === '' ? figure : unit === '°' ? `${figure}°` : `${figure} ${unit}`
}

/** What is wrong, by input; several sentences about one input stand one after the other. */
export function problemsByInput({ problems }: CalculatorResult): Map<string, string> {
  const byInput = new Map<string, string>()
  for (const { input, message } of problems) byInput.set(input, [byInput.get(input), message].filter(Boolean).join(' '))
  return byInput
}

/** Problems that belong to no single field of this calculator, e.g. figures that can't go together. */
export const problemsElsewhere = (calculator: Calculator, { problems }: CalculatorResult): string[] => problems.filter(({ input }) => !(input in calculator.inputs)).map(({ message }) => message)

/** Inputs that are empty and must be given: asked for, rather than called wrong. */
export const stillOpen = (calculator: Calculator, texts: Readonly<Record<string, string>>): string[] => Object.entries(calculator.inputs).filter(([key, input]) => input.kind !== 'choice' && !input.optional && (texts[key] ?? '').trim() === '').map(([key]) => key)
