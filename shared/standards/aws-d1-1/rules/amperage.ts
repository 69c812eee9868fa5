/** Row 12: amperage. SMAW is held to the range of the electrode's maker, the other processes to a percentage of the PQR value. */
import { between, closed, unknownNumeric } from '../../../ranges/numeric.ts'
import { figures, isStated } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { askedSetting, byProcess, lineCures, settingLines, settingRule } from '../percent.ts'

const byPercent = settingRule({
  meta: meta('amperage'),
  setting: 'current',
  label: 'amperage',
  dimension: 'current',
  perDiameter: true,
  band: byProcess({ SAW: 10, GMAW: 10, FCAW: 10, GTAW: 25 }),
})

/** The procedure's own record holds what the maker recommends; no coupon gives it. */
const byMaker = figureRule({
  meta: meta('amperage'),
  field: 'electrical.current',
  at: 'block',
  label: 'amperage',
  dimension: 'current',
  asked: (context) => askedSetting(context.block, 'current', 'current', context.system),
  range: () => null,
  cure: (context, joined) => settingLines(context, 'current').flatMap((line) => lineCures({ label: 'amperage', dimension: 'current' }, context, joined, line)),
})

export const amperage: Rule = {
  ...byPercent,
  range: (context, side) => (side.block?.process === 'SMAW' ? null : byPercent.range(context, side)),
  check(context, sides, joined) {
    if (context.block?.process !== 'SMAW') return byPercent.check(context, sides, joined)
    const { makerCurrent } = context.block.electrical
    const field = `${context.path}.electrical.makerCurrent`
    const maker = figures(makerCurrent, 'current', context.system)
    if (!isStated(makerCurrent) || maker.fault || maker.min === null || maker.max === null) {
      const judged = byMaker.check(context, sides, unknownNumeric('current', 'A'))
      if (judged?.field) return judged
      return cannotTell('For SMAW the amperage must stay in the range that the maker of the electrode recommends, which the procedure does not state.', ['procedure: electrical.makerCurrent'], { field, asked: judged?.asked ?? null, fixes: [{ kind: 'state', label: "State the maker's range of amperage", field }] })
    }
    const judged = byMaker.check(context, sides, between('current', 'A', closed(maker.min), closed(maker.max)))
    if (!judged || judged.verdict === 'cannot-tell') return judged
    const range = `${show(maker.min, 'A')} to ${show(maker.max, 'A')}`
    return {
      ...judged,
      tested: [],
      sentence: judged.verdict === 'within' ? `The amperage lies inside the ${range} that the maker recommends.` : `The amperage goes beyond the ${range} that the maker of the electrode recommends.`,
      fixes: judged.fixes?.filter((fix) => fix.kind === 'set'),
    }
  },
}
