/** Numbers as people write them: decimals with point or comma, fractions, mixed numbers, thin spaces between thousands. */

const VULGAR: Readonly<Record<string, number>> = { '¼': 1 / 4, '½': 1 / 2, '¾': 3 / 4, '⅛': 1 / 8, '⅜': 3 / 8, '⅝': 5 / 8, '⅞': 7 / 8, '⅓': 1 / 3, '⅔': 2 / 3 }
const VULGAR_CLASS = `[${Object.keys(VULGAR).join('')}]`
const DIGITS = '(?:\\d{1,3}(?: \\d{3})+(?![\\d/])|\\d+)'

const FORMS = {
  mixed: new RegExp(`^(\\d+)( +|-)(\\d+)/(\\d+)`),
  mixedVulgar: new RegExp(`^(\\d+)[ -]?(${VULGAR_CLASS})`),
  vulgar: new RegExp(`^(${VULGAR_CLASS})`),
  fraction: /^(\d+) ?\/ ?(\d+)/,
  decimal: new RegExp(`^(?:${DIGITS}(?:[.,]\\d+)*|[.,]\\d+)`),
}

export interface ReadNumber {
  value: number
  /** Characters used, sign included. */
  length: number
  fraction: boolean
}
export type NumberReading = ReadNumber | { problem: string } | null

/**
 * One-for-one replacement of the many dashes, spaces, quotes and slashes by plain ones: positions in the result
 * are positions in the text as typed, so that a slice of the original can be kept.
 */
export const plainSigns = (text: string): string =>
  text
    .replace(/[\u00a0\u2000-\u200b\u202f\u205f\u3000\t\n\r]/g, ' ')
    .replace(/[\u2010-\u2015\u2212\ufe58\uff0d]/g, '-')
    .replace(/[\u2033\u201c\u201d\u201e]/g, '"')
    .replace(/[\u2032\u2018\u2019]/g, "'")
    .replace(/[\u2044\u2215]/g, '/')

/** Reads points and commas: the last sign is the decimal one, unless it could as well part thousands. */
function decimalValue(text: string): number | { problem: string } {
  const bare = text.replaceAll(' ', '')
  const signs = bare.replace(/\d/g, '')
  const last = signs.at(-1)
  if (last === undefined) return Number(bare)
  const [whole = '', decimals = ''] = [bare.slice(0, bare.lastIndexOf(last)), bare.slice(bare.lastIndexOf(last) + 1)]
  if (signs.length === 1) {
    const couldBeThousands = last === ',' && decimals.length === 3 && /^[1-9]\d{0,2}$/.test(whole)
    if (couldBeThousands) return { problem: `"${text}" can be read as ${whole}.${decimals} or as ${whole}${decimals}. Write ${whole}.${decimals} or ${whole}${decimals}` }
    return Number(`${whole || '0'}.${decimals}`)
  }
  const groups = whole.split(/[.,]/)
  const grouped = !whole.includes(last) && new Set(signs.slice(0, -1)).size === 1 && groups.slice(1).every((group) => group.length === 3) && (groups[0] ?? '').length <= 3
  if (grouped) return Number(`${groups.join('')}.${decimals}`)
  const allGrouped = new Set(signs).size === 1 && bare.split(last).slice(1).every((group) => group.length === 3)
  return allGrouped ? Number(bare.replaceAll(last, '')) : { problem: `"${text}" is not a number that can be read. Write one decimal sign, e.g. 12.7` }
}

function readUnsigned(text: string): NumberReading {
  const mixed = FORMS.mixed.exec(text)
  if (mixed) {
    const [all, whole = '', joint = '', above = '', below = ''] = mixed
    // 1-1/2 is the trade's one and a half; 0-1/2 is a range, and so is 1-9/8.
    if (Number(above) < Number(below) && (joint !== '-' || Number(whole) > 0)) return { value: Number(whole) + Number(above) / Number(below), length: all.length, fraction: true }
  }
  const mixedVulgar = FORMS.mixedVulgar.exec(text)
  if (mixedVulgar) return { value: Number(mixedVulgar[1]) + (VULGAR[mixedVulgar[2] ?? ''] ?? 0), length: mixedVulgar[0].length, fraction: true }
  const vulgar = FORMS.vulgar.exec(text)
  if (vulgar) return { value: VULGAR[vulgar[0]] ?? 0, length: 1, fraction: true }
  const fraction = FORMS.fraction.exec(text)
  if (fraction) {
    if (Number(fraction[2]) === 0) return { problem: `"${fraction[0]}" divides by nothing. Write a fraction such as 3/8` }
    return { value: Number(fraction[1]) / Number(fraction[2]), length: fraction[0].length, fraction: true }
  }
  const decimal = FORMS.decimal.exec(text)
  if (!decimal) return null
  const value = decimalValue(decimal[0])
  return typeof value === 'number' ? { value, length: decimal[0].length, fraction: false } : value
}

/**
 * Reads the number with which `text` begins (signs already plain, see {@link plainSigns}).
 * @returns value and characters used; `problem` when it can't be told what is meant; null when no number stands there
 */
export function readNumber(text: string): NumberReading {
  const sign = /^[-+] ?/.exec(text)?.[0] ?? ''
  const reading = readUnsigned(text.slice(sign.length))
  if (!reading || 'problem' in reading) return reading
  return { ...reading, value: sign.startsWith('-') ? -reading.value : reading.value, length: reading.length + sign.length }
}
