/** One line of the table. */
export interface Figure {
  name: string
  value: number
  unit: 'ms' | 's' | '/s' | '×' | 'MB'
  /** How it was measured, and how often. */
  note: string
  /** Further figures of the same measurement, for the file alone. */
  details?: Readonly<Record<string, number>>
}

/**
 * Middle value; of an even count the mean of the two in the middle.
 * @throws RangeError when there is none
 */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b)
  const upper = sorted[sorted.length >> 1]
  const lower = sorted[(sorted.length - 1) >> 1]
  if (upper === undefined || lower === undefined) throw new RangeError('The median of nothing is not known.')
  return (upper + lower) / 2
}

/**
 * Does each piece of work in turn, over and over, so that a busy moment of the machine falls on all alike.
 * @param seconds for the whole; at least three rounds are done
 * @returns milliseconds of each round, the first (unmeasured) one left out
 */
export async function alternate<K extends string>(work: Record<K, () => Promise<unknown>>, seconds: number): Promise<Record<K, number[]>> {
  const names = Object.keys(work) as K[]
  const times = Object.fromEntries(names.map((name) => [name, [] as number[]])) as Record<K, number[]>
  for (const name of names) await work[name]()
  const end = performance.now() + seconds * 1000
  for (let round = 0; round < 3 || performance.now() < end; round++) {
    for (const name of names) {
      const begun = performance.now()
      await work[name]()
      times[name].push(performance.now() - begun)
    }
  }
  return times
}

/** Microseconds for each item, slice by slice: processor time of this process, and time on the clock. */
export interface Slices { cpu: number[]; wall: number[] }

/**
 * Does each piece of work in turns, and tells what an item took. Processor time leaves out what other programs took meanwhile.
 * @param work each goes through `items` items a call; its answer is summed up, so that nothing can be skipped
 * @param seconds for the whole, after a second and twenty rounds of warming up; at least ten rounds are measured
 * @throws Error when a piece of work made nothing
 */
export async function cpuSlices<K extends string>(work: Record<K, () => number | Promise<number>>, items: number, seconds: number): Promise<Record<K, Slices>> {
  const names = Object.keys(work) as K[]
  const slices = Object.fromEntries(names.map((name) => [name, { cpu: [], wall: [] }])) as unknown as Record<K, Slices>
  const warm = performance.now() + 1000
  let end = Infinity
  let rounds = -20
  while (rounds < 10 || performance.now() < end) {
    // On a busy machine a second alone does not make the code warm.
    const counts = rounds >= 0 && performance.now() >= warm
    if (counts && end === Infinity) end = performance.now() + seconds * 1000
    for (const name of names) {
      const clock = performance.now()
      const cpu = process.cpuUsage()
      const made = await work[name]()
      const used = process.cpuUsage(cpu)
      if (made === 0) throw new Error(`${name} made nothing, so there is nothing to measure.`)
      if (!counts) continue
      slices[name].cpu.push((used.user + used.system) / items)
      slices[name].wall.push(((performance.now() - clock) * 1000) / items)
    }
    if (counts || rounds < 0) rounds += 1
  }
  return slices
}

const digits = ({ value, unit }: Figure): string => (unit === '/s' ? Math.round(value).toLocaleString('en') : value.toFixed(unit === '×' || value < 10 ? 2 : value < 100 ? 1 : 0))

/** The figures in columns, as printed at the end of a run. */
export function table(figures: readonly Figure[]): string {
  const rows = figures.map((figure) => [figure.name, digits(figure), figure.unit, figure.note] as const)
  const name = Math.max(...rows.map((row) => row[0].length))
  const value = Math.max(...rows.map((row) => row[1].length))
  return rows.map((row) => `  ${row[0].padEnd(name)}  ${row[1].padStart(value)} ${row[2].padEnd(3)} ${row[3]}`).join('\n')
}
