/** Which finding stands beside which row, and what a row's gauge draws. */
import type { Assessment, Finding, NumericRange, Verdict } from '@shared/schemas/assessment.ts'
import { worstVerdict } from '@/components/Verdict.tsx'
import { coveredPaths, type PlacedRow } from './catalogue.ts'

/** Where findings go that belong to no row: the record as a whole. */
export const RECORD = 'supportingCoupons'

const RANK: Record<Verdict, number> = { outside: 2, 'cannot-tell': 1, within: 0 }
export const worstFirst = (findings: readonly Finding[]): Finding[] => [...findings].sort((a, b) => RANK[b.verdict] - RANK[a.verdict])

/** Findings by the path of the row they stand beside: the row whose path reaches furthest into the field, else the record. */
export function placeFindings(findings: readonly Finding[], rows: readonly PlacedRow[]): Map<string, Finding[]> {
  const covers = rows.flatMap((row) => coveredPaths(row).map((path) => ({ path, row: row.path }))).sort((a, b) => b.path.length - a.path.length)
  const placed = new Map<string, Finding[]>()
  for (const finding of findings) {
    if (finding.class === 'not-a-variable') continue
    const field = finding.field.replace(/^variables\./, '')
    const at = covers.find(({ path }) => field === path || field.startsWith(`${path}.`)) ?? covers.filter(({ path }) => path.startsWith(`${field}.`)).at(-1)
    const row = at?.row ?? RECORD
    placed.set(row, [...(placed.get(row) ?? []), finding])
  }
  return placed
}

/** The worst verdict of each section, for the index. */
export function sectionVerdicts(placed: ReadonlyMap<string, readonly Finding[]>, rows: readonly PlacedRow[]): Map<string, Verdict> {
  const worst = new Map<string, Verdict>()
  const sectionOf = new Map(rows.map((row) => [row.path, row.sectionId]))
  for (const [path, findings] of placed) {
    const section = sectionOf.get(path) ?? 'coupons'
    const before = worst.get(section)
    const verdict = worstVerdict([...findings.map((finding) => finding.verdict), ...(before ? [before] : [])])
    if (verdict) worst.set(section, verdict)
  }
  return worst
}

export interface GaugeOf {
  range: NumericRange | null
  asked: { min: number | null; max: number | null } | null
  tested: number[]
}

/** What a row's gauge draws: the worst finding that compares figures; of equals, one of what a coupon qualifies before one of the procedure with itself. */
export function gaugeOf(findings: readonly Finding[]): GaugeOf | null {
  const figures = worstFirst(findings).flatMap((finding) => (finding.range?.type === 'numeric' ? [{ finding, range: finding.range, tested: finding.tested.filter((one) => typeof one === 'number') }] : []))
  const drawn = figures.find(({ finding, tested }) => tested.length > 0 && finding.verdict === figures[0]?.finding.verdict) ?? figures[0]
  if (!drawn) return null
  const { asked } = drawn.finding
  return { range: drawn.range, asked: asked && !Array.isArray(asked) ? asked : null, tested: drawn.tested }
}

/** What stands in a gauge's place where names are compared: "PQR-009 welded 23 to 23". */
export function testedInWords(findings: readonly Finding[], couponNumber: (id: string) => string | undefined): string | null {
  for (const { range, tested, couponIds } of worstFirst(findings)) {
    const names = tested.filter((one) => typeof one === 'string')
    const coupons = couponIds.map(couponNumber).filter((one) => one !== undefined)
    if (range?.type === 'set' && names.length > 0 && coupons.length > 0) return `${coupons.join(', ')} welded ${[...new Set(names)].join(', ')}`
  }
  return null
}

/** Findings that stand in the way of "every finding is within": essential ones, and supplementary ones while toughness counts. */
export const needing = (assessments: readonly Assessment[]): Finding[] => worstFirst(assessments.flatMap(({ findings }) => findings.filter((one) => one.verdict !== 'within' && one.class !== 'not-a-variable')))
export const blocking = (findings: readonly Finding[]): Finding[] => findings.filter((one) => one.verdict !== 'within' && (one.class === 'essential' || one.class === 'supplementary'))
