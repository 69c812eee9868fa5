/** Guided bends: strain of the outer fibre, and the former that a metal's elongation asks for. */
import { formerDiameter } from '../standards/iso-15614-1/acceptance.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const bendStrainSource: Source = { standard: 'ASME BPVC Section IX', edition: '2021', clause: 'QW-466.1', basis: 'memory', note: 'Formula of the note to the table, recalled.' }
export const isoFormerSource: Source = { standard: 'ISO 15614-1', edition: '2017', clause: '7.4.2', basis: 'secondary', note: 'Read in the 2004 edition.' }

/**
 * Outer-fibre strain of a bend: 100 t / (D + t).
 * @param given former diameter and specimen thickness, mm
 * @returns %
 */
export function bendStrain({ former, thickness }: { former: number; thickness: number }): Calculation<{ strain: number; timesThickness: number }> {
  const sheet = worksheet(bendStrainSource)
  sheet.need('former', 'Former diameter', former, { above: 0, unit: 'mm' })
  sheet.need('thickness', 'Specimen thickness', thickness, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('%')
  const strain = sheet.step('outer-fibre strain', '100 × t / (D + t)', `100 × ${written(thickness)} / (${written(former)} + ${written(thickness)})`, (100 * thickness) / (former + thickness), '%')
  return sheet.done('%', strain, { strain, timesThickness: former / thickness })
}

/**
 * Largest former for a metal's elongation.
 * ISO: 4 t from 20 % on, else 100 t/A − t. Section IX: 4 t from 20 % on, t (100/A − 1) from 3 % but no more than 32-7/8 t; below 3 % no bend.
 * @param given specimen thickness mm, specified minimum elongation %
 * @returns mm
 */
export function bendFormer({ thickness, elongation, standard }: { thickness: number; elongation: number; standard: 'iso-15614-1' | 'asme-ix' }): Calculation<{ former: number | null; strain: number | null }> {
  const sheet = worksheet(standard === 'iso-15614-1' ? isoFormerSource : bendStrainSource)
  sheet.need('thickness', 'Specimen thickness', thickness, { above: 0, unit: 'mm' })
  sheet.need('elongation', 'Elongation', elongation, { above: 0, most: 100, unit: '%' })
  if (sheet.refused) return sheet.stop('mm')
  if (standard === 'asme-ix' && elongation < 3) {
    sheet.outside('Below 3 % elongation Section IX has no bend: a macro section is taken at each place instead.')
    return sheet.done('mm', null, { former: null, strain: null })
  }
  const byElongation = elongation >= 20 ? 4 * thickness : standard === 'iso-15614-1' ? formerDiameter(thickness, elongation) : Math.min(thickness * (100 / elongation - 1), 32.875 * thickness)
  const former = sheet.step('former', elongation >= 20 ? '4 × t' : '100 × t / A − t', elongation >= 20 ? `4 × ${written(thickness)}` : `100 × ${written(thickness)} / ${written(elongation)} − ${written(thickness)}`, byElongation, 'mm')
  return sheet.done('mm', former, { former, strain: (100 * thickness) / (former + thickness) })
}
