import { ArrowDown, ArrowUp, Camera } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { MachineMode } from '@shared/schemas/machines.ts'
import type { Bead } from '@shared/schemas/trials.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { changedSettings, circumstancesOf } from '@shared/trials/compare-beads.ts'
import { faultsInWords, SCORE_WORDS } from '@shared/trials/faults.ts'
import { columnsOf, measuredText, settingOf, settingText, shapeOf } from '../words.ts'
import { ScoreMark } from './ScoreMark.tsx'

interface Row { bead: Bead; changed: ReadonlyMap<string, 'up' | 'down' | 'other'>; elsewise: string[] }

const rowsOf = (beads: readonly Bead[]): Row[] =>
  beads.map((bead, index) => {
    const before = beads[index - 1]
    const [were, are] = [before ? circumstancesOf(before.content) : [], circumstancesOf(bead.content)]
    return {
      bead,
      changed: new Map(before ? changedSettings(before.content.settings, bead.content.settings).map(({ control, direction }) => [control, direction === 'up' || direction === 'down' ? direction : 'other']) : []),
      elsewise: before ? are.flatMap(({ label, text }, at) => (text === were[at]?.text ? [] : [label.toLowerCase()])) : [],
    }
  })

const ARROW = { up: <ArrowUp size={13} aria-hidden="true" />, down: <ArrowDown size={13} aria-hidden="true" />, other: null } as const
const SAID = { up: ', up', down: ', down', other: ', changed' } as const

/** All beads in the order in which they were welded, with what was changed from each to the next marked. A phone gets one block a bead. */
export function BeadTable({ beads, mode, system, shown }: { beads: readonly Bead[]; mode: MachineMode | null; system: UnitSystem; shown: number | null }) {
  const columns = columnsOf(beads)
  const rows = rowsOf(beads)
  const control = (key: string) => mode?.controls.find((one) => one.key === key)
  const setting = (bead: Bead, key: string) => {
    const one = settingOf(bead.content, key)
    return one ? settingText(one.value, control(key)) : '—'
  }
  const cell = 'px-2 py-2 align-top first:pl-4 lg:px-3'
  return (
    <>
      <ol className="md:hidden" aria-label="Beads">
        {[...rows].reverse().map(({ bead, changed, elsewise }) => (
          <li key={bead.id} className={`border-b border-hair last:border-b-0 ${shown === bead.number ? 'bg-straw-bg' : ''}`}>
            <Link to={`?bead=${bead.number}#bead`} className="block px-4 py-3 no-underline">
              <span className="flex items-center justify-between gap-3 text-lg">
                <span className="font-semibold underline underline-offset-4">Bead {bead.number}</span>
                <span className="inline-flex items-center gap-2"><ScoreMark score={bead.content.score} />{bead.content.score === null ? 'not scored' : `${bead.content.score} of 5`}</span>
              </span>
              <span className="mt-0.5 block">
                {changed.size === 0 && elsewise.length === 0 ? (bead.number === beads[0]?.number ? 'the first' : 'nothing changed') : [...columns.filter((column) => changed.has(column.control)).map((column) => `${column.label} ${setting(bead, column.control)} ${column.unit}`.trim()), ...elsewise.map((one) => `other ${one}`)].join(', ')}
              </span>
              {bead.content.faults.length > 0 && <span className="block text-soft">{faultsInWords(bead.content.faults)}</span>}
              {bead.content.note && <span className="block text-soft italic">{bead.content.note}</span>}
            </Link>
          </li>
        ))}
      </ol>
      <div className="overflow-x-auto max-md:hidden" tabIndex={0} role="region" aria-label="Table of beads">
        <table className="w-full border-collapse text-left">
          <caption className="sr-only">Beads; a setting that differs from the bead before is marked</caption>
          <thead>
            <tr className="border-b border-ink">
              <th scope="col" className={`${cell} cell-label`}>Bead</th>
              {columns.map(({ control: key, label, unit }) => <th key={key} scope="col" className={`${cell} text-right cell-label`}>{label}{unit && <span className="block normal-case">{unit}</span>}</th>)}
              <th scope="col" className={`${cell} cell-label max-lg:hidden`}>Measured</th>
              <th scope="col" className={`${cell} cell-label`}>Score</th>
              <th scope="col" className={`${cell} cell-label`}>Faults and note</th>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ bead, changed, elsewise }) => (
              <tr key={bead.id} className={`border-b border-hair last:border-b-0 ${shown === bead.number ? 'bg-paper' : ''}`}>
                <th scope="row" className={`${cell} font-semibold whitespace-nowrap`}>
                  <Link to={`?bead=${bead.number}#bead`} className="text-link inline-flex min-h-6 items-center" aria-current={shown === bead.number ? 'true' : undefined}>Bead {bead.number}</Link>
                  {bead.photos.length > 0 && <Camera size={14} className="ml-1.5 inline text-soft" aria-label={`${bead.photos.length} ${bead.photos.length === 1 ? 'photo' : 'photos'}`} role="img" />}
                  {elsewise.length > 0 && <span className="block text-sm font-normal text-straw-deep">other {elsewise.join(', ')}</span>}
                </th>
                {columns.map(({ control: key }) => {
                  const how = changed.get(key)
                  return (
                    <td key={key} className={`${cell} text-right whitespace-nowrap`}>
                      <span className={how ? 'inline-flex items-center gap-0.5 bg-straw-bg px-1.5 font-semibold text-straw-deep' : 'px-1.5'}>{how && ARROW[how]}{setting(bead, key)}{how && <span className="sr-only">{SAID[how]}</span>}</span>
                    </td>
                  )
                })}
                <td className={`${cell} min-w-32 max-lg:hidden`}>
                  {(['current', 'voltage', 'wireFeed', 'travelSpeed'] as const).flatMap((measure) => measuredText(bead.content.measured[measure], measure, system) ?? []).join(', ') || <span className="text-soft">—</span>}
                </td>
                <td className={`${cell} whitespace-nowrap`}><span className="inline-flex items-center gap-1.5"><ScoreMark score={bead.content.score} />{bead.content.score === null ? <span className="text-soft">not scored</span> : <span title={SCORE_WORDS[bead.content.score]}>{bead.content.score}</span>}<span className="sr-only">{shapeOf(bead.content.score)}</span></span></td>
                <td className={`${cell} min-w-40`}>
                  {bead.content.faults.length > 0 && <span className="block">{faultsInWords(bead.content.faults)}</span>}
                  {bead.content.note && <span className="block text-soft">{bead.content.note}</span>}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  )
}
