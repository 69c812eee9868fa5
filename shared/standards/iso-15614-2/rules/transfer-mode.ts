/** 8.5: transfer mode. */
import { asTested } from '../as-tested.ts'

export const transferMode = asTested({
  file: 'transfer-mode',
  title: 'Transfer mode',
  clause: '8.5',
  field: 'electrical.transferMode',
  at: 'block',
  label: 'transfer mode',
  statement: 'The transfer mode as tested is covered; a change must be looked up.',
  processes: ['GMAW'],
  read: (_, { electrical }) => electrical.transferMode,
})
