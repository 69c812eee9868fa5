import { calibrationState } from '@shared/machines/calibration.ts'
import type { Machine, WriteMachine } from '@shared/schemas/machines.ts'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { day } from '@/lib/figures.ts'
import { KIND_WORDS } from '../words.ts'
import { Calibrated } from './Calibrated.tsx'

const orNot = (text: string) => text || <span className="text-soft">not stated</span>
const today = () => new Date().toISOString().slice(0, 10)

/** A machine's title block, as it is typed. */
export function MachineTitle({ machine, content }: { machine: Machine; content: Pick<WriteMachine, 'name' | 'kind' | 'serial' | 'location' | 'feeder' | 'retired'> & { calibration: { dueOn: string | null } } }) {
  const { dueOn } = content.calibration
  return (
    <TitleBlock
      kind="Machine"
      number={machine.number}
      title={content.name}
      cells={[
        { label: 'For', children: KIND_WORDS[content.kind] },
        { label: 'Where', children: orNot(content.location) },
        { label: 'Serial', children: orNot(content.serial) },
        { label: 'Feeder', children: orNot(content.feeder) },
        { label: 'Calibration', children: <><Calibrated state={calibrationState(dueOn, today())} />{dueOn && <span className="mt-1 block text-soft">due {day(dueOn)}</span>}</> },
        { label: 'Changed', children: day(machine.updatedAt) },
      ]}
      {...(content.retired && { stamp: <span className="rounded-sm border-2 border-dashed border-soft px-2.5 font-narrow text-xl font-semibold tracking-[0.07em] text-soft uppercase">Retired</span> })}
    />
  )
}
