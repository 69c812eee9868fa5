/** Table 6.7: heat input may not rise above that of the test. V × A × 60 / travel speed, without an arc efficiency factor. */
import { heatInputMeter } from '../../../calculations/heat-input.ts'
import { between, closed, numericRange, UNKNOWN, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { Electrical, ProcessBlock } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, inUnitOf, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

interface Spread { sure: number; most: number }

const shown = (kJmm: number, system: UnitSystem): number => tidy(inUnitOf(kJmm, 'heatInput', system))

/** From readings that may be spread: at their middle, and at the hottest corner. */
function fromReadings(voltage: Interval | null, current: Interval | null, travelSpeed: Interval | null, system: UnitSystem): Spread | null {
  const [V, A, v] = [figures(voltage, 'voltage', 'SI'), figures(current, 'current', 'SI'), figures(travelSpeed, 'travelSpeed', 'SI')]
  const [vLow, vHigh, aLow, aHigh, sLow, sHigh] = [V.min ?? V.max, V.max ?? V.min, A.min ?? A.max, A.max ?? A.min, v.min ?? v.max, v.max ?? v.min]
  if (vLow === null || vHigh === null || aLow === null || aHigh === null || sLow === null || sHigh === null || sLow <= 0) return null
  return {
    sure: shown(heatInputMeter({ voltage: (vLow + vHigh) / 2, current: (aLow + aHigh) / 2, travelSpeed: (sLow + sHigh) / 2 }), system),
    most: shown(heatInputMeter({ voltage: vHigh, current: aHigh, travelSpeed: sLow }), system),
  }
}

function stated(electrical: Electrical, system: UnitSystem): number | null {
  const { min, max, fault } = figures(electrical.heatInput, 'heatInput', system)
  return fault ? null : (max ?? min)
}

/** The hottest corner of the block and of every pass; what a pass leaves out it takes from the block. Null where one of them gives none. */
function hottest({ electrical, passes }: ProcessBlock, system: UnitSystem): number | null {
  const own = fromBlock(electrical, system)
  const each = passes.map((pass) => fromReadings(pass.voltage ?? electrical.voltage, pass.current ?? electrical.current, pass.travelSpeed ?? electrical.travelSpeed, system))
  const all = own ? [own, ...each] : each
  const told = all.filter((one) => one !== null)
  return told.length === 0 || told.length < all.length ? null : Math.max(...told.map(({ most }) => most))
}

const fromBlock = (electrical: Electrical, system: UnitSystem): Spread | null => fromReadings(electrical.voltage, electrical.current, electrical.travelSpeed, system)

/** As recorded, else the largest of the run sheet, else from the block's readings. */
function tested(side: CouponSide, system: UnitSystem): Spread | null {
  if (!side.block) return null
  const { electrical, id } = side.block
  const own = stated(electrical, system)
  if (own !== null) return { sure: own, most: own }
  const rows = side.coupon.content.runSheet.flatMap((row) => (row.processId === id ? (fromReadings(row.voltage, row.current, row.travelSpeed, system) ?? []) : []))
  if (rows.length > 0) return { sure: Math.max(...rows.map(({ sure }) => sure)), most: Math.max(...rows.map(({ most }) => most)) }
  return fromBlock(electrical, system)
}

/** A heat treatment that refines the grain lifts the limit. */
const refines = (condition: string | null): boolean => condition === 'above-upper-transformation' || condition === 'above-upper-then-below-lower'

const base = figureRule({
  meta: meta('cvn_heat_input'),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    if (!context.block) return null
    if (figures(context.block.electrical.heatInput, 'heatInput', context.system).fault) return 'fault'
    const own = stated(context.block.electrical, context.system) ?? hottest(context.block, context.system)
    return own === null ? null : { min: 0, max: own }
  },
  range(context, side) {
    const unit = unitOf('heatInput', context.system)
    if (refines(side.variables.pwht.condition) && (context.procedure === null || refines(context.procedure.pwht.condition))) return { range: between('heatInput', unit, UNLIMITED, UNLIMITED), tested: null, reason: 'A grain-refining heat treatment after welding lifts the limit.' }
    const had = tested(side, context.system)
    if (!had) return { range: unknownNumeric('heatInput', unit), tested: null, reason: `${side.coupon.number} does not give its heat input.`, missing: [`${side.coupon.number}: electrical.heatInput`] }
    const sure = { lower: UNLIMITED, upper: closed(had.sure) }
    if (had.most <= had.sure) return { range: numericRange('heatInput', unit, [sure]), tested: had.sure, reason: `${show(had.sure, unit)} is the most.` }
    return { range: numericRange('heatInput', unit, [sure, { lower: UNLIMITED, upper: UNKNOWN }]), tested: had.sure, reason: `The readings are spread: ${show(had.sure, unit)} was surely reached, ${show(had.most, unit)} is the most that they allow.`, missing: [`${side.coupon.number}: electrical.heatInput`] }
  },
})

export const cvnHeatInput: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (!judged || !context.block || joined?.type !== 'numeric') return judged
    if (judged.field !== undefined && judged.asked === null) {
      return cannotTell("The procedure's highest heat input can't be told: neither a cap nor voltage, amperage and travel speed are stated.", ['procedure: electrical.heatInput'], { field: judged.field, range: joined, fixes: [{ kind: 'state', label: 'State a heat input cap', field: judged.field }] })
    }
    const most = sides.map((side) => tested(side, context.system)?.most ?? Infinity)
    const asked = judged.asked && !Array.isArray(judged.asked) && 'max' in judged.asked ? judged.asked.max : null
    if (judged.verdict === 'cannot-tell' && asked !== null && asked > Math.max(...most)) return base.check(context, sides, between('heatInput', unitOf('heatInput', context.system), UNLIMITED, closed(Math.max(...most))))
    return judged
  },
}
