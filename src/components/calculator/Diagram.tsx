import type { ReactNode } from 'react'
import type { Calculator, CalculatorResult } from '@shared/calculations/catalogue.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { CoolingDiagram } from './diagrams/CoolingDiagram.tsx'
import { FerriteDiagram } from './diagrams/FerriteDiagram.tsx'
import { PulseDiagram } from './diagrams/PulseDiagram.tsx'
import { WireFeedDiagram } from './diagrams/WireFeedDiagram.tsx'

interface DiagramProps {
  calculator: Calculator
  result: CalculatorResult
  system: UnitSystem
}

/** The drawing that belongs to a calculator, where people would rather look than read; null for one without. */
export function drawingOf({ calculator, result, system }: DiagramProps): { title: string; drawn: ReactNode } | null {
  switch (calculator.id) {
    case 'ferrite-number':
    case 'ferrite-dilution':
      return { title: 'WRC-1992 diagram', drawn: <FerriteDiagram result={result} /> }
    case 'wire-feed-from-current':
    case 'current-from-wire-feed':
      return { title: 'Wire feed against current', drawn: <WireFeedDiagram result={result} system={system} /> }
    case 'pulse':
      return { title: 'The pulse, drawn', drawn: <PulseDiagram result={result} /> }
    case 'cooling-time':
    case 'heat-input-for-cooling-time':
      return { title: 'Two- or three-dimensional', drawn: <CoolingDiagram result={result} system={system} /> }
    default:
      return null
  }
}
