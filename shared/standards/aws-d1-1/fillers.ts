/** Reads what the rules need out of an AWS classification: strength, low hydrogen, A5 specification, nominal diameter. */
import { fillerSizes } from '../../library/sizes.ts'
import { bareClassification } from '../../library/filler-metals.ts'
import type { Filler, Process, ProcessBlock } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figure } from '../common/reading.ts'

/** Class of the metric twins: tens of MPa → ksi. */
const METRIC: Readonly<Record<number, number>> = { 43: 60, 48: 70, 49: 70, 55: 80, 62: 90, 69: 100, 76: 110, 83: 120 }
const CUSTOMARY: ReadonlySet<number> = new Set([60, 70, 80, 90, 100, 110, 120])

/** `e7018-1 h4r` → `E7018`; null when nothing is stated. */
export function classification(filler: Filler): string | null {
  if (!filler.classification) return null
  return bareClassification(filler.classification.replace(/^AWS\s+/i, '')).replace(/\s+/g, '')
}

const PATTERN: Partial<Record<Process, RegExp>> = { SMAW: /^E(\d{2,3})\d{2}(?!\d)/, GMAW: /^ER?(\d{2,3})[SC]/, GTAW: /^ER?(\d{2,3})S/, FCAW: /^E(\d{1,2})\dT/, SAW: /^F(\d{1,2})[APS]/ }

/** Strength class in ksi: E7018 → 70, E81T1-Ni1 → 80, F7A2-EM12K → 70; null when it can't be read. */
export function strengthClass(process: Process | null, filler: Filler): number | null {
  const text = process === 'SAW' ? (filler.fluxClassification ?? filler.classification)?.toUpperCase().replace(/\s+/g, '') : classification(filler)
  const found = process && text ? PATTERN[process]?.exec(text) : null
  if (!found?.[1]) return null
  const figures = Number(found[1])
  if (METRIC[figures] !== undefined) return METRIC[figures] ?? null
  const ksi = process === 'FCAW' || process === 'SAW' ? figures * 10 : figures
  return CUSTOMARY.has(ksi) ? ksi : null
}

/** Low-hydrogen covering by the usability figure: 15, 16, 18, 28, 48; null when it can't be read. */
export function isLowHydrogen(filler: Filler): boolean | null {
  const usability = /^E\d{2,3}(\d{2})(?!\d)/.exec(classification(filler) ?? '')?.[1]
  return usability === undefined ? null : ['15', '16', '18', '28', '48'].includes(usability)
}

/** Diffusible hydrogen designator in mL/100 g, e.g. 8 of `E7018-H8`; null where none is stated. */
export function hydrogenLimit(filler: Filler): number | null {
  const found = /H(\d{1,2})R?$/i.exec((filler.classification ?? '').trim())
  return found?.[1] && ['2', '4', '8', '16'].includes(found[1]) ? Number(found[1]) : null
}

const BY_FORM: readonly (readonly [RegExp, string])[] = [
  [/^E\d{4}M?$/, 'A5.1'],
  [/^E\d{4,5}-/, 'A5.5'],
  [/^ER(48|49|70)S-[23467G]/, 'A5.18'],
  [/^E(48|49|70)C-[36G]/, 'A5.18'],
  [/^ER\d{2,3}S-/, 'A5.28'],
  [/^E\d{2,3}C-/, 'A5.28'],
  [/^E\d{2,3}T\d+-/, 'A5.29'],
  [/^E\d{2,3}T-/, 'A5.20'],
  [/^F\d{1,2}[APS]+\d?Z?-E[LMH]\d+K?$/, 'A5.17'],
  [/^F\d{1,2}[APS]+\d?Z?-E/, 'A5.23'],
]

/** A5 specification, as stated or from the form of the classification; null when neither tells. */
export function specification(process: Process | null, filler: Filler): string | null {
  const stated = /5\.(\d{1,2})/.exec(filler.specification ?? '')?.[1]
  if (stated) return `A5.${stated}`
  const text = process === 'SAW' ? (filler.fluxClassification ?? '').toUpperCase().replace(/\s+/g, '') : classification(filler)
  return BY_FORM.find(([form]) => form.test(text ?? ''))?.[1] ?? null
}

/** Nominal diameters of the filler in the unit of `system`: 0.045 in. and 1.2 mm are one size. */
export function nominalDiameters(block: ProcessBlock | null, system: UnitSystem): number[] {
  return (block?.filler.diameters ?? []).map((diameter) => {
    const size = fillerSizes.find(({ inch, nominal_mm }) => Math.abs(inch * 25.4 - diameter.si) <= 0.005 || Math.abs(nominal_mm - diameter.si) <= 0.005)
    if (!size) return figure(diameter, 'length', system)
    return system === 'SI' ? size.nominal_mm : size.inch
  })
}
