/**
 * Ferrite number of stainless weld metal by the WRC-1992 diagram, for one composition or for two base metals diluted in a filler.
 * Outside the lines there is no number: the paper forbids extrapolation.
 */
import { demandChemistry, mixed, noteUnknown, share, type Chemistry, type Element } from './chemistry.ts'
import { worksheet, written, type Calculation, type Source, type Worksheet } from './result.ts'
import { stainlessDefinitions, type Equivalents } from './stainless-equivalents.ts'
import { AF_FA_BORDER, FA_F_BORDER, FERRITE_LINES, WRC_AXES, ZERO_FERRITE, type DiagramPoint } from './wrc-diagram.ts'

export const ferriteSource: Source = { standard: 'WRC-1992', edition: '1992', clause: 'figure 6', basis: 'secondary', note: 'Lines digitised by an open teaching repository of a university. Up to FN 30 the published points are met within 0.2 FN; above, six of seven within 1 FN. Predicted and measured FN differ by some ±4 anyway (recalled).' }

/** Order in which the melt solidifies: austenite alone, austenite first, ferrite first, ferrite alone. */
export type SolidificationMode = 'A' | 'AF' | 'FA' | 'F'
export interface FerriteReading {
  crEq: number
  niEq: number
  /** null where the diagram gives none. */
  ferriteNumber: number | null
  /** In words where there is no number: `below 4`. */
  reading: string | null
  mode: SolidificationMode | null
}

/** Nickel equivalent by which a point may pass the end of a line. */
const NI_ROOM = 0.05
const WRC_ELEMENTS = stainlessDefinitions['wrc-1992'].elements
/** Composition limits of the diagram (recalled), %. */
const LIMITS: readonly (readonly [Element, string, number])[] = [['mn', 'Manganese', 10], ['mo', 'Molybdenum', 3], ['n', 'Nitrogen', 0.2], ['si', 'Silicon', 1]]

/** Cr equivalent of a rising polyline at a Ni equivalent; null beyond its ends. */
function crAt(points: readonly DiagramPoint[], niEq: number, room: number): number | null {
  const [first, last] = [points[0], points.at(-1)]
  if (!first || !last || niEq < first[1] - room || niEq > last[1] + room) return null
  const index = Math.min(Math.max(1, points.findIndex(([, ni]) => ni >= niEq)), points.length - 1)
  const [from, to] = [points[niEq > last[1] ? points.length - 2 : index - 1] ?? first, points[niEq > last[1] ? points.length - 1 : index] ?? last]
  return from[0] + ((niEq - from[1]) / (to[1] - from[1])) * (to[0] - from[0])
}

/** Side of a rising border on which a point lies; null where the border is not known that far. */
function sideOf(points: readonly DiagramPoint[], crEq: number, niEq: number): 'left' | 'right' | null {
  const at = crAt(points, niEq, 0)
  if (at !== null) return crEq < at ? 'left' : 'right'
  const [first, last] = [points[0], points.at(-1)]
  if (first && niEq < first[1] && crEq > first[0]) return 'right'
  return last && niEq > last[1] && crEq < last[0] ? 'left' : null
}

function modeOf(crEq: number, niEq: number): SolidificationMode | null {
  if (sideOf(ZERO_FERRITE, crEq, niEq) === 'left') return 'A'
  const [first, second] = [sideOf(AF_FA_BORDER, crEq, niEq), sideOf(FA_F_BORDER, crEq, niEq)]
  if (first === 'left') return 'AF'
  if (second === 'right') return 'F'
  return first === 'right' && second === 'left' ? 'FA' : null
}

/** Reads the diagram at a point and tells the sheet what limits it passes. */
function read(sheet: Worksheet, { crEq, niEq }: Equivalents): FerriteReading {
  const off: FerriteReading = { crEq, niEq, ferriteNumber: null, reading: null, mode: null }
  const [[cr0, cr1], [ni0, ni1]] = [WRC_AXES.crEq, WRC_AXES.niEq]
  if (crEq < cr0 || crEq > cr1 || niEq < ni0 || niEq > ni1) {
    sheet.outside(`The point (${written(crEq)}, ${written(niEq)}) lies off the diagram, which spans Cr equivalent ${cr0} to ${cr1} and Ni equivalent ${ni0} to ${ni1}.`)
    return off
  }
  const mode = modeOf(crEq, niEq)
  const zero = crAt(ZERO_FERRITE, niEq, NI_ROOM)
  const kept = [...(zero === null ? [] : [{ fn: 0, crEq: zero }]), ...FERRITE_LINES.flatMap(({ fn, low, high }) => {
    const at = crAt([low, high], niEq, NI_ROOM)
    return at === null ? [] : [{ fn, crEq: at }]
  })]
  const next = kept.findIndex((line) => line.crEq >= crEq)
  const [left, right] = [kept[next - 1], kept[next]]
  if (!right) {
    sheet.outside(`The point (${written(crEq)}, ${written(niEq)}) lies beyond the last ferrite line at that nickel equivalent; the diagram may not be extrapolated.`)
    return { ...off, mode }
  }
  if (right.fn === 0) {
    sheet.step('FN', 'left of the FN 0 curve', `(${written(crEq)}, ${written(niEq)})`, 0, 'FN')
    return { ...off, ferriteNumber: 0, reading: '0', mode }
  }
  if (!left) {
    sheet.note(`Left of the FN ${right.fn} line, where the diagram shows no line for less: below ${right.fn} FN.`)
    return { ...off, reading: `below ${right.fn}`, mode }
  }
  const value = left.fn + ((crEq - left.crEq) / (right.crEq - left.crEq)) * (right.fn - left.fn)
  sheet.step('FN', `between the lines FN ${left.fn} and FN ${right.fn} at Ni equivalent ${written(niEq)}`, `${left.fn} + (${written(crEq)} − ${written(left.crEq)}) / (${written(right.crEq)} − ${written(left.crEq)}) × ${right.fn - left.fn}`, value, 'FN')
  return { ...off, ferriteNumber: value, reading: null, mode }
}

/** FN at a point of the diagram; equivalents in mass per cent. `value` null with `reading` or a validity sentence where there is no number. */
export function ferriteAt({ crEq, niEq }: Equivalents): Calculation<FerriteReading> {
  const sheet = worksheet(ferriteSource, { advisory: true })
  sheet.need('crEq', 'Chromium equivalent', crEq, { least: 0, most: 200, unit: '%' })
  sheet.need('niEq', 'Nickel equivalent', niEq, { least: 0, unit: '%' })
  if (sheet.refused) return sheet.stop('FN')
  const reading = read(sheet, { crEq, niEq })
  return sheet.done('FN', reading.ferriteNumber, reading)
}

function equivalents(sheet: Worksheet, chemistry: Chemistry, of: string): Equivalents {
  const definition = stainlessDefinitions['wrc-1992']
  const { crEq, niEq } = definition.of(chemistry)
  sheet.step(`${of}Cr equivalent`, definition.cr, `Cr ${written(share(chemistry, 'cr'))}, Mo ${written(share(chemistry, 'mo'))}, Nb ${written(share(chemistry, 'nb'))}`, crEq, '%')
  sheet.step(`${of}Ni equivalent`, definition.ni, `Ni ${written(share(chemistry, 'ni'))}, C ${written(share(chemistry, 'c'))}, N ${written(share(chemistry, 'n'))}, Cu ${written(share(chemistry, 'cu'))}`, niEq, '%')
  return { crEq, niEq }
}

function limits(sheet: Worksheet, chemistry: Chemistry): void {
  for (const [element, label, most] of LIMITS) if (share(chemistry, element) > most + 1e-9) sheet.outside(`${label} of ${written(share(chemistry, element))} % is above the ${most} % for which the diagram is stated.`)
}

/** FN of one composition, %. */
export function ferriteNumber(chemistry: Chemistry): Calculation<FerriteReading> {
  const sheet = worksheet(ferriteSource, { advisory: true })
  demandChemistry(sheet, chemistry)
  if (sheet.refused) return sheet.stop('FN')
  noteUnknown(sheet, chemistry, WRC_ELEMENTS)
  limits(sheet, chemistry)
  const reading = read(sheet, equivalents(sheet, chemistry, ''))
  return sheet.done('FN', reading.ferriteNumber, reading)
}

export interface DilutionGiven {
  baseA: Chemistry
  /** Left out for a joint of one base metal. */
  baseB?: Chemistry | null
  filler: Chemistry
  /** Base metal in the weld, per cent; of both base metals together. */
  dilution: number
  /** Part of that dilution which base metal A gives, per cent; 50 unless told. */
  shareOfA?: number
}
/** Points to draw: each metal, the mixture of the base metals, and the weld on the tie-line between mixture and filler. */
export interface DilutedFerrite extends FerriteReading { points: { baseA: Equivalents; baseB: Equivalents | null; bases: Equivalents; filler: Equivalents; weld: Equivalents }; chemistry: Chemistry }

/**
 * FN of a weld metal mixed from base metal A, base metal B and filler: X weld = D × X base + (1 − D) × X filler for each element.
 * A problem's input is the element with `a`, `b` or `f` before it (`aCr`).
 */
export function ferriteWithDilution({ baseA, baseB = null, filler, dilution, shareOfA = 50 }: DilutionGiven): Calculation<DilutedFerrite> {
  const sheet = worksheet(ferriteSource, { advisory: true })
  const named = (letter: string) => ({ input: (element: Element) => `${letter}${element.charAt(0).toUpperCase()}${element.slice(1)}` })
  sheet.need('dilution', 'Dilution', dilution, { least: 0, most: 100, unit: '%' })
  sheet.need('shareOfA', 'Share of base metal A', shareOfA, { least: 0, most: 100, unit: '%' })
  demandChemistry(sheet, baseA, { ...named('a'), of: 'Base metal A' })
  if (baseB) demandChemistry(sheet, baseB, { ...named('b'), of: 'Base metal B' })
  demandChemistry(sheet, filler, { ...named('f'), of: 'Filler' })
  if (sheet.refused) return sheet.stop('FN')
  noteUnknown(sheet, baseA, WRC_ELEMENTS, 'Base metal A')
  if (baseB) noteUnknown(sheet, baseB, WRC_ELEMENTS, 'Base metal B')
  noteUnknown(sheet, filler, WRC_ELEMENTS, 'Filler')
  const a = baseB ? shareOfA / 100 : 1
  const d = dilution / 100
  const bases = mixed(baseB ? [{ chemistry: baseA, fraction: a }, { chemistry: baseB, fraction: 1 - a }] : [{ chemistry: baseA, fraction: 1 }])
  const weld = mixed([{ chemistry: bases, fraction: d }, { chemistry: filler, fraction: 1 - d }])
  limits(sheet, weld)
  const points = { baseA: equivalents(sheet, baseA, 'base metal A: '), baseB: baseB ? equivalents(sheet, baseB, 'base metal B: ') : null, bases: stainlessDefinitions['wrc-1992'].of(bases), filler: equivalents(sheet, filler, 'filler: '), weld: equivalents(sheet, weld, `weld with ${written(dilution)} % dilution: `) }
  const reading = read(sheet, points.weld)
  return sheet.done('FN', reading.ferriteNumber, { ...reading, points, chemistry: weld })
}

/** What a drawing of the diagram needs; see `wrc-diagram.ts` for where the figures come from. */
export const wrcDiagram = { axes: WRC_AXES, lines: FERRITE_LINES, zero: ZERO_FERRITE, afFa: AF_FA_BORDER, faF: FA_F_BORDER, source: ferriteSource } as const
