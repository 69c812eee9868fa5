import { useState } from 'react'
import type { MachineMode } from '@shared/schemas/machines.ts'
import type { Bead } from '@shared/schemas/trials.ts'
import { compareBeads } from '@shared/trials/compare-beads.ts'
import { Select } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { useRecordings } from '../api.ts'
import { settingText } from '../words.ts'
import { AdviceList, FigureTable } from './Compared.tsx'

/** Two beads: what was changed, what that does to current, power and drop, and which other setting to bring along. */
export function CompareSheet({ beads, mode }: { beads: readonly Bead[]; mode: MachineMode | null }) {
  const [chosen, setChosen] = useState<{ before: number | null; after: number | null }>({ before: null, after: null })
  const after = beads.find(({ number }) => number === chosen.after) ?? beads.at(-1)
  const before = beads.find(({ number }) => number === chosen.before) ?? beads.filter(({ number }) => number < (after?.number ?? 0)).at(-1) ?? beads[0]
  const [recorded, recordedAfter] = [useRecordings(before?.id), useRecordings(after?.id)]
  if (!before || !after || beads.length < 2) return null
  const told = compareBeads(before.content, after.content, mode, { before: recorded[0]?.figures.averageInstantaneousPower ?? null, after: recordedAfter[0]?.figures.averageInstantaneousPower ?? null })
  const options = beads.map(({ number, content }) => ({ value: String(number), label: `Bead ${number}${content.score === null ? '' : `, score ${content.score}`}` }))
  const control = (key: string) => mode?.controls.find((one) => one.key === key)
  const shown = (value: number | null, key: string, unit: string) => (value === null ? 'not set' : `${settingText(value, control(key))}${unit ? ` ${unit}` : ''}`)
  return (
    <Sheet id="compare" title="Before and after">
      <div className="grid gap-3 px-4 pt-3 sm:grid-cols-2">
        <Select label="Before" options={options} value={String(before.number)} onChange={(event) => setChosen({ before: Number(event.target.value), after: after.number })} />
        <Select label="After" options={options} value={String(after.number)} onChange={(event) => setChosen({ before: before.number, after: Number(event.target.value) })} />
      </div>
      <div className="space-y-4 px-4 py-3">
        {told.nothingChanged ? <p className="text-soft">Nothing changed between these two beads: what differs in them is the hand, or chance.</p> : (
          <ul className="space-y-0.5">
            {told.settings.map((change) => <li key={change.control}><span className="font-medium">{change.label}</span> from {shown(change.before, change.control, change.unit)} to <span className="font-semibold">{shown(change.after, change.control, change.unit)}</span></li>)}
            {told.circumstances.map(({ key, label, before: was, after: is }) => <li key={key} className="text-straw-deep"><span className="font-medium">{label}</span> {['machine', 'mode', 'program'].includes(key) ? 'is another' : `from ${was} to ${is}`}: the settings alone don’t tell this bead.</li>)}
          </ul>
        )}
        {told.problems.map((problem) => <p key={problem} className="font-medium text-oxide">{problem}</p>)}
        <FigureTable comparison={told} labels={[`bead ${before.number}`, `bead ${after.number}`]} />
        <AdviceList advice={told.advice} />
        {told.figures.some(({ key, after: is }) => key === 'duty' && is !== null) && <p className="text-sm text-soft">Worked out from a rectangular pulse; real ramps move the mean by 5 to 10 %. Advice, never a limit.</p>}
      </div>
    </Sheet>
  )
}
