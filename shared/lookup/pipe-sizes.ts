/** Pipe by nominal size and schedule: ASME B36.10M, from memory, inches. To be confirmed against the standard; other schedules are not known here. */

interface PipeSize { nps: string; outside: number; 40: number; 80: number }

export const PIPE_SOURCE = { standard: 'ASME B36.10M', basis: 'memory' } as const

/** Outside diameter and walls of Schedule 40 and 80, in. */
export const PIPE_SIZES: readonly PipeSize[] = [
  { nps: '1/2', outside: 0.84, 40: 0.109, 80: 0.147 },
  { nps: '3/4', outside: 1.05, 40: 0.113, 80: 0.154 },
  { nps: '1', outside: 1.315, 40: 0.133, 80: 0.179 },
  { nps: '1 1/4', outside: 1.66, 40: 0.14, 80: 0.191 },
  { nps: '1 1/2', outside: 1.9, 40: 0.145, 80: 0.2 },
  { nps: '2', outside: 2.375, 40: 0.154, 80: 0.218 },
  { nps: '2 1/2', outside: 2.875, 40: 0.203, 80: 0.276 },
  { nps: '3', outside: 3.5, 40: 0.216, 80: 0.3 },
  { nps: '4', outside: 4.5, 40: 0.237, 80: 0.337 },
  { nps: '6', outside: 6.625, 40: 0.28, 80: 0.432 },
  { nps: '8', outside: 8.625, 40: 0.322, 80: 0.5 },
  { nps: '10', outside: 10.75, 40: 0.365, 80: 0.594 },
  { nps: '12', outside: 12.75, 40: 0.406, 80: 0.688 },
]

/** @param nps as written: `2`, `1 1/2`, `1-1/2` */
export const pipeSize = (nps: string): PipeSize | null => PIPE_SIZES.find((size) => size.nps === nps.replace('-', ' ').replace(/\s+/g, ' ').trim()) ?? null
