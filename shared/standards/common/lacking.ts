/** Which entries a record lacks, in words: "PQR-1 does not record the pass thickness maximum". */
import { fieldAt, fieldLabel } from '../../comparison/fields.ts'
import type { Interval } from '../../schemas/common.ts'
import { isStated } from './reading.ts'
import { list } from './wording.ts'

/** `thickness`, or `thickness (as one figure)` where a coupon gives a spread in place of the figure that is needed. */
export const lacksFigure = (interval: Interval | null | undefined, path: string): string => (isStated(interval) ? `${path} (as one figure)` : path)

/** The field's path without the record's name and the note in brackets. */
export const pathOfMissing = (missing: string): string => missing.replace(/^.*?: /, '').replace(/ \(.*\)$/, '')

/** A label inside a sentence: `Pass thickness` → `pass thickness`, `A-Number` stays. */
export const lowerFirst = (label: string): string => (/^[A-Z]([A-Z-]|$)/.test(label) ? label : label.charAt(0).toLowerCase() + label.slice(1))

/** A field by its path, whole or below its process block, as the sentence names it; the note stays behind it. */
export function fieldWords(path: string): string {
  const [, bare = path, note] = /^(\S+)(?: \((.*)\))?$/.exec(path) ?? []
  const label = lowerFirst(fieldLabel(fieldAt(bare) ? bare : `processes.*.${bare}`))
  return note ? `${label} ${note.startsWith('as ') ? note : `(${note})`}` : label
}

/**
 * What is missing, by record.
 * @param missing `PQR-1: thickness`, `procedure: processes.0.maxPassThickness`
 * @returns "PQR-1 does not record the X and the Y, and the procedure does not state the Z"; empty when nothing is missing
 */
export function lackWords(missing: readonly string[]): string {
  const byRecord = new Map<string, string[]>()
  for (const text of new Set(missing)) {
    const [, record = '', path = text] = /^(.*?): (.*)$/.exec(text) ?? []
    const words = fieldWords(path)
    const known = byRecord.get(record) ?? []
    if (!known.includes(words)) byRecord.set(record, [...known, words])
  }
  const parts = [...byRecord].map(([record, fields]) => `${record === 'procedure' ? 'the procedure does not state' : `${record} does not record`} the ${list(fields.map((field, i) => (i === 0 ? field : `the ${field}`)))}`)
  return list(parts, parts.length > 2 ? 'and' : ', and').replace(' , and', ', and')
}
