/** Whether a tension specimen is accepted (QW-153): the stress against the specified minimum of the base metal as welded. */
import type { Basis, TestVerdict } from '../../schemas/assessment.ts'
import type { Quantity } from '../../schemas/common.ts'
import type { BaseMetal, TensionTest, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { inUnitOf, tidy, unitOf } from '../common/reading.ts'
import { pFamily, pNumber, secondMetal } from './members.ts'
import { FIGURES } from './ranges.ts'

/** Five per cent below the specified minimum is allowed for a break in the base metal only (QW-153.1(d); read). */
const BASE_METAL_BREAK = 0.95

/** How far a reported stress may lie from load over area before somebody must look (practice of reviewers; a rounding of the area stays inside). */
const AGREES = 0.01

/** Area of a tension specimen in mm²; null when its measures aren't recorded. */
export function specimenArea(test: TensionTest): number | null {
  if (test.kind === 'turned' || (test.diameter && !test.width)) return test.diameter && test.diameter.si > 0 ? (Math.PI * test.diameter.si ** 2) / 4 : null
  return test.width && test.thickness && test.width.si > 0 && test.thickness.si > 0 ? test.width.si * test.thickness.si : null
}

/** Stress from maximum load and least area, MPa; null when a figure is missing. */
export function computedStress(test: TensionTest): number | null {
  const area = specimenArea(test)
  return area === null || !test.load || test.load.si < 0 ? null : tidy((test.load.si * 1000) / area)
}

/**
 * Welded strength that the table of base metals gives whatever the temper (secondary, as noted in the library's rows): beside the
 * weld the metal keeps less than the unwelded plate.
 */
const AS_WELDED: Readonly<Record<string, { SI: number; US: number }>> = { '6061': { SI: 165, US: 24 }, '6063': { SI: 115, US: 17 } }

/** Steps in which strengths are printed: the other system's figure is the nearest of them. */
const STEP = { SI: 5, US: 1 } as const

/** A minimum in the judging system: one figure, or two between which it can't be told; `unwelded` where only the temper's is known. */
interface Minimum { low: number; high: number; how: string; basis: Basis; unwelded: boolean }

const rounded = (value: number, system: UnitSystem): string => `${Math.round(value * 10) / 10} ${unitOf('stress', system)}`
export const stressText = (mpa: number, system: UnitSystem): string => rounded(inUnitOf(mpa, 'stress', system), system)

/** A temper got by work or heat (H1…, T1…), which welding takes away. */
const TEMPER = /(?:^|[-\s])(?:T[1-9]\d*|H[1-9]\d*)\b/i

/** Aluminium by P-Number 21 to 26, or by its name where it has none. */
function aluminium(metal: BaseMetal): boolean {
  const p = pNumber(metal)
  if (p !== null) return pFamily(p) >= 21 && pFamily(p) <= 26
  return /^(?:A9\d{4}|(?:EN )?AW-?\d{4})/i.test(metal.uns?.trim() ?? '') || /^(?:EN )?AW-?\d{4}/i.test(metal.grade?.trim() ?? '')
}

/** Alloy number of an aluminium grade: `6061-T6`, `EN AW-6061 T6`, `A96061` → 6061. */
const alloyOf = (metal: BaseMetal): string | null => /(?:^|A9|AW-?|\s)(\d{4})(?!\d)/i.exec(`${metal.grade ?? ''} ${metal.uns ?? ''}`)?.[1] ?? null

/** A figure stated in the judging system stands; one copied from the other system is known only to within its rounding. */
function inSystem(stated: Quantity, system: UnitSystem): { low: number; high: number } {
  const value = tidy(inUnitOf(stated.si, 'stress', system))
  const own = stated.unit === 'MPa' || stated.unit === 'N/mm²' ? 'SI' : 'US'
  if (own === system) return { low: value, high: value }
  const printed = Math.round(value / STEP[system]) * STEP[system]
  return { low: Math.min(value, printed), high: Math.max(value, printed) }
}

function minimumOf(metal: BaseMetal, system: UnitSystem): Minimum | null {
  const stated = metal.minTensile
  const tempered = aluminium(metal) && (TEMPER.test(metal.grade ?? '') || TEMPER.test(metal.condition ?? ''))
  const alloy = tempered && pNumber(metal) === '23' ? alloyOf(metal) : null
  const welded = alloy === null ? undefined : AS_WELDED[alloy]
  if (alloy !== null && welded) {
    const notThat = stated && stated.si > welded.SI + 1 ? `, not the ${stressText(stated.si, system)} of the unwelded temper` : ''
    return { low: welded[system], high: welded[system], how: ` (the welded strength of ${alloy}${notThat})`, basis: 'secondary', unwelded: false }
  }
  return stated ? { ...inSystem(stated, system), how: '', basis: 'read', unwelded: tempered } : null
}

/** Specified minimum tensile strength that counts: of the weaker metal; null when one isn't recorded. */
export function requiredStrength(variables: WeldingVariables): Minimum | null {
  const a = minimumOf(variables.baseMetals.a, variables.unitSystem)
  const b = minimumOf(secondMetal(variables), variables.unitSystem)
  if (a === null || b === null) return null
  const [weaker, other] = a.high <= b.high ? [a, b] : [b, a]
  return { ...weaker, low: Math.min(a.low, b.low), unwelded: weaker.unwelded || other.unwelded }
}

/**
 * How many tension tests the specimens make (QW-151; read 2010 and 2021). Over 25 mm (1 in.) several part-thickness specimens that together
 * represent the thickness are one test. Saw and machine take some of it away and no figure is known for that, so a set counts as soon
 * as no further specimen like its thinnest would have fitted.
 * @param T thickness of the coupon in the unit of `system`
 * @returns the tests, and the marks of specimens that are left without a full set
 */
export function tensionTests(specimens: readonly TensionTest[], T: number, system: UnitSystem): { tests: number; left: string[] } {
  const size = (test: TensionTest): number | null => (test.kind === 'reduced-section' && test.thickness && test.thickness.si > 0 ? inUnitOf(test.thickness.si, 'length', system) : null)
  const isPart = (test: TensionTest): boolean => T > FIGURES[system].tensionSets && (size(test) ?? T) <= T / 2
  let tests = specimens.filter((test) => !isPart(test)).length
  let set: TensionTest[] = []
  let represented = 0
  for (const test of specimens.filter(isPart).sort((a, b) => (size(b) ?? 0) - (size(a) ?? 0))) {
    set.push(test)
    represented += size(test) ?? 0
    if (T - represented >= (size(test) ?? 0)) continue
    tests += 1
    set = []
    represented = 0
  }
  return { tests, left: set.map(({ specimen }) => specimen) }
}

/** Load and area give another stress than the one reported, by more than 1 % (QW-152): the stress computed and the one reported, MPa; null where they agree or one is missing. */
export function stressDisagrees(test: TensionTest): { computed: number; reported: number } | null {
  const computed = computedStress(test)
  const reported = test.reportedStrength?.si
  if (computed === null || reported === undefined || Math.abs(reported - computed) <= AGREES * computed) return null
  return { computed, reported }
}

/** Judges one tension specimen; the stress is computed from load and area, the reported one only where the measures are missing. */
export function judgeTension(test: TensionTest, variables: WeldingVariables): TestVerdict {
  const system = variables.unitSystem
  const minimum = requiredStrength(variables)
  const base = { testId: test.id, specimen: test.specimen, clause: 'QW-153.1', basis: minimum?.basis ?? ('read' as const) }
  const computed = computedStress(test)
  const mpa = computed ?? test.reportedStrength?.si ?? null
  const shown = computed === null ? null : { label: 'Stress from load and area', value: tidy(inUnitOf(computed, 'stress', system)), unit: unitOf('stress', system) }
  const cannot = (sentence: string): TestVerdict => ({ ...base, verdict: 'cannot-tell', sentence, computed: shown })
  if (mpa === null) return cannot(`${test.specimen} has neither load and size nor a reported strength.`)
  const reached = `${test.specimen} reached ${stressText(mpa, system)}`
  if (minimum === null) return cannot(`${reached}, but the specified minimum strength of the base metal isn't recorded.`)
  const stress = tidy(inUnitOf(mpa, 'stress', system))
  const needs = rounded(minimum.high, system)
  const asPrinted = `the minimum is recorded in the other system of units and comes to ${rounded(minimum.low, system)} or ${needs}; record it in ${unitOf('stress', system)} as your edition prints it`
  if (stress >= minimum.high) return { ...base, verdict: 'pass', sentence: `${reached} (${computed === null ? 'as reported' : 'from load and area'}); at least ${needs} is required${minimum.how}.`, computed: shown }
  if (minimum.unwelded) return cannot(`${reached}. The ${needs} recorded is the strength of the unwelded temper, which metal beside a weld does not keep; whether the weld is strong enough takes the minimum that your edition gives for the welded alloy, which isn't known here.`)
  if (stress >= minimum.low) return cannot(`${reached}: ${asPrinted}.`)
  const [low, high] = [tidy(BASE_METAL_BREAK * minimum.low), tidy(BASE_METAL_BREAK * minimum.high)]
  if (stress >= low) {
    if (test.fracture === null) return cannot(`${reached}, under the ${needs} required; it passes only if it broke in the base metal, and where it broke isn't recorded.`)
    // Outside weld and interface: only a break in the base metal is surely that.
    if (test.fracture === 'base-metal') {
      if (stress < high) return cannot(`${reached} and broke in the base metal: ${asPrinted}.`)
      return { ...base, clause: 'QW-153.1(d)', verdict: 'pass', sentence: `${reached} and broke in the base metal, where down to ${rounded(high, system)} (5 % under ${needs}) is accepted${minimum.how}.`, computed: shown }
    }
    if (test.fracture === 'heat-affected-zone') return cannot(`${reached} and broke in the heat-affected zone; whether that is base metal outside weld and interface must be judged by a person.`)
  }
  return { ...base, verdict: 'fail', sentence: `${reached}; ${test.fracture === 'base-metal' ? `even in the base metal at least ${rounded(low, system)}` : `at least ${needs}`} is required${minimum.how}.`, computed: shown }
}
