/** The settings of a panel, control by control: the approved range in the panel's own unit and steps. */
import type { PanelControl, PanelLine, PanelNotice, PanelQuantity } from '../schemas/machines.ts'
import { settle } from '../units/convert.ts'
import { formatNumber } from '../units/format.ts'
import { SI_UNIT } from '../units/types.ts'
import { notice, PROGRAM_KINDS, type Approved, type CardFacts } from './card-facts.ts'
import { dialFigures, dialStored, narrowed, overlap, type Dialled, type Span } from './dial.ts'
import { list } from './fit-notices.ts'
import { fromStorage, PANEL_QUANTITY, toStorage } from './panel-quantities.ts'
import { commonStretches, isUneven, knobStretches, measuredAt, stationsOf, widest, type Measured } from './program-points.ts'
import { measurementsFor } from './wires.ts'

const decimalsIn = (step: number): number => (/e-(\d+)$/.exec(String(step))?.[1] ? Number(/e-(\d+)$/.exec(String(step))?.[1]) : (String(step).split('.')[1]?.length ?? 0))

/** A figure as it stands on the panel: with the decimals of its steps. */
export const panelFigure = (value: number, { step, min }: Pick<PanelControl, 'step' | 'min'>): string => (step === null ? String(value) : value.toFixed(Math.max(decimalsIn(step), decimalsIn(min))))

const withUnit = (figure: string, unit: string): string => (unit === '' ? figure : `${figure} ${unit}`)
const scaleText = (control: PanelControl): string => withUnit(`${panelFigure(control.min, control)} to ${panelFigure(control.max, control)}`, control.unit)
const isMeasured = (quantity: PanelQuantity): quantity is Measured => quantity === 'current' || quantity === 'voltage' || quantity === 'wireFeed'
/** A stored span in the words of its own unit; for reasons. */
const spanText = ({ lo, hi }: Span, quantity: PanelQuantity): string => {
  const { dimension } = PANEL_QUANTITY[quantity]
  const figure = (value: number) => (dimension === null ? String(value) : formatNumber(value, dimension))
  const unit = dimension === null ? '' : SI_UNIT[dimension]
  return withUnit(figure(lo) === figure(hi) ? figure(lo) : `${figure(lo)} to ${figure(hi)}`, unit)
}

/** The approved range of a quantity after the machine's accuracy and reach; null, with the reason noted, where nothing is left. */
export function heldRange({ machine, mode, machineNumber }: CardFacts, quantity: PanelQuantity, { span, text }: Approved, notices: PanelNotice[]): Span | null {
  if (!isMeasured(quantity)) return span
  const { label } = PANEL_QUANTITY[quantity]
  const accuracy = machine.calibration.accuracy[quantity]
  const held = narrowed(span, accuracy)
  if (!held) {
    notices.push(notice('refuse', 'cannot-hold', `${label}: the procedure allows ${text}; the meters of ${machineNumber} are true to ± ${accuracy ?? '?'} %, which is wider. No reading would be proof that the range is kept.`, 'calculated: the range narrowed by the meter’s accuracy'))
    return null
  }
  const reach = mode.reach[quantity]
  if (!reach) return held
  const reached = overlap(held, { lo: reach.min, hi: reach.max })
  if (!reached) notices.push(notice('refuse', 'out-of-reach', `${label}: the procedure asks for ${text}; in this mode ${machineNumber} gives ${spanText({ lo: reach.min, hi: reach.max }, quantity)}.`))
  return reached
}

const line = (control: PanelControl, part: Partial<PanelLine>): PanelLine => ({
  control: control.key, label: control.label, where: control.where, quantity: control.sets, unit: control.unit, value: null, text: '—', min: null, max: null, scaleMin: control.min, scaleMax: control.max, step: control.step, because: '', shown: control.shown, ...part,
})

const dialled = (control: PanelControl, { min, max, value }: Extract<Dialled, { ok: true }>, because: string): PanelLine => line(control, { value, text: withUnit(panelFigure(value, control), control.unit), min, max, because })

function refusal(control: PanelControl, text: string, { why, below, above }: Extract<Dialled, { ok: false }>): PanelNotice {
  if (why === 'off-scale') return notice('refuse', 'off-scale', `${control.label}: the procedure asks for ${text}; the scale runs from ${scaleText(control)}.`)
  const neighbours = [below, above].flatMap((value) => (value === null ? [] : [withUnit(panelFigure(value, control), control.unit)]))
  return notice('refuse', 'step', `${control.label}: the procedure asks for ${text}; the control goes in steps of ${withUnit(String(control.step), control.unit)} and has no position inside${neighbours.length > 0 ? ` (nearest: ${neighbours.join(' and ')})` : ''}.`)
}

function converted(facts: CardFacts, control: PanelControl, approved: Approved, notices: PanelNotice[]): PanelLine {
  const held = heldRange(facts, control.sets, approved, notices)
  if (!held) return line(control, { because: 'The machine can’t keep the approved range.' })
  const found = dialStored(control, held)
  if (!found) {
    notices.push(notice('warn', 'bare-scale', `${control.label}: the scale (${scaleText(control)}) has no unit, so the position for ${approved.text} cannot be worked out. Turn it until the measured value is inside.`, 'common practice: measure once and note the position'))
    return line(control, { because: 'Its scale has no unit to convert.' })
  }
  if (!found.ok) {
    notices.push(refusal(control, approved.text, found))
    return line(control, { because: 'No position of the control lies in the approved range.' })
  }
  const ends = [held.lo, held.hi].map((end) => (Number.isFinite(end) ? fromStorage(end, control.sets, control.unit) : null))
  const cut = (ends[0] !== null && ends[0] !== undefined && ends[0] < control.min) || (ends[1] !== null && ends[1] !== undefined && ends[1] > control.max)
  const accuracy = isMeasured(control.sets) ? facts.machine.calibration.accuracy[control.sets] : null
  return dialled(control, found, [
    `The procedure allows ${approved.text}`, accuracy !== null && `, narrowed by the meters’ ± ${accuracy} %`, control.step === null ? '' : `, rounded inward to steps of ${withUnit(String(control.step), control.unit)}`, cut && '; the scale ends sooner', '.',
  ].filter(Boolean).join(''))
}

/** The control that leads a one-knob mode; its positions are what the measured points count by. */
export const leadingControl = ({ kind, controls }: CardFacts['mode']): PanelControl | null =>
  controls.find(({ sets }) => sets === 'knob') ?? (PROGRAM_KINDS.includes(kind) ? (controls.find(({ sets }) => sets === 'wireFeed') ?? controls.find(({ sets }) => sets === 'current') ?? null) : null)

type MeasuredSet = NonNullable<CardFacts['program']>['measured'][number]
interface KnobFound { set: MeasuredSet; dial: Extract<Dialled, { ok: true }>; stretches: number; limits: Measured[]; unknown: Measured[] }

const LIMITS: readonly Measured[] = ['wireFeed', 'voltage', 'current']

/** Knob positions at which everything that was measured and is limited lies in its range. */
function knobOf(control: PanelControl, set: MeasuredSet, held: Partial<Record<Measured, Span>>): KnobFound | { why: Extract<Dialled, { ok: false }> | 'nowhere'; limits: Measured[]; unknown: Measured[] } | null {
  const wanted = LIMITS.filter((of) => held[of] !== undefined)
  const limits = wanted.filter((of) => stationsOf(set.points, of).length > 0)
  const unknown = wanted.filter((of) => !limits.includes(of) && of !== control.sets)
  if (limits.length === 0) return null
  let stretches: Span[] = [{ lo: control.min, hi: control.max }]
  const own = control.sets !== 'knob' && isMeasured(control.sets) ? held[control.sets] : undefined
  if (own) {
    const direct = dialStored(control, own)
    stretches = direct?.ok ? [{ lo: direct.min, hi: direct.max }] : []
  }
  for (const of of limits) stretches = commonStretches(stretches, knobStretches(set.points, of, held[of] ?? { lo: -Infinity, hi: Infinity }))
  const stretch = widest(stretches)
  if (!stretch) return { why: 'nowhere', limits, unknown }
  const inside = (knob: number): boolean =>
    limits.every((of) => {
      const range = held[of]
      const out = measuredAt(set.points, of, knob)
      return out !== null && range !== undefined && out.low >= range.lo && out.high <= range.hi
    }) && (!own || [toStorage(knob, control.sets, control.unit)].every((stored) => stored !== null && stored >= own.lo && stored <= own.hi))
  const dial = dialFigures(control, stretch, inside)
  return dial.ok ? { set, dial, stretches: stretches.length, limits, unknown } : { why: dial, limits, unknown }
}

/** What comes out where the other range is kept: the reason why no position keeps both. */
function clash(control: PanelControl, set: MeasuredSet, held: Partial<Record<Measured, Span>>, limits: readonly Measured[], ranges: CardFacts['ranges']): string {
  const [first, second] = limits
  const range = first && held[first]
  const label = (of: Measured) => PANEL_QUANTITY[of].label.toLowerCase()
  if (!first || !range) return ''
  const stretch = widest(knobStretches(set.points, first, range))
  const stations = stationsOf(set.points, first)
  const [all, ends] = [stations.flatMap(({ low, high }) => [low, high]), [stations[0]?.knob, stations.at(-1)?.knob]]
  const knobs = (lo: number, hi: number) => withUnit(lo === hi ? String(settle(Number(lo.toPrecision(3)))) : `${Number(lo.toPrecision(3))} to ${Number(hi.toPrecision(3))}`, control.unit)
  if (!stretch) return ` Between ${knobs(ends[0] ?? 0, ends[1] ?? 0)} it gave ${spanText({ lo: Math.min(...all), hi: Math.max(...all) }, first)} of ${label(first)}; the procedure asks for ${ranges[first]?.text ?? ''}.`
  const seen = second ? [measuredAt(set.points, second, stretch.lo), measuredAt(set.points, second, stretch.hi)].flatMap((out) => (out ? [out.low, out.high] : [])) : []
  if (!second || seen.length === 0) return ''
  return ` Where ${label(first)} is right, at ${knobs(stretch.lo, stretch.hi)}, ${label(second)} is ${spanText({ lo: Math.min(...seen), hi: Math.max(...seen) }, second)}; the procedure asks for ${ranges[second]?.text ?? ''}.`
}

interface Led { line: PanelLine; trim: number | null; /** Whether a measured set decided; else the trim is not known. */ measured: boolean }

/** The leading control of a program, by the shop's own points of this wire, diameter and gas. */
function led(facts: CardFacts, control: PanelControl, notices: PanelNotice[]): Led {
  const { program, wire, wireText, ranges } = facts
  const approved = ranges[control.sets]
  const sets = program ? measurementsFor(program, wire).filter(({ points }) => points.length > 0) : []
  const held: Partial<Record<Measured, Span>> = {}
  for (const of of LIMITS) {
    const range = ranges[of]
    const span = range && heldRange(facts, of, range, notices)
    if (span) held[of] = span
  }
  const results = sets.map((set) => ({ set, result: knobOf(control, set, held) }))
  const found = results.flatMap(({ result }) => (result && 'dial' in result ? [result] : [])).sort((one, other) => other.dial.max - other.dial.min - (one.dial.max - one.dial.min))[0]
  const names = (of: readonly Measured[]) => list(of.map((one) => PANEL_QUANTITY[one].label.toLowerCase()))
  if (found) {
    const { set, dial, stretches, limits, unknown } = found
    const uneven = limits.filter((of) => isUneven(set.points, of))
    if (uneven.length > 0) notices.push(notice('warn', 'points-uneven', `The measured points of ${names(uneven)} do not run evenly up or down. The card keeps to where all of them agree; measure the doubtful ones again.`, 'the shop’s own points'))
    if (stretches > 1) notices.push(notice('note', 'stretches', `More than one stretch of ${control.label} keeps the ranges; the card gives the widest.`, 'the shop’s own points'))
    if (unknown.length > 0) notices.push(notice('warn', 'points-lack', `The points hold no ${names(unknown)}, which the procedure limits: measure it while welding.`, 'the shop’s own points'))
    return { line: dialled(control, dial, `Interpolated between the shop’s own points of ${wireText}, so that ${names(limits)} ${limits.length === 1 ? 'stays' : 'stay'} inside; never beyond the outermost point.`), trim: set.trim, measured: true }
  }
  const failed = results.find(({ result }) => result !== null)
  if (failed?.result && 'why' in failed.result) {
    const { why, limits } = failed.result
    const reason = why === 'nowhere' || why.why === 'off-scale' ? `No position between the measured points keeps ${names(limits)} inside.${clash(control, failed.set, held, limits, ranges)}` : `The stretch that keeps ${names(limits)} inside lies between two steps of ${control.label}.`
    notices.push(notice('refuse', why === 'nowhere' || why.why === 'off-scale' ? 'no-knob' : 'step', `${control.label}: ${reason}`, 'the shop’s own points'))
    return { line: line(control, { because: 'No position keeps the approved ranges.' }), trim: null, measured: false }
  }
  if (approved) {
    if (program) notices.push(notice('warn', 'no-points', `${control.label} is worked out from its scale. The shop has no measured points of ${wireText} with program “${program.label}”, so the arc volts that come with it are not foretold: measure them.`, 'common practice'))
    return { line: converted(facts, control, approved, notices), trim: null, measured: false }
  }
  notices.push(program && program.measured.length > 0
    ? notice('refuse', 'no-points', `${control.label}: the shop’s points of program “${program.label}” are of other wires or gases (${[...new Set(program.measured.map((one) => `${one.wire} ${one.diameter} mm, ${one.gas}`))].join('; ')}). Measure a few points with ${wireText} first.`, 'the shop’s own points')
    : notice('refuse', 'no-points', `${control.label}: what this knob does with ${wireText} has not been measured. Weld with the knob at three or four positions, note wire feed and volts of each in the register, and the card can be made.`, 'common practice'))
  return { line: line(control, { because: 'Nothing was measured to go by.' }), trim: null, measured: false }
}

type Written = NonNullable<CardFacts['block']['electrical']['panel']>['settings'][number]
const alike = (one: string | null, other: string): boolean => one !== null && one.trim().toLowerCase() === other.trim().toLowerCase()

/** What the procedure itself writes for this control of this machine. */
function writtenFor({ block, machine, machineNumber, mode }: CardFacts, control: PanelControl): { setting: Written; value: number } | null {
  const { panel } = block.electrical
  if (!panel || !(alike(panel.machine, machineNumber) || alike(panel.machine, machine.name))) return null
  if (panel.mode !== null && !alike(panel.mode, mode.name) && !alike(panel.mode, mode.key) && !alike(panel.mode, mode.kind.replace('-', ' '))) return null
  const setting = panel.settings.find((one) => alike(one.control, control.label) && one.unit.trim() === control.unit)
  const value = Number(setting?.value.replace(',', '.'))
  return setting && Number.isFinite(value) ? { setting, value } : null
}

/** The procedure's own figure for the control is dialled, where it lies in what was worked out; without a range it stands for itself. */
function asWritten(facts: CardFacts, control: PanelControl, worked: PanelLine, notices: PanelNotice[]): PanelLine {
  const written = writtenFor(facts, control)
  if (!written) return worked
  const { setting, value } = written
  if (value < control.min || value > control.max) return worked
  const text = withUnit(panelFigure(value, control), control.unit)
  const why = `The procedure itself writes ${text} for this control.`
  const onStep = control.step === null || Math.abs(settle((value - control.min) / control.step) - Math.round((value - control.min) / control.step)) < 1e-9
  if (worked.value === null && facts.ranges[control.sets] === undefined && control.sets !== 'knob') {
    const bar = dialFigures(control, { lo: setting.min ?? value, hi: setting.max ?? value })
    return onStep && bar.ok && bar.min <= value && value <= bar.max ? { ...worked, value, text, min: bar.min, max: bar.max, because: why } : worked
  }
  if (worked.value === null || worked.min === null || worked.max === null) return worked
  if (onStep && value >= worked.min && value <= worked.max) {
    // A bar of its own that the procedure writes for the control binds too; the narrower counts.
    const bar = dialFigures(control, { lo: Math.max(worked.min, setting.min ?? worked.min), hi: Math.min(worked.max, setting.max ?? worked.max) })
    return { ...worked, value, text, ...(bar.ok && bar.min <= value && value <= bar.max ? { min: bar.min, max: bar.max } : {}), because: `${why} ${worked.because}` }
  }
  notices.push(notice('warn', 'written-outside', `${control.label}: the procedure writes ${text} for this machine, which is not inside what its ranges leave (${withUnit(`${panelFigure(worked.min, control)} to ${panelFigure(worked.max, control)}`, control.unit)}). The card goes by the ranges.`))
  return worked
}

/** Every control of the mode with what to dial, in the order of the panel; what stands in the way is added to `notices`. */
export function panelLines(facts: CardFacts, notices: PanelNotice[]): PanelLine[] {
  const leading = leadingControl(facts.mode)
  const lead = leading && led(facts, leading, notices)
  return facts.mode.controls.map((control) => {
    if (lead && control === leading) return asWritten(facts, control, lead.line, notices)
    const approved = facts.ranges[control.sets]
    if (approved) return asWritten(facts, control, converted(facts, control, approved, notices), notices)
    if (control.sets === 'trim' && lead?.measured) {
      const { trim } = lead
      if (trim !== null && trim >= control.min && trim <= control.max) return line(control, { value: trim, text: withUnit(panelFigure(trim, control), control.unit), min: trim, max: trim, because: 'The points were measured at this trim; at another they do not hold.' })
      notices.push(notice('note', 'trim-unknown', `${control.label}: at which trim the points were measured is not noted. Leave it where it stood.`, 'the shop’s own points'))
    }
    return asWritten(facts, control, line(control, { because: 'The procedure doesn’t limit this.' }), notices)
  })
}
