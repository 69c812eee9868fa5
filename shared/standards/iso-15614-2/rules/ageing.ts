/** 8.4.11: natural or artificial ageing. */
import { asTested } from '../as-tested.ts'
import { isHardening } from '../hardening.ts'

export const ageing = asTested({
  file: 'ageing',
  title: 'Ageing',
  clause: '8.4.11',
  field: 'pwht.ageing',
  at: 'weld',
  label: 'ageing',
  statement: 'Of heat-treatable alloys (groups 23 to 26) natural and artificial ageing after welding are different conditions, neither of which covers the other.',
  applies: isHardening,
  read: ({ pwht }) => (pwht.ageing ? `${pwht.ageing} ageing` : null),
  covers: (value) => ({ sure: [value] }),
})
