import { useMemo, useState } from 'react'
import type { z } from 'zod'
import type { UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { moment } from '@/lib/figures.ts'
import { useUnits } from '@/hooks/units.ts'
import { mergeContents, type Difference, type Side } from '@/lib/draft/merge.ts'
import type { SavedRecord } from '@/lib/draft/saving.ts'

/** How two contents of a kind of record are joined, and how a field of them reads. */
export interface ConflictKind<C> {
  schema: z.ZodType<C>
  /** Lists whose items keep an id. */
  lists: readonly string[]
  label: (path: string, content: C) => string
  words: (path: string, value: unknown, content: C, system: UnitSystem) => string
}

export interface ConflictViewProps<C> {
  /** The record's name, e.g. "WPS-014 rev B". */
  name: string
  kind: ConflictKind<C>
  isOpen: boolean
  onClose: () => void
  base: C
  mine: C
  theirs: SavedRecord<C>
  /** Takes the joined content, to be saved over theirs. */
  onMerge: (content: C) => void
}

/** Both versions side by side, a row a field; nothing is saved, and nothing lost, until each field that both changed is settled. */
export function ConflictView<C>({ name, kind, isOpen, onClose, base, mine, theirs, onMerge }: ConflictViewProps<C>) {
  const [chosen, setChosen] = useState<Record<string, Side>>({})
  const { content, differences } = useMemo(() => mergeContents(base, mine, theirs.content, kind.lists, (path) => chosen[path]), [base, mine, theirs, chosen, kind])
  const clashes = differences.filter(({ by }) => by === 'both')
  const rest = differences.filter(({ by }) => by !== 'both')
  const open = clashes.filter(({ path }) => !chosen[path]).length
  const valid = kind.schema.safeParse(content).success
  const all = (side: Side) => setChosen(Object.fromEntries(clashes.map(({ path }) => [path, side])))
  const choose = (path: string, side: Side) => setChosen({ ...chosen, [path]: side })
  const shared = { kind, mine, theirs: theirs.content, chosen, choose }
  return (
    <Dialog
      wide
      title={`Two versions of ${name}`}
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
        Somebody else saved this record on {moment(theirs.updatedAt)}, while you were writing. Both versions are kept until you settle each field. {clashes.length === 0 ? 'You changed different fields, so the two go together; look them over.' : 'Choose a side for each field that both of you changed.'}
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

interface RowProps<C> {
  kind: ConflictKind<C>
  difference: Difference
  mine: C
  theirs: C
  chosen: Record<string, Side>
  choose: (path: string, side: Side) => void
}

function Row<C>({ kind, difference, mine, theirs, chosen, choose }: RowProps<C>) {
  const { system } = useUnits()
  const { path, by } = difference
  const side = chosen[path] ?? (by === 'both' ? undefined : by)
  // A block that only one of them has is named by the one who has it.
  const label = kind.label(path, difference.theirs === undefined ? mine : theirs)
  const words = (of: Side) => {
    const value = of === 'mine' ? difference.mine : difference.theirs
    return value === undefined ? 'removed' : kind.words(path, value, of === 'mine' ? mine : theirs, system)
  }
  return (
    <fieldset className={`border-t border-rule py-2 ${side ? '' : 'wash-cannot-tell'}`}>
      <legend className="float-left w-full font-medium">{label}</legend>
      <p className="clear-left text-sm text-soft">Before: {difference.base === undefined ? 'not there' : kind.words(path, difference.base, mine, system)}</p>
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
