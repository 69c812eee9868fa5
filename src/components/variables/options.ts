/** The named values of a weld's variables, as people read them. */
import { STANDARD_IDS, type StandardChoice, type StandardId } from '@shared/schemas/common.ts'
import { POSITIONS, PROCESSES, type Position } from '@shared/schemas/welding.ts'
import { standards } from '@shared/standards/index.ts'
import type { Option } from '@/components/fields/text.tsx'

const options = (words: Readonly<Record<string, string>>): readonly Option[] => Object.entries(words).map(([value, label]) => ({ value, label }))

export const WELDS = options({ groove: 'Groove', fillet: 'Fillet' })
export const JOINT_TYPES = options({ butt: 'Butt', tee: 'Tee', corner: 'Corner', lap: 'Lap', edge: 'Edge' })
export const WORKS = options({ repair: 'Repair', 'build-up': 'Build-up' })
export const BRANCHES = options({ 'set-on': 'Set-on', 'set-in': 'Set-in', 'set-through': 'Set-through' })
export const AGEINGS = options({ natural: 'Natural', artificial: 'Artificial' })
export const HEAT_INPUT_QUANTITIES = options({ 'arc-energy': 'Arc energy, U · I ÷ v', 'heat-input': 'Heat input, with factor k' })
export const LEVELS = options({ '2': 'Level 2', '1': 'Level 1' })
export const ROUTE_OPTIONS = options({ test: 'By test', prequalified: 'Prequalified' })
export const PENETRATIONS = options({ full: 'Complete', partial: 'Partial' })
export const GROOVES = options({
  square: 'Square', 'single-v': 'Single V', 'double-v': 'Double V', 'single-bevel': 'Single bevel', 'double-bevel': 'Double bevel', 'single-u': 'Single U', 'double-u': 'Double U',
  'single-j': 'Single J', 'double-j': 'Double J', 'compound-v': 'Compound V', 'flare-bevel': 'Flare bevel', 'flare-v': 'Flare V',
})
export const BACKINGS = options({ none: 'None', metal: 'Metal', 'weld-metal': 'Weld metal', ceramic: 'Ceramic', flux: 'Flux', 'consumable-insert': 'Consumable insert' })
export const GOUGINGS = options({ none: 'None', grinding: 'Grinding', 'arc-gouging': 'Arc gouging', machining: 'Machining', chipping: 'Chipping' })
export const ALIGNMENTS = options({ 'root-side': 'Flush on the root side', 'face-side': 'Flush on the face side', centred: 'Centred' })
export const PRODUCTS = options({ plate: 'Plate', pipe: 'Pipe', 'plate-and-pipe': 'Plate and pipe' })
export const MECHANISATIONS = options({ manual: 'Manual', semiautomatic: 'Semiautomatic', machine: 'Machine', automatic: 'Automatic' })
export const PROGRESSIONS = options({ up: 'Up', down: 'Down', both: 'Up or down' })
export const PRODUCT_FORMS = options({ 'covered-electrode': 'Covered electrode', solid: 'Solid wire or rod', 'metal-cored': 'Metal-cored', 'flux-cored': 'Flux-cored', powder: 'Powder', insert: 'Insert' })
export const FLUX_TYPES = options({ active: 'Active', neutral: 'Neutral', alloy: 'Alloy' })
export const CURRENT_TYPES = options({ DCEP: 'DC, electrode positive', DCEN: 'DC, electrode negative', AC: 'AC', 'AC-balanced': 'AC, balanced wave' })
export const TRANSFER_MODES = options({ 'short-circuiting': 'Short-circuiting', globular: 'Globular', spray: 'Spray', 'pulsed-spray': 'Pulsed spray' })
export const POWER_SOURCES = options({ 'constant-voltage': 'Constant voltage', 'constant-current': 'Constant current' })
export const HEAT_INPUT_METHODS = options({ meter: 'Volts × amps ÷ travel', volume: 'Weld metal volume', 'instantaneous-energy': 'Instantaneous energy', 'instantaneous-power': 'Instantaneous power' })
export const BEADS = options({ stringer: 'Stringer', weave: 'Weave', both: 'Stringer or weave' })
export const SINGLE_MULTIPLE = options({ single: 'Single', multiple: 'Multiple' })
export const PEENINGS = options({ none: 'None', used: 'Used' })
export const KEYHOLES = options({ 'melt-in': 'Melt-in', keyhole: 'Keyhole' })
export const LAYERS = options({ root: 'Root', hot: 'Hot', fill: 'Fill', cap: 'Cap', backing: 'Backing', fillet: 'Fillet' })
export const PWHTS = options({
  none: 'None', 'below-lower-transformation': 'Below the lower transformation', 'above-upper-transformation': 'Above the upper transformation',
  'above-upper-then-below-lower': 'Above the upper, then below the lower', 'between-transformations': 'Between the transformations', 'within-range': 'Within a stated range', 'solution-anneal': 'Solution anneal',
})
export const UNIT_SYSTEMS = options({ SI: 'SI: mm, °C', US: 'US customary: in, °F' })
export const PROCESS_OPTIONS: readonly Option[] = PROCESSES.map((value) => ({ value, label: value === 'OTHER' ? 'Another process' : value }))

const isPipeOnly = (position: Position) => ['5G', '6G', '6GR', '5F'].includes(position)
/** Positions of a groove or a fillet; pipe positions only where pipe is welded. A groove's may be asked of a fillet procedure too, so `chosen` ones stay. */
export const positionsFor = (weld: 'groove' | 'fillet', product: 'plate' | 'pipe' | 'plate-and-pipe', chosen: readonly Position[]): { value: Position }[] =>
  POSITIONS.filter((position) => chosen.includes(position) || (position.includes(weld === 'groove' ? 'G' : 'F') && (product !== 'plate' || !isPipeOnly(position)))).map((value) => ({ value }))

/** The word of a named value; the value itself where it has none. */
export const wordOf = (list: readonly Option[], value: string): string => list.find((option) => option.value === value)?.label ?? value

const NAMES: Record<StandardId, string> = { 'asme-ix': 'ASME BPVC.IX', 'aws-d1-1': 'AWS D1.1', 'aws-d1-2': 'AWS D1.2', 'iso-15614-1': 'ISO 15614-1', 'iso-15614-2': 'ISO 15614-2' }
const known = (value: string): StandardId | undefined => STANDARD_IDS.find((id) => id === value)
/** A standard's name, whether or not its rules are in the program yet; the text itself when it is none. */
export const standardName = (value: string): string => {
  const id = known(value)
  return id ? NAMES[id] : value
}
/** A standard as it was chosen, in one line: "ISO 15614-1 2017+A1:2019, level 2". */
export const choiceInWords = ({ standard, edition, level, route }: StandardChoice): string =>
  [`${standardName(standard)} ${edition}`, level && `level ${level}`, route === 'prequalified' && 'prequalified'].filter(Boolean).join(', ')
/** The standard that qualifies a procedure at one of two levels. */
export const hasLevels = (standard: StandardId): boolean => standard === 'iso-15614-1'
/** Standards whose rules the program keeps, each with its editions, newest first. */
export const STANDARDS = standards.map(({ id, editions, routes }) => ({ id, label: NAMES[id], routes: routes ?? ['test'], editions: editions.map((edition) => ({ value: edition.id, label: edition.label })) }))
/** A standard newly chosen: its newest edition, and the level that applies where none is named. */
export const freshChoice = (id: StandardId): StandardChoice => ({ standard: id, edition: STANDARDS.find((one) => one.id === id)?.editions.at(-1)?.value ?? '', level: hasLevels(id) ? '2' : null })
