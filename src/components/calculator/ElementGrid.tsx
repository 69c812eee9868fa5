import type { CalculatorInput } from '@shared/calculations/catalogue.ts'
import { useDebounced } from '@/hooks/debounced.ts'

export interface ElementInput {
  key: string
  input: CalculatorInput
  /** `Cr` */
  symbol: string
}

export interface ElementGridProps {
  legend: string
  elements: readonly ElementInput[]
  texts: Readonly<Record<string, string>>
  onChange: (key: string, text: string) => void
  problems: ReadonlyMap<string, string>
  idOf: (key: string) => string
  note?: string | null
}

/** A composition in mass per cent: one small box an element, in the order of a certificate. An empty box is an element that is not reported. */
export function ElementGrid({ legend, elements, texts, onChange, problems, idOf, note }: ElementGridProps) {
  const wrong = elements.filter(({ key }) => problems.has(key))
  const message = useDebounced(wrong.map(({ key }) => problems.get(key)).join('\n'), 700)
  return (
    <fieldset className="min-w-0">
      <legend className="mb-1 font-medium">
        {legend} <span className="font-normal text-soft">mass %</span>
      </legend>
      <div className="grid grid-cols-[repeat(auto-fill,minmax(4.25rem,1fr))] gap-2">
        {elements.map(({ key, input, symbol }) => (
          <div key={key} className="relative">
            <label htmlFor={idOf(key)} className="pointer-events-none absolute top-1 left-2 font-narrow text-sm font-medium text-soft">
              <span aria-hidden="true">{symbol}</span>
              <span className="sr-only">{input.label}, %</span>
            </label>
            <input
              id={idOf(key)}
              className="box pt-5! pb-1! text-right"
              inputMode="decimal"
              autoComplete="off"
              placeholder="–"
              aria-invalid={problems.has(key) || undefined}
              aria-describedby={problems.has(key) ? `${idOf(key)}-said` : undefined}
              value={texts[key] ?? ''}
              onChange={(event) => onChange(key, event.target.value)}
            />
          </div>
        ))}
      </div>
      {wrong.map(({ key }) => (
        <p key={key} id={`${idOf(key)}-said`} className={message.includes(problems.get(key) ?? '\n\n') ? 'mt-1 text-sm font-medium text-oxide' : 'sr-only'}>
          {problems.get(key)}
        </p>
      ))}
      {note && <p className="mt-1 text-sm text-soft">{note}</p>}
    </fieldset>
  )
}
