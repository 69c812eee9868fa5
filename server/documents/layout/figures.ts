import type { Bound, NumericRange, Segment } from '@shared/schemas/assessment.ts'
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import { SHOWN_UNIT, toSi, UNITS } from '@shared/units/convert.ts'
import { formatInterval, formatNumber, formatQuantity } from '@shared/units/format.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'

export type PrintedUnits = UnitSystem | 'both'

const isDimension = (name: string): name is Dimension => Object.hasOwn(UNITS, name)
/** A figure is never parted from its unit at a line's end. */
const tied = (text: string): string => text.replace(/(\d) (?=[^\d\s(])/gu, '$1\u00a0').replace(/([≤≥]) /gu, '$1\u00a0')

/** Figures in the units that the reader asked for; with `both`, the system in which the record is written comes first. */
export class Figures {
  private readonly systems: readonly UnitSystem[]
  constructor(readonly units: PrintedUnits, readonly written: UnitSystem) {
    this.systems = units === 'both' ? (written === 'SI' ? ['SI', 'US'] : ['US', 'SI']) : [units]
  }

  get first(): UnitSystem {
    return this.systems[0] ?? 'SI'
  }

  private both(say: (system: UnitSystem) => string): string {
    const [first = '', second] = this.systems.map(say)
    return tied(second === undefined || second === first ? first : `${first} (${second})`)
  }

  quantity(quantity: Quantity | null | undefined, dimension: Dimension): string {
    return quantity ? this.both((system) => formatQuantity(quantity, dimension, system).text) : ''
  }

  /** '' when nothing is given. */
  interval(interval: Interval | null | undefined, dimension: Dimension): string {
    return interval ? this.both((system) => formatInterval(interval, dimension, system).text) : ''
  }

  /** A storage figure. */
  value(si: number, dimension: Dimension): string {
    return this.both((system) => {
      const unit = SHOWN_UNIT[system][dimension]
      return `${formatNumber(si, dimension, unit)} ${unit}`
    })
  }

  /** Unit(s) for a table's head, where the cells carry figures alone. */
  unit(dimension: Dimension): string {
    const [first = '', second] = this.systems.map((system) => SHOWN_UNIT[system][dimension])
    return second === undefined || second === first ? first : `${first} (${second})`
  }

  private bare(say: (system: UnitSystem) => { figure: string; unit: string; text: string }, dimension: Dimension): string {
    const [first = '', second] = this.systems.map((system) => {
      const said = say(system)
      return said.unit === SHOWN_UNIT[system][dimension] ? said.figure : said.text
    })
    return tied(second === undefined || second === first ? first : `${first} (${second})`)
  }

  /** A quantity without its unit, for a cell below `unit(dimension)`. */
  cell(quantity: Quantity | null | undefined, dimension: Dimension): string {
    return quantity ? this.bare((system) => formatQuantity(quantity, dimension, system), dimension) : ''
  }

  cellInterval(interval: Interval | null | undefined, dimension: Dimension): string {
    return interval ? this.bare((system) => formatInterval(interval, dimension, system), dimension) : ''
  }

  /** Computed figures keep their trailing zeros, so that a column lines up. */
  cellValue(si: number, dimension: Dimension): string {
    return this.bare((system) => {
      const unit = SHOWN_UNIT[system][dimension]
      const figure = formatNumber(si, dimension, unit, true)
      return { figure, unit, text: `${figure} ${unit}` }
    }, dimension)
  }

  /** A figure of a range or finding, given in the range's unit; `plain` leaves the unit and the second system out. */
  ofRange(value: number, range: { dimension: string; unit: string }, plain = false): string {
    const { dimension, unit } = range
    if (!isDimension(dimension) || UNITS[dimension][unit] === undefined) return plain || !unit ? String(value) : tied(`${value} ${unit}`)
    const si = toSi(value, dimension, unit)
    return plain ? formatNumber(si, dimension, SHOWN_UNIT[this.first][dimension]) : this.value(si, dimension)
  }

  private bound(bound: Bound, range: NumericRange, side: 'lower' | 'upper'): string {
    if (bound.kind === 'unlimited') return side === 'lower' ? 'no minimum' : 'no maximum'
    if (bound.kind === 'unknown') return side === 'lower' ? 'minimum not known' : 'maximum not known'
    const figure = this.ofRange(bound.value, range)
    return bound.kind === 'closed' ? figure : side === 'lower' ? `over ${figure}` : `under ${figure}`
  }

  private segment(segment: Segment, range: NumericRange): string {
    const { lower, upper } = segment
    if (lower.kind === 'unlimited' && upper.kind === 'unlimited') return 'unlimited'
    if (lower.kind === 'unknown' && upper.kind === 'unknown') return 'cannot be told'
    if (lower.kind === 'unlimited') return upper.kind === 'closed' ? `up to ${this.bound(upper, range, 'upper')}` : this.bound(upper, range, 'upper')
    if (upper.kind === 'unlimited') return lower.kind === 'closed' ? `${this.bound(lower, range, 'lower')} and over` : `${this.bound(lower, range, 'lower')}, no maximum`
    if (lower.kind === 'closed' && upper.kind === 'closed' && lower.value === upper.value) return this.bound(lower, range, 'lower')
    if (lower.kind === 'closed' && upper.kind === 'closed' && this.units !== 'both') return `${this.ofRange(lower.value, range, true)} to ${this.bound(upper, range, 'upper')}`
    return `${this.bound(lower, range, 'lower')} to ${this.bound(upper, range, 'upper')}`
  }

  /** A range in words, e.g. "5 to 20 mm" or "16 °C and over". */
  range(range: NumericRange): string {
    if (range.segments.length === 0) return 'nothing qualified'
    return range.segments.map((segment) => this.segment(segment, range)).join(' and ')
  }
}
