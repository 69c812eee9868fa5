import type { ArcPlot } from '@shared/schemas/arc-data.ts'
import { figure } from '@/lib/figures.ts'
import { timeText, type Range } from '../plot-view.ts'

const PARTS = 20

/** The plot as figures: lowest and highest in twenty equal parts of what is shown. */
export function PlotTable({ plot, range }: { plot: ArcPlot; range: Range }) {
  const span = range.to - range.from
  const parts = Array.from({ length: PARTS }, (_, part) => {
    const [from, to] = [range.from + (part * span) / PARTS, range.from + ((part + 1) * span) / PARTS]
    const inside = plot.t.flatMap((t, at) => (t >= from && t <= to ? [at] : []))
    const low = (values: readonly number[]) => Math.min(...inside.map((at) => values[at] ?? 0))
    const high = (values: readonly number[]) => Math.max(...inside.map((at) => values[at] ?? 0))
    return { from, to, cells: inside.length > 0 ? [low(plot.currentMin), high(plot.currentMax), low(plot.voltageMin), high(plot.voltageMax)] : [] }
  })
  return (
    <details className="mt-2">
      <summary className="w-fit cursor-pointer font-medium">As a table</summary>
      <div className="mt-2 overflow-x-auto" role="region" aria-label="The plot as a table" tabIndex={0}>
        <table className="w-full max-w-2xl border-collapse text-right">
          <thead>
            <tr className="border-b border-rule">
              {['From', 'To', 'Lowest A', 'Highest A', 'Lowest V', 'Highest V'].map((head) => (
                <th key={head} scope="col" className="px-2 py-1 font-medium whitespace-nowrap">{head}</th>
              ))}
            </tr>
          </thead>
          <tbody>
            {parts.map(({ from, to, cells }) => (
              <tr key={from} className="border-b border-hair">
                <td className="px-2 py-1 whitespace-nowrap">{timeText(from, span)}</td>
                <td className="px-2 py-1 whitespace-nowrap">{timeText(to, span)}</td>
                {cells.length > 0 ? cells.map((value, at) => <td key={at} className="px-2 py-1">{figure(value, 1)}</td>) : <td colSpan={4} className="px-2 py-1 text-soft">nothing recorded</td>}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  )
}
