/** Row 34: backing or backgouging left out; adding it is free. */
import { setRange } from '../../../ranges/set.ts'
import type { Joint } from '../../../schemas/welding.ts'
import { cannotTell, list, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

/** Whether the joint has each; null when it isn't said. */
const has = ({ backing, backGouging }: Joint): { backing: boolean | null; gouged: boolean | null } => ({ backing: backing === null ? null : backing !== 'none', gouged: backGouging === null ? null : backGouging !== 'none' })
const WORDS = { backing: 'backing', gouged: 'backgouging' } as const
const FIELD = { backing: 'backing', gouged: 'backGouging' } as const

export const backing: Rule = {
  meta: meta('backing_backgouging'),
  field: 'joint.backing',
  at: 'weld',
  label: 'Backing and backgouging',
  applies: (context) => context.procedure.joint.weld === 'groove',
  range(_context, side) {
    if (side.variables.joint.weld === 'fillet') return null
    const had = has(side.variables.joint)
    const told = (['backing', 'gouged'] as const).filter((key) => had[key] === true).map((key) => `with ${WORDS[key]}`)
    const unknown = had.backing === null || had.gouged === null
    return { range: setRange(told.length > 0 ? told : unknown ? [] : ['with or without backing and backgouging'], { unknown }), tested: told.length > 0 ? list(told) : unknown ? null : 'neither', reason: told.length > 0 ? `${side.coupon.number} was welded ${list(told)}, which may not be left out.` : 'Nothing was used that could be left out.', ...(unknown ? { missing: (['backing', 'gouged'] as const).filter((key) => had[key] === null).map((key) => `${side.coupon.number}: joint.${FIELD[key]}`) } : {}) }
  },
  check(context, sides, joined) {
    const asked = has(context.procedure.joint)
    const words = (['backing', 'gouged'] as const).filter((key) => asked[key] === true).map((key) => `with ${WORDS[key]}`)
    const shown = words.length > 0 ? words : ['without backing and backgouging']
    const missing: string[] = []
    for (const side of sides) {
      if (side.variables.joint.weld === 'fillet') continue
      const had = has(side.variables.joint)
      const dropped = (['backing', 'gouged'] as const).filter((key) => had[key] === true && asked[key] === false)
      const first = dropped[0]
      if (first) {
        const replaced = first === 'backing' ? asked.gouged === true : asked.backing === true
        if (replaced) return cannotTell(`${names([side])} was welded with ${WORDS[first]}; the procedure leaves it out and uses ${first === 'backing' ? 'backgouging' : 'backing'} instead, which the row does not clearly speak of.`, ['a reading of row 34 for one in place of the other'], { asked: shown, range: joined, field: `joint.${FIELD[first]}` })
        return { verdict: 'outside', sentence: `${names([side])} was welded with ${WORDS[first]}, which the procedure leaves out.`, asked: shown, range: joined, field: `joint.${FIELD[first]}`, fixes: [{ kind: 'plan-coupon', label: `Weld a coupon without ${WORDS[first]}`, requirement: `A groove coupon welded without ${WORDS[first]}.` }] }
      }
      for (const key of ['backing', 'gouged'] as const) {
        if (had[key] === null && asked[key] !== true) missing.push(`${side.coupon.number}: joint.${FIELD[key]}`)
        else if (had[key] === true && asked[key] === null) missing.push(`procedure: joint.${FIELD[key]}`)
      }
    }
    if (missing.length > 0) {
      const field = missing.some((text) => text.startsWith('procedure')) ? (missing.find((text) => text.startsWith('procedure')) ?? '').replace('procedure: ', '') : 'joint.backing'
      return cannotTell("Whether backing or backgouging is left out can't be told: it isn't stated on both sides.", [...new Set(missing)], { asked: shown, range: joined, field, fixes: [{ kind: 'state', label: 'State backing and backgouging', field }] })
    }
    return { verdict: 'within', sentence: `Nothing that ${names(sides)} had is left out.`, asked: shown, range: joined }
  },
}
