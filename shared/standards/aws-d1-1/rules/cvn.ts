/** Table 6.7: what counts besides Table 6.5 when CVN toughness is specified. It adds to Table 6.5 and never loosens it. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figureOrNull, figures, sameText, tidy, unitOf } from '../../common/reading.ts'
import { figureRule, namedRule } from '../../common/rule-kinds.ts'
import { cannotTell, names, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { classification } from '../fillers.ts'
import { meta } from '../meta.ts'
import { askedPlaces } from '../positions.ts'
import { couponThickness, lengthRange, unknownLength } from '../ranges.ts'
import { groupsOf, identity, members } from '../steels.ts'

/** Group of each member, in one name whichever way round; the steel itself where it has no group. Null where neither is known. */
function groupPair(variables: WeldingVariables, system: UnitSystem): string | null {
  const told = members(variables, system).map(({ metal, thickness }) => {
    const groups = groupsOf(metal, thickness, system)
    return groups ? `Group ${groups.map((group) => (group === 'PQR' ? `of ${identity(metal) ?? 'PQR'}` : group)).join(' and ')}` : identity(metal)
  })
  return told.some((one) => one === null) ? null : told.sort().join(' to ')
}

export const cvnBaseGroup = namedRule({
  meta: meta('cvn_base_group'),
  field: 'baseMetals.a.d11Group',
  at: 'weld',
  label: 'base metal group',
  asked(context) {
    const pair = groupPair(context.procedure, context.system)
    return pair ? [pair] : null
  },
  tested: (context, side) => groupPair(side.variables, context.system),
  because: 'With CVN any other base metal group counts.',
})

/** Printed pairs: the floor, the thickness below which it falls to the least, and that least. */
const FLOOR = { SI: { floor: 16, thin: 6, least: 3 }, US: { floor: 5 / 8, thin: 1 / 4, least: 1 / 8 } } as const

export const cvnThickness = figureRule({
  meta: meta('cvn_min_thickness', { combine: 'union' }),
  field: 'thickness',
  at: 'weld',
  label: 'least thickness with CVN',
  dimension: 'length',
  asked(context) {
    const all = [context.procedure.thickness, context.procedure.thicknessB].flatMap((interval) => (interval ? [figures(interval, 'length', context.system)] : []))
    if (all.some(({ fault }) => fault)) return 'fault'
    if (all.some((one) => one.all)) return { min: 0, max: null }
    const lows = all.flatMap(({ min, max }) => min ?? max ?? [])
    return lows.length > 0 ? { min: Math.min(...lows), max: Math.min(...lows) } : null
  },
  range(context, side) {
    const { system } = context
    const T = couponThickness(side.variables, system)
    if (T === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no thickness recorded.`, missing: [`${side.coupon.number}: thickness`] }
    const { floor, thin, least } = FLOOR[system]
    const low = T < thin ? least : Math.min(T, floor)
    return { range: lengthRange(system, low, null), tested: T, reason: `A test of ${show(T, unitOf('length', system))} gives ${show(low, unitOf('length', system))} as the least thickness with CVN.` }
  },
})

export const cvnFillerClass = namedRule({
  meta: meta('cvn_filler_class'),
  field: 'filler.classification',
  at: 'block',
  label: 'filler classification',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = context.block && classification(context.block.filler)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : side.block ? classification(side.block.filler) : null),
  because: 'With CVN any other classification counts, and an unclassified filler is only itself.',
})

/** Classification with the flux's trade name where it has no class; crushed slag is a flux of its own. */
function fluxToken(block: ProcessBlock | null): string | null {
  if (!block) return null
  const { fluxClassification, fluxTradeName, fluxIsRecrushedSlag } = block.filler
  if (fluxIsRecrushedSlag === null) return null
  const name = fluxClassification ?? fluxTradeName
  return name ? `${sameText(name)}${fluxIsRecrushedSlag ? ' from crushed slag' : ''}` : null
}

export const cvnFlux = namedRule({
  meta: meta('cvn_flux'),
  field: 'filler.fluxClassification',
  at: 'block',
  label: 'flux (class or trade name, crushed slag or not)',
  asked(context) {
    const value = fluxToken(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => fluxToken(side.block),
  because: 'With CVN another flux-wire class, another trade name of an unclassified flux, and crushed slag count.',
})

export const cvnBrand = namedRule({
  meta: meta('cvn_brand'),
  field: 'filler.tradeName',
  at: 'block',
  label: 'trade name of the electrode',
  asked: (context) => (context.block?.filler.tradeName ? [sameText(context.block.filler.tradeName)] : null),
  tested: (_context, side) => (side.block?.filler.tradeName ? sameText(side.block.filler.tradeName) : null),
  because: 'With CVN another maker, brand or type counts for flux-cored electrodes.',
})

const UP = 'vertical up'
const OTHER = 'other than vertical up'

function upToken(block: ProcessBlock | null): string | null {
  if (!block || block.positions.length === 0) return null
  if (!askedPlaces(block.positions).some((place) => place === 'vertical' || place === '5F') || block.progression === 'down') return OTHER
  return block.progression === null ? null : UP
}

export const cvnVerticalUp = namedRule({
  meta: meta('cvn_vertical_up'),
  field: 'positions',
  at: 'block',
  label: 'position and direction with CVN',
  asked(context) {
    const value = upToken(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => upToken(side.block),
  covers: (value) => (value === UP ? [UP, OTHER] : [OTHER]),
  because: 'A vertical-up test covers the toughness of every position; no other position covers vertical up.',
})

const STEP = { SI: 56, US: 100 } as const

export const cvnInterpass = figureRule({
  meta: meta('cvn_max_interpass'),
  field: 'preheat.interpassMaximum',
  at: 'weld',
  label: 'maximum interpass temperature',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked(context) {
    const maximum = figureOrNull(context.procedure.preheat.interpassMaximum, 'temperature', context.system)
    return maximum === null ? null : { min: maximum, max: maximum }
  },
  range(context, side) {
    const { system } = context
    const unit = unitOf('temperature', system)
    const had = figureOrNull(side.variables.preheat.interpassMaximum, 'temperature', system)
    if (had === null) return { range: unknownNumeric('temperature', unit), tested: null, reason: `${side.coupon.number} has no interpass temperature recorded.`, missing: [`${side.coupon.number}: preheat.interpassMaximum`] }
    return { range: between('temperature', unit, UNLIMITED, closed(tidy(had + STEP[system]))), tested: had, reason: `${show(had, unit)} may rise by ${STEP[system]}.` }
  },
})

/** Of the total time in production at least this share must have been on the test. */
const SHARE = 0.8

const time = figureRule({
  meta: meta('cvn_pwht'),
  field: 'pwht.time',
  at: 'weld',
  label: 'time of heat treatment',
  dimension: 'time',
  asked(context) {
    const { min, max, fault } = figures(context.procedure.pwht.time, 'time', context.system)
    const high = max ?? min
    return fault ? 'fault' : high === null ? null : { min: high, max: high }
  },
  range(context, side) {
    const unit = unitOf('time', context.system)
    const treated = side.variables.pwht.condition
    if (treated === 'none') return null
    const { min, max } = figures(side.variables.pwht.time, 'time', context.system)
    const had = min ?? max
    if (had === null) return { range: unknownNumeric('time', unit), tested: null, reason: `${side.coupon.number} does not record the time of its heat treatment.`, missing: [`${side.coupon.number}: pwht.time`] }
    const most = tidy(had / SHARE)
    return { range: between('time', unit, UNLIMITED, closed(most)), tested: had, reason: `${show(had, unit)} on the test is 80 % of ${show(most, unit)}.` }
  },
})

export const cvnPwht: Rule = {
  ...time,
  applies: (context) => context.procedure.pwht.condition !== null && context.procedure.pwht.condition !== 'none',
  check(context, sides, joined) {
    const { condition } = context.procedure.pwht
    if (condition === null || condition === 'none') return null
    const judged = time.check(context, sides, joined)
    if (judged?.verdict !== 'within') return judged
    const asked = figures(context.procedure.pwht.temperature, 'temperature', context.system)
    const unit = unitOf('temperature', context.system)
    for (const side of sides) {
      const had = figures(side.variables.pwht.temperature, 'temperature', context.system)
      const [low, high, from, to] = [asked.min ?? asked.max, asked.max ?? asked.min, had.min ?? had.max, had.max ?? had.min]
      if (low === null || high === null || from === null || to === null) return cannotTell('The heat treatment temperature isn\'t recorded on both sides, so a change can\'t be told.', [...(low === null ? ['procedure: pwht.temperature'] : []), ...(from === null ? [`${side.coupon.number}: pwht.temperature`] : [])], { field: 'pwht.temperature', range: joined })
      if (from < low || to > high) return { ...judged, verdict: 'outside', field: 'pwht.temperature', sentence: `${names([side])} was treated at ${show(from, unit)}${from === to ? '' : ` to ${show(to, unit)}`}, outside the ${show(low, unit)} to ${show(high, unit)} of the procedure.` }
    }
    return judged
  },
}

const isStringer = (block: ProcessBlock | null): string | null => (block?.technique.bead === 'stringer' ? 'stringer beads' : block?.technique.bead ? 'weave beads' : null)

export const cvnWeave = namedRule({
  meta: meta('cvn_vertical_weave'),
  field: 'technique.bead',
  at: 'block',
  label: 'bead in vertical welding',
  applies: (context) => askedPlaces(context.block?.positions ?? []).includes('vertical'),
  asked(context) {
    const value = isStringer(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => isStringer(side.block),
  covers: (value) => (value === 'weave beads' ? ['weave beads', 'stringer beads'] : ['stringer beads']),
  because: 'With CVN a change from stringer to weave counts in vertical welding.',
  setValue: (name) => (name === 'stringer beads' ? 'stringer' : 'weave'),
})

export const cvnPasses = namedRule({
  meta: meta('cvn_multi_to_single'),
  field: 'technique.passesPerSide',
  at: 'block',
  label: 'passes per side',
  asked: (context) => (context.block?.technique.passesPerSide ? [context.block.technique.passesPerSide] : null),
  tested: (_context, side) => side.block?.technique.passesPerSide ?? null,
  covers: (value) => (value === 'single' ? ['single', 'multiple'] : ['multiple']),
  because: 'With CVN a change from several passes to a single pass per side counts.',
  setValue: (name) => name,
})

const swings = (block: ProcessBlock | null): boolean => block?.mechanisation === 'machine' || block?.mechanisation === 'automatic'

/** Oscillation is kept as text, so only equal words can be told to be within 20 %. */
const oscillation = namedRule({
  meta: meta('cvn_oscillation'),
  field: 'technique.oscillation',
  at: 'block',
  label: 'machine oscillation',
  applies: (context) => swings(context.block),
  asked: (context) => (context.block?.technique.oscillation ? [sameText(context.block.technique.oscillation)] : null),
  tested: (_context, side) => (side.block?.technique.oscillation ? sameText(side.block.technique.oscillation) : null),
  because: 'With CVN machine oscillation may change by 20 %.',
})

export const cvnOscillation: Rule = {
  ...oscillation,
  check(context, sides, joined) {
    const judged = oscillation.check(context, sides, joined)
    if (judged?.verdict !== 'outside') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `Machine oscillation is written otherwise than on ${names(sides)}; whether it differs by more than 20 % must be judged by a person.`, missing: ['oscillation in figures on both sides'], fixes: [] }
  },
}
