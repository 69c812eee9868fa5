import { useState, type FormEvent } from 'react'
import { parseInterval } from '@shared/units/parse.ts'
import { POSITIONS, PROCESSES } from '@shared/schemas/welding.ts'
import { Button } from '@/components/Button.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { Select, TextField } from '@/components/fields/text.tsx'
import { useUnits } from '@/hooks/units.ts'
import { searchLibrary } from '@/lib/library-search.ts'
import { isAsked, type Asked } from '../question.ts'

const metals = searchLibrary('base-metals')
const PROCESS_KEYS = PROCESSES.filter((one) => one !== 'OTHER').map((value) => ({ value, label: value }))
const WELDS = [
  { value: 'groove', label: 'Groove' },
  { value: 'fillet', label: 'Fillet' },
]

/** The joint picked piece by piece; what is left open is not asked. */
export function ByParts({ given, onAsk }: { given: Asked; onAsk: (asked: Asked) => void }) {
  const { system, unitOf } = useUnits()
  const [parts, setParts] = useState<Asked>({ metalA: given.metalA, metalB: given.metalB, thickness: given.thickness, process: given.process, position: given.position, weld: given.weld })
  const [wrong, setWrong] = useState<{ thickness?: string; all?: string }>({})
  const put = (part: Asked) => setParts((before) => ({ ...before, ...part }))
  const submit = (event: FormEvent) => {
    event.preventDefault()
    const reading = parts.thickness ? parseInterval(parts.thickness, 'length', system) : null
    if (reading && !reading.ok) return setWrong({ thickness: reading.message })
    if (!isAsked(parts)) return setWrong({ all: 'Pick at least one part of the joint.' })
    setWrong({})
    onAsk(Object.fromEntries(Object.entries(parts).filter(([, value]) => value)))
  }
  const positions = POSITIONS.filter((one) => !parts.weld || one.includes(parts.weld === 'groove' ? 'G' : 'F')).map((value) => ({ value, label: value }))
  return (
    <form noValidate onSubmit={submit} className="grid gap-x-4 gap-y-3 sm:grid-cols-2">
      <ComboBox label="Metal" text={parts.metalA ?? ''} queryKey="base-metals" load={metals} allowOwn placeholder="Grade, UNS or P-No. 1" onPick={(_item, text) => put({ metalA: text })} />
      <ComboBox label="To metal" optional text={parts.metalB ?? ''} queryKey="base-metals" load={metals} allowOwn placeholder="Left empty: the same" onPick={(_item, text) => put({ metalB: text })} />
      <TextField label={`Thickness, ${unitOf('length')}`} autoComplete="off" placeholder={system === 'SI' ? '12' : '1/2'} maxLength={40} value={parts.thickness ?? ''} error={wrong.thickness ?? null} onChange={(event) => put({ thickness: event.target.value })} />
      <Select label="Process" empty="Any" options={PROCESS_KEYS} value={parts.process ?? ''} onChange={(event) => put({ process: event.target.value })} />
      <Select label="Weld" empty="Either" options={WELDS} value={parts.weld ?? ''} onChange={(event) => put({ weld: event.target.value, position: '' })} />
      <Select label="Position" empty="Any" options={positions} value={parts.position ?? ''} onChange={(event) => put({ position: event.target.value })} />
      <div className="sm:col-span-2">
        {wrong.all && <p role="alert" className="mb-2 font-medium text-oxide">{wrong.all}</p>}
        <Button kind="primary" type="submit" className="min-h-12 w-full text-lg! sm:w-auto">
          Look up
        </Button>
      </div>
    </form>
  )
}
