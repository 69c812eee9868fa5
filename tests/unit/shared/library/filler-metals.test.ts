import { describe, expect, it, test } from 'vitest'
import { fNumberOf } from '../../../../shared/library/f-numbers.ts'
import { bareClassification, fillerById, fillers, findFillers, matchFillers, resolveFiller, toFiller } from '../../../../shared/library/filler-metals.ts'
import { fillerSizeName } from '../../../../shared/library/sizes.ts'
import { fillerSchema } from '../../../../shared/schemas/welding.ts'

describe('classification', () => {
  test.each([
    ['E7018', 'a51-e7018'],
    ['E7018-1 H4R', 'a51-e7018'],
    ['e7018 H4', 'a51-e7018'],
    ['ER70S-6', 'a518-er70s-6'],
    ['E308L-16', 'a54-e308l-16'],
    ['E71T-1M H8', 'a520-e71t-1m'],
    ['ER5356', 'a510-er5356'],
    ['G 42 4 M21 3Si1', 'iso-14341-g42-4-m21-3si1'],
    ['E 42 4 B 42 H5', 'iso-2560-e42-4-b42-h5'],
  ])('%s is %s', (classification, id) => {
    expect(resolveFiller(classification)?.id).toBe(id)
  })
  it('answers all that an unfinished classification can mean', () => {
    expect(matchFillers('E71T-1').map(({ classification }) => classification)).toEqual(['E71T-1C', 'E71T-1M'])
    expect(resolveFiller('E71T-1')).toBeNull()
    expect(resolveFiller('E9999')).toBeNull()
  })
  it('leaves -1 alone where it is part of the classification', () => {
    expect(bareClassification('E308LT1-1')).toBe('E308LT1-1')
    expect(bareClassification('ENi-1')).toBe('ENI-1')
  })
  it('resolves every row by its own classification', () => {
    expect(fillers.filter((row) => !matchFillers(row.classification, row.spec).includes(row)).map(({ id }) => id)).toEqual([])
  })
})

describe('F-Number by pattern (QW-432)', () => {
  test.each<[string, string | null, number | null]>([
    ['E7028', null, 1],
    ['E7024', 'SFA-5.1', 1],
    ['E6010', null, 3],
    ['E8018-B2', 'SFA-5.5', 4],
    ['E11018-M', null, 4],
    ['E308L-17', null, 5],
    ['E308L-26', 'SFA-5.4', 1],
    ['E410-16', 'SFA-5.4', 4],
    ['E430-15', null, 4],
    ['ER308L', null, 6],
    ['ER80S-B2', null, 6],
    ['E71T-1C', null, 6],
    ['E316LT1-4', null, 6],
    ['F7A2-EM12K', null, 6],
    ['ER1188', null, 21],
    ['ER5556', null, 22],
    ['ER4643', null, 23],
    ['R4043', null, 23],
    ['E4043', null, 23],
    ['ERNiCrMo-3', null, 43],
    ['ENiCrMo-11', null, 45],
    ['ERTi-7', null, 52],
    ['G 42 4 M21 3Si1', null, null],
    ['E9999-99', null, null],
    ['something', null, null],
  ])('%s (%s) is F-No. %s', (classification, spec, expected) => {
    expect(fNumberOf(classification, spec).fNumber).toBe(expected)
  })
  it('agrees with the F-Number of every row in the library', () => {
    expect(fillers.filter((row) => fNumberOf(row.classification, row.spec).fNumber !== row.f_no).map(({ id }) => id)).toEqual([])
    expect(fillers.filter((row) => row.f_no !== null && fNumberOf(row.classification).fNumber !== row.f_no).map(({ id }) => id)).toEqual([])
  })
})

describe('type-ahead and copy', () => {
  it('finds by classification, F-Number and composition', () => {
    expect(findFillers('7018')[0]?.classification).toBe('E7018')
    expect(findFillers('F-No. 43', 100).every(({ f_no }) => f_no === 43)).toBe(true)
    expect(findFillers('A-No. 8', 100).every(({ a_no }) => a_no === 8)).toBe(true)
    expect(findFillers('xyzzy')).toEqual([])
  })
  test.each([
    ['a51-e7018', 'covered-electrode'],
    ['a518-er70s-6', 'solid'],
    ['a518-e70c-6m', 'metal-cored'],
    ['a520-e71t-1m', 'flux-cored'],
    ['a536-e70t15-m21a4-cs1', 'metal-cored'],
    ['a536-e71t1-m21a2-cs1', 'flux-cored'],
    ['a517-f7a2-em12k', 'solid'],
    ['iso-17632-t46-4-m-m1', 'metal-cored'],
    ['iso-17632-t46-2-p-m1', 'flux-cored'],
    ['iso-2560-e42-4-b42-h5', 'covered-electrode'],
  ])('%s is %s', (id, form) => {
    expect(toFiller(fillerById(id) ?? {}).productForm).toBe(form)
  })
  it('keeps an A-Number that is not listed as null, and every row fits the record', () => {
    expect(toFiller(fillerById('a510-er5356') ?? {})).toMatchObject({ fNumber: '22', aNumber: null, diameters: [] })
    for (const row of fillers) expect(fillerSchema.parse(toFiller(row))).toEqual(toFiller(row))
  })
})

test('sizes go by their nominal name', () => {
  expect(fillerSizeName(1.143, 'SI')).toBe('1.2 mm')
  expect(fillerSizeName(3.175, 'SI')).toBe('3.2 mm')
  expect(fillerSizeName(1.6, 'US')).toBe('1/16 in')
  expect(fillerSizeName(2.5, 'US')).toBeNull()
})
