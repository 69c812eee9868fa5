/** Two further preheat estimates: Ito–Bessyo and Séférian. Formulas recalled; second opinions only. */
import { demandChemistry, noteUnknown, share, type Chemistry } from './chemistry.ts'
import { roundUpPreheat } from './preheat-method-b.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

/** °C up to the next 5, as it goes to the welder; null where no more than an ambient of 20 °C is asked. */
const toUse = (preheat: number): number | null => (preheat > 20 ? roundUpPreheat(preheat) : null)

const itoSource: Source = { standard: 'Ito–Bessyo', edition: '', clause: '', basis: 'memory', note: 'Formula recalled; hydrogen by the glycerine method.' }

/**
 * T0 = 1440 Pc − 392 with Pc = Pcm + H/60 + t/600.
 * @param given %, ml/100 g by the glycerine method, mm
 * @returns °C
 */
export function preheatItoBessyo({ pcm, hydrogen, thickness }: { pcm: number; hydrogen: number; thickness: number }): Calculation<{ pc: number; preheat: number; toUse: number | null }> {
  const sheet = worksheet(itoSource, { advisory: true })
  sheet.need('pcm', 'Pcm', pcm, { least: 0, most: 100, unit: '%' })
  sheet.need('hydrogen', 'Diffusible hydrogen', hydrogen, { least: 0, unit: 'ml/100 g' })
  sheet.need('thickness', 'Thickness', thickness, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('°C')
  sheet.within('Thickness', thickness, 19, 50, 'mm')
  sheet.within('Diffusible hydrogen', hydrogen, 1, 5, 'ml/100 g')
  sheet.note('Stated for steels of 0.07 to 0.22 % carbon, hydrogen by the glycerine method.')
  const pc = sheet.step('Pc', 'Pcm + H/60 + t/600', `${written(pcm)} + ${written(hydrogen)}/60 + ${written(thickness)}/600`, pcm + hydrogen / 60 + thickness / 600, '%')
  const preheat = sheet.step('preheat', '1440 × Pc − 392', `1440 × ${written(pc)} − 392`, 1440 * pc - 392, '°C')
  return sheet.done('°C', preheat, { pc, preheat, toUse: toUse(preheat) })
}

const seferianSource: Source = { standard: 'Séférian', edition: '', clause: '', basis: 'memory', note: 'Formula recalled; conservative.' }

/**
 * Tp = 350 √(C total − 0.25), C total = C chem × (1 + 0.005 e); 0 where C total is 0.25 or less.
 * @param given chemistry in %, thickness in mm
 * @returns °C
 */
export function preheatSeferian({ chemistry, thickness }: { chemistry: Chemistry; thickness: number }): Calculation<{ carbonTotal: number; preheat: number; toUse: number | null }> {
  const sheet = worksheet(seferianSource, { advisory: true })
  sheet.need('thickness', 'Thickness', thickness, { above: 0, unit: 'mm' })
  if (chemistry.c === undefined || chemistry.c === null) sheet.need('c', 'Carbon', null)
  demandChemistry(sheet, chemistry)
  if (sheet.refused) return sheet.stop('°C')
  noteUnknown(sheet, chemistry, ['mn', 'cr', 'ni', 'mo'])
  const chem = sheet.step('C chem', 'C + (Mn + Cr)/9 + Ni/18 + 7 Mo/90', `${written(share(chemistry, 'c'))} + (${written(share(chemistry, 'mn'))} + ${written(share(chemistry, 'cr'))})/9 + ${written(share(chemistry, 'ni'))}/18 + 7 × ${written(share(chemistry, 'mo'))}/90`, share(chemistry, 'c') + (share(chemistry, 'mn') + share(chemistry, 'cr')) / 9 + share(chemistry, 'ni') / 18 + (7 * share(chemistry, 'mo')) / 90, '%')
  const carbonTotal = sheet.step('C total', 'C chem × (1 + 0.005 × thickness)', `${written(chem)} × (1 + 0.005 × ${written(thickness)})`, chem * (1 + 0.005 * thickness), '%')
  const preheat = sheet.step('preheat', '350 × √(C total − 0.25), 0 below', `350 × √(${written(carbonTotal)} − 0.25)`, carbonTotal <= 0.25 ? 0 : 350 * Math.sqrt(carbonTotal - 0.25), '°C')
  return sheet.done('°C', preheat, { carbonTotal, preheat, toUse: toUse(preheat) })
}
