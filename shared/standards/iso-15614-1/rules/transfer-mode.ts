/** 8.5: transfer mode of process 13. */
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { named } from '../named.ts'

const TRANSFER: Readonly<Record<string, readonly string[]>> = { 'short-circuiting': ['short-circuiting'], spray: ['spray', 'globular'], globular: ['spray', 'globular'], 'pulsed-spray': ['pulsed-spray'] }

export const transferMode = levelTwoLimit(
  nameBandRule({
    meta: meta('transfer-mode', { title: 'Transfer mode', clause: '8.5', basis: 'memory', processes: ['GMAW', 'FCAW'], statement: 'With solid and metal-cored wire short-circuiting covers itself only; spray and globular cover each other. A change to or from pulsed transfer must be looked up.' }),
    field: 'electrical.transferMode',
    at: 'block',
    label: 'transfer mode',
    applies: ({ block }) => (block?.process === 'GMAW' ? block.filler.productForm !== 'flux-cored' : block?.filler.productForm === 'metal-cored'),
    asked: (context) => named(context.block?.electrical.transferMode ?? null),
    tested: (_context, side) => named(side.block?.electrical.transferMode ?? null),
    covers([value = '']) {
      const sure = TRANSFER[value] ?? [value]
      if (value === 'short-circuiting') return { sure, maybe: ['pulsed-spray'], why: 'How the clause sees a change to or from pulsed transfer is not known here.' }
      return { sure, maybe: value === 'pulsed-spray' ? ['spray', 'globular', 'short-circuiting'] : ['pulsed-spray'], why: 'How the clause sees a change to or from pulsed transfer is not known here.' }
    },
    because: 'Short-circuiting stands alone; spray and globular cover each other.',
    setValue: (name) => name,
  }),
)
