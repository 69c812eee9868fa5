import { Plus, X } from 'lucide-react'
import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { StandardChoice } from '@shared/schemas/common.ts'
import type { MachineMode } from '@shared/schemas/machines.ts'
import type { Bead, Trial } from '@shared/schemas/trials.ts'
import { beadList, proposeRanges, type ProposedRange } from '@shared/trials/propose-ranges.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Select, TextField } from '@/components/fields/text.tsx'
import { freshChoice, standardName, STANDARDS } from '@/components/variables/options.ts'
import { ChoiceFields } from '@/components/variables/StandardChoices.tsx'
import { useUnits } from '@/hooks/units.ts'
import { figure } from '@/lib/figures.ts'
import { asProblem } from '@/lib/problem.ts'
import { useTrialActs } from '../api.ts'
import { settingText } from '../words.ts'

/** The best bead, the later of equals. */
export const bestOf = (beads: readonly Bead[]): Bead | null => beads.reduce<Bead | null>((best, bead) => (bead.content.score !== null && (best === null || (best.content.score ?? 0) <= bead.content.score) ? bead : best), null)

/** Shows what would go into the draft and why, asks for title and standards, and opens the draft. */
export function PromoteDialog({ trial, mode, given, onClose }: { trial: Trial; mode: MachineMode | null; given: Bead | null; onClose: () => void }) {
  const navigate = useNavigate()
  const { system } = useUnits()
  const { promote } = useTrialActs(trial)
  const [chosenId, setChosenId] = useState((given ?? bestOf(trial.beads) ?? trial.beads.at(-1))?.id ?? '')
  const [title, setTitle] = useState(trial.title)
  const [standards, setStandards] = useState<StandardChoice[]>([freshChoice('asme-ix')])
  const [wrong, setWrong] = useState<string | null>(null)
  const { ranges, problems, kin, leftOut } = proposeRanges(trial.beads, chosenId)
  const free = STANDARDS.find(({ id }) => !standards.some(({ standard }) => standard === id))
  const submit = () => {
    if (promote.isPending) return
    setWrong(title.trim() === '' ? 'Give the procedure a title, e.g. "6061 handrail, pulsed, ER5356".' : null)
    if (title.trim() === '' || problems.length > 0) return
    promote.mutate({ beadId: chosenId, title, standards, unitSystem: system }, { onSuccess: (revision) => void navigate(`/revisions/${revision.id}`) })
  }
  const shown = (range: ProposedRange, value: number) => (range.control === null ? figure(value) : settingText(value, mode?.controls.find(({ key }) => key === range.control)))
  return (
    <Dialog wide title="Make it a procedure" isOpen onClose={onClose} dismissable={false} footer={<><Button onClick={onClose}>Not now</Button><Button kind="primary" disabled={problems.length > 0} pending={promote.isPending} onClick={submit}>Create the draft</Button></>}>
      <FormError message={promote.isError ? asProblem(promote.error).message : undefined} />
      <div className="grid gap-4 sm:grid-cols-2">
        <Select label="Bead" options={trial.beads.map(({ id, number, content }) => ({ value: id, label: `Bead ${number}${content.score === null ? ', not scored' : `, score ${content.score}`}` }))} value={chosenId} onChange={(event) => setChosenId(event.target.value)} />
        <TextField label="Title of the procedure" maxLength={160} value={title} error={wrong} onChange={(event) => setTitle(event.target.value)} />
      </div>
      <fieldset className="space-y-2">
        <legend className="mb-1 font-medium">To which standards</legend>
        {standards.map((choice, index) => (
          <div key={choice.standard} className="flex flex-wrap items-center gap-2">
            <ChoiceFields choice={choice} record="procedure" taken={standards} place={index} onChange={(next) => setStandards(standards.map((one, at) => (at === index ? next : one)))} />
            {standards.length > 1 && <button type="button" aria-label={`Remove ${standardName(choice.standard)}`} className="flex size-9 items-center justify-center text-soft hover:text-ink" onClick={() => setStandards(standards.filter((_, at) => at !== index))}><X size={16} aria-hidden="true" /></button>}
          </div>
        ))}
        {free && standards.length < 5 && <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => setStandards([...standards, freshChoice(free.id)])}>Another standard</Button>}
      </fieldset>
      {problems.map((problem) => <p key={problem} role="alert" className="border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">{problem}</p>)}
      {problems.length === 0 && (
        <section aria-label="Proposed ranges">
          <h3 className="sheet-head">Proposed ranges</h3>
          <p className="mb-2 text-pretty text-soft">From {beadList(kin)}. A bead scored 4 or 5 widens a range, one scored 1 or 2 ends it. They are where to start: what holds is what a coupon shows.{leftOut.length > 0 && ` Not counted: ${leftOut.map(({ number, differsIn }) => `bead ${number} (other ${differsIn})`).join(', ')}.`}</p>
          <dl className="border-t border-rule">
            {ranges.map((range) => (
              <div key={range.key} className="grid gap-x-4 border-b border-hair py-2 last:border-b-0 sm:grid-cols-[11rem_9rem_minmax(0,1fr)]">
                <dt className="font-medium">{range.label}{range.from === 'measured' && range.key !== 'stick-out' && <span className="font-normal text-soft">, measured</span>}</dt>
                <dd className="font-semibold">{range.min === range.max ? shown(range, range.min) : `${shown(range, range.min)} to ${shown(range, range.max)}`} <span className="font-normal text-soft">{range.unit}</span></dd>
                <dd className="text-pretty text-soft">{range.because}</dd>
              </div>
            ))}
          </dl>
        </section>
      )}
    </Dialog>
  )
}
