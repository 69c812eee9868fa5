/** Figures of mechanical tests: tensile strength, and the impact energy asked of a narrow Charpy specimen. */
import { worksheet, written, type Calculation, type Source } from './result.ts'

const tensileSource: Source = { standard: 'Tension test', edition: '', clause: '', basis: 'memory', note: 'Load over original area; plain arithmetic.' }

/**
 * Tensile strength of a flat or turned specimen.
 * @param given load in kN; width and thickness, or diameter, in mm
 * @returns MPa
 */
export function tensileStrength(given: { load: number } & ({ shape: 'flat'; width: number; thickness: number } | { shape: 'round'; diameter: number })): Calculation<{ area: number; strength: number }> {
  const sheet = worksheet(tensileSource)
  sheet.need('load', 'Maximum load', given.load, { least: 0, unit: 'kN' })
  if (given.shape === 'flat') {
    sheet.need('width', 'Width', given.width, { above: 0, unit: 'mm' })
    sheet.need('thickness', 'Thickness', given.thickness, { above: 0, unit: 'mm' })
  } else sheet.need('diameter', 'Diameter', given.diameter, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('MPa')
  const area = given.shape === 'flat' ? sheet.step('area', 'width × thickness', `${written(given.width)} × ${written(given.thickness)}`, given.width * given.thickness, 'mm²') : sheet.step('area', 'π / 4 × diameter²', `π / 4 × ${written(given.diameter)}²`, (Math.PI / 4) * given.diameter ** 2, 'mm²')
  const strength = sheet.step('tensile strength', 'load / area', `${written(given.load)} × 1000 / ${written(area)}`, (given.load * 1000) / area, 'MPa')
  return sheet.done('MPa', strength, { area, strength })
}

const charpySource: Source = { standard: 'ASTM A370', edition: '2014', clause: 'table 9', basis: 'secondary', note: 'From a poor scan, completed from memory.' }
export const CHARPY_WIDTHS = [10, 7.5, 6.7, 5, 3.3, 2.5] as const
export type CharpyWidth = (typeof CHARPY_WIDTHS)[number]
/** ft·lbf asked of each width, 10 to 2.5 mm. */
export const CHARPY_TABLE: readonly (readonly number[])[] = [
  [40, 30, 27, 20, 13, 10], [35, 26, 23, 18, 12, 9], [30, 22, 20, 15, 10, 8], [25, 19, 17, 12, 8, 6], [20, 15, 13, 10, 7, 5], [16, 12, 11, 8, 5, 4],
  [15, 11, 10, 8, 5, 4], [13, 10, 9, 6, 4, 3], [12, 9, 8, 6, 4, 3], [10, 8, 7, 5, 3, 2], [7, 5, 5, 4, 2, 2],
]
const J_PER_FTLBF = 1.3558179483314004

/**
 * Energy asked of a sub-size specimen for a full-size requirement. Measured energies are never scaled up to full size.
 * @param given full-size requirement in J, width in mm
 * @returns J; a requirement between the rows of the table goes in proportion to the width, and the result says so
 */
export function charpySubSize({ requirement, width }: { requirement: number; width: number }): Calculation<{ required: number; requiredFtLbf: number; fromTable: boolean }> {
  const sheet = worksheet(charpySource)
  sheet.need('requirement', 'Full-size requirement', requirement, { above: 0, unit: 'J' })
  sheet.need('width', 'Specimen width', width, { above: 0, most: 10, unit: 'mm' })
  if (sheet.refused) return sheet.stop('J')
  const full = sheet.step('full-size requirement', 'J / 1.35582', `${written(requirement)} / 1.35582`, requirement / J_PER_FTLBF, 'ft·lbf')
  const column = CHARPY_WIDTHS.findIndex((each) => Math.abs(each - width) < 1e-9)
  // Metric requirements are the table's figures rounded to whole joules.
  const row = CHARPY_TABLE.find(([first = 0]) => Math.abs(first - full) <= 0.5 / J_PER_FTLBF)
  const cell = column < 0 ? undefined : row?.[column]
  if (cell !== undefined) {
    sheet.step('sub-size requirement', 'table 9', `${written(row?.[0] ?? full)} ft·lbf, width ${written(width)} mm`, cell, 'ft·lbf')
    const required = sheet.step('in joules', 'ft·lbf × 1.35582', `${cell} × 1.35582`, cell * J_PER_FTLBF, 'J')
    return sheet.done('J', required, { required, requiredFtLbf: cell, fromTable: true })
  }
  sheet.outside(column < 0 ? `A width of ${written(width)} mm is not in the table (${CHARPY_WIDTHS.join(', ')} mm); taken in proportion to the width.` : `A requirement of ${written(requirement)} J is no row of the table; taken in proportion to the width, as European product standards do (recalled).`)
  const required = sheet.step('sub-size requirement', 'requirement × width / 10', `${written(requirement)} × ${written(width)} / 10`, (requirement * width) / 10, 'J')
  return sheet.done('J', required, { required, requiredFtLbf: required / J_PER_FTLBF, fromTable: false })
}
