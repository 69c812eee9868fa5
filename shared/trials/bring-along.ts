/**
 * In manual pulse every setting changes the others' effect at once. This says which one to bring along, to what figure, and why.
 * Drop and mean current follow from the pulse model (calculated); detachment is a recalled relation; aims are common practice.
 */
import { bringAlong, PULSE_EFFECTS, type PulseSetting } from '../calculations/pulse.ts'
import { fromStorage, PANEL_QUANTITY, toStorage } from '../machines/panel-quantities.ts'
import { panelFigure } from '../machines/panel-lines.ts'
import type { MachineMode, PanelControl, PanelQuantity } from '../schemas/machines.ts'
import type { BeadContent } from '../schemas/trials.ts'
import { settle } from '../units/convert.ts'
import { SI_UNIT } from '../units/types.ts'
import { DROP_RATIO, DUTY, type PulseInputs } from './bead-figures.ts'
import type { SettingChange } from './compare-beads.ts'

export interface Advice {
  /** `bring`: another setting to move. `watch`: what the change does, or a limit that is near. */
  kind: 'bring' | 'watch'
  /** The control to move; null where the panel has none, or nothing is to be moved. */
  control: string | null
  /** What to dial, in the panel's unit and on its steps; null for `watch`. */
  value: number | null
  unit: string
  /** "Frequency to 133 Hz". */
  title: string
  why: string
  /** The relation with its figures; empty where nothing was calculated. */
  formula: string
  basis: string
}

interface Given { before: PulseInputs; after: PulseInputs; changed: readonly SettingChange[]; content: BeadContent; mode: MachineMode | null }

const figure = (value: number): string => String(Number(value.toPrecision(4)))
const CALCULATED = 'calculated: the rectangular pulse'

/** The nearest position of a control, in its own unit; null where the figure lies off its scale. */
function onControl(stored: number, setting: { sets: PanelQuantity; unit: string }, control: PanelControl | null): number | null {
  const wanted = fromStorage(stored, setting.sets, setting.unit)
  if (wanted === null) return null
  if (!control) return Number(wanted.toPrecision(4))
  const { min, max, step } = control
  const at = step === null ? Number(wanted.toPrecision(4)) : settle(min + Math.round((wanted - min) / step) * step)
  return at < min || at > max ? null : at
}

export function bringAlongAdvice({ before, after, changed, content, mode }: Given): Advice[] {
  const found: Advice[] = []
  const moved = (quantity: PanelQuantity): boolean => changed.some(({ control }) => content.settings.some((one) => one.control === control && one.sets === quantity))
  const controlOf = (control: string): PanelControl | null => mode?.controls.find(({ key }) => key === control) ?? null

  let onTimeBrought: number | null = null
  /** @returns what is then dialled, in the unit of storage; null where nothing is moved */
  const bring: Bring = (quantity, stored, why, formula, basis) => {
    if (stored === null || !Number.isFinite(stored) || stored <= 0) return null
    const setting = content.settings.find(({ sets }) => sets === quantity)
    const { label, dimension } = PANEL_QUANTITY[quantity]
    if (!setting) {
      found.push({ kind: 'watch', control: null, value: null, unit: '', title: `${label} about ${figure(stored)} ${dimension ? SI_UNIT[dimension] : ''}`.trim(), why: `${why} This panel has no knob for it.`, formula, basis })
      return null
    }
    const value = onControl(stored, setting, controlOf(setting.control))
    const control = controlOf(setting.control)
    if (value === null) {
      const wanted = fromStorage(stored, setting.sets, setting.unit)
      found.push({ kind: 'watch', control: setting.control, value: null, unit: setting.unit, title: `${setting.label} can’t follow`, why: `${why} ${wanted === null ? 'Its scale has no unit to reckon with.' : `That asks ${figure(wanted)} ${setting.unit}, which is beyond its scale.`}`, formula, basis })
      return null
    }
    if (value === setting.value) return null
    const pulses = quantity === 'pulseFrequency' ? { frequency: stored, onTime: onTimeBrought ?? after.onTime } : quantity === 'pulseOnTime' ? { frequency: after.frequency, onTime: stored } : null
    if (pulses?.frequency && pulses.onTime && (pulses.frequency * pulses.onTime) / 1000 >= 1) {
      found.push({ kind: 'watch', control: setting.control, value: null, unit: setting.unit, title: `${setting.label} can’t follow`, why: `${why} That asks ${figure(value)} ${setting.unit}, at which the on-time fills the whole period and no background is left: go back with the setting that was changed.`, formula, basis })
      return null
    }
    found.push({ kind: 'bring', control: setting.control, value, unit: setting.unit, title: `${setting.label} to ${control ? panelFigure(value, control) : figure(value)}${setting.unit ? ` ${setting.unit}` : ''}`, why, formula, basis })
    return toStorage(value, setting.sets, setting.unit)
  }

  const [feedMoved, frequencyMoved, onTimeMoved] = [moved('wireFeed'), moved('pulseFrequency'), moved('pulseOnTime')]
  const [f1, f2, t1, t2, v1, v2] = [before.frequency, after.frequency, before.onTime, after.onTime, before.wireFeed, after.wireFeed]
  const peakShift = before.peakCurrent !== null && after.peakCurrent !== null && Math.abs(after.peakCurrent - before.peakCurrent) > 1e-9
  const backgroundShift = before.backgroundCurrent !== null && after.backgroundCurrent !== null && Math.abs(after.backgroundCurrent - before.backgroundCurrent) > 1e-9

  if (feedMoved && !frequencyMoved && f1 && v1 && v2)
    bring('pulseFrequency', bringAlong.frequencyForFeed({ frequency: f1, wireFeed: v1, newFeed: v2 }), `Wire feed went ${v2 > v1 ? 'up' : 'down'} while the pulses did not, so each pulse now melts ${v2 > v1 ? 'more' : 'less'} wire and the arc gets ${v2 > v1 ? 'shorter' : 'longer'}. In step with the feed the drop stays as it was, and the mean current follows.`, `f₂ = f₁ × feed₂ / feed₁ = ${figure(f1)} × ${figure(v2)} / ${figure(v1)}`, CALCULATED)
  if (frequencyMoved && !feedMoved && f1 && f2 && v1)
    bring('wireFeed', (v1 * f2) / f1, `Frequency went ${f2 > f1 ? 'up' : 'down'} alone: drops get ${f2 > f1 ? 'smaller' : 'larger'} and the arc ${f2 > f1 ? 'longer' : 'shorter'}. Feed in step keeps the drop.`, `feed₂ = feed₁ × f₂ / f₁ = ${figure(v1)} × ${figure(f2)} / ${figure(f1)}`, CALCULATED)

  const followed = !(peakShift && !onTimeMoved && t1 && before.peakCurrent && after.peakCurrent) ? null :
    bring('pulseOnTime', bringAlong.onTimeForPeak({ peakCurrent: before.peakCurrent, onTime: t1, newPeak: after.peakCurrent }), `The peak went ${after.peakCurrent > before.peakCurrent ? 'up' : 'down'}; one drop still leaves with each pulse when peak² × on-time stays the same.`, `on-time₂ = on-time₁ × (peak₁ / peak₂)² = ${figure(t1)} × (${figure(before.peakCurrent)} / ${figure(after.peakCurrent)})²`, 'memory: textbook relation, exponent about 2 for steel; the exponent for aluminium is not known')

  onTimeBrought = followed
  if ((onTimeMoved || peakShift || backgroundShift) && !frequencyMoved && !feedMoved && f1 && t1 && t2) {
    const known = before.peakCurrent !== null && before.backgroundCurrent !== null && after.peakCurrent !== null && after.backgroundCurrent !== null
    // Two pieces of advice are meant together: the frequency is reckoned with the on-time that follows the peak.
    const onTime = followed ?? t2
    const together = followed === null ? '' : ` with that on-time`
    const what = onTimeMoved ? 'The on-time' : peakShift ? 'The peak' : 'The background'
    if (known) {
      const duty = (f1 * t1) / 1000
      const mean = duty * (before.peakCurrent ?? 0) + (1 - duty) * (before.backgroundCurrent ?? 0)
      bring('pulseFrequency', bringAlong.frequencyForMean({ meanCurrent: mean, peakCurrent: after.peakCurrent ?? 0, backgroundCurrent: after.backgroundCurrent ?? 0, onTime }), `${what} moved the mean current off the ${figure(mean)} A that fits this wire feed. This frequency brings it back${together}.`, `f = 1000 × (mean − background) / (peak − background) / on-time = 1000 × (${figure(mean)} − ${figure(after.backgroundCurrent ?? 0)}) / (${figure(after.peakCurrent ?? 0)} − ${figure(after.backgroundCurrent ?? 0)}) / ${figure(onTime)}`, CALCULATED)
    } else if (onTimeMoved)
      bring('pulseFrequency', (f1 * t1) / t2, 'With the on-time the share of each period at peak moved, and the mean current with it. This frequency keeps the share, so the mean stays whatever the two currents are.', `f₂ = f₁ × on-time₁ / on-time₂ = ${figure(f1)} × ${figure(t1)} / ${figure(t2)}`, CALCULATED)
  }

  const told = found.some(({ control }) => control !== null && content.settings.some((one) => one.control === control && one.sets === 'pulseFrequency'))
  found.push(...watches({ before, after, changed, content, mode }, told ? null : bring))
  return found
}

type Bring = (quantity: PanelQuantity, stored: number | null, why: string, formula: string, basis: string) => number | null

/** Limits that are near, and what each changed setting usually does to the arc. @param bring null where the frequency is advised already */
function watches({ after, changed, content }: Given, bring: Bring | null): Advice[] {
  const found: Advice[] = []
  const watch = (title: string, why: string, basis: string, formula = ''): void => void found.push({ kind: 'watch', control: null, value: null, unit: '', title, why, formula, basis })
  const { frequency, onTime, wireFeed, wireDiameter } = after
  if (frequency && onTime) {
    const duty = (frequency * onTime) / 1000
    if (duty >= 1) watch('No background left', `At ${figure(frequency)} Hz a period lasts ${figure(1000 / frequency)} ms and the on-time is ${figure(onTime)} ms: it no longer pulses.`, CALCULATED)
    else if (duty > DUTY.high || duty < DUTY.low) watch(`Duty ${figure(duty)}`, `Settings that weld well mostly lie between ${DUTY.low} and ${DUTY.high}.`, DUTY.basis)
  }
  if (bring && frequency && wireFeed && wireDiameter && changed.length > 0) {
    const drop = Math.cbrt((6 * (((wireFeed * 1000) / 60) * Math.PI * wireDiameter ** 2)) / (4 * frequency * Math.PI))
    const ratio = drop / wireDiameter
    if (ratio > DROP_RATIO.high || ratio < DROP_RATIO.low)
      bring('pulseFrequency', bringAlong.frequencyForDrop({ wireFeed, wireDiameter, ratio: DROP_RATIO.aim }), `The drop would be ${figure(ratio)} times the wire, ${ratio > 1 ? 'too large for one drop a pulse' : 'smaller than one drop a pulse gives'}.`, `f = 1.5 × feed / (${DROP_RATIO.aim}³ × wire) = 1.5 × ${figure((wireFeed * 1000) / 60)} mm/s / (${DROP_RATIO.aim}³ × ${figure(wireDiameter)} mm)`, DROP_RATIO.basis)
  }
  const EFFECT: Partial<Record<PanelQuantity, PulseSetting>> = { peakVoltage: 'peakVoltage', voltage: 'peakVoltage', trim: 'peakVoltage', wireFeed: 'wireFeed', backgroundCurrent: 'backgroundCurrent', backgroundVoltage: 'backgroundCurrent', pulseFrequency: 'frequency', pulseOnTime: 'onTime' }
  for (const { control, label, direction } of changed) {
    const quantity = content.settings.find((one) => one.control === control)?.sets
    const effect = PULSE_EFFECTS.find(({ setting }) => setting === (quantity && EFFECT[quantity]))
    if (!effect || direction === 'unknown' || direction === 'same') continue
    const longer = (effect.arcLength === 'longer') === (direction === 'up')
    watch(`${label} ${direction}: arc ${longer ? 'longer' : 'shorter'}`, effect.watch, 'memory: usual direction, other settings fixed')
  }
  return found
}
