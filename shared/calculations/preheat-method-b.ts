/** Preheat by ISO/TR 17671-2 (EN 1011-2) method B: CET, thickness, hydrogen and heat input in one formula. */
import { above, worksheet, written, type Calculation, type Source } from './result.ts'

export const methodBSource: Source = { standard: 'EN 1011-2 / ISO/TR 17671-2', edition: '2001 / 2002', clause: 'C.3, method B', basis: 'secondary', note: 'Formula as in many agreeing publications; the full text of the standard was not at hand.' }

/** Preheat shown to the welder goes up to the next 5 °C, never down (shop practice). */
export const roundUpPreheat = (temperature: number): number => Math.ceil(temperature / 5 - 1e-9) * 5

export interface PreheatGiven {
  /** CET of the steel that decides, %; see `cetToUse`. */
  cet: number
  /** The thicker plate, mm; not a combined thickness. */
  thickness: number
  /** Diffusible hydrogen, ml/100 g (ISO 3690). */
  hydrogen: number
  /** kJ/mm, with k. */
  heatInput: number
  /** Temperature of the steel before welding, °C. */
  ambient?: number
  /** Yield strength, MPa; only to check the validity. */
  yieldStrength?: number | null
}
export interface PreheatFigures {
  /** What the formula gives, °C; may lie below zero. */
  formula: number
  /** Whether hydrogen asks for a preheat above the steel's temperature. */
  required: boolean
  /** °C up to the next 5; null when none is required. */
  preheat: number | null
}

/**
 * Tp = 697 CET + 160 tanh(d/35) + 62 HD^0.35 + (53 CET − 32) Q − 328.
 * @returns `value` is the formula's temperature, °C
 */
export function preheatMethodB({ cet, thickness, hydrogen, heatInput, ambient = 20, yieldStrength = null }: PreheatGiven): Calculation<PreheatFigures> {
  const sheet = worksheet(methodBSource, { advisory: true })
  sheet.need('cet', 'CET', cet, { least: 0, most: 100, unit: '%' })
  sheet.need('thickness', 'Thickness', thickness, { above: 0, unit: 'mm' })
  sheet.need('hydrogen', 'Diffusible hydrogen', hydrogen, { above: 0, unit: 'ml/100 g' })
  sheet.need('heatInput', 'Heat input', heatInput, { above: 0, unit: 'kJ/mm' })
  sheet.need('ambient', 'Temperature of the steel', ambient, { above: -273.15, unit: '°C' })
  if (yieldStrength !== null) sheet.need('yieldStrength', 'Yield strength', yieldStrength, { above: 0, unit: 'MPa' })
  if (sheet.refused) return sheet.stop('°C')
  sheet.within('CET', cet, 0.2, 0.5, '%')
  sheet.within('Thickness', thickness, 10, 90, 'mm')
  sheet.within('Diffusible hydrogen', hydrogen, 1, 20, 'ml/100 g')
  sheet.within('Heat input', heatInput, 0.5, 4, 'kJ/mm')
  if (yieldStrength !== null) sheet.within('Yield strength', yieldStrength, null, 1000, 'MPa')
  const terms = [697 * cet, 160 * Math.tanh(thickness / 35), 62 * hydrogen ** 0.35, (53 * cet - 32) * heatInput] as const
  sheet.step('composition', '697 × CET', `697 × ${written(cet)}`, terms[0], '°C')
  sheet.step('thickness', '160 × tanh(d / 35)', `160 × tanh(${written(thickness)} / 35)`, terms[1], '°C')
  sheet.step('hydrogen', '62 × HD^0.35', `62 × ${written(hydrogen)}^0.35`, terms[2], '°C')
  sheet.step('heat input', '(53 × CET − 32) × Q', `(53 × ${written(cet)} − 32) × ${written(heatInput)}`, terms[3], '°C')
  const formula = sheet.step('preheat', 'sum − 328', `${terms.map(written).join(' + ')} − 328`, terms.reduce((sum, term) => sum + term, -328), '°C')
  const required = above(formula, ambient)
  sheet.note(required ? 'The interpass temperature must not fall below it either.' : 'Not above the temperature of the steel: this method asks for no preheat. Dry the joint and weld above +5 °C all the same.')
  return sheet.done('°C', formula, { formula, required, preheat: required ? roundUpPreheat(formula) : null })
}

/** CET that decides: the parent's if it exceeds the weld metal's by 0.03 or more, else the weld metal's + 0.03. */
export function cetToUse({ parent, weldMetal }: { parent: number; weldMetal: number }): Calculation<{ cet: number; decides: 'parent' | 'weld-metal' }> {
  const sheet = worksheet(methodBSource, { advisory: true })
  sheet.need('parent', 'CET of the parent metal', parent, { least: 0, most: 100, unit: '%' })
  sheet.need('weldMetal', 'CET of the weld metal', weldMetal, { least: 0, most: 100, unit: '%' })
  if (sheet.refused) return sheet.stop('%')
  const decides = above(weldMetal + 0.03, parent) ? 'weld-metal' : 'parent'
  const cet = sheet.step('CET', decides === 'parent' ? 'parent metal, at least 0.03 above the weld metal' : 'weld metal + 0.03', decides === 'parent' ? written(parent) : `${written(weldMetal)} + 0.03`, decides === 'parent' ? parent : weldMetal + 0.03, '%')
  return sheet.done('%', cet, { cet, decides })
}
