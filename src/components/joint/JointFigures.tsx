import type { JointGeometry } from '@shared/calculations/joint-geometry.ts'
import { fromSi } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { figure } from '@/lib/figures.ts'

type Line = [label: string, value: string, unit: string]

const area = (mm2: number, system: UnitSystem): [string, string] => (system === 'SI' ? [figure(mm2, mm2 < 100 ? 1 : 0), 'mm²'] : [figure(fromSi(mm2, 'area', 'in²'), 3), 'in²'])
const perLength = (kgPerM: number, system: UnitSystem): [string, string] => (system === 'SI' ? [figure(kgPerM, kgPerM < 0.1 ? 3 : 2), 'kg/m'] : [figure(fromSi(kgPerM, 'mass', 'lb') * 0.3048, 2), 'lb/ft'])
const mass = (kg: number, system: UnitSystem): [string, string] => (system === 'SI' ? [figure(kg, 2), 'kg'] : [figure(fromSi(kg, 'mass', 'lb'), 2), 'lb'])
const length = (mm: number, system: UnitSystem): [string, string] => (system === 'SI' ? [figure(mm, 1), 'mm'] : [figure(fromSi(mm, 'length', 'in'), 3), 'in'])

/** What follows from a joint's figures. */
export function JointFigures({ geometry, fillet, system }: { geometry: JointGeometry; fillet: boolean; system: UnitSystem }) {
  const { areaMm2, weldMetalKgPerM, weldMetalRoundKg, throatMm, passes } = geometry
  const lines: Line[] = []
  if (areaMm2 !== null) lines.push([fillet ? 'Fillet area' : 'Groove area', ...area(areaMm2, system)])
  if (throatMm !== null) lines.push(['Throat', ...length(throatMm, system)])
  if (weldMetalKgPerM !== null) lines.push(['Weld metal', ...perLength(weldMetalKgPerM, system)])
  if (weldMetalRoundKg !== null) lines.push(['Once round', ...mass(weldMetalRoundKg, system)])
  if (passes.length > 0) lines.push(['Passes', String(passes.length), ''])
  return (
    <>
      <p className="cell-label">Computed</p>
      {lines.length > 0 ? (
        <dl className="mt-1.5 space-y-1">
          {lines.map(([label, value, unit]) => (
            <div key={label} className="flex justify-between gap-3">
              <dt>{label}</dt>
              <dd className="font-semibold whitespace-nowrap">
                {value} <span className="font-normal text-soft">{unit}</span>
              </dd>
            </div>
          ))}
        </dl>
      ) : (
        <p className="mt-1.5 text-sm text-soft">Area and weld metal follow once the joint can be drawn.</p>
      )}
    </>
  )
}
