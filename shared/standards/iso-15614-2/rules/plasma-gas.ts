/** 8.5: plasma gas. */
import { gasName } from '../../common/reading.ts'
import { asTested } from '../as-tested.ts'

export const plasmaGas = asTested({
  file: 'plasma-gas',
  title: 'Plasma gas',
  clause: '8.5',
  field: 'plasmaGas',
  at: 'block',
  label: 'plasma gas',
  statement: 'The plasma gas as tested is covered; a change must be looked up.',
  processes: ['PAW'],
  read: (_, { plasmaGas }) => gasName(plasmaGas),
})
