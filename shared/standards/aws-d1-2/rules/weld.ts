/** Kind of weld, position, gas, current, backing, progression, cleaning, layers, heat treatment and the highest temperature. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import { setRange } from '../../../ranges/set.ts'
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, gasName, sameText, unitOf } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { cannotTell, list, names, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { isHeatLimited, metals, readAlloy } from '../alloys.ts'
import { meta, TABLE } from '../meta.ts'
import { unconfirmedName } from '../unconfirmed.ts'

const kind = ({ joint }: WeldingVariables): string => (joint.weld === 'fillet' ? 'fillet' : joint.penetration === 'partial' ? 'partial-penetration groove' : 'complete-penetration groove')

export const weldKind: Rule = {
  meta: meta('weld-kind', 'Kind of weld', 'Clause 3', 'memory', 'Tables 3.4 and 3.5 could not be confirmed', 'A test covers its own kind of weld. What a groove test covers besides is not confirmed; a fillet test, which has no tension and bend specimens, covers no groove.'),
  field: 'joint.weld',
  at: 'weld',
  label: 'Kind of weld',
  range: (_context, side) => ({ range: setRange([kind(side.variables)], { unknown: side.variables.joint.weld === 'groove' }), tested: kind(side.variables), reason: `A ${kind(side.variables)} test covers itself.` }),
  check(context, sides, joined) {
    if (joined?.type !== 'set') return null
    const asked = kind(context.procedure)
    if (joined.values.includes(asked)) return { verdict: 'within', sentence: `${names(sides)} is a ${asked} test.`, asked: [asked], range: joined }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a ${asked} coupon`, requirement: `A ${asked} test.` }
    if (context.procedure.joint.weld === 'groove' && !joined.unknown) return { verdict: 'outside', sentence: `A ${asked} is not covered: ${names(sides)} is a fillet test without tension and bend specimens.`, asked: [asked], range: joined, basis: 'common-practice', fixes: [plan] }
    return cannotTell(`${names(sides)} is a ${list(joined.values)} test; whether it covers a ${asked} is not confirmed here.`, ['what the tables of Clause 3 give for this kind of weld'], { asked: [asked], range: joined, fixes: [plan] })
  },
}

const positions = unconfirmedName({
  meta: meta('position', 'Position', 'Table 3.3', 'memory', 'Position as a variable recalled; Table 3.3 could not be confirmed', 'Another position. What a test position covers besides itself is not confirmed, so another one is "cannot tell".'),
  field: 'positions',
  at: 'block',
  label: 'position',
  asked: (context) => (context.block && context.block.positions.length > 0 ? context.block.positions : null),
  tested: (_context, side) => (side.block && side.block.positions.length > 0 ? side.block.positions.join(' and ') : null),
  covers: (_value, _context, side) => side.block?.positions ?? [],
  because: 'A test position covers itself.',
})
export const position: Rule = positions

export const shieldingGas = namedRule({
  meta: meta('shielding-gas', 'Shielding gas', 'Table 3.1', 'memory', TABLE, 'Another shielding gas or mixture.', { classes: { GMAW: 'essential', GTAW: 'essential', PAW: 'essential' } }),
  field: 'shieldingGas',
  at: 'block',
  label: 'shielding gas',
  asked(context) {
    const name = context.block && gasName(context.block.shieldingGas)
    return name ? [name] : null
  },
  tested: (_context, side) => (side.block ? gasName(side.block.shieldingGas) : null),
  because: 'The gas must be that of the test.',
})

export const currentType = namedRule({
  meta: meta('current-type', 'Current type', 'Table 3.1', 'memory', TABLE, 'Another type of current or polarity.'),
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  asked: (context) => (context.block?.electrical.currentType ? [context.block.electrical.currentType] : null),
  tested: (_context, side) => side.block?.electrical.currentType ?? null,
  because: 'The current must be that of the test.',
  setValue: (name) => name,
})

const backingToken = ({ joint }: WeldingVariables): string | null => (joint.backing === null ? null : joint.backing === 'none' ? 'without backing' : 'with backing')

export const backing = namedRule({
  meta: meta('backing', 'Backing removed', 'Table 3.1', 'memory', TABLE, 'Backing left out that the test had.'),
  field: 'joint.backing',
  at: 'weld',
  label: 'use of backing',
  applies: (context) => context.procedure.joint.weld === 'groove',
  asked(context) {
    const value = backingToken(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.variables.joint.weld === 'fillet' ? undefined : backingToken(side.variables)),
  covers: (value) => (value === 'without backing' ? ['without backing', 'with backing'] : ['with backing']),
  because: 'Only leaving backing out counts.',
})

const isVertical = (block: ProcessBlock | null): boolean => (block?.positions ?? []).some((one) => ['3G', '3F', '5G', '5F', '6G', '6GR'].includes(one))
const directions = (block: ProcessBlock | null): string[] | null => (block?.progression === 'both' ? ['uphill', 'downhill'] : block?.progression ? [block.progression === 'up' ? 'uphill' : 'downhill'] : null)

export const progression = namedRule({
  meta: meta('vertical-progression', 'Vertical direction', 'Table 3.1', 'memory', TABLE, 'Vertical welding uphill instead of downhill, or back.'),
  field: 'progression',
  at: 'block',
  label: 'vertical direction',
  applies: (context) => isVertical(context.block),
  asked: (context) => directions(context.block),
  tested: (_context, side) => (isVertical(side.block) ? (directions(side.block)?.join(' and ') ?? null) : undefined),
  covers: (_value, _context, side) => directions(side.block) ?? [],
  because: 'Uphill and downhill are qualified apart.',
  setValue: (name) => (name === 'uphill' ? 'up' : 'down'),
})

const cleaningToken = (block: ProcessBlock | null): string | null => {
  if (!block) return null
  const { initialCleaning, interpassCleaning } = block.technique
  return initialCleaning === null || interpassCleaning === null ? null : `${sameText(initialCleaning)}, then ${sameText(interpassCleaning)}`
}

/** Cleaning is kept in words: other words may mean the same method. */
export const cleaning = unconfirmedName({
  meta: meta('cleaning', 'Cleaning method', 'Table 3.1', 'secondary', TABLE, 'Another method of cleaning before welding and between passes. It is kept in words, so other words are "cannot tell".'),
  field: 'technique.initialCleaning',
  at: 'block',
  label: 'cleaning method (first and between passes)',
  asked(context) {
    const value = cleaningToken(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => cleaningToken(side.block),
  because: 'The same method of cleaning.',
})

function layerToken(block: ProcessBlock | null, counted: number): string | null {
  if (!block) return null
  if (block.technique.passesPerSide === 'single') return 'single layer'
  if (counted > 0) return counted === 1 ? 'single layer' : `${counted} layers`
  return block.technique.passesPerSide === 'multiple' ? 'several layers' : null
}
const sheetRows = (content: { runSheet: readonly { processId: string }[] }, block: ProcessBlock | null): number => content.runSheet.filter((row) => row.processId === block?.id).length

export const layers = unconfirmedName({
  meta: meta('layers', 'Number of layers', 'Table 3.1', 'secondary', TABLE, 'Another number of layers. Which change of number counts is not confirmed, so any other number is "cannot tell".'),
  field: 'technique.passesPerSide',
  at: 'block',
  label: 'number of layers',
  asked(context) {
    const value = layerToken(context.block, context.block?.passes.length ?? 0)
    return value ? [value] : null
  },
  tested: (_context, side) => layerToken(side.block, side.block?.passes.length || sheetRows(side.coupon.content, side.block)),
  because: 'The same number of layers.',
})

export const pwht = namedRule({
  meta: meta('pwht', 'Postweld heat treatment', 'Table 3.1', 'secondary', TABLE, 'Heat treatment after welding added, left out or changed in kind.'),
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment after welding',
  asked: (context) => (context.procedure.pwht.condition ? [context.procedure.pwht.condition] : null),
  tested: (_context, side) => side.variables.pwht.condition,
  because: 'The same heat treatment after welding.',
  display: (name) => (name === 'none' ? 'no heat treatment' : name.replaceAll('-', ' ')),
  setValue: (name) => name,
})

const HOTTEST = { SI: 120, US: 250 } as const

export const highestTemperature: Rule = {
  meta: meta('highest-temperature', 'Highest preheat and interpass temperature', 'Clause 4', 'secondary', 'Interpass figure from a secondary source; preheat figure and the 15 minutes from memory', 'Heat-treatable alloys and 5xxx of more than 3 % magnesium: preheat and interpass temperature at most 120 °C (250 °F), held at most 15 minutes at that heat.', { withoutCoupon: true }),
  field: 'preheat.interpassMaximum',
  at: 'weld',
  label: 'Highest preheat and interpass temperature',
  range: () => null,
  check(context) {
    const { procedure, system } = context
    const limited = metals(procedure).map(isHeatLimited)
    const unit = unitOf('temperature', system)
    const most = HOTTEST[system]
    const range = between('temperature', unit, UNLIMITED, closed(most))
    const field = 'preheat.interpassMaximum'
    if (!limited.includes(true)) {
      if (limited.includes(null)) return cannotTell("The alloy isn't named, so whether its temperature is limited can't be told.", ['procedure: baseMetals.a.grade'], { field: 'baseMetals.a.grade', fixes: [{ kind: 'state', label: 'State the alloy', field: 'baseMetals.a.grade' }] })
      return { verdict: 'within', sentence: `${list([...new Set(metals(procedure).map((metal) => readAlloy(metal)?.alloy ?? ''))])} has no such limit.`, asked: null, range: null }
    }
    const interpass = figureOrNull(procedure.preheat.interpassMaximum, 'temperature', system)
    const minimum = figureOrNull(procedure.preheat.minimum, 'temperature', system)
    const set = { kind: 'set' as const, label: `Set the highest interpass temperature to ${show(most, unit)}`, field, value: quantity(most, 'temperature', unit) }
    if (minimum !== null && minimum > most) return { verdict: 'outside', sentence: `Preheat of ${show(minimum, unit)} is over the ${show(most, unit)} that these alloys take.`, asked: { min: minimum, max: minimum }, range, field: 'preheat.minimum', basis: 'memory', fixes: [{ ...set, label: `Set the preheat to ${show(most, unit)}`, field: 'preheat.minimum' }] }
    if (interpass === null) return cannotTell(`The highest interpass temperature isn't stated; these alloys take ${show(most, unit)} at most.`, [`procedure: ${field}`], { field, range, fixes: [set] })
    const asked = { min: interpass, max: interpass }
    return interpass > most ? { verdict: 'outside', sentence: `Interpass temperature of ${show(interpass, unit)} is over the ${show(most, unit)} that these alloys take.`, asked, range, fixes: [set] } : { verdict: 'within', sentence: `Interpass temperature of ${show(interpass, unit)} is not over the ${show(most, unit)} that these alloys take.`, asked, range }
  },
}
