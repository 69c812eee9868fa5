import type { LayoutGuess } from '@shared/arc-data/layout.ts'
import type { ArcChoice } from '@shared/schemas/arc-data.ts'
import { Select, TextField } from '@/components/fields/text.tsx'

type Role = '' | 'time' | 'current' | 'voltage'
const ROLES: readonly { value: Role; label: string }[] = [{ value: '', label: 'not used' }, { value: 'time', label: 'time' }, { value: 'current', label: 'current' }, { value: 'voltage', label: 'voltage' }]
const asOptions = (units: readonly string[]) => units.map((unit) => ({ value: unit, label: unit }))

/** The first rows of the file, with what each column holds; every choice can be changed. */
export function ColumnChoice({ guess, choice, onChoose }: { guess: LayoutGuess; choice: ArcChoice; onChoose: (change: ArcChoice) => void }) {
  const { layout, columns } = guess
  const { time, current, voltage } = layout.columns
  const roleOf = (column: number): Role => (column === time ? 'time' : column === current ? 'current' : column === voltage ? 'voltage' : '')
  const assign = (column: number, role: Role) => {
    const before = roleOf(column)
    const taken = role === 'time' ? time : role === 'current' ? current : role === 'voltage' ? voltage : null
    const next = { time: time ?? -1, current, voltage }
    if (role !== '') next[role] = column
    // Current and voltage change places; a time column may simply go.
    if (before === 'time' && role !== 'time') next.time = taken !== null && role !== '' ? taken : -1
    else if (before !== '' && before !== role && taken !== null) next[before] = taken
    onChoose(next)
  }
  return (
    <div className="space-y-4">
      <div className="overflow-x-auto border border-rule" role="region" aria-label="First rows of the file" tabIndex={0}>
        <table className="w-full border-collapse">
          <thead>
            <tr className="border-b border-rule align-bottom">
              {columns.map(({ name }, column) => (
                <th key={column} scope="col" className="min-w-26 px-2 py-2 text-left">
                  <span className="mb-1 block font-medium break-words">{name || `Column ${column + 1}`}</span>
                  <select aria-label={`What column ${column + 1} holds`} className="box" value={roleOf(column)} onChange={(event) => assign(column, event.target.value as Role)}>
                    {ROLES.map(({ value, label }) => (
                      <option key={value} value={value}>{label}</option>
                    ))}
                  </select>
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {(columns[0]?.values ?? []).map((_, row) => (
              <tr key={row} className="border-b border-hair last:border-b-0">
                {columns.map(({ values }, column) => (
                  <td key={column} className={`px-2 py-1 tabular-nums ${roleOf(column) === '' ? 'text-soft' : ''}`}>{values[row]}</td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <div className="grid gap-4 sm:grid-cols-3">
        {time === null ? (
          <TextField label="Samples a second" inputMode="numeric" placeholder="e.g. 10000" value={choice.samplesPerSecond ?? ''} description="The file has no time column, so the time comes from the sample rate." onChange={(event) => onChoose({ samplesPerSecond: Number(event.target.value.replace(/[\s']/g, '').replace(',', '.')) || undefined })} />
        ) : (
          <Select label="Unit of the time" options={asOptions(['s', 'ms', 'µs'])} value={layout.timeUnit} onChange={(event) => onChoose({ timeUnit: event.target.value as 's' | 'ms' | 'µs' })} />
        )}
        <Select label="Unit of the current" options={asOptions(['A', 'kA', 'mA'])} value={layout.currentUnit} onChange={(event) => onChoose({ currentUnit: event.target.value as 'A' | 'kA' | 'mA' })} />
        <Select label="Unit of the voltage" options={asOptions(['V', 'kV', 'mV'])} value={layout.voltageUnit} onChange={(event) => onChoose({ voltageUnit: event.target.value as 'V' | 'kV' | 'mV' })} />
      </div>
    </div>
  )
}
