/**
 * The panel card: an approved range turned into the settings of one machine, in the panel's own units and steps, rounded inward.
 * With any refusal the card is not ready and carries no figure to dial.
 */
import type { PanelCard, PanelLine, PanelNotice, PanelQuantity } from '../schemas/machines.ts'
import type { WeldingVariables } from '../schemas/welding.ts'
import { fromSi, settle } from '../units/convert.ts'
import { formatInterval } from '../units/format.ts'
import { SI_UNIT } from '../units/types.ts'
import { cardFacts, notice, spanOf, type Approved, type CardFacts, type PanelCardInput } from './card-facts.ts'
import { narrowed, type Span } from './dial.ts'
import { fitNotices } from './fit-notices.ts'
import { heldRange, panelLines } from './panel-lines.ts'
import { PANEL_QUANTITY } from './panel-quantities.ts'

export type { PanelCardInput } from './card-facts.ts'

const ORDER: Readonly<Record<PanelNotice['level'], number>> = { refuse: 0, warn: 1, note: 2 }

/** Inward to the given step, to a finer one where nothing of a narrow range would be left; an open end stays out. */
function inward({ lo, hi }: Span, step: number): { lo: number | null; hi: number | null } {
  for (const fine of [step, step / 5, step / 50]) {
    const [from, to] = [settle(Math.ceil(settle(lo / fine) - 1e-9) * fine), settle(Math.floor(settle(hi / fine) + 1e-9) * fine)]
    if (from <= to) return { lo: Number.isFinite(lo) ? from : null, hi: Number.isFinite(hi) ? to : null }
  }
  // A single figure leaves no inside: it is told as near as it is measured.
  const middle = lo === hi ? settle((Math.round((lo / step) * 5) / 5) * step) : Number(((lo + hi) / 2).toFixed(3))
  return { lo: middle, hi: middle }
}
const words = ({ lo, hi }: { lo: number | null; hi: number | null }, unit: string): string => (lo !== null && hi !== null ? (lo === hi ? `${lo} ${unit}` : `${lo} to ${hi} ${unit}`) : lo !== null ? `at least ${lo} ${unit}` : `at most ${hi ?? '?'} ${unit}`)

/** Seconds for which wire is run without arc, and what comes out is measured. */
const RUN_SECONDS = 6

/** Cut length of wire for the feed check: v·t. 100 in/min is 10 in. in 6 s. [calculated] */
function cutLength({ span }: Approved, system: CardFacts['system']): string {
  const millimetres = (feed: number) => (feed * 1000 * RUN_SECONDS) / 60
  const span6 = { lo: millimetres(span.lo), hi: millimetres(span.hi) }
  const inches = { lo: Number.isFinite(span6.lo) ? fromSi(span6.lo, 'length', 'in') : span6.lo, hi: Number.isFinite(span6.hi) ? fromSi(span6.hi, 'length', 'in') : span6.hi }
  return system === 'US' ? words(inward(inches, 0.1), 'in') : words(inward(span6, 1), 'mm')
}

const HOW: Partial<Record<PanelQuantity, string>> = {
  current: 'with a true-RMS clamp meter on the lead; know which mean it shows',
  voltage: 'at the feeder, as near the arc as you can: long leads lose 1 to 4 V',
  peakCurrent: 'with a recorder that samples the pulse; an ordinary meter shows a mean',
  backgroundCurrent: 'with a recorder that samples the pulse; an ordinary meter shows a mean',
  backgroundVoltage: 'with a recorder that samples the pulse; an ordinary meter shows a mean',
  pulseFrequency: 'with a recorder that samples the pulse',
  pulseOnTime: 'with a recorder that samples the pulse',
  acFrequency: 'with a recorder that samples the arc',
  gasFlow: 'with a flow meter at the nozzle',
}

const and = new Intl.ListFormat('en-GB', { type: 'conjunction' })

function howToMeasure(quantity: PanelQuantity, approved: Approved, system: CardFacts['system']): string {
  const { label } = PANEL_QUANTITY[quantity]
  if (quantity === 'wireFeed') return `${label}, ${approved.text}: run the wire without arc for ${RUN_SECONDS} s, cut it and measure ${cutLength(approved, system)}.`
  return `${label}, ${approved.text}: measure it ${HOW[quantity] ?? 'while welding'}.`
}

/** What the machine's own meter may show, where its accuracy is known and takes a part of the range. [calculated] */
function readingText({ machine }: CardFacts, quantity: PanelQuantity, { span }: Approved): string {
  if (quantity !== 'current' && quantity !== 'voltage' && quantity !== 'wireFeed') return ''
  const accuracy = machine.calibration.accuracy[quantity]
  const held = narrowed(span, accuracy)
  if (accuracy === null || accuracy === 0 || !held) return ''
  return `; as the meter is true to ± ${accuracy} %, the reading stays at ${words(inward(held, quantity === 'current' ? 1 : 0.1), SI_UNIT[quantity])}`
}

const WHEN = { always: 'The display shows it all the time', 'while-welding': 'The display shows it while you weld', 'after-welding': 'The display holds it when the arc has stopped' } as const

/** What is limited: seen on the panel, told where; or not, and then it must be measured. */
function watched(facts: CardFacts, lines: readonly PanelLine[], notices: PanelNotice[]): PanelCard['mustMeasure'] {
  const { mode, ranges, system } = facts
  const must: PanelCard['mustMeasure'] = []
  for (const [quantity, approved] of Object.entries(ranges) as [PanelQuantity, Approved][]) {
    const display = mode.displays.find((one) => one.quantity === quantity)
    const set = lines.some((line) => line.quantity === quantity && line.shown && line.value !== null)
    if (quantity === 'gasFlow' && !mode.controls.some(({ sets }) => sets === 'gasFlow')) continue
    if (display && !mode.controls.some(({ sets }) => sets === quantity)) notices.push(notice('note', 'watch', `${PANEL_QUANTITY[quantity].label}: keep ${approved.text}${readingText(facts, quantity, approved)}. ${WHEN[display.when]}.`))
    if (!display && !set) must.push({ quantity, text: howToMeasure(quantity, approved, system) })
  }
  if (must.length > 0) notices.push(notice('warn', 'not-shown', `The procedure limits ${and.format(must.map(({ quantity }) => PANEL_QUANTITY[quantity].label.toLowerCase()))}, which this panel does not show: measure ${must.length === 1 ? 'it' : 'them'}, see below.`, 'common practice'))
  return must
}

/** Ranges that no control sets must still lie in the machine's reach. */
function beyondReach(facts: CardFacts, notices: PanelNotice[]): void {
  for (const quantity of ['current', 'voltage', 'wireFeed'] as const) {
    const approved = facts.ranges[quantity]
    if (approved && !facts.mode.controls.some(({ sets }) => sets === quantity)) heldRange(facts, quantity, approved, notices)
  }
}

/** Travel speed is the welder's, not the machine's: as seconds for a length that can be chalked on the plate. */
function travelNote({ block, pass, system }: CardFacts): PanelNotice[] {
  const interval = pass?.travelSpeed ?? block.electrical.travelSpeed
  const span = spanOf(interval)
  if (!interval || !span || span.lo > span.hi) return []
  const length = system === 'US' ? { millimetres: 254, text: '10 in' } : { millimetres: 100, text: '100 mm' }
  const seconds = (speed: number) => (speed <= 0 ? Infinity : (length.millimetres / speed) * 60)
  const time = inward({ lo: Number.isFinite(span.hi) ? seconds(span.hi) : -Infinity, hi: seconds(span.lo) }, 0.5)
  const text = time.lo === null && time.hi === null ? '' : ` ${length.text} in ${words(time, 's')}.`
  return [notice('note', 'travel', `Travel speed, ${formatInterval(interval, 'travelSpeed', system).text}:${text || ' time it.'}`, 'calculated')]
}

function voltsNote({ mode, ranges }: CardFacts): PanelNotice[] {
  if (!ranges.voltage || !mode.controls.some(({ sets }) => sets === 'voltage')) return []
  return [notice('note', 'arc-volts', 'The procedure’s volts are those at the arc. Leads and gun lose 1 to 4 V on a long run, so check them while welding, at the feeder.', 'common practice')]
}

const blank = (line: PanelLine): PanelLine => ({ ...line, value: null, text: '—', min: null, max: null })

/**
 * Turns the ranges of a procedure's process into the settings of one mode of one machine.
 * Every figure on a card that is ready lies in the procedure's range when it is converted back; notices come refusals first.
 * Sources stand in each notice's `basis`; figures of the trade are common practice.
 */
export function panelCard(input: PanelCardInput): PanelCard {
  const notices: PanelNotice[] = []
  const facts = cardFacts(input, notices)
  const mode = input.machine.content.modes.find(({ key }) => key === input.mode)
  const card = (part: Partial<PanelCard>): PanelCard => ({
    machine: input.machine.number, machineName: input.machine.content.name, mode: input.mode, modeName: mode?.name ?? input.mode, processId: facts?.block.id ?? input.processId ?? '', program: facts?.program?.key ?? null, programLabel: facts?.program?.label ?? null, pass: facts?.pass?.number ?? null,
    ready: false, lines: [], mustMeasure: [], notices: [...new Map(notices.map((one) => [one.message, one])).values()].sort((one, other) => ORDER[one.level] - ORDER[other.level]), ...part,
  })
  if (!facts) return card({})
  notices.push(...fitNotices(facts, input.program ?? null))
  const lines = panelLines(facts, notices)
  beyondReach(facts, notices)
  const mustMeasure = watched(facts, lines, notices)
  if (Object.keys(facts.ranges).filter((quantity) => quantity !== 'gasFlow').length === 0) notices.push(notice('refuse', 'nothing-limited', 'The procedure states no electrical range for this process, so there is nothing to dial by. Ask the engineer.'))
  else if (facts.mode.controls.length === 0) notices.push(notice('refuse', 'no-controls', 'The register does not list the controls of this mode yet. Add them on the machine’s page.'))
  notices.push(...voltsNote(facts), ...travelNote(facts))
  const ready = notices.every(({ level }) => level !== 'refuse')
  return card({ ready, lines: ready ? lines : lines.map(blank), mustMeasure })
}

/** Passes of a process that have ranges of their own, so that a card may be asked for each. */
export const passesWithRanges = (variables: WeldingVariables, processId: string | null): string[] =>
  (variables.processes.find(({ id }) => id === processId) ?? variables.processes[0])?.passes.filter(({ current, voltage, wireFeed }) => [current, voltage, wireFeed].some((one) => spanOf(one) !== null)).map(({ number }) => number) ?? []

/** Modes of a machine that are for the process, those that pulse first where it pulses; for the choice in front of a machine. */
export function modesFor<M extends PanelCardInput['machine']['content']['modes'][number]>(modes: readonly M[], process: WeldingVariables['processes'][number] | undefined): M[] {
  const wants = process?.process
  const pulsed = process?.electrical.pulsed ?? process?.electrical.transferMode === 'pulsed-spray'
  const pulses = (mode: M) => mode.kind.includes('pulse')
  return modes.filter(({ processes }) => !wants || processes.includes(wants)).sort((one, other) => Number(pulses(other) === pulsed) - Number(pulses(one) === pulsed))
}
