/** 8.4.4: make of filler where impact is required below -20 °C. */
import type { AssessedCoupon } from '../../../schemas/assessment.ts'
import type { Filler, ProcessBlock } from '../../../schemas/welding.ts'
import { isoProcessNumber, siFigure } from '../../common/iso-names.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf } from '../levels.ts'
import { designation } from '../designation.ts'
import { energyOf } from '../energy.ts'
import { asked } from '../energy-bands.ts'
import { meta } from '../meta.ts'

/** Processes whose fillers are bound to their make below -20 °C; solid wires and rods are free. */
const BOUND: ReadonlySet<string> = new Set(['111', '114', '121', '122', '124', '125', '126', '132', '136'])

const COLD = -20

/** A solid wire under flux: process 12 is bound to its make, solid wires are free, and which of the two holds is not known. */
const isSolidUnderFlux = (block: ProcessBlock | null): boolean => block?.process === 'SAW' && block.filler.productForm === 'solid'

const make = (filler: Filler): readonly string[] | null => (filler.tradeName ? [sameText(filler.tradeName)] : null)

const isSameDesignation = (a: Filler, b: Filler | undefined): boolean => {
  const own = designation(a)
  const other = b && designation(b)
  return !!own && !!other && own.system === other.system && own.key === other.key
}

export const fillerMake = nameBandRule({
  meta: meta('filler-make', { title: 'Make of filler', clause: '8.4.4', basis: 'secondary', class: 'supplementary', processes: ['SMAW', 'SAW', 'FCAW', 'GMAW'], statement: 'Where impact values are required below -20 °C, processes 111, 114, 12, 132 and 136 keep the make tested; another make of the same designation is covered by one more linked test piece at the highest heat input asked, with weld-metal impacts. Solid wires and rods are free; of a solid wire under flux it must be looked up.' }),
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
    const wanted = asked(context)
    const pieces = context.coupons.flatMap((coupon) => (coupon.content.toughness.some(({ place, values }) => place === 'weld' && values.length > 0) ? coupon.content.variables.processes.filter((block) => block.process === context.block?.process && isSameDesignation(block.filler, context.block?.filler)).map((block) => ({ coupon, block })) : []))
    const isHot = (block: ProcessBlock, coupon: AssessedCoupon): boolean => { const had = energyOf(block, coupon); return wanted !== null && !('missing' in had) && had.kind === wanted.kind && had.mean >= wanted.high }
    const extra = pieces.filter(({ block, coupon }) => isHot(block, coupon)).flatMap(({ block }) => make(block.filler) ?? [])
    if (siFigure(context.procedure.impactTemperature, 'temperature') === null) return { sure: [...value, ...extra], maybe: 'any', why: 'The make is bound only where impact values are required below -20 °C, and the impact test temperature isn\'t stated.', missing: ['procedure: impactTemperature'] }
    const sure = [...value, ...extra]
    if (isSolidUnderFlux(context.block)) return { sure, maybe: 'any', why: 'Process 12 keeps the make, and solid wires are free of it; which of the two holds for a solid wire under flux is not known here.' }
    const cool = pieces.flatMap(({ block }) => make(block.filler) ?? []).filter((name) => !sure.includes(name))
    return cool.length > 0 ? { sure, maybe: cool, why: 'The test piece with the other make must have been welded at the highest heat input that is asked, which its record does not show.' } : { sure }
  },
  because: 'Below -20 °C the make tested stays; another one of the same designation needs a test piece with weld-metal impacts.',
  plan: (asked) => `One test piece with ${asked.join(', ')} at the highest heat input, weld-metal impact tests only.`,
})
