import { parseArgs } from 'node:util'
import { Refusal } from './steps.mjs'

/** The steps of a test run, in order. */
export const testSteps = /** @type {const} */ (['types', 'lint', 'unit', 'api', 'e2e'])
/** @typedef {(typeof testSteps)[number]} TestStep */

/**
 * @template {Record<string, { type: 'boolean', short?: string, default?: boolean }>} T
 * @param {string[]} args
 * @param {T} options
 * @param {string} help shown with what is wrong
 * @returns {{ [name in keyof T]: boolean }}
 * @throws {Refusal} for an option that is not among them
 */
export function readOptions(args, options, help) {
  try {
    const { values } = parseArgs({ args, options, strict: true, allowPositionals: false })
    return /** @type {{ [name in keyof T]: boolean }} */ (Object.fromEntries(Object.keys(options).map((name) => [name, /** @type {Record<string, unknown>} */ (values)[name] === true])))
  } catch (error) {
    throw new Refusal(`${error instanceof Error ? (error.message.split('. ')[0] ?? '') : String(error)}.\n\n${help}`)
  }
}

/**
 * The leading words that name steps choose them; everything after is handed to the test runner.
 * @param {readonly string[]} args
 * @returns {{ help: boolean, steps: TestStep[], rest: string[] }} steps in running order; with filters alone only those that run tests
 */
export function readTestArgs(args) {
  const isStep = (/** @type {string | undefined} */ word) => testSteps.some((step) => step === word)
  let count = 0
  while (isStep(args[count])) count++
  const named = args.slice(0, count)
  const rest = args.slice(count)
  const steps = testSteps.filter((step) => (named.length > 0 ? named.includes(step) : rest.length === 0 || !['types', 'lint'].includes(step)))
  return { help: rest.includes('--help') || rest.includes('-h'), steps, rest }
}
