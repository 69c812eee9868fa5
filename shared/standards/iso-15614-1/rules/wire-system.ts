/** 8.5: one wire or several. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const wires = (block: ProcessBlock | null): readonly string[] | null => {
  if (!block) return null
  const byHand = block.mechanisation === 'manual' || block.mechanisation === 'semiautomatic'
  const value = block.technique.electrodes ?? (byHand && block.process !== 'SAW' ? 'single' : null)
  return value && [`${value} wire`]
}

export const wireSystem = levelTwoLimit(
  nameBandRule({
    meta: meta('wire-system', { title: 'Wire system', clause: '8.5', basis: 'memory', processes: ['SAW', 'GMAW', 'FCAW'], statement: 'One wire and several wires do not stand for each other.' }),
    field: 'technique.electrodes',
    at: 'block',
    label: 'wire system',
    asked: (context) => wires(context.block),
    tested: (_context, side) => wires(side.block),
    because: 'Single and multiple wire stay as tested.',
  }),
)
