/** Values for fuzzing: what a JSON schema describes, and the same with something wrong in it. */
import fc from 'fast-check'

export interface JsonSchema {
  $ref?: string
  $defs?: Record<string, JsonSchema>
  type?: string | string[]
  const?: unknown
  enum?: unknown[]
  anyOf?: JsonSchema[]
  oneOf?: JsonSchema[]
  allOf?: JsonSchema[]
  format?: string
  properties?: Record<string, JsonSchema>
  required?: string[]
  additionalProperties?: JsonSchema | boolean
  propertyNames?: JsonSchema
  items?: JsonSchema
  minItems?: number
  maxItems?: number
  minLength?: number
  maxLength?: number
  minimum?: number
  maximum?: number
}

/** Deeper than any shape of ours; below it only what is required is filled in. */
const MAX_DEPTH = 16

const formats: Record<string, fc.Arbitrary<string>> = {
  uuid: fc.uuid(),
  email: fc.stringMatching(/^[a-z]{1,8}@[a-z]{1,8}\.example$/),
  date: fc.date({ min: new Date('1990-01-01'), max: new Date('2050-01-01'), noInvalidDate: true }).map((date) => date.toISOString().slice(0, 10)),
  'date-time': fc.date({ min: new Date('1990-01-01'), max: new Date('2050-01-01'), noInvalidDate: true }).map((date) => date.toISOString()),
}

/** What JSON schema cannot say of a field, by its name: e-mail addresses that are trimmed first, numbers that come as text, and words people use. */
const typical: Record<string, fc.Arbitrary<unknown>> = {
  email: formats.email ?? fc.constant(''),
  password: fc.constantFrom('a long enough password', 'a bead every ten minutes'),
  newPassword: fc.constant('a long enough password'),
  limit: fc.integer({ min: 1, max: 200 }).map(String),
  index: fc.integer({ min: 0, max: 3 }).map(String),
  cursor: fc.constant('WyJuYW1lIiwiYSIsIjAiXQ'),
  line: fc.constantFrom('12 mm S355 PA 135', '1/2 in A36 butt 3G', '304L to A36 fillet', 'ER70S-6', '⌀ 168.3 x 7.11'),
  metalA: fc.constantFrom('A36', '304L', '5083', 'S355J2'),
  thickness: fc.constantFrom('12 mm', '1/2 in', '3/8"', '.035', 'thick'),
  typed: fc.constantFrom('12.7 mm', '1/2 in', '200 F', '18-22'),
}

/** The field's usual values where its name is known and its schema says no more than "text", or nothing as it is coerced. */
export function typicalFor(name: string, schema: JsonSchema): fc.Arbitrary<unknown> | undefined {
  if (name === 'to' && schema.type === 'array') return fc.array(typical.email ?? fc.constant(''), { minLength: 1, maxLength: 3 })
  const coerced = Object.keys(schema).every((keyword) => keyword === 'default' || keyword === '$schema')
  return coerced || schema.type === 'string' ? typical[name] : undefined
}

function textOf({ format, minLength = 0, maxLength = 40 }: JsonSchema): fc.Arbitrary<string> {
  const known = format && formats[format]
  return known || fc.string({ minLength, maxLength: Math.max(minLength, Math.min(maxLength, 60)), unit: 'grapheme' })
}

function objectOf(schema: JsonSchema, root: JsonSchema, depth: number): fc.Arbitrary<unknown> {
  const properties = schema.properties ?? {}
  const required = schema.required ?? []
  const model = Object.fromEntries(Object.entries(properties).map(([name, inner]) => [name, typicalFor(name, inner) ?? arbitraryOf(inner, root, depth + 1)]))
  if (Object.keys(model).length > 0) return fc.record(model, { requiredKeys: depth >= MAX_DEPTH ? required : required.filter((name) => name in model) })
  const values = typeof schema.additionalProperties === 'object' ? arbitraryOf(schema.additionalProperties, root, depth + 1) : fc.jsonValue({ maxDepth: 1 })
  return fc.dictionary(fc.string({ maxLength: 12 }), values, { maxKeys: 3 })
}

/** Values that the schema describes, as far as these keywords say; refinements beyond them may still refuse one. */
export function arbitraryOf(schema: JsonSchema, root: JsonSchema = schema, depth = 0): fc.Arbitrary<unknown> {
  if (schema.$ref) {
    const name = schema.$ref.split('/').at(-1) ?? ''
    return depth > MAX_DEPTH ? fc.constant(null) : arbitraryOf(root.$defs?.[name] ?? {}, root, depth + 1)
  }
  if (schema.const !== undefined) return fc.constant(schema.const)
  if (schema.enum) return fc.constantFrom(...schema.enum)
  const choices = schema.anyOf ?? schema.oneOf
  if (choices) return fc.oneof(...choices.map((choice) => arbitraryOf(choice, root, depth + 1)))
  if (schema.allOf?.[0]) return arbitraryOf(schema.allOf[0], root, depth + 1)
  const type = Array.isArray(schema.type) ? schema.type[0] : schema.type
  switch (type) {
    case 'object':
      return objectOf(schema, root, depth)
    case 'array':
      return fc.array(arbitraryOf(schema.items ?? {}, root, depth + 1), { minLength: schema.minItems ?? 0, maxLength: Math.max(schema.minItems ?? 0, Math.min(schema.maxItems ?? 3, depth > 3 ? 1 : 3)) })
    case 'string':
      return textOf(schema)
    case 'integer':
      return fc.integer({ min: Math.max(schema.minimum ?? -1e6, -1e9), max: Math.min(schema.maximum ?? 1e6, 1e9) })
    case 'number':
      return fc.oneof(fc.double({ min: Math.max(schema.minimum ?? -1e4, -1e12), max: Math.min(schema.maximum ?? 1e4, 1e12), noNaN: true }), fc.constantFrom(0, 1, 12.7))
    case 'boolean':
      return fc.boolean()
    case 'null':
      return fc.constant(null)
    default:
      return fc.jsonValue({ maxDepth: 2 })
  }
}

/** What nobody means to send. */
const oddities: fc.Arbitrary<unknown> = fc.oneof(
  fc.constantFrom<unknown>(null, true, false, 0, -0, -1, 1e308, -1e308, 5e-324, Number.MAX_SAFE_INTEGER, 2 ** 31, '', ' ', '\0', '\ud800', '\u202e', 'NaN', 'null', '__proto__', 'constructor', "'; drop table people; --", '$1 $name :name {link}', '%', '\\', [], {}, [[[[]]]], { __proto__: null }, { toString: 1 }, { $ref: '#' }, { length: -1 }, '9'.repeat(400), 'é'.repeat(5000), '2026-02-31', '0001-01-01', '99999-01-01T00:00:00Z'),
  fc.jsonValue({ maxDepth: 3 }),
)

const KEY = fc.constantFrom('__proto__', 'constructor', 'toString', 'id', 'organizationId', '', '0', 'length', 'si', 'min', 'extra')

/** The value with up to `changes` of its parts replaced, removed or added to. */
export function mutated(value: unknown, changes = 2): fc.Arbitrary<unknown> {
  if (changes === 0) return fc.constant(value)
  return fc.tuple(fc.array(fc.nat(), { minLength: 1, maxLength: 8 }), fc.constantFrom('replace', 'remove', 'add'), oddities, KEY).chain(([walk, how, odd, key]) => mutated(changeAt(value, walk, how, odd, key), changes - 1))
}

function changeAt(value: unknown, [step = 0, ...rest]: number[], how: string, odd: unknown, key: string): unknown {
  const keys = typeof value === 'object' && value !== null ? Object.keys(value) : []
  const at = keys[step % Math.max(keys.length, 1)]
  if (at === undefined || rest.length === 0) {
    if (how === 'add' && Array.isArray(value)) return [...(value as unknown[]), odd]
    if (how === 'add' && typeof value === 'object' && value !== null) return { ...value, [key]: odd }
    if (how !== 'remove' || at === undefined) return odd
    return Array.isArray(value) ? value.filter((_, index) => String(index) !== at) : Object.fromEntries(Object.entries(value as object).filter(([name]) => name !== at))
  }
  const inner = changeAt((value as Record<string, unknown>)[at], rest, how, odd, key)
  return Array.isArray(value) ? value.map((old: unknown, index) => (String(index) === at ? inner : old)) : { ...(value as object), [at]: inner }
}

/** Mostly right, often nearly right, sometimes anything at all. */
export const nearly = (schema: JsonSchema): fc.Arbitrary<unknown> => {
  const right = arbitraryOf(schema)
  return fc.oneof({ weight: 5, arbitrary: right }, { weight: 4, arbitrary: right.chain((value) => mutated(value)) }, { weight: 1, arbitrary: oddities })
}

/** Text in a path or query: of the right form, or not at all. */
export const oddText: fc.Arbitrary<string> = fc.oneof(fc.uuid(), fc.string({ maxLength: 30, unit: 'binary' }), fc.constantFrom('0', '-1', '1e9', 'null', 'undefined', '[object Object]', '..', '.', '%', "' or 1=1", '\u0000', '9'.repeat(300), 'é', '⌀ 12', '{}', '[]'))
