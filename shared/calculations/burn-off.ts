/**
 * Wire feed against mean current: feed = α I + β l I² (anode heating, and resistance heating of the electrode extension).
 * The constants are recalled textbook figures and differ by some 15 % from any one wire: starting data that a shop overrides by its own points.
 */
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const burnOffSource: Source = { standard: 'Burn-off relation', edition: '', clause: '', basis: 'memory', note: 'Textbook constants for 1.2 mm wire, recalled; other diameters scaled by wire section.' }

export const BURN_OFF_MATERIALS = ['carbon-steel', 'aluminium'] as const
export type BurnOffMaterial = (typeof BURN_OFF_MATERIALS)[number]
export interface BurnOffConstants { /** mm/(A·s) */ alpha: number; /** 1/(A²·s) */ beta: number }
/** Of 1.2 mm wire. No constant is known for stainless steel: α lies close to carbon steel, β a third to a half higher. */
const AT_1_2: Readonly<Record<BurnOffMaterial, BurnOffConstants>> = { 'carbon-steel': { alpha: 0.3, beta: 5e-5 }, aluminium: { alpha: 0.75, beta: 0 } }
/** Diameters for which the reference states scaled constants, mm. */
export const BURN_OFF_DIAMETERS: Readonly<Record<BurnOffMaterial, readonly number[]>> = { 'carbon-steel': [0.6, 0.8, 0.9, 1.0, 1.2], aluminium: [0.8, 0.9, 1.0, 1.2] }

/** Constants of another diameter: α goes with 1/section, β with 1/section². mm in. */
export function burnOffConstants(material: BurnOffMaterial, diameter: number): BurnOffConstants {
  const { alpha, beta } = AT_1_2[material]
  return { alpha: alpha * (1.2 / diameter) ** 2, beta: beta * (1.2 / diameter) ** 4 }
}

export interface Wire {
  material: BurnOffMaterial
  /** mm */
  diameter: number
  /** Electrode extension, mm. */
  extension: number
  /** The shop's own, in place of the textbook ones. */
  constants?: BurnOffConstants
}
export interface BurnOffFigures { wireFeed: number; current: number; alpha: number; beta: number }

function opened(wire: Wire) {
  const sheet = worksheet(burnOffSource, { advisory: true })
  sheet.need('diameter', 'Wire diameter', wire.diameter, { above: 0, unit: 'mm' })
  sheet.need('extension', 'Electrode extension', wire.extension, { least: 0, unit: 'mm' })
  if (wire.constants) {
    sheet.need('alpha', 'Constant α', wire.constants.alpha, { above: 0, unit: 'mm/(A·s)' })
    sheet.need('beta', 'Constant β', wire.constants.beta, { least: 0, unit: '1/(A²·s)' })
  }
  const { alpha, beta } = wire.constants ?? burnOffConstants(wire.material, wire.diameter)
  return { sheet, alpha, beta }
}

function limits(sheet: ReturnType<typeof worksheet>, wire: Wire): void {
  sheet.within('Electrode extension', wire.extension, 10, 25, 'mm')
  const sizes = BURN_OFF_DIAMETERS[wire.material]
  if (!wire.constants) sheet.within('Wire diameter', wire.diameter, Math.min(...sizes), Math.max(...sizes), 'mm')
  sheet.note('Good to about 15 %; for spray and pulsed spray only, not for short circuits.')
  if (wire.material === 'aluminium' && !wire.constants) sheet.note('One constant for all aluminium wires: alloys differ in burn-off, so set 4043 and 5356 each by its own trial.')
}

/**
 * Wire feed for a mean current.
 * @param given A; `rmsCurrent` of a pulsed wave goes into the squared term
 * @returns m/min
 */
export function wireFeedFromCurrent(wire: Wire & { current: number; rmsCurrent?: number | null }): Calculation<BurnOffFigures> {
  const { sheet, alpha, beta } = opened(wire)
  sheet.need('current', 'Current', wire.current, { above: 0, unit: 'A' })
  const rms = wire.rmsCurrent ?? wire.current
  if (wire.rmsCurrent !== undefined && wire.rmsCurrent !== null) sheet.need('rmsCurrent', 'RMS current', wire.rmsCurrent, { above: 0, unit: 'A' })
  if (!sheet.refused && rms < wire.current) sheet.refuse('rmsCurrent', `RMS current of ${written(rms)} A can't be below the mean of ${written(wire.current)} A.`)
  if (sheet.refused) return sheet.stop('m/min')
  limits(sheet, wire)
  const mmPerS = sheet.step('wire feed', 'α × I + β × extension × I²', `${written(alpha)} × ${written(wire.current)} + ${written(beta)} × ${written(wire.extension)} × ${written(rms)}²`, alpha * wire.current + beta * wire.extension * rms ** 2, 'mm/s')
  const wireFeed = sheet.step('in metres a minute', 'mm/s × 60 / 1000', `${written(mmPerS)} × 0.06`, mmPerS * 0.06, 'm/min')
  return sheet.done('m/min', wireFeed, { wireFeed, current: wire.current, alpha, beta })
}

/**
 * Mean current at a wire feed: the positive root of β l I² + α I − feed = 0.
 * @param given m/min
 * @returns A
 */
export function currentFromWireFeed(wire: Wire & { wireFeed: number }): Calculation<BurnOffFigures> {
  const { sheet, alpha, beta } = opened(wire)
  sheet.need('wireFeed', 'Wire feed', wire.wireFeed, { above: 0, unit: 'm/min' })
  if (sheet.refused) return sheet.stop('A')
  limits(sheet, wire)
  const feed = sheet.step('feed', 'm/min / 0.06', `${written(wire.wireFeed)} / 0.06`, wire.wireFeed / 0.06, 'mm/s')
  const bl = beta * wire.extension
  // The rationalised root has no cancellation and holds at β = 0 as well.
  const current = sheet.step('current', bl === 0 ? 'feed / α' : '(−α + √(α² + 4 β l feed)) / (2 β l)', bl === 0 ? `${written(feed)} / ${written(alpha)}` : `(−${written(alpha)} + √(${written(alpha)}² + 4 × ${written(bl)} × ${written(feed)})) / (2 × ${written(bl)})`, (2 * feed) / (alpha + Math.sqrt(alpha ** 2 + 4 * bl * feed)), 'A')
  return sheet.done('A', current, { wireFeed: wire.wireFeed, current, alpha, beta })
}

/** Points of a wire's curve, for drawing: m/min at each current. Empty for a wire that can't be. */
export const wireFeedCurve = (wire: Wire, currents: readonly number[]): { current: number; wireFeed: number }[] =>
  currents.flatMap((current) => {
    const { value } = wireFeedFromCurrent({ ...wire, current })
    return value === null ? [] : [{ current, wireFeed: value }]
  })

const shopSource: Source = { standard: 'Shop rule for steel, short arc, argon with CO2', edition: '', clause: '', basis: 'secondary', note: 'Typical-settings pages of several machine manuals: one ampere for each 0.001 in of plate. Starting values only.' }
/** in/min per ampere, and the current range of the manuals, by wire (in and nominal mm). */
export const SHOP_WIRES: readonly { inch: number; mm: number; inPerMinPerAmpere: number; from: number; to: number }[] = [
  { inch: 0.024, mm: 0.6, inPerMinPerAmpere: 3.5, from: 30, to: 90 },
  { inch: 0.03, mm: 0.8, inPerMinPerAmpere: 2, from: 40, to: 145 },
  { inch: 0.035, mm: 0.9, inPerMinPerAmpere: 1.6, from: 50, to: 180 },
  { inch: 0.045, mm: 1.2, inPerMinPerAmpere: 1, from: 75, to: 250 },
]

/**
 * First settings for a plate by the shop rule.
 * @param given plate thickness mm, wire one of `SHOP_WIRES` by nominal mm
 * @returns `value` is the current, A; wire feed in m/min
 */
export function shopSettings({ thickness, wire }: { thickness: number; wire: number }): Calculation<{ current: number; wireFeed: number; wireFeedInPerMin: number }> {
  const sheet = worksheet(shopSource, { advisory: true })
  sheet.need('thickness', 'Plate thickness', thickness, { above: 0, unit: 'mm' })
  const row = SHOP_WIRES.find(({ mm }) => mm === wire)
  if (!row) sheet.refuse('wire', `Wire of ${written(wire)} mm has no shop rule; those known are ${SHOP_WIRES.map(({ mm }) => mm).join(', ')} mm.`)
  if (sheet.refused || !row) return sheet.stop('A')
  const current = sheet.step('current', '1 A for each 0.001 in of plate', `${written(thickness)} / 25.4 × 1000`, (thickness / 25.4) * 1000, 'A')
  sheet.within('Current', current, row.from, row.to, 'A')
  const wireFeedInPerMin = sheet.step('wire feed', `${row.inPerMinPerAmpere} in/min for each ampere`, `${row.inPerMinPerAmpere} × ${written(current)}`, row.inPerMinPerAmpere * current, 'in/min')
  return sheet.done('A', current, { current, wireFeed: wireFeedInPerMin * 0.0254, wireFeedInPerMin })
}

const spraySource: Source = { standard: 'Least current for spray transfer', edition: '', clause: '', basis: 'secondary', note: 'Table of a filler maker’s handbook; a current at or above the figure counts as spray.' }
/** A, by wire diameter in inches. */
export const SPRAY_TRANSITION: readonly { id: string; wire: string; gas: string; least: Readonly<Record<string, number>> }[] = [
  { id: 'mild-steel', wire: 'Mild steel', gas: 'argon with 2 % oxygen', least: { '0.030': 150, '0.035': 165, '0.045': 220, '0.052': 240, '1/16': 275 } },
  { id: 'stainless', wire: 'Stainless steel', gas: 'argon with 1 % oxygen', least: { '0.035': 170, '0.045': 225, '1/16': 285 } },
  { id: 'aluminium', wire: 'Aluminium', gas: 'argon', least: { '0.030': 95, '0.045': 135, '1/16': 180 } },
  { id: 'copper', wire: 'Deoxidised copper', gas: 'argon', least: { '0.035': 180, '0.045': 210, '1/16': 310 } },
  { id: 'silicon-bronze', wire: 'Silicon bronze', gas: 'argon', least: { '0.035': 165, '0.045': 205, '1/16': 270 } },
]

/**
 * Whether a current reaches spray transfer.
 * @returns `value` is the least spray current, A; null where the table has none for that wire
 */
export function sprayTransition({ wire, diameter, current = null }: { wire: string; diameter: string; current?: number | null }): Calculation<{ least: number | null; spray: boolean | null }> {
  const sheet = worksheet(spraySource, { advisory: true })
  const row = SPRAY_TRANSITION.find(({ id }) => id === wire)
  if (!row) sheet.refuse('wire', 'This wire material has no row in the table.')
  if (current !== null) sheet.need('current', 'Current', current, { least: 0, unit: 'A' })
  if (sheet.refused || !row) return sheet.stop('A')
  const least = row.least[diameter] ?? null
  if (least === null) sheet.outside(`The table gives no figure for ${row.wire.toLowerCase()} wire of ${diameter} in; it has ${Object.keys(row.least).join(', ')} in.`)
  else sheet.step('least current for spray', `table, ${row.wire.toLowerCase()}, ${row.gas}`, `${diameter} in`, least, 'A')
  sheet.note('With CO2 in the mixture the transition rises, and above some 18 to 20 % true spray is hard to reach.')
  return sheet.done('A', least, { least, spray: least === null || current === null ? null : current >= least })
}
