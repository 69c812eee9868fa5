/** Which calculators stand beside which row of a record, and what each may write there. */
import type { Interval, Quantity } from '../schemas/common.ts'
import type { ProcessBlock, WeldingVariables } from '../schemas/welding.ts'
import { fromSi, quantity, SHOWN_UNIT } from '../units/convert.ts'
import { decimalsOf } from '../units/format.ts'
import type { Dimension, UnitSystem } from '../units/types.ts'
import type { CalculatorResult } from './catalogue.ts'
import { baseFamilies, weldFamily, type MetalFamily } from './record-metals.ts'

const judgedBy = (weld: WeldingVariables, ...standards: string[]): boolean => weld.standards.some(({ standard }) => standards.includes(standard))
const ferritic = (families: readonly MetalFamily[]): boolean => families.length > 0 && families.every((each) => each === 'steel')

type Beside = (weld: WeldingVariables, block: ProcessBlock | null) => readonly (string | false)[]

const gasShielded = (block: ProcessBlock | null): boolean => block?.process === 'GMAW' || block?.process === 'FCAW'
const burnsOff: (weld: WeldingVariables, block: ProcessBlock | null) => boolean = (weld, block) => block?.process === 'GMAW' && ['steel', 'aluminium'].includes(weldFamily(weld, block) ?? '')

/** By the row's path from the weld, or from its process block. The first is the one that the chosen standard suggests. */
const BESIDE: Readonly<Record<string, Beside>> = {
  'preheat.minimum': (weld) => {
    const families = baseFamilies(weld)
    // Not steel, or not told: method B and its kin mean nothing for aluminium or an austenitic steel.
    if (!ferritic(families)) return []
    const structural = ['preheat-d1-1-table', 'preheat-d1-1-annex']
    const iso = ['preheat-method-b', 'preheat-method-a']
    return [...(judgedBy(weld, 'aws-d1-1') ? [...structural, ...iso] : iso), 'preheat-seferian']
  },
  'electrical.heatInput': (weld, block) => {
    const iso = judgedBy(weld, 'iso-15614-1', 'iso-15614-2')
    const waveform = block?.electrical.waveformControlled === true
    const sectionIx = waveform ? ['heat-input-power', 'heat-input-energy'] : ['heat-input-meter', 'heat-input-power', 'heat-input-energy']
    const heat = iso ? (waveform ? ['heat-input-iso-power'] : ['heat-input-iso', 'heat-input-iso-power']) : sectionIx
    return [...heat, ...(ferritic(baseFamilies(weld)) ? ['cooling-time', 'heat-input-for-cooling-time', 'haz-hardness-yurioka', 'haz-hardness-dueren'] : [])]
  },
  'electrical.current': (weld, block) => [burnsOff(weld, block) && 'current-from-wire-feed', block?.process === 'GMAW' && 'spray-transition'],
  'electrical.wireFeed': (weld, block) => [burnsOff(weld, block) && 'wire-feed-from-current', burnsOff(weld, block) && weldFamily(weld, block) === 'steel' && 'shop-settings', gasShielded(block) && 'deposition-rate'],
  'electrical.travelSpeed': () => ['travel-speed'],
  'electrical.peakCurrent': () => ['pulse', 'pulse-detachment'],
  'baseMetals.a': (weld) => [baseFamilies(weld).includes('steel') && 'carbon-equivalents', baseFamilies(weld).includes('stainless') && 'pren'],
  filler: (weld, block) => [weldFamily(weld, block) === 'stainless' && 'ferrite-dilution', weldFamily(weld, block) === 'stainless' && 'ferrite-number'],
  'filler.aNumber': (weld, block) => [['steel', 'stainless'].includes(weldFamily(weld, block) ?? '') && 'a-number'],
  shieldingGas: (_weld, block) => ['gas-class', gasShielded(block) && 'wire-gas-flow', block?.process === 'GTAW' && 'tig-cup'],
  'joint.filletLeg': () => ['fillet-leg', 'fillet-throat'],
  'joint.filletThroat': () => ['fillet-throat'],
  impactEnergy: () => ['charpy-sub-size'],
}

/** Calculators beside a row of the sheet, the one that suits first; none for most rows. */
export const besideRow = (path: string, weld: WeldingVariables, block: ProcessBlock | null): string[] => (BESIDE[path]?.(weld, block) ?? []).filter((each) => each !== false)

/** Beside the joint's computed figures. */
export const besideJoint = (weld: WeldingVariables): string[] => ['consumption', 'cost', 'passes', ...(weld.joint.weld === 'groove' ? ['groove-weld'] : ['fillet-throat', 'fillet-leg']), 'deposition-rate']

/** Beside a bend test of a coupon, and beside a row of indentations: to be read, as what was used or measured is written and never worked out. */
export const BESIDE_BEND: readonly string[] = ['bend-former', 'bend-strain']
export const BESIDE_HARDNESS: readonly string[] = ['hardness-conversion']

interface Target {
  /** From the weld, or from the process block where `ofBlock`. */
  path: string
  ofBlock?: true
  /** The output that is written. */
  output: string
  /** The output to write for somebody who reads US units, where the source prints its own figure. */
  us?: { output: string; unit: string }
  dimension: Dimension
  kind: 'quantity' | 'interval'
  /** A single figure becomes this end of the interval and leaves the other; else it becomes both ends. */
  end?: 'min' | 'max'
  /** Which way it is rounded, where that doesn't follow from its end: a bound worked out for an aim stays inside the aim. */
  side?: Side
}

const preheat = (output: string, us?: Target['us']): Target => ({ path: 'preheat.minimum', output, dimension: 'temperature', kind: 'quantity', ...(us ? { us } : {}) })
const heat = (output: string): Target => ({ path: 'electrical.heatInput', ofBlock: true, output, dimension: 'heatInput', kind: 'interval', end: 'max' })
const printed = { output: 'fahrenheit', unit: '°F' }

const TARGETS: Readonly<Record<string, Target>> = {
  'preheat-method-b': preheat('preheat'),
  'preheat-method-a': preheat('preheat'),
  'preheat-d1-1-table': preheat('preheat', printed),
  'preheat-d1-1-annex': preheat('toUse', printed),
  'preheat-seferian': preheat('toUse'),
  'preheat-ito-bessyo': preheat('toUse'),
  'heat-input-meter': heat('arcEnergy'),
  'heat-input-power': heat('arcEnergy'),
  'heat-input-energy': heat('arcEnergy'),
  'heat-input-iso': heat('heatInput'),
  'heat-input-iso-power': heat('heatInput'),
  'heat-input-for-cooling-time': { ...heat('heatInput'), side: 'down' },
  'wire-feed-from-current': { path: 'electrical.wireFeed', ofBlock: true, output: 'wireFeed', dimension: 'wireFeed', kind: 'interval' },
  'shop-settings': { path: 'electrical.wireFeed', ofBlock: true, output: 'wireFeed', dimension: 'wireFeed', kind: 'interval' },
  'current-from-wire-feed': { path: 'electrical.current', ofBlock: true, output: 'current', dimension: 'current', kind: 'interval' },
  'travel-speed': { path: 'electrical.travelSpeed', ofBlock: true, output: 'travelSpeed', dimension: 'travelSpeed', kind: 'interval' },
  'fillet-leg': { path: 'joint.filletLeg', output: 'legToWeld', dimension: 'length', kind: 'interval', end: 'min' },
  'fillet-throat': { path: 'joint.filletThroat', output: 'throat', dimension: 'length', kind: 'interval', end: 'min' },
}

/** Which way a figure may be rounded so that it stays on the safe side. */
type Side = 'up' | 'down' | 'nearest'
const sideOf = ({ path, end, side }: Target, at: 'min' | 'max' | null): Side => side ?? (path === 'preheat.minimum' || path === 'joint.filletLeg' ? 'up' : path === 'joint.filletThroat' ? 'down' : (at ?? end) === 'max' ? 'up' : (at ?? end) === 'min' ? 'down' : 'nearest')

/** A storage figure as a quantity that a person who reads `system` would write. */
function writtenAs(si: number, dimension: Dimension, system: UnitSystem, side: Side, unit: string = SHOWN_UNIT[system][dimension]): Quantity {
  const factor = 10 ** decimalsOf(dimension, unit)
  const exact = Number((fromSi(si, dimension, unit) * factor).toPrecision(10))
  const round = side === 'up' ? Math.ceil : side === 'down' ? Math.floor : Math.round
  return quantity(round(exact) / factor, dimension, unit)
}

export interface Use {
  /** From the weld's variables, as a fix names a field. */
  field: string
  value: Quantity | Interval
  /** As it will read: `120 °C`. */
  text: string
}

const figureOf = ({ shown }: CalculatorResult, key: string): number | null => {
  const value = shown.find((each) => each.key === key)?.value
  return typeof value === 'number' ? value : null
}

/**
 * What a result would write into the record, in the reader's units and rounded to the safe side.
 * @param results of both ends of the record's ranges where they were worked out, else of the figures as they stand
 * @returns null for a calculator that writes nowhere, without a result, or where the field may not be written
 */
export function toWrite(calculatorId: string, results: { single: CalculatorResult } | { least: CalculatorResult; most: CalculatorResult }, system: UnitSystem, blockIndex: number | null): Use | null {
  const target = TARGETS[calculatorId]
  if (!target || (target.ofBlock && blockIndex === null)) return null
  const field = target.ofBlock ? `processes.${blockIndex}.${target.path}` : target.path
  if ('least' in results) {
    const [least, most] = [figureOf(results.least, target.output), figureOf(results.most, target.output)]
    if (target.kind !== 'interval' || least === null || most === null) return null
    const [min, max] = [writtenAs(least, target.dimension, system, sideOf(target, 'min')), writtenAs(most, target.dimension, system, sideOf(target, 'max'))]
    return { field, value: { min, max, all: false }, text: `${min.typed} to ${max.typed}` }
  }
  const own = system === 'US' && target.us ? target.us : null
  const figure = figureOf(results.single, own?.output ?? target.output)
  if (figure === null) return null
  const value = own ? quantity(figure, target.dimension, own.unit) : writtenAs(figure, target.dimension, system, sideOf(target, null))
  if (target.kind === 'quantity') return { field, value, text: value.typed }
  return target.end ? { field: `${field}.${target.end}`, value, text: `${value.typed} ${target.end === 'max' ? 'as the greatest' : 'as the least'}` } : { field, value: { min: value, max: value, all: false }, text: value.typed }
}
