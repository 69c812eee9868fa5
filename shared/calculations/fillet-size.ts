/** Leg and throat of a fillet weld. A leg asked for is rounded up, a throat claimed is rounded down. */
import { massPerMetre } from './joint-geometry.ts'
import { throatOf } from './fillet-geometry.ts'
import { radians } from './polygon.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const filletSource: Source = { standard: 'Fillet geometry', edition: '', clause: '', basis: 'memory', note: 'Plane geometry of a flat fillet.' }

export interface FilletFigures {
  /** mm */
  throat: number
  /** mm² */
  area: number
  /** kg/m */
  mass: number | null
  /** Whole millimetres: the throat that may be claimed. */
  throatClaimed: number
}

const round = (value: number, way: 'up' | 'down'): number => (way === 'up' ? Math.ceil(value - 1e-9) : Math.floor(value + 1e-9))

/**
 * Throat, section and mass from the leg or legs.
 * @param given legs in mm at `angle` degrees between the members (90 unless told; both legs equal when skewed); density in g/cm³
 */
export function filletFromLegs({ leg, legB = null, angle = 90, density = null }: { leg: number; legB?: number | null; angle?: number; density?: number | null }): Calculation<FilletFigures> {
  const sheet = worksheet(filletSource)
  sheet.need('leg', 'Leg', leg, { above: 0, unit: 'mm' })
  if (legB !== null) sheet.need('legB', 'Second leg', legB, { above: 0, unit: 'mm' })
  sheet.need('angle', 'Angle between the members', angle, { above: 0, below: 180, unit: '°' })
  if (density !== null) sheet.need('density', 'Density', density, { above: 0, unit: 'g/cm³' })
  const other = legB ?? leg
  if (!sheet.refused && angle !== 90 && other !== leg) sheet.refuse('legB', 'Unequal legs are computed at 90° only; give one leg, or an angle of 90°.')
  if (sheet.refused) return sheet.stop('mm')
  const z = written(leg)
  const throat =
    angle !== 90 ? sheet.step('throat', 'z × cos(angle / 2)', `${z} × cos(${written(angle)}° / 2)`, leg * Math.cos(radians(angle) / 2), 'mm')
    : other === leg ? sheet.step('throat', 'z / √2', `${z} / √2`, throatOf(leg), 'mm')
    : sheet.step('throat', 'z1 × z2 / √(z1² + z2²)', `${z} × ${written(other)} / √(${z}² + ${written(other)}²)`, (leg * other) / Math.hypot(leg, other), 'mm')
  const area = sheet.step('section', 'z1 × z2 × sin(angle) / 2', `${z} × ${written(other)} × sin(${written(angle)}°) / 2`, (leg * other * Math.sin(radians(angle))) / 2, 'mm²')
  const mass = density === null ? null : sheet.step('mass', 'section × density / 1000', `${written(area)} × ${written(density)} / 1000`, massPerMetre(area, density * 1000), 'kg/m')
  sheet.note(`In whole millimetres a throat of ${round(throat, 'down')} mm may be claimed: a throat is rounded down.`)
  return sheet.done('mm', throat, { throat, area, mass, throatClaimed: round(throat, 'down') })
}

/** Leg that a throat asks for, at equal legs; mm. `legToWeld` is rounded up to whole millimetres. */
export function legFromThroat({ throat, angle = 90 }: { throat: number; angle?: number }): Calculation<{ leg: number; legToWeld: number }> {
  const sheet = worksheet(filletSource)
  sheet.need('throat', 'Throat', throat, { above: 0, unit: 'mm' })
  sheet.need('angle', 'Angle between the members', angle, { above: 0, below: 180, unit: '°' })
  if (sheet.refused) return sheet.stop('mm')
  const leg = sheet.step('leg', 'throat / cos(angle / 2)', `${written(throat)} / cos(${written(angle)}° / 2)`, throat / Math.cos(radians(angle) / 2), 'mm')
  sheet.note(`In whole millimetres weld a leg of ${round(leg, 'up')} mm: a leg is rounded up.`)
  return sheet.done('mm', leg, { leg, legToWeld: round(leg, 'up') })
}
