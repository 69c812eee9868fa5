import { useQueries, useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { Bead } from '@shared/schemas/trials.ts'
import { fromSi, SHOWN_UNIT } from '@shared/units/convert.ts'
import { Select } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { useUnits } from '@/hooks/units.ts'
import { useWidth } from '@/hooks/width.ts'
import { figure } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'
import { counterpartOf, curveOf, wireSentences, wiresOf, type Wire, type WireCurve } from './curves.ts'
import { scaleOf } from './plot-data.ts'

const HEIGHT = 280
const EDGE = { left: 52, right: 16, top: 12, bottom: 40 }
const MOST_MACHINES = 24

/** The wire-feed curves of two wires, so that nobody carries one's setting over to the other. */
export function WireCurves({ beads }: { beads: readonly Bead[] }) {
  const { system } = useUnits()
  const list = useQuery(query('listMachines', { query: { limit: MOST_MACHINES } }))
  const read = useQueries({ queries: (list.data?.items ?? []).map(({ id }) => ({ ...query('readMachine', { params: { id } }), staleTime: 300_000 })) })
  const machines = read.flatMap(({ data }) => data ?? [])
  const wires = wiresOf(beads, machines)
  const name = ({ name: wire, diameter }: Wire) => `${wire} ${figure(diameter)} mm`
  const [chosen, setChosen] = useState<{ one: string | null; other: string | null }>({ one: null, other: null })
  const one = wires.find((wire) => name(wire) === chosen.one) ?? wires[0]
  const other = wires.find((wire) => name(wire) === chosen.other) ?? (one && counterpartOf(one, wires))
  const [frame, width] = useWidth(480)
  if (!one || !other) return null
  const extension = beads.at(-1)?.content.stickOut?.si ?? 15
  const curves = [curveOf(one, machines, beads, extension), curveOf(other, machines, beads, extension)]
  const unit = SHOWN_UNIT[system].wireFeed
  const feed = (value: number) => fromSi(value, 'wireFeed', unit)
  const all = curves.flatMap(({ curve, points }) => [...curve, ...points])
  const options = wires.map((wire) => ({ value: name(wire), label: name(wire) }))
  return (
    <Sheet id="wires" title="Wire feed of two wires">
      <div className="grid gap-3 px-4 pt-3 sm:grid-cols-2">
        <Select label="Wire" options={options} value={name(one)} onChange={(event) => setChosen({ one: event.target.value, other: name(other) })} />
        <Select label="Against" options={options} value={name(other)} onChange={(event) => setChosen({ one: name(one), other: event.target.value })} />
      </div>
      <div ref={frame} className="px-2 pt-2">
        {all.length === 0 ? <p className="px-2 pb-2 text-soft">Neither a textbook constant nor a measured point is known for these wires.</p> : <Curves curves={curves} width={width} feed={feed} unit={unit} name={name} />}
      </div>
      <div className="space-y-1.5 px-4 pb-3">
        {wireSentences(one, other).map((sentence) => <p key={sentence} className="text-pretty">{sentence}</p>)}
        {curves.map(({ wire, basis, points }) => <p key={name(wire)} className="text-sm text-soft"><span className="font-medium text-ink">{name(wire)}:</span> {basis} {points.length > 0 ? `${points.length} ${points.length === 1 ? 'point' : 'points'} of the shop’s own (${[...new Set(points.map(({ from }) => from.replace(/^bead \d+$/, 'these beads')))].join('; ')}).` : 'The shop has no point of its own yet.'}</p>)}
        {curves.some(({ curve }) => curve.length > 0) && <p className="text-sm text-soft">Textbook curves for spray and pulsed spray at {figure(extension)} mm extension. One constant serves all aluminium wires, so two alloys share a curve: only the shop’s own points tell them apart.</p>}
      </div>
      <details className="border-t border-hair px-4 py-2">
        <summary className="min-h-6 cursor-pointer">The same as a table</summary>
        <table className="mt-2 w-full max-w-xl text-left">
          <caption className="sr-only">Wire feed by current of {name(one)} and {name(other)}</caption>
          <thead><tr className="border-b border-ink"><th scope="col" className="py-1 cell-label">Wire</th><th scope="col" className="py-1 text-right cell-label">A</th><th scope="col" className="py-1 text-right cell-label">{unit}</th><th scope="col" className="py-1 pl-3 cell-label">From</th></tr></thead>
          <tbody>
            {curves.flatMap(({ wire, curve, points }) => [...curve.filter(({ current }) => current % 50 === 0).map((point) => ({ ...point, from: 'textbook' })), ...points].map((point, index) => (
              <tr key={`${name(wire)} ${point.from} ${point.current} ${index}`} className="border-b border-hair"><th scope="row" className="py-1 font-medium">{name(wire)}</th><td className="py-1 text-right">{figure(point.current)}</td><td className="py-1 text-right">{figure(feed(point.wireFeed))}</td><td className="py-1 pl-3">{point.from}</td></tr>
            )))}
          </tbody>
        </table>
      </details>
    </Sheet>
  )
}

/** First wire: solid line, discs; second: dashed line, squares. */
function Curves({ curves, width, feed, unit, name }: { curves: readonly WireCurve[]; width: number; feed: (value: number) => number; unit: string; name: (wire: Wire) => string }) {
  const all = curves.flatMap(({ curve, points }) => [...curve, ...points])
  const [across, up] = [scaleOf(all.map(({ current }) => current)), scaleOf(all.map(({ wireFeed }) => feed(wireFeed)))]
  const x = (value: number) => EDGE.left + ((value - across.low) / (across.high - across.low)) * (width - EDGE.left - EDGE.right)
  const y = (value: number) => HEIGHT - EDGE.bottom - ((value - up.low) / (up.high - up.low)) * (HEIGHT - EDGE.top - EDGE.bottom)
  return (
    <>
      <svg width={width} height={HEIGHT} className="block max-w-full" role="img" aria-label={`Wire feed against current of ${curves.map(({ wire }) => name(wire)).join(' and ')}; the figures stand in the table below`}>
        {across.ticks.map((tick) => <g key={tick}><line x1={x(tick)} x2={x(tick)} y1={EDGE.top} y2={HEIGHT - EDGE.bottom} className="stroke-hair" /><text x={x(tick)} y={HEIGHT - EDGE.bottom + 16} textAnchor="middle" className="fill-soft text-xs">{figure(tick)}</text></g>)}
        {up.ticks.map((tick) => <g key={tick}><line x1={EDGE.left} x2={width - EDGE.right} y1={y(tick)} y2={y(tick)} className="stroke-hair" /><text x={EDGE.left - 8} y={y(tick) + 4} textAnchor="end" className="fill-soft text-xs">{figure(tick)}</text></g>)}
        <text x={(EDGE.left + width - EDGE.right) / 2} y={HEIGHT - 6} textAnchor="middle" className="fill-ink text-sm">Mean current, A</text>
        <text transform={`translate(12 ${(HEIGHT - EDGE.bottom + EDGE.top) / 2}) rotate(-90)`} textAnchor="middle" className="fill-ink text-sm">Wire feed, {unit}</text>
        {curves.map(({ wire, curve, points }, index) => (
          <g key={name(wire)}>
            <polyline points={curve.map((point) => `${x(point.current).toFixed(1)},${y(feed(point.wireFeed)).toFixed(1)}`).join(' ')} className={`fill-none ${index === 0 ? 'stroke-plum' : 'stroke-heat-2'}`} strokeWidth={2} strokeDasharray={index === 0 ? undefined : '7 5'} />
            {points.map((point, at) => (index === 0 ? <circle key={at} cx={x(point.current)} cy={y(feed(point.wireFeed))} r={5} className="fill-plum stroke-sheet" /> : <rect key={at} x={x(point.current) - 5} y={y(feed(point.wireFeed)) - 5} width={10} height={10} className="fill-heat-2 stroke-sheet" />))}
          </g>
        ))}
      </svg>
      <p className="flex flex-wrap gap-x-5 px-2 pb-2 text-sm text-soft">
        {curves.map(({ wire }, index) => (
          <span key={name(wire)} className="inline-flex items-center gap-1.5">
            <svg viewBox="0 0 34 12" className="h-3 w-8.5" aria-hidden="true"><line x1={0} x2={34} y1={6} y2={6} className={index === 0 ? 'stroke-plum' : 'stroke-heat-2'} strokeWidth={2} strokeDasharray={index === 0 ? undefined : '7 5'} />{index === 0 ? <circle cx={17} cy={6} r={4.5} className="fill-plum" /> : <rect x={12.5} y={1.5} width={9} height={9} className="fill-heat-2" />}</svg>
            {name(wire)}: line textbook, marks measured
          </span>
        ))}
      </p>
    </>
  )
}
