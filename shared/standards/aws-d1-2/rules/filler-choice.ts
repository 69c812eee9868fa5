/** Whether filler and base metal suit each other and the service. */
import type { BaseMetal } from '../../../schemas/welding.ts'
import { figureOrNull, unitOf } from '../../common/reading.ts'
import { cannotTell, list, show } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { fillerAlloy, metals, readAlloy } from '../alloys.ts'
import { meta } from '../meta.ts'

/** Fillers of about 3 % magnesium and more, which hot service corrodes under stress. */
const HOT_UNFIT: ReadonlySet<string> = new Set(['5356', '5183', '5556'])
const HOT_FIT: ReadonlySet<string> = new Set(['4043', '5554'])
const HOT = { SI: 65, US: 150 } as const
const SILICON: ReadonlySet<string> = new Set(['4009', '4010', '4043', '4047', '4145', '4643'])
/** Base metals of more than 2.5 % magnesium for which silicon fillers are never taken. */
const MAGNESIUM: ReadonlySet<string> = new Set(['5083', '5086', '5456'])

/** Whether a filler suits service above 65 °C (150 °F); null where nothing is known of it. */
export const suitsHotService = (alloy: string): boolean | null => (HOT_UNFIT.has(alloy) ? false : HOT_FIT.has(alloy) ? true : null)

const alloyOf = (metal: BaseMetal): string => readAlloy(metal)?.alloy ?? ''

export const fillerChoice: Rule = {
  meta: meta('filler-choice', 'Filler for metal and service', 'Table 4.2', 'secondary', 'Guides of filler makers and a trade journal', 'Silicon fillers (4043 and the like) are never used on 5083, 5086 and 5456. Above 65 °C (150 °F) in service fillers of about 3 % magnesium or more (5356, 5183, 5556) are not used; 4043 and 5554 are. 6xxx without filler is "cannot tell", and so is a filler of which hot service is not known.', { withoutCoupon: true }),
  field: 'filler.classification',
  at: 'block',
  label: 'Filler for metal and service',
  range: () => null,
  check(context) {
    const { block, procedure, system } = context
    if (!block) return null
    const field = `${context.path}.filler.classification`
    const says = (verdict: RuleVerdict['verdict'], sentence: string, more: Partial<RuleVerdict> = {}): RuleVerdict => ({ verdict, sentence, asked: null, range: null, ...more })
    const sixes = metals(procedure).map(alloyOf).filter((alloy) => alloy.startsWith('6'))
    if (block.filler.added === false) return sixes.length > 0 ? cannotTell(`${list([...new Set(sixes)])} welded without filler is prone to cracks; whether that is accepted must be judged by a person.`, ['a ruling on welding without filler'], { basis: 'memory' }) : says('within', 'No filler is used.')
    const alloy = fillerAlloy(block.filler)
    if (alloy === null) return cannotTell("The filler isn't stated, so whether it suits the metal can't be told.", ['procedure: filler.classification'], { field, fixes: [{ kind: 'state', label: 'State the filler classification', field }] })
    const service = figureOrNull(procedure.serviceTemperature, 'temperature', system)
    const magnesium = metals(procedure).map(alloyOf).filter((one) => MAGNESIUM.has(one))
    if (SILICON.has(alloy) && magnesium.length > 0) return says('outside', `Filler ${alloy} is never used on ${list([...new Set(magnesium)])}; take 5356, 5183 or 5556.`, { asked: [alloy], fixes: service !== null && service > HOT[system] ? [] : [{ kind: 'set', label: 'Set the filler to ER5356', field, value: 'ER5356' }] })
    if (service !== null && service > HOT[system]) {
      const unit = unitOf('temperature', system)
      const fit = suitsHotService(alloy)
      if (fit === false) return says('outside', `Filler ${alloy} is not for service at ${show(service, unit)}: above ${show(HOT[system], unit)} its magnesium invites stress corrosion.`, { asked: [alloy], fixes: magnesium.length > 0 ? [] : [{ kind: 'set', label: 'Set the filler to ER4043', field, value: 'ER4043' }] })
      if (fit === null) return cannotTell(`Whether filler ${alloy} is for service at ${show(service, unit)} is not known here.`, ['suitability of the filler for hot service'], { asked: [alloy] })
    }
    return says('within', `Nothing known stands against filler ${alloy} for this metal${service === null ? '' : ' and service'}.`, { asked: [alloy] })
  },
}
