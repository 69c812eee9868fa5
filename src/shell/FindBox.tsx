import { useRef, useState, type FormEvent } from 'react'
import { useNavigate } from 'react-router-dom'
import { useHotkey } from '@/hooks/keys.ts'

/** The box on the bar: a joint in words leads to the procedures that fit it. `/` puts the cursor in. */
export function FindBox({ className = '' }: { className?: string }) {
  const navigate = useNavigate()
  const input = useRef<HTMLInputElement>(null)
  const [line, setLine] = useState('')
  useHotkey('/', () => input.current?.focus())
  const find = (event: FormEvent) => {
    event.preventDefault()
    const asked = line.trim()
    void navigate(asked ? `/look-up?line=${encodeURIComponent(asked)}` : '/look-up')
  }
  return (
    <form role="search" aria-label="Find a procedure" className={`relative ${className}`} onSubmit={find}>
      <input
        ref={input}
        aria-label="Find a procedure for a joint"
        placeholder="Find a procedure for a joint…"
        aria-keyshortcuts="/"
        autoComplete="off"
        maxLength={200}
        value={line}
        onChange={(event) => setLine(event.target.value)}
        onKeyDown={(event) => event.key === 'Escape' && input.current?.blur()}
        className="h-9 w-full rounded border border-transparent bg-bar-raised pr-8 pl-3 text-bar-text placeholder:text-bar-soft"
      />
      <kbd aria-hidden="true" className="pointer-events-none absolute inset-y-0 right-3 flex items-center font-sans text-bar-soft">
        /
      </kbd>
    </form>
  )
}
