/** Row 17 (SAW, GMAW, FCAW): wire feed speed more than 10 % off the PQR value, where it and not amperage is the control. */
import { isStated } from '../../common/reading.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { settingRule } from '../percent.ts'

const base = settingRule({
  meta: meta('wire_feed_speed'),
  setting: 'wireFeed',
  label: 'wire feed speed',
  dimension: 'wireFeed',
  band: () => ({ down: 10, up: 10 }),
  applies: (context) => !!context.block && (isStated(context.block.electrical.wireFeed) || context.block.passes.some((pass) => isStated(pass.wireFeed)) || !isStated(context.block.electrical.current)),
})

export const wireFeed: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    const { block } = context
    if (judged?.verdict !== 'outside' || !block || !isStated(block.electrical.current)) return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} It counts only if wire feed speed and not amperage is the control; the procedure states both.`, missing: [`procedure: which of amperage and wire feed speed is the control (${names(sides)})`] }
  },
}
