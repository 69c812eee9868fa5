/** A composition in mass per cent: what may be entered, what it must not add up to, and how two melts mix. */
import { written, type Worksheet } from './result.ts'

export const ELEMENTS = ['c', 'si', 'mn', 'p', 's', 'cr', 'mo', 'ni', 'cu', 'v', 'nb', 'ti', 'al', 'n', 'b', 'w'] as const
export type Element = (typeof ELEMENTS)[number]
/** Mass per cent; boron and nitrogen too (0.0009, not 9 ppm). An element that is absent is not known. */
export type Chemistry = Partial<Record<Element, number | null>>

export const ELEMENT_NAMES: Readonly<Record<Element, string>> = { c: 'Carbon', si: 'Silicon', mn: 'Manganese', p: 'Phosphorus', s: 'Sulphur', cr: 'Chromium', mo: 'Molybdenum', ni: 'Nickel', cu: 'Copper', v: 'Vanadium', nb: 'Niobium', ti: 'Titanium', al: 'Aluminium', n: 'Nitrogen', b: 'Boron', w: 'Tungsten' }
export const ELEMENT_SYMBOLS: Readonly<Record<Element, string>> = { c: 'C', si: 'Si', mn: 'Mn', p: 'P', s: 'S', cr: 'Cr', mo: 'Mo', ni: 'Ni', cu: 'Cu', v: 'V', nb: 'Nb', ti: 'Ti', al: 'Al', n: 'N', b: 'B', w: 'W' }

/** The figure of an element, 0 where it is not known. */
export const share = (chemistry: Chemistry, element: Element): number => chemistry[element] ?? 0

/** Those of `elements` without a figure. */
export const unknownOf = (chemistry: Chemistry, elements: readonly Element[]): Element[] => elements.filter((element) => chemistry[element] === undefined || chemistry[element] === null)

/**
 * Refuses a composition that can't be: a share that is negative or no number, and a sum above 100 %.
 * @param input how an element is named among the inputs
 * @param of whose composition it is, e.g. `Base metal A`, put before the element's name
 */
export function demandChemistry(sheet: Worksheet, chemistry: Chemistry, { input = (element: Element): string => element, of = '' }: { input?: (element: Element) => string; of?: string } = {}): void {
  const given = ELEMENTS.filter((element) => chemistry[element] !== undefined && chemistry[element] !== null)
  const name = (element: Element): string => (of === '' ? ELEMENT_NAMES[element] : `${of}: ${ELEMENT_NAMES[element].toLowerCase()}`)
  const before = sheet.refused
  for (const element of given) sheet.need(input(element), name(element), chemistry[element], { least: 0, most: 100, unit: '%' })
  if (sheet.refused && !before) return
  const sum = given.reduce((total, element) => total + share(chemistry, element), 0)
  const largest = given.reduce<Element | null>((most, element) => (most === null || share(chemistry, element) > share(chemistry, most) ? element : most), null)
  if (largest && sum > 100 + 1e-9) sheet.refuse(input(largest), `${of === '' ? 'The composition' : `${of}: the composition`} adds up to ${written(sum)} %, above 100 %; ${ELEMENT_NAMES[largest].toLowerCase()} of ${written(share(chemistry, largest))} % is the largest share.`)
}

/** Says which elements of a formula were counted as 0 because they are not given. */
export function noteUnknown(sheet: Worksheet, chemistry: Chemistry, elements: readonly Element[], of = ''): void {
  const unknown = unknownOf(chemistry, elements)
  if (unknown.length > 0) sheet.note(`${of === '' ? '' : `${of}: `}${unknown.map((element) => ELEMENT_SYMBOLS[element]).join(', ')} not given, counted as 0; the figure is too low if the metal holds any.`)
}

/** Parts that mix to one melt; the shares are fractions that sum to 1. An element that no part gives stays unknown. */
export function mixed(parts: readonly { chemistry: Chemistry; fraction: number }[]): Chemistry {
  return Object.fromEntries(ELEMENTS.flatMap((element) => (parts.every(({ chemistry }) => unknownOf(chemistry, [element]).length > 0) ? [] : [[element, parts.reduce((sum, { chemistry, fraction }) => sum + fraction * share(chemistry, element), 0)]])))
}
