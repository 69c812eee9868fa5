/**
 * What every calculation gives back: its figures, whether they stand inside the stated validity, and the working.
 * A calculation never throws on a bad figure and never answers NaN or Infinity: it names the input that is wrong.
 */
import type { Basis } from '../schemas/assessment.ts'

export interface Source {
  standard: string
  edition: string
  clause: string
  basis: Basis
  /** What stands behind the basis, in our own words. */
  note: string
}

/** One line of working: `label: formula = working = value unit`. */
export interface Step {
  label: string
  formula: string
  /** The formula with its figures put in. */
  working: string
  value: number | string
  unit: string
}

/** A bad figure: the input by its name in the calculation, and a sentence that names it in words. */
export interface InputProblem { input: string; message: string }

export interface Validity {
  inside: boolean
  /** One sentence for each limit that is passed; empty when inside. */
  said: string[]
}

export type FigureValue = number | string | boolean | null

export interface Calculation<F extends object = Record<string, FigureValue>> {
  /** The principal figure in `unit`; null when it can't be told (see `problems`, `validity.said` and `notes`). */
  value: number | null
  unit: string
  /** Every figure; null when an input is wrong. */
  figures: F | null
  validity: Validity
  problems: InputProblem[]
  steps: Step[]
  /** What was assumed and what the reader must know, in words. */
  notes: string[]
  source: Source
  /** true: an estimate that may never by itself pass or fail a qualification. */
  advisory: boolean
}

const NOISE = 1e-9
/** a > b beyond float noise: equality with a limit is never an excess. */
export const above = (a: number, b: number): boolean => a > b + NOISE * Math.max(1, Math.abs(b))
export const below = (a: number, b: number): boolean => above(b, a)

/** A figure for a line of working: at most five significant digits, whole numbers in full. */
export function written(value: number): string {
  if (!Number.isFinite(value)) return '?'
  return Number.isInteger(value) ? String(value) : String(Math.abs(value) >= 1e5 ? Math.round(value) : Number(value.toPrecision(5)))
}

export interface Demand { above?: number; least?: number; below?: number; most?: number; unit?: string }

/** The sentence for a figure that can't be, or null. The label names the input as a person reads it. */
export function complaint(label: string, value: number | null | undefined, demand: Demand): string | null {
  const unit = demand.unit ? ` ${demand.unit}` : ''
  if (value === null || value === undefined || Number.isNaN(value)) return `${label} is not given.`
  if (!Number.isFinite(value)) return `${label} is too large to calculate with.`
  if (demand.above !== undefined && !(value > demand.above)) return `${label} must be above ${written(demand.above)}${unit}; ${written(value)}${unit} was given.`
  if (demand.least !== undefined && value < demand.least) return demand.least === 0 ? `${label} must not be negative; ${written(value)}${unit} was given.` : `${label} must be at least ${written(demand.least)}${unit}; ${written(value)}${unit} was given.`
  if (demand.below !== undefined && !(value < demand.below)) return `${label} must be below ${written(demand.below)}${unit}; ${written(value)}${unit} was given.`
  if (demand.most !== undefined && value > demand.most) return `${label} must be at most ${written(demand.most)}${unit}; ${written(value)}${unit} was given.`
  return null
}

export interface Worksheet {
  /** Demands that an input is a number in its bounds. */
  need(input: string, label: string, value: number | null | undefined, demand?: Demand): void
  refuse(input: string, message: string): void
  readonly refused: boolean
  /** Notes when a figure lies outside the range for which the formula is stated; null = that end is open. */
  within(label: string, value: number, min: number | null, max: number | null, unit?: string): void
  /** Another validity limit, in a whole sentence. */
  outside(sentence: string): void
  note(sentence: string): void
  /** Adds a line of working and hands its value on. */
  step(label: string, formula: string, working: string, value: number, unit?: string): number
  stepText(label: string, formula: string, working: string, value: string): string
  done<F extends object>(unit: string, value: number | null, figures: F): Calculation<F>
  /** No figures: an input is wrong. */
  stop<F extends object>(unit: string): Calculation<F>
}

const span = (min: number | null, max: number | null, unit: string): string => (min === null ? `up to ${written(max ?? 0)}${unit}` : max === null ? `from ${written(min)}${unit}` : `from ${written(min)} to ${written(max)}${unit}`)

/** Collects problems, limits, notes and working of one calculation. */
export function worksheet(source: Source, { advisory = false }: { advisory?: boolean } = {}): Worksheet {
  const [problems, steps, said, notes]: [InputProblem[], Step[], string[], string[]] = [[], [], [], []]
  const result = <F extends object>(unit: string, value: number | null, figures: F | null): Calculation<F> => ({ value, unit, figures, validity: { inside: said.length === 0, said }, problems, steps, notes, source, advisory })
  const stop = <F extends object>(unit: string): Calculation<F> => result<F>(unit, null, null)
  return {
    need(input, label, value, demand = {}) {
      const message = complaint(label, value, demand)
      if (message) problems.push({ input, message })
    },
    refuse: (input, message) => void problems.push({ input, message }),
    get refused() {
      return problems.length > 0
    },
    within(label, value, min, max, unit = '') {
      const shown = unit === '' ? '' : ` ${unit}`
      if ((min !== null && below(value, min)) || (max !== null && above(value, max))) said.push(`${label} of ${written(value)}${shown} is outside the range for which this is stated, ${span(min, max, shown)}.`)
    },
    outside: (sentence) => void said.push(sentence),
    note: (sentence) => void notes.push(sentence),
    step(label, formula, working, value, unit = '') {
      steps.push({ label, formula, working, value, unit })
      return value
    },
    stepText(label, formula, working, value) {
      steps.push({ label, formula, working, value, unit: '' })
      return value
    },
    done(unit, value, figures) {
      const numbers = [value, ...(Object.values(figures) as unknown[]), ...steps.map((step) => step.value)].filter((each): each is number => typeof each === 'number')
      if (numbers.every(Number.isFinite)) return result(unit, value, figures)
      steps.length = 0
      problems.push({ input: '', message: 'These figures together are too large or too small to calculate with; check the units of each.' })
      return stop(unit)
    },
    stop,
  }
}
