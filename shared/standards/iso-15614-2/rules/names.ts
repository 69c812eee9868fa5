/** Variables of which only "as tested" is sure: whatever differs must be looked up, save where the standard is known to close it. */
import { setRange } from '../../../ranges/set.ts'
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { gasSymbol, isoPositions, isoProcessNumber, materialGroup, secondMember } from '../../common/iso-names.ts'
import { gasName, isNoGas, sameText } from '../../common/reading.ts'
import { nameBandRule, type NameBand } from '../../common/review-band.ts'
import { list } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

type Reader = (variables: WeldingVariables, block: ProcessBlock) => string | null | undefined

interface Row {
  file: string
  title: string
  clause: string
  field: string
  at: 'weld' | 'block'
  label: string
  statement: string
  read: Reader
  covers?: (value: string) => NameBand
  applies?: (variables: WeldingVariables, block: ProcessBlock) => boolean
  processes?: readonly ('GMAW' | 'GTAW' | 'PAW')[]
}

const same = (why: string) => (value: string): NameBand => ({ sure: [value], maybe: 'any', why })

const build = (row: Row): Rule =>
  nameBandRule({
    meta: meta(row.file, { title: row.title, clause: row.clause, statement: row.statement, ...(row.processes ? { processes: row.processes } : {}) }),
    field: row.field,
    at: row.at,
    label: row.label,
    applies: row.applies && ((context) => context.block !== null && row.applies?.(context.procedure, context.block) !== false),
    asked(context) {
      const value = context.block && row.read(context.procedure, context.block)
      return value ? [value] : null
    },
    tested(_context, side) {
      const value = side.block ? row.read(side.variables, side.block) : null
      return value === undefined ? undefined : value === null ? null : [value]
    },
    covers: (value) => (row.covers ?? same(`What a change of ${row.label} does is not held here.`))(value[0] ?? ''),
    because: 'As tested is covered.',
  })

const NUMBERS = ['131', '141', '15']

const numbered = build({ file: 'process', title: 'Welding process', clause: '8.4.1', field: 'process', at: 'block', label: 'ISO 4063 process', statement: 'Processes 131, 141 and 15, each by itself; the number follows from process, filler form and gas. Autogenous TIG (142) belongs to the edition of 2025, which is not held.', read: (_, block) => isoProcessNumber(block), covers: (value) => ({ sure: NUMBERS.includes(value) ? [value] : [], ...(value === '142' ? { maybe: ['142'], why: 'Process 142 belongs to the edition of 2025, which is not held here.' } : {}) }) })

/** Judged without coupons too: no coupon of another process covers it. */
export const process: Rule = {
  ...numbered,
  meta: { ...numbered.meta, withoutCoupon: true },
  check(context, sides) {
    const letters = context.block?.process
    if (!letters) return null
    if (sides.length > 0) {
      const tested = sides.flatMap((side) => numbered.range(context, side)?.tested ?? [])
      return numbered.check(context, sides, setRange(tested.map(String)))
    }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon with ${letters}`, requirement: `A coupon welded with ${letters}.` }
    const had = [...new Set(context.coupons.flatMap((coupon) => coupon.content.variables.processes.flatMap((block) => block.process ?? [])))]
    if (had.length === 0) return { verdict: 'cannot-tell', sentence: context.coupons.length === 0 ? 'No coupon is linked, so no coupon supports this process.' : 'The coupons do not record their process.', asked: [letters], range: null, missing: [`a coupon welded with ${letters}`], fixes: [plan] }
    return { verdict: 'outside', sentence: `${letters} is not covered: the coupons were welded with ${list(had)}.`, asked: [letters], range: setRange(had), tested: had, fixes: [plan] }
  },
}

const weldType = ({ joint }: WeldingVariables): string => (joint.weld === 'fillet' ? 'fillet weld' : joint.branch || joint.branchAngle ? 'branch connection' : joint.type === 'tee' ? 'T-joint butt weld' : joint.penetration === 'partial' ? 'partial penetration butt weld' : 'butt weld')
const sides = ({ joint }: WeldingVariables): string | null => {
  const both = joint.weldedFromBothSides ?? (joint.backing === 'weld-metal' || (joint.backGouging !== null && joint.backGouging !== 'none') ? true : joint.backing === null ? null : joint.backing === 'none' ? null : false)
  if (both === null) return null
  return both ? 'both sides' : joint.backing === null ? null : `one side, ${joint.backing === 'none' ? 'no backing' : `${joint.backing} backing`}`
}
const treatment = ({ pwht }: WeldingVariables): string | null => (pwht.condition === null ? null : pwht.condition === 'none' ? 'no heat treatment after welding' : pwht.condition.replaceAll('-', ' '))
const hardening = (variables: WeldingVariables): boolean => [variables.baseMetals.a, secondMember(variables)].some((metal) => [23, 24, 25, 26].includes(materialGroup(metal)?.main ?? 0))
const temper = (variables: WeldingVariables): string | null => {
  const both = [variables.baseMetals.a.condition, secondMember(variables).condition]
  return both.every(Boolean) ? both.map((text) => sameText(text ?? '')).sort().join(' and ') : null
}
const shielding = (gas: ProcessBlock['shieldingGas']): string | null => {
  const symbol = gasSymbol(gas)
  const name = gasName(gas)
  return symbol === null ? null : symbol.startsWith('I3') && name ? `${symbol} (${name})` : symbol
}
const pulsed = ({ process: letters, electrical }: ProcessBlock): boolean | null => (electrical.pulsed ?? (electrical.transferMode === null ? (letters === null ? false : null) : electrical.transferMode === 'pulsed-spray'))
const currentName = (block: ProcessBlock): string | null => {
  const { currentType } = block.electrical
  const pulse = pulsed(block)
  return currentType === null || pulse === null ? null : `${currentType === 'AC-balanced' ? 'AC' : currentType}${pulse ? ' pulsed' : ''}`
}

export const asTested: readonly Rule[] = [
  build({ file: 'joint-type', title: 'Type of joint and weld', clause: '8.4.3', field: 'joint.weld', at: 'weld', label: 'type of weld', statement: 'The same type of weld is covered; a fillet coupon proves no mechanical properties, so it covers no butt weld. What else a coupon covers must be looked up.', read: weldType, covers: (value) => (value === 'fillet weld' ? { sure: [value] } : same('Which other types of weld a coupon covers is not held here.')(value)) }),
  build({ file: 'backing-and-sides', title: 'Sides and backing', clause: '8.4.3', field: 'joint.backing', at: 'weld', label: 'sides and backing', statement: 'The same sides and backing are covered; a change must be looked up.', applies: ({ joint }) => joint.weld === 'groove', read: (variables) => (variables.joint.weld === 'fillet' ? undefined : sides(variables)) }),
  build({ file: 'run-count', title: 'Single or multiple runs', clause: '8.4.3', field: 'technique.passesPerSide', at: 'block', label: 'number of runs', statement: 'Single or multiple runs as tested are covered; a change must be looked up.', read: (_, { technique }) => technique.passesPerSide }),
  build({ file: 'mechanisation', title: 'Degree of mechanisation', clause: '8.4.1', field: 'mechanisation', at: 'block', label: 'degree of mechanisation', statement: 'The degree of mechanisation as tested is covered; a change must be looked up.', read: (_, { mechanisation }) => mechanisation }),
  build({ file: 'current-type', title: 'Type of current and polarity', clause: '8.4.6', field: 'electrical.currentType', at: 'block', label: 'current type and polarity', statement: 'Type, pulsing and polarity as tested are covered; a change must be looked up.', read: (_, block) => currentName(block) }),
  build({ file: 'transfer-mode', title: 'Transfer mode', clause: '8.5', field: 'electrical.transferMode', at: 'block', label: 'transfer mode', statement: 'The transfer mode as tested is covered; a change must be looked up.', processes: ['GMAW'], read: (_, { electrical }) => electrical.transferMode }),
  build({ file: 'wire-system', title: 'Wire system', clause: '8.5', field: 'technique.electrodes', at: 'block', label: 'wire system', statement: 'One wire or several as tested is covered; a change must be looked up.', processes: ['GMAW'], read: (_, { technique, mechanisation }) => technique.electrodes ?? (mechanisation === 'manual' || mechanisation === 'semiautomatic' ? 'single' : null) }),
  build({ file: 'shielding-gas', title: 'Shielding gas', clause: '8.5', field: 'shieldingGas', at: 'block', label: 'shielding gas', statement: 'The same symbol of ISO 14175 is covered, of argon and helium mixtures the same composition; a change, also of the helium share, must be looked up.', read: (_, { shieldingGas }) => shielding(shieldingGas) }),
  build({ file: 'backing-gas', title: 'Backing gas', clause: '8.5', field: 'backingGas', at: 'block', label: 'backing gas', statement: 'The backing gas as tested is covered; a change must be looked up.', processes: ['GTAW', 'PAW'], applies: ({ joint }) => joint.weld === 'groove', read: (_, { backingGas }) => (backingGas && isNoGas(backingGas) ? 'no backing gas' : gasSymbol(backingGas)) }),
  build({ file: 'plasma-gas', title: 'Plasma gas', clause: '8.5', field: 'plasmaGas', at: 'block', label: 'plasma gas', statement: 'The plasma gas as tested is covered; a change must be looked up.', processes: ['PAW'], read: (_, { plasmaGas }) => gasName(plasmaGas) }),
  build({ file: 'pwht', title: 'Heat treatment after welding', clause: '8.4.11', field: 'pwht.condition', at: 'weld', label: 'heat treatment after welding', statement: 'Heat treatment after welding may be neither added nor left out, and its kind stays.', read: treatment, covers: (value) => ({ sure: [value] }) }),
  build({ file: 'ageing', title: 'Ageing', clause: '8.4.11', field: 'pwht.ageing', at: 'weld', label: 'ageing', statement: 'Of heat-treatable alloys (groups 23 to 26) natural and artificial ageing after welding are different conditions, neither of which covers the other.', applies: hardening, read: ({ pwht }) => (pwht.ageing ? `${pwht.ageing} ageing` : null), covers: (value) => ({ sure: [value] }) }),
  build({ file: 'temper', title: 'Temper before welding', clause: '8.4.12', field: 'baseMetals.a.condition', at: 'weld', label: 'temper of the parent metal', statement: 'Of heat-treatable alloys the temper before welding as tested is covered; a change must be looked up.', applies: hardening, read: temper }),
]

/** Position: the tested ones are sure. */
export const position = nameBandRule({
  meta: meta('position', { title: 'Welding position', clause: '8.4.2', combine: 'jointly', statement: 'The positions tested are covered; which others they cover must be looked up.' }),
  field: 'positions',
  at: 'block',
  label: 'position',
  asked: (context) => context.block && isoPositions(context.procedure, context.block),
  tested: (_context, side) => side.block && isoPositions(side.variables, side.block),
  covers: (value) => ({ sure: value, maybe: 'any', why: 'Which other positions a coupon covers is not held here.' }),
  because: 'As tested is covered.',
  lacks: () => ['positions', 'progression'],
})
