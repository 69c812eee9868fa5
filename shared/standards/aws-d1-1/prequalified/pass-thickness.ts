/** Table 5.1: thickest root and fill pass. */
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, unitOf } from '../../common/reading.ts'
import { cannotTell, show } from '../../common/wording.ts'
import { askedPlaces } from '../positions.ts'
import { lengthRange } from '../ranges.ts'
import { feedOf, fillPassLimit, plainPlaces, rootPassLimit } from './limits.ts'
import { condition } from './meta.ts'
import { noPosition, tightest } from './places.ts'
import { EPSILON, FOUR, saysByTable, TABLE_5_1 } from './verdict.ts'

export const pqPassThickness = condition({
  file: 'pass-thickness', title: 'Thickest root and fill pass', clause: 'Table 5.1', basis: 'read', source: TABLE_5_1, field: 'maxPassThickness', at: 'block', more: FOUR,
  statement: 'Root passes and fill passes of a groove are not thicker than the table allows for process and position.',
  applies: (context) => context.procedure.joint.weld === 'groove',
  check(context, block) {
    const { system } = context
    const unit = unitOf('length', system)
    const field = `${context.path}.maxPassThickness`
    const had = figureOrNull(block.maxPassThickness, 'length', system)
    const process = block.process ?? 'SMAW'
    const places = plainPlaces(askedPlaces(block.positions))
    if (places.length === 0) return noPosition(context)
    const root = tightest(places, (place) => rootPassLimit(process, place), system)
    const fillPrinted = fillPassLimit(process, feedOf(block))
    const fill = fillPrinted ? fillPrinted[system] : Infinity
    const onlyRoot = block.passes.length > 0 && block.passes.every((pass) => pass.layer === 'root')
    const rootValue = root?.value ?? Infinity
    if (had === null || had < 0) return cannotTell('The thickest pass is not stated.', ['procedure: maxPassThickness'], { field, fixes: [{ kind: 'state', label: 'State the thickest pass', field }] })
    const asked = { min: 0, max: had }
    const most = Math.max(rootValue, onlyRoot ? 0 : fill)
    const limit = onlyRoot ? rootValue : Math.min(rootValue, fill)
    const range = lengthRange(system, null, limit === Infinity ? null : limit)
    if (had <= limit + EPSILON) return saysByTable(context, 'within', `Passes up to ${show(had, unit)} are not thicker than the table allows.`, { asked, range })
    const set = Number.isFinite(limit) ? [{ kind: 'set' as const, label: `Limit passes to ${show(limit, unit)}`, field, value: quantity(limit, 'length', unit) }] : []
    if (onlyRoot || had > most + EPSILON) return saysByTable(context, 'outside', `A pass of ${show(had, unit)} is thicker than the ${show(onlyRoot ? limit : most, unit)} allowed${onlyRoot && root ? ` for root passes in ${root.place} position` : ''}.`, { asked, range, fixes: set })
    return cannotTell(`Root passes may be ${rootValue === Infinity ? 'of any thickness' : `${show(rootValue, unit)} thick`}, fill passes ${fill === Infinity ? 'of any thickness' : show(fill, unit)}; which of them is ${show(had, unit)} is not stated.`, ['procedure: thickness of root and of fill passes'], { asked, range, field, fixes: set })
  },
})
