import fc from 'fast-check'
import { expect, it } from 'vitest'
import { canonicalJson } from '../../../../shared/schemas/canonical.ts'

const shuffled = (value: unknown): unknown => (Array.isArray(value) ? value.map(shuffled) : value !== null && typeof value === 'object' ? Object.fromEntries(Object.entries(value).reverse().map(([key, item]) => [key, shuffled(item)])) : value)

it('is the same whatever the order in which keys were written', () => {
  expect(canonicalJson({ b: 1, a: [2, { d: null, c: 'x' }] })).toBe('{"a":[2,{"c":"x","d":null}],"b":1}')
  fc.assert(
    fc.property(fc.jsonValue(), (value) => {
      expect(canonicalJson(shuffled(value))).toBe(canonicalJson(value))
      expect(canonicalJson(JSON.parse(canonicalJson(value)))).toBe(canonicalJson(value))
    }),
  )
})
it('tells different contents apart', () => {
  fc.assert(
    fc.property(fc.jsonValue(), fc.jsonValue(), (one, other) => {
      expect(canonicalJson(one) === canonicalJson(other)).toBe(JSON.stringify(JSON.parse(canonicalJson(one))) === JSON.stringify(JSON.parse(canonicalJson(other))))
    }),
  )
  expect(canonicalJson([1, 2])).not.toBe(canonicalJson([2, 1]))
})
it('leaves out what is absent and refuses what JSON has no form for', () => {
  expect(canonicalJson({ a: undefined, b: 1 })).toBe('{"b":1}')
  expect(() => canonicalJson({ a: Number.NaN })).toThrow(TypeError)
  expect(() => canonicalJson({ a: () => 1 })).toThrow(TypeError)
})
