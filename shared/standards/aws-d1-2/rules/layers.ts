/** Number of layers. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { meta, TABLE } from '../meta.ts'
import { unconfirmedName } from '../unconfirmed.ts'

function layerToken(block: ProcessBlock | null, counted: number): string | null {
  if (!block) return null
  if (block.technique.passesPerSide === 'single') return 'single layer'
  if (counted > 0) return counted === 1 ? 'single layer' : `${counted} layers`
  return block.technique.passesPerSide === 'multiple' ? 'several layers' : null
}
const sheetRows = (content: { runSheet: readonly { processId: string }[] }, block: ProcessBlock | null): number => content.runSheet.filter((row) => row.processId === block?.id).length

export const layers = unconfirmedName({
  meta: meta('layers', 'Number of layers', 'Table 3.1', 'secondary', TABLE, 'Another number of layers. Which change of number counts is not confirmed, so any other number is "cannot tell".'),
  field: 'technique.passesPerSide',
  at: 'block',
  label: 'number of layers',
  asked(context) {
    const value = layerToken(context.block, context.block?.passes.length ?? 0)
    return value ? [value] : null
  },
  tested: (_context, side) => layerToken(side.block, side.block?.passes.length || sheetRows(side.coupon.content, side.block)),
  because: 'The same number of layers.',
})
