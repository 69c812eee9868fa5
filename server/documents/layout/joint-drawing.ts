import type { JointDimension, JointGeometry } from '@shared/calculations/joint-geometry.ts'
import type { Faces } from './fonts.ts'
import { drawLines, leadingOf, setText, widthOf, type Style } from './text.ts'
import { COLOUR, PASS_COLOURS } from './tokens.ts'

type Point = { x: number; y: number }
type Shape = readonly Point[]

const FIGURE: Style = { face: 'text', size: 7, colour: COLOUR.ink, leading: 9 }
const ROOM = { left: 14, right: 24, top: 30, bottom: 32 }
/** Room at the right for the figures that stand there. */
const rightRoom = (faces: Faces, geometry: JointGeometry): number => ROOM.right + Math.max(20, ...geometry.dimensions.filter(({ kind }) => kind !== 'root-opening' && kind !== 'included-angle').map(({ text }) => widthOf(faces, FIGURE, text)))
const LAYER_COLOUR: Readonly<Record<string, string>> = { root: PASS_COLOURS[0], backing: PASS_COLOURS[0], hot: PASS_COLOURS[1], fill: PASS_COLOURS[2], cap: PASS_COLOURS[3] }

export interface Frame { x: number; y: number; width: number; height: number }

/** The drawing's pencil: millimetres of the joint to points on the sheet. */
class Pencil {
  readonly scale: number
  private readonly left: number
  private readonly bottom: number
  constructor(readonly doc: PDFKit.PDFDocument, readonly faces: Faces, readonly geometry: JointGeometry, frame: Frame) {
    const { minX, minY, maxX, maxY } = geometry.bounds
    const width = frame.width - ROOM.left - rightRoom(faces, geometry)
    const fit = (top: number) => Math.min(width / Math.max(maxX - minX, 1e-6), (frame.height - top - ROOM.bottom) / Math.max(maxY - minY, 1e-6))
    // The arc over an angle rises above the work by as much as its leg is longer than it is high.
    const rises = geometry.dimensions.map(({ kind, vertex, to }) => (kind === 'included-angle' && vertex ? Math.hypot(to.x - vertex.x, to.y - vertex.y) - (to.y - vertex.y) : 0))
    const top = ROOM.top + Math.max(0, ...rises) * fit(ROOM.top)
    const room = { width, height: frame.height - top - ROOM.bottom }
    this.scale = fit(top)
    this.left = frame.x + ROOM.left + (room.width - (maxX - minX) * this.scale) / 2 - minX * this.scale
    this.bottom = frame.y + top + (room.height + (maxY - minY) * this.scale) / 2 + minY * this.scale
  }

  at = ({ x, y }: Point): Point => ({ x: this.left + x * this.scale, y: this.bottom - y * this.scale })

  path(shape: Shape): PDFKit.PDFDocument {
    const points = shape.map(this.at)
    return this.doc.polygon(...points.map(({ x, y }): [number, number] => [x, y]))
  }

  line(from: Point, to: Point): void {
    this.doc.moveTo(from.x, from.y).lineTo(to.x, to.y)
  }

  /** A figure on a white patch, so that hatching never runs through it. */
  text(text: string, x: number, y: number, align: 'left' | 'center' | 'right' = 'left'): void {
    const width = widthOf(this.faces, FIGURE, text)
    const left = align === 'left' ? x : align === 'center' ? x - width / 2 : x - width
    this.doc.rect(left - 1.5, y - leadingOf(FIGURE) / 2, width + 3, leadingOf(FIGURE)).fill(COLOUR.white)
    drawLines(this.faces, FIGURE, setText(this.faces, FIGURE, text, width + 1), left, y - leadingOf(FIGURE) / 2)
  }

  /** A slim arrow head with its point at `tip`. */
  head(tip: Point, angle: number, size = 4.4): void {
    const side = (turn: number): [number, number] => [tip.x - size * Math.cos(angle + turn), tip.y - size * Math.sin(angle + turn)]
    this.doc.polygon([tip.x, tip.y], side(0.26), side(-0.26)).fill(COLOUR.ink)
  }
}

function hatch(pencil: Pencil, shape: Shape): void {
  const points = shape.map(pencil.at)
  const [minX, maxX] = [Math.min(...points.map(({ x }) => x)), Math.max(...points.map(({ x }) => x))]
  const [minY, maxY] = [Math.min(...points.map(({ y }) => y)), Math.max(...points.map(({ y }) => y))]
  const { doc } = pencil
  doc.save()
  pencil.path(shape).clip()
  doc.lineWidth(0.35).strokeColor('#A9B0B3')
  for (let x = minX - (maxY - minY); x < maxX; x += 5) doc.moveTo(x, maxY).lineTo(x + (maxY - minY), minY)
  doc.stroke().restore()
  doc.lineWidth(0.9).strokeColor(COLOUR.ink)
  pencil.path(shape).stroke()
}

function drawPasses(pencil: Pencil): void {
  const { doc, geometry } = pencil
  geometry.passes.forEach((pass, index) => {
    const colour = (pass.layer && LAYER_COLOUR[pass.layer]) ?? PASS_COLOURS[index % PASS_COLOURS.length] ?? COLOUR.plum
    doc.lineWidth(geometry.passes.length > 12 ? 0.3 : 0.8)
    pencil.path(pass.polygon).fillAndStroke(colour, COLOUR.white)
  })
  for (const pass of geometry.passes) {
    const xs = pass.polygon.map(({ x }) => x * pencil.scale)
    const ys = pass.polygon.map(({ y }) => y * pencil.scale)
    const room = { width: Math.max(...xs) - Math.min(...xs) - 2, height: Math.max(...ys) - Math.min(...ys) }
    let style: Style = { face: 'headStrong', size: 10, colour: COLOUR.white, leading: 10 }
    while (style.size > 4 && (widthOf(pencil.faces, style, pass.number) > room.width || style.size * 0.8 > room.height)) style = { ...style, size: style.size - 0.5, leading: style.size - 0.5 }
    // A figure too small to read is left out; the run sheet names every bead.
    if (style.size <= 4) continue
    const { x, y } = pencil.at(pass.labelAt)
    const width = widthOf(pencil.faces, style, pass.number)
    drawLines(pencil.faces, style, setText(pencil.faces, style, pass.number, width + 1), x - width / 2, y - leadingOf(style) / 2)
  }
}

/** A straight dimension `away` points from its feature, with extension lines. */
function straight(pencil: Pencil, mark: JointDimension, shift: Point, align: 'left' | 'center' | 'right', textShift: Point): void {
  const { doc } = pencil
  const [from, to] = [pencil.at(mark.from), pencil.at(mark.to)]
  const [a, b] = [{ x: from.x + shift.x, y: from.y + shift.y }, { x: to.x + shift.x, y: to.y + shift.y }]
  doc.lineWidth(0.4).strokeColor(COLOUR.soft)
  const over = Math.hypot(shift.x, shift.y) || 1
  const past = { x: shift.x + (shift.x / over) * 3, y: shift.y + (shift.y / over) * 3 }
  pencil.line(from, { x: from.x + past.x, y: from.y + past.y })
  pencil.line(to, { x: to.x + past.x, y: to.y + past.y })
  const length = Math.hypot(b.x - a.x, b.y - a.y)
  const angle = Math.atan2(b.y - a.y, b.x - a.x)
  if (length > 13) {
    pencil.line(a, b)
    doc.stroke()
    pencil.head(b, angle)
    pencil.head(a, angle + Math.PI)
  } else {
    const [ux, uy] = [Math.cos(angle) * 10, Math.sin(angle) * 10]
    pencil.line({ x: a.x - ux, y: a.y - uy }, a)
    pencil.line(b, { x: b.x + ux, y: b.y + uy })
    doc.stroke()
    pencil.head(a, angle)
    pencil.head(b, angle + Math.PI)
  }
  pencil.text(mark.text, (a.x + b.x) / 2 + textShift.x, (a.y + b.y) / 2 + textShift.y, align)
}

/** An angle: its legs carried on past the work, an arc between them, the figure above it. */
function angular(pencil: Pencil, mark: JointDimension, reach: number, beside: boolean): void {
  if (!mark.vertex) return
  const { doc } = pencil
  const [vertex, from, to] = [pencil.at(mark.vertex), pencil.at(mark.from), pencil.at(mark.to)]
  const legs = [from, to].map((point) => ({ point, angle: Math.atan2(point.y - vertex.y, point.x - vertex.x), length: Math.hypot(point.x - vertex.x, point.y - vertex.y) }))
  const radius = Math.max(...legs.map(({ length }) => length)) + reach
  doc.lineWidth(0.4).strokeColor(COLOUR.soft)
  for (const { point, angle } of legs) pencil.line({ x: point.x + Math.cos(angle) * 2, y: point.y + Math.sin(angle) * 2 }, { x: vertex.x + Math.cos(angle) * (radius + 3), y: vertex.y + Math.sin(angle) * (radius + 3) })
  doc.stroke()
  const [low, high] = [Math.min(...legs.map(({ angle }) => angle)), Math.max(...legs.map(({ angle }) => angle))]
  const steps = 28
  for (let step = 0; step <= steps; step += 1) {
    const angle = low + ((high - low) * step) / steps
    const point = { x: vertex.x + Math.cos(angle) * radius, y: vertex.y + Math.sin(angle) * radius }
    if (step === 0) doc.moveTo(point.x, point.y)
    else doc.lineTo(point.x, point.y)
  }
  doc.stroke()
  const middle = beside ? high : (low + high) / 2
  const at = { x: vertex.x + Math.cos(middle) * radius, y: vertex.y + Math.sin(middle) * radius }
  if (beside) pencil.text(mark.text, at.x + 6, at.y - 3, 'left')
  else pencil.text(mark.text, at.x, at.y - 7, 'center')
}

function drawDimension(pencil: Pencil, mark: JointDimension, index: number): void {
  const { geometry } = pencil
  const [from, to] = [pencil.at(mark.from), pencil.at(mark.to)]
  const edge = { right: pencil.at({ x: geometry.bounds.maxX, y: 0 }).x, left: pencil.at({ x: geometry.bounds.minX, y: 0 }).x, bottom: pencil.at({ x: 0, y: geometry.bounds.minY }).y }
  const upright = Math.abs(from.x - to.x) < Math.abs(from.y - to.y)
  switch (mark.kind) {
    case 'thickness':
    case 'thickness-b':
      if (upright) straight(pencil, mark, { x: edge.right - from.x + 9, y: 0 }, 'left', { x: 5, y: 0 })
      else straight(pencil, mark, { x: 0, y: edge.bottom - from.y + 10 }, 'center', { x: 0, y: 8 })
      break
    case 'root-opening': {
      const half = Math.abs(to.x - from.x) / 2
      const aside = half + (2 * half > 13 ? 6 : 14)
      const left = geometry.dimensions.some(({ kind }) => kind === 'root-face')
      straight(pencil, mark, { x: 0, y: edge.bottom - from.y + 13 }, left ? 'right' : 'left', { x: left ? -aside : aside, y: 0 })
      break
    }
    case 'root-face': {
      const away = Math.min(30, Math.max(18, (edge.right - from.x) * 0.35))
      straight(pencil, mark, { x: away, y: 0 }, 'left', { x: 5, y: 0 })
      break
    }
    case 'included-angle':
      angular(pencil, mark, 10, false)
      break
    case 'bevel-angle':
      angular(pencil, mark, geometry.dimensions.some(({ kind }) => kind === 'included-angle') ? 2 : 8, true)
      break
    case 'root-radius':
      pencil.doc.lineWidth(0.4).strokeColor(COLOUR.soft)
      // Up and to the right, clear of the root face's figure below it.
      pencil.line({ x: to.x + 30, y: to.y - 9 }, to)
      pencil.doc.stroke()
      pencil.head(to, Math.atan2(9, -30))
      pencil.text(`R ${mark.text}`, to.x + 32, to.y - 10, 'left')
      break
    case 'leg':
      if (upright) straight(pencil, mark, { x: edge.left < from.x ? edge.right - from.x + 9 : 12, y: 0 }, 'left', { x: 5, y: 0 })
      else straight(pencil, mark, { x: 0, y: -10 - index * 4 }, 'center', { x: 0, y: -7 })
      break
  }
}

/** The joint's cross-section as vectors: hatched plates, backing, numbered passes, dimensions with their figures. */
export function drawJointSection(doc: PDFKit.PDFDocument, faces: Faces, geometry: JointGeometry, frame: Frame): void {
  const pencil = new Pencil(doc, faces, geometry, frame)
  if (geometry.backing) {
    doc.lineWidth(0.9)
    pencil.path(geometry.backing).fillAndStroke(COLOUR.backing, COLOUR.ink)
  }
  for (const plate of geometry.plates) hatch(pencil, plate)
  if (geometry.passes.length > 0) drawPasses(pencil)
  else {
    for (const weld of geometry.weld) {
      doc.lineWidth(0.7).dash(2.4, { space: 1.8 })
      pencil.path(weld).fillAndStroke(COLOUR.white, COLOUR.ink)
      doc.undash()
    }
  }
  geometry.dimensions.forEach((mark, index) => drawDimension(pencil, mark, index))
}
