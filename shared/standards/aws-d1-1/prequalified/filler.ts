/** Table 5.4: filler metal that matches the group of the base metal. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { cannotTell, list } from '../../common/wording.ts'
import type { RuleVerdict } from '../../rule.ts'
import { classification, isLowHydrogen, strengthClass } from '../fillers.ts'
import type { Group } from '../steels.ts'
import { condition } from './meta.ts'
import { readMetals, unread } from './metals.ts'
import { byTest, FOUR, says } from './verdict.ts'

export type Listed = Exclude<Group, 'PQR'>
/** Strength classes that match, in ksi; solid and metal-cored wires have no 60 ksi class. */
const STRENGTH: Record<Listed, readonly number[]> = { I: [60, 70], II: [70], III: [80], IV: [90] }
export const classesOf = (group: Listed, process: ProcessBlock['process']): readonly number[] => (process === 'GMAW' && group === 'I' ? [70] : STRENGTH[group])
const ORDER: readonly Group[] = ['I', 'II', 'III', 'IV']
/** Low-hydrogen electrodes that the table names for Group II. */
const GROUP_II_SMAW = /^E70(15|16|18|28)/
const SINGLE_PASS_ONLY = /T-?(2|3|10|13|14|GS)(?![0-9])/

/** Classes that match a group, in words. */
export const wanted = (group: Listed, process: ProcessBlock['process']): string => {
  const classes = classesOf(group, process).map((ksi) => (process === 'SMAW' ? `E${ksi}XX` : process === 'SAW' ? `F${ksi / 10}XX` : process === 'FCAW' ? `E${ksi / 10}XT` : `ER${ksi}S or E${ksi}C`))
  return `${process === 'SMAW' && group !== 'I' ? 'low-hydrogen ' : ''}${list(classes, 'or')}`
}

export const pqFiller = condition({
  file: 'filler', title: 'Matching filler metal', clause: 'Table 5.4', basis: 'memory', field: 'filler.classification', at: 'block',
  source: 'Table 5.4 as recalled',
  statement: 'The filler metal matches the group of the base metal (of the weaker one where two are joined), low-hydrogen for SMAW as soon as one of them is of Group II or higher, on Group II alone E7015, E7016, E7018 or E7028; single-pass-only FCAW classes are out.',
  more: FOUR,
  check(context, block) {
    const metals = readMetals(context)
    const missing = unread(metals, 'which filler matches')
    if (missing) return missing
    const field = `${context.path}.filler.classification`
    const name = classification(block.filler)
    const ksi = strengthClass(block.process, block.filler)
    if (ksi === null) return cannotTell(name === null ? 'The classification of the filler is not stated.' : `The strength of ${name} can't be read from its classification.`, ['procedure: filler.classification'], { field, fixes: [{ kind: 'state', label: 'State the filler classification', field }] })
    const shown = block.process === 'SAW' ? (block.filler.fluxClassification ?? name ?? '') : (name ?? '')
    const perMetal = metals.map(({ groups }) => (groups ?? []).filter((group): group is Listed => group !== 'PQR'))
    if (perMetal.some((groups) => groups.length === 0)) return cannotTell('A base metal that always needs a test has no matching filler here.', ['a prequalified base metal'], { asked: [shown] })
    // Where one metal stands in two groups over the thickness asked, the higher one decides for it.
    const tops = perMetal.map((groups) => groups.reduce((a, b) => (ORDER.indexOf(a) >= ORDER.indexOf(b) ? a : b)))
    const [low, high] = [...tops].sort((a, b) => ORDER.indexOf(a) - ORDER.indexOf(b))
    if (!low || !high) return null
    const strengths = [...new Set([...classesOf(low, block.process), ...classesOf(high, block.process)])]
    const need = low === high ? `Group ${low} needs ${wanted(low, block.process)}` : `Group ${low} to Group ${high} needs a filler that matches either, ${wanted(low, block.process)} or ${wanted(high, block.process)}`
    const outside = (why: string): RuleVerdict => says('outside', `${shown} does not match: ${why}.`, { asked: [shown], fixes: [byTest] })
    if (block.process === 'FCAW' && SINGLE_PASS_ONLY.test(name ?? '')) return outside('it is a single-pass-only class')
    if (!strengths.includes(ksi)) return outside(need)
    if (block.process === 'SMAW' && high !== 'I') {
      const lowHydrogen = isLowHydrogen(block.filler)
      if (lowHydrogen === false || (low === 'II' && high === 'II' && ksi === 70 && !GROUP_II_SMAW.test(name ?? ''))) return outside(`Group ${high} needs a low-hydrogen electrode (${wanted(high, 'SMAW')})`)
    }
    return says('within', `${shown} matches Group ${low === high ? low : `${low} to ${high}`}.`, { asked: [shown] })
  },
})
