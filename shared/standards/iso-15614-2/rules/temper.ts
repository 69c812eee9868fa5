/** 8.4.12: temper before welding. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { secondMember } from '../../common/iso-names.ts'
import { sameText } from '../../common/reading.ts'
import { asTested } from '../as-tested.ts'
import { isHardening } from '../hardening.ts'

const temperName = (variables: WeldingVariables): string | null => {
  const both = [variables.baseMetals.a.condition, secondMember(variables).condition]
  return both.every(Boolean) ? both.map((text) => sameText(text ?? '')).sort().join(' and ') : null
}

export const temper = asTested({
  file: 'temper',
  title: 'Temper before welding',
  clause: '8.4.12',
  field: 'baseMetals.a.condition',
  at: 'weld',
  label: 'temper of the parent metal',
  statement: 'Of heat-treatable alloys the temper before welding as tested is covered; a change must be looked up.',
  applies: isHardening,
  read: temperName,
})
