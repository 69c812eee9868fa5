import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { ChevronLeft, ChevronRight, Maximize2, ZoomIn, ZoomOut } from 'lucide-react'
import { useId, useRef, useState, type PointerEvent } from 'react'
import type { ArcPlot, ArcRecording } from '@shared/schemas/arc-data.ts'
import { Button } from '@/components/Button.tsx'
import { ErrorState } from '@/components/states.tsx'
import { useDebounced } from '@/hooks/debounced.ts'
import { useWidth } from '@/hooks/width.ts'
import { figure } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'
import { byKey, domainOf, envelope, moved, ticks, timeText, zoomed, type Range } from '../plot-view.ts'
import { PlotTable } from './PlotTable.tsx'

const LEFT = 46
const RIGHT = 10
const PANEL = 150
const GAP = 22
const FOOT = 26

/** Of a plot, the stretches that lie in a range, with a neighbour at either end so that lines run off the edge. */
function within(plot: ArcPlot, { from, to }: Range): ArcPlot {
  const first = Math.max(0, plot.t.findIndex((t) => t >= from) - 1)
  const after = plot.t.findIndex((t) => t > to)
  const cut = (values: number[]) => values.slice(first, after < 0 ? undefined : after + 1)
  return { t: cut(plot.t), currentMin: cut(plot.currentMin), currentMax: cut(plot.currentMax), voltageMin: cut(plot.voltageMin), voltageMax: cut(plot.voltageMax) }
}

/** Current and voltage over time: the lowest and highest of each stretch, so that no peak is lost. Drag or keys show a part, read again in more detail. */
export function ArcPlotView({ recording }: { recording: ArcRecording }) {
  const { figures, plot } = recording
  const whole: Range = { from: 0, to: Math.max(figures.duration, 1e-4) }
  const [range, setRange] = useState<Range>(whole)
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null)
  const [frame, width] = useWidth(900)
  const clip = useId()
  const board = useRef<SVGSVGElement>(null)
  const isWhole = range.from <= whole.from && range.to >= whole.to
  const asked = useDebounced(range, 200)
  const detailed = figures.rows > 2000 && !(asked.from <= whole.from && asked.to >= whole.to)
  const detail = useQuery({ ...query('plotArcRecording', { params: { id: recording.id }, query: asked }), enabled: detailed, staleTime: Infinity, placeholderData: keepPreviousData })
  // Until the finer one is there, the coarse one shows the same part.
  const fine = detailed && detail.data && !detail.isPlaceholderData && detail.data.t.length > 1 && asked === range
  const shown = within(fine ? detail.data : plot, range)
  const span = range.to - range.from
  const inner = Math.max(80, width - LEFT - RIGHT)
  const xOf = (t: number) => LEFT + ((t - range.from) / span) * inner
  const timeAt = (clientX: number) => {
    const box = board.current?.getBoundingClientRect()
    const share = box ? (clientX - box.left - LEFT) / inner : 0
    return range.from + Math.min(1, Math.max(0, share)) * span
  }
  const height = 2 * PANEL + GAP + FOOT
  const change = (next: Range | null) => next && setRange(next)
  const finish = (event: PointerEvent) => {
    if (!drag) return
    const [from, to] = [Math.min(drag.from, drag.to), Math.max(drag.from, drag.to)]
    setDrag(null)
    // A click is no part.
    if ((to - from) / span > 0.01) setRange({ from, to: Math.max(to, from + 1e-4) })
    event.currentTarget.releasePointerCapture(event.pointerId)
  }
  const xTicks = ticks(range.from, range.to, inner / 110)
  const x = shown.t.map(xOf)
  return (
    <div className="px-4 py-3">
      <div className="no-print mb-2 flex flex-wrap items-center gap-2">
        <Button icon={<ZoomIn size={16} aria-hidden="true" />} onClick={() => change(zoomed(range, 0.5, whole))}>Closer</Button>
        <Button icon={<ZoomOut size={16} aria-hidden="true" />} disabled={isWhole} onClick={() => change(zoomed(range, 2, whole))}>Further</Button>
        <Button aria-label="Earlier" icon={<ChevronLeft size={16} aria-hidden="true" />} disabled={isWhole} onClick={() => change(moved(range, -0.5, whole))} />
        <Button aria-label="Later" icon={<ChevronRight size={16} aria-hidden="true" />} disabled={isWhole} onClick={() => change(moved(range, 0.5, whole))} />
        <Button icon={<Maximize2 size={16} aria-hidden="true" />} disabled={isWhole} onClick={() => change(whole)}>All</Button>
        {figures.pulse && <Button onClick={() => change(tenPulses(recording, range, whole))}>Ten pulses</Button>}
        <p className="text-sm text-soft" role="status">
          {isWhole ? `All ${figure(figures.duration, 2)} s` : `${timeText(range.from, span)} to ${timeText(range.to, span)}`}
          {detailed && detail.isFetching ? ', reading it closer' : ''}
        </p>
      </div>
      <div
        ref={frame}
        role="group"
        tabIndex={0}
        aria-label="Plot of current and voltage. Plus and minus zoom, the arrow keys move, 0 shows all."
        onKeyDown={(event) => {
          if (event.ctrlKey || event.metaKey || event.altKey) return
          const next = byKey(event.key, range, whole)
          if (!next) return
          event.preventDefault()
          setRange(next)
        }}
      >
        <svg
          ref={board}
          width={width}
          height={height}
          viewBox={`0 0 ${width} ${height}`}
          className="block max-w-full cursor-crosshair touch-pan-y select-none"
          role="img"
          aria-label={`Current between ${figure(figures.current.min, 1)} and ${figure(figures.current.max, 1)} A and voltage between ${figure(figures.voltage.min, 1)} and ${figure(figures.voltage.max, 1)} V while the arc burns, over ${figure(figures.duration, 2)} s. The table below gives figures.`}
          onPointerDown={(event) => {
            if (event.button !== 0) return
            event.currentTarget.setPointerCapture(event.pointerId)
            const t = timeAt(event.clientX)
            setDrag({ from: t, to: t })
          }}
          onPointerMove={(event) => drag && setDrag({ ...drag, to: timeAt(event.clientX) })}
          onPointerUp={finish}
          onPointerCancel={() => setDrag(null)}
        >
          <clipPath id={clip}>
            <rect x={LEFT} y={0} width={inner} height={height} />
          </clipPath>
          <g clipPath={`url(#${clip})`}>
            {figures.stops.map(({ from, to }) => (
              <rect key={from} x={xOf(from)} y={0} width={Math.max(1, xOf(to) - xOf(from))} height={2 * PANEL + GAP} className="fill-hair" />
            ))}
          </g>
          <Panel top={0} unit="A" name="Current" x={x} low={shown.currentMin} high={shown.currentMax} width={width} clip={clip} tone="fill-heat-2 stroke-heat-2" />
          <Panel top={PANEL + GAP} unit="V" name="Voltage" x={x} low={shown.voltageMin} high={shown.voltageMax} width={width} clip={clip} tone="fill-plum stroke-plum" />
          {xTicks.map((t) => (
            <g key={t}>
              <line x1={xOf(t)} x2={xOf(t)} y1={2 * PANEL + GAP} y2={2 * PANEL + GAP + 5} className="stroke-edge" />
              <text x={xOf(t)} y={height - 6} textAnchor={xOf(t) > width - 40 ? 'end' : 'middle'} className="fill-soft text-xs">
                {timeText(t, span)}
              </text>
            </g>
          ))}
          {drag && <rect x={Math.min(xOf(drag.from), xOf(drag.to))} y={0} width={Math.abs(xOf(drag.to) - xOf(drag.from))} height={2 * PANEL + GAP} className="fill-steel opacity-20" />}
        </svg>
      </div>
      {detail.isError && detailed && <div className="mt-2"><ErrorState compact error={detail.error} onRetry={() => void detail.refetch()} /></div>}
      <p className="mt-1 text-sm text-soft">Drag across a part to see it closer. Each stretch shows its lowest and highest reading{figures.stops.length > 0 ? '; stops are tinted' : ''}.</p>
      <PlotTable plot={shown} range={range} />
    </div>
  )
}

/** Ten pulses at the beginning of what is shown, or of the arc. */
function tenPulses({ figures, plot }: ArcRecording, range: Range, whole: Range): Range {
  const span = 10 / (figures.pulse?.frequency ?? 1)
  const burning = plot.t.find((t, at) => t >= range.from && (plot.currentMax[at] ?? 0) >= 10) ?? range.from
  const from = Math.max(range.from, Math.min(burning + span, whole.to - span))
  return { from: Math.max(0, from), to: Math.min(whole.to, Math.max(0, from) + span) }
}

interface PanelProps { top: number; unit: string; name: string; x: readonly number[]; low: readonly number[]; high: readonly number[]; width: number; clip: string; tone: string }

function Panel({ top, unit, name, x, low, high, width, clip, tone }: PanelProps) {
  const [bottom, ceiling] = domainOf(low, high)
  const yOf = (value: number) => top + 16 + (1 - (value - bottom) / (ceiling - bottom)) * (PANEL - 16)
  return (
    <g>
      {ticks(bottom, ceiling, 4).map((value) => (
        <g key={value}>
          <line x1={LEFT} x2={width - RIGHT} y1={yOf(value)} y2={yOf(value)} className="stroke-hair" />
          <text x={LEFT - 6} y={yOf(value) + 4} textAnchor="end" className="fill-soft text-xs">
            {figure(value)}
          </text>
        </g>
      ))}
      <line x1={LEFT} x2={LEFT} y1={top + 16} y2={top + PANEL} className="stroke-edge" />
      <line x1={LEFT} x2={width - RIGHT} y1={top + PANEL} y2={top + PANEL} className="stroke-edge" />
      <text x={LEFT} y={top + 10} className="fill-ink text-xs font-semibold">
        {name}, {unit}
      </text>
      <path d={envelope(x, low, high, yOf)} clipPath={`url(#${clip})`} className={tone} strokeWidth={1} strokeLinejoin="round" />
    </g>
  )
}
