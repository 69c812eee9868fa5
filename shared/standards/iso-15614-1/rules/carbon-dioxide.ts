/** 8.5: carbon dioxide share of process 13. */
import { between, closed, numericRange, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { GasMixture } from '../../../schemas/welding.ts'
import { gasSymbol } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const carbonDioxide = (gas: GasMixture | null): number | null => (gas && gas.components.length > 0 ? gas.components.reduce((sum, part) => sum + (part.gas === 'CO2' ? part.percent : 0), 0) : null)

/** Symbols of ISO 14175 whose gas holds carbon dioxide beside another one. */
const MIXED = /^(?:M12|M14|M2[0134567]|M3[13-5]|C2)$/

/** The share must be told wherever the gas holds carbon dioxide, or may: a symbol alone gives no share. */
const mayHold = (gas: GasMixture | null): boolean => {
  const share = carbonDioxide(gas)
  return share === null ? MIXED.test(gasSymbol(gas) ?? '') : share > 0
}

export const carbonDioxideShare = levelTwoLimit(
  bandRule({
    meta: meta('carbon-dioxide', { title: 'Carbon dioxide in the shielding gas', clause: '8.5', basis: 'read', processes: ['GMAW', 'FCAW'], statement: 'For process 13 the carbon dioxide content is at most 1.1 times that tested (2004), 1.2 times as the 2017 edition is recalled; between the two it must be looked up.' }),
    field: 'shieldingGas',
    at: 'block',
    label: 'carbon dioxide content',
    dimension: 'percent',
    ends: { min: '.components', max: '.components' },
    applies: (context) => mayHold(context.block?.shieldingGas ?? null),
    asked(context) {
      const share = carbonDioxide(context.block?.shieldingGas ?? null)
      return share === null ? null : { min: share, max: share }
    },
    band(context, side) {
      if (!side.block) return null
      const share = carbonDioxide(side.block.shieldingGas)
      if (share === null) return { sure: numericRange('percent', '%', []), maybe: unknownNumeric('percent', '%'), tested: null, reason: `${side.coupon.number} does not record the composition of its gas.`, missing: [`${side.coupon.number}: shieldingGas.components`] }
      if (share === 0 && !context.procedure) return null
      const upTo = (factor: number): ReturnType<typeof between> => between('percent', '%', UNLIMITED, closed(Math.min(100, tidy(share * factor))))
      return { sure: upTo(1.1), maybe: upTo(1.2), tested: share, reason: `${share} % tested: up to 1.1 times (1.2 times as 2017 is recalled).`, why: 'Between 1.1 and 1.2 times the tested content the editions are recalled differently.' }
    },
    plan: (asked) => `A coupon with at least ${tidy((asked.max ?? 0) / 1.1).toFixed(1)} % carbon dioxide.`,
  }),
)
