/** Preheat of AWS D1.1: the table by category, and the annex by hydrogen control (susceptibility index, restraint, thickness). */
import { minimumPreheat } from '../standards/aws-d1-1/prequalified/limits.ts'
import type { UnitSystem } from '../units/types.ts'
import { roundUpPreheat } from './preheat-method-b.ts'
import { above, worksheet, written, type Calculation, type Source } from './result.ts'

const celsius = (fahrenheit: number): number => (fahrenheit - 32) / 1.8

export const tablePreheatSource: Source = { standard: 'AWS D1.1/D1.1M', edition: '2020', clause: 'Table 5.8', basis: 'secondary', note: 'Columns A and B read in the 2015 edition, C and D from secondary sources; the list for D is recalled.' }
export const PREHEAT_CATEGORIES = ['A', 'B', 'C', 'D'] as const
export type PreheatCategory = (typeof PREHEAT_CATEGORIES)[number]

/**
 * Minimum preheat and interpass temperature by category and thickest part.
 * @param given thickness in mm; `system` chooses which of the two printed sets of figures binds
 * @returns °C; `value` is the printed minimum
 */
export function preheatByTable({ category, thickness, system = 'SI' }: { category: PreheatCategory; thickness: number; system?: UnitSystem }): Calculation<{ preheat: number; fahrenheit: number; onlyIfCold: boolean }> {
  const sheet = worksheet(tablePreheatSource, { advisory: true })
  sheet.need('thickness', 'Thickness of the thickest part', thickness, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('°C')
  // The table's own figures in the system: a bound of 3/4 in and one of 20 mm are not the same.
  const T = system === 'US' ? Number((thickness / 25.4).toPrecision(12)) : thickness
  const least = system === 'US' ? 0.125 : 3
  if (above(least, T)) sheet.outside(`A thickness of ${written(T)} ${system === 'US' ? 'in' : 'mm'} is below the ${least} ${system === 'US' ? 'in' : 'mm'} at which the table begins.`)
  const printed = minimumPreheat(category, T, system)
  const [preheat, fahrenheit] = system === 'US' ? [celsius(printed), printed] : [printed, printed * 1.8 + 32]
  sheet.step('minimum preheat', `Table 5.8, category ${category}`, `thickest part ${written(T)} ${system === 'US' ? 'in' : 'mm'}`, printed, system === 'US' ? '°F' : '°C')
  const onlyIfCold = fahrenheit <= 32
  if (onlyIfCold) sheet.note('When the base metal is below 0 °C (32 °F), preheat to at least 20 °C (70 °F) and keep it while welding.')
  if (category === 'D') sheet.note('Category D asks for consumables of H8 or less.')
  sheet.note('Two steels of different category take the higher minimum. The thickest part at the point of welding counts.')
  return sheet.done('°C', preheat, { preheat, fahrenheit, onlyIfCold })
}

export const annexSource: Source = { standard: 'AWS D1.1', edition: '2000–2020', clause: 'preheat annex (XI, later I, H, B), hydrogen control', basis: 'memory', note: 'Index formula, groups and table recalled; one cell and the agreement of two routes to the group support them. To be checked against the code’s table.' }

export const HYDROGEN_LEVELS: Readonly<Record<'H1' | 'H2' | 'H3', number>> = { H1: 5, H2: 10, H3: 30 }
export const SUSCEPTIBILITY_GROUPS = ['A', 'B', 'C', 'D', 'E', 'F', 'G'] as const
export type SusceptibilityGroup = (typeof SUSCEPTIBILITY_GROUPS)[number]
/** Highest index, rounded to 0.1, of each group. */
const GROUP_TOP: readonly number[] = [3, 3.5, 4, 4.5, 5, 5.5, 7]

/** Bands of Pcm by which the annex gives the group as well: below each figure, from A for H1, B for H2, C for H3. */
const PCM_BANDS: readonly number[] = [0.18, 0.23, 0.28, 0.33, 0.38]

/** Group by the annex's bands of Pcm; null for a hydrogen that is none of the three levels, and from Pcm 0.38 on. */
export function groupByPcm({ pcm, hydrogen }: { pcm: number; hydrogen: number }): SusceptibilityGroup | null {
  const level = [HYDROGEN_LEVELS.H1, HYDROGEN_LEVELS.H2, HYDROGEN_LEVELS.H3].indexOf(hydrogen)
  const band = PCM_BANDS.findIndex((top) => above(top, pcm))
  return level < 0 || band < 0 ? null : (SUSCEPTIBILITY_GROUPS[level + band] ?? null)
}

/**
 * Susceptibility index 12 Pcm + log10 H and its group. The annex's bands of Pcm do not always give the same letter; a note says where they differ, and the preheat goes by the later one.
 * @param given Pcm in %, hydrogen in ml/100 g (5, 10 or 30 for H1, H2, H3, or the measured value)
 */
export function susceptibility({ pcm, hydrogen }: { pcm: number; hydrogen: number }): Calculation<{ index: number; group: SusceptibilityGroup | null; groupByPcm: SusceptibilityGroup | null }> {
  const sheet = worksheet(annexSource, { advisory: true })
  sheet.need('pcm', 'Pcm', pcm, { least: 0, most: 100, unit: '%' })
  sheet.need('hydrogen', 'Diffusible hydrogen', hydrogen, { above: 0, unit: 'ml/100 g' })
  if (sheet.refused) return sheet.stop('')
  const index = sheet.step('susceptibility index', '12 × Pcm + log10(H)', `12 × ${written(pcm)} + log10(${written(hydrogen)})`, 12 * pcm + Math.log10(hydrogen))
  const rounded = Math.round(index * 10 + 1e-9) / 10
  const group = SUSCEPTIBILITY_GROUPS[GROUP_TOP.findIndex((top) => rounded <= top)] ?? null
  if (group) sheet.stepText('group', `index rounded to one decimal: ${rounded}`, 'A to 3.0, B to 3.5, C to 4.0, D to 4.5, E to 5.0, F to 5.5, G to 7.0', group)
  else sheet.outside(`An index of ${written(rounded)} is above 7.0, where the groups end.`)
  const byPcm = groupByPcm({ pcm, hydrogen })
  if (byPcm && group && byPcm !== group) sheet.note(`By the bands of Pcm the group is ${byPcm}, by the index ${group}: the later letter is the safe one; check the code.`)
  return sheet.done('', index, { index, group, groupByPcm: byPcm })
}

export const RESTRAINTS = ['low', 'medium', 'high'] as const
export type Restraint = (typeof RESTRAINTS)[number]
/** °F for groups A to G by rows of rising thickness; null = no more than ambient (below 65 °F). */
const A = null
const TABLE: Readonly<Record<Restraint, readonly (readonly (number | null)[])[]>> = {
  low: [[A, A, A, A, 140, 280, 300], [A, A, 65, 140, 210, 280, 300], [A, A, 65, 175, 230, 280, 300], [65, 65, 100, 200, 250, 280, 300], [65, 65, 100, 200, 250, 280, 300]],
  medium: [[A, A, A, A, 160, 280, 320], [A, A, 65, 175, 240, 290, 320], [A, 65, 165, 230, 280, 300, 320], [65, 175, 230, 265, 300, 300, 320], [200, 250, 280, 300, 320, 320, 320]],
  high: [[A, A, A, 100, 230, 300, 320], [A, 65, 150, 220, 280, 320, 320], [65, 185, 240, 280, 300, 320, 320], [240, 265, 300, 300, 320, 320, 320], [240, 265, 300, 300, 320, 320, 320]],
}
const BANDS = ['below 3/8 in', '3/8 to 3/4 in', 'over 3/4 to 1-1/2 in', 'over 1-1/2 to 3 in', 'over 3 in'] as const

function bandOf(thickness: number): number {
  const inches = thickness / 25.4
  if (above(0.375, inches)) return 0
  return 1 + [0.75, 1.5, 3].filter((top) => above(inches, top)).length
}

export interface AnnexFigures {
  group: SusceptibilityGroup
  band: string
  /** °C and °F; null = no more than ambient. */
  preheat: number | null
  fahrenheit: number | null
  /** °C up to the next 5, as it goes to the welder; null = no more than ambient. */
  toUse: number | null
  required: boolean
}

/**
 * Minimum preheat and interpass of the annex from restraint, thickness and group.
 * @param given thickness in mm
 * @returns °C; `value` null where no more than ambient is asked
 */
export function preheatByAnnexGroup({ restraint, thickness, group }: { restraint: Restraint; thickness: number; group: SusceptibilityGroup }): Calculation<AnnexFigures> {
  const sheet = worksheet(annexSource, { advisory: true })
  sheet.need('thickness', 'Thickness', thickness, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('°C')
  const row = bandOf(thickness)
  const band = BANDS[row] ?? BANDS[4]
  const fahrenheit = TABLE[restraint][row]?.[SUSCEPTIBILITY_GROUPS.indexOf(group)] ?? null
  const where = `restraint ${restraint}, ${band}, group ${group}`
  sheet.note('To be checked against the code’s table before it is used as a requirement: most cells are recalled.')
  if (fahrenheit === null) {
    sheet.stepText('minimum preheat', 'annex table', where, 'no more than ambient (below 65 °F)')
    return sheet.done('°C', null, { group, band, preheat: null, fahrenheit: null, toUse: null, required: false })
  }
  sheet.step('minimum preheat', 'annex table', where, fahrenheit, '°F')
  const preheat = sheet.step('in Celsius', '(°F − 32) / 1.8', `(${fahrenheit} − 32) / 1.8`, celsius(fahrenheit), '°C')
  return sheet.done('°C', preheat, { group, band, preheat, fahrenheit, toUse: roundUpPreheat(preheat), required: true })
}

/** `group` and `required` are null where the index lies above the groups. */
export interface AnnexWayFigures extends Omit<AnnexFigures, 'group' | 'required'> { index: number; group: SusceptibilityGroup | null; groupByPcm: SusceptibilityGroup | null; required: boolean | null }

/** The whole way of the annex by hydrogen control: index, group, table. `value` is the preheat, °C; null where ambient is enough or no group holds. */
export function preheatByAnnex({ pcm, hydrogen, restraint, thickness }: { pcm: number; hydrogen: number; restraint: Restraint; thickness: number }): Calculation<AnnexWayFigures> {
  const index = susceptibility({ pcm, hydrogen })
  const byIndex = index.figures?.group ?? null
  // Where the two ways differ the later letter counts: never less preheat than either asks. A measured hydrogen asks no less than the level below it.
  const level = Math.max(...Object.values(HYDROGEN_LEVELS).filter((each) => each <= hydrogen))
  const byPcm = groupByPcm({ pcm, hydrogen: level })
  const group = byIndex && byPcm && byPcm > byIndex ? byPcm : byIndex
  // Without a group the table still tells the band and checks the thickness.
  const table = preheatByAnnexGroup({ restraint, thickness, group: group ?? 'G' })
  const joined = { ...table, problems: [...index.problems, ...table.problems], notes: [...index.notes, ...(group !== byIndex ? [`Group ${group ?? ''} of the bands of Pcm counts here: it is later than ${byIndex ?? ''} of the index.`] : []), ...table.notes], validity: { inside: index.validity.inside && table.validity.inside, said: [...index.validity.said, ...table.validity.said] } }
  if (!index.figures || !table.figures) return { ...joined, value: null, figures: null, steps: [] }
  if (!group) return { ...joined, value: null, figures: { ...index.figures, band: table.figures.band, preheat: null, fahrenheit: null, toUse: null, required: null }, steps: index.steps }
  return { ...joined, steps: [...index.steps, ...table.steps], figures: { ...table.figures, ...index.figures, group } }
}

export const hardnessControlSource: Source = { ...annexSource, clause: 'preheat annex, hardness control', note: 'For fillet welds: a critical cooling rate from CE (AWS), then a least energy for a single pass from a chart. The charts are not kept here.' }

/**
 * Hardness control of the annex: states what the charts are entered with and keeps what somebody read from them.
 * @param given CE (AWS) in %, hardness 350 or 400 HV; `readEnergy` the least single-pass energy read from the code, kJ/mm
 */
export function hardnessControl({ ceAws, hardness, readEnergy = null }: { ceAws: number; hardness: 350 | 400; readEnergy?: number | null }): Calculation<{ ceAws: number; hardness: number; readEnergy: number | null }> {
  const sheet = worksheet(hardnessControlSource, { advisory: true })
  sheet.need('ceAws', 'CE (AWS)', ceAws, { least: 0, most: 100, unit: '%' })
  if (readEnergy !== null) sheet.need('readEnergy', 'Energy read from the code', readEnergy, { above: 0, unit: 'kJ/mm' })
  if (sheet.refused) return sheet.stop('kJ/mm')
  sheet.note('For fillet welds only. Carbon up to 0.11 %: hardness or hydrogen control; above, the code’s zone chart decides.')
  sheet.note(readEnergy === null ? `The charts are not kept here. Read the least single-pass energy from the code with CE ${written(ceAws)} and ${hardness} HV, and enter it.` : `Read by you from the code with CE ${written(ceAws)} and ${hardness} HV; not computed here.`)
  return sheet.done('kJ/mm', readEnergy, { ceAws, hardness, readEnergy })
}
