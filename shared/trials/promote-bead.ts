/** A bead becomes the draft of a procedure: its values as nominal, ranges from the beads around it, everything else left to be written. */
import type { Interval, Quantity, StandardChoice } from '../schemas/common.ts'
import type { MachineMode, PanelQuantity, WriteMachine } from '../schemas/machines.ts'
import type { Bead } from '../schemas/trials.ts'
import { baseMetalSchema, fillerSchema, procedureContentSchema, type BaseMetal, type Electrical, type Filler, type Process, type ProcedureContent } from '../schemas/welding.ts'
import { panelFigure } from '../machines/panel-lines.ts'
import { panelUnit } from '../machines/panel-quantities.ts'
import { quantity } from '../units/convert.ts'
import { SI_UNIT, type UnitSystem } from '../units/types.ts'
import { beadList, proposeRanges, type ProposedRange, type RangeProposal } from './propose-ranges.ts'

export interface PromoteInput {
  beads: readonly Bead[]
  chosenId: string
  title: string
  standards: readonly StandardChoice[]
  unitSystem?: UnitSystem
  trial: { number: string; title: string }
  machine: { number: string; content: WriteMachine } | null
  /** The library's rows of the bead, copied as the drafting sheet does; null = written as it was typed. */
  metal: BaseMetal | null
  filler: Filler | null
}

export interface Promotion extends RangeProposal {
  /** Null where a problem stands in the way. */
  content: ProcedureContent | null
}

/** A proposed range as a procedure states it, in the unit in which it was dialled or measured. */
function asInterval({ min, max, dimension, unit, sets, from }: ProposedRange): Interval | null {
  if (dimension === null) return null
  const name = from === 'set' && sets ? panelUnit(sets, unit) : SI_UNIT[dimension]
  if (name === null) return null
  const end = (value: number): Quantity => quantity(Number(value.toPrecision(10)), dimension, name)
  return { min: end(min), max: end(max), all: false }
}

const WELD_FIELDS = ['current', 'voltage', 'wireFeed', 'pulseFrequency', 'pulseOnTime', 'backgroundCurrent', 'backgroundVoltage', 'peakCurrent', 'acFrequency'] as const
const PULSED: readonly MachineMode['kind'][] = ['pulsed-one-knob', 'manual-pulse', 'double-pulse']

/** The weld's variables: as measured where the chosen bead was measured, else as dialled. */
function electricalOf(ranges: readonly ProposedRange[]): Partial<Electrical> {
  const of = (quantityKey: PanelQuantity): Interval | null => {
    const mine = ranges.filter(({ sets }) => sets === quantityKey)
    const one = mine.find(({ from }) => from === 'measured') ?? mine[0]
    return one ? asInterval(one) : null
  }
  const travel = ranges.find(({ measure }) => measure === 'travelSpeed')
  return { ...Object.fromEntries(WELD_FIELDS.map((field) => [field, of(field)])), travelSpeed: travel ? asInterval(travel) : null }
}

/** The panel's settings in its own words and unit. */
function panelOf(ranges: readonly ProposedRange[], machine: PromoteInput['machine'], mode: MachineMode | null): Electrical['panel'] {
  const set = ranges.filter(({ from, control }) => from === 'set' && control !== null).slice(0, 16)
  if (set.length === 0) return null
  return {
    machine: machine?.number ?? null,
    mode: mode?.name ?? null,
    caution: mode && !mode.has.craterFill ? 'This mode has no crater fill: double back over the last 10 to 20 mm before the arc is broken.' : null,
    settings: set.map(({ control, label, chosen, min, max, unit }) => {
      const known = mode?.controls.find(({ key }) => key === control)
      return { control: label, hint: known?.where ?? null, value: known ? panelFigure(chosen.lo, known) : String(chosen.lo), unit, scaleMin: known?.min ?? null, scaleMax: known?.max ?? null, min, max }
    }),
  }
}

function mechanisationOf(process: Process, machine: PromoteInput['machine']): 'manual' | 'semiautomatic' | 'machine' | null {
  const guns = machine?.content.gunTypes ?? []
  if (guns.length > 0 && guns.every((gun) => gun === 'machine-mounted')) return 'machine'
  if (process === 'GMAW' || process === 'FCAW') return 'semiautomatic'
  return process === 'SMAW' || process === 'GTAW' ? 'manual' : null
}

/** The reasons of each range, cut so that the note stays readable. */
function noteOf({ trial, beads, chosenId }: PromoteInput, { ranges, kin, leftOut }: RangeProposal): string {
  const chosen = beads.find(({ id }) => id === chosenId)
  const head = `From ${trial.number} (${trial.title}), bead ${chosen?.number ?? '?'}${chosen?.content.score ? `, scored ${chosen.content.score} of 5` : ''}. Its values are the nominal ones; the ranges come from ${beadList(kin)} of that trial. Trial beads qualify nothing: a coupon has to show the range.`
  const apart = leftOut.length > 0 ? `Not counted: ${leftOut.map(({ number, differsIn: what }) => `bead ${number} (other ${what})`).join(', ')}.` : ''
  const reasons = ranges.map(({ label, from, because }) => `${label}${from === 'measured' ? ', measured' : ''}: ${because}`)
  return [head, apart, ...reasons].filter((line) => line !== '').join('\n').slice(0, 4000)
}

/**
 * The content of a draft from a trial bead. Parses with `procedureContentSchema`; what the trial doesn't tell stays not stated.
 * @returns `content` null, with `problems` in sentences, when the bead can't be promoted
 */
export function promoteBead(input: PromoteInput): Promotion {
  const { beads, chosenId, title, standards, unitSystem = 'SI', machine, metal, filler } = input
  const proposal = proposeRanges(beads, chosenId)
  const chosen = beads.find(({ id }) => id === chosenId)
  if (!chosen || proposal.problems.length > 0) return { ...proposal, content: null }
  const bead = chosen.content
  const mode = machine?.content.modes.find(({ key }) => key === bead.modeKey) ?? null
  const { ranges } = proposal
  const pulsed = mode ? PULSED.includes(mode.kind) : bead.settings.some(({ sets }) => sets === 'pulseFrequency') || null
  const stickOut = ranges.find(({ key }) => key === 'stick-out')
  const own = metal ?? baseMetalSchema.parse({ specification: bead.metal?.slice(0, 80) ?? null })
  const diameter = bead.wireDiameter && bead.wireDiameter.si > 0 ? [bead.wireDiameter] : []
  const transfer = mode?.transferModes.length === 1 ? (mode.transferModes[0] ?? null) : pulsed ? 'pulsed-spray' : null
  const electrical = {
    ...electricalOf(ranges), pulsed, transferMode: transfer,
    currentType: mode?.polarities.length === 1 ? (mode.polarities[0] ?? null) : null,
    powerSource: mode?.kind === 'constant-voltage' || mode?.kind === 'one-knob' ? 'constant-voltage' : mode?.kind === 'constant-current' ? 'constant-current' : null,
    panel: panelOf(ranges, machine, mode),
  }
  const fillet = bead.position?.endsWith('F') ?? false
  const content = procedureContentSchema.safeParse({
    title,
    variables: {
      standards, unitSystem, product: 'plate',
      joint: { weld: fillet ? 'fillet' : 'groove', type: fillet ? 'tee' : 'butt', notes: bead.joint ? `The trial was welded as: ${bead.joint}.` : null },
      baseMetals: { a: own, b: own },
      thickness: bead.thickness ? { min: bead.thickness, max: bead.thickness, all: false } : null,
      processes: [{
        id: 'p1', process: bead.process, mechanisation: mechanisationOf(bead.process, machine),
        filler: { ...(filler ?? fillerSchema.parse({ classification: bead.wire?.slice(0, 60) ?? null })), diameters: diameter },
        positions: bead.position ? [bead.position] : [],
        shieldingGas: bead.gas,
        electrical,
        technique: { contactTubeDistance: stickOut ? asInterval(stickOut) : null },
      }],
    },
    notes: noteOf(input, proposal),
  })
  return content.success ? { ...proposal, content: content.data } : { ...proposal, content: null, problems: content.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`) }
}
