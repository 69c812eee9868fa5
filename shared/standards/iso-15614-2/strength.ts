/** Strength that a transverse tension specimen must reach: joint coefficient T × specified minimum of the parent (7.4.2; recalled). */
import type { BaseMetal, WeldingVariables } from '../../schemas/welding.ts'
import { materialGroup, secondMember, siFigure } from '../common/iso-names.ts'
import { tidy } from '../common/reading.ts'

export type Ageing = 'natural' | 'artificial' | null
/** `T4`, `T5`, `T6` of a temper such as T651; `O`; null for others and where none is recorded. */
export type Temper = 'O' | 'T4' | 'T5' | 'T6' | null

export function temperOf(condition: string | null | undefined): Temper {
  const text = (condition ?? '').trim().toUpperCase()
  if (/^O(?:$|[^A-Z])/.test(text)) return 'O'
  const digit = /^T([456])/.exec(text)?.[1]
  return digit === '4' ? 'T4' : digit === '5' ? 'T5' : digit === '6' ? 'T6' : null
}

export interface Coefficient { T: number; of: string; temper: readonly Temper[] }

/** T and the temper whose specified minimum it multiplies; null where the table has no entry. */
export function jointCoefficient(group: string, temper: Temper, ageing: Ageing): Coefficient | null {
  if (/^2[12](?:\.|$)/.test(group)) return { T: 1, of: 'the annealed condition', temper: ['O'] }
  if (ageing === null) return null
  const of = (T: number, ...tempers: Temper[]): Coefficient => ({ T, of: tempers.join(' or '), temper: tempers })
  if (group === '23.1') {
    if (temper === 'T4') return of(0.7, ageing === 'natural' ? 'T4' : 'T6')
    if (temper === 'T5' || temper === 'T6') return of(ageing === 'natural' ? 0.6 : 0.7, temper)
  }
  if (group === '23.2') {
    if (temper === 'T4' && ageing === 'natural') return of(0.95, 'T4')
    if (temper === 'T6') return of(0.75, 'T6')
  }
  return null
}

/** What is required of the weld: `sure` where the record's own minimum is that of the wanted temper; else a bound or why not. */
export type Required = { value: number; how: string; bound: boolean } | { why: string; field: string }

function ofMember(metal: BaseMetal, ageing: Ageing, name: 'a' | 'b'): Required {
  const group = materialGroup(metal)
  const minimum = siFigure(metal.minTensile, 'stress')
  const at = `variables.baseMetals.${name}`
  if (!group) return { why: 'The ISO/TR 15608 group of the parent metal isn\'t recorded.', field: `${at}.iso15608` }
  if (minimum === null) return { why: 'The specified minimum strength of the parent metal isn\'t recorded.', field: `${at}.minTensile` }
  if (group.main === 23 && group.sub === null) return { why: 'The sub-group of the parent metal isn\'t recorded: 23.1 and 23.2 have coefficients of their own.', field: `${at}.iso15608` }
  const temper = temperOf(metal.condition)
  const hardening = group.main === 23
  if (hardening && !metal.condition) return { why: 'The temper of the parent metal isn\'t recorded.', field: `${at}.condition` }
  if (hardening && ageing === null) return { why: 'Whether the test piece was naturally or artificially aged isn\'t recorded.', field: 'variables.pwht.ageing' }
  const coefficient = jointCoefficient(group.text, temper, ageing)
  if (!coefficient) return { why: `For group ${group.text}${metal.condition ? ` in ${metal.condition}` : ''} the design specification sets the strength.`, field: `${at}.condition` }
  const value = tidy(coefficient.T * minimum)
  const how = `${coefficient.T} times ${minimum} MPa`
  // A work-hardened or aged temper is specified no weaker than the annealed one: reaching its minimum is more than enough.
  if (coefficient.temper.includes(temper)) return { value, how: `${how}, the minimum of ${coefficient.of}`, bound: false }
  if (coefficient.of === 'the annealed condition') return { value, how: `${how}; the minimum of the annealed condition, which counts, isn't recorded`, bound: true }
  return { why: `It counts against ${coefficient.T} times the minimum of ${coefficient.of}, which isn't recorded beside that of ${metal.condition ?? 'the parent'}.`, field: `${at}.minTensile` }
}

/** The weaker of both members. */
export function requiredStrength(variables: WeldingVariables): Required {
  const ageing = variables.pwht.ageing ?? null
  const a = ofMember(variables.baseMetals.a, ageing, 'a')
  const b = ofMember(secondMember(variables), ageing, 'b')
  if ('why' in a) return a
  if ('why' in b) return b
  const weaker = a.value <= b.value ? a : b
  return { ...weaker, bound: a.bound || b.bound }
}

/** Elongation at or below which the specimen is annealed first (7.4.3; recalled). */
const ANNEAL = 5

/** Bend former: 100·ts/A − ts; null where the parent must be annealed first. @param A specified minimum elongation, % */
export const formerDiameter = (ts: number, A: number): number | null => (A <= ANNEAL ? null : tidy((100 * ts) / A - ts))
