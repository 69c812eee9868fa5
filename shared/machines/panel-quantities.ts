/** What a control sets or a display shows: its name, what it measures, and the way between the panel's unit and the unit of storage. */
import type { PanelQuantity } from '../schemas/machines.ts'
import { fromSi, toSi } from '../units/convert.ts'
import { unitSpelt } from '../units/unit-names.ts'
import type { Dimension } from '../units/types.ts'

interface PanelQuantityFacts {
  label: string
  /** Null where the figure means something on this machine only: a bare knob, a trim. */
  dimension: Dimension | null
  /** The unit that such a control usually has; the first offer of a new row. */
  unit: string
}

export const PANEL_QUANTITY: { readonly [Q in PanelQuantity]: PanelQuantityFacts } = {
  current: { label: 'Current', dimension: 'current', unit: 'A' },
  voltage: { label: 'Voltage', dimension: 'voltage', unit: 'V' },
  wireFeed: { label: 'Wire feed', dimension: 'wireFeed', unit: 'm/min' },
  peakCurrent: { label: 'Peak current', dimension: 'current', unit: 'A' },
  backgroundCurrent: { label: 'Background current', dimension: 'current', unit: 'A' },
  peakVoltage: { label: 'Peak voltage', dimension: 'voltage', unit: 'V' },
  backgroundVoltage: { label: 'Background voltage', dimension: 'voltage', unit: 'V' },
  pulseFrequency: { label: 'Pulse frequency', dimension: 'frequency', unit: 'Hz' },
  pulseOnTime: { label: 'Pulse on-time', dimension: 'pulseTime', unit: 'ms' },
  acFrequency: { label: 'AC frequency', dimension: 'frequency', unit: 'Hz' },
  acBalance: { label: 'AC balance', dimension: 'percent', unit: '%' },
  doublePulseFrequency: { label: 'Double-pulse frequency', dimension: 'frequency', unit: 'Hz' },
  knob: { label: 'Program knob', dimension: null, unit: '' },
  trim: { label: 'Trim', dimension: null, unit: '' },
  inductance: { label: 'Inductance', dimension: null, unit: '' },
  preFlow: { label: 'Pre-flow', dimension: 'duration', unit: 's' },
  postFlow: { label: 'Post-flow', dimension: 'duration', unit: 's' },
  craterCurrent: { label: 'Crater current', dimension: 'current', unit: 'A' },
  craterTime: { label: 'Crater time', dimension: 'duration', unit: 's' },
  hotStart: { label: 'Hot start', dimension: 'percent', unit: '%' },
  upSlope: { label: 'Up-slope', dimension: 'duration', unit: 's' },
  downSlope: { label: 'Down-slope', dimension: 'duration', unit: 's' },
  burnBack: { label: 'Burn-back', dimension: 'duration', unit: 's' },
  runIn: { label: 'Run-in', dimension: 'wireFeed', unit: 'm/min' },
  gasFlow: { label: 'Gas flow', dimension: 'gasFlow', unit: 'L/min' },
}

/**
 * The name in `units/convert` of a unit as printed on a panel (`ipm` is in/min).
 * @returns null when it does not measure the quantity: a bare scale, or per cent in place of amps
 */
export function panelUnit(quantity: PanelQuantity, printed: string): string | null {
  const { dimension } = PANEL_QUANTITY[quantity]
  return dimension === null || printed.trim() === '' ? null : (unitSpelt(printed, dimension) ?? null)
}

/** A figure on the panel in the unit of storage; null where the panel's unit cannot be converted. */
export function toStorage(value: number, quantity: PanelQuantity, printed: string): number | null {
  const { dimension } = PANEL_QUANTITY[quantity]
  const unit = panelUnit(quantity, printed)
  return dimension === null || unit === null ? null : toSi(value, dimension, unit)
}

/** A storage figure in the panel's own unit; null where it cannot be converted. */
export function fromStorage(stored: number, quantity: PanelQuantity, printed: string): number | null {
  const { dimension } = PANEL_QUANTITY[quantity]
  const unit = panelUnit(quantity, printed)
  return dimension === null || unit === null ? null : fromSi(stored, dimension, unit)
}
