import { describe, expect, it } from 'vitest'
import { alternate, median, table } from '../../../scripts/bench/measure.ts'
import { readStatement } from '../../../scripts/bench/statement.ts'

describe('median', () => {
  it('is the middle value, or the mean of the two in the middle', () => {
    expect(median([9, 1, 5])).toBe(5)
    expect(median([4, 1, 3, 2])).toBe(2.5)
    expect(median([7])).toBe(7)
    expect(() => median([])).toThrow(RangeError)
  })
})

describe('alternate', () => {
  it('takes turns and leaves the first round of each out', async () => {
    const order: string[] = []
    const note = (name: string) => () => Promise.resolve(order.push(name))
    const times = await alternate({ a: note('a'), b: note('b') }, 0)
    expect(order).toEqual(['a', 'b', 'a', 'b', 'a', 'b', 'a', 'b'])
    expect([times.a.length, times.b.length]).toEqual([3, 3])
  })
})

describe('table', () => {
  it('lines names and figures up, each with its unit', () => {
    const text = table([{ name: 'Cold start', value: 12.345, unit: 's', note: 'n' }, { name: 'Assessments', value: 23456.7, unit: '/s', note: 'm' }, { name: 'Ratio', value: 0.4321, unit: '×', note: '' }])
    expect(text.split('\n').map((line) => line.trimEnd())).toEqual(['  Cold start     12.3 s   n', '  Assessments  23,457 /s  m', '  Ratio          0.43 ×'])
  })
})

describe('readStatement', () => {
  it.each([
    ['Executing (default): START TRANSACTION;', { text: 'START TRANSACTION;', values: [] }],
    ['Executing (7f-1): select a\nfrom t where b = $1 and c = $2; "x; 1", 2', { text: 'select a\nfrom t where b = $1 and c = $2', values: ['x; 1', 2] }],
    ["Executing (7f-1): select '; 1", { text: "select '; 1", values: [] }],
    ["Executing (7f-1): select '; x' || $1; null", { text: "select '; x' || $1", values: [null] }],
    ['Executed (7f-1): select 1', { text: 'select 1', values: [] }],
  ])('reads %s', (line, statement) => {
    expect(readStatement(line)).toEqual(statement)
  })
  it('leaves other lines alone', () => {
    expect(readStatement('connected')).toBeNull()
  })
})
