import type { ProgramPoint } from '@shared/schemas/machines.ts'
import { figure } from '@/lib/figures.ts'

const [WIDTH, HEIGHT] = [320, 190]
const EDGE = { left: 40, right: 40, top: 22, bottom: 34 }

interface Curve { points: { knob: number; value: number }[]; low: number; high: number }

/** Whole steps that hold the values, so that the scale reads evenly. */
function curveOf(points: readonly ProgramPoint[], of: 'wireFeed' | 'voltage'): Curve | null {
  const found = points.flatMap((point) => (typeof point[of] === 'number' && Number.isFinite(point[of]) && Number.isFinite(point.knob) ? [{ knob: point.knob, value: point[of] }] : [])).sort((one, other) => one.knob - other.knob)
  if (found.length === 0) return null
  const values = found.map(({ value }) => value)
  const [low, high] = [Math.floor(Math.min(...values)), Math.ceil(Math.max(...values))]
  return { points: found, low: low === high ? low - 1 : low, high: low === high ? high + 1 : high }
}

/** Knob against wire feed (discs, solid line, left scale) and volts (squares, broken line, right scale), as measured. */
export function PointsPlot({ points, title }: { points: readonly ProgramPoint[]; title: string }) {
  const [feed, volts] = [curveOf(points, 'wireFeed'), curveOf(points, 'voltage')]
  const knobs = [...(feed?.points ?? []), ...(volts?.points ?? [])].map(({ knob }) => knob)
  if (knobs.length < 2 || Math.min(...knobs) === Math.max(...knobs)) return <p className="self-center text-soft">Two points or more are drawn here: knob against wire feed and volts.</p>
  const [first, last] = [Math.min(...knobs), Math.max(...knobs)]
  const x = (knob: number) => EDGE.left + ((knob - first) / (last - first)) * (WIDTH - EDGE.left - EDGE.right)
  const y = (value: number, { low, high }: Curve) => HEIGHT - EDGE.bottom - ((value - low) / (high - low)) * (HEIGHT - EDGE.top - EDGE.bottom)
  const path = (curve: Curve) => curve.points.map(({ knob, value }, index) => `${index === 0 ? 'M' : 'L'}${x(knob).toFixed(1)} ${y(value, curve).toFixed(1)}`).join('')
  const words = (name: string, unit: string, curve: Curve | null) => (curve ? `${name} from ${figure(curve.points[0]?.value ?? 0)} to ${figure(curve.points.at(-1)?.value ?? 0)} ${unit}` : '')
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="w-full max-w-sm" role="img" aria-label={`${title}: knob from ${figure(first)} to ${figure(last)}, ${[words('wire feed', 'm/min', feed), words('volts', 'V', volts)].filter(Boolean).join(', ')}`}>
      <g className="fill-soft text-[11px]" stroke="none">
        <path d={`M${EDGE.left} ${EDGE.top}V${HEIGHT - EDGE.bottom}H${WIDTH - EDGE.right}V${EDGE.top}`} fill="none" className="stroke-rule" />
        {feed && <><text x={EDGE.left - 5} y={HEIGHT - EDGE.bottom} textAnchor="end">{feed.low}</text><text x={EDGE.left - 5} y={EDGE.top + 8} textAnchor="end">{feed.high}</text><text x={2} y={12}>● m/min</text></>}
        {volts && <><text x={WIDTH - EDGE.right + 5} y={HEIGHT - EDGE.bottom}>{volts.low}</text><text x={WIDTH - EDGE.right + 5} y={EDGE.top + 8}>{volts.high}</text><text x={WIDTH - 2} y={12} textAnchor="end">■ V</text></>}
        <text x={EDGE.left} y={HEIGHT - EDGE.bottom + 15} textAnchor="middle">{figure(first)}</text>
        <text x={WIDTH - EDGE.right} y={HEIGHT - EDGE.bottom + 15} textAnchor="middle">{figure(last)}</text>
        <text x={WIDTH / 2} y={HEIGHT - 4} textAnchor="middle">knob</text>
      </g>
      {feed && <g className="fill-ink stroke-ink"><path d={path(feed)} fill="none" strokeWidth={1.5} />{feed.points.map(({ knob, value }, index) => <circle key={index} cx={x(knob)} cy={y(value, feed)} r={3.5} />)}</g>}
      {volts && <g className="fill-plum stroke-plum"><path d={path(volts)} fill="none" strokeWidth={1.5} strokeDasharray="5 3" />{volts.points.map(({ knob, value }, index) => <rect key={index} x={x(knob) - 3} y={y(value, volts) - 3} width={6} height={6} />)}</g>}
    </svg>
  )
}
