/** QW-404.9 (SAW): the tensile indicator of the flux-wire class, or trade names where flux or wire is not classified. */
import type { Filler } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

type Kind = 'flux name' | 'tensile' | 'both names'

/** Which of its four cases the clause puts a filler in. */
const kindOf = (filler: Filler): Kind => (filler.aNumber === 8 ? 'flux name' : filler.fluxClassification ? 'tensile' : filler.classification ? 'flux name' : 'both names')

/** What is compared in that case; null when it isn't recorded. */
function token(filler: Filler, kind: Kind): string | null {
  if (kind === 'tensile') {
    const digits = filler.fluxClassification ? /^F(\d{1,2})(?=[A-Z])/.exec(sameText(filler.fluxClassification))?.[1] : undefined
    return digits ? `F${digits}` : null
  }
  if (!filler.fluxTradeName) return null
  const flux = `flux ${sameText(filler.fluxTradeName)}`
  if (kind === 'flux name') return flux
  return filler.tradeName ? `${flux}, wire ${sameText(filler.tradeName)}` : null
}

/**
 * Which of the two systems a class is written in: tens of ksi (F7…, F11…) or tens of MPa (F43…, F48…). No source here pairs the two, so
 * a class of the one can't be compared with a class of the other.
 */
export function indicatorSystem(fluxClass: string): 'customary class' | 'metric class' | 'class of another kind' {
  const digits = /^F(\d{1,2})/.exec(fluxClass)?.[1]
  return digits === undefined ? 'class of another kind' : Number(digits) >= 40 ? 'metric class' : 'customary class'
}

export const fluxWireClass = namedRule({
  meta: meta('QW-404.9', 'flux-wire-class'),
  field: 'filler.fluxClassification',
  at: 'block',
  label: 'flux-wire classification (or the trade names)',
  asked(context) {
    const value = context.block && token(context.block.filler, kindOf(context.block.filler))
    return value ? [value] : null
  },
  // The procedure's case decides what of the coupon is compared.
  tested: (context, side) => (side.block ? token(side.block.filler, kindOf((context.block ?? side.block).filler)) : null),
  lacks(_, block) {
    if (!block || kindOf(block.filler) === 'tensile') return []
    return [...(block.filler.fluxTradeName ? [] : ['filler.fluxTradeName']), ...(kindOf(block.filler) === 'both names' && !block.filler.tradeName ? ['filler.tradeName'] : [])]
  },
  kind: (name) => (name.startsWith('F') ? indicatorSystem(name) : 'trade name'),
  because: 'A classified flux and wire keep the tensile indicator; what is not classified, and every A-8 deposit, keeps its trade name.',
})
