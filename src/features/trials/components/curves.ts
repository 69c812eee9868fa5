/** Wire feed against mean current of two wires: the textbook relation, and the points that the shop measured itself. */
import { BURN_OFF_DIAMETERS, burnOffSource, wireFeedCurve, type BurnOffMaterial } from '@shared/calculations/burn-off.ts'
import { isAluminiumWire, isSameDiameter, isSameWire, wireFamily } from '@shared/machines/wires.ts'
import { valueOf } from '@shared/trials/bead-values.ts'
import type { Machine } from '@shared/schemas/machines.ts'
import type { Bead } from '@shared/schemas/trials.ts'

export interface Wire { name: string; /** mm */ diameter: number }
interface CurvePoint { current: number; wireFeed: number; from: string }
export interface WireCurve { wire: Wire; /** Textbook, m/min over A; empty where no constant is known. */ curve: { current: number; wireFeed: number }[]; points: CurvePoint[]; basis: string }

const CURRENTS = Array.from({ length: 23 }, (_, index) => 60 + index * 10)

/** The material for which burn-off constants are known; null for stainless and others. */
const burnOffMaterial = (name: string): BurnOffMaterial | null => (isAluminiumWire(name) ? 'aluminium' : wireFamily(name)?.key === 'steel' ? 'carbon-steel' : null)

/** A wire's curve and the shop's own points of it: from the programs of its machines, and from beads with a measured current. */
export function curveOf(wire: Wire, machines: readonly Machine[], beads: readonly Bead[], extension: number): WireCurve {
  const material = burnOffMaterial(wire.name)
  const known = material !== null && BURN_OFF_DIAMETERS[material].some((size) => isSameDiameter(size, wire.diameter))
  const mine = (name: string, diameter: number) => isSameWire(name, wire.name) && isSameDiameter(diameter, wire.diameter)
  const points = [
    ...machines.flatMap(({ number, content }) => content.modes.flatMap(({ programs }) => programs.flatMap(({ label, measured }) => measured.filter((set) => mine(set.wire, set.diameter)).flatMap((set) => set.points.flatMap((point) => (point.wireFeed !== null && point.current !== null ? [{ current: point.current, wireFeed: point.wireFeed, from: `${number}, ${label}` }] : [])))))),
    ...beads.flatMap(({ number, content }) => {
      const [current, feed] = [valueOf(content, 'current'), valueOf(content, 'wireFeed')]
      return content.wire !== null && content.wireDiameter !== null && mine(content.wire, content.wireDiameter.si) && current?.from === 'measured' && feed ? [{ current: current.value, wireFeed: feed.value, from: `bead ${number}` }] : []
    }),
  ].sort((one, other) => one.current - other.current)
  return {
    wire, points, curve: material !== null && known ? wireFeedCurve({ material, diameter: wire.diameter, extension }, CURRENTS) : [],
    basis: material === null ? 'No textbook constant is known for this wire.' : known ? `${burnOffSource.standard}, basis: ${burnOffSource.basis}; good to about 15 %.` : 'The textbook constants do not reach this diameter.',
  }
}

/** Wires to choose from: the trial's own, what the shop's machines were measured with, and the sizes with a textbook constant. */
export function wiresOf(beads: readonly Bead[], machines: readonly Machine[]): Wire[] {
  const own = beads.flatMap(({ content }) => (content.wire !== null && content.wireDiameter !== null ? [{ name: content.wire, diameter: content.wireDiameter.si }] : [])).reverse()
  const measured = machines.flatMap(({ content }) => content.modes.flatMap(({ programs }) => programs.flatMap((program) => program.measured.map(({ wire, diameter }) => ({ name: wire, diameter })))))
  const [first] = own
  const aluminium = first === undefined || isAluminiumWire(first.name)
  const usual = (aluminium ? ['ER5356', 'ER4043'] : ['ER70S-6']).flatMap((name) => BURN_OFF_DIAMETERS[aluminium ? 'aluminium' : 'carbon-steel'].map((diameter) => ({ name, diameter })).reverse())
  const found: Wire[] = []
  for (const wire of [...own, ...measured, ...usual]) if (!found.some((one) => isSameWire(one.name, wire.name) && isSameDiameter(one.diameter, wire.diameter))) found.push(wire)
  return found
}

/** What a wire is best held against: another alloy of its kind in the same size, else another size of it. */
export function counterpartOf(wire: Wire, wires: readonly Wire[]): Wire | undefined {
  const others = wires.filter((other) => other !== wire)
  const akin = others.filter((other) => burnOffMaterial(other.name) === burnOffMaterial(wire.name))
  return akin.find((other) => !isSameWire(other.name, wire.name) && isSameDiameter(other.diameter, wire.diameter)) ?? akin.find((other) => isSameWire(other.name, wire.name)) ?? akin[0] ?? others[0]
}

/** What is known of two wires beside their curves; basis in each sentence. */
export function wireSentences(one: Wire, other: Wire): string[] {
  const said: string[] = []
  const both = (a: string, b: string) => [one.name, other.name].some((name) => isSameWire(name, a)) && [one.name, other.name].some((name) => isSameWire(name, b))
  if (both('ER4043', 'ER5356')) {
    said.push('ER5356 wants some 10 to 20 % more feed than ER4043 at the same current, so a setting of one is not a setting of the other (memory, common practice).')
    said.push('At one current the two want arc voltages some 2 to 3 V apart: one program can’t suit both (common practice).')
  }
  if (!isSameDiameter(one.diameter, other.diameter)) {
    const [thin, thick] = one.diameter < other.diameter ? [one, other] : [other, one]
    said.push(`At the same current the thicker wire is fed slower: ${thick.diameter} mm has ${((thick.diameter / thin.diameter) ** 2).toFixed(2)} times the section of ${thin.diameter} mm (common practice; the figure is calculated).`)
  }
  return said
}
