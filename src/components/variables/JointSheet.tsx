import { useDeferredValue, useMemo } from 'react'
import { geometryOf } from '@shared/calculations/joint-geometry.ts'
import { fromSi } from '@shared/units/convert.ts'
import { JointDrawing } from '@/components/joint/JointDrawing.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { figure } from '@/lib/figures.ts'
import { JOINT } from './catalogue.ts'
import { useSheet } from './context.ts'
import { BACKINGS, GROOVES, WELDS, wordOf } from './options.ts'
import { JointWork } from './RowWork.tsx'
import { SheetField } from './SheetField.tsx'

/** The joint, drawn as it is typed, with what follows from its figures, then its rows. */
export function JointSheet() {
  const { content, system } = useSheet()
  const variables = useDeferredValue(content.variables)
  const { joint } = variables
  const geometry = useMemo(() => geometryOf(variables, system), [variables, system])
  const shape = joint.weld === 'fillet' || !joint.groove ? wordOf(WELDS, joint.weld) : `${wordOf(GROOVES, joint.groove)} groove`
  const backing = joint.backing && joint.backing !== 'none' ? `, backing ${wordOf(BACKINGS, joint.backing).toLowerCase()}` : ''
  const { areaMm2, weldMetalKgPerM, passes } = geometry
  const computed: [string, string, string][] = []
  if (areaMm2 !== null) computed.push([joint.weld === 'fillet' ? 'Fillet area' : 'Groove area', system === 'SI' ? figure(areaMm2, 0) : figure(fromSi(areaMm2, 'area', 'in²'), 3), system === 'SI' ? 'mm²' : 'in²'])
  if (weldMetalKgPerM !== null) computed.push(['Weld metal', system === 'SI' ? figure(weldMetalKgPerM, 2) : figure(fromSi(weldMetalKgPerM, 'mass', 'lb') * 0.3048, 2), system === 'SI' ? 'kg/m' : 'lb/ft'])
  if (passes.length > 0) computed.push(['Passes', String(passes.length), ''])
  return (
    <Sheet id="joint" title="Joint" aside={`${shape}${backing}`}>
      <figure className="grid border-b border-rule sm:grid-cols-[minmax(0,1fr)_12.5rem]">
        <div className="min-w-0 px-2 py-2">
          <JointDrawing geometry={geometry} />
        </div>
        <figcaption className="border-hair px-4 py-3 max-sm:border-t sm:border-l">
          <p className="cell-label">Computed</p>
          {computed.length > 0 ? (
            <dl className="mt-1.5 space-y-1">
              {computed.map(([label, value, unit]) => (
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
        </figcaption>
      </figure>
      <JointWork />
      {JOINT.rows.map((spec) => (
        <SheetField key={spec.path} spec={spec} />
      ))}
    </Sheet>
  )
}
