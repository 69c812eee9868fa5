/** The spellings in which people write units, led back to the names of units/convert.ts. */
import { UNITS } from './convert.ts'
import type { Dimension } from './types.ts'

/** Words and signs that mean the same in every dimension, rewritten in this order on a lower-case text without spaces and full stops. */
const REWRITES: readonly (readonly [RegExp, string])[] = [
  [/[³]|\^3/g, '3'],
  [/[²]|\^2/g, '2'],
  [/[µμ]/g, 'u'],
  [/℃/g, 'c'],
  [/℉/g, 'f'],
  [/degrees?|deg|[°º]/g, ''],
  [/celsius|centigrade/g, 'c'],
  [/fahrenheit/g, 'f'],
  [/kelvins?/g, 'k'],
  [/millimet(?:re|er)s?/g, 'mm'],
  [/centimet(?:re|er)s?/g, 'cm'],
  [/\bmet(?:re|er)s?/g, 'm'],
  [/inches|inch|''|"/g, 'in'],
  [/feet|foot|'/g, 'ft'],
  [/cubicft|cuft/g, 'ft3'],
  [/lit(?:re|er)s?|ltr/g, 'l'],
  [/minutes?|mins/g, 'min'],
  [/seconds?|secs?/g, 's'],
  [/hours?|hrs?/g, 'h'],
  [/per(?!cent)/g, '/'],
  [/kilojoules?/g, 'kj'],
  [/joules?/g, 'j'],
  [/amp(?:ere)?s?/g, 'a'],
  [/volts?/g, 'v'],
  [/hertz/g, 'hz'],
  [/percent|pct/g, '%'],
  [/[·*-]/g, ''],
]

/** Short forms of the trade that are not a unit's own name. */
const SHORT_FORMS: { readonly [D in Dimension]?: Readonly<Record<string, string>> } = {
  travelSpeed: { ipm: 'in/min', mmpm: 'mm/min', cmpm: 'cm/min', mpm: 'm/min' },
  wireFeed: { ipm: 'in/min', mmpm: 'mm/min', cmpm: 'cm/min', mpm: 'm/min' },
  gasFlow: { cfh: 'ft³/h', scfh: 'ft³/h', lpm: 'L/min' },
  force: { lb: 'lbf', lbs: 'lbf', kips: 'kip' },
  energy: { ftlb: 'ft·lbf', ftlbs: 'ft·lbf' },
  mass: { lbs: 'lb' },
  angle: { '': '°' },
  hardness: { hv10: 'HV', hv5: 'HV' },
}

const plain = (text: string): string => REWRITES.reduce((result, [pattern, by]) => result.replace(pattern, by), text.toLowerCase().replace(/[\s.]/g, ''))

const spellings = new Map<Dimension, ReadonlyMap<string, string>>()
function spellingsOf(dimension: Dimension): ReadonlyMap<string, string> {
  let known = spellings.get(dimension)
  if (!known) {
    known = new Map([...Object.keys(UNITS[dimension]).map((unit) => [plain(unit), unit] as const), ...Object.entries(SHORT_FORMS[dimension] ?? {})])
    spellings.set(dimension, known)
  }
  return known
}

/**
 * The unit that `text` spells, e.g. `in.`, `inch` and `"` → `in`, `cfh` → `ft³/h`.
 * @returns the unit's name as in `UNITS[dimension]`; null when it measures something else or is not known;
 * undefined when the text leaves the unit open (`200°` without C or F)
 */
export function unitSpelt(text: string, dimension: Dimension): string | null | undefined {
  const key = plain(text)
  const unit = spellingsOf(dimension).get(key)
  if (unit !== undefined) return unit
  return key === '' ? undefined : null
}

/** The dimensions that a spelling would measure, for "that is a voltage" messages. */
export const dimensionsOf = (text: string): Dimension[] => (Object.keys(UNITS) as Dimension[]).filter((dimension) => plain(text) !== '' && typeof unitSpelt(text, dimension) === 'string')
