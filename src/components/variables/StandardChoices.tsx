import { Plus, X } from 'lucide-react'
import type { StandardChoice } from '@shared/schemas/common.ts'
import { Button } from '@/components/Button.tsx'
import { Select } from '@/components/fields/text.tsx'
import { inputId, useSheet, useSheetField } from './context.ts'
import { freshChoice, hasLevels, LEVELS, ROUTE_OPTIONS, standardName, STANDARDS } from './options.ts'
import type { RecordKind } from './row-spec.ts'

export interface ChoiceFieldsProps {
  choice: StandardChoice
  onChange: (choice: StandardChoice) => void
  /** A coupon is always a test, so the route is asked of a procedure alone. */
  record: RecordKind
  /** Standards that the record names already beside this one. */
  taken?: readonly StandardChoice[]
  /** Which of several, where a row already shows what they are: the labels are kept for readers. */
  place?: number
  id?: string
}

/** One standard with its edition and, where the standard has them, the level and the route. */
export function ChoiceFields({ choice, onChange, record, taken = [], place, id }: ChoiceFieldsProps) {
  const known = STANDARDS.find(({ id: one }) => one === choice.standard)
  const name = standardName(choice.standard)
  const editions = known?.editions ?? []
  const hidden = place !== undefined
  const label = (text: string) => (hidden ? `${text} of ${name}` : text)
  const free = STANDARDS.filter(({ id: one }) => one === choice.standard || !taken.some(({ standard }) => standard === one))
  return (
    <>
      <Select
        id={id}
        className="min-w-40"
        label={hidden ? `Standard ${place + 1}` : 'Standard'}
        labelHidden={hidden}
        options={[...(known ? [] : [{ value: choice.standard, label: name }]), ...free.map((one) => ({ value: one.id, label: one.label }))]}
        value={choice.standard}
        onChange={(event) => {
          const next = STANDARDS.find(({ id: one }) => one === event.target.value)
          if (next) onChange(freshChoice(next.id))
        }}
      />
      <Select
        className="min-w-24"
        label={label('Edition')}
        labelHidden={hidden}
        options={editions.some(({ value }) => value === choice.edition) ? editions : [...editions, { value: choice.edition, label: choice.edition }]}
        value={choice.edition}
        onChange={(event) => onChange({ ...choice, edition: event.target.value })}
      />
      {hasLevels(choice.standard) && <Select className="min-w-28" label={label('Level')} labelHidden={hidden} options={LEVELS} value={choice.level ?? '2'} onChange={(event) => onChange({ ...choice, level: event.target.value === '1' ? '1' : '2' })} />}
      {record === 'procedure' && (known?.routes.length ?? 0) > 1 && (
        <Select className="min-w-36" label={hidden ? `How ${name} supports it` : 'Supported'} labelHidden={hidden} options={ROUTE_OPTIONS} value={choice.route ?? 'test'} onChange={(event) => onChange({ ...choice, route: event.target.value === 'prequalified' ? 'prequalified' : 'test' })} />
      )}
    </>
  )
}

/** The standards by which the record is judged; one kept before its rules were there stays and is named. */
export function StandardChoices() {
  const { record = 'procedure' } = useSheet()
  const { value, set, error } = useSheetField<StandardChoice[]>('variables.standards')
  const free = STANDARDS.find(({ id }) => !value.some(({ standard }) => standard === id))
  return (
    <div className="space-y-2">
      {value.map((choice, index) => (
        <div key={choice.standard} className="flex flex-wrap items-center gap-2">
          <ChoiceFields id={index === 0 ? inputId('standards') : undefined} choice={choice} record={record} taken={value} place={index} onChange={(next) => set(value.map((one, at) => (at === index ? next : one)))} />
          {value.length > 1 && (
            <button type="button" aria-label={`Remove ${standardName(choice.standard)}`} className="flex size-8 items-center justify-center rounded text-soft hover:text-ink" onClick={() => set(value.filter((_, at) => at !== index))}>
              <X size={15} aria-hidden="true" />
            </button>
          )}
        </div>
      ))}
      {free && value.length < 5 && (
        <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => set([...value, freshChoice(free.id)])}>
          Standard
        </Button>
      )}
      {error && <p className="text-sm font-medium text-oxide">{error}</p>}
    </div>
  )
}
