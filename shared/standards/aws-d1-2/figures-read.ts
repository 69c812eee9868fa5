/** Reads of a record the figures whose limits aren't confirmed. */
import type { Interval } from '../../schemas/common.ts'
import type { WeldingVariables } from '../../schemas/welding.ts'
import type { Dimension, UnitSystem } from '../../units/types.ts'
import { figures } from '../common/reading.ts'
import type { Rule } from '../rule.ts'
import { thicknessOf } from './alloys.ts'
import { meta, TABLE } from './meta.ts'
import { unconfirmedFigure } from './unconfirmed.ts'

export const WHY = `${TABLE}; the figures could not be confirmed`
export const statement = (text: string): string => `${text}. How far it may change is not confirmed, so anything but the tested value is "cannot tell".`

export function ends(interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): { min: number | null; max: number | null } | null | 'fault' {
  const { min, max, all, fault } = figures(interval, dimension, system)
  if (fault) return 'fault'
  if (all) return { min: null, max: null }
  return min === null && max === null ? null : { min: min ?? max, max: max ?? min }
}

export function had(interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): { min: number; max: number } | null {
  const told = ends(interval, dimension, system)
  return told === null || told === 'fault' || told.min === null || told.max === null ? null : { min: told.min, max: told.max }
}

export function thicknesses(variables: WeldingVariables, system: UnitSystem): { min: number | null; max: number | null } | null | 'fault' {
  const all = thicknessOf(variables, system)
  if (all.length === 0) return null
  if (all.some(({ fault }) => fault)) return 'fault'
  if (all.some((one) => one.all)) return { min: null, max: null }
  return { min: Math.min(...all.map(({ min, max }) => min ?? max ?? 0)), max: Math.max(...all.map(({ min, max }) => max ?? min ?? 0)) }
}

type Setting = 'current' | 'voltage' | 'travelSpeed'

/** A setting of the arc of which only the tested value is sure. */
export const unconfirmedSetting = (key: Setting, file: string, label: string, dimension: Dimension): Rule =>
  unconfirmedFigure({
    meta: meta(file, label.charAt(0).toUpperCase() + label.slice(1), 'Table 3.1', 'memory', WHY, statement(`Another ${label}`)),
    field: `electrical.${key}`,
    at: 'block',
    label,
    dimension,
    asked: (context) => ends(context.block?.electrical[key], dimension, context.system),
    tested: (side, system) => had(side.block?.electrical[key], dimension, system),
  })
