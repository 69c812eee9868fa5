import type { Interval, Quantity } from '../schemas/common.ts'
import { SI_UNIT, type Dimension, type UnitSystem } from './types.ts'

/** si = typed × factor + offset */
interface UnitDefinition { factor: number; offset?: number }

/**
 * Every unit that a person may write, by dimension; the first of each system is the one shown.
 * Factors are exact by definition (1 in = 25.4 mm, 1 lbf = 4.4482216152605 N) or follow from those: SI brochure and NIST SP 811.
 */
const LBF_KN = 4.4482216152605e-3
const PSI_MPA = 6.894757293168361e-3
export const UNITS: { readonly [D in Dimension]: Readonly<Record<string, UnitDefinition>> } = {
  length: { mm: { factor: 1 }, in: { factor: 25.4 }, cm: { factor: 10 }, m: { factor: 1000 }, ft: { factor: 304.8 } },
  temperature: { '°C': { factor: 1 }, '°F': { factor: 5 / 9, offset: -160 / 9 }, K: { factor: 1, offset: -273.15 } },
  temperatureDifference: { K: { factor: 1 }, '°C': { factor: 1 }, '°F': { factor: 5 / 9 } },
  travelSpeed: { 'mm/min': { factor: 1 }, 'in/min': { factor: 25.4 }, 'cm/min': { factor: 10 }, 'mm/s': { factor: 60 }, 'm/min': { factor: 1000 } },
  wireFeed: { 'm/min': { factor: 1 }, 'in/min': { factor: 0.0254 }, 'mm/min': { factor: 0.001 }, 'cm/min': { factor: 0.01 }, 'mm/s': { factor: 0.06 } },
  current: { A: { factor: 1 }, kA: { factor: 1000 } },
  voltage: { V: { factor: 1 } },
  heatInput: { 'kJ/mm': { factor: 1 }, 'kJ/in': { factor: 1 / 25.4 }, 'J/mm': { factor: 0.001 }, 'J/in': { factor: 0.001 / 25.4 }, 'kJ/cm': { factor: 0.1 } },
  stress: { MPa: { factor: 1 }, ksi: { factor: PSI_MPA * 1000 }, psi: { factor: PSI_MPA }, 'N/mm²': { factor: 1 } },
  force: { kN: { factor: 1 }, lbf: { factor: LBF_KN }, kip: { factor: LBF_KN * 1000 }, N: { factor: 0.001 } },
  energy: { J: { factor: 1 }, 'ft·lbf': { factor: 1.3558179483314004 }, kJ: { factor: 1000 } },
  gasFlow: { 'L/min': { factor: 1 }, 'ft³/h': { factor: 28.316846592 / 60 }, 'm³/h': { factor: 1000 / 60 } },
  time: { min: { factor: 1 }, h: { factor: 60 }, s: { factor: 1 / 60 } },
  duration: { s: { factor: 1 }, min: { factor: 60 }, ms: { factor: 0.001 } },
  angle: { '°': { factor: 1 } },
  percent: { '%': { factor: 1 } },
  frequency: { Hz: { factor: 1 }, kHz: { factor: 1000 } },
  pulseTime: { ms: { factor: 1 }, s: { factor: 1000 }, µs: { factor: 0.001 } },
  mass: { kg: { factor: 1 }, lb: { factor: 0.45359237 }, g: { factor: 0.001 } },
  area: { 'mm²': { factor: 1 }, 'in²': { factor: 645.16 }, 'cm²': { factor: 100 } },
  hardness: { HV: { factor: 1 } },
  temperatureRate: { 'K/h': { factor: 1 }, '°C/h': { factor: 1 }, '°F/h': { factor: 5 / 9 } },
}

/** The unit in which a dimension is shown in each system. */
export const SHOWN_UNIT: { readonly [S in UnitSystem]: Readonly<Record<Dimension, string>> } = {
  SI: { ...SI_UNIT, temperatureDifference: '°C', temperatureRate: '°C/h' },
  US: { ...SI_UNIT, length: 'in', temperature: '°F', temperatureDifference: '°F', travelSpeed: 'in/min', wireFeed: 'in/min', heatInput: 'kJ/in', stress: 'ksi', force: 'lbf', energy: 'ft·lbf', gasFlow: 'ft³/h', mass: 'lb', area: 'in²', temperatureRate: '°F/h' },
}

/** Twelve significant digits: removes the last-bit noise of a conversion so that 12.7 mm is 1/2 in at a boundary. */
export const settle = (value: number): number => Number(value.toPrecision(12))

/**
 * A figure in `unit` as the dimension's storage figure.
 * @throws RangeError when the unit does not measure that dimension
 */
export function toSi(value: number, dimension: Dimension, unit: string): number {
  const definition = UNITS[dimension][unit]
  if (!definition) throw new RangeError(`${unit} is not a unit of ${dimension}`)
  return settle(value * definition.factor + (definition.offset ?? 0))
}

/** A storage figure in `unit`. @throws RangeError when the unit does not measure that dimension */
export function fromSi(si: number, dimension: Dimension, unit: string): number {
  const definition = UNITS[dimension][unit]
  if (!definition) throw new RangeError(`${unit} is not a unit of ${dimension}`)
  return settle((si - (definition.offset ?? 0)) / definition.factor)
}

/** The figure that a rule of the given system compares: mm or in, °C or °F … */
export const inSystem = (quantity: Quantity, dimension: Dimension, system: UnitSystem): number => fromSi(quantity.si, dimension, SHOWN_UNIT[system][dimension])

/** Builds a quantity from a figure, typed the way it would be shown. */
export const quantity = (value: number, dimension: Dimension, unit: string = SI_UNIT[dimension]): Quantity => ({ si: toSi(value, dimension, unit), unit, typed: `${value} ${unit}` })

/** Builds an interval; one figure gives min = max. */
export const interval = (min: number | null, max: number | null | undefined, dimension: Dimension, unit?: string): Interval => ({
  min: min === null ? null : quantity(min, dimension, unit),
  max: max === undefined ? (min === null ? null : quantity(min, dimension, unit)) : max === null ? null : quantity(max, dimension, unit),
  all: false,
})
