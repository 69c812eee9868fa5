/** 8.4.4: filler type of ISO 18273. */
import type { Filler } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { meta } from '../meta.ts'

/** Type of ISO 18273: the first figure of the alloy. `Al 5356`, `ER5356`, `S Al 4043A` → 5, 4. */
export function fillerType(filler: Filler): string | null {
  if (filler.added === false) return 'no filler'
  const digit = /(?:^|[^\d])([1-5])\d{3}(?!\d)/.exec(filler.classification ?? '')?.[1]
  return digit ? `type ${digit}` : filler.classification ? `designation ${sameText(filler.classification)}` : null
}

export const fillerTypeRule = nameBandRule({
  meta: meta('filler-type', { title: 'Filler type', clause: '8.4.4', statement: 'A filler covers those of its type under ISO 18273 (1 aluminium, 3 Al-Mn, 4 Al-Si, 5 Al-Mg). Whether types 4 and 5 cover each other must be looked up; that Al-Mg covers Al-Si is a rule for welders, not for procedures.' }),
  field: 'filler.classification',
  at: 'block',
  label: 'filler type',
  asked(context) {
    const type = context.block && fillerType(context.block.filler)
    return type ? [type] : null
  },
  tested(_context, side) {
    const type = side.block && fillerType(side.block.filler)
    return type ? [type] : null
  },
  covers(value) {
    const [type = ''] = value
    if (type === 'type 4' || type === 'type 5') return { sure: value, maybe: ['type 4', 'type 5'].filter((other) => other !== type), why: 'Types 4 and 5 are believed not to cover each other, which is not confirmed.' }
    return type.startsWith('type') || type === 'no filler' ? { sure: value } : { sure: value, maybe: 'any', why: 'The type can\'t be read from the designation.' }
  },
  because: 'The same type of ISO 18273 is covered.',
})
