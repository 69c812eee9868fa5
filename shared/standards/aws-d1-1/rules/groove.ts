/** Rows 31 to 33: groove type, square groove, and smaller angle, smaller opening or larger face beyond the tolerances. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, isStated, tidy, unitOf } from '../../common/reading.ts'
import { figureRule, namedRule } from '../../common/rule-kinds.ts'
import { list, names, show } from '../../common/wording.ts'
import type { Rule, RuleContext } from '../../rule.ts'
import { meta } from '../meta.ts'
import { matchDetail } from '../prequalified/match-detail.ts'
import { testKind } from '../ranges.ts'
import type { Variable } from '../variables.ts'

const isGroove = (context: RuleContext): boolean => context.procedure.joint.weld === 'groove'

const type = namedRule({
  meta: meta('groove_type'),
  field: 'joint.groove',
  at: 'weld',
  label: 'groove type',
  applies: isGroove,
  asked: (context) => (context.procedure.joint.groove ? [context.procedure.joint.groove] : null),
  tested: (_context, side) => (side.variables.joint.weld === 'fillet' ? undefined : side.variables.joint.groove),
  because: 'A complete-penetration test covers every groove detail that meets the prequalified dimensions, else its own type.',
  setValue: (name) => name,
})

export const grooveType: Rule = {
  ...type,
  check(context, sides, joined) {
    const judged = type.check(context, sides, joined)
    if (judged?.verdict !== 'outside' || !context.block || !sides.some((side) => testKind(side.variables) === 'complete')) return judged
    const match = matchDetail(context.procedure, context.block, context.system)
    const complete = names(sides.filter((side) => testKind(side.variables) === 'complete'))
    if (match.fits === 'yes' && match.detail) return { ...judged, verdict: 'within', sentence: `The groove meets the prequalified dimensions of ${match.detail.code}, so the complete-penetration test of ${complete} covers it.`, basis: match.detail.basis === 'read' ? 'secondary' : match.detail.basis, fixes: [] }
    const why = match.misses.length > 0 ? `it does not fit the nearest detail kept here: ${list(match.misses.map(({ sentence }) => sentence))}` : match.lacking.length > 0 ? `the draft leaves open ${list(match.lacking)}` : 'no detail for such a groove is kept here'
    return { ...judged, verdict: 'cannot-tell', sentence: `The groove type is not that of ${complete}, which covers another type only where its detail meets the prequalified dimensions; ${why}.`, missing: match.lacking.length > 0 ? match.lacking.map((field) => `procedure: ${field}`) : ['a prequalified detail that the groove meets'] }
  },
}

const squareOr = ({ joint }: WeldingVariables): string | null => (joint.groove === null ? null : joint.groove === 'square' ? 'square groove' : 'other groove')

export const squareGroove = namedRule({
  meta: meta('square_groove'),
  field: 'joint.groove',
  at: 'weld',
  label: 'kind of groove (square or other)',
  applies: isGroove,
  asked(context) {
    const value = squareOr(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.variables.joint.weld === 'fillet' ? undefined : squareOr(side.variables)),
  because: 'A square groove and any other groove are qualified apart.',
})

/** Fit-up tolerances as printed; the opening of a backgouged root may close further, its face is not limited. */
const TOLERANCE = { SI: { opening: 2, openingGouged: 3, face: 2 }, US: { opening: 1 / 16, openingGouged: 1 / 8, face: 1 / 16 } } as const
const ANGLE = 5

const isGouged = ({ joint }: WeldingVariables): boolean => joint.backGouging !== null && joint.backGouging !== 'none'

interface Measure { variable: Variable; field: string; label: string; dimension: 'length' | 'angle'; value: (variables: WeldingVariables) => Interval | null; may: 'fall' | 'rise'; room: (variables: WeldingVariables, system: UnitSystem) => number | null; arises: (variables: WeldingVariables) => boolean }

const notSquare = ({ joint }: WeldingVariables): boolean => joint.groove !== 'square'
const isFlare = ({ joint }: WeldingVariables): boolean => joint.groove === 'flare-bevel' || joint.groove === 'flare-v'

function measure({ variable, field, label, dimension, value, may, room, arises }: Measure): Rule {
  return figureRule({
    meta: meta(variable),
    field,
    at: 'weld',
    label,
    dimension,
    applies: (context) => isGroove(context) && arises(context.procedure),
    asked(context) {
      const { min, max, all, fault } = figures(value(context.procedure), dimension, context.system)
      if (fault) return 'fault'
      if (all) return { min: null, max: null }
      const low = min ?? max
      const high = max ?? min
      // Only the end that counts: the smallest opening or angle, the largest face.
      return low === null || high === null ? null : may === 'fall' ? { min: low, max: low } : { min: high, max: high }
    },
    range(context, side) {
      const { system } = context
      const unit = unitOf(dimension, system)
      if (side.variables.joint.weld === 'fillet') return null
      // A test of another groove says nothing of this measure: the groove type is judged by itself.
      if (!arises(side.variables)) return { range: between(dimension, unit, UNLIMITED, UNLIMITED), tested: null, reason: `${side.coupon.number} has a groove without ${label}.` }
      const { min, max, fault } = figures(value(side.variables), dimension, system)
      const had = may === 'fall' ? (min ?? max) : (max ?? min)
      if (had === null || fault) return { range: unknownNumeric(dimension, unit), tested: null, reason: `${side.coupon.number} does not record the ${label}.`, missing: [`${side.coupon.number}: ${field}`] }
      const step = room(side.variables, system)
      if (step === null) return { range: between(dimension, unit, UNLIMITED, UNLIMITED), tested: had, reason: `The ${label} of a backgouged root is not limited.` }
      const edge = tidy(may === 'fall' ? had - step : had + step)
      return { range: may === 'fall' ? between(dimension, unit, closed(edge), UNLIMITED) : between(dimension, unit, UNLIMITED, closed(edge)), tested: had, reason: `${show(had, unit)} may be ${show(step, unit)} ${may === 'fall' ? 'less' : 'more'}.` }
    },
  })
}

export const grooveAngle = measure({
  variable: 'groove_angle', field: 'joint.includedAngle', label: 'groove angle', dimension: 'angle', may: 'fall',
  value: ({ joint }) => (isStated(joint.includedAngle) ? joint.includedAngle : joint.bevelAngle),
  room: () => ANGLE,
  arises: (variables) => notSquare(variables) && !isFlare(variables),
})
export const rootOpening = measure({
  variable: 'root_opening', field: 'joint.rootOpening', label: 'root opening', dimension: 'length', may: 'fall',
  value: ({ joint }) => joint.rootOpening,
  room: (variables, system) => TOLERANCE[system][isGouged(variables) ? 'openingGouged' : 'opening'],
  arises: () => true,
})
export const rootFace = measure({
  variable: 'root_face', field: 'joint.rootFace', label: 'root face', dimension: 'length', may: 'rise',
  value: ({ joint }) => joint.rootFace,
  room: (variables, system) => (isGouged(variables) ? null : TOLERANCE[system].face),
  arises: notSquare,
})
