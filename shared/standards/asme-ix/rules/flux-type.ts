/** QW-404.34 (SAW): neutral to active flux or the reverse, for multilayer deposits in P-No. 1. */
import { namedRule } from '../../common/rule-kinds.ts'
import { pNumbers } from '../members.ts'
import { meta } from '../meta.ts'

export const fluxType = namedRule({
  meta: meta('QW-404.34', 'flux-type'),
  field: 'filler.fluxType',
  at: 'block',
  label: 'flux type',
  applies: (context) => pNumbers(context.procedure).includes('1') && context.block?.technique.passesPerSide !== 'single',
  asked: (context) => (context.block?.filler.fluxType ? [context.block.filler.fluxType] : null),
  tested: (_context, side) => side.block?.filler.fluxType ?? null,
  because: 'For multilayer deposits in P-No. 1 neutral and active flux do not cover each other.',
  setValue: (name) => name,
})
