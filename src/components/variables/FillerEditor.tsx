import { fillerSchema, type Filler, type Process } from '@shared/schemas/welding.ts'
import { toFiller } from '@shared/library/filler-metals.ts'
import { fillerAdvice } from '@shared/library/filler-advice.ts'
import { FoldedAdvice } from '@/components/advice/Advice.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { Checkbox } from '@/components/fields/text.tsx'
import { call } from '@/lib/api.ts'
import { subtitleOf } from '@/lib/library-search.ts'
import { inputId, useSheet, useSheetField } from './context.ts'
import { fillerInWords } from './labels.ts'
import { useOwnRows } from './own-rows.ts'

const loader = (process: Process | null) => async (text: string, signal: AbortSignal) => {
  const page = await call('listLibrary', { params: { kind: 'filler-metals' }, query: { q: text || undefined, limit: 20, ...(process && process !== 'OTHER' ? { process } : {}) }, signal })
  return page.items.map((item) => ({ id: item.id, title: item.title, subtitle: subtitleOf(item), data: item.content }))
}

/** The filler metal: from the library with its numbers, written as it is called, or none (autogenous). Sizes and lot of the record stay. */
export function FillerEditor({ path, label, process }: { path: string; label: string; process: Process | null }) {
  const { value, set, error } = useSheetField<Filler>(`variables.${path}`)
  const { baseMetals, serviceTemperature } = useSheet().content.variables
  const library = useOwnRows(baseMetals.a, baseMetals.b, value)
  const advice = fillerAdvice({ ...baseMetals, filler: value, process, serviceTemperature: serviceTemperature?.si ?? null, library })
  const kept = { diameters: value.diameters, tradeName: value.tradeName, lot: value.lot, fluxTradeName: value.fluxTradeName }
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-1.5">
      {value.added !== false && (
        <ComboBox
          id={inputId(path)}
          className="min-w-60 grow basis-60"
          label={label}
          labelHidden
          text={value.classification ?? ''}
          queryKey={`filler-metals ${process ?? ''}`}
          load={loader(process)}
          allowOwn
          placeholder="Classification, specification or F-Number"
          error={error}
          onPick={(item, text) => set(item ? { ...toFiller(item.data), ...kept } : fillerSchema.parse({ ...kept, added: true, classification: text === '' ? null : text.slice(0, 60) }))}
        />
      )}
      {value.added !== false && <p className="min-w-0 grow basis-40 text-sm text-soft">{value.libraryId === null && value.classification && !value.fNumber ? 'Not from the library: state its numbers below.' : (value.specification ?? '')}</p>}
      <Checkbox label="No filler (autogenous)" checked={value.added === false} onChange={(event) => set(event.target.checked ? fillerSchema.parse({ added: false }) : fillerSchema.parse({ added: true }))} />
      <span className="sr-only">{fillerInWords(value)}</span>
      <FoldedAdvice advice={advice} />
    </div>
  )
}
