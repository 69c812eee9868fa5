import { useId, useState, type ClipboardEvent } from 'react'
import { pasteChemistry, printChemistry, type Unread } from '@shared/library/paste-chemistry.ts'
import { chemistrySchema, ELEMENTS, type Chemistry, type Element } from '@shared/schemas/heats.ts'
import { Button } from '@/components/Button.tsx'
import { FieldError } from '@/components/fields/Field.tsx'

export const USUAL = {
  steel: ['C', 'Si', 'Mn', 'P', 'S', 'Cr', 'Mo', 'Ni', 'Cu', 'V', 'Nb', 'Ti', 'Al', 'N', 'B'],
  aluminium: ['Si', 'Fe', 'Cu', 'Mn', 'Mg', 'Cr', 'Zn', 'Ti', 'Zr', 'Be'],
} as const satisfies Record<string, readonly Element[]>

export interface ChemistryEditorProps {
  value: Chemistry
  onChange: (value: Chemistry) => void
  /** Elements that always have a cell. */
  usual: readonly Element[]
  /** Texts of cells that are no figure: the form must not be saved with them. */
  onUnread: (unread: string[]) => void
  /** What the server or the schema says of the whole. */
  error?: string | undefined
}

type Texts = Partial<Record<Element, string>>
const textsOf = (chemistry: Chemistry): Texts => Object.fromEntries(chemistry.map((row) => [row.element, printChemistry([row]).slice(row.element.length + 1)]))
const keyOf = (chemistry: Chemistry): string => printChemistry(chemistry)

/** A cell as a share, or why it is none. */
function readCell(element: Element, text: string): { row: Chemistry[number] | null; why: string | null } {
  if (text.trim() === '') return { row: null, why: null }
  const { rows, unread } = pasteChemistry(`${element} ${text}`)
  const [row] = rows
  if (row && rows.length === 1 && unread.length === 0) return { row, why: null }
  return { row: null, why: unread[0]?.why ?? `“${text}” is no figure for ${element}.` }
}

/** A chemistry cell by cell, or pasted as the certificate has it: into any cell, or into the box below. */
export function ChemistryEditor({ value, onChange, usual, onUnread, error }: ChemistryEditorProps) {
  const id = useId()
  const [texts, setTexts] = useState<Texts>(() => textsOf(value))
  const [seen, setSeen] = useState(() => keyOf(value))
  const [pasted, setPasted] = useState('')
  const [left, setLeft] = useState<Unread[]>([])
  if (seen !== keyOf(value)) {
    // From elsewhere: the other's version was taken, or the form was begun anew.
    setSeen(keyOf(value))
    setTexts(textsOf(value))
  }
  const shown = ELEMENTS.filter((element) => usual.includes(element) || texts[element] !== undefined)
  const order = [...usual, ...shown.filter((element) => !usual.includes(element))]
  const put = (next: Texts) => {
    setTexts(next)
    const cells = ELEMENTS.flatMap((element) => (next[element] === undefined ? [] : [{ element, text: next[element], ...readCell(element, next[element]) }]))
    const rows = cells.flatMap(({ row }) => (row ? [row] : []))
    onUnread(cells.flatMap(({ element, text, why }) => (why === null ? [] : [`${element} ${text}`])))
    setSeen(keyOf(rows))
    onChange(rows)
  }
  const take = (text: string) => {
    const { rows, unread } = pasteChemistry(text)
    setLeft(unread)
    // What could not be read stays in the box, so that nothing is lost.
    setPasted(unread.map((one) => one.text).join('\n'))
    if (rows.length > 0) put({ ...texts, ...textsOf(rows) })
  }
  const pasteInto = (event: ClipboardEvent) => {
    const text = event.clipboardData.getData('text')
    if (pasteChemistry(text).rows.length < 2) return
    event.preventDefault()
    take(text)
  }
  const whole = chemistrySchema.safeParse(value)
  const sum = value.reduce((total, { percent }) => total + percent, 0)
  const told = error ?? (whole.success ? undefined : whole.error.issues[0]?.message)
  const more = ELEMENTS.filter((element) => !order.includes(element))
  return (
    <div className="space-y-4">
      <div role="group" aria-label="Chemistry in mass per cent" aria-describedby={told ? `${id}-sum` : undefined} className="grid grid-cols-3 gap-x-3 gap-y-2.5 sm:grid-cols-5 lg:grid-cols-8">
        {order.map((element) => {
          const text = texts[element] ?? ''
          const { why } = readCell(element, text)
          return (
            <div key={element} className="min-w-0">
              <label htmlFor={`${id}-${element}`} className="mb-0.5 block text-sm font-medium">
                {element} <span className="font-normal text-soft">%</span>
              </label>
              <input id={`${id}-${element}`} className="box" inputMode="decimal" autoComplete="off" value={text} aria-invalid={why ? true : undefined} aria-describedby={why ? `${id}-${element}-error` : undefined} onPaste={pasteInto} onChange={(event) => put({ ...texts, [element]: event.target.value })} />
              <FieldError id={`${id}-${element}-error`} error={why} />
            </div>
          )
        })}
        {more.length > 0 && (
          <div className="min-w-0">
            <label htmlFor={`${id}-more`} className="mb-0.5 block text-sm font-medium">
              Another
            </label>
            <select id={`${id}-more`} className="box pr-7" value="" onChange={(event) => setTexts({ ...texts, [event.target.value]: '' })}>
              <option value="">…</option>
              {more.map((element) => (
                <option key={element}>{element}</option>
              ))}
            </select>
          </div>
        )}
      </div>
      <div>
        <p className={told ? 'hidden' : 'text-soft'}>{value.length === 0 ? 'Nothing is entered yet. What is left empty counts as not reported.' : `${Number(sum.toFixed(4))} % in ${value.length} ${value.length === 1 ? 'element' : 'elements'}; the rest is not reported.`}</p>
        <FieldError id={`${id}-sum`} error={told} />
      </div>
      <div>
        <label htmlFor={`${id}-paste`} className="mb-1 block font-medium">
          Paste from the certificate
        </label>
        <textarea
          id={`${id}-paste`}
          rows={2}
          className="box resize-y"
          placeholder="C 0.12 Mn 1.35 P <0.005, or a head of elements over a row of figures"
          value={pasted}
          aria-describedby={left.length > 0 ? `${id}-left` : undefined}
          onPaste={pasteInto}
          onChange={(event) => setPasted(event.target.value)}
        />
        <div className="mt-2 flex flex-wrap items-center gap-x-4 gap-y-1">
          <Button disabled={pasted.trim() === ''} onClick={() => take(pasted)}>
            Fill the cells from it
          </Button>
          <p className="text-sm text-soft">Decimal points or commas, % and ppm are read.</p>
        </div>
        {left.length > 0 && (
          <div id={`${id}-left`} role="status" className="mt-2 border-l-[3px] border-l-straw bg-straw-bg px-3 py-2">
            <p className="font-medium">Not read, and kept in the box:</p>
            <ul>
              {left.map(({ text, why }, index) => (
                <li key={index}>
                  “{text}”: <span className="text-soft">{why}</span>
                </li>
              ))}
            </ul>
          </div>
        )}
      </div>
    </div>
  )
}
