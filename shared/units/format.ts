/** Quantities and intervals as they are read: the figure and its unit apart, so that a screen can colour the unit. */
import type { Interval, Quantity } from '../schemas/common.ts'
import { SHOWN_UNIT, fromSi } from './convert.ts'
import { parseQuantity } from './parse.ts'
import { plainSigns, readNumber } from './read-number.ts'
import { SI_UNIT, type Dimension, type UnitSystem } from './types.ts'

export interface Formatted {
  figure: string
  /** Empty when the figure carries its own units or none applies. */
  unit: string
  /** Figure and unit in one line. */
  text: string
}

export interface FormatOptions {
  /** true: always as typed, whatever the unit; false: never; left out: as typed when the unit is the one shown in this system. */
  asTyped?: boolean
}

/** Decimals at most, by dimension and unit: what a reading of that kind can carry in a shop. Trailing zeros are left away. */
const DECIMALS: { readonly [D in Dimension]: Readonly<Record<string, number>> } = {
  length: { mm: 1, in: 3, cm: 2, m: 3, ft: 2 },
  temperature: { '°C': 0, '°F': 0, K: 0 },
  temperatureDifference: { K: 0, '°C': 0, '°F': 0 },
  travelSpeed: { 'mm/min': 0, 'in/min': 1, 'cm/min': 1, 'mm/s': 2, 'm/min': 2 },
  wireFeed: { 'm/min': 1, 'in/min': 0, 'mm/min': 0, 'cm/min': 0, 'mm/s': 0 },
  current: { A: 0, kA: 2 },
  voltage: { V: 1 },
  heatInput: { 'kJ/mm': 2, 'kJ/in': 1, 'J/mm': 0, 'J/in': 0, 'kJ/cm': 1 },
  stress: { MPa: 0, ksi: 1, psi: 0, 'N/mm²': 0 },
  force: { kN: 1, lbf: 0, kip: 2, N: 0 },
  energy: { J: 0, 'ft·lbf': 0, kJ: 2 },
  gasFlow: { 'L/min': 0, 'ft³/h': 0, 'm³/h': 2 },
  time: { min: 0, h: 2, s: 0 },
  duration: { s: 0, min: 2, ms: 0 },
  angle: { '°': 1 },
  percent: { '%': 1 },
  frequency: { Hz: 0, kHz: 3 },
  pulseTime: { ms: 1, s: 4, 'µs': 0 },
  mass: { kg: 2, lb: 2, g: 0 },
  area: { 'mm²': 1, 'in²': 3, 'cm²': 2 },
  hardness: { HV: 0 },
  temperatureRate: { 'K/h': 0, '°C/h': 0, '°F/h': 0 },
}

/** Decimals with which a dimension is shown in a unit. */
export const decimalsOf = (dimension: Dimension, unit: string): number => DECIMALS[dimension][unit] ?? 2

/**
 * A storage figure in `unit`, rounded to the digits that make sense for it; a figure that would round to nothing keeps two significant digits.
 * @param fixed keep trailing zeros, for columns that align on the decimal
 * @throws RangeError when the unit does not measure that dimension
 */
export function formatNumber(si: number, dimension: Dimension, unit: string = SI_UNIT[dimension], fixed = false): string {
  const value = fromSi(si, dimension, unit)
  const decimals = decimalsOf(dimension, unit)
  const rounded = Number(`${Math.round(Number(`${Math.abs(value)}e${decimals}`))}e-${decimals}`) * Math.sign(value)
  const shown = Number.isFinite(rounded) ? rounded : value
  if (shown === 0 && value !== 0 && Math.abs(value) >= 1e-6) return String(Number(value.toPrecision(2)))
  return fixed ? (shown + 0).toFixed(decimals) : String(shown + 0)
}

const joined = (figure: string, unit: string): Formatted => ({ figure, unit, text: unit === '' ? figure : unit === '°' ? `${figure}°` : `${figure} ${unit}` })

/** The number as it was typed, if reading it again gives the stored figure; null for a text that is not one number (`10 ± 2`). */
function typedFigure(quantity: Quantity, dimension: Dimension): string | null {
  const number = readNumber(plainSigns(quantity.typed.trim()))
  if (!number || 'problem' in number) return null
  const figure = quantity.typed.trim().slice(0, number.length)
  const again = parseQuantity(`${figure} ${quantity.unit}`, dimension, 'SI')
  const same = again.ok && Math.abs(again.quantity.si - quantity.si) <= 1e-9 * Math.max(1, Math.abs(quantity.si))
  return same ? figure : null
}

/**
 * A quantity as read in `system`: as typed where it was typed in that system's unit (`1/2` in), else converted and rounded.
 */
export function formatQuantity(quantity: Quantity, dimension: Dimension, system: UnitSystem, { asTyped }: FormatOptions = {}): Formatted {
  const shown = SHOWN_UNIT[system][dimension]
  const typed = (asTyped ?? quantity.unit === shown) ? typedFigure(quantity, dimension) : null
  return typed === null ? joined(formatNumber(quantity.si, dimension, shown), shown) : joined(typed, quantity.unit)
}

/**
 * An interval as read in `system`: `18–22`, `≤ 25`, `≥ 5`, one value where both ends agree, `all`; empty strings when nothing is given.
 */
export function formatInterval(interval: Interval, dimension: Dimension, system: UnitSystem, options: FormatOptions = {}): Formatted {
  if (interval.all) return joined('all', '')
  const [min, max] = [interval.min && formatQuantity(interval.min, dimension, system, options), interval.max && formatQuantity(interval.max, dimension, system, options)]
  if (!min && !max) return joined('', '')
  if (!min) return joined(`≤ ${max?.figure}`, max?.unit ?? '')
  if (!max) return joined(`≥ ${min.figure}`, min.unit)
  if (interval.min?.si === interval.max?.si) return min
  if (min.unit !== max.unit) return joined(`${min.text} to ${max.text}`, '')
  const plain = /^[\d.,]+$/.test(min.figure) && /^[\d.,]+$/.test(max.figure)
  return joined(`${min.figure}${plain ? '–' : ' to '}${max.figure}`, min.unit)
}
