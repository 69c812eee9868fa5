/** Points of a plot of beads over any two of their figures. */
import type { Bead } from '@shared/schemas/trials.ts'
import { beadValues, type BeadValue } from '@shared/trials/bead-values.ts'
import { beadFigures, FIGURE, FIGURES } from '@shared/trials/bead-figures.ts'
import { SHOWN_UNIT, fromSi } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'

export interface Axis { key: string; label: string; unit: string }
export interface Point { number: number; score: number | null; x: number; y: number }

interface Shown { key: string; label: string; unit: string; value: number }
const inSystem = ({ key, label, unit, value, dimension }: BeadValue, system: UnitSystem): Shown => (dimension === null ? { key, label, unit, value } : { key, label, unit: SHOWN_UNIT[system][dimension], value: fromSi(value, dimension, SHOWN_UNIT[system][dimension]) })

/** All figures of a bead in the reader's units: settings, measured values, and what the settings come to. */
function shownOf(bead: Bead, system: UnitSystem): Shown[] {
  const { figures } = beadFigures(bead.content)
  const computed = FIGURES.flatMap((key): Shown[] => {
    const { label, unit, dimension } = FIGURE[key]
    const value = figures[key]?.value
    return value === undefined ? [] : [inSystem({ key: `figure:${key}`, label, unit, value, dimension, from: 'measured' }, system)]
  })
  return [...beadValues(bead.content).map((value) => inSystem(value, system)), ...computed]
}

/** Every figure that at least two beads have; what varies comes first. */
export function axesOf(beads: readonly Bead[], system: UnitSystem): Axis[] {
  const found = new Map<string, Axis & { values: number[] }>()
  for (const bead of beads) for (const { key, label, unit, value } of shownOf(bead, system)) found.set(key, { key, label, unit, values: [...(found.get(key)?.values ?? []), value] })
  const varies = ({ values }: { values: number[] }) => Math.max(...values) - Math.min(...values) > 1e-9
  return [...found.values()].filter(({ values }) => values.length >= 2).sort((one, other) => Number(varies(other)) - Number(varies(one))).map(({ key, label, unit }) => ({ key, label, unit }))
}

export function pointsOf(beads: readonly Bead[], x: string, y: string, system: UnitSystem): Point[] {
  return beads.flatMap((bead) => {
    const values = new Map(shownOf(bead, system).map(({ key, value }) => [key, value]))
    const [one, other] = [values.get(x), values.get(y)]
    return one === undefined || other === undefined ? [] : [{ number: bead.number, score: bead.content.score, x: one, y: other }]
  })
}

/** Points that stand on one another share a label: "2, 3". */
export function labelsOf(points: readonly Point[]): (Point & { label: string })[] {
  const at = ({ x, y }: Point) => `${x.toPrecision(8)} ${y.toPrecision(8)}`
  return points.map((point) => {
    const same = points.filter((other) => at(other) === at(point))
    return { ...point, label: same[0]?.number === point.number ? same.map(({ number }) => number).join(', ') : '' }
  })
}

export interface Scale { low: number; high: number; ticks: number[] }
/** A scale with round ticks that holds the values with a little room. */
export function scaleOf(values: readonly number[]): Scale {
  const [least, most] = [Math.min(...values), Math.max(...values)]
  const span = most - least || Math.max(Math.abs(most) * 0.1, 1)
  const rough = span / 4
  const power = 10 ** Math.floor(Math.log10(rough))
  const step = [1, 2, 5, 10].map((one) => one * power).find((one) => one >= rough) ?? power
  const low = Math.floor((least - span * 0.08) / step) * step
  const high = Math.ceil((most + span * 0.08) / step) * step
  const ticks = Array.from({ length: Math.round((high - low) / step) + 1 }, (_, index) => Number((low + index * step).toPrecision(10)))
  return { low, high, ticks }
}
