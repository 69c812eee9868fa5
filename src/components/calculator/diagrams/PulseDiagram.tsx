import type { CalculatorResult } from '@shared/calculations/catalogue.ts'
import { figure } from '@/lib/figures.ts'
import { PlotFrame } from './PlotFrame.tsx'

/** Three periods of the current as it is set, with its mean and its RMS. */
export function PulseDiagram({ result }: { result: CalculatorResult }) {
  const { inputs, figures } = result
  if (!inputs || !figures) return <p className="text-soft">The wave stands here once it can be worked out.</p>
  const [peak, background, onTime, period] = [Number(inputs.peakCurrent), Number(inputs.backgroundCurrent), Number(inputs.onTime), Number(figures.period)]
  const [mean, rms] = [Number(figures.meanCurrent), Number(figures.rmsCurrent)]
  const periods = [0, 1, 2]
  const end = period * periods.length
  const top = peak * 1.12
  return (
    <figure>
      <PlotFrame title="Pulse wave" description={`Peak ${figure(peak)} A for ${figure(onTime)} ms of each ${figure(period)} ms, background ${figure(background)} A between; mean ${figure(mean)} A, RMS ${figure(rms)} A.`} x={{ from: 0, to: end, label: 'Time, ms' }} y={{ from: 0, to: top, label: 'Current, A' }} ratio={0.45}>
        {({ x, y, box, narrow }) => (
          <>
            {periods.map((each) => (
              <rect key={each} x={x(each * period)} y={y(peak)} width={x(onTime) - x(0)} height={y(0) - y(peak)} fill="var(--straw-bg)" />
            ))}
            <path d={periods.map((each) => `${each === 0 ? 'M' : 'L'}${x(each * period)} ${y(each === 0 ? peak : background)}L${x(each * period)} ${y(peak)}H${x(each * period + onTime)}V${y(background)}H${x((each + 1) * period)}`).join('')} fill="none" stroke="var(--ink)" strokeWidth={2} />
            <path d={`M${box.left} ${y(mean)}H${box.right}`} stroke="var(--heat-2)" strokeWidth={1.5} strokeDasharray="8 4" />
            <path d={`M${box.left} ${y(rms)}H${box.right}`} stroke="var(--oxide)" strokeWidth={1.5} strokeDasharray="2 3" />
            <text x={box.right - 4} y={y(mean) + (rms - mean < top * 0.08 ? 14 : -5)} textAnchor="end" fontSize="12" fontWeight="600" fill="var(--heat-2)">
              mean {figure(mean)} A
            </text>
            <text x={box.right - 4} y={y(rms) - 5} textAnchor="end" fontSize="12" fontWeight="600" fill="var(--oxide)">
              RMS {figure(rms)} A
            </text>
            <text x={x(onTime / 2)} y={y(peak) - 5} textAnchor={narrow ? 'start' : 'middle'} fontSize="12" fill="var(--soft)">
              {figure(onTime)} ms
            </text>
            <path d={`M${x(period)} ${y(peak) - 3}V${box.top}M${x(2 * period)} ${y(peak) - 3}V${box.top}`} stroke="var(--edge)" />
            <text x={x(1.5 * period)} y={box.top + 8} textAnchor="middle" fontSize="12" fill="var(--soft)">
              period {figure(period)} ms
            </text>
          </>
        )}
      </PlotFrame>
      <figcaption className="text-sm text-soft">Rectangular pulses as set; a real wave rises and falls over time. Dashed the mean, dotted the RMS, which heats the wire.</figcaption>
    </figure>
  )
}
