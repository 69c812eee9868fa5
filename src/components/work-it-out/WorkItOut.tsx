import { Calculator as CalculatorIcon, X } from 'lucide-react'
import { useId, useRef, useState } from 'react'
import { calculatorById } from '@shared/calculations/catalogue.ts'
import type { Use } from '@shared/calculations/beside.ts'
import type { CalculatorRecord } from '@shared/calculations/from-record.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { WorkPanel } from './WorkPanel.tsx'

export interface WorkItOutProps {
  /** What is worked out, in the row's own words: `Preheat, minimum`. */
  what: string
  /** Ids of calculators, the one that suits first. Nothing is shown where there is none. */
  calculators: readonly string[]
  record: CalculatorRecord
  /** Which process; null for the weld as a whole. */
  blockIndex: number | null
  system: UnitSystem
  /** What the figures come from, in words. */
  of?: 'draft' | 'coupon'
  /** Writes a result into the record; left out where a person can't write. */
  onUse?: ((use: Use, label: string) => void) | undefined
  className?: string
}

/** A calculator beside the field that needs it, filled from the record; opens in its place, so that the field stays in sight. */
export function WorkItOut({ what, calculators, className = '', ...rest }: WorkItOutProps) {
  const [open, setOpen] = useState(false)
  const opener = useRef<HTMLButtonElement>(null)
  const id = useId()
  const known = calculators.flatMap((each) => calculatorById(each) ?? [])
  if (known.length === 0) return null
  const close = () => {
    setOpen(false)
    opener.current?.focus()
  }
  return (
    <div className={`no-print ${className}`}>
      <button ref={opener} type="button" aria-expanded={open} aria-controls={id} className="inline-flex min-h-6 items-center gap-1.5 text-sm text-steel hover:underline max-sm:min-h-11" onClick={() => setOpen(!open)}>
        <CalculatorIcon size={14} aria-hidden="true" />
        Work it out<span className="sr-only"> for {what}</span>
      </button>
      {open && (
        <section id={id} aria-label={`Work it out: ${what}`} className="relative mt-1.5 border border-edge bg-paper px-3.5 py-3" onKeyDown={(event) => event.key === 'Escape' && close()}>
          <button type="button" aria-label="Close the working" className="absolute top-1.5 right-1.5 flex size-9 items-center justify-center rounded text-soft hover:text-ink" onClick={close}>
            <X size={16} aria-hidden="true" />
          </button>
          <WorkPanel what={what} calculators={known} {...rest} />
        </section>
      )}
    </div>
  )
}
