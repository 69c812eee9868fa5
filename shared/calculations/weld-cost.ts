/** Filler, time, gas and cost of a length of weld. Prices and rates are the shop's own; none is built in. */
import { worksheet, written, type Calculation, type Source } from './result.ts'
import { beadArea, consumption, passesToFill } from './weld-metal.ts'

export const consumptionSource: Source = { standard: 'Consumption of a weld', edition: '', clause: '', basis: 'memory', note: 'Plain arithmetic; the cost of deposited metal follows published practice. Operator factors, recalled: manual 0.1 to 0.3, semi-automatic 0.3 to 0.5, mechanised above 0.5.' }

export interface ConsumptionGiven {
  /** kg/m */
  weldMetal: number
  /** m */
  length: number
  /** Fractions. */
  efficiency: number
  operatorFactor: number
  /** kg/h, already with the efficiency. */
  depositionRate: number
  /** L/min; 0 for a process without gas. */
  gasFlow?: number
  /** L of gas for purging and pre- and post-flow. */
  purge?: number
}
export interface CostGiven extends ConsumptionGiven {
  /** Own prices in one currency: filler and flux per kg, gas per m³, labour and overhead per hour. */
  fillerPrice: number
  gasPrice?: number
  labourRate: number
}
export interface ConsumptionFigures { weldMetal: number; filler: number; arcTime: number; totalTime: number; gas: number }
export interface CostFigures extends ConsumptionFigures { fillerCost: number; gasCost: number; labourCost: number; total: number; perMetre: number; perKg: number }

function consumed(given: ConsumptionGiven) {
  const { weldMetal, length, efficiency, operatorFactor, depositionRate, gasFlow = 0, purge = 0 } = given
  const sheet = worksheet(consumptionSource)
  sheet.need('weldMetal', 'Weld metal', weldMetal, { above: 0, unit: 'kg/m' })
  sheet.need('length', 'Weld length', length, { above: 0, unit: 'm' })
  sheet.need('efficiency', 'Deposition efficiency', efficiency, { above: 0, most: 1 })
  sheet.need('operatorFactor', 'Operator factor', operatorFactor, { above: 0, most: 1 })
  sheet.need('depositionRate', 'Deposition rate', depositionRate, { above: 0, unit: 'kg/h' })
  sheet.need('gasFlow', 'Gas flow', gasFlow, { least: 0, unit: 'L/min' })
  sheet.need('purge', 'Purge gas', purge, { least: 0, unit: 'L' })
  if (sheet.refused) return { sheet, figures: null }
  const { fillerKg, arcTimeH, totalTimeH, gasL } = consumption({ weldMetalKgPerM: weldMetal, lengthM: length, efficiency, depositionRate, operatorFactor, gasFlow })
  const mass = sheet.step('weld metal', 'mass per metre × length', `${written(weldMetal)} × ${written(length)}`, weldMetal * length, 'kg')
  sheet.step('filler', 'weld metal / efficiency', `${written(mass)} / ${written(efficiency)}`, fillerKg, 'kg')
  sheet.step('arc time', 'weld metal / deposition rate', `${written(mass)} / ${written(depositionRate)}`, arcTimeH, 'h')
  sheet.step('time on the job', 'arc time / operator factor', `${written(arcTimeH)} / ${written(operatorFactor)}`, totalTimeH, 'h')
  const gas = gasFlow > 0 || purge > 0 ? sheet.step('gas', 'flow × arc time × 60 + purge', `${written(gasFlow)} × ${written(arcTimeH)} × 60 + ${written(purge)}`, gasL + purge, 'L') : 0
  return { sheet, figures: { weldMetal: mass, filler: fillerKg, arcTime: arcTimeH, totalTime: totalTimeH, gas } }
}

/** Filler (kg), arc and total time (h) and gas (L) of a weld; `value` is the filler in kg. */
export function weldConsumption(given: ConsumptionGiven): Calculation<ConsumptionFigures> {
  const { sheet, figures } = consumed(given)
  return figures ? sheet.done('kg', figures.filler, figures) : sheet.stop('kg')
}

/** Cost of a weld in the currency of the prices; `value` is the whole cost. */
export function weldCost(given: CostGiven): Calculation<CostFigures> {
  const { fillerPrice, gasPrice = 0, labourRate } = given
  const { sheet, figures } = consumed(given)
  sheet.need('fillerPrice', 'Price of the filler', fillerPrice, { least: 0 })
  sheet.need('gasPrice', 'Price of the gas', gasPrice, { least: 0 })
  sheet.need('labourRate', 'Labour and overhead', labourRate, { least: 0 })
  if (!figures || sheet.refused) return sheet.stop('')
  const fillerCost = sheet.step('cost of filler', 'filler × price', `${written(figures.filler)} × ${written(fillerPrice)}`, figures.filler * fillerPrice)
  const gasCost = sheet.step('cost of gas', 'gas in m³ × price', `${written(figures.gas / 1000)} × ${written(gasPrice)}`, (figures.gas / 1000) * gasPrice)
  const labourCost = sheet.step('labour and overhead', 'time on the job × rate', `${written(figures.totalTime)} × ${written(labourRate)}`, figures.totalTime * labourRate)
  const total = sheet.step('cost', 'sum', `${written(fillerCost)} + ${written(gasCost)} + ${written(labourCost)}`, fillerCost + gasCost + labourCost)
  return sheet.done('', total, { ...figures, fillerCost, gasCost, labourCost, total, perMetre: total / given.length, perKg: total / figures.weldMetal })
}

/**
 * Section of a bead and how many fill a groove.
 * @param given mm, m/min, fraction, mm/min, mm²
 * @returns `value` is the number of passes; the root pass is usually smaller, so it is an estimate
 */
export function passCount({ grooveArea, wireDiameter, wireFeed, efficiency, travelSpeed }: { grooveArea: number; wireDiameter: number; wireFeed: number; efficiency: number; travelSpeed: number }): Calculation<{ bead: number; passes: number }> {
  const sheet = worksheet({ ...consumptionSource, note: 'Mass balance; an estimate, as the root pass is usually smaller.' })
  sheet.need('grooveArea', 'Groove section', grooveArea, { above: 0, unit: 'mm²' })
  sheet.need('wireDiameter', 'Wire diameter', wireDiameter, { above: 0, unit: 'mm' })
  sheet.need('wireFeed', 'Wire feed', wireFeed, { above: 0, unit: 'm/min' })
  sheet.need('efficiency', 'Deposition efficiency', efficiency, { above: 0, most: 1 })
  sheet.need('travelSpeed', 'Travel speed', travelSpeed, { above: 0, unit: 'mm/min' })
  if (sheet.refused) return sheet.stop('')
  const bead = sheet.step('bead section', 'wire section × feed × efficiency / travel speed', `π/4 × ${written(wireDiameter)}² × ${written(wireFeed * 1000)} × ${written(efficiency)} / ${written(travelSpeed)}`, beadArea({ wireDiameter, wireFeed, efficiency, travelSpeed }), 'mm²')
  const passes = sheet.step('passes', 'groove section / bead section, rounded up', `${written(grooveArea)} / ${written(bead)}`, passesToFill(grooveArea, bead))
  return sheet.done('', passes, { bead, passes })
}
