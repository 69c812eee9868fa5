import { useQuery } from '@tanstack/react-query'
import { baseMetalTitle } from '@shared/library/base-metals.ts'
import { toFiller } from '@shared/library/filler-metals.ts'
import { toGasMixture } from '@shared/library/gases.ts'
import { baseMetalRowSchema, fillerRowSchema } from '@shared/library/rows.ts'
import { gasText, readGas } from '@shared/machines/wires.ts'
import type { Machine } from '@shared/schemas/machines.ts'
import type { BeadContent } from '@shared/schemas/trials.ts'
import { gasMixtureSchema, POSITIONS, PROCESSES } from '@shared/schemas/welding.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { Select, TextField } from '@/components/fields/text.tsx'
import { searchLibrary } from '@/lib/library-search.ts'
import { query } from '@/lib/query.ts'

export interface SetUpProps {
  content: BeadContent
  onChange: (content: BeadContent) => void
  machine: Machine | null | undefined
  system: UnitSystem
  errors: Readonly<Record<string, string>>
  onUnread: (field: string, message: string | null) => void
}

const metals = searchLibrary('base-metals')
const wires = searchLibrary('filler-metals')
const gases = searchLibrary('gases')

/** On what the bead is welded: what mostly stays the same from bead to bead. */
export function SetUp({ content, onChange, machine, system, errors, onUnread }: SetUpProps) {
  const list = useQuery(query('listMachines', { query: { limit: 200 } }))
  const set = (part: Partial<BeadContent>) => onChange({ ...content, ...part })
  const modes = machine?.content.modes ?? []
  const mode = modes.find(({ key }) => key === content.modeKey)
  const programs = mode?.programs ?? []
  const known = (list.data?.items ?? []).map(({ id, number, name }) => ({ value: id, label: `${number} ${name}` }))
  const unread = (field: string) => (message: string | null) => onUnread(field, message)
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Select label="Machine" empty="not named" options={known} value={content.machineId ?? ''} error={errors.machineId ?? null} onChange={(event) => set({ machineId: event.target.value || null, modeKey: null, programKey: null, settings: [] })} />
      <Select
        label="Mode"
        empty={machine ? 'choose the mode' : 'choose a machine first'}
        options={modes.map(({ key, name }) => ({ value: key, label: name }))}
        value={content.modeKey ?? ''}
        disabled={!machine}
        onChange={(event) => {
          const next = modes.find(({ key }) => key === event.target.value)
          set({ modeKey: next?.key ?? null, programKey: null, settings: [], ...(next?.processes[0] && !next.processes.includes(content.process) ? { process: next.processes[0] } : {}) })
        }}
      />
      {programs.length > 0 && <Select label="Program" empty="not named" options={programs.map(({ key, label }) => ({ value: key, label }))} value={content.programKey ?? ''} onChange={(event) => set({ programKey: event.target.value || null })} />}
      <Select label="Process" options={(mode?.processes ?? PROCESSES).map((value) => ({ value, label: value === 'OTHER' ? 'Another process' : value }))} value={content.process} onChange={(event) => set({ process: PROCESSES.find((one) => one === event.target.value) ?? content.process })} />
      <ComboBox
        label="Wire or electrode" text={content.wire ?? ''} queryKey="filler-metals" load={wires} allowOwn placeholder="e.g. ER5356"
        onPick={(item, text) => {
          const row = item ? fillerRowSchema.safeParse(item.data) : null
          set(row?.success ? { wireId: row.data.id, wire: (toFiller(row.data).classification ?? text).slice(0, 60) } : { wireId: null, wire: text === '' ? null : text.slice(0, 60) })
        }}
      />
      <QuantityField label={`Wire diameter, ${system === 'US' ? 'in' : 'mm'}`} dimension="length" system={system} value={content.wireDiameter} error={errors.wireDiameter ?? null} onUnread={unread('wireDiameter')} onChange={(wireDiameter) => set({ wireDiameter })} />
      <ComboBox
        label="Gas" text={gasText(content.gas) ?? content.gas?.name ?? ''} queryKey="gases" load={gases} allowOwn placeholder="e.g. Ar 100" error={errors.gas}
        onPick={(item, text) => set({ gas: item ? { ...toGasMixture(item.data), flow: content.gas?.flow ?? null } : text === '' ? null : gasMixtureSchema.parse({ components: readGas(text) ?? [], name: text.slice(0, 80) }) })}
      />
      <QuantityField label={`Stick-out, ${system === 'US' ? 'in' : 'mm'}`} dimension="length" system={system} value={content.stickOut} error={errors.stickOut ?? null} onUnread={unread('stickOut')} onChange={(stickOut) => set({ stickOut })} />
      <ComboBox
        label="Metal" text={content.metal ?? ''} queryKey="base-metals" load={metals} allowOwn placeholder="e.g. 6061-T6"
        onPick={(item, text) => {
          const row = item ? baseMetalRowSchema.safeParse(item.data) : null
          set(row?.success ? { metalId: row.data.id, metal: baseMetalTitle(row.data).slice(0, 120) } : { metalId: null, metal: text === '' ? null : text.slice(0, 120) })
        }}
      />
      <QuantityField label={`Thickness, ${system === 'US' ? 'in' : 'mm'}`} dimension="length" system={system} value={content.thickness} error={errors.thickness ?? null} onUnread={unread('thickness')} onChange={(thickness) => set({ thickness })} />
      <TextField label="Joint" optional maxLength={120} placeholder="e.g. bead on plate, T joint" value={content.joint ?? ''} onChange={(event) => set({ joint: event.target.value === '' ? null : event.target.value })} />
      <Select label="Position" empty="not stated" options={POSITIONS.map((value) => ({ value, label: value }))} value={content.position ?? ''} onChange={(event) => set({ position: POSITIONS.find((one) => one === event.target.value) ?? null })} />
    </div>
  )
}
