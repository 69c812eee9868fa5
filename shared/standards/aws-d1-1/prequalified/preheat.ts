/** Table 5.8: least preheat and interpass temperature by category and thickness. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, unitOf } from '../../common/reading.ts'
import { cannotTell, list, show } from '../../common/wording.ts'
import { hydrogenLimit } from '../fillers.ts'
import { members, preheatCategory } from '../steels.ts'
import { minimumPreheat } from './limits.ts'
import { condition } from './meta.ts'
import { lowHydrogenProcess, readMetals, thickest, unread } from './metals.ts'
import { FOUR, says } from './verdict.ts'

export const pqPreheat = condition({
  file: 'preheat', title: 'Minimum preheat and interpass temperature', clause: 'Table 5.8', basis: 'secondary', field: 'preheat.minimum', at: 'weld',
  source: 'Table 3.3 read in 2015 for categories A and B; category C from a manual that reproduces it; category D from memory',
  statement: 'Preheat and interpass temperature are at least those of the category of steel and process for the thickest part; of two steels the higher value rules. Metal below 0 °C (32 °F) is first heated to 20 °C (70 °F).',
  more: FOUR,
  check(context, block) {
    const { system } = context
    const unit = unitOf('temperature', system)
    const metals = members(context.procedure, system)
    const read = readMetals(context)
    const missing = unread(read, 'the preheat category')
    if (missing) return missing
    const T = thickest(context)
    if (T === null) return cannotTell("The thickness isn't stated, so the preheat can't be told.", ['procedure: thickness'], { field: 'thickness', fixes: [{ kind: 'state', label: 'State the thickness', field: 'thickness' }] })
    const lowHydrogen = lowHydrogenProcess(block)
    if (lowHydrogen === null) return cannotTell('Whether the electrode is low-hydrogen can\'t be read from its classification, and the category depends on it.', ['procedure: filler.classification'], { field: `${context.path}.filler.classification` })
    const categories = metals.map(({ metal }, i) => preheatCategory(metal, read[i]?.groups ?? [], lowHydrogen, hydrogenLimit(block.filler)))
    const lacking = categories.findIndex((category) => category === null)
    if (lacking >= 0) return cannotTell(`${read[lacking]?.name ?? 'The base metal'} stands in no category kept here for ${lowHydrogen ? 'this process' : 'electrodes that are not low-hydrogen'}.`, ['preheat category of the base metal'], { field: 'baseMetals.a.specification' })
    const known = categories.filter((category) => category !== null)
    const least = Math.max(...known.map(({ category }) => minimumPreheat(category, T, system)))
    const names = [...new Set(known.map(({ category }) => category))]
    const basis = known.some((one) => one.basis === 'memory') ? 'memory' : known.some((one) => one.basis === 'secondary') ? 'secondary' : 'read'
    const range = between('temperature', unit, closed(least), UNLIMITED)
    const thick = T === Infinity ? 'unlimited thickness' : `up to ${show(T, unitOf('length', system))}`
    const why = `category ${list(names)}, ${thick}`
    const field = 'preheat.minimum'
    const stated = figureOrNull(context.procedure.preheat.minimum, 'temperature', system)
    if (stated === null) return cannotTell(`Minimum preheat isn't stated; at least ${show(least, unit)} is needed (${why}).`, ['procedure: preheat.minimum'], { field, range, basis, fixes: [{ kind: 'set', label: `Set the minimum preheat to ${show(least, unit)}`, field, value: quantity(least, 'temperature', unit) }] })
    const asked = { min: stated, max: stated }
    if (stated < least) return says('outside', `Preheat of ${show(stated, unit)} is below the ${show(least, unit)} needed (${why}).`, { asked, range, basis, fixes: [{ kind: 'set', label: `Set the minimum preheat to ${show(least, unit)}`, field, value: quantity(least, 'temperature', unit) }] })
    const cold = system === 'SI' ? { freezing: 0, text: ' Metal colder than 0 °C is first heated to 20 °C.' } : { freezing: 32, text: ' Metal colder than 32 °F is first heated to 70 °F.' }
    return says('within', `Preheat of ${show(stated, unit)} is at least the ${show(least, unit)} needed (${why}).${least <= cold.freezing ? cold.text : ''}`, { asked, range, basis })
  },
})
