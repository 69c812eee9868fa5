/** Row 22 (SAW): spacing of several arcs along the joint. */
import { geometryRule, several, spacingRoom } from '../electrode-geometry.ts'

export const longitudinalSpacing = geometryRule('longitudinal_arc_spacing', 'electrodeSpacing', 'spacing of arcs along the joint', 'length', several, spacingRoom)
