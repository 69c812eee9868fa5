import { describe, expect, it } from 'vitest'
import { readOptions, readTestArgs } from '../../../scripts/lib/options.mjs'

describe('readTestArgs', () => {
  it.each([
    { args: [], steps: ['types', 'lint', 'unit', 'api', 'e2e'], rest: [] },
    { args: ['unit'], steps: ['unit'], rest: [] },
    { args: ['e2e', 'lint'], steps: ['lint', 'e2e'], rest: [] },
    { args: ['unit', 'units/parse', '-t', 'bare'], steps: ['unit'], rest: ['units/parse', '-t', 'bare'] },
    { args: ['parse'], steps: ['unit', 'api', 'e2e'], rest: ['parse'] },
    { args: ['parse', 'unit'], steps: ['unit', 'api', 'e2e'], rest: ['parse', 'unit'] },
  ])('reads $args', ({ args, steps, rest }) => {
    expect(readTestArgs(args)).toEqual({ help: false, steps, rest })
  })

  it('knows help', () => {
    expect(readTestArgs(['--help']).help).toBe(true)
    expect(readTestArgs(['unit', '-h']).help).toBe(true)
  })
})

describe('readOptions', () => {
  const options = { verbose: { type: 'boolean' as const }, help: { type: 'boolean' as const, short: 'h' } }

  it('reads what is there and takes the rest as off', () => {
    expect(readOptions(['-h'], options, '')).toEqual({ verbose: false, help: true })
    expect(readOptions([], options, '')).toEqual({ verbose: false, help: false })
  })

  it('names an option that it does not know and shows the help', () => {
    expect(() => readOptions(['--quick'], options, 'the help')).toThrow(/--quick[^]*the help/)
  })
})
