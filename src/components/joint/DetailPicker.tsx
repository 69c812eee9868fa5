import { useState } from 'react'
import { GROOVE_TYPES, type Joint, type WeldingVariables } from '@shared/schemas/welding.ts'
import { detailSheet, detailsFor, jointOfDetail } from '@shared/standards/aws-d1-1/prequalified/detail-values.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { Select } from '@/components/fields/text.tsx'
import { GROOVES, JOINT_TYPES } from '@/components/variables/options.ts'
import { sourceInWords, thicknessIn } from './DetailNote.tsx'

const some = <T extends string>(values: readonly T[], text: string): T | null => values.find((value) => value === text) ?? null
const TYPES = ['butt', 'tee', 'corner'] as const

/** Standard groove details, each with what its drawing states and what fit-up may leave; one fills the joint. */
export function DetailPicker({ variables, onClose, onPick }: { variables: WeldingVariables; onClose: () => void; onPick: (change: Partial<Joint>, code: string) => void }) {
  const { joint, thickness, unitSystem } = variables
  const [groove, setGroove] = useState<Joint['groove']>(joint.groove)
  const [type, setType] = useState<Joint['type'] | null>(some(TYPES, joint.type))
  const [every, setEvery] = useState(false)
  const processes = variables.processes.flatMap(({ process }) => process ?? [])
  const at = thicknessIn(thickness, unitSystem)
  const details = detailsFor({ groove, type, processes: every ? [] : processes })
  return (
    <Dialog title="Standard groove details" isOpen onClose={onClose} wide footer={<Button onClick={onClose}>Close</Button>}>
      <div className="grid gap-3 sm:grid-cols-3">
        <Select label="Groove" options={GROOVES} empty="Any" value={groove ?? ''} onChange={(event) => setGroove(some(GROOVE_TYPES, event.target.value))} />
        <Select label="Joint" options={JOINT_TYPES.filter(({ value }) => some(TYPES, value))} empty="Any" value={type ?? ''} onChange={(event) => setType(some(TYPES, event.target.value))} />
        <Select label="Processes" options={[{ value: 'every', label: 'Any' }]} empty={processes.length > 0 ? [...new Set(processes)].join(', ') : 'Any'} value={every ? 'every' : ''} onChange={(event) => setEvery(event.target.value === 'every')} />
      </div>
      <p className="text-sm text-soft">The figures that are kept here could be confirmed; the figure of the standard has more details. Picking one fills the joint with what a drawing may state.</p>
      {details.length === 0 && <p>No detail kept here is like this. Choose another groove, joint or process.</p>}
      <ul className="divide-y divide-hair border-y border-rule">
        {details.map((detail, index) => {
          const sheet = detailSheet(detail, at, unitSystem)
          return (
            <li key={`${detail.code} ${index}`} className="grid gap-2 py-3 sm:grid-cols-[8rem_minmax(0,1fr)_auto] sm:items-start">
              <div>
                <p className="font-semibold">{detail.code}</p>
                <p className="text-sm text-soft">{detail.processes.join(', ')}</p>
              </div>
              <div className="min-w-0">
                <dl className="grid gap-x-4 text-sm sm:grid-cols-[7rem_minmax(0,1fr)_minmax(0,1fr)]">
                  {sheet.lines.map(({ label, detailed, fitUp }) => (
                    <div key={label} className="contents">
                      <dt className="text-soft">{label}</dt>
                      <dd>as detailed {detailed}</dd>
                      <dd>at fit-up {fitUp}</dd>
                    </div>
                  ))}
                </dl>
                <p className="mt-1 text-sm">{sheet.notes.join(' ')}</p>
                <p className="text-sm text-soft">{sourceInWords(sheet)}</p>
              </div>
              <Button aria-label={`Use ${detail.code}${detail.angle === null ? '' : `, ${detail.angle}°`}`} onClick={() => onPick(jointOfDetail(detail, joint, at, unitSystem), detail.code)}>
                Use
              </Button>
            </li>
          )
        })}
      </ul>
    </Dialog>
  )
}
