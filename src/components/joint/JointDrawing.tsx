import { useId, useMemo } from 'react'
import type { JointGeometry } from '@shared/calculations/joint-geometry.ts'
import { jointPicture } from '@shared/calculations/joint-picture.ts'
import { dimensionsInWords } from '@shared/calculations/joint-placing.ts'
import { useWidth } from '@/hooks/width.ts'
import { JointSvg } from './JointSvg.tsx'

export interface JointDrawingProps {
  geometry: JointGeometry
  /** Highest drawing in px, dimensions left out. */
  maxHeight?: number
  /** Without dimensions and notes, for lists. */
  bare?: boolean
}

/** What a section shows, for whoever hears it. */
export function sectionInWords({ dimensions, passes }: JointGeometry): string {
  return `Joint cross-section${dimensions.length > 0 ? `: ${dimensionsInWords(dimensions)}` : ''}. ${passes.length === 0 ? 'No passes listed.' : `${passes.length} ${passes.length === 1 ? 'pass' : 'passes'}.`}`
}

/** Why a joint can't be drawn. */
export function Undrawn({ geometry }: { geometry: JointGeometry }) {
  return (
    <div className="px-4 py-5 text-soft">
      <p className="font-medium text-ink">The joint can’t be drawn yet.</p>
      <ul className="mt-1 list-disc pl-5">
        {geometry.impossible.map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
      </ul>
    </div>
  )
}

/** The cross-section of a joint with its pass build-up and dimensions; says what it had to take, or why it can't be drawn. */
export function JointDrawing({ geometry, maxHeight = 190, bare = false }: JointDrawingProps) {
  const [frame, width] = useWidth(480)
  const hatch = useId()
  const drawable = geometry.impossible.length === 0
  const picture = useMemo(() => (drawable ? jointPicture(geometry, { width, maxHeight, bare }) : null), [drawable, geometry, width, maxHeight, bare])
  if (!picture) return <Undrawn geometry={geometry} />
  return (
    <div ref={frame} className="min-w-0">
      <svg width={width} height={picture.height} viewBox={`0 0 ${width} ${picture.height}`} role="img" aria-label={sectionInWords(geometry)} className="block max-w-full" fill="none">
        <JointSvg picture={picture} hatch={hatch} />
      </svg>
      {!bare && geometry.assumed.length > 0 && <p className="px-4 pb-3 text-xs text-soft">Drawn with what the record leaves open: {geometry.assumed.join(' ')}</p>}
    </div>
  )
}
