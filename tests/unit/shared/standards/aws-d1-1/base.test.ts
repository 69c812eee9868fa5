import { describe, expect, test } from 'vitest'
import { coupon, judge, problems, procedure, type Arc } from './records.ts'

describe('a procedure like its coupon', () => {
  const arcs: Arc[] = ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW']
  test.each(arcs.flatMap((process) => [false, true].flatMap((toughness) => (['SI', 'US'] as const).map((system) => ({ process, toughness, system })))))('is within: $process, CVN $toughness, $system', ({ process, toughness, system }) => {
    const given = { processes: [process], toughness, system }
    expect(problems(judge(procedure(given), [coupon(given)]))).toEqual([])
    expect(judge(procedure(given), [coupon(given)]).verdict).toBe('within')
  })
})
