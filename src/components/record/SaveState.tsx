import { Button } from '@/components/Button.tsx'
import { moment } from '@/lib/figures.ts'
import type { Phase, SavedRecord, Saving } from '@/lib/draft/saving.ts'

const SHORT = { saved: 'Saved', changed: 'Not saved yet', saving: 'Saving…', unreachable: 'Kept on this device', refused: 'Not saved', conflict: 'Two versions', closed: 'Not saved' } as const

/** The same in two words, in sight wherever the sheet is scrolled to; the full line beside the sheet speaks to readers. */
export function SaveMark({ phase }: { phase: Phase }) {
  const calm = phase === 'saved' || phase === 'saving' || phase === 'changed'
  return (
    <p aria-hidden="true" className={`text-sm xl:mt-3 xl:border-l-2 xl:px-3 max-xl:fixed max-xl:right-3 max-xl:bottom-3 max-xl:z-20 max-xl:border max-xl:bg-sheet max-xl:px-2.5 max-xl:py-1 ${calm ? 'border-rule text-soft' : 'border-oxide font-semibold text-oxide'} ${phase === 'saved' ? 'max-xl:hidden' : ''}`}>
      {SHORT[phase]}
    </p>
  )
}

/** One line on where the typing is: saved, on its way, kept here, or waiting for a decision. */
export function SaveState<C, R extends SavedRecord<C>>({ saving, onSave, onCompare }: { saving: Saving<C, R>; onSave: () => void; onCompare: () => void }) {
  const { phase, problem } = saving
  if (phase === 'saved') return <p role="status" className="text-sm text-soft" title={moment(saving.savedAt)}>Saved</p>
  if (phase === 'changed' || phase === 'saving') return <p role="status" className="text-sm text-soft">{phase === 'saving' ? 'Saving…' : 'Not saved yet'}</p>
  const look = phase === 'closed' || phase === 'refused' ? 'border-l-oxide bg-oxide-bg' : 'border-l-straw bg-straw-bg'
  return (
    <div role="status" className={`border-l-[3px] px-3 py-2 text-sm ${look}`}>
      <p className="font-semibold">{{ unreachable: 'Not saved: kept on this device', refused: 'Not saved', conflict: 'Somebody else saved first', closed: 'This can’t be saved any more' }[phase]}</p>
      <p className="mt-0.5">
        {phase === 'conflict'
          ? 'Your version is kept here. Compare the two and settle each field.'
          : phase === 'closed'
            ? `${problem?.message ?? 'It is closed.'} What you typed is kept on this device; copy what you need before you leave.`
            : phase === 'unreachable'
              ? `${problem?.message ?? ''} It is tried again by itself.`
              : problem?.message}
      </p>
      {phase === 'conflict' && (
        <Button className="mt-2" onClick={onCompare}>
          Compare the two
        </Button>
      )}
      {(phase === 'unreachable' || phase === 'refused') && (
        <Button className="mt-2" onClick={onSave}>
          Try now
        </Button>
      )}
    </div>
  )
}
