import { ArrowDown, ArrowUp } from 'lucide-react'
import type { FigureKey } from '@shared/trials/bead-figures.ts'
import type { Advice } from '@shared/trials/bring-along.ts'
import type { BeadComparison, Direction, FigureChange } from '@shared/trials/compare-beads.ts'
import { Button } from '@/components/Button.tsx'
import { figure } from '@/lib/figures.ts'

/** What to bring along, each with its relation and where that comes from; a figure to dial can be taken over. */
export function AdviceList({ advice, onDial }: { advice: readonly Advice[]; onDial?: (control: string, value: number) => void }) {
  if (advice.length === 0) return null
  const brings = advice.filter(({ kind }) => kind === 'bring')
  const watches = advice.filter(({ kind }) => kind === 'watch')
  return (
    <div className="space-y-2">
      {brings.length > 0 && <p className="cell-label">Bring along</p>}
      {brings.map(({ title, why, formula, basis, control, value }) => (
        <div key={title} className="border-l-4 border-l-plum bg-plum-bg px-3 py-2">
          <div className="flex flex-wrap items-center justify-between gap-x-3 gap-y-1">
            <p className="text-lg font-semibold">{title}</p>
            {onDial && control !== null && value !== null && <Button className="min-h-12" aria-label={`Set ${title}`} onClick={() => onDial(control, value)}>Set it</Button>}
          </div>
          <p className="text-pretty">{why}</p>
          <p className="mt-0.5 text-sm break-words text-soft">{formula}{formula && ' · '}{basis}</p>
        </div>
      ))}
      {watches.map(({ title, why, formula, basis }) => (
        <div key={`${title} ${why}`} className="border-l-4 border-l-straw px-3 py-1">
          <p className="font-medium">{title}</p>
          <p className="text-pretty">{why}</p>
          <p className="text-sm break-words text-soft">{formula}{formula && ' · '}{basis}</p>
        </div>
      ))}
    </div>
  )
}

const BRIEF: readonly FigureKey[] = ['meanCurrent', 'dropletVolume', 'duty', 'power']
const DIGITS: Record<FigureKey, number> = { duty: 3, meanCurrent: 0, rmsCurrent: 0, power: 0, dropletVolume: 2, dropletDiameter: 2, energyPerLength: 2, detachment: 0 }
const HOW = { model: 'from the settings', measured: 'off the meter', meters: 'mean volts × amps', recorded: 'off the recording' } as const
const WORD: Record<Direction, string> = { up: 'up', down: 'down', same: 'same', unknown: 'can’t be told' }

function Move({ change }: { change: FigureChange }) {
  const { direction, share } = change
  return (
    <span className={`inline-flex items-center gap-1 whitespace-nowrap ${direction === 'up' || direction === 'down' ? 'font-semibold' : 'text-soft'}`}>
      {direction === 'up' && <ArrowUp size={14} aria-hidden="true" />}
      {direction === 'down' && <ArrowDown size={14} aria-hidden="true" />}
      {WORD[direction]}
      {share !== null && share !== 0 && ` ${figure(Math.abs(share) * 100, Math.abs(share) < 0.1 ? 1 : 0)} %`}
    </span>
  )
}

/** Mean and RMS current, power, drop and energy, before and after. @param brief the four that are looked at between beads */
export function FigureTable({ comparison, labels, brief = false }: { comparison: BeadComparison; labels: [string, string]; brief?: boolean }) {
  const rows = comparison.figures.filter(({ key, before, after }) => (brief ? BRIEF.includes(key) && after !== null : before !== null || after !== null))
  if (rows.length === 0) return <p className="text-soft">{comparison.notes[0] ?? 'The settings don’t say enough to work anything out.'}</p>
  const notes = brief ? comparison.notes.slice(0, 1) : comparison.notes
  const shown = (value: number | null, key: FigureKey) => (value === null ? '—' : figure(value, DIGITS[key]))
  return (
    <div>
      <table className="w-full text-left">
        <caption className="sr-only">What the settings come to, {labels[0]} against {labels[1]}</caption>
        <thead>
          <tr className="border-b border-ink">
            <th scope="col" className="py-1 pr-2 cell-label">Comes to</th>
            <th scope="col" className="py-1 pr-2 text-right cell-label">{labels[0]}</th>
            <th scope="col" className="py-1 pr-2 text-right cell-label">{labels[1]}</th>
            <th scope="col" className="py-1 cell-label">Moves</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((change) => (
            <tr key={change.key} className="border-b border-hair last:border-b-0">
              <th scope="row" className="py-1.5 pr-2 font-medium">
                {change.label} {change.unit && <span className="font-normal whitespace-nowrap text-soft">{change.unit}</span>}
                {!brief && change.how && <span className="block text-sm font-normal text-soft">{HOW[change.how]}</span>}
              </th>
              <td className="py-1.5 pr-2 text-right tabular-nums">{shown(change.before, change.key)}</td>
              <td className="py-1.5 pr-2 text-right font-semibold tabular-nums">{shown(change.after, change.key)}</td>
              <td className="py-1.5"><Move change={change} /></td>
            </tr>
          ))}
        </tbody>
      </table>
      {notes.map((note) => <p key={note} className="mt-1.5 text-sm text-pretty text-soft">{note}</p>)}
    </div>
  )
}
