/** QW-404.5: ferrous deposits keep their A-Number; cover each other; without A-Number the composition itself is compared. */
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { remember } from '../../common/remember.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { isFerrous, secondMetal } from '../members.ts'
import { meta } from '../meta.ts'

const numberOfF = remember((text) => Number.parseInt(text.replace(/^F-?/i, ''), 10))

/** Iron-based deposit, by F-Number (1 to 6), else by base metals; unknown counts as ferrous so that it is asked. */
function ferrousDeposit(variables: WeldingVariables, block: ProcessBlock): boolean {
  const f = block.filler.fNumber === null ? NaN : numberOfF(block.filler.fNumber)
  if (!Number.isNaN(f)) return f <= 6
  return isFerrous(variables.baseMetals.a) !== false || isFerrous(secondMetal(variables)) !== false
}

const token = (block: ProcessBlock): string | null =>
  block.filler.aNumber !== null ? `A-${block.filler.aNumber}` : block.filler.depositComposition ? `deposit ${sameText(block.filler.depositComposition)}` : null

const A1_A2: readonly string[] = ['A-1', 'A-2']

export const fillerANumber = namedRule({
  meta: meta('QW-404.5', 'filler-a-number'),
  field: 'filler.aNumber',
  at: 'block',
  label: 'A-Number',
  // Without filler metal there is no deposit analysis to keep; QW-404.14 holds that difference.
  applies: (context) => !!context.block && context.block.filler.added !== false && ferrousDeposit(context.procedure, context.block),
  asked(context) {
    const value = context.block && token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : side.block ? (ferrousDeposit(side.variables, side.block) ? token(side.block) : 'no A-Number (nonferrous)') : null),
  covers: (value) => (value === 'A-1' || value === 'A-2' ? A1_A2 : [value]),
  kind: (name) => (name.startsWith('deposit') ? 'composition' : 'A-Number'),
  because: 'The deposit analysis keeps its A-Number; A-1 and A-2 cover each other.',
  setValue: (name) => (name.startsWith('A-') ? Number(name.slice(2)) : undefined),
  plan: (asked) => `A coupon whose deposit is ${asked.join(', ')}.`,
})
