/** Row 33: a larger root face than tested, beyond the tolerance. */
import { grooveMeasure, isGouged, isNotSquare } from '../groove-measure.ts'

/** Fit-up tolerance of the joint figures; the face of a backgouged root is not limited. */
const TOLERANCE = { SI: 2, US: 1 / 16 } as const

export const rootFace = grooveMeasure({
  variable: 'root_face', field: 'joint.rootFace', label: 'root face', dimension: 'length', may: 'rise',
  value: ({ joint }) => joint.rootFace,
  room: (variables, system) => (isGouged(variables) ? null : TOLERANCE[system]),
  arises: isNotSquare,
})
