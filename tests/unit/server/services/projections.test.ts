import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { askedMetalTokens, projectionsOf } from '../../../../server/services/projections.ts'
import { askedMetal } from '../../../../shared/lookup/joint-question.ts'
import { baseMetals, toBaseMetal } from '../../../../shared/library/base-metals.ts'
import { weldingVariablesSchema, type WeldingVariables } from '../../../../shared/schemas/welding.ts'
import { interval } from '../../../../shared/units/convert.ts'

const variables = (given: object): WeldingVariables => weldingVariablesSchema.parse({ standards: [{ standard: 'asme-ix', edition: '2021' }, { standard: 'asme-ix', edition: '2023' }], processes: [{ id: 'a', process: 'GTAW', positions: ['1G'] }, { id: 'b', process: 'SMAW', positions: ['1G', '3G'] }], ...given })
const project = (given: object) => projectionsOf('Title', variables(given))

describe('projections', () => {
  it('gather what all processes and standards name, once', () => {
    expect(project({})).toMatchObject({ title: 'Title', processes: ['GTAW', 'SMAW'], positions: ['1G', '3G'], standards: ['asme-ix'], weld: 'groove', thicknessMin: null, thicknessMax: null, diameterMin: null, diameterMax: null })
  })

  it('span both members', () => {
    expect(project({ thickness: interval(5, 20, 'length'), thicknessB: interval(3, 12, 'length') })).toMatchObject({ thicknessMin: 3, thicknessMax: 20 })
  })

  it('leave an end open that is not given, and let "all" be every size', () => {
    expect(project({ thickness: interval(5, null, 'length') })).toMatchObject({ thicknessMin: 5, thicknessMax: null })
    expect(project({ diameter: { min: null, max: null, all: true } })).toMatchObject({ diameterMin: 0, diameterMax: null })
    expect(project({ thickness: { min: null, max: null, all: false } })).toMatchObject({ thicknessMin: null, thicknessMax: null })
  })

  it('are found by every metal of the library as its own row, name or P-Number', () => {
    fc.assert(fc.property(fc.constantFrom(...baseMetals), (row) => {
      const metal = toBaseMetal(row)
      const { metals } = project({ baseMetals: { a: metal, b: metal } })
      const asked = askedMetal(`${row.spec} ${row.grade}`)
      if (!asked) return
      if (asked.libraryIds.includes(row.id)) expect(askedMetalTokens(asked).some((token) => metals.includes(token))).toBe(true)
    }))
  })

  it('name a pair once when both are the same', () => {
    const a36 = toBaseMetal(baseMetals.find(({ id }) => id === 'us-a36') ?? {})
    const a516 = toBaseMetal(baseMetals.find(({ id }) => id === 'us-a516-70') ?? {})
    expect(project({ baseMetals: { a: a36, b: a36 } }).metalsLabel).not.toContain(' to ')
    expect(project({ baseMetals: { a: a36, b: a516 } }).metalsLabel).toMatch(/36.* to .*516.*70/)
  })
})
