/** QW-410.10: single electrode to multiple or the reverse, for machine and automatic welding. */
import { namedRule } from '../../common/rule-kinds.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment } from '../ranges.ts'

export const electrodeNumber = unlessHeatTreated(namedRule({
  meta: meta('QW-410.10', 'electrode-number'),
  field: 'technique.electrodes',
  at: 'block',
  label: 'single or multiple electrodes',
  applies: (context) => context.block?.mechanisation === 'machine' || context.block?.mechanisation === 'automatic',
  asked: (context) => (context.block?.technique.electrodes ? [context.block.technique.electrodes] : null),
  tested: (_context, side) => side.block?.technique.electrodes ?? null,
  covers: (value, _context, side) => (exemptByHeatTreatment(side.variables) === true ? 'any' : [value]),
  because: 'Machine and automatic welding with one electrode and with several do not cover each other.',
  setValue: (name) => name,
}))
