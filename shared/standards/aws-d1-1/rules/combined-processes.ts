/** A test of several processes supports the same processes in the same order; dropping one isn't clearly covered. */
import { setRange } from '../../../ranges/set.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { cannotTell, list, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { ownMeta } from '../meta.ts'

/** Processes in the order in which they stand, each told once. */
const order = (variables: WeldingVariables): string[] => [...new Set(variables.processes.flatMap(({ process }) => process ?? []))]

export const combinedProcesses: Rule = {
  meta: ownMeta('combined-processes', 'Several processes in one test', 'Clause 6', 'secondary', 'Course advice to qualify one process with each test weld; the text does not clearly speak of it', 'A test weld of several processes supports a procedure with the same processes in the same order; whether it supports one of them alone can\'t be told.'),
  field: 'process',
  at: 'block',
  label: 'Processes of the test',
  applies: (context) => context.coupons.some(({ content }) => order(content.variables).length > 1),
  range(_context, side) {
    const had = order(side.variables)
    return had.length < 2 ? null : { range: setRange([had.join(', then ')]), tested: had.join(', then '), reason: 'The processes were tested together.' }
  },
  check(context, sides, joined) {
    const asked = order(context.procedure)
    const several = sides.filter((side) => order(side.variables).length > 1)
    if (several.length === 0) return null
    const shown = [asked.join(', then ')]
    if (several.every((side) => order(side.variables).join() === asked.join())) return { verdict: 'within', sentence: `${names(several)} was welded with ${shown[0] ?? ''}, as the procedure is.`, asked: shown, range: joined }
    return cannotTell(`${names(several)} was welded with ${list(several.map((side) => order(side.variables).join(', then ')))}; the procedure has ${shown[0] ?? ''}. Whether a test of several processes supports that is not clearly said.`, ['a ruling on tests of several processes'], { asked: shown, range: joined, fixes: [{ kind: 'plan-coupon', label: 'Weld one coupon a process', requirement: `A coupon welded with ${context.block?.process ?? 'the process'} alone.` }] })
  },
}
