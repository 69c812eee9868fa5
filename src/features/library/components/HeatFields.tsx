import { Controller, useWatch, type UseFormReturn } from 'react-hook-form'
import { metalFacts } from '@shared/library/filler-advice-facts.ts'
import { baseMetalById, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerById } from '@shared/library/filler-metals.ts'
import { familyOf } from '@shared/library/heat-figures.ts'
import type { WriteHeat } from '@shared/schemas/heats.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import type { Dimension } from '@shared/units/types.ts'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { Select, TextArea, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { useUnits } from '@/hooks/units.ts'
import { searchLibrary } from '@/lib/library-search.ts'
import { chemistryOptions, HEAT_KINDS } from '../heat-form.ts'
import { ChemistryEditor, USUAL } from './ChemistryEditor.tsx'

export type HeatForm = UseFormReturn<WriteHeat, unknown, WriteHeat>
const textOrNull = { setValueAs: (text: unknown) => (text === '' ? null : text) }
const SEARCH = { heat: searchLibrary('base-metals'), lot: searchLibrary('filler-metals') }

/** Whether its chemistry is one of aluminium, by its library row, else by what is entered. */
function isAluminium({ kind, libraryId, chemistry }: Pick<WriteHeat, 'kind' | 'libraryId' | 'chemistry'>): boolean {
  if (familyOf(chemistry) === 'aluminium') return true
  if (libraryId === null) return false
  if (kind === 'lot') return Math.floor((fillerById(libraryId)?.f_no ?? 0) / 10) === 2
  const row = baseMetalById(libraryId)
  return row !== null && metalFacts(toBaseMetal(row))?.family === 'aluminium'
}

/** The fields of a heat or lot, but for its files. */
export function HeatFields({ form, onUnread }: { form: HeatForm; onUnread: (unread: string[]) => void }) {
  const { errors } = form.formState
  const [kind, grade, libraryId, chemistry] = useWatch({ control: form.control, name: ['kind', 'grade', 'libraryId', 'chemistry'] })
  const words = HEAT_KINDS[kind]
  const wholeError = errors.chemistry?.message ?? errors.chemistry?.root?.message
  return (
    <>
      <Sheet id="paper" title="What the certificate says it is">
        <div className="grid gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-2 lg:grid-cols-3">
          <ComboBox
            label={words.of}
            text={grade}
            queryKey={words.library}
            load={SEARCH[kind]}
            allowOwn
            placeholder={kind === 'heat' ? 'Grade, specification or UNS' : 'Classification or specification'}
            description={grade !== '' && libraryId === null ? 'Not from the library: no procedure will offer it by its grade.' : undefined}
            error={errors.grade?.message ?? null}
            onPick={(item, text) => {
              form.setValue('grade', (item?.title ?? text).slice(0, 120), { shouldDirty: true, shouldValidate: form.formState.isSubmitted })
              form.setValue('libraryId', typeof item?.data.id === 'string' ? item.data.id : null, { shouldDirty: true })
            }}
          />
          <TextField label={words.number} maxLength={60} error={errors.number?.message} {...form.register('number')} />
          <TextField label="Certificate number" optional maxLength={120} error={errors.certificate?.message} {...form.register('certificate', textOrNull)} />
          <TextField label="Certificate type" optional maxLength={20} placeholder="e.g. 3.1" description="As the paper names it, EN 10204." error={errors.certificateType?.message} {...form.register('certificateType', textOrNull)} />
          <TextField label="Received on" optional type="date" error={errors.receivedOn?.message} {...form.register('receivedOn', textOrNull)} />
          <Figure form={form} name={kind === 'lot' ? 'diameter' : 'thickness'} label={kind === 'lot' ? 'Size' : 'Thickness'} dimension="length" />
          {kind === 'heat' && <Figure form={form} name="diameter" label="Diameter, of a pipe or bar" dimension="length" />}
          <Figure form={form} name="tensile" label="Tensile strength" dimension="stress" />
          <Figure form={form} name="yield" label="Yield strength" dimension="stress" />
          <Figure form={form} name="elongation" label="Elongation" dimension="percent" />
          <TextArea className="sm:col-span-2 lg:col-span-3" label="Notes" optional rows={2} maxLength={2000} error={errors.notes?.message} {...form.register('notes', textOrNull)} />
        </div>
      </Sheet>
      <Sheet id="chemistry" title="Chemistry" aside="mass per cent" className="mt-4">
        <div className="space-y-4 px-4 py-4">
          <Select className="max-w-60" label="Analysis of" empty="Not stated" options={chemistryOptions(kind)} {...form.register('chemistryOf', textOrNull)} />
          <Controller control={form.control} name="chemistry" render={({ field }) => <ChemistryEditor value={field.value} onChange={field.onChange} usual={isAluminium({ kind, libraryId, chemistry }) ? USUAL.aluminium : USUAL.steel} onUnread={onUnread} error={wholeError} />} />
        </div>
      </Sheet>
    </>
  )
}

/** A measured value of the certificate. */
function Figure({ form, name, label, dimension }: { form: HeatForm; name: 'thickness' | 'diameter' | 'tensile' | 'yield' | 'elongation'; label: string; dimension: Dimension }) {
  const { system } = useUnits()
  return <Controller control={form.control} name={name} render={({ field }) => <QuantityField label={`${label}, ${SHOWN_UNIT[system][dimension]}`} optional dimension={dimension} system={system} value={field.value} onChange={field.onChange} error={form.formState.errors[name]?.message ?? null} />} />
}
