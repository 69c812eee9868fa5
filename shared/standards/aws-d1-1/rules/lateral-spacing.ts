/** Row 23 (SAW): spacing of several arcs across the joint. */
import { geometryRule, several, spacingRoom } from '../electrode-geometry.ts'

export const lateralSpacing = geometryRule('lateral_arc_spacing', 'lateralSpacing', 'spacing of arcs across the joint', 'length', several, spacingRoom)
