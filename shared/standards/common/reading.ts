/** Reads figures and names out of a record for the rules. What contradicts itself reads as "not known". */
import type { Interval, Quantity } from '../../schemas/common.ts'
import type { GasMixture } from '../../schemas/welding.ts'
import { SHOWN_UNIT, UNITS } from '../../units/convert.ts'
import type { Dimension, UnitSystem } from '../../units/types.ts'
import { remember } from './remember.ts'

export interface Figures {
  min: number | null
  max: number | null
  /** Every size is asked. */
  all: boolean
  /** The record contradicts itself: minimum above maximum, or a negative size. */
  fault: boolean
}

const NONE: Figures = { min: null, max: null, all: false, fault: false }
const FAULT: Figures = { min: null, max: null, all: false, fault: true }

/** Nine decimals: takes the last-bit noise off a product, so that 1.1 × 8 is 8.8 at a boundary. Quicker than by digits. */
export const tidy = (value: number): number => Math.round(value * 1e9) / 1e9

/** Storage keeps nine decimals, which a unit's factor magnifies: of a converted figure seven are told apart. */
const converted = (value: number): number => Math.round(value * 1e7) / 1e7 + 0

/** A storage figure in the unit of `system`, without the noise that typing it in another unit leaves. */
export function inUnitOf(si: number, dimension: Dimension, system: UnitSystem): number {
  if (system === 'SI') return tidy(si)
  const unit = UNITS[dimension][SHOWN_UNIT.US[dimension]]
  return unit ? converted((si - (unit.offset ?? 0)) / unit.factor) : si
}

/** A quantity as the figure that a rule of `system` compares. */
export const figure = (quantity: Quantity, dimension: Dimension, system: UnitSystem): number => inUnitOf(quantity.si, dimension, system)

export const figureOrNull = (quantity: Quantity | null | undefined, dimension: Dimension, system: UnitSystem): number | null => (quantity ? figure(quantity, dimension, system) : null)

/** Both ends of an interval in the judging system; temperatures alone may be below zero. */
export function figures(interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): Figures {
  if (!interval) return NONE
  if (interval.all) return { min: null, max: null, all: true, fault: false }
  const min = figureOrNull(interval.min, dimension, system)
  const max = figureOrNull(interval.max, dimension, system)
  if (min !== null && max !== null && min > max) return FAULT
  if (dimension !== 'temperature' && ((min !== null && min < 0) || (max !== null && max < 0))) return FAULT
  return { min, max, all: false, fault: false }
}

/** A figure that a coupon must have as one value (T, t): null when it is missing, contradictory, not above zero or a true interval. */
export function single(interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): number | null {
  const { min, max } = figures(interval, dimension, system)
  const value = min ?? max
  if (value === null || value <= 0) return null
  return max !== null && max !== value ? null : value
}

/** Whether an interval says anything at all. */
export const isStated = (interval: Interval | null | undefined): boolean => !!interval && (interval.all || interval.min !== null || interval.max !== null)

export const unitOf = (dimension: Dimension, system: UnitSystem): string => SHOWN_UNIT[system][dimension]

const NO_GAS = /^(none|no gas|not used|without)$/i

/** True when the record says in words that no gas is used: no components and the name "none". */
export const isNoGas = (gas: GasMixture): boolean => gas.components.length === 0 && gas.name !== null && saysNoGas(gas.name)

const saysNoGas = remember((name) => NO_GAS.test(name.trim()))

type Part = GasMixture['components'][number]
const isPresent = (part: Part): boolean => part.percent > 0
const byShare = (a: Part, b: Part): number => b.percent - a.percent || a.gas.localeCompare(b.gas)

/** The mixture as one name, e.g. `Ar 75 % + CO2 25 %`, sorted by share; `none`; null when the composition isn't known or doesn't sum to 100. */
export function gasName(gas: GasMixture | null): string | null {
  if (!gas) return null
  if (isNoGas(gas)) return 'none'
  let total = 0
  for (const part of gas.components) total += part.percent
  if (gas.components.length === 0 || Math.abs(total - 100) > 0.05) return null
  const parts = gas.components.filter(isPresent)
  if (parts.length === 1 && parts[0]) return `${parts[0].gas} 100 %`
  if (parts.length > 2 || (parts[0] && parts[1] && byShare(parts[0], parts[1]) > 0)) parts.sort(byShare)
  let name = ''
  for (const part of parts) name += name === '' ? `${part.gas} ${part.percent} %` : ` + ${part.gas} ${part.percent} %`
  return name
}

/** Argon, helium or a mixture of both; null when the composition isn't known. */
export function isInert(gas: GasMixture | null): boolean | null {
  if (!gas || gasName(gas) === null || isNoGas(gas)) return null
  return gas.components.every((part) => part.percent === 0 || part.gas === 'Ar' || part.gas === 'He')
}

/** Words that people typed, made equal in case, hyphens and spacing, and still readable. */
export const plainWords = remember((text) => text.trim().toLowerCase().replace(/[\s-]+/g, ' '))

/** Text with case and spacing made equal, for comparing names that people typed. */
export const sameText = remember((text) => text.trim().toUpperCase().replace(/[\s-]+/g, ''))
