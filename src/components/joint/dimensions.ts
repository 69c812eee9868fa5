/** Where a joint's dimensions are drawn: millimetres in, strokes and texts in px out. */
import type { JointDimension } from '@shared/calculations/joint-geometry.ts'
import type { Bounds, Point } from '@shared/calculations/polygon.ts'

/** Millimetres (y up) to px (y down). */
export interface View {
  at: (point: Point) => Point
  bounds: Bounds
  /** px of the drawn section, without the room for dimensions. */
  box: { left: number; top: number; right: number; bottom: number }
}

export interface Drawn {
  /** SVG path of dimension and extension lines. */
  path: string
  /** SVG path of arrow heads, filled. */
  heads: string
  text: { x: number; y: number; anchor: 'start' | 'middle' | 'end'; words: string }
}

const NAMES: Record<JointDimension['kind'], string> = {
  thickness: 'thickness',
  'thickness-b': 'thickness of the second member',
  'root-opening': 'root opening',
  'root-face': 'root face',
  'included-angle': 'included angle',
  'bevel-angle': 'bevel angle',
  'root-radius': 'root radius',
  leg: 'leg',
}
/** "thickness 10 mm, included angle 60°" */
export const dimensionsInWords = (dimensions: readonly JointDimension[]): string => dimensions.map(({ kind, text }) => `${NAMES[kind]} ${text}`).join(', ')

const round = (value: number) => Math.round(value * 10) / 10
const p = (point: Point) => `${round(point.x)} ${round(point.y)}`

/** Arrow head with its tip at `tip`, pointing along `angle` (radians, px axes). */
function head(tip: Point, angle: number): string {
  const wing = (turn: number): Point => ({ x: tip.x - 8 * Math.cos(angle + turn), y: tip.y - 8 * Math.sin(angle + turn) })
  return `M${p(tip)}L${p(wing(0.32))}L${p(wing(-0.32))}Z`
}

/** A vertical measure, out to the nearer side. */
function upright(from: Point, to: Point, view: View, words: string): Drawn {
  const right = from.x >= (view.box.left + view.box.right) / 2
  const sign = right ? 1 : -1
  const x = (right ? Math.max(from.x, to.x) : Math.min(from.x, to.x)) + sign * 16
  const [top, bottom] = [Math.min(from.y, to.y), Math.max(from.y, to.y)]
  const tight = bottom - top < 22
  return {
    path: `M${p({ x: from.x + sign * 3, y: from.y })}H${x + sign * 5}M${p({ x: to.x + sign * 3, y: to.y })}H${x + sign * 5}M${p({ x, y: top - (tight ? 14 : 0) })}V${round(bottom + (tight ? 14 : 0))}`,
    heads: tight ? head({ x, y: top }, Math.PI / 2) + head({ x, y: bottom }, -Math.PI / 2) : head({ x, y: top }, -Math.PI / 2) + head({ x, y: bottom }, Math.PI / 2),
    text: { x: x + sign * 10, y: (top + bottom) / 2 + 5, anchor: right ? 'start' : 'end', words },
  }
}

/** A level measure below (or above) the section; arrows from outside where the gap is small. */
function level(from: Point, to: Point, view: View, words: string, side: 'left' | 'right'): Drawn {
  const below = (from.y + to.y) / 2 >= (view.box.top + view.box.bottom) / 2
  const y = below ? view.box.bottom + 18 : view.box.top - 18
  const [left, right] = [Math.min(from.x, to.x), Math.max(from.x, to.x)]
  const step = below ? 3 : -3
  const reach = below ? 5 : -5
  const ends = `M${round(left)} ${round((from.x <= to.x ? from.y : to.y) + step)}V${y + reach}M${round(right)} ${round((from.x <= to.x ? to.y : from.y) + step)}V${y + reach}`
  if (right - left < 90) {
    return {
      path: `${ends}M${round(left - 20)} ${y}H${round(left)}M${round(right)} ${y}H${round(right + 20)}`,
      heads: head({ x: left, y }, 0) + head({ x: right, y }, Math.PI),
      text: side === 'right' ? { x: right + 26, y: y + 5, anchor: 'start', words } : { x: left - 26, y: y + 5, anchor: 'end', words },
    }
  }
  return {
    path: `${ends}M${round(left)} ${y}H${round(right)}`,
    heads: head({ x: left, y }, Math.PI) + head({ x: right, y }, 0),
    text: { x: (left + right) / 2, y: y + (below ? 17 : -7), anchor: 'middle', words },
  }
}

/** An angle, as an arc beyond the plate's surface. */
function angle(from: Point, to: Point, vertex: Point, beyond: number, words: string, side: 'middle' | 'end'): Drawn {
  const reach = Math.max(Math.hypot(from.x - vertex.x, from.y - vertex.y), Math.hypot(to.x - vertex.x, to.y - vertex.y)) + beyond
  const a = Math.atan2(from.y - vertex.y, from.x - vertex.x)
  const b = Math.atan2(to.y - vertex.y, to.x - vertex.x)
  const out = (turn: number, radius: number): Point => ({ x: vertex.x + radius * Math.cos(turn), y: vertex.y + radius * Math.sin(turn) })
  const middle = out((a + b) / 2, reach)
  const last = out(b, reach)
  const sweep = b > a ? 1 : 0
  const tilt = sweep ? 1 : -1
  return {
    path: `M${p(from)}L${p(out(a, reach + 5))}M${p(to)}L${p(out(b, reach + 5))}M${p(out(a, reach))}A${round(reach)} ${round(reach)} 0 0 ${sweep} ${p(last)}`,
    heads: head(out(a, reach), a - (tilt * Math.PI) / 2) + head(last, b + (tilt * Math.PI) / 2),
    text: side === 'middle' ? { x: middle.x, y: middle.y - 8, anchor: 'middle', words } : { x: last.x + 10, y: last.y + 2, anchor: 'start', words },
  }
}

/** What else is drawn, as far as one dimension must make room for another. */
export interface Company {
  bevelAngle: boolean
  rootFace: boolean
}

/** Places one dimension. */
export function placeDimension(dimension: JointDimension, view: View, company: Company): Drawn {
  const { kind, text } = dimension
  const [from, to] = [view.at(dimension.from), view.at(dimension.to)]
  const vertex = dimension.vertex && view.at(dimension.vertex)
  if (vertex) return kind === 'included-angle' ? angle(from, to, vertex, company.bevelAngle ? 32 : 16, text, 'middle') : angle(from, to, vertex, 10, text, 'end')
  if (kind === 'root-radius') {
    const away = Math.atan2(to.y - from.y, to.x - from.x)
    const end = { x: to.x + 22 * Math.cos(away), y: to.y + 22 * Math.sin(away) }
    return { path: `M${p(from)}L${p(end)}`, heads: head(to, away), text: { x: end.x + 5, y: end.y + 3, anchor: 'start', words: `R ${text}` } }
  }
  if (kind === 'root-face') {
    const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 }
    const [x, y] = [middle.x + 40, view.box.bottom + 18]
    return { path: `M${p(middle)}L${round(x)} ${y}H${round(x + 6)}`, heads: head(middle, Math.atan2(middle.y - y, middle.x - x)), text: { x: x + 10, y: y + 5, anchor: 'start', words: `face ${text}` } }
  }
  return Math.abs(to.y - from.y) > Math.abs(to.x - from.x) ? upright(from, to, view, text) : level(from, to, view, text, kind === 'root-opening' && company.rootFace ? 'left' : 'right')
}
