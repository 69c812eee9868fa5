/** Method of cleaning before welding and between passes. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { plainWords } from '../../common/reading.ts'
import { meta, TABLE } from '../meta.ts'
import { unconfirmedName } from '../unconfirmed.ts'

/** A full stop at the end of a note is no part of the method. */
const method = (text: string): string => plainWords(text).replace(/\.$/, '')

const cleaningToken = (block: ProcessBlock | null): string | null => {
  if (!block) return null
  const { initialCleaning, interpassCleaning } = block.technique
  return initialCleaning === null || interpassCleaning === null ? null : `${method(initialCleaning)}, then ${method(interpassCleaning)}`
}

/** Cleaning is kept in words: other words may mean the same method. */
export const cleaning = unconfirmedName({
  meta: meta('cleaning', 'Cleaning method', 'Table 3.1', 'secondary', TABLE, 'Another method of cleaning before welding and between passes. It is kept in words, so other words are "cannot tell".'),
  field: 'technique.initialCleaning',
  at: 'block',
  label: 'cleaning method (first and between passes)',
  asked(context) {
    const value = cleaningToken(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => cleaningToken(side.block),
  lacks: (_variables, block) => (['initialCleaning', 'interpassCleaning'] as const).filter((key) => block?.technique[key] === null).map((key) => `technique.${key}`),
  because: 'The same method of cleaning.',
})
