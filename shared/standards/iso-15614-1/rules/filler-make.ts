/** 8.4.4: make of filler where impact is required below -20 °C. */
import type { Filler } from '../../../schemas/welding.ts'
import { hasImpactTests, isoProcessNumber, siFigure } from '../../common/iso-names.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'

/** Processes whose fillers are bound to their make below -20 °C; solid wires and rods are free. */
const BOUND: ReadonlySet<string> = new Set(['111', '114', '121', '122', '124', '125', '126', '132', '136'])

const COLD = -20

const make = (filler: Filler): readonly string[] | null => (filler.tradeName ? [sameText(filler.tradeName)] : null)

export const fillerMake = nameBandRule({
  meta: meta('filler-make', { title: 'Make of filler', clause: '8.4.4', basis: 'secondary', class: 'supplementary', processes: ['SMAW', 'SAW', 'FCAW', 'GMAW'], statement: 'Where impact values are required below -20 °C, processes 111, 114, 12, 132 and 136 keep the make tested; another make of the same designation is covered by one more test piece at the highest heat input with weld-metal impacts. Solid wires and rods are free.' }),
  field: 'filler.tradeName',
  at: 'block',
  label: 'make of filler',
  applies(context) {
    const number = context.block && isoProcessNumber(context.block)
    if (!number || !BOUND.has(number) || context.block?.filler.added === false) return false
    const at = siFigure(context.procedure.impactTemperature, 'temperature')
    return at === null || at < COLD
  },
  asked: (context) => context.block && make(context.block.filler),
  tested: (_context, side) => side.block && make(side.block.filler),
  covers(value, context) {
    if (!context.procedure || levelOf(context) === '1') return context.procedure ? { sure: value, maybe: 'any', why: 'What level 1 asks of the make is not held here.' } : { sure: value }
    const extra = context.coupons.flatMap((coupon) => (hasImpactTests(coupon.content) && coupon.content.toughness.some(({ place }) => place === 'weld') ? coupon.content.variables.processes.filter((block) => block.process === context.block?.process).flatMap((block) => make(block.filler) ?? []) : []))
    if (siFigure(context.procedure.impactTemperature, 'temperature') === null) return { sure: [...value, ...extra], maybe: 'any', why: 'The make is bound only where impact values are required below -20 °C, and the impact test temperature isn\'t stated.', missing: ['procedure: impactTemperature'] }
    return { sure: [...value, ...extra] }
  },
  because: 'Below -20 °C the make tested stays; another one of the same designation needs a test piece with weld-metal impacts.',
  plan: (asked) => `One test piece with ${asked.join(', ')} at the highest heat input, weld-metal impact tests only.`,
})
