/** QW-404.36 (SAW): flux from recrushed slag needs batch testing, or qualification as an unclassified flux. */
import { sameText } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const base = namedRule({
  meta: meta('QW-404.36', 'recrushed-slag'),
  field: 'filler.fluxIsRecrushedSlag',
  at: 'block',
  label: 'use of recrushed slag',
  asked: (context) => (context.block?.filler.fluxIsRecrushedSlag === null || !context.block ? null : [context.block.filler.fluxIsRecrushedSlag ? 'recrushed slag' : 'new flux']),
  tested: (_context, side) => (side.block?.filler.fluxIsRecrushedSlag == null ? null : side.block.filler.fluxIsRecrushedSlag ? `recrushed slag${side.block.filler.fluxTradeName ? ` ${sameText(side.block.filler.fluxTradeName)}` : ''}` : 'new flux'),
  covers: (value) => [value, 'new flux'],
  because: 'New flux raises no question here; recrushed slag must be tested by batch or qualified as a flux of its own.',
  setValue: (name) => (name === 'new flux' ? false : undefined),
})

export const recrushedSlag: Rule = {
  ...base,
  check(context, sides, joined) {
    const filler = context.block?.filler
    if (!filler || filler.fluxIsRecrushedSlag === null) return base.check(context, sides, joined)
    if (!filler.fluxIsRecrushedSlag) return { verdict: 'within', sentence: 'No recrushed slag is used.', asked: ['new flux'], range: joined }
    const name = filler.fluxTradeName ? `recrushed slag ${sameText(filler.fluxTradeName)}` : null
    if (name && joined?.type === 'set' && joined.values.includes(name)) return { verdict: 'within', sentence: 'The same recrushed flux was qualified with the coupon.', asked: [name], range: joined }
    return { verdict: 'cannot-tell', sentence: "Recrushed slag needs testing by batch, or qualification as an unclassified flux; neither is recorded here.", asked: ['recrushed slag'], range: joined, missing: ['batch test of the recrushed slag'], fixes: [{ kind: 'set', label: 'Use new flux', field: `${context.path}.filler.fluxIsRecrushedSlag`, value: false }] }
  },
}
