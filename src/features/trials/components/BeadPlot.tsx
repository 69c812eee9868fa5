import { useState } from 'react'
import type { Bead } from '@shared/schemas/trials.ts'
import { Select } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { useUnits } from '@/hooks/units.ts'
import { useWidth } from '@/hooks/width.ts'
import { figure } from '@/lib/figures.ts'
import { SHAPE_WORDS, shapeOf, type ScoreShape } from '../words.ts'
import { axesOf, labelsOf, pointsOf, scaleOf } from './plot-data.ts'
import { ScoreShapeMark } from './ScoreMark.tsx'

const HEIGHT = 320
const EDGE = { left: 56, right: 20, top: 16, bottom: 44 }

/** Beads over any two settings or measured values; the score by shape, each bead by its number. */
export function BeadPlot({ beads }: { beads: readonly Bead[] }) {
  const { system } = useUnits()
  const axes = axesOf(beads, system)
  const [chosen, setChosen] = useState<{ x: string | null; y: string | null }>({ x: null, y: null })
  const [frame, width] = useWidth(560)
  const x = axes.find(({ key }) => key === chosen.x) ?? axes[0]
  const y = axes.find(({ key }) => key === chosen.y) ?? axes.find(({ key }) => key !== x?.key)
  if (!x || !y) return <Sheet id="plot" title="Plot"><p className="px-4 py-3 text-soft">Two beads with two figures each are drawn here: any setting or measured value against any other.</p></Sheet>
  const points = pointsOf(beads, x.key, y.key, system)
  const [across, up] = [scaleOf(points.map((point) => point.x)), scaleOf(points.map((point) => point.y))]
  const px = (value: number) => EDGE.left + ((value - across.low) / (across.high - across.low)) * (width - EDGE.left - EDGE.right)
  const py = (value: number) => HEIGHT - EDGE.bottom - ((value - up.low) / (up.high - up.low)) * (HEIGHT - EDGE.top - EDGE.bottom)
  const options = axes.map(({ key, label, unit }) => ({ value: key, label: unit ? `${label}, ${unit}` : label }))
  const named = (axis: { label: string; unit: string }) => (axis.unit ? `${axis.label}, ${axis.unit}` : axis.label)
  const shapes = [...new Set(points.map(({ score }) => shapeOf(score)))]
  return (
    <Sheet id="plot" title="Plot">
      <div className="grid gap-3 px-4 pt-3 sm:grid-cols-2">
        <Select label="Across" options={options} value={x.key} onChange={(event) => setChosen({ x: event.target.value, y: y.key })} />
        <Select label="Up" options={options} value={y.key} onChange={(event) => setChosen({ x: x.key, y: event.target.value })} />
      </div>
      <div ref={frame} className="px-2 pt-2">
        {points.length === 0 ? <p className="px-2 pb-3 text-soft">No bead has both of these figures.</p> : (
          <svg width={width} height={HEIGHT} className="block max-w-full" role="img" aria-label={`${points.length} beads, ${named(x)} across and ${named(y)} up; the figures stand in the table below`}>
            {across.ticks.map((tick) => (
              <g key={tick}>
                <line x1={px(tick)} x2={px(tick)} y1={EDGE.top} y2={HEIGHT - EDGE.bottom} className="stroke-hair" />
                <text x={px(tick)} y={HEIGHT - EDGE.bottom + 16} textAnchor="middle" className="fill-soft text-xs">{figure(tick)}</text>
              </g>
            ))}
            {up.ticks.map((tick) => (
              <g key={tick}>
                <line x1={EDGE.left} x2={width - EDGE.right} y1={py(tick)} y2={py(tick)} className="stroke-hair" />
                <text x={EDGE.left - 8} y={py(tick) + 4} textAnchor="end" className="fill-soft text-xs">{figure(tick)}</text>
              </g>
            ))}
            <line x1={EDGE.left} x2={width - EDGE.right} y1={HEIGHT - EDGE.bottom} y2={HEIGHT - EDGE.bottom} className="stroke-ink" />
            <line x1={EDGE.left} x2={EDGE.left} y1={EDGE.top} y2={HEIGHT - EDGE.bottom} className="stroke-ink" />
            <text x={(EDGE.left + width - EDGE.right) / 2} y={HEIGHT - 8} textAnchor="middle" className="fill-ink text-sm">{named(x)}</text>
            <text transform={`translate(14 ${(HEIGHT - EDGE.bottom + EDGE.top) / 2}) rotate(-90)`} textAnchor="middle" className="fill-ink text-sm">{named(y)}</text>
            {points.length > 1 && <polyline points={points.map((point) => `${px(point.x).toFixed(1)},${py(point.y).toFixed(1)}`).join(' ')} className="fill-none stroke-edge" strokeDasharray="2 4" />}
            {labelsOf(points).map((point) => (
              <g key={point.number} transform={`translate(${px(point.x).toFixed(1)} ${py(point.y).toFixed(1)})`}>
                <ScoreShapeMark shape={shapeOf(point.score)} size={7} />
                <text x={11} y={-7} className="fill-ink stroke-sheet text-sm font-semibold" strokeWidth={3} paintOrder="stroke">{point.label}</text>
              </g>
            ))}
          </svg>
        )}
      </div>
      <div className="flex flex-wrap gap-x-5 gap-y-1 px-4 pb-3 text-sm text-soft">
        {shapes.map((shape: ScoreShape) => (
          <span key={shape} className="inline-flex items-center gap-1.5"><svg viewBox="-9 -9 18 18" className="size-4" aria-hidden="true"><ScoreShapeMark shape={shape} /></svg>{shape === 'none' ? SHAPE_WORDS[shape] : `score ${SHAPE_WORDS[shape]}`}</span>
        ))}
        <span>dotted: in the order welded</span>
      </div>
      <details className="border-t border-hair px-4 py-2">
        <summary className="min-h-6 cursor-pointer">The same as a table</summary>
        <table className="mt-2 w-full max-w-md text-left">
          <caption className="sr-only">{named(x)} and {named(y)} of each bead</caption>
          <thead><tr className="border-b border-ink"><th scope="col" className="py-1 cell-label">Bead</th><th scope="col" className="py-1 text-right cell-label">{named(x)}</th><th scope="col" className="py-1 text-right cell-label">{named(y)}</th><th scope="col" className="py-1 text-right cell-label">Score</th></tr></thead>
          <tbody>{points.map((point) => <tr key={point.number} className="border-b border-hair last:border-b-0"><th scope="row" className="py-1 font-medium">{point.number}</th><td className="py-1 text-right">{figure(point.x)}</td><td className="py-1 text-right">{figure(point.y)}</td><td className="py-1 text-right">{point.score ?? '—'}</td></tr>)}</tbody>
        </table>
      </details>
    </Sheet>
  )
}
