/** Gas: TIG cups, flow units, starting flows, and the gas that a length of weld takes. */
import { worksheet, written, type Calculation, type Source } from './result.ts'

const arithmetic: Source = { standard: 'Arithmetic', edition: '', clause: '', basis: 'memory', note: 'Flow × time for a metre.' }
const CFH = 28.316846592 / 60
const cupSource: Source = { standard: 'TIG cup number', edition: '', clause: '', basis: 'secondary', note: 'Published cup-size notes: the number counts sixteenths of an inch; some 2 ft³/h of argon for each.' }

/** Inside diameter (mm) and starting argon flow (L/min) of a TIG cup. */
export function tigCup({ cup }: { cup: number }): Calculation<{ diameter: number; flow: number; flowCfh: number }> {
  const sheet = worksheet(cupSource, { advisory: true })
  sheet.need('cup', 'Cup number', cup, { above: 0, most: 32 })
  if (sheet.refused) return sheet.stop('mm')
  const diameter = sheet.step('inside diameter', 'number × 25.4 / 16', `${written(cup)} × 1.5875`, cup * 1.5875, 'mm')
  const flowCfh = sheet.step('starting flow', '2 ft³/h for each number', `2 × ${written(cup)}`, 2 * cup, 'ft³/h')
  return sheet.done('mm', diameter, { diameter, flow: flowCfh * CFH, flowCfh })
}

/** L/min as ft³/h (1 ft³/h = 0.4719 L/min). */
export function flowInCfh({ flow }: { flow: number }): Calculation<{ cfh: number }> {
  const sheet = worksheet({ standard: 'Units', edition: '', clause: '', basis: 'memory', note: '1 ft³ = 28.316846592 L by definition.' })
  sheet.need('flow', 'Gas flow', flow, { least: 0, unit: 'L/min' })
  if (sheet.refused) return sheet.stop('ft³/h')
  const cfh = sheet.step('flow', 'L/min / 0.471947', `${written(flow)} / 0.471947`, flow / CFH, 'ft³/h')
  return sheet.done('ft³/h', cfh, { cfh })
}

/** Argon settings of a torch manual (secondary): A, tungsten mm, cups, L/min. */
export const TIG_SETTINGS: readonly { from: number; to: number; tungsten: number; cups: string; flow: readonly [number, number] }[] = [
  { from: 5, to: 80, tungsten: 1, cups: '4, 5', flow: [5, 6] },
  { from: 70, to: 150, tungsten: 1.6, cups: '4, 5, 6', flow: [6, 7] },
  { from: 130, to: 250, tungsten: 2.4, cups: '6, 7', flow: [7, 8] },
  { from: 220, to: 350, tungsten: 3.2, cups: '7, 8, 10', flow: [8, 10] },
  { from: 330, to: 500, tungsten: 4, cups: '10, 12', flow: [10, 12] },
]

const wireFlowSource: Source = { standard: 'Shielding of MIG/MAG', edition: '', clause: '', basis: 'memory', note: 'Thumb rule: 10 to 12 L/min for each mm of wire, at least the nozzle bore in mm.' }

/** Starting flow for a wire and nozzle; mm in, L/min out. */
export function wireGasFlow({ wireDiameter, nozzle = null }: { wireDiameter: number; nozzle?: number | null }): Calculation<{ from: number; to: number }> {
  const sheet = worksheet(wireFlowSource, { advisory: true })
  sheet.need('wireDiameter', 'Wire diameter', wireDiameter, { above: 0, unit: 'mm' })
  if (nozzle !== null) sheet.need('nozzle', 'Nozzle bore', nozzle, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('L/min')
  const from = sheet.step('at least', nozzle === null ? '10 × wire diameter' : 'the greater of 10 × wire diameter and the nozzle bore', `10 × ${written(wireDiameter)}${nozzle === null ? '' : `, ${written(nozzle)}`}`, Math.max(10 * wireDiameter, nozzle ?? 0), 'L/min')
  const to = sheet.step('up to', '12 × wire diameter, no less than the first figure', `12 × ${written(wireDiameter)}`, Math.max(12 * wireDiameter, from), 'L/min')
  return sheet.done('L/min', from, { from, to })
}

/** Gas for a metre of weld, L/m, from flow (L/min) and travel speed (mm/min). */
export function gasPerMetre({ flow, travelSpeed }: { flow: number; travelSpeed: number }): Calculation<{ litres: number }> {
  const sheet = worksheet(arithmetic)
  sheet.need('flow', 'Gas flow', flow, { least: 0, unit: 'L/min' })
  sheet.need('travelSpeed', 'Travel speed', travelSpeed, { above: 0, unit: 'mm/min' })
  if (sheet.refused) return sheet.stop('L/m')
  const litres = sheet.step('gas per metre of pass', 'flow × 1000 / travel speed', `${written(flow)} × 1000 / ${written(travelSpeed)}`, (flow * 1000) / travelSpeed, 'L/m')
  return sheet.done('L/m', litres, { litres })
}
