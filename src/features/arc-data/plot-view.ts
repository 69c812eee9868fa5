/** Measures of the plot of a recording: scales, ticks, the shape of an envelope, and what zooming does. */

export interface Range { from: number; to: number }

/** Round steps that divide a span into about `count` parts. */
export function ticks(low: number, high: number, count: number): number[] {
  const span = high - low
  if (!(span > 0)) return [low]
  const raw = span / Math.max(1, count)
  const power = 10 ** Math.floor(Math.log10(raw))
  const step = ([1, 2, 5, 10].find((one) => one * power >= raw * 0.999) ?? 10) * power
  const first = Math.ceil(low / step - 1e-9)
  const last = Math.floor(high / step + 1e-9)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, at) => Number(((first + at) * step).toPrecision(12)))
}

/** Lowest and highest with some air, rounded to whole ticks, 0 included where it is near. */
export function domainOf(mins: readonly number[], maxs: readonly number[]): [number, number] {
  let low = Infinity
  let high = -Infinity
  for (const value of mins) if (value < low) low = value
  for (const value of maxs) if (value > high) high = value
  if (low > high) return [0, 1]
  if (low > 0 && low < high * 0.6) low = 0
  const air = Math.max((high - low) * 0.06, Math.abs(high) * 0.02, 0.5)
  return [low === 0 ? 0 : low - air, high + air]
}

/** The stretch between lowest and highest as one closed path; where both are one it is a line. */
export function envelope(x: readonly number[], low: readonly number[], high: readonly number[], scale: (value: number) => number): string {
  if (x.length === 0) return ''
  const at = (index: number, value: number) => `${(x[index] ?? 0).toFixed(2)},${scale(value).toFixed(2)}`
  const up = high.map((value, index) => at(index, value))
  const down = low.map((value, index) => at(index, value)).reverse()
  return `M${up.join('L')}L${down.join('L')}Z`
}

const LEAST = 1e-4

/** Half or twice what is shown, about its middle or `about`. */
export function zoomed(range: Range, factor: number, whole: Range, about = (range.from + range.to) / 2): Range {
  const span = Math.max(LEAST, (range.to - range.from) * factor)
  if (span >= whole.to - whole.from) return whole
  const share = (about - range.from) / (range.to - range.from || 1)
  return held({ from: about - share * span, to: about + (1 - share) * span }, whole)
}

/** Moved by a share of what is shown. */
export function moved(range: Range, share: number, whole: Range): Range {
  const by = (range.to - range.from) * share
  return held({ from: range.from + by, to: range.to + by }, whole)
}

/** Kept within the recording without changing how much is shown. */
function held(range: Range, whole: Range): Range {
  const span = range.to - range.from
  if (range.from < whole.from) return { from: whole.from, to: Math.min(whole.to, whole.from + span) }
  if (range.to > whole.to) return { from: Math.max(whole.from, whole.to - span), to: whole.to }
  return range
}

/** What a key does to the shown part; null where it does nothing. */
export function byKey(key: string, range: Range, whole: Range): Range | null {
  if (key === '+' || key === '=' || key === 'ArrowUp') return zoomed(range, 0.5, whole)
  if (key === '-' || key === 'ArrowDown') return zoomed(range, 2, whole)
  if (key === 'ArrowLeft') return moved(range, -0.25, whole)
  if (key === 'ArrowRight') return moved(range, 0.25, whole)
  if (key === 'Home' || key === '0' || key === 'Escape') return whole
  return null
}

/** Seconds as they stand on an axis that spans so much: ms where it is short. */
export function timeText(seconds: number, span: number): string {
  const [value, shown, unit] = span < 0.5 ? [seconds * 1000, span * 1000, 'ms'] : [seconds, span, 's']
  // A thousandth of what is shown is as fine as can be seen.
  const decimals = Math.min(6, Math.max(0, 2 - Math.floor(Math.log10(shown))))
  return `${Number(value.toFixed(decimals))} ${unit}`
}
