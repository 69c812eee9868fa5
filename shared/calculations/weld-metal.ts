/** Weld metal, filler, time and gas of a joint; estimates for planning, all plane arithmetic. */

/**
 * Section of one bead from the wire that goes into it, mm².
 * @param input wire diameter mm, wire feed m/min, efficiency as a fraction, travel speed mm/min
 */
export const beadArea = ({ wireDiameter, wireFeed, efficiency, travelSpeed }: { wireDiameter: number; wireFeed: number; efficiency: number; travelSpeed: number }): number => ((Math.PI * wireDiameter ** 2) / 4) * ((wireFeed * 1000 * efficiency) / travelSpeed)

/** How many beads of a size fill a section; the root bead is usually smaller, so this is an estimate. */
export const passesToFill = (grooveArea: number, bead: number): number => Math.ceil(grooveArea / bead - 1e-9)

/** Section of a cap, mm²: two thirds of width times height (a parabola). */
export const capArea = (width: number, height: number): number => (2 / 3) * width * height

export interface Consumption {
  fillerKg: number
  /** Hours with the arc burning. */
  arcTimeH: number
  /** Hours on the job at the operator factor. */
  totalTimeH: number
  gasL: number
}

/**
 * Filler, time and gas for a weld.
 * @param input kg/m, m, efficiency and operator factor as fractions, kg/h (already with the efficiency), L/min
 * @throws RangeError when a divisor is not above zero
 */
export function consumption({ weldMetalKgPerM, lengthM, efficiency, depositionRate, operatorFactor, gasFlow }: { weldMetalKgPerM: number; lengthM: number; efficiency: number; depositionRate: number; operatorFactor: number; gasFlow: number }): Consumption {
  if (!(efficiency > 0 && depositionRate > 0 && operatorFactor > 0)) throw new RangeError('Efficiency, deposition rate and operator factor must be above 0')
  const mass = weldMetalKgPerM * lengthM
  const arcTimeH = mass / depositionRate
  return { fillerKg: mass / efficiency, arcTimeH, totalTimeH: arcTimeH / operatorFactor, gasL: gasFlow * arcTimeH * 60 }
}
