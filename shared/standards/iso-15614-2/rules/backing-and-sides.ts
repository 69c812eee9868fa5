/** 8.4.3: sides and backing. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { asTested } from '../as-tested.ts'

const sides = ({ joint }: WeldingVariables): string | null => {
  const both = joint.weldedFromBothSides ?? (joint.backing === 'weld-metal' || (joint.backGouging !== null && joint.backGouging !== 'none') ? true : joint.backing === null ? null : joint.backing === 'none' ? null : false)
  if (both === null) return null
  return both ? 'both sides' : joint.backing === null ? null : `one side, ${joint.backing === 'none' ? 'no backing' : `${joint.backing} backing`}`
}

export const backingAndSides = asTested({
  file: 'backing-and-sides',
  title: 'Sides and backing',
  clause: '8.4.3',
  field: 'joint.backing',
  at: 'weld',
  label: 'sides and backing',
  statement: 'The same sides and backing are covered; a change must be looked up.',
  applies: ({ joint }) => joint.weld === 'groove',
  read: (variables) => (variables.joint.weld === 'fillet' ? undefined : sides(variables)),
})
