/** Row 25 (SAW): by machine, the electrode turned along travel by more than 3°. */
import { geometryRule, mechanised } from '../electrode-geometry.ts'

export const travelAngle = geometryRule('machine_electrode_angle', 'travelAngle', 'electrode angle along travel', 'angle', mechanised, () => 3)
