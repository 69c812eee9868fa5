/** Figures 5.1 and 5.2: the groove meets a prequalified detail. */
import { fieldWords } from '../../common/lacking.ts'
import { cannotTell, list } from '../../common/wording.ts'
import { details, readDesignation } from './joint-details.ts'
import { matchDetail } from './match-detail.ts'
import { condition } from './meta.ts'
import { FOUR, says } from './verdict.ts'

export const pqJoint = condition({
  file: 'joint-detail', title: 'Prequalified joint detail', clause: 'Fig. 5.1', basis: 'memory', field: 'joint.groove', at: 'weld', more: FOUR,
  source: 'Figures 5.1 and 5.2 as far as they were read or quoted; the list kept here is not complete (double bevels with spacer among others are missing), drawing tolerances of partial-penetration details are recalled, and where SMAW details serve GMAW and FCAW is not kept',
  statement: 'A groove meets a prequalified detail in thickness, root opening, root face, groove radius, angle, backing or backgouging, position and gas; none is for short-circuiting GMAW. A single value is held to the tolerance for drawings, a range also to that of fit-up. A groove that fits no detail kept here is "cannot tell" unless its own designation is kept and it misses it.',
  applies: (context) => context.procedure.joint.weld === 'groove',
  check(context, block) {
    const { joint } = context.procedure
    const clause = joint.penetration === 'partial' ? 'Fig. 5.2' : 'Fig. 5.1'
    const designation = joint.designation?.trim() ?? ''
    if (designation !== '') {
      const read = readDesignation(designation)
      const field = 'joint.designation'
      if (!read) return cannotTell(`${designation} can't be read as a designation of a joint detail.`, ['procedure: joint.designation'], { field, clause })
      if (read.penetration !== joint.penetration || (joint.groove !== null && read.groove !== joint.groove) || !read.joints.includes(joint.type)) return says('outside', `${designation} is a ${list(read.joints, 'or')} joint with a ${read.groove.replace('-', ' ')} groove and ${read.penetration} penetration, which the joint stated is not.`, { field, clause, asked: [designation] })
      if (block.process && !read.processes.includes(block.process)) {
        if (read.processes.includes('SMAW') && (block.process === 'GMAW' || block.process === 'FCAW')) return cannotTell(`${designation} is a detail for SMAW; it serves ${block.process} only where the figure says so, which must be looked up.`, ['note of the figure for this detail'], { field, clause, asked: [designation] })
        return says('outside', `${designation} is a detail for ${list(read.processes, 'and')}, not for ${block.process}.`, { field, clause, asked: [designation] })
      }
      if (!details.some(({ code }) => code === designation)) return cannotTell(`The dimensions of ${designation} are not kept here; look them up in the figure.`, [`dimensions of ${designation}`], { field, clause, asked: [designation] })
    }
    const match = matchDetail(context.procedure, block, context.system)
    const code = match.detail?.code ?? ''
    if (match.fits === 'yes') return says('within', `The groove meets ${code}.`, { clause, asked: [code], basis: match.detail?.basis ?? 'memory' })
    const field = match.misses[0]?.field ?? match.lacking[0] ?? 'joint.groove'
    const whole = (path: string): string => (/^(?:positions|shieldingGas|electrical)/.test(path) ? `${context.path}.${path}` : path)
    const full = whole(field)
    const misses = list(match.misses.map(({ sentence }) => sentence))
    if (match.fits === 'no' && designation !== '') return says('outside', `The groove does not meet ${designation}: ${misses}.`, { clause, field: full, asked: [designation], basis: match.detail?.basis ?? 'memory' })
    if (match.lacking.length > 0 && match.misses.length === 0) return cannotTell(`Whether the groove meets ${code || 'a prequalified detail'} can't be told; not stated: ${list(match.lacking.map((path) => `the ${fieldWords(whole(path))}`))}.`, match.lacking.map((path) => `procedure: ${path}`), { clause, field: full, fixes: match.lacking.map((path) => ({ kind: 'state' as const, label: 'State it', field: whole(path) })) })
    return cannotTell(match.detail ? `The groove fits no detail kept here; nearest is ${code}, but ${misses}. The list is not complete, so look the figure up or give the designation of the detail.` : 'No detail for such a groove and process is kept here; look the figure up or give the designation of the detail.', ['a prequalified detail that the groove meets'], { clause, field: full, fixes: [{ kind: 'state', label: 'Give the designation of the detail', field: 'joint.designation' }] })
  },
})
