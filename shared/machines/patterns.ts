/**
 * Generic patterns to start a machine from: the controls that such a panel usually has. Ends of scales are only a beginning, to be
 * set right by the panel in front of one; those of manual pulse are the spans of one maker's interface (secondary, maker's manual),
 * the others common practice. No make or model is meant.
 */
import { machineModeSchema, type MachineMode, type PanelControl, type PanelQuantity } from '../schemas/machines.ts'
import { PANEL_QUANTITY } from './panel-quantities.ts'

export const PATTERN_KEYS = ['constant-voltage', 'one-knob', 'pulsed-one-knob', 'manual-pulse', 'double-pulse', 'tig', 'tig-ac', 'stick'] as const
export type PatternKey = (typeof PATTERN_KEYS)[number]

export interface Pattern { key: PatternKey; label: string; about: string; mode: MachineMode }

/** A row for a control of this quantity, with its usual label and unit. */
export const newControl = (sets: PanelQuantity, given: Partial<PanelControl> = {}): PanelControl => ({
  key: sets.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`), label: PANEL_QUANTITY[sets].label, where: null, sets, unit: PANEL_QUANTITY[sets].unit, min: 0, max: 10, step: null, shown: true, ...given,
})
const scale = (sets: PanelQuantity, min: number, max: number, step: number | null, given: Partial<PanelControl> = {}): PanelControl => newControl(sets, { min, max, step, ...given })
const welding: MachineMode['displays'] = [{ quantity: 'current', unit: 'A', when: 'while-welding', resolution: 1 }, { quantity: 'voltage', unit: 'V', when: 'while-welding', resolution: 0.1 }]
const feed = scale('wireFeed', 1, 20, 0.1)
const gasTimes = [scale('preFlow', 0, 5, 0.1), scale('postFlow', 0, 20, 0.5)]
const mode = (given: Partial<MachineMode> & Pick<MachineMode, 'key' | 'name' | 'kind' | 'processes'>): MachineMode => machineModeSchema.parse(given)

export const PATTERNS: readonly Pattern[] = [
  { key: 'constant-voltage', label: 'Constant-voltage wire', about: 'Volts and wire feed, each with its own knob.', mode: mode({ key: 'wire', name: 'Wire', kind: 'constant-voltage', processes: ['GMAW', 'FCAW'], transferModes: ['short-circuiting', 'globular', 'spray'], polarities: ['DCEP'], controls: [scale('voltage', 14, 36, 0.5), feed, scale('inductance', 0, 10, 1)], displays: welding }) },
  { key: 'one-knob', label: 'One-knob programs', about: 'A program for wire and gas; one knob leads, a trim sets the arc length.', mode: mode({ key: 'one-knob', name: 'One knob', kind: 'one-knob', processes: ['GMAW'], transferModes: ['short-circuiting', 'spray'], polarities: ['DCEP'], controls: [scale('knob', 0, 10, 0.1), scale('trim', -5, 5, 0.5)], displays: welding }) },
  { key: 'pulsed-one-knob', label: 'Pulsed, one knob', about: 'As one-knob, with pulses that the machine picks.', mode: mode({ key: 'pulse', name: 'Pulse', kind: 'pulsed-one-knob', processes: ['GMAW'], transferModes: ['pulsed-spray'], polarities: ['DCEP'], controls: [feed, scale('trim', 0.5, 1.5, 0.01)], displays: welding, has: { craterFill: false, hotStart: false, ramp: false, preFlow: false, postFlow: false } }) },
  { key: 'manual-pulse', label: 'Manual pulse', about: 'Peak, background, frequency, on-time and wire feed: five settings that pull on each other.', mode: mode({ key: 'manual-pulse', name: 'Manual pulse', kind: 'manual-pulse', processes: ['GMAW'], transferModes: ['pulsed-spray'], polarities: ['DCEP'], controls: [feed, scale('peakCurrent', 100, 565, 1), scale('backgroundCurrent', 10, 200, 1), scale('pulseFrequency', 20, 400, 1), scale('pulseOnTime', 1, 5, 0.1)], displays: welding }) },
  { key: 'double-pulse', label: 'Double pulse', about: 'Pulses that swell and ebb a few times a second.', mode: mode({ key: 'double-pulse', name: 'Double pulse', kind: 'double-pulse', processes: ['GMAW'], transferModes: ['pulsed-spray'], polarities: ['DCEP'], controls: [feed, scale('trim', 0.5, 1.5, 0.01), scale('doublePulseFrequency', 0.5, 5, 0.1)], displays: welding }) },
  { key: 'tig', label: 'TIG', about: 'Amps with slopes, crater and gas times.', mode: mode({ key: 'tig', name: 'TIG', kind: 'constant-current', processes: ['GTAW'], polarities: ['DCEN'], controls: [scale('current', 5, 300, 1), scale('upSlope', 0, 10, 0.1), scale('downSlope', 0, 20, 0.1), scale('craterCurrent', 5, 300, 1), ...gasTimes], displays: welding, has: { craterFill: true, hotStart: false, ramp: true, preFlow: true, postFlow: true } }) },
  { key: 'tig-ac', label: 'TIG, alternating', about: 'As TIG, with balance and frequency.', mode: mode({ key: 'tig-ac', name: 'TIG AC', kind: 'ac', processes: ['GTAW'], polarities: ['AC'], controls: [scale('current', 5, 300, 1), scale('acBalance', 30, 90, 1), scale('acFrequency', 40, 200, 1), scale('downSlope', 0, 20, 0.1), ...gasTimes], displays: welding, has: { craterFill: true, hotStart: false, ramp: true, preFlow: true, postFlow: true } }) },
  { key: 'stick', label: 'Stick', about: 'Amps, with hot start.', mode: mode({ key: 'stick', name: 'Stick', kind: 'constant-current', processes: ['SMAW'], polarities: ['DCEP', 'DCEN'], controls: [scale('current', 10, 300, 1), scale('hotStart', 0, 100, 5)], displays: welding, has: { craterFill: false, hotStart: true, ramp: false, preFlow: false, postFlow: false } }) },
]

/** A key that none of the others has: `wire`, then `wire-2` … */
export function freshKey(wanted: string, taken: readonly string[]): string {
  const plain = wanted.toLowerCase().replace(/[^a-z0-9]+/g, '-').replace(/^-+|-+$/g, '').slice(0, 34) || 'one'
  if (!taken.includes(plain)) return plain
  let count = 2
  while (taken.includes(`${plain}-${count}`)) count += 1
  return `${plain}-${count}`
}
