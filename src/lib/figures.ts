/** Figures as they stand on a sheet. */

/** A figure without noise: at most four significant decimals' worth, a true minus, a thin space between thousands. */
export function figure(value: number, digits?: number): string {
  const settled = digits === undefined ? Number(value.toPrecision(Math.abs(value) >= 1000 ? 6 : 4)) : Number(value.toFixed(digits))
  const [whole = '0', part] = (digits === undefined ? String(Math.abs(settled)) : Math.abs(settled).toFixed(digits)).split('.')
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, '\u2009') : whole
  return `${settled < 0 ? '\u2212' : ''}${grouped}${part ? `.${part}` : ''}`
}

const SIZES = ['bytes', 'kB', 'MB', 'GB']
/** A file's size in words: 812 bytes, 1.4 MB. */
export function fileSize(bytes: number): string {
  let value = bytes
  let step = 0
  while (value >= 1000 && step < SIZES.length - 1) {
    value /= 1000
    step += 1
  }
  return `${step === 0 ? value : value.toFixed(value < 10 ? 1 : 0)} ${SIZES[step]}`
}

const DAY = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' })
const MOMENT = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' })
/** 18 Nov 2026, in the reader's own time zone. */
export const day = (iso: string): string => DAY.format(new Date(iso))
/** 18 Nov 2026, 14:05 */
export const moment = (iso: string): string => MOMENT.format(new Date(iso))
