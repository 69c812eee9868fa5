/** Row 1: a filler metal of a higher strength class than tested; a lower class is free. The GMAW column isn't confirmed. */
import { namedRule } from '../../common/rule-kinds.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { strengthClass } from '../fillers.ts'
import { meta } from '../meta.ts'

const CLASSES = [60, 70, 80, 90, 100, 110, 120]
const name = (ksi: number): string => `${ksi} ksi class`

const base = namedRule({
  meta: meta('filler_strength'),
  field: 'filler.classification',
  at: 'block',
  label: 'filler strength class',
  asked(context) {
    const ksi = context.block && strengthClass(context.block.process, context.block.filler)
    return ksi ? [name(ksi)] : null
  },
  tested(_context, side) {
    const ksi = side.block && strengthClass(side.block.process, side.block.filler)
    return ksi ? name(ksi) : null
  },
  covers: (value) => CLASSES.filter((ksi) => ksi <= Number.parseInt(value, 10)).map(name),
  because: 'Only an increase of strength counts; whether a weaker filler is strong enough is a matter of design.',
})

export const fillerStrength: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (judged?.verdict !== 'outside' || context.block?.process !== 'GMAW') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `The filler is of a higher strength class than that of ${names(sides)}. Whether this counts for GMAW is not confirmed here; look it up in your edition.`, missing: ['confirmation of row 1 for GMAW'] }
  },
}
