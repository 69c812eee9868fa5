import { Select } from '@/components/fields/text.tsx'
import type { CardChoice, PanelCardState } from './use-panel-card.ts'

/** Machine, mode, program and pass of a card; those without a choice are left out. */
export function CardChoices({ state, choice, onChange, fixedMachine = false }: { state: PanelCardState; choice: CardChoice; onChange: (choice: CardChoice) => void; fixedMachine?: boolean }) {
  const { machines, modes, mode, passes, card } = state
  const programs = mode?.programs ?? []
  return (
    <div className="no-print grid gap-3 sm:grid-cols-2">
      {!fixedMachine && (
        <Select
          label="Machine in front of you"
          empty="none chosen"
          value={choice.machine ?? ''}
          options={machines.map(({ id, number, name }) => ({ value: id, label: `${number} ${name}` }))}
          onChange={(event) => onChange({ ...choice, machine: event.target.value || null, mode: null, program: null })}
        />
      )}
      {choice.machine !== null && modes.length > 1 && <Select label="Mode" value={mode?.key ?? ''} options={modes.map(({ key, name }) => ({ value: key, label: name }))} onChange={(event) => onChange({ ...choice, mode: event.target.value, program: null })} />}
      {choice.machine !== null && programs.length > 0 && <Select label="Program" empty="the one that suits the wire" value={choice.program ?? ''} options={programs.map(({ key, label }) => ({ value: key, label: `${label}${choice.program === null && card.data?.program === key ? ' (suits)' : ''}` }))} onChange={(event) => onChange({ ...choice, program: event.target.value || null })} />}
      {choice.machine !== null && passes.length > 0 && <Select label="Pass" empty="the whole process" value={choice.pass ?? ''} options={passes.map((pass) => ({ value: pass, label: `Pass ${pass}` }))} onChange={(event) => onChange({ ...choice, pass: event.target.value || null })} />}
    </div>
  )
}
