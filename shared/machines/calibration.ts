/** Where a machine stands with its calibration on a given day. */
import type { CalibrationState } from '../schemas/machines.ts'

/** Days before the due date from which people are reminded. */
export const DUE_SOON_DAYS = 30

/** Whole days from one calendar day to another; negative when it has passed. Both as YYYY-MM-DD. */
export const daysUntil = (due: string, today: string): number => Math.round((Date.parse(`${due}T00:00:00Z`) - Date.parse(`${today}T00:00:00Z`)) / 86_400_000)

/** A calibration is good on its due date and lapsed the day after. */
export function calibrationState(dueOn: string | null, today: string): CalibrationState {
  if (dueOn === null) return 'unknown'
  const days = daysUntil(dueOn, today)
  return days < 0 ? 'lapsed' : days <= DUE_SOON_DAYS ? 'due-soon' : 'current'
}

const MONTHS = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December']

/** A calendar day in words: 19 December 2026. */
export function dayWords(day: string): string {
  const [year = '', month = '', date = ''] = day.split('-')
  return `${Number(date)} ${MONTHS[Number(month) - 1] ?? month} ${year}`
}
