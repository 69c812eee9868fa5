import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { baseMetals, findBaseMetals, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillers, toFiller } from '@shared/library/filler-metals.ts'
import { gases, toGasMixture } from '@shared/library/gases.ts'
import { asWritten, ownRow } from '@shared/library/own-rows.ts'
import { hasGroups, P_NUMBERS, pNumberProblem } from '@shared/library/p-numbers.ts'
import { ownBaseMetalSchema, ownFillerSchema, ownGasSchema, writeLibraryItemSchema, type OwnBaseMetal } from '@shared/schemas/library.ts'

describe('P-Numbers', () => {
  it('are known for every row of the reference, and groups only for ferrous ones', () => {
    for (const { p_no, group_no } of baseMetals) {
      if (p_no === null) continue
      expect(P_NUMBERS).toContain(p_no)
      if (group_no !== null) expect(hasGroups(p_no), p_no).toBe(true)
    }
  })
  it.each([['12', /no P-Number 12/], ['5', /divided into 5A, 5B, 5C: say which/], ['10', /10A, 10B/], ['27', /no P-Number 27/], ['P1', /no P-Number P1/], ['8A', /no P-Number 8A/]])('%s is none', (text, why) => expect(pNumberProblem(text)).toMatch(why))
  it.each(['1', '5b', '10H', '15E', '23', '62'])('%s is one', (text) => expect(pNumberProblem(text)).toBeNull())
})

describe('an own row', () => {
  it('started from any row of the reference can be written, but for a mixture that is only a class', () => {
    for (const row of baseMetals) expect(ownBaseMetalSchema.safeParse(asWritten('base-metals', row).content).error?.issues ?? [], row.id).toEqual([])
    for (const row of fillers) expect(ownFillerSchema.safeParse(asWritten('filler-metals', row).content).error?.issues ?? [], row.id).toEqual([])
    for (const row of gases.filter(({ components }) => components.length > 0)) expect(ownGasSchema.safeParse(asWritten('gases', row).content).error?.issues ?? [], row.id).toEqual([])
  })

  it('of a copied reference row is copied into a record as that is, but for its key', () => {
    for (const row of baseMetals) expect({ ...toBaseMetal(ownRow(asWritten('base-metals', row)).content), libraryId: null }, row.id).toEqual({ ...toBaseMetal(row), libraryId: null })
    for (const row of fillers) expect({ ...toFiller(ownRow(asWritten('filler-metals', row)).content), libraryId: null }, row.id).toEqual({ ...toFiller(row), libraryId: null })
    for (const row of gases.filter(({ components }) => components.length > 0)) expect(toGasMixture(ownRow(asWritten('gases', row)).content).isoSymbol, row.id).toBe(row.symbol)
  })

  const text = fc.string({ minLength: 1, maxLength: 20 }).map((one) => one.trim()).filter((one) => one !== '' && one !== '—')
  const figure = fc.option(fc.integer({ min: 1, max: 900 }), { nil: null })
  const metal = fc.record({ spec: text, grade: text, product_form: text, p_no: fc.option(fc.constantFrom(...P_NUMBERS), { nil: null }), iso_15608: fc.constantFrom(null, '1', '1.2', '8.1', '22.4'), min_tensile_mpa: figure, density_kg_m3: figure, source: text })

  it('is what was written when it is read again, whatever was written', () => {
    fc.assert(
      fc.property(metal, (given) => {
        const content: OwnBaseMetal = ownBaseMetalSchema.parse(given)
        const row = ownRow({ kind: 'base-metals', content })
        expect(asWritten('base-metals', row.content)).toEqual({ kind: 'base-metals', content })
        expect(row.key).toMatch(/^own-.{0,76}$/)
        expect(toBaseMetal(row.content).libraryId).toBe(row.key)
        expect([row.basis, row.source]).toEqual(['own', content.source])
      }),
    )
  })

  it('keeps its key when it is changed', () => {
    const written = writeLibraryItemSchema.parse({ kind: 'gases', content: { name: 'Bay mix', components: [{ gas: 'Ar', percent: 100 }], source: 's' } })
    expect(ownRow(written, 'own-before').key).toBe('own-before')
    expect(ownRow(written).content.symbol).toBe('I1')
  })

  it('never stands in for a row of the reference', () => {
    expect(findBaseMetals('A516-70')[0]?.id.startsWith('own-')).toBe(false)
  })
})
