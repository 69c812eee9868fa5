/**
 * P-Numbers that ASME IX QW-420 sets up, from memory of the 2013 to 2023 editions; an unassigned metal has none.
 * Each designation is a P-Number of its own: 5A, 5B and 5C share nothing.
 */
const plain = (from: number, to: number): string[] => Array.from({ length: to - from + 1 }, (_, index) => String(from + index))
const lettered = (number: number, letters: string): string[] => [...letters].map((letter) => `${number}${letter}`)

export const P_NUMBERS: readonly string[] = ['1', '3', '4', ...lettered(5, 'ABC'), '6', '7', '8', ...lettered(9, 'ABC'), ...lettered(10, 'ABCEFGHIJK'), ...lettered(11, 'ABC'), ...lettered(15, 'ABCDEF'), ...plain(21, 26), ...plain(31, 35), ...plain(41, 49), ...plain(51, 53), '61', '62']
const known = new Set(P_NUMBERS)

/** Why a text is no P-Number, in a sentence, or null when it is one. */
export function pNumberProblem(text: string): string | null {
  const written = text.trim().toUpperCase()
  if (known.has(written)) return null
  const parts = P_NUMBERS.filter((one) => /^\d+[A-Z]$/.test(one) && one.slice(0, -1) === written)
  if (parts.length > 0) return `P-Number ${written} is divided into ${parts.join(', ')}: say which.`
  return `There is no P-Number ${text.trim()}. They run from 1 to 15F for steel, 21 to 26 aluminium, 31 to 35 copper, 41 to 49 nickel, 51 to 53 titanium, 61 and 62 zirconium; leave it empty where the metal has none.`
}

/** Group Numbers exist for the ferrous P-Numbers, 1 to 15F. */
export const hasGroups = (pNumber: string): boolean => Number.parseInt(pNumber, 10) <= 15
