/** Row 1: a filler metal of a higher strength class than tested; a lower class is free. */
import { namedRule } from '../../common/rule-kinds.ts'
import { strengthClass } from '../fillers.ts'
import { meta } from '../meta.ts'

const CLASSES = [60, 70, 80, 90, 100, 110, 120]
const name = (ksi: number): string => `${ksi} ksi class`

export const fillerStrength = namedRule({
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
