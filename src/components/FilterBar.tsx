import { Search } from 'lucide-react'
import { useRef, useState, type ReactNode } from 'react'
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
  // What the list was last told, and what was last sent: an echo of our own search must not undo newer typing.
  const [told, setTold] = useState(search)
  const [sent, setSent] = useState(search)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  if (told !== search) {
    setTold(search)
    if (search !== sent) {
      setSent(search)
      setText(search)
    }
  }
  const send = (next: string) => {
    clearTimeout(timer.current)
    setSent(next)
    onSearch(next)
  }
  const type = (next: string) => {
    setText(next)
    clearTimeout(timer.current)
    timer.current = setTimeout(() => send(next), 250)
  }
  return (
    <div role="search" aria-label={label} className="no-print mb-3 flex flex-wrap items-end gap-x-3 gap-y-2">
      <label className="relative min-w-52 grow sm:max-w-80">
        <span className="sr-only">{label}</span>
        <Search size={16} aria-hidden="true" className="absolute top-1/2 left-2.5 -translate-y-1/2 text-soft" />
        <input type="search" className="box pl-8" placeholder={label} value={text} onChange={(event) => type(event.target.value)} onKeyDown={(event) => event.key === 'Enter' && send(text)} />
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
