import { describe, expect, it } from 'vitest'
import { quantity } from '@shared/units/convert.ts'
import { contentPath, findingField, readPath, same, writePath } from '@/lib/draft/paths.ts'
import { steelProcedure } from '../../../../fixtures/samples.ts'

const content = steelProcedure()

describe('paths', () => {
  it('leads from a finding or a refusal to the form and back', () => {
    expect(contentPath('thickness')).toBe('variables.thickness')
    expect(contentPath('content.variables.thickness')).toBe('variables.thickness')
    expect(contentPath('supportingCoupons')).toBe('supportingCoupons')
    expect(findingField('variables.processes.0.filler')).toBe('processes.0.filler')
  })
  it('writes a copy and leaves the given one', () => {
    const before = structuredClone(content)
    const written = writePath(content, 'variables.processes.1.progression', 'down')
    expect(readPath(written, 'variables.processes.1.progression')).toBe('down')
    expect(content).toEqual(before)
  })
  it('makes the interval that an end is written into, and ends "all"', () => {
    const ten = quantity(10, 'length')
    expect(readPath(writePath({ ...content, variables: { ...content.variables, thickness: null } }, 'variables.thickness.max', ten), 'variables.thickness')).toEqual({ min: null, max: ten, all: false })
    expect(readPath(writePath({ a: { min: null, max: null, all: true } }, 'a.min', ten), 'a')).toEqual({ min: ten, max: null, all: false })
  })
  it('writes an optional field that was never given', () => {
    const { serviceTemperature: _given, ...variables } = content.variables
    const ninety = quantity(90, 'temperature')
    expect(readPath(writePath({ ...content, variables }, 'variables.serviceTemperature', ninety), 'variables.serviceTemperature')).toEqual(ninety)
    expect(readPath(writePath({ ...content, variables }, 'variables.diameterB.max', ninety), 'variables.diameterB')).toEqual({ min: null, max: ninety, all: false })
  })
  it('refuses a path that is not there', () => {
    expect(writePath(content, 'variables.processes.7.progression', 'up')).toBeNull()
    expect(writePath(content, 'variables.nothing', 1)).toBeNull()
  })
  it('compares by content, not by the order of keys', () => {
    expect(same({ a: 1, b: [1, { c: null }] }, { b: [1, { c: null }], a: 1 })).toBe(true)
    expect(same({ a: 1 }, { a: 1, b: null })).toBe(false)
    // A field that may be absent is undefined in a form, and is not there in what the server keeps.
    expect(same({ a: 1 }, { a: 1, b: undefined })).toBe(true)
    expect(same([1], { 0: 1 })).toBe(false)
  })
})
