import { useId, type ReactNode } from 'react'
import { useWidth } from '@/hooks/width.ts'
import { figure } from '@/lib/figures.ts'
import { ticksOf, type Span } from './scale.ts'

export interface Plotted {
  x: (value: number) => number
  y: (value: number) => number
  /** Of the part inside the axes, px. */
  box: { left: number; top: number; right: number; bottom: number }
  /** Narrow: fewer words fit. */
  narrow: boolean
  clip: string
}

export interface PlotFrameProps {
  /** What the drawing is. */
  title: string
  /** What it shows just now, in a sentence: read out in its place. */
  description: string
  x: Span & { label: string }
  y: Span & { label: string }
  /** Height over width. */
  ratio?: number
  children: (plotted: Plotted) => ReactNode
}

const [LEFT, RIGHT, TOP, FOOT] = [44, 12, 12, 42]

/** Axes with figures at the width that there is; what stands between them is drawn by the children. */
export function PlotFrame({ title, description, x, y, ratio = 0.62, children }: PlotFrameProps) {
  const [frame, width] = useWidth(640)
  const id = useId()
  const height = Math.round(Math.min(460, Math.max(240, width * ratio)))
  const box = { left: LEFT, top: TOP, right: Math.max(LEFT + 80, width - RIGHT), bottom: height - FOOT }
  const xOf = (value: number) => box.left + ((value - x.from) / (x.to - x.from)) * (box.right - box.left)
  const yOf = (value: number) => box.bottom - ((value - y.from) / (y.to - y.from)) * (box.bottom - box.top)
  return (
    <div ref={frame} className="min-w-0">
      <svg width={width} height={height} role="img" aria-labelledby={`${id}-title ${id}-about`} className="block max-w-full">
        <title id={`${id}-title`}>{title}</title>
        <desc id={`${id}-about`}>{description}</desc>
        <clipPath id={`${id}-clip`}>
          <rect x={box.left} y={box.top} width={box.right - box.left} height={box.bottom - box.top} />
        </clipPath>
        {ticksOf(x, (box.right - box.left) / 70).map((tick) => (
          <g key={tick}>
            <line x1={xOf(tick)} x2={xOf(tick)} y1={box.top} y2={box.bottom} stroke="var(--hair)" />
            <text x={xOf(tick)} y={box.bottom + 16} textAnchor="middle" fontSize="12" fill="var(--soft)">
              {figure(tick)}
            </text>
          </g>
        ))}
        {ticksOf(y, (box.bottom - box.top) / 44).map((tick) => (
          <g key={tick}>
            <line x1={box.left} x2={box.right} y1={yOf(tick)} y2={yOf(tick)} stroke="var(--hair)" />
            <text x={box.left - 6} y={yOf(tick) + 4} textAnchor="end" fontSize="12" fill="var(--soft)">
              {figure(tick)}
            </text>
          </g>
        ))}
        {children({ x: xOf, y: yOf, box, narrow: width < 480, clip: `url(#${id}-clip)` })}
        <path d={`M${box.left} ${box.top}V${box.bottom}H${box.right}`} fill="none" stroke="var(--ink)" />
        <text x={box.right} y={height - 6} textAnchor="end" fontSize="12" fill="var(--ink)">
          {x.label}
        </text>
        <text x={12} y={box.top} fontSize="12" fill="var(--ink)" textAnchor="end" transform={`rotate(-90 12 ${box.top})`}>
          {y.label}
        </text>
      </svg>
    </div>
  )
}

export type MarkShape = 'disc' | 'square' | 'diamond' | 'ring' | 'cross'

/** A point with its own shape, so that meaning never rests on colour alone. */
export function Mark({ x, y, shape, colour }: { x: number; y: number; shape: MarkShape; colour: string }) {
  switch (shape) {
    case 'disc':
      return <circle cx={x} cy={y} r={6} fill={colour} stroke="var(--sheet)" strokeWidth={1.5} />
    case 'ring':
      return <circle cx={x} cy={y} r={5.5} fill="var(--sheet)" stroke={colour} strokeWidth={2} />
    case 'square':
      return <rect x={x - 5} y={y - 5} width={10} height={10} fill={colour} stroke="var(--sheet)" strokeWidth={1.5} />
    case 'diamond':
      return <path d={`M${x} ${y - 7}L${x + 7} ${y}L${x} ${y + 7}L${x - 7} ${y}Z`} fill={colour} stroke="var(--sheet)" strokeWidth={1.5} />
    case 'cross':
      return <path d={`M${x - 5} ${y - 5}L${x + 5} ${y + 5}M${x + 5} ${y - 5}L${x - 5} ${y + 5}`} stroke={colour} strokeWidth={2.5} />
  }
}

export interface LegendRow {
  name: string
  shape: MarkShape
  colour: string
  /** Figures of the row, one for each head. */
  cells: readonly string[]
}

/** The points of a drawing as a table: its legend, and its reading for whoever can't see it. */
export function PointTable({ caption, heads, rows }: { caption: string; heads: readonly string[]; rows: readonly LegendRow[] }) {
  return (
    <table className="w-full border-collapse">
      <caption className="sr-only">{caption}</caption>
      <thead>
        <tr className="border-b border-rule text-left text-soft">
          <th scope="col" className="py-1 pr-3 font-normal">
            Point
          </th>
          {heads.map((head) => (
            <th key={head} scope="col" className="py-1 pl-3 text-right font-normal">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ name, shape, colour, cells }) => (
          <tr key={name} className="border-b border-hair last:border-b-0">
            <th scope="row" className="py-1 pr-3 text-left font-medium">
              <svg width="16" height="16" aria-hidden="true" className="mr-2 inline-block align-text-bottom">
                <Mark x={8} y={8} shape={shape} colour={colour} />
              </svg>
              {name}
            </th>
            {cells.map((cell, index) => (
              <td key={index} className="py-1 pl-3 text-right tabular-nums">
                {cell}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  )
}
