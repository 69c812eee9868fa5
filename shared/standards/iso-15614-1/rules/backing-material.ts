/** 8.3.1: permanent backing counts as parent material. */
import { sameText } from '../../common/reading.ts'
import { cannotTell, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

/** Permanent backing counts as parent material (8.3.1); a record names it in words only. */
export const backingMaterial: Rule = {
  meta: meta('backing-material', { title: 'Backing material', clause: '8.3.1', basis: 'secondary', statement: 'Permanent backing counts as parent material and must be of a covered group. A record names it in words, so it is compared with the coupon\'s words and with the names of the parent metals.' }),
  field: 'joint.backingMaterial',
  at: 'weld',
  label: 'Backing material',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.procedure.joint.backing === 'metal',
  range: () => null,
  check(context, sides) {
    const { joint, baseMetals } = context.procedure
    if (joint.weld !== 'groove' || joint.backing !== 'metal') return null
    const text = joint.backingMaterial
    if (text === null) return cannotTell("The backing material isn't stated; permanent backing counts as parent material.", ['procedure: joint.backingMaterial'], { fixes: [{ kind: 'state', label: 'State the backing material', field: 'joint.backingMaterial' }] })
    const told = sameText(text)
    const known = [...sides.flatMap((side) => side.variables.joint.backingMaterial ?? []), ...[baseMetals.a, baseMetals.b].flatMap((metal) => [metal.grade, metal.iso15608 && `group ${metal.iso15608}`].flatMap((name) => name ?? []))]
    if (known.some((name) => told === sameText(name) || (name.length > 3 && told.includes(sameText(name))))) return { verdict: 'within', sentence: `Backing of ${text} is the coupon's or the parent metal's own.`, asked: [text], range: null }
    return cannotTell(`Backing of ${text} is neither that of ${names(sides)} nor named as the parent metal. If it stays in place its group must be covered; if it is removed, say so.`, ['the ISO/TR 15608 group of the backing, or that it is removed'], { asked: [text] })
  },
}
