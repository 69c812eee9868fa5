import type { ReactNode } from 'react'
import type { Calculator } from '@shared/calculations/catalogue.ts'
import type { InputTexts } from '@shared/calculations/calculator-texts.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { partedInputs, type ElementGroup } from './element-groups.ts'
import { ElementGrid } from './ElementGrid.tsx'
import { FigureField } from './FigureField.tsx'

export interface InputsFormProps {
  calculator: Calculator
  texts: InputTexts
  onChange: (changes: Record<string, string>) => void
  system: UnitSystem
  problems: ReadonlyMap<string, string>
  /** Put before each field's id, so that two calculators may stand on one page. */
  idBase: string
  /** What is said of an input beside its own help: where its figure came from. */
  noteOf?: (key: string) => ReactNode
  /** Under each composition, e.g. a box to paste a certificate into. */
  underGroup?: (group: ElementGroup) => ReactNode
  /** Narrower columns, for a panel inside a row. */
  dense?: boolean
}

/** Every input of a calculator: figures with their units, then compositions as grids of elements. */
export function InputsForm({ calculator, texts, onChange, system, problems, idBase, noteOf, underGroup, dense = false }: InputsFormProps) {
  const { plain, groups } = partedInputs(calculator)
  const idOf = (key: string) => `${idBase}-${key}`
  return (
    <div className="space-y-4">
      {plain.length > 0 && (
        <div className={`grid items-start gap-x-4 gap-y-3 ${dense ? 'grid-cols-[repeat(auto-fill,minmax(min(100%,11rem),1fr))]' : 'grid-cols-[repeat(auto-fill,minmax(min(100%,14rem),1fr))]'}`}>
          {plain.map(([key, input]) => (
            <FigureField key={key} id={idOf(key)} input={input} value={texts[key] ?? ''} onChange={(text) => onChange({ [key]: text })} system={system} problem={problems.get(key) ?? null} note={noteOf?.(key)} />
          ))}
        </div>
      )}
      {groups.map((group) => (
        <div key={group.letter}>
          <ElementGrid legend={group.legend} elements={group.elements} texts={texts} onChange={(key, text) => onChange({ [key]: text })} problems={problems} idOf={idOf} />
          {underGroup?.(group)}
        </div>
      ))}
    </div>
  )
}
