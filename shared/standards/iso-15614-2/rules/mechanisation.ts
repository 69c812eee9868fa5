/** 8.4.1: degree of mechanisation. */
import { asTested } from '../as-tested.ts'

export const mechanisation = asTested({
  file: 'mechanisation',
  title: 'Degree of mechanisation',
  clause: '8.4.1',
  field: 'mechanisation',
  at: 'block',
  label: 'degree of mechanisation',
  statement: 'The degree of mechanisation as tested is covered; a change must be looked up.',
  read: (_, { mechanisation }) => mechanisation,
})
