/** Row 32: a square groove instead of another groove, or back. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { asksGroove } from '../groove-measure.ts'
import { meta } from '../meta.ts'

const squareOr = ({ joint }: WeldingVariables): string | null => (joint.groove === null ? null : joint.groove === 'square' ? 'square groove' : 'other groove')

export const squareGroove = namedRule({
  meta: meta('square_groove'),
  field: 'joint.groove',
  at: 'weld',
  label: 'kind of groove (square or other)',
  applies: asksGroove,
  asked(context) {
    const value = squareOr(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.variables.joint.weld === 'fillet' ? undefined : squareOr(side.variables)),
  because: 'A square groove and any other groove are qualified apart.',
})
