/**
 * Estimate of the greatest hardness beside the fusion line of a single bead, from chemistry and t8/5. Advisory only: never for acceptance,
 * error about ±30 HV, no tempering by later passes.
 */
import { demandChemistry, noteUnknown, share, type Chemistry, type Element } from './chemistry.ts'
import { worksheet, written, type Calculation, type Source, type Worksheet } from './result.ts'

export const yuriokaSource: Source = { standard: 'Yurioka', edition: '1987', clause: '', basis: 'memory', note: 'Constants recalled; the martensite constant 294 was seen in public code, some copies print 297.' }
export const duerenSource: Source = { standard: 'Düren', edition: '1982', clause: '', basis: 'memory', note: 'Constants recalled; the martensite constants were seen in public code.' }

/** HV; `hardness` null where the relation gives none. */
export interface HazFigures { hardness: number | null; martensite: number; bainite: number; advisory: true }
export interface HazGiven { chemistry: Chemistry; /** s */ t85: number }

function opened(sheet: Worksheet, { chemistry, t85 }: HazGiven, elements: readonly Element[]): boolean {
  if (chemistry.c === undefined || chemistry.c === null) sheet.need('c', 'Carbon', null)
  demandChemistry(sheet, chemistry)
  sheet.need('t85', 'Cooling time t8/5', t85, { above: 0, unit: 's' })
  if (sheet.refused) return false
  noteUnknown(sheet, chemistry, elements)
  sheet.note('An estimate for a single bead, good to about ±30 HV; never a ground for acceptance.')
  return true
}

/** Yurioka's arctangent between the martensite and bainite hardness. HV. */
export function hazHardnessYurioka(given: HazGiven): Calculation<HazFigures> {
  const { chemistry: x, t85 } = given
  const sheet = worksheet(yuriokaSource, { advisory: true })
  if (!opened(sheet, given, ['si', 'mn', 'cu', 'ni', 'cr', 'mo', 'v', 'nb'])) return sheet.stop('HV')
  const C = share(x, 'c')
  sheet.within('Carbon', C, null, 0.8, '%')
  sheet.within('Nitrogen', share(x, 'n'), null, 0.01, '%')
  if (share(x, 'b') > 0.0003 + 1e-12) sheet.outside(`Boron of ${written(share(x, 'b'))} % is above 0.0003 %; the boron term of this relation is not covered here.`)
  const martensite = sheet.step('all martensite', '884 C (1 − 0.3 C²) + 294', `C ${written(C)}`, 884 * C * (1 - 0.3 * C ** 2) + 294, 'HV')
  const ceII = sheet.step('CE II', 'C + Si/24 + Mn/5 + Cu/10 + Ni/18 + Cr/5 + Mo/2.5 + V/5 + Nb/3', 'shares in %', C + share(x, 'si') / 24 + share(x, 'mn') / 5 + share(x, 'cu') / 10 + share(x, 'ni') / 18 + share(x, 'cr') / 5 + share(x, 'mo') / 2.5 + share(x, 'v') / 5 + share(x, 'nb') / 3, '%')
  const bainite = sheet.step('no martensite', '145 + 130 tanh(2.65 CE II − 0.69)', `145 + 130 tanh(2.65 × ${written(ceII)} − 0.69)`, 145 + 130 * Math.tanh(2.65 * ceII - 0.69), 'HV')
  const cp = C <= 0.3 ? C : C / 6 + 0.25
  const ceI = sheet.step('CE I', 'Cp + Si/24 + Mn/6 + Cu/15 + Ni/12 + Cr (1 − 0.16 √Cr)/8 + Mo/4', `Cp ${written(cp)}`, cp + share(x, 'si') / 24 + share(x, 'mn') / 6 + share(x, 'cu') / 15 + share(x, 'ni') / 12 + (share(x, 'cr') * (1 - 0.16 * Math.sqrt(share(x, 'cr')))) / 8 + share(x, 'mo') / 4, '%')
  const ceIII = sheet.step('CE III', 'Cp + Mn/3.6 + Cu/20 + Ni/9 + Cr/5 + Mo/4', `Cp ${written(cp)}`, cp + share(x, 'mn') / 3.6 + share(x, 'cu') / 20 + share(x, 'ni') / 9 + share(x, 'cr') / 5 + share(x, 'mo') / 4, '%')
  const tM = sheet.step('longest time for all martensite', 'exp(10.6 CE I − 4.8)', `exp(10.6 × ${written(ceI)} − 4.8)`, Math.exp(10.6 * ceI - 4.8), 's')
  const tB = sheet.step('shortest time for no martensite', 'exp(6.2 CE III + 0.74)', `exp(6.2 × ${written(ceIII)} + 0.74)`, Math.exp(6.2 * ceIII + 0.74), 's')
  if (!(tB > tM)) {
    sheet.outside('For this chemistry the two limiting cooling times cross; the relation gives no hardness.')
    return sheet.done<HazFigures>('HV', null, { hardness: null, martensite, bainite, advisory: true })
  }
  const X = sheet.step('place between them', '4 ln(t/tM) / ln(tB/tM) − 2', `4 ln(${written(t85)}/${written(tM)}) / ln(${written(tB)}/${written(tM)}) − 2`, (4 * Math.log(t85 / tM)) / Math.log(tB / tM) - 2)
  const hardness = sheet.step('hardness', '(HM + HB)/2 − (HM − HB)/2.2 × arctan X', `(${written(martensite)} + ${written(bainite)})/2 − (${written(martensite)} − ${written(bainite)})/2.2 × arctan ${written(X)}`, (martensite + bainite) / 2 - ((martensite - bainite) / 2.2) * Math.atan(X), 'HV')
  return sheet.done('HV', hardness, { hardness, martensite, bainite, advisory: true })
}

/** Düren's relation, kept between its bainite and martensite limits. HV. */
export function hazHardnessDueren(given: HazGiven): Calculation<HazFigures> {
  const { chemistry: x, t85 } = given
  const sheet = worksheet(duerenSource, { advisory: true })
  if (!opened(sheet, given, ['si', 'mn', 'cu', 'cr', 'ni', 'mo', 'v'])) return sheet.stop('HV')
  const C = share(x, 'c')
  const S = sheet.step('S', 'Si/11 + Mn/8 + Cu/9 + Cr/5 + Ni/17 + Mo/6 + V/3', 'shares in %', share(x, 'si') / 11 + share(x, 'mn') / 8 + share(x, 'cu') / 9 + share(x, 'cr') / 5 + share(x, 'ni') / 17 + share(x, 'mo') / 6 + share(x, 'v') / 3, '%')
  const martensite = sheet.step('all martensite', '802 C + 305', `802 × ${written(C)} + 305`, 802 * C + 305, 'HV')
  const bainite = sheet.step('no martensite', '350 (C + S) + 101', `350 × (${written(C)} + ${written(S)}) + 101`, 350 * (C + S) + 101, 'HV')
  const log = Math.log10(t85)
  const free = sheet.step('mixed structure', '2019 [C (1 − 0.5 log t) + 0.3 S] + 66 (1 − 0.8 log t)', `C ${written(C)}, S ${written(S)}, log t ${written(log)}`, 2019 * (C * (1 - 0.5 * log) + 0.3 * S) + 66 * (1 - 0.8 * log), 'HV')
  if (bainite > martensite) sheet.outside('For this chemistry the hardness without martensite comes out above that of martensite; the relation does not hold.')
  const [low, high] = [Math.min(bainite, martensite), Math.max(bainite, martensite)]
  const hardness = sheet.step('hardness', 'kept between the two limits', `${written(low)} to ${written(high)}`, Math.min(high, Math.max(low, free)), 'HV')
  return sheet.done('HV', hardness, { hardness, martensite, bainite, advisory: true })
}
