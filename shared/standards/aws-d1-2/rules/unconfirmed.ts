/** Thickness, diameter, amperage, voltage, travel speed, gas flow and preheat: essential, but without confirmed figures. */
import type { Interval } from '../../../schemas/common.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import type { Dimension, UnitSystem } from '../../../units/types.ts'
import { figureOrNull, figures, isNoGas, isStated } from '../../common/reading.ts'
import type { CouponSide, Rule, RuleContext } from '../../rule.ts'
import { thicknessOf } from '../alloys.ts'
import { meta, TABLE } from '../meta.ts'
import { unconfirmedFigure } from '../unconfirmed.ts'

const WHY = `${TABLE}; the figures could not be confirmed`
const statement = (text: string): string => `${text}. How far it may change is not confirmed, so anything but the tested value is "cannot tell".`

function ends(interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): { min: number | null; max: number | null } | null | 'fault' {
  const { min, max, all, fault } = figures(interval, dimension, system)
  if (fault) return 'fault'
  if (all) return { min: null, max: null }
  return min === null && max === null ? null : { min: min ?? max, max: max ?? min }
}

function had(interval: Interval | null | undefined, dimension: Dimension, system: UnitSystem): { min: number; max: number } | null {
  const told = ends(interval, dimension, system)
  return told === null || told === 'fault' || told.min === null || told.max === null ? null : { min: told.min, max: told.max }
}

function thicknesses(variables: WeldingVariables, system: UnitSystem): { min: number | null; max: number | null } | null | 'fault' {
  const all = thicknessOf(variables, system)
  if (all.length === 0) return null
  if (all.some(({ fault }) => fault)) return 'fault'
  if (all.some((one) => one.all)) return { min: null, max: null }
  return { min: Math.min(...all.map(({ min, max }) => min ?? max ?? 0)), max: Math.max(...all.map(({ min, max }) => max ?? min ?? 0)) }
}

export const thickness = unconfirmedFigure({
  meta: meta('thickness', 'Thickness', 'Table 3.4', 'memory', 'Table 3.4 could not be confirmed; no figure of another standard is used', statement('Thickness outside the range that the test qualifies')),
  field: 'thickness',
  at: 'weld',
  label: 'thickness',
  dimension: 'length',
  asked: (context) => thicknesses(context.procedure, context.system),
  tested(side, system) {
    const told = thicknesses(side.variables, system)
    return told === null || told === 'fault' || told.min === null || told.max === null ? null : { min: told.min, max: told.max }
  },
})

export const diameter = unconfirmedFigure({
  meta: meta('diameter', 'Diameter', 'Table 3.1', 'secondary', WHY, statement('Pipe diameter outside the range that the test qualifies')),
  field: 'diameter',
  at: 'weld',
  label: 'pipe diameter',
  dimension: 'length',
  applies: (context) => context.procedure.product !== 'plate',
  asked: (context) => ends(context.procedure.diameter, 'length', context.system),
  tested: (side, system) => (isStated(side.variables.diameter) || side.variables.product !== 'plate' ? had(side.variables.diameter, 'length', system) : null),
})

type Setting = 'current' | 'voltage' | 'travelSpeed'

const setting = (key: Setting, file: string, label: string, dimension: Dimension): Rule =>
  unconfirmedFigure({
    meta: meta(file, label.charAt(0).toUpperCase() + label.slice(1), 'Table 3.1', 'memory', WHY, statement(`Another ${label}`)),
    field: `electrical.${key}`,
    at: 'block',
    label,
    dimension,
    asked: (context) => ends(context.block?.electrical[key], dimension, context.system),
    tested: (side, system) => had(side.block?.electrical[key], dimension, system),
  })

export const amperage = setting('current', 'amperage', 'amperage', 'current')
export const voltage = setting('voltage', 'voltage', 'voltage', 'voltage')
export const travelSpeed = setting('travelSpeed', 'travel-speed', 'travel speed', 'travelSpeed')

const withGas = (context: RuleContext): boolean => !!context.block && context.block.process !== 'SMAW' && !(context.block.shieldingGas && isNoGas(context.block.shieldingGas))

export const gasFlow = unconfirmedFigure({
  meta: meta('gas-flow', 'Gas flow', 'Table 3.1', 'memory', WHY, statement('Another flow of shielding gas'), { classes: { GMAW: 'essential', GTAW: 'essential', PAW: 'essential' } }),
  field: 'shieldingGas.flow',
  at: 'block',
  label: 'gas flow',
  dimension: 'gasFlow',
  applies: withGas,
  asked: (context) => ends(context.block?.shieldingGas?.flow, 'gasFlow', context.system),
  tested: (side, system) => had(side.block?.shieldingGas?.flow, 'gasFlow', system),
})

const preheatOf = (side: Pick<CouponSide, 'variables'>, system: UnitSystem): { min: number; max: number } | null => {
  const value = figureOrNull(side.variables.preheat.minimum, 'temperature', system)
  return value === null ? null : { min: value, max: value }
}

export const preheat = unconfirmedFigure({
  meta: meta('preheat', 'Preheat', 'Table 3.1', 'secondary', WHY, statement('Another preheat')),
  field: 'preheat.minimum',
  at: 'weld',
  label: 'preheat',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked: (context) => preheatOf({ variables: context.procedure }, context.system),
  tested: preheatOf,
})
