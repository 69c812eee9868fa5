/** Table 5.1: electrode diameter, current and pass size; Tables 7.7 and 5.5: smallest fillet and partial-penetration weld. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import type { Pass, ProcessBlock } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, figures, isStated, tidy, unitOf, type Figures } from '../../common/reading.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { RuleContext, RuleVerdict } from '../../rule.ts'
import { classification, isLowHydrogen, nominalDiameters } from '../fillers.ts'
import { askedPlaces } from '../positions.ts'
import { lengthRange, testKind } from '../ranges.ts'
import { members } from '../steels.ts'
import type { Printed } from './joint-details.ts'
import { diameterLimit, feedOf, fillPassLimit, MINIMUM_FILLET, MINIMUM_PARTIAL, minimumSize, NO_ROW, plainPlaces, rootPassLimit, sawCurrent, singlePassFillet, type SawPass } from './limits.ts'
import { matchDetail } from './match-detail.ts'
import { lowHydrogenProcess } from './materials.ts'
import { condition, limitBasis } from './meta.ts'

const EPSILON = 1e-6
const says = (context: RuleContext, verdict: RuleVerdict['verdict'], sentence: string, more: Partial<RuleVerdict> = {}): RuleVerdict => ({ verdict, sentence, asked: null, range: null, basis: limitBasis(context), ...more })
const TABLE = 'Table 5.1 read in 2020; figures of other editions recalled'
const FOUR = { classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' } } as const

const noPosition = (context: RuleContext): RuleVerdict => {
  const field = `${context.path}.positions`
  return cannotTell('No position is stated, and the limit depends on it.', ['procedure: positions'], { field, fixes: [{ kind: 'state', label: 'State the positions', field }] })
}

/** Least of several printed figures in the judging system, with its place; null when none limits. */
function tightest<P extends string>(places: readonly P[], limit: (place: P) => Printed | null, system: 'SI' | 'US'): { value: number; place: P } | null {
  let found: { value: number; place: P } | null = null
  for (const place of places) {
    const printed = limit(place)
    if (printed && (!found || printed[system] < found.value)) found = { value: printed[system], place }
  }
  return found
}

interface Size { value: number; root: boolean | null; at: string }

/** Every diameter that is asked with whether it is for root passes: from the passes where they tell it, else from the block. */
function sizes(context: RuleContext, block: ProcessBlock): Size[] {
  const told = block.passes.flatMap((pass, i): Size[] => {
    const value = figureOrNull(pass.fillerDiameter, 'length', context.system)
    return value === null ? [] : [{ value, root: pass.layer === null ? null : pass.layer === 'root', at: `${context.path}.passes.${i}.fillerDiameter` }]
  })
  const own = nominalDiameters(block, context.system)
  // The block names every size; passes say which of them lays the root.
  const untold = own.map((value, i): Size => ({ value, root: told.length > 0 ? false : null, at: `${context.path}.filler.diameters.${i}` }))
  return told.length > 0 ? [...told, ...untold.filter(({ value }) => !told.some((size) => Math.abs(size.value - value) < EPSILON))] : untold
}

export const pqDiameter = condition({
  file: 'electrode-diameter', title: 'Largest electrode', clause: 'Table 5.1', basis: 'read', source: TABLE, field: 'filler.diameters', at: 'block', more: FOUR,
  statement: 'The electrode is not larger than the table allows for process, position, groove or fillet, and root pass. Submerged arc grooves in horizontal, vertical and overhead positions need a test.',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const field = `${context.path}.filler.diameters`
    const all = sizes(context, block)
    if (all.length === 0) return cannotTell('The electrode diameter is not stated.', ['procedure: filler.diameters'], { field, fixes: [{ kind: 'state', label: 'State the electrode diameters', field }] })
    const places = plainPlaces(askedPlaces(block.positions))
    if (places.length === 0) return noPosition(context)
    const { weld } = context.procedure.joint
    const lowHydrogen = isLowHydrogen(block.filler)
    const restricted = lowHydrogen !== false || /^E\d{2,3}14/.test(classification(block.filler) ?? '')
    const process = block.process ?? 'SMAW'
    const noRow = places.find((place) => diameterLimit(process, weld, place, false, restricted) === NO_ROW)
    if (noRow) return says(context, 'outside', `${process} ${weld} welds in ${noRow} position are not prequalified; they need a qualification test.`, { asked: [noRow], field: `${context.path}.positions`, fixes: [{ kind: 'plan-coupon', label: 'Qualify by test', requirement: `A qualification test in ${noRow} position.` }] })
    const limitFor = (root: boolean) => tightest(places, (place) => { const limit = diameterLimit(process, weld, place, root, restricted); return limit === NO_ROW ? null : limit }, system)
    const [fill, root] = [limitFor(false), limitFor(weld === 'groove')]
    if (!fill || !root) return null
    const top = Math.max(...all.map(({ value }) => value))
    const asked = { min: Math.min(...all.map(({ value }) => value)), max: top }
    const range = lengthRange(system, null, fill.value)
    const over = all.find((size) => size.value > (size.root === true ? root.value : fill.value) + EPSILON)
    if (over) {
      const limit = over.root === true ? root : fill
      return says(context, 'outside', `An electrode of ${show(over.value, unit)} is larger than the ${show(limit.value, unit)} allowed for ${over.root === true ? 'root passes' : `${weld} welds`} in ${limit.place} position.`, { asked, range: lengthRange(system, null, limit.value), field: over.at, fixes: [{ kind: 'set', label: `Set the electrode to ${show(limit.value, unit)}`, field: over.at, value: quantity(limit.value, 'length', unit) }] })
    }
    const unsure = all.find((size) => size.root === null && size.value > root.value + EPSILON)
    if (unsure && all.every((size) => size.root === null && size.value > root.value + EPSILON)) return says(context, 'outside', `Every electrode stated is larger than the ${show(root.value, unit)} allowed for root passes in ${root.place} position.`, { asked, range: lengthRange(system, null, root.value), field })
    if (unsure) return cannotTell(`Electrodes of ${show(unsure.value, unit)} may not lay root passes (at most ${show(root.value, unit)}); which size lays the root is not stated.`, ['procedure: electrode diameter of the root pass'], { field: `${context.path}.passes`, asked, range, fixes: [{ kind: 'state', label: 'State the passes with their electrode', field: `${context.path}.passes` }] })
    return says(context, 'within', `Electrodes up to ${show(top, unit)} are not larger than the ${show(fill.value, unit)} allowed.`, { asked, range })
  },
})

const passKind = (pass: Pick<Pass, 'layer'>, opening: Figures): SawPass | null => {
  if (pass.layer === 'cap') return 'cap'
  if (pass.layer === 'fillet') return 'fillet'
  if (pass.layer === 'fill' || pass.layer === 'hot' || pass.layer === 'backing') return 'fill'
  if (pass.layer !== 'root') return null
  const most = opening.max ?? opening.min
  return most === null ? null : most > 0 ? 'root with opening' : 'root without opening'
}

function sawCurrentVerdict(context: RuleContext, block: ProcessBlock): RuleVerdict {
  const feed = feedOf(block)
  const fieldOfFeed = `${context.path}.technique.electrodes`
  if (feed === null) return cannotTell('Whether one or several electrodes are used is not stated, and the limit of current depends on it.', ['procedure: technique.electrodes'], { field: fieldOfFeed, fixes: [{ kind: 'state', label: 'State the number of electrodes', field: fieldOfFeed }] })
  const opening = figures(context.procedure.joint.rootOpening, 'length', context.system)
  const fillet = context.procedure.joint.weld === 'fillet'
  const lines = block.passes.flatMap((pass, i) => { const { max, min } = figures(pass.current, 'current', context.system); const top = max ?? min; return top === null ? [] : [{ top, kind: fillet ? ('fillet' as const) : passKind(pass, opening), at: `${context.path}.passes.${i}.current` }] })
  const own = figures(block.electrical.current, 'current', context.system)
  const ownTop = own.fault ? null : (own.max ?? own.min)
  if (lines.length === 0 && ownTop !== null) lines.push({ top: ownTop, kind: fillet ? 'fillet' : null, at: `${context.path}.electrical.current` })
  if (lines.length === 0) return cannotTell('The current is not stated.', ['procedure: electrical.current'], { field: `${context.path}.electrical.current`, fixes: [{ kind: 'state', label: 'State the current', field: `${context.path}.electrical.current` }] })
  const asked = { min: 0, max: Math.max(...lines.map(({ top }) => top)) }
  // An unnamed groove pass is held to the strictest row; above that the layer must be known.
  const strict = Math.min(...(['root with opening', 'root without opening', 'fill'] as const).map((kind) => sawCurrent(kind, feed).sure))
  let unsure: string | null = null
  for (const { top, kind, at } of lines) {
    const limit = kind === null ? { sure: strict, maybe: Infinity } : sawCurrent(kind, feed)
    if (top <= limit.sure) continue
    if (top > limit.maybe) return says(context, 'outside', `${show(top, 'A')} is over the ${show(limit.sure, 'A')} allowed for the ${kind ?? ''}${kind === 'fillet' ? '' : ' pass'} with one electrode.`, { asked, range: between('current', 'A', UNLIMITED, closed(limit.sure)), field: at, fixes: [{ kind: 'set', label: `Set the current to ${show(limit.sure, 'A')}`, field: at.endsWith('.current') ? `${at}.max` : at, value: quantity(limit.sure, 'current', 'A') }] })
    unsure = kind === null ? `${show(top, 'A')} is over the ${show(limit.sure, 'A')} of the strictest pass; state the current of each pass with its layer.` : `${show(top, 'A')} is over the ${show(limit.sure, 'A')} allowed for parallel electrodes (${kind}); multiple electrodes with a power source each have no limit. Which it is, is not recorded.`
  }
  return unsure === null ? says(context, 'within', `${show(asked.max, 'A')} is not over the current allowed.`, { asked }) : cannotTell(unsure, ['procedure: passes with their layer, or how the electrodes are fed'], { asked, field: `${context.path}.passes` })
}

export const pqCurrent = condition({
  file: 'current', title: 'Largest current', clause: 'Table 5.1', basis: 'read', source: TABLE, field: 'electrical.current', at: 'block', more: FOUR,
  statement: 'SMAW, GMAW and FCAW stay within the range that the maker of the electrode recommends; submerged arc within the figures of the table for each pass.',
  check(context, block) {
    if (block.process === 'SAW') return sawCurrentVerdict(context, block)
    const field = `${context.path}.electrical.makerCurrent`
    const maker = figures(block.electrical.makerCurrent, 'current', context.system)
    const stated = [block.electrical.current, ...block.passes.map((pass) => pass.current)].filter((interval) => isStated(interval)).map((interval) => figures(interval, 'current', context.system))
    if (stated.length === 0 || stated.some(({ fault }) => fault)) return cannotTell('The current is not stated, or contradicts itself.', ['procedure: electrical.current'], { field: `${context.path}.electrical.current`, fixes: [{ kind: 'state', label: 'State the current', field: `${context.path}.electrical.current` }] })
    const asked = { min: Math.min(...stated.map(({ min, max, all }) => (all ? -Infinity : (min ?? max ?? 0)))), max: Math.max(...stated.map(({ min, max, all }) => (all ? Infinity : (max ?? min ?? 0)))) }
    const told = { min: Number.isFinite(asked.min) ? asked.min : null, max: Number.isFinite(asked.max) ? asked.max : null }
    if (maker.min === null || maker.max === null) return cannotTell('The current must stay in the range that the maker of the electrode recommends, which the procedure does not state.', ['procedure: electrical.makerCurrent'], { field, asked: told, fixes: [{ kind: 'state', label: "State the maker's range of current", field }] })
    const range = between('current', 'A', closed(maker.min), closed(maker.max))
    const inside = asked.min >= maker.min - EPSILON && asked.max <= maker.max + EPSILON
    const words = `${show(maker.min, 'A')} to ${show(maker.max, 'A')} that the maker recommends`
    return inside ? says(context, 'within', `The current lies inside the ${words}.`, { asked: told, range }) : says(context, 'outside', `The current goes beyond the ${words}.`, { asked: told, range, fixes: [{ kind: 'set', label: `Set the current to ${show(maker.min, 'A')} to ${show(maker.max, 'A')}`, field: `${context.path}.electrical.current`, value: { min: quantity(maker.min, 'current', 'A'), max: quantity(maker.max, 'current', 'A'), all: false } }] })
  },
})

export const pqPassThickness = condition({
  file: 'pass-thickness', title: 'Thickest root and fill pass', clause: 'Table 5.1', basis: 'read', source: TABLE, field: 'maxPassThickness', at: 'block', more: FOUR,
  statement: 'Root passes and fill passes of a groove are not thicker than the table allows for process and position.',
  applies: (context) => context.procedure.joint.weld === 'groove',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const field = `${context.path}.maxPassThickness`
    const had = figureOrNull(block.maxPassThickness, 'length', system)
    const process = block.process ?? 'SMAW'
    const places = plainPlaces(askedPlaces(block.positions))
    if (places.length === 0) return noPosition(context)
    const root = tightest(places, (place) => rootPassLimit(process, place), system)
    const fillPrinted = fillPassLimit(process, feedOf(block))
    const fill = fillPrinted ? fillPrinted[system] : Infinity
    const onlyRoot = block.passes.length > 0 && block.passes.every((pass) => pass.layer === 'root')
    const rootValue = root?.value ?? Infinity
    if (had === null || had < 0) return cannotTell('The thickest pass is not stated.', ['procedure: maxPassThickness'], { field, fixes: [{ kind: 'state', label: 'State the thickest pass', field }] })
    const asked = { min: 0, max: had }
    const most = Math.max(rootValue, onlyRoot ? 0 : fill)
    const limit = onlyRoot ? rootValue : Math.min(rootValue, fill)
    const range = lengthRange(system, null, limit === Infinity ? null : limit)
    if (had <= limit + EPSILON) return says(context, 'within', `Passes up to ${show(had, unit)} are not thicker than the table allows.`, { asked, range })
    const set = Number.isFinite(limit) ? [{ kind: 'set' as const, label: `Limit passes to ${show(limit, unit)}`, field, value: quantity(limit, 'length', unit) }] : []
    if (onlyRoot || had > most + EPSILON) return says(context, 'outside', `A pass of ${show(had, unit)} is thicker than the ${show(onlyRoot ? limit : most, unit)} allowed${onlyRoot && root ? ` for root passes in ${root.place} position` : ''}.`, { asked, range, fixes: set })
    return cannotTell(`Root passes may be ${rootValue === Infinity ? 'of any thickness' : `${show(rootValue, unit)} thick`}, fill passes ${fill === Infinity ? 'of any thickness' : show(fill, unit)}; which of them is ${show(had, unit)} is not stated.`, ['procedure: thickness of root and of fill passes'], { asked, range, field, fixes: set })
  },
})

export const pqSinglePassFillet = condition({
  file: 'single-pass-fillet', title: 'Largest single-pass fillet', clause: 'Table 5.1', basis: 'read', source: `${TABLE}; the limits for bare weathering steel (note f) are not kept here`, field: 'joint.filletLeg', at: 'weld', more: FOUR,
  statement: 'A fillet laid in one pass is not larger than the table allows for process and position.',
  applies: (context, block) => context.procedure.joint.weld === 'fillet' && block.technique.passesPerSide !== 'multiple',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const leg = figures(context.procedure.joint.filletLeg, 'length', system)
    const top = leg.fault ? null : leg.all ? Infinity : (leg.max ?? leg.min)
    if (top === null) return cannotTell('The fillet size is not stated.', ['procedure: joint.filletLeg'], { field: 'joint.filletLeg', fixes: [{ kind: 'state', label: 'State the fillet size', field: 'joint.filletLeg' }] })
    const places = plainPlaces(askedPlaces(block.positions))
    if (places.length === 0) return noPosition(context)
    const process = block.process ?? 'SMAW'
    const feed = feedOf(block)
    const sure = tightest(places, (place) => singlePassFillet(process, place, feed)?.sure ?? null, system)
    const maybe = tightest(places, (place) => singlePassFillet(process, place, feed)?.maybe ?? null, system)
    if (!sure || !maybe) return says(context, 'within', 'A single-pass fillet of any size is allowed here.', { range: lengthRange(system, null, null) })
    const asked = { min: leg.min, max: Number.isFinite(top) ? top : null }
    const range = lengthRange(system, null, sure.value)
    const shown = Number.isFinite(top) ? show(top, unit) : 'Every size'
    if (top <= sure.value + EPSILON) return says(context, 'within', `A fillet of ${shown} is not larger than the ${show(sure.value, unit)} allowed in one pass.`, { asked, range })
    const set = { kind: 'set' as const, label: `Limit the fillet to ${show(sure.value, unit)}`, field: 'joint.filletLeg.max', value: quantity(sure.value, 'length', unit) }
    const several = { kind: 'set' as const, label: 'Lay it in several passes', field: `${context.path}.technique.passesPerSide`, value: 'multiple' }
    if (block.technique.passesPerSide === null) return cannotTell(`${shown} is over the ${show(sure.value, unit)} allowed in one pass; whether one or several passes are laid is not stated.`, ['procedure: technique.passesPerSide'], { asked, range, field: `${context.path}.technique.passesPerSide`, fixes: [several, set] })
    if (top <= maybe.value + EPSILON) return cannotTell(`${shown} is over the ${show(sure.value, unit)} of single and parallel electrodes; only multiple electrodes reach ${show(maybe.value, unit)}.`, ['procedure: how the electrodes are fed'], { asked, range, fixes: [several, set] })
    return says(context, 'outside', `A fillet of ${shown} is larger than the ${show(sure.value, unit)} allowed in one pass in ${sure.place} position.`, { asked, range, fixes: [several, set] })
  },
})

/** Least thickness that decides: the thinner part for low-hydrogen processes, else the thicker one; from least and greatest asked. */
function deciding(context: RuleContext, lowHydrogen: boolean): { low: number; high: number; thinner: number } | null {
  const both = members(context.procedure, context.system).map(({ thickness }) => (thickness.fault ? null : { low: thickness.all ? 0 : (thickness.min ?? thickness.max), high: thickness.all ? Infinity : (thickness.max ?? thickness.min) }))
  const [a, b] = both
  if (!a || !b || a.low === null || a.high === null || b.low === null || b.high === null) return null
  const pick = lowHydrogen ? Math.min : Math.max
  return { low: pick(a.low, b.low), high: pick(a.high, b.high), thinner: Math.min(a.high, b.high) }
}

export interface MinimumFillet { T: number; leg: number }

/** Smallest fillet for the thickest metal asked, never more than the thinner part; null where no thickness is stated. */
export function minimumFillet(context: RuleContext, lowHydrogen: boolean): MinimumFillet | null {
  const T = deciding(context, lowHydrogen)
  return T && { T: T.high, leg: Math.min(minimumSize(MINIMUM_FILLET, T.high, context.system), T.thinner) }
}

export const pqMinimumFillet = condition({
  file: 'minimum-fillet', title: 'Smallest fillet', clause: 'Table 7.7', basis: 'secondary', source: 'Sizes as listed in a course text; notes from memory', field: 'joint.filletLeg', at: 'weld', more: FOUR,
  statement: 'A fillet is at least the size that the table gives for the thickness: of the thinner part with low-hydrogen processes, else of the thicker part and in a single pass; it need not be larger than the thinner part. Cyclically loaded: at least 5 mm (3/16 in.).',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const leg = figures(context.procedure.joint.filletLeg, 'length', system)
    const low = leg.fault || leg.all ? null : (leg.min ?? leg.max)
    const high = leg.fault ? null : leg.all ? Infinity : (leg.max ?? leg.min)
    const lowHydrogen = lowHydrogenProcess(block)
    if (lowHydrogen === null) return cannotTell("Whether the electrode is low-hydrogen can't be read from its classification, and the smallest fillet depends on it.", ['procedure: filler.classification'], { field: `${context.path}.filler.classification` })
    const least = minimumFillet(context, lowHydrogen)
    if (!least) return cannotTell('The thickness is not stated, and the smallest fillet depends on it.', ['procedure: thickness'], { field: 'thickness', fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] })
    if (high === null) return cannotTell('The fillet size is not stated.', ['procedure: joint.filletLeg'], { field: 'joint.filletLeg', fixes: [{ kind: 'state', label: 'State the fillet size', field: 'joint.filletLeg' }] })
    const basis = 'secondary' as const
    const range = lengthRange(system, least.leg, null)
    const asked = { min: low, max: Number.isFinite(high) ? high : null }
    const set = { kind: 'set' as const, label: `Set the smallest fillet to ${show(least.leg, unit)}`, field: 'joint.filletLeg.min', value: quantity(least.leg, 'length', unit) }
    const why = `${show(least.leg, unit)} for ${lowHydrogen ? 'the thinner' : 'the thicker'} part of ${least.T === Infinity ? 'unlimited thickness' : show(least.T, unit)}`
    if (high < least.leg - EPSILON) return says(context, 'outside', `A fillet of ${show(high, unit)} is smaller than ${why}.`, { asked, range, basis, fixes: [set] })
    if (!lowHydrogen && block.technique.passesPerSide === 'multiple') return cannotTell(`With an electrode that is not low-hydrogen the smallest fillet (${why}) must be laid in a single pass; the procedure lays several.`, ['procedure: that the smallest fillet is laid in one pass'], { asked, range, basis, field: `${context.path}.technique.passesPerSide` })
    if (low === null || low < least.leg - EPSILON) return cannotTell(`The thickest metal asked needs at least ${why}; smaller fillets are asked as well, and which metal they are for is not stated.`, ['procedure: fillet size for each thickness'], { asked, range, basis, fixes: [set] })
    return says(context, 'within', `A fillet of ${show(low, unit)} is at least ${why}.`, { asked, range, basis })
  },
})

export const pqMinimumPartial = condition({
  file: 'minimum-partial-penetration', title: 'Smallest partial-penetration weld', clause: 'Table 5.5', basis: 'memory', source: 'Table 5.5 as recalled; what each detail takes off the groove depth from an engineering manual', field: 'depositThickness', at: 'block', more: FOUR,
  statement: 'A partial-penetration weld is at least the size that the table gives for the thickness; in some details the weld is smaller than the groove is deep.',
  applies: (context) => testKind(context.procedure) === 'partial',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const field = `${context.path}.depositThickness`
    const depth = figures(block.depositThickness, 'length', system)
    const had = depth.fault || depth.all ? null : (depth.min ?? depth.max)
    const lowHydrogen = lowHydrogenProcess(block)
    const T = lowHydrogen === null ? null : deciding(context, lowHydrogen)
    if (lowHydrogen === null) return cannotTell("Whether the electrode is low-hydrogen can't be read from its classification, and the smallest weld depends on it.", ['procedure: filler.classification'], { field: `${context.path}.filler.classification` })
    if (!T) return cannotTell('The thickness is not stated, and the smallest weld depends on it.', ['procedure: thickness'], { field: 'thickness', fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] })
    if (had === null) return cannotTell('The groove depth is not stated as a figure.', ['procedure: depositThickness'], { field, fixes: [{ kind: 'state', label: 'State the groove depth', field }] })
    const least = Math.min(minimumSize(MINIMUM_PARTIAL, T.high, system), T.thinner)
    const range = lengthRange(system, least, null)
    const asked = { min: had, max: depth.max }
    const basis = 'memory' as const
    const { detail, fits } = matchDetail(context.procedure, block, system)
    const places = plainPlaces(askedPlaces(block.positions))
    const off = fits === 'yes' && detail?.loss ? Math.max(0, ...places.map((place) => detail.loss?.(place)[system] ?? 0)) : null
    const size = off === null ? null : tidy(Math.max(0, had - off))
    if (had < least - EPSILON || (size !== null && size < least - EPSILON)) return says(context, 'outside', `A weld of ${show(size ?? had, unit)} is smaller than the ${show(least, unit)} needed.`, { asked, range, basis, fixes: [{ kind: 'set', label: `Set the groove depth to ${show(least + (off ?? 0), unit)}`, field: `${field}.min`, value: quantity(tidy(least + (off ?? 0)), 'length', unit) }] })
    if (size === null) return cannotTell(`The groove is ${show(had, unit)} deep and ${show(least, unit)} of weld is needed; how much the detail takes off the depth is not known, because no detail kept here fits.`, ['a prequalified detail that the groove meets'], { asked, range, basis })
    return says(context, 'within', `A weld of ${show(size, unit)} is at least the ${show(least, unit)} needed${off ? ` (the detail takes ${show(off, unit)} off the groove depth)` : ''}.`, { asked, range, basis })
  },
})
