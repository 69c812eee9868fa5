/** 8.4.6: type of current, pulsing and polarity. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { asTested } from '../as-tested.ts'

const pulsed = ({ process: letters, electrical }: ProcessBlock): boolean | null => (electrical.pulsed ?? (electrical.transferMode === null ? (letters === null ? false : null) : electrical.transferMode === 'pulsed-spray'))
const currentName = (block: ProcessBlock): string | null => {
  const { currentType } = block.electrical
  const pulse = pulsed(block)
  return currentType === null || pulse === null ? null : `${currentType === 'AC-balanced' ? 'AC' : currentType}${pulse ? ' pulsed' : ''}`
}

export const currentType = asTested({
  file: 'current-type',
  title: 'Type of current and polarity',
  clause: '8.4.6',
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  statement: 'Type, pulsing and polarity as tested are covered; a change must be looked up.',
  read: (_, block) => currentName(block),
})
