/** 8.4.6: type of current, pulsing and polarity. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { named } from '../named.ts'

const WIRE = new Set(['GMAW', 'FCAW', 'GTAW', 'PAW'])

/** `DCEP`, `AC`, `DCEP pulsed` …; null where type or pulsing isn't stated. */
export function currentName(block: ProcessBlock | null): string | null {
  const type = block?.electrical.currentType
  if (!block || !type) return null
  const { pulsed, transferMode } = block.electrical
  const name = type === 'AC-balanced' ? 'AC' : type
  if (pulsed === true || transferMode === 'pulsed-spray') return `${name} pulsed`
  return pulsed === false || transferMode !== null || !block.process || !WIRE.has(block.process) ? name : null
}

export const currentType = nameBandRule({
  meta: meta('current-type', { title: 'Type of current and polarity', clause: '8.4.6', basis: 'memory', statement: 'AC, DC and pulsed current and the polarity stay as tested at level 2; for process 111 AC also covers DC of both polarities where impact is not required. Level 1 is believed to bind only with impact.' }),
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  asked: (context) => named(currentName(context.block)),
  tested: (_context, side) => named(currentName(side.block)),
  covers(value, context, side) {
    const dc = ['DCEP', 'DCEN']
    const alternating = side.block?.process === 'SMAW' && value[0] === 'AC'
    const sure = alternating && context.toughness === false ? [...value, ...dc] : value
    if (levelOf(context) === '1' && context.toughness !== true) return { sure, maybe: 'any', why: 'Level 1 is believed to bind the current only where impact is required, which is not confirmed.' }
    if (levelOf(context) === '1') return { sure }
    return alternating && context.toughness === null ? { sure, maybe: dc, why: 'AC covers DC only where impact is not required, which isn\'t stated.', missing: ['procedure: toughnessRequired'] } : { sure }
  },
  because: 'Type, pulsing and polarity stay as tested.',
  lacks: () => ['electrical.currentType', 'electrical.pulsed'],
})
