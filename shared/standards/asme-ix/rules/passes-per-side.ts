/** QW-410.9: several passes per side to one pass per side. */
import { namedRule } from '../../common/rule-kinds.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment } from '../ranges.ts'

export const passesPerSide = unlessHeatTreated(namedRule({
  meta: meta('QW-410.9', 'passes-per-side'),
  field: 'technique.passesPerSide',
  at: 'block',
  label: 'passes per side',
  asked: (context) => (context.block?.technique.passesPerSide ? [context.block.technique.passesPerSide] : null),
  tested: (_context, side) => side.block?.technique.passesPerSide ?? null,
  covers: (value, _context, side) => (value === 'single' || exemptByHeatTreatment(side.variables) === true ? ['single', 'multiple'] : ['multiple']),
  because: 'A coupon of several passes per side does not cover one pass per side; the reverse is covered.',
  setValue: (name) => name,
}))
