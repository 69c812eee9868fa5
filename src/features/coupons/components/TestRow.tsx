import { X } from 'lucide-react'
import { createContext, use, type ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { fieldAt } from '@shared/comparison/fields.ts'
import { NOT_STATED, textOf } from '@shared/comparison/describe.ts'
import type { CouponQualification, TestVerdict } from '@shared/schemas/assessment.ts'
import type { Quantity } from '@shared/schemas/common.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { Checkbox, Select, TextField } from '@/components/fields/text.tsx'
import { Margin } from '@/components/margin/Margin.tsx'
import { inputId, useSheet } from '@/components/variables/context.ts'
import { BASIS_SENTENCE } from '@/components/standards/words.ts'
import { standardName } from '@/components/variables/options.ts'
import { VerdictMark, worstVerdict } from '@/components/Verdict.tsx'
import { figure } from '@/lib/figures.ts'
import { VERDICT_OF, verdictsOn, type JudgedTest } from '../judged.ts'
import { NumbersField, QuantitiesField } from './ListField.tsx'
import type { TestField } from './test-fields.ts'

/** How the coupon is judged at the moment, under each of its standards. */
export const JudgedContext = createContext<readonly CouponQualification[]>([])

const WORD: Record<TestVerdict['verdict'], string> = { pass: 'Accepted', fail: 'Not accepted', 'cannot-tell': 'Cannot tell' }
const LOOK = { within: 'border-l-jade bg-sheet', outside: 'border-l-oxide bg-oxide-bg', 'cannot-tell': 'border-l-straw bg-straw-bg' } as const

/** One test's verdict in the margin: the word, the sentence with its figures, the clause; it opens to how it was reached. */
export function TestNote({ result, several = false }: { result: JudgedTest; several?: boolean }) {
  const { computed } = result
  const standard = `${standardName(result.standard)} ${result.edition}`
  const verdict = VERDICT_OF[result.verdict]
  return (
    <article aria-label={`${WORD[result.verdict]}: ${result.specimen}`} className={`margin-note border-l-[3px] px-3 py-1.5 text-sm ${LOOK[verdict]}`}>
      <header className="flex items-start justify-between gap-3">
        <p className="font-semibold">
          <VerdictMark verdict={verdict} className="mr-1.5 size-2.5 align-[-0.5px]" />
          {WORD[result.verdict]}
          {several && <span className="font-normal text-soft"> · {standardName(result.standard)}</span>}
        </p>
        <p className="font-narrow text-[0.875rem] leading-[1.125rem] font-medium whitespace-nowrap text-soft">{result.clause}</p>
      </header>
      <p className="text-pretty">{result.sentence}</p>
      {result.basis === 'memory' && <p className="mt-0.5 text-xs text-soft">{BASIS_SENTENCE.memory}</p>}
      <details className="mt-0.5">
        <summary className="w-fit cursor-pointer py-1 text-xs text-soft underline decoration-dotted underline-offset-2">How this was reached</summary>
        <div className="mt-0.5 space-y-1 text-xs leading-[1.125rem]">
          <p>
            {standard}, {result.clause}, judged from what is recorded of {result.specimen}.
          </p>
          {computed && (
            <p>
              {computed.label}: {figure(computed.value)} {computed.unit}.
            </p>
          )}
          <p className="text-soft">{BASIS_SENTENCE[result.basis]}</p>
          <p>
            <Link to={`/standards/${result.standard}`} className="text-link">
              What is checked of {standardName(result.standard)}
            </Link>
          </p>
        </div>
      </details>
    </article>
  )
}

type Test = { id: string } & Readonly<Record<string, unknown>>

export interface TestRowProps {
  /** Where the test stands in the content: `tension.0`, `visual`. */
  path: string
  fields: readonly TestField[]
  test: Test
  /** "T1", "Weld". */
  mark: string
  /** Absent where the record is only read. */
  onChange?: (part: Record<string, unknown>) => void
  onRemove?: () => void
  /** Below the fields: the openings of a bend. */
  children?: ReactNode
}

/** One test: its mark, its fields, what was computed from them, and the verdict in the margin. */
export function TestRow({ path, fields: every, test, mark, onChange, onRemove, children }: TestRowProps) {
  const { system } = useSheet()
  const judged = use(JudgedContext)
  const results = verdictsOn(judged, test.id)
  const worst = worstVerdict(results.map(({ verdict }) => VERDICT_OF[verdict]))
  const computed = results.find((result) => result.computed)?.computed
  const fields = every.filter(({ when }) => !when || when(test))
  return (
    <div id={inputId(path)} role="group" aria-label={mark} tabIndex={-1} className={`sheet-row relative border-b border-hair last:border-b-0 ${worst === 'outside' ? 'wash-outside' : worst === 'cannot-tell' ? 'wash-cannot-tell' : ''}`}>
      <div className="grid grid-cols-1 gap-x-3 px-4 sm:grid-cols-[3.25rem_minmax(0,1fr)] py-3">
        <p className="pt-0.5 font-narrow text-xl font-semibold break-words max-sm:pr-10">{mark}</p>
        <div className="min-w-0 space-y-2.5">
          <div className="flex items-start gap-2 max-sm:mt-1">
            {onChange ? (
              <div className="grid min-w-0 grow grid-cols-2 items-end gap-x-3 gap-y-2 sm:grid-cols-[repeat(auto-fill,minmax(9.25rem,1fr))]">
                {fields.map((field) => (
                  <FieldOf key={field.key} field={field} id={inputId(`${path}.${field.key}`)} mark={mark} value={test[field.key]} onChange={(next) => onChange({ [field.key]: next })} />
                ))}
              </div>
            ) : (
              <dl className="grid min-w-0 grow grid-cols-2 gap-x-3 gap-y-1.5 sm:grid-cols-[repeat(auto-fill,minmax(9.25rem,1fr))]">
                {fields
                  .filter(({ key }) => key !== 'specimen')
                  .map(({ key, label }) => (
                    <div key={key}>
                      <dt className="text-sm text-soft">{label}</dt>
                      <dd className="font-medium first-letter:uppercase">{textOf(fieldAt(`${path}.${key}`), test[key], system) ?? NOT_STATED}</dd>
                    </div>
                  ))}
              </dl>
            )}
            {onRemove && (
              <button type="button" aria-label={`Remove ${mark}`} className="flex size-9 shrink-0 items-center justify-center rounded text-soft hover:text-ink max-sm:absolute max-sm:top-2 max-sm:right-3" onClick={onRemove}>
                <X size={16} aria-hidden="true" />
              </button>
            )}
          </div>
          {children}
          {computed && (
            <p className="text-soft">
              {computed.label} <strong className="font-narrow text-xl font-semibold text-ink">{figure(computed.value)}</strong> {computed.unit}
            </p>
          )}
        </div>
      </div>
      {results.length > 0 && (
        <Margin findings={[]}>
          {results.map((result) => (
            <TestNote key={`${result.standard} ${result.sentence}`} result={result} several={judged.length > 1} />
          ))}
        </Margin>
      )}
    </div>
  )
}

/** A sentence or a row of figures takes more room than one figure. */
const LONG = 'col-span-2 sm:col-span-3'
const orNull = (text: string) => (text === '' ? null : text)
const YES_NO = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
]

function FieldOf({ field, id, mark, value, onChange }: { field: TestField; id: string; mark: string; value: unknown; onChange: (next: unknown) => void }) {
  const { system } = useSheet()
  const { label } = field
  switch (field.kind) {
    case 'quantity':
      return <QuantityField id={id} label={`${label}, ${SHOWN_UNIT[system][field.dimension]}`} dimension={field.dimension} system={system} value={value as Quantity | null} onChange={onChange} />
    case 'choice':
      return <Select id={id} label={label} options={field.options} {...(field.always ? {} : { empty: 'Not stated' })} value={(value as string | null) ?? ''} onChange={(event) => onChange(orNull(event.target.value))} />
    case 'flag':
      return <Select id={id} label={label} options={YES_NO} empty="Not stated" value={value === null || value === undefined ? '' : value ? 'yes' : 'no'} onChange={(event) => onChange(event.target.value === '' ? null : event.target.value === 'yes')} />
    case 'tick':
      return (
        <div className="flex min-h-9 items-center">
          <Checkbox id={id} label={label} checked={value === true} onChange={(event) => onChange(event.target.checked)} />
        </div>
      )
    case 'text':
      return <TextField id={id} className={field.max > 100 ? LONG : ''} label={label} maxLength={field.max} value={(value as string | null) ?? ''} error={field.key === 'specimen' && !value ? `Mark the specimen, e.g. ${mark || 'T1'}.` : null} onChange={(event) => onChange(field.key === 'specimen' ? event.target.value : orNull(event.target.value))} />
    case 'quantities':
      return <QuantitiesField id={id} className="col-span-2" label={`${label}, ${SHOWN_UNIT[system][field.dimension]}`} most={field.most} dimension={field.dimension} system={system} value={value as Quantity[]} onChange={onChange} />
    case 'numbers':
      return <NumbersField id={id} className={LONG} label={`${label}, ${field.unit}`} most={field.most} value={value as number[]} onChange={onChange} />
  }
}
