import { useId, useState, type ClipboardEvent, type KeyboardEvent } from 'react'

export interface GridCellProps {
  /** Row and column, e.g. `2.5`; unique in its grid. */
  at: string
  label: string
  text: string
  /** Keeps the text as a value; gives what is wrong with it, if it can't. */
  write: (text: string) => string | null
  onKey: (event: KeyboardEvent<HTMLElement>) => void
  onPaste?: (event: ClipboardEvent) => void
  className?: string
  inputMode?: 'text' | 'numeric'
}

/** A cell of a grid that is typed in: read when it is left; what can't be read stays, with the reason under it. */
export function GridCell({ at, label, text, write, onKey, onPaste, className = '', inputMode }: GridCellProps) {
  const id = useId()
  const [typed, setTyped] = useState(text)
  const [seen, setSeen] = useState(text)
  const [wrong, setWrong] = useState<string | null>(null)
  if (seen !== text) {
    setSeen(text)
    setTyped(text)
    setWrong(null)
  }
  return (
    <div className="relative">
      <input
        data-cell={at}
        aria-label={label}
        aria-invalid={wrong ? true : undefined}
        aria-describedby={wrong ? `${id}-wrong` : undefined}
        autoComplete="off"
        inputMode={inputMode}
        className={`box ${className}`}
        value={typed}
        onFocus={(event) => event.target.select()}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={() => setWrong(typed === text ? null : write(typed))}
        onKeyDown={onKey}
        onPaste={onPaste}
      />
      {wrong && (
        <p id={`${id}-wrong`} className="absolute top-full left-0 z-10 -mt-1 w-60 border-l-[3px] border-l-oxide bg-oxide-bg px-2 py-1 text-sm">
          {wrong}
        </p>
      )}
    </div>
  )
}
