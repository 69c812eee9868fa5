/** Figures of 7.4 and Table 3: bend former, strength required, hardness limits, and where ultrasonic and magnetic tests may stand. */
import type { Basis, TestVerdict } from '../../schemas/assessment.ts'
import type { CouponContent, WeldingVariables } from '../../schemas/welding.ts'
import { materialGroup, secondMember, siFigure, type MaterialGroup } from '../common/iso-names.ts'
import { tidy } from '../common/reading.ts'
import type { Level } from './levels.ts'

/** Both members' groups, those that are recorded. */
export const groupsOf = (variables: WeldingVariables): MaterialGroup[] => [variables.baseMetals.a, secondMember(variables)].flatMap((metal) => materialGroup(metal) ?? [])

/** Lower of a figure of both members; null where one isn't recorded. */
function lower(variables: WeldingVariables, field: 'minTensile' | 'minElongation', dimension: 'stress' | 'percent'): number | null {
  const a = siFigure(variables.baseMetals.a[field], dimension)
  const b = siFigure(secondMember(variables)[field], dimension)
  return a === null || b === null ? null : Math.min(a, b)
}

/** Specified minimum strength that counts, of the weaker parent, MPa. */
export const requiredStrength = (variables: WeldingVariables): number | null => lower(variables, 'minTensile', 'stress')
/** Specified minimum elongation of the less ductile parent, per cent. */
export const leastElongation = (variables: WeldingVariables): number | null => lower(variables, 'minElongation', 'percent')

/** Bend former for a specimen of `ts` mm and a parent of `A` % minimum elongation (7.4.2; read 2004), mm. */
export const formerDiameter = (ts: number, A: number): number => tidy(A >= 20 ? 4 * ts : (100 * ts) / A - ts)

/** UT may not replace RT below 8 mm, nor for groups 8, 10 and 41 to 48 (Table 2 footnote; recalled); null where thickness or group isn't recorded. */
export function ultrasonicAllowed(t: number | null, groups: readonly MaterialGroup[]): boolean | null {
  if (t !== null && t < 8) return false
  if (groups.some(({ main }) => main === 8 || main === 10 || (main >= 41 && main <= 48))) return false
  return t === null || groups.length === 0 ? null : true
}

/** Non-magnetic: only penetrant testing tells. */
export const isNonMagnetic = (groups: readonly MaterialGroup[]): boolean => groups.some(({ main }) => main === 8 || (main >= 41 && main <= 48))

/** Highest HV10 that passes, and up to which a second reading would pass; null where the table prints none. */
export interface HardnessLimit { sure: number; maybe: number; why?: string; basis: Basis }

/** Table 3 (level 2; recalled). @param yieldStrength specified minimum, MPa */
export function hardnessLimit({ main, sub }: MaterialGroup, heatTreated: boolean, yieldStrength: number | null): HardnessLimit | null {
  const flat = (value: number): HardnessLimit => ({ sure: value, maybe: value, basis: 'memory' })
  if (main === 2 && !heatTreated && yieldStrength !== null && yieldStrength >= 960) return { sure: 380, maybe: Infinity, why: 'For direct-quenched steels of 960 MPa and more the limit is an open question.', basis: 'memory' }
  if (main === 1 || main === 2) return flat(heatTreated ? 320 : 380)
  if (main === 3) {
    if (yieldStrength !== null && yieldStrength > 890) return { sure: 0, maybe: Infinity, why: 'Above 890 MPa yield the values are agreed.', basis: 'memory' }
    return flat(heatTreated ? 380 : 450)
  }
  if (main === 4 || main === 5) return heatTreated ? { sure: 320, maybe: 350, why: '320 in the 2004 edition, 350 as 2017 is recalled.', basis: 'memory' } : flat(380)
  if (main === 6) return heatTreated ? flat(350) : null
  if (main === 9 && sub === 1) return flat(heatTreated ? 300 : 350)
  return main === 9 && sub !== null ? flat(heatTreated ? 350 : 450) : null
}

/** Judges HV10 results against the limits of both parents: passed by the stricter, failed only above the milder. */
export function judgeHardness(test: CouponContent['hardness'][number], variables: WeldingVariables, level: Level): TestVerdict {
  const top = test.values.length === 0 ? null : Math.max(...test.values)
  const place = test.place.replaceAll('-', ' ')
  const base = { testId: test.id, specimen: `Hardness, ${place}`, clause: '7.4.5 Table 3', basis: 'memory' as const, computed: top === null ? null : { label: 'Highest value', value: top, unit: test.scale } }
  const cannot = (sentence: string): TestVerdict => ({ ...base, verdict: 'cannot-tell', sentence })
  if (top === null) return cannot(`Hardness of the ${place} has no values recorded.`)
  if (test.scale !== 'HV10') return cannot(`The limits are HV10; ${test.scale} is recorded.`)
  if (variables.pwht.condition === null) return cannot('Whether the test piece was heat treated isn\'t recorded, and the limit depends on it.')
  const treated = variables.pwht.condition !== 'none'
  const pairs = [variables.baseMetals.a, secondMember(variables)].map((metal) => ({ group: materialGroup(metal), strength: siFigure(metal.minYield, 'stress') }))
  if (pairs.some(({ group }) => group === null)) return cannot('The ISO/TR 15608 group of the parent metal isn\'t recorded.')
  const limits = pairs.map(({ group, strength }) => (group ? hardnessLimit(group, treated, strength) : null))
  const known = limits.filter((limit) => limit !== null)
  const named = pairs.map(({ group }) => group?.text).filter((text, i, all) => all.indexOf(text) === i).join(' and ')
  if (known.length < limits.length) return cannot(`No limit is held here for group ${named}${treated ? '' : ', not heat treated'}; the highest is ${top}.`)
  const sure = Math.min(...known.map((limit) => limit.sure))
  const maybe = Math.max(...known.map((limit) => limit.maybe))
  if (top <= sure) return { ...base, verdict: 'pass', sentence: `The highest value of the ${place} is ${top} HV10; up to ${sure} is allowed for group ${named}, ${treated ? 'heat treated' : 'not heat treated'}.` }
  if (top <= maybe) return cannot(`The highest value is ${top} HV10, above the ${sure} that is sure. ${known.find((limit) => limit.why)?.why ?? 'The parents have different limits, and on which side it was measured isn\'t recorded.'}`)
  if (level === '1') return cannot(`The highest value is ${top} HV10, above the ${maybe} of level 2; at level 1 the application standard sets the limit.`)
  return { ...base, verdict: 'fail', sentence: `The highest value of the ${place} is ${top} HV10, above the ${maybe} allowed for group ${named}. Single high values may be checked by further indents, none of which may exceed it (7.6).` }
}
