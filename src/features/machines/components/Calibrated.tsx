import type { CalibrationState } from '@shared/schemas/machines.ts'
import { CALIBRATION_WORDS } from '../words.ts'

const LOOK: Record<CalibrationState, string> = { current: 'border-jade text-jade', 'due-soon': 'border-straw text-straw-deep', lapsed: 'border-oxide text-oxide', unknown: 'border-dashed border-soft text-soft' }

/** Where the calibration stands, in a word with a shape of its own. */
export function Calibrated({ state }: { state: CalibrationState }) {
  return <span className={`inline-block rounded-sm border px-1.5 font-narrow text-[0.8125rem] leading-5 font-semibold tracking-[0.07em] whitespace-nowrap uppercase ${LOOK[state]}`}>{CALIBRATION_WORDS[state]}</span>
}
