/**
 * From a chosen bead and the scored beads around it to proposed ranges. A bead scored 4 or 5 widens a range, a bead scored 1 or 2 bounds it:
 * no range reaches a value at which a bead was bad, nor past it. [common practice: a starting point, never a range of qualification]
 */
import { isSameDiameter, isSameWire } from '../machines/wires.ts'
import type { PanelQuantity } from '../schemas/machines.ts'
import type { Bead, BeadContent } from '../schemas/trials.ts'
import { settle } from '../units/convert.ts'
import { SI_UNIT, type Dimension } from '../units/types.ts'
import { fromStorage, PANEL_QUANTITY, toStorage } from '../machines/panel-quantities.ts'
import { MEASURE, measuredSpread, type Measure, type Spread } from './bead-values.ts'
import { faultsInWords } from './faults.ts'

const GOOD = 4
const BAD = 2

export interface ProposedRange {
  /** `set:<control>`, `measured:<name>` or `stick-out`. */
  key: string
  label: string
  from: 'set' | 'measured'
  control: string | null
  sets: PanelQuantity | null
  measure: Measure | null
  dimension: Dimension | null
  unit: string
  /** The chosen bead's own, in `unit`; lo = hi for a single figure. */
  chosen: Spread
  min: number
  max: number
  because: string
}

const sameGas = (one: BeadContent['gas'], other: BeadContent['gas']): boolean => {
  const parts = (gas: BeadContent['gas']) => JSON.stringify((gas?.components ?? []).filter(({ percent }) => percent > 0).map(({ gas: name, percent }) => [name, percent]).sort())
  const named = (gas: BeadContent['gas']) => (gas?.name ?? gas?.isoSymbol ?? '').toLowerCase()
  return parts(one) === parts(other) && ((one?.components.length ?? 0) > 0 || named(one) === named(other))
}
const sameText = (one: string | null, other: string | null): boolean => (one ?? '').trim().toLowerCase() === (other ?? '').trim().toLowerCase()
const sameSize = (one: BeadContent['thickness'], other: BeadContent['thickness'], same: (a: number, b: number) => boolean): boolean => (one === null || other === null ? one === other : same(one.si, other.si))

/** What sets a bead apart from the chosen one, so that its score says nothing about these settings; null when they are comparable. */
function differsIn(chosen: BeadContent, other: BeadContent): string | null {
  if (chosen.machineId !== other.machineId) return 'machine'
  if (!sameText(chosen.modeKey, other.modeKey)) return 'mode'
  if (!sameText(chosen.programKey, other.programKey)) return 'program'
  if (chosen.process !== other.process) return 'process'
  const wires = [chosen.wire ?? chosen.wireId, other.wire ?? other.wireId]
  if (!(wires[0] && wires[1] ? isSameWire(wires[0], wires[1]) || sameText(wires[0], wires[1]) : wires[0] === wires[1])) return 'wire'
  if (!sameSize(chosen.wireDiameter, other.wireDiameter, isSameDiameter)) return 'wire diameter'
  if (!sameGas(chosen.gas, other.gas)) return 'gas'
  if (!(chosen.metalId !== null && chosen.metalId === other.metalId) && !sameText(chosen.metal ?? chosen.metalId, other.metal ?? other.metalId)) return 'metal'
  if (!sameSize(chosen.thickness, other.thickness, (a, b) => Math.abs(a - b) < 1e-6)) return 'thickness'
  // A setting that is good in the flat says nothing of one overhead. Left unsaid on either bead, the two are taken as alike.
  if (chosen.position !== null && other.position !== null && chosen.position !== other.position) return 'position'
  return null
}

interface Kin { bead: Bead; spread: Spread }
interface Subject extends Pick<ProposedRange, 'key' | 'label' | 'from' | 'control' | 'sets' | 'measure' | 'dimension' | 'unit'> { of: (content: BeadContent) => Spread | null }

/** A setting in the chosen bead's unit, whatever unit the other's panel had. */
function settingSubject(chosen: BeadContent['settings'][number]): Subject {
  return {
    key: `set:${chosen.control}`, label: chosen.label, from: 'set', control: chosen.control, sets: chosen.sets, measure: null, dimension: PANEL_QUANTITY[chosen.sets].dimension, unit: chosen.unit,
    of: ({ settings }) => {
      const setting = settings.find(({ control, sets }) => control === chosen.control && sets === chosen.sets)
      if (!setting) return null
      if (setting.unit === chosen.unit) return { lo: setting.value, hi: setting.value }
      const stored = toStorage(setting.value, setting.sets, setting.unit)
      const value = stored === null ? null : fromStorage(stored, chosen.sets, chosen.unit)
      return value === null ? null : { lo: settle(value), hi: settle(value) }
    },
  }
}

const RANGED: readonly Measure[] = ['current', 'voltage', 'wireFeed', 'travelSpeed', 'peakCurrent', 'backgroundCurrent']

function subjectsOf(content: BeadContent): Subject[] {
  return [
    ...content.settings.map(settingSubject),
    ...RANGED.map((measure): Subject => ({ key: `measured:${measure}`, label: MEASURE[measure].label, from: 'measured', control: null, sets: MEASURE[measure].quantity, measure, dimension: MEASURE[measure].dimension, unit: SI_UNIT[MEASURE[measure].dimension], of: (one) => measuredSpread(one, measure) })),
    { key: 'stick-out', label: 'Stick-out', from: 'measured', control: null, sets: null, measure: null, dimension: 'length', unit: 'mm', of: ({ stickOut }) => (stickOut ? { lo: stickOut.si, hi: stickOut.si } : null) },
  ]
}

const shown = (value: number): string => String(Number(value.toPrecision(5)))
const spanText = ({ lo, hi }: Spread, unit: string): string => `${lo === hi ? shown(lo) : `${shown(lo)} to ${shown(hi)}`}${unit ? ` ${unit}` : ''}`
export const beadList = (numbers: readonly number[]): string => {
  const sorted = [...new Set(numbers)].sort((a, b) => a - b)
  return sorted.length === 1 ? `bead ${sorted[0]}` : `beads ${sorted.slice(0, -1).join(', ')} and ${sorted.at(-1)}`
}
const capital = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}`

function rangeOf(subject: Subject, chosen: Bead, kin: readonly Bead[], bad: readonly Bead[]): ProposedRange | null {
  const own = subject.of(chosen.content)
  if (!own) return null
  const { unit } = subject
  const spreads = (beads: readonly Bead[]): Kin[] => beads.flatMap((bead) => { const spread = subject.of(bead.content); return spread ? [{ bead, spread }] : [] })
  const others = spreads(kin.filter(({ id, content }) => id !== chosen.id && (content.score ?? 0) >= GOOD))
  // A bad bead at the very value of the chosen one failed by something else; one that touches it only partly bounds that side.
  const wrong = spreads(bad)
  const below = wrong.filter(({ spread }) => spread.lo < own.lo).sort((a, b) => Math.min(b.spread.hi, own.lo) - Math.min(a.spread.hi, own.lo))[0]
  const above = wrong.filter(({ spread }) => spread.hi > own.hi).sort((a, b) => Math.max(a.spread.lo, own.hi) - Math.max(b.spread.lo, own.hi))[0]
  const [floor, ceiling] = [below ? below.spread.hi : -Infinity, above ? above.spread.lo : Infinity]
  const reached = others.filter(({ spread }) => (spread.lo >= own.lo || spread.lo > floor) && (spread.hi <= own.hi || spread.hi < ceiling))
  const cut = others.filter((one) => !reached.includes(one))
  const min = Math.min(own.lo, ...reached.map(({ spread }) => spread.lo))
  const max = Math.max(own.hi, ...reached.map(({ spread }) => spread.hi))
  const wide = reached.filter(({ spread }) => spread.lo < own.lo || spread.hi > own.hi)
  const numbers = (list: readonly Kin[]) => list.map(({ bead }) => bead.number)
  const said: string[] = []
  if (wide.length > 0) said.push(`${capital(beadList(numbers(wide)))} scored ${GOOD} or better at ${spanText({ lo: Math.min(...wide.map(({ spread }) => spread.lo)), hi: Math.max(...wide.map(({ spread }) => spread.hi)) }, unit)}, so the range runs from ${shown(min)} to ${shown(max)}${unit ? ` ${unit}` : ''}.`)
  else if (reached.length > 0) said.push(`${capital(beadList(numbers(reached)))} scored ${GOOD} or better at the same value; nothing was tried beside it, so there is no room.`)
  else said.push(own.lo === own.hi ? `Only bead ${chosen.number} stands for this value, so there is no room. Weld good beads to either side of it to earn a range.` : `From what was measured on bead ${chosen.number} alone.`)
  for (const one of [below, above]) if (one) said.push(`Bead ${one.bead.number} at ${spanText(one.spread, unit)} scored ${one.bead.content.score ?? ''}${one.bead.content.faults.length > 0 ? ` (${faultsInWords(one.bead.content.faults)})` : ''}: the range stops short of it.`)
  if (cut.length > 0) said.push(`${capital(beadList(numbers(cut)))} scored well beyond that, and a bad bead lies between, so ${cut.length === 1 ? 'it does' : 'they do'} not widen it.`)
  return { key: subject.key, label: subject.label, from: subject.from, control: subject.control, sets: subject.sets, measure: subject.measure, dimension: subject.dimension, unit, chosen: own, min, max, because: said.join(' ') }
}

export interface RangeProposal {
  ranges: ProposedRange[]
  /** Beads that speak for or against: same machine, mode, wire, gas, metal, thickness, position. */
  kin: number[]
  /** The others, and in what they differ. */
  leftOut: { number: number; differsIn: string }[]
  /** Why the bead can't be promoted as it stands; empty when it can. */
  problems: string[]
}

/** Ranges around a bead of a trial. Every range holds the bead's own value; a bad bead's value that differs never lies inside. */
export function proposeRanges(beads: readonly Bead[], chosenId: string): RangeProposal {
  const chosen = beads.find(({ id }) => id === chosenId)
  if (!chosen) return { ranges: [], kin: [], leftOut: [], problems: ['That bead is not in this trial any more.'] }
  const apart = beads.flatMap((bead) => { const what = bead.id === chosenId ? null : differsIn(chosen.content, bead.content); return what === null ? [] : [{ number: bead.number, differsIn: what, id: bead.id }] })
  const kin = beads.filter(({ id }) => !apart.some((one) => one.id === id))
  const bad = kin.filter(({ id, content }) => id !== chosenId && content.score !== null && content.score <= BAD)
  const ranges = subjectsOf(chosen.content).flatMap((subject) => rangeOf(subject, chosen, kin, bad) ?? [])
  const problems: string[] = []
  if (chosen.content.score !== null && chosen.content.score <= BAD) problems.push(`Bead ${chosen.number} scored ${chosen.content.score}: choose a bead that you would weld again.`)
  if (ranges.length === 0) problems.push(`Bead ${chosen.number} has no setting and no measured value yet, so there is nothing to write into a procedure.`)
  return { ranges, kin: kin.map(({ number }) => number), leftOut: apart.map(({ number, differsIn: what }) => ({ number, differsIn: what })), problems }
}
