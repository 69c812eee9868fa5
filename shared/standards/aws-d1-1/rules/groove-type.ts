/** Row 31: another groove type; a complete-penetration test covers every detail that meets the prequalified dimensions. */
import { namedRule } from '../../common/rule-kinds.ts'
import { fieldWords } from '../../common/lacking.ts'
import { list, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { asksGroove } from '../groove-measure.ts'
import { meta } from '../meta.ts'
import { matchDetail } from '../prequalified/match-detail.ts'
import { testKind } from '../ranges.ts'

const type = namedRule({
  meta: meta('groove_type'),
  field: 'joint.groove',
  at: 'weld',
  label: 'groove type',
  applies: asksGroove,
  asked: (context) => (context.procedure.joint.groove ? [context.procedure.joint.groove] : null),
  tested: (_context, side) => (side.variables.joint.weld === 'fillet' ? undefined : side.variables.joint.groove),
  because: 'A complete-penetration test covers every groove detail that meets the prequalified dimensions, else its own type.',
  setValue: (name) => name,
})

export const grooveType: Rule = {
  ...type,
  check(context, sides, joined) {
    const judged = type.check(context, sides, joined)
    if (judged?.verdict !== 'outside' || !context.block || !sides.some((side) => testKind(side.variables) === 'complete')) return judged
    const match = matchDetail(context.procedure, context.block, context.system)
    const complete = names(sides.filter((side) => testKind(side.variables) === 'complete'))
    if (match.fits === 'yes' && match.detail) return { ...judged, verdict: 'within', sentence: `The groove meets the prequalified dimensions of ${match.detail.code}, so the complete-penetration test of ${complete} covers it.`, basis: match.detail.basis === 'read' ? 'secondary' : match.detail.basis, fixes: [] }
    const why = match.misses.length > 0 ? `it does not fit the nearest detail kept here: ${list(match.misses.map(({ sentence }) => sentence))}` : match.lacking.length > 0 ? `the draft leaves open ${list(match.lacking.map((path) => `the ${fieldWords(path)}`))}` : 'no detail for such a groove is kept here'
    return { ...judged, verdict: 'cannot-tell', sentence: `The groove type is not that of ${complete}, which covers another type only where its detail meets the prequalified dimensions; ${why}.`, missing: match.lacking.length > 0 ? match.lacking.map((field) => `procedure: ${field}`) : ['a prequalified detail that the groove meets'] }
  },
}
