/** The stored values of a record in the trade's words, for print. */
import type { CouponState, RevisionState, Signature } from '@shared/schemas/records.ts'
import type { Assessment, Basis, VariableClass } from '@shared/schemas/assessment.ts'
import type { GasMixture, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'

type Joint = WeldingVariables['joint']
type Electrical = ProcessBlock['electrical']
type Words<T extends string | null> = Readonly<Record<Exclude<T, null>, string>>

export const STANDARD_NAME: Words<Assessment['standard']> = { 'asme-ix': 'ASME BPVC.IX', 'aws-d1-1': 'AWS D1.1', 'aws-d1-2': 'AWS D1.2', 'iso-15614-1': 'ISO 15614-1', 'iso-15614-2': 'ISO 15614-2' }
export const STATE_WORD: Words<RevisionState> = { draft: 'draft', 'in-review': 'in review', approved: 'approved', superseded: 'superseded', withdrawn: 'withdrawn' }
export const COUPON_STATE_WORD: Words<CouponState> = { planned: 'planned', welding: 'welding', testing: 'testing', certified: 'certified', rejected: 'rejected' }
export const CLASS_WORD: Words<VariableClass> = { essential: 'essential', supplementary: 'supplementary essential', nonessential: 'nonessential', 'not-a-variable': 'not a variable here' }
export const BASIS_WORD: Words<Basis> = { read: 'read', secondary: 'secondary', memory: 'memory: confirm in your edition', 'common-practice': 'common practice' }
export const MEANING_WORD: Words<Signature['meaning']> = { authored: 'Authored', reviewed: 'Reviewed', approved: 'Approved', certified: 'Certified', withdrawn: 'Withdrawn', rejected: 'Rejected', returned: 'Returned' }

export const JOINT_TYPE: Words<Joint['type']> = { butt: 'butt joint', tee: 'tee joint', corner: 'corner joint', lap: 'lap joint', edge: 'edge joint' }
export const GROOVE: Words<Joint['groove']> = { square: 'square', 'single-v': 'single-V', 'double-v': 'double-V', 'single-bevel': 'single-bevel', 'double-bevel': 'double-bevel', 'single-u': 'single-U', 'double-u': 'double-U', 'single-j': 'single-J', 'double-j': 'double-J', 'compound-v': 'compound V', 'flare-bevel': 'flare bevel', 'flare-v': 'flare V' }
export const BACKING: Words<Joint['backing']> = { none: 'no backing', metal: 'metal', 'weld-metal': 'weld metal', ceramic: 'ceramic', flux: 'flux', 'consumable-insert': 'consumable insert' }
export const BACK_GOUGING: Words<Joint['backGouging']> = { none: 'none', grinding: 'grinding', 'arc-gouging': 'arc gouging', machining: 'machining', chipping: 'chipping' }
export const WORK = { repair: 'repair', 'build-up': 'build-up' } as const
export const ALIGNMENT = { 'root-side': 'flush on the root side', 'face-side': 'flush on the face side', centred: 'centred' } as const
export const BRANCH = { 'set-on': 'set-on', 'set-in': 'set-in', 'set-through': 'set-through' } as const
export const AGEING = { natural: 'natural', artificial: 'artificial' } as const
export const HEAT_QUANTITY = { 'arc-energy': 'arc energy, U · I / v', 'heat-input': 'heat input, with factor k' } as const
export const NDT_METHOD = { VT: 'visual', RT: 'radiography', UT: 'ultrasonics', PT: 'penetrant', MT: 'magnetic particle' } as const
export const PRODUCT: Words<WeldingVariables['product']> = { plate: 'plate', pipe: 'pipe', 'plate-and-pipe': 'plate and pipe' }
export const PWHT: Words<WeldingVariables['pwht']['condition']> = {
  none: 'none', 'below-lower-transformation': 'below the lower transformation temperature', 'above-upper-transformation': 'above the upper transformation temperature',
  'above-upper-then-below-lower': 'above the upper, then below the lower transformation temperature', 'between-transformations': 'between the transformation temperatures', 'within-range': 'within a stated temperature range', 'solution-anneal': 'solution annealed',
}
export const MECHANISATION: Words<ProcessBlock['mechanisation']> = { manual: 'manual', semiautomatic: 'semiautomatic', machine: 'machine', automatic: 'automatic' }
export const PROGRESSION: Words<ProcessBlock['progression']> = { up: 'uphill', down: 'downhill', both: 'uphill and downhill' }
export const PRODUCT_FORM: Words<ProcessBlock['filler']['productForm']> = { 'covered-electrode': 'covered electrode', solid: 'solid wire or rod', 'metal-cored': 'metal-cored wire', 'flux-cored': 'flux-cored wire', powder: 'powder', insert: 'insert' }
export const CURRENT_TYPE: Words<Electrical['currentType']> = { DCEP: 'DCEP', DCEN: 'DCEN', AC: 'AC', 'AC-balanced': 'AC, balanced wave' }
export const TRANSFER: Words<Electrical['transferMode']> = { 'short-circuiting': 'short-circuiting', globular: 'globular', spray: 'spray', 'pulsed-spray': 'pulsed spray' }
export const POWER_SOURCE: Words<Electrical['powerSource']> = { 'constant-voltage': 'constant voltage', 'constant-current': 'constant current' }
export const HEAT_METHOD: Words<Electrical['heatInputMethod']> = { meter: 'from mean volts, amps and travel speed', volume: 'from the volume of weld metal', 'instantaneous-energy': 'from instantaneous energy', 'instantaneous-power': 'from instantaneous power' }
export const LAYER: Words<ProcessBlock['passes'][number]['layer']> = { root: 'root', hot: 'hot', fill: 'fill', cap: 'cap', backing: 'backing', fillet: 'fillet' }
export const TENSION_KIND = { 'reduced-section': 'reduced section', turned: 'turned', 'full-section': 'full section' } as const
export const BEND_KIND = { face: 'face', root: 'root', side: 'side', 'longitudinal-face': 'longitudinal face', 'longitudinal-root': 'longitudinal root' } as const
export const PLACE = { weld: 'weld metal', 'fusion-line': 'fusion line', 'heat-affected-zone': 'heat-affected zone', 'base-metal': 'base metal' } as const

export const yesNo = (value: boolean | null | undefined): string => (value === null || value === undefined ? '' : value ? 'yes' : 'no')

/** Looks a stored value up in its words; '' for nothing stored. */
export const said = <T extends string>(words: Readonly<Record<T, string>>, value: T | null | undefined): string => (value ? words[value] : '')

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

/** A process with its transfer and mechanisation, e.g. "GMAW-P, semiautomatic". */
export function processName(block: ProcessBlock): string {
  const process = block.process === 'GMAW' && (block.electrical.transferMode === 'pulsed-spray' || block.electrical.pulsed) ? 'GMAW-P' : (block.process ?? 'process not stated')
  return [process, said(MECHANISATION, block.mechanisation)].filter(Boolean).join(', ')
}

/** A gas mixture by its parts: "82 % Ar + 18 % CO2 (ISO 14175 M21)". */
export function gasName(gas: GasMixture | null): string {
  if (!gas) return ''
  const parts = gas.components.map((part) => (part.percent === 100 ? `${part.gas} 100 %` : `${part.percent} % ${part.gas}`)).join(' + ')
  const symbol = gas.isoSymbol ? `ISO 14175 ${gas.isoSymbol}` : ''
  return [parts || gas.name || '', [parts ? gas.name : '', symbol].filter(Boolean).join(', ')].filter(Boolean).map((text, index) => (index === 1 ? `(${text})` : text)).join(' ')
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec']
/** An ISO date or date-time as "18 Nov 2026"; no clock and no local zone is read. */
export function dateWords(iso: string | null | undefined): string {
  if (!iso) return ''
  const [year, month, day] = iso.slice(0, 10).split('-').map(Number)
  return `${day}\u00a0${MONTHS[(month ?? 1) - 1]}\u00a0${year}`
}

/** A date-time as "18 Nov 2026, 14:05:09 UTC". */
export function timeWords(iso: string): string {
  const utc = new Date(iso).toISOString()
  return `${dateWords(utc)}, ${utc.slice(11, 19)} UTC`
}
