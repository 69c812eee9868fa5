/** Results of tests that ISO 15614-1 and -2 judge alike: tension, bends, macro sections, impact sets, non-destructive tests. Figures in SI. */
import type { AssessedCoupon, Basis, SpecimenRequirement, TestVerdict } from '../../schemas/assessment.ts'
import type { BendTest, CouponContent, NdtTest, TensionTest } from '../../schemas/welding.ts'
import type { Rule } from '../rule.ts'
import { couponRanges as rangesOf, type CouponRange, type Missing } from './coupon-ranges.ts'
import { siFigure } from './iso-names.ts'
import { fieldWords, lowerFirst } from './lacking.ts'
import { tidy } from './reading.ts'
import { show } from './wording.ts'

export type { Missing }
type Reference = Pick<TestVerdict, 'clause' | 'basis'>

/** Stress from maximum load and least area, MPa; null when a measure is missing. */
export function stressOf(test: TensionTest): number | null {
  const d = test.diameter?.si ?? 0
  const round = test.kind === 'turned' || (d > 0 && !test.width)
  const area = round ? (Math.PI * d ** 2) / 4 : (test.width?.si ?? 0) * (test.thickness?.si ?? 0)
  return area > 0 && test.load && test.load.si >= 0 ? tidy((test.load.si * 1000) / area) : null
}

/** Retest of a destructive specimen (7.6; recalled). */
const RETEST = ' If only an imperfection of the weld made it fail, two more specimens may be tested for it, and both must pass (7.6).'

const mpa = (value: number): string => `${Math.round(value * 10) / 10} MPa`

/** One transverse tension specimen against the least strength required. @param required MPa, or why it isn't known */
export function judgeTension(test: TensionTest, required: { value: number; how: string } | { why: string; clause?: string }, reference: Reference): TestVerdict {
  const computed = stressOf(test)
  const stress = computed ?? siFigure(test.reportedStrength, 'stress')
  const base = { testId: test.id, specimen: test.specimen, ...reference, computed: computed === null ? null : { label: 'Stress from load and area', value: computed, unit: 'MPa' } }
  if (stress === null) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen} has neither load and size nor a reported strength.` }
  if ('why' in required) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen} reached ${mpa(stress)}. ${required.why}` }
  const passed = stress >= required.value
  return { ...base, verdict: passed ? 'pass' : 'fail', sentence: `${test.specimen} reached ${mpa(stress)}${computed === null ? ' (as reported)' : ''}; at least ${mpa(required.value)} is required (${required.how}).${passed ? '' : RETEST}` }
}

const FLAW = 3

/** One bend: no single flaw above 3 mm in any direction; corner flaws are ignored unless they come from lack of fusion, slag or the like. */
export function judgeBend(test: BendTest, reference: Reference): TestVerdict {
  const base = { testId: test.id, specimen: test.specimen, ...reference, computed: null }
  if (test.broke) return { ...base, verdict: 'fail', sentence: `${test.specimen} broke.${RETEST}` }
  const sizes = test.openings.filter(({ corner, fromInternalFlaw }) => !corner || fromInternalFlaw === true).map(({ size }) => tidy(size.si))
  const largest = Math.max(0, ...sizes)
  if (largest > FLAW) return { ...base, verdict: 'fail', sentence: `${test.specimen} has a flaw of ${show(largest, 'mm')}, above the ${FLAW} mm allowed.${RETEST}` }
  const bent = siFigure(test.angle, 'angle')
  if (bent !== null && bent < 180) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen} was bent to ${show(bent, '°')}; 180° is asked.` }
  if (!test.inspected && test.openings.length === 0) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen} has no inspection recorded.` }
  return { ...base, verdict: 'pass', sentence: largest > 0 ? `${test.specimen}: the largest flaw is ${show(largest, 'mm')}, not above ${FLAW} mm.` : `${test.specimen} shows no flaw that counts.` }
}

export function judgeMacro(test: CouponContent['macros'][number], reference: Reference): TestVerdict {
  const base = { testId: test.id, specimen: test.specimen, ...reference, computed: null }
  if (test.cracks === true) return { ...base, verdict: 'fail', sentence: `${test.specimen} shows a crack.${RETEST}` }
  if (test.fusionComplete === false) return { ...base, verdict: 'fail', sentence: `${test.specimen} shows incomplete fusion.${RETEST}` }
  if (test.cracks === null || test.fusionComplete === null) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen}: fusion and cracks aren't both recorded.` }
  return { ...base, verdict: 'pass', sentence: `${test.specimen}: fusion complete, no cracks; other imperfections are judged on the section by the quality level.` }
}

const METHOD: Readonly<Record<NdtTest['method'], string>> = { VT: 'Visual testing', RT: 'Radiographic testing', UT: 'Ultrasonic testing', PT: 'Penetrant testing', MT: 'Magnetic particle testing' }

export function judgeNdt(test: NdtTest, level: string, reference: Reference): TestVerdict {
  const base = { testId: test.id, specimen: METHOD[test.method], ...reference, computed: null }
  if (test.accepted === null) return { ...base, verdict: 'cannot-tell', sentence: `${METHOD[test.method]} has no result recorded.` }
  return test.accepted ? { ...base, verdict: 'pass', sentence: `${METHOD[test.method]} was accepted by ${level}.` } : { ...base, verdict: 'fail', sentence: `${METHOD[test.method]} was not accepted. One more test piece may be welded and examined alike; if it fails too, the test has failed (7.6).` }
}

/** Share of the full 10 mm width that a specimen marked `10 x 7.5` has; null where the size isn't recorded. */
export function widthShare(size: string | null): number | null {
  const figures = [...(size ?? '').matchAll(/\d+(?:[.,]\d+)?/g)].map(([text]) => Number(text.replace(',', '.'))).filter((value) => value > 0 && value <= 10)
  return figures.length === 0 ? null : Math.min(...figures) / 10
}

/**
 * An impact set: mean not below the required energy, at most one value below it and that not below 70 %. Six values are a set with its retest:
 * the mean of all six counts. Reduced specimens: the requirement is taken in proportion to the width only where the record's own requirement says so,
 * so a set that passes only in proportion can't be told.
 */
export function judgeImpact(test: CouponContent['toughness'][number], required: number | null, requiredAt: number | null, reference: Reference): TestVerdict {
  const label = `Impact set, ${test.place === 'weld' ? 'weld' : 'heat-affected zone'}`
  const values = test.values.map(({ si }) => tidy(si))
  const mean = values.length === 0 ? null : tidy(values.reduce((a, b) => a + b, 0) / values.length)
  const base = { testId: test.id, specimen: label, ...reference, computed: mean === null ? null : { label: 'Mean energy', value: meanShown(mean, required), unit: 'J' } }
  const cannot = (sentence: string): TestVerdict => ({ ...base, verdict: 'cannot-tell', sentence })
  if (mean === null || values.length < 3) return cannot(`${label} has ${values.length} of 3 values.`)
  if (values.length > 3 && values.length < 6) return cannot(`${label} has ${values.length} values; a set has three, with its retest six.`)
  if (required === null) return cannot(`${label}: mean ${show(meanShown(mean, null), 'J')}, but the required energy isn't recorded.`)
  const at = siFigure(test.temperature, 'temperature')
  if (requiredAt !== null && at !== null && at > requiredAt) return cannot(`${label} was tested at ${show(at, '°C')}, warmer than the ${show(requiredAt, '°C')} required.`)
  const share = widthShare(test.size) ?? 1
  const full = verdictOf(values, mean, required)
  if (full === null) return { ...base, verdict: 'pass', sentence: `${label}: mean ${show(meanShown(mean, required), 'J')} against ${show(required, 'J')} required, lowest ${show(Math.min(...values), 'J')}.` }
  if (share < 1 && verdictOf(values, mean, required * share) === null) return cannot(`${label}: mean ${show(meanShown(mean, required), 'J')} on reduced specimens passes only if the required ${show(required, 'J')} is taken in proportion to the width (${show(tidy(required * share), 'J')}); the application standard decides that.`)
  const retest = values.length === 3 && values.filter((value) => value < 0.7 * required).length <= 1 ? ' Three more specimens may be tested; the mean of all six must then reach it (7.6).' : ''
  return { ...base, verdict: 'fail', sentence: `${label}: ${full}.${retest}` }
}

/** A mean as it is told: to a tenth, unless that would put it on the other side of what is required. */
const meanShown = (mean: number, required: number | null): number => {
  const tenth = Math.round(mean * 10) / 10
  return required !== null && mean < required !== tenth < required ? mean : tenth
}

/** What is wrong with a set, or null. */
function verdictOf(values: readonly number[], mean: number, required: number): string | null {
  if (mean < tidy(required)) return `mean ${show(meanShown(mean, required), 'J')} is below the ${show(tidy(required), 'J')} required`
  if (values.length > 3) return null
  const low = values.filter((value) => value < tidy(required))
  if (low.length > 1) return `${low.length} values are below the ${show(tidy(required), 'J')} required`
  return low.some((value) => value < tidy(0.7 * required)) ? `the lowest value is below 70 % of the ${show(tidy(required), 'J')} required` : null
}

export const specimenRow = (kind: string, label: string, required: number, recorded: number, clause: string, basis: Basis, alternative: string | null = null): SpecimenRequirement => ({ kind, label, required, recorded, alternative, clause, basis })

const FIELD: Readonly<Record<string, string>> = { tension: 'tension', macro: 'macros', impact: 'toughness', hardness: 'hardness', visual: 'ndt', volumetric: 'ndt', surface: 'ndt' }

/** Rows that are not met yet. */
export const missingSpecimens = (rows: readonly SpecimenRequirement[]): Missing[] =>
  rows.filter(({ required, recorded }) => recorded < required).map((row) => ({ field: FIELD[row.kind] ?? 'bends', message: `${row.label}: ${row.required} required, ${row.recorded} recorded.`, clause: row.clause }))

const KINDS = ['tension', 'bends', 'macros', 'toughness', 'hardness', 'ndt'] as const

/** Results that did not pass, each beside its own record. */
export const missingResults = ({ content }: AssessedCoupon, results: readonly TestVerdict[]): Missing[] =>
  results.filter(({ verdict }) => verdict !== 'pass').map((result) => {
    const kind = KINDS.find((name) => (content[name] ?? []).some(({ id }) => id === result.testId))
    return { field: kind ? `${kind}.${(content[kind] ?? []).findIndex(({ id }) => id === result.testId)}` : 'tension', message: result.sentence, clause: result.clause }
  })

/** What the record itself lacks before it may be certified. */
export function missingFromRecord({ content }: AssessedCoupon, clause: string): Missing[] {
  const needs: readonly (readonly [present: unknown, field: string, message: string])[] = [
    [content.variables.thickness, 'variables.thickness', 'Record the thickness of the test piece.'],
    [content.weldedOn, 'weldedOn', 'Record the date of welding.'],
    [content.welder, 'welder', 'Name the welder who welded the test piece.'],
    [content.witness, 'witness', 'Name the examiner or examining body.'],
    [content.laboratory, 'laboratory', 'Name the laboratory that tested the specimens.'],
    [content.reportNumber, 'reportNumber', "Give the number of the laboratory's report."],
    ...content.variables.processes.map((block, i) => [block.process, `variables.processes.${i}.process`, 'State the welding process.'] as const),
  ]
  return needs.filter(([present]) => !present).map(([, field, message]) => ({ field, message, clause }))
}

/**
 * Every range that a coupon gives by itself. It is asked of plate and pipe alike, since a coupon of either covers some of the other; rules of the
 * weld as a whole give none.
 */
export const couponRanges = (coupon: AssessedCoupon, rules: readonly Rule[], edition: string, level: '1' | '2' | null): CouponRange[] => rangesOf({ coupon, rules: rules.flatMap(ofAnyProduct), role: 'full', edition, level })

function ofAnyProduct(rule: Rule): Rule[] {
  if (rule.meta.scope === 'weld') return []
  return [{ ...rule, applies: rule.applies && ((context) => rule.applies?.({ ...context, procedure: { ...context.procedure, product: 'plate-and-pipe' } }) ?? true) }]
}

const BLOCK_FIELD = /^(?:process|mechanisation|depositThickness|maxPassThickness|filler|positions|progression|shieldingGas|backingGas|plasmaGas|electrical|technique|passes)(?:\.|$)/

/** What the ranges lack, beside the field that lacks it. */
export function missingFromRanges(ranges: readonly CouponRange[], coupon: AssessedCoupon): Missing[] {
  const missing = new Map<string, Missing>()
  for (const range of ranges) {
    for (const text of range.missing) {
      if (!text.startsWith(`${coupon.number}: `)) continue
      const path = text.slice(coupon.number.length + 2)
      const place = path.split(' ')[0] ?? path
      const index = coupon.content.variables.processes.findIndex(({ id }) => id === range.processId)
      const field = BLOCK_FIELD.test(place) ? `variables.processes.${Math.max(0, index)}.${place}` : `variables.${place}`
      if (!missing.has(field)) missing.set(field, { field, message: `Record the ${fieldWords(place)}: the range of ${lowerFirst(range.label)} follows from it.`, clause: range.clause })
    }
  }
  return [...missing.values()]
}

/** Each field once: what is said first stands. */
export function once(rows: readonly Missing[]): Missing[] {
  const seen = new Set<string>()
  return rows.filter(({ field, message }) => {
    const key = `${field} ${message}`
    if (seen.has(key)) return false
    seen.add(key)
    return true
  })
}

