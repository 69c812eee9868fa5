import { useId, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react'
import type { JointGeometry } from '@shared/calculations/joint-geometry.ts'
import { settled, stepOf, type JointHandle } from '@shared/calculations/joint-handles.ts'
import type { JointPicture } from '@shared/calculations/joint-picture.ts'
import { formatInterval } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { interval } from '@shared/units/convert.ts'
import { sectionInWords } from './JointDrawing.tsx'
import { JointSvg } from './JointSvg.tsx'

export interface JointStageProps {
  geometry: JointGeometry
  picture: JointPicture
  handles: readonly JointHandle[]
  system: UnitSystem
  hot: string | null
  hotPass: number | null
  onHot: (field: string | null) => void
  /** A handle at a value; told at every move. */
  onMove: (handle: JointHandle, value: number) => void
  /** The handle was let go. */
  onSettle: () => void
  /** A figure was chosen to be written. */
  onEdit: (field: string, handle: JointHandle | null) => void
}

const words = (handle: JointHandle, system: UnitSystem): string => formatInterval(interval(handle.value, undefined, handle.dimension), handle.dimension, system, { asTyped: false }).text

/** The drawing with its handles: dragged, or moved with the arrow keys; Enter or a click on a figure writes it. */
export function JointStage({ geometry, picture, handles, system, hot, hotPass, onHot, onMove, onSettle, onEdit }: JointStageProps) {
  const hatch = useId()
  const svg = useRef<SVGSVGElement>(null)
  // The drawing is scaled anew at every move; a drag goes on in the scale in which it began, so that the handle keeps to the hand.
  const drag = useRef<{ handle: JointHandle; picture: JointPicture; at: { x: number; y: number }; grip: { x: number; y: number } } | null>(null)
  const [dragging, setDragging] = useState<string | null>(null)

  const start = (event: PointerEvent<SVGGElement>, handle: JointHandle) => {
    if (event.button !== 0) return
    event.preventDefault()
    event.currentTarget.focus()
    event.currentTarget.setPointerCapture(event.pointerId)
    drag.current = { handle, picture, at: picture.at(handle.at), grip: { x: event.clientX, y: event.clientY } }
    setDragging(handle.path)
  }
  const move = (event: PointerEvent<SVGGElement>) => {
    const held = drag.current
    if (!held) return
    const place = held.picture.from({ x: held.at.x + event.clientX - held.grip.x, y: held.at.y + event.clientY - held.grip.y })
    onMove(held.handle, settled(held.handle, held.handle.read(place), system))
  }
  const end = () => {
    if (!drag.current) return
    drag.current = null
    setDragging(null)
    onSettle()
  }
  const onKey = (event: KeyboardEvent<SVGGElement>, handle: JointHandle) => {
    if (event.key === 'Enter') {
      event.preventDefault()
      onEdit(handle.path, handle)
      return
    }
    const step = stepOf(handle.dimension, system)
    const turns: Record<string, number> = { ArrowUp: 1, ArrowRight: 1, ArrowDown: -1, ArrowLeft: -1, PageUp: 10, PageDown: -10 }
    const turn = turns[event.key]
    const value = event.key === 'Home' ? handle.min : event.key === 'End' ? handle.max : turn === undefined ? null : handle.value + turn * step
    if (value === null || event.ctrlKey || event.metaKey || event.altKey) return
    event.preventDefault()
    onMove(handle, settled(handle, value, system))
  }

  return (
    <svg ref={svg} width={picture.width} height={picture.height} viewBox={`0 0 ${picture.width} ${picture.height}`} role="group" aria-label={sectionInWords(geometry)} className="block max-w-full touch-pan-y select-none" fill="none">
      <JointSvg picture={picture} hatch={hatch} hot={hot} hotPass={hotPass} onMark={(field) => onEdit(field, handles.find(({ path }) => path === field) ?? null)} />
      {handles.map((handle) => {
        const { x, y } = picture.at(handle.at)
        const active = hot === handle.path || dragging === handle.path
        return (
          <g
            key={`${handle.path} ${handle.label}`}
            role="slider"
            tabIndex={0}
            aria-label={handle.label}
            aria-valuenow={Number(handle.value.toFixed(2))}
            aria-valuemin={Number(handle.min.toFixed(2))}
            aria-valuemax={Number(Math.max(handle.max, handle.value).toFixed(2))}
            aria-valuetext={words(handle, system)}
            aria-orientation={handle.axis === 'x' ? 'horizontal' : 'vertical'}
            data-handle={handle.path}
            className={`no-print touch-none outline-none ${handle.axis === 'x' ? 'cursor-ew-resize' : 'cursor-ns-resize'} group`}
            onPointerDown={(event) => start(event, handle)}
            onPointerMove={move}
            onPointerUp={end}
            onPointerCancel={end}
            onPointerEnter={() => !drag.current && onHot(handle.path)}
            onPointerLeave={() => !drag.current && onHot(null)}
            onFocus={() => onHot(handle.path)}
            onBlur={() => {
              onHot(null)
              onSettle()
            }}
            onKeyDown={(event) => onKey(event, handle)}
          >
            <circle cx={x} cy={y} r="16" className="fill-transparent" />
            <circle cx={x} cy={y} r="9" className="stroke-steel opacity-0 group-focus-visible:opacity-100" strokeWidth="2" />
            <rect x={x - 4.5} y={y - 4.5} width="9" height="9" transform={`rotate(45 ${x} ${y})`} className={`stroke-steel ${active ? 'fill-steel' : 'fill-sheet'}`} strokeWidth="2" />
          </g>
        )
      })}
    </svg>
  )
}
