import { Search } from 'lucide-react'
import { useEffect, useEffectEvent, useState, type ReactNode } from 'react'
import { useDebounced } from '@/hooks/debounced.ts'
import { Button } from './Button.tsx'

export interface FilterBarProps {
  /** Name of the search box: "Find a coupon". */
  label: string
  search: string
  onSearch: (text: string) => void
  /** Selects and switches. */
  children?: ReactNode
  /** "12 of 40 procedures" */
  count?: string
  /** Given only while a filter is set. */
  onClear?: (() => void) | undefined
}

/** Search and filters over a list; the search is sent when typing rests. */
export function FilterBar({ label, search, onSearch, children, count, onClear }: FilterBarProps) {
  const [text, setText] = useState(search)
  const [given, setGiven] = useState(search)
  if (given !== search) {
    setGiven(search)
    setText(search)
  }
  const rested = useDebounced(text, 250)
  const send = useEffectEvent((next: string) => {
    if (next === text && next !== search) {
      setGiven(next)
      onSearch(next)
    }
  })
  useEffect(() => send(rested), [rested])
  return (
    <div role="search" aria-label={label} className="no-print mb-3 flex flex-wrap items-end gap-x-3 gap-y-2">
      <label className="relative min-w-52 grow sm:max-w-80">
        <span className="sr-only">{label}</span>
        <Search size={16} aria-hidden="true" className="absolute top-1/2 left-2.5 -translate-y-1/2 text-soft" />
        <input type="search" className="box pl-8" placeholder={label} value={text} onChange={(event) => setText(event.target.value)} onKeyDown={(event) => event.key === 'Enter' && onSearch(text)} />
      </label>
      {children}
      {onClear && (
        <Button kind="quiet" onClick={onClear}>
          Clear
        </Button>
      )}
      {count && (
        <p className="ml-auto self-center text-soft" role="status">
          {count}
        </p>
      )}
    </div>
  )
}
