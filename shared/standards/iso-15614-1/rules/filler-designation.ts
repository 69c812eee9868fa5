/** 8.4.4: filler designation. */
import type { Filler } from '../../../schemas/welding.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { designation } from '../designation.ts'

const nameOf = (filler: Filler): string | null => {
  if (filler.added === false) return 'no filler'
  const read = designation(filler)
  return read && `${read.key}${read.hydrogen === null ? '' : ` H${read.hydrogen}`}`
}

export const fillerDesignation = nameBandRule({
  meta: meta('filler-designation', { title: 'Filler designation', clause: '8.4.4', basis: 'secondary', statement: 'Another filler is covered where its standard designation tells equal mechanical properties, the same covering or core, the same nominal composition and the same or lower hydrogen; the basic coverings of AWS (15, 16, 18, 48) count as one. Level 1 groups fillers by a table that is not held here, so there only the same designation is sure.' }),
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
