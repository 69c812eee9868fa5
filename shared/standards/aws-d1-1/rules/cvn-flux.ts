/** Table 6.7 (SAW): another flux-wire class, another trade name where there is no class, crushed slag. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

/** Classification with the flux's trade name where it has no class; crushed slag is a flux of its own. */
function fluxToken(block: ProcessBlock | null): string | null {
  if (!block) return null
  const { fluxClassification, fluxTradeName, fluxIsRecrushedSlag } = block.filler
  if (fluxIsRecrushedSlag === null) return null
  const name = fluxClassification ?? fluxTradeName
  return name ? `${sameText(name)}${fluxIsRecrushedSlag ? ' from crushed slag' : ''}` : null
}

export const cvnFlux = namedRule({
  meta: meta('cvn_flux'),
  field: 'filler.fluxClassification',
  at: 'block',
  label: 'flux (class or trade name, crushed slag or not)',
  asked(context) {
    const value = fluxToken(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => fluxToken(side.block),
  lacks: (_variables, block) => [...(block?.filler.fluxClassification === null && block.filler.fluxTradeName === null ? ['filler.fluxClassification'] : []), ...(block?.filler.fluxIsRecrushedSlag === null ? ['filler.fluxIsRecrushedSlag'] : [])],
  because: 'With CVN another flux-wire class, another trade name of an unclassified flux, and crushed slag count.',
})

