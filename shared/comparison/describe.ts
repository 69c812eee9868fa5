/** A value of a record in words, as the document prints it. */
import { z } from 'zod'
import { intervalSchema, quantitySchema, standardChoiceSchema, type Quantity } from '../schemas/common.ts'
import { electricalSchema, gasMixtureSchema } from '../schemas/welding.ts'
import { formatInterval, formatQuantity, type FormatOptions } from '../units/format.ts'
import type { Dimension, UnitSystem } from '../units/types.ts'
import { fieldAt, type Field } from './fields.ts'

export const NOT_STATED = 'not stated'

/** Choices whose word on paper is not their name with spaces. */
const CHOICE_WORDS: Readonly<Record<string, string>> = {
  'single-v': 'single V',
  'double-v': 'double V',
  'single-u': 'single U',
  'double-u': 'double U',
  'single-j': 'single J',
  'double-j': 'double J',
  'compound-v': 'compound V',
  'flare-v': 'flare V',
  'melt-in': 'melt-in',
  'build-up': 'build-up',
  'set-on': 'set-on',
  'set-in': 'set-in',
  'set-through': 'set-through',
  'pulsed-spray': 'pulsed spray',
  'short-circuiting': 'short-circuiting',
  'AC-balanced': 'AC, balanced',
  SI: 'SI',
  US: 'US customary',
  'asme-ix': 'ASME BPVC.IX',
  'aws-d1-1': 'AWS D1.1',
  'aws-d1-2': 'AWS D1.2',
  'iso-15614-1': 'ISO 15614-1',
  'iso-15614-2': 'ISO 15614-2',
}

/** `below-lower-transformation` → `below lower transformation`, `single-v` → `single V`; names in capitals stay. */
export const choiceWord = (choice: string): string => CHOICE_WORDS[choice] ?? (/^[A-Z0-9-]+$/.test(choice) ? choice : choice.replaceAll('-', ' '))

const looseQuantity = quantitySchema.extend({ unit: z.string(), typed: z.string() })
const openingSchema = z.object({ size: looseQuantity, corner: z.boolean(), fromInternalFlaw: z.boolean().nullable() })
const settingsSchema = electricalSchema.shape.panel.unwrap().unwrap().shape.settings

const measured = (quantity: Quantity, dimension: Dimension, system: UnitSystem, options: FormatOptions): string => formatQuantity(quantity, dimension, system, options).text

type Reader = (value: unknown, dimension: Dimension, system: UnitSystem, options: FormatOptions) => string | null
const list = (texts: readonly string[], between = ', '): string | null => (texts.length > 0 ? texts.join(between) : null)
const number = (value: number): string => String(Number(value.toPrecision(12)))

const READERS: { readonly [K in Field['kind']]: Reader } = {
  text: (value) => z.string().parse(value),
  date: (value) => z.string().parse(value),
  choice: (value) => choiceWord(z.string().parse(value)),
  boolean: (value) => (z.boolean().parse(value) ? 'yes' : 'no'),
  number: (value) => number(z.number().parse(value)),
  numbers: (value) => list(z.array(z.number()).parse(value).map(number)),
  quantity: (value, dimension, system, options) => measured(looseQuantity.parse(value), dimension, system, options),
  quantities: (value, dimension, system, options) => list(z.array(looseQuantity).parse(value).map((each) => measured(each, dimension, system, options))),
  interval: (value, dimension, system, options) => formatInterval(intervalSchema.parse(value), dimension, system, options).text || null,
  positions: (value) => list(z.array(z.string()).parse(value)),
  ids: (value) => list(z.array(z.string()).parse(value)),
  gas: (value) => list(gasMixtureSchema.shape.components.parse(value).map(({ gas, percent }) => `${gas} ${number(percent)} %`)),
  standards: (value) => list(z.array(standardChoiceSchema).parse(value).map(({ standard, edition, level, route }) => `${choiceWord(standard)}, ${edition}${level ? `, level ${level}` : ''}${route === 'prequalified' ? ', prequalified' : ''}`), '; '),
  panel: (value) => list(settingsSchema.parse(value).map(({ control, value: set, unit }) => `${control} ${set}${unit ? ` ${unit}` : ''}`), '; '),
  openings: (value, dimension, system, options) => list(z.array(openingSchema).parse(value).map(({ size, corner, fromInternalFlaw }) => `${measured(size, dimension, system, options)}${corner ? ' at a corner' : ''}${fromInternalFlaw ? ' from an internal flaw' : ''}`)),
}

/** The value's text, or null when nothing is stated. A value that does not fit its field is shown as it is stored. */
export function textOf(field: Field | null, value: unknown, system: UnitSystem, options: FormatOptions = {}): string | null {
  if (value === null || value === undefined || value === '') return null
  if (!field) return typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean' ? String(value) : JSON.stringify(value)
  try {
    return READERS[field.kind](value, field.dimension ?? 'length', system, options)
  } catch (error) {
    if (error instanceof z.ZodError) return typeof value === 'string' ? value : JSON.stringify(value)
    throw error
  }
}

/**
 * The value of the field at `path` as read in `system`: `12.7 mm`, `18–22 V`, `single V`, `yes`; `not stated` for null.
 */
export const describeValue = (path: string, value: unknown, system: UnitSystem): string => textOf(fieldAt(path), value, system) ?? NOT_STATED
