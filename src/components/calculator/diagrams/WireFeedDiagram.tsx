import { BURN_OFF_DIAMETERS, wireFeedCurve, type BurnOffMaterial } from '@shared/calculations/burn-off.ts'
import type { CalculatorResult } from '@shared/calculations/catalogue.ts'
import { fromSi, SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatNumber } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { figure } from '@/lib/figures.ts'
import { Mark, PlotFrame } from './PlotFrame.tsx'
import { ticksOf } from './scale.ts'

const COLOURS = ['var(--heat-1)', 'var(--heat-2)', 'var(--heat-3)', 'var(--jade)', 'var(--soft)']
const DASHES = ['', '8 3', '3 3', '10 3 2 3', '1 3']

/** Wire feed against mean current of the wires of a material, the asked one heavy, with the point worked out. */
export function WireFeedDiagram({ result, system }: { result: CalculatorResult; system: UnitSystem }) {
  const { inputs, figures } = result
  const [current, wireFeed] = [Number(figures?.current), Number(figures?.wireFeed)]
  if (!inputs || !figures || !Number.isFinite(current) || !Number.isFinite(wireFeed)) return <p className="text-soft">The curves stand here once there is a result.</p>
  const material = inputs.material as BurnOffMaterial
  const [asked, extension] = [Number(inputs.diameter), Number(inputs.extension)]
  const unit = SHOWN_UNIT[system].wireFeed
  const shown = (feed: number) => fromSi(feed, 'wireFeed', unit)
  const sizes = [...new Set([...BURN_OFF_DIAMETERS[material], asked])].sort((a, b) => a - b)
  const reach = Math.max(350, current * 1.2)
  const currents = Array.from({ length: 61 }, (_, index) => (reach / 60) * index).filter((value) => value > 0)
  const top = shown(Math.max(wireFeed * 1.25, 12))
  const curves = sizes.map((diameter, index) => ({ diameter, points: wireFeedCurve({ material, diameter, extension }, currents), colour: COLOURS[index % COLOURS.length], dash: DASHES[index % DASHES.length] }))
  const size = (mm: number) => `${formatNumber(mm, 'length', SHOWN_UNIT[system].length)} ${SHOWN_UNIT[system].length}`
  const table = ticksOf({ from: 50, to: reach }, 6)
  return (
    <figure className="space-y-2">
      <PlotFrame title="Wire feed against current" description={`Wire of ${size(asked)} at ${figure(current)} A: ${figure(shown(wireFeed))} ${unit}. At one current the feed falls as the wire gets thicker.`} x={{ from: 0, to: reach, label: 'Mean current, A' }} y={{ from: 0, to: top, label: `Wire feed, ${unit}` }}>
        {({ x, y, box, clip }) => (
          <>
            <g clipPath={clip} fill="none">
              {curves.map(({ diameter, points, colour, dash }) => (
                <path key={diameter} d={points.map((point, index) => `${index === 0 ? 'M' : 'L'}${x(point.current).toFixed(1)} ${y(shown(point.wireFeed)).toFixed(1)}`).join('')} stroke={colour} strokeDasharray={diameter === asked ? '' : dash} strokeWidth={diameter === asked ? 3 : 1.5} />
              ))}
            </g>
            {curves.map(({ diameter, points, colour }) => {
              const end = [...points].reverse().find((point) => shown(point.wireFeed) <= top)
              if (!end) return null
              const high = shown(end.wireFeed) > top * 0.93
              return (
                <text key={diameter} x={high ? x(end.current) - 4 : Math.min(x(end.current), box.right) - 4} y={high ? box.top + 12 : y(shown(end.wireFeed)) - 6} textAnchor="end" fontSize="12" fontWeight={diameter === asked ? 700 : 500} fill={colour}>
                  {formatNumber(diameter, 'length', SHOWN_UNIT[system].length)}
                </text>
              )
            })}
            <path d={`M${x(current)} ${box.bottom}V${y(shown(wireFeed))}H${box.left}`} fill="none" stroke="var(--oxide)" strokeDasharray="2 3" />
            <Mark x={x(current)} y={y(shown(wireFeed))} shape="disc" colour="var(--oxide)" />
          </>
        )}
      </PlotFrame>
      <figcaption className="space-y-2">
        <p className="text-sm text-soft">Each curve is marked with its wire diameter in {SHOWN_UNIT[system].length}, at an extension of {size(extension)}. Textbook constants: starting data that your own measured points replace.</p>
        <details className="print-open">
          <summary className="cursor-pointer font-medium">The curves as a table</summary>
          <div className="overflow-x-auto">
            <table className="mt-1 border-collapse">
              <caption className="sr-only">Wire feed in {unit} by current and wire diameter</caption>
              <thead>
                <tr className="border-b border-rule text-soft">
                  <th scope="col" className="py-1 pr-4 text-left font-normal">A</th>
                  {sizes.map((mm) => (
                    <th key={mm} scope="col" className="py-1 pl-4 text-right font-normal whitespace-nowrap">{size(mm)}</th>
                  ))}
                </tr>
              </thead>
              <tbody>
                {table.map((amperes) => (
                  <tr key={amperes} className="border-b border-hair last:border-b-0">
                    <th scope="row" className="py-0.5 pr-4 text-left font-medium">{amperes}</th>
                    {sizes.map((mm) => (
                      <td key={mm} className="py-0.5 pl-4 text-right tabular-nums">{wireFeedCurve({ material, diameter: mm, extension }, [amperes]).map((point) => formatNumber(point.wireFeed, 'wireFeed', unit, true))}</td>
                    ))}
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
        </details>
      </figcaption>
    </figure>
  )
}
