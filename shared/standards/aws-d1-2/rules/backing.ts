/** Backing left out that the test had. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta, TABLE } from '../meta.ts'

const backingToken = ({ joint }: WeldingVariables): string | null => (joint.backing === null ? null : joint.backing === 'none' ? 'without backing' : 'with backing')

export const backing = namedRule({
  meta: meta('backing', 'Backing removed', 'Table 3.1', 'memory', TABLE, 'Backing left out that the test had.'),
  field: 'joint.backing',
  at: 'weld',
  label: 'use of backing',
  applies: (context) => context.procedure.joint.weld === 'groove',
  asked(context) {
    const value = backingToken(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.variables.joint.weld === 'fillet' ? undefined : backingToken(side.variables)),
  covers: (value) => (value === 'without backing' ? ['without backing', 'with backing'] : ['with backing']),
  because: 'Only leaving backing out counts.',
})
