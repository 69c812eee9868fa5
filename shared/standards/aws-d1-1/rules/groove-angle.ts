/** Row 33: a smaller groove angle than tested, beyond the tolerance. */
import type { Interval } from '../../../schemas/common.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { grooveAngleOf } from '../groove-angle.ts'
import { grooveMeasure, isNotSquare } from '../groove-measure.ts'

/** Fit-up tolerance of the joint figures. */
const TOLERANCE = 5
const isFlare = ({ joint }: WeldingVariables): boolean => joint.groove === 'flare-bevel' || joint.groove === 'flare-v'

export const grooveAngle = grooveMeasure({
  variable: 'groove_angle', field: 'joint.includedAngle', label: 'groove angle', dimension: 'angle', may: 'fall',
  value: ({ joint }): Interval | null => grooveAngleOf(joint),
  room: () => TOLERANCE,
  arises: (variables) => isNotSquare(variables) && !isFlare(variables),
})
