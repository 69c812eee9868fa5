import { describe, expect, it } from 'vitest'
import { familyOf, heatFigures } from '@shared/library/heat-figures.ts'
import { pasteChemistry } from '@shared/library/paste-chemistry.ts'
import type { WriteHeat } from '@shared/schemas/heats.ts'

const figures = (text: string, given: Partial<Pick<WriteHeat, 'kind' | 'chemistryOf'>> = {}) => heatFigures({ kind: 'heat', chemistryOf: 'ladle', ...given, chemistry: pasteChemistry(text).rows })
const readings = (...given: Parameters<typeof figures>) => Object.fromEntries(figures(...given).figures.map(({ id, reading }) => [id, reading]))

const steel = 'C 0.18 Si 0.40 Mn 1.45 Cr 0.05 Ni 0.03 Mo 0.01 Cu 0.04 V 0.005'
const deposit = 'C 0.08 Mn 1.2 Si 0.6 Cr 0.03 Ni 0.02 Mo 0.01'

describe('figures of a heat', () => {
  it('of ferritic steel are the carbon equivalents, as the published case has them', () => {
    expect(readings(steel)).toEqual({ ceIiw: '0.439', pcm: '0.272', cet: '0.331', cen: '0.444' })
    for (const { calculation, formula } of figures(steel).figures) expect([calculation.source.basis, calculation.advisory, formula.length > 5]).toEqual(['secondary', true, true])
  })

  it('are not worked out from elements that add up to more than the whole', () => {
    const over = figures('C 0.18 Si 0.35 Mn 1.45 Fe 97 Cr 12.5')
    expect([over.family, over.figures]).toEqual([null, []])
    expect(over.notes).toEqual(['The elements add up to more than 100 %, so one of them is wrong; nothing is worked out before it is put right.'])
  })

  it('say where a formula is not stated for the steel', () => {
    const pcm = figures(steel).figures.find(({ id }) => id === 'pcm')
    expect(pcm?.calculation.validity).toEqual({ inside: false, said: ['Pcm is stated for C up to 0.17 %; this steel has 0.18 %.'] })
  })

  it('have an A-Number only for a deposit', () => {
    expect(readings(deposit, { kind: 'lot', chemistryOf: 'deposit' })).toMatchObject({ aNumber: '1' })
    const wire = figures(deposit, { kind: 'lot', chemistryOf: 'wire' })
    expect(wire.figures.map(({ id }) => id)).not.toContain('aNumber')
    expect(wire.notes.join()).toMatch(/of the deposit, not of the wire/)
    expect(readings(deposit)).not.toHaveProperty('aNumber')
  })

  it('leave the A-Number open while elements are missing', () => {
    const open = figures('C 0.08 Mn 1.2', { kind: 'lot', chemistryOf: 'deposit' }).figures.find(({ id }) => id === 'aNumber')
    expect(open?.calculation.value).toBeNull()
    expect(open?.calculation.notes.join()).toMatch(/not given/)
  })

  it('of stainless steel are ferrite number and PREN, with tungsten where it is reported', () => {
    expect(readings('C 0.05 Mn 1.6 Si 0.4 Cr 18.75 Ni 9.9 Mo 0.08 N 0.04')).toEqual({ ferriteNumber: '3.2', pren: '19.7' })
    expect(readings('C 0.02 Cr 25 Ni 7 Mo 3.5 N 0.25 W 0.7').pren).toBe('41.7')
    expect(figures('C 0.02 Cr 25 Ni 7 Mo 3.5 N 0.25 W 0.7').figures.find(({ id }) => id === 'pren')?.formula).toMatch(/0.5 W/)
  })

  it('count a bound at its figure, and say so', () => {
    const read = figures('C 0.1 Mn 1 B <0.0005')
    expect(read.notes).toContain('B is given as a bound and counts at that bound.')
    expect(Number(read.figures.find(({ id }) => id === 'pcm')?.reading)).toBeCloseTo(0.1 + 1 / 20 + 5 * 0.0005, 3)
  })

  it('are not made up for other metals', () => {
    expect(figures('Si 0.1 Mg 4.9 Mn 0.15 Zn 0.05 Ti 0.1', { kind: 'lot', chemistryOf: 'wire' })).toMatchObject({ family: 'aluminium', figures: [] })
    expect(figures('Ni 62 Cr 22 Mo 9 C 0.03 Nb 3.5')).toMatchObject({ family: 'nickel', figures: [] })
    expect(figures('')).toEqual({ family: null, figures: [], notes: [] })
  })

  it.each([['Al 97 Mg 1 Si 0.6', 'aluminium'], ['C 0.02 Cr 17 Ni 12', 'stainless'], ['C 0.1 Cr 9 Mo 1', 'steel'], ['Fe 98.5 Mn 1', 'steel'], ['Cu 70 Ni 29 Fe 0.5', 'other'], ['Ti 99', 'other']] as const)('%s is %s', (text, family) => {
    expect(familyOf(pasteChemistry(text).rows)).toBe(family)
  })

  it('refuse a chemistry that can’t be with a sentence in place of a figure', () => {
    const { figures: refused } = heatFigures({ kind: 'heat', chemistryOf: null, chemistry: [{ element: 'C', percent: 60 }, { element: 'Mn', percent: 60 }] })
    expect(refused.every(({ reading, calculation }) => reading === null && calculation.problems.length > 0)).toBe(true)
  })
})
