/**
 * Prequalified groove details as far as they could be confirmed: Fig. 5.1 (complete penetration) and Fig. 5.2 (partial penetration).
 * Lengths are nominal inches with the printed millimetres beside them; every bound is inclusive. The list is not complete.
 */
import type { Basis } from '../../../schemas/assessment.ts'
import type { Joint, Process } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import type { Place } from '../positions.ts'

export type Groove = NonNullable<Joint['groove']>
export type JointType = Joint['type']

const WELD_TYPES: Readonly<Record<string, Groove>> = { '1': 'square', '2': 'single-v', '3': 'double-v', '4': 'single-bevel', '5': 'double-bevel', '6': 'single-u', '7': 'double-u', '8': 'single-j', '9': 'double-j', '10': 'flare-bevel', '11': 'flare-v' }
const JOINTS: Readonly<Record<string, JointType>> = { B: 'butt', T: 'tee', C: 'corner' }

export interface Designation { joints: JointType[]; penetration: 'full' | 'partial'; limited: boolean; groove: Groove; letter: string; processes: Process[] }

/** Reads `TC-U4a-GF`; null for a text that is no designation. */
export function readDesignation(text: string): Designation | null {
  const found = /^([BTC]{1,3})-([LUP])(1[01]|[1-9])([a-z]?)(?:-(S|G|F|GF))?$/.exec(text.trim())
  const groove = WELD_TYPES[found?.[3] ?? '']
  if (!found || !groove) return null
  const suffix = found[5] ?? ''
  return {
    joints: (['B', 'T', 'C'] as const).flatMap((letter) => (found[1]?.includes(letter) ? [JOINTS[letter] ?? 'butt'] : [])),
    penetration: found[2] === 'P' ? 'partial' : 'full',
    limited: found[2] === 'L',
    groove,
    letter: found[4] ?? '',
    processes: suffix === '' ? ['SMAW'] : suffix === 'S' ? ['SAW'] : [...suffix].map((letter) => (letter === 'G' ? 'GMAW' : 'FCAW')),
  }
}

/** A length as printed in both systems. */
export interface Printed { US: number; SI: number }
const inch = (US: number, SI: number): Printed => ({ US, SI })
const ZERO = inch(0, 0)
const SIXTEENTH = inch(1 / 16, 2)
const EIGHTH = inch(1 / 8, 3)
const QUARTER = inch(1 / 4, 6)

/** What may be added to and taken from a nominal value; null = not limited. */
export interface Tolerance { up: Printed | null; down: Printed | null }
interface Tolerances { detailed: { opening: Tolerance; face: Tolerance; angle: readonly [number, number] }; fitUp: { opening: Tolerance; face: Tolerance; angle: readonly [number, number] } }

const NONE: Tolerance = { up: ZERO, down: ZERO }
const FREE: Tolerance = { up: null, down: null }
const BACKED: Tolerances = {
  detailed: { opening: { up: SIXTEENTH, down: ZERO }, face: NONE, angle: [10, 0] },
  fitUp: { opening: { up: QUARTER, down: SIXTEENTH }, face: NONE, angle: [10, -5] },
}
const GOUGED: Tolerances = {
  detailed: { opening: { up: SIXTEENTH, down: ZERO }, face: { up: SIXTEENTH, down: ZERO }, angle: [10, 0] },
  fitUp: { opening: { up: SIXTEENTH, down: EIGHTH }, face: FREE, angle: [10, -5] },
}
const GOUGED_SAW: Tolerances = {
  detailed: { opening: NONE, face: { up: ZERO, down: EIGHTH }, angle: [10, 0] },
  fitUp: { opening: { up: QUARTER, down: ZERO }, face: { up: SIXTEENTH, down: SIXTEENTH }, angle: [10, -5] },
}
const SQUARE_SAW: Tolerances = {
  detailed: { opening: NONE, face: NONE, angle: [0, 0] },
  fitUp: { opening: { up: SIXTEENTH, down: ZERO }, face: NONE, angle: [0, 0] },
}
const U_GOUGED: Tolerances = { ...GOUGED, detailed: { opening: { up: SIXTEENTH, down: ZERO }, face: { up: SIXTEENTH, down: SIXTEENTH }, angle: [10, 0] } }
const partial = (up: Printed, down: Printed): Tolerances => ({
  detailed: { opening: NONE, face: { up: null, down: ZERO }, angle: [10, 0] },
  fitUp: { opening: { up, down }, face: { up: SIXTEENTH, down: SIXTEENTH }, angle: [10, -5] },
})

export interface Detail {
  code: string
  groove: Groove
  joints: readonly JointType[]
  penetration: 'full' | 'partial'
  processes: readonly Process[]
  /** Thickest base metal; null = unlimited. */
  most: Printed | null
  /** Thinnest base metal of a partial-penetration detail. */
  least: Printed | null
  /** `T` and `T/2` follow the thickness. */
  opening: readonly [Printed, Printed] | 'T' | 'T/2'
  face: readonly [Printed, Printed] | null
  angle: number | null
  places: readonly Place[]
  /** Whether FCAW must have an external gas; null = the line does not say. */
  gas: 'required' | 'not required' | null
  backed: boolean
  gouged: boolean
  /** Welded from both sides without backgouging. */
  bothSides?: boolean
  /** Least radius of a U or J groove, with what the drawing may add. */
  radius?: readonly [Printed, Printed]
  tolerances: Tolerances
  /** Weld size of a partial-penetration detail: groove depth less this, by place. */
  loss?: (place: Place) => Printed
  basis: Basis
}

const ALL: readonly Place[] = ['flat', 'horizontal', 'vertical', 'overhead']
const FLAT: readonly Place[] = ['flat']
const FVO: readonly Place[] = ['flat', 'vertical', 'overhead']

type Line = readonly [opening: Printed, angle: number, places: readonly Place[], gas?: Detail['gas']]

const designed = (code: string): Designation => {
  const read = readDesignation(code)
  if (!read) throw new RangeError(`${code} is no joint designation`)
  return read
}

const shape = (code: string): Pick<Detail, 'code' | 'groove' | 'joints' | 'penetration' | 'processes'> => {
  const { groove, joints, penetration, processes } = designed(code)
  return { code, groove, joints, penetration, processes }
}

const backed = (code: string, basis: Basis, lines: readonly Line[], most: Printed | null = null): Detail[] =>
  lines.map(([opening, angle, places, gas = null]) => ({ ...shape(code), most, least: null, opening: [opening, opening], face: null, angle, places, gas, backed: true, gouged: false, tolerances: BACKED, basis }))

const gouged = (code: string, basis: Basis, angle: number | null, more: Partial<Detail> = {}): Detail => ({ ...shape(code), most: null, least: null, opening: [ZERO, EIGHTH], face: [ZERO, EIGHTH], angle, places: ALL, gas: null, backed: false, gouged: true, tolerances: GOUGED, basis, ...more })
const sawGouged = (code: string, basis: Basis): Detail => gouged(code, basis, 60, { opening: [ZERO, ZERO], face: [ZERO, QUARTER], places: FLAT, tolerances: GOUGED_SAW })
const square = (code: string, basis: Basis, most: Printed, more: Partial<Detail>): Detail => ({ ...shape(code), most, least: null, opening: [ZERO, ZERO], face: null, angle: null, places: ALL, gas: null, backed: false, gouged: true, tolerances: GOUGED, basis, ...more })

const noLoss = (): Printed => ZERO
const eighthLoss = (): Printed => EIGHTH
const pjp = (code: string, least: Printed | null, face: Printed, angle: number, tolerances: Tolerances, loss: (place: Place) => Printed, places: readonly Place[] = ALL): Detail => ({ ...shape(code), most: null, least, opening: [ZERO, ZERO], face: [face, inch(Infinity, Infinity)], angle, places, gas: null, backed: false, gouged: false, tolerances, loss, basis: 'secondary' })
const PJP_WIDE = partial(EIGHTH, SIXTEENTH)
const PJP_SAW = partial(SIXTEENTH, ZERO)

/** 1/4 in., of which the drawing and the fit-up may each add 1/8 in. */
const U_RADIUS = [QUARTER, EIGHTH] as const
const R316 = inch(3 / 16, 5)
const R38 = inch(3 / 8, 10)
const R12 = inch(1 / 2, 12)

export const details: readonly Detail[] = [
  ...backed('TC-U4a', 'read', [[QUARTER, 45, ALL], [R38, 30, FVO]]),
  ...backed('TC-U4a-GF', 'read', [[R316, 30, ALL, 'required'], [R38, 30, FLAT, 'not required'], [QUARTER, 45, ALL, 'not required']]),
  ...backed('TC-U4a-S', 'read', [[R38, 30, FLAT], [QUARTER, 45, FLAT]]),
  ...backed('B-U2a', 'memory', [[QUARTER, 45, ALL], [R38, 30, FVO], [R12, 20, FVO]]),
  ...backed('B-U2a-GF', 'memory', [[R316, 30, FVO, 'required'], [R38, 30, FVO, 'not required'], [QUARTER, 45, FVO, 'not required']]),
  ...backed('B-L2a-S', 'memory', [[QUARTER, 30, FLAT]], inch(2, 50)),
  ...backed('B-U2-S', 'memory', [[inch(5 / 8, 16), 20, FLAT]]),
  ...backed('B-U4a', 'memory', [[QUARTER, 45, ALL], [R38, 30, ALL]]),
  square('B-L1a', 'secondary', QUARTER, { opening: 'T', backed: true, gouged: false, tolerances: BACKED }),
  square('C-L1a', 'secondary', QUARTER, { opening: 'T', backed: true, gouged: false, tolerances: BACKED }),
  square('B-L1a-GF', 'secondary', inch(3 / 8, 10), { opening: 'T', gas: 'not required', backed: true, gouged: false, tolerances: BACKED }),
  square('B-L1b', 'secondary', QUARTER, { opening: 'T/2' }),
  square('B-L1b-GF', 'secondary', inch(3 / 8, 10), { opening: [ZERO, EIGHTH] }),
  square('B-L1-S', 'secondary', inch(3 / 8, 10), { places: FLAT, gouged: false, bothSides: true, tolerances: SQUARE_SAW }),
  square('B-L1a-S', 'secondary', inch(5 / 8, 16), { places: FLAT, tolerances: SQUARE_SAW }),
  square('TC-L1b', 'secondary', QUARTER, { opening: 'T/2' }),
  square('TC-L1-GF', 'secondary', inch(3 / 8, 10), { opening: [ZERO, EIGHTH] }),
  square('TC-L1-S', 'secondary', inch(3 / 8, 10), { places: FLAT, tolerances: SQUARE_SAW }),
  gouged('B-U2', 'memory', 60),
  gouged('B-U2-GF', 'memory', 60),
  gouged('B-U4b', 'read', 45),
  gouged('B-U4b-GF', 'read', 45, { gas: 'not required' }),
  sawGouged('B-U4b-S', 'read'),
  gouged('TC-U4b', 'read', 45),
  gouged('TC-U4b-GF', 'read', 45),
  sawGouged('TC-U4b-S', 'read'),
  gouged('B-U3b', 'memory', 60),
  gouged('B-U3-GF', 'memory', 60),
  gouged('B-U6', 'secondary', 45, { face: [EIGHTH, EIGHTH], radius: U_RADIUS, tolerances: U_GOUGED }),
  gouged('B-U6', 'secondary', 20, { face: [EIGHTH, EIGHTH], radius: U_RADIUS, places: ['flat', 'overhead'], tolerances: U_GOUGED }),
  pjp('BC-P2', QUARTER, inch(1 / 32, 1), 60, PJP_WIDE, noLoss),
  pjp('BC-P2-GF', QUARTER, EIGHTH, 60, PJP_WIDE, noLoss),
  pjp('BC-P2-S', inch(7 / 16, 11), QUARTER, 60, PJP_SAW, noLoss, FLAT),
  pjp('BTC-P4', null, EIGHTH, 45, PJP_WIDE, eighthLoss),
  pjp('BTC-P4-GF', QUARTER, EIGHTH, 45, PJP_WIDE, (place) => (place === 'flat' || place === 'horizontal' ? ZERO : EIGHTH)),
  pjp('TC-P4-S', inch(7 / 16, 11), QUARTER, 60, PJP_SAW, noLoss, FLAT),
  pjp('BTC-P5', inch(5 / 16, 8), EIGHTH, 45, PJP_WIDE, () => QUARTER),
]

export interface FitUp { opening: { min: number; max: number } | null; face: { min: number; max: number } | null; angle: { min: number; max: number } | null }

const shift = (printed: Printed | null, system: UnitSystem): number => (printed === null ? Infinity : printed[system])

/**
 * What a fitter may find at assembly of a joint for which the drawing states these values.
 * @returns an end that is not limited is infinite; null where nothing was stated
 */
export function fitUp(detail: Detail, stated: { opening: number | null; face: number | null; angle: number | null }, system: UnitSystem): FitUp {
  const { opening, face, angle } = detail.tolerances.fitUp
  const reach = (value: number | null, tolerance: Tolerance): { min: number; max: number } | null => (value === null ? null : { min: Math.max(0, value - shift(tolerance.down, system)), max: value + shift(tolerance.up, system) })
  return {
    opening: reach(stated.opening, opening),
    face: reach(stated.face, face),
    angle: stated.angle === null ? null : { min: stated.angle + angle[1], max: stated.angle + angle[0] },
  }
}

/** Weld size of a partial-penetration groove: its depth less what the detail takes off in that position; null for other details. */
export const weldSize = (detail: Detail, depth: number, place: Place, system: UnitSystem): number | null => (detail.loss ? Math.max(0, depth - detail.loss(place)[system]) : null)
