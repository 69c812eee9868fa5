/** Cooling time from 800 to 500 °C of unalloyed and low-alloy steel, three- and two-dimensional (EN 1011-2 Annex D). */
import { worksheet, written, type Calculation, type Source, type Worksheet } from './result.ts'

export const coolingSource: Source = { standard: 'EN 1011-2', edition: '2001', clause: 'Annex D', basis: 'secondary', note: 'Formulas of a plate maker’s handbook and several agreeing pages; the factors for fillets are recalled, the transition thickness follows by algebra.' }

/** Joint factors; a range is written lowest first. The 2-D factor of a fillet depends on heat input against thickness. */
export const JOINT_FACTORS: readonly { id: string; label: string; f2: readonly [number, number]; f3: number; basis: 'secondary' | 'memory' }[] = [
  { id: 'run-on-plate', label: 'Run on plate', f2: [1, 1], f3: 1, basis: 'secondary' },
  { id: 'butt', label: 'Filling pass of a butt weld', f2: [0.9, 0.9], f3: 0.9, basis: 'secondary' },
  { id: 'fillet-corner', label: 'Single-run fillet, corner joint', f2: [0.67, 0.9], f3: 0.67, basis: 'memory' },
  { id: 'fillet-tee', label: 'Single-run fillet, T joint', f2: [0.45, 0.67], f3: 0.67, basis: 'memory' },
]

export interface CoolingGiven {
  /** kJ/mm, with k. */
  heatInput: number
  /** Preheat or interpass temperature, °C. */
  preheat: number
  /** mm */
  thickness: number
  f2: number
  f3: number
}
export interface CoolingFigures {
  /** s */
  t85: number
  threeDimensional: number
  twoDimensional: number
  regime: '2D' | '3D'
  /** Thickness at which both formulas agree, mm; thinner is two-dimensional. */
  transitionThickness: number
}

const inverse = (T0: number): number => 1 / (500 - T0) - 1 / (800 - T0)
const inverseSquared = (T0: number): number => 1 / (500 - T0) ** 2 - 1 / (800 - T0) ** 2
/** s per kJ/mm, and s per (kJ/mm / mm)². */
const thick = (T0: number, f3: number): number => (6700 - 5 * T0) * inverse(T0) * f3
const thin = (T0: number, f2: number): number => (4300 - 4.3 * T0) * 1e5 * inverseSquared(T0) * f2
const transition = (Q: number, T0: number, f2: number, f3: number): number => Math.sqrt(((4300 - 4.3 * T0) * 1e5) / (6700 - 5 * T0) * Q * (f2 / f3) * (1 / (500 - T0) + 1 / (800 - T0)))

function demands(sheet: Worksheet, { preheat, f2, f3 }: Pick<CoolingGiven, 'preheat' | 'f2' | 'f3'>): void {
  sheet.need('preheat', 'Preheat temperature', preheat, { above: -273.15, below: 500, unit: '°C' })
  sheet.need('f2', 'Joint factor F2', f2, { above: 0 })
  sheet.need('f3', 'Joint factor F3', f3, { above: 0 })
}

/**
 * Cooling time t8/5: the longer of the two formulas.
 * @returns s
 */
export function coolingTime({ heatInput, preheat, thickness, f2, f3 }: CoolingGiven): Calculation<CoolingFigures> {
  const sheet = worksheet(coolingSource, { advisory: true })
  sheet.need('heatInput', 'Heat input', heatInput, { above: 0, unit: 'kJ/mm' })
  sheet.need('thickness', 'Thickness', thickness, { above: 0, unit: 'mm' })
  demands(sheet, { preheat, f2, f3 })
  if (sheet.refused) return sheet.stop('s')
  sheet.within('Heat input', heatInput, 0.3, 5, 'kJ/mm')
  sheet.within('Preheat', preheat, null, 300, '°C')
  const [Q, T0, d] = [written(heatInput), written(preheat), written(thickness)]
  const threeDimensional = sheet.step('three-dimensional', '(6700 − 5 T0) × Q × [1/(500 − T0) − 1/(800 − T0)] × F3', `(6700 − 5 × ${T0}) × ${Q} × [1/(500 − ${T0}) − 1/(800 − ${T0})] × ${written(f3)}`, thick(preheat, f3) * heatInput, 's')
  const twoDimensional = sheet.step('two-dimensional', '(4300 − 4.3 T0) × 10⁵ × (Q/d)² × [1/(500 − T0)² − 1/(800 − T0)²] × F2', `(4300 − 4.3 × ${T0}) × 10⁵ × (${Q}/${d})² × [1/(500 − ${T0})² − 1/(800 − ${T0})²] × ${written(f2)}`, thin(preheat, f2) * (heatInput / thickness) ** 2, 's')
  const transitionThickness = sheet.step('transition thickness', '√((4300 − 4.3 T0) × 10⁵ / (6700 − 5 T0) × Q × F2/F3 × [1/(500 − T0) + 1/(800 − T0)])', `Q ${Q}, T0 ${T0}, F2 ${written(f2)}, F3 ${written(f3)}`, transition(heatInput, preheat, f2, f3), 'mm')
  const regime = twoDimensional > threeDimensional ? '2D' : '3D'
  const t85 = sheet.step('t8/5', 'the longer of the two', `${written(twoDimensional)}, ${written(threeDimensional)}`, Math.max(twoDimensional, threeDimensional), 's')
  sheet.note(regime === '2D' ? 'The plate is thinner than the transition thickness: heat flows in two dimensions.' : 'The plate is thicker than the transition thickness: heat flows in three dimensions.')
  return sheet.done('s', t85, { t85, threeDimensional, twoDimensional, regime, transitionThickness })
}

/** Transition thickness alone, mm. */
export function transitionThickness({ heatInput, preheat, f2, f3 }: Omit<CoolingGiven, 'thickness'>): Calculation<{ transitionThickness: number }> {
  const sheet = worksheet(coolingSource, { advisory: true })
  sheet.need('heatInput', 'Heat input', heatInput, { above: 0, unit: 'kJ/mm' })
  demands(sheet, { preheat, f2, f3 })
  if (sheet.refused) return sheet.stop('mm')
  const value = transition(heatInput, preheat, f2, f3)
  return sheet.done('mm', value, { transitionThickness: value })
}

/**
 * Heat input that gives a wanted t8/5: the smaller of what the two formulas ask, as the longer time counts.
 * @param given s
 * @returns kJ/mm, with k
 */
export function heatInputForCoolingTime({ t85, preheat, thickness, f2, f3 }: Omit<CoolingGiven, 'heatInput'> & { t85: number }): Calculation<{ heatInput: number; regime: '2D' | '3D' }> {
  const sheet = worksheet(coolingSource, { advisory: true })
  sheet.need('t85', 'Cooling time t8/5', t85, { above: 0, unit: 's' })
  sheet.need('thickness', 'Thickness', thickness, { above: 0, unit: 'mm' })
  demands(sheet, { preheat, f2, f3 })
  if (sheet.refused) return sheet.stop('kJ/mm')
  sheet.within('Preheat', preheat, null, 300, '°C')
  const three = sheet.step('three-dimensional', 't / {(6700 − 5 T0) × [1/(500 − T0) − 1/(800 − T0)] × F3}', `${written(t85)} / ${written(thick(preheat, f3))}`, t85 / thick(preheat, f3), 'kJ/mm')
  const two = sheet.step('two-dimensional', 'd × √(t / {(4300 − 4.3 T0) × 10⁵ × [1/(500 − T0)² − 1/(800 − T0)²] × F2})', `${written(thickness)} × √(${written(t85)} / ${written(thin(preheat, f2))})`, thickness * Math.sqrt(t85 / thin(preheat, f2)), 'kJ/mm')
  const heatInput = sheet.step('heat input', 'the smaller of the two', `${written(two)}, ${written(three)}`, Math.min(three, two), 'kJ/mm')
  sheet.within('Heat input', heatInput, 0.3, 5, 'kJ/mm')
  return sheet.done('kJ/mm', heatInput, { heatInput, regime: two < three ? '2D' : '3D' })
}
