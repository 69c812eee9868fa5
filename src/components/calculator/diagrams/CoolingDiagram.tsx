import { coolingTime } from '@shared/calculations/cooling-time.ts'
import type { CalculatorResult } from '@shared/calculations/catalogue.ts'
import { fromSi, SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatNumber } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { figure } from '@/lib/figures.ts'
import { Mark, PlotFrame } from './PlotFrame.tsx'

/** t8/5 against thickness: the two formulas, the thickness that divides them, and the point worked out. */
export function CoolingDiagram({ result, system }: { result: CalculatorResult; system: UnitSystem }) {
  const { inputs, figures } = result
  if (!inputs || !figures) return <p className="text-soft">The curve stands here once there is a result.</p>
  const heatInput = Number(inputs.heatInput ?? figures.heatInput)
  const given = { heatInput, preheat: Number(inputs.preheat), f2: Number(inputs.f2), f3: Number(inputs.f3) }
  const thickness = Number(inputs.thickness)
  const here = coolingTime({ ...given, thickness }).figures
  if (!here) return null
  const { transitionThickness, threeDimensional, regime, t85 } = here
  const unit = SHOWN_UNIT[system].length
  const shown = (mm: number) => fromSi(mm, 'length', unit)
  const most = Math.max(thickness * 1.4, transitionThickness * 1.8)
  const least = Math.max(most / 60, Math.min(thickness, transitionThickness) * 0.55)
  const top = Math.max(t85 * 1.3, threeDimensional * 2.2)
  const twoAt = (mm: number) => coolingTime({ ...given, thickness: mm }).figures?.twoDimensional ?? 0
  const steps = Array.from({ length: 50 }, (_, index) => least + ((most - least) / 49) * index)
  const inWords = (mm: number) => `${formatNumber(mm, 'length', unit)} ${unit}`
  return (
    <figure className="space-y-1">
      <PlotFrame title="Cooling time against thickness" description={`At ${inWords(thickness)} the cooling time is ${figure(t85)} s and heat flows in ${regime === '2D' ? 'two' : 'three'} dimensions; the transition thickness is ${inWords(transitionThickness)}.`} x={{ from: 0, to: shown(most), label: `Thickness, ${unit}` }} y={{ from: 0, to: top, label: 't8/5, s' }} ratio={0.5}>
        {({ x, y, box, clip, narrow }) => {
          const at = x(shown(transitionThickness))
          return (
            <>
              <rect x={box.left} y={box.top} width={Math.max(0, at - box.left)} height={box.bottom - box.top} fill="var(--plum-bg)" opacity={0.6} />
              <text x={at - 6} y={box.top + 14} textAnchor="end" fontSize="12" fontWeight="600" fill="var(--heat-1)">
                {narrow ? '2-D' : 'two-dimensional'}
              </text>
              <text x={at + 6} y={box.top + 14} fontSize="12" fontWeight="600" fill="var(--heat-2)">
                {narrow ? '3-D' : 'three-dimensional'}
              </text>
              <g clipPath={clip} fill="none">
                <path d={steps.map((mm, index) => `${index === 0 ? 'M' : 'L'}${x(shown(mm)).toFixed(1)} ${y(twoAt(mm)).toFixed(1)}`).join('')} stroke="var(--heat-1)" strokeWidth={1} strokeDasharray="4 3" />
                <path d={`M${box.left} ${y(threeDimensional)}H${box.right}`} stroke="var(--heat-2)" strokeWidth={1} strokeDasharray="4 3" />
                <path d={steps.map((mm, index) => `${index === 0 ? 'M' : 'L'}${x(shown(mm)).toFixed(1)} ${y(Math.max(twoAt(mm), threeDimensional)).toFixed(1)}`).join('')} stroke="var(--ink)" strokeWidth={2.5} />
              </g>
              <path d={`M${at} ${box.top}V${box.bottom}`} stroke="var(--edge)" strokeDasharray="2 3" />
              <path d={`M${x(shown(thickness))} ${box.bottom}V${y(t85)}H${box.left}`} fill="none" stroke="var(--oxide)" strokeDasharray="2 3" />
              <Mark x={x(shown(thickness))} y={y(t85)} shape="disc" colour="var(--oxide)" />
            </>
          )
        }}
      </PlotFrame>
      <figcaption className="text-sm text-soft">
        The longer of the two formulas counts. They meet at a thickness of {inWords(transitionThickness)}: thinner plate cools in two dimensions. This one is {inWords(thickness)}, {regime === '2D' ? 'two-dimensional' : 'three-dimensional'}.
      </figcaption>
    </figure>
  )
}
