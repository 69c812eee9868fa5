/** QW-410.64: P-No. 11A and 11B under 16 mm (5/8 in.) prepared, gouged or repaired by heat need a coupon that was. */
import { figures, isStated } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { pNumbers } from '../members.ts'
import { meta } from '../meta.ts'
import { FIGURES } from '../ranges.ts'

const token = (thermal: boolean | null | undefined): string | null => (thermal === true ? 'thermal preparation' : thermal === false ? 'no thermal preparation' : null)

export const thermalPreparation = namedRule({
  meta: meta('QW-410.64', 'thermal-preparation'),
  field: 'technique.thermalPreparation',
  at: 'block',
  label: 'thermal preparation, gouging or repair',
  applies(context) {
    if (!pNumbers(context.procedure).some((p) => p === '11A' || p === '11B')) return false
    const { thickness, thicknessB } = context.procedure
    return [thickness, ...(isStated(thicknessB) ? [thicknessB] : [])].some((interval) => {
      const { min, max, all } = figures(interval, 'length', context.system)
      const least = all ? null : (min ?? max)
      return least === null || least < FIGURES[context.system].toughness
    })
  },
  asked(context) {
    const value = token(context.block?.technique.thermalPreparation)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block?.technique.thermalPreparation),
  covers: (value) => (value === 'thermal preparation' ? ['thermal preparation', 'no thermal preparation'] : [value]),
  because: 'Thin P-No. 11A and 11B metal may be cut, gouged or repaired by heat only if the coupon was.',
  setValue: (name) => name === 'thermal preparation',
})
