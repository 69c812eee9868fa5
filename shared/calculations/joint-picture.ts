/** A joint's section as strokes and texts, the same for the screen and the printed page. */
import type { JointGeometry } from './joint-geometry.ts'
import { boxOf, placeDimensions, type PlacedMark } from './joint-placing.ts'
import type { Point, Polygon } from './polygon.ts'

export interface PicturedPass {
  order: number
  number: string
  processId: string
  /** Heat tint, 0 plum to 3 straw. */
  heat: number
  path: string
  /** null where the bead is too small for its number. */
  label: { x: number; y: number; size: number } | null
}

export interface JointPicture {
  width: number
  height: number
  /** Picture units per mm: the drawing's scale. */
  scale: number
  plates: string[]
  backing: string | null
  insert: string | null
  weld: string[]
  passes: PicturedPass[]
  marks: PlacedMark[]
  axis: { y: number; left: number; right: number; words: string } | null
  /** mm to the picture, and back. */
  at: (point: Point) => Point
  from: (place: Point) => Point
}

export interface PictureFrame {
  width: number
  /** Highest section, dimensions left out. */
  maxHeight: number
  /** Without dimensions, for lists. */
  bare?: boolean
  /** Width of a figure 14 high. */
  measure?: (text: string) => number
}

/** Heat tints in their order over any number of passes: the first plum, the last straw. */
export const heatOf = (order: number, count: number): number => (count <= 4 ? order : Math.min(3, Math.floor((order * 4) / count)))

const LABEL_SIZE = 17
const LEAST_LABEL = 9
const MARGIN = 10
const AXIS_ROOM = 34

interface Room { left: number; right: number; top: number; bottom: number }

function layOut(geometry: JointGeometry, frame: Required<PictureFrame>, room: Room) {
  const { bounds } = geometry
  const wide = Math.max(bounds.maxX - bounds.minX, 1)
  const tall = Math.max(bounds.maxY - bounds.minY, 1)
  const scale = Math.min(Math.max(frame.width - room.left - room.right, 60) / wide, frame.maxHeight / tall)
  const left = Math.max(room.left, Math.min((frame.width - wide * scale) / 2, frame.width - room.right - wide * scale))
  const at = ({ x, y }: Point): Point => ({ x: left + (x - bounds.minX) * scale, y: room.top + (bounds.maxY - y) * scale })
  const box = { left, right: left + wide * scale, top: room.top, bottom: room.top + tall * scale }
  const marks = frame.bare ? [] : placeDimensions(geometry.dimensions, { at, box, measure: frame.measure })
  return { scale, left, at, box, marks }
}

/** What the marks need beyond the section, on each side. */
function need(marks: readonly PlacedMark[], box: { left: number; top: number; right: number; bottom: number }, measure: (text: string) => number, room: Room, width: number): Room {
  const boxes = marks.map((mark) => boxOf(mark, measure))
  const ys = marks.flatMap(({ path }) => [...path.matchAll(/[ML]-?[\d.]+ (-?[\d.]+)|V(-?[\d.]+)/g)].map(([, y, v]) => Number(y ?? v)))
  return {
    left: room.left + Math.max(0, ...boxes.map(({ left }) => MARGIN - left)),
    right: room.right + Math.max(0, ...boxes.map(({ right }) => right + MARGIN - width)),
    top: Math.max(MARGIN, ...boxes.map(({ top }) => box.top - top + MARGIN), ...ys.map((y) => box.top - y + MARGIN)),
    bottom: Math.max(MARGIN, ...boxes.map(({ bottom }) => bottom - box.bottom + MARGIN), ...ys.map((y) => y - box.bottom + MARGIN)),
  }
}

/** The section with its dimensions, as large as the frame lets it be, to one scale in both directions. */
export function jointPicture(geometry: JointGeometry, { width, maxHeight, bare = false, measure = (text) => text.length * 8 }: PictureFrame): JointPicture {
  const frame = { width, maxHeight, bare, measure }
  let room: Room = bare ? { left: 6, right: 6, top: 6, bottom: 6 } : { left: 24, right: 24, top: 40, bottom: 38 }
  let laid = layOut(geometry, frame, room)
  // A smaller section moves its figures, and they may need more room again.
  for (let turn = 0; turn < 5 && !bare; turn += 1) {
    const next = need(laid.marks, laid.box, measure, room, width)
    if (turn > 1 && Math.max(...(['left', 'right', 'top', 'bottom'] as const).map((side) => next[side] - room[side])) < 0.5) break
    room = next
    laid = layOut(geometry, frame, room)
  }
  const { at, scale, left, box, marks } = laid
  const { bounds, passes } = geometry
  const outline = (polygon: Polygon) => `${polygon.map((point, index) => `${index === 0 ? 'M' : 'L'}${at(point).x.toFixed(1)} ${at(point).y.toFixed(1)}`).join('')}Z`
  const pictured = passes.map((pass): PicturedPass => {
    const [xs, ys] = [pass.polygon.map(({ x }) => x), pass.polygon.map(({ y }) => y)]
    const [across, high] = [(Math.max(...xs) - Math.min(...xs)) * scale, (Math.max(...ys) - Math.min(...ys)) * scale]
    const size = Math.min(LABEL_SIZE, high * 0.95, across / (0.5 * pass.number.length + 0.2))
    const label = at(pass.labelAt)
    return { order: pass.order, number: pass.number, processId: pass.processId, heat: heatOf(pass.order, passes.length), path: outline(pass.polygon), label: size >= LEAST_LABEL ? { x: label.x, y: label.y + size * 0.35, size } : null }
  })
  const axis = !bare && geometry.axis !== null
  const below = box.bottom + room.bottom
  return {
    width, height: below + (axis ? AXIS_ROOM : 0), scale,
    plates: geometry.plates.map(outline), backing: geometry.backing && outline(geometry.backing), insert: geometry.insert && outline(geometry.insert), weld: geometry.weld.map(outline), passes: pictured, marks,
    axis: axis && geometry.axis !== null ? { y: below + 6, left: box.left, right: box.right, words: geometry.axis } : null,
    at,
    from: ({ x, y }) => ({ x: bounds.minX + (x - left) / scale, y: bounds.maxY - (y - room.top) / scale }),
  }
}
