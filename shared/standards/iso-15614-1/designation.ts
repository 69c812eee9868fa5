/** What a filler designation tells of strength, covering, composition and hydrogen. */
import type { Filler } from '../../schemas/welding.ts'
import { sameText } from '../common/reading.ts'

interface Designation { system: 'ISO' | 'AWS'; key: string; hydrogen: number | null }

/** Basic coverings of one strength stand for each other; `I1` marks the suffix -1 for better impact values. */
const BASIC = /^(E\d{2,3})(?:15|16|18|48)(?=$|[A-Z])/

const HYDROGEN = /H(\d{1,2})R?$/

/**
 * A designation as the clause compares it: without hydrogen, and of covered electrodes without recovery and position digits or between basic
 * coverings. `E 42 4 B 42 H5` → `E424B`, hydrogen 5.
 * @returns null where none is recorded
 */
export function designation(filler: Filler): Designation | null {
  const raw = filler.classification?.trim()
  if (!raw) return null
  const system = /^(?:ISO|EN)/i.test(filler.specification ?? '') || /^[EGWTSF]\s+\d{2}/i.test(raw) ? 'ISO' : 'AWS'
  const text = sameText(raw.replace(/(?<=^E\d{4,5})-1(?!\d)/i, 'I1').replace(/^(?:EN\s+)?ISO\s+\d+(?:-[AB])?\s*[-:]?\s*/i, ''))
  const hydrogen = HYDROGEN.exec(text)?.[1]
  const bare = text.replace(HYDROGEN, '').replace(/(?<=\d)R$/, '')
  const covered = system === 'ISO' ? /^(E\d{2}[A-Z0-9].*?(?:RA|RB|RC|RR|A|B|C|R))\d{1,2}$/.exec(bare)?.[1] : undefined
  const key = covered ?? (system === 'AWS' ? bare.replace(BASIC, '$1 basic') : bare)
  return { system, key, hydrogen: hydrogen === undefined ? null : Number(hydrogen) }
}
