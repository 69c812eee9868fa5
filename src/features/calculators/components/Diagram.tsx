import type { ReactNode } from 'react'
import type { Calculator, CalculatorResult } from '@shared/calculations/catalogue.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { CoolingDiagram } from '@/components/calculator/diagrams/CoolingDiagram.tsx'
import { FerriteDiagram } from '@/components/calculator/diagrams/FerriteDiagram.tsx'
import { PulseDiagram } from '@/components/calculator/diagrams/PulseDiagram.tsx'
import { WireFeedDiagram } from '@/components/calculator/diagrams/WireFeedDiagram.tsx'
import { Sheet } from '@/components/Sheet.tsx'

export interface DiagramProps {
  calculator: Calculator
  result: CalculatorResult
  system: UnitSystem
}

function drawing({ calculator, result, system }: DiagramProps): { title: string; drawn: ReactNode } | null {
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

/** The drawing that belongs to a calculator, where people would rather look than read. */
export function Diagram(props: DiagramProps) {
  const found = drawing(props)
  if (!found) return null
  return (
    <Sheet title={found.title}>
      <div className="px-4 py-3">{found.drawn}</div>
    </Sheet>
  )
}
