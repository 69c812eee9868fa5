import { baseMetalSchema, type BaseMetal } from '@shared/schemas/welding.ts'
import { toBaseMetal } from '@shared/library/base-metals.ts'
import { Button } from '@/components/Button.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { searchLibrary } from '@/lib/library-search.ts'
import { same } from '@/lib/draft/paths.ts'
import { inputId, useSheet, useSheetField } from './context.ts'
import { metalInWords } from './labels.ts'

const search = searchLibrary('base-metals')

/** What the library says of a metal beyond its name. */
export function metalFacts(metal: BaseMetal): string {
  const group = metal.pNumber && `P-${metal.pNumber}${metal.groupNumber === null ? '' : ` Group ${metal.groupNumber}`}`
  return [metal.productForm, group, metal.iso15608 && `ISO 15608 ${metal.iso15608}`, metal.uns].filter(Boolean).join(' · ')
}

/** One base metal: picked from the library, whose row is copied into the record, or written as it is called. */
export function MetalEditor({ path, label }: { path: string; label: string }) {
  const { content } = useSheet()
  const { value, set, error } = useSheetField<BaseMetal>(`variables.${path}`)
  const other = path.endsWith('.b') ? content.variables.baseMetals.a : null
  const own = value.libraryId === null && metalInWords(value) !== '' && !value.pNumber && !value.iso15608
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-1.5">
      <ComboBox
        id={inputId(path)}
        className="min-w-60 grow basis-60"
        label={label}
        labelHidden
        text={metalInWords(value)}
        queryKey="base-metals"
        load={search}
        allowOwn
        placeholder="Grade, specification, UNS or P-Number"
        error={error}
        onPick={(item, text) => set(item ? toBaseMetal(item.data) : baseMetalSchema.parse({ specification: text === '' ? null : text.slice(0, 80) }))}
      />
      <p className="min-w-0 grow basis-56 text-sm text-soft">{own ? 'Not from the library: state its P-Number or group below.' : metalFacts(value)}</p>
      {other && metalInWords(other) !== '' && !same(other, value) && (
        <Button kind="quiet" onClick={() => set(structuredClone(other))}>
          Same as A
        </Button>
      )}
    </div>
  )
}
