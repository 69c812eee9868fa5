/** Row 33: a smaller groove angle than tested, beyond the tolerance. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { intervalCures } from '../../common/cures.ts'
import { figures, isStated } from '../../common/reading.ts'
import { grooveAngleOf, oneEdgeBevelled } from '../groove-angle.ts'
import { grooveMeasure, isNotSquare } from '../groove-measure.ts'

/** Fit-up tolerance of the joint figures. */
const TOLERANCE = 5
const isFlare = ({ joint }: WeldingVariables): boolean => joint.groove === 'flare-bevel' || joint.groove === 'flare-v'

export const grooveAngle = grooveMeasure({
  variable: 'groove_angle', field: 'joint.includedAngle', label: 'groove angle', dimension: 'angle', may: 'fall',
  value: ({ joint }) => grooveAngleOf(joint),
  room: () => TOLERANCE,
  arises: (variables) => isNotSquare(variables) && !isFlare(variables),
  cure({ procedure: { joint }, system }, range) {
    const byBevel = isStated(joint.bevelAngle) && (oneEdgeBevelled(joint.groove) || !isStated(joint.includedAngle))
    const { min, max, all } = figures(grooveAngleOf(joint), 'angle', system)
    // Where the bevels of both edges alone are stated, a figure for both together would contradict them.
    if (all || (byBevel && !oneEdgeBevelled(joint.groove))) return []
    const field = byBevel ? 'joint.bevelAngle' : 'joint.includedAngle'
    const lowest = range.segments[0]?.lower
    const tooSmall = (value: number | null): boolean => value !== null && lowest !== undefined && 'value' in lowest && value < lowest.value
    const asked = { min: min ?? max, max: max ?? min }
    return intervalCures({ label: 'groove angle', dimension: 'angle', field, current: byBevel ? joint.bevelAngle : joint.includedAngle, range, asked, wrong: (['min', 'max'] as const).filter((end) => tooSmall(asked[end])) })
  },
})
