import { useMemo } from 'react'
import { geometryOf } from '@shared/calculations/joint-geometry.ts'
import { JointDesigner } from '@/components/joint/JointDesigner.tsx'
import { JointDrawing } from '@/components/joint/JointDrawing.tsx'
import { JointFigures } from '@/components/joint/JointFigures.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { JOINT } from './catalogue.ts'
import { useSheet } from './context.ts'
import { BACKINGS, GROOVES, WELDS, wordOf } from './options.ts'
import { JointWork } from './RowWork.tsx'
import { SheetField } from './SheetField.tsx'

/** The joint, drawn as it is typed and to be changed at the drawing, with what follows from its figures, then its rows. */
export function JointSheet() {
  const { content, system, control, record } = useSheet()
  const { joint } = content.variables
  const shape = joint.weld === 'fillet' || !joint.groove ? wordOf(WELDS, joint.weld) : `${wordOf(GROOVES, joint.groove)} groove`
  const backing = joint.backing && joint.backing !== 'none' ? `, backing ${wordOf(BACKINGS, joint.backing).toLowerCase()}` : ''
  return (
    <Sheet id="joint" title="Joint" aside={`${shape}${backing}`}>
      {control ? <JointDesigner control={control} system={system} sequence={record !== 'coupon'} /> : <ReadJoint />}
      <JointWork />
      {/* The drawing stays in sight on a desk: what has the focus must not lie under it. */}
      <div className={control ? '[@media(min-height:800px)_and_(min-width:1024px)]:[&_:is(input,select,textarea,button)]:scroll-mt-112' : ''}>
        {JOINT.rows.map((spec) => (
          <SheetField key={spec.path} spec={spec} />
        ))}
      </div>
    </Sheet>
  )
}

/** The drawing and its figures, to be read. */
function ReadJoint() {
  const { content, system } = useSheet()
  const { variables } = content
  const geometry = useMemo(() => geometryOf(variables, system), [variables, system])
  return (
    <figure className="grid border-b border-rule sm:grid-cols-[minmax(0,1fr)_12.5rem]">
      <div className="min-w-0 px-2 py-2">
        <JointDrawing geometry={geometry} maxHeight={240} />
      </div>
      <figcaption className="border-hair px-4 py-3 max-sm:border-t sm:border-l">
        <JointFigures geometry={geometry} fillet={variables.joint.weld === 'fillet'} system={system} />
      </figcaption>
    </figure>
  )
}
