/** Chromium and nickel equivalents of stainless weld metal by each diagram, and the pitting resistance number. Mass per cent. */
import { demandChemistry, noteUnknown, share, type Chemistry, type Element } from './chemistry.ts'
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const STAINLESS_DIAGRAMS = ['wrc-1992', 'wrc-1988', 'delong', 'schaeffler', 'hammar-svensson'] as const
export type StainlessDiagram = (typeof STAINLESS_DIAGRAMS)[number]
export interface Equivalents { crEq: number; niEq: number }

interface Definition { label: string; cr: string; ni: string; elements: readonly Element[]; of(x: Chemistry): Equivalents; source: Source }
const published = (standard: string, edition: string): Source => ({ standard, edition, clause: 'equivalents', basis: 'secondary', note: 'As quoted by published sources from the paper.' })
const recalled = (standard: string, edition: string): Source => ({ standard, edition, clause: 'equivalents', basis: 'memory', note: 'Textbook formula, recalled.' })
const wrcCr = (x: Chemistry): number => share(x, 'cr') + share(x, 'mo') + 0.7 * share(x, 'nb')
const oldCr = (x: Chemistry): number => share(x, 'cr') + share(x, 'mo') + 1.5 * share(x, 'si') + 0.5 * share(x, 'nb')

export const stainlessDefinitions: Readonly<Record<StainlessDiagram, Definition>> = {
  'wrc-1992': { label: 'WRC-1992', cr: 'Cr + Mo + 0.7 Nb', ni: 'Ni + 35 C + 20 N + 0.25 Cu', elements: ['cr', 'mo', 'nb', 'ni', 'c', 'n', 'cu'], of: (x) => ({ crEq: wrcCr(x), niEq: share(x, 'ni') + 35 * share(x, 'c') + 20 * share(x, 'n') + 0.25 * share(x, 'cu') }), source: published('WRC-1992', '1992') },
  'wrc-1988': { label: 'WRC-1988', cr: 'Cr + Mo + 0.7 Nb', ni: 'Ni + 35 C + 20 N', elements: ['cr', 'mo', 'nb', 'ni', 'c', 'n'], of: (x) => ({ crEq: wrcCr(x), niEq: share(x, 'ni') + 35 * share(x, 'c') + 20 * share(x, 'n') }), source: published('WRC-1988', '1988') },
  delong: { label: 'DeLong', cr: 'Cr + Mo + 1.5 Si + 0.5 Nb', ni: 'Ni + 30 C + 30 N + 0.5 Mn', elements: ['cr', 'mo', 'si', 'nb', 'ni', 'c', 'n', 'mn'], of: (x) => ({ crEq: oldCr(x), niEq: share(x, 'ni') + 30 * share(x, 'c') + 30 * share(x, 'n') + 0.5 * share(x, 'mn') }), source: recalled('DeLong', '1973') },
  schaeffler: { label: 'Schaeffler', cr: 'Cr + Mo + 1.5 Si + 0.5 Nb', ni: 'Ni + 30 C + 0.5 Mn', elements: ['cr', 'mo', 'si', 'nb', 'ni', 'c', 'mn'], of: (x) => ({ crEq: oldCr(x), niEq: share(x, 'ni') + 30 * share(x, 'c') + 0.5 * share(x, 'mn') }), source: recalled('Schaeffler', '1949') },
  'hammar-svensson': { label: 'Hammar–Svensson', cr: 'Cr + 1.37 Mo + 1.5 Si + 2 Nb + 3 Ti', ni: 'Ni + 0.31 Mn + 22 C + 14.2 N + Cu', elements: ['cr', 'mo', 'si', 'nb', 'ti', 'ni', 'mn', 'c', 'n', 'cu'], of: (x) => ({ crEq: share(x, 'cr') + 1.37 * share(x, 'mo') + 1.5 * share(x, 'si') + 2 * share(x, 'nb') + 3 * share(x, 'ti'), niEq: share(x, 'ni') + 0.31 * share(x, 'mn') + 22 * share(x, 'c') + 14.2 * share(x, 'n') + share(x, 'cu') }), source: recalled('Hammar–Svensson', '') },
}

/** Equivalents by one diagram; `value` is the chromium equivalent, in per cent. */
export function stainlessEquivalents(diagram: StainlessDiagram, chemistry: Chemistry): Calculation<Equivalents & { ratio: number | null }> {
  const definition = stainlessDefinitions[diagram]
  const sheet = worksheet(definition.source, { advisory: true })
  demandChemistry(sheet, chemistry)
  if (sheet.refused) return sheet.stop('%')
  noteUnknown(sheet, chemistry, definition.elements)
  const { crEq, niEq } = definition.of(chemistry)
  sheet.step('Cr equivalent', definition.cr, definition.label, crEq, '%')
  sheet.step('Ni equivalent', definition.ni, definition.label, niEq, '%')
  return sheet.done('%', crEq, { crEq, niEq, ratio: niEq > 0 ? crEq / niEq : null })
}

export const PREN_FORMULAS = ['usual', 'tungsten', 'thirty-nitrogen'] as const
export type PrenFormula = (typeof PREN_FORMULAS)[number]
export const prenFormulas: Readonly<Record<PrenFormula, string>> = { usual: 'Cr + 3.3 Mo + 16 N', tungsten: 'Cr + 3.3 (Mo + 0.5 W) + 16 N', 'thirty-nitrogen': 'Cr + 3.3 Mo + 30 N' }
const prenSource: Source = { standard: 'PREN', edition: '', clause: '', basis: 'secondary', note: 'Note of a stainless steel association. Specifications differ in the formula, so the one used is stated.' }

/** Pitting resistance equivalent number; dimensionless. */
export function pren(chemistry: Chemistry, formula: PrenFormula = 'usual'): Calculation<{ pren: number; formula: string }> {
  const sheet = worksheet(prenSource, { advisory: true })
  demandChemistry(sheet, chemistry)
  if (sheet.refused) return sheet.stop('')
  noteUnknown(sheet, chemistry, formula === 'tungsten' ? ['cr', 'mo', 'n', 'w'] : ['cr', 'mo', 'n'])
  const [cr, mo, n, w] = [share(chemistry, 'cr'), share(chemistry, 'mo'), share(chemistry, 'n'), formula === 'tungsten' ? share(chemistry, 'w') : 0]
  const factor = formula === 'thirty-nitrogen' ? 30 : 16
  const value = sheet.step('PREN', prenFormulas[formula], `${written(cr)} + 3.3 × ${written(mo + 0.5 * w)} + ${factor} × ${written(n)}`, cr + 3.3 * (mo + 0.5 * w) + factor * n)
  return sheet.done('', value, { pren: value, formula: prenFormulas[formula] })
}

const regressionSource: Source = { standard: 'Ferrite regression, Welding in the World', edition: '', clause: 'doi 10.1007/bf03321381', basis: 'secondary', note: 'Printed in the abstract; stated error about +1 ± 2 FN, cooling 10 to 1000 °C/s.' }

/**
 * Ferrite number of austenitic weld metal by regression on the Hammar–Svensson equivalents: a second opinion beside the diagram.
 * @returns FN
 */
export function ferriteRegression(chemistry: Chemistry): Calculation<{ ferriteNumber: number; crEq: number; niEq: number }> {
  const sheet = worksheet(regressionSource, { advisory: true })
  demandChemistry(sheet, chemistry)
  if (sheet.refused) return sheet.stop('FN')
  const definition = stainlessDefinitions['hammar-svensson']
  noteUnknown(sheet, chemistry, definition.elements)
  const { crEq, niEq } = definition.of(chemistry)
  if (!(niEq > 0)) {
    sheet.refuse('ni', 'Nickel must be given: with a nickel equivalent of 0 there is no ratio.')
    return sheet.stop('FN')
  }
  const s = sheet.step('S', '(Cr eq + Ni eq) / 100', `(${written(crEq)} + ${written(niEq)}) / 100`, (crEq + niEq) / 100)
  const r = sheet.step('r', 'Cr eq / Ni eq', `${written(crEq)} / ${written(niEq)}`, crEq / niEq)
  sheet.within('S', s, 0.3, 0.4)
  sheet.within('Ratio r', r, 1.22, 2)
  const ferriteNumber = sheet.step('FN', '54.22 − 126.26 S + (−48.11 + 37.14 S) r + (−0.23 + 61.95 S) r²', `S ${written(s)}, r ${written(r)}`, 54.22 - 126.26 * s + (-48.11 + 37.14 * s) * r + (-0.23 + 61.95 * s) * r ** 2, 'FN')
  return sheet.done('FN', ferriteNumber, { ferriteNumber, crEq, niEq })
}
