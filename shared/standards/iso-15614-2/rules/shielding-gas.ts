/** 8.5: shielding gas. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { gasSymbol } from '../../common/iso-names.ts'
import { gasName } from '../../common/reading.ts'
import { asTested } from '../as-tested.ts'

const shielding = (gas: ProcessBlock['shieldingGas']): string | null => {
  const symbol = gasSymbol(gas)
  const name = gasName(gas)
  return symbol === null ? null : symbol.startsWith('I3') && name ? `${symbol} (${name})` : symbol
}

export const shieldingGas = asTested({
  file: 'shielding-gas',
  title: 'Shielding gas',
  clause: '8.5',
  field: 'shieldingGas',
  at: 'block',
  label: 'shielding gas',
  statement: 'The same symbol of ISO 14175 is covered, of argon and helium mixtures the same composition; a change, also of the helium share, must be looked up.',
  read: (_, { shieldingGas }) => shielding(shieldingGas),
})
