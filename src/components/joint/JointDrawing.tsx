import { useId } from 'react'
import type { JointGeometry } from '@shared/calculations/joint-geometry.ts'
import type { Polygon } from '@shared/calculations/polygon.ts'
import { useWidth } from '@/hooks/width.ts'
import { dimensionsInWords, placeDimension, type View } from './dimensions.ts'

export interface JointDrawingProps {
  geometry: JointGeometry
  /** Highest drawing in px, dimensions left out. */
  maxHeight?: number
  /** Without dimensions and notes, for lists. */
  bare?: boolean
}

const HEATS = ['fill-heat-1', 'fill-heat-2', 'fill-heat-3', 'fill-heat-4'] as const
/** Heat tints in their order over any number of passes: the first plum, the last straw. */
export const heatOf = (order: number, count: number): number => (count <= 4 ? order : Math.min(3, Math.floor((order * 4) / count)))

/** The cross-section of a joint with its pass build-up and dimensions; says what it had to take, or why it can't be drawn. */
export function JointDrawing({ geometry, maxHeight = 190, bare = false }: JointDrawingProps) {
  const [frame, width] = useWidth(480)
  const hatch = useId()
  const { plates, backing, weld, passes, dimensions, bounds, impossible, assumed } = geometry
  if (impossible.length > 0) {
    return (
      <div className="px-4 py-5 text-soft">
        <p className="font-medium text-ink">The joint can’t be drawn yet.</p>
        <ul className="mt-1 list-disc pl-5">
          {impossible.map((reason) => (
            <li key={reason}>{reason}</li>
          ))}
        </ul>
      </div>
    )
  }
  const has = (kind: string) => dimensions.some((dimension) => dimension.kind === kind)
  const room = bare ? { x: 6, top: 6, bottom: 6 } : { x: 92, top: has('included-angle') ? (has('bevel-angle') ? 80 : 62) : has('bevel-angle') ? 58 : 40, bottom: 38 }
  // Thicknesses stand to the right of the section, and in inches they are long words.
  const right = bare ? room.x : Math.max(room.x, ...dimensions.map(({ kind, text }) => (kind.startsWith('thickness') ? 32 + text.length * 7.8 : 0)))
  const wide = Math.max(bounds.maxX - bounds.minX, 1)
  const tall = Math.max(bounds.maxY - bounds.minY, 1)
  const scale = Math.min(Math.max(width - room.x - right, 80) / wide, maxHeight / tall)
  const height = tall * scale + room.top + room.bottom
  const left = Math.max(0, Math.min((width - wide * scale) / 2, width - right - wide * scale))
  const view: View = {
    at: ({ x, y }) => ({ x: left + (x - bounds.minX) * scale, y: room.top + (bounds.maxY - y) * scale }),
    bounds,
    box: { left, right: left + wide * scale, top: room.top, bottom: room.top + tall * scale },
  }
  const outline = (polygon: Polygon) => `${polygon.map((point, index) => `${index === 0 ? 'M' : 'L'}${view.at(point).x.toFixed(1)} ${view.at(point).y.toFixed(1)}`).join('')}Z`
  const fits = (polygon: Polygon) => Math.min(spanOf(polygon.map(({ x }) => x)), spanOf(polygon.map(({ y }) => y))) * scale >= 13
  const drawn = bare ? [] : dimensions.map((dimension) => placeDimension(dimension, view, { bevelAngle: has('bevel-angle'), rootFace: has('root-face') }))
  // A wide angle's arc rises above the room that is kept for it.
  const lift = Math.max(0, ...drawn.map(({ text }) => 16 - text.y))
  const words = `Joint cross-section${dimensions.length > 0 ? `: ${dimensionsInWords(dimensions)}` : ''}. ${passes.length === 0 ? 'No passes listed.' : `${passes.length} ${passes.length === 1 ? 'pass' : 'passes'}.`}`
  return (
    <div ref={frame} className="min-w-0">
      <svg width={width} height={height + lift} viewBox={`0 ${-lift} ${width} ${height + lift}`} role="img" aria-label={words} className="block max-w-full" fill="none">
        <defs>
          <pattern id={hatch} width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <path d="M0 0V9" className="stroke-edge" strokeWidth="0.8" />
          </pattern>
        </defs>
        {plates.map((polygon, index) => (
          <path key={index} d={outline(polygon)} fill={`url(#${hatch})`} className="stroke-ink" strokeWidth="1.75" strokeLinejoin="round" />
        ))}
        {backing && <path d={outline(backing)} className="fill-hair stroke-ink" strokeWidth="1.5" />}
        {passes.length === 0 && weld.map((polygon, index) => <path key={index} d={outline(polygon)} className="fill-paper stroke-soft" strokeDasharray="5 3" />)}
        {passes.map((pass) => (
          <path key={pass.order} d={outline(pass.polygon)} className={`${HEATS[heatOf(pass.order, passes.length)]} stroke-sheet`} strokeWidth="1.25" strokeLinejoin="round" />
        ))}
        {passes
          .filter(({ polygon }) => fits(polygon))
          .map((pass) => {
            const { x, y } = view.at(pass.labelAt)
            return (
              <text key={pass.order} x={x} y={y + 6} textAnchor="middle" aria-hidden="true" className={`font-narrow text-[17px] font-semibold ${heatOf(pass.order, passes.length) >= 2 ? 'fill-[#1b2226]' : 'fill-[#ffffff]'}`}>
                {pass.number}
              </text>
            )
          })}
        {drawn.map(({ path, heads, text }, index) => (
          <g key={index} aria-hidden="true">
            <path d={path} className="stroke-soft" strokeWidth="1" />
            <path d={heads} className="fill-soft" />
            <text x={text.x} y={text.y} textAnchor={text.anchor} className="fill-ink stroke-sheet text-[14px] font-medium" strokeWidth="4" paintOrder="stroke" strokeLinejoin="round">
              {text.words}
            </text>
          </g>
        ))}
      </svg>
      {!bare && assumed.length > 0 && <p className="px-4 pb-3 text-xs text-soft">Drawn with what the record leaves open: {assumed.join(' ')}</p>}
    </div>
  )
}

const spanOf = (values: readonly number[]): number => Math.max(...values) - Math.min(...values)
