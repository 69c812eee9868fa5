/** Section and mass of a groove weld from its figures, by the same geometry as the drawing. */
import { jointSchema } from '../schemas/welding.ts'
import { interval } from '../units/convert.ts'
import type { GrooveType } from './groove-profile.ts'
import { bothEdgesPrepared } from './groove-profile.ts'
import { jointGeometry, massPerMetre } from './joint-geometry.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'
import { capArea } from './weld-metal.ts'

export const grooveSource: Source = { standard: 'Groove geometry', edition: '', clause: '', basis: 'memory', note: 'Plane geometry; agrees with a filler maker’s published consumption tables. A cap is two thirds of width × height.' }
export const GROOVE_AREA_TYPES = ['square', 'single-v', 'double-v', 'single-bevel', 'double-bevel', 'single-u', 'double-u', 'single-j', 'double-j'] as const satisfies readonly GrooveType[]
export type GrooveAreaType = (typeof GROOVE_AREA_TYPES)[number]

export interface GrooveGiven {
  type: GrooveAreaType
  /** mm */
  thickness: number
  rootOpening: number
  rootFace?: number
  /** Degrees of one prepared edge. */
  bevelAngle?: number | null
  /** mm, of a U or J. */
  rootRadius?: number | null
  /** mm; 0 without a cap. */
  capWidth?: number
  capHeight?: number
  /** g/cm³ */
  density?: number
}
export interface GrooveFiguresOut { groove: number; cap: number; area: number; mass: number }

/** Section in mm² (= cm³ per metre) and mass in kg/m; `value` is the mass. Both sides of a double groove are taken alike. */
export function grooveArea({ type, thickness, rootOpening, rootFace = 0, bevelAngle = null, rootRadius = null, capWidth = 0, capHeight = 0, density = 7.85 }: GrooveGiven): Calculation<GrooveFiguresOut> {
  const sheet = worksheet(grooveSource)
  sheet.need('thickness', 'Plate thickness', thickness, { above: 0, unit: 'mm' })
  sheet.need('rootOpening', 'Root opening', rootOpening, { least: 0, unit: 'mm' })
  sheet.need('rootFace', 'Root face', rootFace, { least: 0, unit: 'mm' })
  sheet.need('capWidth', 'Cap width', capWidth, { least: 0, unit: 'mm' })
  sheet.need('capHeight', 'Cap height', capHeight, { least: 0, unit: 'mm' })
  sheet.need('density', 'Density', density, { above: 0, unit: 'g/cm³' })
  if (type !== 'square') sheet.need('bevelAngle', 'Bevel angle', bevelAngle, { least: 0, below: 90, unit: '°' })
  if (/-[uj]$/.test(type)) sheet.need('rootRadius', 'Root radius', rootRadius, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('kg/m')
  const mm = (value: number) => interval(value, undefined, 'length')
  const both = bothEdgesPrepared(type)
  const geometry = jointGeometry({
    joint: jointSchema.parse({ groove: type, rootOpening: mm(rootOpening), rootFace: mm(rootFace), bevelAngle: bevelAngle === null || both ? null : interval(bevelAngle, undefined, 'angle'), includedAngle: bevelAngle === null || !both ? null : interval(2 * bevelAngle, undefined, 'angle'), rootRadius: rootRadius === null ? null : mm(rootRadius) }),
    thickness: mm(thickness),
    density: density * 1000,
    system: 'SI',
  })
  for (const message of geometry.impossible) sheet.refuse('', message)
  if (sheet.refused || geometry.areaMm2 === null) return sheet.stop('kg/m')
  const groove = sheet.step('groove section', 'area between the edges', `thickness ${written(thickness)}, opening ${written(rootOpening)}${type === 'square' ? '' : `, face ${written(rootFace)}, bevel ${written(bevelAngle ?? 0)}°`}`, geometry.areaMm2, 'mm²')
  const cap = capWidth > 0 && capHeight > 0 ? sheet.step('cap', '2/3 × width × height', `2/3 × ${written(capWidth)} × ${written(capHeight)}`, capArea(capWidth, capHeight), 'mm²') : 0
  const area = groove + cap
  const mass = sheet.step('mass per metre', 'section × density / 1000', `${written(area)} × ${written(density)} / 1000`, massPerMetre(area, density * 1000), 'kg/m')
  for (const sentence of geometry.assumed) sheet.note(sentence)
  return sheet.done('kg/m', mass, { groove, cap, area, mass })
}
