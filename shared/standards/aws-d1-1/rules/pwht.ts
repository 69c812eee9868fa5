/** Row 37: heat treatment after welding added or left out. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const token = ({ pwht }: WeldingVariables): string | null => (pwht.condition === null ? null : pwht.condition === 'none' ? 'as welded' : 'heat treated')

export const pwht = namedRule({
  meta: meta('pwht'),
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment after welding',
  asked(context) {
    const value = token(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.variables),
  because: 'Welding with and without heat treatment are qualified apart.',
  setValue: (name) => (name === 'as welded' ? 'none' : undefined),
})
