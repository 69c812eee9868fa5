/** Which column holds what, told by its figures where the heads do not. */

/** The first figures of a column; NaN where there is none. */
export type Series = readonly number[]
interface Known { time: number | null; current: number | null; voltage: number | null }

const figuresOf = (series: Series): number[] => series.filter((value) => !Number.isNaN(value))
const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + Math.abs(value), 0) / Math.max(1, values.length)

/** Goes up and never back, as time does. */
function climbs(series: Series): boolean {
  const values = figuresOf(series)
  if (values.length < 3 || values.length < series.length * 0.8) return false
  return values.every((value, at) => at === 0 || value >= (values[at - 1] ?? 0)) && (values.at(-1) ?? 0) > (values[0] ?? 0)
}

/** Counts rows: 1, 2, 3 … is a number of the sample, not its time. */
function counts(series: Series): boolean {
  const values = figuresOf(series)
  return values.length > 2 && values.every((value, at) => Number.isInteger(value) && (at === 0 || value - (values[at - 1] ?? 0) === 1))
}

/**
 * Fills in what is not known: time is a first column that only climbs and is no row count; of exactly two that are left, the larger
 * is the current (an arc has more amperes than volts). More than two can't be told.
 * @param noTime a person said that there is no time column
 */
export function columnsByValue(series: readonly Series[], known: Known, noTime = false): Known {
  const found: Known = { ...known }
  const taken = new Set([known.time, known.current, known.voltage])
  const free = () => series.flatMap((values, column) => (taken.has(column) || figuresOf(values).length < values.length * 0.8 ? [] : [column]))
  const climbing = free().filter((column) => climbs(series[column] ?? []))
  const times = climbing.filter((column) => !counts(series[column] ?? []))
  // A constant current climbs nowhere; where current and voltage are both free, one climbing column of three or more is the time.
  if (known.time === null && times[0] !== undefined && (known.current !== null || known.voltage !== null || series.length >= 3)) {
    found.time = noTime ? null : times[0]
    taken.add(times[0])
  }
  const left = free().filter((column) => !counts(series[column] ?? []))
  if (found.current === null && found.voltage === null && left.length === 2) {
    const [a = 0, b = 0] = left
    const aIsCurrent = mean(figuresOf(series[a] ?? [])) > mean(figuresOf(series[b] ?? []))
    return { ...found, current: aIsCurrent ? a : b, voltage: aIsCurrent ? b : a }
  }
  if (found.current === null && found.voltage !== null && left.length === 1) return { ...found, current: left[0] ?? null }
  if (found.voltage === null && found.current !== null && left.length === 1) return { ...found, voltage: left[0] ?? null }
  return found
}
