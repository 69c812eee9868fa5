/**
 * Preheat by ISO/TR 17671-2 (EN 1011-2) method A: the inputs are worked out, the preheat is read from the standard's own curves,
 * of which no figures are kept here.
 */
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const methodASource: Source = { standard: 'EN 1011-2 / ISO/TR 17671-2', edition: '2001 / 2002', clause: 'C.2, method A', basis: 'secondary', note: 'Hydrogen scales and combined thickness from published help pages; the curves are not kept here.' }

export const HYDROGEN_SCALES = ['A', 'B', 'C', 'D', 'E'] as const
export type HydrogenScale = (typeof HYDROGEN_SCALES)[number]

/** Scale of a diffusible hydrogen content, ml/100 g; each upper bound (15, 10, 5, 3) belongs to the lower scale. */
export const hydrogenScale = (hydrogen: number): HydrogenScale => (hydrogen > 15 ? 'A' : hydrogen > 10 ? 'B' : hydrogen > 5 ? 'C' : hydrogen > 3 ? 'D' : 'E')

/** Scales that are usual for a process (published help page); `E` needs special proof. */
export const USUAL_SCALES: readonly { process: string; scale: string }[] = [
  { process: 'Rutile or cellulosic electrodes', scale: 'A' },
  { process: 'Basic electrodes, by how they are dried', scale: 'down to D' },
  { process: 'Gas-shielded solid wire', scale: 'C, clean wire D' },
  { process: 'TIG', scale: 'D' },
]

export const COMBINED_JOINTS = ['butt', 'corner', 'tee', 'tee-both-sides'] as const
export type CombinedJoint = (typeof COMBINED_JOINTS)[number]

/**
 * Combined thickness: the sum of the thicknesses of all paths by which heat leaves, each averaged over 75 mm from the weld (recalled).
 * @param given mm; for a tee `thickness` is the through plate, which counts twice, and `thicknessB` the standing plate
 */
export function combinedThickness({ joint, thickness, thicknessB }: { joint: CombinedJoint; thickness: number; thicknessB: number }): Calculation<{ combinedThickness: number }> {
  const sheet = worksheet(joint === 'tee-both-sides' ? { ...methodASource, basis: 'memory', note: 'Half of the sum for two fillets laid at once is recalled.' } : { ...methodASource, note: 'Sums by joint from published help pages; the average over 75 mm is recalled.' }, { advisory: true })
  const tee = joint === 'tee' || joint === 'tee-both-sides'
  sheet.need('thickness', tee ? 'Thickness of the through plate' : 'First thickness', thickness, { above: 0, unit: 'mm' })
  sheet.need('thicknessB', tee ? 'Thickness of the standing plate' : 'Second thickness', thicknessB, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('mm')
  const [t1, t2] = [written(thickness), written(thicknessB)]
  const value =
    joint === 'tee' ? sheet.step('combined thickness', '2 × through plate + standing plate', `2 × ${t1} + ${t2}`, 2 * thickness + thicknessB, 'mm')
    : joint === 'tee-both-sides' ? sheet.step('combined thickness', 'both fillets at once: half of (2 × through plate + standing plate)', `(2 × ${t1} + ${t2}) / 2`, (2 * thickness + thicknessB) / 2, 'mm')
    : sheet.step('combined thickness', 't1 + t2', `${t1} + ${t2}`, thickness + thicknessB, 'mm')
  sheet.note('Take each thickness as its average over 75 mm from the weld.')
  return sheet.done('mm', value, { combinedThickness: value })
}

export interface MethodAGiven {
  /** CE (IIW), %. */
  ce: number
  /** ml/100 g */
  hydrogen: number
  joint: CombinedJoint
  /** mm */
  thickness: number
  thicknessB: number
  /** kJ/mm, with k. */
  heatInput: number
  /** °C that somebody read from the standard's curve; null until then. */
  readFromStandard?: number | null
}
export interface MethodAFigures { ce: number; scale: HydrogenScale; combinedThickness: number; heatInput: number; preheat: number | null }

/**
 * The inputs with which the curves of method A are entered.
 * @returns `value` is the preheat that was read from the standard, °C; null until one is entered
 */
export function preheatMethodA({ ce, hydrogen, joint, thickness, thicknessB, heatInput, readFromStandard = null }: MethodAGiven): Calculation<MethodAFigures> {
  const sheet = worksheet(methodASource, { advisory: true })
  sheet.need('ce', 'CE', ce, { least: 0, most: 100, unit: '%' })
  sheet.need('hydrogen', 'Diffusible hydrogen', hydrogen, { least: 0, unit: 'ml/100 g' })
  sheet.need('heatInput', 'Heat input', heatInput, { above: 0, unit: 'kJ/mm' })
  if (readFromStandard !== null) sheet.need('readFromStandard', 'Preheat read from the standard', readFromStandard, { above: -273.15, unit: '°C' })
  const combined = combinedThickness({ joint, thickness, thicknessB })
  for (const { input, message } of combined.problems) sheet.refuse(input, message)
  if (sheet.refused || combined.value === null) return sheet.stop('°C')
  const scale = hydrogenScale(hydrogen)
  sheet.stepText('hydrogen scale', 'A over 15, B over 10, C over 5, D over 3, E up to 3 ml/100 g', `${written(hydrogen)} ml/100 g`, scale)
  for (const { label, formula, working, value, unit } of combined.steps) if (typeof value === 'number') sheet.step(label, formula, working, value, unit)
  const asked = `CE ${written(ce)}, scale ${scale}, combined thickness ${written(combined.value)} mm and heat input ${written(heatInput)} kJ/mm`
  if (readFromStandard === null) sheet.note(`The curves of this method are not kept here. Read the preheat from the standard with ${asked}, and enter it.`)
  else sheet.note(`Read by you from the standard with ${asked}; not computed here.`)
  return sheet.done('°C', readFromStandard, { ce, scale, combinedThickness: combined.value, heatInput, preheat: readFromStandard })
}
