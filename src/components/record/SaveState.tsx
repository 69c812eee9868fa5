import { Button } from '@/components/Button.tsx'
import { moment } from '@/lib/figures.ts'
import type { SavedRecord, Saving } from '@/lib/draft/saving.ts'

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
