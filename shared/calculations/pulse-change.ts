/** What a change of pulse settings did, and which of the other settings to bring along to keep drop, mean current or detachment as they were. */
import { bringAlong, pulseFigures, type PulseFigures, type PulseSettings } from './pulse.ts'
import { written } from './result.ts'

export interface PulseDelta { key: keyof PulseFigures; before: number; after: number; change: number }
export interface Companion {
  setting: 'frequency' | 'onTime'
  /** In the setting's unit, Hz or ms. */
  value: number
  /** What it keeps as it was. */
  keeps: 'droplet' | 'meanCurrent' | 'detachment'
  sentence: string
}
export interface PulseChange { changed: (keyof PulseSettings)[]; deltas: PulseDelta[]; companions: Companion[] }

const moved = (one: number, other: number): boolean => Math.abs(one - other) > 1e-9 * Math.max(1, Math.abs(one))
const KEYS: readonly (keyof PulseSettings)[] = ['peakCurrent', 'backgroundCurrent', 'frequency', 'onTime', 'wireFeed', 'wireDiameter', 'peakVoltage', 'backgroundVoltage', 'travelSpeed']

/**
 * Compares two sets of pulse settings; null when either can't be.
 * A companion is offered only where it fits into its period at the new settings; each keeps one thing, so they may not all be taken.
 */
export function pulseChange(before: PulseSettings, after: PulseSettings): PulseChange | null {
  const [was, is] = [pulseFigures(before).figures, pulseFigures(after).figures]
  if (!was || !is) return null
  const changed = KEYS.filter((key) => (before[key] ?? null) !== (after[key] ?? null))
  const deltas = (Object.keys(is) as (keyof PulseFigures)[]).flatMap((key): PulseDelta[] => {
    const [from, to] = [was[key], is[key]]
    return from !== null && to !== null && moved(from, to) ? [{ key, before: from, after: to, change: to - from }] : []
  })
  const companions: Companion[] = []
  const offer = (setting: Companion['setting'], value: number | null, keeps: Companion['keeps'], what: string) => {
    if (value === null || !moved(value, after[setting]) || !pulseFigures({ ...after, [setting]: value }).figures) return
    companions.push({ setting, value, keeps, sentence: `${setting === 'frequency' ? 'Pulse frequency' : 'Time at peak'} of ${written(Number(value.toPrecision(3)))} ${setting === 'frequency' ? 'Hz' : 'ms'} keeps ${what}.` })
  }
  if (was.dropletVolume !== null && is.dropletVolume !== null && moved(was.dropletVolume, is.dropletVolume)) offer('frequency', (after.frequency * is.dropletVolume) / was.dropletVolume, 'droplet', 'the wire melted per pulse as it was')
  if (moved(was.meanCurrent, is.meanCurrent)) offer('frequency', bringAlong.frequencyForMean({ meanCurrent: was.meanCurrent, peakCurrent: after.peakCurrent, backgroundCurrent: after.backgroundCurrent, onTime: after.onTime }), 'meanCurrent', `the mean current at ${written(Math.round(was.meanCurrent))} A`)
  if (moved(was.detachment, is.detachment)) offer('onTime', bringAlong.onTimeForPeak({ peakCurrent: before.peakCurrent, onTime: before.onTime, newPeak: after.peakCurrent }), 'detachment', 'the detachment parameter as it was')
  return { changed, deltas, companions }
}
