/** M-Numbers, F-Numbers and whether filler and base metal suit each other. */
import type { Basis } from '../../../schemas/assessment.ts'
import type { BaseMetal, ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { figureOrNull, unitOf } from '../../common/reading.ts'
import { namedRule, weakest } from '../../common/rule-kinds.ts'
import { cannotTell, list, show } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { fillerAlloy, fNumber, metals, mNumber, readAlloy } from '../alloys.ts'
import { meta, TABLE } from '../meta.ts'

/** One name for the pair whichever way round; the alloy itself where it has no M-Number. */
function pair(variables: WeldingVariables): string | null {
  const told = metals(variables).map((metal) => { const m = mNumber(metal)?.m; const alloy = readAlloy(metal)?.alloy; return m ? `M-${m}` : (alloy ?? null) })
  return told.some((one) => one === null) ? null : told.sort().join(' to ')
}
const pairBasis = (variables: WeldingVariables): Basis => metals(variables).map((metal) => mNumber(metal)?.basis ?? 'memory').reduce(weakest)

const base = namedRule({
  meta: meta('m-number', 'M-Number', 'Table 3.1', 'secondary', `${TABLE}; M-Numbers of Table 3.2 from the same notes`, 'Another M-Number or pair of M-Numbers.'),
  field: 'baseMetals.a.d12MNumber',
  at: 'weld',
  label: 'M-Number',
  asked(context) {
    const value = pair(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => pair(side.variables),
  because: 'A test covers the M-Numbers that it joined.',
})

export const baseMetal: Rule = {
  ...base,
  range(context, side) {
    const range = base.range(context, side)
    return range && { ...range, basis: pairBasis(side.variables) }
  },
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    return judged && { ...judged, basis: sides.map((side) => pairBasis(side.variables)).reduce(weakest, pairBasis(context.procedure)) }
  },
}

const filler = (block: ProcessBlock | null): string | null => {
  if (!block) return null
  if (block.filler.added === false) return 'no filler'
  const f = fNumber(block.filler)
  return f === null ? null : `F-${f}`
}

export const fillerNumber = namedRule({
  meta: meta('f-number', 'F-Number', 'Table 3.1', 'secondary', `${TABLE}; F-Numbers from the same notes`, 'Another F-Number: 4043 instead of 5356 is a change from F-22 to F-23 and needs a new test.'),
  field: 'filler.fNumber',
  at: 'block',
  label: 'F-Number',
  asked(context) {
    const value = filler(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => filler(side.block),
  because: 'Every F-Number is qualified by itself.',
  setValue: (name) => (name.startsWith('F-') ? name.slice(2) : undefined),
})

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
  meta: meta('filler-choice', 'Filler for metal and service', 'Table 4.2', 'secondary', 'Guides of filler makers and a trade journal', 'Silicon fillers (4043 and the like) are never used on 5083, 5086 and 5456. Above 65 °C (150 °F) in service fillers of about 3 % magnesium or more (5356, 5183, 5556) are not used; 4043 and 5554 are.', { withoutCoupon: true }),
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
    const magnesium = metals(procedure).map(alloyOf).filter((one) => MAGNESIUM.has(one))
    if (SILICON.has(alloy) && magnesium.length > 0) return says('outside', `Filler ${alloy} is never used on ${list([...new Set(magnesium)])}; take 5356, 5183 or 5556.`, { asked: [alloy], fixes: [{ kind: 'set', label: 'Set the filler to ER5356', field, value: 'ER5356' }] })
    const service = figureOrNull(procedure.serviceTemperature, 'temperature', system)
    if (service !== null && service > HOT[system]) {
      const unit = unitOf('temperature', system)
      const fit = suitsHotService(alloy)
      if (fit === false) return says('outside', `Filler ${alloy} is not for service at ${show(service, unit)}: above ${show(HOT[system], unit)} its magnesium invites stress corrosion.`, { asked: [alloy], fixes: [{ kind: 'set', label: 'Set the filler to ER4043', field, value: 'ER4043' }] })
      if (fit === null) return cannotTell(`Whether filler ${alloy} is for service at ${show(service, unit)} is not known here.`, ['suitability of the filler for hot service'], { asked: [alloy] })
    }
    return says('within', `Nothing known stands against filler ${alloy} for this metal${service === null ? '' : ' and service'}.`, { asked: [alloy] })
  },
}
