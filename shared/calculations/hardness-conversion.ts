/**
 * Hardness and strength of unalloyed and low-alloy steel against each other. For information: a limit in HV is judged on measured HV only.
 * Straight between rows, never beyond the table.
 */
import { worksheet, written, type Calculation, type Source } from './result.ts'

export const isoConversionSource: Source = { standard: 'ISO 18265', edition: '', clause: 'table A.1', basis: 'secondary', note: 'A published table headed DIN 50150, which the standard took over; its edition is not told there. Three figures of strength that are obvious slips there are set right from memory (HV 80, 120, 360).' }
export const astmConversionSource: Source = { standard: 'ASTM E140', edition: '', clause: 'table 1', basis: 'secondary', note: 'Selected points for non-austenitic steel; the Brinell figures (10 mm, 3000 kgf) are recalled.' }

interface Row { hv: number; hb: number | null; hrc: number | null; rm: number | null }
/** HRC begins at HV 240. */
export const HARDNESS_TABLE: readonly Row[] = [
  { hv: 80, hb: 76, hrc: null, rm: 255 },
  { hv: 90, hb: 85.5, hrc: null, rm: 285 },
  { hv: 100, hb: 95, hrc: null, rm: 320 },
  { hv: 110, hb: 105, hrc: null, rm: 350 },
  { hv: 120, hb: 114, hrc: null, rm: 385 },
  { hv: 130, hb: 124, hrc: null, rm: 415 },
  { hv: 140, hb: 133, hrc: null, rm: 450 },
  { hv: 150, hb: 143, hrc: null, rm: 480 },
  { hv: 160, hb: 152, hrc: null, rm: 510 },
  { hv: 170, hb: 162, hrc: null, rm: 545 },
  { hv: 180, hb: 171, hrc: null, rm: 575 },
  { hv: 190, hb: 181, hrc: null, rm: 610 },
  { hv: 200, hb: 190, hrc: null, rm: 640 },
  { hv: 210, hb: 199, hrc: null, rm: 675 },
  { hv: 220, hb: 209, hrc: null, rm: 705 },
  { hv: 230, hb: 219, hrc: null, rm: 740 },
  { hv: 240, hb: 228, hrc: 20.3, rm: 770 },
  { hv: 245, hb: 233, hrc: 21.3, rm: 785 },
  { hv: 250, hb: 238, hrc: 22.2, rm: 800 },
  { hv: 255, hb: 242, hrc: 23.1, rm: 820 },
  { hv: 260, hb: 247, hrc: 24.0, rm: 835 },
  { hv: 265, hb: 252, hrc: 24.8, rm: 850 },
  { hv: 270, hb: 257, hrc: 25.6, rm: 865 },
  { hv: 275, hb: 261, hrc: 26.4, rm: 880 },
  { hv: 280, hb: 266, hrc: 27.1, rm: 900 },
  { hv: 285, hb: 271, hrc: 27.8, rm: 915 },
  { hv: 290, hb: 276, hrc: 28.5, rm: 930 },
  { hv: 295, hb: 280, hrc: 29.2, rm: 950 },
  { hv: 300, hb: 285, hrc: 29.8, rm: 965 },
  { hv: 310, hb: 295, hrc: 31.0, rm: 995 },
  { hv: 320, hb: 304, hrc: 32.2, rm: 1030 },
  { hv: 330, hb: 314, hrc: 33.3, rm: 1060 },
  { hv: 340, hb: 323, hrc: 34.4, rm: 1095 },
  { hv: 350, hb: 333, hrc: 35.5, rm: 1125 },
  { hv: 360, hb: 342, hrc: 36.6, rm: 1155 },
  { hv: 370, hb: 352, hrc: 37.7, rm: 1190 },
  { hv: 380, hb: 361, hrc: 38.8, rm: 1220 },
  { hv: 390, hb: 371, hrc: 39.8, rm: 1255 },
  { hv: 400, hb: 380, hrc: 40.8, rm: 1290 },
  { hv: 410, hb: 390, hrc: 41.8, rm: 1320 },
  { hv: 420, hb: 399, hrc: 42.7, rm: 1350 },
  { hv: 430, hb: 409, hrc: 43.6, rm: 1385 },
  { hv: 440, hb: 418, hrc: 44.5, rm: 1420 },
  { hv: 450, hb: 428, hrc: 45.3, rm: 1455 },
]
const E140: readonly Row[] = [[22, 248, 237], [25, 266, 253], [30, 302, 286], [35, 345, 327], [40, 392, 371], [45, 446, 421], [50, 513, null], [55, 595, null], [60, 697, null], [65, 832, null]].map(([hrc, hv, hb]) => ({ hv: hv ?? 0, hb: hb ?? null, hrc: hrc ?? null, rm: null }))

export const HARDNESS_SCALES = ['hv', 'hb', 'hrc', 'rm'] as const
export type HardnessScale = (typeof HARDNESS_SCALES)[number]
export const hardnessScaleLabels: Readonly<Record<HardnessScale, { label: string; unit: string }>> = { hv: { label: 'Vickers hardness', unit: 'HV' }, hb: { label: 'Brinell hardness', unit: 'HB' }, hrc: { label: 'Rockwell hardness', unit: 'HRC' }, rm: { label: 'Tensile strength', unit: 'MPa' } }
export type HardnessFigures = Record<HardnessScale, number | null>

/** `to` at a figure on `from`, straight between the rows that have both; null outside them. */
function lookUp(table: readonly Row[], from: HardnessScale, value: number, to: HardnessScale): number | null {
  const points = table.flatMap((row) => (row[from] === null || row[to] === null ? [] : [{ x: row[from], y: row[to] }]))
  const index = points.findIndex(({ x }) => x >= value - 1e-9)
  const [right, left] = [points[index], points[index - 1]]
  if (!right) return null
  if (Math.abs(right.x - value) <= 1e-9) return right.y
  return left ? left.y + ((value - left.x) / (right.x - left.x)) * (right.y - left.y) : null
}

const sheetName = (standard: 'iso-18265' | 'astm-e140'): string => (standard === 'iso-18265' ? 'ISO 18265 table A.1' : 'ASTM E140 table 1')

/**
 * Converts a hardness or strength to the other scales.
 * @param given the figure and its scale; `standard` which table, as the two differ by a few HV
 * @returns `value` in HV; a scale the table doesn't reach is null
 */
export function convertHardness({ scale, figure, standard = 'iso-18265' }: { scale: HardnessScale; figure: number; standard?: 'iso-18265' | 'astm-e140' }): Calculation<HardnessFigures> {
  const iso = standard === 'iso-18265'
  const sheet = worksheet(iso ? isoConversionSource : astmConversionSource, { advisory: true })
  const { label, unit } = hardnessScaleLabels[scale]
  sheet.need('figure', label, figure, { above: 0, unit })
  if (sheet.refused) return sheet.stop('HV')
  const table = iso ? HARDNESS_TABLE : E140
  const known = table.flatMap((row) => (row[scale] === null ? [] : [row[scale]]))
  if (known.length === 0) {
    sheet.outside(`${sheetName(standard)} as kept here has no ${label.toLowerCase()}.`)
    return sheet.done<HardnessFigures>('HV', null, { hv: null, hb: null, hrc: null, rm: null, [scale]: figure })
  }
  sheet.within(label, figure, Math.min(...known), Math.max(...known), unit)
  const to = (target: HardnessScale): number | null => {
    if (target === scale) return figure
    const value = lookUp(table, scale, figure, target)
    if (value !== null) sheet.step(hardnessScaleLabels[target].label, `${sheetName(standard)}, straight between rows`, `${written(figure)} ${unit}`, value, hardnessScaleLabels[target].unit)
    return value
  }
  const figures = { hv: to('hv'), hb: to('hb'), hrc: to('hrc'), rm: to('rm') }
  if (iso && figures.hv !== null && figures.hv < 240) sheet.note('Rockwell C is not given below HV 240.')
  sheet.note('For information only: a limit in HV is judged on measured HV. The two standards differ by a few HV, so state which was used.')
  return sheet.done('HV', figures.hv, figures)
}
