/** What the standard is for: steel from 3 mm (1/8 in.), specified yield not over 690 MPa (100 ksi). Judged by the procedure alone. */
import { quantity } from '../../../units/convert.ts'
import { figure, unitOf } from '../../common/reading.ts'
import { list, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { ownMeta } from '../meta.ts'
import { FIGURES, lengthRange } from '../ranges.ts'
import { members, systemOf } from '../steels.ts'

const YIELD = { SI: 690, US: 100 } as const

export const scope: Rule = {
  meta: ownMeta('scope', 'Scope of the standard', 'Clause 1', 'secondary', 'Inspection notices and a trade magazine on the lower thickness; limit of yield strength from memory', 'The base metal is at least 3 mm (1/8 in.) thick and its specified yield strength is not over 690 MPa (100 ksi); thinner metal falls under the sheet steel code.', { withoutCoupon: true, route: undefined }),
  field: 'thickness',
  at: 'weld',
  label: 'Scope of the standard',
  range: () => null,
  check(context) {
    const { system, procedure } = context
    const least = FIGURES[system].least
    const unit = unitOf('length', system)
    const both = members(procedure, system)
    const lows = both.flatMap(({ thickness }) => thickness.min ?? thickness.max ?? [])
    if (both.some(({ thickness }) => thickness.all)) lows.push(0)
    const low = lows.length > 0 ? Math.min(...lows) : null
    const range = lengthRange(system, least, null)
    if (low === null || both.some(({ thickness }) => thickness.fault)) return { verdict: 'cannot-tell', sentence: "The thickness isn't stated, so whether the standard is for it can't be told.", asked: null, range, missing: ['procedure: thickness'], fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] }
    const asked = { min: low, max: null }
    if (low < least) return { verdict: 'outside', sentence: `Metal of ${show(low, unit)} is thinner than the ${show(least, unit)} for which the standard is written.`, asked, range, fixes: [{ kind: 'set', label: `Set the least thickness to ${show(least, unit)}`, field: 'thickness.min', value: quantity(least, 'length', unit) }] }
    const strong = both.flatMap(({ metal }) => (metal.minYield && figure(metal.minYield, 'stress', systemOf(metal.minYield)) > YIELD[systemOf(metal.minYield)] ? [metal.minYield] : []))
    if (strong.length > 0) return { verdict: 'outside', sentence: `A specified yield strength of ${list([...new Set(strong.map(({ typed }) => typed))])} is over the ${show(YIELD[system], unitOf('stress', system))} for which the standard is written.`, asked, range, basis: 'memory', field: 'baseMetals.a.minYield' }
    return { verdict: 'within', sentence: `${show(low, unit)} and more is a thickness for which the standard is written.`, asked, range }
  },
}
