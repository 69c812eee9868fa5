import { chemistryOf } from '@shared/calculations/catalogue/elements.ts'
import { ferriteNumber, ferriteWithDilution, wrcDiagram, type DilutedFerrite, type FerriteReading } from '@shared/calculations/ferrite-number.ts'
import type { CalculatorResult } from '@shared/calculations/catalogue.ts'
import type { DiagramPoint } from '@shared/calculations/wrc-diagram.ts'
import { figure } from '@/lib/figures.ts'
import { Mark, PlotFrame, PointTable, type LegendRow, type MarkShape, type Plotted } from './PlotFrame.tsx'
import { spanOf } from './scale.ts'

interface Point { name: string; crEq: number; niEq: number; shape: MarkShape; colour: string }

/** Lines of FN that carry their figure; the others are drawn thin between them. */
const NAMED = [2, 4, 6, 8, 10, 12, 14, 16, 18, 20, 24, 30, 40, 50, 60, 70, 80, 90, 100]

const inWords = ({ ferriteNumber: value, reading }: FerriteReading): string => (value !== null ? `${figure(value, 1)} FN` : reading ? `${reading} FN` : 'no number: outside the lines')

/** The WRC-1992 diagram with only the lines that the reference gives, and where these metals lie on it. */
export function FerriteDiagram({ result }: { result: CalculatorResult }) {
  const { inputs } = result
  if (!inputs) return <p className="text-soft">The diagram stands here once the compositions can be read.</p>
  const single = !('dilution' in inputs)
  const b = chemistryOf(inputs, 'b')
  const figures: (FerriteReading & Partial<Pick<DilutedFerrite, 'points'>>) | null = single
    ? ferriteNumber(inputs).figures
    : ferriteWithDilution({ dilution: Number(inputs.dilution), shareOfA: Number(inputs.shareOfA), baseA: chemistryOf(inputs, 'a'), baseB: Object.keys(b).length > 0 ? b : null, filler: chemistryOf(inputs, 'f') }).figures
  if (!figures) return <p className="text-soft">The diagram stands here once the compositions can be read.</p>
  const mix = figures.points
  const points: Point[] = mix
    ? [
        { name: 'Base metal A', ...mix.baseA, shape: 'square', colour: 'var(--heat-2)' },
        ...(mix.baseB ? [{ name: 'Base metal B', ...mix.baseB, shape: 'diamond' as const, colour: 'var(--heat-2)' }, { name: 'Both base metals', ...mix.bases, shape: 'cross' as const, colour: 'var(--heat-2)' }] : []),
        { name: 'Filler', ...mix.filler, shape: 'ring', colour: 'var(--heat-1)' },
        { name: `Weld at ${figure(Number(inputs.dilution))} % dilution`, ...mix.weld, shape: 'disc', colour: 'var(--oxide)' },
      ]
    : [{ name: 'Weld metal', crEq: figures.crEq, niEq: figures.niEq, shape: 'disc', colour: 'var(--oxide)' }]
  const { axes } = wrcDiagram
  const x = spanOf(points.map(({ crEq }) => crEq), { from: axes.crEq[0], to: axes.crEq[1] })
  const y = spanOf(points.map(({ niEq }) => niEq), { from: axes.niEq[0], to: axes.niEq[1] })
  const rows = points.map(({ name, crEq, niEq, shape, colour }): LegendRow => ({ name, shape, colour, cells: [figure(crEq, 2), figure(niEq, 2)] }))
  const weld = points.at(-1)
  return (
    <figure className="space-y-2">
      <PlotFrame
        title="WRC-1992 diagram"
        description={`${weld?.name ?? 'The weld'} at Cr equivalent ${figure(figures.crEq, 2)} and Ni equivalent ${figure(figures.niEq, 2)}: ${inWords(figures)}. The table below holds every point.`}
        x={{ ...x, label: 'Cr equivalent = Cr + Mo + 0.7 Nb' }}
        y={{ ...y, label: 'Ni equivalent = Ni + 35 C + 20 N + 0.25 Cu' }}
        ratio={0.66}
      >
        {(plotted) => <Drawn plotted={plotted} points={points} tied={mix} />}
      </PlotFrame>
      <figcaption className="space-y-2">
        <p className="font-medium">Read off: {inWords(figures)}.</p>
        <PointTable caption="Points on the diagram" heads={['Cr eq. %', 'Ni eq. %']} rows={rows} />
        <p className="text-sm text-soft">Solid lines are ferrite numbers; dashed, the borders between the orders of solidification (A, AF, FA, F). Nothing is drawn where the reference gives no line.</p>
      </figcaption>
    </figure>
  )
}

function Drawn({ plotted, points, tied }: { plotted: Plotted; points: readonly Point[]; tied: DilutedFerrite['points'] | undefined }) {
  const { x, y, clip, narrow } = plotted
  const path = (line: readonly DiagramPoint[]) => line.map(([cr, ni], index) => `${index === 0 ? 'M' : 'L'}${x(cr).toFixed(1)} ${y(ni).toFixed(1)}`).join('')
  // Whatever the axes were stretched to, a figure needs its own room beside the next.
  const kept: number[] = []
  for (const { fn, high } of wrcDiagram.lines) {
    const last = wrcDiagram.lines.find((line) => line.fn === kept.at(-1))
    if (NAMED.includes(fn) && (!last || Math.hypot(x(high[0]) - x(last.high[0]), y(high[1]) - y(last.high[1])) > (narrow ? 24 : 21))) kept.push(fn)
  }
  const modes: [string, number, number][] = [['A', 17.6, 16.6], ['AF', 20.1, 15.2], ['FA', 21.2, 13.6], ['F', 25.5, 12]]
  return (
    <>
      <g clipPath={clip}>
        {wrcDiagram.lines.map(({ fn, low, high }) => (
          <path key={fn} d={path([low, high])} fill="none" stroke="var(--edge)" strokeWidth={kept.includes(fn) ? 1 : 0.5} />
        ))}
        <path d={path(wrcDiagram.zero)} fill="none" stroke="var(--ink)" strokeWidth={1.5} />
        <path d={path(wrcDiagram.afFa)} fill="none" stroke="var(--straw)" strokeWidth={1.5} strokeDasharray="6 4" />
        <path d={path(wrcDiagram.faF)} fill="none" stroke="var(--straw)" strokeWidth={1.5} strokeDasharray="6 4" />
      </g>
      {wrcDiagram.lines.filter(({ fn }) => kept.includes(fn)).map(({ fn, high }) => (
        <text key={fn} x={x(high[0])} y={y(high[1]) - 4} textAnchor="middle" fontSize="11" fill="var(--soft)">
          {fn}
        </text>
      ))}
      {modes.map(([mode, cr, ni]) => (
        <text key={mode} x={x(cr)} y={y(ni)} textAnchor="middle" fontSize="14" fontWeight="600" fill="var(--straw-deep)" style={{ fontFamily: 'Barlow Condensed' }}>
          {mode}
        </text>
      ))}
      {tied && (
        <g stroke="var(--heat-2)" strokeWidth={1.5} fill="none">
          {tied.baseB && <path d={`M${x(tied.baseA.crEq)} ${y(tied.baseA.niEq)}L${x(tied.baseB.crEq)} ${y(tied.baseB.niEq)}`} strokeDasharray="2 4" />}
          <path d={`M${x(tied.bases.crEq)} ${y(tied.bases.niEq)}L${x(tied.filler.crEq)} ${y(tied.filler.niEq)}`} />
        </g>
      )}
      {points.map(({ name, crEq, niEq, shape, colour }) => (
        <Mark key={name} x={x(crEq)} y={y(niEq)} shape={shape} colour={colour} />
      ))}
    </>
  )
}
