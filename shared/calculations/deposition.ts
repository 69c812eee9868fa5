/** Deposition rate, wire length per mass, and what share of the filler becomes weld metal. */
import { wireArea } from './pulse.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const depositionSource: Source = { standard: 'Mass balance', edition: '', clause: '', basis: 'memory', note: 'Wire section × feed × density × efficiency; plain arithmetic.' }

/** Densities, g/cm³, as handbooks give them. */
export const DENSITIES = { 'carbon-steel': 7.85, stainless: 7.95, aluminium: 2.7 } as const

export const efficiencySource: Source = { standard: 'Deposition efficiency', edition: '', clause: '', basis: 'secondary', note: 'Averages of a filler maker’s handbook; covered electrodes with a 2 in stub.' }
export const DEPOSITION_EFFICIENCIES: readonly { id: string; label: string; efficiency: number }[] = [
  { id: 'saw', label: 'Submerged arc', efficiency: 0.99 },
  { id: 'gmaw-ar-o2', label: 'GMAW, argon with 2 % oxygen', efficiency: 0.98 },
  { id: 'gmaw-75-25', label: 'GMAW, argon with 25 % CO2', efficiency: 0.96 },
  { id: 'gmaw-co2', label: 'GMAW, CO2', efficiency: 0.93 },
  { id: 'metal-cored', label: 'Metal-cored wire', efficiency: 0.93 },
  { id: 'fcaw-g', label: 'Flux-cored, gas-shielded', efficiency: 0.86 },
  { id: 'fcaw-s', label: 'Flux-cored, self-shielded', efficiency: 0.78 },
  { id: 'smaw-300', label: 'Covered electrode, 12 in', efficiency: 0.59 },
  { id: 'smaw-350', label: 'Covered electrode, 14 in', efficiency: 0.62 },
  { id: 'smaw-450', label: 'Covered electrode, 18 in', efficiency: 0.66 },
]

/**
 * Deposition rate.
 * @param given mm, m/min, g/cm³, efficiency as a fraction
 * @returns kg/h
 */
export function depositionRate({ wireDiameter, wireFeed, density, efficiency }: { wireDiameter: number; wireFeed: number; density: number; efficiency: number }): Calculation<{ depositionRate: number; meltOffRate: number; lbPerHour: number }> {
  const sheet = worksheet(depositionSource)
  sheet.need('wireDiameter', 'Wire diameter', wireDiameter, { above: 0, unit: 'mm' })
  sheet.need('wireFeed', 'Wire feed', wireFeed, { above: 0, unit: 'm/min' })
  sheet.need('density', 'Density', density, { above: 0, unit: 'g/cm³' })
  sheet.need('efficiency', 'Deposition efficiency', efficiency, { above: 0, most: 1 })
  if (sheet.refused) return sheet.stop('kg/h')
  const area = sheet.step('wire section', 'π / 4 × diameter²', `π / 4 × ${written(wireDiameter)}²`, wireArea(wireDiameter), 'mm²')
  const meltOffRate = sheet.step('melt-off rate', 'section × feed × 60 × density / 1000', `${written(area)} × ${written(wireFeed)} × 60 × ${written(density)} / 1000`, (area * wireFeed * 60 * density) / 1000, 'kg/h')
  const rate = sheet.step('deposition rate', 'melt-off rate × efficiency', `${written(meltOffRate)} × ${written(efficiency)}`, meltOffRate * efficiency, 'kg/h')
  sheet.note('For solid wire: a cored wire is lighter than its section, so its rate is below this.')
  return sheet.done('kg/h', rate, { depositionRate: rate, meltOffRate, lbPerHour: rate / 0.45359237 })
}

/**
 * Length of wire in a mass: 1 / (section × density).
 * @param given mm, g/cm³
 * @returns m/kg
 */
export function wireLengthPerMass({ wireDiameter, density }: { wireDiameter: number; density: number }): Calculation<{ metresPerKg: number; inchesPerLb: number }> {
  const sheet = worksheet(depositionSource)
  sheet.need('wireDiameter', 'Wire diameter', wireDiameter, { above: 0, unit: 'mm' })
  sheet.need('density', 'Density', density, { above: 0, unit: 'g/cm³' })
  if (sheet.refused) return sheet.stop('m/kg')
  const metresPerKg = sheet.step('length of one kilogram', '1000 / (section × density)', `1000 / (${written(wireArea(wireDiameter))} × ${written(density)})`, 1000 / (wireArea(wireDiameter) * density), 'm/kg')
  return sheet.done('m/kg', metresPerKg, { metresPerKg, inchesPerLb: (metresPerKg / 0.0254) * 0.45359237 })
}

/**
 * Efficiency of a covered electrode whose stub is thrown away: efficiency without stub × (length − stub) / length. mm in.
 */
export function stubEfficiency({ efficiency, electrodeLength, stub }: { efficiency: number; electrodeLength: number; stub: number }): Calculation<{ efficiency: number }> {
  const sheet = worksheet(depositionSource)
  sheet.need('efficiency', 'Efficiency without stub', efficiency, { above: 0, most: 1 })
  sheet.need('electrodeLength', 'Electrode length', electrodeLength, { above: 0, unit: 'mm' })
  sheet.need('stub', 'Stub length', stub, { least: 0, unit: 'mm' })
  if (!sheet.refused && stub >= electrodeLength) sheet.refuse('stub', `A stub of ${written(stub)} mm leaves nothing of an electrode of ${written(electrodeLength)} mm.`)
  if (sheet.refused) return sheet.stop('')
  const value = sheet.step('effective efficiency', 'efficiency × (length − stub) / length', `${written(efficiency)} × (${written(electrodeLength)} − ${written(stub)}) / ${written(electrodeLength)}`, (efficiency * (electrodeLength - stub)) / electrodeLength)
  return sheet.done('', value, { efficiency: value })
}
