/** One coupon judged under every standard that the program keeps, variable by variable, side by side. */
import { fieldLabel, fieldPattern } from '../comparison/fields.ts'
import type { AssessedCoupon, Basis, CouponQualification, QualifiedRange, QualifiedSpan, Segment } from '../schemas/assessment.ts'
import type { StandardId } from '../schemas/common.ts'
import type { SideBySide, SideCell, SideRow } from '../schemas/standards.ts'
import type { Process, ProcessBlock } from '../schemas/welding.ts'
import { weakest } from '../standards/common/rule-kinds.ts'
import { capital, list, show, showSpan } from '../standards/common/wording.ts'
import { standards as registered } from '../standards/index.ts'
import type { Rule, Standard } from '../standards/rule.ts'
import { qualifyCoupon } from './assess.ts'

export interface UnderStandard {
  standard: StandardId
  /** The edition that the coupon names, else the newest kept; null where the one it names is not kept. */
  edition: string | null
  qualification: CouponQualification | null
  /** Why nothing can be told; null where it was judged. */
  reason: string | null
}

/** Variables in the order in which they are read, each by the fields at which the rules of the standards stand. */
const VARIABLES: readonly (readonly [variable: string, label: string, fields: RegExp])[] = [
  ['process', 'Welding process', /^processes\.\*\.process$/],
  ['mechanisation', 'Mechanisation', /^processes\.\*\.mechanisation$/],
  ['weld', 'Groove or fillet', /^joint\.(weld|type|penetration|pressureRetaining|work|branch|branchAngle)$/],
  ['fillet', 'Fillet size', /^joint\.fillet/],
  ['groups', 'Base metal groups', /^baseMetals/],
  ['thickness', 'Base metal thickness', /^thickness(B)?$/],
  ['deposit', 'Deposited weld metal', /^processes\.\*\.depositThickness$/],
  ['pass', 'Pass thickness', /^processes\.\*\.(maxPassThickness|technique\.passesPerSide)$/],
  ['diameter', 'Outside diameter', /^(diameter(B)?|pipeRotated|product)$/],
  ['filler', 'Filler metal and flux', /^processes\.\*\.filler/],
  ['positions', 'Positions and progression', /^processes\.\*\.(positions|progression)$/],
  ['joint', 'Joint details', /^joint/],
  ['preheat', 'Preheat minimum', /^preheat\.(minimum|maintenance|method)$|^preheat$/],
  ['interpass', 'Interpass maximum', /^preheat\.interpassMaximum$/],
  ['postHeating', 'Post-heating', /^postHeating/],
  ['pwht', 'PWHT', /^pwht/],
  ['gas', 'Gas', /^processes\.\*\.(shielding|backing|trailing|plasma)Gas/],
  ['current', 'Current and polarity', /^processes\.\*\.electrical\.(currentType|current|makerCurrent|pulse|pulsed|background|peak|ac|waveformControlled|powerSource)/],
  ['transfer', 'Transfer mode', /^processes\.\*\.electrical\.transferMode$/],
  ['voltage', 'Voltage', /^processes\.\*\.electrical\.voltage$/],
  ['wireFeed', 'Wire feed speed', /^processes\.\*\.electrical\.wireFeed$/],
  ['travelSpeed', 'Travel speed', /^processes\.\*\.electrical\.travelSpeed$/],
  ['heatInput', 'Heat input', /^processes\.\*\.electrical\.heatInput/],
  ['tungsten', 'Tungsten electrode', /^processes\.\*\.electrical\.tungsten/],
  ['technique', 'Technique', /^processes\.\*\.technique/],
  ['level', 'Test level', /^standards/],
  ['toughness', 'Toughness and hardness', /^(toughnessRequired|impact|hardness)/],
]

const variableOf = (field: string): string => {
  const pattern = fieldPattern(field)
  return VARIABLES.find(([, , fields]) => fields.test(pattern))?.[0] ?? pattern
}
const labelOf = (variable: string): string => VARIABLES.find(([name]) => name === variable)?.[1] ?? fieldLabel(variable)

/** The level that the coupon was tested to under a standard, as its record says; null where it names none. */
function choiceOf(coupon: AssessedCoupon, id: StandardId): { edition: string; level: '1' | '2' | null } | null {
  const own = coupon.content.variables.standards.find(({ standard }) => standard === id)
  return own ? { edition: own.edition, level: own.level } : null
}

const newest = ({ editions }: Standard): string | null => [...editions].sort((a, b) => (a.id < b.id ? 1 : -1))[0]?.id ?? null

/**
 * One coupon under every registered standard: by the edition and level that its record names, else by the newest edition kept.
 * @returns one entry a standard, in the order in which they are registered; never an error
 */
export function qualifyUnderAll(coupon: AssessedCoupon, standards: readonly Standard[] = registered): UnderStandard[] {
  return standards.map((standard) => {
    const own = choiceOf(coupon, standard.id)
    const edition = own?.edition ?? newest(standard)
    if (edition === null || !standard.editions.some(({ id }) => id === edition)) {
      return { standard: standard.id, edition: null, qualification: null, reason: `The coupon names edition ${edition ?? ''} of ${standard.shortName}, which is not kept here; kept are ${list(standard.editions.map(({ label }) => label))}.` }
    }
    const processes = coupon.content.variables.processes.flatMap(({ process }) => process ?? [])
    if (processes.length === 0) return { standard: standard.id, edition, qualification: null, reason: 'The welding process is not recorded, so nothing can be told.' }
    const strange = processes.filter((process) => !standard.processes.includes(process))
    if (strange.length === processes.length) return { standard: standard.id, edition, qualification: null, reason: `${list([...new Set(strange)].map((process) => (process === 'OTHER' ? 'This process' : process)))} ${strange.length > 1 ? 'are' : 'is'} outside the rules of ${standard.shortName} kept here.` }
    return { standard: standard.id, edition, qualification: qualifyCoupon(coupon, standard.id, edition, own?.level ?? null), reason: null }
  })
}

const isKnown = ({ lower, upper }: Segment): boolean => lower.kind !== 'unknown' && upper.kind !== 'unknown'
/** Nothing of the range can be told. */
const allUnknown = ({ range }: QualifiedRange): boolean => (range.type === 'set' ? range.unknown && !range.any && range.values.length === 0 : range.segments.length > 0 && !range.segments.some((segment) => isKnown(segment) || 'value' in segment.lower || 'value' in segment.upper))

/** A range in words; what of it can't be told is said, never left out. */
function inWords(range: QualifiedSpan): string {
  if (range.type === 'set') return range.any ? 'every value' : `${showSpan(range)}${range.unknown && range.values.length > 0 ? '; whether others too can\'t be told' : ''}`
  const [only] = range.segments
  const fromNothing = only && (only.lower.kind === 'unlimited' || (range.dimension !== 'temperature' && 'value' in only.lower && only.lower.value === 0))
  if (range.segments.length === 1 && fromNothing && only.upper.kind === 'unlimited') return 'every value'
  const told = range.segments.map((segment) => {
    const { lower, upper } = segment
    if (isKnown(segment)) return showSpan({ ...range, segments: [segment] })
    if ('value' in lower) return `above ${show(lower.value, range.unit)} can't be told`
    return 'value' in upper ? `below ${show(upper.value, range.unit)} can't be told` : 'the rest can\'t be told'
  })
  return told.join('; ')
}

/** Rules of a standard for one variable and process in an edition. */
const rulesAt = (standard: Standard, edition: string, process: Process, variable: string): Rule[] =>
  standard.rules.filter(({ meta, at, field }) => meta.editions.includes(edition) && meta.route !== 'prequalified' && meta.classes[process] !== undefined && variableOf(at === 'block' ? `processes.0.${field}` : field) === variable)

interface Asked { coupon: AssessedCoupon; standard: Standard; under: UnderStandard; block: ProcessBlock; variable: string }

function cellOf({ coupon, standard, under, block, variable }: Asked): SideCell {
  const cell = (state: SideCell['state'], words: string, more: Partial<SideCell> = {}): SideCell => ({ standard: standard.id, state, words, clause: null, basis: null, ranges: [], missing: [], ...more })
  const { qualification, edition } = under
  if (!qualification || edition === null) return cell('cannot-tell', under.reason ?? 'It was not judged.')
  const { process } = block
  if (process === null) return cell('cannot-tell', 'The welding process is not recorded.')
  if (!standard.processes.includes(process)) return cell('cannot-tell', `${process === 'OTHER' ? 'This process' : process} is outside the rules of ${standard.shortName} kept here.`)
  const ranges = qualification.ranges.filter((range) => (range.processId === null || range.processId === block.id) && variableOf(range.field) === variable)
  const rules = rulesAt(standard, edition, process, variable)
  const basisOf = (bases: readonly Basis[]): Basis | null => (bases.length > 0 ? bases.reduce(weakest) : null)
  if (ranges.length > 0) {
    const told = ranges.map((range) => {
      const words = allUnknown(range) ? 'can\'t be told' : inWords(range.range)
      return ranges.length === 1 ? words : `${range.label || fieldLabel(range.field)}: ${words}`
    })
    const lacking = ranges.filter(allUnknown)
    const more = { clause: list([...new Set(ranges.map(({ clause }) => clause))]), basis: basisOf(ranges.map(({ basis }) => basis)), ranges, missing: lacking.map(({ reason }) => reason) }
    return lacking.length === ranges.length ? cell('cannot-tell', capital(lacking.map(({ reason }) => reason).join(' ')), more) : cell('range', capital(told.join('; ')), more)
  }
  if (rules.length === 0) return cell('not-a-variable', `No rule of ${standard.shortName} kept here for ${process}.`)
  const clause = list([...new Set(rules.map(({ meta }) => meta.clause))])
  const basis = basisOf(rules.map(({ meta }) => meta.basis))
  const classes = rules.map(({ meta }) => meta.classes[process])
  if (classes.every((own) => own === 'nonessential')) return cell('no-range', 'Nonessential: the procedure states its own value, and no coupon limits it.', { clause, basis })
  const toughness = coupon.content.variables.toughnessRequired === true || coupon.content.toughness.length > 0
  const essential = classes.includes('essential')
  if (!toughness && !essential) return cell('no-range', 'Counts only where toughness is required, and then a coupon without toughness tests, as this one, does not cover it.', { clause, basis })
  const missing = qualification.missing.filter(({ field }) => variableOf(field.replace(/^variables\./, '')) === variable).map(({ message }) => message)
  if (missing.length > 0) return cell('cannot-tell', `Can't be told: ${missing.join(' ')}`, { clause, basis, missing })
  // Rules that give this coupon no range: they judge the procedure when it is written, or do not arise for such a weld.
  return rules.every(({ meta }) => meta.withoutCoupon || meta.classes[process] === 'nonessential')
    ? cell('no-range', 'Judged on the procedure itself; a coupon gives no range for it.', { clause, basis })
    : cell('no-range', 'Does not arise for a weld such as this coupon; judged when a procedure asks for it.', { clause, basis })
}

/**
 * The table of one coupon: rows of variables by process, a cell for every standard, and no cell left blank.
 * @param coupon its identity and content; nothing is changed
 */
export function sideBySide(coupon: AssessedCoupon, standards: readonly Standard[] = registered): SideBySide {
  const all = qualifyUnderAll(coupon, standards)
  const rows: SideRow[] = []
  for (const block of coupon.content.variables.processes) {
    const named = new Set<string>(VARIABLES.map(([variable]) => variable))
    for (const { qualification } of all) for (const range of qualification?.ranges ?? []) if (range.processId === null || range.processId === block.id) named.add(variableOf(range.field))
    for (const variable of named) {
      const cells = standards.flatMap((standard) => {
        const under = all.find((one) => one.standard === standard.id)
        return under ? [cellOf({ coupon, standard, under, block, variable })] : []
      })
      // A variable that no standard has a rule for is left out; where only some can't be told, it stays.
      if (cells.some(({ state, clause }) => state !== 'not-a-variable' && clause !== null)) rows.push({ variable, label: labelOf(variable), processId: block.id, process: block.process, cells })
    }
  }
  return {
    couponId: coupon.id,
    number: coupon.number,
    certified: coupon.certified,
    standards: standards.flatMap((standard) => {
      const under = all.find((one) => one.standard === standard.id)
      if (!under) return []
      const note = standard.editions.find(({ id }) => id === under.edition)?.note
      const lacking = under.qualification?.missing.map(({ message }) => message) ?? []
      return [{ standard: standard.id, shortName: standard.shortName, edition: under.edition, named: choiceOf(coupon, standard.id) !== null, readyToCertify: under.qualification?.readyToCertify ?? false, reason: under.reason, notes: [...(note ? [note] : []), ...lacking] }]
    }),
    rows,
  }
}
