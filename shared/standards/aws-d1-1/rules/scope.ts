/** What the standard is for: carbon and low-alloy steel from 3 mm (1/8 in.), specified yield not over 690 MPa (100 ksi). Judged by the procedure alone. */
import type { BaseMetal } from '../../../schemas/welding.ts'
import { figure, unitOf } from '../../common/reading.ts'
import { list, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { memberCures } from '../member-cures.ts'
import { ownMeta } from '../meta.ts'
import { FIGURES, lengthRange } from '../ranges.ts'
import { groupsOf, identity, members, systemOf } from '../steels.ts'

const YIELD = { SI: 690, US: 100 } as const

/** Groups of ISO/TR 15608 and M-Numbers that are no carbon or low-alloy steel: stainless, cast iron, aluminium, copper, nickel, titanium, zirconium. */
export function isOtherMetal({ iso15608, d12MNumber, pNumber }: BaseMetal): boolean {
  const group = Number(/^\d+/.exec(iso15608 ?? '')?.[0] ?? NaN)
  const p = Number(/^\d+/.exec(pNumber ?? '')?.[0] ?? NaN)
  return d12MNumber !== null || group === 7 || group === 8 || group === 10 || group >= 21 || (p >= 6 && p <= 8) || (p >= 10 && /^10H/i.test(pNumber ?? '')) || p >= 21
}

const fieldOf = (i: number, key: 'minYield' | 'specification'): string => `baseMetals.${i === 0 ? 'a' : 'b'}.${key}`

export const scope: Rule = {
  meta: ownMeta('scope', 'Scope of the standard', 'Clause 1', 'secondary', 'Inspection notices and a trade magazine on the lower thickness; kind of steel and limit of yield strength from memory', 'The base metal is carbon or low-alloy steel, at least 3 mm (1/8 in.) thick, with a specified yield strength of at most 690 MPa (100 ksi); thinner metal falls under the sheet steel code. A steel that is in no group kept here must have its yield strength stated.', { withoutCoupon: true, route: undefined }),
  field: 'thickness',
  at: 'weld',
  label: 'Scope of the standard',
  range: () => null,
  check(context) {
    const { system, procedure } = context
    const least = FIGURES[system].least
    const unit = unitOf('length', system)
    const both = members(procedure, system)
    const range = lengthRange(system, least, null)
    const other = both.findIndex(({ metal }) => isOtherMetal(metal))
    if (other >= 0) return { verdict: 'outside', sentence: `${identity(both[other]?.metal ?? procedure.baseMetals.a) ?? 'The base metal'} is not carbon or low-alloy steel, for which the standard is written.`, asked: null, range: null, basis: 'memory', field: fieldOf(other, 'specification') }
    if (procedure.joint.work === 'build-up') return { verdict: 'cannot-tell', sentence: 'Build-up welding is outside the rules kept here.', asked: null, range: null, missing: ['rules for build-up welding'], field: 'joint.work', basis: 'memory' }
    const lows = both.flatMap(({ thickness }) => thickness.min ?? thickness.max ?? [])
    if (both.some(({ thickness }) => thickness.all)) lows.push(0)
    const low = lows.length > 0 ? Math.min(...lows) : null
    if (low === null || both.some(({ thickness }) => thickness.fault)) return { verdict: 'cannot-tell', sentence: "The thickness isn't stated, so whether the standard is for it can't be told.", asked: null, range, missing: ['procedure: thickness'], fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] }
    const asked = { min: low, max: null }
    if (low < least) return { verdict: 'outside', sentence: `Metal of ${show(low, unit)} is thinner than the ${show(least, unit)} for which the standard is written.`, asked, range, fixes: memberCures(context, range, 'thickness') }
    const strong = both.flatMap(({ metal }, i) => (metal.minYield && figure(metal.minYield, 'stress', systemOf(metal.minYield)) > YIELD[systemOf(metal.minYield)] ? [{ had: metal.minYield, i }] : []))
    if (strong[0]) return { verdict: 'outside', sentence: `A specified yield strength of ${list([...new Set(strong.map(({ had }) => had.typed))])} is over the ${show(YIELD[system], unitOf('stress', system))} for which the standard is written.`, asked, range, basis: 'memory', field: fieldOf(strong[0].i, 'minYield') }
    const open = both.findIndex(({ metal, thickness }) => metal.minYield === null && groupsOf(metal, thickness, system) === null)
    if (open >= 0) {
      const field = fieldOf(open, 'minYield')
      return { verdict: 'cannot-tell', sentence: `${identity(both[open]?.metal ?? procedure.baseMetals.a) ?? 'The base metal'} is in no group kept here and its yield strength isn't stated, so whether the standard is for it can't be told.`, asked, range, missing: [`procedure: ${field}`], field, basis: 'memory', fixes: [{ kind: 'state', label: 'State the yield strength', field }] }
    }
    return { verdict: 'within', sentence: `${show(low, unit)} and more is a thickness for which the standard is written.`, asked, range }
  },
}
