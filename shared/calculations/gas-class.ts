/** Class and designation of a shielding gas by ISO 14175, as a calculation. */
import { classifyGas, type GasComponent } from '../library/gases.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const gasClassSource: Source = { standard: 'ISO 14175', edition: '2008', clause: 'Table 2', basis: 'memory', note: 'Bands recalled; main groups, two examples and the form of the designation from published sources.' }
export const GAS_INPUTS = { argon: 'Ar', helium: 'He', carbonDioxide: 'CO2', oxygen: 'O2', hydrogen: 'H2', nitrogen: 'N2' } as const satisfies Record<string, GasComponent['gas']>
export type GasInput = keyof typeof GAS_INPUTS

/** Symbol and designation of a mixture in volume per cent. `value` is null: the answer is a name. */
export function gasClass(mixture: Partial<Record<GasInput, number | null>>): Calculation<{ symbol: string; designation: string }> {
  const sheet = worksheet(gasClassSource)
  const given = (Object.keys(GAS_INPUTS) as GasInput[]).flatMap((key) => (mixture[key] === undefined || mixture[key] === null ? [] : [{ key, percent: mixture[key] }]))
  for (const { key, percent } of given) sheet.need(key, GAS_INPUTS[key], percent, { least: 0, most: 100, unit: '%' })
  if (sheet.refused) return sheet.stop('')
  const sum = given.reduce((total, { percent }) => total + percent, 0)
  if (given.length === 0) sheet.refuse('argon', 'No gas is given.')
  else if (Math.abs(sum - 100) > 0.01) sheet.refuse(given.reduce((most, each) => (each.percent > most.percent ? each : most)).key, `The gases add up to ${written(sum)} %; a mixture is 100 %.`)
  if (sheet.refused) return sheet.stop('')
  const { symbol, designation, steps } = classifyGas(given.map(({ key, percent }) => ({ gas: GAS_INPUTS[key], percent })))
  steps.forEach((sentence, index) => sheet.stepText(`step ${index + 1}`, sentence, '', ''))
  return sheet.done('', null, { symbol: symbol ?? 'Z', designation: designation ?? '' })
}
