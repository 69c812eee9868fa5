/**
 * Base metals: ASME IX QW/QB-422 P-Numbers and Groups, ISO/TR 15608 groups and AWS groups by specification and grade.
 * The listing decides, not strength nor analysis; basis and source stand in each row.
 */
import type { BaseMetal } from '../schemas/welding.ts'
import { quantity } from '../units/convert.ts'
import data from './data/base-metals.json' with { type: 'json' }
import { baseMetalRowSchema, type BaseMetalRow, type RowContent } from './rows.ts'
import { findRows, squeeze } from './search.ts'

export const baseMetals: readonly BaseMetalRow[] = data
const byId = new Map(baseMetals.map((row) => [row.id, row]))

/** @returns the reference row with that key, or null */
export const baseMetalById = (id: string): BaseMetalRow | null => byId.get(id) ?? null

/** `A/SA-516` is listed under both prefixes: `A516` and `SA516`. */
function specKeys(spec: string): string[] {
  const both = /^([AB])\/S\1-?(.+)$/i.exec(spec.replaceAll(' ', ''))
  if (both) return [squeeze(`${both[1]}${both[2]}`), squeeze(`S${both[1]}${both[2]}`)]
  return [squeeze(spec)]
}

/** The specification as somebody writes it: without society, metric twin (`A516/A516M`) and year. */
function specKey(spec: string): string {
  const plain = spec.replace(/\b(?:ASTM|ASME)\b/gi, '').trim()
  const listedTwice = /^([AB])\/S\1\s*-?\s*(\d.*)$/i.exec(plain)
  if (listedTwice) return squeeze(`${listedTwice[1]}${listedTwice[2]}`)
  return squeeze(plain.replace(/\/\s*S?[AB]\s*-?\s*\d+M?$/i, '').replace(/^(S?[AB]\s*-?\s*\d+)M$/i, '$1').replace(/^(?:BS|DIN|NF)\s+(?=EN)/i, '').replace(/:\d{4}.*$/, ''))
}

const ALUMINIUM = /^(?:ENAW-?|AW-?)?(\d{4}A?)(?:[-\s]?(O|F|H\d+|T\d+)(?:\/(?:O|H\d+|T\d+))?)?$/i

/** Words of a grade that tell rows apart: `Type E Gr. B` → e, b; `11 Cl. 2` → 11, cl2; `TP304L` → 304l. */
function gradeTokens(grade: string): string[] {
  const plain = grade
    .replace(/\((?!Gr|S\d|[A-Z]\d)[^)]*\)|,?\s*t\s*[≤<=].*$/gi, ' ')
    .replace(/—/g, ' ')
    .replace(/\b(?:Grade|Gr|Type)\b\.?/gi, ' ')
    .replace(/\bTP\s?(?=\d)/gi, '')
    .replace(/\b(?:Class|Cl)\b\.?\s*/gi, 'Cl')
    .replace(/\bannealed\b|\bnaval brass\b|\baluminium bronze\b/gi, ' ')
    .trim()
  const aluminium = ALUMINIUM.exec(plain.replace(/^EN AW-/i, 'AW-'))
  if (aluminium) return [aluminium[1], aluminium[2]].flatMap((part) => (part ? [squeeze(part)] : []))
  return plain.split(/\s+/).map(squeeze).filter((token) => token !== '')
}

/** A row whose grade lists several (`A, B`, `B / L245`, `2205 (S32205)`) answers to each. */
function gradesOf(row: { grade: string }): string[][] {
  const alternatives = row.grade.replace(/\s*\(([A-Z]\d{5})\)/g, ' / $1').replace(/\(Gr\. \d\)/g, '')
  const parts = ALUMINIUM.test(alternatives.replace(/^EN AW-/i, 'AW-')) ? [alternatives] : alternatives.replace(/\([^)]*\)|,?\s*t\s*≤.*$/g, '').split(/\s*,\s*|\s+\/\s+/)
  return parts.map(gradeTokens)
}

const numberKeys = (row: BaseMetalRow): string[] => (row.uns_or_en_number ? [squeeze(row.uns_or_en_number)] : [])
const same = (one: readonly string[], other: readonly string[]): boolean => one.length === other.length && one.every((token, index) => token === other[index])
const within = (few: readonly string[], many: readonly string[]): boolean => few.every((token) => many.includes(token))

/** Rows whose grade is, or else includes, the one asked for. */
function byGrade(rows: readonly BaseMetalRow[], grade: string): BaseMetalRow[] {
  const asked = gradeTokens(grade)
  const joined = asked.join('')
  const written = rows.filter((row) => row.grade === grade)
  if (written.length > 0) return written
  const exact = rows.filter((row) => gradesOf(row).some((tokens) => same(tokens, asked) || (joined !== '' && tokens.join('') === joined)) || row.aliases.some((alias) => squeeze(alias) === joined))
  if (exact.length > 0) return exact
  if (asked.length === 0) return [...rows]
  const byNumber = rows.filter((row) => numberKeys(row).includes(joined))
  if (byNumber.length > 0) return byNumber
  return rows.filter((row) => gradesOf(row).some((tokens) => within(asked, tokens)))
}

/**
 * All rows that a specification and grade can mean: one when it is exact, several when it leaves something open
 * (`A53`, `Gr. B` is Type E or S), none when it is not listed. `A36`, `SA-36` and `ASTM A36/A36M` are one look-up.
 */
export function matchBaseMetals(spec: string, grade: string): BaseMetalRow[] {
  const key = specKey(spec)
  return byGrade(baseMetals.filter((row) => specKeys(row.spec).includes(key)), grade)
}

/**
 * The one row that a specification and grade mean.
 * @returns null when it is not listed or when several rows answer (see {@link matchBaseMetals})
 */
export function resolveBaseMetal(spec: string, grade: string): BaseMetalRow | null {
  const rows = matchBaseMetals(spec, grade)
  return rows.length === 1 ? (rows[0] ?? null) : null
}

const SPEC_AND_GRADE = /^(S?[AB])\s*-?\s*(\d{2,4})(?:M\b)?(?:\/S?[AB]-?\d+M?)?[\s-]*(.*)$/i
const EN_OR_API = /^(EN\s*\d+(?:-\d+)?|API\s*5L)[\s:-]*(.*)$/i

/**
 * Rows meant by a metal written in one string: `A516-70`, `A106B`, `SA-240 304L`, `S355J2`, `304L`, `6061`, `1.4404`, `S31603`, `P91`.
 * @returns exact matches before grades that only begin so (`S355` → S355JR …); empty when nothing is listed
 */
export function readBaseMetals(text: string): BaseMetalRow[] {
  const written = text.trim().replace(/^(?:ASTM|ASME)\s+/i, '')
  if (written === '') return []
  for (const pattern of [SPEC_AND_GRADE, EN_OR_API]) {
    const parts = pattern.exec(written)
    if (!parts) continue
    const [spec, grade] = pattern === SPEC_AND_GRADE ? [`${parts[1]}${parts[2]}`, parts[3] ?? ''] : [parts[1] ?? '', parts[2] ?? '']
    const rows = matchBaseMetals(spec, grade)
    if (rows.length > 0) return rows
  }
  const key = squeeze(written)
  const byNumber = baseMetals.filter((row) => numberKeys(row).includes(key))
  const byAlloy = baseMetals.filter((row) => numberKeys(row).includes(`aw${key}`))
  const exact = baseMetals.filter((row) => gradesOf(row).some((tokens) => tokens.join('') === gradeTokens(written).join('')))
  if (exact.length > 0) return [...new Set([...exact, ...byNumber])]
  if (byNumber.length > 0) return byNumber
  const asked = gradeTokens(written)
  const contained = baseMetals.filter((row) => asked.length > 0 && gradesOf(row).some((tokens) => within(asked, tokens)))
  if (byAlloy.length > 0 || contained.length > 0) return baseMetals.filter((row) => byAlloy.includes(row) || contained.includes(row))
  return /^[sp]\d{3}$/.test(key) ? baseMetals.filter((row) => gradesOf(row).some((tokens) => tokens.join('').startsWith(key))) : []
}

/** `SA-516 70`, `EN 10025-2 S355JR`; a specification with one grade stands alone. */
export const baseMetalTitle = (row: Pick<BaseMetalRow, 'spec' | 'grade'>): string => (row.grade === '—' || row.grade === '' ? row.spec : `${row.spec} ${row.grade}`)

export const baseMetalSearch = (row: BaseMetalRow): string =>
  [...specKeys(row.spec), ...specKeys(row.spec).flatMap((key) => gradesOf(row).map((tokens) => `${key} ${tokens.join(' ')}`)), row.grade, ...gradesOf(row).map((tokens) => tokens.join(' ')), row.uns_or_en_number, ...row.aliases, row.product_form, row.nominal_composition, row.p_no && `P-No. ${row.p_no}`, row.p_no && `P-Number ${row.p_no}`, row.p_no && row.group_no && `P-No. ${row.p_no} Group ${row.group_no}`, row.iso_15608_subgroup && `ISO 15608 group ${row.iso_15608_subgroup}`, row.aws_d1_1_group && `D1.1 group ${row.aws_d1_1_group}`, row.aws_d1_2_m_no && `M-No. ${row.aws_d1_2_m_no}`].filter((part) => part !== null && part !== '' && part !== 0).join(' | ')

const P_NUMBER_QUERY = /^\s*P\s*-?\s*(?:No\.?|Number|Nr\.?)\s*(\d+[A-Z]?)\s*(?:,?\s*(?:Gr(?:oup|\.)?)\s*(?:No\.?\s*)?(\d))?\s*$/i

const ISO_GROUP_QUERY = /^\s*(?:ISO\s*)?(?:(?:\/?TR\s*)?15608\s*)?(?:group|gr\.?|15608)\s*(\d{1,2}(?:\.\d)?)\s*$/i

/**
 * Type-ahead over grade, specification, UNS or EN number, P-Number (`P-No. 8`, `P-No. 1 Group 2`), group and product form.
 * @returns at most `limit` rows, best first
 */
export function findBaseMetals(query: string, limit = 20): BaseMetalRow[] {
  const pNumber = P_NUMBER_QUERY.exec(query)
  if (pNumber) return baseMetals.filter((row) => row.p_no?.toUpperCase() === pNumber[1]?.toUpperCase() && (!pNumber[2] || row.group_no === Number(pNumber[2]))).slice(0, limit)
  const isoGroup = ISO_GROUP_QUERY.exec(query)
  if (isoGroup) return baseMetals.filter((row) => row.iso_15608_subgroup === isoGroup[1] || row.iso_15608_group === isoGroup[1]).slice(0, limit)
  const read = query.trim().length > 1 ? readBaseMetals(query) : []
  const found = findRows(baseMetals, query, (row) => ({ title: baseMetalTitle(row), search: baseMetalSearch(row) }), baseMetals.length)
  return [...new Set([...read, ...found])].slice(0, limit)
}

/**
 * Copies a library row into a record, so that a later correction of the library never alters it.
 * @throws ZodError when the content is not a base metal's
 */
export function toBaseMetal(content: RowContent<BaseMetalRow>): BaseMetal {
  const row = baseMetalRowSchema.parse(content)
  return {
    libraryId: row.id,
    specification: row.spec,
    grade: row.grade === '—' || row.grade === '' ? null : row.grade,
    uns: row.uns_or_en_number,
    productForm: row.product_form,
    pNumber: row.p_no,
    groupNumber: row.group_no,
    iso15608: row.iso_15608_subgroup ?? row.iso_15608_group,
    d11Group: row.aws_d1_1_group,
    d12MNumber: row.aws_d1_2_m_no,
    minTensile: row.min_tensile_mpa === null ? null : quantity(row.min_tensile_mpa, 'stress', 'MPa'),
    minYield: row.min_yield_mpa === null ? null : quantity(row.min_yield_mpa, 'stress', 'MPa'),
    minElongation: row.min_elongation_pct === null ? null : quantity(row.min_elongation_pct, 'percent', '%'),
    condition: null,
    heatNumber: null,
    certificate: null,
  }
}
