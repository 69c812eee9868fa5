import { Plus, X } from 'lucide-react'
import type { StandardChoice } from '@shared/schemas/common.ts'
import { Button } from '@/components/Button.tsx'
import { Select, TextArea, TextField } from '@/components/fields/text.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { WRITTEN_IN, TOUGHNESS } from '@/components/variables/catalogue.ts'
import { useSheet, useSheetField } from '@/components/variables/context.ts'
import { standardName, STANDARDS } from '@/components/variables/options.ts'
import { SheetField } from '@/components/variables/SheetField.tsx'
import { useProcedureContent } from './procedure-content.ts'

const orNull = (text: string) => (text === '' ? null : text)

/** What the procedure is for and by which standards it is judged. */
export function ScopeSheet() {
  const { control } = useSheet()
  const content = useProcedureContent()
  const { standards } = content.variables
  return (
    <Sheet id="scope" title="Scope" aside={standards.map(({ standard, edition }) => `${standardName(standard)} ${edition}`).join(', ')}>
      <SheetRow label="Title">{control ? <Title /> : <p className="font-medium">{content.title}</p>}</SheetRow>
      {(control || content.scope) && <SheetRow label="Scope">{control ? <Text name="scope" label="Scope" max={1000} example="Groove welds in carbon steel vessels, shop and site" /> : <p className="max-w-prose whitespace-pre-line">{content.scope}</p>}</SheetRow>}
      <SheetRow label="Standards" unit="judged by each">
        {control ? <Standards /> : <p className="font-medium">{standards.map(({ standard, edition, level }) => `${standardName(standard)} ${edition}${level ? ` level ${level}` : ''}`).join(', ')}</p>}
      </SheetRow>
      <SheetField spec={WRITTEN_IN} />
      <SheetField spec={TOUGHNESS} />
    </Sheet>
  )
}

function Title() {
  const { value, set, error, onBlur } = useSheetField<string>('title')
  return <TextField label="Title" labelHidden maxLength={160} value={value} onChange={(event) => set(event.target.value)} onBlur={onBlur} error={error} />
}

/** A text of the record itself rather than of the weld. */
export function Text({ name, label, max, example, rows = 2 }: { name: 'scope' | 'notes'; label: string; max: number; example?: string; rows?: number }) {
  const { value, set, error, onBlur } = useSheetField<string | null>(name)
  return <TextArea label={label} labelHidden rows={rows} maxLength={max} placeholder={example && `e.g. ${example}`} value={value ?? ''} onChange={(event) => set(orNull(event.target.value))} onBlur={onBlur} error={error} />
}

/** The standards whose rules the program keeps; one kept before its rules were there stays and is named. */
function Standards() {
  const { value, set, error } = useSheetField<StandardChoice[]>('variables.standards')
  const free = STANDARDS.find(({ id }) => !value.some(({ standard }) => standard === id))
  const change = (index: number, next: StandardChoice) => set(value.map((one, at) => (at === index ? next : one)))
  return (
    <div className="space-y-2">
      {value.map((choice, index) => {
        const known = STANDARDS.find(({ id }) => id === choice.standard)
        const editions = known?.editions ?? []
        const options = editions.some((edition) => edition.value === choice.edition) ? editions : [...editions, { value: choice.edition, label: choice.edition }]
        return (
          <div key={choice.standard} className="flex flex-wrap items-center gap-2">
            <Select
              className="min-w-40"
              label={`Standard ${index + 1}`}
              labelHidden
              options={[...(known ? [] : [{ value: choice.standard, label: standardName(choice.standard) }]), ...STANDARDS.filter(({ id }) => id === choice.standard || !value.some(({ standard }) => standard === id)).map(({ id, label }) => ({ value: id, label }))]}
              value={choice.standard}
              onChange={(event) => {
                const next = STANDARDS.find(({ id }) => id === event.target.value)
                if (next) change(index, { standard: next.id, edition: next.editions.at(-1)?.value ?? '', level: null })
              }}
            />
            <Select className="min-w-24" label={`Edition of ${standardName(choice.standard)}`} labelHidden options={options} value={choice.edition} onChange={(event) => change(index, { ...choice, edition: event.target.value })} />
            {value.length > 1 && (
              <button type="button" aria-label={`Remove ${standardName(choice.standard)}`} className="flex size-8 items-center justify-center rounded text-soft hover:text-ink" onClick={() => set(value.filter((_, at) => at !== index))}>
                <X size={15} aria-hidden="true" />
              </button>
            )}
          </div>
        )
      })}
      {free && value.length < 5 && (
        <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => set([...value, { standard: free.id, edition: free.editions.at(-1)?.value ?? '', level: null }])}>
          Standard
        </Button>
      )}
      {error && <p className="text-sm font-medium text-oxide">{error}</p>}
    </div>
  )
}
