/** 8.4.11: heat treatment after welding. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { asTested } from '../as-tested.ts'

const treatment = ({ pwht }: WeldingVariables): string | null => (pwht.condition === null ? null : pwht.condition === 'none' ? 'no heat treatment after welding' : pwht.condition.replaceAll('-', ' '))

export const pwhtCondition = asTested({
  file: 'pwht',
  title: 'Heat treatment after welding',
  clause: '8.4.11',
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment after welding',
  statement: 'Heat treatment after welding may be neither added nor left out, and its kind stays.',
  read: treatment,
  covers: (value) => ({ sure: [value] }),
})
