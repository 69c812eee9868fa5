/** 8.5: one wire or several. */
import { asTested } from '../as-tested.ts'

export const wireSystem = asTested({
  file: 'wire-system',
  title: 'Wire system',
  clause: '8.5',
  field: 'technique.electrodes',
  at: 'block',
  label: 'wire system',
  statement: 'One wire or several as tested is covered; a change must be looked up.',
  processes: ['GMAW'],
  read: (_, { technique, mechanisation }) => technique.electrodes ?? (mechanisation === 'manual' || mechanisation === 'semiautomatic' ? 'single' : null),
})
