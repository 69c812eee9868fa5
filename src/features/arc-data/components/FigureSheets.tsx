import type { ReactNode } from 'react'
import { ARC_OFF, ARC_ON, STOP_AFTER } from '@shared/arc-data/figures.ts'
import type { ArcFigures, ArcRecording } from '@shared/schemas/arc-data.ts'
import { fromSi } from '@shared/units/convert.ts'
import { Sheet } from '@/components/Sheet.tsx'
import { useUnits } from '@/hooks/units.ts'
import { figure } from '@/lib/figures.ts'

interface Line { label: string; value: string; unit: string; how: ReactNode; strong?: boolean }

function Lines({ lines }: { lines: readonly Line[] }) {
  return (
    <dl>
      {lines.map(({ label, value, unit, how, strong }) => (
        <div key={label} className="grid gap-x-4 gap-y-0.5 border-b border-hair px-4 py-2.5 last:border-b-0 sm:grid-cols-[12rem_9rem_minmax(0,1fr)] sm:items-baseline">
          <dt className="font-medium">{label}</dt>
          <dd className={strong ? 'font-narrow text-2xl font-semibold text-figure' : 'text-lg'}>
            {value} <span className="font-sans text-base font-normal text-soft">{unit}</span>
          </dd>
          <dd className="text-sm text-soft">{how}</dd>
        </div>
      ))}
    </dl>
  )
}

/** Power, energy and heat input, each with how it was worked out. */
export function PowerSheet({ recording }: { recording: ArcRecording }) {
  const { figures, heatInput, heatInputHow } = recording
  const { system, unitOf } = useUnits()
  const heat = heatInput === null ? '' : figure(fromSi(heatInput, 'heatInput', unitOf('heatInput')), system === 'SI' ? 2 : 1)
  return (
    <Sheet title="Power and energy" aside="ASME IX QW-409.1(c)">
      <Lines
        lines={[
          { label: 'Instantaneous power', value: figure(figures.averageInstantaneousPower, 0), unit: 'W', strong: true, how: 'Mean of volts times amperes, sample by sample, over the time in which the arc burns; each step weighs as long as it lasts.' },
          { label: 'Energy', value: figure(figures.energy / 1000, 2), unit: 'kJ', strong: true, how: `The same products added up over ${figure(figures.arcTime, 2)} s of arc.` },
          { label: 'Heat input', value: heatInput === null ? 'not told' : heat, unit: heatInput === null ? '' : unitOf('heatInput'), strong: heatInput !== null, how: heatInputHow === null ? 'Energy over the length of weld. Attach the recording to a pass or bead and give the length that was welded meanwhile, or record its travel speed there.' : `From ${heatInputHow}. No process efficiency is applied.` },
        ]}
      />
    </Sheet>
  )
}

/** How far the product of the meters would have been off, drawn to one scale. */
export function MetersSheet({ figures }: { figures: ArcFigures }) {
  const { averageInstantaneousPower: power, meterPower, meterError, alternating, current, voltage } = figures
  const most = Math.max(power, meterPower, 1)
  const agree = Math.abs(meterError) < 0.5
  const [i, v, word] = alternating ? [current.rms, voltage.rms, 'RMS'] : [current.mean, voltage.mean, 'mean']
  return (
    <Sheet title="Meters against the arc" aside={agree ? 'they agree' : `${figure(Math.abs(meterError), 1)} % ${meterError < 0 ? 'too low' : 'too high'}`}>
      <div className="px-4 py-4">
        <p className="max-w-prose text-lg">
          {agree
            ? 'Volts times amperes of the meters give the power of this arc: its voltage and current do not change together.'
            : `Volts times amperes of the meters are ${figure(Math.abs(meterError), 1)} % ${meterError < 0 ? 'below' : 'above'} the power of the arc: ${figure(Math.abs(power - meterPower), 0)} W that meters would have ${meterError < 0 ? 'missed' : 'added'}.`}
        </p>
        <dl className="mt-4 space-y-3">
          <Bar label="Volts × amperes, sample by sample" watts={power} most={most} tone="bg-ink" />
          <Bar label={`Volts × amperes of the meters: ${figure(v, 2)} V × ${figure(i, 1)} A, ${word} values`} watts={meterPower} most={most} tone={agree ? 'bg-jade' : 'bg-oxide'} missing={power > meterPower ? power - meterPower : 0} />
        </dl>
        {!agree && <p className="mt-3 max-w-prose text-sm text-soft">Where the waveform is controlled, volts and amperes change together, and the product of two means is not the mean of the products. QW-409.1 then wants instantaneous power or energy.</p>}
      </div>
    </Sheet>
  )
}

function Bar({ label, watts, most, tone, missing = 0 }: { label: string; watts: number; most: number; tone: string; missing?: number }) {
  return (
    <div>
      <dt className="flex flex-wrap justify-between gap-x-4">{label}</dt>
      <dd className="mt-1 flex items-center gap-3">
        <span aria-hidden="true" className="flex h-5 grow bg-hair">
          <span className={tone} style={{ width: `${(watts / most) * 100}%` }} />
          {missing > 0 && <span className="border-y border-r border-dashed border-oxide bg-oxide-bg" style={{ width: `${(missing / most) * 100}%` }} />}
        </span>
        <span className="w-20 shrink-0 text-right font-semibold whitespace-nowrap tabular-nums">
          {figure(watts, 0)} <span className="font-normal text-soft">W</span>
        </span>
      </dd>
    </div>
  )
}

/** Means, RMS and extremes while the arc burns, and what meters would show. */
export function ReadingsSheet({ figures }: { figures: ArcFigures }) {
  const rows = [['Current', 'A', figures.current, 1], ['Voltage', 'V', figures.voltage, 2]] as const
  return (
    <Sheet title="Readings" aside="while the arc burns">
      <div className="overflow-x-auto" role="region" aria-label="Readings as a table" tabIndex={0}>
        <table className="w-full max-w-3xl border-collapse text-right">
          <thead>
            <tr className="border-b border-rule">
              <td />
              {['Mean', 'RMS', 'Lowest', 'Highest'].map((head) => (
                <th key={head} scope="col" className="px-2 py-2 font-medium sm:px-4">{head}</th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(([name, unit, { mean, rms, min, max }, digits]) => (
              <tr key={name} className="border-b border-hair last:border-b-0">
                <th scope="row" className="py-2 pr-2 pl-4 text-left font-medium whitespace-nowrap">{name} <span className="font-normal text-soft">{unit}</span></th>
                {[mean, rms, min, max].map((value, at) => (
                  <td key={at} className="px-2 py-2 sm:px-4">{figure(value, digits)}</td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Sheet>
  )
}

/** Pulses found in the current, with one of them drawn. */
export function PulseSheet({ figures }: { figures: ArcFigures }) {
  const { pulse, said } = figures
  if (!pulse) {
    const why = said.find((sentence) => /pulse/i.test(sentence))
    return (
      <Sheet title="Pulses" aside="none told">
        <p className="px-4 py-3">{why ?? 'The current is not told as pulsed.'}</p>
      </Sheet>
    )
  }
  const { frequency, peakCurrent, backgroundCurrent, onTime, count } = pulse
  const duty = onTime * frequency
  return (
    <Sheet title="Pulses" aside={`${figure(count, 0)} found`}>
      <div className="grid gap-x-6 lg:grid-cols-[minmax(0,1fr)_18rem]">
        <Lines
          lines={[
            { label: 'Frequency', value: figure(frequency, 1), unit: 'Hz', how: `A pulse each ${figure(1000 / frequency, 2)} ms, from rise to rise.` },
            { label: 'Peak current', value: figure(peakCurrent, 0), unit: 'A', how: 'Mean of the samples on the upper level.' },
            { label: 'Background current', value: figure(backgroundCurrent, 0), unit: 'A', how: 'Mean of the samples on the lower level.' },
            { label: 'On-time', value: figure(onTime * 1000, 2), unit: 'ms', how: `At half height; ${figure(duty * 100, 1)} % of the time.` },
          ]}
        />
        <Wave duty={duty} peak={peakCurrent} background={backgroundCurrent} onTime={onTime} period={1 / frequency} />
      </div>
    </Sheet>
  )
}

function Wave({ duty, peak, background, onTime, period }: { duty: number; peak: number; background: number; onTime: number; period: number }) {
  const [left, right, top, bottom] = [46, 270, 20, 110]
  const cycle = (right - left) / 2
  const base = bottom - (background / peak) * (bottom - top)
  const path = [0, 1].map((turn) => `${left + turn * cycle},${base}V${top}H${left + turn * cycle + duty * cycle}V${base}H${left + (turn + 1) * cycle}`).join('L')
  return (
    <svg viewBox="0 0 288 150" className="w-full max-w-72 p-4" role="img" aria-label={`Two pulses drawn: ${figure(peak, 0)} A for ${figure(onTime * 1000, 2)} ms, then ${figure(background, 0)} A until ${figure(period * 1000, 2)} ms`}>
      <line x1={left} x2={right} y1={bottom} y2={bottom} className="stroke-edge" />
      <line x1={left} x2={left} y1={top - 8} y2={bottom} className="stroke-edge" />
      <path d={`M${path}`} className="fill-none stroke-heat-2" strokeWidth={2} />
      <text x={left - 5} y={top + 4} textAnchor="end" className="fill-soft text-xs">{figure(peak, 0)} A</text>
      <text x={left - 5} y={base + 4} textAnchor="end" className="fill-soft text-xs">{figure(background, 0)} A</text>
      <path d={`M${left},${bottom + 8}v6M${left},${bottom + 11}h${duty * cycle}M${left + duty * cycle},${bottom + 8}v6`} className="fill-none stroke-ink" />
      <text x={left} y={bottom + 30} className="fill-ink text-xs">{figure(onTime * 1000, 2)} ms of {figure(period * 1000, 2)} ms</text>
    </svg>
  )
}

const SHOWN_STOPS = 20

/** Arc-on time and the stops between. */
export function ArcTimeSheet({ figures }: { figures: ArcFigures }) {
  const { arcTime, duration, stops, stopCount } = figures
  return (
    <Sheet title="Arc time and stops" aside={stopCount === 0 ? 'no stop' : `${stopCount} ${stopCount === 1 ? 'stop' : 'stops'}`}>
      <Lines lines={[{ label: 'Arc-on time', value: figure(arcTime, 2), unit: 's', how: `Of ${figure(duration, 2)} s recorded. The arc counts as burning from ${ARC_ON} A on, and as stopped once the current stays below ${ARC_OFF} A for ${STOP_AFTER * 1000} ms.` }]} />
      {stops.length > 0 && (
        <ol className="border-t border-hair px-4 py-3">
          {stops.slice(0, SHOWN_STOPS).map(({ from, to }, at) => (
            <li key={from} className="py-0.5">
              <span className="inline-block min-w-16 text-soft">Stop {at + 1}</span> {figure(to - from, 2)} <span className="text-soft">s</span>, from {figure(from, 2)} to {figure(to, 2)} <span className="text-soft">s</span>
            </li>
          ))}
          {stopCount > SHOWN_STOPS && <li className="py-0.5 text-soft">and {stopCount - SHOWN_STOPS} more</li>}
        </ol>
      )}
    </Sheet>
  )
}

const DELIMITERS: Record<ArcRecording['layout']['delimiter'], string> = { ',': 'comma', ';': 'semicolon', '\t': 'tab', ' ': 'space', '|': 'bar' }

/** What was noticed while reading, rows left out, and how the file was read. */
export function FileSheet({ recording }: { recording: ArcRecording }) {
  const { figures, layout, sha256 } = recording
  const { columns, delimiter, decimal, timeUnit, currentUnit, voltageUnit, samplesPerSecond, headerRows } = layout
  const time = columns.time === null ? `no time column, ${figure(samplesPerSecond ?? 0)} samples a second` : `time in column ${columns.time + 1} (${timeUnit})`
  return (
    <Sheet title="The file" aside={`${figure(figures.rows, 0)} rows used`}>
      <div className="space-y-3 px-4 py-3">
        {figures.said.length > 0 && (
          <ul className="list-disc space-y-1 pl-5">
            {figures.said.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        )}
        {figures.bad.length > 0 && (
          <div className="border-l-[3px] border-l-straw bg-straw-bg px-3 py-2">
            <p className="font-medium">Rows left out{figures.badRows > figures.bad.length ? `, the first ${figures.bad.length} of ${figures.badRows}` : ''}</p>
            <ul className="mt-1 space-y-0.5">
              {figures.bad.map(({ row, text, why }) => (
                <li key={row} className="break-words">Row {row}, “{text}”: {why}.</li>
              ))}
            </ul>
          </div>
        )}
        <p className="text-soft">
          Read with {headerRows} {headerRows === 1 ? 'row' : 'rows'} of head, columns apart by {DELIMITERS[delimiter]}, decimal {decimal === ',' ? 'comma' : 'point'}; {time}, current in column {columns.current + 1} ({currentUnit}), voltage in column {columns.voltage + 1} ({voltageUnit}).
        </p>
        <p className="text-xs break-all text-soft">SHA-256 {sha256}</p>
      </div>
    </Sheet>
  )
}
