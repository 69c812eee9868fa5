/** 8.4.4: filler designation, and its make where impact values are required below -20 °C. */
import type { Filler } from '../../../schemas/welding.ts'
import { hasImpactTests, isoProcessNumber, siFigure } from '../../common/iso-names.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'

export interface Designation { system: 'ISO' | 'AWS'; key: string; hydrogen: number | null }

/** Basic coverings of one strength stand for each other; `I1` marks the suffix -1 for better impact values. */
const BASIC = /^(E\d{2,3})(?:15|16|18|48)(?=$|[A-Z])/
const HYDROGEN = /H(\d{1,2})R?$/

/**
 * A designation as the clause compares it: without hydrogen, and of covered electrodes without recovery and position digits or between basic
 * coverings. `E 42 4 B 42 H5` → `E424B`, hydrogen 5.
 * @returns null where none is recorded
 */
export function designation(filler: Filler): Designation | null {
  const raw = filler.classification?.trim()
  if (!raw) return null
  const system = /^(?:ISO|EN)/i.test(filler.specification ?? '') || /^[EGWTSF]\s+\d{2}/i.test(raw) ? 'ISO' : 'AWS'
  const text = sameText(raw.replace(/(?<=^E\d{4,5})-1(?!\d)/i, 'I1').replace(/^(?:EN\s+)?ISO\s+\d+(?:-[AB])?\s*[-:]?\s*/i, ''))
  const hydrogen = HYDROGEN.exec(text)?.[1]
  const bare = text.replace(HYDROGEN, '').replace(/(?<=\d)R$/, '')
  const covered = system === 'ISO' ? /^(E\d{2}[A-Z0-9].*?(?:RA|RB|RC|RR|A|B|C|R))\d{1,2}$/.exec(bare)?.[1] : undefined
  const key = covered ?? (system === 'AWS' ? bare.replace(BASIC, '$1 basic') : bare)
  return { system, key, hydrogen: hydrogen === undefined ? null : Number(hydrogen) }
}

const nameOf = (filler: Filler): string | null => {
  if (filler.added === false) return 'no filler'
  const read = designation(filler)
  return read && `${read.key}${read.hydrogen === null ? '' : ` H${read.hydrogen}`}`
}


export const fillerDesignation = nameBandRule({
  meta: meta('filler-designation', { title: 'Filler designation', clause: '8.4.4', basis: 'secondary', statement: 'Another filler is covered where its standard designation tells equal mechanical properties, the same covering or core, the same nominal composition and the same or lower hydrogen. Level 1 groups fillers by a table that is not held here, so there only the same designation is sure.' }),
  field: 'filler.classification',
  at: 'block',
  label: 'filler designation',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const name = context.block && nameOf(context.block.filler)
    return name ? [name] : null
  },
  tested(_context, side) {
    const name = side.block && nameOf(side.block.filler)
    return name ? [name] : null
  },
  covers(value, context, side) {
    const own = side.block && designation(side.block.filler)
    const asked = context.block && designation(context.block.filler)
    if (!own || !asked || side.block?.filler.added === false) return { sure: value }
    const askedName = (context.block && nameOf(context.block.filler)) ?? ''
    const sameKey = own.key === asked.key
    const drier = own.hydrogen === null || (asked.hydrogen !== null && asked.hydrogen <= own.hydrogen)
    if (sameKey && drier) return { sure: [...value, askedName] }
    if (sameKey && asked.hydrogen === null) return { sure: value, maybe: [askedName], why: `The coupon's filler is H${own.hydrogen ?? ''}; the hydrogen of the one asked isn't stated.`, missing: ['procedure: filler.classification (with its hydrogen symbol)'] }
    if (!sameKey && own.key.replace('I1', '') === asked.key.replace('I1', '')) return { sure: value, maybe: [askedName], why: 'The designations differ only in the suffix for impact values; whether the mechanical properties count as equivalent is for a person to judge.' }
    if (levelOf(context) === '1') return { sure: value, maybe: 'any', why: 'Level 1 groups fillers by a table of its annex that is not held here.', clause: '8.4.4 Annex A' }
    if (own.system !== asked.system) return { sure: value, maybe: [askedName], why: 'The designations are of different systems and can\'t be compared here.', missing: ['procedure: filler.classification (in the system of the coupon)'] }
    return { sure: value }
  },
  because: 'Equal strength, covering or core and composition by designation, hydrogen not higher.',
})

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

