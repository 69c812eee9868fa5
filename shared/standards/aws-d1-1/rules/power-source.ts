/** Row 15 (GMAW, FCAW): constant voltage changed to constant current. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const CV = 'constant voltage'
const CC = 'constant current'
const token = (block: ProcessBlock | null): string | null => (block?.electrical.powerSource ? (block.electrical.powerSource === 'constant-voltage' ? CV : CC) : null)

export const powerSource = namedRule({
  meta: meta('power_source'),
  field: 'electrical.powerSource',
  at: 'block',
  label: 'output of the power source',
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block),
  covers: (value) => (value === CC ? [CC, CV] : [CV]),
  because: 'Only a change from constant voltage to constant current counts.',
  setValue: (name) => (name === CV ? 'constant-voltage' : 'constant-current'),
})
