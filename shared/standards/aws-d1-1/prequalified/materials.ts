/** Process, power source, base metal, matching filler, preheat, gas: what a prequalified procedure may be made of. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, isNoGas, unitOf } from '../../common/reading.ts'
import { cannotTell, list, show } from '../../common/wording.ts'
import type { RuleContext, RuleVerdict } from '../../rule.ts'
import { classification, hydrogenLimit, isLowHydrogen, strengthClass } from '../fillers.ts'
import { groupBasis, groupsOf, identity, members, preheatCategory, type Group } from '../steels.ts'
import { minimumPreheat } from './limits.ts'
import { condition } from './meta.ts'

const says = (verdict: RuleVerdict['verdict'], sentence: string, more: Partial<RuleVerdict> = {}): RuleVerdict => ({ verdict, sentence, asked: null, range: null, ...more })
const byTest = { kind: 'plan-coupon' as const, label: 'Qualify by test', requirement: 'A qualification test (PQR), with the procedure judged by the route by test.' }

export const pqProcess = condition({
  file: 'process', title: 'Prequalified process', clause: 'Clause 5', basis: 'read', field: 'process', at: 'block',
  source: '3.2.1 and 3.2.2 read in 2000; footnote c of Table 5.1 read in 2020',
  statement: 'SMAW, SAW, FCAW and GMAW (not short-circuiting) may be prequalified; GTAW, short-circuiting GMAW and every other process need a test.',
  check(context, block) {
    const { process } = block
    if (process === 'GTAW') return says('outside', 'GTAW is never prequalified; it needs a qualification test.', { asked: ['GTAW'], fixes: [byTest] })
    if (process !== 'GMAW') return says('within', `${process ?? ''} may be prequalified.`, { asked: process ? [process] : null })
    const { transferMode } = block.electrical
    const field = `${context.path}.electrical.transferMode`
    if (transferMode === null) return cannotTell('GMAW may be prequalified with spray, pulsed spray or globular transfer, not with short-circuiting; the transfer mode is not stated.', ['procedure: electrical.transferMode'], { field, fixes: [{ kind: 'state', label: 'State the transfer mode', field }] })
    if (transferMode === 'short-circuiting') return says('outside', 'Short-circuiting GMAW is never prequalified; it needs a qualification test.', { asked: [transferMode], field, fixes: [{ kind: 'set', label: 'Set the transfer mode to spray', field, value: 'spray' }, byTest] })
    return says('within', `GMAW with ${transferMode.replace('-', ' ')} transfer may be prequalified.`, { asked: [transferMode] })
  },
})

export const pqPowerSource = condition({
  file: 'power-source', title: 'Constant-voltage power source', clause: 'Clause 5', basis: 'memory', field: 'electrical.powerSource', at: 'block',
  source: 'Clause 5 as recalled',
  statement: 'Prequalified GMAW and FCAW need a constant-voltage power source.',
  more: { classes: { GMAW: 'essential', FCAW: 'essential' } },
  check(context, block) {
    const field = `${context.path}.electrical.powerSource`
    const { powerSource } = block.electrical
    if (powerSource === null) return cannotTell('The output of the power source is not stated; prequalified work needs constant voltage.', ['procedure: electrical.powerSource'], { field, fixes: [{ kind: 'state', label: 'State the output of the power source', field }] })
    if (powerSource === 'constant-current') return says('outside', 'A constant-current power source is not prequalified for this process.', { asked: ['constant current'], fixes: [{ kind: 'set', label: 'Set the power source to constant voltage', field, value: 'constant-voltage' }, byTest] })
    return says('within', 'The power source is constant voltage.', { asked: ['constant voltage'] })
  },
})

interface Read { groups: readonly Group[] | null; name: string | null; field: string }

const readMetals = (context: RuleContext): Read[] =>
  members(context.procedure, context.system).map(({ metal, thickness }, i) => ({ groups: groupsOf(metal, thickness, context.system), name: identity(metal), field: `baseMetals.${i === 0 ? 'a' : 'b'}.specification` }))

/** Names a metal that gives no group; null when both give one. */
function unread(metals: readonly Read[], what: string): RuleVerdict | null {
  const first = metals.find(({ groups }) => groups === null)
  if (!first) return null
  const sentence = first.name === null ? `The base metal isn't named, so ${what} can't be told.` : `${first.name} is not in the list of steels kept here; only a listed steel is prequalified, so look it up in your edition.`
  return cannotTell(sentence, [`procedure: ${first.field}`], { field: first.field, fixes: [{ kind: 'state', label: 'State the base metal or its D1.1 group', field: first.field }] })
}

export const pqBaseMetal = condition({
  file: 'base-metal', title: 'Prequalified base metal', clause: 'Table 5.3', basis: 'memory', field: 'baseMetals.a.specification', at: 'weld',
  source: 'Group I of Table 3.1 read in 2015; Groups II to IV and Table 6.9 from memory',
  statement: 'Both base metals stand in Group I to IV of Table 5.3. An unlisted steel is not prequalified; steels of Table 6.9 always need a test.',
  check(context) {
    const metals = readMetals(context)
    const missing = unread(metals, 'whether it is prequalified')
    if (missing) return missing
    const groups = metals.flatMap((metal) => metal.groups ?? [])
    const asked = metals.map(({ name, groups: own }) => `${name ?? 'steel'} (Group ${list(own ?? [])})`)
    const tested = metals.filter((metal) => metal.groups?.includes('PQR'))
    if (tested.length > 0) return says('outside', `${list(tested.map(({ name }) => name ?? 'The steel'))} always needs a qualification test (Table 6.9).`, { asked: tested.map(({ name }) => name ?? 'steel'), fixes: [byTest] })
    return says('within', `${list([...new Set(asked)])} ${new Set(asked).size > 1 ? 'are' : 'is'} prequalified base metal.`, { asked: [...new Set(asked)], basis: groups.every((group) => groupBasis(group) === 'read') ? 'read' : 'memory' })
  },
})

const STRENGTH: Record<Exclude<Group, 'PQR'>, readonly number[]> = { I: [60, 70], II: [70], III: [80], IV: [90] }
const ORDER: readonly Group[] = ['I', 'II', 'III', 'IV']
/** Low-hydrogen electrodes that the table names for Group II. */
const GROUP_II_SMAW = /^E70(15|16|18|28)/
const SINGLE_PASS_ONLY = /T\d*-?(2|3|10|13|14|GS)(?![0-9])/

/** Classes that match a group, in words. */
const wanted = (group: Exclude<Group, 'PQR'>, process: ProcessBlock['process']): string => {
  const classes = STRENGTH[group].map((ksi) => (process === 'SMAW' ? `E${ksi}XX` : process === 'SAW' ? `F${ksi / 10}XX` : process === 'FCAW' ? `E${ksi / 10}XT` : `ER${ksi}S or E${ksi}C`))
  return `${process === 'SMAW' && group !== 'I' ? 'low-hydrogen ' : ''}${list(classes, 'or')}`
}

export const pqFiller = condition({
  file: 'filler', title: 'Matching filler metal', clause: 'Table 5.4', basis: 'memory', field: 'filler.classification', at: 'block',
  source: 'Table 5.4 as recalled',
  statement: 'The filler metal matches the group of the base metal (of the weaker one where two are joined), low-hydrogen from Group II on for SMAW; single-pass-only FCAW classes are out.',
  more: { classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' } },
  check(context, block) {
    const metals = readMetals(context)
    const missing = unread(metals, 'which filler matches')
    if (missing) return missing
    const field = `${context.path}.filler.classification`
    const name = classification(block.filler)
    const ksi = strengthClass(block.process, block.filler)
    if (ksi === null) return cannotTell(name === null ? 'The classification of the filler is not stated.' : `The strength of ${name} can't be read from its classification.`, ['procedure: filler.classification'], { field, fixes: [{ kind: 'state', label: 'State the filler classification', field }] })
    const shown = block.process === 'SAW' ? (block.filler.fluxClassification ?? name ?? '') : (name ?? '')
    const perMetal = metals.map(({ groups }) => (groups ?? []).filter((group): group is Exclude<Group, 'PQR'> => group !== 'PQR'))
    if (perMetal.some((groups) => groups.length === 0)) return cannotTell('A base metal that always needs a test has no matching filler here.', ['a prequalified base metal'], { asked: [shown] })
    // Where one metal stands in two groups over the thickness asked, the higher one decides for it.
    const tops = perMetal.map((groups) => groups.reduce((a, b) => (ORDER.indexOf(a) >= ORDER.indexOf(b) ? a : b)))
    const [low, high] = [...tops].sort((a, b) => ORDER.indexOf(a) - ORDER.indexOf(b))
    if (!low || !high) return null
    const strengths = [...new Set([...STRENGTH[low], ...STRENGTH[high]])]
    const need = low === high ? `Group ${low} needs ${wanted(low, block.process)}` : `Group ${low} to Group ${high} needs a filler that matches either, ${wanted(low, block.process)} or ${wanted(high, block.process)}`
    const outside = (why: string): RuleVerdict => says('outside', `${shown} does not match: ${why}.`, { asked: [shown], fixes: [byTest] })
    if (block.process === 'FCAW' && SINGLE_PASS_ONLY.test(name ?? '')) return outside('it is a single-pass-only class')
    if (!strengths.includes(ksi)) return outside(need)
    if (block.process === 'SMAW' && high !== 'I') {
      const lowHydrogen = isLowHydrogen(block.filler)
      if (lowHydrogen === false || (high === 'II' && ksi === 70 && !GROUP_II_SMAW.test(name ?? ''))) return outside(`Group ${high} needs a low-hydrogen electrode (${wanted(high, 'SMAW')})`)
    }
    return says('within', `${shown} matches Group ${low === high ? low : `${low} to ${high}`}.`, { asked: [shown] })
  },
})

/** Every process but SMAW counts as low-hydrogen here; SMAW by its electrode. */
export const lowHydrogenProcess = (block: ProcessBlock): boolean | null => (block.process === 'SMAW' ? isLowHydrogen(block.filler) : true)

/** Thickest part at the point of welding over what is asked; Infinity where every thickness is. */
export function thickest(context: RuleContext): number | null {
  const tops = members(context.procedure, context.system).map(({ thickness }) => (thickness.fault ? null : thickness.all ? Infinity : (thickness.max ?? thickness.min)))
  return tops.some((top) => top === null) ? null : Math.max(...tops.filter((top) => top !== null))
}

export const pqPreheat = condition({
  file: 'preheat', title: 'Minimum preheat and interpass temperature', clause: 'Table 5.8', basis: 'secondary', field: 'preheat.minimum', at: 'weld',
  source: 'Table 3.3 read in 2015 for categories A and B; category C from a manual that reproduces it; category D from memory',
  statement: 'Preheat and interpass temperature are at least those of the category of steel and process for the thickest part; of two steels the higher value rules. Metal below 0 °C (32 °F) is first heated to 20 °C (70 °F).',
  more: { classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' } },
  check(context, block) {
    const { system } = context
    const unit = unitOf('temperature', system)
    const metals = members(context.procedure, system)
    const read = readMetals(context)
    const missing = unread(read, 'the preheat category')
    if (missing) return missing
    const T = thickest(context)
    if (T === null) return cannotTell("The thickness isn't stated, so the preheat can't be told.", ['procedure: thickness'], { field: 'thickness', fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] })
    const lowHydrogen = lowHydrogenProcess(block)
    if (lowHydrogen === null) return cannotTell('Whether the electrode is low-hydrogen can\'t be read from its classification, and the category depends on it.', ['procedure: filler.classification'], { field: `${context.path}.filler.classification` })
    const categories = metals.map(({ metal }, i) => preheatCategory(metal, read[i]?.groups ?? [], lowHydrogen, hydrogenLimit(block.filler)))
    const lacking = categories.findIndex((category) => category === null)
    if (lacking >= 0) return cannotTell(`${read[lacking]?.name ?? 'The base metal'} stands in no category kept here for ${lowHydrogen ? 'this process' : 'electrodes that are not low-hydrogen'}.`, ['preheat category of the base metal'], { field: 'baseMetals.a.specification' })
    const known = categories.filter((category) => category !== null)
    const least = Math.max(...known.map(({ category }) => minimumPreheat(category, T, system)))
    const names = [...new Set(known.map(({ category }) => category))]
    const basis = known.some((one) => one.basis === 'memory') ? 'memory' : known.some((one) => one.basis === 'secondary') ? 'secondary' : 'read'
    const range = between('temperature', unit, closed(least), UNLIMITED)
    const thick = T === Infinity ? 'unlimited thickness' : `up to ${show(T, unitOf('length', system))}`
    const why = `category ${list(names)}, ${thick}`
    const field = 'preheat.minimum'
    const stated = figureOrNull(context.procedure.preheat.minimum, 'temperature', system)
    if (stated === null) return cannotTell(`Minimum preheat isn't stated; at least ${show(least, unit)} is needed (${why}).`, ['procedure: preheat.minimum'], { field, range, basis, fixes: [{ kind: 'set', label: `Set the minimum preheat to ${show(least, unit)}`, field, value: quantity(least, 'temperature', unit) }] })
    const asked = { min: stated, max: stated }
    if (stated < least) return says('outside', `Preheat of ${show(stated, unit)} is below the ${show(least, unit)} needed (${why}).`, { asked, range, basis, fixes: [{ kind: 'set', label: `Set the minimum preheat to ${show(least, unit)}`, field, value: quantity(least, 'temperature', unit) }] })
    return says('within', `Preheat of ${show(stated, unit)} is at least the ${show(least, unit)} needed (${why}).`, { asked, range, basis })
  },
})

export const pqGas = condition({
  file: 'gas', title: 'Prequalified shielding gas', clause: 'Table 5.7', basis: 'memory', field: 'shieldingGas', at: 'block',
  source: 'Table 5.7 recalled with doubt; no figure of it is used',
  statement: 'The gas is the one used to classify the electrode, one of Table 5.7, or one that the maker tested by the A5 specification. The table is not confirmed, so a gas is always "cannot tell" here.',
  more: { classes: { GMAW: 'essential', FCAW: 'essential' } },
  check(context, block) {
    const field = `${context.path}.shieldingGas`
    if (!block.shieldingGas) return cannotTell('The shielding gas is not stated.', ['procedure: shieldingGas'], { field, fixes: [{ kind: 'state', label: 'State the shielding gas, or that none is used', field }] })
    if (isNoGas(block.shieldingGas)) return block.process === 'FCAW' ? says('within', 'Self-shielded: no gas is used.', { asked: ['none'] }) : says('outside', 'GMAW without a shielding gas is not prequalified.', { asked: ['none'] })
    return cannotTell('Whether the gas is prequalified must be looked up: it is when the electrode was classified with it, when Table 5.7 lists it, or when the maker tested it by the A5 specification.', ['the gas in Table 5.7 or in the electrode\'s classification'], { field })
  },
})

export const pqToughness = condition({
  file: 'toughness', title: 'CVN toughness', clause: 'Clause 5', basis: 'memory', field: 'toughnessRequired', at: 'weld',
  source: 'No source for prequalified work with specified CVN',
  statement: 'Where CVN toughness is specified, meeting Clause 5 does not show it: a test weld for CVN is needed, so prequalification alone is "cannot tell".',
  applies: (context) => context.procedure.toughnessRequired === true,
  check: () => cannotTell('CVN toughness is required, and a prequalified procedure has no test that shows it.', ['a test weld with CVN specimens'], { fixes: [byTest] }),
})

export const pqPwht = condition({
  file: 'pwht', title: 'Postweld heat treatment', clause: 'Table 5.2', basis: 'memory', field: 'pwht.condition', at: 'weld',
  source: 'Table 5.2 as recalled; conditions for heat treatment are not kept here',
  statement: 'The procedure states whether it is heat treated after welding. Which heat treatments are prequalified is not confirmed.',
  more: { classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' } },
  check(context) {
    const value = context.procedure.pwht.condition
    if (value === 'none') return says('within', 'No heat treatment after welding.', { asked: ['none'] })
    if (value === null) return cannotTell('Whether the weld is heat treated is not stated.', ['procedure: pwht.condition'], { field: 'pwht.condition', fixes: [{ kind: 'set', label: 'Set heat treatment to none', field: 'pwht.condition', value: 'none' }] })
    return cannotTell('Which heat treatments are prequalified is not confirmed here; look it up in your edition.', ['conditions for prequalified heat treatment'], { asked: [value] })
  },
})
