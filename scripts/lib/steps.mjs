/** Something that the person at the terminal can act on: printed as a sentence, never as a stack. */
export class Refusal extends Error {}

/**
 * @param {number} ms
 * @returns {string} seconds with one decimal from 0.1 s, else milliseconds
 */
export const duration = (ms) => (ms < 100 ? `${Math.round(ms)} ms` : `${(ms / 1000).toFixed(1)} s`)

/**
 * @typedef {(detail: string) => void} Note Adds what was found or done to the step's line.
 * @typedef {<T>(title: string, work: (note: Note) => T | Promise<T>) => Promise<T>} Step
 */

/**
 * Progress by step, with times. On a terminal the seconds tick while a step runs; elsewhere a step has a line when it ends.
 * @param {{ out?: NodeJS.WritableStream & { isTTY?: boolean } }} [options]
 * @returns {Step}
 */
export function createSteps({ out = process.stdout } = {}) {
  return async (title, work) => {
    const begun = performance.now()
    let detail = ''
    const label = title.padEnd(20)
    const tick = () => out.write(`\r\x1b[2K  … ${label} ${duration(performance.now() - begun)}`)
    const timer = out.isTTY ? setInterval(tick, 500) : undefined
    if (out.isTTY) tick()
    const close = (/** @type {string} */ mark) => {
      clearInterval(timer)
      out.write(`${out.isTTY ? '\r\x1b[2K' : ''}  ${mark} ${label} ${duration(performance.now() - begun).padStart(7)}${detail ? `  ${detail}` : ''}\n`)
    }
    try {
      const result = await work((text) => { detail = text })
      close('✓')
      return result
    } catch (error) {
      close('✗')
      throw error
    }
  }
}

/**
 * Says why a script ends, in a sentence where there is one.
 * @param {unknown} error
 */
export function complain(error) {
  const known = error instanceof Refusal || (error instanceof Error && error.name === 'PostgresError')
  console.error(`\n${known ? error.message : error instanceof Error ? (error.stack ?? error.message) : String(error)}`)
}
