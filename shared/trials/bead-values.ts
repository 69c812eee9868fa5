/** What a trial bead was welded with: dialled settings in the unit of storage, measured values beside them. */
import { PANEL_QUANTITY, panelUnit, toStorage } from '../machines/panel-quantities.ts'
import type { Interval, Quantity } from '../schemas/common.ts'
import type { PanelQuantity } from '../schemas/machines.ts'
import type { BeadContent, BeadSetting } from '../schemas/trials.ts'
import { settle } from '../units/convert.ts'
import { SI_UNIT, type Dimension } from '../units/types.ts'

export type Measure = keyof BeadContent['measured']
interface MeasureFacts { label: string; dimension: Dimension; /** The variable of the weld that it is. */ quantity: PanelQuantity | null }
export const MEASURE: { readonly [M in Measure]: MeasureFacts } = {
  current: { label: 'Mean current', dimension: 'current', quantity: 'current' },
  voltage: { label: 'Arc voltage', dimension: 'voltage', quantity: 'voltage' },
  wireFeed: { label: 'Wire feed', dimension: 'wireFeed', quantity: 'wireFeed' },
  travelSpeed: { label: 'Travel speed', dimension: 'travelSpeed', quantity: null },
  peakCurrent: { label: 'Peak current', dimension: 'current', quantity: 'peakCurrent' },
  backgroundCurrent: { label: 'Background current', dimension: 'current', quantity: 'backgroundCurrent' },
  length: { label: 'Length', dimension: 'length', quantity: null },
  arcTime: { label: 'Arc time', dimension: 'duration', quantity: null },
}
export const MEASURES = Object.keys(MEASURE) as Measure[]

/** From lo to hi; a single figure has lo = hi. */
export interface Spread { lo: number; hi: number }
const isInterval = (value: Interval | Quantity): value is Interval => 'all' in value

/** A measured value in the unit of storage: one figure, or what the meter wandered between. Null when not measured. */
function spreadOf(value: Interval | Quantity | null): Spread | null {
  if (value === null) return null
  if (!isInterval(value)) return { lo: value.si, hi: value.si }
  const [lo, hi] = [value.min?.si ?? value.max?.si, value.max?.si ?? value.min?.si]
  return lo === undefined || hi === undefined ? null : { lo: Math.min(lo, hi), hi: Math.max(lo, hi) }
}
const middle = (spread: Spread | null): number | null => (spread ? settle((spread.lo + spread.hi) / 2) : null)

/** mm/min: as measured, else worked out from length and arc time; null without either. */
export function travelSpread({ measured }: Pick<BeadContent, 'measured'>): Spread | null {
  const given = spreadOf(measured.travelSpeed)
  if (given) return given
  const [length, time] = [measured.length?.si ?? 0, measured.arcTime?.si ?? 0]
  if (length <= 0 || time <= 0) return null
  const speed = settle((length / time) * 60)
  return { lo: speed, hi: speed }
}

export const measuredSpread = (content: Pick<BeadContent, 'measured'>, measure: Measure): Spread | null => (measure === 'travelSpeed' ? travelSpread(content) : spreadOf(content.measured[measure]))

/** The setting of a quantity in the unit of storage; null when the panel doesn't set it, or has a bare scale. */
export function settingOf({ settings }: Pick<BeadContent, 'settings'>, quantity: PanelQuantity): number | null {
  const setting = settings.find(({ sets }) => sets === quantity)
  return setting ? toStorage(setting.value, quantity, setting.unit) : null
}

/** A quantity as measured (its middle), else as dialled. Storage unit. */
export function valueOf(content: Pick<BeadContent, 'settings' | 'measured'>, quantity: PanelQuantity): { value: number; from: 'set' | 'measured' } | null {
  const measure = MEASURES.find((one) => MEASURE[one].quantity === quantity)
  const measured = measure ? middle(measuredSpread(content, measure)) : null
  if (measured !== null) return { value: measured, from: 'measured' }
  const set = settingOf(content, quantity)
  return set === null ? null : { value: set, from: 'set' }
}

/** One figure of a bead, as a plot or a table takes it. */
export interface BeadValue {
  /** `set:<control>`, `measured:<name>` or `stick-out`. */
  key: string
  label: string
  from: 'set' | 'measured'
  /** Unit of `value`: that of storage; a panel's own where it can't be converted, empty for a bare scale. */
  unit: string
  value: number
  dimension: Dimension | null
}

function settingValue(setting: BeadSetting): BeadValue {
  const { control, label, sets, value, unit } = setting
  const stored = toStorage(value, sets, unit)
  const { dimension } = PANEL_QUANTITY[sets]
  const known = stored !== null && dimension !== null && panelUnit(sets, unit) !== null
  return { key: `set:${control}`, label: `${label}, as set`, from: 'set', value: known ? stored : value, unit: known ? SI_UNIT[dimension] : unit, dimension: known ? dimension : null }
}

/** All figures of a bead: its settings in the order of the panel, then what was measured. */
export function beadValues(content: BeadContent): BeadValue[] {
  const measured = MEASURES.flatMap((measure): BeadValue[] => {
    const value = middle(measuredSpread(content, measure))
    const { label, dimension } = MEASURE[measure]
    return value === null ? [] : [{ key: `measured:${measure}`, label: `${label}, measured`, from: 'measured', value, unit: SI_UNIT[dimension], dimension }]
  })
  const stickOut: BeadValue[] = content.stickOut ? [{ key: 'stick-out', label: 'Stick-out', from: 'measured', value: content.stickOut.si, unit: 'mm', dimension: 'length' }] : []
  return [...content.settings.map(settingValue), ...measured, ...stickOut]
}
