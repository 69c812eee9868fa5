/** Whether the machine, its mode and its program are right for the procedure at all, before any figure is looked at. */
import type { MachineMode, PanelNotice } from '../schemas/machines.ts'
import { calibrationState, daysUntil, dayWords } from './calibration.ts'
import { notice, PROGRAM_KINDS, type CardFacts } from './card-facts.ts'
import { familiesOf, isAluminiumWire, measurementsFor, programFit, wireFamily } from './wires.ts'

const PRACTICE = 'common practice'
const PULSED: readonly MachineMode['kind'][] = ['pulsed-one-knob', 'manual-pulse', 'double-pulse']
export const list = (words: readonly string[]): string => (words.length < 2 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} and ${words.at(-1) ?? ''}`)

function stateNotices({ state, machine, machineNumber }: CardFacts): PanelNotice[] {
  const found: PanelNotice[] = []
  if (state === 'draft' || state === 'in-review') found.push(notice('warn', 'not-approved', `Nobody has approved this procedure: it is ${state === 'draft' ? 'a draft' : 'in review'}. Use the card for trial beads only.`))
  if (state === 'superseded' || state === 'withdrawn') found.push(notice('refuse', 'not-in-force', `This revision was ${state}. Weld to the revision that is in force.`))
  if (machine.retired) found.push(notice('refuse', 'retired', `${machineNumber} has been retired from use.`))
  return found
}

function calibrationNotices({ machine, machineNumber, today }: CardFacts): PanelNotice[] {
  const { dueOn } = machine.calibration
  const state = calibrationState(dueOn, today)
  const basis = 'ISO 3834-2 cl. 16: measuring gear is controlled at stated intervals (secondary); ASME IX and AWS D1.1 ask no calibration of welding sets (secondary)'
  const prove = 'Prove volts, amps and wire feed with calibrated instruments of your own.'
  if (dueOn === null) return [notice('warn', 'calibration-unknown', `No calibration is recorded for ${machineNumber}, so its figures may not be true. ${prove}`, basis)]
  if (state === 'lapsed') return [notice('warn', 'calibration-lapsed', `The calibration of ${machineNumber} lapsed on ${dayWords(dueOn)}, so its figures may not be true. ${prove}`, basis)]
  const days = daysUntil(dueOn, today)
  return state === 'due-soon' ? [notice('note', 'calibration-due', `The calibration of ${machineNumber} is due on ${dayWords(dueOn)}${days === 0 ? ', today' : days === 1 ? ', tomorrow' : `, in ${days} days`}.`, basis)] : []
}

function modeNotices({ block, mode, machineNumber, ranges }: CardFacts): PanelNotice[] {
  const found: PanelNotice[] = []
  const { process, electrical } = block
  const told = `${machineNumber}, mode “${mode.name}”`
  if (process === null) found.push(notice('warn', 'process-not-stated', 'The procedure does not state the process, so whether this mode is for it cannot be told.'))
  else if (!mode.processes.includes(process)) found.push(notice('refuse', 'process', `${told}, is for ${list(mode.processes)}, not for ${process}.`))
  const transfer = electrical.transferMode
  if (transfer !== null && mode.transferModes.length > 0 && !mode.transferModes.includes(transfer)) found.push(notice('refuse', 'transfer-mode', `The procedure asks for ${transfer} transfer; ${told}, gives ${list(mode.transferModes)}.`))
  if (transfer !== null && mode.transferModes.length === 0) found.push(notice('note', 'transfer-unknown', `The procedure asks for ${transfer} transfer. The register does not say what ${told}, gives: listen to the arc.`))
  const pulsed = electrical.pulsed ?? (transfer === 'pulsed-spray' ? true : null)
  const pulses = PULSED.includes(mode.kind) || mode.controls.some(({ sets }) => sets === 'pulseFrequency')
  if (pulsed === true && !pulses) found.push(notice('refuse', 'not-pulsed', `The procedure is for pulsed current; ${told}, does not pulse.`))
  if (pulsed === false && PULSED.includes(mode.kind)) found.push(notice('refuse', 'pulsed', `The procedure is for current without pulses; ${told}, pulses.`))
  const polarity = electrical.currentType === 'AC-balanced' ? 'AC' : electrical.currentType
  if (polarity !== null && mode.polarities.length > 0 && !mode.polarities.includes(polarity)) found.push(notice('refuse', 'polarity', `The procedure asks for ${polarity}; ${told}, gives ${list(mode.polarities)}.`))
  if (polarity !== null && mode.polarities.length !== 1) found.push(notice('note', 'polarity-set', `Connect for ${polarity} before you start: ${mode.polarities.length === 0 ? 'the register does not say how this mode is connected' : 'this mode can be connected either way'}.`))
  const source = electrical.powerSource
  if ((source === 'constant-voltage' && mode.kind === 'constant-current') || (source === 'constant-current' && mode.kind === 'constant-voltage')) found.push(notice('refuse', 'power-source', `The procedure asks for a ${source} power source; ${told}, is ${mode.kind}.`))
  if (mode.kind === 'manual-pulse') found.push(notice('note', 'pulse-settings', 'In manual pulse each setting changes the effect of the others at once: after turning one, check the arc and bring the others along, inside their bars.', PRACTICE))
  if (ranges.current && ranges.wireFeed === undefined && !mode.controls.some(({ sets }) => sets === 'current') && mode.kind !== 'constant-current') found.push(notice('note', 'feed-sets-current', 'Amps are not dialled here: they follow wire feed and stick-out. Set the feed by the amps that you measure.', PRACTICE))
  return found
}

function dutyNotices({ machine, machineNumber, ranges }: CardFacts): PanelNotice[] {
  const duty = machine.dutyCycle
  const least = ranges.current?.span.lo
  if (!duty || least === undefined || !Number.isFinite(least) || least <= duty.current) return []
  const share = Math.floor(duty.percent * (duty.current / least) ** 2)
  return [notice('warn', 'duty-cycle', `${machineNumber} is rated ${duty.current} A at ${duty.percent} %. At ${Math.round(least)} A, the least that the procedure allows, it holds about ${share} % of ten minutes: let it cool between.`, 'calculated: duty cycle falls with the square of the current; common practice')]
}

function craterNotices({ mode, wire }: CardFacts): PanelNotice[] {
  if (wire.classification === null || !isAluminiumWire(wire.classification)) return []
  if (mode.has.craterFill || mode.controls.some(({ sets }) => sets === 'craterCurrent' || sets === 'craterTime')) return []
  const aluminium = `${wire.classification} is an aluminium filler, and aluminium cracks in a crater that was not filled`
  return [notice('warn', 'no-crater-fill', `This mode has no crater fill. ${aluminium}: go back 10 to 20 mm over the bead and break the arc there, trigger again two or three times, or run off on to a tab.`, 'common practice; the cure from an aluminium wire maker (secondary)')]
}

function gunNotices({ machine, mode }: CardFacts): PanelNotice[] {
  const other = machine.gunTypes.filter((gun) => gun === 'spool-gun' || gun === 'push-pull')
  if (other.length === 0 || machine.gunTypes.length < 2 || !mode.controls.some(({ sets }) => sets === 'wireFeed' || sets === 'knob')) return []
  return [notice('note', 'guns', `This machine takes several guns. A ${list(other.map((gun) => (gun === 'spool-gun' ? 'spool gun' : 'push-pull gun')))} feeds otherwise at the same dial: check the feed by cut length after a change of gun.`, PRACTICE)]
}

/** Aluminium of the 4xxx and 5xxx series under one button: the case that a machine's panel hides. */
const LUMPED = 'At one current ER4043 and ER5356 want arc volts some 2 to 3 V apart, and ER5356 more wire feed, so one program cannot suit both.'

function programNotices(facts: CardFacts, asked: string | null): PanelNotice[] {
  const { mode, program, wire, wireText, machineNumber } = facts
  const needs = PROGRAM_KINDS.includes(mode.kind)
  if (!program) {
    if (asked !== null) return [notice('refuse', 'no-program', `The mode “${mode.name}” of ${machineNumber} has no such program. Choose one of its programs.`)]
    if (!needs) return []
    const names = mode.programs.map(({ label }) => `“${label}”`)
    return [notice('refuse', 'program', names.length === 0 ? `No program of the mode “${mode.name}” is in the register, so what its knob does cannot be told.` : `None of the programs of this mode (${list(names)}) is for ${wireText}.`)]
  }
  const found: PanelNotice[] = []
  const fit = programFit(program, wire)
  const name = `Program “${program.label}”`
  const own = measurementsFor(program, wire).some(({ points }) => points.length > 0)
  if (wire.classification !== null && fit.wire === false) {
    const mine = wireFamily(wire.classification)
    const families = familiesOf(program.wires)
    const foreign = mine !== null && families.length > 0 && !families.some(({ key }) => key === mine.key)
    if (foreign && !own) found.push(notice('refuse', 'program-other-alloy', `${name} is for ${list(families.map((one) => one.name))} (${list(program.wires)}); the procedure’s wire ${wire.classification} is ${mine.name}.`, PRACTICE))
    else found.push(notice('warn', 'program-other-wire', `${name} is for ${list(program.wires)}, not for ${wire.classification}.${own ? ' The shop has measured it with this wire; only those points count.' : ''}`, PRACTICE))
  }
  if (wire.classification !== null && fit.wire === null) found.push(notice('warn', 'program-wire-unknown', `The register does not say for which wire ${name.toLowerCase()} was made, so whether it suits ${wire.classification} cannot be told.`))
  if (fit.diameter === false) found.push(notice('warn', 'program-other-diameter', `${name} is for ${list(program.diameters.map((one) => `${one} mm`))} wire, the procedure’s is ${wire.diameter ?? '?'} mm. At one current the wire feed falls as the wire gets thicker.`, PRACTICE))
  if (fit.gas === false) found.push(notice('warn', 'program-other-gas', `${name} is for ${list(program.gases)}; the procedure’s gas is another.`, PRACTICE))
  const families = familiesOf(program.wires)
  if (families.length > 1) {
    const both = families.some(({ key }) => key === 'aluminium-4') && families.some(({ key }) => key === 'aluminium-5')
    found.push(notice('warn', 'program-lumps', `${name} stands for several alloys at once (${list(program.wires)}). ${both ? LUMPED : 'Alloys melt and wet unlike each other, so one program cannot suit them all.'}${own ? ' This card goes by the points that the shop measured with this wire.' : ' Measure points of your own with this wire before you trust it.'}`, PRACTICE))
  }
  return found
}

/** Everything that speaks for or against this machine, mode and program, apart from the figures. */
export const fitNotices = (facts: CardFacts, askedProgram: string | null): PanelNotice[] => [
  ...stateNotices(facts), ...modeNotices(facts), ...programNotices(facts, askedProgram), ...craterNotices(facts), ...dutyNotices(facts), ...calibrationNotices(facts), ...gunNotices(facts),
]
