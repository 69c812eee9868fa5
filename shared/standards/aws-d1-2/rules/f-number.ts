/** F-Number of the filler. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { fNumber } from '../alloys.ts'
import { meta, TABLE } from '../meta.ts'

const filler = (block: ProcessBlock | null): string | null => {
  if (!block) return null
  if (block.filler.added === false) return 'no filler'
  const f = fNumber(block.filler)
  return f === null ? null : `F-${f}`
}

export const fillerNumber = namedRule({
  meta: meta('f-number', 'F-Number', 'Table 3.1', 'secondary', `${TABLE}; F-Numbers from the same notes`, 'Another F-Number: 4043 instead of 5356 is a change from F-22 to F-23 and needs a new test.'),
  field: 'filler.fNumber',
  at: 'block',
  label: 'F-Number',
  asked(context) {
    const value = filler(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => filler(side.block),
  because: 'Every F-Number is qualified by itself.',
})
