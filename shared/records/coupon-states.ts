import type { CouponState } from '../schemas/records.ts'
import type { CouponContent } from '../schemas/welding.ts'

type Recorded = Pick<CouponContent, 'runSheet' | 'tension' | 'bends' | 'macros' | 'toughness' | 'hardness' | 'visual' | 'ndt'>
export interface CouponMove {
  from: CouponState
  to: CouponState
  /** What brings it about: a save whose content says so, or a signature. */
  by: 'save' | 'certification' | 'rejection'
  /** In words, for whoever asks why a coupon stands where it stands. */
  when: string
}

/** Every move of a coupon. An open coupon stands where its content puts it, so removing the last result moves it back. */
export const COUPON_MOVES: readonly CouponMove[] = [
  { from: 'planned', to: 'welding', by: 'save', when: 'the first pass is in the run sheet' },
  { from: 'planned', to: 'testing', by: 'save', when: 'the first test result is recorded' },
  { from: 'welding', to: 'testing', by: 'save', when: 'the first test result is recorded' },
  { from: 'welding', to: 'planned', by: 'save', when: 'the run sheet is empty again' },
  { from: 'testing', to: 'welding', by: 'save', when: 'the last test result was taken back' },
  { from: 'testing', to: 'planned', by: 'save', when: 'the results and the run sheet were taken back' },
  { from: 'testing', to: 'certified', by: 'certification', when: 'nothing that the standard asks for is missing, and somebody signs' },
  { from: 'planned', to: 'rejected', by: 'rejection', when: 'somebody signs with the reason' },
  { from: 'welding', to: 'rejected', by: 'rejection', when: 'somebody signs with the reason' },
  { from: 'testing', to: 'rejected', by: 'rejection', when: 'somebody signs with the reason' },
]

export const isOpen = (state: CouponState): boolean => COUPON_MOVES.some((move) => move.from === state)

/** Whether the table holds such a move. */
export const mayMove = (from: CouponState, to: CouponState, by: CouponMove['by']): boolean => COUPON_MOVES.some((move) => move.from === from && move.to === to && move.by === by)

/** Where an open coupon stands by what is recorded of it. */
export function openStateOf(content: Recorded): 'planned' | 'welding' | 'testing' {
  const results = content.tension.length + content.bends.length + content.macros.length + content.toughness.length + content.hardness.length + (content.visual ? 1 : 0) + (content.ndt?.length ?? 0)
  if (results > 0) return 'testing'
  return content.runSheet.length > 0 ? 'welding' : 'planned'
}
