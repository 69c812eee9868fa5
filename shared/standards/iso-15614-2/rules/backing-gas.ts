/** 8.5: backing gas. */
import { gasSymbol } from '../../common/iso-names.ts'
import { isNoGas } from '../../common/reading.ts'
import { asTested } from '../as-tested.ts'

export const backingGas = asTested({
  file: 'backing-gas',
  title: 'Backing gas',
  clause: '8.5',
  field: 'backingGas',
  at: 'block',
  label: 'backing gas',
  statement: 'The backing gas as tested is covered; a change must be looked up.',
  processes: ['GTAW', 'PAW'],
  applies: ({ joint }) => joint.weld === 'groove',
  read: (_, { backingGas }) => (backingGas && isNoGas(backingGas) ? 'no backing gas' : gasSymbol(backingGas)),
})
