import { describe, expect, it } from 'vitest'
import { assess } from '@shared/assessment/assess.ts'
import { cases } from '../../../scripts/bench/cases.ts'
import { compare } from '../../../scripts/bench/library.ts'
import { alternate, cpuSlices, median, table } from '../../../scripts/bench/measure.ts'
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

describe('cpuSlices', () => {
  it('takes turns and tells processor time and clock for each item', async () => {
    const order: string[] = []
    const note = (name: string) => () => order.push(name)
    const { a, b } = await cpuSlices({ a: note('a'), b: note('b') }, 4, 0)
    expect(order.slice(0, 4)).toEqual(['a', 'b', 'a', 'b'])
    expect(a.cpu.length).toBeGreaterThanOrEqual(10)
    expect([a.wall.length, b.cpu.length, b.wall.length]).toEqual([a.cpu.length, a.cpu.length, a.cpu.length])
    expect([...a.cpu, ...b.wall].every((value) => value >= 0)).toBe(true)
  })
  it('does not measure work that makes nothing', async () => {
    await expect(cpuSlices({ idle: () => 0 }, 1, 0)).rejects.toThrow('idle made nothing')
  })
})

describe('the cases of the engine', () => {
  const all = cases(40)
  it.each(all)('$name: procedures that all differ, on two coupons, with verdicts of every kind', ({ input, pool }) => {
    expect(new Set(pool.map(({ procedure }) => JSON.stringify(procedure))).size).toBe(40)
    expect(new Set(pool.map(({ procedure }) => procedure)).size).toBe(40)
    expect(input.coupons).toHaveLength(2)
    expect(new Set(pool.flatMap((one) => assess(one).findings.map(({ verdict }) => verdict)))).toEqual(new Set(['within', 'outside', 'cannot-tell']))
  })
  it('judges more than 40 variables under ASME IX, all of them within as the procedure stands', () => {
    const main = all.find(({ input }) => input.standard === 'asme-ix')
    const assessment = main && assess(main.input)
    expect(assessment?.verdict).toBe('within')
    expect(assessment?.findings.filter((one) => one.class !== 'not-a-variable').length).toBeGreaterThan(40)
  })
  it('is judged by the general library as by ourselves', async () => {
    const main = all.find(({ input }) => input.standard === 'asme-ix')
    if (!main) throw new Error('no case')
    const { rules, facts, judge } = await compare(main.input, main.pool)
    expect(rules.length).toBeGreaterThanOrEqual(12)
    expect(rules).toEqual(expect.arrayContaining(['asme-ix/base-metal-thickness', 'asme-ix/filler-f-number', 'asme-ix/preheat', 'asme-ix/heat-input', 'asme-ix/shielding-gas']))
    const covered = await Promise.all(facts.map((own) => judge(own)))
    expect(covered.filter((ids) => ids.length < rules.length).length).toBeGreaterThan(0)
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
