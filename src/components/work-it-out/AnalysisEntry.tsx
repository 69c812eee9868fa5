import { carbonEquivalent } from '@shared/calculations/carbon-equivalent.ts'
import { calculatorById } from '@shared/calculations/catalogue.ts'
import type { Chemistry } from '@shared/calculations/chemistry.ts'
import { partedInputs } from '@/components/calculator/element-groups.ts'
import { ElementGrid } from '@/components/calculator/ElementGrid.tsx'
import { problemsByInput } from '@/components/calculator/figures.ts'
import { PasteBox } from '@/components/calculator/PasteBox.tsx'

const source = calculatorById('carbon-equivalents')
const group = source ? partedInputs(source).groups[0] : undefined

/** An analysis typed as texts, read; null while nothing is typed or a figure in it can't be. */
export function readAnalysis(texts: Readonly<Record<string, string>>): Chemistry | null {
  if (!source || Object.values(texts).every((text) => text.trim() === '')) return null
  const { inputs } = source.run(texts)
  return inputs && carbonEquivalent('ceIiw', inputs).value !== null ? inputs : null
}

export interface AnalysisEntryProps {
  texts: Readonly<Record<string, string>>
  onChange: (changes: Record<string, string>) => void
  idBase: string
}

/** The certificate's analysis of the steel, for the equivalents that a calculation asks; typed or pasted where no heat is kept. */
export function AnalysisEntry({ texts, onChange, idBase }: AnalysisEntryProps) {
  if (!source || !group) return null
  const problems = problemsByInput(source.run(texts))
  return (
    <details className="border-t border-rule pt-2">
      <summary className="cursor-pointer py-1 font-medium">Work out the carbon equivalent from an analysis</summary>
      <div className="mt-1">
        <ElementGrid legend="Analysis of the steel" elements={group.elements} texts={texts} onChange={(key, text) => onChange({ [key]: text })} problems={problems} idOf={(key) => `${idBase}-analysis-${key}`} />
        <PasteBox group={{ legend: 'Analysis of the steel', elements: group.elements }} onChange={onChange} />
      </div>
    </details>
  )
}
