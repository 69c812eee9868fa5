/** 7.4.4: where impact values are required, the coupon's impact tests meet what the procedure asks. */
import { siFigure } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { cannotTell, notStated, show } from '../../common/wording.ts'
import type { CouponSide, Rule, RuleContext, RuleVerdict } from '../../rule.ts'
import { meta } from '../meta.ts'
import { weldType } from '../weld-types.ts'

const PLACE = { weld: 'weld', 'heat-affected-zone': 'heat-affected zone' } as const
const BUTT: ReadonlySet<string> = new Set(['butt weld', 'partial penetration butt weld'])
const PLAN = { kind: 'plan-coupon' as const, label: 'Test a coupon for impact', requirement: 'Impact sets of weld and heat-affected zone at the temperature asked.' }

/** One coupon. Without impact tests a butt may still stand up to 12 mm, which the thickness rule holds it to. */
function judge(context: RuleContext, { coupon }: CouponSide): RuleVerdict {
  const sets = coupon.content.toughness.filter(({ values }) => values.length > 0)
  if (sets.length === 0) {
    if (BUTT.has(weldType(context.procedure)) && BUTT.has(weldType(coupon.content.variables))) return { verdict: 'within', sentence: `${coupon.number} has no impact tests; as a butt it may stand up to 12 mm (8.3.2).`, asked: null, range: null }
    return cannotTell(`Impact values are required, and ${coupon.number} has none; a fillet, T-joint or branch proves no mechanical properties.`, [`${coupon.number}: toughness`], { fixes: [PLAN] })
  }
  const wanted = siFigure(context.procedure.impactTemperature, 'temperature')
  if (wanted === null) return notStated('impact test temperature', 'impactTemperature')
  const energy = siFigure(context.procedure.impactEnergy, 'energy')
  for (const place of ['weld', 'heat-affected-zone'] as const) {
    const own = sets.filter((set) => set.place === place)
    if (own.length === 0) continue
    const cold = own.filter((set) => { const at = siFigure(set.temperature, 'temperature'); return at !== null && at <= wanted })
    if (cold.length === 0) {
      const told = own.flatMap((set) => siFigure(set.temperature, 'temperature') ?? [])
      if (told.length === 0) return cannotTell(`${coupon.number} does not record at what temperature its ${PLACE[place]} was tested.`, [`${coupon.number}: toughness`])
      return cannotTell(`The ${PLACE[place]} of ${coupon.number} was tested at ${show(Math.min(...told), '°C')}, warmer than the ${show(wanted, '°C')} asked.`, [`${coupon.number}: an impact set at ${show(wanted, '°C')}`], { field: 'impactTemperature', fixes: [PLAN] })
    }
    const means = cold.map(({ values }) => tidy(values.reduce((sum, { si }) => sum + si, 0) / values.length))
    const least = Math.min(...means)
    if (energy !== null && least < energy) return cannotTell(`The ${PLACE[place]} of ${coupon.number} reached ${show(least, 'J')} on average, below the ${show(energy, 'J')} asked.`, [`${coupon.number}: impact values of ${show(energy, 'J')}`], { field: 'impactEnergy', fixes: [PLAN] })
  }
  return { verdict: 'within', sentence: `${coupon.number} was tested for impact at ${show(wanted, '°C')} or colder.`, asked: null, range: null }
}

/** Judged coupon by coupon: those that meet it may act together. */
export const impactTests: Rule = {
  meta: meta('impact-tests', { title: 'Impact tests', clause: '7.4.4', basis: 'memory', class: 'supplementary', statement: 'Where impact values are required, the impact sets of a supporting coupon were tested no warmer than the procedure asks and reached the mean energy that it asks; a warmer or weaker set can\'t be told. A butt coupon without impact tests may stand up to 12 mm; a fillet, T-joint or branch coupon proves no impact values.' }),
  field: 'toughnessRequired',
  at: 'weld',
  label: 'Impact tests',
  applies: (context) => context.toughness === true,
  range: () => null,
  check(context, sides) {
    if (context.toughness !== true) return null
    const judged = sides.map((side) => judge(context, side))
    return judged.find(({ verdict }) => verdict === 'within') ?? judged[0] ?? null
  },
}
