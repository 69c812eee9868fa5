import type { Calculator, CalculatorResult } from '@shared/calculations/catalogue.ts'
import type { UnitSystem } from '@shared/units/types.ts'

export interface DiagramProps {
  calculator: Calculator
  result: CalculatorResult
  system: UnitSystem
}

/** The drawing that belongs to a calculator, where people would rather look than read. */
export function Diagram(_props: DiagramProps) {
  return null
}
