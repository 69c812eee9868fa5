import { useDeferredValue, useState } from 'react'
import type { Control, FieldValues } from 'react-hook-form'
import type { Interval } from '@shared/schemas/common.ts'
import { handlesOf, movedInterval, type JointHandle } from '@shared/calculations/joint-handles.ts'
import { jointPicture } from '@shared/calculations/joint-picture.ts'
import { markName } from '@shared/calculations/joint-placing.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { say } from '@/components/toast.tsx'
import { useWidth } from '@/hooks/width.ts'
import { DetailNote } from './DetailNote.tsx'
import { DetailPicker } from './DetailPicker.tsx'
import { FigureEditor } from './FigureEditor.tsx'
import { Undrawn } from './JointDrawing.tsx'
import { JointFigures } from './JointFigures.tsx'
import { JointStage } from './JointStage.tsx'
import { useJointLive, useJointStore } from './live.tsx'
import { PassSequence } from './PassSequence.tsx'
import { useJointEdit } from './use-joint-edit.ts'

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)

interface Editing { field: string; label: string; dimension: 'length' | 'angle'; value: Interval | null; at: { x: number; y: number } }

/**
 * The joint drawn large and to scale, to be changed by hand: handles are dragged or moved with arrow keys, a figure is written where it
 * stands, a standard detail fills all of them. The sheet's own fields and the drawing follow one another.
 * @param sequence whether passes are planned here; a coupon logs them on its run sheet
 */
export function JointDesigner({ control, system, sequence }: { control: Control<FieldValues>; system: UnitSystem; sequence: boolean }) {
  const edit = useJointEdit(control, system)
  const { variables, setting, geometry, kept } = edit
  const store = useJointStore()
  const hot = useJointLive((live) => live.hot)
  const [frame, width] = useWidth(480)
  const [hotPass, setHotPass] = useState<number | null>(null)
  const [editing, setEditing] = useState<Editing | null>(null)
  const [picking, setPicking] = useState(false)
  const drawable = geometry.problems.length === 0
  const picture = drawable ? jointPicture(geometry, { width, maxHeight: width < 520 ? 220 : 300 }) : null
  const handles = drawable ? handlesOf(setting, geometry) : []
  const { joint } = variables
  // The list below follows when there is time; the drawing at once.
  const [restedVariables, restedGeometry] = [useDeferredValue(variables), useDeferredValue(geometry)]

  const open = (field: string, handle: JointHandle | null) => {
    if (!picture) return
    edit.settle()
    const mark = picture.marks.find((one) => one.field === field)
    const at = mark ? mark.text : handle ? picture.at(handle.at) : { x: width / 2, y: 20 }
    setEditing({ field, label: handle?.label ?? capital(mark ? markName(mark.kind) : 'figure'), dimension: handle?.dimension ?? (/[aA]ngle/.test(field) && field !== 'joint.angleChange' ? 'angle' : 'length'), value: kept(field), at: { x: Math.max(4, Math.min(at.x - 88, width - 180)), y: Math.max(4, at.y - 30) } })
  }
  const close = () => {
    const from = editing?.field
    setEditing(null)
    // The focus goes back to the handle from which the figure was opened.
    requestAnimationFrame(() => document.querySelector<SVGGElement>(`[data-handle="${from}"]`)?.focus())
  }
  const takeDetail = (change: Parameters<typeof edit.setJoint>[0], code: string) => {
    const before = joint
    edit.setJoint(change)
    setPicking(false)
    say(`${code} filled in, as detailed`, { undo: () => edit.setJoint(before) })
  }

  return (
    <>
      <figure className="grid border-b border-rule bg-sheet [@media(min-height:800px)_and_(min-width:1024px)]:sticky [@media(min-height:800px)_and_(min-width:1024px)]:top-0 [@media(min-height:800px)_and_(min-width:1024px)]:z-10 sm:grid-cols-[minmax(0,1fr)_12.5rem]">
        <div className="relative min-h-56 min-w-0 px-2 py-2 sm:min-h-80">
          <div ref={frame} className="min-w-0">
            {picture ? (
              <JointStage geometry={geometry} picture={picture} handles={handles} system={system} hot={hot} hotPass={hotPass} onHot={store.setHot} onMove={(handle, value) => edit.show(handle.path, movedInterval(kept(handle.path), value, handle.dimension, system))} onSettle={edit.settle} onEdit={open} />
            ) : (
              <Undrawn geometry={geometry} />
            )}
          </div>
          {editing && (
            <div className="no-print absolute z-10" style={{ left: editing.at.x, top: editing.at.y }}>
              <FigureEditor
                key={editing.field}
                label={editing.label}
                dimension={editing.dimension}
                system={system}
                value={editing.value}
                onTyping={(value) => edit.show(editing.field, value)}
                onDone={(value) => {
                  edit.write(editing.field, value)
                  close()
                }}
                onCancel={() => {
                  edit.cancel(editing.field)
                  close()
                }}
              />
            </div>
          )}
          {geometry.assumed.length > 0 && picture && <p className="px-2 pb-1 text-xs text-soft">Drawn with what the record leaves open: {geometry.assumed.join(' ')}</p>}
          {picture && <p className="no-print px-2 text-xs text-soft">Drag a handle, or move it with the arrow keys. A click on a figure, or Enter on its handle, writes it.</p>}
        </div>
        <figcaption className="border-hair px-4 py-3 max-sm:border-t sm:border-l">
          <JointFigures geometry={geometry} fillet={joint.weld === 'fillet'} system={system} />
          {joint.weld === 'groove' && (
            <p className="no-print mt-4">
              <Button onClick={() => setPicking(true)}>Standard details</Button>
            </p>
          )}
        </figcaption>
      </figure>
      <DetailNote joint={joint} thickness={variables.thickness} system={variables.unitSystem} />
      {sequence && <PassSequence variables={restedVariables} geometry={restedGeometry} system={system} onChange={edit.changeBlocks} onHot={setHotPass} />}
      {picking && <DetailPicker variables={variables} onClose={() => setPicking(false)} onPick={takeDetail} />}
    </>
  )
}
