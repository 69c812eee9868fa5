import { useMemo, useState } from 'react'
import type { Revision } from '@shared/schemas/records.ts'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { moment } from '@/lib/figures.ts'
import { useUnits } from '@/hooks/units.ts'
import { mergeContents, type Difference, type Side } from '@/lib/draft/merge.ts'
import { labelOf, valueInWords } from '@/components/variables/labels.ts'

export interface ConflictViewProps {
  isOpen: boolean
  onClose: () => void
  base: ProcedureContent
  mine: ProcedureContent
  theirs: Revision
  /** Takes the joined content, to be saved over theirs. */
  onMerge: (content: ProcedureContent) => void
}

/** Both versions side by side, a row a field; nothing is saved, and nothing lost, until each field that both changed is settled. */
export function ConflictView({ isOpen, onClose, base, mine, theirs, onMerge }: ConflictViewProps) {
  const [chosen, setChosen] = useState<Record<string, Side>>({})
  const { content, differences } = useMemo(() => mergeContents(base, mine, theirs.content, (path) => chosen[path]), [base, mine, theirs, chosen])
  const clashes = differences.filter(({ by }) => by === 'both')
  const rest = differences.filter(({ by }) => by !== 'both')
  const open = clashes.filter(({ path }) => !chosen[path]).length
  const valid = procedureContentSchema.safeParse(content).success
  const all = (side: Side) => setChosen(Object.fromEntries(clashes.map(({ path }) => [path, side])))
  const choose = (path: string, side: Side) => setChosen({ ...chosen, [path]: side })
  const shared = { mine, theirs: theirs.content, chosen, choose }
  return (
    <Dialog
      wide
      title={`Two versions of ${theirs.number} rev ${theirs.revision}`}
      isOpen={isOpen}
      onClose={onClose}
      dismissable={false}
      footer={
        <>
          <p className="mr-auto self-center text-soft" role="status">
            {open > 0 ? `${open} ${open === 1 ? 'field is' : 'fields are'} still to be settled.` : valid ? 'Every field is settled.' : 'A field in your version is not right yet. Go back, correct it, and settle this then.'}
          </p>
          <Button onClick={onClose}>Back to the sheet</Button>
          <Button kind="primary" disabled={open > 0 || !valid} onClick={() => onMerge(content)}>
            Save the joined version
          </Button>
        </>
      }
    >
      <p className="max-w-prose text-pretty">
        Somebody else saved this draft on {moment(theirs.updatedAt)}, while you were writing. Both versions are kept until you settle each field. {clashes.length === 0 ? 'You changed different fields, so the two go together; look them over.' : 'Choose a side for each field that both of you changed.'}
      </p>
      {clashes.length > 0 && (
        <section aria-label="Changed by both">
          <header className="mb-1.5 flex flex-wrap items-baseline justify-between gap-3">
            <h3 className="sheet-head">Changed by both</h3>
            <p className="flex gap-1">
              <Button kind="quiet" onClick={() => all('mine')}>
                All mine
              </Button>
              <Button kind="quiet" onClick={() => all('theirs')}>
                All theirs
              </Button>
            </p>
          </header>
          {clashes.map((one) => (
            <Row key={one.path} difference={one} {...shared} />
          ))}
        </section>
      )}
      {rest.length > 0 && (
        <section aria-label="Changed by one">
          <h3 className="sheet-head mb-1.5">Changed by one of you</h3>
          {rest.map((one) => (
            <Row key={one.path} difference={one} {...shared} />
          ))}
        </section>
      )}
    </Dialog>
  )
}

interface RowProps {
  difference: Difference
  mine: ProcedureContent
  theirs: ProcedureContent
  chosen: Record<string, Side>
  choose: (path: string, side: Side) => void
}

function Row({ difference, mine, theirs, chosen, choose }: RowProps) {
  const { system } = useUnits()
  const { path, by } = difference
  const side = chosen[path] ?? (by === 'both' ? undefined : by)
  // A block that only one of them has is named by the one who has it.
  const label = labelOf(path, difference.theirs === undefined ? mine : theirs)
  const words = (of: Side) => {
    const value = of === 'mine' ? difference.mine : difference.theirs
    return value === undefined ? 'removed' : valueInWords(path, value, of === 'mine' ? mine : theirs, system)
  }
  return (
    <fieldset className={`border-t border-rule py-2 ${side ? '' : 'wash-cannot-tell'}`}>
      <legend className="float-left w-full font-medium">{label}</legend>
      <p className="clear-left text-sm text-soft">Before: {difference.base === undefined ? 'not there' : valueInWords(path, difference.base, mine, system)}</p>
      <div className="mt-1.5 grid gap-2 sm:grid-cols-2">
        {(['mine', 'theirs'] as const).map((of) => (
          <label key={of} className={`flex min-h-11 cursor-pointer items-start gap-2.5 border px-3 py-2 ${side === of ? 'border-ink border-l-[5px]' : 'border-rule'}`}>
            <input type="radio" name={`side ${path}`} className="mt-0.5 size-4 accent-ink" checked={side === of} onChange={() => choose(path, of)} />
            <span className="min-w-0 break-words">
              <span className="cell-label block">{of === 'mine' ? 'Yours' : 'Theirs'}</span>
              {words(of)}
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  )
}
