/** Bands of heat input from what a coupon had, in the quantity that the procedure states. */
import { numericRange, unknownNumeric } from '../../ranges/numeric.ts'
import { type Band } from '../common/review-band.ts'
import { cannotTell, stateFix } from '../common/wording.ts'
import type { CouponSide, RangeContext, RuleContext, RuleVerdict } from '../rule.ts'
import { energyOf, factors, type Energy, type EnergyKind } from './energy.ts'

export const UNIT = 'kJ/mm'

export const nothing = numericRange('heatInput', UNIT, [])

export const unknown = unknownNumeric('heatInput', UNIT)

const KIND: Readonly<Record<'E' | 'Q', string>> = { E: 'arc energy', Q: 'heat input with k' }

export const kindText = (kind: EnergyKind): string => (kind ? KIND[kind] : 'heat input or arc energy, not said which')

function askedKind(context: RangeContext, had: EnergyKind): EnergyKind {
  if (!context.block) return had
  const known = energyOf(context.block)
  return 'missing' in known ? had : known.kind
}

/** Band of one coupon: `limit` builds it from the tested energy and the factors that turn it into what the procedure states. */
export function energyBand(context: RangeContext, side: CouponSide, limit: (had: Energy, factor: { least: number; greatest: number }) => Pick<Band, 'sure' | 'maybe' | 'reason' | 'why' | 'basis'>): Band | null {
  if (!side.block) return null
  const had = energyOf(side.block, side.coupon)
  if ('missing' in had) return { sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not give its heat input.`, missing: had.missing.map((field) => `${side.coupon.number}: ${field}`) }
  const to = askedKind(context, had.kind)
  const factor = context.procedure ? factors(had.kind, to, side.block) : { least: 1, greatest: 1 }
  const band = limit(had, factor)
  const unsaid = factor.least !== factor.greatest
  return { ...band, tested: had.mean, why: unsaid ? `${kindText(null).replace(/^h/, 'H')}: the process factor k may or may not be in the figures. ${band.why ?? ''}`.trim() : band.why, missing: unsaid ? [...(had.kind === null ? [`${side.coupon.number}: electrical.heatInputQuantity`] : []), ...(to === null ? ['procedure: electrical.heatInputQuantity'] : [])] : undefined }
}

export const asked = (context: RangeContext): Energy | null => {
  const known = context.block ? energyOf(context.block) : null
  return known && !('missing' in known) ? known : null
}

/** What the procedure lacks to tell its own heat input. */
export function unstated(context: RuleContext, sentence: string): RuleVerdict | null {
  if (!context.block) return null
  const known = energyOf(context.block)
  if (!('missing' in known)) return null
  const first = known.missing[0]?.split(' ')[0] ?? 'electrical.heatInput'
  return cannotTell(sentence, known.missing.map((field) => `procedure: ${context.path}.${field}`), { field: `${context.path}.${first}`, fixes: [stateFix('heat input', `${context.path}.electrical.heatInput`)] })
}

export const SPREAD = 'The readings of the coupon are spread; the mean counts unless the record says that the specimens lay where the highest or lowest was.'
