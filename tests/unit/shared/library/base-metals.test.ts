import { describe, expect, it, test } from 'vitest'
import { baseMetalById, baseMetals, findBaseMetals, matchBaseMetals, readBaseMetals, resolveBaseMetal, toBaseMetal } from '../../../../shared/library/base-metals.ts'
import { baseMetalSchema } from '../../../../shared/schemas/welding.ts'

describe('specification and grade', () => {
  test.each([
    ['A36', '', 'us-a36'],
    ['SA-36', '', 'us-a36'],
    ['A/SA-36', '—', 'us-a36'],
    ['ASTM A36/A36M', '', 'us-a36'],
    ['SA-516', 'Gr. 70', 'us-a516-70'],
    ['A516', 'Grade 70', 'us-a516-70'],
    ['A106', 'B', 'us-a106-b'],
    ['SA-312', 'TP304L', 'us-a312-tp304l'],
    ['SA-240', '304L', 'us-a240-304l'],
    ['SA-240', 'S32205', 'us-a240-2205'],
    ['SA-240', '2205', 'us-a240-2205'],
    ['A588', 'B', 'us-a588'],
    ['API 5L', 'X52', 'us-api5l-x52'],
    ['SA-387', 'Gr. 11 Class 2', 'us-a387-11-2'],
    ['SA-537', 'Class 1', 'us-a537-1'],
    ['SB-575', 'C-276', 'us-b575-c276'],
    ['SB-209', '6061-T6', 'us-b209-6061-t6'],
    ['EN 10025-2', 'S355J2', 'en-10025-2-s355j2'],
    ['EN 10025-2:2019', 'S355J2', 'en-10025-2-s355j2'],
    ['EN 10028-7', '1.4404', 'en-10028-7-1-4404'],
    ['EN 10028-7', 'X2CrNiMo17-12-2', 'en-10028-7-1-4404'],
    ['SA-53', 'K03005', null],
  ])('%s %s is %s', (spec, grade, id) => {
    expect(resolveBaseMetal(spec, grade)?.id ?? null).toBe(id)
  })

  it('answers several rows when the grade leaves the type open, and picks none', () => {
    expect(matchBaseMetals('A53', 'Gr. B').map(({ id }) => id)).toEqual(['us-a53-b-e', 'us-a53-b-s'])
    expect(resolveBaseMetal('A53', 'Gr. B')).toBeNull()
  })
  it('finds nothing for what is not listed', () => {
    expect(matchBaseMetals('A9999', '1')).toEqual([])
    expect(matchBaseMetals('SA-516', '99')).toEqual([])
    expect(matchBaseMetals('SA-992', '')).toEqual([])
  })
  it('resolves every row by its own specification and grade', () => {
    const lost = baseMetals.filter((row) => !matchBaseMetals(row.spec, row.grade).includes(row)).map(({ id }) => id)
    expect(lost).toEqual([])
    const confused = baseMetals.filter((row) => matchBaseMetals(row.spec, row.grade).some(({ p_no }) => p_no !== row.p_no)).map(({ id }) => id)
    expect(confused).toEqual([])
  })
})

describe('a metal in one string', () => {
  test.each([
    ['A516-70', ['us-a516-70']],
    ['SA-516 Gr.70', ['us-a516-70']],
    ['A106B', ['us-a106-b']],
    ['A36', ['us-a36']],
    ['S355J2', ['en-10025-2-s355j2']],
    ['1.4404', ['en-10028-7-1-4404']],
    ['P91', ['us-a335-p91']],
    ['AW-5083', ['en-485-aw-5083']],
  ])('%s', (text, ids) => {
    expect(readBaseMetals(text).map(({ id }) => id)).toEqual(ids)
  })
  it('reads a bare stainless grade in all its product forms', () => {
    expect(readBaseMetals('304L').map(({ id }) => id)).toEqual(expect.arrayContaining(['us-a240-304l', 'us-a312-tp304l']))
  })
  it('reads S355 as the grades that begin so, and 6061 as both listings', () => {
    expect(readBaseMetals('S355').every(({ grade }) => grade.startsWith('S355'))).toBe(true)
    expect(readBaseMetals('S355').length).toBeGreaterThan(5)
    expect(readBaseMetals('6061').map(({ id }) => id)).toEqual(expect.arrayContaining(['us-b209-6061-t6', 'en-485-aw-6061']))
  })
  it('reads nothing from other words', () => {
    expect(readBaseMetals('GTAW')).toEqual([])
    expect(readBaseMetals('')).toEqual([])
  })
})

describe('type-ahead', () => {
  test.each([
    ['A516-70', 'us-a516-70'],
    ['sa 516 gr 70', 'us-a516-70'],
    ['S31603', 'us-a182-f316l'],
    ['x2crnimo17', 'en-10028-7-1-4404'],
    ['6061', 'us-b209-6061-t6'],
  ])('%s puts %s first', (query, id) => {
    expect(findBaseMetals(query)[0]?.id).toBe(id)
  })
  it('finds by P-Number and group, and never a metal whose P-Number is not listed', () => {
    const rows = findBaseMetals('P-No. 8', 400)
    expect(rows.length).toBeGreaterThan(20)
    expect(rows.every(({ p_no }) => p_no === '8')).toBe(true)
    expect(findBaseMetals('P-No. 1 Group 2', 400).every(({ p_no, group_no }) => p_no === '1' && group_no === 2)).toBe(true)
    expect(findBaseMetals('P-No. null', 400)).toEqual([])
  })
  it('finds by ISO 15608 group', () => {
    expect(findBaseMetals('15608 group 23.1', 400).every(({ iso_15608_subgroup }) => iso_15608_subgroup === '23.1')).toBe(true)
  })
})

describe('copied into a record', () => {
  it('carries the numbers and keeps not listed as null', () => {
    const metal = toBaseMetal(baseMetalById('us-a516-70') ?? {})
    expect(metal).toMatchObject({ libraryId: 'us-a516-70', specification: 'A/SA-516', grade: '70', pNumber: '1', groupNumber: 2, d12MNumber: null })
    expect(metal.minTensile?.si).toBe(485)
    expect(toBaseMetal(baseMetalById('us-a36') ?? {}).grade).toBeNull()
  })
  it('every row fits the record', () => {
    for (const row of baseMetals) expect(baseMetalSchema.parse(toBaseMetal(row))).toEqual(toBaseMetal(row))
  })
  it('refuses a content that is no base metal', () => {
    expect(() => toBaseMetal({ id: 'x' })).toThrow()
  })
})
