import { describe, expect, it, test } from 'vitest'
import { z } from 'zod'
import { aNumberTable, aNumbersOf } from '../../../../shared/library/a-numbers.ts'
import { baseMetals } from '../../../../shared/library/base-metals.ts'
import { fillers } from '../../../../shared/library/filler-metals.ts'
import { gases } from '../../../../shared/library/gases.ts'
import { LIBRARY_KINDS, libraryRows } from '../../../../shared/library/library-rows.ts'
import { asmePositions, isoPosition, positions } from '../../../../shared/library/positions.ts'
import { processes, readProcess } from '../../../../shared/library/processes.ts'
import { baseMetalRowSchema, fillerRowSchema, gasRowSchema } from '../../../../shared/library/rows.ts'

describe('the data agree with themselves', () => {
  it('rows have the shape that they say', () => {
    z.array(baseMetalRowSchema).parse(baseMetals)
    z.array(fillerRowSchema).parse(fillers)
    z.array(gasRowSchema).parse(gases)
    expect(baseMetals).toHaveLength(266)
    expect(fillers).toHaveLength(194)
  })
  it('every basis is one that we use', () => {
    for (const { basis, title } of libraryRows()) expect(['read', 'secondary', 'memory', 'common-practice'], title).toContain(basis)
  })
  it('no UNS number has two P-Numbers', () => {
    const seen = new Map<string, string>()
    for (const { uns_or_en_number: uns, p_no: pNumber, id } of baseMetals) {
      if (!uns || !pNumber || !/^[A-Z]\d/.test(uns)) continue
      expect(seen.get(uns) ?? pNumber, id).toBe(pNumber)
      seen.set(uns, pNumber)
    }
  })
  it('P-No. 1 groups follow the specified tensile', () => {
    for (const row of baseMetals.filter(({ p_no, min_tensile_mpa }) => p_no === '1' && min_tensile_mpa !== null)) {
      const tensile = row.min_tensile_mpa ?? 0
      expect(row.group_no, row.id).toBe(tensile < 480 ? 1 : tensile < 550 ? 2 : tensile < 620 ? 3 : 4)
    }
  })
  it('a yield point never lies above the tensile strength', () => {
    for (const { id, min_yield_mpa: yieldPoint, min_tensile_mpa: tensile } of [...baseMetals, ...fillers]) if (yieldPoint !== null && tensile !== null) expect(yieldPoint, id).toBeLessThanOrEqual(tensile)
  })
})

describe('all kinds in one list', () => {
  const rows = libraryRows()
  it('has rows of every kind, with a key of their own and a source', () => {
    expect(new Set(rows.map(({ kind }) => kind))).toEqual(new Set(LIBRARY_KINDS))
    for (const kind of LIBRARY_KINDS) {
      const keys = rows.filter((row) => row.kind === kind).map(({ key }) => key)
      expect(new Set(keys).size).toBe(keys.length)
    }
    expect(rows.every(({ title, search, source }) => title !== '' && search !== '' && source !== '')).toBe(true)
  })
  it('says "not listed" rather than nothing', () => {
    expect(rows.find(({ key }) => key === 'us-a913-65')?.subtitle).toMatch(/P-No\. not listed/)
  })
})

describe('A-Numbers', () => {
  it('treats a missing element as missing, not as nought', () => {
    const reading = aNumbersOf({ c: 0.07, mn: 1.2, si: 0.5 })
    expect(reading.decided).toBe(false)
    expect(reading.missing).toEqual(['cr', 'mo', 'ni'])
    expect(reading.candidates).toContain(1)
  })
  it('names both where two overlap', () => {
    expect(aNumbersOf({ c: 0.1, cr: 13, mo: 0.3, ni: 0.3, mn: 0.8, si: 0.5 })).toEqual({ candidates: [6, 7], decided: false, missing: [] })
  })
  it('includes the limits themselves', () => {
    expect(aNumbersOf({ c: 0.2, cr: 0.2, mo: 0.3, ni: 0.5, mn: 1.6, si: 1 }).candidates).toEqual([1])
    expect(aNumbersOf({ c: 0.201, cr: 0.2, mo: 0.3, ni: 0.5, mn: 1.6, si: 1 }).candidates).toEqual([])
    expect(aNumberTable).toHaveLength(12)
  })
})

describe('positions', () => {
  test.each([
    ['3G', 'groove', 'plate', 'up', ['PF']],
    ['3G', 'groove', 'plate', null, ['PF', 'PG']],
    ['4G', 'groove', 'plate', null, ['PE']],
    ['4F', 'fillet', 'plate', null, ['PD']],
    ['2G', 'groove', 'pipe', null, ['PC']],
    ['6G', 'groove', 'pipe', 'both', ['H-L045', 'J-L045']],
    ['9G', null, null, null, []],
  ] as const)('%s %s %s %s is %s', (asme, weld, product, progression, iso) => {
    const reading = isoPosition(asme, weld, product, progression)
    expect(reading.iso).toEqual(iso)
    expect(reading.decided).toBe(iso.length === 1)
  })
  it('reads an ISO symbol back, with the progression it states', () => {
    expect(asmePositions('PF', 'groove', 'plate')).toMatchObject({ positions: ['3G'], progression: 'up' })
    expect(asmePositions('PA', null, 'plate')).toMatchObject({ positions: ['1G', '1F'], progression: null })
    expect(asmePositions('PK', 'groove', 'pipe').positions).toEqual([])
    for (const row of positions) expect(isoPosition(row.asme_aws ?? '', row.weld_type, null, row.progression).iso).toEqual(row.asme_aws === null ? [] : expect.arrayContaining([row.iso_6947]))
  })
})

describe('processes', () => {
  test.each([
    ['SMAW', 'SMAW', null],
    ['111', 'SMAW', null],
    ['135', 'GMAW', null],
    ['136', 'FCAW', null],
    ['114', 'FCAW', null],
    ['141', 'GTAW', null],
    ['tig', 'GTAW', null],
    ['GMAW-P', 'GMAW', 'pulsed-spray'],
    ['GMAW-S', 'GMAW', 'short-circuiting'],
    ['FCAW', 'FCAW', null],
    ['FSW', 'OTHER', null],
  ])('%s is %s', (text, process, transferMode) => {
    expect(readProcess(text)).toMatchObject({ process, transferMode })
  })
  it('reads nothing else', () => {
    expect(readProcess('999')).toBeNull()
    expect(processes.length).toBe(20)
  })
})
