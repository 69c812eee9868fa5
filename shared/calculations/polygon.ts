/** Plane geometry in mm: x across the joint, y up from the root side of the plates. */

export interface Point { x: number; y: number }
export type Polygon = readonly Point[]
export interface Bounds { minX: number; minY: number; maxX: number; maxY: number }

/** Area in mm² (always positive), by the shoelace formula. */
export const polygonArea = (polygon: Polygon): number => Math.abs(polygon.reduce((sum, point, index) => {
  const next = polygon[(index + 1) % polygon.length] ?? point
  return sum + point.x * next.y - next.x * point.y
}, 0)) / 2

/** Centre of area, where a label stands; the mean of the corners for a polygon without area. */
export function centroid(polygon: Polygon): Point {
  let [area, x, y] = [0, 0, 0]
  polygon.forEach((point, index) => {
    const next = polygon[(index + 1) % polygon.length] ?? point
    const cross = point.x * next.y - next.x * point.y
    area += cross
    x += (point.x + next.x) * cross
    y += (point.y + next.y) * cross
  })
  if (Math.abs(area) < 1e-9) return { x: polygon.reduce((sum, point) => sum + point.x, 0) / (polygon.length || 1), y: polygon.reduce((sum, point) => sum + point.y, 0) / (polygon.length || 1) }
  return { x: x / (3 * area), y: y / (3 * area) }
}

/** The box around all points; all noughts when there are none. */
export function boundsOf(polygons: readonly Polygon[]): Bounds {
  const points = polygons.flat()
  if (points.length === 0) return { minX: 0, minY: 0, maxX: 0, maxY: 0 }
  const [xs, ys] = [points.map(({ x }) => x), points.map(({ y }) => y)]
  return { minX: Math.min(...xs), minY: Math.min(...ys), maxX: Math.max(...xs), maxY: Math.max(...ys) }
}

export const mirrored = (polygon: Polygon): Polygon => polygon.map(({ x, y }) => ({ x: -x, y }))
export const radians = (degrees: number): number => (degrees * Math.PI) / 180
