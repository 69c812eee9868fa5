/** 8.4.3: single or multiple runs. */
import { asTested } from '../as-tested.ts'

export const runCount = asTested({
  file: 'run-count',
  title: 'Single or multiple runs',
  clause: '8.4.3',
  field: 'technique.passesPerSide',
  at: 'block',
  label: 'number of runs',
  statement: 'Single or multiple runs as tested are covered; a change must be looked up.',
  read: (_, { technique }) => technique.passesPerSide,
})
