import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { classifyGas, findGases, gasById, gases, toGasMixture, type GasComponent } from '../../../../shared/library/gases.ts'
import { gasMixtureSchema } from '../../../../shared/schemas/welding.ts'

const mix = (text: string): GasComponent[] => text.split(' ').map((part) => ({ gas: part.replace(/[\d.]+$/, '').replace(/_$/, '') as GasComponent['gas'], percent: Number(/_([\d.]+)$/.exec(part)?.[1]) }))

describe('classes of ISO 14175:2008', () => {
  test.each([
    ['Ar_100', 'I1'],
    ['He_100', 'I2'],
    ['Ar_5 He_95', 'I3'],
    ['Ar_4 He_96', 'Z'],
    ['Ar_96 CO2_4', 'M12'],
    ['Ar_95 CO2_5', 'M12'],
    ['Ar_94.9 CO2_5.1', 'M20'],
    ['Ar_85 CO2_15', 'M20'],
    ['Ar_84.9 CO2_15.1', 'M21'],
    ['Ar_75 CO2_25', 'M21'],
    ['Ar_50 CO2_50', 'M31'],
    ['Ar_45 CO2_55', 'Z'],
    ['Ar_90 CO2_6 O2_4', 'M25'],
    ['Ar_90 CO2_8 O2_2', 'M24'],
    ['He_90 Ar_7.5 CO2_2.5', 'M12'],
    ['Ar_55 He_30 CO2_15', 'M20'],
    ['Ar_99.7 O2_0.3', 'Z'],
    ['CO2_80 O2_20', 'C2'],
    ['N2_100', 'N1'],
    ['Ar_95 H2_5', 'R1'],
    ['Ar_80 H2_20', 'R2'],
    ['Ar_97 N2_3', 'N2'],
    ['Ar_93 N2_3 H2_4', 'N4'],
    ['H2_100', 'Z'],
    ['CO2_50 N2_50', 'Z'],
  ])('%s is %s', (text, symbol) => {
    expect(classifyGas(mix(text)).symbol).toBe(symbol)
  })
  test.each([
    ['Ar_82 CO2_18', 'ISO 14175-M21-ArC-18'],
    ['Ar_90 CO2_6 O2_4', 'ISO 14175-M25-ArCO-6/4'],
    ['Ar_70 He_30', 'ISO 14175-I3-ArHe-30'],
    ['Ar_100', 'ISO 14175-I1-Ar'],
  ])('%s is designated %s', (text, designation) => {
    expect(classifyGas(mix(text)).designation).toBe(designation)
  })
  it('tells its steps and refuses what is no mixture', () => {
    expect(classifyGas(mix('Ar_82 CO2_18')).steps.join(' ')).toMatch(/carbon dioxide above 15 to 25 %/)
    expect(classifyGas(mix('Ar_82 CO2_17'))).toMatchObject({ symbol: null, steps: ['The components sum to 99 %; a mixture sums to 100 %.'] })
    expect(classifyGas([]).symbol).toBeNull()
  })
  it('does not depend on the order of components, nor on one of nought', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), fc.integer({ min: 0, max: 20 }), fc.integer({ min: 0, max: 15 }), (co2, he, o2) => {
        const parts: GasComponent[] = [{ gas: 'Ar', percent: 100 - co2 - he - o2 }, { gas: 'CO2', percent: co2 }, { gas: 'He', percent: he }, { gas: 'O2', percent: o2 }]
        const { symbol } = classifyGas(parts)
        expect(classifyGas([...parts].reverse()).symbol).toBe(symbol)
        const withArgon: GasComponent[] = [{ gas: 'Ar', percent: 100 - co2 - o2 }, { gas: 'CO2', percent: co2 }, { gas: 'O2', percent: o2 }]
        expect(classifyGas(withArgon).symbol).toBe(symbol)
      }),
    )
  })
  it('gives the symbol that the AWS designations carry', () => {
    const row = gases.find(({ awsDesignation }) => awsDesignation === 'SG-HeAC-7.5/2.5')
    expect(row?.symbol).toBe('M12')
    expect(gases.filter(({ id, symbol }) => id.startsWith('mix-') && symbol === null)).toEqual([])
  })
})

describe('library rows', () => {
  it('have one key each and are found by symbol and composition', () => {
    expect(new Set(gases.map(({ id }) => id)).size).toBe(gases.length)
    expect(findGases('82/18')[0]?.id).toBe('mix-ar-82-co2-18')
    expect(findGases('M21').every(({ symbol }) => symbol === 'M21')).toBe(true)
    expect(findGases('argon').length).toBeGreaterThan(3)
  })
  it('are copied into a record', () => {
    expect(toGasMixture(gasById('mix-ar-82-co2-18') ?? {})).toMatchObject({ isoSymbol: 'M21', name: 'Ar 82, CO2 18', components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], flow: null })
    for (const row of gases) expect(gasMixtureSchema.parse(toGasMixture(row))).toEqual(toGasMixture(row))
  })
})
