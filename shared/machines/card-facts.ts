/** What a panel card starts from: the process block with its ranges, the mode, the program and the wire, looked up once. */
import type { Interval } from '../schemas/common.ts'
import type { MachineMode, MachineProgram, PanelNotice, PanelQuantity, WriteMachine } from '../schemas/machines.ts'
import type { RevisionState } from '../schemas/records.ts'
import type { Electrical, Pass, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'
import { formatInterval } from '../units/format.ts'
import type { UnitSystem } from '../units/types.ts'
import { overlap, type Span } from './dial.ts'
import { PANEL_QUANTITY } from './panel-quantities.ts'
import { gasText, measurementsFor, programFit, type CardWire } from './wires.ts'

export interface PanelCardInput {
  variables: WeldingVariables
  /** Id of the process block; null = the first. */
  processId: string | null
  /** The machine's number and content, as the register keeps them. */
  machine: { number: string; content: WriteMachine }
  /** Key of the mode. */
  mode: string
  /** Key of the program; left out, the one that suits the wire best is taken. */
  program?: string | null | undefined
  /** Number of a pass with ranges of its own; left out, the ranges of the whole process count. */
  pass?: string | null | undefined
  /** State of the revision; left out where the variables are of none. */
  state?: RevisionState | undefined
  /** YYYY-MM-DD */
  today: string
}

/** What the procedure allows of a quantity, in the unit of storage and in words. */
export interface Approved { span: Span; text: string }

export interface CardFacts {
  block: ProcessBlock
  pass: Pass | null
  machine: WriteMachine
  machineNumber: string
  mode: MachineMode
  program: MachineProgram | null
  wire: CardWire
  /** "ER5356, 1.2 mm, Ar 100" */
  wireText: string
  ranges: Partial<Record<PanelQuantity, Approved>>
  system: UnitSystem
  state: RevisionState | undefined
  today: string
}

type Ranged = Extract<PanelQuantity, keyof Electrical>
const RANGED: readonly Ranged[] = ['wireFeed', 'current', 'voltage', 'peakCurrent', 'backgroundCurrent', 'backgroundVoltage', 'pulseFrequency', 'pulseOnTime', 'acFrequency']
const OF_PASS: readonly (Ranged & keyof Pass)[] = ['wireFeed', 'current', 'voltage']

/** An interval as a span; null when it says nothing. */
export const spanOf = (interval: Interval | null | undefined): Span | null =>
  !interval || interval.all || (!interval.min && !interval.max) ? null : { lo: interval.min?.si ?? -Infinity, hi: interval.max?.si ?? Infinity }

export const notice = (level: PanelNotice['level'], code: string, message: string, basis: string | null = null): PanelNotice => ({ level, code, message, basis })

export const PROGRAM_KINDS: readonly MachineMode['kind'][] = ['one-knob', 'pulsed-one-knob', 'double-pulse']

/**
 * The program that a wire would choose: one with the shop's own points of it, else the one that names it.
 * @returns null when none names it
 */
function suited(mode: MachineMode, wire: CardWire): MachineProgram | null {
  const rated = mode.programs.map((program) => {
    const fit = programFit(program, wire)
    const points = measurementsFor(program, wire).some((one) => one.points.length > 0)
    const against = [fit.wire, fit.diameter, fit.gas].filter((one) => one === false).length
    return { program, rank: (points ? 100 : 0) + (fit.wire === true ? 10 : 0) + (fit.diameter === true ? 2 : 0) + (fit.gas === true ? 1 : 0) - against, named: fit.wire === true || points || (fit.wire === null && mode.programs.length === 1) }
  })
  return rated.filter(({ named }) => named).sort((one, other) => other.rank - one.rank)[0]?.program ?? null
}

function rangesOf(block: ProcessBlock, pass: Pass | null, system: UnitSystem, notices: PanelNotice[]): CardFacts['ranges'] {
  const ranges: CardFacts['ranges'] = {}
  const add = (quantity: PanelQuantity, intervals: readonly (Interval | null | undefined)[], who: string) => {
    const { dimension, label } = PANEL_QUANTITY[quantity]
    const given = intervals.filter((one) => spanOf(one) !== null)
    if (dimension === null || given.length === 0) return
    const words = given.map((one) => (one ? formatInterval(one, dimension, system, { asTyped: true }).text : '')).join(', and ')
    let span: Span | null = { lo: -Infinity, hi: Infinity }
    for (const one of given) {
      const next = spanOf(one)
      span = span && next && next.lo <= next.hi ? overlap(span, next) : null
    }
    if (span) ranges[quantity] = { span, text: words }
    else notices.push(notice('refuse', 'no-range', `${label}: ${who} asks ${words}, which leaves no value. Mend the range in the procedure first.`))
  }
  for (const quantity of RANGED) {
    const own = OF_PASS.find((one) => one === quantity)
    add(quantity, [block.electrical[quantity], own && pass?.[own]], pass ? `the procedure for pass ${pass.number}` : 'the procedure')
  }
  add('gasFlow', [block.shieldingGas?.flow], 'the procedure')
  return ranges
}

/** A pass whose own range is tighter than that of the process: a card for the whole process would mislead it. */
function tighterPasses(block: ProcessBlock): string[] {
  return block.passes
    .filter((pass) => OF_PASS.some((quantity) => {
      const [own, whole] = [spanOf(pass[quantity]), spanOf(block.electrical[quantity])]
      return own !== null && (whole === null || own.lo > whole.lo || own.hi < whole.hi)
    }))
    .map(({ number }) => number)
}

/**
 * Looks everything up that the card needs.
 * @param notices what could not be looked up is added here
 * @returns null when there is no such process or mode, so that no card can be made
 */
export function cardFacts(input: PanelCardInput, notices: PanelNotice[]): CardFacts | null {
  const { variables, machine } = input
  const block = input.processId === null ? variables.processes[0] : variables.processes.find(({ id }) => id === input.processId)
  const mode = machine.content.modes.find(({ key }) => key === input.mode)
  if (!block) notices.push(notice('refuse', 'no-process', 'The procedure has no such process. Choose one of its processes.'))
  if (!mode) notices.push(notice('refuse', 'no-mode', `${machine.number} has no such mode. Choose one of its modes.`))
  if (!block || !mode) return null
  const wanted = input.pass ?? null
  const pass = wanted === null ? null : (block.passes.find(({ number }) => number === wanted) ?? null)
  if (wanted !== null && !pass) notices.push(notice('refuse', 'no-pass', `The process has no pass ${wanted}. Choose one of its passes.`))
  if (wanted === null) {
    const tighter = tighterPasses(block)
    if (tighter.length > 0) notices.push(notice('warn', 'pass-ranges', `${tighter.length === 1 ? `Pass ${tighter[0]} has a range of its own` : `Passes ${tighter.join(', ')} have ranges of their own`}. Choose the pass before you dial; this card holds for the others.`))
  }
  const diameters = pass?.fillerDiameter ? [pass.fillerDiameter] : block.filler.diameters
  const measured = mode.programs.flatMap((program) => program.measured)
  const classification = block.filler.added === false ? null : block.filler.classification
  const wireOf = (diameter: number | null): CardWire => ({ classification, diameter, gas: block.shieldingGas })
  // Of several sizes, the one for which something was measured.
  const known = diameters.find(({ si }) => measurementsFor({ measured }, wireOf(si)).length > 0) ?? diameters[0]
  const wire = wireOf(known?.si ?? null)
  if (diameters.length > 1 && known && mode.programs.length > 0) notices.push(notice('note', 'several-diameters', `The procedure allows ${diameters.map(({ typed }) => typed).join(', ')} wire. This card is for ${known.typed}.`))
  const chosen = input.program ?? null
  const program = chosen === null ? suited(mode, wire) : (mode.programs.find(({ key }) => key === chosen) ?? null)
  const size = known ? `${Number(known.si.toFixed(2))} mm` : null
  return {
    block, pass, machine: machine.content, machineNumber: machine.number, mode, program, wire,
    wireText: [classification ?? 'a wire that is not stated', size, gasText(block.shieldingGas)].filter((part) => part !== null).join(', '),
    ranges: rangesOf(block, pass, variables.unitSystem, notices),
    system: variables.unitSystem, state: input.state, today: input.today,
  }
}
