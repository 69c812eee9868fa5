/** Filler metals by AWS/SFA and ISO classification, with F-Number, A-Number and ISO 9606 group; basis and source stand in each row. */
import type { Filler } from '../schemas/welding.ts'
import { fillerSchema } from '../schemas/welding.ts'
import data from './data/filler-metals.json' with { type: 'json' }
import { fillerRowSchema, type FillerRow, type RowContent } from './rows.ts'
import { findRows, squeeze } from './search.ts'

export const fillers: readonly FillerRow[] = data
const byId = new Map(fillers.map((row) => [row.id, row]))

/** @returns the reference row with that key, or null */
export const fillerById = (id: string): FillerRow | null => byId.get(id) ?? null

/**
 * A classification without its optional supplements: diffusible hydrogen (`H4`, `H5` …), moisture (`R`) and the improved
 * toughness sign of A5.1 (`E7018-1`). They alter neither usability group nor analysis.
 */
export function bareClassification(classification: string): string {
  const plain = classification.trim().toUpperCase().replace(/\s+/g, ' ')
  if (/^[EGTWS] \S/.test(plain)) return plain
  return plain.replace(/[\s-]*H(?:2|4|5|8|10|16)R?$/, '').replace(/^(E\d{2}(?:15|16|18|24|28))-1(?=$|R$)/, '$1').replace(/^(E\d{4}M?)R$/, '$1')
}

/** `SFA-5.18`, `A5.18`, `AWS A5.18/A5.18M:2021` → `5.18`; an ISO number without its edition. */
function specNumber(spec: string): string {
  const aws = /(?:SFA|A)\s*-?\s*(5\.\d+)/i.exec(spec)
  return aws?.[1] ?? squeeze(spec.replace(/:\d{4}$/, ''))
}

/** All rows that a classification can mean; an exact one alone, else those that it begins (`E71T-1` → `E71T-1C`, `E71T-1M`). */
export function matchFillers(classification: string, spec?: string | null): FillerRow[] {
  const key = squeeze(bareClassification(classification))
  if (key === '') return []
  const listed = spec ? fillers.filter((row) => row.spec.split(' / ').some((name) => specNumber(name) === specNumber(spec))) : fillers
  const rows = listed.length > 0 ? listed : fillers
  const exact = rows.filter((row) => squeeze(bareClassification(row.classification)) === key)
  if (exact.length > 0 || key.length < 4) return exact
  const begun = bareClassification(classification)
  return rows.filter((row) => row.classification.toUpperCase().startsWith(begun) && !/^\d/.test(row.classification.slice(begun.length)))
}

/** The one row that a classification means (supplements aside); null when it is not listed or not settled. */
export function resolveFiller(classification: string, spec?: string | null): FillerRow | null {
  const rows = matchFillers(classification, spec)
  return rows.length === 1 ? (rows[0] ?? null) : null
}

export const fillerSearch = (row: FillerRow): string =>
  [row.classification, ...row.spec.split(' / '), row.uns, row.f_no && `F-No. ${row.f_no}`, row.f_no && `F-Number ${row.f_no}`, row.a_no && `A-No. ${row.a_no}`, row.a_no && `A-Number ${row.a_no}`, row.iso_9606_filler_group, row.nominal_composition, ...row.processes].filter((part) => part !== null && part !== '' && part !== 0).join(' | ')

/**
 * Type-ahead over classification, specification, UNS, F-Number, A-Number, composition and process.
 * @returns at most `limit` rows, best first
 */
export function findFillers(query: string, limit = 20): FillerRow[] {
  const number = /^\s*([FA])\s*-?\s*(?:No\.?|Number|Nr\.?)\s*(\d+)\s*$/i.exec(query)
  if (number) return fillers.filter((row) => (number[1]?.toUpperCase() === 'F' ? row.f_no : row.a_no) === Number(number[2])).slice(0, limit)
  const read = query.trim().length > 2 ? matchFillers(query) : []
  const found = findRows(fillers, query, (row) => ({ title: row.classification, search: fillerSearch(row) }), fillers.length)
  return [...new Set([...read, ...found])].slice(0, limit)
}

/** What the classification says of the form; null where it leaves it open. */
function productForm(row: FillerRow): Filler['productForm'] {
  const cored = /^(?:E\d{2,3}C-|T )/.test(row.classification) || /5\.(?:20|22|29|36)\b/.test(row.spec)
  if (row.processes.some((process) => process === 'SMAW' || process === '111')) return 'covered-electrode'
  if (cored) return row.processes.some((process) => ['GMAW', '138', '133'].includes(process)) ? 'metal-cored' : 'flux-cored'
  return 'solid'
}

/**
 * Copies a library row into a record. Sizes are left to be picked: the row lists what is made, not what is used.
 * @throws ZodError when the content is not a filler metal's
 */
export function toFiller(content: RowContent<FillerRow>): Filler {
  const row = fillerRowSchema.parse(content)
  const fluxWire = row.processes.includes('SAW') && /^F\d/.test(row.classification)
  return fillerSchema.parse({
    added: true,
    libraryId: row.id,
    specification: row.spec,
    classification: row.classification,
    fNumber: row.f_no === null ? null : String(row.f_no),
    aNumber: row.a_no,
    productForm: productForm(row),
    fluxClassification: fluxWire ? row.classification : null,
  })
}
