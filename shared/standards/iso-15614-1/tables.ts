/** Tables 7 to 9 as figures, in mm. Two readings where two are known: `sure` is what both allow, `maybe` what either does. */
import { closed, intersectNumeric, numericRange, unionNumeric, UNLIMITED } from '../../ranges/numeric.ts'
import type { Basis, NumericRange } from '../../schemas/assessment.ts'
import { tidy } from '../common/reading.ts'

export interface Reading { sure: NumericRange; maybe: NumericRange; how: string; basis: Basis; why?: string }

/** A range in mm; null = no limit at that end. */
export const mm = (lower: number | null, upper: number | null): NumericRange =>
  numericRange('length', 'mm', [{ lower: lower === null ? UNLIMITED : closed(tidy(lower)), upper: upper === null ? UNLIMITED : closed(tidy(upper)) }])
export const nothing: NumericRange = numericRange('length', 'mm', [])

const plain = (range: NumericRange, how: string, basis: Basis = 'memory'): Reading => ({ sure: range, maybe: range, how, basis })

/** Table 7, level 2 (figures of 2004 Table 5, recalled as kept). Lower row bounds exclusive, upper ones inclusive. */
export function buttLevelTwo(t: number, runs: 'single' | 'multiple'): Reading {
  const single = runs === 'single'
  if (t <= 3) {
    const upper = single ? 1.3 * t : 2 * t
    return { sure: mm(0.7 * t, upper), maybe: mm(0.5 * t, upper), how: `0.7t to ${single ? '1.3t' : '2t'}`, basis: 'memory', why: 'Up to 3 mm the lower limit may be 0.5t in the 2017 text; 0.7t is sure.' }
  }
  if (t <= 12) return single ? plain(mm(Math.max(0.5 * t, 3), 1.3 * t), '0.5t, at least 3 mm, to 1.3t') : plain(mm(3, 2 * t), '3 mm to 2t')
  if (t <= 100) return single ? plain(mm(0.5 * t, 1.1 * t), '0.5t to 1.1t') : plain(mm(0.5 * t, 2 * t), '0.5t to 2t')
  return single ? plain(nothing, 'no figure for a single run above 100 mm') : plain(mm(50, 2 * t), '50 mm to 2t')
}

/** Table 7, level 1 (built on ASME IX; weak). A pass over 13 mm may hold it to 1.1t. @param thickPass null = not recorded */
export function buttLevelOne(t: number, thickPass: boolean | null): Reading {
  const row = levelOneRow(t)
  if (thickPass === false) return row
  const cut = mm(null, 1.1 * t)
  return { ...row, sure: intersectNumeric(row.sure, cut), why: thickPass ? 'A pass was thicker than 13 mm, which may hold level 1 to 1.1t.' : 'Whether a pass was thicker than 13 mm isn\'t recorded; if so, level 1 may be held to 1.1t.' }
}

function levelOneRow(t: number): Reading {
  if (t < 1.5) return plain(mm(t, 2 * t), 't to 2t')
  if (t <= 10) return plain(mm(1.5, 2 * t), '1.5 mm to 2t')
  if (t <= 12) return { sure: mm(5, 2 * t), maybe: mm(1.5, 2 * t), how: '5 mm to 2t', basis: 'memory', why: 'Whether the row limit is 10 mm or 12 mm is not confirmed; from 1.5 mm to 5 mm look it up.' }
  if (t < 38) return plain(mm(5, 2 * t), '5 mm to 2t')
  if (t < 40) return { sure: mm(5, 2 * t), maybe: mm(5, 200), how: '5 mm to 2t', basis: 'memory', why: 'Whether the row limit is 38 mm or 40 mm is not confirmed; above 2t look it up.' }
  if (t <= 150) return plain(mm(5, 200), '5 mm to 200 mm')
  return plain(mm(5, 1.33 * t), '5 mm to 1.33t')
}

/** Table 8, material thickness of a fillet at level 2; the editions are recalled differently between 3 and 30 mm. */
export function filletThickness(t: number): Reading {
  if (t <= 3) return plain(mm(0.7 * t, 2 * t), '0.7t to 2t')
  if (t >= 30) return plain(mm(5, null), '5 mm and up')
  const recent = mm(3, 2 * t)
  const older = mm(Math.max(0.5 * t, 3), 1.2 * t)
  return { sure: intersectNumeric(recent, older), maybe: unionNumeric(recent, older), how: '3 mm to 2t (2017) and 0.5t, at least 3 mm, to 1.2t (2004)', basis: 'memory', why: 'The editions are recalled differently: 3 mm to 2t, or 0.5t (at least 3 mm) to 1.2t.' }
}

/** Table 8, throat at level 2. @param a throat, or deposited thickness where a butt test stands for a fillet @param t material thickness, null = not known */
export function throatRange(a: number, runs: 'single' | 'multiple', t: number | null): Reading {
  if (runs === 'multiple') return plain(mm(null, null), 'no restriction for several runs')
  const range = mm(0.75 * a, 1.5 * a)
  if (t !== null && t < 30) return plain(range, '0.75a to 1.5a')
  return { sure: mm(a, a), maybe: range, how: '0.75a to 1.5a', basis: 'memory', why: 'From 30 mm material the 2004 edition has every throat of a single run proved by itself.' }
}

/** Table 9 at level 2 (2017: half and up) with the 2004 figures as the narrower reading. */
export function diameterRange(D: number): Reading {
  const recent = mm(0.5 * D, null)
  if (D <= 25) return { sure: mm(0.5 * D, 2 * D), maybe: recent, how: '0.5D and up', basis: 'secondary', why: 'Up to 25 mm the 2004 edition stops at 2D.' }
  return { sure: mm(Math.max(0.5 * D, 25), null), maybe: recent, how: '0.5D and up', basis: 'secondary', why: 'The 2004 edition does not go below 25 mm.' }
}
