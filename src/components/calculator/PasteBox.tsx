import { useId, useState } from 'react'
import { pasteChemistry, type Unread } from '@shared/library/paste-chemistry.ts'
import { Button } from '@/components/Button.tsx'
import { TextArea } from '@/components/fields/text.tsx'
import { elementKey, type ElementGroup } from './element-groups.ts'

export interface PasteBoxProps {
  group: Pick<ElementGroup, 'legend' | 'elements'>
  onChange: (changes: Record<string, string>) => void
}

/** Fills a composition from a line copied out of a certificate; what it can't read, and what the formula doesn't know, is said. */
export function PasteBox({ group, onChange }: PasteBoxProps) {
  const [text, setText] = useState('')
  const [said, setSaid] = useState<{ taken: number; unread: readonly Unread[]; unused: readonly string[] } | null>(null)
  const id = useId()
  const read = () => {
    const { rows, unread } = pasteChemistry(text)
    const known = rows.flatMap(({ element, percent }) => {
      const key = elementKey(group, element)
      return key ? [[key, String(percent)] as const] : []
    })
    if (known.length > 0) onChange(Object.fromEntries(known))
    setSaid({ taken: known.length, unread, unused: rows.flatMap(({ element }) => (elementKey(group, element) ? [] : [element])) })
  }
  return (
    <details className="no-print mt-1">
      <summary className="w-fit cursor-pointer py-1 text-sm text-steel underline decoration-dotted underline-offset-2">
        Paste from a certificate<span className="sr-only">: {group.legend}</span>
      </summary>
      <div className="mt-1 space-y-2">
        <TextArea id={id} label={`${group.legend}, as copied`} rows={2} placeholder="C 0.16 Si 0.35 Mn 1.42 P 0.012 … or a row of symbols over a row of figures" value={text} onChange={(event) => setText(event.target.value)} />
        <Button disabled={text.trim() === ''} onClick={read}>
          Fill in
        </Button>
        {said && (
          <div role="status" className="text-sm">
            <p>{said.taken === 0 ? 'No element of this formula was found in that text.' : `${said.taken} ${said.taken === 1 ? 'element' : 'elements'} filled in.`}{said.unused.length > 0 && ` Not used by this formula: ${said.unused.join(', ')}.`}</p>
            {said.unread.map(({ text: part, why }) => (
              <p key={part} className="text-straw-deep">
                “{part}” was left out: {why}
              </p>
            ))}
          </div>
        )}
      </div>
    </details>
  )
}
