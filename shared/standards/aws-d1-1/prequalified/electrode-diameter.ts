/** Table 5.1: largest electrode by process, position and pass. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, unitOf } from '../../common/reading.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { RuleContext } from '../../rule.ts'
import { classification, isLowHydrogen, nominalDiameters } from '../fillers.ts'
import { askedPlaces } from '../positions.ts'
import { lengthRange } from '../ranges.ts'
import { diameterLimit, NO_ROW, plainPlaces } from './limits.ts'
import { condition } from './meta.ts'
import { noPosition, tightest } from './places.ts'
import { EPSILON, FOUR, saysByTable, TABLE_5_1 } from './verdict.ts'

interface Size { value: number; root: boolean | null; at: string }

/** Every diameter that is asked with whether it is for root passes: from the passes where they tell it, else from the block. */
function sizes(context: RuleContext, block: ProcessBlock): Size[] {
  const told = block.passes.flatMap((pass, i): Size[] => {
    const value = figureOrNull(pass.fillerDiameter, 'length', context.system)
    return value === null ? [] : [{ value, root: pass.layer === null ? null : pass.layer === 'root', at: `${context.path}.passes.${i}.fillerDiameter` }]
  })
  const own = nominalDiameters(block, context.system)
  // The block names every size; passes say which of them lays the root.
  const untold = own.map((value, i): Size => ({ value, root: told.length > 0 ? false : null, at: `${context.path}.filler.diameters.${i}` }))
  return told.length > 0 ? [...told, ...untold.filter(({ value }) => !told.some((size) => Math.abs(size.value - value) < EPSILON))] : untold
}

export const pqDiameter = condition({
  file: 'electrode-diameter', title: 'Largest electrode', clause: 'Table 5.1', basis: 'read', source: TABLE_5_1, field: 'filler.diameters', at: 'block', more: FOUR,
  statement: 'The electrode is not larger than the table allows for process, position, groove or fillet, and root pass; SMAW electrodes of low-hydrogen or EXX14 kind are smaller in vertical and overhead. Submerged arc grooves in horizontal, vertical and overhead positions need a test.',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const field = `${context.path}.filler.diameters`
    const all = sizes(context, block)
    if (all.length === 0) return cannotTell('The electrode diameter is not stated.', ['procedure: filler.diameters'], { field, fixes: [{ kind: 'state', label: 'State the electrode diameters', field }] })
    const places = plainPlaces(askedPlaces(block.positions))
    if (places.length === 0) return noPosition(context)
    const { weld } = context.procedure.joint
    const lowHydrogen = isLowHydrogen(block.filler)
    const process = block.process ?? 'SMAW'
    // An electrode whose kind can't be read may be one of those that are held smaller.
    const unread = process === 'SMAW' && lowHydrogen === null
    const restricted = lowHydrogen !== false || /^E\d{2,3}14/.test(classification(block.filler) ?? '')
    const noRow = places.find((place) => diameterLimit(process, weld, place, false, restricted) === NO_ROW)
    if (noRow) return saysByTable(context, 'outside', `${process} ${weld} welds in ${noRow} position are not prequalified; they need a qualification test.`, { asked: [noRow], field: `${context.path}.positions`, fixes: [{ kind: 'plan-coupon', label: 'Qualify by test', requirement: `A qualification test in ${noRow} position.` }] })
    const limitFor = (root: boolean, small = restricted) => tightest(places, (place) => { const limit = diameterLimit(process, weld, place, root, small); return limit === NO_ROW ? null : limit }, system)
    const [fill, root] = [limitFor(false), limitFor(true)]
    if (!fill || !root) return null
    const top = Math.max(...all.map(({ value }) => value))
    const asked = { min: Math.min(...all.map(({ value }) => value)), max: top }
    const range = lengthRange(system, null, fill.value)
    const isOver = (size: Size): boolean => size.value > (size.root === true ? root.value : fill.value) + EPSILON
    const over = all.find(isOver)
    if (over && unread && !all.some((size) => size.value > (limitFor(size.root === true, false)?.value ?? 0) + EPSILON)) return cannotTell(`An electrode of ${show(over.value, unit)} is allowed in ${fill.place} position only if it is neither low-hydrogen nor EXX14, which its classification does not tell.`, ['procedure: filler.classification'], { field: `${context.path}.filler.classification`, asked, range, fixes: [{ kind: 'state', label: 'State the filler classification', field: `${context.path}.filler.classification` }] })
    // One size for all passes lays the root as well.
    const rootIsLaid = weld === 'fillet' || all.some((size) => size.root === true || size.value <= root.value + EPSILON)
    const bestFor = (size: Size): number => (size.root === true || (size.root === null && !rootIsLaid) ? root.value : fill.value)
    const setTo = (size: Size) => ({ kind: 'set' as const, label: `Set the electrode to ${show(bestFor(size), unit)}`, field: size.at, value: quantity(bestFor(size), 'length', unit) })
    if (over) {
      const limit = over.root === true ? root : fill
      return saysByTable(context, 'outside', `An electrode of ${show(over.value, unit)} is larger than the ${show(limit.value, unit)} allowed for ${over.root === true ? 'root passes' : `${weld} welds`} in ${limit.place} position.`, { asked, range: lengthRange(system, null, limit.value), field: over.at, fixes: all.filter(isOver).map(setTo) })
    }
    const unsure = weld === 'fillet' ? undefined : all.find((size) => size.root === null && size.value > root.value + EPSILON)
    if (unsure && all.every((size) => size.root === null && size.value > root.value + EPSILON)) return saysByTable(context, 'outside', `Every electrode stated is larger than the ${show(root.value, unit)} allowed for root passes in ${root.place} position.`, { asked, range: lengthRange(system, null, root.value), field, fixes: [setTo(unsure)] })
    if (unsure) return cannotTell(`Electrodes of ${show(unsure.value, unit)} may not lay root passes (at most ${show(root.value, unit)}); which size lays the root is not stated.`, ['procedure: electrode diameter of the root pass'], { field: `${context.path}.passes`, asked, range, fixes: [{ kind: 'state', label: 'State the passes with their electrode', field: `${context.path}.passes` }] })
    return saysByTable(context, 'within', `Electrodes up to ${show(top, unit)} are not larger than the ${show(fill.value, unit)} allowed.`, { asked, range })
  },
})
