/** Two beads side by side: what was changed between them, what that does to current, power and drop, and what to bring along. */
import type { MachineMode } from '../schemas/machines.ts'
import type { BeadContent, BeadSetting } from '../schemas/trials.ts'
import { settle } from '../units/convert.ts'
import { gasText } from '../machines/wires.ts'
import { beadFigures, FIGURE, FIGURES, pulseInputs, type FigureKey, type How, type PulseInputs, type Told } from './bead-figures.ts'
import { bringAlongAdvice, type Advice } from './bring-along.ts'

export type Direction = 'up' | 'down' | 'same' | 'unknown'
export interface SettingChange { control: string; label: string; unit: string; before: number | null; after: number | null; direction: Direction }
interface Circumstance { key: string; label: string; before: string; after: string }
export interface FigureChange { key: FigureKey; label: string; unit: string; before: number | null; after: number | null; direction: Direction; /** (after − before) / before; null when either isn't known. */ share: number | null; how: How | null }

export interface BeadComparison {
  /** Settings that differ; empty when none does. */
  settings: SettingChange[]
  /** Wire, gas, stick-out and the like that differ: then a change of the bead isn't the setting's alone. */
  circumstances: Circumstance[]
  figures: FigureChange[]
  advice: Advice[]
  notes: string[]
  problems: string[]
  nothingChanged: boolean
}

const NOISE = 1e-9
function directionOf(before: number | null, after: number | null): Direction {
  if (before === null || after === null) return 'unknown'
  if (Math.abs(after - before) <= NOISE * Math.max(1, Math.abs(before), Math.abs(after))) return 'same'
  return after > before ? 'up' : 'down'
}

/** Settings that differ by control; one that only one bead has counts as changed. */
export function changedSettings(before: readonly BeadSetting[], after: readonly BeadSetting[]): SettingChange[] {
  const [was, is] = [new Map(before.map((one) => [one.control, one])), new Map(after.map((one) => [one.control, one]))]
  return [...new Set([...is.keys(), ...was.keys()])].flatMap((control) => {
    const [one, other] = [was.get(control), is.get(control)]
    const named = other ?? one
    if (!named) return []
    const alike = !one || !other || one.unit === other.unit
    const change: SettingChange = { control, label: named.label, unit: named.unit, before: alike ? (one?.value ?? null) : null, after: other?.value ?? null, direction: directionOf(alike ? (one?.value ?? null) : null, other?.value ?? null) }
    return change.direction === 'same' ? [] : [change]
  })
}

const NONE = 'not stated'
/** In words, for what stays the same between beads of one trial: machine and mode, wire, gas, metal, joint, position, stick-out. */
export function circumstancesOf(content: BeadContent): { key: string; label: string; text: string }[] {
  const typed = (value: { typed: string; unit: string } | null) => (value === null ? NONE : /[a-z°]/i.test(value.typed) ? value.typed : `${value.typed} ${value.unit}`)
  return [
    { key: 'machine', label: 'Machine', text: content.machineId ?? NONE },
    { key: 'mode', label: 'Mode', text: content.modeKey ?? NONE },
    { key: 'program', label: 'Program', text: content.programKey ?? NONE },
    { key: 'process', label: 'Process', text: content.process },
    { key: 'metal', label: 'Metal', text: content.metal ?? content.metalId ?? NONE },
    { key: 'thickness', label: 'Thickness', text: typed(content.thickness) },
    { key: 'joint', label: 'Joint', text: content.joint ?? NONE },
    { key: 'position', label: 'Position', text: content.position ?? NONE },
    { key: 'wire', label: 'Wire', text: content.wire ?? content.wireId ?? NONE },
    { key: 'wireDiameter', label: 'Wire diameter', text: typed(content.wireDiameter) },
    { key: 'gas', label: 'Gas', text: gasText(content.gas) ?? content.gas?.name ?? content.gas?.isoSymbol ?? NONE },
    { key: 'stickOut', label: 'Stick-out', text: typed(content.stickOut) },
  ]
}

/**
 * What the panel doesn't set and nobody has measured yet is taken from the bead before: it will move, so it is told as an assumption.
 */
function carriedOver(before: PulseInputs, after: PulseInputs): { inputs: PulseInputs; notes: string[] } {
  const carried: string[] = []
  const take = (key: 'peakCurrent' | 'backgroundCurrent' | 'travelSpeed', label: string, unit: string): number | null => {
    const [own, former] = [after[key], before[key]]
    if (own !== null || former === null) return own
    carried.push(`${label} ${Number(former.toPrecision(4))} ${unit}`)
    return former
  }
  const inputs = { ...after, peakCurrent: take('peakCurrent', 'peak current', 'A'), backgroundCurrent: take('backgroundCurrent', 'background current', 'A'), travelSpeed: take('travelSpeed', 'travel speed', 'mm/min') }
  return { inputs, notes: carried.length === 0 ? [] : [`Taken as on the bead before until they are measured: ${carried.join(', ')}.`] }
}

const figureChange = (key: FigureKey, before: Told | null, after: Told | null): FigureChange => {
  // A meter's figure against a model's would show a change that is only one of method.
  const comparable = before === null || after === null || before.how === after.how
  const [was, is] = [comparable ? (before?.value ?? null) : null, after?.value ?? null]
  const direction = directionOf(was, is)
  return { key, label: FIGURE[key].label, unit: FIGURE[key].unit, before: was, after: is, direction, share: direction === 'unknown' || was === null || is === null || was === 0 ? null : direction === 'same' ? 0 : settle((is - was) / was), how: after?.how ?? before?.how ?? null }
}

/**
 * Compares two beads of a trial. `after` may be a bead that is not welded yet: what only measuring can tell is then taken from `before` and said so.
 * @param mode of the machine, for the steps and ends of its controls
 * @param power W, from recordings of both arcs; with one of them alone nothing could be compared, so it is left out
 */
export function compareBeads(before: BeadContent, after: BeadContent, mode: MachineMode | null = null, power: { before: number | null; after: number | null } = { before: null, after: null }): BeadComparison {
  const settings = changedSettings(before.settings, after.settings)
  const [were, are] = [circumstancesOf(before), circumstancesOf(after)]
  const circumstances = are.flatMap(({ key, label, text }, index) => (text === were[index]?.text ? [] : [{ key, label, before: were[index]?.text ?? NONE, after: text }]))
  const both = before.measured.wireFeed !== null && after.measured.wireFeed !== null
  const from = pulseInputs(before, { dialled: !both })
  const { inputs, notes } = carriedOver(from, pulseInputs(after, { dialled: !both }))
  const recorded = power.before !== null && power.after !== null
  const [was, is] = [beadFigures(before, from, recorded ? power.before : null), beadFigures(after, inputs, recorded ? power.after : null)]
  return {
    settings, circumstances,
    figures: FIGURES.map((key) => figureChange(key, was.figures[key], is.figures[key])),
    advice: is.pulsed || was.pulsed ? bringAlongAdvice({ before: from, after: inputs, changed: settings, content: after, mode }) : [],
    notes: [...notes, ...is.notes], problems: is.problems,
    nothingChanged: settings.length === 0 && circumstances.length === 0,
  }
}
