/** Row 33: a smaller root opening than tested, beyond the tolerance. */
import { grooveMeasure, isGouged } from '../groove-measure.ts'

/** Fit-up tolerance of the joint figures; a root that is backgouged may close further. */
const TOLERANCE = { SI: { plain: 2, gouged: 3 }, US: { plain: 1 / 16, gouged: 1 / 8 } } as const

export const rootOpening = grooveMeasure({
  variable: 'root_opening', field: 'joint.rootOpening', label: 'root opening', dimension: 'length', may: 'fall',
  value: ({ joint }) => joint.rootOpening,
  room: (variables, system) => TOLERANCE[system][isGouged(variables) ? 'gouged' : 'plain'],
  arises: () => true,
})
