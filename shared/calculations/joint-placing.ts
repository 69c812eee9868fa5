/** Where a joint's dimensions are drawn: millimetres in, strokes and texts out, in the picture's own units (a figure is 14 high). */
import type { JointDimension, MarkKind } from './joint-marks.ts'
import type { Point } from './polygon.ts'

/** Millimetres (y up) to the picture (y down). */
export interface View {
  at: (point: Point) => Point
  /** The drawn section, without the room for dimensions. */
  box: { left: number; top: number; right: number; bottom: number }
  /** Width of a figure. */
  measure: (text: string) => number
}

export interface PlacedMark {
  kind: MarkKind
  /** Field of the weld's variables that holds the figure. */
  field: string
  /** SVG path of dimension and extension lines. */
  path: string
  /** SVG path of arrow heads, filled. */
  heads: string
  text: { x: number; y: number; anchor: 'start' | 'middle' | 'end'; words: string }
}

const NAMES: Record<MarkKind, string> = {
  thickness: 'thickness', 'thickness-b': 'thickness of the second member', 'root-opening': 'root opening', 'root-face': 'root face', 'included-angle': 'included angle', 'bevel-angle': 'bevel angle', 'root-radius': 'root radius', leg: 'leg', 'leg-b': 'leg on the second member',
  'groove-depth': 'groove depth', 'second-depth': 'depth of the second side', 'second-angle': 'angle of the second side', 'angle-change': 'angle changes at', 'upper-angle': 'angle of the upper part', taper: 'taper', 'member-angle': 'angle between the members', 'reinforcing-fillet': 'reinforcing fillet',
  'backing-thickness': 'backing thickness', 'backing-width': 'backing width', 'gouge-depth': 'gouging depth', 'insert-width': 'insert width', 'insert-height': 'insert height',
}
/** What a dimension is called. */
export const markName = (kind: MarkKind): string => NAMES[kind]
/** "thickness 10 mm, included angle 60°" */
export const dimensionsInWords = (dimensions: readonly JointDimension[]): string => dimensions.map(({ kind, text }) => `${NAMES[kind]} ${text}`).join(', ')

/** Words that tell a figure from its neighbours of the same look. */
const LEAD: Partial<Record<MarkKind, string>> = { 'root-face': 'face ', 'root-radius': 'R ', 'groove-depth': 'depth ', 'second-depth': 'depth ', 'gouge-depth': 'gouge ', taper: 'taper ', 'insert-width': 'insert ', 'backing-width': 'backing ', 'reinforcing-fillet': 'fillet ' }

const round = (value: number) => Math.round(value * 10) / 10
const p = (point: Point) => `${round(point.x)} ${round(point.y)}`
type Placing = Omit<PlacedMark, 'kind' | 'field'>

/** Arrow head with its tip at `tip`, pointing along `angle` (radians, y down). */
function head(tip: Point, angle: number): string {
  const wing = (turn: number): Point => ({ x: tip.x - 8 * Math.cos(angle + turn), y: tip.y - 8 * Math.sin(angle + turn) })
  return `M${p(tip)}L${p(wing(0.32))}L${p(wing(-0.32))}Z`
}

/** A vertical measure, out to the nearer side. */
function upright(from: Point, to: Point, view: View, words: string, leftwards: boolean): Placing {
  const right = !leftwards && from.x >= (view.box.left + view.box.right) / 2
  const sign = right ? 1 : -1
  const x = (right ? Math.max(from.x, to.x) : Math.min(from.x, to.x)) + sign * 16
  const [top, bottom] = [Math.min(from.y, to.y), Math.max(from.y, to.y)]
  const tight = bottom - top < 22
  return {
    path: `M${p({ x: from.x + sign * 3, y: from.y })}H${round(x + sign * 5)}M${p({ x: to.x + sign * 3, y: to.y })}H${round(x + sign * 5)}M${p({ x, y: top - (tight ? 14 : 0) })}V${round(bottom + (tight ? 14 : 0))}`,
    heads: tight ? head({ x, y: top }, Math.PI / 2) + head({ x, y: bottom }, -Math.PI / 2) : head({ x, y: top }, -Math.PI / 2) + head({ x, y: bottom }, Math.PI / 2),
    text: { x: x + sign * 10, y: (top + bottom) / 2 + 5, anchor: right ? 'start' : 'end', words },
  }
}

/** A level measure below (or above) the section; arrows from outside where the gap is small. */
function level(from: Point, to: Point, view: View, words: string, side: 'left' | 'right', row: number, under: boolean): Placing {
  const below = under || (from.y + to.y) / 2 >= (view.box.top + view.box.bottom) / 2
  const y = below ? view.box.bottom + 18 + row * 22 : view.box.top - 18 - row * 22
  const [left, right] = [Math.min(from.x, to.x), Math.max(from.x, to.x)]
  const step = below ? 3 : -3
  const reach = below ? 5 : -5
  const ends = `M${round(left)} ${round((from.x <= to.x ? from.y : to.y) + step)}V${round(y + reach)}M${round(right)} ${round((from.x <= to.x ? to.y : from.y) + step)}V${round(y + reach)}`
  if (right - left < view.measure(words) + 34) {
    return {
      path: `${ends}M${round(left - 20)} ${round(y)}H${round(left)}M${round(right)} ${round(y)}H${round(right + 20)}`,
      heads: head({ x: left, y }, 0) + head({ x: right, y }, Math.PI),
      text: side === 'right' ? { x: right + 26, y: y + 5, anchor: 'start', words } : { x: left - 26, y: y + 5, anchor: 'end', words },
    }
  }
  return {
    path: `${ends}M${round(left)} ${round(y)}H${round(right)}`,
    heads: head({ x: left, y }, Math.PI) + head({ x: right, y }, 0),
    text: { x: (left + right) / 2, y: y + (below ? 17 : -7), anchor: 'middle', words },
  }
}

/** A measure along a slope, on its outer side. */
function aslant(from: Point, to: Point, words: string): Placing {
  const turn = Math.atan2(to.y - from.y, to.x - from.x)
  const out = { x: Math.sin(turn) * 14, y: -Math.cos(turn) * 14 }
  const [a, b] = [{ x: from.x + out.x, y: from.y + out.y }, { x: to.x + out.x, y: to.y + out.y }]
  return {
    path: `M${p(from)}L${p({ x: a.x + out.x * 0.3, y: a.y + out.y * 0.3 })}M${p(to)}L${p({ x: b.x + out.x * 0.3, y: b.y + out.y * 0.3 })}M${p(a)}L${p(b)}`,
    heads: head(a, turn + Math.PI) + head(b, turn),
    text: { x: (a.x + b.x) / 2 + out.x * 0.6, y: (a.y + b.y) / 2 + out.y * 0.6, anchor: 'middle', words },
  }
}

/** An angle, as an arc beyond what it opens over. */
function angle(from: Point, to: Point, vertex: Point, beyond: number, words: string, side: 'middle' | 'end' | 'under'): Placing {
  const reach = Math.max(Math.hypot(from.x - vertex.x, from.y - vertex.y), Math.hypot(to.x - vertex.x, to.y - vertex.y)) + beyond
  const a = Math.atan2(from.y - vertex.y, from.x - vertex.x)
  const b = Math.atan2(to.y - vertex.y, to.x - vertex.x)
  const out = (turn: number, radius: number): Point => ({ x: vertex.x + radius * Math.cos(turn), y: vertex.y + radius * Math.sin(turn) })
  const middle = out((a + b) / 2, reach)
  const last = out(b, reach)
  const sweep = b > a ? 1 : 0
  const tilt = sweep ? 1 : -1
  const downwards = middle.y > vertex.y
  return {
    path: `M${p(from)}L${p(out(a, reach + 5))}M${p(to)}L${p(out(b, reach + 5))}M${p(out(a, reach))}A${round(reach)} ${round(reach)} 0 0 ${sweep} ${p(last)}`,
    heads: head(out(a, reach), a - (tilt * Math.PI) / 2) + head(last, b + (tilt * Math.PI) / 2),
    text: side === 'under' ? { x: last.x + (last.x >= vertex.x ? 10 : -10), y: last.y + (last.y < vertex.y ? 18 : -8), anchor: last.x >= vertex.x ? 'start' : 'end', words } : side === 'middle' ? { x: middle.x, y: middle.y + (downwards ? 18 : -8), anchor: 'middle', words } : { x: last.x + (last.x >= vertex.x ? 10 : -10), y: last.y - 6, anchor: last.x >= vertex.x ? 'start' : 'end', words },
  }
}

/** What else is drawn, as far as one dimension must make room for another. */
interface Company { has: (kind: MarkKind) => boolean; row: number }

function place(dimension: JointDimension, view: View, { has, row }: Company): Placing {
  const { kind } = dimension
  const text = `${LEAD[kind] ?? ''}${dimension.text}`
  const [from, to] = [view.at(dimension.from), view.at(dimension.to)]
  const vertex = dimension.vertex && view.at(dimension.vertex)
  if (vertex) {
    if (kind === 'included-angle') return angle(from, to, vertex, has('bevel-angle') ? 32 : has('upper-angle') ? from.y - view.box.top + 34 : 16, text, 'middle')
    if (kind === 'second-angle') return angle(to, from, vertex, 10, text, from.x < vertex.x ? 'middle' : 'end')
    return angle(from, to, vertex, kind === 'member-angle' ? 6 : 10, text, kind === 'taper' ? 'under' : 'end')
  }
  if (kind === 'root-radius') {
    const away = Math.atan2(to.y - from.y, to.x - from.x)
    // A rounded member's radius is written within it, not over the weld.
    if (Math.cos(away) < 0) return { path: `M${p(from)}L${p(to)}`, heads: head(to, away), text: { x: from.x + 4, y: from.y - 4, anchor: 'start', words: text } }
    const end = { x: to.x + 22 * Math.cos(away), y: to.y + 22 * Math.sin(away) }
    return { path: `M${p(from)}L${p(end)}`, heads: head(to, away), text: { x: end.x + 5, y: end.y + 3, anchor: 'start', words: text } }
  }
  if (kind === 'root-face') {
    const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 }
    const [x, y] = [middle.x + 40, Math.min(view.box.bottom + 18, middle.y + 170)]
    return { path: `M${p(middle)}L${round(x)} ${round(y)}H${round(x + 6)}`, heads: head(middle, Math.atan2(middle.y - y, middle.x - x)), text: { x: x + 10, y: y + 5, anchor: 'start', words: text } }
  }
  const [dx, dy] = [Math.abs(to.x - from.x), Math.abs(to.y - from.y)]
  if (Math.min(dx, dy) > 0.5) return aslant(from, to, text)
  return dy > dx ? upright(from, to, view, text, kind === 'root-opening') : level(from, to, view, text, kind === 'root-opening' && has('root-face') ? 'left' : 'right', row, kind === 'root-opening')
}

const HIGH = 14
/** The box of a figure. */
export function boxOf({ text }: PlacedMark, measure: View['measure']): { left: number; right: number; top: number; bottom: number } {
  const width = measure(text.words)
  const left = text.anchor === 'start' ? text.x : text.anchor === 'end' ? text.x - width : text.x - width / 2
  return { left, right: left + width, top: text.y - HIGH + 2, bottom: text.y + 3 }
}

/** Places all dimensions of a drawing; a figure that would lie on an earlier one is moved a line further out. */
export function placeDimensions(dimensions: readonly JointDimension[], view: View): PlacedMark[] {
  const has = (kind: MarkKind) => dimensions.some((one) => one.kind === kind)
  const rows = { above: 0, below: has('second-angle') ? 1 : has('root-face') && !has('root-opening') ? 0 : -1 }
  const placed: PlacedMark[] = []
  for (const dimension of dimensions) {
    const [from, to] = [view.at(dimension.from), view.at(dimension.to)]
    const isLevel = !dimension.vertex && dimension.kind !== 'root-radius' && dimension.kind !== 'root-face' && Math.abs(from.y - to.y) < 0.5
    const side = dimension.kind === 'root-opening' || (from.y + to.y) / 2 >= (view.box.top + view.box.bottom) / 2 ? 'below' : 'above'
    if (isLevel && side === 'below') rows.below += 1
    const mark: PlacedMark = { kind: dimension.kind, field: dimension.path, ...place(dimension, view, { has, row: isLevel ? Math.max(0, rows[side]) : 0 }) }
    if (isLevel && side === 'above') rows.above += 1
    const down = mark.text.y >= (view.box.top + view.box.bottom) / 2
    for (let turn = 0; turn < 5; turn += 1) {
      const mine = boxOf(mark, view.measure)
      const hit = placed.map((one) => boxOf(one, view.measure)).find((other) => mine.left < other.right + 4 && mine.right > other.left - 4 && mine.top < other.bottom && mine.bottom > other.top)
      if (!hit) break
      mark.text = { ...mark.text, y: down ? hit.bottom + HIGH : hit.top - 4 }
    }
    placed.push(mark)
  }
  return placed
}
