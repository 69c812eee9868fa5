/** What can't be in a bead, in a sentence at its field. */
import type { Interval, Quantity } from '../schemas/common.ts'
import type { BeadContent } from '../schemas/trials.ts'
import { MEASURE, MEASURES } from './bead-values.ts'

export interface Complaint { field: string; message: string }

const isInterval = (value: Interval | Quantity): value is Interval => 'all' in value

/** Figures that can't be: nothing or less where only more is possible, ends the wrong way round, gas shares that don't make 100 %, one fault twice. */
export function checkBead(content: BeadContent): Complaint[] {
  const found: Complaint[] = []
  const positive = (field: string, label: string, value: Quantity | null): void => {
    if (value !== null && value.si <= 0) found.push({ field, message: `${label} must be above 0; “${value.typed}” was given.` })
  }
  positive('thickness', 'Thickness', content.thickness)
  positive('wireDiameter', 'Wire diameter', content.wireDiameter)
  positive('stickOut', 'Stick-out', content.stickOut)
  for (const measure of MEASURES) {
    const value = content.measured[measure]
    if (value === null) continue
    const { label } = MEASURE[measure]
    const field = `measured.${measure}`
    if (!isInterval(value)) {
      positive(field, label, value)
      continue
    }
    positive(field, label, [value.min, value.max].find((end) => end !== null && end.si <= 0) ?? null)
    if (value.min && value.max && value.min.si > value.max.si) found.push({ field, message: `${label}: the lower figure, ${value.min.typed}, is above the upper, ${value.max.typed}. Swap them or correct one.` })
  }
  const [peak, background] = [content.measured.peakCurrent, content.measured.backgroundCurrent]
  if (peak && background && background.si > peak.si) found.push({ field: 'measured.backgroundCurrent', message: `Background current of ${background.typed} is above the peak of ${peak.typed}.` })
  const parts = content.gas?.components ?? []
  const sum = parts.reduce((total, { percent }) => total + percent, 0)
  if (parts.length > 0 && Math.abs(sum - 100) > 0.01) found.push({ field: 'gas', message: `The parts of the gas sum to ${Number(sum.toFixed(2))} %; a mixture sums to 100 %.` })
  const twice = content.faults.find(({ fault }, index) => content.faults.findIndex((other) => other.fault === fault) !== index)
  if (twice) found.push({ field: 'faults', message: 'A fault is named twice; give it one severity.' })
  const doubled = content.settings.find(({ control }, index) => content.settings.findIndex((other) => other.control === control) !== index)
  if (doubled) found.push({ field: 'settings', message: `${doubled.label} is given twice; give it one value.` })
  return found
}
