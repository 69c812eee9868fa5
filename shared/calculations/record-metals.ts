/** What family a weld's metals are of, as far as the record says: it decides which calculations mean anything for it. */
import { bareClassification } from '../library/filler-metals.ts'
import { wireFamily } from '../machines/wires.ts'
import type { BaseMetal, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'

export type MetalFamily = 'steel' | 'stainless' | 'aluminium' | 'nickel' | 'copper' | 'titanium'

/** By main group of ISO/TR 15608. Groups 7 to 10 are the stainless steels, 21 to 26 aluminium, 31 to 38 copper, 41 to 48 nickel, 51 to 54 titanium. */
function byIsoGroup(group: string): MetalFamily | null {
  const main = Number.parseInt(group, 10)
  if (main >= 7 && main <= 10) return main === 9 ? 'steel' : 'stainless'
  if ((main >= 1 && main <= 6) || main === 11) return 'steel'
  if (main >= 21 && main <= 26) return 'aluminium'
  if (main >= 31 && main <= 38) return 'copper'
  if (main >= 41 && main <= 48) return 'nickel'
  return main >= 51 && main <= 54 ? 'titanium' : null
}

/** By P-Number of Section IX: 6 to 8 and 10H, 10I stainless; 21 to 26 aluminium; 31 to 35 copper; 41 to 49 nickel; 51 to 53 titanium. */
function byPNumber(pNumber: string): MetalFamily | null {
  const number = Number.parseInt(pNumber, 10)
  if ((number >= 6 && number <= 8) || /^10[HI]$/i.test(pNumber)) return 'stainless'
  if (number >= 1 && number <= 15) return 'steel'
  if (number >= 21 && number <= 26) return 'aluminium'
  if (number >= 31 && number <= 35) return 'copper'
  if (number >= 41 && number <= 49) return 'nickel'
  return number >= 51 && number <= 53 ? 'titanium' : null
}

/** @returns null when the record doesn't tell */
function metalFamily(metal: BaseMetal): MetalFamily | null {
  if (metal.iso15608) return byIsoGroup(metal.iso15608)
  if (metal.pNumber) return byPNumber(metal.pNumber)
  if (metal.d12MNumber) return 'aluminium'
  return metal.d11Group ? 'steel' : null
}

/** Families of the weld's base metals, each once. */
export const baseFamilies = ({ baseMetals: { a, b } }: WeldingVariables): MetalFamily[] => [...new Set([metalFamily(a), metalFamily(b)].filter((each) => each !== null))]

/** Family of the deposit: the filler's, else that of base metals which agree; null when neither tells. */
export function weldFamily(variables: WeldingVariables, block: ProcessBlock | null): MetalFamily | null {
  const classification = block?.filler.added === false ? null : block?.filler.classification
  const key = classification ? wireFamily(bareClassification(classification))?.key : undefined
  if (key) return key.startsWith('aluminium') ? 'aluminium' : (key as MetalFamily)
  const families = baseFamilies(variables)
  return families.length === 1 ? (families[0] ?? null) : null
}

/** ISO 4063 number of a block's process, as far as process, filler and gas tell it; null where they don't. */
export function isoProcess(block: ProcessBlock): string | null {
  const active = (block.shieldingGas?.components ?? []).some(({ gas, percent }) => (gas === 'CO2' || gas === 'O2') && percent > 0)
  const gas = (block.shieldingGas?.components.length ?? 0) > 0
  switch (block.process) {
    case 'SMAW':
      return '111'
    case 'SAW':
      return '12'
    case 'GMAW':
      if (!gas) return '13'
      return block.filler.productForm === 'metal-cored' ? (active ? '138' : '133') : active ? '135' : '131'
    case 'FCAW':
      return gas ? (active ? '136' : '132') : null
    case 'GTAW':
      return '14'
    case 'PAW':
      return '15'
    default:
      return null
  }
}
