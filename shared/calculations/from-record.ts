/**
 * What a record of a weld gives a calculator: each input with where it came from, what the record leaves open, and which ends of
 * the record's ranges count. Nothing is invented: an input that the record doesn't give is either left open, or told to be assumed.
 */
import { hydrogenLimit } from '../standards/aws-d1-1/fillers.ts'
import { lowHydrogenProcess } from '../standards/aws-d1-1/prequalified/metals.ts'
import { groupsOf, members, preheatCategory } from '../standards/aws-d1-1/steels.ts'
import { isSameDiameter } from '../machines/wires.ts'
import type { Interval, Quantity } from '../schemas/common.ts'
import type { BendTest, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'
import type { Dimension } from '../units/types.ts'
import { efficiencies } from './arc-energy.ts'
import { SHOP_WIRES, SPRAY_TRANSITION, type BurnOffMaterial } from './burn-off.ts'
import { calculatorById } from './catalogue.ts'
import { quantityText } from './calculator-texts.ts'
import { carbonEquivalent, type CarbonEquivalent } from './carbon-equivalent.ts'
import { ELEMENT_SYMBOLS, type Chemistry, type Element } from './chemistry.ts'
import { coolingTime, JOINT_FACTORS } from './cooling-time.ts'
import { DENSITIES, DEPOSITION_EFFICIENCIES, depositionRate } from './deposition.ts'
import { GROOVE_AREA_TYPES } from './groove-area.ts'
import { geometryOf, massPerMetre } from './joint-geometry.ts'
import { cetToUse } from './preheat-method-b.ts'
import { isoProcess, weldFamily } from './record-metals.ts'

export interface Chemistries {
  a?: Chemistry | null
  b?: Chemistry | null
  filler?: Chemistry | null
  /** What each is: `heat 48213`, `typed here`. */
  names?: Readonly<Partial<Record<'a' | 'b' | 'filler', string>>>
}
/** A record as calculators ask it; `bend` and `hardness` where they stand beside such a test of a coupon. */
export interface CalculatorRecord { variables: WeldingVariables; chemistries?: Chemistries; bend?: Pick<BendTest, 'thickness' | 'formerDiameter'>; hardness?: { values: readonly number[] } }

interface Taken {
  /** As `calculator-texts` keeps it. */
  text: string
  /** In words: `Thickness, upper end`. */
  from: string
  /** Not in the record: a usual figure, to be looked at. */
  assumed?: true
  /** Not in the record: of a heat's or lot's analysis. */
  analysis?: true
}
type Inputs = Readonly<Record<string, Taken | null | undefined>>
/** Inputs that give the least and the greatest result over the ranges of the record. */
interface Ends { least: Readonly<Record<string, string>>; most: Readonly<Record<string, string>> }
export interface FromRecord {
  taken: Readonly<Record<string, Taken>>
  /** Inputs that must be given and that the record doesn't give. */
  missing: readonly string[]
  ends: Ends | null
  /** Which end of a range was taken, and why. */
  said: readonly string[]
}
interface Reading { inputs: Inputs; ends?: Ends | null; said?: readonly (string | null)[] }

interface Given extends CalculatorRecord { block: ProcessBlock | null }

const plain = (value: number): string => String(Number(value.toPrecision(4)))
const whole = (text: string, from: string): Taken => ({ text, from })
const usual = (text: string, from: string): Taken => ({ text, from, assumed: true })
const one = (quantity: Quantity | null | undefined, dimension: Dimension, from: string): Taken | null => (quantity ? { text: quantityText(quantity, dimension), from } : null)

type End = 'least' | 'most' | 'middle'
const END_WORDS: Readonly<Record<End, string>> = { least: 'lower end', most: 'upper end', middle: 'middle' }
/** One figure of an interval; none for "all", and none for an end that is left open: the other end would stand for what it is not. */
function of(interval: Interval | null | undefined, dimension: Dimension, from: string, end: End): Taken | null {
  if (!interval || interval.all) return null
  const { min, max } = interval
  const single = min && max && min.si === max.si
  if (end === 'middle' && min && max && !single) return { text: plain((min.si + max.si) / 2), from: `${from}, middle` }
  const quantity = end === 'least' ? min : end === 'most' ? max : (min ?? max)
  return one(quantity, dimension, single || !(min && max) ? from : `${from}, ${END_WORDS[end]}`)
}
const si = (interval: Interval | null | undefined, end: 'least' | 'most'): number | null => (!interval || interval.all ? null : ((end === 'least' ? interval.min?.si : interval.max?.si) ?? null))
const ranges = (interval: Interval | null | undefined): boolean => Boolean(interval?.min && interval.max && interval.min.si !== interval.max.si)

/** The thicker of both members, at its upper end; none where one has no upper end. */
function thickest({ variables: { thickness, thicknessB } }: Given): Taken | null {
  const [a, b] = [si(thickness, 'most'), si(thicknessB, 'most')]
  if ([thickness, thicknessB].some((each) => each && (each.all || !each.max))) return null
  return b !== null && (a === null || b > a) ? of(thicknessB, 'length', 'Thickness of B', 'most') : of(thickness, 'length', 'Thickness', 'most')
}

/** The higher equivalent of both metals, from their analyses; not rounded as it is shown, since it is worked on with. */
function equivalent({ chemistries }: Given, name: CarbonEquivalent): Taken | null {
  const known = (['a', 'b'] as const).flatMap((side) => {
    const chemistry = chemistries?.[side]
    const value = chemistry ? carbonEquivalent(name, chemistry).value : null
    return value === null ? [] : [{ value, side }]
  })
  const [most] = known.sort((x, y) => y.value - x.value)
  return most ? { text: String(Number(most.value.toFixed(5))), from: analysed(chemistries, most.side), analysis: true } : null
}

/** CET for method B: the parent's, unless the filler's + 0.03 is higher. */
function decisiveCet(given: Given): { cet: Taken | null; said: string | null } {
  const parent = equivalent(given, 'cet')
  const { filler } = given.chemistries ?? {}
  const weldMetal = filler ? carbonEquivalent('cet', filler).value : null
  if (parent === null) return { cet: null, said: null }
  if (weldMetal === null) return { cet: parent, said: 'CET is that of the base metal. Where it is not at least 0.03 above that of the weld metal, take the weld metal’s plus 0.03.' }
  const { figures } = cetToUse({ parent: Number(parent.text), weldMetal })
  return figures?.decides === 'weld-metal' ? { cet: { text: String(Number(figures.cet.toFixed(5))), from: `${analysed(given.chemistries, 'filler')}, + 0.03`, analysis: true }, said: null } : { cet: parent, said: null }
}

const PARTS = { a: 'Metal A', b: 'Metal B', filler: 'Filler' } as const
type Part = keyof typeof PARTS
const analysed = (chemistries: Chemistries | undefined, part: Part): string => `Analysis of ${PARTS[part].toLowerCase().replace(/ [ab]$/, (letter) => letter.toUpperCase())}${chemistries?.names?.[part] ? `, ${chemistries.names[part]}` : ''}`
const elementsFrom = (chemistries: Chemistries | undefined, part: Part | null, letter = ''): Record<string, Taken> =>
  part === null ? {} : Object.fromEntries((Object.entries(chemistries?.[part] ?? {}) as [Element, number | null][]).flatMap(([element, value]): [string, Taken][] => (value === null ? [] : [[letter === '' ? element : `${letter}${ELEMENT_SYMBOLS[element]}`, { text: String(value), from: analysed(chemistries, part), analysis: true }]])))
/** The metal with the higher carbon equivalent, which decides what a weld can stand; `differ` where the other has another. */
function decisive({ chemistries }: Given): { part: Part | null; differ: boolean } {
  const [a, b] = [chemistries?.a, chemistries?.b]
  const ce = (chemistry: Chemistry) => carbonEquivalent('ceIiw', chemistry).value ?? 0
  if (a && b) return { part: ce(a) >= ce(b) ? 'a' : 'b', differ: ce(a) !== ce(b) }
  return { part: a ? 'a' : b ? 'b' : null, differ: false }
}

/** Heat input with thermal efficiency, kJ/mm: as stated, else from the meters. */
function heatWithEfficiency({ variables, block }: Given, end: 'least' | 'most'): Taken | null {
  if (!block) return null
  const { heatInput, heatInputQuantity, current, voltage, travelSpeed } = block.electrical
  const number = isoProcess(block)
  const k = efficiencies.find((each) => each.number === number)?.k ?? null
  const stated = si(heatInput, end)
  const words = end === 'least' ? 'lowest' : 'highest'
  const iso = variables.standards.some(({ standard }) => standard.startsWith('iso'))
  if (stated !== null && heatInputQuantity === 'heat-input') return whole(plain(stated), `Heat input, ${words}`)
  if (stated !== null && k !== null && (heatInputQuantity === 'arc-energy' || !iso)) return whole(plain(stated * k), `Heat input, ${words}, × k ${k}`)
  const [U, I, v] = [si(voltage, end), si(current, end), si(travelSpeed, end === 'least' ? 'most' : 'least')]
  if (U === null || I === null || v === null || !(v > 0) || k === null || block.electrical.waveformControlled) return null
  return whole(plain((k * U * I * 60) / v / 1000), `Volts, amps and travel speed, ${words}, × k ${k}`)
}

const FACTORS = new Map(JOINT_FACTORS.map((each) => [each.id, each]))
function jointFactors({ variables: { joint } }: Given): { f2: Taken | null; f3: Taken | null } {
  const row = FACTORS.get(joint.weld === 'groove' ? (joint.type === 'butt' ? 'butt' : '') : joint.type === 'tee' ? 'fillet-tee' : joint.type === 'corner' ? 'fillet-corner' : '')
  if (!row) return { f2: null, f3: null }
  // A fillet's factor in two dimensions is a range; which figure holds is for whoever knows the weld.
  return { f2: row.f2[0] === row.f2[1] ? usual(String(row.f2[0]), `${row.label}`) : null, f3: usual(String(row.f3), row.label) }
}

const LEAST_HEAT = 'The lowest heat input and the thickest part count: they cool fastest.'
function cooling(given: Given): Reading {
  const inputs = { heatInput: heatWithEfficiency(given, 'least'), preheat: one(given.variables.preheat.minimum, 'temperature', 'Preheat, minimum'), thickness: thickest(given), ...jointFactors(given) }
  return { inputs, said: [inputs.heatInput && LEAST_HEAT] }
}
/** t8/5 of the draft, s; null where a figure for it is missing. */
function coolingOf(given: Given): Taken | null {
  const { inputs } = cooling(given)
  const value = (key: string) => Number(inputs[key]?.text ?? NaN)
  const [heatInput, f2, f3] = [value('heatInput'), value('f2'), value('f3')]
  const preheat = given.variables.preheat.minimum?.si ?? NaN
  const thickness = Math.max(si(given.variables.thickness, 'most') ?? -Infinity, si(given.variables.thicknessB, 'most') ?? -Infinity)
  const t85 = [heatInput, preheat, thickness, f2, f3].every(Number.isFinite) ? coolingTime({ heatInput, preheat, thickness, f2, f3 }).value : null
  return t85 === null ? null : whole(plain(t85), 't8/5 worked out from the draft')
}

function hydrogen({ block }: Given): Taken | null {
  const designator = block ? hydrogenLimit(block.filler) : null
  const iso = /\bH(5|10|15)\b/.exec(block?.filler.classification ?? '')?.[1]
  const limit = designator ?? (iso ? Number(iso) : null)
  return limit === null ? null : whole(String(limit), `Filler metal: its designator promises at most ${limit} ml/100 g`)
}

/** The highest of the two metals' categories of Table 5.8. */
function category({ variables, block }: Given): Taken | null {
  if (!block) return null
  const low = lowHydrogenProcess(block)
  const found = members(variables, variables.unitSystem).map(({ metal, thickness }) => {
    const groups = groupsOf(metal, thickness, variables.unitSystem)
    return groups ? preheatCategory(metal, groups, low, hydrogenLimit(block.filler)) : null
  })
  const [a, b] = found
  return a && b && a.category === b.category ? whole(a.category, 'Base metals, process and filler') : null
}

const jointKind = ({ variables: { joint } }: Given): Taken | null => {
  const kind = joint.type === 'butt' ? 'butt' : joint.type === 'corner' ? 'corner' : joint.type === 'tee' ? 'tee' : null
  return kind ? whole(kind, 'Joint') : null
}

function meter({ block }: Given): Reading {
  if (!block) return { inputs: {} }
  const { voltage, current, travelSpeed } = block.electrical
  const inputs = { voltage: of(voltage, 'voltage', 'Volts', 'most'), current: of(current, 'current', 'Amps', 'most'), travelSpeed: of(travelSpeed, 'travelSpeed', 'Travel speed', 'least') }
  const other = { voltage: of(voltage, 'voltage', '', 'least'), current: of(current, 'current', '', 'least'), travelSpeed: of(travelSpeed, 'travelSpeed', '', 'most') }
  const [least, most] = [textsOf(other), textsOf(inputs)]
  const ends = Object.keys(least).length === 3 && Object.keys(most).length === 3 && [voltage, current, travelSpeed].some(ranges) ? { least, most } : null
  return { inputs, ends, said: [ends && 'The ends that give the highest heat input are filled in: highest volts and amps, slowest travel.'] }
}
const textsOf = (inputs: Inputs): Record<string, string> => Object.fromEntries(Object.entries(inputs).flatMap(([key, taken]) => (taken ? [[key, taken.text]] : [])))

const burnMaterial = (given: Given): Taken | null => {
  const family = weldFamily(given.variables, given.block)
  const material: BurnOffMaterial | null = family === 'steel' ? 'carbon-steel' : family === 'aluminium' ? 'aluminium' : null
  return material ? whole(material, 'Filler and base metals') : null
}
const wireSize = ({ block }: Given): Taken | null => {
  const [first, second] = block?.filler.diameters ?? []
  return first ? whole(quantityText(first, 'length'), second ? 'Sizes, the first' : 'Sizes') : null
}
function burnOff(given: Given, key: 'current' | 'wireFeed', interval: Interval | null | undefined, dimension: 'current' | 'wireFeed', from: string): Reading {
  const extension = of(given.block?.technique.contactTubeDistance, 'length', 'Contact tube to work', 'middle')
  const [least, most] = [of(interval, dimension, '', 'least'), of(interval, dimension, '', 'most')]
  return {
    inputs: { material: burnMaterial(given), diameter: wireSize(given), [key]: of(interval, dimension, from, 'middle'), extension: extension && { ...extension, from: `${extension.from}, less the arc` } },
    ends: least && most && ranges(interval) ? { least: { [key]: least.text }, most: { [key]: most.text } } : null,
    said: [extension && 'The extension is the contact tube’s distance less the length of the arc; take that off if you know it.'],
  }
}

/** Share of the filler that becomes weld metal, by process and gas, as handbooks average it. */
function efficiency({ block }: Given): Taken | null {
  const parts = block?.shieldingGas?.components ?? []
  const co2 = parts.find(({ gas }) => gas === 'CO2')?.percent ?? 0
  const id = block?.process === 'SAW' ? 'saw' : block?.process === 'FCAW' ? (block.shieldingGas ? 'fcaw-g' : null) : block?.process === 'GMAW' ? (block.filler.productForm === 'metal-cored' ? 'metal-cored' : parts.length === 0 ? null : co2 >= 100 ? 'gmaw-co2' : co2 > 5 ? 'gmaw-75-25' : 'gmaw-ar-o2') : null
  const row = DEPOSITION_EFFICIENCIES.find((each) => each.id === id)
  return row ? usual(String(row.efficiency * 100), `${row.label}: handbook average`) : null
}
const density = (given: Given): Taken | null => {
  const family = weldFamily(given.variables, given.block)
  const id = family === 'steel' ? 'carbon-steel' : family === 'stainless' || family === 'aluminium' ? family : null
  return id ? usual(String(DENSITIES[id]), 'usual density of the metal') : null
}
const feed = ({ block }: Given) => of(block?.electrical.wireFeed, 'wireFeed', 'Wire feed speed', 'middle')

function consumption(given: Given): Reading {
  const geometry = geometryOf(given.variables)
  const [size, share] = [given.block?.filler.diameters[0]?.si, efficiency(given)]
  const [wire, rho] = [given.block?.electrical.wireFeed, density(given)]
  const [slow, fast] = [si(wire, 'least'), si(wire, 'most')]
  const middle = ((slow ?? fast ?? NaN) + (fast ?? slow ?? NaN)) / 2
  const rate = size && share && rho && Number.isFinite(middle) ? depositionRate({ wireDiameter: size, wireFeed: middle, density: Number(rho.text), efficiency: Number(share.text) / 100 }).value : null
  // A metal that is not from the library has no density of its own here: the usual one of its family stands in.
  const mass = geometry.weldMetalKgPerM ?? (geometry.areaMm2 !== null && rho ? massPerMetre(geometry.areaMm2, Number(rho.text) * 1000) : null)
  return {
    inputs: { weldMetal: mass === null ? null : whole(plain(mass), 'Joint, without cap'), efficiency: share, depositionRate: rate === null ? null : whole(plain(rate), 'Wire feed, size and efficiency'), gasFlow: of(given.block?.shieldingGas?.flow, 'gasFlow', 'Shielding gas flow', 'middle') ?? (given.block?.process === 'SMAW' || given.block?.process === 'SAW' ? whole('0', 'no gas with this process') : null), purge: usual('0', 'none unless a purge is used') },
    said: [mass !== null && given.variables.processes.length > 1 ? 'The weld metal is that of the whole joint; this draft shares it between several processes.' : null],
  }
}

function groove({ variables: { joint, thickness } }: Given): Inputs {
  const type = GROOVE_AREA_TYPES.find((each) => each === joint.groove)
  const included = of(joint.includedAngle, 'angle', 'Included angle, half', 'middle')
  const half = included ? { ...included, text: plain(Number(included.text.replace(/[^\d.]/g, '')) / 2) } : null
  return { type: type ? whole(type, 'Groove') : null, thickness: of(thickness, 'length', 'Thickness', 'middle'), rootOpening: of(joint.rootOpening, 'length', 'Root opening', 'middle'), rootFace: of(joint.rootFace, 'length', 'Root face', 'middle'), bevelAngle: of(joint.bevelAngle, 'angle', 'Bevel angle', 'middle') ?? half, rootRadius: of(joint.rootRadius, 'length', 'Root radius', 'middle') }
}

function pulse({ block }: Given): Inputs {
  const e = block?.electrical
  return { peakCurrent: of(e?.peakCurrent, 'current', 'Peak current', 'middle'), backgroundCurrent: of(e?.backgroundCurrent, 'current', 'Background current', 'middle'), frequency: of(e?.pulseFrequency, 'frequency', 'Pulse frequency', 'middle'), onTime: of(e?.pulseOnTime, 'pulseTime', 'Pulse on time', 'middle'), backgroundVoltage: of(e?.backgroundVoltage, 'voltage', 'Background voltage', 'middle'), wireFeed: of(e?.wireFeed, 'wireFeed', 'Wire feed speed', 'middle'), wireDiameter: wireSize({ block } as Given), travelSpeed: of(e?.travelSpeed, 'travelSpeed', 'Travel speed', 'middle') }
}

function elongation({ variables: { baseMetals: { a, b } } }: Given): Taken | null {
  const [lower] = [a.minElongation, b.minElongation].filter((each) => each !== null).sort((x, y) => x.si - y.si)
  return one(lower, 'percent', a.minElongation && b.minElongation ? 'Elongation, minimum, the lower' : 'Elongation, minimum')
}

const yieldOf = ({ variables: { baseMetals: { a, b } } }: Given): Taken | null => {
  const [higher] = [a.minYield, b.minYield].filter((each) => each !== null).sort((x, y) => y.si - x.si)
  return one(higher, 'stress', 'Yield, minimum')
}

const gasShares = ({ block }: Given): Inputs => {
  const keys = { Ar: 'argon', CO2: 'carbonDioxide', O2: 'oxygen', He: 'helium', H2: 'hydrogen', N2: 'nitrogen' } as const
  return Object.fromEntries((block?.shieldingGas?.components ?? []).map(({ gas, percent }) => [keys[gas], whole(String(percent), 'Shielding gas')]))
}

const AMBIENT = usual('20', 'a usual shop; colder steel needs more')
const base = (given: Given): Reading => {
  const { part, differ } = decisive(given)
  return { inputs: elementsFrom(given.chemistries, part), said: [differ ? 'The metal with the higher carbon equivalent is filled in.' : null] }
}
const hazard = (given: Given): Reading => ({ inputs: { ...base(given).inputs, t85: coolingOf(given) }, said: ['Least heat input, thickest part and the metal with the higher carbon equivalent: the hardest case.'] })
const spray = (given: Given): Inputs => {
  const family = weldFamily(given.variables, given.block)
  const id = family === 'steel' ? 'mild-steel' : family
  const wire = SPRAY_TRANSITION.find((each) => each.id === id)
  const mm = given.block?.filler.diameters[0]?.si
  const size = wire && mm ? Object.keys(wire.least).find((inch) => isSameDiameter((inch === '1/16' ? 0.0625 : Number(inch)) * 25.4, mm)) : undefined
  return { wire: wire ? whole(wire.id, 'Filler and base metals') : null, diameter: size ? whole(size, 'Sizes') : null, current: of(given.block?.electrical.current, 'current', 'Amps', 'least') }
}
const shop = (given: Given): Inputs => {
  const mm = given.block?.filler.diameters[0]?.si
  const wire = mm === undefined ? undefined : SHOP_WIRES.find((each) => isSameDiameter(each.mm, mm))
  return { thickness: of(given.variables.thickness, 'length', 'Thickness', 'middle'), wire: wire ? whole(String(wire.mm), 'Sizes') : null }
}
const withProcess = (given: Given, reading: Reading): Reading => {
  const number = given.block ? isoProcess(given.block) : null
  return { ...reading, inputs: { process: number ? whole(number, 'Process and gas') : null, ...reading.inputs } }
}
const usualSystem = (given: Given): Taken => whole(given.variables.unitSystem, 'Written in')

/** How each calculator is filled; one that is not named here takes nothing from a record. */
const CASES: Readonly<Record<string, (given: Given) => Reading>> = {
  'heat-input-meter': meter,
  'heat-input-iso': (given) => withProcess(given, meter(given)),
  'heat-input-iso-power': (given) => withProcess(given, { inputs: {} }),
  'carbon-equivalents': base,
  'preheat-seferian': (given) => ({ inputs: { ...base(given).inputs, thickness: thickest(given) } }),
  'haz-hardness-yurioka': hazard,
  'haz-hardness-dueren': hazard,
  'a-number': ({ chemistries }) => ({ inputs: elementsFrom(chemistries, 'filler') }),
  pren: (given) => ({ inputs: elementsFrom(given.chemistries, given.chemistries?.a ? 'a' : 'b') }),
  'ferrite-number': ({ chemistries }) => ({ inputs: elementsFrom(chemistries, 'filler') }),
  'ferrite-dilution': ({ chemistries }) => ({ inputs: { ...elementsFrom(chemistries, 'a', 'a'), ...elementsFrom(chemistries, 'b', 'b'), ...elementsFrom(chemistries, 'filler', 'f'), shareOfA: usual('50', 'both edges melt alike') } }),
  'preheat-method-b': (given) => {
    const { cet, said } = decisiveCet(given)
    return { inputs: { cet, thickness: thickest(given), hydrogen: hydrogen(given), heatInput: heatWithEfficiency(given, 'least'), ambient: AMBIENT, yieldStrength: yieldOf(given) }, said: ['The lowest heat input and the thickest part ask for most preheat.', said] }
  },
  'preheat-method-a': (given) => ({ inputs: { ce: equivalent(given, 'ceIiw'), hydrogen: hydrogen(given), joint: jointKind(given), thickness: of(given.variables.thickness, 'length', 'Thickness', 'most'), thicknessB: of(given.variables.thicknessB, 'length', 'Thickness of B', 'most') ?? of(given.variables.thickness, 'length', 'Thickness, as of A', 'most'), heatInput: heatWithEfficiency(given, 'least') } }),
  'preheat-d1-1-table': (given) => ({ inputs: { category: category(given), thickness: thickest(given), system: usualSystem(given) } }),
  'preheat-d1-1-annex': (given) => ({ inputs: { pcm: equivalent(given, 'pcm'), hydrogen: hydrogen(given), thickness: thickest(given) } }),
  'cooling-time': cooling,
  'heat-input-for-cooling-time': (given) => ({ inputs: { preheat: one(given.variables.preheat.minimum, 'temperature', 'Preheat, minimum'), thickness: thickest(given), ...jointFactors(given) } }),
  'wire-feed-from-current': (given) => burnOff(given, 'current', given.block?.electrical.current, 'current', 'Amps'),
  'current-from-wire-feed': (given) => burnOff(given, 'wireFeed', given.block?.electrical.wireFeed, 'wireFeed', 'Wire feed speed'),
  'shop-settings': (given) => ({ inputs: shop(given) }),
  'spray-transition': (given) => ({ inputs: spray(given) }),
  'deposition-rate': (given) => ({ inputs: { wireDiameter: wireSize(given), wireFeed: feed(given), density: density(given), efficiency: efficiency(given) } }),
  pulse: (given) => ({ inputs: pulse(given) }),
  'pulse-detachment': (given) => ({ inputs: { peakCurrent: pulse(given).peakCurrent, onTime: pulse(given).onTime, exponent: usual('2', 'about 2 for steel') } }),
  'groove-weld': (given) => ({ inputs: { ...groove(given), capWidth: usual('0', 'no cap'), capHeight: usual('0', 'no cap'), density: density(given) } }),
  passes: (given) => ({ inputs: { grooveArea: ((area) => (area === null ? null : whole(plain(area), 'Joint')))(geometryOf(given.variables).areaMm2), wireDiameter: wireSize(given), wireFeed: feed(given), efficiency: efficiency(given), travelSpeed: of(given.block?.electrical.travelSpeed, 'travelSpeed', 'Travel speed', 'middle') } }),
  'fillet-throat': (given) => ({ inputs: { leg: of(given.variables.joint.filletLeg, 'length', 'Fillet leg', 'least'), legB: of(given.variables.joint.filletLegB, 'length', 'Leg on B', 'least'), angle: of(given.variables.joint.memberAngle, 'angle', 'Angle of the members', 'middle') ?? usual('90', 'members stand square'), density: density(given) } }),
  'fillet-leg': (given) => ({ inputs: { throat: of(given.variables.joint.filletThroat, 'length', 'Fillet throat', 'least'), angle: of(given.variables.joint.memberAngle, 'angle', 'Angle of the members', 'middle') ?? usual('90', 'members stand square') } }),
  consumption,
  cost: consumption,
  'gas-class': (given) => ({ inputs: gasShares(given) }),
  'wire-gas-flow': (given) => ({ inputs: { wireDiameter: wireSize(given) } }),
  'bend-former': (given) => ({ inputs: { standard: whole(given.variables.standards.some(({ standard }) => standard === 'asme-ix') ? 'asme-ix' : 'iso-15614-1', 'Standard'), thickness: one(given.bend?.thickness, 'length', 'Thickness of the specimen'), elongation: elongation(given) } }),
  'bend-strain': ({ bend }) => ({ inputs: { former: one(bend?.formerDiameter, 'length', 'Former'), thickness: one(bend?.thickness, 'length', 'Thickness of the specimen') } }),
  'hardness-conversion': ({ hardness }) => ({ inputs: { scale: whole('hv', 'Vickers, as tested'), figure: hardness && hardness.values.length > 0 ? whole(String(Math.max(...hardness.values)), 'the highest of this row') : null } }),
  'charpy-sub-size': ({ variables }) => ({ inputs: { requirement: one(variables.impactEnergy, 'energy', 'Impact energy') } }),
}

/**
 * Fills a calculator from a record.
 * @param blockIndex which process; null for what belongs to the weld as a whole, which then takes the first
 */
export function fromRecord(calculatorId: string, record: CalculatorRecord, blockIndex: number | null = null): FromRecord {
  const calculator = calculatorById(calculatorId)
  const block = record.variables.processes[blockIndex ?? 0] ?? null
  const { inputs, ends = null, said = [] } = CASES[calculatorId]?.({ ...record, block }) ?? { inputs: {} }
  const known = calculator?.inputs ?? {}
  const taken = Object.fromEntries(Object.entries(inputs).flatMap(([key, each]) => (each && key in known ? [[key, each] as const] : [])))
  const missing = Object.entries(known).flatMap(([key, input]) => ((input.kind === 'choice' || !input.optional) && !(key in taken) ? [key] : []))
  return { taken, missing, ends, said: said.filter((each) => each !== null && each !== undefined) }
}
