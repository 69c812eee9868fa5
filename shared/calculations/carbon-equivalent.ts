/**
 * Numbers of weldability from the chemistry of a ferritic steel, mass per cent: CE (IIW), CE (AWS), Pcm, CET, CEN.
 * An element that is not given counts as 0, and the result says so.
 */
import { demandChemistry, ELEMENT_SYMBOLS, noteUnknown, share, type Chemistry, type Element } from './chemistry.ts'
import { worksheet, written, type Calculation, type Source, type Worksheet } from './result.ts'

export const CARBON_EQUIVALENTS = ['ceIiw', 'ceAws', 'pcm', 'cet', 'cen'] as const
export type CarbonEquivalent = (typeof CARBON_EQUIVALENTS)[number]

interface Limit { min?: number; max?: number }
interface Definition {
  label: string
  formula: string
  /** Divisor of each element's share; boron multiplies. */
  elements: readonly Element[]
  of(chemistry: Chemistry): number
  limits: Partial<Record<Element, Limit>>
  source: Source
}

/** Accommodation factor of CEN: 0.5 for low carbon, 1 for high. */
export const accommodationFactor = (carbon: number): number => 0.75 + 0.25 * Math.tanh(20 * (carbon - 0.12))

const CE_ELEMENTS = ['c', 'mn', 'cr', 'mo', 'v', 'ni', 'cu'] as const
const ceIiwOf = (x: Chemistry): number => share(x, 'c') + share(x, 'mn') / 6 + (share(x, 'cr') + share(x, 'mo') + share(x, 'v')) / 5 + (share(x, 'ni') + share(x, 'cu')) / 15
const source = (standard: string, edition: string, clause: string): Source => ({ standard, edition, clause, basis: 'secondary', note: 'Several published formula pages agree; the composition limits are recalled.' })

export const carbonEquivalentDefinitions: Readonly<Record<CarbonEquivalent, Definition>> = {
  ceIiw: {
    label: 'CE (IIW)', formula: 'C + Mn/6 + (Cr + Mo + V)/5 + (Ni + Cu)/15', elements: CE_ELEMENTS, of: ceIiwOf,
    limits: { c: { min: 0.05, max: 0.25 }, si: { max: 0.8 }, mn: { max: 1.7 }, cr: { max: 0.9 }, cu: { max: 1 }, ni: { max: 2.5 }, mo: { max: 0.75 }, v: { max: 0.2 } },
    source: source('EN 1011-2 / ISO/TR 17671-2', '2001 / 2002', 'method A'),
  },
  ceAws: {
    label: 'CE (AWS)', formula: 'C + (Mn + Si)/6 + (Cr + Mo + V)/5 + (Ni + Cu)/15', elements: [...CE_ELEMENTS, 'si'], of: (x) => ceIiwOf(x) + share(x, 'si') / 6,
    limits: {}, source: source('AWS D1.1', '2000–2020', 'preheat annex'),
  },
  pcm: {
    label: 'Pcm', formula: 'C + Si/30 + (Mn + Cu + Cr)/20 + Ni/60 + Mo/15 + V/10 + 5 B', elements: ['c', 'si', 'mn', 'cu', 'cr', 'ni', 'mo', 'v', 'b'],
    of: (x) => share(x, 'c') + share(x, 'si') / 30 + (share(x, 'mn') + share(x, 'cu') + share(x, 'cr')) / 20 + share(x, 'ni') / 60 + share(x, 'mo') / 15 + share(x, 'v') / 10 + 5 * share(x, 'b'),
    limits: { c: { max: 0.17 } }, source: source('Ito–Bessyo; AWS D1.1 preheat annex', '', 'Pcm'),
  },
  cet: {
    label: 'CET', formula: 'C + (Mn + Mo)/10 + (Cr + Cu)/20 + Ni/40', elements: ['c', 'mn', 'mo', 'cr', 'cu', 'ni'],
    of: (x) => share(x, 'c') + (share(x, 'mn') + share(x, 'mo')) / 10 + (share(x, 'cr') + share(x, 'cu')) / 20 + share(x, 'ni') / 40,
    limits: { c: { min: 0.05, max: 0.32 }, si: { max: 0.8 }, mn: { min: 0.5, max: 1.9 }, cr: { max: 1.5 }, cu: { max: 0.7 }, mo: { max: 0.75 }, nb: { max: 0.06 }, ni: { max: 2.5 }, ti: { max: 0.12 }, v: { max: 0.18 }, b: { max: 0.005 } },
    source: source('EN 1011-2 / ISO/TR 17671-2', '2001 / 2002', 'method B'),
  },
  cen: {
    label: 'CEN', formula: 'C + A(C) × [Si/24 + Mn/6 + Cu/15 + Ni/20 + (Cr + Mo + Nb + V)/5 + 5 B]', elements: ['c', 'si', 'mn', 'cu', 'ni', 'cr', 'mo', 'nb', 'v', 'b'],
    of: (x) => share(x, 'c') + accommodationFactor(share(x, 'c')) * (share(x, 'si') / 24 + share(x, 'mn') / 6 + share(x, 'cu') / 15 + share(x, 'ni') / 20 + (share(x, 'cr') + share(x, 'mo') + share(x, 'nb') + share(x, 'v')) / 5 + 5 * share(x, 'b')),
    limits: {}, source: source('Yurioka', '', 'CEN'),
  },
}

/** Sentences for each element outside the limits stated for a number. */
function limitsPassed(name: CarbonEquivalent, chemistry: Chemistry): string[] {
  const { label, limits } = carbonEquivalentDefinitions[name]
  return (Object.entries(limits) as [Element, Limit][]).flatMap(([element, { min, max }]) => {
    const value = chemistry[element] ?? null
    if (value === null || ((min === undefined || value >= min - 1e-9) && (max === undefined || value <= max + 1e-9))) return []
    const range = min === undefined ? `up to ${max} %` : `${min} to ${max} %`
    return [`${label} is stated for ${ELEMENT_SYMBOLS[element]} ${range}; this steel has ${written(value)} %.`]
  })
}

const working = (name: CarbonEquivalent, x: Chemistry): string => carbonEquivalentDefinitions[name].elements.map((element) => `${ELEMENT_SYMBOLS[element]} ${written(share(x, element))}`).join(', ')

function opened(sheet: Worksheet, chemistry: Chemistry): void {
  sheet.need('c', 'Carbon', chemistry.c, { least: 0, most: 100, unit: '%' })
  demandChemistry(sheet, { ...chemistry, c: sheet.refused ? null : chemistry.c })
}

/** One number from a chemistry; `value` is it, in mass per cent. Refuses a chemistry without carbon. */
export function carbonEquivalent(name: CarbonEquivalent, chemistry: Chemistry): Calculation<{ value: number; accommodationFactor: number | null }> {
  const definition = carbonEquivalentDefinitions[name]
  const sheet = worksheet(definition.source, { advisory: true })
  opened(sheet, chemistry)
  if (sheet.refused) return sheet.stop('%')
  noteUnknown(sheet, chemistry, definition.elements)
  for (const sentence of limitsPassed(name, chemistry)) sheet.outside(sentence)
  const factor = name === 'cen' ? sheet.step('A(C)', '0.75 + 0.25 tanh(20 × (C − 0.12))', `C ${written(share(chemistry, 'c'))}`, accommodationFactor(share(chemistry, 'c'))) : null
  if (name.startsWith('ce') && name !== 'cet' && name !== 'cen' && share(chemistry, 'c') < 0.12) sheet.note('CE suits steels above some 0.12 % carbon; below that Pcm or CEN tells more.')
  const value = sheet.step(definition.label, definition.formula, working(name, chemistry), definition.of(chemistry), '%')
  return sheet.done('%', value, { value, accommodationFactor: factor })
}

export type CarbonEquivalentFigures = Record<CarbonEquivalent, number> & { accommodationFactor: number }

/** All five side by side; `value` is CE (IIW). Validity names each number whose limits the chemistry passes. */
export function carbonEquivalents(chemistry: Chemistry): Calculation<CarbonEquivalentFigures> {
  const sheet = worksheet({ ...carbonEquivalentDefinitions.ceIiw.source, standard: 'EN 1011-2 / ISO/TR 17671-2; AWS; Yurioka', clause: 'CE, Pcm, CET, CEN' }, { advisory: true })
  opened(sheet, chemistry)
  if (sheet.refused) return sheet.stop('%')
  noteUnknown(sheet, chemistry, ['c', 'si', 'mn', 'cr', 'mo', 'ni', 'cu', 'v', 'nb', 'b'])
  if (share(chemistry, 'c') < 0.12) sheet.note('CE suits steels above some 0.12 % carbon; below that Pcm or CEN tells more.')
  const values = Object.fromEntries(CARBON_EQUIVALENTS.map((name) => {
    for (const sentence of limitsPassed(name, chemistry)) sheet.outside(sentence)
    if (name === 'cen') sheet.step('A(C)', '0.75 + 0.25 tanh(20 × (C − 0.12))', `C ${written(share(chemistry, 'c'))}`, accommodationFactor(share(chemistry, 'c')))
    const definition = carbonEquivalentDefinitions[name]
    return [name, sheet.step(definition.label, definition.formula, working(name, chemistry), definition.of(chemistry), '%')]
  })) as Record<CarbonEquivalent, number>
  return sheet.done('%', values.ceIiw, { ...values, accommodationFactor: accommodationFactor(share(chemistry, 'c')) })
}
