/** Row 24 (SAW): a parallel electrode turned by more than 10°. */
import { geometryRule, several } from '../electrode-geometry.ts'

export const parallelAngle = geometryRule('parallel_electrode_angle', 'parallelAngle', 'angle of the parallel electrode', 'angle', several, () => 10)
