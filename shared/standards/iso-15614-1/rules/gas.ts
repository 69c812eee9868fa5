/** 8.5: shielding, backing and plasma gas by symbol of ISO 14175, and the carbon dioxide share of process 13. */
import { between, closed, numericRange, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { GasMixture } from '../../../schemas/welding.ts'
import { gasSymbol } from '../../common/iso-names.ts'
import { gasName, isNoGas, tidy } from '../../common/reading.ts'
import { bandRule, nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const named = (value: string | null): readonly string[] | null => (value === null ? null : [value])

export const shieldingGas = levelTwoLimit(
  nameBandRule({
    meta: meta('shielding-gas', { title: 'Shielding gas', clause: '8.5', basis: 'read', processes: ['GMAW', 'FCAW', 'GTAW', 'PAW'], statement: 'The shielding gas keeps the symbol of ISO 14175 that was tested; a gas outside the symbols (Z) keeps its nominal composition. Symbols are worked out from the composition by the bands of 2008, recalled.' }),
    field: 'shieldingGas',
    at: 'block',
    label: 'shielding gas',
    asked: (context) => named(context.block && gasSymbol(context.block.shieldingGas)),
    tested: (_context, side) => named(side.block && gasSymbol(side.block.shieldingGas)),
    covers: (value) => ({ sure: value, basis: value[0]?.startsWith('Z') ? 'memory' : 'read' }),
    because: 'The symbol (main group and sub-group) is the limit.',
  }),
)

const carbonDioxide = (gas: GasMixture | null): number | null => (gas && gas.components.length > 0 ? gas.components.reduce((sum, part) => sum + (part.gas === 'CO2' ? part.percent : 0), 0) : null)

export const carbonDioxideShare = levelTwoLimit(
  bandRule({
    meta: meta('carbon-dioxide', { title: 'Carbon dioxide in the shielding gas', clause: '8.5', basis: 'read', processes: ['GMAW', 'FCAW'], statement: 'For process 13 the carbon dioxide content is at most 1.1 times that tested (2004), 1.2 times as the 2017 edition is recalled; between the two it must be looked up.' }),
    field: 'shieldingGas',
    at: 'block',
    label: 'carbon dioxide content',
    dimension: 'percent',
    ends: { min: '.components', max: '.components' },
    applies: (context) => (carbonDioxide(context.block?.shieldingGas ?? null) ?? 0) > 0,
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

const backing = (gas: GasMixture | null): string | null => (gas && (isNoGas(gas) ? 'no backing gas' : gasSymbol(gas)))

export const backingGas = levelTwoLimit(
  nameBandRule({
    meta: meta('backing-gas', { title: 'Backing gas', clause: '8.5', basis: 'memory', processes: ['GTAW', 'PAW'], statement: 'The backing gas keeps its symbol; a coupon without backing gas covers work with it, not the reverse.' }),
    field: 'backingGas',
    at: 'block',
    label: 'backing gas',
    applies: (context) => context.procedure.joint.weld === 'groove',
    asked: (context) => named(context.block && backing(context.block.backingGas)),
    tested: (_context, side) => named(side.block && backing(side.block.backingGas)),
    covers: (value) => (value[0] === 'no backing gas' ? { sure: 'any' } : { sure: value }),
    because: 'Without backing gas is the harder case: it covers work with it.',
  }),
)

export const plasmaGas = levelTwoLimit(
  nameBandRule({
    meta: meta('plasma-gas', { title: 'Plasma gas', clause: '8.5', basis: 'memory', processes: ['PAW'], statement: 'The plasma gas keeps the composition tested.' }),
    field: 'plasmaGas',
    at: 'block',
    label: 'plasma gas',
    asked: (context) => named(gasName(context.block?.plasmaGas ?? null)),
    tested: (_context, side) => named(gasName(side.block?.plasmaGas ?? null)),
    because: 'The nominal composition stays as tested.',
  }),
)
