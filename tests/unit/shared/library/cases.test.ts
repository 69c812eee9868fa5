/** The worked cases of the material tables, all of them; each names its source and basis. */
import { expect, test } from 'vitest'
import { aNumbersOf, type DepositComposition } from '../../../../shared/library/a-numbers.ts'
import { matchBaseMetals, resolveBaseMetal } from '../../../../shared/library/base-metals.ts'
import { fNumberOf } from '../../../../shared/library/f-numbers.ts'
import { resolveFiller } from '../../../../shared/library/filler-metals.ts'
import { classifyGas, type GasComponent } from '../../../../shared/library/gases.ts'
import { isoPosition } from '../../../../shared/library/positions.ts'
import cases from '../../../fixtures/cases/materials.json' with { type: 'json' }

interface Given {
  spec?: string
  grade?: string
  classification?: string
  deposit_percent?: DepositComposition
  mixture_vol_percent?: Record<string, number>
  asme?: string
  progression?: 'up' | 'down' | null
  product?: 'plate' | 'pipe'
}

/** Answers a case in the case's own words. */
function answer(given: Given): Record<string, unknown> {
  if (given.classification !== undefined) {
    const row = resolveFiller(given.classification, given.spec)
    const reading = fNumberOf(given.classification, given.spec)
    expect(reading.fNumber).toBe(row?.f_no)
    return { f_no: reading.fNumber, a_no: row?.a_no }
  }
  if (given.spec !== undefined) {
    expect(matchBaseMetals(given.spec, given.grade ?? '')).toHaveLength(1)
    const row = resolveBaseMetal(given.spec, given.grade ?? '')
    return { p_no: row?.p_no, group_no: row?.group_no }
  }
  if (given.deposit_percent) {
    const { candidates, decided } = aNumbersOf(given.deposit_percent)
    return { a_no_candidates: candidates, decided }
  }
  if (given.mixture_vol_percent) return { symbol: classifyGas(Object.entries(given.mixture_vol_percent).map(([gas, percent]) => ({ gas, percent }) as GasComponent)).symbol }
  const { iso, decided } = isoPosition(given.asme ?? '', null, given.product ?? null, given.progression ?? null)
  return { iso_6947: iso, decided }
}

test.each(cases.map((each) => [each.id, each.title, each] as const))('%s %s', (_id, _title, { given, expect: expected }) => {
  expect(answer(given as Given)).toMatchObject(expected)
})

test('no case is left out', () => {
  expect(cases).toHaveLength(27)
})
