import { useQuery } from '@tanstack/react-query'
import { ChevronDown } from 'lucide-react'
import { useContext, useState } from 'react'
import { Button as AriaButton, ComboBox as AriaComboBox, ComboBoxStateContext, FieldError as AriaFieldError, Input, Label, ListBox, ListBoxItem, Popover, Text } from 'react-aria-components'
import { useDebounced } from '@/hooks/debounced.ts'
import type { FieldProps } from './Field.tsx'

export interface ComboItem<T> {
  id: string
  title: string
  /** Second line: what tells two alike apart. */
  subtitle?: string
  data: T
}

export interface ComboBoxProps<T> extends FieldProps {
  /** Text in the box; what was picked, or typed. */
  text: string
  /** Called with the picked item, and with null and the text when somebody types their own (only with `allowOwn`) or clears the box. */
  onPick: (item: ComboItem<T> | null, text: string) => void
  /** Finds items for a text; cached by `queryKey` and the text. */
  load: (text: string, signal: AbortSignal) => Promise<ComboItem<T>[]>
  queryKey: string
  /** A text that is in no list is kept as typed. */
  allowOwn?: boolean
  disabled?: boolean
  placeholder?: string
  id?: string
}

/** Type-ahead over something that the server searches. Arrow keys and Enter pick; Esc closes and keeps what was typed. */
export function ComboBox<T>({ label, labelHidden = false, description, error, optional, className = '', text, onPick, load, queryKey, allowOwn = false, disabled, placeholder, id }: ComboBoxProps<T>) {
  const [typed, setTyped] = useState(text)
  const [given, setGiven] = useState(text)
  // The list closes by itself only when the picked key changes, so it is kept until the text does.
  const [picked, setPicked] = useState<string | null>(null)
  const [open, setOpen] = useState(false)
  if (given !== text) {
    setGiven(text)
    setTyped(text)
    if (!open) setPicked(null)
  }
  const asked = useDebounced(typed.trim(), 150)
  const found = useQuery({ queryKey: ['combo', queryKey, asked], queryFn: ({ signal }) => load(asked, signal), enabled: open, staleTime: 60_000 })
  // Only what answers the text as it stands: a fast "304, down, Enter" must never pick from the list before.
  const current = asked === typed.trim()
  const items = (current ? found.data : undefined) ?? []
  const leave = () => {
    if (typed === text) return
    if (typed.trim() === '') onPick(null, '')
    else if (allowOwn) onPick(null, typed.trim())
    else setTyped(text)
  }
  return (
    <AriaComboBox
      className={`min-w-0 ${className}`}
      inputValue={typed}
      onInputChange={(next) => {
        setTyped(next)
        setPicked(null)
      }}
      onOpenChange={setOpen}
      value={picked}
      onChange={(key) => {
        const item = items.find((one) => one.id === key)
        setPicked(item?.id ?? null)
        if (!item) return
        setTyped(item.title)
        onPick(item, item.title)
      }}
      items={items}
      isDisabled={disabled}
      isInvalid={Boolean(error)}
      allowsCustomValue
      allowsEmptyCollection
      menuTrigger="manual"
      onBlur={leave}
    >
      <Label className={labelHidden ? 'sr-only' : 'mb-1 block font-medium'}>
        {label}
        {optional && <span className="font-normal text-soft"> (optional)</span>}
      </Label>
      <div className="relative">
        <Typed id={id} placeholder={placeholder} />
        <AriaButton aria-label={`Show the list for ${label}`} className="absolute inset-y-0 right-0 flex w-8 items-center justify-center text-soft">
          <ChevronDown size={16} aria-hidden="true" />
        </AriaButton>
      </div>
      {description && (
        <Text slot="description" className="mt-1 block text-sm text-soft">
          {description}
        </Text>
      )}
      <AriaFieldError className="mt-1 block text-sm font-medium text-oxide">{error}</AriaFieldError>
      <Popover className="max-h-80 w-(--trigger-width) min-w-72 overflow-auto border border-ink bg-sheet text-ink" offset={2}>
        <ListBox
          className="outline-none"
          renderEmptyState={() => (
            <p className="px-3 py-2 text-soft">{found.isError ? 'The list could not be read. Try again in a moment.' : found.isFetching || !current ? 'Looking…' : typed.trim() ? `Nothing is called “${typed.trim()}”.${allowOwn ? ' It is kept as you typed it.' : ''}` : 'Type to search.'}</p>
          )}
        >
          {(item: ComboItem<T>) => (
            <ListBoxItem id={item.id} textValue={item.title} className="cursor-pointer border-b border-hair px-3 py-1.5 outline-none last:border-b-0 data-[focused]:bg-ink data-[focused]:text-paper [&[data-focused]_.text-soft]:text-inherit">
              <span className="block font-medium">{item.title}</span>
              {item.subtitle && <span className="block text-sm text-soft">{item.subtitle}</span>}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </AriaComboBox>
  )
}

/** Typing opens the list; a text that was put in by picking does not open it anew. */
function Typed({ id, placeholder }: { id?: string; placeholder?: string }) {
  const state = useContext(ComboBoxStateContext)
  return <Input id={id} className="box pr-9" placeholder={placeholder} onInput={() => state?.open(null, 'input')} />
}
