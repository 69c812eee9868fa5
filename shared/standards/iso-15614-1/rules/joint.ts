/** 8.4.3: weld and joint type, sides and backing, single and multiple runs; 8.3.4 branch angle. */
import { between, closed, numericRange, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Joint, WeldingVariables } from '../../../schemas/welding.ts'
import { askedInterval, siSingle } from '../../common/iso-names.ts'
import { isStated, sameText } from '../../common/reading.ts'
import { bandRule, nameBandRule } from '../../common/review-band.ts'
import { cannotTell, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { runsOf } from '../sides.ts'

const isBranch = (joint: Joint): boolean => (joint.branch !== null && joint.branch !== undefined) || isStated(joint.branchAngle)

/** The kind of weld in the standard's terms. */
export function weldType(variables: WeldingVariables): string {
  const { joint } = variables
  if (joint.weld === 'fillet') return 'fillet weld'
  if (isBranch(joint)) return 'branch connection'
  if (joint.type === 'tee') return 'T-joint butt weld'
  if (joint.type !== 'butt') return `${joint.type} joint butt weld`
  return joint.penetration === 'partial' ? 'partial penetration butt weld' : 'butt weld'
}

const COVERS: Readonly<Record<string, readonly string[]>> = {
  'butt weld': ['butt weld', 'partial penetration butt weld', 'fillet weld'],
  'T-joint butt weld': ['T-joint butt weld', 'fillet weld'],
  'branch connection': ['branch connection'],
  'fillet weld': ['fillet weld'],
}

export const jointType = levelTwoLimit(
  nameBandRule({
    meta: meta('joint-type', { title: 'Type of joint and weld', clause: '8.4.3', basis: 'memory', statement: 'A butt coupon covers full and partial penetration butt welds and fillets; a T-joint butt coupon covers T-joint butt welds and fillets; a pipe butt coupon also covers branches at 60° and more; a fillet coupon covers fillets. Where fillets are the main form of production a fillet coupon is asked for as well, which no record tells.' }),
    field: 'joint.weld',
    at: 'weld',
    label: 'type of weld',
    asked: (context) => [weldType(context.procedure)],
    tested: (_context, side) => [weldType(side.variables)],
    covers([value = ''], _context, side) {
      const sure = COVERS[value] ?? [value]
      if (value === 'butt weld' && side.variables.product !== 'plate') return { sure: [...sure, 'branch connection'] }
      if (value === 'butt weld') return { sure, maybe: ['branch connection'], why: 'A plate coupon covers large pipe, but whether it covers a branch is not known here.' }
      return value in COVERS ? { sure } : { sure, maybe: ['fillet weld', ...(value === 'partial penetration butt weld' ? ['butt weld'] : [])], why: 'That test piece is not one of the standard\'s own; what it covers beyond itself is not known here.' }
    },
    because: 'Butt covers partial penetration and fillet; T-joint butt covers fillet; fillet covers itself.',
  }),
)

export const branchAngle = bandRule({
  meta: meta('branch-angle', { title: 'Branch angle', clause: '8.3.4', basis: 'memory', statement: 'A branch tested at an angle covers from that angle to the right angle; a pipe butt coupon covers branches from 60°.' }),
  field: 'joint.branchAngle',
  at: 'weld',
  label: 'branch angle',
  dimension: 'angle',
  applies: (context) => isBranch(context.procedure.joint),
  asked: (context) => askedInterval(context.procedure.joint.branchAngle, 'angle'),
  band(context, side) {
    const { joint } = side.variables
    const upTo = (lower: number): ReturnType<typeof between> => between('angle', '°', closed(lower), closed(90))
    if (!isBranch(joint)) {
      if (!context.procedure || side.variables.product === 'plate' || weldType(side.variables) !== 'butt weld') return null
      const range = upTo(60)
      return { sure: range, maybe: range, tested: null, reason: 'A pipe butt coupon covers branches from 60° to 90°.', clause: '8.4.3' }
    }
    const had = siSingle(joint.branchAngle, 'angle')
    if (had === null || had > 90) {
      const unknown = unknownNumeric('angle', '°')
      return { sure: numericRange('angle', '°', []), maybe: unknown, tested: null, reason: `${side.coupon.number} does not record its branch angle.`, missing: [`${side.coupon.number}: joint.branchAngle`] }
    }
    const range = upTo(had)
    return { sure: range, maybe: range, tested: had, reason: `Tested at ${had}°: covers ${had}° to 90°.` }
  },
})

/** Sides and backing in the standard's terms; null where the record does not say. */
export function sidesAndBacking(joint: Joint): string | null {
  const { backing, backGouging, weldedFromBothSides } = joint
  const both = weldedFromBothSides ?? (backing === 'weld-metal' || (joint.groove?.startsWith('double') ?? false) || (backGouging !== null && backGouging !== 'none') ? true : backing !== null && backing !== 'none' ? false : null)
  if (both === null) return null
  if (both) return backGouging === null ? null : backGouging === 'none' ? 'both sides, not gouged' : 'both sides, gouged'
  if (backing === null) return null
  return backing === 'none' ? 'one side, no backing' : backing === 'consumable-insert' ? 'one side, consumable insert' : 'one side, with backing'
}

const ORDER = ['one side, no backing', 'one side, with backing', 'both sides, not gouged', 'both sides, gouged']

export const backingAndSides = levelTwoLimit(
  nameBandRule({
    meta: meta('backing-and-sides', { title: 'Sides and backing', clause: '8.4.3', basis: 'memory', statement: 'A coupon welded from one side without backing covers backing and both sides; with backing it covers backing and both sides; both sides without gouging covers gouging. None of them covers the open root.' }),
    field: 'joint.backing',
    at: 'weld',
    label: 'sides and backing',
    applies: (context) => context.procedure.joint.weld === 'groove',
    asked(context) {
      const value = sidesAndBacking(context.procedure.joint)
      return value ? [value] : null
    },
    tested(_context, side) {
      if (side.variables.joint.weld === 'fillet') return undefined
      const value = sidesAndBacking(side.variables.joint)
      return value ? [value] : null
    },
    covers([value = '']) {
      const from = ORDER.indexOf(value)
      return from < 0 ? { sure: [value], maybe: 'any', why: 'How a consumable insert stands among the kinds of backing is not known here.' } : { sure: ORDER.slice(from), maybe: from === 0 ? ['one side, consumable insert'] : undefined }
    },
    because: 'Each covers itself and what follows: one side without backing, one side with backing, both sides, both sides gouged.',
    lacks: () => ['joint.backing', 'joint.weldedFromBothSides', 'joint.backGouging'],
  }),
)

/** Permanent backing counts as parent material (8.3.1); a record names it in words only. */
export const backingMaterial: Rule = {
  meta: meta('backing-material', { title: 'Backing material', clause: '8.3.1', basis: 'secondary', statement: 'Permanent backing counts as parent material and must be of a covered group. A record names it in words, so it is compared with the coupon\'s words and with the names of the parent metals.' }),
  field: 'joint.backingMaterial',
  at: 'weld',
  label: 'Backing material',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.procedure.joint.backing === 'metal',
  range: () => null,
  check(context, sides) {
    const { joint, baseMetals } = context.procedure
    if (joint.weld !== 'groove' || joint.backing !== 'metal') return null
    const text = joint.backingMaterial
    if (text === null) return cannotTell("The backing material isn't stated; permanent backing counts as parent material.", ['procedure: joint.backingMaterial'], { fixes: [{ kind: 'state', label: 'State the backing material', field: 'joint.backingMaterial' }] })
    const told = sameText(text)
    const known = [...sides.flatMap((side) => side.variables.joint.backingMaterial ?? []), ...[baseMetals.a, baseMetals.b].flatMap((metal) => [metal.grade, metal.iso15608 && `group ${metal.iso15608}`].flatMap((name) => name ?? []))]
    if (known.some((name) => told === sameText(name) || (name.length > 3 && told.includes(sameText(name))))) return { verdict: 'within', sentence: `Backing of ${text} is the coupon's or the parent metal's own.`, asked: [text], range: null }
    return cannotTell(`Backing of ${text} is neither that of ${names(sides)} nor named as the parent metal. If it stays in place its group must be covered; if it is removed, say so.`, ['the ISO/TR 15608 group of the backing, or that it is removed'], { asked: [text] })
  },
}

export const runCount = levelTwoLimit(
  nameBandRule({
    meta: meta('run-count', { title: 'Single or multiple runs', clause: '8.4.3', basis: 'memory', statement: 'For one process a change from several runs to a single run (or one from each side), or the reverse, is not covered.' }),
    field: 'technique.passesPerSide',
    at: 'block',
    label: 'number of runs',
    asked(context) {
      const runs = context.block && (context.block.technique.passesPerSide ?? runsOf(context.procedure, context.block))
      return runs ? [runs] : null
    },
    tested(_context, side) {
      const runs = side.block && (side.block.technique.passesPerSide ?? runsOf(side.variables, side.block, side.coupon))
      return runs ? [runs] : null
    },
    because: 'Single and multiple runs do not stand for each other.',
    setValue: (name) => name,
  }),
)

export { isBranch }
