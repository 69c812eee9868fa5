/** Row 26 (SAW): by machine, the electrode turned across travel by more than 5°. */
import { geometryRule, mechanised } from '../electrode-geometry.ts'

export const normalAngle = geometryRule('machine_normal_angle', 'normalAngle', 'electrode angle across travel', 'angle', mechanised, () => 5)
