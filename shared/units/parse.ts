/**
 * Reads quantities and intervals as people write them: `1 1/2"`, `12,7 mm`, `200 F`, `.035`, `18-22 V`, `max 25`, `10 ± 2`.
 * A bare number takes the unit shown in the writer's system. Two exceptions, because a wrong guess would be a wrong weld:
 * a bare length that begins with its decimal point and is below 0.5 (`.035`, `.045`: filler sizes) is in inches in either
 * system; a bare fraction in SI (`3/8`) is refused and its unit asked for.
 */
import type { Interval, Quantity } from '../schemas/common.ts'
import { SHOWN_UNIT, UNITS, settle, toSi } from './convert.ts'
import { plainSigns, readNumber } from './read-number.ts'
import type { Dimension, UnitSystem } from './types.ts'
import { dimensionsOf, unitSpelt } from './unit-names.ts'

export type QuantityReading = { ok: true; quantity: Quantity } | { ok: false; message: string }
export type IntervalReading = { ok: true; interval: Interval } | { ok: false; message: string }

/** What a dimension is called in a message, with an example in each system. */
const WORDS: { readonly [D in Dimension]: readonly [name: string, si: string, us: string] } = {
  length: ['a length', '12.7 mm', '1/2 in'],
  temperature: ['a temperature', '150 °C', '300 °F'],
  temperatureDifference: ['a temperature difference', '55 °C', '100 °F'],
  travelSpeed: ['a travel speed', '250 mm/min', '10 in/min'],
  wireFeed: ['a wire feed speed', '8 m/min', '315 in/min'],
  current: ['a current', '180 A', '180 A'],
  voltage: ['a voltage', '24 V', '24 V'],
  heatInput: ['a heat input', '1.5 kJ/mm', '38 kJ/in'],
  stress: ['a stress', '485 MPa', '70 ksi'],
  force: ['a force', '98.5 kN', '22100 lbf'],
  energy: ['an energy', '27 J', '20 ft·lbf'],
  gasFlow: ['a gas flow', '15 L/min', '30 ft³/h'],
  time: ['a time', '90 min', '90 min'],
  duration: ['a duration', '45 s', '45 s'],
  angle: ['an angle', '60°', '60°'],
  percent: ['a percentage', '18 %', '18 %'],
  frequency: ['a frequency', '120 Hz', '120 Hz'],
  pulseTime: ['a pulse time', '2.2 ms', '2.2 ms'],
  mass: ['a mass', '0.8 kg', '1.8 lb'],
  area: ['an area', '180 mm²', '0.28 in²'],
  hardness: ['a hardness', '250 HV', '250 HV'],
  temperatureRate: ['a heating or cooling rate', '100 °C/h', '180 °F/h'],
}

const example = (dimension: Dimension, system: UnitSystem): string => WORDS[dimension][system === 'SI' ? 1 : 2]
const MAX_TYPED = 60

interface Single { value: number; unit: string | null; fraction: boolean; startsWithPoint: boolean; typed: string }
type SingleReading = Single | { problem: string }

/** One number with or without a unit; the unit is not yet settled. */
function readSingle(typed: string, dimension: Dimension, system: UnitSystem): SingleReading {
  const text = plainSigns(typed)
  const number = readNumber(text)
  if (!number) return { problem: `"${typed}" is not ${WORDS[dimension][0]}. Write a number, e.g. ${example(dimension, system)}.` }
  if ('problem' in number) return { problem: `${number.problem}.` }
  const rest = text.slice(number.length).trim()
  const unit = rest === '' ? undefined : unitSpelt(rest, dimension)
  if (unit === null) {
    if (readNumber(rest.replace(/^(?:-|to|and|±|\+\/?-|\.+|…)/i, '').trim())) return { problem: `"${typed}" holds more than one number; one value belongs here, e.g. ${example(dimension, system)}.` }
    const [other] = dimensionsOf(rest)
    return { problem: other ? `"${typed}" is ${WORDS[other][0]}, not ${WORDS[dimension][0]}. Write e.g. ${example(dimension, system)}.` : `"${rest}" in "${typed}" is not a unit of ${WORDS[dimension][0].replace(/^an? /, '')}. Write e.g. ${example(dimension, system)}; units known here: ${Object.keys(UNITS[dimension]).join(', ')}.` }
  }
  return { value: number.value, unit: unit ?? null, fraction: number.fraction, startsWithPoint: text.startsWith('.'), typed }
}

/** The unit meant by a bare number, or the question that it leaves open. */
function unitOf(single: Single, dimension: Dimension, system: UnitSystem, neighbour: string | null): string | { problem: string } {
  if (single.unit) return single.unit
  if (neighbour) return neighbour
  if (dimension === 'length' && single.startsWithPoint && single.value < 0.5) return 'in'
  if (dimension === 'length' && system === 'SI' && single.fraction) return { problem: `"${single.typed}" has no unit. Write ${single.typed} in, or the figure in mm.` }
  return SHOWN_UNIT[system][dimension]
}

const belowZero: readonly Dimension[] = ['temperature', 'temperatureDifference']

function settled(single: Single, dimension: Dimension, system: UnitSystem, neighbour: string | null = null): QuantityReading {
  const unit = unitOf(single, dimension, system, neighbour)
  if (typeof unit !== 'string') return { ok: false, message: unit.problem }
  const si = toSi(single.value, dimension, unit)
  if (!Number.isFinite(si) || Math.abs(si) > 1e12) return { ok: false, message: `"${single.typed}" is too large to be ${WORDS[dimension][0]}. Write e.g. ${example(dimension, system)}.` }
  if (si < 0 && !belowZero.includes(dimension)) return { ok: false, message: `"${single.typed}" is below zero; ${WORDS[dimension][0]} can't be. Write e.g. ${example(dimension, system)}.` }
  if (dimension === 'temperature' && si < -273.15) return { ok: false, message: `"${single.typed}" is below absolute zero. Write e.g. ${example(dimension, system)}.` }
  return { ok: true, quantity: { si, unit, typed: single.typed } }
}

const tooLong = (text: string): boolean => text.length > MAX_TYPED
const wrong = (message: string): { ok: false; message: string } => ({ ok: false, message })

/**
 * Reads one value. The result's `si` is in the dimension's storage unit, `typed` is the text as typed, trimmed.
 * @returns the quantity, or a message that names the value and what would be right
 */
export function parseQuantity(text: string, dimension: Dimension, system: UnitSystem): QuantityReading {
  const typed = text.trim()
  if (typed === '') return wrong(`Write ${WORDS[dimension][0]}, e.g. ${example(dimension, system)}.`)
  if (tooLong(typed)) return wrong(`"${typed.slice(0, 20)}…" is longer than ${MAX_TYPED} characters. Write e.g. ${example(dimension, system)}.`)
  const single = readSingle(typed, dimension, system)
  return 'problem' in single ? wrong(single.problem) : settled(single, dimension, system)
}

const AT_MOST = /^(?:max(?:imum)?\.?|up to|at most|no more than|not over|not more than|<=|≤|=<|to)\s*/i
const AT_LEAST = /^(?:min(?:imum)?\.?|at least|no less than|not less than|not under|from|>=|≥|=>)\s*/i
const AT_MOST_AFTER = /\s*(?:max(?:imum)?\.?|(?:and|or) (?:less|under|below|down))$/i
const AT_LEAST_AFTER = /\s*(?:min(?:imum)?\.?|(?:and|or) (?:more|over|above|up)|\+)$/i
const STRICT = /^(?:<|>|over|under|above|below|less than|more than)\s*(?=[\d.,])/i
const ALL = /^(?:all|any|every|unlimited)(?: (?:sizes?|thickness(?:es)?|diameters?|values?))?$/i
const SEPARATOR = /\s*(?:-|to|and|\.{2,3}|…)\s*/gi
const PLUS_MINUS = /\s*(?:±|\+\s*\/\s*-|\+-)\s*/

const only = (min: Quantity | null, max: Quantity | null): IntervalReading => ({ ok: true, interval: { min, max, all: false } })

/** `10 ± 2`, `10 ± 5 %`: both ends keep the whole text, as neither was typed. */
function readTolerance(typed: string, dimension: Dimension, system: UnitSystem): IntervalReading | null {
  const text = plainSigns(typed)
  const sign = PLUS_MINUS.exec(text)
  if (!sign || sign.index === 0) return null
  const middle = readSingle(typed.slice(0, sign.index), dimension, system)
  if ('problem' in middle) return wrong(middle.problem)
  const tail = typed.slice(sign.index + sign[0].length)
  const percent = dimension === 'percent' ? null : /^(.*?)\s*%$/.exec(tail)
  const around = readSingle(percent?.[1] ?? tail, dimension, system)
  if ('problem' in around) return wrong(around.problem)
  const centre = settled(middle, dimension, system, around.unit)
  if (!centre.ok) return centre
  const unit = centre.quantity.unit
  const given = middle.value
  const half = percent ? Math.abs(given) * (around.value / 100) : around.value
  if (!percent && around.unit && around.unit !== unit) return wrong(`"${typed}" mixes units. Write value and tolerance in one unit, e.g. ${example(dimension, system)}.`)
  if (half < 0) return wrong(`"${typed}" has a tolerance below zero. Write e.g. 10 ± 2.`)
  const end = (value: number) => settled({ ...middle, value: settle(value), unit, typed }, dimension, system)
  const [low, high] = [end(given - half), end(given + half)]
  if (!low.ok) return wrong(`"${typed}" reaches below zero. Write the two ends, e.g. 5 to 20.`)
  return high.ok ? only(low.quantity, high.quantity) : high
}

function readPair(typed: string, dimension: Dimension, system: UnitSystem): IntervalReading | null {
  const text = plainSigns(typed)
  const start = /^(?:from|between)\s+/i.exec(text)?.[0].length ?? 0
  for (const separator of text.slice(start).matchAll(SEPARATOR)) {
    const at = start + separator.index
    const [left, right] = [typed.slice(start, at), typed.slice(at + separator[0].length)]
    if (left === '' || right === '') continue
    const [low, high] = [readSingle(left, dimension, system), readSingle(right, dimension, system)]
    if ('problem' in low || 'problem' in high) continue
    const [min, max] = [settled(low, dimension, system, high.unit), settled(high, dimension, system, low.unit)]
    if (!min.ok) return min
    if (!max.ok) return max
    if (min.quantity.si > max.quantity.si) return wrong(`"${typed}" runs downward. Write the smaller value first: ${right.replace(/\s.*/, '')} to ${left}.`)
    return only(min.quantity, max.quantity)
  }
  return null
}

/**
 * Reads an interval: one value (min = max), two ends, one end (`max 25`, `min 5`, `≤ 25`, `20 max`, `25 and over`), a value
 * with a tolerance, or `all`. Both ends are included; a bare end takes the other end's unit.
 * @returns the interval, or a message that names the value and what would be right
 */
export function parseInterval(text: string, dimension: Dimension, system: UnitSystem): IntervalReading {
  const typed = text.trim()
  if (ALL.test(typed)) return { ok: true, interval: { min: null, max: null, all: true } }
  const one = parseQuantity(typed, dimension, system)
  if (one.ok) return only(one.quantity, one.quantity)
  if (typed === '' || tooLong(typed)) return one
  const plain = plainSigns(typed)
  const tolerance = readTolerance(typed, dimension, system)
  if (tolerance) return tolerance
  const pair = readPair(typed, dimension, system)
  if (pair) return pair
  if (STRICT.test(plain)) return wrong(`"${typed}" leaves its end out, and an interval here includes its ends. Write "max ${plain.replace(STRICT, '')}" or "min ${plain.replace(STRICT, '')}" with the last value that is allowed.`)
  for (const [pattern, side] of [[AT_MOST, 'max'], [AT_LEAST, 'min'], [AT_MOST_AFTER, 'max'], [AT_LEAST_AFTER, 'min']] as const) {
    const word = pattern.exec(plain)
    if (!word) continue
    const rest = word.index === 0 ? typed.slice(word[0].length) : typed.slice(0, word.index)
    const end = parseQuantity(rest, dimension, system)
    if (!end.ok) return end
    return side === 'max' ? only(null, end.quantity) : only(end.quantity, null)
  }
  return one
}
