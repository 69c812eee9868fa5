/** The faults by which a trial bead is scored, in the shop's words, and the knob that usually mends each in manual pulse. */
import type { BeadContent, BEAD_FAULTS } from '../schemas/trials.ts'

export type BeadFault = (typeof BEAD_FAULTS)[number]
export const FAULT_WORDS: Readonly<Record<BeadFault, string>> = {
  spatter: 'Spatter', undercut: 'Undercut', 'cold-lap': 'Cold lap', porosity: 'Porosity', 'crater-crack': 'Crater crack', 'arc-too-long': 'Arc too long', 'arc-too-short': 'Arc too short', 'bead-too-high': 'Too high', 'bead-too-wide': 'Too wide', 'burn-through': 'Burn-through', soot: 'Soot',
}
export const SEVERITY_WORDS = ['', 'a little', 'clear', 'bad'] as const
export const SCORE_WORDS = ['', 'scrap', 'poor', 'so-so', 'good', 'would write it down'] as const

/** "spatter, a little; soot, clear" */
export const faultsInWords = (faults: BeadContent['faults']): string => faults.map(({ fault, severity }) => `${FAULT_WORDS[fault].toLowerCase()}, ${SEVERITY_WORDS[severity] ?? ''}`).join('; ')

/** Which knob for which fault in manual pulse. [common practice] */
export const PULSE_REMEDY: Partial<Readonly<Record<BeadFault, string>>> = {
  spatter: 'The feed may be too high for the mean current: raise the frequency, which keeps the drop if the feed rises in step.',
  'arc-too-short': 'The feed is too high for the mean current: raise the frequency.',
  'arc-too-long': 'Lower the frequency or raise the feed.',
  soot: 'Often a long arc: lower the frequency or raise the feed.',
  'crater-crack': 'Fill the crater: crater fill where the machine has it, else double back 10 to 20 mm and re-trigger.',
  'burn-through': 'Too hot though drops leave well: lower frequency and feed together.',
}
