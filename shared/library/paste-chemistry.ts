/** Reads a chemistry as certificates are copied: runs of `C 0.12 Mn 1.35`, `C=0.12; Mn=1,35`, or a head of elements over a row of figures. */
import { ELEMENTS, type Element } from '../schemas/heats.ts'

export interface ElementShare {
  element: Element
  /** Mass per cent. */
  percent: number
  /** The text said "<": the figure is a bound. */
  atMost?: boolean
}
/** What could not be read, as it stood, and why. */
export interface Unread { text: string; why: string }
export interface PastedChemistry { rows: ElementShare[]; unread: Unread[] }

const BY_SYMBOL = new Map<string, Element>(ELEMENTS.map((element) => [element.toLowerCase(), element]))
const NAMES: Readonly<Record<string, Element>> = { cb: 'Nb', altot: 'Al', 'al-t': 'Al', 'al(t)': 'Al', carbon: 'C', silicon: 'Si', manganese: 'Mn', phosphorus: 'P', sulphur: 'S', sulfur: 'S', chromium: 'Cr', molybdenum: 'Mo', nickel: 'Ni', copper: 'Cu', vanadium: 'V', niobium: 'Nb', columbium: 'Nb', titanium: 'Ti', aluminium: 'Al', aluminum: 'Al', nitrogen: 'N', boron: 'B', tungsten: 'W', cobalt: 'Co', magnesium: 'Mg', zinc: 'Zn', iron: 'Fe', zirconium: 'Zr', beryllium: 'Be', lead: 'Pb', tin: 'Sn', hydrogen: 'H', oxygen: 'O', tantalum: 'Ta', calcium: 'Ca' }

/** `Mn`, `MN`, `mn %`, `Mn [%]`, `Cb` and `manganese` are elements; null for any other word. */
function elementOf(word: string): Element | null {
  const plain = word.toLowerCase().replace(/\s*[([]?\s*(?:wt\.?|mass)?[\s-]*%\s*[)\]]?\s*$/, '').replace(/[:=.]+$/, '').trim()
  return BY_SYMBOL.get(plain) ?? NAMES[plain] ?? null
}

interface Figure { percent: number; atMost: boolean }
const FIGURE = /^([<≤]|max\.?\s)?\s*(\d+(?:[.,]\d+)?|[.,]\d+)\s*(%|ppm)?$/i

/** A figure in per cent: `0.12`, `1,35 %`, `<0.005`, `45 ppm`; null for anything else. */
function figureOf(text: string): Figure | null {
  const found = FIGURE.exec(text.trim())
  if (!found) return null
  const value = Number((found[2] ?? '').replace(',', '.'))
  // Through the decimal text, so that 45 ppm is 0.0045 and not 0.0045000000000000005.
  const percent = found[3]?.toLowerCase() === 'ppm' ? Number(`${value}e-4`) : value
  return Number.isFinite(percent) ? { percent, atMost: found[1] !== undefined } : null
}

class Reading {
  readonly rows: ElementShare[] = []
  readonly unread: Unread[] = []

  leave(text: string, why: string): void {
    if (text.trim() !== '') this.unread.push({ text: text.trim(), why })
  }

  take(element: Element, written: string, text: string): void {
    const figure = figureOf(written)
    const before = this.rows.find((row) => row.element === element)
    if (!figure) this.leave(text, `“${written}” is no figure for ${element}.`)
    else if (figure.percent > 100) this.leave(text, `${element} can’t be more than 100 %.`)
    else if (before) this.leave(text, `${element} was given before, as ${before.percent} %; the first is kept.`)
    else this.rows.push({ element, percent: figure.percent, ...(figure.atMost && { atMost: true }) })
  }
}

const TOKEN = /([<≤]?\s*[-−–]?[.,]?\d(?:[\d.,–−-]*\d)?\s*(?:%|ppm\b)?)|([\p{L}][\p{L}()-]*(?:\s*[([]\s*%\s*[)\]]|\s+%)?)|([=:;,|\s]+)|(.)/giu

/** `C 0.12 Mn=1,35; P <0.005`: each element takes the figure that follows it. */
function readRun(line: string, into: Reading): void {
  let element: { element: Element; text: string } | null = null
  let stray = ''
  let words = ''
  const drop = () => {
    if (element) into.leave(element.text, `No figure stands after ${element.element}.`)
    element = null
    into.leave(words, 'This is no element that is kept.')
    words = ''
    into.leave(stray, 'This can’t be read as a chemistry.')
    stray = ''
  }
  for (const [text, figure, word, gap] of line.matchAll(TOKEN)) {
    if (gap !== undefined) {
      if (stray !== '') stray += ' '
      continue
    }
    if (figure !== undefined && stray === '') {
      if (element) into.take(element.element, figure.trim(), `${element.text} ${figure.trim()}`)
      else if (words !== '') into.leave(`${words} ${figure.trim()}`, `“${words}” is no element that is kept.`)
      else into.leave(figure, 'No element stands before this figure.')
      element = null
      words = ''
      continue
    }
    const named = word === undefined || stray !== '' ? null : elementOf(word)
    if (named && word !== undefined) {
      drop()
      element = { element: named, text: word.trim() }
    } else if (element && word !== undefined) {
      // "Fe bal.", "N trace": words where a figure should be.
      into.leave(`${element.text} ${word}`, `“${word}” is no figure for ${element.element}.`)
      element = null
    } else if (word !== undefined && stray === '') words = words === '' ? word : `${words} ${word}`
    else if (element && /^[-–—.]$/.test(text)) element = null
    else if (!/^[.()[\]%]$/.test(text)) stray += text
  }
  drop()
}

const SPLITS: readonly (readonly [RegExp, RegExp])[] = [[/\t/, /\t/], [/\|/, /\|/], [/;/, /;/], [/,/, /,/], [/\s/, /\s+/]]
const EMPTY = /^(?:[-–—.]|n\/?a|not reported)?$/i
const LIMITS = /^(?:min|max|spec|req|limit)/i

interface Head { cells: readonly (Element | null)[]; names: readonly string[]; split: RegExp }

/** A line of at least two elements and no figure is a head. */
function headOf(line: string): Head | null {
  const trimmed = line.trim().replace(/^\||\|$/g, '')
  const split = SPLITS.find(([sign]) => sign.test(trimmed))?.[1]
  if (!split) return null
  const names = trimmed.split(split).map((cell) => cell.trim()).filter((cell) => split.source !== '\\s+' || !/^[([]?(?:wt\.?)?%[)\]]?$/.test(cell))
  const cells = names.map(elementOf)
  return cells.filter((cell) => cell !== null).length >= 2 && !names.some((cell) => /\d/.test(cell)) ? { cells, names, split } : null
}

/** @returns whether the row gave figures */
function readRow(line: string, { cells, names, split }: Head, into: Reading): boolean {
  const parts = line.trim().replace(/^\||\|$/g, '').split(split).map((cell) => cell.trim())
  // A row may begin with what it is ("ladle", "K4471") where the head has no cell for it.
  const label = parts.length === cells.length + 1 ? parts.shift() : undefined
  if (parts.length > cells.length) {
    into.leave(line, `This row has ${parts.length} values under ${cells.length} headings.`)
    return false
  }
  if (LIMITS.test(label ?? '') || (cells[0] === null && LIMITS.test(parts[0] ?? ''))) {
    into.leave(line, 'These are limits of a specification, not figures of this heat.')
    return false
  }
  if (label !== undefined) into.leave(label, 'This is no figure.')
  parts.forEach((part, index) => {
    const element = cells[index]
    if (EMPTY.test(part)) return
    if (element) into.take(element, part, `${names[index]} ${part}`)
    else into.leave(`${names[index]} ${part}`.trim(), `“${names[index]}” is no element that is kept.`)
  })
  return true
}

/**
 * Reads a pasted chemistry. Decimal points and commas, per cent signs, `ppm` and `<0.005` are understood; what isn't is kept in
 * `unread`, never dropped. Shares are not added up here: `chemistrySchema` refuses a sum above 100 %.
 */
export function pasteChemistry(text: string): PastedChemistry {
  const into = new Reading()
  const lines = text.split(/\r?\n/).filter((line) => line.trim() !== '' && !/^[\s|:+=-]+$/.test(line))
  for (let at = 0; at < lines.length; at += 1) {
    const line = lines[at] ?? ''
    const head = headOf(line)
    const below = lines[at + 1]
    if (!head || below === undefined || headOf(below)) {
      readRun(line, into)
      continue
    }
    let read = false
    while (at + 1 < lines.length && !headOf(lines[at + 1] ?? '')) {
      at += 1
      if (read) into.leave(lines[at] ?? '', 'A further row of figures; the first is kept.')
      else read = readRow(lines[at] ?? '', head, into)
    }
  }
  return { rows: into.rows, unread: into.unread }
}

/** A decimal without an exponent: 0.0000001, not 1e-7. */
const decimal = (value: number): string => (String(value).includes('e') ? value.toFixed(20).replace(/\.?0+$/, '') : String(value))

/** A chemistry in one line, as `pasteChemistry` reads it: `C 0.12 Mn 1.35 B <0.0005`. */
export const printChemistry = (rows: readonly ElementShare[]): string => rows.map(({ element, percent, atMost }) => `${element} ${atMost ? '<' : ''}${decimal(percent)}`).join(' ')
